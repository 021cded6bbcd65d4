/** @module The known terms as they stand at another scale, in the unit of the terms at the scale of the series. */
import { R } from '../../numerics/index.js';
import type { Moved, Question } from '../model.js';

const BITS = 128;

/** factor · c′_n x′^(n + power) for the orders of the known terms, as doubles. */
export function movedTerms({ known, expansion }: Question, moved: Moved): number[] {
  const x = R.fromNumber(moved.x);
  const factor = expansion.factor.ball(BITS);
  return known.orders.map((order) => {
    const c = moved.coefficients[order - expansion.power] ?? R.ZERO;
    const term = R.mul(R.mul(factor, c, BITS), R.powInt(x, order, BITS), BITS);
    return R.toNumber(R.mul2exp(term, -known.unit));
  });
}
