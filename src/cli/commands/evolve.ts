/** @module leastterm evolve: the coupling or a quark mass at another scale and number of flavours. */
import type { Call, Command, Given } from '../command.js';
import { EXIT, UsageError } from '../faults.js';
import { USUAL_DIGITS } from '../input.js';
import { deliver } from '../output.js';
import { presentation } from '../present.js';
import { couplingValue, massOf, scaleOf, thresholdsOf } from '../quantities.js';
import { accepted } from '../refused.js';
import { askedOf } from '../request.js';
import type { EvolveRequest } from '../../studies/index.js';
import type { Threshold } from '../../qcd/index.js';

/** Options that fix what is evolved, in the order of the complaints. */
function checkChoice(given: Given): void {
  if (given.alphaS !== undefined && given.mass !== undefined) {
    throw new UsageError('--alpha-s and --mass exclude each other: one evolution at a time', evolve.name);
  }
  if (given.alphaS === undefined && given.mass === undefined) {
    throw new UsageError(
      "what is evolved is missing; write --alpha-s '0.1180(9)' or --mass '4.186(6)GeV'",
      evolve.name,
    );
  }
  if (given.alphaS !== undefined && given.alphaSMZ !== undefined) {
    throw new UsageError(
      '--alpha-s-mz is the coupling behind a mass; with --alpha-s there is one already',
      evolve.name,
    );
  }
  if (given.from === undefined) throw new UsageError('--from is missing; write --from 91.1879GeV', evolve.name);
  if (given.to === undefined) throw new UsageError('--to is missing; write --to 1.77693GeV', evolve.name);
}

/** Refuses a scale at which two numbers of flavours are in use, unless one was given. */
async function clearFlavours(
  option: 'from' | 'to',
  scale: number,
  flavours: number | undefined,
  thresholds: readonly Threshold[],
): Promise<void> {
  if (flavours !== undefined) return;
  const { studies } = await import('../rooms.js');
  const quark = studies.unclearQuark(scale, thresholds);
  if (quark === undefined) return;
  const [low, high] = [quark.flavours - 1, quark.flavours];
  throw new UsageError(
    `--${option}: at ${scale} GeV both ${low} and ${high} flavours are in use (the ${quark.name} quark has ${quark.mass} GeV); ` +
      `write --${option}-flavours ${low} or --${option}-flavours ${high}`,
    evolve.name,
  );
}

async function request(given: Given): Promise<EvolveRequest> {
  checkChoice(given);
  const { from = '', to = '', fromFlavours, toFlavours, loops } = given;
  const thresholds = await thresholdsOf(given.threshold, evolve.name);
  const start = await scaleOf('from', from, evolve.name);
  const end = to === 'own' ? to : await scaleOf('to', to, evolve.name);
  await clearFlavours('from', start, fromFlavours, thresholds);
  if (end !== 'own') await clearFlavours('to', end, toFlavours, thresholds);
  const { qcd } = await import('../rooms.js');
  const behind =
    given.alphaSMZ === undefined
      ? undefined
      : {
          value: await couplingValue('alpha-s-mz', given.alphaSMZ, evolve.name),
          scale: Number(qcd.INPUTS.MZ.value),
          flavours: 5,
        };
  return {
    quantity: given.mass === undefined ? 'alpha_s' : 'mass',
    value:
      given.mass === undefined
        ? await couplingValue('alpha-s', given.alphaS ?? '', evolve.name)
        : await massOf('mass', given.mass, evolve.name),
    from: { scale: start, ...(fromFlavours === undefined ? {} : { flavours: fromFlavours }) },
    to: { scale: end, ...(toFlavours === undefined ? {} : { flavours: toFlavours }) },
    ...(loops === undefined ? {} : { loops }),
    ...(behind === undefined ? {} : { alphaS: behind }),
    thresholds,
  };
}

async function run(call: Call): Promise<number> {
  const { given } = call;
  const question = await request(given);
  const { report, studies } = await import('../rooms.js');
  const result = accepted(studies.evolveToDigits(question, given.digits ?? USUAL_DIGITS), evolve.name);
  if (given.json)
    deliver(
      report.plainJson({
        leastterm: studies.VERSION,
        request: askedOf(evolve.name, {}, given, { digits: USUAL_DIGITS }),
        ...result,
      }),
      call,
    );
  else if (given.quiet) deliver(`${result.value}\n`, call);
  else deliver(report.evolveText(result, await presentation(call)), call);
  return EXIT.done;
}

export const evolve: Command = {
  name: 'evolve',
  summary: 'alpha_s or a quark mass at another scale and number of flavours',
  about: [
    'Runs the MSbar coupling, or an MSbar quark mass, from one scale to another over the quark thresholds: exact solution of the renormalisation group with up to five loops, decoupling with one loop less. Prints the value with its certified digits, the error that the inputs give it, the shift from one loop less, the spread from crossing the thresholds at half and twice the masses, Lambda_MSbar, and the path.',
    'Scales and masses have units: 91.1879GeV, 500MeV. With --quiet only the bare value (a mass in GeV).',
  ],
  operands: [],
  options: [
    'alpha-s',
    'mass',
    'from',
    'from-flavours',
    'to',
    'to-flavours',
    'loops',
    'threshold',
    'alpha-s-mz',
    'digits',
    'json',
    'output',
    'quiet',
    'no-color',
    'help',
  ],
  words: {
    'alpha-s-mz': { help: 'the coupling behind a mass, alpha_s(M_Z) with five flavours (default: the world average)' },
    digits: { help: 'certified digits wanted of the value (default 15)' },
  },
  examples: [
    [
      "leastterm evolve --alpha-s '0.1180(9)' --from MZ --to 1.77693GeV --to-flavours 3",
      'the world average at the tau mass, with three flavours',
    ],
    [
      "leastterm evolve --mass '4.186(6)GeV' --from 4.186GeV --from-flavours 5 --to MZ",
      'the bottom mass at the Z mass',
    ],
    [
      "leastterm evolve --mass '0.9851(40)GeV' --from 3GeV --to own --json",
      'the charm mass at its own scale, m_c(m_c), as JSON',
    ],
  ],
  run,
};
