/** @module leastterm contour: a quantity on a circle, order by order, at fixed order and contour improved. */
import type { Call, Command } from '../command.js';
import { EXIT, UsageError } from '../faults.js';
import { couplingOf, readSeries, requestOf, USUAL_DIGITS, wantedCoupling } from '../input.js';
import { deliver } from '../output.js';
import { presentation } from '../present.js';
import type { ContourStudyOptions } from '../../studies/index.js';

/** R/√s_0 beyond this makes logarithms that no order of the series can follow. */
const LARGEST_RATIO = 10;

async function weightOf(text: string | undefined): Promise<Pick<ContourStudyOptions, 'weight'>> {
  if (text === undefined) return {};
  const { series } = await import('../rooms.js');
  const weight = series.parseWeight(text);
  if ('problem' in weight) throw new UsageError(`--weight: ${weight.problem}; wanted ${weight.wanted}`, contour.name);
  return { weight };
}

async function normOf(text: string | undefined): Promise<Pick<ContourStudyOptions, 'norm'>> {
  if (text === undefined) return {};
  if (text === 'model') return { norm: text };
  const { series, numerics } = await import('../rooms.js');
  const norm = series.parseUncertain(text);
  if (series.isNumberProblem(norm))
    throw new UsageError(`--norm: ${norm.problem}; wanted ${norm.wanted}, or model`, contour.name);
  if (numerics.isZeroExact(norm.value))
    throw new UsageError('--norm: 0 subtracts nothing; wanted a number other than 0, or model', contour.name);
  return { norm };
}

async function ratioOf(text: string | undefined): Promise<Pick<ContourStudyOptions, 'ratio'>> {
  if (text === undefined) return {};
  const { numerics } = await import('../rooms.js');
  const ratio = numerics.Rational.parse(text);
  if (ratio === undefined || ratio.sign() <= 0 || ratio.toNumber() > LARGEST_RATIO)
    throw new UsageError(
      `--subtraction-scale: "${text}" is no ratio R/sqrt(s_0); wanted a number above 0 and at most ${LARGEST_RATIO}, such as 0.8`,
      contour.name,
    );
  return { ratio };
}

async function run(call: Call): Promise<number> {
  const [name = ''] = call.operands;
  const { given } = call;
  const wanted = await wantedCoupling(call, contour.name);
  const own = {
    ...(await weightOf(given.weight)),
    ...(await normOf(given.norm)),
    ...(await ratioOf(given.subtractionScale)),
    ...(given.loops === undefined ? {} : { loops: given.loops }),
  };
  const series = await readSeries(name, call);
  const { at, path } = await couplingOf(wanted, series, contour.name);
  const { report, studies } = await import('../rooms.js');
  const more = await import('../rooms-more.js');
  const result = studies.contourStudy(
    series,
    at,
    {
      ...own,
      ...(given.order === undefined ? {} : { order: given.order }),
      ...(path === undefined ? {} : { path }),
      digits: given.digits ?? USUAL_DIGITS,
      request: requestOf(contour.name, name, call),
    },
    more.contour,
  );
  if (given.json) deliver(report.plainJson(result), call);
  else if (given.quiet) deliver(more.sheets.contourLines(result), call);
  else deliver(more.sheets.contourText(result, await presentation(call)), call);
  return EXIT.done;
}

export const contour: Command = {
  name: 'contour',
  summary: 'a quantity on a circle: fixed order, contour improved, Borel sums',
  about: [
    'Shows a contour quantity such as the hadronic tau width order by order: fixed-order terms and sums, contour-improved terms and sums with their integrals, the moments of the logarithm, the coupling on the circle, the Borel sums of both expansions, what each operator dimension finds in the weight, and both expansions again with the renormalon of the gluon condensate subtracted.',
    'The series is one of kind contour, or any series of an Adler function with --weight. The two expansions differ by more than their errors, and which is right is contested: they are shown, not averaged. With --quiet a line a value: name, value, truncation error.',
  ],
  operands: [{ name: 'SERIES', help: 'a catalogue id, a series file, or - for standard input' }],
  options: [
    'at',
    'alpha-s-mz',
    'weight',
    'loops',
    'norm',
    'subtraction-scale',
    'order',
    'flavours',
    'digits',
    'json',
    'output',
    'quiet',
    'no-color',
    'help',
  ],
  words: { loops: { help: 'loops of the running on the circle, 1 to 5 (default: all that are known, 5)' } },
  needs: ['at'],
  examples: [
    ['leastterm contour tau-contour-estimate --at 0.34', 'the tau width at alpha_s = 0.34, order by order'],
    ["leastterm contour tau-contour --at 0.34 --weight '1,-2,1'", 'another moment of the same spectral function'],
    ['leastterm contour tau-contour-model --at 0.34 --norm model', 'a model whose Borel sum is known'],
  ],
  run,
};
