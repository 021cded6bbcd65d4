/**
 * @module Least squares of a few parameters: χ²(p) = r(p)ᵀ V⁻¹ r(p), r = X − X_theory(p).
 *
 * Method     Levenberg and Marquardt on the whitened residuals L⁻¹ r, V = L Lᵀ; derivatives by central differences.
 * Bound      settles where a step changes every parameter by less than 1e-11 of itself, or χ² no more.
 * Reference  K. Levenberg 1944; D. W. Marquardt, J. SIAM 11 (1963) 431 (both from memory).
 */
import { cholesky, forward, gram, inverseOf, solveWith } from './matrix.js';
import type { Matrix } from './matrix.js';

/** What the theory says of all data; undefined where it says nothing. */
export type TheoryVector = (parameters: readonly number[]) => readonly number[] | undefined;

export interface Minimum {
  readonly parameters: readonly number[];
  readonly chiSquare: number;
  /** (Jᵀ V⁻¹ J)⁻¹. */
  readonly covariance: Matrix;
  /** dX_i/dp_k at the minimum. */
  readonly jacobian: Matrix;
  readonly theory: readonly number[];
}

const STEPS = 100;
const SETTLED = 1e-11;
/** Where the theory bends so much that steps shorten slowly: after so many, χ² that falls by less than this has settled. */
const PATIENCE = 12;
const LEVEL = 1e-12;
/** Relative step of the derivatives. */
const DIFFERENCE = 2 ** -17;
/** First damping, and how it changes. Heuristics of Marquardt. */
const DAMPING = 1e-3;
const FACTOR = 10;
/** Damping beyond this means that no step downhill is left. */
const STUCK = 1e12;

/** dX_i/dp_k. */
export function jacobianOf(
  theory: TheoryVector,
  p: readonly number[],
  free: readonly number[],
): number[][] | undefined {
  const columns: number[][] = [];
  for (const k of free) {
    const h = Math.abs(p[k] ?? 0) * DIFFERENCE;
    const at = (sign: number): readonly number[] | undefined => theory(p.map((x, i) => (i === k ? x + sign * h : x)));
    const [up, down] = [at(1), at(-1)];
    if (up === undefined || down === undefined) return undefined;
    columns.push(up.map((x, i) => (x - (down[i] ?? NaN)) / (2 * h)));
  }
  return (columns[0] ?? []).map((_, i) => columns.map((c) => c[i] ?? NaN));
}

const square = (v: readonly number[]): number => v.reduce((sum, x) => sum + x * x, 0);

/**
 * The minimum from a start, over the parameters `free` (all when absent). `factor` is L of the covariance of the data.
 * Undefined when the theory has no value near the start or two parameters cannot be told apart.
 */
export function minimise(
  theory: TheoryVector,
  data: readonly number[],
  factor: Matrix,
  start: readonly number[],
  free: readonly number[] = start.map((_, k) => k),
): Minimum | undefined {
  const whitened = (x: readonly number[]): number[] =>
    forward(
      factor,
      data.map((d, i) => d - (x[i] ?? NaN)),
    );
  let p = [...start];
  let x = theory(p);
  if (free.length === 0)
    return x && { parameters: p, chiSquare: square(whitened(x)), covariance: [], jacobian: [], theory: x };
  let damping = DAMPING;
  for (let step = 0; step < STEPS; step++) {
    if (x === undefined) return undefined;
    const r = whitened(x);
    const chi = square(r);
    const raw = jacobianOf(theory, p, free);
    if (raw === undefined || !Number.isFinite(chi)) return undefined;
    const j = whitenedColumns(raw, factor);
    const normal = gram(j);
    const downhill = free.map((_, a) => j.reduce((sum, row, i) => sum + (row[a] ?? 0) * (r[i] ?? 0), 0));
    let moved = 0;
    for (;;) {
      const damped = normal.map((row, a) => row.map((value, b) => (a === b ? value * (1 + damping) : value)));
      const l = cholesky(damped);
      if (l === undefined) return undefined;
      const move = solveWith(l, downhill);
      const next = p.map((value, k) => value + (move[free.indexOf(k)] ?? 0));
      const there = theory(next);
      if (there !== undefined && square(whitened(there)) <= chi * (1 + 1e-14)) {
        moved = Math.max(...free.map((k, a) => Math.abs((move[a] ?? 0) / (p[k] ?? 1))));
        [p, x] = [next, there];
        damping /= FACTOR;
        break;
      }
      damping *= FACTOR;
      if (damping > STUCK) break;
    }
    const gained = chi - square(whitened(x));
    if (moved <= SETTLED || (step >= PATIENCE && gained < LEVEL))
      return settled(theory, p, x, square(whitened(x)), factor, free);
  }
  return undefined;
}

/** L⁻¹ J. */
function whitenedColumns(j: Matrix, factor: Matrix): number[][] {
  const columns = (j[0] ?? []).map((_, k) =>
    forward(
      factor,
      j.map((row) => row[k] ?? NaN),
    ),
  );
  return j.map((_, i) => columns.map((c) => c[i] ?? NaN));
}

function settled(
  theory: TheoryVector,
  parameters: readonly number[],
  x: readonly number[],
  chiSquare: number,
  factor: Matrix,
  free: readonly number[],
): Minimum | undefined {
  const jacobian = jacobianOf(theory, parameters, free);
  if (jacobian === undefined) return undefined;
  const l = cholesky(gram(whitenedColumns(jacobian, factor)));
  return l === undefined ? undefined : { parameters, chiSquare, covariance: inverseOf(l), jacobian, theory: x };
}

/** Change of the free parameters by a change δ of the theory at the minimum: −C Jᵀ V⁻¹ δ. */
export function response({ covariance, jacobian }: Minimum, factor: Matrix, delta: readonly number[]): number[] {
  const weighted = solveWith(factor, delta);
  const pull = (jacobian[0] ?? []).map((_, k) =>
    jacobian.reduce((sum, row, i) => sum + (row[k] ?? 0) * (weighted[i] ?? 0), 0),
  );
  return covariance.map((row) => -row.reduce((sum, value, k) => sum + value * (pull[k] ?? 0), 0));
}
