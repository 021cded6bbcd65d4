/** @module Many back-tests together: empirical coverage by method. */
import { indicative } from '../figures.js';
import type { BacktestResult, PooledMethod } from './result.js';

/** A method's tests on one series. */
interface Tests {
  readonly tested: number;
  readonly inside68: number;
  readonly inside95?: number;
  readonly bias: number;
  readonly sharpness?: number;
  readonly score: number;
}

const DIGITS = 3;

const total = (list: readonly number[]): number => list.reduce((a, b) => a + b, 0);

function median(list: readonly number[]): number {
  const sorted = list.toSorted((a, b) => a - b);
  const half = Math.floor(sorted.length / 2);
  const upper = sorted[half] ?? Number.NaN;
  return sorted.length % 2 === 1 ? upper : ((sorted[half - 1] ?? upper) + upper) / 2;
}

function pooled(head: Pick<PooledMethod, 'method' | 'kind' | 'about'>, tests: readonly Tests[]): PooledMethod[] {
  const tested = total(tests.map((t) => t.tested));
  if (tested === 0) return [];
  const inside68 = total(tests.map((t) => t.inside68));
  const share = inside68 / tested;
  const with95 = tests.every((t) => t.inside95 !== undefined);
  const inside95 = total(tests.map((t) => t.inside95 ?? 0));
  const sharpness = tests.flatMap((t) => (t.sharpness === undefined ? [] : [t.sharpness]));
  return [
    {
      ...head,
      series: tests.length,
      tested,
      inside68,
      ...(with95 ? { inside95, coverage95: indicative(inside95 / tested, DIGITS) } : {}),
      coverage68: indicative(share, DIGITS),
      // Agresti–Coull: also sensible for 0 or all inside.
      coverageError: indicative(
        Math.sqrt((((inside68 + 2) / (tested + 4)) * (1 - (inside68 + 2) / (tested + 4))) / (tested + 4)),
        2,
      ),
      bias: indicative(median(tests.map((t) => t.bias)), DIGITS),
      ...(sharpness.length === 0 ? {} : { sharpness: indicative(median(sharpness), DIGITS) }),
      score: indicative(median(tests.map((t) => t.score)), DIGITS),
    },
  ];
}

/** Coverage of each method over the results, against the first target of each series. */
export function pool(results: readonly BacktestResult[]): PooledMethod[] {
  const names = [...new Set(results.flatMap((r) => r.prescriptions.map((p) => p.prescription)))];
  const models = [...new Set(results.flatMap((r) => r.estimates.map((e) => e.model)))];
  return [
    ...names.flatMap((method) =>
      pooled(
        { method, kind: 'prescription' },
        results.flatMap((r) => {
          const record = r.prescriptions.find((p) => p.prescription === method)?.records[0];
          if (record === undefined) return [];
          const { tested, inside, bias, sharpness, score } = record;
          return [
            {
              tested,
              inside68: inside,
              bias: Number(bias),
              ...(sharpness === undefined ? {} : { sharpness: Number(sharpness) }),
              score: Number(score),
            },
          ];
        }),
      ),
    ),
    ...models.flatMap((model) => {
      const about = results.flatMap((r) => r.estimates).find((e) => e.model === model)?.about;
      return pooled(
        { method: model, kind: 'truncation error', ...(about === undefined ? {} : { about }) },
        results.flatMap((r) => {
          const record = r.estimates.find((e) => e.model === model)?.records[0];
          if (record === undefined) return [];
          const { tested, inside68, inside95 } = record;
          return [
            {
              tested,
              inside68,
              inside95,
              bias: Number(record.bias),
              sharpness: Number(record.sharpness),
              score: Number(record.score68),
            },
          ];
        }),
      );
    }),
  ];
}
