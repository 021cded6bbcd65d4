/**
 * @module A bubble chain as a Series, so that every study can be asked about it: coefficients of α_s, one-loop running, the
 * poles of its Borel transform as known singularities.
 */
import { betaNought, borelPoles, chainCoefficients, factorBall } from '../bubbles/index.js';
import type { ChainPoint, Quantity } from '../bubbles/index.js';
import { R, exact, exactReal } from '../numerics/index.js';
import type { Exact, Rational } from '../numerics/index.js';
import type { KnownSingularity, Series } from '../series/index.js';

/** Poles beyond this do not show in the first dozen coefficients. */
const REACH = 4.25;

/** c_n β0^n: coefficients of α_s^(n+1) over the normalisation. */
export function inAlpha(coefficients: readonly Exact[], flavours: number): Exact[] {
  return coefficients.map((c, n) =>
    n === 0
      ? c
      : exactReal((prec) => R.mul(c.ball(prec + 8), R.powInt(betaNought(flavours, prec + 16), n, prec + 16), prec + 8)),
  );
}

export interface ChainSeriesOptions {
  /** In place of the quantity's own coefficients. */
  readonly coefficients?: readonly Exact[];
  /** Only these singularities; all when absent. */
  readonly side?: 'ultraviolet';
  readonly title?: string;
  /** Hard scale in GeV. */
  readonly scale?: Rational;
  /** The coupling as one of MSbar, for the evolution from M_Z. */
  readonly scheme?: string;
}

function singularities(quantity: Quantity, side: 'ultraviolet' | undefined): KnownSingularity[] {
  return borelPoles(quantity, REACH)
    .filter(({ u }) => side === undefined || u.sign() < 0)
    .map(({ u, order }) => ({
      u: exact(u),
      exponent: exact(order),
      kind: u.sign() > 0 ? ('infrared' as const) : ('ultraviolet' as const),
    }));
}

/** The first `length` terms of a chain. */
export function chainSeries(
  quantity: Quantity,
  point: ChainPoint,
  length: number,
  options: ChainSeriesOptions = {},
): Series {
  const coefficients = options.coefficients ?? chainCoefficients(quantity, length, point.ratio);
  const { scale } = options;
  return {
    id: quantity.name,
    title: options.title ?? `${quantity.title}, large beta_0`,
    quantity: quantity.meaning,
    sources: quantity.sources,
    notes: [],
    invented: false,
    coupling: { name: 'alpha_s', divisor: '1', plain: false },
    firstPower: 1,
    scheme: options.scheme ?? 'large beta_0, one-loop running only',
    flavours: point.flavours,
    scaleRatio: point.ratio,
    ...(scale === undefined
      ? {}
      : { hardScale: { value: exact(scale), unit: 'GeV' as const, text: `${scale.toString()} GeV` } }),
    factor: exactReal((prec) => factorBall(quantity.norm.factor, prec)),
    additive: exact(0),
    coefficients: inAlpha(coefficients.slice(0, length), point.flavours).map((value) => ({
      value,
      text: '',
      status: 'computed' as const,
    })),
    singularities: singularities(quantity, options.side),
    condensates: [],
  };
}
