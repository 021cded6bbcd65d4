/**
 * @module A user's own series without the momenta below μ_f, approximately: through its leading infrared singularity.
 *
 * A power correction (Λ/Q)^d without anomalous dimension is what the low momenta of λ ∫ dτ/τ τ^s x(k), s = d/2, τ = k²/Q²,
 * leave behind, x(k) the series' own coupling at the scale k. Its part τ < τ_f has the coefficients of τ_f^s g(x(μ_f)) rewritten
 * to the scale of the series, with s g_n = δ_(n0) + Σ_j (n−j) b_j g_(n−1−j) from the β function; all of them grow alike at
 * large n, whatever μ_f. λ is the ratio of the last known coefficient to that of τ_f = 1; its error the step from the one before.
 *
 * Bound      none: a model of one singularity, exact only for a series that is nothing else. Indicative.
 * Reference  the toy integral is standard (M. Beneke, Phys. Rept. 317 (1999) 1, from memory); the recursion re-derived.
 */
import {
  R,
  Rational,
  divExact,
  exact,
  exactReal,
  exp,
  isZeroExact,
  log,
  mulExact,
  subExact,
  toNumberExact,
} from '../numerics/index.js';
import type { Exact } from '../numerics/index.js';
import { changeScale, divisorSize, evolveAlpha, isRefusal, liftExact, refuse } from '../qcd/index.js';
import type { Refusal } from '../qcd/index.js';
import type { Expansion, Series, StatedSingularity, Uncertain } from '../series/index.js';
import { VERSION, exactText, expand, fixedOrderSeries, growthStudy, indicative } from '../studies/index.js';
import type { GrowthReport, SeriesCutResult, SeriesCutRow } from './series-cut-result.js';

export interface SeriesCutQuestion {
  readonly series: Series;
  readonly at: Uncertain;
  /** μ_f/Q. */
  readonly cut: Rational;
  readonly order?: number;
  readonly digits: number;
  readonly request: SeriesCutResult['request'];
}

/** Cuts beside the one asked for, as multiples of it. */
const NEIGHBOURS = [[17, 20], [6, 5], [7, 5]] as const; // prettier-ignore
const SHOWN = 5;
/** Panels of the integral between two cuts. */
const PANELS = 40;
const LEAST_TERMS = 3;

/** g_0 … g_(N−1). */
export function lowMomentumSeries(beta: readonly Exact[], s: Exact, length: number): Exact[] {
  return liftExact([s, ...beta], (ring, [power = ring.one, ...b]) => {
    const g: (typeof power)[] = [];
    for (let n = 0; n < length; n++) {
      let sum = n === 0 ? ring.one : ring.zero;
      b.forEach((own, j) => {
        const earlier = g[n - 1 - j];
        if (earlier === undefined) return;
        sum = ring.add(sum, ring.mul(ring.mul(ring.fromRational(Rational.of(n - j)), own), earlier));
      });
      g.push(ring.div(sum, power));
    }
    return g;
  });
}

/** ln(μ²/k²) for the scales of the series and of the cut over Q. */
const logBetween = (ratio: Exact, cut: Rational): Exact =>
  exactReal((prec) => {
    const own = log(ratio.ball(prec + 8), prec + 8);
    return R.mul2exp(R.sub(own, log(R.fromRational(cut, prec + 8), prec + 8), prec + 8), 1);
  });

interface Setting {
  readonly e: Expansion;
  readonly beta: readonly Exact[];
  readonly ratio: Exact;
  readonly s: Exact;
  readonly lambda: Exact;
  readonly lambdaError: number;
}

/** Coefficients of the part below a cut, λ included. */
function lowPart({ e, beta, ratio, s, lambda }: Setting, cut: Rational): Exact[] {
  const g = lowMomentumSeries(beta, s, e.coefficients.length);
  const there = changeScale({ coefficients: g, firstPower: 1 }, beta, logBetween(ratio, cut));
  // τ_f^s = exp(2 s ln cut).
  const front = exactReal((prec) => {
    const size = R.mul(R.mul2exp(log(R.fromRational(cut, prec + 8), prec + 8), 1), s.ball(prec + 8), prec + 8);
    return exp(size, prec);
  });
  return there.map((c) => mulExact(mulExact(front, lambda), c));
}

/** The nearest infrared singularity that the file or the operator product expansion states. */
const leading = (e: Expansion): StatedSingularity | undefined =>
  e.stated.find((x) => x.kind === 'infrared' && x.u !== undefined);

function settingOf(question: SeriesCutQuestion, e: Expansion): Setting | Refusal {
  const { series, cut } = question;
  const { running } = e;
  if (running === undefined || series.coupling.plain) {
    return refuse(`the running of ${series.id} is not known`, 'name coupling, scheme and flavours in its file');
  }
  if (e.power !== 1)
    return refuse(`${series.id} starts at the power ${e.power}`, 'only series that start at the first power');
  if (e.coefficients.length < LEAST_TERMS) {
    return refuse(
      `${e.coefficients.length} coefficients say nothing about their growth`,
      `give ${LEAST_TERMS} or more`,
    );
  }
  const found = leading(e);
  if (found?.u === undefined) {
    return refuse(
      `${series.id} states no infrared singularity`,
      'write singularities: [{ dimension: 4 }] into its file',
    );
  }
  if (cut.cmp(Rational.ONE) > 0) {
    return refuse(
      `the cut mu_f = ${cut.toNumber().toPrecision(4)} Q lies above Q`,
      'give a cut below 1 (in units of Q)',
    );
  }
  const { beta, scaleRatio: ratio } = running;
  const s = found.u;
  const whole = changeScale(
    { coefficients: lowMomentumSeries(beta, s, e.coefficients.length), firstPower: 1 },
    beta,
    logBetween(ratio, Rational.ONE),
  );
  const last = e.coefficients.length - 1;
  if (isZeroExact(e.coefficients[last]!)) return refuse('the last coefficient is zero', 'give one that is not');
  const lambda = divExact(e.coefficients[last]!, whole[last]!);
  const before = toNumberExact(divExact(e.coefficients[last - 1]!, whole[last - 1]!));
  return { e, beta, ratio, s, lambda, lambdaError: Math.abs(toNumberExact(lambda) - before) };
}

const sumOf = (e: Expansion, c: readonly Exact[]): number => {
  const x = toNumberExact(e.x);
  return c.reduce((sum, own, n) => sum + toNumberExact(own) * x ** (n + 1), 0) * toNumberExact(e.factor);
};

/** λ ∫ dτ/τ τ^s x(k) between two cuts, with the coupling run exactly; undefined where it does not reach so low. */
function window(question: SeriesCutQuestion, setting: Setting, from: number, to: number): number | undefined {
  const { series, at } = question;
  const { e, beta, ratio, s, lambda } = setting;
  const divisor = toNumberExact(divisorSize(series.coupling.divisor));
  const [alpha, mu, power] = [at.value, ratio, s].map(toNumberExact) as [number, number, number];
  const f = (y: number): number | undefined => {
    const k = Math.exp(y / 2);
    const run = evolveAlpha({ alpha, from: mu, to: k, flavours: series.flavours ?? 0, loops: beta.length });
    return isRefusal(run) ? undefined : (Math.exp(power * y) * run) / divisor;
  };
  const [a, b] = [2 * Math.log(from), 2 * Math.log(to)];
  const h = (b - a) / (2 * PANELS);
  let sum = 0;
  for (let i = 0; i <= 2 * PANELS; i++) {
    const value = f(a + i * h);
    if (value === undefined) return undefined;
    sum += value * (i === 0 || i === 2 * PANELS ? 1 : i % 2 === 1 ? 4 : 2);
  }
  return ((sum * h) / 3) * toNumberExact(lambda) * toNumberExact(e.factor);
}

function row(question: SeriesCutQuestion, setting: Setting, cut: Rational): SeriesCutRow {
  const { e } = setting;
  const low = lowPart(setting, cut);
  const high = e.coefficients.map((c, n) => subExact(c, low[n]!));
  const last = high.length - 1;
  const value = toNumberExact(e.additive) + sumOf(e, high);
  const between = window(question, setting, question.cut.toNumber(), cut.toNumber());
  const x = toNumberExact(e.x);
  return {
    cut: indicative(cut.toNumber(), SHOWN),
    high: indicative(value, SHOWN + 2),
    lastTerm: indicative(toNumberExact(high[last]!) * x ** (last + 1) * toNumberExact(e.factor), 3),
    ...(between === undefined
      ? {}
      : { between: indicative(between, SHOWN), both: indicative(value + between, SHOWN + 2) }),
  };
}

const words = ({ verdict, statement, signPattern }: GrowthReport): SeriesCutResult['growth']['whole'] => ({
  verdict,
  statement,
  signPattern,
});

/** The series cut at μ_f, or why it cannot be. */
export function seriesCut(question: SeriesCutQuestion): SeriesCutResult | Refusal {
  const { cut, order, digits, request } = question;
  const series = fixedOrderSeries(question.series);
  const { expansion: e } = expand(series, question.at.value, order);
  const setting = settingOf({ ...question, series }, e);
  if (isRefusal(setting)) return setting;
  const low = lowPart(setting, cut);
  const high = e.coefficients.map((c, n) => subExact(c, low[n]!));
  const growthOf = (values: readonly Exact[], title: string): SeriesCutResult['growth']['whole'] =>
    words(
      growthStudy(
        {
          ...series,
          title,
          coefficients: values.map((value) => ({ value, text: '', status: 'computed' as const })),
          singularities: [],
        },
        { digits, request },
      ).growth,
    );
  const cuts = [cut, ...NEIGHBOURS.map(([n, d]) => cut.mul(Rational.of(n, d)))].filter((c) => c.cmp(Rational.ONE) <= 0);
  const stated = leading(e)!;
  return {
    leastterm: VERSION,
    request,
    series: { id: series.id, title: series.title },
    coupling: exactText(question.at.value, digits),
    cut: indicative(cut.toNumber(), 8),
    singularity: {
      u: exactText(stated.u!, 10),
      dimension: exactText(mulExact(exact(2), stated.u!), 10),
      origin: stated.origin,
    },
    strength: { value: indicative(toNumberExact(setting.lambda)), error: indicative(setting.lambdaError, 2) },
    terms: e.coefficients.map((c, n) => ({
      n: n + e.power,
      whole: exactText(c, digits),
      low: indicative(toNumberExact(low[n]!), SHOWN + 2),
      high: indicative(toNumberExact(high[n]!), SHOWN + 2),
    })),
    value: {
      whole: indicative(toNumberExact(e.additive) + sumOf(e, e.coefficients), SHOWN + 2),
      high: indicative(toNumberExact(e.additive) + sumOf(e, high), SHOWN + 2),
    },
    rows: cuts.toSorted((a, b) => a.cmp(b)).map((c) => row({ ...question, series }, setting, c)),
    growth: { whole: growthOf(e.coefficients, 'all momenta'), high: growthOf(high, 'k > mu_f') },
    standing: 'indicative',
  };
}
