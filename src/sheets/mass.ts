/** @module Heavy-quark masses for people: the value with its errors, order by order, the renormalon, the ambiguity of the pole. */
import { shorten } from '../numerics/index.js';
import type { MassEntry, MassResult, MassTerm, MassValue } from '../masses/index.js';
import { Page, rough, unpainted, type Fact, type TableRow, type TerminalOptions } from '../report/index.js';

/** Digits of a term in GeV. */
const TERM_DIGITS = 4;
const VALUE_DIGITS = 8;

const isValue = (entry: MassEntry): entry is MassValue => 'value' in entry;

const cut = (text: string | undefined, digits = TERM_DIGITS): string =>
  text === undefined ? '' : shorten(text, digits);

const bothSides = (plus: string, minus: string): string =>
  rough(plus) === rough(minus) ? `± ${rough(plus)}` : `+${rough(plus)} -${rough(minus)}`;

const STATUS = {
  'confirmed-two-sources': 'two published statements agree',
  rederived: 're-derived',
  'one-source': 'one publication read',
  memory: 'recalled, with consistency tests',
} as const;

function scaleFact(entry: MassValue): Fact[] {
  const { scaleVariation } = entry;
  if (scaleVariation === undefined) return [];
  const { plus, minus, points } = scaleVariation;
  const factors = points.flatMap((p) => (p.value === undefined ? [] : [Number(p.factor)]));
  const left = points.filter((p) => p.refused !== undefined).map((p) => p.factor);
  const where = `μ from ${Math.min(1, ...factors)} to ${Math.max(1, ...factors)} times its value`;
  const missing = left.length === 0 ? '' : `; ${left.join(' and ')} left out, α_s is too large there`;
  return [{ label: 'scale variation', text: `${bothSides(plus, minus)} (${where}${missing})` }];
}

function valueFacts(entry: MassValue): Fact[] {
  const digits =
    entry.digits === 'certified'
      ? 'certified, for the truncated relations'
      : 'converged, in doubles: no enclosure is at hand for this path';
  return [
    { label: entry.symbol, text: `${entry.value} GeV`, tone: 'mark' },
    { label: 'rounded, in GeV', text: entry.printed },
    { label: 'digits', text: digits },
    ...entry.errors.map((e) => ({
      label: `error from ${e.label}`,
      text: `${bothSides(e.plus, e.minus)}${e.oneSided === true ? ' (from one side: the other has no conversion)' : ''}`,
    })),
    ...(entry.lastTerm === undefined ? [] : [{ label: 'last term', text: rough(entry.lastTerm) }]),
    ...scaleFact(entry),
    ...(entry.perturbative === undefined
      ? []
      : [{ label: 'perturbative', text: `± ${rough(entry.perturbative)}, the larger of the last two` }]),
    ...(entry.ambiguity === undefined
      ? []
      : [{ label: 'ambiguity', text: `± ${rough(entry.ambiguity)} by |Im|/π; other conventions below` }]),
  ];
}

function orderTable(page: Page, entry: MassValue): void {
  const terms = new Map(entry.terms?.map((t) => [t.order, t]));
  page.table(
    [
      { head: 'order', align: 'right' },
      { head: 'value', align: 'point', tone: 'mark' },
      { head: 'change', align: 'point' },
      { head: 'pole term', align: 'point' },
      { head: 'renormalon', align: 'point' },
      { head: 'removed', align: 'point' },
      { head: 'left', align: 'point' },
      { head: 'ratio', align: 'point' },
      { head: 'of left', align: 'point' },
    ],
    entry.byOrder.map((row): TableRow => ({
      cells: [
        String(row.order),
        shorten(row.value, Math.min(page.digits, VALUE_DIGITS)),
        cut(row.change),
        ...termCells(terms.get(row.order)),
      ],
    })),
  );
  if (terms.size === 0) return;
  page.blank();
  page.say(
    'renormalon: what the leading singularity alone gives for the pole term; removed: what the definition takes out at this order, re-expanded at μ; ratio: pole term to the one before, and the same of what is left',
    'faint',
  );
  if (entry.closed !== undefined) page.say(`added at once, as a Borel integral: ${cut(entry.closed, 7)} GeV`, 'faint');
}

/** The relation between m(m) and the definition given, when that is no MSbar mass. */
function sourceSection(page: Page, result: MassResult): void {
  const { sourceTerms, from } = result;
  if (sourceTerms === undefined) return;
  page.head(`Between m(m) and ${from.symbol}, in GeV, at m(m) as found`);
  page.table(
    [
      { head: 'order', align: 'right' },
      { head: 'pole term', align: 'point' },
      { head: 'renormalon', align: 'point' },
      { head: 'removed', align: 'point' },
      { head: 'left', align: 'point' },
      { head: 'ratio', align: 'point' },
      { head: 'of left', align: 'point' },
    ],
    sourceTerms.map((t) => ({ cells: [String(t.order), ...termCells(t)] })),
  );
}

const termCells = (t: MassTerm | undefined): string[] =>
  t === undefined
    ? []
    : [cut(t.pole), cut(t.renormalon), cut(t.removed), cut(t.left), cut(t.poleRatio, 2), cut(t.leftRatio, 2)];

function evolutionSection(page: Page, entry: MassValue): void {
  const { evolution } = entry;
  if (evolution === undefined) return;
  page.head(`R-evolution of ${entry.symbol}`);
  page.table(
    [
      { head: 'R/GeV', align: 'point' },
      { head: 'α_s(R)', align: 'point' },
      { head: 'mass/GeV', align: 'point', tone: 'mark' },
    ],
    evolution.path.map((p) => ({ cells: [p.scale, p.alpha, shorten(p.mass, VALUE_DIGITS)] })),
  );
  page.blank();
  page.facts([
    { label: 'leading logarithms', text: `${shorten(evolution.leadingLog, VALUE_DIGITS)} GeV, in closed form` },
    { label: 'fixed order at μ', text: `${shorten(evolution.fixedOrder, VALUE_DIGITS)} GeV, not evolved` },
    { label: 'quadrature', text: `two steps differ by ${rough(evolution.doubt)} GeV` },
  ]);
}

/** All definitions side by side. */
function sideBySide(page: Page, values: readonly MassEntry[]): void {
  const most = Math.max(0, ...values.map((v) => (isValue(v) ? v.order : 0)));
  const orders = Array.from({ length: most }, (_, k) => k + 1);
  page.table(
    [
      { head: 'mass', align: 'left' },
      { head: 'GeV', align: 'point', tone: 'mark' },
      { head: 'inputs', align: 'left' },
      { head: 'pert.', align: 'left' },
      ...orders.map((n) => ({ head: n === 1 ? 'α_s' : `α_s^${n}`, align: 'point' as const })),
    ],
    values.map((entry) => {
      if (!isValue(entry)) {
        return {
          note: `${entry.title}: refused. ${entry.refused.reason}. Remedy: ${entry.refused.remedy}.`,
          tone: 'warn' as const,
        };
      }
      const inputs = Math.hypot(...entry.errors.map((e) => Math.max(Number(e.plus), Number(e.minus))));
      return {
        cells: [
          `${entry.symbol}${entry.renormalonFree ? '' : ' *'}`,
          shorten(entry.value, page.narrow ? 5 : 6),
          inputs > 0 ? `± ${rough(String(inputs))}` : '',
          entry.perturbative === undefined ? '' : `± ${rough(entry.perturbative)}`,
          ...orders.map((n) => cut(entry.byOrder.find((row) => row.order === n)?.change, 3)),
        ],
      };
    }),
  );
  page.blank();
  for (const v of values) {
    if (isValue(v) && v.closed !== undefined)
      page.say(`${v.symbol}: a Borel integral of ${cut(v.closed, 7)} GeV is added to the terms`, 'faint');
  }
  if (values.some((v) => isValue(v) && !v.renormalonFree)) {
    page.say('* holds the renormalon: its ambiguity comes on top, see below', 'faint');
  }
}

function renormalonSection(page: Page, result: MassResult): void {
  const { strength, poleAmbiguity } = result;
  page.head('The renormalon of the pole mass');
  const error = strength.error === undefined ? '' : ` ± ${rough(strength.error)}`;
  page.facts([
    { label: 'strength N', text: `${strength.value}${error}, ${strength.method}` },
    ...strength.others.map((o) => ({ label: 'other estimates', text: `${o.value}, ${o.method} (${o.reference})` })),
    { label: `Λ_MSbar, n_l = ${result.light}`, text: `${result.lambda} GeV (exact definition, ${result.loops} loops)` },
  ]);
  page.blank();
  page.say('Irreducible ambiguity of the pole mass, by convention; never compare across rows without converting:');
  page.blank();
  page.table(
    [
      { head: 'convention', align: 'left' },
      { head: 'GeV', align: 'point', tone: 'mark' },
      { head: 'from N', align: 'left' },
      { head: 'in Λ', align: 'point' },
      { head: '', align: 'left' },
    ],
    poleAmbiguity.conventions.map((c) => ({
      cells: [c.name, c.GeV, c.error === undefined ? '' : `± ${rough(c.error)}`, c.inLambda, c.about],
    })),
  );
}

function definitionsSection(page: Page, values: readonly MassEntry[]): void {
  page.head(values.length === 1 ? 'Definition' : 'Definitions');
  const facts = values.filter(isValue).map((v): Fact => ({
    label: v.symbol,
    text: `${[v.title, ...v.notes].join('; ')}. ${v.source} (${STATUS[v.status]})`,
  }));
  page.facts(facts);
}

export function massText(result: MassResult, options: TerminalOptions = {}): string {
  const page = new Page(options.columns ?? 100, options.paint ?? unpainted, options.digits);
  const [only] = result.values;
  const single = result.values.length === 1 && only !== undefined && isValue(only) ? only : undefined;
  const given = `${result.from.symbol} = ${result.mass.replace(/\s*([GMT]eV)$/, ' $1')}`;
  page.title(single === undefined ? `${given} in other definitions` : `${given} as ${single.symbol}`);
  page.facts([
    {
      label: 'coupling',
      text: `α_s = ${result.alphaS.given} at ${result.alphaS.scale} GeV with ${result.alphaS.flavours} flavours; ${cut(result.alphaS.atMass, 6)} at m(m) with n_l = ${result.light}`,
    },
    { label: 'm(m)', text: `${shorten(result.msbar, VALUE_DIGITS)} GeV` },
    { label: 'scale μ', text: `${result.scale} GeV for all expansions` },
  ]);
  if (single === undefined) {
    page.head('Side by side, with the change by each order');
    sideBySide(page, result.values);
  } else {
    page.head('Value');
    page.facts(valueFacts(single));
    page.head('Order by order, in GeV');
    orderTable(page, single);
  }
  if (single !== undefined) evolutionSection(page, single);
  sourceSection(page, result);
  renormalonSection(page, result);
  definitionsSection(page, result.values);
  if (result.cautions.length > 0) {
    page.head('Cautions');
    page.points(result.cautions, 'warn');
  }
  return page.text();
}

/** The bare value, or one line a definition: name and value in GeV. */
export function massLines(result: MassResult): string {
  const lines = result.values.map((v) => {
    const value = isValue(v) ? v.value : 'refused';
    return result.values.length === 1 ? value : `${v.definition} ${value}`;
  });
  return `${lines.join('\n')}\n`;
}
