/**
 * @module A contour quantity as the power series in the coupling at s_0 that every other study works on.
 *
 * Method     R = Σ_l (J_l/l!) (β ∂)^l D (QCD room, rewrite/circle.ts): the fixed-order expansion, exactly. Errors, singularities
 *            and condensates follow the coefficients.
 */
import { exact, toNumberExact } from '../../numerics/index.js';
import type { Exact, Rational } from '../../numerics/index.js';
import {
  betaCoefficients,
  circleMoments,
  exactInPiSquared,
  expandOnCircle,
  isRefusal,
  weightIntegral,
} from '../../qcd/index.js';
import { InputError, weightText } from '../../series/index.js';
import type { ContourOrigin, Expansion, Series } from '../../series/index.js';
import { couplingScheme, knownLoops } from '../scheme.js';
import { momentCoefficients } from './coefficients.js';
import { momentCondensate, momentSingularity } from './singularities.js';

export interface CircleRunning {
  readonly flavours: number;
  readonly loops: number;
  /** b_k in the series' own variable, as many as there are loops. */
  readonly beta: readonly Exact[];
}

/** How the coupling of a contour quantity runs along the circle. Throws InputError for a coupling whose running is not known. */
export function circleRunning(series: Series): CircleRunning {
  const scheme = couplingScheme(series);
  const problem = (found: string, wanted: string): InputError =>
    new InputError([{ file: series.id, field: 'scheme', found, wanted }]);
  if (isRefusal(scheme)) throw problem(scheme.reason, scheme.remedy);
  if (scheme.kind !== 'MSbar' && scheme.kind !== 'toy') {
    throw problem(
      `a contour quantity in "${series.scheme ?? ''}"`,
      'MSbar; bring it there first: leastterm rewrite SERIES --coupling MSbar',
    );
  }
  const { flavours } = series;
  if (flavours === undefined) throw problem('no number of flavours', 'a field "flavours"');
  const loops = knownLoops(scheme);
  return { flavours, loops, beta: betaCoefficients(flavours, series.coupling.divisor).slice(0, loops) };
}

/** The fixed-order coefficients that belong to other coefficients of D; as many as the expansion has, leading zeros left out. */
export function fixedOrderOf(origin: ContourOrigin, coefficients: readonly Exact[], e: Expansion): readonly Exact[] {
  const beta = betaCoefficients(origin.flavours, origin.divisor).slice(0, origin.loops);
  const moments = circleMoments(origin.integral, coefficients.length).map(exactInPiSquared);
  const values = expandOnCircle(coefficients, exact(origin.power), beta, moments);
  return values.slice(e.power - origin.power);
}

const made = new WeakMap<Series, Series>();

/** The fixed-order expansion of a contour quantity as a series of its own; any other series as it is. */
export function fixedOrderSeries(series: Series): Series {
  if (series.contour === undefined) return series;
  let found = made.get(series);
  if (found === undefined) {
    found = expanded(series, weightIntegral(series.contour.coefficients));
    made.set(series, found);
  }
  return found;
}

function expanded(series: Series, integral: readonly Rational[]): Series {
  const { contour, correlation: _correlation, ...rest } = series;
  const { beta } = circleRunning(series);
  const moments = circleMoments(integral, series.coefficients.length).map(exactInPiSquared);
  const values = expandOnCircle(
    series.coefficients.map((c) => c.value),
    exact(series.firstPower),
    beta,
    moments,
  );
  return {
    ...rest,
    ...momentCoefficients(series, values, beta.map(toNumberExact), moments.map(toNumberExact)),
    singularities: series.singularities.map((s) => momentSingularity(series, s, integral, beta)),
    condensates: series.condensates.map((c) => momentCondensate(c, integral)),
    notes: [
      `Contour quantity with the weight w(x) = ${contour === undefined ? '' : weightText(contour)}, expanded in the coupling at s_0: the coefficients shown are those of this fixed-order expansion.`,
      ...series.notes,
    ],
    expandedFrom: series,
  };
}
