/**
 * @module The part of a branch-point kernel that has a pole at integer b, with the pole taken out exactly.
 *
 * Purpose    b = m + ε, |ε| <= 1/2: the term k = m of the convergent sum and the Γ-function term both diverge as ε → 0.
 * Method     w^b Γ(−b) − (−w)^m/(m!(m−b)) = −(−1)^m (w^m/m!)·(e^A − 1)/ε,
 *            A = ε log w + log Γ(1−ε) − Σ_{j=1}^m log(1+ε/j); for ε = 0 (e^A − 1)/ε is log w + γ − H_m.
 *            With L(ε) the part of A without log w, everything is relatively accurate in ε.
 * Bound      by ball arithmetic; the product Π(1+ε/j) from stirling.ts with log2(1/ε) spare bits, or by
 *            u ← u + (ε/j)(1+u) for u = Π − 1, whose increments all have the sign of ε.
 */
import { bitLength, shift } from '../bits.js';
import { eulerGamma } from '../ball/constants.js';
import * as C from '../ball/complex.js';
import type { Complex } from '../ball/complex.js';
import { cexp } from '../ball/complex-elementary.js';
import { exp, expm1, log, log1p } from '../ball/elementary.js';
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import { Rational } from '../rational.js';
import { gamma } from './gamma.js';
import { logGamma, logGamma1p } from './log-gamma.js';
import { risingProduct } from './stirling.js';

/** Factorials up to this are multiplied out; beyond it x^m/m! goes through log Γ (heuristic). */
const FACTORIAL_LIMIT = 1000;
/** log2(1/|ε|) in units of the precision from which on the slow product without cancellation is used (heuristic). */
const CLOSE = 1;

interface Kept {
  readonly eps: Rational;
  readonly m: number;
  readonly prec: number;
  readonly value: Ball;
}
/** The last few values: one exponent is used at many points. */
const kept: Kept[] = [];
const KEEP = 8;

/** L(ε) = log Γ(1−ε) − Σ_{j=1}^m log(1+ε/j), relatively accurate to about prec bits; L(0) = 0. */
export function poleLog(eps: Rational, m: number, prec: number): Ball {
  const found = kept.find((k) => k.m === m && k.prec >= prec && k.prec < 2 * prec + 64 && k.eps.equals(eps));
  if (found !== undefined) return found.value;
  const value = computeLog(eps, m, prec);
  kept.unshift({ eps, m, prec, value });
  if (kept.length > KEEP) kept.pop();
  return value;
}

function computeLog(eps: Rational, m: number, prec: number): Ball {
  if (eps.isZero()) return R.ZERO;
  const e = bitLength(eps.den) - bitLength(eps.num); // |ε| near 2^-e
  const work = prec + 12 + e;
  const g = logGamma1p(R.fromRational(eps.neg(), work), prec + 8);
  if (m === 0) return g;
  let u: Ball;
  if (e < CLOSE * prec) {
    const ball = R.fromRational(eps, work + 8);
    const p = risingProduct(shift(ball.mid, ball.exp + work), work, m);
    const product = R.ball(p.mid, p.exp, (m + 1) * 2 ** 6, work + 16);
    return R.sub(g, log(R.div(product, factorial(m, work + 8), work + 8), prec + 8), prec);
  }
  u = R.ZERO;
  for (let j = 1; j <= m; j++) {
    const step = R.fromRational(Rational.of(eps.num, eps.den * BigInt(j)), prec + 16);
    u = R.add(u, R.mul(step, R.add(R.ONE, u, prec + 16), prec + 16), prec + 16);
  }
  return R.sub(g, log1p(u, prec + 8), prec);
}

/** H_m − γ, minus the limit of L(ε)/ε at 0. */
export function harmonicLimit(m: number, prec: number): Ball {
  const wp = prec + 12 + bitLength(BigInt(m + 1));
  const one = 1n << BigInt(wp);
  let s = 0n;
  for (let j = 1; j <= m; j++) s += one / BigInt(j);
  return R.sub(R.ball(s, -wp, m + 1), eulerGamma(wp), prec);
}

const factorials: bigint[] = [1n];
/** m!, exact up to FACTORIAL_LIMIT. */
function factorial(m: number, prec: number): Ball {
  if (m > FACTORIAL_LIMIT) return gamma(R.fromNumber(m + 1), prec);
  while (factorials.length <= m) factorials.push(factorials[factorials.length - 1]! * BigInt(factorials.length));
  return R.fromNumber(factorials[m]!);
}

/** x^m/m! for x > 0. */
export function powerOverFactorial(x: Ball, logX: Ball, m: number, prec: number): Ball {
  if (m <= FACTORIAL_LIMIT) return R.div(R.powInt(x, m, prec + 8), factorial(m, prec + 8), prec);
  const work = prec + 24;
  const a = R.mul(R.fromNumber(m), logX, work + 40);
  return exp(R.sub(a, logGamma(R.fromNumber(m + 1), work + 40), work + 40), prec);
}

/** z^m/m! for complex z. */
export function powerOverFactorialComplex(z: Complex, m: number, prec: number): Complex {
  const work = prec + 8 + 2 * Math.ceil(Math.log2(m + 2));
  let power: Complex = C.ONE;
  let base = z;
  for (let k = m; k > 0; k >>= 1) {
    if (k & 1) power = C.mul(power, base, work);
    if (k > 1) base = C.sqr(base, work);
  }
  const f = factorial(m, prec + 8);
  return { re: R.div(power.re, f, prec), im: R.div(power.im, f, prec) };
}

/** The real pole part: A, and (e^A − 1)/ε. */
export interface PolePart {
  readonly growth: Ball; // e^A
  readonly quotient: Ball; // (e^A − 1)/ε
}

/** For real w = x > 0. */
export function polePart(logX: Ball, eps: Rational, m: number, prec: number): PolePart {
  if (eps.isZero()) return { growth: R.ONE, quotient: R.sub(logX, harmonicLimit(m, prec), prec) };
  const work = prec + 10;
  const e = R.fromRational(eps, work);
  const a = R.add(R.mul(e, logX, work), poleLog(eps, m, work), work);
  const excess = expm1(a, work);
  const sum = R.add(R.ONE, excess, work);
  // 1 + (e^A − 1) cancels for A far below 0.
  const growth = R.upperBits(sum) < -2 ? exp(a, work) : sum;
  return { growth, quotient: R.div(excess, e, prec) };
}

/** (e^A − 1)/ε for complex w. */
export function polePartComplex(logW: Complex, eps: Rational, m: number, prec: number): Complex {
  if (eps.isZero()) return C.sub(logW, C.fromReal(harmonicLimit(m, prec)), prec);
  const work = prec + 10;
  const e = R.fromRational(eps, work);
  const a = C.add(C.mulReal(logW, e, work), C.fromReal(poleLog(eps, m, work)), work);
  const excess = cexpm1(a, work);
  return { re: R.div(excess.re, e, prec), im: R.div(excess.im, e, prec) };
}

/** e^z − 1, accurate relative to |z|. */
export function cexpm1(z: Complex, prec: number): Complex {
  const e = -C.upperBits(z);
  if (e < prec / 8) return C.sub(cexp(z, prec + Math.max(0, e) + 8), C.ONE, prec);
  // z Σ_{k<n} z^k/(k+1)!, tail below 2·2^(−en)
  const n = Math.ceil(prec / e) + 1;
  let s: Complex = C.ONE;
  for (let k = n; k >= 2; k--) {
    const t = C.mul(s, z, prec + 8);
    const d = R.fromNumber(k);
    s = C.add(C.ONE, { re: R.div(t.re, d, prec + 8), im: R.div(t.im, d, prec + 8) }, prec + 8);
  }
  const wide: Complex = { re: R.addError(s.re, 2, -e * n), im: R.addError(s.im, 2, -e * n) };
  return C.mul(z, wide, prec);
}
