/**
 * @module The ambiguity that no prescription removes from a pole mass, under its named conventions, in GeV and in Λ.
 *
 * Formulas   |Im|/π = N (2π/β_0) 2^(−b) Λ/Γ(1+b), exact in the coupling; |Im| is π times that. Least term and near-least partial
 *            sums from the known terms, continued by N μ a_n α^(n+1) beyond them.
 * Bound      indicative: N is an estimate, and so are the terms beyond the known ones.
 * Reference  conventions and who uses them: ambiguity/conventions.ts.
 */
import { conventions, type Convention } from '../ambiguity/index.js';
import { rgammaDouble, toNumberExact } from '../numerics/index.js';
import { asymptoticNumbers, renormalonOf } from './asymptotic.js';

export interface PoleAmbiguityQuestion {
  readonly light: number;
  /** N of the series in α_s. */
  readonly strength: number;
  /** Λ_MSbar with n_l flavours, in GeV. */
  readonly lambda: number;
  /** GeV. */
  readonly mu: number;
  /** α_s(μ) with n_l flavours. */
  readonly alpha: number;
  /** The known terms of M − m(m) at μ in GeV, from order α_s on. */
  readonly terms: readonly number[];
}

export interface PoleAmbiguity {
  /** GeV, with the sentence of its origin. */
  readonly conventions: readonly Convention[];
  /** All terms that were looked at, known and continued. */
  readonly terms: readonly number[];
  readonly known: number;
}

/** (|Im|/π)/Λ for the strength N. */
export function ambiguityOverLambda(light: number, strength: number): number {
  const { b, t } = renormalonOf(light);
  const exponent = b.toNumber();
  return strength * toNumberExact(t) * 2 ** -exponent * rgammaDouble(1 + exponent);
}

/** Terms looked at: past the least one by more than the near-least ones reach. */
const MORE_TERMS = 12;
const MOST_TERMS = 100;

/** All conventions side by side. */
export function poleAmbiguity(question: PoleAmbiguityQuestion): PoleAmbiguity {
  const { light, strength, lambda, mu, alpha, terms } = question;
  const x = toNumberExact(renormalonOf(light).t) / alpha;
  const count = Math.min(MOST_TERMS, Math.max(terms.length, Math.ceil(x)) + MORE_TERMS);
  const a = asymptoticNumbers(light, count);
  const all = Array.from({ length: count }, (_, n) => terms[n] ?? strength * mu * (a[n] ?? 0) * alpha ** (n + 1));
  let sum = 0;
  const sums = all.map((term) => (sum += term));
  const powers = all.map((_, n) => n + 1);
  const im = Math.PI * Math.abs(ambiguityOverLambda(light, strength)) * lambda;
  const origin = { im, size: mu, origin: 'the Borel sum of the pole mass' };
  return { conventions: conventions(all, sums, powers, true, origin), terms: all, known: terms.length };
}
