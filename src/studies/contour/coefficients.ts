/**
 * @module Coefficients of a contour quantity's fixed-order expansion: exact values; errors, correlations and roundings of the
 * file's coefficients through the same linear map.
 */
import { doubleField, Rational, toDecimal, toNumberExact } from '../../numerics/index.js';
import type { Exact } from '../../numerics/index.js';
import { onCircle } from '../../qcd/index.js';
import { textOf } from '../../series/index.js';
import type { Coefficient, Series } from '../../series/index.js';
import { ROUNDED_DIGITS } from '../expand-errors.js';

export interface MomentCoefficients {
  readonly coefficients: readonly Coefficient[];
  readonly correlation?: readonly (readonly Rational[])[];
}

/** Digits of the text of an irrational coefficient. */
const TEXT_DIGITS = 20;
/** Digits kept of an error and of a correlation. */
const ERROR_DIGITS = 12;
/** σ of a number uniformly distributed within half a unit. */
const HALF_UNIT = 0.5 / Math.sqrt(3);

const rational = (x: number): Rational => Rational.parse(x.toPrecision(ERROR_DIGITS)) ?? Rational.ZERO;

const text = (value: Exact): string =>
  value.rational === undefined ? toDecimal(value.ball(TEXT_DIGITS * 4), TEXT_DIGITS).text : textOf(value);

const decadeOf = (x: number): number => Math.floor(Math.log10(Math.abs(x)) + 1e-12);

/** σ of the rounding that a plain decimal without an error implies; 0 for other numbers. */
function roundingOf(c: Coefficient): number {
  if (c.error !== undefined || c.significantDigits === undefined || c.significantDigits < ROUNDED_DIGITS) return 0;
  const size = toNumberExact(c.value);
  return size === 0 ? 0 : HALF_UNIT * 10 ** (decadeOf(size) - c.significantDigits + 1);
}

/**
 * The coefficients with the values `values`; `beta` and `moments` are those of the map, in doubles.
 */
export function momentCoefficients(
  series: Series,
  values: readonly Exact[],
  beta: readonly number[],
  moments: readonly number[],
): MomentCoefficients {
  const of = series.coefficients;
  const plus = of.map((c) => c.error?.plus.toNumber() ?? 0);
  const minus = of.map((c) => c.error?.minus.toNumber() ?? 0);
  const rounding = of.map(roundingOf);
  const noisy = of.flatMap((_, j) => (plus[j]! > 0 || minus[j]! > 0 ? [j] : []));
  // Column j of the map: what a unit of c_j puts into each coefficient.
  const columns = new Map<number, number[]>();
  const column = (j: number): number[] => {
    let found = columns.get(j);
    if (found === undefined) {
      const unit = of.map((_, i) => (i === j ? 1 : 0));
      found = onCircle(doubleField, unit, series.firstPower, beta, moments);
      columns.set(j, found);
    }
    return found;
  };
  const rho = (i: number, j: number): number => (i === j ? 1 : (series.correlation?.[i]?.[j]?.toNumber() ?? 0));
  /** Covariance of the coefficients n and m for one side of each error. */
  const covariance = (n: number, m: number, side: (j: number, slope: number) => number): number => {
    let sum = 0;
    for (const j of noisy) {
      const left = column(j)[n]!;
      if (left === 0) continue;
      for (const l of noisy) {
        const right = column(l)[m]!;
        if (right !== 0) sum += rho(j, l) * left * right * side(j, left) * side(l, right);
      }
    }
    return sum;
  };
  const mean = (j: number): number => (plus[j]! + minus[j]!) / 2;
  const estimated = of.findIndex((c) => c.status === 'estimated');
  const coefficients = values.map((value, n): Coefficient => {
    const up = Math.sqrt(covariance(n, n, (j, slope) => (slope > 0 ? plus[j]! : minus[j]!)));
    const down = Math.sqrt(covariance(n, n, (j, slope) => (slope > 0 ? minus[j]! : plus[j]!)));
    const spread = Math.hypot(...rounding.map((r, j) => (r > 0 ? r * column(j)[n]! : 0)));
    const size = toNumberExact(value);
    const digits = decadeOf(size) + 1 - Math.round(Math.log10(spread / HALF_UNIT));
    return {
      value,
      text: text(value),
      status: estimated >= 0 && n >= estimated ? 'estimated' : 'computed',
      ...(up > 0 || down > 0 ? { error: { plus: rational(up), minus: rational(down) } } : {}),
      ...(spread > 0 && digits >= ROUNDED_DIGITS ? { significantDigits: digits } : {}),
    };
  });
  if (noisy.length === 0 || values.length === 1) return { coefficients };
  const sigma = values.map((_, n) => Math.sqrt(covariance(n, n, mean)));
  const correlation = values.map((_, n) =>
    values.map((__, m) => {
      if (n === m) return Rational.ONE;
      if (sigma[n] === 0 || sigma[m] === 0) return Rational.ZERO;
      return rational(Math.max(-1, Math.min(1, covariance(n, m, mean) / (sigma[n]! * sigma[m]!))));
    }),
  );
  return { coefficients, correlation };
}
