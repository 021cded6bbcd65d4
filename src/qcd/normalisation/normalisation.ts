/**
 * @module The strength of the leading infrared singularity of a series, by independent published methods, each with an error.
 *
 * Purpose    N of N (1 − t/t_s)^(−1−p)[…], needed by subtraction schemes and by the ambiguity in powers of Λ.
 * Method     the sum rule in the geometric coupling and the ratio to the asymptotic form, with the Borel-factor expansion
 *            as a third witness; each at μ = Q and at μ = Q/2, 2Q (N scales as (μ/Q)^d, which is divided out). A coefficient
 *            function 1 + C_1 x + … of the power correction is divided out of the series first. With an ultraviolet
 *            singularity at or inside the distance of the infrared one, the sum rule is also summed in the conformal variable,
 *            and inside it the plain methods stop at n = 3. Where only the exponent is known (another coupling, an
 *            anomalous dimension) the ratio without corrections and the Borel factor remain.
 * Bound      of a method: the larger of its last step (drift of a ratio without corrections: n times that) and half the spread
 *            under the change of scale, with the coefficients' errors in quadrature. Of N: the leading method's, or its distance to
 *            another method beyond that one's own error, whichever is larger. A heuristic: the result is indicative.
 * Reference  see estimates.ts and conformal.ts.
 */
import { R, exact, exactReal, log, toNumberExact, type Exact } from '../../numerics/index.js';
import { betaCoefficients } from '../beta-function.js';
import { divisorSize } from '../divisor.js';
import { refuse, type Refusal } from '../refusal.js';
import { changeScale } from '../rewrite/scale.js';
import { checkTheory } from '../running/domain.js';
import { LIMIT_INSIDE, nearestUltraviolet, settingOf, stepsOf, type Setting } from './setting.js';
import type { Normalisation, NormalisationEstimate, NormalisationMethod, NormalisationQuestion } from './types.js';

/** Fewer known coefficients tell nothing about the strength. */
const LEAST_COEFFICIENTS = 2;
/** Half the range of μ for the scale variation. */
const SCALE_FACTOR = 2;

/** ln(factor²) as an exact number. */
const logSquare = (factor: number): Exact => exactReal((prec) => R.mul2exp(log(R.fromNumber(factor), prec + 4), 1));

const REFERENCES: Readonly<Record<NormalisationMethod, string>> = {
  'sum rule': 'arXiv:1701.00347, arXiv:1712.04983',
  'sum rule in the conformal variable': 'arXiv:1701.00347 with the map of hep-ph/9811367',
  'ratio to the asymptotic form': 'arXiv:1605.03609',
  'expansion of the Borel factor': 'Phys. Rev. D56 (1997) 1091, hep-ph/0105008',
};

const last = (list: readonly number[] | undefined): number => list?.[list.length - 1] ?? NaN;

/** What a question cannot have; undefined for a good one. */
function refused(question: NormalisationQuestion): Refusal | undefined {
  const { coefficients, firstPower, flavours, dimension } = question;
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
  return undefined;
}

/** r_0, r_1, … of x^(n+1) at μ = factor · Q. */
function coefficientsAt(question: NormalisationQuestion, factor: number): number[] {
  const { coefficients, firstPower, divisor, flavours, loops = 5 } = question;
  const beta = betaCoefficients(flavours, divisor).slice(0, loops);
  const list = factor === 1 ? coefficients : changeScale({ coefficients, firstPower }, beta, logSquare(factor));
  return [...Array.from({ length: firstPower - 1 }, () => exact(0)), ...list].map(toNumberExact);
}

/** The methods at one scale; N is that of the series at μ = Q. */
const allSteps = (question: NormalisationQuestion, s: Setting, factor: number): ReturnType<typeof stepsOf> =>
  stepsOf(coefficientsAt(question, factor), s).map((m) => ({
    ...m,
    steps: m.steps.map((x) => x / factor ** question.dimension),
  }));

/** Errors of the methods from those of the coefficients: every method is linear in them. Uncorrelated. */
function inputErrors(question: NormalisationQuestion, s: Setting): number[] {
  const { errors = [], coefficients, firstPower } = question;
  const squares: number[] = [];
  errors.forEach((sigma, n) => {
    if (!(sigma > 0)) return;
    const unit = Array.from({ length: coefficients.length + firstPower - 1 }, (_, k) =>
      k === n + firstPower - 1 ? sigma : 0,
    );
    stepsOf(unit, s).forEach(({ steps }, i) => {
      squares[i] = (squares[i] ?? 0) + last(steps) ** 2;
    });
  });
  return squares.map(Math.sqrt);
}

/** Every method that applies, with its own error. */
function estimatesOf(question: NormalisationQuestion, s: Setting): NormalisationEstimate[] {
  const central = allSteps(question, s, 1);
  const others = s.scales ? [1 / SCALE_FACTOR, SCALE_FACTOR].map((factor) => allSteps(question, s, factor)) : [];
  const inputs = inputErrors(question, s);
  return central.map(({ method, steps, limited }, i): NormalisationEstimate => {
    const input = inputs[i] ?? 0;
    const value = last(steps);
    const varied = others.map((list) => last(list[i]?.steps));
    const drift = method === 'ratio to the asymptotic form' && s.corrections.length === 0 ? steps.length - 1 : 1;
    const lastStep = drift * Math.abs(value - (steps[steps.length - 2] ?? NaN));
    const all = [value, ...varied];
    const [half, double] = varied;
    return {
      method,
      reference: REFERENCES[method],
      steps,
      value,
      error: Math.hypot(Math.max(lastStep, (Math.max(...all) - Math.min(...all)) / 2), input),
      input,
      limited,
      ...(half === undefined || double === undefined ? {} : { scaleVariation: [half, double] }),
    };
  });
}

function notesOf(question: NormalisationQuestion, s: Setting): string[] {
  const ultraviolet = nearestUltraviolet(question);
  const notes: string[] = [];
  if (s.nearby === 'inside')
    notes.push(
      `the ultraviolet singularity at u = −${ultraviolet} lies closer than this one: the sums over all orders diverge, ` +
        `so that the plain methods stop at n = ${LIMIT_INSIDE}`,
    );
  if (s.nearby === 'beside')
    notes.push(`the ultraviolet singularity at u = −${ultraviolet} is as near as this one: the sums converge slowly`);
  if (s.plain)
    notes.push(
      question.exponent === undefined
        ? 'the beta function of this coupling is not known beyond two loops: no sum rule, and the ratio has no corrections'
        : 'the exponent is stated: no sum rule, and the ratio has no corrections',
    );
  if (s.sumRuleTerms < question.coefficients.length + question.firstPower - 1 && !s.plain && s.nearby !== 'inside')
    notes.push(
      question.ends === true
        ? `the sum rule takes the first ${s.sumRuleTerms} coefficients: later ones change it no more`
        : `the beta function is known to ${s.sumRuleTerms} loops: the sum rule takes as many coefficients`,
    );
  return notes;
}

/** N with its error; refuses ultraviolet dimensions and too short series. */
export function leadingNormalisation(question: NormalisationQuestion): Normalisation | Refusal {
  const bad = refused(question);
  if (bad !== undefined) return bad;
  const setting = settingOf(question);
  const estimates = estimatesOf(question, setting);
  const [leading, ...rest] = estimates;
  const value = leading?.value ?? NaN;
  const steps = leading?.steps ?? [];
  const spread = [value, ...(leading?.scaleVariation ?? [])];
  // The Borel factor of a sum rule is a witness only: it converges slowest.
  const rivals = setting.plain ? rest : rest.filter((e) => e.method !== 'expansion of the Borel factor');
  const errorParts = {
    lastStep: Math.abs(value - (steps[steps.length - 2] ?? NaN)),
    // A method that is far away but does not claim to be near contradicts nothing.
    methods: Math.max(0, ...rivals.map((e) => Math.abs(value - e.value) - e.error)),
    scale: (Math.max(...spread) - Math.min(...spread)) / 2,
    input: leading?.input ?? 0,
  };
  const error = Math.max(leading?.error ?? NaN, errorParts.methods);
  const size = toNumberExact(divisorSize(question.divisor));
  return {
    value,
    error,
    inAlpha: { value: value / size, error: error / size },
    estimates,
    errorParts,
    notes: notesOf(question, setting),
  };
}

export type { Normalisation, NormalisationEstimate, NormalisationMethod, NormalisationQuestion } from './types.js';
