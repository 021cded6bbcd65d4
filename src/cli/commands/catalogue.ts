/** @module leastterm catalogue: the series that come with the program. */
import { catalogueFilter } from '../catalogue-filter.js';
import type { Call, Command, Given } from '../command.js';
import { EXIT, UsageError } from '../faults.js';
import { readSeries } from '../input.js';
import { deliver } from '../output.js';
import { presentation } from '../present.js';

async function list(call: Call): Promise<void> {
  const { report, series } = await import('../rooms.js');
  const keep = await catalogueFilter(call.given, catalogue.name);
  const entries = (await series.listCatalogue()).filter(keep);
  if (call.given.json) deliver(report.plainJson(entries), call);
  else if (call.given.quiet) deliver(entries.map((entry) => `${entry.id}\n`).join(''), call);
  else deliver(report.catalogueText(entries, await presentation(call)), call);
}

async function show(id: string, call: Call): Promise<void> {
  const shown = await readSeries(id, call);
  const { report, series } = await import('../rooms.js');
  if (call.given.json) deliver(report.plainJson(report.plainSeries(shown)), call);
  else if (call.given.quiet) {
    deliver(series.writeSeries(shown), call);
  } else deliver(report.seriesText(shown, await presentation(call)), call);
}

/** Reads every file, or the one named, and holds it against what it records; 1 when one fails. */
async function check(id: string | undefined, call: Call): Promise<number> {
  const { report, series, studies } = await import('../rooms.js');
  const ids = id === undefined ? await series.catalogueIds() : [id];
  const result = await studies.catalogueCheck(ids);
  if (call.given.json) deliver(report.plainJson(result), call);
  else if (call.given.quiet) deliver(report.catalogueProblems(result), call);
  else deliver(report.catalogueCheckText(result, await presentation(call)), call);
  return result.every((entry) => entry.problems.length === 0) ? EXIT.done : EXIT.allRefused;
}

const FILTERS = ['quantity', 'dimension', 'invented', 'published'] as const;

/** Filters choose from the list; elsewhere they would be ignored in silence. */
function checkFilters(action: string, given: Given): void {
  const idle = FILTERS.find((name) => given[name] !== undefined);
  if (action === 'list' || idle === undefined) return;
  throw new UsageError(`--${idle} chooses from the list; write leastterm catalogue list --${idle}`, catalogue.name);
}

async function run(call: Call): Promise<number> {
  const [action = 'list', id] = call.operands;
  if (ACTIONS.includes(action)) checkFilters(action, call.given);
  if (action === 'check') return check(id, call);
  if (action === 'list' && id === undefined) await list(call);
  else if (action === 'show' && id !== undefined) await show(id, call);
  else if (action === 'show') {
    throw new UsageError('ID is missing: which series to show; leastterm catalogue list names them', catalogue.name);
  } else if (action === 'list') {
    throw new UsageError(`"${id}" is one operand too many; write leastterm catalogue show ${id}`, catalogue.name);
  } else {
    const { series } = await import('../rooms.js');
    const hint = series.suggestion(action, ACTIONS);
    throw new UsageError(
      `"${action}" is no action of the catalogue${hint}; wanted list, show ID or check`,
      catalogue.name,
    );
  }
  return EXIT.done;
}

const ACTIONS: readonly string[] = ['list', 'show', 'check'];

export const catalogue: Command = {
  name: 'catalogue',
  summary: 'the series that come with leastterm: list, show, check',
  about: [
    'list names every series with its order and flavours; show prints one with its coefficients and sources. show also takes a file. With --quiet, list prints the bare ids, and show prints the series file itself, a start for one of your own.',
    'check reads every file (or the one named) at each number of flavours it is meant for, holds its coefficients against the values it records, and writes and reads it again; the exit code is 1 when one fails. With --quiet only what is wrong.',
  ],
  operands: [
    { name: 'ACTION', help: 'list (the default), show or check', optional: true },
    { name: 'ID', help: 'which one to show or check', optional: true },
  ],
  options: [
    'quantity',
    'dimension',
    'flavours',
    'invented',
    'published',
    'json',
    'output',
    'quiet',
    'no-color',
    'help',
  ],
  examples: [
    ['leastterm catalogue list', 'every series with its order and flavours'],
    ['leastterm catalogue list --quantity mass --flavours 4', 'those about a mass that serve four flavours'],
    ['leastterm catalogue show adler', 'one series with its coefficients and sources'],
    ['leastterm catalogue show adler -q -o mine.yaml', 'its series file, to change it'],
  ],
  words: {
    flavours: {
      help: 'list: only series for that many flavours; show: the number to use in place of that in the file',
    },
  },
  run,
};
