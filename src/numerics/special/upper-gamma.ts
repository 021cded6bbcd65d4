/**
 * @module The upper incomplete Γ function Γ(s, z) = ∫_z^∞ t^(s−1) e^−t dt.
 *
 * Purpose    real and complex s, also at and next to the poles 0, −1, −2, … of Γ(s), where Γ(s, z) is regular; z > 0, complex z, and
 *            both sides of the cut z < 0.
 * Method     Γ(s, z) = z^s e^−z G_(−s)(z) with the kernels of branch-alternating.ts, branch-cut.ts, branch-same.ts and complex-branch.ts
 *            at exact midpoints.
 * Bound      ∂Γ/∂z = −z^(s−1) e^−z exactly, so a radius r of z costs r·sup|z^(s−1) e^−z|. In s: ∂Γ/∂s = z^s e^−z (G log z + ∂G_(−s)/∂s) with
 *            the bounds of spread.ts; for complex s these carry e^(π|Im s|), since |(1+v)^(s−1)| <= |1+v|^(Re s − 1) e^(π|Im s|).
 * Reference  DLMF 8.2.2, 8.2.9, 8.8.13 (derivative in z), 8.6.5.
 */
import * as C from '../ball/complex.js';
import type { Complex } from '../ball/complex.js';
import { cexp, clog } from '../ball/complex-elementary.js';
import { pi } from '../ball/constants.js';
import { exp, log } from '../ball/elementary.js';
import { addMag, mag, mulMag, widenMag } from '../ball/mag.js';
import type { Mag } from '../ball/mag.js';
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import type { Exact } from '../exact.js';
import { Rational } from '../rational.js';
import { branchAlternating } from './branch-alternating.js';
import { branchCut } from './branch-cut.js';
import { branchSame } from './branch-same.js';
import { complexBranch } from './complex-branch.js';
import { readExponent } from './exponent.js';
import type { Exponent } from './exponent.js';
import { modulusLower, modulusUpper, radiusOf, spreadExponent } from './spread.js';

type Order = Exact | Rational | Ball;
/** Precision at which bounds are formed. */
const ROUGH = 60;

/** −s as the kernels' exponent, exact value and radius apart; undefined beyond their limit. */
function exponentOf(s: Order, prec: number): Exponent | undefined {
  if (s instanceof Rational) return readExponent(s.neg(), prec);
  if ('mid' in s) return readExponent(R.neg(s), prec);
  return s.rational !== undefined ? readExponent(s.rational.neg(), prec) : readExponent(R.neg(s.ball(prec + 40)), prec);
}

/** Bits by which |s log z − z| exceeds 1: the exponential needs them. */
function exponentBits(size: number, order: number): number {
  return Math.ceil(Math.log2(2 + size + Math.abs(order) * (1 + Math.abs(Math.log(size)))));
}

const clampSize = (x: number): number => Math.min(Math.max(x, 1e-300), 1e300);

/** Γ(s, x) for x > 0 and real s, |s| <= 32768; INDETERMINATE otherwise. */
export function upperGamma(s: Order, x: Ball, prec: number): Ball {
  const b = exponentOf(s, prec);
  if (b === undefined || !R.isPositive(x)) return R.INDETERMINATE;
  const m = R.exactMid(x);
  const work = prec + 8 + exponentBits(clampSize(R.toNumber(m)), b.approx);
  const g = branchAlternating(b.value, m, prec + 6);
  const order = b.value.neg();
  const power = R.mul(R.fromRational(order, work), log(m, work), work);
  const value = R.mul(exp(R.sub(power, m, work), prec + 6), g, prec + 2);
  if (x.rad === 0 && b.radius.m === 0) return R.round(value, prec);
  return R.round(widenMag(value, realSpread(b, x, g)), prec);
}

/** Effect of the radii of s and x: header. */
function realSpread(b: Exponent, x: Ball, g: Ball): Mag {
  return complexSpread(wideOrder(b), { re: x, im: R.ZERO }, C.fromReal(g), b, 0);
}

function wideOrder(b: Exponent): Complex {
  return C.fromReal(widenMag(R.fromRational(b.value.neg(), ROUGH), b.radius));
}

/** r_z·sup|z^(s−1) e^−z| + sup|z^s e^−z|·(r_s |log z| |G| + |δG|) over the whole of s and z. */
function complexSpread(s: Complex, z: Complex, g: Complex, b: Exponent, imaginary: number): Mag {
  const logZ = clog(z, ROUGH);
  const less = C.sub(s, C.ONE, ROUGH);
  const size = modulusUpper(cexp(C.sub(C.mul(less, logZ, ROUGH), z, ROUGH), ROUGH));
  const fromZ = mulMag(radiusOf(z), size);
  if (b.radius.m === 0) return fromZ;
  const low = modulusLower(z);
  const shiftOfG = spreadExponent(b, low, imaginary);
  const inner = addMag(mulMag(b.radius, mulMag(modulusUpper(logZ), addMag(modulusUpper(g), shiftOfG))), shiftOfG);
  return addMag(fromZ, mulMag(mulMag(size, modulusUpper(z)), inner));
}

/**
 * Γ(s, z) for complex z off the cut (−∞, 0], and on it from above, the principal value, when Im z is exactly 0; s real or complex.
 * Relative to the modulus of the result. INDETERMINATE where z may be 0 or may lie on both sides of the cut.
 */
export function upperGammaComplex(s: Order | Complex, z: Complex, prec: number): Complex {
  if ('re' in s) {
    if (!R.isExactZero(s.im)) return complexOrder(s, z, prec);
    return upperGammaComplex(s.re, z, prec);
  }
  if (R.isExactZero(z.im)) {
    if (R.isPositive(z.re)) return C.fromReal(upperGamma(s, z.re, prec));
    return R.isNegative(z.re) ? onCut(s, R.neg(z.re), prec) : C.INDETERMINATE;
  }
  if (!R.isPositive(z.re) && R.containsZero(z.im)) return C.INDETERMINATE;
  const b = exponentOf(s, prec);
  if (b === undefined) return C.INDETERMINATE;
  const m = C.exactMid(z);
  const g = branchCut(b.value, m, prec + 8);
  const value = C.mul(factor(C.fromReal(R.fromRational(b.value.neg(), prec + 100)), m, b.approx, prec), g, prec + 4);
  return widened(
    value,
    b.radius.m === 0 && radiusOf(z).m === 0 ? mag(0) : complexSpread(wideOrder(b), z, g, b, 0),
    prec,
  );
}

/** z^s e^−z at exact z. */
function factor(s: Complex, z: Complex, order: number, prec: number): Complex {
  const { re, im } = C.toNumbers(z);
  const work = prec + 10 + exponentBits(clampSize(Math.hypot(re, im)), order);
  return cexp(C.sub(C.mul(s, clog(z, work), work), z, work), prec + 8);
}

function widened(value: Complex, error: Mag, prec: number): Complex {
  return C.round({ re: widenMag(value.re, error), im: widenMag(value.im, error) }, prec);
}

/** Γ(s, −x + i0) = (−x + i0)^s e^x G, where G_b(−x + i0) is minus the conjugate of the integral passing above (branch-same.ts). */
function onCut(s: Order, x: Ball, prec: number): Complex {
  const b = exponentOf(s, prec);
  if (b === undefined) return C.INDETERMINATE;
  const m = R.exactMid(x);
  const { pv, im } = branchSame(b.value, m, prec + 8);
  const g: Complex = { re: R.neg(pv), im: R.neg(im) };
  const order = R.fromRational(b.value.neg(), prec + 100);
  const work = prec + 10 + exponentBits(clampSize(R.toNumber(m)), b.approx);
  const logZ: Complex = { re: log(m, work), im: pi(work) };
  const power = cexp(C.add(C.mulReal(logZ, order, work), C.fromReal(m), work), prec + 8);
  const value = C.mul(power, g, prec + 4);
  if (b.radius.m === 0 && x.rad === 0) return C.round(value, prec);
  return widened(value, complexSpread(wideOrder(b), { re: R.neg(x), im: R.ZERO }, g, b, 0), prec);
}

function complexOrder(s: Complex, z: Complex, prec: number): Complex {
  if (!R.isPositive(z.re) && R.containsZero(z.im)) return C.INDETERMINATE;
  const m = C.exactMid(z);
  const order = C.exactMid(s);
  const g = complexBranch(C.neg(order), m, prec + 8);
  if (g.re.rad === Infinity) return C.INDETERMINATE;
  const { re, im } = C.toNumbers(order);
  const value = C.mul(factor(order, m, Math.hypot(re, im), prec), g, prec + 4);
  const radius = radiusOf(s);
  if (radius.m === 0 && radiusOf(z).m === 0) return C.round(value, prec);
  // The bounds of the real kernel at −Re s, with the factor e^(π|Im s|) of the header.
  const b = readExponent(R.neg(order.re), ROUGH);
  if (b === undefined) return C.INDETERMINATE;
  const reach = Math.abs(im) + 1e-9 + R.radiusToNumber(s.im);
  return widened(value, complexSpread(s, z, g, { ...b, radius }, reach), prec);
}
