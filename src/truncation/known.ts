/**
 * @module The known terms of an expansion as doubles in a unit of their own, so that any size is in range.
 *
 * Leading zeros are no terms. A lacunary series (every p-th coefficient, p > 1) is read as a series in x^p.
 */
import { R, type Ball } from '../numerics/index.js';
import type { Expansion } from '../series/index.js';

export interface Known {
  /** Terms are in units of 2^unit; the last non-zero one lies between 1/2 and 1 in size. */
  readonly unit: number;
  /** Power of x of each term. */
  readonly orders: readonly number[];
  /** Signed; 0 for an exact zero; ±Infinity where a term exceeds the last one beyond the range of doubles. */
  readonly values: readonly number[];
  /** ln of the size; −Infinity for an exact zero. Always in range. */
  readonly logs: readonly number[];
  /** Step between the orders. */
  readonly stride: number;
  /** ln|x|. */
  readonly logX: number;
}

/** A term is taken for zero when this many bits do not tell it from zero. */
const TERM_BITS = 256;
/** A common step of so many non-zero coefficients is no accident any more. A heuristic. */
const LACUNARY_FROM = 3;

const gcd = (a: number, b: number): number => (b === 0 ? a : gcd(b, a % b));

/** ln|b| of a ball without zero, for any size. */
function logSize(b: Ball): number {
  const bits = R.upperBits(b);
  return Math.log(Math.abs(R.toNumber(R.mul2exp(b, -bits)))) + bits * Math.LN2;
}

/** The terms factor · c_n x^(n + power) of an expansion; undefined when all of them are zero. */
export function knownTerms(e: Expansion): Known | undefined {
  const x = e.x.ball(TERM_BITS);
  const prefactor = e.factor.ball(TERM_BITS);
  if (R.containsZero(x) || R.containsZero(prefactor)) return undefined;
  const balls = e.coefficients.map((c, n) =>
    R.mul(R.mul(c.ball(TERM_BITS), prefactor, TERM_BITS), R.powInt(x, n + e.power, TERM_BITS), TERM_BITS),
  );
  const nonZero = balls.flatMap((b, n) => (R.containsZero(b) ? [] : [n]));
  const [first, last] = [nonZero[0], nonZero.at(-1)];
  if (first === undefined || last === undefined) return undefined;
  const step = nonZero.reduce((g, n) => gcd(g, n - first), 0);
  const stride = nonZero.length >= LACUNARY_FROM && step > 1 ? step : 1;
  const kept = balls.flatMap((b, n) => (n >= first && (n - first) % stride === 0 ? [{ b, n }] : []));
  const unit = R.upperBits(balls[last] ?? R.ONE);
  return {
    unit,
    orders: kept.map(({ n }) => n + e.power),
    values: kept.map(({ b }) => (R.containsZero(b) ? 0 : R.toNumber(R.mul2exp(b, -unit)))),
    logs: kept.map(({ b }) => (R.containsZero(b) ? -Infinity : logSize(b) - unit * Math.LN2)),
    stride,
    logX: logSize(x),
  };
}

/** Power of the first missing term. */
export const nextOrder = (known: Known): number => (known.orders.at(-1) ?? 0) + known.stride;

/** The first `count` of the known terms, in a unit of their own. */
export function firstTerms(known: Known, count: number): Known | undefined {
  const logs = known.logs.slice(0, count);
  const last = logs.findLast((l) => l > -Infinity);
  if (last === undefined) return undefined;
  const shift = Math.ceil(last / Math.LN2);
  return {
    ...known,
    unit: known.unit + shift,
    orders: known.orders.slice(0, count),
    values: logs.map((l, k) => Math.sign(known.values[k] ?? 0) * Math.exp(l - shift * Math.LN2)),
    logs: logs.map((l) => l - shift * Math.LN2),
  };
}

/** Index of the smallest non-zero term. */
export function leastIndex(known: Known): number {
  let best = -1;
  known.logs.forEach((l, k) => {
    if (l > -Infinity && (best < 0 || l < (known.logs[best] ?? Infinity))) best = k;
  });
  return best;
}
