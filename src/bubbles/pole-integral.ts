/**
 * @module Laplace integrals of single poles, as functionals: J_m(p) = ∫_0^∞ e^(−zu) (u − p)^(−m) du.
 *
 * Plain      z = L > 0 real. p < 0: J_1 = e^x E₁(x), x = |p|L. p > 0, principal value: J_1 = −e^(−x) Ei(x).
 * Sine       Im/π of the same with z = L − iπ, for the kernel sin(πu)/π: e^(−zu) = e^(−Lu)(cos πu + i sin πu). p > 0,
 *            average of the contours above and below: J_1 = e^(−zp) [E₁(−zp) + iπ]; the second term is the residual.
 * All m      m J_(m+1) = (−p)^(−m) − z J_m. p = 0: the finite part, J_(m+1) = ((−z)^m/m!)(H_m − γ − ln z); the poles at
 *            u = 0 cancel in every quantity, and so do the logarithms of the cut-off that the finite part drops.
 * Masses     p = −(first + k): J_1 = ∫ dv e^(−|p|v)/(v + z); p = +(first + k): principal value of ∫ dv e^(−pv)/(v − z). With a
 *            polynomial |P| <= 1, |P′| <= 2n² in x = e^(−v) beside it, the principal value is below
 *            ∫_{2z}^∞ e^(−first·v)/(v−z) dv + 2z sup|d/dv| <= 1/(z·first) + 2z(2n² + first + 1). For z = L − iπ: |v − z| >= π.
 *            J_2 has v/(v ± z) = 1 ∓ z/(v ± z) there, J_3 half of v²/(v ± z), and so on.
 * Reference  DLMF 6.2; finite parts: M. J. Lighthill, "Fourier analysis and generalised functions" (1958) (from memory).
 */
import { C, R, Rational, cexp, clog, eiScaled, eulerGamma, pi, scaledE1 } from '../numerics/index.js';
import type { Ball, Complex } from '../numerics/index.js';
import type { Functional } from './functional.js';

/** Mass of order m from that of order 1: |v^(m−1)/(m−1)! /(v ± z)| split into a polynomial and z^(m−1) of the first. */
function massOfOrder(one: number, size: number, first: number, m: number): number {
  // (m−1) mass_m <= ∫ v^(m−2)/(m−2)! e^(−first·v) dv + |z| mass_(m−1).
  let mass = one;
  for (let k = 1; k < m; k++) mass = (first ** -k + size * mass) / k;
  return mass;
}

/** J_1 … J_orders from J_1 at p ≠ 0. */
function raised(one: Complex, at: Rational, z: Complex, orders: number, prec: number): Complex[] {
  const list = [one];
  const back = at.neg();
  for (let m = 1; m < orders; m++) {
    const step = C.sub(C.fromReal(R.fromRational(back.pow(-m), prec)), C.mul(z, list[m - 1]!, prec), prec);
    list.push(C.mulReal(step, R.fromRational(Rational.of(1, m), prec), prec));
  }
  return list;
}

/** Finite parts at p = 0. */
function atOrigin(z: Complex, orders: number, prec: number): Complex[] {
  const start = C.neg(C.add(clog(z, prec), C.fromReal(eulerGamma(prec)), prec));
  const list: Complex[] = [];
  let power: Complex = C.ONE;
  let harmonic = Rational.ZERO;
  for (let m = 0; m < orders; m++) {
    if (m > 0) {
      power = C.mulReal(C.mul(power, C.neg(z), prec), R.fromRational(Rational.of(1, m), prec), prec);
      harmonic = harmonic.add(Rational.of(1, m));
    }
    list.push(C.mul(power, C.add(start, C.fromReal(R.fromRational(harmonic, prec)), prec), prec));
  }
  return list;
}

/** (−z)^(m−1)/(m−1)! · start, for m = 1 … orders: what a residue at p makes of e^(−zu). */
function derivatives(start: Complex, z: Complex, orders: number, prec: number): Complex[] {
  const list = [start];
  for (let m = 1; m < orders; m++) {
    const next = C.mul(list[m - 1]!, C.neg(z), prec);
    list.push(C.mulReal(next, R.fromRational(Rational.of(1, m), prec), prec));
  }
  return list;
}

/** The principal value of ∫_0^∞ e^(−Lu) b(u) du, L > 0. */
export function plainLaplace(L: Ball, prec: number): Functional {
  const z = C.fromReal(L);
  const size = R.toNumber(L);
  return {
    moments(at, orders) {
      if (at.isZero()) return atOrigin(z, orders, prec).map(({ re }) => re);
      const x = R.mul(R.fromRational(at.abs(), prec), L, prec);
      const one = at.sign() < 0 ? scaledE1(C.fromReal(x), prec) : C.fromReal(R.neg(eiScaled(x, prec)));
      return raised(one, at, z, orders, prec).map(({ re }) => re);
    },
    mass(side, first, m, n) {
      const one = side === 'ultraviolet' ? 1 / (size * first) : 1 / (size * first) + 2 * size * (2 * n * n + first + 1);
      return massOfOrder(one, size, first, m);
    },
    // |e^(−x) Ei(x)| <= 1 + |ln x| for all x > 0 (the maximum for x > 1 is 0.7, and Ei(x) > ln x + γ below).
    bound: (first, m) => massOfOrder(1 + Math.abs(Math.log(Math.min(1, size * first))), size, first, m),
  };
}

const overPi = (list: readonly Complex[], prec: number): Ball[] => list.map(({ im }) => R.div(im, pi(prec), prec));

/** The principal value of ∫_0^∞ e^(−Lu) (sin πu/π) b(u) du, L > 0. */
export function sineLaplace(L: Ball, prec: number): Functional {
  const z: Complex = { re: L, im: R.neg(pi(prec)) };
  const size = Math.hypot(R.toNumber(L), Math.PI) * 1.001;
  const decay = Math.exp(-R.toNumber(L)) * 1.0000001;
  return {
    moments(at, orders) {
      if (at.isZero()) return overPi(atOrigin(z, orders, prec), prec);
      const w = C.mulReal(z, R.fromRational(at.neg(), prec), prec);
      return overPi(raised(scaledE1(w, prec), at, z, orders, prec), prec);
    },
    residual: {
      at(at, orders) {
        const e = cexp(C.mulReal(z, R.fromRational(at.neg(), prec), prec), prec);
        const start: Complex = { re: R.neg(R.mul(e.im, pi(prec), prec)), im: R.mul(e.re, pi(prec), prec) };
        return overPi(derivatives(start, z, orders, prec), prec);
      },
      bound: (first, m) => size ** (m - 1) * decay ** first,
      decay,
    },
    // Over π, like the values: |v − z| >= π on the infrared side, |v + z| >= |z| on the other.
    mass: (side, first, m) =>
      massOfOrder(1 / ((side === 'infrared' ? Math.PI : size * 0.998) * first), size, first, m) / Math.PI,
    bound: (first, m) =>
      massOfOrder(1 / (Math.PI * first), size, first, m) / Math.PI + size ** (m - 1) * decay ** first,
  };
}

/** Σ Res of e^(−zu) b(u) over the poles p > 0. */
export function plainResidue(L: Ball, prec: number): Functional {
  const z = C.fromReal(L);
  const size = R.toNumber(L) * 1.001;
  const of = (first: number, m: number): number => Math.exp(-size * 0.999 * first) * 1.001 * size ** (m - 1);
  return {
    moments(at, orders) {
      if (at.sign() <= 0) return Array.from({ length: orders }, () => R.ZERO);
      const e = cexp(C.mulReal(z, R.fromRational(at.neg(), prec), prec), prec);
      return derivatives(e, z, orders, prec).map(({ re }) => re);
    },
    mass: (side, first, m) => (side === 'infrared' ? of(first, m) : 0),
    bound: of,
  };
}

/** Σ Res of e^(−Lu) (sin πu/π) b(u) over the poles p > 0: all of it residual. */
export function sineResidue(L: Ball, prec: number): Functional {
  const z: Complex = { re: L, im: R.neg(pi(prec)) };
  const size = Math.hypot(R.toNumber(L), Math.PI) * 1.001;
  const decay = Math.exp(-R.toNumber(L)) * 1.0000001;
  return {
    moments: (_at, orders) => Array.from({ length: orders }, () => R.ZERO),
    residual: {
      at(at, orders) {
        const e = cexp(C.mulReal(z, R.fromRational(at.neg(), prec), prec), prec);
        return overPi(derivatives(e, z, orders, prec), prec);
      },
      bound: (first, m) => size ** (m - 1) * decay ** first,
      decay,
    },
    mass: () => Number.MIN_VALUE,
    bound: (first, m) => size ** (m - 1) * decay ** first,
  };
}
