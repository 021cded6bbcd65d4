/**
 * @module contour: a contour quantity order by order, with any weight and any number of loops on the circle.
 * The work is done by the contour room, which the caller has loaded: no other study needs it.
 */
import type * as Contour from '../../contour/index.js';
import { exact, signExact, toNumberExact } from '../../numerics/index.js';

import type { Rational } from '../../numerics/index.js';
import { InputError } from '../../series/index.js';
import type { ContourWeight, Series, Uncertain } from '../../series/index.js';
import type { Assessment, Caution } from '../assessment.js';
import type { AssessOptions } from '../assess.js';
import { cautions } from '../cautions.js';
import { checkCoupling } from '../coupling-range.js';
import { diagnoseGrowth } from '../../growth/index.js';
import { expand } from '../expand.js';
import { couplingScheme, loopWords } from '../scheme.js';
import { couplingSummary, seriesSummary } from '../summary.js';
import { VERSION } from '../version.js';
import { fixedOrderSeries } from './moment.js';
import { contourSums } from './sums.js';
import type { ContourSum } from './sums.js';

export interface ContourStudyOptions extends Pick<AssessOptions, 'order' | 'digits' | 'request' | 'path'> {
  /** In place of the file's own; with it any series of D will do. */
  readonly weight?: ContourWeight;
  /** Loops of the running on the circle, 1 to 5. */
  readonly loops?: number;
  /** N_g of the gluon condensate's renormalon, or 'model'. */
  readonly norm?: Uncertain | 'model';
  /** R/√s_0 of its subtraction. */
  readonly ratio?: Rational;
}

export type ContourResult = Pick<Assessment, 'leastterm' | 'request' | 'series' | 'coupling'> &
  Contour.ContourReport & {
    /** Every sum with its errors, those of the input among them. */
    readonly sums: readonly ContourSum[];
    readonly cautions: readonly Caution[];
  };

/** Digits at which the sums are made again for the errors of the input. */
const MOVED_DIGITS = 8;

/** The series with another weight, and in a world of fewer loops. */
function adjusted(series: Series, { weight, loops }: ContourStudyOptions): Series {
  let own = series;
  if (weight !== undefined) {
    const { checks: _checks, ...rest } = series;
    // A constant in front of D is no part of the moment; of a moment it is.
    own = { ...rest, contour: weight, ...(series.contour === undefined ? { additive: exact(0) } : {}) };
  }
  if (own.contour === undefined)
    throw new InputError([
      {
        file: series.id,
        found: 'a plain series',
        wanted: 'a contour quantity (kind: contour), or a weight for this one: --weight kinematic',
      },
    ]);
  const scheme = couplingScheme(own);
  if (loops === undefined || !('kind' in scheme)) return own;
  if (scheme.kind !== 'MSbar')
    throw new InputError([
      {
        file: series.id,
        field: 'scheme',
        found: `--loops ${loops} with "${series.scheme ?? ''}"`,
        wanted: 'an MSbar series for another number of loops',
      },
    ]);
  return { ...own, scheme: `MSbar, ${loopWords(loops)}` };
}

/** The norm as the contour room takes it. */
function normOf(norm: ContourStudyOptions['norm']): Contour.Norm | 'model' | undefined {
  if (norm === undefined || norm === 'model') return norm;
  const error = norm.error === undefined ? 0 : (norm.error.plus.toNumber() + norm.error.minus.toNumber()) / 2;
  return { value: norm.value, error, origin: `N_g = ${norm.text}, as given` };
}

/** The study of a contour quantity at the coupling value `at`. */
export function contourStudy(
  given: Series,
  at: Uncertain,
  options: ContourStudyOptions,
  engine: Pick<typeof Contour, 'contourReport'>,
): ContourResult {
  const own = adjusted(given, options);
  const series = fixedOrderSeries(own);
  checkCoupling(series, at);
  const expanded = expand(series, at.value, options.order);
  const { contour } = expanded.expansion;
  if (contour === undefined) throw new RangeError('contourStudy: the expansion has lost its contour');
  const norm = normOf(options.norm);
  const how = {
    ...(norm === undefined ? {} : { norm }),
    ...(options.ratio === undefined ? {} : { ratio: options.ratio }),
  };
  const report = engine.contourReport({ ...expanded.expansion, contour }, { ...how, digits: options.digits });
  const sums = contourSums(report, own, at, (moved, coupling) => {
    if (signExact(coupling) <= 0) return undefined;
    const { expansion } = expand(fixedOrderSeries(moved), coupling, options.order);
    return (
      expansion.contour &&
      engine.contourReport({ ...expansion, contour: expansion.contour }, { ...how, digits: MOVED_DIGITS })
    );
  });
  const growth = diagnoseGrowth(expanded.growthInput);
  return {
    leastterm: VERSION,
    request: options.request,
    series: seriesSummary(own, expanded),
    coupling: couplingSummary(own, at, expanded, options.digits, options.path),
    ...report,
    sums,
    // The difference of the two expansions has a part of its own in the report.
    cautions: cautions(series, expanded, growth, undefined, [], toNumberExact(at.value)).filter(
      ({ code }) => code !== 'contour-quantity',
    ),
  };
}
