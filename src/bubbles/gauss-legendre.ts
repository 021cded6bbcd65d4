/**
 * @module Gauss–Legendre rules in balls.
 *
 * Method     zeros of P_n by Newton steps from cos(π(i − 1/4)/(n + 1/2)), in fixed point; weights 2/((1−x²) P_n′(x)²).
 * Bound      each zero is proved by a change of sign of P_n across its ball, evaluated in balls; n disjoint changes of sign are
 *            all the zeros. For f analytic and |f| <= M in the Bernstein ellipse of parameter ρ the rule is off by at most
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

/** log2(1+√2): bits by which the radius of a ball grows in a step of the recurrence at most. */
const LOSS = 1.2716;

const known = new Map<string, readonly Node[]>();

/** P_n(x) and P_(n−1)(x). */
function legendre(n: number, x: Ball, prec: number): { readonly value: Ball; readonly before: Ball } {
  let before: Ball = R.ONE;
  let value = x;
  for (let k = 1; k < n; k++) {
    const up = R.mul(R.mul(R.fromNumber(2 * k + 1), x, prec), value, prec);
    const next = R.div(R.sub(up, R.mul(R.fromNumber(k), before, prec), prec), R.fromNumber(k + 1), prec);
    before = value;
    value = next;
  }
  return { value, before };
}

/** P_n′ = n (P_(n−1) − x P_n)/(1 − x²). */
function slope(n: number, x: Ball, p: ReturnType<typeof legendre>, prec: number): Ball {
  const top = R.mul(R.fromNumber(n), R.sub(p.before, R.mul(x, p.value, prec), prec), prec);
  return R.div(top, R.sub(R.ONE, R.sqr(x, prec), prec), prec);
}

/** The zero to double precision. */
function roughZero(n: number, i: number): number {
  let x = Math.cos((Math.PI * (i + 0.75)) / (n + 0.5));
  for (let step = 0; step < 6; step++) {
    let [before, value] = [1, x];
    for (let k = 1; k < n; k++) [before, value] = [value, ((2 * k + 1) * x * value - k * before) / (k + 1)];
    x -= (value * (1 - x * x)) / (n * (before - x * value));
  }
  return x;
}

function zero(n: number, i: number, prec: number): Node {
  const loss = Math.ceil(LOSS * n);
  const work = prec + 2 * loss + 24;
  let x = R.fromNumber(roughZero(n, i));
  for (let bits = DOUBLE_BITS; bits < work; bits *= 2) {
    const own = Math.min(work, 2 * bits + 40);
    const p = legendre(n, x, own);
    x = R.exactMid(R.sub(x, R.div(p.value, slope(n, x, p, own), own), own));
  }
  const radius = -prec - loss - 4;
  const end = (side: 1 | -1): Ball => legendre(n, R.add(x, R.ball(BigInt(side), radius), work), work).value;
  const [low, high] = [end(-1), end(1)];
  const proved = (R.isPositive(low) && R.isNegative(high)) || (R.isNegative(low) && R.isPositive(high));
  const ball = proved ? R.addError(x, 1, radius) : R.INDETERMINATE;
  const p = legendre(n, ball, work);
  // P_n = 0 at the node: P_n′ = n P_(n−1)/(1 − x²).
  const square = R.sub(R.ONE, R.sqr(ball, work), work);
  const weight = R.div(R.mul2exp(square, 1), R.sqr(R.mul(R.fromNumber(n), p.before, work), work), prec);
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
  const { before } = legendre(n, R.ZERO, prec + 20);
  const weight = R.div(R.fromNumber(2), R.sqr(R.mul(R.fromNumber(n), before, prec + 20), prec + 20), prec);
  return { x: R.ZERO, weight };
}
