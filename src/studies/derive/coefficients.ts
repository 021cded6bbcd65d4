/** @module Tracked numbers as the coefficients of a series file: value in closed form, error, correlations. */
import { R, Rational, toDecimal, toNumberExact } from '../../numerics/index.js';
import type { Exact } from '../../numerics/index.js';
import { LIMITS, decimalText, written } from '../../series/index.js';
import type { Coefficient } from '../../series/index.js';
import { formalText, rationalText } from './formal-text.js';
import type { Source, Sources } from './sources.js';
import type { Tracked } from './tracked.js';

/** Closed forms longer than this are written as decimals (habit). */
const LONGEST_FORM = 900;
/** Digits of a propagated error. */
const ERROR_DIGITS = 12;
/** Digits of a correlation, and how near to 0 or ±1 it must be to be meant so: doubles carry no more. */
const CORRELATION_DIGITS = 14;
const NEARLY = 1e-10;

/** Digits of a decimal: of a value without error, and how far beyond the first digit of the error otherwise. */
const DIGITS = { exact: 60, beyondError: 12, least: 15 } as const;

/** Plain notation for sizes that people write so. */
function plainDecimal(value: Exact, sigma: number): string {
  const size = Math.abs(toNumberExact(value));
  const wanted = sigma > 0 && size > 0 ? Math.ceil(Math.log10(size / sigma)) + DIGITS.beyondError : DIGITS.exact;
  const digits = Math.min(DIGITS.exact, Math.max(DIGITS.least, wanted));
  const ball = value.ball(Math.ceil(digits * 3.33) + 32);
  // What cannot be told from zero at this precision is written as zero: a bound is no coefficient.
  return R.containsZero(ball) ? '0' : toDecimal(ball, digits).text;
}

/** The value with the text that a file will hold. */
export function writtenValue(x: Tracked, sigma: number): Exact & { readonly text: string } {
  if (x.value.rational !== undefined) return written(x.value, rationalText(x.value.rational));
  if (x.formal !== undefined) {
    const text = formalText(x.formal);
    if (text.length <= LONGEST_FORM) return written(x.value, text);
  }
  return written(x.value, plainDecimal(x.value, sigma));
}

const rounded = (x: number, digits: number): Rational => Rational.parse(x.toPrecision(digits)) ?? Rational.ZERO;

type Spread = NonNullable<Coefficient['error']>;

/** An error of many digits (a square root, say) is rounded as every computed error is. */
function short(source: Source): Pick<Source, 'error'> {
  const { error } = source;
  if (error === undefined) return {};
  const brief = (q: Rational): Rational =>
    q.num.toString().length > ERROR_DIGITS + 3 ? rounded(q.toNumber(), ERROR_DIGITS) : q;
  return { error: { plus: brief(error.plus), minus: brief(error.minus) } };
}

function spread(x: Tracked, variance: number, sources: Sources): Spread | undefined {
  const only = sources.only(x.slopes);
  if (only === undefined) {
    const sigma = Math.sqrt(variance);
    const size = rounded(sigma, ERROR_DIGITS);
    return sigma > 0 && size.sign() > 0 ? { plus: size, minus: size } : undefined;
  }
  const { source, slope } = only;
  const { error } = short(source);
  if (slope === 1 && error !== undefined) return error;
  if (slope === -1 && error !== undefined) return { plus: error.minus, minus: error.plus };
  const [up, down] = [Math.abs(slope) * source.plus, Math.abs(slope) * source.minus].map((e) =>
    rounded(e, ERROR_DIGITS),
  );
  if (up === undefined || down === undefined) return undefined;
  return slope > 0 ? { plus: up, minus: down } : { plus: down, minus: up };
}

/** "3561.9 +- 1.64" where value and error are short decimals; the value alone otherwise. */
function texts(value: { readonly text: string; readonly rational?: Rational }, error: Spread | undefined): string {
  if (error === undefined) return value.text;
  const sizes = [error.plus, error.minus].map(decimalText);
  const [plus, minus] = sizes;
  if (plus === undefined || minus === undefined) return value.text;
  if (error.plus.equals(error.minus)) return `${value.text} +- ${plus}`;
  return /^[-+]?[\d.]+$/.test(value.text) ? `${value.text} +${plus} -${minus}` : value.text;
}

export interface WrittenList {
  readonly coefficients: readonly Coefficient[];
  /** Absent when the errors are independent, or when there are too many coefficients to list it. */
  readonly correlation?: readonly (readonly Rational[])[];
}

/** Coefficients of a file with their errors and correlations. */
export function writtenList(list: readonly Tracked[], sources: Sources): WrittenList {
  const covariance = sources.covariances(list.map((x) => x.slopes));
  const coefficients = list.map((x, i): Coefficient => {
    const variance = covariance[i]?.[i] ?? 0;
    const value = writtenValue(x, Math.sqrt(variance));
    const error = spread(x, variance, sources);
    return {
      value,
      ...(error === undefined ? {} : { error }),
      text: texts(value, error),
      status: sources.estimated(x.slopes) ? 'estimated' : 'computed',
    };
  });
  const correlation = list.length > LIMITS.correlation ? undefined : correlations(covariance);
  return { coefficients, ...(correlation === undefined ? {} : { correlation }) };
}

/** The correlation matrix; undefined when all errors are independent. */
function correlations(covariance: readonly (readonly number[])[]): Rational[][] | undefined {
  const sigmas = covariance.map((row, i) => Math.sqrt(row[i] ?? 0));
  let independent = true;
  const entry = (i: number, j: number): Rational => {
    if (i === j) return Rational.ONE;
    const size = (sigmas[i] ?? 0) * (sigmas[j] ?? 0);
    const rho = size > 0 ? (covariance[i]?.[j] ?? 0) / size : 0;
    if (Math.abs(rho) < NEARLY) return Rational.ZERO;
    independent = false;
    return Math.abs(rho) > 1 - NEARLY ? Rational.of(rho > 0 ? 1 : -1) : rounded(rho, CORRELATION_DIGITS);
  };
  const matrix = sigmas.map((_, i) => sigmas.map((__, j) => entry(Math.min(i, j), Math.max(i, j))));
  return independent ? undefined : matrix;
}
