/**
 * @module Gauss–Legendre panels along a polygon in the complex plane, with a two-level error estimate.
 *
 * Purpose    integrals along a rotated ray or a path around singularities, of functions that are smooth on each panel.
 * Method     the n-point rule on every piece, then on its two halves; the halves are the value.
 * Bound      none proved: the radius is the difference of the two levels plus the rounding errors. For functions analytic around a
 *            piece the halves are more accurate than that by many orders, so the estimate is on the safe side. Converged.
 * Reference  DLMF 3.5(v).
 */
import * as C from '../ball/complex.js';
import type { Complex } from '../ball/complex.js';
import { addMag, widenMag } from '../ball/mag.js';
import type { Mag } from '../ball/mag.js';
import * as R from '../ball/real.js';
import { modulusUpper } from '../special/spread.js';
import { legendreRule } from './legendre.js';
import type { Rule } from './legendre.js';
import type { Integral, Integrand } from './types.js';

/** ∫_a^b f by the rule on the straight piece. */
export function onPiece(f: Integrand, a: Complex, b: Complex, rule: Rule, prec: number): Complex {
  const half = C.mul2exp(C.sub(b, a, prec), -1);
  const centre = C.mul2exp(C.add(a, b, prec), -1);
  let sum: Complex = rule.middle === undefined ? C.ZERO : C.mulReal(f(centre, prec), rule.middle, prec);
  rule.nodes.forEach((x, i) => {
    const step = C.mulReal(half, x, prec);
    const pair = C.add(f(C.add(centre, step, prec), prec), f(C.sub(centre, step, prec), prec), prec);
    sum = C.add(sum, C.mulReal(pair, rule.weights[i]!, prec), prec);
  });
  return C.mul(sum, half, prec);
}

/** ∫ f along the straight pieces through `points` (two or more), n nodes a piece. */
export function gaussPanels(f: Integrand, points: readonly Complex[], n: number, prec: number): Integral {
  const rule = legendreRule(n, prec);
  const work = prec + 10;
  let value: Complex = C.ZERO;
  let error: Mag = { m: 0, e: 0 };
  for (let i = 1; i < points.length; i++) {
    const [a, b] = [points[i - 1]!, points[i]!];
    const middle = C.exactMid(C.mul2exp(C.add(a, b, work), -1));
    const whole = onPiece(f, a, b, rule, work);
    const halves = C.add(onPiece(f, a, middle, rule, work), onPiece(f, middle, b, rule, work), work);
    error = addMag(error, modulusUpper(C.exactMid(C.sub(halves, whole, work))));
    value = C.add(value, halves, work);
  }
  const wide: Complex = { re: widenMag(value.re, error), im: widenMag(value.im, error) };
  return { value: C.round(wide, prec), standing: 'converged', evaluations: 3 * n * Math.max(0, points.length - 1) };
}

/** Points r_k e^(iθ) of a ray from the origin: 0, the first length, and then growing by the factor up to the last. */
export function rayPoints(direction: Complex, first: number, last: number, factor: number, prec: number): Complex[] {
  const out: Complex[] = [C.ZERO];
  for (let r = first; ; r *= factor) {
    out.push(C.exactMid(C.mulReal(direction, R.fromNumber(Math.min(r, last)), prec)));
    if (r >= last) return out;
  }
}
