/**
 * @module A quantity on a circle, R = (1/2πi) ∮_{|s| = s_0} ds/s W(s/s_0) D(−s), as one power series in the coupling at s_0.
 *
 * Method     W(x) = 2 ∫_x^1 w(x′) dx′, and with L = ln(−x), x = s/s_0, the operator of algebra/renormalisation.ts:
 *            D(x(−s)) = exp(L β ∂) D(x(s_0)), so R = Σ_l (J_l/l!) (β ∂)^l D,  J_l = (1/2πi) ∮ dx/x W(x) ln^l(−x),
 *            I(n, l) = (1/2πi) ∮ dx/x (−x)^n ln^l(−x):  I(0, l) = (−1)^(l/2) π^l/(l+1) for even l, 0 for odd l;
 *            n I(n, l) = [l odd] (−1)^n (−1)^((l−1)/2) π^(l−1) − l I(n, l−1),  I(n, 0) = 0 for n ≠ 0 (by parts).
 * Bound      exact: rational, and rational in π².
 * Reference  M. Beneke, M. Jamin, JHEP 09 (2008) 044, arXiv:0806.3156 (the moments of the τ width; numbers reproduced).
 */
import { Rational, R, exact, exactReal, pi, type Exact } from '../../numerics/index.js';
import { liftExact, type Ring } from '../algebra/ring.js';

/** Σ_k q_k π^(2k), q_0 first. */
export type InPiSquared = readonly Rational[];

/** W_0, W_1, … of W(x) = 2 ∫_x^1 w: W_0 = 2 Σ w_i/(i+1), W_{i+1} = −2 w_i/(i+1). */
export function weightIntegral(w: readonly Rational[]): Rational[] {
  const parts = w.map((c, i) => c.mul(Rational.of(2, i + 1)));
  return [parts.reduce((sum, c) => sum.add(c), Rational.ZERO), ...parts.map((c) => c.neg())];
}

/** I(n, 0) … I(n, count − 1). */
function powerMoments(n: number, count: number): InPiSquared[] {
  const list: Rational[][] = [];
  for (let l = 0; l < count; l++) {
    const half = Math.floor(l / 2);
    const sign = half % 2 === 0 ? 1 : -1;
    const top = Array.from({ length: half + 1 }, () => Rational.ZERO);
    if (n === 0) {
      if (l % 2 === 0) top[half] = Rational.of(sign, l + 1);
    } else {
      if (l % 2 === 1) top[half] = Rational.of(n % 2 === 0 ? sign : -sign, n);
      list[l - 1]?.forEach((q, k) => {
        top[k] = (top[k] ?? Rational.ZERO).sub(q.mul(Rational.of(l, n)));
      });
    }
    list.push(top);
  }
  return list;
}

/** (1/2πi) ∮ dx/x W(x) (−x)^(−shift) ln^l(−x) for l = 0 … count − 1. */
export function circleMoments(integral: readonly Rational[], count: number, shift = 0): InPiSquared[] {
  const sums = Array.from({ length: count }, (_, l) =>
    Array.from({ length: Math.floor(l / 2) + 1 }, () => Rational.ZERO),
  );
  integral.forEach((W, m) => {
    if (W.isZero()) return;
    const weight = m % 2 === 0 ? W : W.neg();
    powerMoments(m - shift, count).forEach((moment, l) => {
      moment.forEach((q, k) => {
        sums[l]![k] = sums[l]![k]!.add(weight.mul(q));
      });
    });
  });
  return sums;
}

/** The number Σ q_k π^(2k). */
export function exactInPiSquared(q: InPiSquared): Exact {
  const last = q.findLastIndex((c) => !c.isZero());
  if (last <= 0) return exact(q[0] ?? Rational.ZERO);
  return exactReal((prec) => {
    const work = prec + 3 * last + 20;
    const square = R.sqr(pi(work), work);
    let sum = R.ZERO;
    for (let k = last; k >= 0; k--) sum = R.add(R.mul(sum, square, work), R.fromRational(q[k]!, work), work);
    return sum;
  });
}

/** "265/72 - 1/3*pi^2": an expression that a series file takes. */
export function inPiSquaredText(q: InPiSquared): string {
  let text = '';
  q.forEach((c, k) => {
    if (c.isZero()) return;
    const body =
      k === 0 ? c.abs().toString() : `${c.abs().equals(Rational.ONE) ? '' : `${c.abs().toString()}*`}pi^${2 * k}`;
    text += text === '' ? (c.sign() < 0 ? `-${body}` : body) : ` ${c.sign() < 0 ? '-' : '+'} ${body}`;
  });
  return text === '' ? '0' : text;
}

/** Σ_l (J_l/l!) (β ∂)^l Σ c_n x^(n + power), as many coefficients as came in, over any ring. */
export function onCircle<T>(ring: Ring<T>, c: readonly T[], power: T, beta: readonly T[], moments: readonly T[]): T[] {
  const sum = c.map((x) => ring.mul(x, moments[0] ?? ring.zero));
  let g = [...c];
  for (let l = 1; l < c.length; l++) {
    // g ← β g′/l, dx/d ln μ² = −Σ b_j x^(j+2); the lowest l coefficients are zero.
    const next = c.map(() => ring.zero);
    const share = ring.fromRational(Rational.of(-1, l));
    for (let n = l - 1; n < c.length - 1; n++) {
      const slope = ring.mul(ring.mul(g[n]!, share), ring.add(power, ring.fromRational(Rational.of(n))));
      for (let j = 0; j < Math.min(beta.length, c.length - 1 - n); j++)
        next[n + 1 + j] = ring.add(next[n + 1 + j]!, ring.mul(beta[j]!, slope));
    }
    g = next;
    const J = moments[l] ?? ring.zero;
    for (let n = l; n < c.length; n++) sum[n] = ring.add(sum[n]!, ring.mul(J, g[n]!));
  }
  return sum;
}

/** The same for exact numbers; `power` may be any real number. At least as many moments as coefficients are needed. */
export function expandOnCircle(
  coefficients: readonly Exact[],
  power: Exact,
  beta: readonly Exact[],
  moments: readonly Exact[],
): Exact[] {
  const n = coefficients.length;
  const b = beta.slice(0, Math.max(n - 1, 0));
  return liftExact([power, ...coefficients, ...b, ...moments.slice(0, n)], (ring, [p, ...x]) =>
    onCircle(ring, x.slice(0, n), p ?? ring.zero, x.slice(n, n + b.length), x.slice(n + b.length)),
  );
}
