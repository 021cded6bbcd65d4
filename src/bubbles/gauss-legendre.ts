/**
 * @module Gauss–Legendre rules in balls.
 *
 * Method     zeros of P_n by Newton steps from cos(π(i − 1/4)/(n + 1/2)), in fixed point; weights 2/((1−x²) P_n′(x)²).
 * Bound      a step of the recurrence adds at most 2 units and obeys e_(k+1) <= 2 e_k + e_(k−1) + 2, so that P_n is off by less than
 *            4 (1+√2)^n units. Each zero is proved by a change of sign of P_n beyond that error; n disjoint changes of sign
 *            are all the zeros. For f analytic and |f| <= M in the Bernstein ellipse of parameter ρ the rule is off by at most
 *            8 M ρ^(1−2n)/(ρ−1): a polynomial of degree 2n−1 comes within 2Mρ^(1−2n)/(ρ−1) of f, and rule and integral are
 *            both at most twice the maximum.
 * Reference  L. N. Trefethen, "Approximation Theory and Approximation Practice" (2013), theorems 8.2 and 19.3 (from memory).
 */
import { R } from '../numerics/index.js';
import type { Ball } from '../numerics/index.js';

export interface Node {
  readonly x: Ball;
  readonly weight: Ball;
}

/** Bits that the double-precision zeros have at least, for n up to some hundreds. */
const DOUBLE_BITS = 40;

/** log2(1+√2): bits by which an error grows in a step of the recurrence at most. */
const LOSS = 1.2716;

const known = new Map<string, readonly Node[]>();

/** P_n(x) and P_(n−1)(x) for x·2^-wp, in fixed point: off by less than 2^(LOSS·n + 2) units each. */
function legendre(n: number, x: bigint, wp: number): { readonly value: bigint; readonly before: bigint } {
  const bits = BigInt(wp);
  let before = 1n << bits;
  let value = x;
  for (let k = 1; k < n; k++) {
    const up = (BigInt(2 * k + 1) * x * value) >> bits;
    const next = (up - BigInt(k) * before) / BigInt(k + 1);
    before = value;
    value = next;
  }
  return n === 0 ? { value: before, before: 0n } : { value, before };
}

/** x − P_n/P_n′ with P_n′ = n (P_(n−1) − x P_n)/(1 − x²). */
function step(n: number, x: bigint, wp: number): bigint {
  const bits = BigInt(wp);
  const { value, before } = legendre(n, x, wp);
  const top = value * ((1n << bits) - ((x * x) >> bits));
  const below = BigInt(n) * (before - ((x * value) >> bits));
  return x - top / below;
}

/** The zero to double precision. */
function roughZero(n: number, i: number): number {
  let x = Math.cos((Math.PI * (i + 0.75)) / (n + 0.5));
  for (let round = 0; round < 6; round++) {
    let [before, value] = [1, x];
    for (let k = 1; k < n; k++) [before, value] = [value, ((2 * k + 1) * x * value - k * before) / (k + 1)];
    x -= (value * (1 - x * x)) / (n * (before - x * value));
  }
  return x;
}

/** A number of 2^-from units in units of 2^-to. */
const rescaled = (x: bigint, from: number, to: number): bigint =>
  to >= from ? x << BigInt(to - from) : x >> BigInt(from - to);

function zero(n: number, i: number, prec: number): Node {
  const loss = Math.ceil(LOSS * n) + 2;
  const work = prec + 2 * loss + 24;
  let wp = DOUBLE_BITS + loss + 16;
  let x = R.fromNumber(roughZero(n, i)).mid;
  x = rescaled(x, -R.fromNumber(roughZero(n, i)).exp, wp);
  for (let bits = DOUBLE_BITS; bits < work; bits *= 2) {
    const next = Math.min(work + loss, 2 * bits + loss + 16);
    x = rescaled(x, wp, next);
    wp = next;
    x = step(n, x, wp);
  }
  // The zero lies within 2^-radius of x when P_n certainly changes its sign there.
  const radius = prec + loss + 4;
  const half = 1n << BigInt(wp - radius);
  const error = 1n << BigInt(loss);
  const [low, high] = [legendre(n, x - half, wp).value, legendre(n, x + half, wp).value];
  const proved = (low > error && high < -error) || (low < -error && high > error);
  const ball = proved ? R.ball(x, -wp, 2 ** (wp - radius), prec + loss) : R.INDETERMINATE;
  // P_n = 0 at the node: P_n′ = n P_(n−1)/(1 − x²), and |P_(n−1)′| <= n² for the radius of x.
  const before = R.addError(R.ball(legendre(n, x, wp).before, -wp, Number(error)), n * n, -radius);
  const square = R.sub(R.ONE, R.sqr(ball, work), work);
  const weight = R.div(R.mul2exp(square, 1), R.sqr(R.mul(R.fromNumber(n), before, work), work), prec);
  return { x: ball, weight };
}

/** The rule with n points on [−1, 1], to about prec bits. */
export function gaussLegendre(n: number, prec: number): readonly Node[] {
  const key = `${n} ${prec}`;
  const have = known.get(key);
  if (have !== undefined) return have;
  const half = Array.from({ length: n >> 1 }, (_, i) => zero(n, i, prec));
  const mirrored = half.map(({ x, weight }) => ({ x: R.neg(x), weight })).toReversed();
  const nodes = [...half, ...(n % 2 === 1 ? [middle(n, prec)] : []), ...mirrored];
  known.set(key, nodes);
  return nodes;
}

/** x = 0 for odd n. */
function middle(n: number, prec: number): Node {
  const loss = Math.ceil(LOSS * n) + 2;
  const wp = prec + loss + 24;
  const before = R.ball(legendre(n, 0n, wp).before, -wp, 2 ** loss);
  const weight = R.div(R.fromNumber(2), R.sqr(R.mul(R.fromNumber(n), before, wp), wp), prec);
  return { x: R.ZERO, weight };
}
