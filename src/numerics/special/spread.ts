/**
 * @module What the uncertainty of x, w and b does to a kernel evaluated at their midpoints.
 *
 * Purpose    one set of derivative bounds for F_b, G_b (real and complex) and E₁.
 * Bound      In x: y = G_b(w) solves y′ = (1 + b/w) y − 1/w, and S(x) = −G_b(−x ± i0), F_b = Re S, solves the same with the signs of
 *            b/x − 1 and +1/x; both are y′ = a y + c with |a| <= A = 1 + |b|/ρ, |c| <= 1/ρ for |w| >= ρ. By Gronwall's
 *            inequality |y| <= Y = (|y(m)| + r/ρ) e^(rA) within distance r, so |y″| <= A(AY + 1/ρ) + |b|Y/ρ² + 1/ρ² and
 *            |y(w) − y(m)| <= r |y′(m)| + r²/2·sup|y″|, with y′(m) from the equation itself. For large |w| a better bound of y″
 *            comes from the integral, on the ray of asymptotic.ts: 2√e (b+2)^(3/2)/ρ³ for b >= −1, and, with
 *            |1+v| <= e^|v| on the ray at 3π/4, 2/(ρ/√2 − p)³ for p = −1 − b > 0, ρ/√2 > p.
 *            In b: for −1 <= Re β the integrals are below e^(π|Im β|) √(e(Re β + 2))/|w| (asymptotic.ts, |arg(1+v)| < π). Cauchy's
 *            formula on |β − b| = 1/π gives |∂y/∂b| <= π e √(e(b + 1/π + 2))/|w| <= 14.1 √(b + 2.4)/|w| for b >= −0.68;
 *            below that through w y_(b−1) = 1 − b y_b and its derivative.
 *            For E₁: |d/dw e^w E₁(w)| <= min(2/|w|, 2√2/|w|²) on the whole cut plane, from the ray at 3π/4.
 */
import * as C from '../ball/complex.js';
import type { Complex } from '../ball/complex.js';
import {
  addMag,
  addMagLower,
  divMag,
  leMag,
  mag,
  magBits,
  magLower,
  magRadius,
  magToNumber,
  magUpper,
  mulMag,
  mulMagLower,
} from '../ball/mag.js';
import type { Mag } from '../ball/mag.js';
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import type { Exponent } from './exponent.js';

const UNBOUNDED: Mag = { m: Infinity, e: 0 };
/** Precision at which slopes are computed: only their size matters. */
const SLOPE_BITS = 80;
const LOWEST = -0.68;

/** Upper bound of |z|. */
export function modulusUpper(z: Complex): Mag {
  const a = magUpper(z.re);
  const b = magUpper(z.im);
  const s = addMag(mulMag(a, a), mulMag(b, b));
  return rootUp(s);
}

/** Lower bound of |z|. */
export function modulusLower(z: Complex): Mag {
  const a = magLower(z.re);
  const b = magLower(z.im);
  const s = addMagLower(mulMagLower(a, a), mulMagLower(b, b));
  return s.m === 0 ? s : { m: Math.sqrt(s.e % 2 === 0 ? s.m : s.m * 2) * (1 - 1e-12), e: Math.floor(s.e / 2) };
}

function rootUp(s: Mag): Mag {
  return s.m === 0 ? s : mag(Math.sqrt(s.e % 2 === 0 ? s.m : s.m * 2) * (1 + 1e-12), Math.floor(s.e / 2));
}

/** Largest distance from the midpoint of the rectangle. */
export function radiusOf(z: Complex): Mag {
  const a = magRadius(z.re);
  const b = magRadius(z.im);
  return rootUp(addMag(mulMag(a, a), mulMag(b, b)));
}

/** The bound r|y′| + r²/2 sup|y″| of the header. */
function secondOrder(y: Mag, slope: Mag, low: Mag, r: Mag, b: number): Mag {
  if (r.m === 0) return r;
  if (low.m === 0) return UNBOUNDED;
  const gronwall = curvatureByEquation(y, low, r, b);
  const direct = curvatureByIntegral(low, b);
  const second = leMag(gronwall, direct) ? gronwall : direct;
  return addMag(mulMag(r, slope), mulMag(mag(0.5), mulMag(mulMag(r, r), second)));
}

function curvatureByEquation(y: Mag, low: Mag, r: Mag, b: number): Mag {
  const inverse = divMag(mag(1), low);
  const absB = mag(Math.abs(b) * (1 + 1e-12));
  const a = addMag(mag(1), mulMag(absB, inverse));
  const reach = magToNumber(mulMag(r, a));
  if (!(reach < 300)) return UNBOUNDED;
  const sup = mulMag(addMag(y, mulMag(r, inverse)), mag(Math.exp(reach) * (1 + 1e-12)));
  const first = addMag(mulMag(a, sup), inverse);
  return addMag(
    addMag(mulMag(a, first), mulMag(absB, mulMag(inverse, mulMag(inverse, sup)))),
    mulMag(inverse, inverse),
  );
}

function curvatureByIntegral(low: Mag, b: number): Mag {
  const p = -1 - b;
  if (p > 0 && !(magBits(low) > Math.log2(p) + 2)) return UNBOUNDED;
  // for p > 0: ρ/√2 − p >= ρ (1/√2 − 1/4)
  const inverse = divMag(mag(p > 0 ? 2.2 : 1), low);
  const factor = p > 0 ? 2 : 3.2975 * (b + 2) ** 1.5 * (1 + 1e-12);
  return mulMag(mag(factor), mulMag(inverse, mulMag(inverse, inverse)));
}

/** Effect of x's radius on F_b(x). */
export function spreadSame(pv: Ball, x: Ball, b: Exponent): Mag {
  if (x.rad === 0) return mag(0);
  const m = R.exactMid(x);
  const inverse = R.div(R.ONE, m, SLOPE_BITS);
  const a = R.sub(R.mul(R.fromRational(b.value, SLOPE_BITS), inverse, SLOPE_BITS), R.ONE, SLOPE_BITS);
  const slope = R.add(R.mul(a, pv, SLOPE_BITS), inverse, SLOPE_BITS);
  return secondOrder(magUpper(pv), magUpper(slope), magLower(x), magRadius(x), b.approx);
}

/** Effect of w's radius on G_b(w). */
export function spreadCut(y: Complex, w: Complex, b: Exponent): Mag {
  const r = radiusOf(w);
  if (r.m === 0) return r;
  const inverse = C.inv(C.exactMid(w), SLOPE_BITS);
  const a = C.add(C.ONE, C.mulReal(inverse, R.fromRational(b.value, SLOPE_BITS), SLOPE_BITS), SLOPE_BITS);
  const slope = C.sub(C.mul(a, y, SLOPE_BITS), inverse, SLOPE_BITS);
  return secondOrder(modulusUpper(y), modulusUpper(slope), modulusLower(w), r, b.approx);
}

/** Effect of w's radius on e^w E₁(w). */
export function spreadE1(w: Complex): Mag {
  const r = radiusOf(w);
  if (r.m === 0) return r;
  const inverse = divMag(mag(1), modulusLower(w));
  const far = mulMag(mag(2.83), mulMag(inverse, inverse));
  const near = mulMag(mag(2), inverse);
  return mulMag(r, magBits(inverse) < -0.5 ? far : near);
}

/** e^(π y), rounded up. */
function turn(y: number): Mag {
  const bits = Math.PI * y * Math.LOG2E * (1 + 1e-12);
  return mag(2 ** (bits - Math.floor(bits)) * (1 + 1e-12), Math.floor(bits));
}

/**
 * Effect of b's radius on F_b, G_b or their one-sided values at |w| >= low. `imaginary` bounds |Im b| where b is the real part of
 * a complex exponent with that radius.
 */
export function spreadExponent(b: Exponent, low: Mag, imaginary = 0): Mag {
  if (b.radius.m === 0) return b.radius;
  const r = magToNumber(b.radius);
  const bottom = b.approx - r - 1e-9;
  const top = b.approx + r + 1e-9;
  if (!(r < 1000) || low.m === 0) return UNBOUNDED;
  const n = Math.max(0, Math.ceil(LOWEST - bottom));
  const inverse = divMag(mag(1), low);
  const turned = mulMag(turn(imaginary), inverse);
  let value = mulMag(mag(Math.sqrt(Math.E * (top + n + 2)) * 1.001), turned);
  let slope = mulMag(mag(14.1 * Math.sqrt(top + n + 2.4)), turned);
  for (let k = n; k >= 1; k--) {
    const size = mag(Math.hypot(Math.max(Math.abs(bottom + k), Math.abs(top + k)), imaginary) * (1 + 1e-12));
    slope = mulMag(addMag(value, mulMag(size, slope)), inverse);
    value = mulMag(addMag(mag(1), mulMag(size, value)), inverse);
  }
  return mulMag(b.radius, slope);
}
