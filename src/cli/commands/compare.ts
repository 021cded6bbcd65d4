/** @module leastterm compare: every prescription side by side. */
import type { Call, Command } from '../command.js';
import { chosenPrescriptions } from '../choose.js';
import { seriesExtras } from '../chain-extras.js';
import { EXIT, UsageError } from '../faults.js';
import { couplingOf, exactValue, readSeries, requestOf, USUAL_DIGITS, wantedCoupling } from '../input.js';
import { deliver } from '../output.js';
import { presentation } from '../present.js';
import { accepted } from '../refused.js';
import type { CompareOptions, Grid, Sort } from '../../studies/index.js';

/** The couplings or scales of --grid; undefined without one. */
async function gridOf({ given }: Call): Promise<Grid | undefined> {
  const { at, alphaSMZ, grid } = given;
  if (grid === undefined) return undefined;
  const { studies } = await import('../rooms.js');
  const read = studies.readGrid(grid);
  if (studies.isGridProblem(read)) throw new UsageError(`--grid: ${read.problem}; wanted ${read.wanted}`, compare.name);
  if (read.over === 'coupling' && (at !== undefined || alphaSMZ !== undefined))
    throw new UsageError(
      'a --grid of couplings, --at and --alpha-s-mz exclude each other: give one of them (--grid scale=0.5:2:5 goes with --at)',
      compare.name,
    );
  return read;
}

async function sortOf(sort: string | undefined): Promise<Sort | undefined> {
  if (sort === undefined) return undefined;
  const { series, studies } = await import('../rooms.js');
  const found = studies.SORTS.find((name) => name === sort);
  if (found === undefined)
    throw new UsageError(
      `--sort: no key "${sort}"${series.suggestion(sort, studies.SORTS)}; wanted one of ${studies.SORTS.join(', ')}`,
      compare.name,
    );
  return found;
}

async function run(call: Call): Promise<number> {
  const [name = ''] = call.operands;
  const { given } = call;
  if (given.csv === true && given.json) throw new UsageError('--csv and --json: give one of them', compare.name);
  const grid = await gridOf(call);
  const wanted = grid?.over === 'coupling' ? undefined : await wantedCoupling(call, compare.name);
  const by = await chosenPrescriptions(given, compare.name);
  const sort = await sortOf(given.sort);
  const exact = await exactValue(given.exact, compare.name);
  const series = await readSeries(name, call);
  const { report, studies } = await import('../rooms.js');
  const reached = wanted === undefined ? undefined : await couplingOf(wanted, series, compare.name);
  const options: CompareOptions = {
    ...(reached?.path === undefined ? {} : { path: reached.path }),
    ...(given.order === undefined ? {} : { order: given.order }),
    ...(await seriesExtras(series, by, compare.name)),
    ...(sort === undefined ? {} : { sort }),
    ...(exact === undefined ? {} : { exact }),
    ...(given.hide === undefined ? {} : { hide: given.hide }),
    digits: given.digits ?? USUAL_DIGITS,
    request: requestOf(compare.name, name, call),
  };
  const couplings = grid?.over === 'coupling' ? grid.values : reached === undefined ? [] : [reached.at];
  const [at] = couplings;
  const result =
    grid?.over === 'scale' && at !== undefined
      ? accepted(await studies.compareScales(series, at, grid.values, options), compare.name)
      : studies.compare(series, couplings, options);
  if (given.json) deliver(report.plainJson(result), call);
  else if (given.csv === true) deliver(report.compareCsv(result), call);
  else if (given.quiet) deliver(report.compareLines(result), call);
  else deliver(report.compareText(result, await presentation(call)), call);
  return result.rows.every((row) => row.refused !== undefined) ? EXIT.allRefused : EXIT.done;
}

export const compare: Command = {
  name: 'compare',
  summary: 'every prescription side by side, with its track record',
  about: [
    'One row a prescription that accepts the series: value, truncation error, ambiguity, terms used, trust in the number, trust in its digits, score with the last coefficient hidden (--hide for more; beyond 24 coefficients from the first 12), cautions. Below, the spread of all values and of those without a caution, and who refused and why.',
    'With --grid at several couplings, or with --grid scale=0.5:2:5 at several renormalisation scales mu/Q (coefficients rewritten, coupling run from the value of --at); --csv and --json write one row for each point and prescription. With --quiet a line a value: name, value, truncation error.',
  ],
  operands: [{ name: 'SERIES', help: 'a catalogue id, a series file, or - for standard input' }],
  options: [
    'at',
    'alpha-s-mz',
    'grid',
    'only',
    'except',
    'family',
    'sort',
    'hide',
    'exact',
    'strong-coupling',
    'order',
    'flavours',
    'digits',
    'json',
    'csv',
    'output',
    'quiet',
    'no-color',
    'help',
  ],
  examples: [
    ['leastterm compare adler --at 0.3156', 'all prescriptions on the Adler function, one row each'],
    [
      'leastterm compare adler --at 0.3156 --family borel,model --sort score',
      'only the Borel methods, best record first',
    ],
    ['leastterm compare adler --grid 0.1:0.4:7 --csv -o grid.csv', 'at seven couplings, for a plot'],
    ['leastterm compare adler --at 0.3156 --grid scale=0.5:2:5 --csv', 'at five scales from Q/2 to 2Q, even in ln mu'],
  ],
  run,
};
