/**
 * @module Stevenson's optimised coupling at next-to-leading and next-to-next-to-leading order.
 *
 * D = a(1 + r_1 a + r_2 a²) with β = −b_0 a²(1 + c_1 a + c_2 a²); invariants ρ_1 = τ − r_1, τ = b_0 ln(μ²/Λ²), and
 * ρ_2 = r_2 + c_2 − c_1 r_1 − r_1². Stationary:
 *   NLO (in τ):        r_1 = −c_1/[2(1 + c_1 a)],
 *   NNLO (τ and c_2):  r_1 = (1/I − 1/a − c_1)/2,  1 + 2 r_1 a + 3 r_2 a² = a/[S(a) I],  I = ∫_0^a dx/S²,  S = 1 + c_1 x + c_2 x²,
 * and the invariants fix a (and c_2). Newton's method in doubles, then with the same slopes in balls.
 * Bound: the residual of the equations over their slopes: converged, not proved.
 * Reference: P. M. Stevenson, Phys. Rev. D 23 (1981) 2916 (formulas from memory, re-derived; check values by numerical
 * stationarity).
 */
import { C, clog, csqrt, R } from '../numerics/index.js';
import type { Ball, Complex } from '../numerics/index.js';
import type { BetaFunction } from './running-coupling.js';
import { scaleFunction } from './running-coupling.js';

/** What is to be optimised: beta function, coefficients r_1 (and r_2) and coupling of the scheme at hand. */
export interface Charge {
  readonly b0: Ball;
  readonly c: readonly Ball[];
  readonly r: readonly Ball[];
  readonly x: Ball;
}

export interface Optimum {
  readonly a: Ball;
  readonly r: readonly Ball[];
  readonly c2?: Ball;
  /** D at the optimum. */
  readonly value: Ball;
}

const MOST_STEPS = 80;
/** Newton steps in balls: each gains the digits of the double slopes. */
const POLISH = 12;
/** Relative step of the difference quotients. */
const STEP = 1e-6;
/** The residual may be this many times larger than its share in the error suggests. */
const SAFETY_BITS = 4;

type Unknowns = readonly Ball[];
type Equations = (u: Unknowns, prec: number) => readonly Ball[] | undefined;

/** τ(x) with c as given. */
function tau(b0: Ball, c: readonly Ball[], x: Ball, prec: number): Ball | undefined {
  const beta: BetaFunction = { b0, c };
  return scaleFunction(beta, prec)?.(x);
}

/** ∫_0^a dx/(1 + c_1 x + c_2 x²)². */
function inverseSquareIntegral(c1: Ball, c2: Ball, a: Ball, prec: number): Ball {
  const delta = R.sub(R.mul2exp(c2, 2), R.sqr(c1, prec), prec);
  const S = R.add(R.ONE, R.mul(R.add(c1, R.mul(c2, a, prec), prec), a, prec), prec);
  const edge = R.sub(R.div(R.add(R.mul2exp(R.mul(c2, a, prec), 1), c1, prec), S, prec), c1, prec);
  const twice = R.mul2exp(c2, 1);
  return R.div(R.add(edge, R.mul(twice, inverseIntegral(c1, c2, delta, a, prec), prec), prec), delta, prec);
}

/** ∫_0^a dx/(1 + c_1 x + c_2 x²) by the two zeros of the quadratic. */
function inverseIntegral(c1: Ball, c2: Ball, delta: Ball, a: Ball, prec: number): Ball {
  const root = csqrt(C.fromReal(R.neg(delta)), prec);
  // With z± = (−c_1 ± √(c_1² − 4c_2))/(2c_2): 1/S = [1/(x − z₊) − 1/(x − z₋)]/√(…).
  const part = (sign: 1 | -1): Complex => {
    const z = C.mulReal(
      C.add(C.fromReal(R.neg(c1)), sign === 1 ? root : C.neg(root), prec),
      R.div(R.ONE, R.mul2exp(c2, 1), prec),
      prec,
    );
    return clog(C.sub(C.ONE, C.div(C.fromReal(a), z, prec), prec), prec);
  };
  return C.div(C.sub(part(1), part(-1), prec), root, prec).re;
}

function nloEquations(q: Charge): Equations {
  return ([a], prec) => {
    const c1 = q.c[0] ?? R.ZERO;
    const r1 = nloR1(c1, a!, prec);
    const [here, there] = [tau(q.b0, [c1], a!, prec), tau(q.b0, [c1], q.x, prec)];
    if (here === undefined || there === undefined) return undefined;
    return [R.sub(R.sub(here, r1, prec), R.sub(there, q.r[0]!, prec), prec)];
  };
}

function nloR1(c1: Ball, a: Ball, prec: number): Ball {
  return R.div(R.neg(c1), R.mul2exp(R.add(R.ONE, R.mul(c1, a, prec), prec), 1), prec);
}

/** r_1 and r_2 at (a, c_2). */
function nnloCoefficients(c1: Ball, c2: Ball, a: Ball, prec: number): readonly [Ball, Ball] {
  const I = inverseSquareIntegral(c1, c2, a, prec);
  const S = R.add(R.ONE, R.mul(R.add(c1, R.mul(c2, a, prec), prec), a, prec), prec);
  const r1 = R.mul2exp(R.sub(R.sub(R.div(R.ONE, I, prec), R.div(R.ONE, a, prec), prec), c1, prec), -1);
  const right = R.div(a, R.mul(S, I, prec), prec);
  const left = R.add(R.ONE, R.mul2exp(R.mul(r1, a, prec), 1), prec);
  return [r1, R.div(R.sub(right, left, prec), R.mul(R.fromNumber(3), R.sqr(a, prec), prec), prec)];
}

function rho2(c1: Ball, c2: Ball, r1: Ball, r2: Ball, prec: number): Ball {
  const linear = R.add(r2, c2, prec);
  return R.sub(linear, R.mul(r1, R.add(c1, r1, prec), prec), prec);
}

function nnloEquations(q: Charge): Equations {
  return ([a, c2], prec) => {
    const [c1, c2Here] = [q.c[0]!, q.c[1]!];
    const [r1, r2] = nnloCoefficients(c1, c2!, a!, prec);
    const [here, there] = [tau(q.b0, [c1, c2!], a!, prec), tau(q.b0, [c1, c2Here], q.x, prec)];
    if (here === undefined || there === undefined) return undefined;
    const scale = R.sub(R.sub(here, r1, prec), R.sub(there, q.r[0]!, prec), prec);
    const scheme = R.sub(rho2(c1, c2!, r1, r2, prec), rho2(c1, c2Here, q.r[0]!, q.r[1]!, prec), prec);
    return [scale, scheme];
  };
}

/** Inverse of the slopes at u by difference quotients in doubles; undefined when singular. */
function inverseSlopes(f: Equations, u: readonly number[]): readonly (readonly number[])[] | undefined {
  const at = (v: readonly number[]): number[] | undefined =>
    f(
      v.map((x) => R.fromNumber(x)),
      160,
    )?.map(R.toNumber);
  const columns = u.map((x, i) => {
    const h = STEP * Math.abs(x);
    const [up, down] = [1, -1].map((s) => at(u.map((y, j) => (j === i ? y + s * h : y))));
    return up === undefined || down === undefined ? undefined : up.map((y, k) => (y - down[k]!) / (2 * h));
  });
  if (columns.some((c) => c?.every(Number.isFinite) !== true)) return undefined;
  const [p, q] = columns as number[][];
  if (q === undefined) return p![0] === 0 ? undefined : [[1 / p![0]!]];
  const det = p![0]! * q[1]! - q[0]! * p![1]!;
  return det === 0
    ? undefined
    : [
        [q[1]! / det, -q[0]! / det],
        [-p![1]! / det, p![0]! / det],
      ];
}

/** Solution near `start`, all unknowns positive in their first component. */
function solve(f: Equations, start: readonly number[], prec: number): Unknowns | undefined {
  let u = [...start];
  let slopes = inverseSlopes(f, u);
  for (let i = 0; i < MOST_STEPS && slopes !== undefined; i++) {
    const rest = f(
      u.map((x) => R.fromNumber(x)),
      160,
    )?.map(R.toNumber);
    if (rest === undefined || !rest.every(Number.isFinite)) return undefined;
    const move = slopes.map((row) => row.reduce((s, m, k) => s + m * rest[k]!, 0));
    // Half steps while a step would change the coupling by more than a third.
    const damping = Math.min(1, (0.3 * u[0]!) / Math.max(Math.abs(move[0]!), 1e-300));
    u = u.map((x, k) => x - damping * move[k]!);
    if (!(u[0]! > 0)) return undefined;
    slopes = inverseSlopes(f, u);
    if (damping === 1 && move.every((m, k) => Math.abs(m) < 1e-11 * Math.abs(u[k]!))) break;
  }
  return slopes === undefined ? undefined : polish(f, u, slopes, prec);
}

function polish(
  f: Equations,
  start: readonly number[],
  slopes: readonly (readonly number[])[],
  prec: number,
): Unknowns | undefined {
  let u: Ball[] = start.map((x) => R.fromNumber(x));
  for (let i = 0; i < POLISH; i++) {
    const rest = f(u, prec);
    if (rest === undefined || rest.some((y) => y.rad === Infinity)) return undefined;
    const move = slopes.map((row) =>
      row.reduce((s, m, k) => R.add(s, R.mul(R.fromNumber(m), rest[k]!, prec), prec), R.ZERO),
    );
    const settled = move.every((m, k) => R.upperBits(m) < R.upperBits(u[k]!) - prec + 24);
    if (settled) return u.map((x, k) => R.widen(x, R.mul2exp(R.abs(move[k]!), SAFETY_BITS)));
    u = u.map((x, k) => R.exactMid(R.sub(x, move[k]!, prec)));
  }
  return undefined;
}

/** Optimum with r_1 only; `start` a guess for the coupling. */
export function nloOptimum(q: Charge, start: number, prec: number): Optimum | undefined {
  const found = solve(nloEquations(q), [start], prec);
  if (found === undefined) return undefined;
  const a = found[0]!;
  const r1 = nloR1(q.c[0] ?? R.ZERO, a, prec);
  return { a, r: [r1], value: R.mul(a, R.add(R.ONE, R.mul(r1, a, prec), prec), prec) };
}

/** Optimum with r_1 and r_2; `start` guesses for coupling and c_2. */
export function nnloOptimum(q: Charge, start: readonly [number, number], prec: number): Optimum | undefined {
  const found = solve(nnloEquations(q), start, prec);
  if (found === undefined) return undefined;
  const [a, c2] = [found[0]!, found[1]!];
  const [r1, r2] = nnloCoefficients(q.c[0]!, c2, a, prec);
  const inner = R.add(r1, R.mul(r2, a, prec), prec);
  return { a, c2, r: [r1, r2], value: R.mul(a, R.add(R.ONE, R.mul(inner, a, prec), prec), prec) };
}
