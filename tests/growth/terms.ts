/** @module Growth inputs for the tests: from decimal texts, from numbers, from the bench files. */
import { readFileSync } from 'node:fs';
import type { GrowthInput, GrowthTerm } from '../../src/growth/index.js';
import { exact, R, type Rational } from '../../src/numerics/index.js';
import { rational } from '../support/check-value.js';

/** ln|q| for any size; −Infinity for zero. */
export function logAbs(q: Rational): number {
  if (q.isZero()) return -Infinity;
  const b = R.exactMid(R.fromRational(q.abs(), 80));
  const bits = R.upperBits(b);
  return Math.log(R.toNumber(R.mul2exp(b, -bits))) + bits * Math.LN2;
}

export interface Options {
  /** Give the exact coefficients too; yes by default. */
  readonly exact?: boolean;
  readonly errors?: readonly number[];
  /** Indices of estimated coefficients. */
  readonly estimated?: readonly number[];
  readonly expected?: GrowthInput['expected'];
}

/** Input from exact coefficients; leading zeros are cut as the caller of the diagnosis does. */
export function fromRationals(all: readonly Rational[], options: Options = {}): GrowthInput {
  const first = Math.max(
    0,
    all.findIndex((q) => !q.isZero()),
  );
  const c = all.slice(first);
  const terms: GrowthTerm[] = c.map((q, n) => ({
    logAbs: logAbs(q),
    sign: q.sign(),
    relativeError: options.errors?.[n + first] ?? 0,
    estimated: options.estimated?.includes(n + first) ?? false,
  }));
  return {
    terms,
    expected: options.expected ?? [],
    ...(options.exact === false ? {} : { exact: c.map((q) => exact(q)) }),
    leadingZeros: first,
  };
}

export const fromTexts = (texts: readonly string[], options: Options = {}): GrowthInput =>
  fromRationals(texts.map(rational), options);

interface BenchFile {
  readonly coefficients: { readonly values: readonly string[] };
  readonly coefficient_errors?: readonly string[];
}

/** The bench series of that name, all or its first `count` coefficients; quoted errors are given when the file has them. */
export function benchInput(
  id: string,
  count?: number,
  options: Options & { readonly silent?: boolean } = {},
): GrowthInput {
  const file = JSON.parse(readFileSync(new URL(`../data/bench/${id}.json`, import.meta.url), 'utf8')) as BenchFile;
  const all = file.coefficients.values.map(rational);
  const quoted = options.silent === true ? undefined : file.coefficient_errors?.map(rational);
  const errors = quoted?.map((e, n) => (all[n]!.isZero() ? 0 : e.div(all[n]!).abs().toNumber()));
  return fromRationals(all.slice(0, count), { ...options, ...(errors === undefined ? {} : { errors }) });
}
