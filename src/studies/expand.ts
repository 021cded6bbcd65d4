/**
 * @module From a Series and a coupling to an Expansion: where the bookkeeping of files ends and numerics begins.
 */
import type {
  ContourOrigin,
  Expansion,
  KnownSingularity,
  Running,
  Series,
  StatedSingularity,
  Uncertain,
} from '../series/index.js';
import { coefficientsAt } from '../series/index.js';
import {
  addExact,
  divExact,
  exact,
  isZeroExact,
  mulExact,
  R,
  Rational,
  signExact,
  subExact,
  toNumberExact,
} from '../numerics/index.js';
import type { Exact } from '../numerics/index.js';
import { flavourPolynomials } from '../prescriptions/index.js';
import { betaCoefficients, divisorSize, expectedSingularity, isRefusal, uPerT, weightIntegral } from '../qcd/index.js';
import type { GrowthInput, GrowthTerm } from '../growth/index.js';
import { circleRunning, fixedOrderSeries } from './contour/moment.js';
import { ROUNDED_DIGITS } from './expand-errors.js';
import { couplingScheme, isMSbar, knownLoops, massDefinition } from './scheme.js';

export interface Expanded {
  readonly expansion: Expansion;
  /** u per unit of t, for a QCD coupling with known n_f. */
  readonly uPerT?: Exact;
  /** Exactly zero coefficients taken off the front; the power of the first remaining one has grown by as many. */
  readonly leadingZeros: number;
  /** Quoted one-sigma errors of the coefficients kept (half the sum of an asymmetric pair). */
  readonly errors: readonly number[];
  readonly growthInput: GrowthInput;
}

const TWO = Rational.of(2);

/** Expands the first `order` coefficients of the series at the coupling value `at`. */
export function expand(from: Series, at: Exact, order?: number): Expanded {
  const series = fixedOrderSeries(from);
  const kept = order === undefined ? series.coefficients : series.coefficients.slice(0, order);
  // Σ c_n x^n at x < 0 is Σ (−1)^n c_n |x|^n: the sum is along the positive axis of the mirrored Borel plane.
  const mirrored = series.coupling.plain && signExact(at) < 0;
  const values = kept.map((c, n) => (mirrored && (n + series.firstPower) % 2 !== 0 ? negated(c.value) : c.value));
  const firstNonZero = values.findIndex((v) => !isZeroExact(v));
  const leadingZeros = firstNonZero < 0 ? 0 : firstNonZero;
  const coefficients = values.slice(leadingZeros);
  const relativeErrors = kept.slice(leadingZeros).map(relativeError);
  const scale =
    series.coupling.plain || series.flavours === undefined
      ? undefined
      : uPerT(series.flavours, series.coupling.divisor);
  const given = statedSingularities(series, leadingZeros, scale);
  const stated = mirrored ? given.map((s) => ({ ...s, t: negated(s.t), kind: 'other' as const })) : given;
  const expansion: Expansion = {
    x: divExact(mirrored ? negated(at) : at, series.coupling.plain ? exact(1) : divisorSize(series.coupling.divisor)),
    power: series.firstPower + leadingZeros,
    factor: series.factor,
    additive: series.additive,
    coefficients,
    relativeErrors,
    stated,
    ...runningOf(series, coefficients.length, leadingZeros),
    ...strongOf(series, leadingZeros),
    ...(series.bubbleChain === undefined ? {} : { bubbleChain: series.bubbleChain }),
    ...(series.expandedFrom === undefined ? {} : { contour: contourOf(series.expandedFrom, order, scale) }),
  };
  const growthInput: GrowthInput = {
    terms: coefficients.map((c, n) =>
      growthTerm(c, relativeErrors[n]!, kept[n + leadingZeros]!.status === 'estimated'),
    ),
    expected: stated.map((s) => ({
      t: toNumberExact(s.t),
      ...(s.exponent === undefined ? {} : { exponent: toNumberExact(s.exponent) }),
      kind: s.kind,
    })),
    exact: coefficients,
    leadingZeros,
  };
  return {
    expansion,
    ...(scale === undefined ? {} : { uPerT: scale }),
    leadingZeros,
    errors: kept.slice(leadingZeros).map(quotedError),
    growthInput,
  };
}

/** L loops fix L − 2 corrections of a singularity: c_1 holds β_2, c_2 holds β_3. */
const LOOPS_BEFORE_CORRECTIONS = 2;

/** What stands behind the fixed-order expansion of a contour quantity. */
function contourOf(series: Series, order: number | undefined, scale: Exact | undefined): ContourOrigin {
  const { flavours, loops } = circleRunning(series);
  const weight = series.contour?.coefficients ?? [];
  const kept = series.coefficients.slice(0, order);
  return {
    weight,
    integral: weightIntegral(weight),
    coefficients: kept.map((c) => c.value),
    power: series.firstPower,
    errors: kept.map(quotedError),
    stated: statedSingularities(series, 0, scale).map((s) => ({
      ...s,
      corrections: s.corrections.slice(0, Math.max(0, loops - LOOPS_BEFORE_CORRECTIONS)),
    })),
    flavours,
    loops,
    divisor: series.coupling.divisor,
  };
}

/** The exponents of F = Σ c_n x^n: those of the file without the power in front. */
function strongOf({ strongCoupling, firstPower }: Series, leadingZeros: number): Pick<Expansion, 'strongCoupling'> {
  if (strongCoupling === undefined) return {};
  const { power, spacing } = strongCoupling;
  return { strongCoupling: { power: power.sub(Rational.of(firstPower + leadingZeros)), spacing } };
}

/**
 * The β function in the series' own variable, and the scale it stands at: where the file names MSbar (or a toy world of few
 * loops). A quantity in units of a running mass has a second source of scale dependence and is left without.
 */
function runningOf(series: Series, count: number, leadingZeros: number): { running?: Running } {
  const scheme = couplingScheme(series);
  const { flavours } = series;
  if (flavours === undefined || isRefusal(scheme) || massDefinition(series) === 'running') return {};
  if (scheme.kind !== 'MSbar' && scheme.kind !== 'toy') return {};
  const beta = betaCoefficients(flavours, series.coupling.divisor).slice(0, knownLoops(scheme));
  const polynomials = series.anyFlavours === true ? polynomialsOf(series, count, leadingZeros) : undefined;
  return {
    running: {
      beta,
      scaleRatio: series.scaleRatio ?? exact(1),
      flavours,
      ...(polynomials === undefined ? {} : { flavourPolynomials: polynomials }),
    },
  };
}

/** Bits at which an interpolated coefficient is held against the file's. */
const CHECK_BITS = 128;

/**
 * The first `count` coefficients as polynomials in n_f of degree n, from the file at n_f = 0 … count − 1 when they are asked
 * for; undefined unless they reproduce the file at one number more.
 */
function polynomialsOf(series: Series, count: number, leadingZeros: number): Running['flavourPolynomials'] {
  let found: { readonly list: ReturnType<typeof flavourPolynomials> | undefined } | undefined;
  return () => {
    if (found !== undefined) return found.list;
    const at = (flavours: number): readonly Exact[] | undefined =>
      coefficientsAt(series, flavours)?.slice(leadingZeros, leadingZeros + count);
    const lists = Array.from({ length: count }, (_, flavours) => at(flavours));
    const check = at(count);
    const known = lists.filter((list): list is readonly Exact[] => list !== undefined);
    const list = known.length < count ? undefined : flavourPolynomials(known);
    const holds = list?.every((p, n) => {
      const value = p.reduceRight((acc, c) => addExact(mulExact(acc, exact(count)), c), exact(0));
      return check?.[n] !== undefined && R.overlaps(value.ball(CHECK_BITS), check[n].ball(CHECK_BITS));
    });
    found = { list: holds === true ? list : undefined };
    return found.list;
  };
}

const negated = (e: Exact): Exact => mulExact(e, exact(-1));

function quotedError(c: Uncertain): number {
  return c.error === undefined ? 0 : (c.error.plus.toNumber() + c.error.minus.toNumber()) / 2;
}

/** Quoted error over value, or the rounding implied by the digits of a plain decimal (uniform within half a unit). */
function relativeError(c: Series['coefficients'][number]): number {
  const logAbs = logAbsOf(c.value);
  if (c.error !== undefined) {
    const e = quotedError(c);
    return e === 0 ? 0 : Math.exp(Math.log(e) - logAbs);
  }
  if (c.significantDigits === undefined || c.significantDigits < ROUNDED_DIGITS || logAbs === -Infinity) return 0;
  const decade = Math.floor(logAbs / Math.LN10 + 1e-12);
  return (0.5 / Math.sqrt(3)) * Math.exp((decade - c.significantDigits + 1) * Math.LN10 - logAbs);
}

/** ln|c|, for any size; −Infinity for zero. */
export function logAbsOf(c: Exact): number {
  if (isZeroExact(c)) return -Infinity;
  const b = c.ball(96);
  if (b.mid === 0n) return -Infinity;
  const bits = R.upperBits(R.exactMid(b));
  return Math.log(Math.abs(R.toNumber(R.mul2exp(R.exactMid(b), -bits)))) + bits * Math.LN2;
}

function growthTerm(c: Exact, relativeErrorOf: number, estimated: boolean): GrowthTerm {
  return { logAbs: logAbsOf(c), sign: signExact(c), relativeError: relativeErrorOf, estimated };
}

/** No anomalous dimension stands behind Λ/Q (a self-energy) and behind the gluon condensate α_s G², to leading order. */
const WITHOUT_ANOMALOUS: readonly number[] = [1, 4];

const dimensionAlone = (dimension: Exact | undefined): Pick<StatedSingularity, 'dimensionAlone'> =>
  dimension === undefined || WITHOUT_ANOMALOUS.includes(toNumberExact(dimension)) ? {} : { dimensionAlone: true };

/** File statements first; a condensate or an operator dimension alone brings the expectation of the OPE and the β function. */
function statedSingularities(series: Series, leadingZeros: number, scale: Exact | undefined): StatedSingularity[] {
  const shift = series.firstPower - 1 + leadingZeros;
  const list: StatedSingularity[] = [];
  for (const s of series.singularities) {
    const u = s.u ?? (s.dimension === undefined ? undefined : exact(s.dimension.div(TWO)));
    const t = s.t ?? (u !== undefined && scale !== undefined ? divExact(u, scale) : undefined);
    if (t === undefined || signExact(t) === 0) continue;
    const expected = s.exponent === undefined ? expectation(series, u, s) : undefined;
    // A stated exponent refers to c_n with n counted from the file's first coefficient.
    const exponent =
      s.exponent !== undefined
        ? addExact(s.exponent, exact(leadingZeros))
        : expected && addExact(expected.exponent, exact(shift));
    const dimension =
      s.dimension !== undefined ? exact(s.dimension) : u !== undefined && signExact(u) > 0 ? addExact(u, u) : undefined;
    list.push({
      t,
      ...(u === undefined ? {} : { u }),
      ...(exponent === undefined ? {} : { exponent }),
      corrections: shift === 0 && expected !== undefined ? expected.corrections : [],
      ...(s.strength === undefined ? {} : { strength: s.strength.value }),
      ...(s.wilsonCorrections === undefined ? {} : { wilson: s.wilsonCorrections }),
      ...(dimension === undefined ? {} : { dimension }),
      ...(expected !== undefined && s.anomalousDimension === undefined ? dimensionAlone(dimension) : {}),
      kind: s.kind,
      origin: expected === undefined ? 'file' : 'operator product expansion',
    });
  }
  for (const c of series.condensates) {
    if (
      scale === undefined ||
      list.some((s) => s.dimension !== undefined && isZeroExact(subExact(s.dimension, exact(c.dimension))))
    )
      continue;
    const expected = expectation(series, exact(c.dimension.div(TWO)), {});
    if (expected === undefined) continue;
    list.push({
      t: expected.t,
      u: exact(expected.u),
      exponent: addExact(expected.exponent, exact(shift)),
      corrections: shift === 0 ? expected.corrections : [],
      dimension: exact(c.dimension),
      ...dimensionAlone(exact(c.dimension)),
      kind: 'infrared',
      origin: 'operator product expansion',
    });
  }
  return list.sort((a, b) => Math.abs(toNumberExact(a.t)) - Math.abs(toNumberExact(b.t)));
}

/**
 * Expected exponent and corrections: of an infrared singularity from its dimension; of an ultraviolet one only where the
 * file states the anomalous term, since that needs operators which no rule in n_f alone fixes. An invented world has its own
 * rules: nothing is expected there but what its file states.
 */
function expectation(
  series: Series,
  u: Exact | undefined,
  stated: Pick<KnownSingularity, 'anomalousDimension' | 'wilsonCorrections'>,
): ReturnType<typeof expectedSingularity> | undefined {
  if (u?.rational === undefined || series.flavours === undefined || series.coupling.plain) return undefined;
  if (u.rational.sign() < 0 && stated.anomalousDimension === undefined) return undefined;
  const scheme = couplingScheme(series);
  const loops = !isRefusal(scheme) && scheme.kind === 'toy' ? scheme.loops : undefined;
  if (loops !== undefined && !isMSbar(series)) return undefined;
  const expected = expectedSingularity({
    flavours: series.flavours,
    dimension: u.rational.add(u.rational),
    divisor: series.coupling.divisor,
    ...(loops === undefined ? {} : { loops }),
    ...(stated.anomalousDimension === undefined ? {} : { anomalousDimension: stated.anomalousDimension }),
    ...(stated.wilsonCorrections === undefined ? {} : { wilson: { corrections: stated.wilsonCorrections } }),
  });
  // Position and exponent belong to the quantity; the corrections to the beta function of MSbar.
  const known = isMSbar(series) ? Math.max(0, (loops ?? Infinity) - LOOPS_BEFORE_CORRECTIONS) : 0;
  return { ...expected, corrections: expected.corrections.slice(0, known) };
}
