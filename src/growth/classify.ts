/**
 * @module The verdict rule.
 *
 * Purpose    one word for the growth, or "undecided", from the measured order and the evidence.
 * Method     up to SHORT coefficients: Bayes factor, settling of the linear extrapolants and the order of the last ratios
 *            must agree. Beyond: the order with its error is compared with the five regions; the best one must be three
 *            times likelier than any other, and factorial against geometric growth must not contradict the Bayes factor.
 * Bound      every threshold is a named heuristic.
 * Reference  R. E. Kass and A. E. Raftery 1995 (grades of evidence).
 */
import type { Estimate, GrowthVerdict, RatioRow } from './growth.js';
import type { Prepared } from './prepare.js';

/** Fewest known coefficients for any statement. */
export const MIN_COEFFICIENTS = 4;
/** When quoted errors hide coefficients, this many must remain. */
export const MIN_AFTER_LOSS = 6;
/** Up to this many coefficients count as a short series. */
export const SHORT = 7;
/** Up to this many, the rule for short series may decide for factorial growth when the fitted order does not. */
export const MIDDLE = 12;
/** Grades of the Bayes factor (Kass–Raftery), and what is asked for at which length. */
export const RULE = {
  positive: 3,
  strong: 20,
  veryStrong: 150,
  /** From six coefficients on, a regular sign pattern supports factorial growth and this factor is enough. */
  sixPoints: 10,
  /** |λ_n − λ_{n−1}|/|λ_n| below this: the ratio test has settled. */
  settled: 0.25,
  /** … and its error, propagated from the coefficients, below this part of it. */
  linearError: 0.5,
  /** Orders of the last ratios that may belong to n!. */
  local: { low: 0.4, high: 1.7 },
  /** … to a geometric series, and to a convergent one. */
  localGeometric: 0.35,
  flat: 0.1,
  localConvergent: -0.6,
  /** Short superfactorial series: fewest coefficients, and steadiness of the local order. */
  superCoefficients: 7,
  superSteady: 0.2,
} as const;

/** Regions of the order s; what lies between belongs to neither. */
const REGIONS: readonly { verdict: GrowthVerdict; low: number; high: number }[] = [
  { verdict: 'convergent', low: -Infinity, high: -0.3 },
  { verdict: 'geometric', low: -0.15, high: 0.15 },
  { verdict: 'subfactorial', low: 0.3, high: 0.75 },
  { verdict: 'factorial', low: 0.9, high: 1.15 },
  { verdict: 'superfactorial', low: 1.35, high: Infinity },
];
const COARSE_REGIONS: typeof REGIONS = [
  { verdict: 'convergent', low: -Infinity, high: -0.5 },
  { verdict: 'geometric', low: -0.1, high: 0.1 },
  { verdict: 'factorial', low: 0.9, high: 1.1 },
  { verdict: 'superfactorial', low: 1.8, high: Infinity },
];
/** Smallest error that the order is given credit for. */
const ORDER_ERROR = 0.04;
/** A region must be this much likelier than any other. */
const LIKELIER = 3;
/** Subfactorial growth lies between two familiar ones, and a large exponent γ imitates it: it must be known this well. */
const SUBFACTORIAL = { error: 0.06, coefficients: 16, local: 0.08 };
/** Superfactorial or convergent behaviour in fewer coefficients than this needs a local order that is steady. */
const STEADY = { coefficients: 16, change: 0.2 };
/** Orders known worse than this must not contradict the Bayes factor, and only the familiar laws are considered. */
const COARSE = 0.12;

export interface Classified {
  readonly verdict: GrowthVerdict;
  /** Measured order per power of x, where one was fitted. */
  readonly order?: Estimate;
  /** Why not more: completes "undecided: …". */
  readonly reason: string;
  readonly beyond: boolean;
}

const undecided = (reason: string, order?: Estimate): Classified => ({
  verdict: 'undecided',
  reason,
  beyond: false,
  ...(order === undefined ? {} : { order }),
});

const two = (x: number): string => Number(x.toPrecision(2)).toString();

/** Relative change of the linear extrapolant at the last order; undefined without two of them. */
export function settling(rows: readonly RatioRow[]): number | undefined {
  const a = rows[rows.length - 1]?.linear;
  const b = rows[rows.length - 2]?.linear;
  return a === undefined || b === undefined || a === 0 ? undefined : Math.abs(1 - b / a);
}

/** A large exponent γ imitates geometric growth, but its local order rises towards 1; a geometric one falls to 0. */
function levelling(p: Prepared): boolean {
  if (p.local === undefined) return true;
  const local = p.local.value / p.sequence.stride;
  const falling = local < RULE.flat || (p.local.before !== undefined && local < p.local.before / p.sequence.stride);
  return Math.abs(local) < RULE.localGeometric && falling;
}

function classifyShort(p: Prepared, rows: readonly RatioRow[]): Classified {
  const k = p.comparison?.bayesFactor ?? 1;
  const n = p.nonZero.length;
  const stride = p.sequence.stride;
  const local = p.local === undefined ? undefined : { value: p.local.value / stride, error: p.local.error / stride };
  if (p.pattern.kind === 'irregular' || local === undefined || p.local === undefined) {
    return undecided(`${n} coefficients with irregular signs do not fix the growth`);
  }
  const before = p.local.before === undefined ? undefined : p.local.before / stride;
  const s = settling(rows);
  const last = rows[rows.length - 1];
  const known = Math.abs((last?.linearError ?? 0) / (last?.linear ?? 1)) <= RULE.linearError;
  const hasSettled = s !== undefined && s <= RULE.settled && known;
  const strong = (n >= 6 && k >= RULE.sixPoints) || (n >= 5 && k >= RULE.strong);
  const made = (verdict: GrowthVerdict): Classified => ({ verdict, order: local, reason: '', beyond: false });
  const inWindow = local.value >= RULE.local.low && local.value <= RULE.local.high;
  if (inWindow && ((k >= RULE.positive && hasSettled) || strong)) return made('factorial');
  const steady = before !== undefined && Math.abs(local.value - before) < RULE.superSteady;
  if (local.value > RULE.local.high && n >= RULE.superCoefficients && steady && k >= RULE.positive) return made('superfactorial');
  if (n >= 5 && k <= 1 / RULE.strong && levelling(p)) return made('geometric');
  if (n >= 5 && k <= 1 / RULE.positive && local.value <= RULE.localConvergent && (before ?? 0) <= RULE.localConvergent) {
    return made('convergent');
  }
  const evidence = `the Bayes factor for factorial against geometric growth is ${two(k)} from ${n} coefficients`;
  if (k >= RULE.positive && !hasSettled && s !== undefined) {
    return undecided(`${evidence}, but the linear extrapolants of the ratio test still change by ${two(100 * s)} %`, local);
  }
  return undecided(evidence, local);
}

/** Distance from the order to a region in units of its error. */
function distance(order: Estimate, region: { low: number; high: number }): number {
  const gap = Math.max(region.low - order.value, order.value - region.high, 0);
  return gap / Math.max(order.error, ORDER_ERROR);
}

/** The better known of the fitted and the local order. */
export function bestOrder(p: Prepared): Estimate | undefined {
  const fitted = p.order?.order;
  const stride = p.sequence.stride;
  const local = p.local === undefined ? undefined : { value: p.local.value / stride, error: p.local.error / stride };
  if (fitted === undefined) return local;
  return local !== undefined && local.error < fitted.error ? local : fitted;
}

/** Local order, local order one step earlier and fitted order all in the region of the verdict, and steady. */
function steadyIn(p: Prepared, verdict: GrowthVerdict): boolean {
  const region = REGIONS.find((r) => r.verdict === verdict)!;
  const stride = p.sequence.stride;
  const { value, before } = p.local ?? {};
  const orders = [value, before].map((v) => (v === undefined ? NaN : v / stride));
  const all = [...orders, p.order?.order.value ?? NaN];
  return all.every((v) => v >= region.low && v <= region.high) && Math.abs(orders[0]! - orders[1]!) < STEADY.change;
}

function surelySubfactorial(p: Prepared, order: Estimate): boolean {
  const local = p.local === undefined ? undefined : p.local.value / p.sequence.stride;
  const flat = p.pattern.kind === 'irregular' || (local !== undefined && Math.abs(local - order.value) < SUBFACTORIAL.local);
  return order.error <= SUBFACTORIAL.error && p.nonZero.length >= SUBFACTORIAL.coefficients && flat;
}

function classifyLong(p: Prepared): Classified {
  const order = bestOrder(p);
  const n = p.nonZero.length;
  const k = p.comparison?.bayesFactor ?? 1;
  if (p.order?.beyond === true && order !== undefined) return { verdict: 'superfactorial', order, reason: '', beyond: true };
  if (order === undefined) return undecided(`no order of growth could be fitted to ${n} coefficients`);
  const regions = order.error > COARSE ? COARSE_REGIONS : REGIONS;
  const scored = regions.map((r) => ({ verdict: r.verdict, chi2: distance(order, r) ** 2 })).sort(
    (a, b) => a.chi2 - b.chi2,
  );
  const [first, second] = [scored[0]!, scored[1]!];
  const measured = `the power of n! fitted to ${n} coefficients is ${two(order.value)} ± ${two(order.error)}`;
  if (second.chi2 - first.chi2 < 2 * Math.log(LIKELIER)) return undecided(measured, order);
  if (first.verdict === 'subfactorial' && !surelySubfactorial(p, order)) {
    return undecided(measured, order);
  }
  const extreme = first.verdict === 'superfactorial' || first.verdict === 'convergent';
  if (extreme && p.pattern.kind !== 'irregular' && n < STEADY.coefficients && !steadyIn(p, first.verdict)) {
    return undecided(measured, order);
  }
  if (order.error > COARSE) {
    if (first.verdict === 'factorial' && k < RULE.positive) return undecided(`${measured}, the Bayes factor ${two(k)}`, order);
    if (first.verdict === 'geometric' && !levelling(p)) return undecided(measured, order);
    if ((first.verdict === 'geometric' || first.verdict === 'convergent') && k > 1 / RULE.positive) return undecided(`${measured}, the Bayes factor ${two(k)}`, order);
  }
  return { verdict: first.verdict, order, reason: '', beyond: false };
}

/** rows: ratio test over the computed coefficients. */
export function classify(p: Prepared, rows: readonly RatioRow[]): Classified {
  const n = p.nonZero.length;
  if (n < MIN_COEFFICIENTS) {
    return undecided(n === 0 ? 'no coefficient is known' : `${n} known coefficient${n === 1 ? '' : 's'}: growth cannot be determined`);
  }
  if (p.sequence.unknown > 0 && n < MIN_AFTER_LOSS) {
    return undecided(`the quoted errors leave ${n} coefficients`);
  }
  if (n <= SHORT) return classifyShort(p, rows);
  const long = classifyLong(p);
  // A dozen coefficients may still be judged by the evidence of short series.
  if (long.verdict !== 'undecided' || n > MIDDLE) return long;
  const short = classifyShort(p, rows);
  return short.verdict === 'factorial' ? short : long;
}
