/**
 * @module Least squares where the model is not exact and the coefficients have errors of their own.
 *
 * Purpose    weights 1/(σ² + ρ_n²): ρ_n the relative error of c_n, σ the discrepancy of the model. Without σ a few exact
 *            coefficients would outweigh all the others.
 * Method     σ² from an unweighted fit first, then the weighted one.
 * Bound      standard errors are those of the weights, enlarged where the residuals say so.
 */
import { leastSquares } from './least-squares.js';

export interface WeightedFit {
  readonly coefficients: readonly number[];
  readonly standardErrors: readonly number[];
}

/** Smallest discrepancy, relative to the median error: a fit that goes through the points is luck. */
const LUCK = 0.1;
const TINY = 1e-32;

/** columns as in leastSquares; errors ρ_n. Undefined without a degree of freedom left. */
export function weightedFit(
  columns: readonly (readonly number[])[],
  y: readonly number[],
  errors: readonly number[],
): WeightedFit | undefined {
  const dof = y.length - columns.length;
  if (dof < 1) return undefined;
  const plain = leastSquares(columns, y);
  if (plain === undefined) return undefined;
  const median = [...errors].sort((a, b) => a - b)[Math.floor(errors.length / 2)] ?? 0;
  const discrepancy = Math.max(plain.rss / dof, (LUCK * median) ** 2, TINY);
  const fit = leastSquares(
    columns,
    y,
    errors.map((e) => discrepancy / (discrepancy + e * e)),
  );
  if (fit === undefined) return undefined;
  const scale = Math.max(fit.rss / dof, discrepancy);
  return { coefficients: fit.coefficients, standardErrors: fit.unitVariances.map((v) => Math.sqrt(scale * v)) };
}
