/**
 * @module Every truncation-error model on the series without its last coefficients, against what was hidden.
 *
 * A model about the next term is held against the sum with the next term: that is all it speaks of. A model about the
 * remainder is held against the exact value or the measurement, or the known sum while the terms fall; else not at all.
 * Errors of the target widen the bands in quadrature.
 */
import { R } from '../../numerics/index.js';
import type { Ball } from '../../numerics/index.js';
import { partialSums } from '../../prescriptions/index.js';
import type { Question, TruncationModel } from '../../truncation/index.js';
import { restricted } from '../../truncation/index.js';
import type { Expansion } from '../../series/index.js';
import { ask } from '../truncation-answer.js';
import { intervalScore, LEVEL_68, LEVEL_95, outsideBy } from './score.js';
import { COMPARE_BITS } from './target.js';
import type { Target } from './target.js';

export interface EstimateTrial {
  readonly hidden: number;
  readonly against: Target['kind'] | 'next sum';
  /** Distance of the target from the sum that the band belongs to, and the bands, in units of |target|. */
  readonly distance: number;
  /** The target's own error. */
  readonly targetError: number;
  readonly band68: readonly [number, number];
  readonly band95: readonly [number, number];
  readonly fell: '68' | '95' | 'outside';
}

export interface EstimateScore {
  readonly against: EstimateTrial['against'];
  readonly tested: number;
  readonly inside68: number;
  readonly inside95: number;
  /** Mean of (centre of the 68 % band − distance). */
  readonly bias: number;
  /** Mean half-width of the 68 % band. */
  readonly sharpness: number;
  readonly score68: number;
  readonly score95: number;
}

export interface Refusing {
  readonly hidden: number;
  readonly reason: string;
}

/** Trials of one model, one for each number of hidden terms, against each target that it speaks of. */
export function estimateTrials(
  model: TruncationModel,
  question: Question,
  e: Expansion,
  hidden: readonly number[],
  common: readonly Target[],
): { trials: EstimateTrial[]; refusals: Refusing[] } {
  const trials: EstimateTrial[] = [];
  const refusals: Refusing[] = [];
  const sums = partialSums(e, COMPARE_BITS);
  const orders = question.known.orders;
  /** The partial sum with the first `count` known terms. */
  const sumOf = (count: number): Ball | undefined => {
    const order = orders[count - 1];
    return order === undefined ? sums[0] : sums[order - e.power + 1];
  };
  for (const h of hidden) {
    const count = orders.length - h;
    const part = count < 1 ? undefined : restricted(question, count);
    if (part === undefined) continue;
    const answer = ask(model, part);
    if ('reason' in answer) {
      refusals.push({ hidden: h, reason: answer.reason });
      continue;
    }
    const from = sumOf(answer.terms);
    const next = sumOf(count + 1);
    const targets: { kind: EstimateTrial['against']; value: Ball; error: number }[] =
      model.about === 'next term'
        ? next === undefined
          ? []
          : [{ kind: 'next sum', value: next, error: 0 }]
        : [...common];
    // What the exact answer says of a band is of interest for every model, whatever it speaks of.
    if (model.about === 'next term') targets.push(...common.filter((t) => t.kind === 'exact'));
    for (const target of targets) {
      if (from === undefined || R.containsZero(target.value)) continue;
      const size = R.abs(target.value);
      const relative = (b: Ball): number => R.toNumber(R.div(b, size, COMPARE_BITS));
      const end = (x: number): number => relative(R.mul2exp(R.fromNumber(x), part.known.unit));
      const distance = relative(R.sub(target.value, from, COMPARE_BITS));
      const targetError = relative(R.fromNumber(target.error));
      const band = (level: 68 | 95): [number, number] => [end(answer.bands[level].low), end(answer.bands[level].high)];
      const [band68, band95] = [band(68), band(95)];
      if (![distance, ...band68, ...band95].every(Number.isFinite)) continue;
      const inside = ([low, high]: readonly [number, number]): boolean =>
        outsideBy(low, high, distance, targetError) === 0;
      const fell = inside(band68) ? '68' : inside(band95) ? '95' : 'outside';
      trials.push({ hidden: h, against: target.kind, distance, targetError, band68, band95, fell });
    }
  }
  return { trials, refusals };
}

const mean = (list: readonly number[]): number => list.reduce((a, b) => a + b, 0) / list.length;

/** One score for each target. */
export function estimateScores(trials: readonly EstimateTrial[]): EstimateScore[] {
  return [...new Set(trials.map((t) => t.against))].map((against) => {
    const own = trials.filter((t) => t.against === against);
    return {
      against,
      tested: own.length,
      inside68: own.filter((t) => t.fell === '68').length,
      inside95: own.filter((t) => t.fell !== 'outside').length,
      bias: mean(own.map((t) => (t.band68[0] + t.band68[1]) / 2 - t.distance)),
      sharpness: mean(own.map((t) => (t.band68[1] - t.band68[0]) / 2)),
      score68: mean(own.map((t) => intervalScore(t.band68[0], t.band68[1], t.distance, t.targetError, LEVEL_68))),
      score95: mean(own.map((t) => intervalScore(t.band95[0], t.band95[1], t.distance, t.targetError, LEVEL_95))),
    };
  });
}
