/**
 * @module Stationary points of a truncated series in the renormalisation scale.
 *
 * Method     D_N(L), L = ln(μ²/μ_0²), from the exact table of logarithms and the running coupling; sign changes of dD/dL on a
 *            grid in ln μ, refined by bisection and then by the secant method in balls.
 *            dD/dL = Σ_n x^{n+p} [∂_L d_n(L)] − Σ_n (n+p) d_n(L) x^{n+p−1} · b_0 x² S(x).
 * Bound      the value at a stationary point is insensitive to it: its error is of the square of what is left of L.
 * Reference  P. M. Stevenson, Phys. Rev. D 23 (1981) 2916 (scale variable only).
 */
import { R } from '../numerics/index.js';
import type { Ball } from '../numerics/index.js';
import type { Expansion, Running } from '../series/index.js';
import { logRows } from '../truncation/index.js';
import { betaFunction, bracket, runner } from './running-coupling.js';
import type { BetaFunction } from './running-coupling.js';

export interface Stationary {
  /** ln(μ²/μ_0²). */
  readonly shift: Ball;
  /** Σ d_n(L) x^{n+p} there. */
  readonly value: Ball;
}

/** Half-width of the search in ln μ about Q: μ from Q/e to e Q. */
const HALF_WIDTH = 1;
/** Grid points of the search. Heuristic. */
const GRID = 48;
const BISECTIONS = 40;
const SECANTS = 12;
const GRID_BITS = 80;

interface Problem {
  readonly beta: BetaFunction;
  /** Entry [k][n] multiplies ln(μ_0²/μ²)^k in d_n. */
  readonly table: readonly (readonly Ball[])[];
  /** x at a shift of ln μ². */
  readonly run: (shift: Ball) => Ball | undefined;
  readonly power: number;
}

/** d_n(L) and its derivative. */
function row(table: Problem['table'], n: number, L: Ball, prec: number): readonly [Ball, Ball] {
  let value: Ball = R.ZERO;
  let slope: Ball = R.ZERO;
  for (let k = n; k >= 0; k--) {
    slope = R.add(R.mul(slope, L, prec), value, prec);
    value = R.add(R.mul(value, L, prec), table[k]![n]!, prec);
  }
  return [value, slope];
}

/** D and dD/dL at L = ln(μ²/μ_0²); undefined below the Landau pole. */
function at(p: Problem, L: Ball, prec: number): readonly [Ball, Ball] | undefined {
  const x = p.run(L);
  if (x === undefined) return undefined;
  const velocity = R.neg(R.mul(R.mul(p.beta.b0, R.sqr(x, prec), prec), bracket(p.beta, x, prec), prec));
  let weight = R.powInt(x, p.power - 1, prec);
  let value: Ball = R.ZERO;
  let slope: Ball = R.ZERO;
  p.table.forEach((_, n) => {
    // The table is in ln(μ_0²/μ²) = −L.
    const [d, opposite] = row(p.table, n, R.neg(L), prec);
    const moved = R.mul(R.mul(R.fromNumber(n + p.power), d, prec), velocity, prec);
    slope = R.add(slope, R.mul(weight, R.sub(moved, R.mul(opposite, x, prec), prec), prec), prec);
    weight = R.mul(weight, x, prec);
    value = R.add(value, R.mul(weight, d, prec), prec);
  });
  return [value, slope];
}

/** Every stationary point of the first `count` terms for μ/Q in [1/e, e], lowest scale first. */
export function stationaryPoints(
  e: Expansion,
  running: Running,
  centre: number,
  count: number,
  prec: number,
): readonly Stationary[] {
  const coefficients = e.coefficients.slice(0, count);
  const work = prec + 32;
  const make = (bits: number): Problem => {
    const beta = betaFunction(
      running.beta.map((b) => b.ball(bits)),
      bits,
    );
    const table = logRows(coefficients, e.power, running.beta, bits);
    return { beta, table, run: runner(beta, e.x.ball(bits), bits), power: e.power };
  };
  const rough = make(GRID_BITS);
  const slopeAt = (L: number): number | undefined => {
    const found = at(rough, R.fromNumber(L), GRID_BITS);
    return found === undefined ? undefined : R.toNumber(found[1]);
  };
  // ln(μ²/Q²) runs over [−2, 2]; the series stands at ln(μ_0²/Q²) = centre.
  const grid = Array.from({ length: GRID + 1 }, (_, i) => -2 * HALF_WIDTH + (4 * HALF_WIDTH * i) / GRID - centre);
  const slopes = grid.map(slopeAt);
  const fine = make(work);
  return grid.slice(1).flatMap((high, i): Stationary[] => {
    const [left, right] = [slopes[i], slopes[i + 1]];
    if (left === undefined || right === undefined || left * right > 0) return [];
    const L = bisect(slopeAt, grid[i]!, high, left);
    const found = L === undefined ? undefined : refine(fine, L, prec);
    return found === undefined ? [] : [found];
  });
}

function bisect(f: (L: number) => number | undefined, low: number, high: number, atLow: number): number | undefined {
  let [a, b] = [low, high];
  for (let i = 0; i < BISECTIONS; i++) {
    const middle = (a + b) / 2;
    const value = f(middle);
    if (value === undefined) return undefined;
    if (value * atLow > 0) a = middle;
    else b = middle;
  }
  return (a + b) / 2;
}

/** Secant steps in balls from a double: the number of correct bits grows by half at each. */
function refine(p: Problem, start: number, prec: number): Stationary | undefined {
  const work = prec + 32;
  let [L, before] = [R.fromNumber(start), R.fromNumber(start + 2 ** -20)];
  let [here, there] = [at(p, L, work)?.[1], at(p, before, work)?.[1]];
  for (let i = 0; i < SECANTS; i++) {
    if (here === undefined || there === undefined) return undefined;
    const slope = R.div(R.sub(here, there, work), R.sub(L, before, work), work);
    const move = R.div(here, slope, work);
    if (!(move.rad < Infinity)) break;
    const next = R.exactMid(R.sub(L, move, work));
    [before, there] = [L, here];
    if (R.upperBits(R.sub(next, L, work)) < -prec / 2) {
      const value = at(p, next, work)?.[0];
      // What is left of L is far below 2^{-prec/2}; it enters the value squared.
      return value === undefined ? undefined : { shift: next, value };
    }
    L = next;
    here = at(p, L, work)?.[1];
  }
  return undefined;
}
