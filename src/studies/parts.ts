/** @module The parts of an assessment that stand alone: growth, Borel plane, one prescription. */
import { diagnoseGrowth } from '../growth/index.js';
import { exact } from '../numerics/index.js';
import type { Series, Uncertain } from '../series/index.js';
import { sumUp } from './assess.js';
import type { AssessOptions } from './assess.js';
import type { Assessment } from './assessment.js';
import { cautions } from './cautions.js';
import { fixedOrderSeries } from './contour/moment.js';
import { keptCorrelation } from './correlation.js';
import { expand } from './expand.js';
import { growthReport } from './growth-report.js';
import { planeReport } from './plane-report.js';
import { leadingStrength, strengthReport } from './strength-report.js';
import { couplingSummary, seriesSummary } from './summary.js';
import { ultravioletReport } from './ultraviolet-report.js';
import { valueEntry } from './values.js';
import { VERSION } from './version.js';

export type GrowthResult = Pick<Assessment, 'leastterm' | 'request' | 'series' | 'growth' | 'cautions'>;
export type PlaneResult = Pick<Assessment, 'leastterm' | 'request' | 'series' | 'borelPlane' | 'cautions'>;
export type SumResult = Pick<Assessment, 'leastterm' | 'request' | 'series' | 'coupling' | 'values' | 'cautions'>;

type PartOptions = Omit<AssessOptions, 'by' | 'path'>;

/** Growth needs no coupling: the diagnosis is of the coefficients. */
const ANY_COUPLING = exact(1);

/** The growth diagnosis of a series. */
export function growthStudy(given: Series, options: PartOptions): GrowthResult {
  const series = fixedOrderSeries(given);
  const expanded = expand(series, ANY_COUPLING, options.order);
  const growth = diagnoseGrowth(expanded.growthInput);
  return {
    leastterm: VERSION,
    request: options.request,
    series: seriesSummary(series, expanded),
    growth: growthReport(
      growth,
      expanded,
      strengthReport(leadingStrength(series, expanded)),
      ultravioletReport(series, expanded),
    ),
    cautions: cautions(series, expanded, growth, undefined, []),
  };
}

/** The Borel plane of a series. */
export function planeStudy(given: Series, options: PartOptions): PlaneResult {
  const series = fixedOrderSeries(given);
  const expanded = expand(series, ANY_COUPLING, options.order);
  const growth = diagnoseGrowth(expanded.growthInput);
  return {
    leastterm: VERSION,
    request: options.request,
    series: seriesSummary(series, expanded),
    borelPlane: planeReport(expanded, growth, options.digits, keptCorrelation(series, expanded)),
    cautions: cautions(series, expanded, growth, undefined, []),
  };
}

/** Chosen prescriptions at a coupling. */
export function sumStudy(given: Series, at: Uncertain, options: AssessOptions): SumResult {
  const series = fixedOrderSeries(given);
  const { expanded, growth, values } = sumUp(series, at, options);
  return {
    leastterm: VERSION,
    request: options.request,
    series: seriesSummary(series, expanded),
    coupling: couplingSummary(series, at, expanded, options.digits, options.path),
    values: values.map((v) => valueEntry(v, options.digits)),
    cautions: cautions(series, expanded, growth, undefined, values),
  };
}
