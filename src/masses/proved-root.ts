/**
 * @module A root of an increasing function in balls, proved by a change of sign.
 * Method  chord steps with the slope at the start; then f(x − δ) < 0 < f(x + δ). The ball is twice as wide, since the ends may
 *         have been rounded when f looked at them.
 * Bound   the ball holds a root; INDETERMINATE when the signs cannot be decided.
 */
import { R, type Ball } from '../numerics/index.js';

const STEPS = 400;
/** Tries to prove the bracket, doubling its width each time. */
const WIDENINGS = 12;

/** @param f encloses the function at a point; @param start near the root; @param slope f′ there, > 0, to a few digits. */
export function provedRoot(f: (x: Ball) => Ball, start: Ball, slope: number, prec: number): Ball {
  const inverse = R.fromNumber(1 / slope);
  let x = R.exactMid(start);
  let size = Infinity;
  for (let k = 0; k < STEPS; k++) {
    const move = R.mul(f(x), inverse, prec + 30);
    const next = R.upperBits(move);
    // No smaller than before: what is left is the radius of f.
    if (!(next < size - 1)) break;
    size = next;
    x = R.exactMid(R.sub(x, move, prec + 30));
  }
  if (size === Infinity) return R.INDETERMINATE;
  for (let k = 1; k <= WIDENINGS; k++) {
    const delta = R.mul2exp(R.ONE, Math.max(size, -4 * prec) + k);
    const low = f(R.sub(x, delta, prec + 60));
    const high = f(R.add(x, delta, prec + 60));
    if (R.isNegative(low) && R.isPositive(high)) return R.widen(x, R.mul2exp(delta, 1));
  }
  return R.INDETERMINATE;
}
