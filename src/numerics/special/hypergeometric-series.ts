/**
 * @module The power series Σ Π(a_i)_k/Π(b_j)_k z^k/k! in balls.
 *
 * Purpose    the common sum behind the confluent and the Gauss function.
 * Method     term by term, relative errors beside exact terms (tracked.ts); ends by itself when some a_i is exactly 0, −1, −2, ….
 * Bound      for k >= K > max|b_j| the ratio of terms is at most ρ = |z| Π (K+|a_i|)/(K−|b_i|)·E, where E = 1/(K+1) for as many a as b and
 *            E = max(1, (K+|a_last|)/(K+1)) for one a more: every factor falls with k or is below its bound. The tail from K on is then
 *            below |t_K|/(1−ρ).
 * Reference  DLMF 13.2.2, 15.2.1, 16.2.1; bound derived here.
 */
import * as C from '../ball/complex.js';
import type { Complex } from '../ball/complex.js';
import { addMag, divMag, mag, magBits, magToNumber, widenMag } from '../ball/mag.js';
import type { Mag } from '../ball/mag.js';
import * as R from '../ball/real.js';
import { modulusUpper } from './spread.js';
import { absoluteError, timesTracked, TRACKED_ONE } from './tracked.js';

/** Longest sum (heuristic); beyond it the answer is INDETERMINATE. */
const MOST_TERMS = 40_000;
const SMALL = 1e-9;

/** Σ_k Π(a)_k/Π(b)_k z^k/k! with terms down to 2^-bits of the largest; `a` has as many members as `b`, or one more. */
export function hypergeometricSeries(a: readonly Complex[], b: readonly Complex[], z: Complex, bits: number): Complex {
  const sizeA = a.map((x) => magToNumber(modulusUpper(x)) * (1 + SMALL));
  const sizeB = b.map((x) => magToNumber(modulusUpper(x)) * (1 + SMALL));
  const sizeZ = magToNumber(modulusUpper(z)) * (1 + SMALL);
  const from = Math.max(1, ...sizeB) + 1;
  const real = [z, ...a, ...b].every((x) => R.isExactZero(x.im));
  let term = TRACKED_ONE;
  let sum: Complex = C.ONE;
  let error = mag(0);
  let largest = 0;
  for (let k = 0; k < MOST_TERMS; k++) {
    term = timesTracked(term, factor(a, b, z, k, bits), bits);
    const size = modulusUpper(term.value);
    if (!(size.m < Infinity && term.error.m < Infinity)) return C.INDETERMINATE;
    if (size.m === 0) return widened(sum, error, real);
    largest = Math.max(largest, magBits(size));
    const K = k + 1;
    if (K > from && magBits(size) < largest - bits) {
      const rho = ratio(sizeA, sizeB, sizeZ, K);
      if (rho < 1) {
        const tail = divMag(addMag(size, absoluteError(term)), mag((1 - rho) * (1 - SMALL)));
        return widened(sum, addMag(error, tail), real);
      }
    }
    sum = C.add(sum, term.value, bits);
    error = addMag(error, absoluteError(term));
  }
  return C.INDETERMINATE;
}

function widened(sum: Complex, error: Mag, real: boolean): Complex {
  return { re: widenMag(sum.re, error), im: real ? sum.im : widenMag(sum.im, error) };
}

/** z Π(a_i + k)/(Π(b_j + k)(k + 1)). */
function factor(a: readonly Complex[], b: readonly Complex[], z: Complex, k: number, bits: number): Complex {
  const step = R.fromNumber(k);
  let top = z;
  let bottom: Complex = C.fromReal(R.fromNumber(k + 1));
  for (const x of a) top = C.mul(top, { re: R.add(x.re, step, bits), im: x.im }, bits);
  for (const x of b) bottom = C.mul(bottom, { re: R.add(x.re, step, bits), im: x.im }, bits);
  return C.div(top, bottom, bits);
}

function ratio(a: readonly number[], b: readonly number[], z: number, K: number): number {
  let rho = z * (1 + SMALL);
  b.forEach((y, i) => (rho *= (K + a[i]!) / (K - y)));
  const last = a.length > b.length ? a[a.length - 1]! : undefined;
  return rho * (last === undefined ? 1 / (K + 1) : Math.max(1, (K + last) / (K + 1))) * (1 + SMALL);
}
