/**
 * @module The series with logarithms that hypergeometric functions have where parameters differ by integers.
 *
 * Purpose    Σ_k t_k D_k with t_(k+1)/t_k = z Π_i (a_i + k)/((n+1+k)(1+k)), t_0 = 1, and D_(k+1) = D_k + Σ_i 1/(a_i+k) − 1/(1+k) − 1/(n+1+k):
 *            one a for U(a, n+1, z), two for 2F1 at 1 − z.
 * Bound      beyond k >= |a_i| + 1 every |D_(k+1) − D_k| <= #a + 2 and the ratio of terms is at most
 *            ρ = |z| Π max(1, (K+|a_i|)/(K+1)) for two a, the same over K+1 for one. The tail from K on is at most
 *            |t_K| (|D_K|/(1−ρ) + (#a + 2)/(1−ρ)²).
 * Reference  DLMF 13.2.9, 15.8.10; bound derived here.
 */
import * as C from '../ball/complex.js';
import type { Complex } from '../ball/complex.js';
import { addMag, divMag, mag, magBits, magToNumber, mulMag, widenMag } from '../ball/mag.js';
import * as R from '../ball/real.js';
import { modulusUpper } from './spread.js';
import { absoluteError, timesTracked, TRACKED_ONE } from './tracked.js';

/** Longest sum (heuristic); beyond it the answer is INDETERMINATE. */
const MOST_TERMS = 40_000;
const SMALL = 1e-9;

/** The sum of the header from D_0 = `start`, one or two `upper`, integer n >= 0. */
export function logarithmicSeries(
  upper: readonly Complex[],
  n: number,
  z: Complex,
  start: Complex,
  bits: number,
): Complex {
  const sizes = upper.map((x) => magToNumber(modulusUpper(x)) * (1 + SMALL));
  const sizeZ = magToNumber(modulusUpper(z)) * (1 + SMALL);
  const from = Math.max(1, ...sizes) + 2;
  const real = [z, start, ...upper].every((x) => R.isExactZero(x.im));
  const more = 2 + sizes.length;
  let term = TRACKED_ONE;
  let factor = start;
  let sum: Complex = C.ZERO;
  let error = mag(0);
  let largest = -Infinity;
  for (let k = 0; k < MOST_TERMS; k++) {
    const size = addMag(modulusUpper(term.value), absoluteError(term));
    const grown = modulusUpper(factor);
    if (!(grown.m < Infinity && size.m < Infinity)) return C.INDETERMINATE;
    const whole = magBits(mulMag(size, addMag(grown, mag(1))));
    largest = Math.max(largest, whole);
    if (k > from && whole < largest - bits) {
      let rho = sizes.length === 1 ? sizeZ / (k + 1) : sizeZ;
      for (const s of sizes) rho *= Math.max(1, (k + s) / (k + 1));
      if (rho < 1 - SMALL) {
        const gap = 1 - rho;
        const tail = addMag(divMag(grown, mag(gap * (1 - SMALL))), mag((more / (gap * gap)) * (1 + SMALL)));
        const total = addMag(error, mulMag(size, tail));
        return { re: widenMag(sum.re, total), im: real ? sum.im : widenMag(sum.im, total) };
      }
    }
    sum = C.add(sum, C.mul(term.value, factor, bits), bits);
    error = addMag(error, mulMag(absoluteError(term), grown));
    const [one, other] = [R.fromNumber(k + 1), R.fromNumber(n + 1 + k)];
    let top = z;
    let step: Complex = C.fromReal(R.neg(R.add(R.div(R.ONE, one, bits), R.div(R.ONE, other, bits), bits)));
    for (const x of upper) {
      const at: Complex = { re: R.add(x.re, R.fromNumber(k), bits), im: x.im };
      top = C.mul(top, at, bits);
      step = C.add(step, C.inv(at, bits), bits);
    }
    const bottom = R.mul(one, other, bits);
    term = timesTracked(term, { re: R.div(top.re, bottom, bits), im: R.div(top.im, bottom, bits) }, bits);
    factor = C.add(factor, step, bits);
  }
  return C.INDETERMINATE;
}
