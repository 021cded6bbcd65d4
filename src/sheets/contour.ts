/** @module A contour quantity for people: the weight, both expansions order by order, their Borel sums, the subtracted series. */
import type { ContourResult, ContourSum } from '../studies/index.js';
import { shorten } from '../numerics/index.js';
import {
  cautionPoints,
  conjugates,
  couplingFacts,
  Page,
  plusMinus,
  rough,
  sentence,
  unpainted,
  withError,
  withPi,
} from '../report/index.js';
import type { Fact, TerminalOptions } from '../report/index.js';

/** Moments and operator dimensions shown; JSON has all. */
const MOST_ROWS = 5;

function readFacts(result: ContourResult): Fact[] {
  const { end, loops, refused } = result.circle;
  return [
    { label: 'quantity', text: result.series.quantity ?? result.series.id },
    { label: 'weight', text: `w(x) = ${result.weight.text}, x = s/s_0` },
    { label: 'scheme', text: `${result.series.scheme ?? ''}, ${result.series.flavours ?? ''} active flavours` },
    ...couplingFacts(result.series, result.coupling).filter((fact) => fact.label !== 'Borel u'),
    {
      label: 'on the circle',
      text:
        end === undefined
          ? `refused: ${refused?.reason ?? ''}`
          : `${loops}-loop running; at s = s_0: x = ${conjugates(end.re, end.im, 8).replace('∓', '-').replace('±', '+')}, |x| = ${shorten(end.modulus, 6)}, ${end.degrees}°`,
    },
  ];
}

function weightSection(page: Page, result: ContourResult): void {
  page.head('The weight');
  page.facts([
    ...result.moments.slice(0, MOST_ROWS).map(({ power, value, exact }) => ({
      label: `J_${power}`,
      text: exact === undefined || exact === value ? shorten(value, 12) : `${withPi(exact)} = ${shorten(value, 12)}`,
    })),
    ...result.powerCorrections.slice(0, MOST_ROWS).map(({ dimension, statement }) => ({
      label: `dimension ${dimension}`,
      text: statement,
    })),
  ]);
}

function orderTables(page: Page, result: ContourResult): void {
  const { digits } = page;
  page.head('Fixed order');
  page.table(
    [
      { head: 'order', align: 'right' },
      { head: 'coefficient', align: 'point' },
      { head: 'term', align: 'point' },
      { head: 'partial sum', align: 'point' },
    ],
    result.orders.map((row) => ({
      cells: [
        String(row.order),
        shorten(row.momentCoefficient, digits),
        shorten(row.fixedOrder.term, digits),
        shorten(row.fixedOrder.sum, digits),
      ],
    })),
  );
  page.head('Contour improved');
  if (result.refused !== undefined) {
    page.say(sentence(`refused: ${result.refused.reason}; ${result.refused.remedy}`), 'warn');
    return;
  }
  page.table(
    [
      { head: 'order', align: 'right' },
      { head: 'c of D', align: 'point' },
      { head: 'A', align: 'point' },
      { head: 'term', align: 'point' },
      { head: 'partial sum', align: 'point' },
    ],
    result.orders.map((row) => ({
      cells: [
        String(row.order),
        withError(row.coefficient, row.coefficientError, digits),
        shorten(row.integral ?? '', digits),
        shorten(row.improved?.term ?? '', digits),
        shorten(row.improved?.sum ?? '', digits),
      ],
    })),
  );
  const { difference } = result;
  if (difference === undefined) return;
  page.blank();
  page.say(
    `Fixed order minus contour improved: ${shorten(difference.value, 4)}${difference.overTruncation === undefined ? '' : `, ${rough(difference.overTruncation)} times the larger last term`}.`,
    'mark',
  );
  page.say(sentence(difference.statement), 'warn');
}

function borelSection(page: Page, result: ContourResult): void {
  page.head('Borel sums');
  for (const row of result.borel) {
    page.blank();
    page.say(`${row.method}, ${row.variant}`);
    const facts: Fact[] =
      row.refused !== undefined
        ? [{ label: 'refused', text: `${row.refused.reason}; ${row.refused.remedy}`, tone: 'faint' }]
        : [
            { label: 'principal value', text: `${shorten(row.value ?? '', page.digits)} ${plusMinus(row.truncation)}` },
            {
              label: 'lateral sums',
              text:
                row.imaginary === undefined
                  ? ''
                  : `± i times ${shorten(row.imaginary, 6)}; ambiguity |Im|/π = ${row.ambiguity ?? ''}`,
            },
            {
              label: 'contour improved',
              text:
                row.improvedLimit === undefined
                  ? ''
                  : `tends to ${shorten(row.improvedLimit, page.digits)} in this model: asymptotic separation ${shorten(row.separation ?? '', 4)}`,
            },
          ];
    page.facts(facts.filter((fact) => fact.text !== ''));
  }
}

function subtractedSection(page: Page, result: ContourResult): void {
  page.head("Without the gluon condensate's renormalon");
  const { subtracted } = result;
  if ('refused' in subtracted) {
    page.say(sentence(`refused: ${subtracted.refused.reason}; ${subtracted.refused.remedy}`), 'warn');
    return;
  }
  const { norm, ratio, addedBack, orders, difference, normMoves } = subtracted;
  page.facts([
    { label: 'norm', text: `${norm.value}${norm.error === undefined ? '' : ` ± ${norm.error}`}; ${norm.origin}` },
    { label: 'scale', text: `R = ${ratio} √s_0; added back in every sum: ${shorten(addedBack, 6)}` },
  ]);
  page.blank();
  page.table(
    [
      { head: 'order', align: 'right' },
      { head: 'fixed-order term', align: 'point' },
      { head: 'sum', align: 'point' },
      { head: 'contour-improved term', align: 'point' },
      { head: 'sum', align: 'point' },
    ],
    orders.map((row) => ({
      cells: [
        String(row.order),
        shorten(row.fixedOrder.term, page.digits),
        shorten(row.fixedOrder.sum, page.digits),
        shorten(row.improved.term, page.digits),
        shorten(row.improved.sum, page.digits),
      ],
    })),
  );
  page.blank();
  page.say(`Fixed order minus contour improved: ${shorten(difference, 4)}.`, 'mark');
  if (normMoves !== undefined)
    page.say(
      `One standard deviation of the norm moves the fixed-order sum by ${normMoves.fixedOrder}, the contour-improved one by ${normMoves.improved}.`,
    );
}

/** Every sum with all its errors, so that none is taken without the others in sight. */
function sumsSection(page: Page, { sums, coupling }: ContourResult): void {
  page.head('Side by side');
  const columns = [
    { head: 'truncation', of: (s: ContourSum) => s.truncation },
    { head: 'ambiguity', of: (s: ContourSum) => s.ambiguity },
    { head: 'coupling', of: (s: ContourSum) => s.coupling },
    { head: 'coefficients', of: (s: ContourSum) => s.coefficients },
  ].filter(({ of }) => sums.some((s) => of(s) !== undefined));
  page.table(
    [
      { head: '', align: 'left' },
      { head: 'value', align: 'point' },
      ...columns.map(({ head }) => ({ head, align: 'left' as const })),
    ],
    sums.map((s) => ({
      cells: [s.name, shorten(s.value, page.digits), ...columns.map(({ of }) => plusMinus(of(s)))],
    })),
  );
  page.blank();
  page.say(
    'Ambiguity is |Im|/π; coupling and coefficients: what one standard deviation of the input moves. All of these are indicative.',
    'faint',
  );
  if (sums.some((s) => [s.coupling, s.coefficients].includes('unknown')))
    page.say('Unknown: with the input moved by its error the sum is refused.', 'faint');
  if (sums.every((s) => s.coupling === undefined))
    page.say(`No error of ${coupling.name} is given: --at 'VALUE(ERROR)' adds its share.`, 'faint');
}

/** The study for people. */
export function contourText(result: ContourResult, options: TerminalOptions = {}): string {
  const page = new Page(options.columns ?? 100, options.paint ?? unpainted, options.digits);
  page.title(result.series.title);
  page.head('What was read');
  page.facts(readFacts(result));
  weightSection(page, result);
  orderTables(page, result);
  borelSection(page, result);
  subtractedSection(page, result);
  sumsSection(page, result);
  page.blank();
  page.say(
    'Fixed-order digits are certified for these coefficients; those of contour integrals are converged (two rules agree). Borel sums rest on a model or an approximant: indicative.',
    'faint',
  );
  cautionPoints(page, result.cautions);
  return page.text();
}

/** name, value, truncation error: a line a value, set off by tabs. */
export function contourLines(result: ContourResult): string {
  const lines: (string | undefined)[][] = [
    ['fixed-order', result.fixedOrder.value, result.fixedOrder.truncation],
    ...(result.contourImproved === undefined
      ? []
      : [['contour-improved', result.contourImproved.value, result.contourImproved.truncation]]),
    ...result.borel
      .filter((row) => row.value !== undefined && row.central === true)
      .map((row, i) => [
        i === 0 && row.improvedLimit !== undefined ? 'contour-borel' : 'contour-borel-pade',
        row.value,
        row.truncation,
      ]),
  ];
  const { subtracted } = result;
  if (!('refused' in subtracted)) {
    const last = subtracted.orders.at(-1);
    lines.push(
      [
        'condensate-subtracted fixed-order',
        last?.fixedOrder.sum,
        shorten(last?.fixedOrder.term.replace('-', '') ?? '', 3),
      ],
      [
        'condensate-subtracted contour-improved',
        last?.improved.sum,
        shorten(last?.improved.term.replace('-', '') ?? '', 3),
      ],
    );
  }
  return lines.map((line) => `${line.map((cell) => cell ?? '').join('\t')}\n`).join('');
}
