/** @module Section 3: how the coefficients grow, on what evidence, and where the nearest Borel singularity sits. */
import type { ExpectedSingularity, GrowthReport, SingularityReport } from '../../studies/index.js';
import { shorten } from '../../numerics/index.js';
import { percent, plusMinus, withError } from '../layout/figures.js';
import type { Fact, Page } from '../layout/page.js';
import type { TableRow } from '../layout/table.js';
import { sentence } from '../words.js';

const DIGITS = 6;

const optional = (value: string | undefined, error?: string): string =>
  value === undefined ? '' : withError(value, error, DIGITS);

function foundRow(found: SingularityReport): TableRow {
  const angle = found.angle === undefined ? '' : ` at ± ${shorten(found.angle, 4)}°`;
  return {
    cells: [
      'found',
      `${withError(found.t, found.tError, DIGITS)}${angle}`,
      optional(found.u, found.uError),
      optional(found.exponent, found.exponentError),
      optional(found.strength, found.strengthError),
      found.kind,
      found.standing,
    ],
  };
}

function expectedRow(expected: ExpectedSingularity): TableRow {
  const kind = expected.dimension === undefined ? expected.kind : `${expected.kind}, d = ${expected.dimension}`;
  return {
    cells: [
      'expected',
      shorten(expected.t, DIGITS),
      optional(expected.u),
      optional(expected.exponent),
      optional(expected.strength),
      kind,
      expected.origin,
    ],
  };
}

function singularities(page: Page, growth: GrowthReport): void {
  const rows = [
    ...(growth.nearest === undefined ? [] : [foundRow(growth.nearest)]),
    ...growth.expected.map((expected) => expectedRow(expected)),
  ];
  if (rows.length === 0) {
    page.say('Nearest Borel singularity: no position follows from these terms, and none is stated.');
    return;
  }
  page.say('Nearest Borel singularity, (1 − t/t*) to the power −exponent:');
  page.blank();
  page.table(
    [
      { head: '', align: 'left' },
      { head: 'position t*', align: 'point' },
      { head: 'u*', align: 'point' },
      { head: 'exponent', align: 'point' },
      { head: 'strength', align: 'point' },
      { head: 'kind', align: 'left' },
      { head: 'trust or origin', align: 'left', tone: 'faint' },
    ],
    rows,
  );
  if (growth.agreement !== undefined) {
    page.blank();
    page.say(sentence(growth.agreement));
  }
}

function comparisonFacts(growth: GrowthReport): Fact[] {
  const { comparison } = growth.evidence;
  if (comparison === undefined) return [];
  const aicc =
    comparison.deltaAICc === undefined ? 'ΔAICc needs five points' : `ΔAICc = ${shorten(comparison.deltaAICc, 3)}`;
  const order =
    comparison.growthOrder === undefined
      ? ''
      : `; power of n! preferred: ${withError(comparison.growthOrder, comparison.growthOrderError, 4)}`;
  return [
    {
      label: 'models',
      text: `factorial against geometric on ${comparison.points} points: Bayes factor ${shorten(comparison.bayesFactor, 3)} (${comparison.wording}), ${aicc}${order}`,
    },
  ];
}

function ratioTable(page: Page, growth: GrowthReport): void {
  const { ratios } = growth.evidence;
  if (ratios.length === 0) return;
  page.blank();
  page.table(
    [
      { head: 'n', align: 'right' },
      { head: 'c(n) / n c(n−1)', align: 'point' },
      { head: 'linear extrapolant', align: 'point' },
      { head: 'its error', align: 'point' },
    ],
    ratios.map((row) => ({
      cells: [String(row.n), shorten(row.ratio, DIGITS), optional(row.linear), plusMinus(row.linearError)],
    })),
  );
  page.say('Both columns tend to 1/t* when one singularity leads. Indicative.', 'faint');
}

function predictionFacts(growth: GrowthReport): Fact[] {
  return growth.evidence.predictions.map((p) => ({
    label: 'prediction',
    text: `coefficient ${p.n} hidden, then predicted by ${p.method}: off by ${percent(p.relativeMiss)}`,
  }));
}

export function growthSection(page: Page, growth: GrowthReport): void {
  page.head('The growth');
  page.say(sentence(growth.statement), 'strong');
  page.say(`Trust: ${growth.standing}.`, 'faint');
  page.blank();
  singularities(page, growth);
  page.blank();
  page.facts([
    { label: 'signs', text: growth.signPattern },
    ...comparisonFacts(growth),
    ...predictionFacts(growth),
    ...growth.evidence.competition.map((text) => ({ label: 'competition', text })),
    ...(growth.usableCoefficients === undefined
      ? []
      : [
          { label: 'usable', text: `noise leaves ${growth.usableCoefficients} coefficients for rational approximants` },
        ]),
  ]);
  ratioTable(page, growth);
  if (growth.flags.length > 0) {
    page.blank();
    page.points(
      growth.flags.map((flag) => sentence(flag.text)),
      'warn',
    );
  }
}
