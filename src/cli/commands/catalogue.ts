/** @module leastterm catalogue: the series that come with the program. */
import type { Call, Command } from '../command.js';
import { EXIT, UsageError } from '../faults.js';
import { readSeries } from '../input.js';
import { deliver } from '../output.js';
import { presentation } from '../present.js';

async function list(call: Call): Promise<void> {
  const { report, series } = await import('../rooms.js');
  const entries = await series.listCatalogue();
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

async function run(call: Call): Promise<number> {
  const [action = 'list', id] = call.operands;
  if (action === 'list' && id === undefined) await list(call);
  else if (action === 'show' && id !== undefined) await show(id, call);
  else if (action === 'show') {
    throw new UsageError('ID is missing: which series to show; leastterm catalogue list names them', catalogue.name);
  } else if (action === 'list') {
    throw new UsageError(`"${id}" is one operand too many; write leastterm catalogue show ${id}`, catalogue.name);
  } else {
    const { series } = await import('../rooms.js');
    const hint = series.suggestion(action, ['list', 'show']);
    throw new UsageError(`"${action}" is no action of the catalogue${hint}; wanted list or show ID`, catalogue.name);
  }
  return EXIT.done;
}

export const catalogue: Command = {
  name: 'catalogue',
  summary: 'the series that come with leastterm: list, show',
  about: [
    'list names every series with its order and flavours; show prints one with its coefficients and sources. show also takes a file. With --quiet, list prints the bare ids, and show prints the series file itself, a start for one of your own.',
  ],
  operands: [
    { name: 'ACTION', help: 'list (the default) or show', optional: true },
    { name: 'ID', help: 'which one to show', optional: true },
  ],
  options: ['flavours', 'json', 'output', 'quiet', 'no-color', 'help'],
  examples: [
    ['leastterm catalogue list', 'every series with its order and flavours'],
    ['leastterm catalogue show adler', 'one series with its coefficients and sources'],
    ['leastterm catalogue show adler -q -o mine.yaml', 'its series file, to change it'],
  ],
  run,
};
