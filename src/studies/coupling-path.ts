/**
 * @module From α_s(M_Z) to the coupling of a series: evolved over the thresholds to its n_f and its scale μ = Q · (μ/Q).
 *
 * Method     exact path in enclosures for the value; the study of `evolve` for its errors and for the steps that are shown.
 * Bound      the value is certified for the truncated equations; its error holds the errors of α_s(M_Z) and of the quark
 *            masses. One loop less and the crossing scales are told beside, not added: they are estimates.
 */
import { Rational, exact, mulExact, toNumberExact } from '../numerics/index.js';
import { DEFAULT_THRESHOLDS, INPUTS, exactPath, isRefusal, refuse } from '../qcd/index.js';
import type { Refusal, Threshold } from '../qcd/index.js';
import type { Series, Uncertain } from '../series/index.js';
import { evolveStudy } from './evolve.js';
import type { EvolveResult } from './evolve-types.js';
import { estimateText } from './figures.js';
import { couplingScheme, flavoursOf, hardScaleOf, scaleRatioOf, schemeText } from './scheme.js';

export interface EvolvedCoupling {
  readonly at: Uncertain;
  /** The steps, one line each, and what the error holds. */
  readonly path: readonly string[];
}

export interface CouplingOptions {
  /** Loops of the running, 1 to 5 (default). */
  readonly loops?: number;
  readonly thresholds?: readonly Threshold[];
}

const MZ_FLAVOURS = 5;
const MZ = Rational.parse(INPUTS.MZ.value) ?? Rational.ZERO;

/** Why α_s(M_Z) says nothing about this series, or the flavours and the scale at which it is wanted. */
function placeOf(series: Series): { readonly flavours: number; readonly mu: Uncertain['value'] } | Refusal {
  if (series.coupling.plain) {
    return refuse(
      `${series.id} is a series in the plain variable ${series.coupling.name}, not in α_s`,
      `give the value of ${series.coupling.name}: --at 0.1`,
    );
  }
  const scheme = couplingScheme(series);
  if (isRefusal(scheme)) return scheme;
  if (scheme.kind !== 'MSbar') {
    return refuse(
      `${series.id} is in the coupling of "${schemeText(scheme)}", and α_s(M_Z) is MSbar`,
      scheme.kind === 'toy'
        ? 'give the coupling of that world: --at 0.1'
        : 'give --at, or bring it to MSbar first: leastterm rewrite SERIES --coupling MSbar',
    );
  }
  const flavours = flavoursOf(series);
  if (isRefusal(flavours)) return flavours;
  const hard = hardScaleOf(series);
  if (isRefusal(hard)) return hard;
  const ratio = scaleRatioOf(series);
  return isRefusal(ratio) ? ratio : { flavours, mu: mulExact(hard, ratio) };
}

/** Sides that differ by less than this share of their mean are given as their mean, as the Particle Data Group does. */
const ASYMMETRY = 0.1;

/** Errors of the input, upwards and downwards, in quadrature. */
function spread(result: EvolveResult): { readonly plus: Rational; readonly minus: Rational } | undefined {
  const sum = (side: 'plus' | 'minus'): number =>
    Math.sqrt(result.errors.reduce((s, e) => s + Number(e[side]) ** 2, 0));
  const [up, down] = [sum('plus'), sum('minus')];
  const mean = (up + down) / 2;
  const rounded = (x: number): Rational => Rational.parse(x.toPrecision(3)) ?? Rational.ZERO;
  if (!(mean > 0)) return undefined;
  const same = Math.abs(up - down) < ASYMMETRY * mean;
  return { plus: rounded(same ? mean : up), minus: rounded(same ? mean : down) };
}

function budget(result: EvolveResult): string {
  const inputs = result.errors.map((e) => `${e.label} +${e.plus} -${e.minus}`);
  const estimates = [
    ...(result.oneLoopLess === undefined ? [] : [`one loop less moves it by ${result.oneLoopLess.shift}`]),
    ...(result.matching === undefined
      ? []
      : [`crossing the thresholds elsewhere by ${result.matching.spread} (mostly ${result.matching.dominant})`]),
  ];
  return `its error: ${inputs.length === 0 ? 'none given' : inputs.join(', ')}; not in it: ${estimates.length === 0 ? 'nothing' : estimates.join(', ')}`;
}

/** The coupling of the series from α_s(M_Z), or why it cannot be had. */
export function couplingFromMZ(
  series: Series,
  alpha: Uncertain,
  options: CouplingOptions = {},
): EvolvedCoupling | Refusal {
  const place = placeOf(series);
  if (isRefusal(place)) return place;
  const { loops = 5, thresholds = DEFAULT_THRESHOLDS } = options;
  const { flavours, mu } = place;
  const result = evolveStudy({
    quantity: 'alpha_s',
    value: alpha,
    from: { scale: MZ.toNumber(), flavours: MZ_FLAVOURS },
    to: { scale: toNumberExact(mu), flavours },
    loops,
    thresholds,
  });
  if (isRefusal(result)) return result;
  const end = exactPath({
    alpha: alpha.value,
    from: { scale: exact(MZ), flavours: MZ_FLAVOURS },
    to: { scale: mu, flavours },
    options: { loops, thresholds },
  });
  if (isRefusal(end)) return end;
  const error = spread(result);
  const value = toNumberExact(end.alpha);
  const short = estimateText(value, error === undefined ? 0 : Math.max(error.plus.toNumber(), error.minus.toNumber()));
  return {
    at: {
      value: end.alpha,
      ...(error === undefined ? {} : { error }),
      text: error === undefined ? short.value : `${short.value} +- ${short.error}`,
    },
    path: [
      ...result.path.map((step) => step.text),
      `${loops}-loop running, ${loops - 1}-loop decoupling`,
      budget(result),
    ],
  };
}
