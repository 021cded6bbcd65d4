/**
 * Errors of rational approximants of series with vanishing coefficients, against exact sums. In an even series [L/M] and
 * [L+1/M−1] may be one function, and so may two successive orders: their agreement must not pass for an error.
 * Source of the exact sums: as in bench-assess.test.ts (mpmath 1.2.1 and PARI/GP 2.15.2, 52 digits agree).
 */
import { describe, expect, it } from 'vitest';
import { exact, Rational } from '../../src/numerics/index.js';
import { compare } from '../../src/studies/index.js';
import { benchFile, benchSeries } from '../support/bench.js';

const FILES = ['s21_stirling_lacunary', 's110_lacunary_even_alt', 's111_lacunary_even_nonalt'];
const NAMES = ['pade', 'borel-pade', 'borel-dlog'];
/** A rule of thumb may miss by a small factor, not by orders of magnitude. */
const FACTOR = 3;
/** Beyond the digits asked for, in relative size. */
const DIGITS = 1e-11;

const COUNTS = [6, 7, 10];

describe('stated errors of lacunary series cover what happened', () => {
  it.each(FILES.flatMap((id) => COUNTS.map((count) => [id, count] as const)))('%s, %i coefficients', (id, count) => {
    const file = benchFile(id);
    // Same-sign growth: an approximant of the series itself runs along its cut and promises nothing.
    const names = id === 's111_lacunary_even_nonalt' ? NAMES.filter((n) => n !== 'pade') : NAMES;
    let tested = 0;
    for (const r of file.references.slice(-2)) {
      const at = { value: exact(Rational.parse(r.x)!), text: r.x };
      const { rows } = compare(benchSeries(file, count), [at], { digits: 13, hide: 0, by: names, request: {} });
      for (const row of rows) {
        if (row.value === undefined || row.truncationError === undefined) continue;
        const stated = Number(row.truncationError) + Number(row.ambiguity ?? 0);
        const miss = Math.abs(Number(row.value) - Number(r.pv)) - DIGITS * Math.abs(Number(r.pv));
        expect(miss, `${row.prescription} at ${r.x}`).toBeLessThanOrEqual(FACTOR * stated);
        tested++;
      }
    }
    expect(tested).toBeGreaterThan(0);
  });
});
