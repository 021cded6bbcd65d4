/**
 * @module The confluent hypergeometric functions M(a, b, z) = 1F1 and U(a, b, z).
 *
 * Purpose    Laplace integrals of branch points with a power in front: z^a U(a, b, z) = (z^a/Γ(a)) ∫ e^(−zt) t^(a−1) (1+t)^(b−a−1) dt.
 * Method     M: the series, for Re z < 0 after Kummer's transformation. U: finite sums where a or a−b+1 is 0, −1, −2, …; the asymptotic
 *            series; otherwise the connection formula with M, for integer b its limit with logarithm and ψ.
 * Bound      series: hypergeometric-series.ts. Asymptotic series, Re z >= 0, Re a > 0, c = a−b+1: with Taylor's formula for (1+t)^(−c)
 *            under the integral, on the ray zt > 0 where |1+θt| >= 1, the remainder after n >= −Re c terms is at most
 *            |(c)_n|/n!·e^(π(|Im a|+|Im c|)/2) Γ(Re a + n)/|Γ(a)|·|z|^(−Re a−n).
 * Reference  DLMF 13.2.2, 13.2.9, 13.2.39–13.2.42, 13.7.3; the remainder is derived here.
 */
import * as C from '../ball/complex.js';
import type { Complex } from '../ball/complex.js';
import { cexp, clog, cpow } from '../ball/complex-elementary.js';
import { addMag, mag, magBits, magToNumber, widenMag } from '../ball/mag.js';
import * as R from '../ball/real.js';
import { digammaComplex } from './digamma-complex.js';
import { gamma } from './gamma.js';
import { gammaComplex, rgammaComplex } from './gamma-complex.js';
import { hypergeometricSeries } from './hypergeometric-series.js';
import { logarithmicSeries } from './logarithmic-series.js';
import { difference, endsSeries, integer, minus, parameter, plus, sharpen } from './parameter.js';
import type { Given, Parameter } from './parameter.js';
import { modulusLower, modulusUpper } from './spread.js';
import { absoluteError, timesTracked, TRACKED_ONE } from './tracked.js';

/** |z| beyond this is refused to the convergent series (heuristic). */
const FAR = 1 << 14;
const ROUGH = 60;

/** M(a, b, z) = Σ (a)_k/(b)_k z^k/k!. INDETERMINATE where b is 0, −1, … or |z| > 16384. */
export function kummerM(a: Given, b: Given, z: Given, prec: number): Complex {
  const [A, B, Z] = [parameter(a), parameter(b), parameter(z)];
  return C.round(
    sharpen(prec, prec + 20, (bits) => seriesM(A, B, Z.at(bits), bits)),
    prec,
  );
}

function seriesM(a: Parameter, b: Parameter, Z: Complex, bits: number): Complex {
  if (!(magToNumber(modulusUpper(Z)) < FAR)) return C.INDETERMINATE;
  if (endsSeries(a) || R.toNumber(Z.re) >= 0) return hypergeometricSeries([a.at(bits)], [b.at(bits)], Z, bits);
  const other = hypergeometricSeries([difference(b, a).at(bits)], [b.at(bits)], C.neg(Z), bits);
  return C.mul(cexp(Z, bits), other, bits);
}

/** U(a, b, z) on the principal branch, |arg z| < π. INDETERMINATE where z may be on the cut or 0. */
export function kummerU(a: Given, b: Given, z: Given, prec: number): Complex {
  const [A, B, Z] = [parameter(a), parameter(b), parameter(z)];
  const rough = Z.at(ROUGH);
  if (!R.isPositive(rough.re) && R.containsZero(rough.im)) return C.INDETERMINATE;
  const c = plus(difference(A, B), 1);
  const value =
    endsSeries(A) || endsSeries(c)
      ? sharpen(prec, prec + 20, (bits) => polynomial(A, B, c, Z.at(bits), bits))
      : (asymptotic(A, B, c, Z.at(prec + 24), prec, prec + 24) ??
        sharpen(prec, prec + 20 + cancelled(B, rough), (bits) => connected(A, B, c, Z.at(bits), bits)));
  return C.round(value, prec);
}

/** Bits that the convergent series lose: their terms reach e^|z|, the results do not. */
function cancelled(b: Parameter, z: Complex): number {
  const { re, im } = C.toNumbers(z);
  const size = Math.hypot(re, im);
  if (!(size < FAR)) return 0;
  return Math.ceil(Math.LOG2E * (integer(b) === undefined && re < 0 ? size + re : size));
}

function polynomial(a: Parameter, b: Parameter, c: Parameter, z: Complex, bits: number): Complex {
  if (endsSeries(a)) return finite(a, c, z, bits);
  return C.mul(power(z, difference(parameter(1), b), bits), finite(c, a, z, bits), bits);
}

const power = (z: Complex, p: Parameter, bits: number): Complex => cpow(z, p.at(bits), bits);

/** z^−a Σ (a)_k (c)_k/k! (−1/z)^k for a = −n; c = a − b + 1. */
function finite(a: Parameter, c: Parameter, z: Complex, bits: number): Complex {
  const n = -integer(a)!;
  const inverse = C.neg(C.inv(z, bits));
  const [A, Cc] = [a.at(bits), c.at(bits)];
  let term: Complex = C.ONE;
  let sum: Complex = C.ONE;
  for (let k = 0; k < n; k++) {
    term = C.mul(C.mul(term, inverse, bits), C.mul(shifted(A, k, bits), shifted(Cc, k, bits), bits), bits);
    term = divide(term, k + 1, bits);
    sum = C.add(sum, term, bits);
  }
  let z0: Complex = C.ONE;
  for (let k = 0; k < n; k++) z0 = C.mul(z0, z, bits);
  return C.mul(z0, sum, bits);
}

const shifted = (x: Complex, k: number, bits: number): Complex => ({
  re: R.add(x.re, R.fromNumber(k), bits),
  im: x.im,
});
const divide = (x: Complex, k: number, bits: number): Complex => {
  const d = R.fromNumber(k);
  return { re: R.div(x.re, d, bits), im: R.div(x.im, d, bits) };
};

/** The asymptotic series; undefined when it cannot reach 2^-prec, or its bound does not hold. */
function asymptotic(
  a: Parameter,
  b: Parameter,
  c: Parameter,
  z: Complex,
  prec: number,
  bits: number,
): Complex | undefined {
  if (!(R.toNumber(z.re) >= 0) || R.isNegative(z.re)) return undefined;
  const [ra, rc] = [R.toNumber(a.at(ROUGH).re), R.toNumber(c.at(ROUGH).re)];
  if (ra > 0.01) return expansion(a, c, z, prec, bits);
  if (rc <= 0.01) return undefined;
  // z^(1−b) U(a−b+1, 2−b, z) exchanges a and c.
  const value = expansion(c, a, z, prec, bits);
  return value === undefined ? undefined : C.mul(power(z, difference(parameter(1), b), bits), value, bits);
}

function expansion(a: Parameter, c: Parameter, z: Complex, prec: number, bits: number): Complex | undefined {
  const [A, Cc] = [a.at(bits), c.at(bits)];
  const size = magToNumber(modulusLower(z));
  const re = R.toNumber(A.re);
  if (!(size * Math.LOG2E > prec) || !(Math.abs(re) + Math.abs(R.toNumber(Cc.re)) < size)) return undefined;
  const turn = 0.5 * Math.PI * (Math.abs(R.toNumber(A.im)) + Math.abs(R.toNumber(Cc.im))) * Math.LOG2E + 0.1;
  // Γ(Re a)/|Γ(a)| once; then (Re a)_n grows with the terms.
  const ratio =
    magBits(modulusUpper(C.fromReal(gamma(A.re, ROUGH)))) + magBits(modulusUpper(rgammaComplex(A, ROUGH))) + turn;
  const inverse = C.neg(C.inv(z, bits));
  const real = [z, A, Cc].every((x) => R.isExactZero(x.im));
  let term = TRACKED_ONE;
  let sum: Complex = C.ONE;
  let noise = mag(0);
  let rising = 0; // log2 of Π (Re a + k)|c + k|/((k+1)|z|)
  for (let k = 0; k + re < size; k++) {
    const factor = modulusUpper(shifted(Cc, k, ROUGH));
    rising += Math.log2(re + k + 1e-9) + magBits(factor) - Math.log2((k + 1) * size) + 1e-9;
    const step = C.mul(inverse, C.mul(shifted(A, k, bits), shifted(Cc, k, bits), bits), bits);
    term = timesTracked(term, divide(step, k + 1, bits), bits);
    if (k + 1 + R.toNumber(Cc.re) > 1e-6 && rising + ratio < -prec - 8) {
      const rest = addMag(noise, mag(1, Math.ceil(Math.max(rising + ratio, -1e9))));
      const wide: Complex = { re: widenMag(sum.re, rest), im: real ? sum.im : widenMag(sum.im, rest) };
      return C.mul(power(z, minus(a), bits), wide, bits);
    }
    sum = C.add(sum, term.value, bits);
    noise = addMag(noise, absoluteError(term));
  }
  return undefined;
}

function connected(a: Parameter, b: Parameter, c: Parameter, z: Complex, bits: number): Complex {
  if (!(magToNumber(modulusUpper(z)) < FAR)) return C.INDETERMINATE;
  const n = integer(b);
  if (n !== undefined) {
    if (n >= 1) return logarithmic(a, n - 1, z, bits);
    // U(a, b, z) = z^(1−b) U(c, 2−b, z)
    return C.mul(power(z, parameter(1 - n), bits), logarithmic(c, 1 - n, z, bits), bits);
  }
  const one = parameter(1);
  const first = seriesM(a, b, z, bits);
  const second = seriesM(c, difference(parameter(2), b), z, bits);
  const less = difference(one, b);
  const p = C.mul(gammaComplex(less.at(bits), bits), rgammaComplex(c.at(bits), bits), bits);
  const q = C.mul(gammaComplex(minus(less).at(bits), bits), rgammaComplex(a.at(bits), bits), bits);
  return C.add(C.mul(p, first, bits), C.mul(C.mul(q, power(z, less, bits), bits), second, bits), bits);
}

/** U(a, n+1, z), DLMF 13.2.9. */
function logarithmic(a: Parameter, n: number, z: Complex, bits: number): Complex {
  const A = a.at(bits);
  let finiteSum: Complex = C.ZERO;
  if (n > 0) {
    // Σ_{k=1}^n (k−1)! (1−a+k)_(n−k)/(n−k)! z^−k, from k = n downward
    const inverse = C.inv(z, bits);
    let coefficient: Complex = C.ONE;
    let factorial: Complex = C.ONE;
    for (let k = 1; k < n; k++) factorial = C.mulReal(factorial, R.fromNumber(k), bits);
    let zPower: Complex = C.ONE;
    for (let k = 0; k < n; k++) zPower = C.mul(zPower, inverse, bits);
    for (let k = n; k >= 1; k--) {
      finiteSum = C.add(finiteSum, C.mul(C.mul(coefficient, factorial, bits), zPower, bits), bits);
      if (k === 1) break;
      const low = C.sub(C.fromReal(R.fromNumber(k)), A, bits); // 1 − a + (k−1)
      coefficient = divide(C.mul(coefficient, low, bits), n - k + 1, bits);
      factorial = divide(factorial, k - 1, bits);
      zPower = C.mul(zPower, z, bits);
    }
    finiteSum = C.mul(finiteSum, rgammaComplex(A, bits), bits);
  }
  const front = rgammaComplex(plus(a, -n).at(bits), bits);
  if (R.isExactZero(front.re) && R.isExactZero(front.im)) return finiteSum;
  let psi = C.sub(C.add(clog(z, bits), digammaComplex(A, bits), bits), digammaComplex(C.ONE, bits), bits);
  psi = C.sub(psi, digammaComplex(C.fromReal(R.fromNumber(n + 1)), bits), bits);
  const sum = logarithmicSeries([A], n, z, psi, bits);
  let f: Complex = C.mul(front, sum, bits);
  for (let k = 2; k <= n; k++) f = divide(f, k, bits);
  return C.add(n % 2 === 1 ? f : C.neg(f), finiteSum, bits);
}
