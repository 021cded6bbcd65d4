/**
 * @module The record of each prescription on one series, short enough to stand beside its value.
 */
import type { Prescription, Sum } from '../../prescriptions/index.js';
import type { ReadNumber, Series } from '../../series/index.js';
import { diagnoseGrowth } from '../../growth/index.js';
import type { Caution, ValueRecord } from '../assessment.js';
import type { Expanded } from '../expand.js';
import { indicative } from '../figures.js';
import { computedPart, hidings } from './hide.js';
import { memberOf, missesOf, ownTarget, predict, PREDICT_DIGITS, seenOf } from './predict.js';
import type { Prediction } from './predict.js';
import { scoreOf } from './score.js';
import type { Score } from './score.js';
import { commonTargets, isTargetOf } from './target.js';
import type { Target, TargetKind } from './target.js';

/** A miss beyond this many errors, stated and the target's own together, is a bad record. A heuristic: a normal error does it once in 370 times. */
const BAD_PULL = 3;
/** Digits of a score: it rests on one to three predictions. */
const SCORE_DIGITS = 3;

/** Coefficients that the short record of a long series is made from: a step at full length would cost as much as the values. */
export const SEEN_OF_LONG = 12;

export interface RecordOptions {
  /** Most coefficients hidden, one after the other; or how many are seen, all others being hidden at once. */
  readonly what: { readonly hide: number } | { readonly seen: number };
  readonly exact?: ReadNumber;
}

function hiddenBy(what: RecordOptions['what'], known: number): readonly number[] {
  if ('hide' in what) return hidings(known, what.hide);
  return known > what.seen ? [known - what.seen] : [];
}

/** One word for a score. */
export function judge(score: Score, stated: boolean): ValueRecord['verdict'] {
  if (score.inside === score.tested) return 'good';
  if (!stated) return 'no error stated';
  return score.worst > BAD_PULL ? 'bad' : 'fair';
}

export function recordEntry(score: Score, against: TargetKind, stated: boolean): ValueRecord {
  return {
    against,
    tested: score.tested,
    inside: score.inside,
    bias: indicative(score.bias, SCORE_DIGITS),
    ...(score.sharpness === undefined ? {} : { sharpness: indicative(score.sharpness, SCORE_DIGITS) }),
    score: indicative(score.score, SCORE_DIGITS),
    verdict: judge(score, stated),
  };
}

/** Does every prediction that stands come with an error? */
export const allStated = (predictions: readonly Prediction[]): boolean =>
  predictions.every(({ outcome }) => outcome.kind === 'refusal' || outcome.truncation !== undefined);

/**
 * Record of each prescription by name; those that had refused the shorter series are missing. `sums` are the central sums
 * with all coefficients.
 */
export function records(
  series: Series,
  expanded: Expanded,
  sums: ReadonlyMap<Prescription, Sum>,
  options: RecordOptions,
): Map<string, ValueRecord> {
  const known = computedPart(expanded);
  const whole = known === expanded;
  const growth = diagnoseGrowth(known.growthInput);
  const common: Target | undefined = commonTargets(series, known.expansion, growth, options.exact)[0];
  const { what } = options;
  const seen = hiddenBy(what, known.expansion.coefficients.length).map((hidden) => seenOf(known, hidden));
  const found = new Map<string, ValueRecord>();
  for (const [prescription, sum] of sums) {
    const predictions = seen.map((part) => predict(known, prescription, part, false));
    const own = (): Sum | undefined =>
      whole ? sum : memberOf(prescription.apply(known.expansion, growth, { digits: PREDICT_DIGITS, central: true }));
    const target = common !== undefined && isTargetOf(common, prescription.name) ? common : ownTarget(own())[0];
    const score = target === undefined ? undefined : scoreOf(missesOf(predictions, target));
    if (target !== undefined && score !== undefined)
      found.set(prescription.name, {
        ...recordEntry(score, target.kind, allStated(predictions)),
        ...('seen' in what ? { seen: what.seen } : {}),
      });
  }
  return found;
}

/** The caution that goes with bad records. */
export function recordCautions(list: ReadonlyMap<string, ValueRecord>): Caution[] {
  const bad = [...list].filter(([, record]) => record.verdict === 'bad').map(([name]) => name);
  const seen = [...list.values()][0]?.seen;
  const from = seen === undefined ? 'without the last known coefficients' : `from the first ${seen} coefficients alone`;
  return bad.length === 0
    ? []
    : [
        {
          code: 'bad-record',
          text: `${from}, ${bad.join(', ')} missed by more than ${BAD_PULL} times their stated errors on this series, the target's own error allowed for`,
        },
      ];
}
