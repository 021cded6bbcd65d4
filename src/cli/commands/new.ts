/** @module leastterm new: a commented series file, from answers or from options. */
import { existsSync } from 'node:fs';
import { createInterface } from 'node:readline';
import { Readable } from 'node:stream';
import { seriesTemplate, splitCoefficients } from '../comfort/series-template.js';
import type { Answers } from '../comfort/series-template.js';
import type { Call, Command } from '../command.js';
import { EXIT, UsageError } from '../faults.js';
import { deliver } from '../output.js';

/** What is asked for, in this order, where no option answers it. An empty answer leaves a field open. */
const QUESTIONS: readonly (readonly [keyof Answers, string])[] = [
  ['title', 'Title, one line'],
  ['quantity', 'What R is'],
  ['coupling', 'Coupling and divisor (alpha_s/pi), or a plain variable (x)'],
  ['coefficients', 'Coefficients, separated by commas: 1, 1.6398, 6.371(4)'],
  ['firstPower', 'Power of the first coefficient'],
  ['scheme', 'Scheme (MSbar)'],
  ['flavours', 'Active flavours'],
  ['hardScale', 'Hard scale with its unit (1.777 GeV)'],
  ['dimension', 'Dimension of the leading operator of the OPE (4)'],
];

/** Answers from the options; undefined where there is none. */
const fromOptions = ({ given }: Call): Partial<Record<keyof Answers, string>> => ({
  ...(given.title === undefined ? {} : { title: given.title }),
  ...(given.quantity === undefined ? {} : { quantity: given.quantity }),
  ...(given.coupling === undefined ? {} : { coupling: given.coupling }),
  ...(given.coefficients === undefined ? {} : { coefficients: given.coefficients }),
  ...(given.firstPower === undefined ? {} : { firstPower: String(given.firstPower) }),
  ...(given.scheme === undefined ? {} : { scheme: given.scheme }),
  ...(given.flavours === undefined ? {} : { flavours: String(given.flavours) }),
  ...(given.hardScale === undefined ? {} : { hardScale: given.hardScale }),
  ...(given.dimension === undefined ? {} : { dimension: given.dimension }),
});

/** Asks on standard error, so that the file itself may go to standard output. */
async function ask(answered: Partial<Record<keyof Answers, string>>, { surroundings }: Call) {
  const input = surroundings.stdin === undefined ? process.stdin : Readable.from(surroundings.stdin);
  const lines = createInterface({ input, crlfDelay: Infinity })[Symbol.asyncIterator]();
  const answers = { ...answered };
  surroundings.stderr.write('An empty answer leaves a field open.\n');
  for (const [name, question] of QUESTIONS) {
    if (answers[name] !== undefined) continue;
    surroundings.stderr.write(`${question}: `);
    const next = await lines.next();
    if (next.done === true) break;
    answers[name] = next.value.trim();
  }
  return answers;
}

async function run(call: Call): Promise<number> {
  const { given, surroundings } = call;
  const [file = ''] = call.operands;
  if (file !== '-' && existsSync(file))
    throw new UsageError(`${file} is there already; nothing was written: name another file, or remove it`, create.name);
  const options = fromOptions(call);
  if (options.coefficients === undefined && !surroundings.stdinIsTerminal)
    throw new UsageError(
      `--coefficients is missing; write --coefficients '1, 1.6398, 6.371(4)', or run it in a terminal to be asked`,
      create.name,
    );
  const answers = options.coefficients === undefined ? await ask(options, call) : options;
  const coefficients = splitCoefficients(answers.coefficients ?? '');
  if (coefficients.length === 0)
    throw new UsageError('no coefficient was given; a series has at least one', create.name);
  const text = seriesTemplate({
    title: answers.title ?? '',
    quantity: answers.quantity ?? '',
    coupling: answers.coupling ?? 'x',
    coefficients,
    firstPower: answers.firstPower ?? '',
    scheme: answers.scheme ?? '',
    flavours: answers.flavours ?? '',
    hardScale: answers.hardScale ?? '',
    dimension: answers.dimension ?? '',
  });
  // A file that the program itself would refuse is not written.
  const { series } = await import('../rooms.js');
  await series.parseSeries(text, { name: file === '-' ? 'new series' : file, form: 'yaml' });
  deliver(text, { ...call, given: { ...given, output: file } });
  return EXIT.done;
}

export const create: Command = {
  name: 'new',
  asks: true,
  summary: 'a commented series file, from answers or options',
  about: [
    'Asks for what a series file says, where options do not, and writes the file with comments on everything that may be added. In a script give at least --coefficients; nothing is asked then. An existing file is never replaced.',
  ],
  operands: [{ name: 'FILE', help: 'the file to write, or - for standard output' }],
  options: [
    'coefficients',
    'coupling',
    'title',
    'quantity',
    'first-power',
    'scheme',
    'flavours',
    'hard-scale',
    'dimension',
    'quiet',
    'help',
  ],
  words: {
    coupling: {
      placeholder: 'NAME/DIVISOR',
      example: 'alpha_s/pi',
      help: 'the coupling with its divisor, or a plain variable (default x)',
    },
    title: { help: 'one line' },
    quantity: { help: 'what R is, with its normalisation', placeholder: 'TEXT', example: "'D(Q^2)'" },
    dimension: { help: 'dimension of the leading operator: the singularity at u = dimension/2', example: '4' },
  },
  examples: [
    ['leastterm new mine.yaml', 'asks, and writes mine.yaml'],
    [
      "leastterm new mine.yaml --coupling alpha_s/pi --flavours 3 --coefficients '1, 1.64, 6.37'",
      'from options, for a script',
    ],
  ],
  run,
};
