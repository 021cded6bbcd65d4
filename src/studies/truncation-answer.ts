/** @module One model's answer as a plain result: bands in decimal, of any size, or a refusal. */
import type { Band, Estimate, Question, TruncationModel } from '../truncation/index.js';
import type { Refused } from './assessment.js';
import { indicative } from './figures.js';

/** Distances from the sum, with sign. */
export interface BandText {
  readonly low: string;
  readonly high: string;
}

/** Beyond these binary exponents a number is written by way of its logarithm. */
const DOUBLE_RANGE = 900;

/** value · 2^unit in decimal, for any unit. */
export function scaledText(value: number, unit: number, digits: number): string {
  if (value === 0) return '0';
  if (Math.abs(unit) <= DOUBLE_RANGE && Math.abs(Math.log2(Math.abs(value))) < 100)
    return indicative(value * 2 ** unit, digits);
  const log = Math.log10(Math.abs(value)) + unit * Math.log10(2);
  const exponent = Math.floor(log);
  const mantissa = (Math.sign(value) * 10 ** (log - exponent)).toPrecision(digits);
  const carried = /^-?10/.test(mantissa);
  return `${carried ? mantissa.replace('10', '1') : mantissa}e${carried ? exponent + 1 : exponent}`;
}

/** A band in decimal. */
export const bandText = (band: Band, unit: number, digits: number): BandText => ({
  low: scaledText(band.low, unit, digits),
  high: scaledText(band.high, unit, digits),
});

/** One model's answer; never throws for what a model cannot do. */
export function ask(model: TruncationModel, question: Question): Estimate | Refused {
  const answer = model.estimate(question);
  return answer.kind === 'refusal' ? { reason: answer.reason, remedy: answer.remedy } : answer;
}
