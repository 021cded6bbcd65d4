/**
 * @module Double-double arithmetic: a number as the unevaluated sum of two doubles, about 31 digits.
 *
 * Purpose    quadrature sums over many nodes where balls cost ten times as much and nothing is proved anyway.
 * Method     error-free sums and products (Knuth's two-sum, Dekker's product by Veltkamp's splitting; no fused multiply-add).
 * Bound      none is carried along: one operation is good to UNIT relatively (quotients and roots to a few of it), away from
 *            overflow and underflow. Who uses it adds up what is lost.
 * Reference  T. J. Dekker, Numer. Math. 18 (1971) 224; D. E. Knuth, The Art of Computer Programming 2, sec. 4.2.2 (from memory).
 */
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';

/** High and low part, |low| <= ulp(high)/2. */
export type DoubleDouble = readonly [high: number, low: number];

/** What one operation may lose, relatively: 2^−102, a few of the last bits. */
export const UNIT = 2 ** -102;

const SPLITTER = 2 ** 27 + 1;

export const fromNumber = (x: number): DoubleDouble => [x, 0];

/** The two leading doubles of the midpoint of a ball. */
export function fromBall(x: Ball): DoubleDouble {
  const high = R.toNumber(x);
  if (!Number.isFinite(high)) return [high, 0];
  return twoSum(high, R.toNumber(R.sub(R.exactMid(x), R.fromNumber(high), 120)));
}

/** Exactly the sum of the two doubles. */
export const toBall = ([high, low]: DoubleDouble): Ball => R.add(R.fromNumber(high), R.fromNumber(low), 120);

/** a + b of two doubles, exactly. */
export function twoSum(a: number, b: number): DoubleDouble {
  const s = a + b;
  const t = s - a;
  return [s, a - (s - t) + (b - t)];
}

/** What the double product p = a b leaves of the exact one. */
export function productError(a: number, b: number, p: number): number {
  const s = SPLITTER * a;
  const a1 = s - (s - a);
  const a2 = a - a1;
  const t = SPLITTER * b;
  const b1 = t - (t - b);
  const b2 = b - b1;
  return a1 * b1 - p + a1 * b2 + a2 * b1 + a2 * b2;
}

/** Low part of the last highSum or highProduct: two results without an object to hold them, for inner loops. */
export const LOW = new Float64Array(1);

/** High part of a + b; the low part stands in LOW[0]. */
export function highSum(a0: number, a1: number, b0: number, b1: number): number {
  const s = a0 + b0;
  const t = s - a0;
  const e = a0 - (s - t) + (b0 - t) + (a1 + b1);
  const high = s + e;
  LOW[0] = e - (high - s);
  return high;
}

/** High part of a·b; the low part stands in LOW[0]. */
export function highProduct(a0: number, a1: number, b0: number, b1: number): number {
  const p = a0 * b0;
  const e = productError(a0, b0, p) + (a0 * b1 + a1 * b0);
  const high = p + e;
  LOW[0] = e - (high - p);
  return high;
}

export function add(a: DoubleDouble, b: DoubleDouble): DoubleDouble {
  const s = a[0] + b[0];
  const t = s - a[0];
  const e = a[0] - (s - t) + (b[0] - t) + (a[1] + b[1]);
  const high = s + e;
  return [high, e - (high - s)];
}

export const neg = (a: DoubleDouble): DoubleDouble => [-a[0], -a[1]];

export function sub(a: DoubleDouble, b: DoubleDouble): DoubleDouble {
  return add(a, [-b[0], -b[1]]);
}

export function mul(a: DoubleDouble, b: DoubleDouble): DoubleDouble {
  const p = a[0] * b[0];
  const e = productError(a[0], b[0], p) + (a[0] * b[1] + a[1] * b[0]);
  const high = p + e;
  return [high, e - (high - p)];
}

/** a·2^k, exact. */
export function mul2exp(a: DoubleDouble, k: number): DoubleDouble {
  const f = 2 ** k;
  return [a[0] * f, a[1] * f];
}

export function div(a: DoubleDouble, b: DoubleDouble): DoubleDouble {
  const first = a[0] / b[0];
  const rest = sub(a, mul(b, [first, 0]));
  const second = rest[0] / b[0];
  const last = sub(rest, mul(b, [second, 0]));
  const [high, low] = twoSum(first, second);
  return add([high, low], [last[0] / b[0], 0]);
}

/** √a for a >= 0: one Newton step from the double root. */
export function sqrt(a: DoubleDouble): DoubleDouble {
  if (!(a[0] > 0)) return [a[0] === 0 ? 0 : Number.NaN, 0];
  const root = Math.sqrt(a[0]);
  const rest = sub(a, mul([root, 0], [root, 0]));
  const [high, low] = twoSum(root, rest[0] / (2 * root));
  return [high, low];
}
