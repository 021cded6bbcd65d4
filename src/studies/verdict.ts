/**
 * @module The verdict and the rule that makes it.
 *
 * House rule "ladder": the first rung that stands gives the value,
 *   0. coefficient errors above the coefficients, fewer than three above the noise, or growth beyond every (kn)!: no value;
 *   1. growth terminating, convergent or geometric: the fixed-order sum;
 *   2. fewer than four coefficients, or growth undecided with no singularity stated: the fixed-order sum, or the least-term sum
 *      where the terms rise again (nothing pretends to resum);
 *   3. a converged Borel–Padé sum (two orders agree to 1e−6), Leroy before plain, order 2 where the growth is (2n)!, unless a
 *      known coefficient is an outlier;
 *   4. the singularity model, where positions and exponents are stated and its strengths do not cancel;
 *   5. Borel–Leroy–Padé, then Borel–Padé (central entry), unless it is outclassed (below);
 *   6. least term with terminant; 7. least term; 8. fixed order.
 * Outclassed is a sum from fewer than half of the coefficients (noise in them leaves no more to rational approximants) whose
 * error is larger than that of the least term or of fixed order.
 * Truncation error: the prescription's own, never below the half-spread of rungs 4 and 5 where both stand.
 * Ambiguity: |Im|/π of the value's own lateral sums; of another prescription's, or the least term, where it has none. Input: propagated. Nothing is averaged.
 * Other rules, chosen by name (verdict-rule.ts): fixed-order, least-term, prescription:NAME.
 */
import { R } from '../numerics/index.js';
import type { Convention } from '../ambiguity/index.js';
import type { Growth } from '../growth/index.js';
import type { Sum } from '../prescriptions/index.js';
import type { Standing, VerdictReport } from './assessment.js';
import { ballText, indicative } from './figures.js';
import { central, outclassed } from './outclassed.js';
import { INPUT_NOT_KNOWN, writeVerdict } from './rounding.js';
import { restsOnPattern } from './values.js';
import type { Evaluated } from './values.js';
import { LADDER, ruleName } from './verdict-rule.js';
import type { VerdictRule } from './verdict-rule.js';

const SHORT = 4;
/** Fewer usable coefficients than this: the noise decides the value. */
const NOISY = 3;
/** Noise can be told from structure only in a series of at least this length. */
const LONG = 8;
const RUNGS = [
  'singularity-model',
  'borel-leroy-pade',
  'borel-pade',
  'borel-pade-2',
  'terminant',
  'least-term',
  'fixed-order',
];
const BOREL = ['borel-leroy-pade', 'borel-pade', 'borel-pade-2'];
const DIGITS = 15;

/** Terms that end above so many times the least one are past it, whatever the growth is. Heuristic. */
const PAST_LEAST = 3;

interface Choice {
  readonly v: Evaluated;
  readonly rung: string;
  /** Nothing is known of the growth: no ambiguity is ascribed to the value. */
  readonly plain?: true;
}

/** The value that a rule picks, for the ambiguity to be read from its own lateral sums; undefined when there is none. */
export function picked(
  values: readonly Evaluated[],
  growth: Growth,
  count: number,
  rule: VerdictRule = LADDER,
): Evaluated | undefined {
  const choice = pick(values, growth, count, rule);
  return typeof choice === 'string' ? undefined : choice.v;
}

function choose(values: readonly Evaluated[], growth: Growth, count: number): Choice | string {
  if (growth.flags.some((f) => f.code === 'errors-exceed-values'))
    return 'the coefficient errors exceed the coefficients';
  // Noise that the data betray; errors that the file quotes are propagated instead.
  const quoted = (central(values, 'fixed-order')?.input ?? 0) > 0;
  if (!quoted && count >= LONG && growth.usableCoefficients !== undefined && growth.usableCoefficients < NOISY)
    return 'the coefficients are too noisy: no method can tell their sum';
  if (growth.verdict === 'superfactorial' && growth.order !== 2)
    return 'the coefficients grow faster than any (kn)!: no sum is unique';
  const fixed = central(values, 'fixed-order');
  if (['terminating', 'convergent', 'geometric'].includes(growth.verdict))
    return fixed === undefined ? 'there are no terms' : { v: fixed, rung: `growth ${growth.verdict}` };
  if (count < SHORT) return plainSum(values, growth, `fewer than ${SHORT} coefficients`);
  const structured = central(values, 'singularity-model') ?? central(values, 'terminant');
  if (growth.verdict === 'undecided' && structured === undefined)
    return plainSum(values, growth, 'growth undecided and no singularity stated');
  for (const name of hasOutlier(growth) ? [] : BOREL) {
    const v = central(values, name);
    if (v?.outcome.kind === 'sum' && v.outcome.trust === 'converged') return { v, rung: 'converged Borel sum' };
  }
  for (const name of RUNGS) {
    const v = central(values, name);
    if (v === undefined || v.outcome.kind !== 'sum') continue;
    if (name === 'singularity-model' && v.outcome.notes.some((n) => n.startsWith('large contributions cancel')))
      continue;
    // A value below its own errors is no value while another rung stands.
    if (name !== 'fixed-order' && exceeds(v, v.outcome)) continue;
    if (outclassed(v, values, count)) continue;
    return { v, rung: v.prescription.title };
  }
  return 'every prescription refused';
}

/** Of other terms the smallest may be small by accident. */
const REGULAR: readonly Growth['signPattern'][] = ['same', 'alternating'];

/** The fixed-order sum, or the one that ends at the least term where terms of regular signs rise well above it again. */
function plainSum(values: readonly Evaluated[], { signPattern }: Growth, rung: string): Choice | string {
  const fixed = central(values, 'fixed-order');
  const least = central(values, 'least-term');
  if (fixed === undefined) return 'there are no terms';
  const [all, some] = [fixed, least].map((v) => (v?.outcome.kind === 'sum' ? v.outcome.truncation : undefined));
  const known = least !== undefined && all !== undefined && some !== undefined;
  if (known && REGULAR.includes(signPattern) && all > PAST_LEAST * some)
    return { v: least, rung: `${rung}; the terms rise again`, plain: true };
  return { v: fixed, rung, plain: true };
}

/** Do truncation or input error exceed the value? */
function exceeds(v: Evaluated, sum: Sum): boolean {
  return Math.max(sum.truncation ?? 0, v.input ?? 0) > Math.abs(R.toNumber(sum.value));
}

/** The value of a rule that names its prescription; why there is none otherwise. */
function named(values: readonly Evaluated[], name: string): Choice | string {
  const v = central(values, name);
  if (v !== undefined) return { v, rung: v.prescription.title };
  const refused = values.find((one) => one.prescription.name === name && one.outcome.kind === 'refusal');
  return refused?.outcome.kind === 'refusal' ? `${name} refused: ${refused.outcome.reason}` : `${name} gave no value`;
}

/** The value that the rule picks. */
function pick(values: readonly Evaluated[], growth: Growth, count: number, rule: VerdictRule): Choice | string {
  switch (rule.kind) {
    case 'ladder':
      return choose(values, growth, count);
    case 'fixed-order':
      return named(values, 'fixed-order');
    case 'least-term': {
      // Where the terms still fall, the smallest known one is the last.
      const least = central(values, 'least-term');
      const fixed = central(values, 'fixed-order');
      if (least !== undefined) return { v: least, rung: 'least term reached' };
      return fixed === undefined
        ? 'there are no terms'
        : { v: fixed, rung: 'no least term to cut at: the sum of all terms' };
    }
    case 'prescription':
      return named(values, rule.name);
  }
}

/** Half-spread of the model and the Borel–Padé sums that stand. */
function spread(values: readonly Evaluated[], chosen: Evaluated, count: number): number {
  const family = ['singularity-model', 'borel-leroy-pade', 'borel-pade'];
  if (!family.includes(chosen.prescription.name)) return 0;
  const numbers = family.flatMap((name) => {
    const v = central(values, name);
    return v?.outcome.kind === 'sum' && !outclassed(v, values, count) ? [R.toNumber(v.outcome.value)] : [];
  });
  return numbers.length < 2 ? 0 : (Math.max(...numbers) - Math.min(...numbers)) / 2;
}

const ENDS = 'all further coefficients are zero, as the last known ones are';
const PATTERN = 'all further coefficients follow the rational Borel transform of the known ones';
/** The same where a known coefficient breaks the law of the others, and the sum stops before it. */
const patternBefore = (used: number): string =>
  `the outlier is an error and all further coefficients follow the rational Borel transform of the first ${used}`;

const hasOutlier = (growth: Growth): boolean => growth.flags.some((f) => f.code === 'outlier');

/** |Im|/π of the value's own lateral sums; where it has none, the number from elsewhere with its origin. */
function ownAmbiguity(v: Evaluated, elsewhere: Convention): { readonly value: number; readonly origin: string } {
  const im = v.outcome.kind === 'sum' ? v.outcome.imaginary : undefined;
  if (im !== undefined) return { value: Math.abs(R.toNumber(im)) / Math.PI, origin: 'its own lateral sums, |Im|/pi' };
  return { value: elsewhere.value, origin: `${elsewhere.name}, not its own: ${elsewhere.origin}` };
}

export function verdict(
  values: readonly Evaluated[],
  growth: Growth,
  count: number,
  ambiguity: Convention | undefined,
  by: VerdictRule = LADDER,
): VerdictReport {
  const rule = `${ruleName(by)} (docs/verdict.md)`;
  const choice = pick(values, growth, count, by);
  if (typeof choice === 'string') return { printed: `no value: ${choice}`, rule, standing: 'indicative' };
  const { v, rung, plain = false } = choice;
  const outcome = v.outcome;
  if (outcome.kind !== 'sum') return { printed: 'no value', rule, standing: 'indicative' };
  const truncation =
    outcome.truncation === undefined
      ? undefined
      : Math.max(
          outcome.truncation,
          by.kind !== 'ladder' || outcome.trust === 'converged' ? 0 : spread(values, v, count),
        );
  const stated =
    ambiguity === undefined || plain || v.prescription.name === 'fixed-order' ? undefined : ownAmbiguity(v, ambiguity);
  const amount = stated !== undefined && stated.value > 0 ? stated.value : undefined;
  const parts = [
    { label: 'truncation', error: truncation },
    { label: 'ambiguity', error: amount },
    { label: 'input', error: v.input },
  ].flatMap((p) => (p.error !== undefined && p.error > 0 ? [{ label: p.label, error: p.error }] : []));
  const exactSum = truncation === 0 && parts.length === 0 && growth.verdict === 'terminating';
  // A value that leaves out a known coefficient has not converged to the sum of the series as given.
  const apart = hasOutlier(growth) && outcome.termsUsed < count;
  const standing: Standing = exactSum ? 'certified' : apart ? 'indicative' : outcome.trust;
  const rational = apart ? patternBefore(outcome.termsUsed) : PATTERN;
  const assumption = exactSum ? ENDS : restsOnPattern(outcome) ? rational : undefined;
  const value = ballText(outcome.value, DIGITS);
  const unknown = v.inputUnknown === true ? `; ${INPUT_NOT_KNOWN}` : '';
  const printed = `${writeVerdict(value, parts)}${unknown}${assumption === undefined ? '' : `, if ${assumption}`}`;
  return {
    value,
    ...(truncation === undefined ? {} : { truncation: indicative(truncation, 3) }),
    ...(amount === undefined ? {} : { ambiguity: indicative(amount, 3), ambiguityOf: stated!.origin }),
    ...(v.input === undefined ? {} : { input: indicative(v.input, 3) }),
    ...(assumption === undefined ? {} : { assumption }),
    printed,
    prescription: `${v.prescription.name}: ${outcome.variant}`,
    rule: `${rule}; rung: ${rung}`,
    standing,
  };
}
