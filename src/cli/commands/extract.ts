/** @module leastterm extract: from measured numbers to the coupling, a mass or a condensate, with the budget of errors. */
import type { Call, Command } from '../command.js';
import { problemFile } from '../extract-file.js';
import type { ProblemFile, Row } from '../extract-file.js';
import { measuredMass } from '../extract-mass.js';
import { problemOf } from '../extract-problem.js';
import { EXIT, UsageError } from '../faults.js';
import { readSeries, USUAL_DIGITS } from '../input.js';
import { deliver } from '../output.js';
import { checkReplicaOptions, replicasOf, USUAL_SEED } from '../replicas.js';
import { presentation } from '../present.js';
import { accepted } from '../refused.js';
import { askedOf } from '../request.js';
import type { Problem } from '../../extraction/index.js';

/** The values of an option that may stand once for all series, or once for each. */
function spread(option: string, list: readonly string[] | undefined, count: number): readonly (string | undefined)[] {
  const values = list ?? [];
  if (values.length === 0) return Array.from({ length: count }, () => undefined);
  if (values.length === 1) return Array.from({ length: count }, () => values[0]);
  if (values.length === count) return values;
  throw new UsageError(
    `--${option}: ${values.length} values for ${count} series; give one, or one for each`,
    extract.name,
  );
}

const commas = (text: string | undefined): readonly string[] | undefined => text?.split(',').map((part) => part.trim());

/** The measurements of the command line. */
function rowsOf({ operands, given }: Call): readonly Row[] {
  const count = operands.length;
  const measured = given.measured ?? [];
  if (measured.length > 0 && measured.length !== count)
    throw new UsageError(
      `--measured: ${measured.length} values for ${count} series; give one for each, in their order`,
      extract.name,
    );
  const scales = spread('scale-of-measurement', given.scaleOfMeasurement, count);
  const powers = spread('mass-power', commas(given.massPower), count);
  const norms = spread('norm', commas(given.norm), count);
  return operands.map((series, i) => {
    const rest = { measured: measured[i], scale: scales[i], massPower: powers[i], norm: norms[i] };
    return { series, ...Object.fromEntries(Object.entries(rest).filter(([, value]) => value !== undefined)) };
  });
}

async function questionOf(call: Call): Promise<ProblemFile> {
  const { operands, given } = call;
  if (given.problem === undefined) {
    if (given.from !== undefined) {
      if (operands.length > 0)
        throw new UsageError('--from names the relation of a measured mass: leave out the series', extract.name);
      return {
        given,
        rows: [{ series: given.from, ...(given.measured?.[0] === undefined ? {} : { measured: given.measured[0] }) }],
      };
    }
    if (operands.length === 0)
      throw new UsageError('there is no series; name one, such as adler, or a --problem file', extract.name);
    return { given, rows: rowsOf(call) };
  }
  if (operands.length > 0 || given.measured !== undefined)
    throw new UsageError('--problem holds the measurements: leave out the series and --measured', extract.name);
  return problemFile(given.problem, given);
}

async function run(call: Call): Promise<number> {
  checkReplicaOptions(call, extract.name);
  const { given, rows, correlation } = await questionOf(call);
  const mass = given.from === undefined ? undefined : await measuredMass(given);
  const series = mass === undefined ? [] : [mass.series];
  if (mass === undefined) for (const row of rows) series.push(await readSeries(row.series, call));
  const { extraction, sheets } = await import('../rooms-more.js');
  const { report } = await import('../rooms.js');
  const asked = await problemOf(given, rows, series);
  // A mass is the scale of its series itself: only other unknowns have a Q to divide by.
  const stated: Problem =
    asked.for === 'mass' || asked.for === 'pole-mass'
      ? asked
      : {
          ...asked,
          data: asked.data.map((d, i) => (series[i] === undefined ? d : extraction.inUnitOfSeries(d, series[i]))),
        };
  const problem: Problem = {
    ...stated,
    ...(correlation === undefined ? {} : { correlation }),
    ...(mass === undefined ? {} : { data: stated.data.map((d) => ({ ...d, threshold: mass.threshold })) }),
  };
  const request = askedOf(extract.name, { series: call.operands }, call.given, {
    ...(call.given.replicas === undefined ? {} : { seed: USUAL_SEED }),
    digits: given.digits ?? USUAL_DIGITS,
  });
  const [first] = series;
  if (first === undefined) throw new UsageError('there is no series; name one, such as adler', extract.name);
  if (series.length > 1 && problem.for !== 'alpha_s' && problem.for !== 'mass')
    throw new UsageError(`--for ${problem.for} takes one series; a fit is for alpha_s or mass`, extract.name);
  const fitted = series.length > 1 || problem.freeAlphaS === true;
  const solved = accepted(
    fitted ? extraction.fit(problem, series, request) : extraction.extract(problem, first, request),
    extract.name,
  );
  const replicas = await replicasOf(call, problem, series, extract.name);
  const result = replicas === undefined ? solved : { ...solved, replicas };
  if (given.json) deliver(report.plainJson(result), call);
  else if (given.quiet) deliver(sheets.extractLines(result), call);
  else deliver(sheets.extractText(result, await presentation(call)), call);
  if (replicas?.interrupted === true) return EXIT.interrupted;
  return result.rows.every((row) => row.refused !== undefined) ? EXIT.allRefused : EXIT.done;
}

export const extract: Command = {
  name: 'extract',
  summary: 'alpha_s, a mass or a condensate from a measured number, with an error budget',
  about: [
    'Solves R = measured for the unknown, prescription by prescription, evolves alpha_s to M_Z over the thresholds, and prints the budget: measurement, inputs, coefficients, power corrections, truncation, scale, renormalon ambiguity, prescription. Components are kept apart, signed and asymmetric where they are; what overlaps is counted once; three totals, by name.',
    'Without --only, --except or --family the prescriptions of an assessment are run. Several series with a measurement each, or a --problem file, are fitted together. With --quiet a line a prescription: name, value, error upwards and downwards in quadrature.',
  ],
  operands: [
    {
      name: 'SERIES',
      help: 'catalogue ids, series files, or - for standard input; one for each measurement',
      optional: true,
      several: true,
    },
  ],
  options: [
    'measured',
    'for',
    'scale-of-measurement',
    'mass-power',
    'norm',
    'from',
    'quark',
    'light',
    'to',
    'to-flavours',
    'loops',
    'threshold',
    'at',
    'alpha-s-mz',
    'mass',
    'condensate',
    'condensate-by',
    'central',
    'truncation-by',
    'ambiguity-by',
    'only',
    'except',
    'family',
    'correlation',
    'weights',
    'search',
    'problem',
    'replicas',
    'seed',
    'workers',
    'order',
    'flavours',
    'digits',
    'json',
    'output',
    'quiet',
    'no-color',
    'help',
  ],
  words: {
    'mass-power': {
      placeholder: 'POWERS',
      example: '-2',
      help: 'the measured quantity is norm * m^P * R: -2n for the n-th moment, 5 for a width (default 1); 0 for a datum without the mass; several series: joined by commas',
    },
    norm: {
      placeholder: 'VALUES',
      example: '1/4',
      help: 'the measured quantity is norm * m^P * R (default 1), with its error and unit if it has them; several series: joined by commas',
    },
    from: {
      placeholder: 'DEFINITION',
      example: 'ps@2GeV',
      help: 'in place of a series, for --for mass: the definition of the measured mass, pole, rs@2GeV, rs-prime@2GeV, ps@2GeV, kinetic@1GeV',
    },
    to: { help: 'where alpha_s is wanted besides its own scale: a scale with its unit, MZ (default), mtau, or none' },
    'to-flavours': { help: 'active flavours there; needed where two numbers are in use' },
    at: { help: 'the coupling of the series, with its error, for --for condensate' },
    'alpha-s-mz': {
      help: 'alpha_s(M_Z) with five flavours behind a mass or condensate (default: the world average)',
    },
    mass: { help: 'the MSbar mass m(m) behind a pole mass, with its unit' },
    digits: { help: 'digits wanted of each solution (default 15)' },
  },
  examples: [
    [
      "leastterm extract tau-delta0-estimate --measured '0.2042(50)' --for alpha_s",
      'the coupling at the tau mass and at M_Z from the hadronic tau width',
    ],
    [
      "leastterm extract moment.yaml --measured '0.2166(31) GeV^-2' --for mass --mass-power -2",
      'a quark mass from a moment that falls like its square',
    ],
    ["leastterm extract pole-msbar-nl5 --for pole-mass --mass '162.5(1.8)GeV'", 'the top pole mass and its ambiguity'],
  ],
  run,
};
