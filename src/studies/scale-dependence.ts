/**
 * @module How the truncated sum depends on the renormalisation scale, order by order: the coupling by exact running, the
 * coefficients by exact re-expansion. Every order further should be flatter; where it is not, the series has begun to diverge.
 */
import { R, toNumberExact } from '../numerics/index.js';
import type { Series, Uncertain } from '../series/index.js';
import { questionOf, USUAL_PRIORS } from '../truncation/index.js';
import type { AssessOptions } from './assess.js';
import type { Assessment, Refused } from './assessment.js';
import { fixedOrderSeries } from './contour/moment.js';
import { expand } from './expand.js';
import { indicative } from './figures.js';
import { couplingSummary, seriesSummary } from './summary.js';
import { VERSION } from './version.js';

export interface ScalePointReport {
  /** μ over the scale of the series. */
  readonly ratio: string;
  readonly coupling: string;
  /** The sums through each of the orders. */
  readonly sums: readonly string[];
}

export interface ScaleDependence {
  readonly leastterm: string;
  readonly request: Assessment['request'];
  readonly series: Assessment['series'];
  readonly coupling: Assessment['coupling'];
  readonly orders: readonly number[];
  readonly points: readonly ScalePointReport[];
  /** Why the scale does not go further, or does not move at all. */
  readonly stopped?: Refused;
}

export interface ScaleDependenceOptions extends Omit<AssessOptions, 'by' | 'verdictRule'> {
  /** The scan runs from 1/factor to factor. */
  readonly factor?: number;
  /** Odd, so that the scale of the series itself is one of them. */
  readonly points?: number;
}

const FACTOR = 2.5;
const POINTS = 41;
/** Digits of a sum at a moved scale: it is worked out in doubles. */
const DIGITS = 10;

/** Partial sums through every order over a range of scales. */
export function scaleDependence(given: Series, at: Uncertain, options: ScaleDependenceOptions): ScaleDependence {
  const series = fixedOrderSeries(given);
  const expanded = expand(series, at.value, options.order);
  const { expansion } = expanded;
  const question = questionOf(expansion, {
    coupling: series.coupling,
    ...(series.flavours === undefined ? {} : { flavours: series.flavours }),
    priors: USUAL_PRIORS,
  });
  const factor = options.factor ?? FACTOR;
  const count = options.points ?? POINTS;
  const prefactor = toNumberExact(expansion.factor);
  const additive = toNumberExact(expansion.additive);
  const points: ScalePointReport[] = [];
  let stopped: Refused | undefined;
  for (let k = 0; k < count; k++) {
    const logMu = Math.log(factor) * ((2 * k) / (count - 1) - 1);
    const moved = question?.atScale(2 * logMu);
    if (moved === undefined) break;
    if (moved.kind === 'refusal') {
      stopped = { reason: moved.reason, remedy: moved.remedy };
      continue;
    }
    let sum = additive;
    const sums = moved.coefficients.map((c, n) => {
      sum += prefactor * R.toNumber(c) * moved.x ** (n + expansion.power);
      return indicative(sum, DIGITS);
    });
    points.push({ ratio: indicative(Math.exp(logMu), 6), coupling: indicative(moved.alpha, DIGITS), sums });
  }
  return {
    leastterm: VERSION,
    request: options.request,
    series: seriesSummary(series, expanded),
    coupling: couplingSummary(series, at, expanded, options.digits, options.path),
    orders: expansion.coefficients.map((_, n) => n + expansion.power),
    points,
    ...(stopped === undefined ? {} : { stopped }),
  };
}
