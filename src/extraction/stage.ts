/**
 * @module A series ready to be evaluated at any coupling, with shifted coefficients, at its own renormalisation scale or
 * another one.
 *
 * Method     the series is expanded and its growth diagnosed once; another coupling only replaces x. At μ′ the coupling is
 *            evolved exactly and the coefficients are re-expanded; a stated strength of a singularity at u takes the factor
 *            (μ′/μ)^2u, positions and exponents stay. On a circle the coefficients of D are shifted and re-expanded, and the
 *            fixed-order ones follow.
 * Bound      re-expanded coefficients are rounded to SHIFT_BITS, far below any error that they have.
 */
import { R, Rational, addExact, divExact, exact, isZeroExact, mulExact, toNumberExact } from '../numerics/index.js';
import type { Exact } from '../numerics/index.js';
import { diagnoseGrowth } from '../growth/index.js';
import type { Growth } from '../growth/index.js';
import { changeScale, divisorSize, evolveLog, flowOf, isRefusal, refuse } from '../qcd/index.js';
import type { Loops, Refusal } from '../qcd/index.js';
import type { Expansion, Series, StatedSingularity } from '../series/index.js';
import { couplingScheme, expand, fixedOrderOf, knownLoops } from '../studies/index.js';
import type { Expanded } from '../studies/index.js';

/** Bits kept of a coefficient at another scale. */
const SHIFT_BITS = 140;

/** Changes of a series from its central values; what is absent is not shifted. */
export interface SeriesShifts {
  /** Added to the coefficients, in the order of the file. */
  readonly coefficients?: readonly number[];
  /** ln(μ′²/μ²) of the renormalisation scale. */
  readonly logScale?: number;
}

/** The series with its shifts, at any coupling. */
export interface Stage {
  readonly expanded: Expanded;
  readonly growth: Growth;
  /** The expansion at the coupling α(μ) of the file's own scale. */
  at(alpha: Exact): Expansion | Refusal;
}

export interface StageOptions {
  /** Only the first so many coefficients. */
  readonly order?: number;
  /** Loops of the running, 1 to 5. */
  readonly loops: number;
}

export class Stages {
  readonly series: Series;
  /** α over x. */
  readonly divisorSize: number;
  private readonly own: Stage;
  private readonly loops: number;
  private readonly divisor: Exact;
  private readonly atScale = new Map<number, Stage | Refusal>();

  constructor(series: Series, { order, loops }: StageOptions) {
    this.series = series;
    this.loops = loops;
    this.divisor = series.coupling.plain ? exact(1) : divisorSize(series.coupling.divisor);
    this.divisorSize = toNumberExact(this.divisor);
    const expanded = expand(series, exact(1), order);
    this.own = this.ready(expanded, diagnoseGrowth(expanded.growthInput));
  }

  /** The unshifted series. */
  get central(): Stage {
    return this.own;
  }

  /** The growth stays that of the central series when coefficients shift within their errors; at another scale it is new. */
  at({ coefficients, logScale = 0 }: SeriesShifts = {}): Stage | Refusal {
    const shifted =
      coefficients?.some((d) => d !== 0) === true ? shiftedBy(this.own.expanded, coefficients) : undefined;
    if (logScale === 0) return shifted === undefined ? this.own : this.ready(shifted, this.own.growth);
    const before = this.atScale.get(logScale);
    const unshifted = before ?? this.moved(this.own.expanded, logScale);
    this.atScale.set(logScale, unshifted);
    if (shifted === undefined || isRefusal(unshifted)) return unshifted;
    return this.moved(shifted, logScale, unshifted.growth);
  }

  private ready(expanded: Expanded, growth: Growth): Stage {
    return { expanded, growth, at: (alpha) => ({ ...expanded.expansion, x: divExact(alpha, this.divisor) }) };
  }

  private moved(expanded: Expanded, logScale: number, growth?: Growth): Stage | Refusal {
    const running = runningFlow(this.series, expanded, this.loops);
    if (isRefusal(running)) return running;
    const e = expanded.expansion;
    const again = (coefficients: readonly Exact[], firstPower: number): readonly Exact[] =>
      changeScale({ coefficients, firstPower }, running.beta, exact(Rational.fromNumber(logScale))).map(rounded);
    const coefficients = again(e.coefficients, e.power);
    const expansion: Expansion = {
      ...e,
      coefficients,
      relativeErrors: coefficients.map((c, n) => relative(expanded.errors[n] ?? 0, c)),
      stated: e.stated.map((s) => atScale(s, logScale)),
      ...(e.running === undefined ? {} : { running: { ...e.running, scaleRatio: timesExp(e.running.scaleRatio, logScale / 2) } }),
      ...(e.contour === undefined
        ? {}
        : {
            contour: {
              ...e.contour,
              coefficients: again(e.contour.coefficients, e.contour.power),
              stated: e.contour.stated.map((s) => atScale(s, logScale)),
            },
          }),
    }; // prettier-ignore
    const growthInput = {
      ...expanded.growthInput,
      exact: coefficients,
      terms: expanded.growthInput.terms.map((term, n) => ({ ...term, ...sizeOf(coefficients[n]) })),
    };
    return {
      expanded: { ...expanded, expansion, growthInput },
      growth: growth ?? diagnoseGrowth(growthInput),
      at: (alpha) => {
        const there = evolveLog(running.flow, toNumberExact(alpha), logScale);
        if (isRefusal(there)) return there;
        return { ...expansion, x: divExact(exact(Rational.fromNumber(there)), this.divisor) };
      },
    };
  }
}

const isLoops = (n: number): n is Loops => [1, 2, 3, 4, 5].some((k) => k === n);

interface RunningFlow {
  readonly beta: readonly Exact[];
  readonly flow: ReturnType<typeof flowOf>;
}

/** How the coupling of the series runs; a refusal where it does not, or not by the MSbar beta function. */
function runningFlow(series: Series, expanded: Expanded, loops: number): RunningFlow | Refusal {
  const { running } = expanded.expansion;
  if (series.coupling.plain) return refuse('a plain variable has no scale', 'give a series in a coupling');
  const scheme = couplingScheme(series);
  if (isRefusal(scheme)) return scheme;
  if (running === undefined || series.flavours === undefined) {
    return refuse(
      `the beta function of "${series.scheme ?? 'no scheme'}" is not known here`,
      'bring the series to MSbar: leastterm rewrite',
    );
  }
  const most = Math.min(loops, knownLoops(scheme));
  return {
    beta: running.beta.slice(0, most),
    flow: flowOf(series.flavours, isLoops(most) ? most : 5),
  };
}

const added = (c: Exact, d: number): Exact => (d === 0 ? c : addExact(c, exact(Rational.fromNumber(d))));

/** Shifted coefficients; leading zeros of the file have been taken off. */
function shiftedBy(expanded: Expanded, by: readonly number[]): Expanded {
  const e = expanded.expansion;
  if (e.contour !== undefined) {
    const inD = e.contour.coefficients.map((c, n) => added(c, by[n] ?? 0));
    const coefficients = fixedOrderOf(e.contour, inD, e).slice(0, e.coefficients.length);
    return { ...expanded, expansion: { ...e, coefficients, contour: { ...e.contour, coefficients: inD } } };
  }
  const coefficients = e.coefficients.map((c, n) => added(c, by[n + expanded.leadingZeros] ?? 0));
  const [first] = coefficients;
  return first === undefined || isZeroExact(first) ? expanded : { ...expanded, expansion: { ...e, coefficients } };
}

const rounded = (c: Exact): Exact => exact(R.midpoint(R.round(c.ball(SHIFT_BITS + 60), SHIFT_BITS)));

const timesExp = (c: Exact, log: number): Exact => mulExact(c, exact(Rational.fromNumber(Math.exp(log))));

const relative = (error: number, c: Exact): number => {
  const size = Math.abs(toNumberExact(c));
  return error === 0 || size === 0 ? 0 : error / size;
};

function sizeOf(c: Exact | undefined): { logAbs: number; sign: -1 | 0 | 1 } {
  const x = c === undefined ? 0 : toNumberExact(c);
  return { logAbs: Math.log(Math.abs(x)), sign: x > 0 ? 1 : x < 0 ? -1 : 0 };
}

/** A strength belongs to the scale μ of its coupling: Λ^d/Q^d = (μ/Q)^d e^(−t/x(μ)) …. */
function atScale(s: StatedSingularity, logScale: number): StatedSingularity {
  if (s.strength === undefined || s.u === undefined) return s;
  return { ...s, strength: timesExp(s.strength, toNumberExact(s.u) * logScale) };
}
