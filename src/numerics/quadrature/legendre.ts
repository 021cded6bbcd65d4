/**
 * @module Nodes and weights of Gauss–Legendre rules as balls.
 *
 * Purpose    ∫_{−1}^1 f = Σ w_i f(x_i), exact for polynomials of degree 2n − 1.
 * Method     Newton's iteration from a double start, digits doubling, then a proof; w = 2/((1−x²) P_n′(x)²).
 * Bound      P_n takes opposite signs at both ends of each of the n disjoint balls, so each holds exactly one of its n zeros.
 *            P_n comes from the three-term recurrence in balls, which loses (1+√2)^n: these bits are added beforehand.
 * Reference  DLMF 3.5.16–3.5.22, 18.9.1, 18.9.17.
 */
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';

export interface Rule {
  /** Positive nodes in falling order; the mirror images and, for odd n, the node 0 with weight `middle` complete the rule. */
  readonly nodes: readonly Ball[];
  readonly weights: readonly Ball[];
  readonly middle?: Ball;
}

/** log2(1 + √2), rounded up. */
const LOSS = 1.28;
const known = new Map<number, { prec: number; rule: Rule }>();

/** The n-point rule with nodes and weights to about prec bits; n >= 1. Throws RangeError for other n. */
export function legendreRule(n: number, prec: number): Rule {
  if (!Number.isInteger(n) || n < 1) throw new RangeError(`legendreRule: ${n} points, wanted a whole number from 1 on`);
  const have = known.get(n);
  if (have !== undefined && have.prec >= prec) return have.rule;
  const rule = compute(n, prec + 32);
  known.set(n, { prec: prec + 32, rule });
  return rule;
}

function compute(n: number, prec: number): Rule {
  const nodes: Ball[] = [];
  const weights: Ball[] = [];
  for (let i = 0; i < n >> 1; i++) {
    const x = node(n, i, prec);
    nodes.push(x);
    weights.push(weight(n, x, prec));
  }
  return n % 2 === 1 ? { nodes, weights, middle: weight(n, R.ZERO, prec) } : { nodes, weights };
}

/** P_n and P_(n−1) at x. */
export function legendre(n: number, x: Ball, prec: number): { p: Ball; before: Ball } {
  const work = prec + Math.ceil(LOSS * n) + 10;
  let before: Ball = R.ZERO;
  let p: Ball = R.ONE;
  for (let k = 0; k < n; k++) {
    const t = R.sub(
      R.mul(R.mul(R.fromNumber(2 * k + 1), x, work), p, work),
      R.mul(R.fromNumber(k), before, work),
      work,
    );
    before = p;
    p = R.div(t, R.fromNumber(k + 1), work);
  }
  return { p, before };
}

function node(n: number, i: number, prec: number): Ball {
  let x: Ball = R.fromNumber(nodeDouble(n, i));
  const goal = prec + 24 + 2 * Math.ceil(Math.log2(n + 1));
  for (let bits = 32; ;) {
    bits = Math.min(goal, 2 * bits);
    x = R.exactMid(R.sub(x, newtonStep(n, x, bits + 10), bits + 10));
    if (bits === goal) break;
  }
  // The error of the last step is far below 2^(8−goal); the proof says so.
  for (let radius = 8 - goal; radius < -prec / 2; radius += 8) {
    const wide = R.addError(x, 1, radius);
    const ends = [-1, 1].map((s) => legendre(n, R.add(x, R.ball(BigInt(s), radius), 1e9), goal).p);
    const [a, b] = [ends[0]!, ends[1]!];
    if ((R.isPositive(a) && R.isNegative(b)) || (R.isNegative(a) && R.isPositive(b))) return wide;
  }
  return R.INDETERMINATE;
}

/** The node in doubles. */
function nodeDouble(n: number, i: number): number {
  let x = Math.cos((Math.PI * (i + 0.75)) / (n + 0.5));
  for (let round = 0; round < 8; round++) {
    let [before, p] = [0, 1];
    for (let k = 0; k < n; k++) [before, p] = [p, ((2 * k + 1) * x * p - k * before) / (k + 1)];
    x -= (p * (1 - x * x)) / (n * (before - x * p));
  }
  return x;
}

/** P_n/P_n′ with (1−x²) P_n′ = n (P_(n−1) − x P_n). */
function newtonStep(n: number, x: Ball, prec: number): Ball {
  const { p, before } = legendre(n, x, prec);
  const room = R.sub(R.ONE, R.sqr(x, prec + 20), prec + 20);
  const slope = R.mul(R.fromNumber(n), R.sub(before, R.mul(x, p, prec), prec), prec);
  return R.div(R.mul(p, room, prec), slope, prec);
}

/** 2/((1−x²) P_n′²) = 2 (1−x²)/(n P_(n−1))² at a zero. */
function weight(n: number, x: Ball, prec: number): Ball {
  const work = prec + 20;
  // P_(n−1) over the ball: at its centre, with |P_(n−1)′| <= n²/2.
  const { p } = legendre(n - 1, R.exactMid(x), work);
  const at = R.addError(p, x.rad * 0.5 * n * n * (1 + 1e-9), x.exp);
  const square = R.sqr(R.mul(R.fromNumber(n), at, work), work);
  return R.div(R.mul2exp(R.sub(R.ONE, R.sqr(x, work), work), 1), square, prec);
}
