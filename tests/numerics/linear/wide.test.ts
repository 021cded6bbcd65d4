/** Linear systems known to some percent: the solution at every corner of the matrix lies in the enclosure. */
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { Rational } from '../../../src/numerics/index.js';
import type { Ball } from '../../../src/numerics/index.js';
import { rationalField } from '../../../src/numerics/field.js';
import { solveBall, solveField } from '../../../src/numerics/linear/index.js';
import { cases, mustContain } from '../ball/generate.js';

const entries = fc.array(fc.integer({ min: -9, max: 9 }), { minLength: 12, maxLength: 12 });
const signs = fc.array(fc.constantFrom(-1, 0, 1), { minLength: 12, maxLength: 12 });

test('three equations, entries in units of 64 with radii from 1/4 unit to 8', () => {
  let solved = 0;
  fc.assert(
    fc.property(entries, signs, fc.constantFrom(0.25, 1, 3, 8), fc.constantFrom(12, 30, 53), (v, s, rad, prec) => {
      const mids = v.map((x, i) => 64 * x + (i < 9 && i % 4 === 0 ? 700 : 0));
      const ball = (i: number): Ball => ({ mid: BigInt(mids[i]!), exp: 0, rad });
      const point = (i: number): Rational => Rational.of(mids[i]!).add(Rational.fromNumber(s[i]! * rad));
      const rows = <T>(at: (i: number) => T): T[][] => [0, 1, 2].map((r) => [0, 1, 2].map((c) => at(3 * r + c)));
      const right = <T>(at: (i: number) => T): T[] => [9, 10, 11].map(at);
      const enclosed = solveBall(rows(ball), right(ball), prec);
      if (enclosed === undefined) return;
      const exact = solveField(rationalField, rows(point), right(point));
      expect(exact).toBeDefined();
      solved++;
      exact!.forEach((x, i) => mustContain(enclosed[i]!, x, { v, s, rad, prec, i }));
    }),
    cases(400),
  );
  expect(solved).toBeGreaterThan(100);
});
