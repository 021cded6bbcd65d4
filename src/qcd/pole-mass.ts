/**
 * @module Pole mass from the MSbar mass and back, in doubles.
 *
 * Method     M = m(m) [1 + Σ c_k (α_s/π)^k] with α_s at μ = m(m), and its exact inverse at the same order (the m(m) whose
 *            pole mass is M), so that there and back is the identity. The series diverges: successive terms and their
 *            ambiguity are the business of the caller.
 * Bound      rounding; `coefficientError` is the error of the numerically known four-loop coefficient.
 * Reference  K. Melnikov, T. van Ritbergen, hep-ph/9912391; P. Marquard et al., arXiv:1606.06754.
 */
import { Rational, exact, toNumberExact } from '../numerics/index.js';
import { POLE_OVER_MSBAR, formalAt, numberOfFormal } from './constants/index.js';
import { refuse, isRefusal, type Refusal } from './refusal.js';
import { massRatioSeries } from './rewrite/mass.js';
import { checkScale, checkTheory } from './running/domain.js';
import { evolveAlpha } from './running/evolve.js';
import { checkMass } from './running/evolve-mass.js';

/** Known orders of the pole-mass relation. */
export const MAX_POLE_LOOPS = 4;

export interface PoleMass {
  readonly value: number;
  /** m(m), then the terms of order α_s, α_s², …, in the unit of the mass. */
  readonly terms: readonly number[];
  /** From the error of the four-loop coefficient; 0 below four loops. */
  readonly coefficientError: number;
}

export interface PoleMassQuestion {
  /** m(m), MSbar with nl + 1 flavours. */
  readonly mass: number;
  /** α_s at μ = m(m). */
  readonly alpha: number;
  /** nl massless flavours. */
  readonly light: number;
  /** α_s with nl + 1 ('heavy', default) or nl flavours. */
  readonly coupling?: 'heavy' | 'light';
  /** 1 to 4; default 4. */
  readonly loops?: number;
}

const coefficients = new Map<string, readonly number[]>();

/** 1, c_1, …, c_4 of M/m(m) in α_s/π at μ = m(m). */
export function poleMassCoefficients(light: number, coupling: 'heavy' | 'light' = 'heavy'): readonly number[] {
  const key = `${light} ${coupling}`;
  let list = coefficients.get(key);
  if (list === undefined) {
    const question = { of: 'pole', over: 'msbar', light, divisor: 'pi', coupling, reference: 'msbar' } as const;
    list = massRatioSeries({ ...question, log: exact(0) }).map(toNumberExact);
    coefficients.set(key, list);
  }
  return list;
}

/** Error of c_4: the published errors added linearly. */
export function poleMassCoefficientError(light: number): number {
  const formula = POLE_OVER_MSBAR[MAX_POLE_LOOPS - 1]?.error ?? '0';
  return numberOfFormal(formalAt({ formula }, { nl: Rational.of(light) }));
}

function checkLoops(loops: number): Refusal | undefined {
  return Number.isInteger(loops) && loops >= 1 && loops <= MAX_POLE_LOOPS
    ? undefined
    : refuse(`the pole mass is known at 1 to ${MAX_POLE_LOOPS} loops, not ${loops}`, 'ask for 1, 2, 3 or 4 loops');
}

/** The pole mass, term by term. */
export function poleMass(question: PoleMassQuestion): PoleMass | Refusal {
  const { mass, alpha, light, coupling = 'heavy', loops = MAX_POLE_LOOPS } = question;
  const bad = checkMass(mass) ?? checkTheory(light, 1) ?? checkTheory(light + 1, 1) ?? checkLoops(loops);
  if (bad !== undefined) return bad;
  if (!(alpha > 0 && alpha < Infinity)) {
    return refuse(`the coupling ${alpha} is not a positive number`, 'give α_s(m) as a positive number');
  }
  const a = alpha / Math.PI;
  const c = poleMassCoefficients(light, coupling).slice(0, loops + 1);
  const terms = c.map((x, k) => mass * x * a ** k);
  const error = loops === MAX_POLE_LOOPS ? mass * poleMassCoefficientError(light) * a ** MAX_POLE_LOOPS : 0;
  return { value: terms.reduce((sum, x) => sum + x, 0), terms, coefficientError: error };
}

export interface MsbarMassQuestion {
  readonly pole: number;
  /** α_s with nl + 1 flavours at a reference scale. */
  readonly alpha: number;
  readonly scale: number;
  readonly light: number;
  /** Loops of the relation, 1 to 4; default 4. */
  readonly loops?: number;
  /** Loops of the running, 1 to 5; default 5. */
  readonly runningLoops?: number;
}

export interface MsbarMass {
  /** m(m). */
  readonly mass: number;
  /** α_s with nl + 1 flavours at μ = m(m). */
  readonly alpha: number;
}

const STEPS = 200;

/** m(m) with poleMass(m(m)) = M, by secant steps. */
export function msbarMass(question: MsbarMassQuestion): MsbarMass | Refusal {
  const { pole, alpha, scale, light, loops = MAX_POLE_LOOPS, runningLoops = 5 } = question;
  const bad = checkMass(pole) ?? checkScale('scale', scale) ?? checkLoops(loops);
  if (bad !== undefined) return bad;
  const at = (mass: number): { alpha: number; pole: number } | Refusal => {
    const there = evolveAlpha({ alpha, from: scale, to: mass, flavours: light + 1, loops: runningLoops });
    if (typeof there !== 'number') return there;
    const result = poleMass({ mass, alpha: there, light, loops });
    return isRefusal(result) ? result : { alpha: there, pole: result.value };
  };
  let mass = pole;
  let slope = 1;
  let before: { mass: number; gap: number } | undefined;
  for (let k = 0; k < STEPS; k++) {
    const here = at(mass);
    if (isRefusal(here)) return here;
    const gap = here.pole - pole;
    if (before !== undefined && before.mass !== mass) {
      const secant = (gap - before.gap) / (mass - before.mass);
      if (secant > 0.1) slope = secant;
    }
    before = { mass, gap };
    const next = mass - gap / slope;
    if (!(next > 0)) break;
    if (Math.abs(next - mass) <= 4e-16 * mass) return { mass: next, alpha: here.alpha };
    mass = next;
  }
  return refuse(
    `no MSbar mass has the pole mass ${pole} at ${loops} loops: the coupling is too strong at this scale`,
    'use fewer loops or a heavier quark',
  );
}
