/** @module leastterm bubbles: quantities whose large-β0 limit is known exactly, as a laboratory for series. */
import { bubbleQuestion, cutOf } from '../bubble-input.js';
import type { Call, Command } from '../command.js';
import { EXIT, UsageError } from '../faults.js';
import { deliver } from '../output.js';
import { presentation } from '../present.js';
import { accepted } from '../refused.js';
import type { BubbleQuestion, BubbleView } from '../../extraction/index.js';

async function listed(call: Call): Promise<number> {
  const { bubbles, sheets } = await import('../rooms-more.js');
  const { report, studies } = await import('../rooms.js');
  const quantities = bubbles.QUANTITIES.map(({ name, title, meaning, formula, norm, sources, status }) => ({
    name,
    title,
    meaning,
    borelTransform: formula,
    normalisation: norm.text,
    sources,
    status,
  }));
  if (call.given.json) deliver(report.plainJson({ leastterm: studies.VERSION, quantities }), call);
  else if (call.given.quiet) deliver(quantities.map(({ name }) => `${name}\n`).join(''), call);
  else deliver(sheets.bubbleList(quantities, await presentation(call)), call);
  return EXIT.done;
}

async function viewed(question: BubbleQuestion, text: string, call: Call): Promise<void> {
  const { extraction, sheets } = await import('../rooms-more.js');
  const { report, series } = await import('../rooms.js');
  const names = extraction.BUBBLE_VIEWS;
  const view = names.find((name): name is BubbleView => name === text);
  if (view === undefined) {
    throw new UsageError(
      `--view: no view "${text}"${series.suggestion(text, names)}; wanted one of ${names.join(', ')}`,
      bubbles.name,
    );
  }
  const result = accepted(extraction.bubbleView(question, view), bubbles.name);
  if (call.given.json) deliver(report.plainJson(result), call);
  else if (call.given.csv === true || call.given.quiet) deliver(sheets.bubbleViewCsv(result), call);
  else deliver(sheets.bubbleViewText(result, await presentation(call)), call);
}

async function cutAt(question: BubbleQuestion, text: string, call: Call): Promise<void> {
  const { extraction, sheets } = await import('../rooms-more.js');
  const { report } = await import('../rooms.js');
  const cut = await cutOf(text, question, bubbles.name);
  const result = accepted(extraction.bubbleCut(question, cut), bubbles.name);
  if (call.given.json) deliver(report.plainJson(result), call);
  else if (call.given.csv === true) deliver(sheets.bubbleCutCsv(result), call);
  else if (call.given.quiet)
    deliver(`${result.cut.rows.find((r) => r.cut === result.cut.overHard)?.high ?? ''}\n`, call);
  else deliver(sheets.bubbleCutText(result, await presentation(call)), call);
}

async function run(call: Call): Promise<number> {
  const [name] = call.operands;
  const { given } = call;
  if (name === undefined) return listed(call);
  if (given.view !== undefined && given.cut !== undefined) {
    throw new UsageError('--view and --cut exclude each other: give one of them', bubbles.name);
  }
  if (given.csv === true && given.view === undefined && given.cut === undefined) {
    throw new UsageError('--csv is for --view and --cut; without them write --json', bubbles.name);
  }
  const question = await bubbleQuestion(name, call, bubbles.name);
  if (given.view !== undefined) await viewed(question, given.view, call);
  else if (given.cut !== undefined) await cutAt(question, given.cut, call);
  else {
    const { extraction, sheets } = await import('../rooms-more.js');
    const { report } = await import('../rooms.js');
    if (given.quiet && !given.json) {
      const { pv } = accepted(extraction.bubbleValue(question), bubbles.name);
      deliver(`${pv}\n`, call);
      return EXIT.done;
    }
    const result = accepted(extraction.bubbleLaboratory(question), bubbles.name);
    if (given.json) deliver(report.plainJson(result), call);
    else deliver(sheets.bubbleText(result, await presentation(call)), call);
  }
  return EXIT.done;
}

export const bubbles: Command = {
  name: 'bubbles',
  summary: 'a quantity whose large-beta_0 limit is known exactly: a laboratory for series',
  about: [
    'The large-beta_0 limit (bubble chains, naive non-abelianisation) of nine quantities, known in closed form: coefficients to any order, Borel poles with their residues, the principal value and its ambiguity to any number of digits, and how fixed order, the least term and every prescription fare against it when they get the first coefficients only. Without a quantity: the list of them.',
    '--view shows the momenta behind a chain as a table for plots. --cut removes the momenta below mu_f: the coefficients lose their infrared factorial, the low momenta are given beside them as powers of Lambda, and the sum does not depend on mu_f.',
    'With --quiet only the principal value, of --cut the part above it, of --view the rows.',
  ],
  operands: [{ name: 'QUANTITY', help: 'one of the list, such as adler or pole-mass', optional: true }],
  options: [
    'at',
    'alpha-s-mz',
    'flavours',
    'scale',
    'mu',
    'order',
    'view',
    'cut',
    'csv',
    'digits',
    'json',
    'output',
    'quiet',
    'no-color',
    'help',
  ],
  words: {
    at: { help: "alpha_s at mu, MSbar, with its error if there is one: '0.3156(30)'" },
    'alpha-s-mz': {
      help: 'alpha_s(M_Z) with five flavours, evolved over the thresholds to --scale; in place of --at',
    },
    flavours: { help: 'number of flavours (default: that of the quantity, 3 or 4)' },
    scale: {
      placeholder: 'SCALE',
      example: '1.777GeV',
      help: 'the hard scale with its unit: Q, sqrt(s), the mass m(m), or 1/r; for GeV and --alpha-s-mz',
    },
    order: { example: '12', help: 'number of coefficients (default 8)' },
    csv: { help: 'with --view or --cut: comma-separated values, a line a row' },
    digits: { help: 'certified digits wanted of the sums (default 15)' },
  },
  examples: [
    ['leastterm bubbles', 'the quantities'],
    ['leastterm bubbles adler --at 0.32', 'the Adler function: its exact sum, and every prescription against it'],
    ['leastterm bubbles pole-mass --at 0.22 --scale 4.2GeV --digits 40', 'the pole mass, its ambiguity in GeV'],
    ['leastterm bubbles static-potential --at 0.25 --view scales', 'ever softer momenta, order by order'],
    ['leastterm bubbles adler --at 0.32 --cut 0.6', 'without the momenta below 0.6 Q'],
  ],
  run,
};
