/**
 * @module ψ(z) in the complex plane.
 *
 * Purpose    the logarithmic cases of hypergeometric functions with complex parameters.
 * Method     Re z >= 1/2: ψ(z) = ψ(z+n) − Σ_{j<n} 1/(z+j), then ψ(Z) = log Z − 1/(2Z) − Σ B_2k/(2k Z^2k) with |arg Z| <= π/4.
 *            Otherwise ψ(z) = ψ(1−z) − π cot πz. Real arguments go to the real function.
 * Bound      the remainder after N terms is ∫_0^∞ (B_2N − B_2N({x}))/(x+Z)^(2N+1) dx up to sign; |B_2N({x})| <= |B_2N| and
 *            |x+Z| >= (x+|Z|) cos(arg Z/2) give at most 2 |B_2N| sec(π/8)^(2N+1)/(2N |Z|^2N).
 * Reference  DLMF 5.11.2, 5.5.2, 5.5.4, 2.10.1.
 */
import { pi } from '../ball/constants.js';
import * as C from '../ball/complex.js';
import type { Complex } from '../ball/complex.js';
import { clog } from '../ball/complex-elementary.js';
import { cosh, sinCosPi, sinh } from '../ball/elementary.js';
import * as R from '../ball/real.js';
import { Rational } from '../rational.js';
import { bernoulli } from './bernoulli.js';
import { digamma } from './digamma.js';
import { SHIFT_RATIO, stirlingTerms } from './stirling.js';

/** log2 sec(π/8), rounded up. */
const SECTOR_BITS = 0.1143;

/** ψ(z) to about prec bits absolutely (relative where it is large); INDETERMINATE where z may be a pole. */
export function digammaComplex(z: Complex, prec: number): Complex {
  if (R.isExactZero(z.im)) return C.fromReal(digamma(z.re, prec));
  if (R.toNumber(z.re) < 0.5) {
    const work = prec + 16;
    const other = digammaComplex(C.sub(C.ONE, z, work + 40), work);
    return C.sub(other, piCot(z, work), prec);
  }
  const { re, im } = C.toNumbers(z);
  if (!(re < 2 ** 40 && Math.abs(im) < 2 ** 20)) return C.INDETERMINATE;
  const reach = Math.max(4, Math.ceil(SHIFT_RATIO * (prec + 8)), Math.abs(im) + 1);
  const n = Math.max(0, Math.ceil(reach - re));
  const work = prec + 20 + Math.ceil(Math.log2(n + 2));
  const big: Complex = { re: R.add(z.re, R.fromNumber(n), work + 20), im: z.im };
  const inverse = C.inv(big, work);
  const square = C.mul(inverse, inverse, work);
  const { terms, remainder } = stirlingTerms(Math.log2(Math.hypot(re + n, im)) - SECTOR_BITS - 1e-9, prec + 8, false);
  let sum: Complex = C.ZERO;
  for (let k = terms - 1; k >= 1; k--) {
    const coefficient = R.fromRational(bernoulli(2 * k).div(Rational.of(2 * k)), work);
    sum = C.add(C.mul(sum, square, work), C.fromReal(coefficient), work);
  }
  let total = C.sub(clog(big, work), C.mul2exp(inverse, -1), work);
  total = C.sub(total, C.mul(sum, square, work), work);
  const error = Math.ceil(remainder + SECTOR_BITS + 1);
  total = { re: R.addError(total.re, 1, error), im: R.addError(total.im, 1, error) };
  for (let j = 0; j < n; j++) {
    total = C.sub(total, C.inv({ re: R.add(z.re, R.fromNumber(j), work + 20), im: z.im }, work), work);
  }
  return C.round(total, prec);
}

/** π cot πz. */
function piCot(z: Complex, prec: number): Complex {
  const { sin, cos } = sinCosPi(z.re, prec + 8);
  const y = R.mul(pi(prec + 8), z.im, prec + 8);
  const [ch, sh] = [cosh(y, prec + 8), sinh(y, prec + 8)];
  const top: Complex = { re: R.mul(cos, ch, prec + 8), im: R.neg(R.mul(sin, sh, prec + 8)) };
  const bottom: Complex = { re: R.mul(sin, ch, prec + 8), im: R.mul(cos, sh, prec + 8) };
  return C.mulReal(C.div(top, bottom, prec + 4), pi(prec + 8), prec);
}
