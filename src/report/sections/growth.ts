/** @module Section 3: how the coefficients grow, on what evidence, and where the nearest Borel singularity sits. */
import type {
  ExpectedSingularity,
  GrowthReport,
  SingularityReport,
  StrengthReport,
  UltravioletReport,
} from '../../studies/index.js';
import { shorten } from '../../numerics/index.js';
import { percent, plusMinus, withError } from '../layout/figures.js';
import type { Fact, Page } from '../layout/page.js';
import type { TableNote, TableRow } from '../layout/table.js';
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
  const forms = correctionFacts(growth);
  if (forms.length > 0) {
    page.blank();
    page.say(
      'Corrections expected, (1 − t/t*)^(−γ) [1 + c_1 (1 − t/t*) + …] and c(n) ∝ Γ(n+γ) t*^(−n) [1 + …], p = γ − 1:',
    );
    page.facts(forms);
  }
  const alone = growth.expected.filter((s) => s.dimensionAlone === true && s.u !== undefined);
  if (alone.length > 0) {
    page.say(
      `u = ${alone.map((s) => shorten(s.u ?? '', DIGITS)).join(', ')}: the exponent of the dimension alone; an anomalous dimension of the operators is not in it.`,
      'faint',
    );
  }
  if (growth.ultraviolet !== undefined) ultravioletBlock(page, growth.ultraviolet);
  if (growth.strength !== undefined) strengthBlock(page, growth.strength);
}

function ultravioletBlock(page: Page, uv: UltravioletReport): void {
  page.blank();
  page.say(`Ultraviolet, u = ${uv.u}, beyond large β₀ (${uv.reference}; ${uv.standing}):`);
  page.facts([
    { label: 'four-quark operators', text: `shift the exponent by λ = ${uv.shifts.join(', ')}` },
    {
      label: 'exponent',
      text: `${uv.exponent === undefined ? 'not known' : shorten(uv.exponent, DIGITS)}; ${uv.inFile === undefined ? 'the file states none' : `from the file ${shorten(uv.inFile, DIGITS)}`}`,
    },
  ]);
  page.say(sentence(greek(uv.statement)), 'faint');
}

const greek = (text: string): string =>
  text.replaceAll('beta_0^2', 'β₀²').replaceAll('beta_0', 'β₀').replaceAll('beta_1', 'β₁').replaceAll('lambda_1', 'λ₁');

const PLAIN_ORDER = 1e-9;

/** Growth order with its error; an exact fit has no digits to show. */
const orderText = (value: string, error: string | undefined): string =>
  error !== undefined && Number(error) < PLAIN_ORDER ? shorten(value, 3) : withError(value, error, 4);

/** Digits of a correction on the page. */
const CORRECTION_DIGITS = 4;

/** Corrections of every expected singularity, as many as the beta function fixes: c_1, c_2, … and what they are in 1/n. */
function correctionFacts(growth: GrowthReport): Fact[] {
  return growth.expected.flatMap(({ u, exponent, overN = [], corrections = [] }) => {
    if (u === undefined || exponent === undefined || overN.length === 0) return [];
    const p = Number((Number(exponent) - 1).toPrecision(DIGITS));
    const under = (j: number): string =>
      j === 0 ? '(n+p)' : `((n+p)${Array.from({ length: j }, (_, i) => `(n+p−${i + 1})`).join('')})`;
    const terms = overN.map(
      (e, j) => `${e.startsWith('-') ? '−' : '+'} ${shorten(e.replace(/^-/, ''), CORRECTION_DIGITS)}/${under(j)}`,
    );
    const c = corrections.map((x) => shorten(x, DIGITS)).join(', ');
    return [{ label: `u = ${shorten(u, DIGITS)}`, text: `c = ${c}; 1 ${terms.join(' ')}, p = ${p}` }];
  });
}

const STEP_DIGITS = 4;
/** Steps shown: the last ones tell. */
const STEPS = 4;

const stepText = (steps: readonly string[]): string =>
  `${steps.length > STEPS ? '… ' : ''}${steps
    .slice(-STEPS)
    .map((x) => shorten(x, STEP_DIGITS))
    .join(', ')}`;

function strengthVerdict({ value, error, refused, standing }: StrengthReport): string {
  if (refused !== undefined) return `N is not determined: ${refused.reason}. Remedy: ${refused.remedy}.`;
  const text = withError(value ?? '', error, DIGITS);
  return `N = ${text}: the first row, wider where another method is further off than its own error. Trust: ${standing}.`;
}

function strengthBlock(page: Page, strength: StrengthReport): void {
  page.blank();
  const place = `Strength N at u = ${shorten(strength.u, DIGITS)} (d = ${strength.dimension}), for the series in the coupling itself`;
  if (strength.refused !== undefined && strength.methods.length === 0) {
    page.say(`${place}: not known, since ${strength.refused.reason}.`, 'faint');
    return;
  }
  page.say(`${place}:`);
  page.blank();
  page.table(
    [
      { head: 'method', align: 'left' },
      { head: 'N', align: 'point' },
      { head: 'coefficient by coefficient', align: 'left' },
      { head: 'at Q/2, 2Q', align: 'left' },
    ],
    strength.methods.map((m) => ({
      cells: [
        m.method,
        withError(m.value, m.error, DIGITS),
        stepText(m.steps),
        (m.scaleVariation ?? []).map((x) => shorten(x, STEP_DIGITS)).join(', '),
      ],
    })),
  );
  page.blank();
  page.say(strengthVerdict(strength));
  page.say(strength.methods.map((m) => `${m.method}: ${m.reference}`).join('; '), 'faint');
  page.points(strength.notes.map(sentence), 'warn');
}

function comparisonFacts(growth: GrowthReport): Fact[] {
  const { comparison } = growth.evidence;
  if (comparison === undefined) return [];
  const aicc =
    comparison.deltaAICc === undefined ? 'ΔAICc needs five points' : `ΔAICc = ${shorten(comparison.deltaAICc, 3)}`;
  const order =
    comparison.growthOrder === undefined
      ? ''
      : `; power of n! preferred: ${orderText(comparison.growthOrder, comparison.growthOrderError)}`;
  return [
    {
      label: 'models',
      text: `factorial against geometric on ${comparison.points} points: Bayes factor ${shorten(comparison.bayesFactor, 3)} (${comparison.wording}), ${aicc}${order}`,
    },
  ];
}

/** Longer tables are shown by their two ends. */
const SHOWN = { atMost: 16, head: 4, tail: 8 } as const;

function abridged(rows: readonly TableRow[]): (TableRow | TableNote)[] {
  if (rows.length <= SHOWN.atMost) return [...rows];
  const hidden = rows.length - SHOWN.head - SHOWN.tail;
  const note: TableNote = { note: `… ${hidden} more of ${rows.length} rows; all in --json`, tone: 'faint' };
  return [...rows.slice(0, SHOWN.head), note, ...rows.slice(-SHOWN.tail)];
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
    abridged(
      ratios.map((row) => ({
        cells: [String(row.n), shorten(row.ratio, DIGITS), optional(row.linear), plusMinus(row.linearError)],
      })),
    ),
  );
  page.say('Both columns tend to 1/t* when one singularity leads. Indicative.', 'faint');
}

/** The fits are made in doubles: a miss of the size of their rounding is none. */
const ROUNDING = 1e-10;
const missText = (miss: string): string => (Math.abs(Number(miss)) < ROUNDING ? '0 %' : percent(miss));

function predictionFacts(growth: GrowthReport): Fact[] {
  return growth.evidence.predictions.map((p) => ({
    label: 'prediction',
    text: `coefficient ${p.n} hidden, then predicted by ${p.method}: off by ${missText(p.relativeMiss)}`,
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
