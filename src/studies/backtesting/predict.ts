/**
 * @module Every prescription on the series without its last coefficients, and what came of it.
 */
import { diagnoseGrowth } from '../../growth/index.js';
import type { Growth } from '../../growth/index.js';
import { R } from '../../numerics/index.js';
import type { Ball } from '../../numerics/index.js';
import { nextCoefficient } from '../../prescriptions/index.js';
import type { Outcome, Prescription, Sum } from '../../prescriptions/index.js';
import type { Expanded } from '../expand.js';
import { firstOf } from './hide.js';
import { missOf } from './score.js';
import type { Miss } from './score.js';
import type { Target } from './target.js';

/** Certified digits asked of predictions: no miss of interest is smaller. */
export const PREDICT_DIGITS = 12;

/** The member that stands for its family: its own choice, else the first that stands. */
export function memberOf(outcomes: readonly Outcome[]): Sum | undefined {
  const sums = outcomes.filter((o): o is Sum => o.kind === 'sum');
  return sums.find((o) => o.central === true) ?? sums[0];
}

export interface NextCoefficient {
  readonly predicted: Ball;
  readonly actual: Ball;
  /** predicted/actual − 1; absent where the actual one is zero. */
  readonly miss?: number;
}

/** What one prescription said with `hidden` coefficients hidden. */
export interface Prediction {
  readonly hidden: number;
  readonly outcome: Sum | { readonly kind: 'refusal'; readonly reason: string; readonly remedy: string };
  readonly next?: NextCoefficient;
}

/** The growth is diagnosed anew from what is seen: nothing of the hidden terms leaks. */
export function seenOf(known: Expanded, hidden: number): { readonly seen: Expanded; readonly growth: Growth } {
  const seen = firstOf(known, known.expansion.coefficients.length - hidden);
  return { seen, growth: diagnoseGrowth(seen.growthInput) };
}

/** The predictions of one prescription. */
export function predict(
  known: Expanded,
  prescription: Prescription,
  { seen, growth }: ReturnType<typeof seenOf>,
  withNext: boolean,
): Prediction {
  const hidden = known.expansion.coefficients.length - seen.expansion.coefficients.length;
  const outcomes = prescription.apply(seen.expansion, growth, { digits: PREDICT_DIGITS, central: true });
  const sum = memberOf(outcomes);
  if (sum === undefined) {
    const no = outcomes.find((o) => o.kind === 'refusal');
    return { hidden, outcome: { kind: 'refusal', reason: no?.reason ?? 'no value', remedy: no?.remedy ?? '' } };
  }
  const next = withNext ? compareNext(known, seen, prescription.name, sum.variant, growth) : undefined;
  return { hidden, outcome: sum, ...(next === undefined ? {} : { next }) };
}

function compareNext(
  known: Expanded,
  seen: Expanded,
  name: string,
  variant: string,
  growth: Growth,
): NextCoefficient | undefined {
  const predicted = nextCoefficient(name, variant, seen.expansion, growth);
  const actual = known.expansion.coefficients[seen.expansion.coefficients.length]?.ball(512);
  if (predicted === undefined || actual === undefined) return undefined;
  if (R.containsZero(actual)) return { predicted, actual };
  const difference = R.sub(predicted, actual, 512);
  const miss = R.containsZero(difference) ? 0 : R.toNumber(R.div(difference, actual, 512));
  return { predicted, actual, miss };
}

/** The misses of the predictions that stand. */
export function missesOf(predictions: readonly Prediction[], target: Target): Miss[] {
  return predictions.flatMap(({ hidden, outcome }) => {
    if (outcome.kind === 'refusal') return [];
    const miss = missOf(hidden, outcome.value, outcome.truncation, target);
    return miss === undefined ? [] : [miss];
  });
}

/** A method's own value with all known terms, as a target. */
export function ownTarget(sum: Sum | undefined): Target[] {
  return sum === undefined ? [] : [{ kind: 'own value', value: sum.value, error: 0 }];
}
