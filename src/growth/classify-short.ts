/**
 * @module Verdict on a short series.
 *
 * Purpose    four to seven coefficients: factorial only when Bayes factor, ratio test and the last ratios agree.
 * Method     factorial: regular signs, order of the last ratios in the window of n!, and either positive evidence with
 *            settled extrapolants or strong evidence (from five coefficients; a factor of ten from six). Geometric and
 *            convergent: from six coefficients, evidence the other way and last ratios that level off or fall.
 * Bound      thresholds of verdict-rule.ts.
 * Reference  R. E. Kass and A. E. Raftery, J. Am. Stat. Assoc. 90 (1995) 773.
 */
import type { GrowthVerdict, RatioRow } from './growth.js';
import type { Prepared } from './prepare.js';
import { SHORT_RULE as RULE, undecided, type Classified } from './verdict-rule.js';
import { short } from './words.js';

/** Relative change of the linear extrapolant at the last order; undefined without two of them. */
export function settling(rows: readonly RatioRow[]): number | undefined {
  const a = rows[rows.length - 1]?.linear;
  const b = rows[rows.length - 2]?.linear;
  return a === undefined || b === undefined || a === 0 ? undefined : Math.abs(1 - b / a);
}

function hasSettled(rows: readonly RatioRow[]): boolean {
  const s = settling(rows);
  const last = rows[rows.length - 1];
  const error = Math.abs((last?.linearError ?? 0) / (last?.linear ?? 1));
  return s !== undefined && s <= RULE.settled && error <= RULE.linearError;
}

/** A large exponent γ imitates geometric growth, but its local order rises towards 1; a geometric one falls to 0. */
export function levelling(p: Prepared): boolean {
  if (p.local === undefined) return true;
  const { value, before } = p.local;
  return Math.abs(value) < RULE.geometric && (value < RULE.flat || (before !== undefined && value < before));
}

export function classifyShort(p: Prepared, rows: readonly RatioRow[]): Classified {
  const k = p.comparison?.bayesFactor ?? 1;
  const n = p.nonZero.length;
  if (p.pattern.kind === 'irregular' || p.local === undefined) {
    return undecided(`${n} coefficients with irregular signs do not fix the growth`);
  }
  const { value, error, before } = p.local;
  const made = (verdict: GrowthVerdict): Classified => ({
    verdict,
    order: { value, error },
    reason: '',
    beyond: false,
  });
  const settled = hasSettled(rows);
  const strong = (n >= 6 && k >= RULE.sixPoints) || (n >= 5 && k >= RULE.strong);
  const inWindow = value >= RULE.factorial.low && value <= RULE.factorial.high;
  if (inWindow && ((k >= RULE.positive && settled) || strong)) return made('factorial');
  const steady = before !== undefined && Math.abs(value - before) < RULE.superSteady;
  const above = value > RULE.factorial.high && n >= RULE.superCoefficients;
  if (above && steady && k >= RULE.positive) return made('superfactorial');
  const tame = n >= RULE.tameCoefficients;
  if (tame && k <= 1 / RULE.veryStrong && levelling(p)) return made('geometric');
  const falls = value <= RULE.convergent && before !== undefined && before <= RULE.convergent;
  if (tame && k <= 1 / RULE.positive && falls) return made('convergent');
  const few = n <= RULE.few ? 'the series is too short to tell: ' : '';
  const evidence = `${few}the Bayes factor for factorial against geometric growth is ${short(k, 2)} from ${n} coefficients`;
  const moved = settling(rows);
  return k >= RULE.positive && !settled && moved !== undefined
    ? undecided(
        `${evidence}, but the linear extrapolants of the ratio test still change by ${short(100 * moved, 2)} %`,
        p.local,
      )
    : undecided(evidence, p.local);
}
