/**
 * @module The strength of the leading infrared singularity of a series, by independent published methods, with error.
 *
 * Purpose    N of N (1 − t/t_s)^(−1−p)[…], needed by subtraction schemes and by the ambiguity in powers of Λ.
 * Method     the sum rule in the geometric coupling and the ratio to the asymptotic form, with the Borel-factor expansion
 *            as a third witness; each at μ = Q and at μ = Q/2, 2Q (N scales as (μ/Q)^d, which is divided out).
 * Bound      error = the largest of: last step of the sum rule, disagreement of the two methods, half the spread under the
 *            change of scale. A heuristic: the result is indicative.
 * Reference  see estimates.ts.
 */
import { R, doubleField, exact, exactReal, log, toNumberExact, type Exact } from '../../numerics/index.js';
import { betaCoefficients } from '../beta-function.js';
import { divisorSize, type CouplingDivisor } from '../divisor.js';
import { expectedSingularity } from '../expected.js';
import { refuse, type Refusal } from '../refusal.js';
import { changeScale } from '../rewrite/scale.js';
import { cSchemeBeta, relationOfBetas } from '../rewrite/schemes.js';
import { substituteOver } from '../rewrite/relation.js';
import { checkTheory } from '../running/domain.js';
import { asymptoticRatio, borelFactor, sumRule } from './estimates.js';

export interface NormalisationQuestion {
  /** Coefficients of x^(n + firstPower) at μ = Q, x = α_s/divisor, MSbar. */
  readonly coefficients: readonly Exact[];
  /** ≥ 1. */
  readonly firstPower: number;
  readonly divisor: CouplingDivisor;
  readonly flavours: number;
  /** d > 0 of the leading power correction Λ^d/Q^d, an operator without anomalous dimension. */
  readonly dimension: number;
}

export interface NormalisationEstimate {
  readonly method: 'sum rule' | 'ratio to the asymptotic form' | 'expansion of the Borel factor';
  readonly reference: string;
  /** One value for each number of coefficients used. */
  readonly steps: readonly number[];
  /** From all coefficients, at μ = Q. */
  readonly value: number;
  /** The same from coefficients at μ = Q/2 and 2Q. */
  readonly scaleVariation: readonly [half: number, double: number];
}

export interface Normalisation {
  /** The sum rule at μ = Q, for the series in x. */
  readonly value: number;
  readonly error: number;
  /** The same for the series in α_s itself: N/divisor, the normalisation of the literature. */
  readonly inAlpha: { readonly value: number; readonly error: number };
  readonly estimates: readonly NormalisationEstimate[];
  readonly errorParts: { readonly lastStep: number; readonly methods: number; readonly scale: number };
  readonly notes: readonly string[];
}

/** Fewer known coefficients tell nothing about the strength. */
const LEAST_COEFFICIENTS = 2;
/** Half the range of μ for the scale variation. */
const SCALE_FACTOR = 2;

interface Setting {
  readonly t: number;
  readonly p: number;
  readonly corrections: readonly number[];
  readonly b: readonly number[];
  readonly geometric: readonly number[];
  readonly dimension: number;
}

/** The three estimates for r_0, r_1, … of x^(n+1). */
function estimate(r: readonly number[], s: Setting): readonly (readonly number[])[] {
  const n = r.length;
  const b = Array.from({ length: n }, (_, k) => s.b[k] ?? 0);
  const bNew = Array.from({ length: n }, (_, k) => s.geometric[k] ?? 0);
  const relation = relationOfBetas(doubleField, b, bNew, 0, n);
  const geometric = substituteOver(doubleField, r, 1, relation, n);
  const [b0 = NaN, b1 = NaN] = s.b;
  return [
    sumRule(geometric, b0, b1 / b0, s.dimension),
    asymptoticRatio(r, s.t, s.p, s.corrections),
    borelFactor(r, s.t, s.p),
  ];
}

/** ln(factor²) as an exact number. */
const logSquare = (factor: number): Exact => exactReal((prec) => R.mul2exp(log(R.fromNumber(factor), prec + 4), 1));

const METHODS = [
  { method: 'sum rule', reference: 'arXiv:1701.00347, arXiv:1712.04983' },
  { method: 'ratio to the asymptotic form', reference: 'arXiv:1605.03609' },
  { method: 'expansion of the Borel factor', reference: 'Phys. Rev. D56 (1997) 1091, hep-ph/0105008' },
] as const;

/** N with its error; refuses ultraviolet dimensions and too short series. */
export function leadingNormalisation(question: NormalisationQuestion): Normalisation | Refusal {
  const { coefficients, firstPower, divisor, flavours, dimension } = question;
  const bad = checkTheory(flavours, 1);
  if (bad !== undefined) return bad;
  if (!(dimension > 0) || !Number.isInteger(firstPower) || firstPower < 1) {
    return refuse(
      'the strength is estimated for an infrared singularity of a series that starts at a positive power of α_s',
      'give a positive operator dimension and a first power of at least 1',
    );
  }
  if (coefficients.length < LEAST_COEFFICIENTS) {
    return refuse('one coefficient says nothing about the strength of a singularity', 'give at least two coefficients');
  }
  const expected = expectedSingularity({ flavours, dimension, divisor });
  const count = coefficients.length + firstPower;
  const setting: Setting = {
    t: toNumberExact(expected.t),
    p: toNumberExact(expected.exponent) - 1,
    corrections: expected.corrections.slice(0, 2).map(toNumberExact),
    b: betaCoefficients(flavours, divisor).map(toNumberExact),
    geometric: cSchemeBeta(flavours, divisor, count).map(toNumberExact),
    dimension,
  };
  const padding = Array.from({ length: firstPower - 1 }, () => exact(0));
  const beta = betaCoefficients(flavours, divisor);
  const at = (factor: number): readonly (readonly number[])[] => {
    const list = factor === 1 ? coefficients : changeScale({ coefficients, firstPower }, beta, logSquare(factor));
    const r = [...padding, ...list].map(toNumberExact);
    return estimate(r, setting).map((steps) => steps.map((x) => x / factor ** dimension));
  };
  const [central, half, double] = [at(1), at(1 / SCALE_FACTOR), at(SCALE_FACTOR)];
  const last = (list: readonly number[] | undefined): number => list?.[list.length - 1] ?? NaN;
  const estimates = METHODS.map((m, i): NormalisationEstimate => {
    const steps = central[i] ?? [];
    return { ...m, steps, value: last(steps), scaleVariation: [last(half[i]), last(double[i])] };
  });
  const [rule, ratio] = estimates;
  const steps = rule?.steps ?? [];
  const value = rule?.value ?? NaN;
  const spread = [value, ...(rule?.scaleVariation ?? [])];
  const errorParts = {
    lastStep: Math.abs(value - (steps[steps.length - 2] ?? NaN)),
    methods: Math.abs(value - (ratio?.value ?? NaN)),
    scale: (Math.max(...spread) - Math.min(...spread)) / 2,
  };
  const notes =
    dimension > 2
      ? ['an ultraviolet singularity at u = −1 lies closer: the estimates do not converge, use few coefficients']
      : [];
  const error = Math.max(errorParts.lastStep, errorParts.methods, errorParts.scale);
  const size = toNumberExact(divisorSize(divisor));
  return { value, error, inAlpha: { value: value / size, error: error / size }, estimates, errorParts, notes };
}
