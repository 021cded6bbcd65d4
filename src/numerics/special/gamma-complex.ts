/**
 * @module Γ and 1/Γ in the complex plane.
 *
 * Purpose    hypergeometric connection coefficients with complex parameters.
 * Method     Re z >= 1/2: Z = z + n with Re Z large and |arg Z| <= π/4, Stirling's series for log Γ(Z), and the product
 *            z(z+1)…(z+n−1). Re z < 1/2: reflection, Γ(z)Γ(1−z) = π/sin πz. Real arguments go to the real functions.
 * Bound      Stirling's remainder after N terms is at most the first term left out times sec^{2N}(arg Z/2); with
 *            sec(π/8) = 1.0824 that is the real bound at |Z|/1.0824, times 1.0824. The rest is ball arithmetic.
 * Reference  DLMF 5.11.1, 5.11(ii) (sector bound), 5.5.3.
 */
import { pi } from '../ball/constants.js';
import * as C from '../ball/complex.js';
import type { Complex } from '../ball/complex.js';
import { cexp, clog } from '../ball/complex-elementary.js';
import { cosh, log, sinCosPi, sinh } from '../ball/elementary.js';
import * as R from '../ball/real.js';
import { Rational } from '../rational.js';
import { bernoulli } from './bernoulli.js';
import { gamma, rgamma } from './gamma.js';
import { SHIFT_RATIO, stirlingTerms } from './stirling.js';

/** log2 sec(π/8), rounded up. */
const SECTOR_BITS = 0.1143;
const HALF = Rational.of(1, 2);

interface Shifted {
  /** log Γ(z + n). */
  readonly log: Complex;
  /** z(z+1)…(z+n−1). */
  readonly product: Complex;
}

/** For Re z >= 1/2, about. Undefined where z is too wide or too large to handle. */
function shifted(z: Complex, prec: number): Shifted | undefined {
  const { re, im } = C.toNumbers(z);
  if (!(Math.abs(re) < 2 ** 40 && Math.abs(im) < 2 ** 20)) return undefined;
  const reach = Math.max(4, Math.ceil(SHIFT_RATIO * prec), Math.abs(im) + 1);
  const n = Math.max(0, Math.ceil(reach - re));
  const size = Math.ceil(Math.log2(re + n + Math.abs(im) + 2));
  const work = prec + 2 * size + 16;
  const big: Complex = { re: R.add(z.re, R.fromNumber(n), work), im: z.im };
  let product = C.ONE;
  for (let j = 0; j < n; j++) product = C.mul(product, { re: R.add(z.re, R.fromNumber(j), work), im: z.im }, work);
  const half = R.fromRational(HALF, work);
  const main = C.mul({ re: R.sub(big.re, half, work), im: big.im }, clog(big, work), work);
  const constant = R.mul2exp(log(R.mul2exp(pi(work), 1), work), -1);
  const log2x = Math.log2(Math.hypot(re + n, im)) - SECTOR_BITS - 1e-9;
  const { terms, remainder } = stirlingTerms(log2x, prec, true);
  const inverse = C.inv(big, work);
  const square = C.mul(inverse, inverse, work);
  let sum = C.ZERO;
  for (let k = terms - 1; k >= 1; k--) {
    const coefficient = R.fromRational(bernoulli(2 * k).mul(Rational.of(1, 2 * k * (2 * k - 1))), work);
    sum = C.add(C.mul(sum, square, work), C.fromReal(coefficient), work);
  }
  const tail = C.mul(sum, inverse, work);
  const error = Math.ceil(remainder + SECTOR_BITS);
  const total = C.add(C.add(C.sub(main, big, work), C.fromReal(constant), work), tail, work);
  return { log: { re: R.addError(total.re, 1, error), im: R.addError(total.im, 1, error) }, product };
}

/** sin πz, relatively accurate at its zeros. */
function sinPi(z: Complex, prec: number): Complex {
  const { sin, cos } = sinCosPi(z.re, prec + 8);
  const y = R.mul(pi(prec + 8), z.im, prec + 8);
  return { re: R.mul(sin, cosh(y, prec + 8), prec), im: R.mul(cos, sinh(y, prec + 8), prec) };
}

/** Bits beside prec: the logarithm's absolute error is the relative one of Γ, and it grows with |z| log|z|. */
function spareBits(z: Complex): number {
  const { re, im } = C.toNumbers(z);
  return 14 + Math.ceil(2 * Math.log2(2 + Math.min(1e12, Math.abs(re) + Math.abs(im))));
}

const inRightPart = (z: Complex): boolean => R.toNumber(z.re) >= 0.5;
const reflected = (z: Complex, prec: number): Complex => C.sub(C.ONE, z, prec);

/** Γ(z); INDETERMINATE where z may be a pole. Relative accuracy about 2^-prec for |Im z| of order one. */
export function gammaComplex(z: Complex, prec: number): Complex {
  if (R.isExactZero(z.im)) return C.fromReal(gamma(z.re, prec));
  const work = prec + spareBits(z);
  if (!inRightPart(z)) {
    const upper = C.mulReal(rgammaComplex(reflected(z, work + 40), work), pi(work), work);
    return C.div(upper, sinPi(z, work), prec);
  }
  const parts = shifted(z, work);
  return parts === undefined ? C.INDETERMINATE : C.div(cexp(parts.log, work), parts.product, prec);
}

/** 1/Γ(z), entire. */
export function rgammaComplex(z: Complex, prec: number): Complex {
  if (R.isExactZero(z.im)) return C.fromReal(rgamma(z.re, prec));
  const work = prec + spareBits(z);
  if (!inRightPart(z)) {
    const upper = C.mul(gammaComplex(reflected(z, work + 40), work), sinPi(z, work), work);
    return C.mulReal(upper, R.div(R.ONE, pi(work), work), prec);
  }
  const parts = shifted(z, work);
  return parts === undefined ? C.INDETERMINATE : C.mul(parts.product, cexp(C.neg(parts.log), work), prec);
}
