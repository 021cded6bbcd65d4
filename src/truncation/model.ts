/**
 * @module The one interface of all truncation-error models.
 *
 * A model looks at the known terms and says how far the sum may lie from the truth, as one band at 68 % and one at 95 %,
 * or refuses with reason and remedy. It never returns a number that it does not believe.
 */
import type { Ball } from '../numerics/index.js';
import type { Expansion } from '../series/index.js';
import type { CouplingDivisor } from '../qcd/index.js';
import type { Known } from './known.js';
import type { PriorName, Priors } from './priors.js';

/** credible: a posterior probability under stated priors. conventional: a custom, without a probability behind it. */
export type Nature = 'credible' | 'conventional';

export const LEVELS = [68, 95] as const;
export type Level = (typeof LEVELS)[number];

/** Signed distances from the sum, in units of 2^known.unit. */
export interface Band {
  readonly low: number;
  readonly high: number;
}

export interface Estimate {
  readonly kind: 'estimate';
  /** How many known terms are in the sum that the bands belong to. */
  readonly terms: number;
  /** The model's own guess of the next term (credible: its posterior mean), where it has a sign. */
  readonly next?: number;
  readonly bands: Readonly<Record<Level, Band>>;
  /** Numbers worth knowing: posterior mean of the ratio, the scale of the band. Pure numbers, or in the unit of the terms. */
  readonly facts: readonly Fact[];
  readonly notes: readonly string[];
}

export interface Fact {
  readonly name: string;
  readonly value: number;
  /** The value is in units of 2^known.unit. */
  readonly scaled?: boolean;
}

export interface TruncationRefusal {
  readonly kind: 'refusal';
  readonly reason: string;
  readonly remedy: string;
}

/** The expansion at another scale. */
export interface Moved {
  readonly kind: 'moved';
  readonly alpha: number;
  readonly x: number;
  readonly coefficients: readonly Ball[];
}

/** A leading singularity as the models need it: position in t, exponent γ where it is known. */
export interface Leading {
  readonly t: number;
  readonly exponent?: number;
  readonly origin: string;
}

export interface Question {
  readonly known: Known;
  readonly expansion: Expansion;
  readonly coupling: {
    readonly name: string;
    readonly divisor: CouplingDivisor;
    readonly plain: boolean;
  };
  /** Number of flavours, where the coupling runs by the beta function of QCD. */
  readonly flavours?: number;
  readonly priors: Priors;
  /** Singularities that the terms themselves show, nearest first. */
  readonly found?: readonly Leading[];
  /** All coefficients at μ′, ln(μ′²/μ²) = logRatio; the first ones do not depend on the later ones. */
  atScale(logRatio: number): Moved | TruncationRefusal;
}

export interface TruncationModel {
  readonly name: string;
  readonly title: string;
  /** One line: what it is, for lists. */
  readonly summary: string;
  readonly nature: Nature;
  /** What the band is about: the first missing term, or all that is missing. */
  readonly about: 'next term' | 'remainder';
  /** The adjustable assumptions that enter. */
  readonly priors: readonly PriorName[];
  /** Significant digits that the numbers behind a band are good to. */
  readonly digits: number;
  /** Authors and identifier. */
  readonly reference: string;
  estimate(question: Question): Estimate | TruncationRefusal;
}

export const refuse = (reason: string, remedy: string): TruncationRefusal => ({ kind: 'refusal', reason, remedy });

export const symmetric = (half: number): Band => ({ low: -half, high: half });

/** "1 coefficient", "2 coefficients". */
export const counted = (n: number): string => `${n} coefficient${n === 1 ? '' : 's'}`;

/** Refusal of a model that needs more terms; undefined when there are enough. */
export function tooFew(known: Known, least: number, why: string): TruncationRefusal | undefined {
  if (known.values.length >= least) return undefined;
  return refuse(
    `${counted(known.values.length)} known: ${why}`,
    `give at least ${least} coefficients, not counting zeros in front`,
  );
}
