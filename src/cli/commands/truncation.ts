/** @module leastterm truncation: every truncation-error model side by side. */
import type { Call, Command } from '../command.js';
import { EXIT, UsageError } from '../faults.js';
import { couplingOf, readSeries, requestOf, USUAL_DIGITS, wantedCoupling } from '../input.js';
import { deliver } from '../output.js';
import { presentation } from '../present.js';
import type { Priors } from '../../truncation/index.js';

async function priorsOf(text: string | undefined): Promise<Priors | undefined> {
  if (text === undefined) return undefined;
  const { truncation: models } = await import('../rooms.js');
  const priors = models.readPriors(text);
  if (models.isPriorProblem(priors))
    throw new UsageError(`--prior: ${priors.problem}; wanted ${priors.wanted}`, truncation.name);
  return priors;
}

async function run(call: Call): Promise<number> {
  const [name = ''] = call.operands;
  const { given } = call;
  const wanted = await wantedCoupling(call, truncation.name);
  const priors = await priorsOf(given.prior);
  const series = await readSeries(name, call);
  const { at, path } = await couplingOf(wanted, series, truncation.name);
  const { report, studies } = await import('../rooms.js');
  const result = studies.truncationStudy(series, at, {
    ...(given.order === undefined ? {} : { order: given.order }),
    ...(priors === undefined ? {} : { priors }),
    byOrder: given.byOrder === true,
    digits: given.digits ?? USUAL_DIGITS,
    ...(path === undefined ? {} : { path }),
    request: requestOf(truncation.name, name, call),
  });
  if (given.json) deliver(report.plainJson(report.truncationObject(result)), call);
  else if (given.quiet) deliver(report.truncationLines(result), call);
  else deliver(report.truncationText(result, await presentation(call)), call);
  return result.estimates.every((entry) => entry.refused !== undefined) ? EXIT.allRefused : EXIT.done;
}

export const truncation: Command = {
  name: 'truncation',
  summary: 'the truncation error by every model that has a name',
  about: [
    'Shows the truncation-error models side by side, each with its band at 68 and 95 %: conventional ones (last term, ratio, geometric tail, least term, Pade- and FAC-predicted next term, scale envelope), and credible intervals of Bayesian models with their priors (Cacciari-Houdeau and its modified form, geometric, asymmetric abc, the geometric one over the scales).',
    'With --by-order each model also sees the first terms alone, order by order, and the next known term shows whether its band was right. With --quiet one line a model: name, ends of the 68 % band, ends of the 95 % band, as distances from the sum.',
    'Priors are set by name: --prior abc.xi=3,geometric.omega=2. docs/methods/truncation-error.md lists them.',
  ],
  operands: [{ name: 'SERIES', help: 'a catalogue id, a series file, or - for standard input' }],
  options: [
    'at',
    'alpha-s-mz',
    'by-order',
    'prior',
    'order',
    'flavours',
    'digits',
    'json',
    'output',
    'quiet',
    'no-color',
    'help',
  ],
  needs: ['at'],
  examples: [
    ['leastterm truncation adler --at 0.32', 'all models on the Adler function at alpha_s = 0.32'],
    ['leastterm truncation adler --at 0.32 --by-order', 'and how each did at the lower orders'],
    ['leastterm truncation adler --at 0.32 --prior chbar.lambda=0.6 --json', 'another prior, as JSON'],
  ],
  run,
};
