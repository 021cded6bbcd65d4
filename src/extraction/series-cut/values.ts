/** @module The sums of a cut series: k > μ_f in fixed order, k < μ_f by its principal value, and how little both together move with μ_f. */
import { Rational, exact, mulExact, subExact, toNumberExact } from '../../numerics/index.js';
import type { Exact } from '../../numerics/index.js';
import { divisorSize, evolveAlpha, isRefusal, refuse } from '../../qcd/index.js';
import type { Refusal } from '../../qcd/index.js';
import type { Expansion, Series, Uncertain } from '../../series/index.js';
import { hardScaleOf, indicative } from '../../studies/index.js';
import { lowMomentumSum } from './low-momenta.js';
import type { LowMomentumSum } from './low-momenta.js';
import type { SeriesCutRow, SeriesCutValues } from './result.js';
import { modelBelow } from './setting.js';
import type { SeriesCutQuestion, Setting } from './setting.js';
import type { CutStrength } from './strength.js';

/** Cuts beside the one asked for, as multiples of it. */
const NEIGHBOURS = [[17, 20], [6, 5], [7, 5]] as const; // prettier-ignore
const SHOWN = 5;

const sumOf = (e: Expansion, c: readonly Exact[]): number => {
  const x = toNumberExact(e.x);
  return c.reduce((sum, own, n) => sum + toNumberExact(own) * x ** (n + 1), 0) * toNumberExact(e.factor);
};

/** The part below the cut as a number per unit λ; a refusal where the coupling does not reach so low. */
function sumBelow(series: Series, setting: Setting, alpha: number, cut: number): LowMomentumSum | Refusal {
  const { e, beta, ratio, singularity, nu, k, wilson } = setting;
  const divisor = toNumberExact(divisorSize(series.coupling.divisor));
  const from = toNumberExact(ratio);
  const run = { alpha, from, flavours: series.flavours ?? 0, loops: beta.length };
  const [hard, low] = [evolveAlpha({ ...run, to: 1 }), evolveAlpha({ ...run, to: cut })];
  if (isRefusal(hard)) return hard;
  if (isRefusal(low)) return refuse(`the coupling cannot be run down to mu_f: ${low.reason}`, 'choose a larger cut');
  const [s, v] = [toNumberExact(singularity.u), toNumberExact(nu)];
  const sum = lowMomentumSum(beta.map(toNumberExact), s, low / divisor, v);
  if (isRefusal(sum)) return refuse(`${sum.reason}: alpha_s(mu_f) = ${low.toPrecision(3)}`, sum.remedy);
  const x = hard / divisor;
  const operator = wilson.reduceRight((acc, c) => x * (acc + toNumberExact(c)), 0) + 1;
  const front = x ** k * operator * cut ** (2 * s) * (low / hard) ** v * toNumberExact(e.factor);
  return { pv: front * sum.pv, im: Math.abs(front) * sum.im };
}

/** Doubles tell sums apart no better. */
const ROUNDING = 1e-15;

/** Distance of the largest from the smallest, not below their rounding. */
const spreadOf = (sums: readonly number[]): number =>
  Math.max(Math.max(...sums) - Math.min(...sums), ROUNDING * Math.max(...sums.map(Math.abs)));

interface Row {
  readonly cut: Rational;
  readonly high: number;
  readonly lastTerm: number;
  readonly low: LowMomentumSum | Refusal;
}

function rowAt(question: SeriesCutQuestion, setting: Setting, lambda: Exact, alpha: number, cut: Rational): Row {
  const { e } = setting;
  const high = withoutLow(e.coefficients, modelBelow(setting, cut), lambda);
  const last = high.length - 1;
  const low = sumBelow(question.series, setting, alpha, cut.toNumber());
  const size = toNumberExact(lambda);
  return {
    cut,
    high: toNumberExact(e.additive) + sumOf(e, high),
    lastTerm: toNumberExact(high[last]!) * toNumberExact(e.x) ** (last + 1) * toNumberExact(e.factor),
    low: isRefusal(low) ? low : { pv: size * low.pv, im: Math.abs(size) * low.im },
  };
}

/** c_n − λ times the model. */
export const withoutLow = (c: readonly Exact[], model: readonly Exact[], lambda: Exact): Exact[] =>
  c.map((own, n) => subExact(own, mulExact(lambda, model[n]!)));

function rowText({ cut, high, lastTerm, low }: Row): SeriesCutRow {
  return {
    cut: indicative(cut.toNumber(), SHOWN),
    high: indicative(high, SHOWN + 2),
    lastTerm: indicative(lastTerm, 3),
    ...(isRefusal(low) ? {} : { low: indicative(low.pv, SHOWN), sum: indicative(high + low.pv, SHOWN + 2) }),
  };
}

/** Half the difference of the sums at both ends of the coupling's error; undefined where it has none, or one end does not reach μ_f. */
function inputError(question: SeriesCutQuestion, setting: Setting, lambda: Exact, at: Uncertain): number | undefined {
  if (at.error === undefined) return undefined;
  const { plus, minus } = at.error;
  const centre = toNumberExact(at.value);
  const [up, down] = [centre + plus.toNumber(), centre - minus.toNumber()].map((alpha) => {
    const x = exact(Rational.fromNumber((toNumberExact(setting.e.x) * alpha) / centre));
    const { high, low } = rowAt(question, { ...setting, e: { ...setting.e, x } }, lambda, alpha, question.cut);
    return isRefusal(low) ? undefined : high + low.pv;
  });
  return up === undefined || down === undefined ? undefined : Math.abs(up - down) / 2;
}

export function valuesOf(
  question: SeriesCutQuestion,
  setting: Setting,
  strength: CutStrength,
  at: Uncertain,
): SeriesCutValues {
  const { e, singularity } = setting;
  const { series, cut } = question;
  const alpha = toNumberExact(at.value);
  const cuts = [cut, ...NEIGHBOURS.map(([n, d]) => cut.mul(Rational.of(n, d)))].filter((c) => c.cmp(Rational.ONE) <= 0);
  const rows = cuts.toSorted((a, b) => a.cmp(b)).map((c) => rowAt(question, setting, strength.value, alpha, c));
  const own = rows.find((r) => r.cut.equals(cut))!;
  const sums = rows.flatMap(({ high, low }) => (isRefusal(low) ? [] : [high + low.pv]));
  const truncation = Math.max(...rows.map((r) => Math.abs(r.lastTerm)));
  const shared = {
    whole: indicative(toNumberExact(e.additive) + sumOf(e, e.coefficients), SHOWN + 2),
    high: indicative(own.high, SHOWN + 2),
    truncation: indicative(truncation, 2),
    rows: rows.map(rowText),
  };
  const { low } = own;
  if (isRefusal(low)) return { ...shared, refused: { reason: low.reason, remedy: low.remedy } };
  const Q = hardScaleOf(series);
  const d = 2 * toNumberExact(singularity.u);
  // The sum moves with λ by the part that the known terms have not taken out.
  const [size, whole] = [toNumberExact(strength.value), toNumberExact(e.additive) + sumOf(e, e.coefficients)];
  const perLambda = (own.high + low.pv - whole) / size;
  const input = inputError(question, setting, strength.value, at);
  return {
    ...shared,
    low: indicative(low.pv, SHOWN),
    sum: indicative(own.high + low.pv, SHOWN + 2),
    ambiguity: indicative(low.im / Math.PI, 3),
    ...(isRefusal(Q)
      ? {}
      : { inGeV: { value: indicative(low.pv * toNumberExact(Q) ** d, 4), unit: d === 1 ? 'GeV' : `GeV^${d}` } }),
    ...(sums.length < 2 ? {} : { spread: indicative(spreadOf(sums), 2) }),
    ...(input === undefined ? {} : { inputError: indicative(input, 2) }),
    ...(strength.error > 0 ? { strengthError: indicative(Math.abs(perLambda) * strength.error, 2) } : {}),
  };
}
