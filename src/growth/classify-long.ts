/**
 * @module Verdict on eight coefficients and more.
 *
 * Purpose    one word from the measured power s of n!.
 * Method     s with its error (fit to ln|c_n| or last ratios, whichever is known better) against the regions of the five
 *            verdicts; the nearest must be within two errors and three times likelier than any other. A poorly known order is
 *            compared with the familiar laws only, and factorial against geometric growth must not contradict the Bayes
 *            factor.
 * Bound      thresholds of verdict-rule.ts.
 */
import { levelling } from './classify-short.js';
import type { Estimate, GrowthVerdict } from './growth.js';
import type { Prepared } from './prepare.js';
import * as rule from './verdict-rule.js';
import { undecided, type Classified, type Region } from './verdict-rule.js';
import { short } from './words.js';

const RULE = rule.LONG_RULE;

/** Squared distance from the order to a region in units of its error. */
function chiSquared(order: Estimate, region: Region): number {
  const gap = Math.max(region.low - order.value, order.value - region.high, 0);
  return (gap / Math.max(order.error, RULE.orderError)) ** 2;
}

/** The better known of the fitted and the local order. */
function bestOrder(p: Prepared): Estimate | undefined {
  const fitted = p.order?.order;
  if (fitted === undefined || p.local === undefined) return fitted ?? p.local;
  return p.local.error < fitted.error ? { value: p.local.value, error: p.local.error } : fitted;
}

/** Local order, local order one step earlier and fitted order all in the region of the verdict, and steady. */
function steadyIn(p: Prepared, verdict: GrowthVerdict): boolean {
  const region = rule.REGIONS.find((r) => r.verdict === verdict);
  const { value = NaN, before = NaN } = p.local ?? {};
  const all = [value, before, p.order?.order.value ?? NaN];
  return (
    region !== undefined &&
    all.every((v) => v >= region.low && v <= region.high) &&
    Math.abs(value - before) < RULE.steady.change
  );
}

function surelySubfactorial(p: Prepared, order: Estimate): boolean {
  const { error, coefficients, local } = RULE.subfactorial;
  const flat = p.local !== undefined && Math.abs(p.local.value - order.value) < local;
  return order.error <= error && p.nonZero.length >= coefficients && (flat || p.pattern.kind === 'irregular');
}

/** What speaks against the nearest region. */
function objection(p: Prepared, verdict: GrowthVerdict, order: Estimate): boolean {
  const n = p.nonZero.length;
  const k = p.comparison?.bayesFactor ?? 1;
  const { positive } = rule.SHORT_RULE;
  const coarse = order.error > rule.COARSE;
  const few = n < RULE.steady.coefficients && p.pattern.kind !== 'irregular';
  switch (verdict) {
    case 'factorial':
      return coarse && k < positive;
    case 'geometric':
      return coarse && (!levelling(p) || k > 1 / positive);
    case 'convergent':
      return (few && !steadyIn(p, verdict)) || (coarse && k > 1 / positive);
    case 'superfactorial':
      return few && !steadyIn(p, verdict);
    case 'subfactorial':
      return !surelySubfactorial(p, order);
    case 'terminating':
    case 'undecided':
      return true;
  }
}

export function classifyLong(p: Prepared): Classified {
  const order = bestOrder(p);
  const n = p.nonZero.length;
  if (order === undefined) return undecided(`no order of growth could be fitted to ${n} coefficients`);
  if (p.order?.beyond === true) return { verdict: 'superfactorial', order, reason: '', beyond: true };
  const regions = order.error > rule.COARSE ? rule.COARSE_REGIONS : rule.REGIONS;
  const scored = regions
    .map((r) => ({ verdict: r.verdict, chi2: chiSquared(order, r) }))
    .sort((a, b) => a.chi2 - b.chi2);
  const [first, second] = [scored[0]!, scored[1]!];
  const clear = first.chi2 <= RULE.within ** 2 && second.chi2 - first.chi2 >= 2 * Math.log(RULE.likelier);
  if (clear && !objection(p, first.verdict, order)) return { verdict: first.verdict, order, reason: '', beyond: false };
  const k = p.comparison?.bayesFactor;
  const factor = k === undefined ? '' : `, the Bayes factor for factorial growth ${short(k, 2)}`;
  return undecided(
    `the power of n! fitted to ${n} coefficients is ${short(order.value, 2)} ± ${short(order.error, 2)}${factor}`,
    order,
  );
}
