/** @module Bubble chains for people: the laboratory, and the list of quantities. */
import { shorten } from '../numerics/index.js';
import type {
  BubbleAmbiguity,
  BubbleCoupling,
  BubbleQuantity,
  BubbleResult,
  BubbleTrial,
} from '../extraction/index.js';
import { Page, rough, unpainted, type Fact, type TerminalOptions, type TableRow } from '../report/index.js';

/** A page as wide as the terminal. */
export const pageOf = (options: TerminalOptions): Page =>
  new Page(options.columns ?? 100, options.paint ?? unpainted, options.digits);

const inGeV = (length: { overHard: string; GeV?: string }, hard: string): string =>
  `${shorten(length.overHard, 6)} ${hard}${length.GeV === undefined ? '' : `, ${shorten(length.GeV, 6)} GeV`}`;

/** What R is, and where it is evaluated. */
export function couplingFacts(q: BubbleQuantity, c: BubbleCoupling): Fact[] {
  const where = c.mu === '1' ? q.hard : `${c.mu} ${q.hard}`;
  return [
    { label: 'R', text: q.meaning },
    {
      label: `α_s(${where})`,
      text: `${shorten(c.value, 12)}${c.error === undefined ? '' : ` ± ${rough(c.error)}`}, n_f = ${c.flavours}, a = β₀α_s = ${shorten(c.a, 6)}${c.scale === undefined ? '' : `; ${q.hard} = ${shorten(c.scale, 8)} GeV`}`,
    },
    ...(c.path ?? []).map((text) => ({ label: 'reached by', text, tone: 'faint' as const })),
    { label: 'Λ_MSbar', text: `${inGeV(c.lambda, q.hard)}, one loop` },
    { label: 'Landau pole', text: `at k = e^(5/6) Λ = ${inGeV(c.landau, q.hard)}` },
  ];
}

function termsSection(page: Page, { terms, quantity }: BubbleResult): void {
  page.head(`Coefficients, R = ${quantity.normalisation} · Σ c_n aⁿ`);
  page.table(
    [
      { head: 'n', align: 'right' },
      { head: 'c_n', align: 'point' },
      { head: 'term', align: 'point' },
      { head: 'partial sum', align: 'point' },
      { head: '', align: 'left' },
    ],
    terms.map((t): TableRow => ({
      cells: [
        String(t.n),
        shorten(t.coefficient, page.digits),
        shorten(t.term, page.digits),
        shorten(t.partialSum, page.digits),
        t.least === true ? '← least term' : '',
      ],
      ...(t.least === true ? { tone: 'mark' as const } : {}),
    })),
  );
  const exact = terms.filter((t) => t.exact !== undefined);
  if (exact.length > 0) {
    page.blank();
    page.facts(
      exact.map((t) => ({
        label: `c_${t.n}`,
        text: `${t.exact ?? ''}${t.exactBy === undefined ? '' : ` (matched by ${t.exactBy})`}`,
      })),
    );
  }
}

function polesSection(page: Page, { poles, quantity }: BubbleResult): void {
  page.head('Borel transform B(u) = e^(5u/3) (μ²/Q²)^u b(u)');
  page.say(`b(u) = ${quantity.borelTransform}`);
  page.blank();
  page.table(
    [
      { head: 'u', align: 'point' },
      { head: '', align: 'left', tone: 'faint' },
      { head: 'order', align: 'right' },
      { head: 'times (u−p)⁻¹', align: 'left' },
      { head: '(u−p)⁻²', align: 'left' },
    ],
    poles.map((p) => ({ cells: [p.u, p.side, String(p.order), ...p.residues] })),
  );
}

const ambiguityRow = (a: BubbleAmbiguity): TableRow => ({
  cells: [
    a.dimension,
    shorten(a.im, 6),
    shorten(a.imOverPi, 6),
    a.perLambda,
    a.GeV === undefined ? '' : a.GeV.im,
    a.GeV === undefined ? '' : a.GeV.imOverPi,
  ],
});

function sumSection(page: Page, { sum }: BubbleResult): void {
  page.head('The exact sum');
  page.facts([
    { label: 'principal value', text: sum.pv, tone: 'mark' },
    { label: 'Im above the axis', text: sum.im },
    { label: 'ambiguity |Im|/π', text: sum.ambiguity.imOverPi },
    ...(sum.inputError === undefined ? [] : [{ label: 'from the coupling', text: `± ${rough(sum.inputError)}` }]),
    { label: 'digits', text: `${sum.standing}, for the large-β₀ limit`, tone: 'faint' as const },
  ]);
  page.blank();
  page.table(
    [
      { head: 'd', align: 'right' },
      { head: 'Im', align: 'point' },
      { head: '|Im|/π', align: 'point' },
      { head: '|Im|/π over (Λ/Q)^d', align: 'point' },
      { head: '|Im| in GeV^d', align: 'point' },
      { head: '|Im|/π in GeV^d', align: 'point' },
    ],
    sum.ambiguity.byPole.map(ambiguityRow),
  );
}

const trialRow = (t: BubbleTrial, digits: number): TableRow => ({
  cells: [
    t.prescription,
    shorten(t.value ?? '', digits),
    t.deviation === undefined ? '' : rough(t.deviation),
    t.truncationError === undefined ? '' : rough(t.truncationError),
    t.overError === undefined ? '' : rough(t.overError),
    t.overAmbiguity === undefined ? '' : rough(t.overAmbiguity),
  ],
});

function trialsSection(page: Page, { trials, terms, growth }: BubbleResult): void {
  page.head(`How prescriptions fare with these ${terms.length} coefficients`);
  page.say(`Growth of the coefficients: ${growth.statement}`);
  page.blank();
  page.table(
    [
      { head: '', align: 'left' },
      { head: 'value', align: 'point' },
      { head: 'value − PV', align: 'point' },
      { head: 'own error', align: 'point' },
      { head: 'miss/own error', align: 'point' },
      { head: 'miss/ambiguity', align: 'point' },
    ],
    trials.filter((t) => t.refused === undefined).map((t) => trialRow(t, page.digits)),
  );
  const refused = trials.filter((t) => t.refused !== undefined).map((t) => t.prescription);
  if (refused.length > 0) {
    page.blank();
    page.facts([{ label: 'refused', text: refused.join(', '), tone: 'faint' }]);
  }
}

/** The laboratory. */
export function bubbleText(result: BubbleResult, options: TerminalOptions = {}): string {
  const page = pageOf(options);
  const { quantity } = result;
  page.title(`${quantity.title} in the large-β₀ limit`);
  page.blank();
  page.facts(couplingFacts(quantity, result.coupling));
  termsSection(page, result);
  polesSection(page, result);
  sumSection(page, result);
  trialsSection(page, result);
  page.head('Sources');
  page.points(quantity.sources, 'faint');
  page.say(`Status: ${quantity.status}.`, 'faint');
  return page.text();
}

/** The quantities, a line each. */
export function bubbleList(
  quantities: readonly { name: string; title: string; meaning: string }[],
  options: TerminalOptions = {},
): string {
  const page = pageOf(options);
  page.title('Quantities with an exact large-β₀ limit');
  page.blank();
  page.table(
    [
      { head: 'name', align: 'left' },
      { head: 'title', align: 'left' },
      { head: 'R', align: 'left', tone: 'faint' },
    ],
    quantities.map((q) => ({ cells: [q.name, q.title, q.meaning] })),
  );
  return page.text();
}
