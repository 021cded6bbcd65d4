/**
 * @module Fixed-order and contour-improved series of a contour quantity with the gluon condensate's renormalon subtracted.
 *
 * Method     D − (R²/(−s))² K C Σ r_l ā(R²)^l, re-expanded at one scale: for the fixed-order series in x(s_0), for the
 *            contour-improved one in x(−s), where the logarithm ln(R²/(−s)) is complex. To both the principal value
 *            K (R²/s_0)² c̄(R²) (1/2πi) ∮ dx/x W (−x)^(−2) C(x(−s)) is added back, so that R drops out of what they tend to.
 *            A weight without x² leaves the fixed-order series nearly as it was, and moves the contour-improved one to it.
 * Bound      converged, as the contour integrals.
 * Reference  M. Benitez-Rathgeb, D. Boito, A. H. Hoang, M. Jamin, arXiv:2202.10957, 2207.01116 (abstracts read).
 */
import { C, exact, mulExact, R } from '../numerics/index.js';
import type { Ball, Complex, Exact, Rational } from '../numerics/index.js';
import {
  circleMoments,
  exactInPiSquared,
  expandOnCircle,
  liftExact,
  mulSeries,
  compose,
  scaleRelation,
} from '../qcd/index.js';
import type { Refusal } from '../qcd/index.js';
import type { ContourOrigin } from '../series/index.js';
import { renormalonIntegral, subtractionSeries } from './condensate.js';
import { circleIntegrals } from './integrate.js';

export interface Subtraction {
  /** K of the renormalon of D. */
  readonly strength: Exact;
  /** R²/Q², and ln(R²/μ²), μ the scale of x. */
  readonly ratioSquared: Rational;
  readonly log: Exact;
  /** C_1, C_2, … of the condensate's coefficient function. */
  readonly wilson: readonly Exact[];
}

export interface SubtractedSeries {
  /** What is subtracted at x^1, x^2, …, as numbers (powers of the coupling included). */
  readonly fixedOrder: readonly Ball[];
  readonly improved: readonly Ball[];
  readonly addedBack: Ball;
}

/** The dimension of the condensate over two. */
const K = 2;

/** What is subtracted from the fixed-order series: coefficients of x^1 … x^n, for K (R²/Q²)² = 1. */
function fixedOrderPart(origin: ContourOrigin, s: Subtraction, n: number): Exact[] {
  const { atR, beta } = subtractionSeries(origin, [], n);
  const moments = circleMoments(origin.integral, n, K).map(exactInPiSquared);
  const coefficients = Array.from({ length: n }, (_, k) => (k === 0 ? exact(1) : (s.wilson[k - 1] ?? exact(0))));
  const around = expandOnCircle(coefficients, exact(0), beta, moments);
  const relation = scaleRelation(beta, s.log, n);
  return liftExact([...atR, ...relation, ...around], (ring, x) => {
    const moved = compose(ring, [ring.zero, ...x.slice(0, n)], [ring.zero, ...x.slice(n, 2 * n)], n + 1);
    return mulSeries(ring, moved, x.slice(2 * n), n + 1).slice(1);
  });
}

/** What is subtracted at each order, and what is added back. D must start at the first power of the coupling. */
export function subtractedSeries(
  origin: ContourOrigin,
  x: Exact,
  s: Subtraction,
  digits: number,
): SubtractedSeries | Refusal {
  const n = origin.coefficients.length;
  const prec = Math.ceil(digits * 3.33) + 60;
  const { withLogs } = subtractionSeries(origin, s.wilson, n);
  const rows = withLogs.map((row) => row.map((c) => c.ball(prec + 40)));
  const log = s.log.ball(prec + 40);
  const wilson = s.wilson.map((c) => c.ball(prec + 40));
  const integrals = circleIntegrals(
    origin,
    x,
    (point, bits) => {
      const L: Complex = { re: log, im: R.neg(point.angle) };
      const back = C.conj(C.sqr(point.phase, bits));
      let weight = C.mul(point.weight, back, bits);
      // C(x(−s)), for what is added back.
      let coefficient: Complex = C.ZERO;
      for (let k = wilson.length - 1; k >= 0; k--)
        coefficient = C.mul(C.add(coefficient, C.fromReal(wilson[k]!), bits), point.x, bits);
      const list = [C.mul(weight, C.add(C.ONE, coefficient, bits), bits)];
      for (const row of rows) {
        weight = C.mul(weight, point.x, bits);
        let sum: Complex = C.ZERO;
        for (let k = row.length - 1; k >= 0; k--) sum = C.add(C.mul(sum, L, bits), C.fromReal(row[k]!), bits);
        list.push(C.mul(weight, sum, bits));
      }
      return list;
    },
    digits + GUARD_DIGITS,
  );
  if ('reason' in integrals) return integrals;
  const whole = renormalonIntegral(origin, x, s.log, prec);
  if ('reason' in whole) return whole;
  const front = mulExact(s.strength, exact(s.ratioSquared.mul(s.ratioSquared))).ball(prec);
  const [around = R.INDETERMINATE, ...terms] = integrals;
  let power = front;
  const base = x.ball(prec);
  return {
    fixedOrder: fixedOrderPart(origin, s, n).map((c) => {
      power = R.mul(power, base, prec);
      return R.mul(c.ball(prec), power, prec);
    }),
    improved: terms.map((t) => R.mul(front, t, prec)),
    addedBack: R.mul(front, R.mul(whole, around, prec), prec),
  };
}

/** Small parts are resolved relative to the largest. */
const GUARD_DIGITS = 6;
