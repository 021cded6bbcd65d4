/** @module leastterm sum: one prescription, as many digits as are wanted. */
import type { Call, Command } from '../command.js';
import { seriesExtras } from '../chain-extras.js';
import { EXIT, UsageError } from '../faults.js';
import { couplingOf, readSeries, requestOf, USUAL_DIGITS, wantedCoupling } from '../input.js';
import { deliver } from '../output.js';
import { presentation } from '../present.js';

/** The prescription that --by names; a usage error with the known names otherwise. */
async function prescriptionOf(by: string | undefined): Promise<string> {
  const { prescriptions, series } = await import('../rooms.js');
  const names = [
    ...prescriptions.PRESCRIPTIONS,
    ...Object.values(prescriptions.CONTOUR_NAMES),
    prescriptions.BUBBLE_CHAIN,
  ].map((p) => p.name);
  if (by !== undefined && names.includes(by)) return by;
  const known = `one of ${names.join(', ')}`;
  if (by === undefined) throw new UsageError(`--by is missing: ${known}`, sum.name);
  throw new UsageError(`--by: no prescription "${by}"${series.suggestion(by, names)}; wanted ${known}`, sum.name);
}

const plain = (variant: string): string => variant.replaceAll(' ', '').toLowerCase();

async function run(call: Call): Promise<number> {
  const [name = ''] = call.operands;
  const { given } = call;
  const by = await prescriptionOf(given.by);
  const wanted = await wantedCoupling(call, sum.name);
  const series = await readSeries(name, call);
  const { at, path } = await couplingOf(wanted, series, sum.name);
  const { report, studies } = await import('../rooms.js');
  const result = studies.sumStudy(series, at, {
    ...(given.order === undefined ? {} : { order: given.order }),
    digits: given.digits ?? USUAL_DIGITS,
    ...(path === undefined ? {} : { path }),
    ...(await seriesExtras(series, [by], sum.name)),
    request: requestOf(sum.name, name, call),
  });
  const { variant } = given;
  const values = result.values.filter((entry) => variant === undefined || plain(entry.variant) === plain(variant));
  if (values.length === 0 && variant !== undefined) {
    const known = result.values.map((entry) => `"${entry.variant}"`).join(', ');
    throw new UsageError(`--variant: ${by} has no "${variant}" here; wanted one of ${known}`, sum.name);
  }
  const chosen = { ...result, values };
  if (given.json) deliver(report.resultJson(chosen), call);
  else deliver(given.quiet ? report.bareValues(values) : report.sumText(chosen, await presentation(call)), call);
  return values.every((entry) => entry.refused !== undefined) ? EXIT.allRefused : EXIT.done;
}

export const sum: Command = {
  name: 'sum',
  summary: 'one prescription, to any number of digits',
  about: [
    "Sums the series by one prescription: every member of the family with its value, truncation error, ambiguity and trust, or a refusal with its reason and remedy. With --quiet only the value of the family's own choice, for scripts.",
    'Prescriptions: fixed-order, least-term, terminant, hyperasymptotic, scale-variation, fac, pms, blm, pade, wynn-epsilon, levin, weniger-delta, euler, order-dependent-map, borel-pade, borel-leroy-pade, borel-dlog, borel-partial-pade, borel-quadratic, borel-conformal, borel-hypergeometric, borel-pade-2, singularity-model; for contour quantities also contour-improved, contour-borel, contour-borel-pade, condensate-subtracted; for series that name their chain also bubble-chain.',
  ],
  operands: [{ name: 'SERIES', help: 'a catalogue id, a series file, or - for standard input' }],
  options: [
    'by',
    'variant',
    'at',
    'alpha-s-mz',
    'order',
    'strong-coupling',
    'flavours',
    'digits',
    'json',
    'output',
    'quiet',
    'no-color',
    'help',
  ],
  needs: ['by', 'at'],
  examples: [
    [
      'leastterm sum adler --by borel-pade --at 0.3156',
      'its Borel-Pade sums over the near-diagonal table, one after the other',
    ],
    [
      "leastterm sum adler --by borel-pade --variant '[2/2]' --at 0.3156 --digits 50",
      'one entry, fifty certified digits',
    ],
    ['leastterm sum adler --by fixed-order --at 0.3156 -q', 'the bare number, for a script'],
  ],
  run,
};
