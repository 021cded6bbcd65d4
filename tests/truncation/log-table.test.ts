/** The table of logarithms against the composition of series that `rewrite` uses. */
import { describe, expect, it } from 'vitest';
import { exact, R } from '../../src/numerics/index.js';
import { betaCoefficients, changeScale } from '../../src/qcd/index.js';
import { logTable } from '../../src/truncation/scale/log-table.js';
import { rational } from '../support/check-value.js';

describe('coefficients at another scale from the table of logarithms', () => {
  const beta = betaCoefficients(3, 'pi');
  for (const [firstPower, count] of [
    [1, 5],
    [2, 4],
    [1, 14],
  ] as const) {
    it(`${count} coefficients from x^${firstPower} on`, () => {
      const c = Array.from({ length: count }, (_, n) => exact(rational(`${(n + 2) ** n}/${2 * n + 3}`)));
      const table = logTable(c, firstPower, beta, 160);
      for (const log of ['0', '3/2', '-5/4']) {
        const moved = changeScale({ coefficients: c, firstPower }, beta, exact(rational(log)));
        const found = table(rational(log).toNumber());
        expect(found).toHaveLength(count);
        moved.forEach((m, n) => {
          expect(R.overlaps(found[n]!, m.ball(240))).toBe(true);
          expect(R.accuracyBits(found[n]!)).toBeGreaterThan(120);
        });
      }
    });
  }
});
