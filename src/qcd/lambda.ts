/**
 * @module Λ_MSbar: the exact definition, the conventional asymptotic one, and their inverses, in doubles.
 *
 * Method     exact: ln(μ²/Λ²) in closed form (running/flow.ts). Asymptotic: the expansion of α_s in 1/ln(μ²/Λ²)
 *            truncated after as many terms as loops, solved for Λ by bisection and Newton steps.
 * Bound      exact form: rounding only. The asymptotic form differs by the terms left out, at the per-cent level for
 *            n_f = 3 near 1 GeV: quote which one was used.
 * Reference  FLAG Review 2024, arXiv:2411.04268, Eq. (285).
 */
import type { Loops } from './beta-function.js';
import { refuse, type Refusal } from './refusal.js';
import { checkCoupling, checkScale, checkTheory, isLoops, logOfRatio } from './running/domain.js';
import { invertLog } from './running/evolve.js';
import { expandedAlpha, expandedLog } from './running/expanded.js';
import { flowOf, logOverLambda } from './running/flow.js';

/** 'exact': the integral of the truncated beta function; 'asymptotic': the truncated expansion in 1/ln(μ²/Λ²). */
export type LambdaDefinition = 'exact' | 'asymptotic';

/** One line for people about a definition. */
export const LAMBDA_DEFINITIONS: Readonly<Record<LambdaDefinition, string>> = {
  exact: 'Λ_MSbar from the integral of the truncated beta function',
  asymptotic: 'Λ_MSbar from the truncated expansion in 1/ln(μ²/Λ²)',
};

interface Theory {
  readonly flavours: number;
  /** 1 to 5 loops. */
  readonly loops: number;
  readonly definition?: LambdaDefinition;
}

/** Λ_MSbar in the unit of `scale`, from α_s(scale). */
export function lambdaOf(alpha: number, scale: number, theory: Theory): number | Refusal {
  const bad = checkTheory(theory.flavours, theory.loops) ?? checkScale('scale', scale);
  if (bad !== undefined) return bad;
  const flow = flowOf(theory.flavours, loopsOf(theory.loops));
  const wrong = checkCoupling(flow, alpha);
  if (wrong !== undefined) return wrong;
  if (theory.definition !== 'asymptotic') return scale * Math.exp(-logOverLambda(flow, alpha) / 2);
  const log = expandedLog(flow, alpha);
  return typeof log === 'number' ? scale * Math.exp(-log / 2) : log;
}

/** α_s(scale) from Λ_MSbar, both in one unit. */
export function alphaOfLambda(lambda: number, scale: number, theory: Theory): number | Refusal {
  const bad = checkTheory(theory.flavours, theory.loops) ?? checkScale('Λ', lambda) ?? checkScale('scale', scale);
  if (bad !== undefined) return bad;
  const flow = flowOf(theory.flavours, loopsOf(theory.loops));
  const log = logOfRatio(lambda, scale);
  if (theory.definition !== 'asymptotic') return invertLog(flow, log, startFor(flow.b0, log));
  if (!(log > 1)) {
    return refuse(
      `the scale ${scale} is too close to Λ = ${lambda} for the expansion in 1/ln(μ²/Λ²)`,
      'use the exact definition of Λ or a higher scale',
    );
  }
  return expandedAlpha(flow, log);
}

const loopsOf = (n: number): Loops => (isLoops(n) ? n : 5);

/** One-loop start, kept away from the singularity. */
const startFor = (b0: number, log: number): number => 1 / (b0 * Math.max(log, 0.5));
