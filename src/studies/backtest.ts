/**
 * @module backtest: what the methods would have said of coefficients that are known by now.
 *
 * Method, targets and scores: docs/methods/backtest.md.
 */
import { diagnoseGrowth } from '../growth/index.js';
import { R } from '../numerics/index.js';
import type { Prescription, Sum } from '../prescriptions/index.js';
import type { ReadNumber, Series, Uncertain } from '../series/index.js';
import { questionOf, TRUNCATION_MODELS, USUAL_PRIORS } from '../truncation/index.js';
import type { AssessOptions } from './assess.js';
import { prescriptionsNamed } from './assess.js';
import type { Caution, ValueRecord } from './assessment.js';
import { estimateScores, estimateTrials } from './backtesting/estimates.js';
import { computedPart, hidings } from './backtesting/hide.js';
import { memberOf, missesOf, ownTarget, predict, PREDICT_DIGITS, seenOf } from './backtesting/predict.js';
import type { Prediction } from './backtesting/predict.js';
import { allStated, recordEntry } from './backtesting/record.js';
import type { BacktestEstimate, BacktestMethod, BacktestResult, BacktestTrial } from './backtesting/result.js';
import { isInside, missOf, scoreOf } from './backtesting/score.js';
import { commonTargets, isTargetOf, targetWords } from './backtesting/target.js';
import type { Target } from './backtesting/target.js';
import { fixedOrderSeries } from './contour/moment.js';
import { expand } from './expand.js';
import type { Expanded } from './expand.js';
import { ballText, indicative } from './figures.js';
import { couplingSummary, seriesSummary } from './summary.js';
import { VERSION } from './version.js';

export interface BacktestOptions extends Omit<AssessOptions, 'verdictRule'> {
  /** Most coefficients hidden, one after the other. */
  readonly hide: number;
  /** The exact value of the sum, where it is known. */
  readonly exact?: ReadNumber;
}

/** Digits of a relative miss. */
const MISS_DIGITS = 3;

function trialOf(p: Prediction, known: Expanded, targets: readonly Target[]): BacktestTrial {
  const { hidden, outcome, next } = p;
  const e = known.expansion;
  const through = e.power + e.coefficients.length - 1 - hidden;
  if (outcome.kind === 'refusal') {
    const { reason, remedy } = outcome;
    return { hidden, through, misses: [], refused: { reason, remedy } };
  }
  return {
    hidden,
    through,
    variant: outcome.variant,
    value: ballText(outcome.value, PREDICT_DIGITS),
    ...(outcome.truncation === undefined ? {} : { error: indicative(outcome.truncation, MISS_DIGITS) }),
    misses: targets.flatMap((target) => {
      const miss = missOf(hidden, outcome.value, outcome.truncation, target);
      return miss === undefined
        ? []
        : [{ against: target.kind, miss: indicative(miss.miss, MISS_DIGITS), inside: isInside(miss) }];
    }),
    ...(next === undefined
      ? {}
      : {
          next: {
            order: through + 1,
            predicted: ballText(next.predicted, 6),
            actual: ballText(next.actual, 6),
            ...(next.miss === undefined ? {} : { miss: indicative(next.miss, MISS_DIGITS) }),
          },
        }),
  };
}

function methodOf(
  prescription: Prescription,
  known: Expanded,
  full: Sum | undefined,
  seen: readonly ReturnType<typeof seenOf>[],
  common: readonly Target[],
): BacktestMethod {
  const predictions = seen.map((part) => predict(known, prescription, part, true));
  const targets = [...common.filter((target) => isTargetOf(target, prescription.name)), ...ownTarget(full)];
  const stated = allStated(predictions);
  const records = targets.flatMap((target): ValueRecord[] => {
    const score = scoreOf(missesOf(predictions, target));
    return score === undefined ? [] : [recordEntry(score, target.kind, stated)];
  });
  return {
    prescription: prescription.name,
    family: prescription.family,
    records,
    trials: predictions.map((p) => trialOf(p, known, targets)),
  };
}

function estimatesOf(
  series: Series,
  known: Expanded,
  hidden: readonly number[],
  common: readonly Target[],
): BacktestEstimate[] {
  const e = known.expansion;
  const { name, divisor, plain } = series.coupling;
  const question = questionOf(e, {
    coupling: { name, divisor, plain },
    ...(series.flavours === undefined ? {} : { flavours: series.flavours }),
    priors: USUAL_PRIORS,
  });
  if (question === undefined) return [];
  return TRUNCATION_MODELS.map((model) => {
    const { trials, refusals } = estimateTrials(model, question, e, hidden, common);
    const text = (x: number): string => indicative(x, MISS_DIGITS);
    return {
      model: model.name,
      title: model.title,
      nature: model.nature,
      about: model.about,
      records: estimateScores(trials).map((s) => ({
        ...s,
        bias: text(s.bias),
        sharpness: text(s.sharpness),
        score68: text(s.score68),
        score95: text(s.score95),
      })),
      trials: trials.map(({ hidden: h, against, fell }) => ({ hidden: h, against, fell })),
      refusals,
    };
  });
}

/** The back-test of one series at the coupling value `at`. */
export function backtest(given: Series, at: Uncertain, options: BacktestOptions): BacktestResult {
  const series = fixedOrderSeries(given);
  const expanded = expand(series, at.value, options.order);
  const known = computedPart(expanded);
  const count = known.expansion.coefficients.length;
  const growth = diagnoseGrowth(known.growthInput);
  const common = commonTargets(series, known.expansion, growth, options.exact);
  const hidden = hidings(count, options.hide);
  const seen = hidden.map((h) => seenOf(known, h));
  const chosen = common[0];
  const prescriptions = prescriptionsNamed(options.by, options.more).map((p) =>
    methodOf(
      p,
      known,
      memberOf(p.apply(known.expansion, growth, { digits: PREDICT_DIGITS, central: true })),
      seen,
      common,
    ),
  );
  return {
    leastterm: VERSION,
    request: options.request,
    series: seriesSummary(series, expanded),
    coupling: couplingSummary(series, at, expanded, options.digits, options.path),
    known: count,
    hidden,
    target: {
      against: chosen?.kind ?? 'own value',
      ...(chosen === undefined ? {} : { value: ballText(chosen.value, options.digits) }),
      statement: targetWords(chosen?.kind ?? 'own value'),
    },
    prescriptions,
    estimates: estimatesOf(series, known, hidden, common),
    cautions: ownCautions(series, expanded, known, hidden, chosen),
  };
}

function ownCautions(
  series: Series,
  expanded: Expanded,
  known: Expanded,
  hidden: readonly number[],
  chosen: Target | undefined,
): Caution[] {
  const list: Caution[] = [];
  const [all, kept] = [expanded.expansion.coefficients.length, known.expansion.coefficients.length];
  if (hidden.length === 0)
    list.push({
      code: 'too-short',
      text: `${kept} known coefficient${kept === 1 ? '' : 's'}: at least three are needed to hide one`,
    });
  else if (hidden.length < 3)
    list.push({ code: 'few-tests', text: `only ${hidden.length} can be hidden: this proves little` });
  if (kept < all)
    list.push({
      code: 'estimated-left-out',
      text: 'estimated coefficients at the end are left out: an estimate is no test',
    });
  if (chosen !== undefined && R.containsZero(chosen.value))
    list.push({ code: 'target-zero', text: 'the target is not told from zero: no relative miss can be given' });
  if (series.invented) list.push({ code: 'invented', text: 'this series is invented for demonstration' });
  if (expanded.expansion.stated.length > 0)
    list.push({
      code: 'stated-beforehand',
      text: 'singularities stated in the file or expected from the operator product expansion count as known beforehand',
    });
  return list;
}
