/**
 * @module The Gauss hypergeometric function 2F1(a, b; c; z) on the plane cut along [1, ∞).
 *
 * Purpose    Borel transforms with one finite branch point, and their values off the cut.
 * Method     the power series in whichever of z, z/(z−1), 1−z, 1/(1−z) is smallest in modulus (the first two are preferred: they need no Γ
 *            functions). At 1−z: the connection formula, for c−a−b an integer its limit with logarithm and ψ; 1/(1−z) is 1−w at
 *            w = z/(z−1) after Pfaff's transformation. At z = 1 exactly: Gauss's sum.
 * Bound      hypergeometric-series.ts, logarithmic-series.ts; the rest is ball arithmetic. Next to e^(±iπ/3), where all four are 1, the series
 *            grow long and the answer may be INDETERMINATE.
 * Reference  DLMF 15.2.1, 15.4.20, 15.8.1, 15.8.4, 15.8.10.
 */
import * as C from '../ball/complex.js';
import type { Complex } from '../ball/complex.js';
import { clog, cpow } from '../ball/complex-elementary.js';
import * as R from '../ball/real.js';
import { digammaComplex } from './digamma-complex.js';
import { gammaComplex, rgammaComplex } from './gamma-complex.js';
import { hypergeometricSeries } from './hypergeometric-series.js';
import { logarithmicSeries } from './logarithmic-series.js';
import { difference, endsSeries, integer, minus, parameter, plus, sharpen } from './parameter.js';
import type { Given, Parameter } from './parameter.js';

/** A series in a variable of at most this modulus is used without looking further (heuristic). */
const NEAR = 0.75;

/** 2F1(a, b; c; z), principal branch. INDETERMINATE on the cut, at the poles c = 0, −1, … and where nothing converges. */
export function gauss(a: Given, b: Given, c: Given, z: Given, prec: number): Complex {
  const [A, B, D, Z] = [parameter(a), parameter(b), parameter(c), parameter(z)];
  return C.round(
    sharpen(prec, prec + 20, (bits) => evaluate(A, B, D, Z, bits)),
    prec,
  );
}

function evaluate(a: Parameter, b: Parameter, c: Parameter, z: Parameter, bits: number): Complex {
  const Z = z.at(bits);
  if (endsSeries(a) || endsSeries(b)) return series(a, b, c, Z, bits);
  const U = difference(parameter(1), z).at(bits); // 1 − z
  if (R.isExactZero(U.re) && R.isExactZero(U.im)) return atOne(a, b, c, bits);
  const direct = modulus(Z);
  if (direct <= NEAR) return series(a, b, c, Z, bits);
  if (!R.isPositive(U.re) && R.containsZero(U.im)) return C.INDETERMINATE;
  const unit = modulus(U);
  const sizes = [direct, direct / unit, unit, 1 / unit];
  const best = sizes[1]! <= NEAR ? 1 : sizes.indexOf(Math.min(...sizes));
  if (best === 0) return series(a, b, c, Z, bits);
  if (best === 2) return oneMinus(a, b, c, U, bits);
  // (1−z)^−a F(a, c−b; c; z/(z−1))
  const front = cpow(U, minus(a).at(bits), bits);
  const other = difference(c, b);
  const inner =
    best === 1 ? series(a, other, c, C.neg(C.div(Z, U, bits)), bits) : oneMinus(a, other, c, C.inv(U, bits), bits);
  return C.mul(front, inner, bits);
}

function modulus(z: Complex): number {
  const { re, im } = C.toNumbers(z);
  return Math.hypot(re, im);
}

function series(a: Parameter, b: Parameter, c: Parameter, z: Complex, bits: number): Complex {
  return hypergeometricSeries([a.at(bits), b.at(bits)], [c.at(bits)], z, bits);
}

/** Γ(c) Γ(c−a−b)/(Γ(c−a) Γ(c−b)) for Re(c−a−b) > 0. */
function atOne(a: Parameter, b: Parameter, c: Parameter, bits: number): Complex {
  const excess = difference(difference(c, a), b).at(bits);
  if (!R.isPositive(excess.re)) return C.INDETERMINATE;
  const top = C.mul(gammaComplex(c.at(bits), bits), gammaComplex(excess, bits), bits);
  const bottom = C.mul(
    rgammaComplex(difference(c, a).at(bits), bits),
    rgammaComplex(difference(c, b).at(bits), bits),
    bits,
  );
  return C.mul(top, bottom, bits);
}

/** F at z = 1 − u, |u| < 1, |arg u| < π. */
function oneMinus(a: Parameter, b: Parameter, c: Parameter, u: Complex, bits: number): Complex {
  const excess = difference(difference(c, a), b);
  const m = integer(excess);
  const [ca, cb] = [difference(c, a), difference(c, b)];
  if (m !== undefined) {
    if (m >= 0) return logarithmic(a, b, c, m, u, bits);
    return C.mul(cpow(u, excess.at(bits), bits), logarithmic(ca, cb, c, -m, u, bits), bits);
  }
  const one = parameter(1);
  const scale = gammaComplex(c.at(bits), bits);
  const p = C.mul(
    gammaComplex(excess.at(bits), bits),
    C.mul(rgammaComplex(ca.at(bits), bits), rgammaComplex(cb.at(bits), bits), bits),
    bits,
  );
  const q = C.mul(
    gammaComplex(minus(excess).at(bits), bits),
    C.mul(rgammaComplex(a.at(bits), bits), rgammaComplex(b.at(bits), bits), bits),
    bits,
  );
  const first = C.mul(p, series(a, b, difference(one, excess), u, bits), bits);
  const second = C.mul(q, C.mul(cpow(u, excess.at(bits), bits), series(ca, cb, plus(excess, 1), u, bits), bits), bits);
  return C.mul(scale, C.add(first, second, bits), bits);
}

/** c = a + b + m, m >= 0: DLMF 15.8.10. */
function logarithmic(a: Parameter, b: Parameter, c: Parameter, m: number, u: Complex, bits: number): Complex {
  const [am, bm] = [plus(a, m).at(bits), plus(b, m).at(bits)];
  const scale = gammaComplex(c.at(bits), bits);
  let finite: Complex = C.ZERO;
  if (m > 0) {
    // Σ_{k<m} (a)_k (b)_k (m−k−1)!/k! (−u)^k
    const [A, B] = [a.at(bits), b.at(bits)];
    let term: Complex = C.ONE;
    for (let k = 2; k < m; k++) term = C.mulReal(term, R.fromNumber(k), bits);
    for (let k = 0; k < m; k++) {
      finite = C.add(finite, term, bits);
      if (k + 1 === m) break;
      const step = C.mul(C.mul(at(A, k, bits), at(B, k, bits), bits), C.neg(u), bits);
      const d = R.fromNumber((k + 1) * (m - k - 1));
      const t = C.mul(term, step, bits);
      term = { re: R.div(t.re, d, bits), im: R.div(t.im, d, bits) };
    }
    finite = C.mul(finite, C.mul(rgammaComplex(am, bits), rgammaComplex(bm, bits), bits), bits);
  }
  let factorial: Complex = C.ONE;
  let power: Complex = C.ONE;
  for (let k = 1; k <= m; k++) {
    factorial = C.mulReal(factorial, R.fromNumber(k), bits);
    power = C.mul(power, C.neg(u), bits);
  }
  let start = C.add(clog(u, bits), C.add(digammaComplex(am, bits), digammaComplex(bm, bits), bits), bits);
  start = C.sub(
    start,
    C.add(digammaComplex(C.ONE, bits), digammaComplex(C.fromReal(R.fromNumber(m + 1)), bits), bits),
    bits,
  );
  const sum = logarithmicSeries([am, bm], m, u, start, bits);
  const front = C.mul(rgammaComplex(a.at(bits), bits), rgammaComplex(b.at(bits), bits), bits);
  const rest = C.div(C.mul(C.mul(front, power, bits), sum, bits), factorial, bits);
  return C.mul(scale, C.sub(finite, rest, bits), bits);
}

const at = (x: Complex, k: number, bits: number): Complex => ({ re: R.add(x.re, R.fromNumber(k), bits), im: x.im });
