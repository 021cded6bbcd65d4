/**
 * @module Least term with terminant: the optimally truncated sum plus the exact remainder of its leading singularity.
 *
 * After the first n terms of a series led by (1 − t/t*)^{−γ}, the remainder is
 *   t* > 0:  T_n · ω F_{n+γ−1}(ω)  (principal value),  Im above = T_n π ω^{n+γ} e^{−ω}/Γ(n+γ),  ω = |t*| / x,
 *   t* < 0:  T_n · ω G_{n+γ−1}(ω),
 * with T_n the first omitted term (the last one continued by (n−1+γ)/ω·sign when it is not known).
 * Truncation error: the larger of two. (1) The changes when the cut is moved by one term either way. (2) What the strength does not
 * tell: with s_k = c_k t*^k/Γ(k+γ) → S the linear extrapolant k s_k − (k−1) s_{k−1} differs from s_k by the share
 *   ρ = (k−1) |1 − s_{k−1}/s_k|,  the larger one of k = n, n−1, at most 1; 1 below k = 2.
 * The omitted terms behind the first one, T_n (ω F_{n+γ−1} − 1) together, are known no better; where they cancel by accident half
 * of T_n counts: ρ |T_n| max(1/2, |ω F − 1|).
 * Reference: R. B. Dingle (1973) ch. 21–22 (from memory); C. Ayala, X. Lobregat, A. Pineda, arXiv:1902.07736, 1909.01370
 * (abstracts seen); DLMF 2.11(iii). Re-derived and checked to 35 digits.
 */
import { addExact, branchAlternating, branchSame, exact, isZeroExact, R, toNumberExact } from '../numerics/index.js';
import type { Ball } from '../numerics/index.js';
import { branchImaginary } from '../borel/index.js';
import type { Expansion, StatedSingularity } from '../series/index.js';
import type { Outcome, Prescription } from './prescription.js';
import { leastTerm, partialSums, refusal, terms, toDigits } from './prescription.js';

interface Cut {
  readonly value: Ball;
  readonly im: Ball;
  /** Size of all omitted terms but the first, and not less than half of the first. */
  readonly omitted: number;
}

/** Share of the first omitted term that counts where the terms behind it cancel. Heuristic, as with the least term. */
const LEAST_SHARE = 0.5;

/** Partial sum of n terms plus the terminant of s. */
function completed(e: Expansion, s: StatedSingularity, n: number, prec: number): Cut {
  const gamma = addExact(s.exponent!, exact(n));
  const x = e.x.ball(prec);
  const t = s.t.ball(prec);
  const w = R.div(R.abs(t), x, prec);
  const all = terms(e, prec);
  const g = gamma.ball(prec);
  // T_N continued from T_{N−1} by the leading growth: T_n/T_{n−1} = (n−1+γ)/(±ω).
  const step = R.div(R.sub(g, R.ONE, prec), R.isPositive(t) ? w : R.neg(w), prec);
  const first = n < all.length ? all[n]! : R.mul(all[n - 1]!, step, prec);
  const b = addExact(gamma, exact(-1));
  const base = partialSums(e, prec)[n]!;
  const omitted = (factor: Ball): number =>
    Math.abs(R.toNumber(first)) * Math.max(LEAST_SHARE, Math.abs(R.toNumber(factor) - 1));
  if (!R.isPositive(t)) {
    const factor = R.mul(w, branchAlternating(b, w, prec), prec);
    return { value: R.add(base, R.mul(first, factor, prec), prec), im: R.ZERO, omitted: omitted(factor) };
  }
  const factor = R.mul(w, branchSame(b, w, prec).pv, prec);
  return {
    value: R.add(base, R.mul(first, factor, prec), prec),
    im: R.mul(first, branchImaginary(gamma, w, prec), prec),
    omitted: omitted(factor),
  };
}

/** Steps of the strength that are looked at: one may be small by accident. */
const STEPS = 2;

/** How far the strength s_n may be from its limit, as a share of it: see the header. */
function strengthDoubt(e: Expansion, s: StatedSingularity, n: number): number {
  const shares = Array.from({ length: STEPS }, (_, i) => stepShare(e, s, n - i));
  return Math.min(1, Math.max(...shares));
}

/** (k−1) |1 − s_{k−1}/s_k|; 1 where it cannot be had. */
function stepShare(e: Expansion, s: StatedSingularity, k: number): number {
  const [last, before] = [e.coefficients[k], e.coefficients[k - 1]];
  if (k < 2 || last === undefined || before === undefined || isZeroExact(last)) return 1;
  // s_{k−1}/s_k = c_{k−1} (k−1+γ)/(c_k t*).
  const next = R.mul(last.ball(96), s.t.ball(96), 96);
  const ratio = R.div(R.mul(before.ball(96), addExact(s.exponent!, exact(k - 1)).ball(96), 96), next, 96);
  const share = (k - 1) * Math.abs(R.toNumber(R.sub(R.ONE, ratio, 96)));
  return Number.isFinite(share) ? share : 1;
}

/** Where to cut: x − b − 1/3 terms for the same-sign leader, the least term for the alternating one; within 1 … N − 1. */
function cutOf(e: Expansion, s: StatedSingularity): number {
  const N = e.coefficients.length;
  const w = Math.abs(toNumberExact(s.t)) / toNumberExact(e.x);
  const best =
    toNumberExact(s.t) > 0 ? w - (toNumberExact(s.exponent!) - 1) - 1 / 3 : (leastTerm(terms(e, 160))?.index ?? N);
  // Not beyond N − 1: the terminant is scaled by the first omitted term, which must be a known one.
  return Math.min(N - 1, Math.max(1, Math.round(best)));
}

export const terminantSum: Prescription = {
  name: 'terminant',
  title: 'least term with terminant',
  summary: 'optimal cut completed by the remainder of the leading singularity; needs its position and exponent',
  family: 'truncation',
  apply(e, growth, request): readonly Outcome[] {
    const variant = 'leading singularity';
    const s = e.stated[0];
    const N = e.coefficients.length;
    if (s === undefined || s.exponent === undefined)
      return [
        refusal(
          variant,
          s === undefined
            ? 'no position of a leading singularity is known'
            : 'the leading singularity has no known exponent',
          'state it in the series file (singularities: u or dimension, with exponent)',
        ),
      ];
    if (N < 2) return [refusal(variant, 'fewer than two terms', 'give more coefficients')];
    if (
      growth.verdict === 'superfactorial' ||
      growth.verdict === 'terminating' ||
      growth.verdict === 'convergent' ||
      growth.verdict === 'geometric'
    )
      return [refusal(variant, `the growth is ${growth.verdict}, not factorial`, 'use the fixed-order sum')];
    const w = Math.abs(toNumberExact(s.t)) / toNumberExact(e.x);
    if (toNumberExact(s.t) > 0 && w - (toNumberExact(s.exponent) - 1) - 1 / 3 < 0.5)
      return [
        refusal(
          variant,
          'the optimal cut lies before the first term: the coupling is too large',
          'take a smaller coupling (a higher scale)',
        ),
      ];
    const n = request.only === undefined ? cutOf(e, s) : Number(request.only.split(' ')[0]);
    const best = toDigits(
      request.digits,
      (prec) => completed(e, s, n, prec),
      (r) => r.value,
    );
    let truncation: number | undefined;
    if (request.only === undefined) {
      const moved = [n - 1, n + 1].filter((m) => m >= 1 && m <= N).map((m) => R.toNumber(completed(e, s, m, 96).value));
      const here = R.toNumber(best.value);
      truncation = Math.max(...moved.map((v) => Math.abs(v - here)), strengthDoubt(e, s, n) * best.omitted);
    }
    return [
      {
        kind: 'sum',
        variant: `${n} terms`,
        value: best.value,
        // An ultraviolet leader says nothing about the ambiguity: the infrared singularities behind it still have one.
        ...(R.isExactZero(best.im) ? {} : { imaginary: best.im }),
        ...(truncation === undefined ? {} : { truncation }),
        termsUsed: Math.min(N, n + 1),
        trust: 'indicative',
        notes: [
          n < N
            ? 'terminant scaled by the first omitted term'
            : 'terminant scaled by the last term continued by the leading growth',
          ...(e.stated.length > 1 ? ['only the nearest singularity is completed: the next one sets what remains'] : []),
        ],
        central: true,
      },
    ];
  },
};
