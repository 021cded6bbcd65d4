/** @module leastterm backtest: what the methods would have said of coefficients that are known by now. */
import type { Call, Command } from '../command.js';
import { chosenPrescriptions } from '../choose.js';
import { contourExtras } from '../contour-extras.js';
import { EXIT, UsageError } from '../faults.js';
import { couplingOf, exactValue, readSeries, USUAL_DIGITS, wantedCoupling } from '../input.js';
import { deliver } from '../output.js';
import { presentation } from '../present.js';
import { askedOf } from '../request.js';
import type { Series } from '../../series/index.js';
import type { BacktestOptions, BacktestResult, BacktestSummary } from '../../studies/index.js';

/** Coefficients hidden, one after the other, when --hide is not given. */
const USUAL_HIDE = 3;

/** Name of the variable that --catalogue takes a common value for. */
const COMMON = 'alpha_s';

interface Task {
  readonly name: string;
  readonly series: Series;
}

/** The series to test, and those of the catalogue that cannot be. */
async function tasks(call: Call): Promise<{ list: Task[]; skipped: { series: string; reason: string }[] }> {
  const { operands, given } = call;
  const { series: room } = await import('../rooms.js');
  const skipped: { series: string; reason: string }[] = [];
  const list: Task[] = [];
  if (given.catalogue !== true) {
    for (const name of operands) list.push({ name, series: await readSeries(name, call) });
    return { list, skipped };
  }
  for (const { id } of await room.listCatalogue()) {
    // A number of flavours that a file does not allow is a reason to leave it out, not to stop.
    const series = await room.loadSeries(id);
    if (series.invented) skipped.push({ series: id, reason: 'invented' });
    else if (series.coupling.plain || series.coupling.name !== COMMON)
      skipped.push({ series: id, reason: `runs in ${series.coupling.name}, not ${COMMON}` });
    else list.push({ name: id, series });
  }
  return { list, skipped };
}

function checkUse({ operands, given }: Call): void {
  const fail = (message: string): never => {
    throw new UsageError(message, backtest.name);
  };
  if (given.csv === true && given.json) fail('--csv and --json: give one of them');
  if (given.hide === 0) fail('--hide: 0 hides nothing; write --hide 2');
  if (given.catalogue === true && operands.length > 0)
    fail(`--catalogue takes every series; "${operands[0]}" is one operand too many`);
  if (given.catalogue === true && given.flavours !== undefined)
    fail('--flavours: the series of the catalogue keep their own with --catalogue');
  if (given.catalogue !== true && operands.length === 0)
    fail('SERIES is missing: a catalogue id, a series file, or - for standard input; or write --catalogue');
  if (given.exact !== undefined && (given.catalogue === true || operands.length > 1))
    fail('--exact: an exact sum belongs to one series');
}

async function present(call: Call, result: BacktestResult): Promise<void> {
  const { report } = await import('../rooms.js');
  const { given } = call;
  if (given.json) deliver(report.plainJson(result), call);
  else if (given.csv === true) deliver(report.backtestCsv([result]), call);
  else if (given.quiet) deliver(report.backtestLines(result), call);
  else deliver(report.backtestText(result, await presentation(call)), call);
}

async function presentMany(call: Call, result: BacktestSummary): Promise<void> {
  const { report } = await import('../rooms.js');
  const { given } = call;
  if (given.json) deliver(report.plainJson(result), call);
  else if (given.csv === true) deliver(report.backtestCsv(result.results), call);
  else if (given.quiet) deliver(report.backtestSummaryLines(result), call);
  else deliver(report.backtestSummaryText(result, await presentation(call)), call);
}

/** Were there any tests? */
const tested = (result: BacktestResult): boolean =>
  [...result.prescriptions, ...result.estimates].some((method) => method.records.length > 0);

async function run(call: Call): Promise<number> {
  const { given } = call;
  checkUse(call);
  const wanted = await wantedCoupling(call, backtest.name);
  const by = await chosenPrescriptions(given, backtest.name);
  const exact = await exactValue(given.exact, backtest.name);
  const { list, skipped } = await tasks(call);
  const { studies } = await import('../rooms.js');
  const usual = { hide: USUAL_HIDE, digits: USUAL_DIGITS };
  // Of one series, also where it is one of many.
  const { catalogue: _, ...alone } = given;
  const requestFor = (name: string) => askedOf(backtest.name, { series: name }, alone, usual);
  const optionsFor = (name: string): BacktestOptions => ({
    ...(given.order === undefined ? {} : { order: given.order }),
    ...(by === undefined ? {} : { by }),
    ...(exact === undefined ? {} : { exact }),
    hide: given.hide ?? USUAL_HIDE,
    digits: given.digits ?? USUAL_DIGITS,
    request: requestFor(name),
  });
  const results: BacktestResult[] = [];
  for (const [i, { name, series }] of list.entries()) {
    if (list.length > 1) call.surroundings.progress?.step(i, list.length);
    try {
      const { at, path } = await couplingOf(wanted, series, backtest.name);
      const extras = await contourExtras(series, by, backtest.name);
      results.push(
        studies.backtest(series, at, { ...optionsFor(name), ...extras, ...(path === undefined ? {} : { path }) }),
      );
    } catch (error) {
      // In the catalogue, a series that the coupling cannot be brought to is left out with the reason.
      if (!(error instanceof UsageError) || given.catalogue !== true) throw error;
      skipped.push({ series: name, reason: error.message });
    }
  }
  const [single] = results;
  if (given.catalogue !== true && results.length === 1 && single !== undefined) {
    await present(call, single);
    return tested(single) ? EXIT.done : EXIT.allRefused;
  }
  const good = results.filter(tested);
  const tooShort = results
    .filter((r) => !tested(r))
    .map((r) => ({
      series: r.series.id,
      reason: `${r.known} known coefficients: nothing to hide, or nothing to hold it against`,
    }));
  await presentMany(call, {
    leastterm: studies.VERSION,
    request: askedOf(backtest.name, { series: call.operands }, given, usual),
    results: good,
    skipped: [...skipped, ...tooShort],
    summary: studies.pool(good),
  });
  return good.length > 0 ? EXIT.done : EXIT.allRefused;
}

export const backtest: Command = {
  name: 'backtest',
  summary: 'what each method would have said of coefficients known by now',
  about: [
    'Hides the last coefficients, one after the other, lets every prescription and every truncation-error model work from the rest, and scores what they predicted: bias, coverage of the stated interval, sharpness, and the interval score, which weighs both. Methods that imply a next coefficient are held against it.',
    'Values are held against the exact sum (--exact), else the measured value of the file, else the sum of all known terms while these still fall, else the same value with all terms: that tests stability only. Each record names its target. docs/methods/backtest.md has the formulas.',
    'With several series, or --catalogue, the empirical coverage by method. With --quiet a line a method: name, inside, tests, bias, score.',
  ],
  operands: [
    { name: 'SERIES', help: 'catalogue ids, series files, or - for standard input', optional: true, several: true },
  ],
  options: [
    'at',
    'alpha-s-mz',
    'catalogue',
    'hide',
    'exact',
    'strong-coupling',
    'only',
    'except',
    'family',
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
  needs: ['at'],
  examples: [
    ['leastterm backtest adler --at 0.3156', 'how each method did on the Adler function'],
    ['leastterm backtest adler bjorken r-ratio --at 0.2 --hide 1', 'three series, one coefficient hidden'],
    ['leastterm backtest --catalogue --at 0.2 --csv -o coverage.csv', 'every published series in alpha_s'],
  ],
  run,
};
