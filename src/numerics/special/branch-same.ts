/**
 * @module F_b(x) = PV ∫_0^∞ e^{−xv} (1−v)^{−1−b} dv: the branch point on the path of integration.
 *
 * Purpose    principal value and half-discontinuity of a Borel integral over a singularity (1 − t/u)^{−1−b} at t = u > 0,
 *            x = u/g; terminants of same-sign series (b = N + b₀).
 * Method     F_b(x) = e^−x [Σ_k x^k/(k!(k−b)) − Γ(−b) x^b cos πb], Im above the axis = π x^b e^−x/Γ(1+b).
 *            With b = m + ε, m >= 0 the nearest integer, the pole is taken out (pole-part.ts): the term k = m and the Γ term become
 *            (x^m/m!)·[Q cos πε − 2 sin²(πε/2)/ε], Q = (e^A − 1)/ε; Im = e^−x (x^m/m!)(sin πε/ε) e^A.
 *            x beyond about 0.7 times the precision: asymptotic series with its proved remainder.
 * Bound      all pieces are balls; the sum's error is 4·2^-bits·e^x, times e^−x. Accuracy is checked and bits are added where
 *            F_b is small. Radii of x and b: spread.ts.
 * Reference  R. B. Dingle, "Asymptotic Expansions" (1973), chapter 21 (basic terminants); DLMF 8.2, 8.7.3, 2.11(iii).
 */
import { bitLength } from '../bits.js';
import { pi } from '../ball/constants.js';
import { exp, log, sinCosPi } from '../ball/elementary.js';
import {
  addMag,
  divMag,
  mag,
  magBits,
  magLower,
  magRadius,
  magToNumber,
  magUpper,
  mulMag,
  widenMag,
} from '../ball/mag.js';
import type { Mag } from '../ball/mag.js';
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import type { Exact } from '../exact.js';
import { Rational } from '../rational.js';
import { asymptoticLength, asymptoticReal } from './asymptotic.js';
import { readExponent } from './exponent.js';
import type { Exponent } from './exponent.js';
import { exponentialSum } from './exponential-sum.js';
import { gamma, rgamma } from './gamma.js';
import { psiBound } from './log-gamma.js';
import { polePart, powerOverFactorial } from './pole-part.js';
import { refine } from './refine.js';
import { spreadExponent, spreadSame } from './spread.js';

export interface BranchValue {
  /** Principal value: the mean of the integrals passing above and below. */
  readonly pv: Ball;
  /** Imaginary part of the integral passing above the singularity; below it is the negative. */
  readonly im: Ball;
}

const UNKNOWN: BranchValue = { pv: R.INDETERMINATE, im: R.INDETERMINATE };
const HALF = Rational.of(1n, 2n);

/**
 * F_b(x) as {pv, im} for x > 0 and real b, near and at the integers too. Formula: header. Accuracy near prec bits relative to pv
 * and to im, as far as x and b are known. INDETERMINATE for x not certainly positive or |b| > 32768.
 */
export function branchSame(b: Exact | Rational | Ball, x: Ball, prec: number): BranchValue {
  const e = readExponent(b, prec);
  if (e === undefined || !R.isPositive(x)) return UNKNOWN;
  const mid = exactSame(e, R.exactMid(x), prec);
  const pvError = addMag(spreadSame(mid.pv, x, e), spreadExponent(e, magLower(x)));
  return {
    pv: R.round(widenMag(mid.pv, pvError), prec),
    im: R.round(widenMag(mid.im, imSpread(mid.im, e, x, prec)), prec),
  };
}

/** e^−x Ei(x) for x > 0: the principal value of ∫_0^∞ e^{−xv}/(1−v) dv. */
export function eiScaled(x: Ball, prec: number): Ball {
  return branchSame(Rational.ZERO, x, prec).pv;
}

function exactSame(b: Exponent, x: Ball, prec: number): BranchValue {
  const size = Math.min(Math.max(R.toNumber(x), 1e-300), 1e300);
  const spare = 12 + Math.ceil(Math.log2(1 + size + Math.abs(b.approx)));
  const far = asymptoticLength(size * (1 - 1e-12), false, b, prec + 12);
  if (far !== undefined) {
    const logX = log(x, prec + spare + 70);
    const e = exp(R.neg(x), prec + spare);
    const im = residue(b, x, logX, e, prec + spare);
    const series = asymptoticReal(x, b, 1, far, prec + 12);
    const remainder = divMag(mag(1, Math.ceil(Math.max(far.error, -1e9))), magLower(x));
    return { pv: widenMag(series, remainder), im };
  }
  return refine(
    prec,
    prec + spare,
    (bits) => convergent(b, x, size * (1 + 1e-12), bits),
    (value) => R.accuracyBits(value.pv),
  );
}

function convergent(b: Exponent, x: Ball, size: number, bits: number): BranchValue {
  const logX = log(x, bits + 30);
  const e = exp(R.neg(x), bits);
  const sum = exponentialSum(x, size, b, bits);
  if (b.m < 0) {
    // b = m + ε with ε exact: sin πb and cos πb keep their relative accuracy next to the integers.
    const { sin, cos } = sinCosPi(R.fromRational(b.eps, bits + 8), bits);
    const product = R.mul(gammaTerm(b, logX, bits), e, bits);
    const u = b.m % 2 === 0 ? product : R.neg(product);
    return { pv: R.sub(R.mul(sum, e, bits), R.mul(u, cos, bits), bits), im: R.neg(R.mul(u, sin, bits)) };
  }
  const part = pvPart(b, logX, bits);
  const power = R.mul(powerOverFactorial(x, logX, b.m, bits), e, bits);
  const pv = R.add(R.mul(sum, e, bits), R.mul(power, part.pv, bits), bits);
  return { pv, im: R.mul(power, part.im, bits) };
}

/** Γ(−b) x^b for b < 0. */
function gammaTerm(b: Exponent, logX: Ball, bits: number): Ball {
  const minus = R.fromRational(b.value.neg(), bits + 30);
  return R.mul(gamma(minus, bits + 4), exp(R.neg(R.mul(minus, logX, bits + 30)), bits + 4), bits);
}

/** [Q cos πε − 2 sin²(πε/2)/ε] and (sin πε/ε) e^A. */
function pvPart(b: Exponent, logX: Ball, bits: number): BranchValue {
  const part = polePart(logX, b.eps, b.m, bits);
  if (b.eps.isZero()) return { pv: part.quotient, im: pi(bits) };
  const eps = R.fromRational(b.eps, bits + 8);
  const half = sinCosPi(R.fromRational(b.eps.mul(HALF), bits + 8), bits + 8);
  const s2 = R.mul2exp(R.sqr(half.sin, bits + 8), 1);
  const cos = R.sub(R.ONE, s2, bits + 8);
  const sin = R.mul2exp(R.mul(half.sin, half.cos, bits + 8), 1);
  return {
    pv: R.sub(R.mul(part.quotient, cos, bits), R.div(s2, eps, bits), bits),
    im: R.mul(R.div(sin, eps, bits), part.growth, bits),
  };
}

/** π x^b e^−x/Γ(1+b). */
function residue(b: Exponent, x: Ball, logX: Ball, e: Ball, bits: number): Ball {
  if (b.m >= 0) return R.mul(R.mul(powerOverFactorial(x, logX, b.m, bits), e, bits), pvPart(b, logX, bits).im, bits);
  // Next to a zero of 1/Γ the distance ε must keep its own accuracy.
  const close = b.eps.isZero() ? 0 : Math.max(0, bitLength(b.eps.den) - bitLength(b.eps.num));
  const r = rgamma(R.fromRational(b.value.add(Rational.ONE), bits + 20 + close), bits);
  if (R.isExactZero(r)) return R.ZERO;
  const power = exp(R.mul(R.fromRational(b.value, bits + 30), logX, bits + 30), bits);
  return R.mul(R.mul(pi(bits), power, bits), R.mul(e, r, bits), bits);
}

/** Effect of the radii of x and b on the imaginary part: log Im changes by (b/x − 1) dx and (log x − ψ(1+b)) db. */
function imSpread(im: Ball, b: Exponent, x: Ball, prec: number): Mag {
  const r = magRadius(x);
  if (r.m === 0 && b.radius.m === 0) return mag(0);
  const low = magLower(x);
  const slope = r.m === 0 ? mag(0) : slopeInX(b, x, low);
  const growth = mulMag(r, slope);
  let size = magUpper(im);
  let error = mag(0);
  if (growth.m > 0) {
    const t = magToNumber(growth);
    if (!(t < 300)) return mag(Infinity);
    // e^t − 1 <= t e^t
    error = mulMag(size, mulMag(growth, mag(Math.exp(t) * 1.0001)));
    size = addMag(size, error);
  }
  if (b.radius.m === 0) return error;
  const br = magToNumber(b.radius);
  if (b.approx - br < -0.75) return addMag(error, spreadExponent(b, low));
  const shifted = widenMag(R.fromRational(b.value.add(Rational.ONE), prec), b.radius);
  const logs = mag(Math.max(Math.abs(magBits(low)), Math.abs(R.upperBits(x))) * Math.LN2 * 1.001);
  const t = mulMag(b.radius, addMag(logs, psiBound(shifted)));
  const tn = magToNumber(t);
  return tn < 300 ? addMag(error, mulMag(size, mulMag(t, mag(Math.exp(tn) * 1.0001)))) : mag(Infinity);
}

/** sup |b/ξ − 1| over the ball x. */
function slopeInX(b: Exponent, x: Ball, low: Mag): Mag {
  const a = R.sub(R.div(R.fromRational(b.value, 80), R.exactMid(x), 80), R.ONE, 80);
  // |b/ξ − b/m| <= |b| r/(m·low)
  const drift = mulMag(mag(Math.abs(b.approx) * 1.001), divMag(magRadius(x), mulMag(low, magLower(R.exactMid(x)))));
  return addMag(magUpper(a), drift);
}
