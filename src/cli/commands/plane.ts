/** @module leastterm plane: the poles of the Padé approximants in the Borel plane. */
import type { Call, Command } from '../command.js';
import { EXIT } from '../faults.js';
import { readCoupling, readSeries, requestOf, USUAL_DIGITS } from '../input.js';
import { deliver } from '../output.js';
import { presentation } from '../present.js';

async function run(call: Call): Promise<number> {
  const [name = ''] = call.operands;
  if (call.given.at !== undefined) await readCoupling(call.given.at, plane.name);
  const series = await readSeries(name, call);
  const rooms = await import('../rooms-core.js');
  const result = rooms.planeStudy(series, {
    ...(call.given.order === undefined ? {} : { order: call.given.order }),
    digits: call.given.digits ?? USUAL_DIGITS,
    request: requestOf(plane.name, name, call),
  });
  if (call.given.json) deliver(rooms.resultJson(result), call);
  else
    deliver(
      call.given.quiet ? rooms.planeLines(result.borelPlane) : rooms.planeText(result, await presentation(call)),
      call,
    );
  return EXIT.done;
}

export const plane: Command = {
  name: 'plane',
  summary: 'the Borel plane as its Pade approximants see it',
  about: [
    'Lists the poles of the near-diagonal Pade approximants of the Borel transform with their amplitudes, counts the positive real ones exactly, and names doublets, degenerate entries and pairs near the axis. With --quiet one pole a line: entry, real part, imaginary part, separated by tabs.',
  ],
  operands: [{ name: 'SERIES', help: 'a catalogue id, a series file, or - for standard input' }],
  options: ['at', 'order', 'flavours', 'digits', 'json', 'output', 'quiet', 'no-color', 'help'],
  examples: [
    ['leastterm plane adler', 'the poles of its Borel transform, as Pade approximants see them'],
    ['leastterm plane mine.yaml --json', 'every pole with all its digits'],
  ],
  run,
};
