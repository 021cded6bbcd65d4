/**
 * @module Exponential, logarithm, sine, cosine and argument in double-double arithmetic.
 *
 * Purpose    as in real.ts.
 * Method     exp by reduction modulo ln 2, 2^−8 and a Taylor polynomial; log and the argument as the double's value and one
 *            correction of second order; sin and cos by Taylor polynomials on |θ| <= π/4 after reduction modulo π/2.
 * Bound      a few UNIT, relatively for exp, absolutely (of a result of order one) for the others. Angles up to some turns.
 * Reference  Y. Hida, X. S. Li, D. H. Bailey, Proc. 15th IEEE Symposium on Computer Arithmetic (2001) 155 (from memory).
 */
import { ln2, pi } from '../ball/constants.js';
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import { add, div, fromBall, fromNumber, highProduct, highSum, LOW, mul, mul2exp, neg, sub } from './real.js';
import type { DoubleDouble } from './real.js';

/** Three doubles of a constant: enough to reduce by multiples of it. */
function threeDoubles(x: Ball): readonly [DoubleDouble, number] {
  const two = fromBall(x);
  const rest = R.sub(R.sub(x, R.fromNumber(two[0]), 200), R.fromNumber(two[1]), 200);
  return [two, R.toNumber(rest)];
}

interface Constants {
  readonly ln2: readonly [DoubleDouble, number];
  readonly halfPi: readonly [DoubleDouble, number];
  /** 1/n! for n = 0 … 28. */
  readonly inverseFactorials: readonly DoubleDouble[];
}

const CONSTANT_BITS = 200;
let kept: Constants | undefined;

function constants(): Constants {
  if (kept !== undefined) return kept;
  const inverseFactorials: DoubleDouble[] = [[1, 0]];
  for (let n = 1; n <= 28; n++) inverseFactorials.push(div(inverseFactorials[n - 1]!, fromNumber(n)));
  kept = {
    ln2: threeDoubles(ln2(CONSTANT_BITS)),
    halfPi: threeDoubles(R.mul2exp(pi(CONSTANT_BITS), -1)),
    inverseFactorials,
  };
  return kept;
}

/** x − k·constant. */
function reduced(x: DoubleDouble, k: number, [two, third]: readonly [DoubleDouble, number]): DoubleDouble {
  return sub(sub(x, mul(two, fromNumber(k))), fromNumber(k * third));
}

/** c_last x^m + … + c_first, every `stride`-th of the coefficients, by Horner's rule. */
function horner(
  c: readonly DoubleDouble[],
  last: number,
  first: number,
  stride: number,
  [x0, x1]: DoubleDouble,
): DoubleDouble {
  let [v0, v1] = c[last]!;
  for (let n = last - stride; n >= first; n -= stride) {
    v0 = highProduct(v0, v1, x0, x1);
    v0 = highSum(v0, LOW[0]!, c[n]![0], c[n]![1]);
    v1 = LOW[0]!;
  }
  return [v0, v1];
}

const HALVINGS = 8;
const EXP_TERMS = 8;

export function exp(x: DoubleDouble): DoubleDouble {
  if (x[0] > 700) return [Infinity, 0];
  if (x[0] < -740) return [0, 0];
  const { ln2: log2, inverseFactorials } = constants();
  const k = Math.round(x[0] / log2[0][0]);
  const r = mul2exp(reduced(x, k, log2), -HALVINGS);
  // e^r − 1, then (1 + p)² − 1 = 2p + p² as often as r was halved.
  let [p0, p1] = mul(horner(inverseFactorials, EXP_TERMS, 1, 1, r), r);
  for (let i = 0; i < HALVINGS; i++) {
    const square = highProduct(p0, p1, p0, p1);
    p0 = highSum(2 * p0, 2 * p1, square, LOW[0]!);
    p1 = LOW[0]!;
  }
  const result = add([p0, p1], fromNumber(1));
  // In two steps: 2^k alone may overflow.
  const half = Math.trunc(k / 2);
  return mul2exp(mul2exp(result, half), k - half);
}

/** ln x for x > 0 between e^−700 and e^700. */
export function log(x: DoubleDouble): DoubleDouble {
  if (!(x[0] > 0)) return [x[0] === 0 ? -Infinity : Number.NaN, 0];
  const start = Math.log(x[0]);
  const r = sub(mul(x, exp(fromNumber(-start))), fromNumber(1));
  return add(fromNumber(start), [r[0] - (r[0] * r[0]) / 2, r[1]]);
}

/** sin x and cos x. */
export function sinCos(x: DoubleDouble): readonly [sin: DoubleDouble, cos: DoubleDouble] {
  const { halfPi, inverseFactorials } = constants();
  const k = Math.round(x[0] / halfPi[0][0]);
  const r = reduced(x, k, halfPi);
  const square = neg(mul(r, r));
  const s = mul(horner(inverseFactorials, 27, 1, 2, square), r);
  const c = horner(inverseFactorials, 28, 0, 2, square);
  switch (((k % 4) + 4) % 4) {
    case 0:
      return [s, c];
    case 1:
      return [c, neg(s)];
    case 2:
      return [neg(s), neg(c)];
    default:
      return [neg(c), s];
  }
}

/** Argument of x + iy, in (−π, π]. */
export function atan2(y: DoubleDouble, x: DoubleDouble): DoubleDouble {
  // A negative zero is no side of the cut.
  const start = Math.atan2(y[0] + 0, x[0]);
  const [sin, cos] = sinCos(fromNumber(start));
  // tan of what is left.
  const d = div(sub(mul(y, cos), mul(x, sin)), add(mul(x, cos), mul(y, sin)));
  return add(fromNumber(start), d);
}
