/** The bench of series with exact answers (tests/data/bench), as Series objects. */
import { readFileSync } from 'node:fs';
import { exact, Rational } from '../../src/numerics/index.js';
import type { Series } from '../../src/series/index.js';

export interface BenchReference {
  readonly x: string;
  readonly pv: string;
  readonly im_plus?: string;
}

export interface BenchFile {
  readonly id: string;
  readonly references: readonly BenchReference[];
  readonly optimal_truncation: readonly { readonly x: string; readonly n_smallest_term: number | readonly number[] }[];
  readonly expected_from_tool: { readonly verdict: 'resum' | 'flag' | 'refuse' };
  readonly coefficients: { readonly first_power: number; readonly values: readonly string[] };
  readonly coefficient_errors?: readonly string[];
}

export function benchFile(id: string): BenchFile {
  return JSON.parse(readFileSync(new URL(`../data/bench/${id}.json`, import.meta.url), 'utf8')) as BenchFile;
}

const DECIMAL = /^-?\d*\.\d+/;
const digitsOf = (text: string): number => text.replace(/e.*/i, '').replace(/[-.]/g, '').replace(/^0+/, '').length;

/** The file as a series in a plain variable, with its first `count` coefficients. */
export function benchSeries(file: BenchFile, count?: number): Series {
  const q = (s: string): Rational => Rational.parse(s)!;
  return {
    id: file.id,
    title: file.id,
    sources: [],
    notes: [],
    invented: false,
    coupling: { name: 'x', divisor: '1', plain: true },
    firstPower: file.coefficients.first_power,
    factor: exact(1),
    additive: exact(0),
    coefficients: file.coefficients.values.slice(0, count).map((text, n) => {
      const error = file.coefficient_errors?.[n];
      return {
        value: exact(q(text)),
        text,
        status: 'computed' as const,
        ...(error === undefined ? {} : { error: { plus: q(error).abs(), minus: q(error).abs() } }),
        ...(DECIMAL.test(text) ? { significantDigits: digitsOf(text) } : {}),
      };
    }),
    singularities: [],
    condensates: [],
  };
}
