/** @module What was read, as the result states it: the series and the coupling. */
import { toNumberExact } from '../numerics/index.js';
import type { Exact } from '../numerics/index.js';
import { lambdaRatio } from './lambda.js';
import { isMSbar } from './scheme.js';
import type { Series, Uncertain } from '../series/index.js';
import type { CouplingSummary, SeriesSummary } from './assessment.js';
import type { Expanded } from './expand.js';
import { exactText, indicative } from './figures.js';

/** Digits shown of exact inputs such as a factor or a scale ratio. */
const INPUT_DIGITS = 15;

export function seriesSummary(series: Series, expanded: Expanded): SeriesSummary {
  const used = expanded.expansion.coefficients.length + expanded.leadingZeros;
  return {
    id: series.id,
    title: series.title,
    ...(series.quantity === undefined ? {} : { quantity: series.quantity }),
    order: used === 0 ? 0 : series.firstPower + used - 1,
    coefficientsUsed: used,
    coefficientsInFile: series.coefficients.length,
    coupling: { name: series.coupling.name, divisor: series.coupling.divisor, plain: series.coupling.plain },
    firstPower: series.firstPower,
    ...(series.scheme === undefined ? {} : { scheme: series.scheme }),
    ...(series.flavours === undefined ? {} : { flavours: series.flavours }),
    ...(series.scaleRatio === undefined ? {} : { scaleRatio: exactText(series.scaleRatio, INPUT_DIGITS) }),
    ...(series.hardScale === undefined
      ? {}
      : { hardScale: { value: exactText(series.hardScale.value, INPUT_DIGITS), unit: series.hardScale.unit } }),
    ...(series.unit === undefined ? {} : { unit: series.unit }),
    factor: exactText(series.factor, INPUT_DIGITS),
    additive: exactText(series.additive, INPUT_DIGITS),
    sources: series.sources,
    notes: series.notes,
    invented: series.invented,
  };
}

/** One-sigma relative error of the coupling. */
export function relativeCouplingError(at: Uncertain): number {
  if (at.error === undefined) return 0;
  return (at.error.plus.toNumber() + at.error.minus.toNumber()) / 2 / Math.abs(toNumberExact(at.value));
}

/** Hard scale in GeV. */
export function hardScaleGeV(series: Series): number | undefined {
  if (series.hardScale === undefined) return undefined;
  const v = toNumberExact(series.hardScale.value);
  return series.hardScale.unit === 'MeV' ? v / 1000 : v;
}

/** Λ/Q of the series at this coupling: Λ/μ from α and n_f at the loops of the β function, times μ/Q. None outside MSbar. */
export function lambdaOverQ(series: Series, at: Exact): number | undefined {
  if (series.coupling.plain || series.flavours === undefined || !isMSbar(series)) return undefined;
  const overMu = lambdaRatio(toNumberExact(at), series.flavours);
  if (overMu === undefined) return undefined;
  return overMu * (series.scaleRatio === undefined ? 1 : toNumberExact(series.scaleRatio));
}

export function couplingSummary(
  series: Series,
  at: Uncertain,
  expanded: Expanded,
  digits: number,
  path?: readonly string[],
): CouplingSummary {
  const over = lambdaOverQ(series, at.value);
  const Q = hardScaleGeV(series);
  const ratio = series.scaleRatio === undefined ? 1 : toNumberExact(series.scaleRatio);
  return {
    name: series.coupling.name,
    value: exactText(at.value, digits),
    ...(at.error === undefined ? {} : { error: errorText(at) }),
    divisor: series.coupling.divisor,
    x: exactText(expanded.expansion.x, digits),
    ...(expanded.uPerT === undefined ? {} : { uPerT: exactText(expanded.uPerT, digits) }),
    ...(over === undefined
      ? {}
      : {
          lambda: {
            overMu: indicative(over / ratio),
            ...(Q === undefined ? {} : { GeV: indicative(over * Q) }),
            definition: `Lambda_MSbar, n_f = ${series.flavours}, exact four-loop definition${series.scheme === undefined ? ' (no scheme stated: taken as MSbar)' : ''}`,
          },
        }),
    ...(path === undefined ? {} : { path }),
  };
}

function errorText(at: Uncertain): string {
  const { plus, minus } = at.error!;
  return plus.equals(minus)
    ? indicative(plus.toNumber(), 6)
    : `+${indicative(plus.toNumber(), 6)} -${indicative(minus.toNumber(), 6)}`;
}
