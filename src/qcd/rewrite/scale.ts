/**
 * @module A series at another renormalisation scale, and its logarithms to any order.
 *
 * Method     x(μ) = exp(L β ∂_x) x with L = ln(μ²/μ′²) turned into powers of x(μ′) (algebra/renormalisation.ts). The beta
 *            function is used as given: coefficients beyond the list count as zero, so that a long series is re-expanded
 *            exactly for the truncated running, and μ → μ′ → μ is the identity to the order kept.
 * Bound      exact for rational coefficients and logarithms; enclosures otherwise.
 * Reference  the renormalisation group; check values by independent expansion (see the tests).
 */
import type { Exact } from '../../numerics/index.js';
import { polynomialRing } from '../algebra/polynomial-ring.js';
import { shiftCoupling, shiftMass } from '../algebra/renormalisation.js';
import { liftExact, type Ring } from '../algebra/ring.js';
import { substituteOver, type CoefficientSeries, type CouplingRelation } from './relation.js';

/** x(μ′) in powers of x(μ) to `terms` terms, log = ln(μ′²/μ²). */
export function scaleRelation(beta: readonly Exact[], log: Exact, terms: number): CouplingRelation {
  const b = beta.slice(0, Math.max(terms - 1, 0));
  return liftExact([log, ...b], (ring, [l, ...rest]) => shiftCoupling(ring, rest, l ?? ring.zero, terms + 1).slice(1));
}

/**
 * The coefficients in x(μ′) of a series given in x(μ), log = ln(μ′²/μ²). As many as went in.
 * A factor m(μ)^j of a running mass is carried by massFactor.
 */
export function changeScale(series: CoefficientSeries, beta: readonly Exact[], log: Exact): Exact[] {
  const n = series.coefficients.length;
  const b = beta.slice(0, Math.max(n - 1, 0));
  return liftExact([log, ...series.coefficients, ...b], (ring, [l, ...x]) => {
    const back = ring.sub(ring.zero, l ?? ring.zero);
    const relation = shiftCoupling(ring, x.slice(n), back, n + 1).slice(1);
    return substituteOver(ring, x.slice(0, n), series.firstPower, relation, n);
  });
}

/**
 * Table of the logarithms: entry [n][k] is the coefficient of x(μ)^(n + firstPower) L^k, L = ln(μ_0²/μ²), for a series
 * given at μ_0 (for an observable: its coefficients at μ_0 = Q). Row n has n + 1 entries.
 */
export function scaleLogTable(series: CoefficientSeries, beta: readonly Exact[]): Exact[][] {
  const n = series.coefficients.length;
  const b = beta.slice(0, Math.max(n - 1, 0));
  const flat = liftExact([...series.coefficients, ...b], <T>(base: Ring<T>, x: readonly T[]): T[] => {
    const ring = polynomialRing(base);
    const lifted = x.map((c) => [c]);
    const relation = shiftCoupling(ring, lifted.slice(n), [base.zero, base.one], n + 1).slice(1);
    const rows = substituteOver(ring, lifted.slice(0, n), series.firstPower, relation, n);
    return rows.flatMap((row, i) => Array.from({ length: i + 1 }, (_, k) => row[k] ?? base.zero));
  });
  return Array.from({ length: n }, (_, i) => flat.slice((i * (i + 1)) / 2, ((i + 1) * (i + 2)) / 2));
}

/** m(μ′)/m(μ) in powers of x(μ), `terms` coefficients from x^0 on, log = ln(μ′²/μ²). */
export function massFactor(beta: readonly Exact[], gamma: readonly Exact[], log: Exact, terms: number): Exact[] {
  const b = beta.slice(0, Math.max(terms - 2, 0));
  const g = gamma.slice(0, Math.max(terms - 1, 0));
  return liftExact([log, ...b, ...g], (ring, [l, ...x]) =>
    shiftMass(ring, x.slice(0, b.length), x.slice(b.length), l ?? ring.zero, terms),
  );
}
