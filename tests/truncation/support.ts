/** Questions to the truncation-error models from plain numbers, and their answers in absolute units. */
import { expect } from 'vitest';
import { divExact, exact, type Exact } from '../../src/numerics/index.js';
import { divisorSize } from '../../src/qcd/index.js';
import type { Divisor, Expansion } from '../../src/series/index.js';
import {
  questionOf,
  USUAL_PRIORS,
  type Estimate,
  type Priors,
  type Question,
  type TruncationModel,
} from '../../src/truncation/index.js';
import { rational } from '../support/check-value.js';

export interface Given {
  /** Value of the coupling. */
  readonly at: string;
  readonly divisor?: Divisor;
  readonly plain?: boolean;
  readonly flavours?: number;
  readonly power?: number;
  readonly additive?: string;
  readonly factor?: string;
  readonly stated?: Expansion['stated'];
  readonly priors?: Partial<Priors>;
}

export const numbers = (texts: readonly string[]): Exact[] => texts.map((t) => exact(rational(t)));

/** The question for Σ c_n (coupling/divisor)^(n + power). */
export function ask(coefficients: readonly Exact[], given: Given): Question {
  const { divisor = '1', plain = false, flavours } = given;
  const question = questionOf(
    {
      x: divExact(exact(rational(given.at)), divisorSize(divisor)),
      power: given.power ?? 1,
      factor: exact(rational(given.factor ?? '1')),
      additive: exact(rational(given.additive ?? '0')),
      coefficients,
      relativeErrors: coefficients.map(() => 0),
      stated: given.stated ?? [],
    },
    {
      coupling: { name: plain ? 'x' : 'alpha_s', divisor, plain },
      ...(flavours === undefined ? {} : { flavours }),
      priors: { ...USUAL_PRIORS, ...given.priors },
    },
  );
  if (question === undefined) expect.fail('every term is zero');
  return question;
}

export interface Answer {
  readonly low68: number;
  readonly high68: number;
  readonly low95: number;
  readonly high95: number;
  readonly next: number;
  readonly estimate: Estimate;
}

/** Bands and guess in absolute units; fails the test on a refusal. */
export function answer(model: TruncationModel, question: Question): Answer {
  const estimate = model.estimate(question);
  if (estimate.kind === 'refusal') expect.fail(`${model.name} refuses: ${estimate.reason}`);
  const unit = 2 ** question.known.unit;
  const [one, two] = [estimate.bands[68], estimate.bands[95]];
  return {
    low68: one.low * unit,
    high68: one.high * unit,
    low95: two.low * unit,
    high95: two.high * unit,
    next: (estimate.next ?? Number.NaN) * unit,
    estimate,
  };
}

/** Reason and remedy; fails the test on an answer. */
export function refusal(model: TruncationModel, question: Question): { reason: string; remedy: string } {
  const outcome = model.estimate(question);
  if (outcome.kind !== 'refusal') expect.fail(`${model.name} should refuse`);
  expect(outcome.reason).not.toBe('');
  expect(outcome.remedy).not.toBe('');
  return outcome;
}

/** Relative agreement. */
export function expectClose(actual: number, wanted: number | string, tolerance: number): void {
  const w = Number(wanted);
  expect(Math.abs(actual - w), `${actual} against ${wanted}`).toBeLessThanOrEqual(tolerance * Math.abs(w));
}
