/**
 * @module One step over a heavy-quark threshold, both ways, in doubles.
 *
 * Method     downwards α_s^(nl) = α_s^(nl+1) Z(α_s^(nl+1)/π, l), Z truncated at the asked number of loops; upwards the
 *            same truncated relation is solved for α_s^(nl+1), so that down and up again is the identity.
 *            Masses of light quarks likewise with ζ.
 * Bound      rounding; the truncation is the caller's choice.
 */
import { refuse, type Refusal } from '../refusal.js';
import type { HeavyMass, MatchingTable } from './logs.js';
import { doubleTable } from './tables.js';

export interface Matching {
  /** Light flavours nl; the other side has nl + 1. */
  readonly light: number;
  /** ln(μ²/mass²) for the mass definition below. */
  readonly log: number;
  readonly heavyMass: HeavyMass;
  /** 0 to 4: powers of α_s kept in Z and ζ. */
  readonly loops: number;
}

/** Coefficients of (α_s/π)^0 … at a given logarithm. */
function atLog(table: MatchingTable<number>, log: number, loops: number): number[] {
  return table.slice(0, loops + 1).map((row) => {
    let sum = 0;
    for (let j = row.length - 1; j >= 0; j--) sum = sum * log + (row[j] ?? 0);
    return sum;
  });
}

function horner(c: readonly number[], x: number): number {
  let sum = 0;
  for (let k = c.length - 1; k >= 0; k--) sum = sum * x + (c[k] ?? 0);
  return sum;
}

/** α_s^(nl) from α_s^(nl+1), same scale. */
export function matchDown(alpha: number, matching: Matching): number | Refusal {
  const z = atLog(doubleTable(matching.light, 'coupling', matching.heavyMass), matching.log, matching.loops);
  const result = alpha * horner(z, alpha / Math.PI);
  return result > 0 ? result : useless(matching);
}

const STEPS = 100;

/** α_s^(nl+1) from α_s^(nl), same scale: the solution of the truncated relation that continues α_s^(nl+1) = α_s^(nl). */
export function matchUp(alpha: number, matching: Matching): number | Refusal {
  const z = atLog(doubleTable(matching.light, 'coupling', matching.heavyMass), matching.log, matching.loops);
  const derivative = z.map((c, k) => c * (k + 1));
  const goal = alpha / Math.PI;
  let x = goal;
  for (let k = 0; k < STEPS; k++) {
    const f = x * horner(z, x) - goal;
    const slope = horner(derivative, x);
    if (!(slope > 0)) return useless(matching);
    const next = x - f / slope;
    if (!(next > 0)) return useless(matching);
    const done = Math.abs(next - x) <= 2e-16 * x;
    x = next;
    if (done) break;
  }
  return Math.PI * x;
}

/** m_q^(nl)/m_q^(nl+1) at the coupling α_s^(nl+1). */
export function massRatio(alphaHeavy: number, matching: Matching): number {
  const z = atLog(doubleTable(matching.light, 'mass', matching.heavyMass), matching.log, matching.loops);
  return horner(z, alphaHeavy / Math.PI);
}

const useless = (matching: Matching): Refusal =>
  refuse(
    `the matching between ${matching.light} and ${matching.light + 1} flavours does not converge at this scale ` +
      `(logarithm ${matching.log.toPrecision(3)})`,
    'match closer to the quark mass or at a higher scale',
  );
