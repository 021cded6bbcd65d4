/** @module Problems and series for tests of extractions. */
import { expect } from 'vitest';
import type { ExtractResult, ExtractRow, FitResult, Problem, Quantity } from '../../src/extraction/index.js';
import { DEFAULT_THRESHOLDS } from '../../src/qcd/index.js';
import type { Refusal } from '../../src/qcd/index.js';
import { parseSeries } from '../../src/series/index.js';
import type { Series } from '../../src/series/index.js';

/** A measured or given number with a symmetric error. */
export const quantity = (value: string, error = 0, dimension?: number): Quantity => ({
  text: `${value} +- ${error}`,
  value,
  plus: error,
  minus: error,
  ...(dimension === undefined ? {} : { dimension }),
});

export const usual = {
  truncationBy: 'own',
  ambiguityBy: 'im/pi',
  condensates: [],
  loops: 5,
  thresholds: DEFAULT_THRESHOLDS,
  digits: 15,
} as const;

export const atMZ = { scale: 91.1879, flavours: 5 } as const;

export const yaml = (text: string): Promise<Series> => parseSeries(text, { name: 'toy.yaml' });

/** A problem of one measurement of a coupling or variable. */
export const coupling = (measured: Quantity, more: Partial<Problem> = {}): Problem => ({
  ...usual,
  for: 'alpha_s',
  data: [{ series: 'toy', measured }],
  ...more,
});

export function standing<T extends ExtractResult | FitResult>(result: T | Refusal): T {
  if ('reason' in result) throw new Error(`refused: ${result.reason}`);
  return result;
}

export function rowOf(result: ExtractResult | Refusal, name: string): ExtractRow {
  const row = standing(result).rows.find((r) => r.prescription === name);
  if (row === undefined) throw new Error(`no row ${name}`);
  return row;
}

export function componentIn(
  entry: { readonly components?: NonNullable<ExtractRow['components']> },
  name: string,
): NonNullable<ExtractRow['components']>[number] {
  const found = entry.components?.find((c) => c.name === name);
  if (found === undefined) throw new Error(`no component ${name}`);
  return found;
}

/** Both within so many relative units. */
export function near(found: string | number | undefined, wanted: number, relative: number): void {
  expect(Math.abs(Number(found) / wanted - 1), `${found} against ${wanted}`).toBeLessThan(relative);
}

/** Expects a refusal whose reason and remedy hold these words. */
export function refusedWith(result: object, ...words: readonly string[]): void {
  const text =
    'reason' in result && 'remedy' in result ? `${String(result.reason)}; ${String(result.remedy)}` : 'no refusal';
  for (const word of words) expect(text).toContain(word);
}
