/**
 * @module Zeros of S(x) = 1 + (b_1/b_0)x + … , the truncated beta function over its one-loop term, in doubles.
 * Method  Durand–Kerner from points on a circle, then Newton steps; the degree is at most four.
 * Bound   Newton ends at rounding level for simple zeros; the zeros are separated for every n_f from 0 to 16
 *         at every number of loops, which a test checks.
 */

import { cdiv, cmul, csub, polynomialAt, type ComplexNumber } from './complex-number.js';

const SWEEPS = 200;
/** Imaginary parts below this, relative to the size, are rounding: the zero is real. */
const REAL_TOLERANCE = 1e-11;

/** All zeros of Σ s_k x^k, s_0 ≠ 0, s_n ≠ 0; conjugate pairs exactly conjugate, real zeros with im = 0. */
export function zerosOf(s: readonly number[]): ComplexNumber[] {
  const n = s.length - 1;
  const top = s[n] ?? NaN;
  const size = Math.abs((s[0] ?? NaN) / top) ** (1 / Math.max(n, 1));
  let z: ComplexNumber[] = Array.from({ length: n }, (_, k) => ({
    re: size * Math.cos((2 * Math.PI * k) / n + 0.4),
    im: size * Math.sin((2 * Math.PI * k) / n + 0.4),
  }));
  for (let sweep = 0; sweep < SWEEPS; sweep++) {
    z = z.map((zi, i) => {
      let denominator: ComplexNumber = { re: top, im: 0 };
      z.forEach((zj, j) => {
        if (j !== i) denominator = cmul(denominator, csub(zi, zj));
      });
      return csub(zi, cdiv(polynomialAt(s, zi), denominator));
    });
  }
  const slope = s.slice(1).map((c, k) => c * (k + 1));
  const polished = z.map((zi) => {
    let x = zi;
    for (let k = 0; k < 3; k++) x = csub(x, cdiv(polynomialAt(s, x), polynomialAt(slope, x)));
    return x;
  });
  return conjugatePairs(polished);
}

function conjugatePairs(z: readonly ComplexNumber[]): ComplexNumber[] {
  const isReal = (x: ComplexNumber): boolean => Math.abs(x.im) <= REAL_TOLERANCE * Math.hypot(x.re, x.im);
  const real = z.filter(isReal).map((x) => ({ re: x.re, im: 0 }));
  const upper = z.filter((x) => !isReal(x) && x.im > 0);
  return [...real, ...upper.flatMap((x) => [x, { re: x.re, im: -x.im }])];
}
