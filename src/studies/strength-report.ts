/**
 * @module The strength of the leading infrared singularity as the result states it, and the ambiguity that it makes.
 *
 * Method     estimates of the QCD room (qcd/normalisation) on the coefficients at μ = Q. With N of the series in x,
 *            A = |Im|/π = N t_s (d/2)^p (b_0 x)^δ C(x)/Γ(1+p) · (Λ/Q)^d,  p = γ − 1,  δ = d β_1/(2β_0²) − p,
 *            in which Λ resums all corrections c_k; for d β_1/(2β_0²) = p and C = 1 it is N (2πd/β_0)(d/2)^p/Γ(1+p) Λ^d.
 * Bound      indicative: the error is that of N.
 * Reference  M. Beneke, P. Marquard, P. Nason, M. Steinhauser, arXiv:1605.03609 (d = 1; numbers reproduced); re-derived.
 */
import {
  addExact,
  divExact,
  exact,
  exactReal,
  gammaDouble,
  isZeroExact,
  log,
  R,
  signExact,
  subExact,
  toNumberExact,
} from '../numerics/index.js';
import type { Exact } from '../numerics/index.js';
import {
  betaCoefficients,
  changeScale,
  expectedSingularity,
  isRefusal,
  leadingNormalisation,
  refuse,
} from '../qcd/index.js';
import type { Normalisation, NormalisationEstimate, Refusal } from '../qcd/index.js';
import type { Series, StatedSingularity } from '../series/index.js';
import type { StrengthMethod, StrengthReport } from './assessment.js';
import type { Expanded } from './expand.js';
import { estimateText, exactText, indicative } from './figures.js';
import { couplingScheme, isMSbar, knownLoops } from './scheme.js';

/** Digits of the steps of a method. */
const STEP_DIGITS = 5;
const EXPECTED_DIGITS = 10;
/** Loops of a beta function that every coupling shares. */
const UNIVERSAL_LOOPS = 2;

export interface LeadingStrength {
  readonly singularity: StatedSingularity;
  readonly dimension: number;
  readonly found: Normalisation | Refusal;
}

/** The nearest stated infrared singularity that has a dimension and an exponent. */
function leadingOf(expanded: Expanded): StatedSingularity | undefined {
  return expanded.expansion.stated.find((s) => signExact(s.t) > 0 && s.dimension !== undefined);
}

const distance = (u: Exact | undefined): number | undefined =>
  u === undefined ? undefined : Math.abs(toNumberExact(u));

/** Coefficients at μ = Q: what the strength is quoted for. */
function atHardScale(series: Series, expanded: Expanded): readonly Exact[] {
  const { coefficients, power, running } = expanded.expansion;
  const ratio = series.scaleRatio;
  if (ratio === undefined || running === undefined || isZeroExact(subExact(ratio, exact(1)))) return coefficients;
  const back = exactReal((prec) => R.mul2exp(R.neg(log(ratio.ball(prec + 8), prec + 8)), 1));
  return changeScale({ coefficients, firstPower: power }, running.beta, back);
}

/** The strength of the leading infrared singularity of a QCD series; undefined where no such singularity is expected. */
export function leadingStrength(series: Series, expanded: Expanded): LeadingStrength | undefined {
  const { flavours } = series;
  const { expansion, errors } = expanded;
  const singularity = leadingOf(expanded);
  if (flavours === undefined || series.coupling.plain || singularity?.dimension === undefined) return undefined;
  const dimension = toNumberExact(singularity.dimension);
  const shape = { singularity, dimension };
  const { exponent } = singularity;
  if (series.expandedFrom !== undefined)
    return {
      ...shape,
      found: refuse(
        'it belongs to the function under the contour integral, whose circle weakens this singularity',
        'see the growth of that function itself',
      ),
    };
  if (exponent === undefined)
    return {
      ...shape,
      found: refuse('the exponent of the leading singularity is not known', 'state it in the series file'),
    };
  const scheme = couplingScheme(series);
  const world = !isRefusal(scheme) && scheme.kind === 'toy' ? knownLoops(scheme) : undefined;
  const fromFirst = subExact(exponent, exact(expansion.power - 1));
  const bare = expectedSingularity({
    flavours,
    dimension,
    divisor: series.coupling.divisor,
    ...(world === undefined ? {} : { loops: world }),
  }).exponent;
  const own = isZeroExact(subExact(fromFirst, bare));
  const others = expansion.stated.filter((s) => s !== singularity && s.u !== undefined);
  const ultraviolet = distance(others.find((s) => signExact(s.t) < 0)?.u);
  const next = distance(others.find((s) => toNumberExact(s.t) > toNumberExact(singularity.t))?.u);
  const found = leadingNormalisation({
    coefficients: atHardScale(series, expanded),
    firstPower: expansion.power,
    errors,
    divisor: series.coupling.divisor,
    flavours,
    dimension,
    ...(own ? { wilson: singularity.wilson ?? [] } : { exponent: fromFirst }),
    ...(world !== undefined
      ? { loops: world, ends: true }
      : expansion.running === undefined && !isMSbar(series)
        ? { loops: UNIVERSAL_LOOPS }
        : {}),
    ...(ultraviolet === undefined ? {} : { ultraviolet }),
    ...(next === undefined ? {} : { nextInfrared: next }),
  });
  return { ...shape, found };
}

/** The same number for the series in the coupling itself: N/divisor. */
function methodReport(e: NormalisationEstimate, size: number): StrengthMethod {
  const { value, error } = estimateText(e.value / size, e.error / size);
  const [half, double] = e.scaleVariation ?? [];
  return {
    method: e.method,
    reference: e.reference,
    value,
    error,
    steps: e.steps.map((x) => indicative(x / size, STEP_DIGITS)),
    ...(e.limited ? { limited: true } : {}),
    ...(half === undefined || double === undefined
      ? {}
      : { scaleVariation: [indicative(half / size, STEP_DIGITS), indicative(double / size, STEP_DIGITS)] }),
  };
}

/** An error as large as the value says neither size nor sign. */
const isDetermined = ({ value, error }: Normalisation): boolean => error < Math.abs(value);

export function strengthReport(strength: LeadingStrength | undefined): StrengthReport | undefined {
  if (strength === undefined) return undefined;
  const { singularity, dimension, found } = strength;
  const place = {
    dimension: String(dimension),
    u: exactText(singularity.u ?? exact(dimension), EXPECTED_DIGITS),
    standing: 'indicative' as const,
  };
  if (isRefusal(found)) return { ...place, methods: [], notes: [], refused: found };
  const size = found.value / found.inAlpha.value;
  const methods = found.estimates.map((e) => methodReport(e, size));
  if (!isDetermined(found)) {
    const undetermined = refuse(
      'the error of the leading method is as large as its value',
      'more coefficients, or smaller errors of those known',
    );
    return { ...place, methods, notes: found.notes, refused: undetermined };
  }
  const { value, error } = estimateText(found.inAlpha.value, found.inAlpha.error);
  return { ...place, value, error, methods, notes: found.notes };
}

/** |Im|/π of the series' sum over (Λ/Q)^d, with the relative error of N. */
export function ambiguityOverPower(
  { singularity, dimension, found }: LeadingStrength,
  expanded: Expanded,
  flavours: number,
): { readonly value: number; readonly error: number } | undefined {
  const { exponent, wilson = [] } = singularity;
  if (isRefusal(found) || exponent === undefined || !isDetermined(found)) return undefined;
  const { expansion, uPerT } = expanded;
  const x = toNumberExact(expansion.x);
  const [b0, b1] = [uPerT, betaOne(flavours)];
  if (b0 === undefined) return undefined;
  const p = toNumberExact(subExact(exponent, exact(expansion.power))); // γ − 1, n counted from x^1
  const delta = dimension * b1 - p;
  const first = toNumberExact(b0);
  const coefficient = wilson.reduceRight((acc, c) => x * (acc + toNumberExact(c)), 0) + 1;
  const factor = toNumberExact(expansion.factor);
  const t = toNumberExact(singularity.t);
  const value =
    Math.abs(found.value * factor * coefficient) *
    t *
    (dimension / 2) ** p *
    (Math.abs(delta) < SAME_EXPONENT ? 1 : (first * x) ** delta);
  const size = value / gammaDouble(1 + p);
  return { value: size, error: size * Math.abs(found.error / found.value) };
}

/** Exponents closer than this are the same: they are rational numbers of small size. */
const SAME_EXPONENT = 1e-9;

/** β_1/(2β_0²). */
function betaOne(flavours: number): number {
  const [b0 = exact(1), b1 = exact(0)] = betaCoefficients(flavours);
  const ratio = divExact(b1, addExact(b0, b0));
  return toNumberExact(divExact(ratio, b0));
}
