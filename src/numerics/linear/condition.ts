/**
 * @module Condition number of a matrix of doubles, estimated.
 *
 * Purpose    say how many digits a solve in doubles may have lost.
 * Method     1-norms; ‖A^{-1}‖ by Hager's maximisation of ‖A^{-1}x‖ over the unit ball with a few solves.
 * Bound      a lower bound of the true condition number, seldom below a third of it; Infinity for a singular matrix.
 * Reference  W. W. Hager, SIAM J. Sci. Stat. Comput. 5 (1984) 311; N. J. Higham, ACM TOMS 14 (1988) 381.
 */
import { doubleField } from '../field.js';
import { lu, solveFactored, type Matrix } from './lu.js';

/** Heuristic: the maximisation nearly always ends after two steps. */
const STEPS = 5;

/** Estimate of ‖A‖₁‖A^{-1}‖₁. */
export function conditionEstimate(a: Matrix<number>): number {
  const n = a.length;
  if (n === 0) return 1;
  const f = lu(doubleField, a);
  const transposed = lu(
    doubleField,
    a.map((_, i) => a.map((row) => row[i]!)),
  );
  if (f.kind !== 'regular' || transposed.kind !== 'regular') return Infinity;
  let x: number[] = new Array<number>(n).fill(1 / n);
  let estimate = 0;
  for (let step = 0; step < STEPS; step++) {
    const y = solveFactored(doubleField, f, x);
    estimate = Math.max(estimate, norm1(y));
    const z = solveFactored(
      doubleField,
      transposed,
      y.map((v) => (v >= 0 ? 1 : -1)),
    );
    const best = z.reduce((k, v, i) => (Math.abs(v) > Math.abs(z[k]!) ? i : k), 0);
    const product = z.reduce((s, v, i) => s + v * x[i]!, 0);
    if (Math.abs(z[best]!) <= product) break;
    x = x.map((_, i) => (i === best ? 1 : 0));
  }
  const columns = a.map((_, j) => a.reduce((s, row) => s + Math.abs(row[j]!), 0));
  return estimate * Math.max(...columns);
}

const norm1 = (v: readonly number[]): number => v.reduce((s, c) => s + Math.abs(c), 0);
