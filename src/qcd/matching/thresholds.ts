/**
 * @module The heavy-quark thresholds: which masses, at which scales they are crossed.
 * Defaults are the published MSbar masses of the constants, crossed at μ = m(m).
 */
import { INPUTS } from '../constants/index.js';
import { refuse, type Refusal } from '../refusal.js';
import { checkScale, logOfRatio } from '../running/domain.js';
import { checkMass } from '../running/evolve-mass.js';
import type { HeavyMass } from './logs.js';

export interface Threshold {
  /** Name for reports: c, b, t. */
  readonly name: string;
  /** Flavours above the threshold: 4, 5, 6 for c, b, t. */
  readonly flavours: number;
  /** Mass in GeV, of the kind below. */
  readonly mass: number;
  /** Default 'scale-invariant': m(m). 'running' is m(scale) at the scale of the crossing. */
  readonly kind?: HeavyMass;
  /** Crossing scale in GeV; default: the mass. */
  readonly scale?: number;
  /** One standard deviation of the mass. */
  readonly error?: number;
}

/** Standard deviations of a 90 per cent interval. */
const NINETY_PER_CENT = 1.645;

/** c, b, t with the masses of the 2026 tables of the Particle Data Group. */
export const DEFAULT_THRESHOLDS: readonly Threshold[] = [
  {
    name: 'c',
    flavours: 4,
    mass: Number(INPUTS.mCharm.value),
    error: Number(INPUTS.mCharm.error[0]) / NINETY_PER_CENT,
  },
  {
    name: 'b',
    flavours: 5,
    mass: Number(INPUTS.mBottom.value),
    error: Number(INPUTS.mBottom.error[0]) / NINETY_PER_CENT,
  },
  { name: 't', flavours: 6, mass: Number(INPUTS.mTop.value), error: Number(INPUTS.mTop.error[0]) },
];

export const crossingScale = (t: Threshold): number => t.scale ?? t.mass;

/** ln(μ²/mass²) at the crossing. */
export const crossingLog = (t: Threshold): number => logOfRatio(t.mass, crossingScale(t));

/** The thresholds with every crossing scale multiplied by a factor: 1/2, 1, 2 measure the matching spread. */
export const scaledThresholds = (list: readonly Threshold[], factor: number): readonly Threshold[] =>
  list.map((t) => ({ ...t, scale: crossingScale(t) * factor }));

/** Number of active flavours at a scale: the light ones and every quark whose threshold lies below. */
export function flavoursAt(scale: number, list: readonly Threshold[] = DEFAULT_THRESHOLDS): number {
  const crossed = list.filter((t) => scale >= crossingScale(t)).map((t) => t.flavours);
  const lowest = Math.min(...list.map((t) => t.flavours - 1));
  return list.length === 0 ? NaN : Math.max(lowest, ...crossed);
}

export function checkThresholds(list: readonly Threshold[]): Refusal | undefined {
  for (const t of list) {
    const bad = checkMass(t.mass) ?? checkScale(`the threshold of ${t.name}`, crossingScale(t));
    if (bad !== undefined) return bad;
    if (list.some((u) => u !== t && u.flavours === t.flavours)) {
      return refuse(`two thresholds lead to ${t.flavours} flavours`, 'give one threshold for each number of flavours');
    }
  }
  return undefined;
}

/** The threshold between n−1 and n flavours, or a refusal that says how to supply it. */
export function thresholdTo(flavours: number, list: readonly Threshold[]): Threshold | Refusal {
  return (
    list.find((t) => t.flavours === flavours) ??
    refuse(
      `no threshold is known between ${flavours - 1} and ${flavours} flavours`,
      `give the mass of the quark that makes ${flavours} flavours, or stay at fixed n_f`,
    )
  );
}
