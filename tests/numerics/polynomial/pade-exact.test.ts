import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { rationalField } from '../../../src/numerics/field.js';
import { determinantExact } from '../../../src/numerics/linear/bareiss.js';
import { Rational } from '../../../src/numerics/rational.js';
import { euclidRow } from '../../../src/numerics/polynomial/pade-euclid.js';
import { toeplitzMinors } from '../../../src/numerics/polynomial/pade-minors.js';
import { jacobiFromMoments, reversedOrthogonal } from '../../../src/numerics/polynomial/pade-moments.js';
import {
  gcdPoly,
  mulPoly,
  padeExact,
  padeField,
  padeTable,
  subPoly,
  type PadeEntry,
} from '../../../src/numerics/polynomial/index.js';
import { toIntegers } from '../../../src/numerics/polynomial/rational-poly.js';
import { MULTIPLIER, borelSeries, poly, polynomials, q, rationals, seriesOf } from './random.js';

const text = (entry: PadeEntry): string =>
  entry.exists ? `${entry.numerator.join(' ')} / ${entry.denominator.join(' ')}` : 'none';

/** Toeplitz determinant C(L/M) = det b_{L−M+i+j−1}. */
function toeplitz(b: readonly Rational[], L: number, M: number): Rational {
  const at = (k: number): Rational => (k < 0 ? Rational.ZERO : b[k]!);
  return determinantExact(
    Array.from({ length: M }, (_r, i) => Array.from({ length: M }, (_c, j) => at(L - M + 1 + i + j))),
  );
}

describe('definition', () => {
  test('an entry agrees with its series, is reduced and normalised; a missing one has a zero determinant', () => {
    const cases = fc
      .tuple(fc.integer({ min: 0, max: 5 }), fc.integer({ min: 0, max: 5 }))
      .chain(([L, M]) =>
        fc.tuple(fc.constant(L), fc.constant(M), fc.array(rationals, { minLength: L + M + 1, maxLength: L + M + 4 })),
      );
    fc.assert(
      fc.property(cases, ([L, M, b]) => {
        const entry = padeExact(b, L, M);
        if (!entry.exists) {
          expect(toeplitz(b, L, M).isZero()).toBe(true);
          return;
        }
        const { numerator: p, denominator: d } = entry;
        expect(p.length).toBeLessThanOrEqual(L + 1);
        expect(d.length).toBeLessThanOrEqual(M + 1);
        expect(d[0]!.equals(Rational.ONE)).toBe(true);
        expect(gcdPoly(p, d).length).toBe(1);
        const series = seriesOf(p, d, b.length);
        const agree = series.findIndex((c, k) => !c.equals(b[k]!));
        expect(entry.contactOrder).toBe(agree < 0 ? b.length : agree);
        expect(entry.contactOrder).toBeGreaterThanOrEqual(L + M + 1);
        if (p.length > 0) expect(entry.deficiency).toBe(Math.min(L + 1 - p.length, M + 1 - d.length));
        if (!toeplitz(b, L, M).isZero()) expect(entry.deficiency).toBe(0);
      }),
      { numRuns: 200 * MULTIPLIER },
    );
  });

  test('a rational function is found wherever it fits', () => {
    fc.assert(
      fc.property(polynomials(3), polynomials(3), fc.integer({ min: 0, max: 3 }), (p, d, extra) => {
        fc.pre(d.length > 0 && !d[0]!.isZero());
        const [L, M] = [3 + extra, 3];
        const entry = padeExact(seriesOf(p, d, L + M + 3), L, M);
        if (!entry.exists) throw new Error(entry.reason);
        expect(subPoly(mulPoly(entry.numerator, d), mulPoly(entry.denominator, p))).toHaveLength(0);
        expect(entry.contactOrder).toBe(L + M + 3);
      }),
      { numRuns: 200 * MULTIPLIER },
    );
  });

  test('refuses orders without coefficients', () => {
    expect(() => padeExact(poly(1, 2, 3), 2, 1)).toThrow(RangeError);
    expect(() => padeExact(poly(1, 2, 3), -1, 1)).toThrow(RangeError);
    expect(() => padeExact(poly(1, 2, 3), 0.5, 1)).toThrow(RangeError);
  });
});

describe('blocks', () => {
  // Padé's block theorem: equal entries fill squares; below the antidiagonal of a square the entries do not exist.
  test('1 + x²: a corner of the table', () => {
    const b = poly(1, 0, 1, 0, 0, 0, 0, 0);
    const table = (L: number, M: number): string => text(padeExact(b, L, M));
    // Exact values, derived by hand from the definition and confirmed with Bareiss determinants.
    expect([table(0, 0), table(0, 1), table(1, 0), table(1, 1)]).toEqual(['1 / 1', '1 / 1', '1 / 1', 'none']);
    expect([table(0, 2), table(0, 3), table(1, 2), table(1, 3)]).toEqual([
      '1 / 1 0 -1',
      '1 / 1 0 -1',
      '1 / 1 0 -1',
      'none',
    ]);
    for (const [L, M] of [
      [2, 0],
      [2, 1],
      [2, 2],
      [2, 3],
      [3, 0],
      [3, 1],
      [3, 2],
      [3, 3],
    ] as const) {
      expect(table(L, M)).toBe('1 0 1 / 1');
    }
    const missing = padeExact(b, 1, 1);
    expect(missing.exists ? '' : missing.reason).toBe(
      '[1/1] lies in a singular block: its reduced fraction [0/0] agrees with the series for 2 coefficients only, 3 are needed',
    );
  });

  test('geometric series: one infinite block', () => {
    const b = poly(...Array.from({ length: 12 }, (_, k) => 3n ** BigInt(k)));
    for (let L = 0; L < 5; L++) for (let M = 1; M < 5; M++) expect(text(padeExact(b, L, M))).toBe('1 / 1 -3');
    const entry = padeExact(b, 4, 3);
    expect(entry.exists && [entry.deficiency, entry.contactOrder]).toEqual([2, 12]);
  });

  test('(1 + x)^7 is its own approximant from L = 7 on, and normal before', () => {
    const b = poly(1, 7, 21, 35, 35, 21, 7, 1, 0, 0, 0, 0, 0, 0, 0);
    for (let M = 0; M < 5; M++) {
      const entry = padeExact(b, 7, M);
      expect(text(entry)).toBe('1 7 21 35 35 21 7 1 / 1');
      expect(entry.exists && entry.deficiency).toBe(0);
    }
    for (let L = 0; L < 7; L++) for (let M = 0; M < 7; M++) expect(toeplitz(b, L, M).isZero()).toBe(false);
  });

  test('zero, leading zeros, constants', () => {
    expect(padeExact(poly(0, 0, 0, 0), 1, 2)).toEqual({
      exists: true,
      numerator: [],
      denominator: poly(1),
      deficiency: 2,
      contactOrder: 4,
    });
    expect(text(padeExact(poly(5, 0, 0, 0), 1, 2))).toBe('5 / 1');
    // x² + x³ + …: zero to the order needed for [0/1], missing for [0/2], itself for [2/1].
    const b = poly(0, 0, 1, 1, 1);
    expect(text(padeExact(b, 0, 1))).toBe(' / 1');
    expect(text(padeExact(b, 0, 2))).toBe('none');
    expect(text(padeExact(b, 1, 1))).toBe('none');
    expect(text(padeExact(b, 2, 1))).toBe('0 0 1 / 1 -1');
  });

  test('an even function: every block has side two', () => {
    // exp(x²)
    const b = Array.from({ length: 30 }, (_, k) => (k % 2 === 1 ? q(0) : q(1, factorial(k / 2))));
    for (const [L, M] of [
      [2, 2],
      [4, 2],
      [12, 12],
      [14, 14],
    ] as const) {
      const whole = padeExact(b, L, M);
      const half = padeExact(
        b.filter((_, k) => k % 2 === 0),
        L / 2,
        M / 2,
      );
      const spread = (c: readonly Rational[]): Rational[] => c.flatMap((x, i) => (i === 0 ? [x] : [q(0), x]));
      expect(half.exists && text(whole)).toBe(
        half.exists && `${spread(half.numerator).join(' ')} / ${spread(half.denominator).join(' ')}`,
      );
      if (L + M + 2 < b.length) expect(text(padeExact(b, L + 1, M + 1))).toBe('none');
    }
  });
});

function factorial(n: number): bigint {
  return n < 2 ? 1n : BigInt(n) * factorial(n - 1);
}

describe('known approximants', () => {
  test('[2/2] of exp is (12 + 6x + x²)/(12 − 6x + x²)', () => {
    // H. Padé, Ann. Sci. Éc. Norm. Supér. 9 (1892) S3: the approximants of exp; textbook value.
    const b = [1n, 1n, 2n, 6n, 24n].map((n) => q(1, n));
    expect(text(padeExact(b, 2, 2))).toBe('1 1/2 1/12 / 1 -1/2 1/12');
  });

  test('[L/M] of exp in closed form up to [20/20]', () => {
    // Padé: q_j = (L+M−j)! M! (−1)^j / ((L+M)! j! (M−j)!)
    const b = Array.from({ length: 41 }, (_, n) => q(1, factorial(n)));
    for (const [L, M] of [
      [3, 5],
      [7, 4],
      [12, 11],
      [20, 20],
    ] as const) {
      const entry = padeExact(b, L, M);
      const want = Array.from({ length: M + 1 }, (_, j) =>
        q(
          factorial(L + M - j) * factorial(M) * (j % 2 === 0 ? 1n : -1n),
          factorial(L + M) * factorial(j) * factorial(M - j),
        ),
      );
      expect(entry.exists && entry.denominator.join(' ')).toBe(want.join(' '));
    }
  });

  test('[1/2] of ln(1 + x)/x predicts 7/36 for 1/5', () => {
    // Check value in exact rationals, re-derived.
    const b = [q(1), q(-1, 2), q(1, 3), q(-1, 4)];
    const entry = padeExact(b, 1, 2);
    expect(text(entry)).toBe('1 1/2 / 1 1 1/6');
    if (entry.exists) expect(seriesOf(entry.numerator, entry.denominator, 5)[4]!.toString()).toBe('7/36');
  });

  test('the [N/N] of Σ (−1)^n n! x^n have the Laguerre denominators', () => {
    // Stieltjes: q_j of [N−1/N] is C(N, j) N!/(N−j)! (denominator x^N N! L_N(−1/x), first coefficient 1).
    const N = 15;
    const b = Array.from({ length: 2 * N }, (_, n) => q(n % 2 === 0 ? factorial(n) : -factorial(n)));
    const entry = padeExact(b, N - 1, N);
    const want = Array.from({ length: N + 1 }, (_, j) => {
      const binomial = factorial(N) / (factorial(j) * factorial(N - j));
      return (binomial * factorial(N)) / factorial(N - j);
    });
    expect(entry.exists && entry.denominator.join(' ')).toBe(want.join(' '));
  });
});

describe('the ways to one entry agree', () => {
  test('minors by many primes, Euclid in integers, Chebyshev and elimination in rationals', () => {
    const b = borelSeries(27);
    const { integers } = toIntegers(b);
    for (const [L, M] of [
      [13, 13],
      [12, 13],
      [17, 9],
      [5, 14],
    ] as const) {
      const minors = toeplitzMinors(integers, L, M)!;
      const { t } = euclidRow(integers, L + M + 1, L);
      const normal = (c: readonly bigint[]): string => c.map((x) => Rational.of(x, c[0]!).toString()).join(' ');
      expect(normal(minors)).toBe(normal(t));
      if (L + M < 22) {
        const solved = padeField(rationalField, b, L, M);
        expect(solved.exists && solved.denominator.join(' ')).toBe(normal(t));
      }
      if (L >= M - 1) {
        const jacobi = jacobiFromMoments(rationalField, b.slice(L - M + 1, L + M + 1));
        expect(reversedOrthogonal(rationalField, jacobi!).join(' ')).toBe(normal(t));
      }
    }
  });

  test('the minors are determinants: D_0 is C(L/M) up to sign', () => {
    const b = [q(3), q(-1), q(4), q(1), q(-5), q(9), q(2), q(-6), q(5)];
    const minors = toeplitzMinors(toIntegers(b).integers, 4, 4)!;
    const c = toeplitz(b, 4, 4);
    expect([c.num, -c.num]).toContain(minors[0]);
  });

  test('a path through a block is left to Euclid', () => {
    const even = poly(...Array.from({ length: 25 }, (_, k) => (k % 2 === 0 ? k + 1 : 0)));
    expect(toeplitzMinors(toIntegers(even).integers, 12, 12)).toBeUndefined();
  });
});

describe('table', () => {
  test('holds the near-diagonal entries, each as computed alone', () => {
    const b = [q(1), q(0), q(1), q(2), q(0), q(-3), q(1, 7)];
    const table = padeTable(b, { band: 2, minOrder: 1 });
    expect(table.map(({ L, M }) => `${L}/${M}`)).toEqual([
      '1/0',
      '0/1',
      '2/0',
      '1/1',
      '0/2',
      '2/1',
      '1/2',
      '3/1',
      '2/2',
      '1/3',
      '3/2',
      '2/3',
      '4/2',
      '3/3',
      '2/4',
    ]);
    for (const { L, M, entry } of table) expect(entry).toEqual(padeExact(b, L, M));
  });

  test('respects its limits', () => {
    const b = borelSeries(24);
    const table = padeTable(b, { band: 1, minOrder: 20, maxL: 11, maxM: 11 });
    expect(table.map(({ L, M }) => `${L}/${M}`)).toEqual(['10/10', '11/10', '10/11', '11/11']);
    for (const { L, M, entry } of table) expect(entry).toEqual(padeExact(b, L, M));
  });
});
