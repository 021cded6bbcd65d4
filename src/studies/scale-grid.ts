/**
 * @module A series and its coupling at another renormalisation scale: what a comparison over scales runs on.
 *
 * Method     the coefficients by the rewriting of `rewrite`, errors and correlations with them; the coupling by exact running
 *            at the same number of flavours, its error by δα′ = δα β(α′)/β(α).
 */
import { divExact, exact, Rational, toNumberExact } from '../numerics/index.js';
import type { Exact } from '../numerics/index.js';
import { betaCoefficients, divisorSize, exactPath, isRefusal, refuse } from '../qcd/index.js';
import type { Loops, Refusal } from '../qcd/index.js';
import type { Series, Uncertain } from '../series/index.js';
import { exactText } from './figures.js';
import { rewriteStudy } from './rewrite.js';
import { couplingScheme, flavoursOf, knownLoops, scaleRatioOf, schemeText } from './scheme.js';

export interface ComparedAt {
  readonly series: Series;
  readonly at: Uncertain;
  /** μ/Q, where scales are compared. */
  readonly scale?: string;
}

/** Digits of a coupling as text. */
const DIGITS = 12;

/** −β/x² in units that cancel: Σ b_k x^(k+2). */
function velocity(series: Series, flavours: number, loops: number, alpha: number): number {
  const x = alpha / toNumberExact(divisorSize(series.coupling.divisor));
  const beta = betaCoefficients(flavours, series.coupling.divisor).slice(0, loops).map(toNumberExact);
  return beta.reduceRight((acc, b) => acc * x + b, 0) * x * x;
}

function moved(series: Series, at: Uncertain, ratio: Exact): Uncertain | Refusal {
  const scheme = couplingScheme(series);
  if (isRefusal(scheme)) return scheme;
  if (scheme.kind !== 'MSbar' && scheme.kind !== 'toy')
    return refuse(
      `the coupling of "${schemeText(scheme)}" has no running of its own here`,
      'bring the series to MSbar first: leastterm rewrite SERIES --coupling MSbar',
    );
  const flavours = flavoursOf(series);
  if (isRefusal(flavours)) return flavours;
  const before = scaleRatioOf(series);
  if (isRefusal(before)) return before;
  const loops = knownLoops(scheme);
  // Only the ratio of the two scales counts.
  const end = exactPath({
    alpha: at.value,
    from: { scale: exact(1), flavours },
    to: { scale: divExact(ratio, before), flavours },
    options: { loops: loops as Loops, thresholds: [] },
  });
  if (isRefusal(end)) return end;
  const value = end.alpha;
  const text = exactText(value, DIGITS);
  if (at.error === undefined) return { value, text };
  const speed = (alpha: Exact): number => velocity(series, flavours, loops, toNumberExact(alpha));
  const factor = Rational.fromNumber(speed(value) / speed(at.value));
  const error = { plus: at.error.plus.mul(factor), minus: at.error.minus.mul(factor) };
  return { value, error, text: `${text} +- ${error.plus.toNumber().toPrecision(3)}` };
}

/** The series and its coupling at μ/Q = ratio; `at` belongs to the scale of the file. */
export async function atScaleRatio(series: Series, at: Uncertain, ratio: Uncertain): Promise<ComparedAt | Refusal> {
  const coupling = moved(series, at, ratio.value);
  if (isRefusal(coupling)) {
    return refuse(`at μ/Q = ${ratio.text}: ${coupling.reason}`, coupling.remedy);
  }
  const rewritten = await rewriteStudy(series, {
    scale: ratio.value,
    find: (name) => Promise.reject(new RangeError(`no series ${name} is needed for a change of scale`)),
  });
  if (isRefusal(rewritten)) return rewritten;
  return { series: rewritten, at: coupling, scale: ratio.text };
}
