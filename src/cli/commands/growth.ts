/** @module leastterm growth: how the coefficients grow, without a coupling. */
import type { Call, Command } from '../command.js';
import { EXIT } from '../faults.js';
import { readCoupling, readSeries, requestOf, USUAL_DIGITS } from '../input.js';
import { deliver } from '../output.js';
import { presentation } from '../present.js';

async function run(call: Call): Promise<number> {
  const [name = ''] = call.operands;
  if (call.given.at !== undefined) await readCoupling(call.given.at, growth.name);
  const series = await readSeries(name, call);
  if (call.given.cut !== undefined) {
    const { deliverCut } = await import('../series-cut.js');
    await deliverCut(series, call.given.cut, call, growth.name);
    return EXIT.done;
  }
  const rooms = await import('../rooms-core.js');
  const result = rooms.growthStudy(series, {
    ...(call.given.order === undefined ? {} : { order: call.given.order }),
    digits: call.given.digits ?? USUAL_DIGITS,
    request: requestOf(growth.name, name, call),
  });
  if (call.given.json) deliver(rooms.resultJson(result), call);
  else if (call.given.quiet) deliver(`${result.growth.verdict}\n`, call);
  else deliver(rooms.growthText(result, await presentation(call)), call);
  return EXIT.done;
}

export const growth: Command = {
  name: 'growth',
  summary: 'do the coefficients grow factorially, and what says so',
  about: [
    'Tells factorial from geometric growth, or that these terms cannot tell, with the evidence: ratios and their extrapolants, model comparison, prediction of the last known coefficients from the ones before. Gives the nearest Borel singularity beside what the file or the operator product expansion expects. With --quiet only the one word: factorial, geometric, undecided and so on.',
    '--cut removes the momenta below mu_f through the leading infrared singularity, approximately: the coefficients of both parts and the diagnosis of the series with and without them; with a coupling also the sums, and how little they move with mu_f. With --quiet then the word for what is left above mu_f.',
  ],
  operands: [{ name: 'SERIES', help: 'a catalogue id, a series file, or - for standard input' }],
  options: ['at', 'alpha-s-mz', 'cut', 'order', 'flavours', 'digits', 'json', 'output', 'quiet', 'no-color', 'help'],
  words: {
    at: { help: 'the value of the coupling at mu; needed for the sums of --cut only' },
    'alpha-s-mz': { help: 'alpha_s(M_Z) with five flavours, evolved to the series, in place of --at' },
  },
  examples: [
    ['leastterm growth adler', 'do its coefficients grow factorially, and from which singularity?'],
    ['leastterm growth mine.yaml --order 4', 'only its first four coefficients'],
    ['leastterm growth pole-msbar --flavours 4 --at 0.225 --cut 0.5', 'without momenta below half the mass'],
  ],
  run,
};
