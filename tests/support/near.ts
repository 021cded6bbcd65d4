/** Comparison of balls with decimal reference strings to a stated number of significant digits. */
import { expect } from 'vitest';
import { R, Rational } from '../../src/numerics/index.js';
import type { Ball } from '../../src/numerics/index.js';

/** Exact decimal text of a ball's midpoint is long: a rational serves for comparing. */
function text(b: Ball): string {
  return R.midpoint(b).toString();
}

/** Relative difference below 10^(1−digits), computed in rationals. */
function expectNear(actual: string, wanted: string, digits: number): void {
  const a = Rational.parse(actual)!;
  const w = Rational.parse(wanted)!;
  const difference = a.sub(w).div(w).abs();
  expect(difference.toNumber(), `${a.toNumber()} against ${wanted}`).toBeLessThan(10 ** (1 - digits));
}

export const near = { text, expect: expectNear };
