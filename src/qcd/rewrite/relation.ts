/**
 * @module A series in another coupling: x = k_1 X + k_2 X² + …, with the coefficients exact.
 * Method  composition of truncated power series. A relation known to r terms fixes as many coefficients of the series.
 * Bound   exact for rational input; enclosures of any precision otherwise.
 */
import { exact, type Exact } from '../../numerics/index.js';
import { liftExact, type Ring } from '../algebra/ring.js';
import { compose, mulSeries, powSeries, reciprocal, reversion } from '../algebra/truncated.js';

const NOUGHT = exact(0);
const UNIT = exact(1);

/** R = Σ_n c_n x^(n + firstPower). */
export interface CoefficientSeries {
  readonly coefficients: readonly Exact[];
  readonly firstPower: number;
}

/** k_1, k_2, … of x = k_1 X + k_2 X² + … */
export type CouplingRelation = readonly Exact[];

/** c′_n of Σ c_n x^(n+p) = Σ c′_n X^(n+p), over any ring. */
export function substituteOver<T>(
  ring: Ring<T>,
  c: readonly T[],
  firstPower: number,
  relation: readonly T[],
  length: number,
): T[] {
  const inner = [ring.zero, ...relation];
  const body = compose(ring, c, inner, length);
  const ratio = firstPower < 0 ? reciprocal(ring, relation, length) : relation;
  return mulSeries(ring, powSeries(ring, ratio, Math.abs(firstPower), length), body, length);
}

/** How many coefficients a relation of r known terms fixes. */
const fixedTerms = (series: CoefficientSeries, r: number): number =>
  Math.min(series.coefficients.length, series.firstPower === 0 ? r + 1 : r);

/**
 * The coefficients in the new coupling X, given the old one in terms of the new one. Fewer come back than went in when
 * the relation is not known far enough.
 */
export function substituteCoupling(series: CoefficientSeries, oldInNew: CouplingRelation): Exact[] {
  const n = series.coefficients.length;
  const length = fixedTerms(series, oldInNew.length);
  return liftExact([...series.coefficients, ...oldInNew], (ring, x) =>
    substituteOver(ring, x.slice(0, length), series.firstPower, x.slice(n), length),
  );
}

/** X in powers of x from x in powers of X, to the same number of terms. Refuses k_1 = 0 (RangeError). */
export const invertRelation = (relation: CouplingRelation): Exact[] =>
  liftExact(relation, (ring, k) => reversion(ring, [ring.zero, ...k], k.length + 1).slice(1));

/** x in powers of Y from x(X) and X(Y), to the shorter number of terms. */
export function chainRelations(outer: CouplingRelation, inner: CouplingRelation): Exact[] {
  const n = Math.min(outer.length, inner.length);
  return liftExact([...outer.slice(0, n), ...inner.slice(0, n)], (ring, x) =>
    compose(ring, [ring.zero, ...x.slice(0, n)], [ring.zero, ...x.slice(n)], n + 1).slice(1),
  );
}

/**
 * The matrix M of a linear map on coefficient lists, c′ = M c, for errors and correlations: column j is the image of the
 * j-th unit list.
 */
export function mapMatrix(length: number, map: (unit: readonly Exact[]) => readonly Exact[]): Exact[][] {
  const columns = Array.from({ length }, (_, j) => map(Array.from({ length }, (__, i) => (i === j ? UNIT : NOUGHT))));
  const rows = columns[0]?.length ?? 0;
  return Array.from({ length: rows }, (_, i) => columns.map((column) => column[i] ?? NOUGHT));
}
