/** @module leastterm assess: the whole report on one series at one coupling. */
import type { Call, Command } from '../command.js';
import { EXIT, UsageError } from '../faults.js';
import { couplingOf, readSeries, requestOf, USUAL_DIGITS, wantedCoupling } from '../input.js';
import { plainText } from '../letters.js';
import { deliver } from '../output.js';
import { presentation } from '../present.js';
import type { VerdictRule } from '../../studies/index.js';

async function ruleOf(text: string | undefined): Promise<VerdictRule | undefined> {
  if (text === undefined) return undefined;
  const { series, studies } = await import('../rooms.js');
  const rule = studies.verdictRule(text);
  const known = studies.verdictRules();
  if (rule === undefined)
    throw new UsageError(
      `--verdict-rule: no rule "${text}"${series.suggestion(text, known)}; wanted one of ${known.join(', ')}`,
      assess.name,
    );
  return rule;
}

async function run(call: Call): Promise<number> {
  const [name = ''] = call.operands;
  const { given } = call;
  const wanted = await wantedCoupling(call, assess.name);
  const series = await readSeries(name, call);
  const { at, path } = await couplingOf(wanted, series, assess.name);
  const rooms = await import('../rooms-core.js');
  const rule = await ruleOf(given.verdictRule);
  const result = rooms.assess(series, at, {
    ...(given.order === undefined ? {} : { order: given.order }),
    digits: given.digits ?? USUAL_DIGITS,
    ...(path === undefined ? {} : { path }),
    ...(rule === undefined ? {} : { verdictRule: rule }),
    request: requestOf(assess.name, name, call),
  });
  if (given.json) deliver(rooms.resultJson(result), call);
  else if (given.quiet) deliver(await plainText(`${result.verdict.printed}\n`, call.surroundings), call);
  else deliver(rooms.assessmentText(result, await presentation(call)), call);
  return result.values.every((entry) => entry.refused !== undefined) ? EXIT.allRefused : EXIT.done;
}

export const assess: Command = {
  name: 'assess',
  summary: 'the whole report: terms, growth, values, ambiguity, verdict',
  about: [
    'Reads a series and assesses it at one value of its coupling: what was read, the terms with the least one marked, the growth of the coefficients, the Borel plane, one value a prescription or the reason why there is none, the renormalon ambiguity, where to stop, and a verdict with its cautions.',
    'Shells read parentheses themselves: put a value such as 0.3156(30) in quotes, or write 0.3156+-0.0030.',
  ],
  operands: [{ name: 'SERIES', help: 'a catalogue id, a series file, or - for standard input' }],
  options: [
    'at',
    'alpha-s-mz',
    'order',
    'flavours',
    'digits',
    'verdict-rule',
    'strong-coupling',
    'json',
    'output',
    'quiet',
    'no-color',
    'help',
  ],
  needs: ['at'],
  examples: [
    ["leastterm assess adler --at '0.3156(30)'", 'the Adler function of the catalogue at alpha_s = 0.3156 +- 0.0030'],
    ['leastterm assess mine.yaml --at 0.25 --json -o mine.json', 'the same of your own file, as JSON, into a file'],
    ['leastterm assess - --at 0.1 < list.txt', 'a bare list of coefficients from standard input'],
  ],
  run,
};
