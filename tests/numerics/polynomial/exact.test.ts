import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { Rational } from '../../../src/numerics/rational.js';
import {
  addPoly,
  derivativePoly,
  divideExactPoly,
  divmodPoly,
  equalPoly,
  evaluatePoly,
  gcdPoly,
  mulPoly,
  subPoly,
  trimPoly,
  type RationalPoly,
} from '../../../src/numerics/polynomial/rational-poly.js';
import { gcdInt, provablySquarefree } from '../../../src/numerics/polynomial/gcd.js';
import { mulInt, primitiveInt } from '../../../src/numerics/polynomial/integer.js';
import { invertWord, modWord, wordPrime } from '../../../src/numerics/polynomial/modular.js';
import { squarefree } from '../../../src/numerics/polynomial/squarefree.js';
import { overCommonDenominator } from '../../../src/numerics/polynomial/lowest-terms.js';
import { MULTIPLIER, poly, polynomials, q, rationals } from './random.js';

const numRuns = 200 * MULTIPLIER;

describe('arithmetic', () => {
  test('evaluation is a ring homomorphism and the derivative obeys the product rule', () => {
    fc.assert(
      fc.property(polynomials(6), polynomials(6), rationals, (a, b, x) => {
        const [fa, fb] = [evaluatePoly(a, x), evaluatePoly(b, x)];
        expect(evaluatePoly(addPoly(a, b), x).equals(fa.add(fb))).toBe(true);
        expect(evaluatePoly(mulPoly(a, b), x).equals(fa.mul(fb))).toBe(true);
        const leibniz = addPoly(mulPoly(derivativePoly(a), b), mulPoly(a, derivativePoly(b)));
        expect(equalPoly(derivativePoly(mulPoly(a, b)), leibniz)).toBe(true);
      }),
      { numRuns },
    );
  });

  test('a = quotient·b + remainder with deg remainder < deg b', () => {
    fc.assert(
      fc.property(polynomials(8), polynomials(5), (a, b) => {
        fc.pre(trimPoly(b).length > 0);
        const { quotient, remainder } = divmodPoly(a, b);
        expect(equalPoly(addPoly(mulPoly(quotient, b), remainder), a)).toBe(true);
        expect(remainder.length).toBeLessThan(trimPoly(b).length);
        expect(equalPoly(divideExactPoly(mulPoly(a, b), b) ?? poly(7), a)).toBe(true);
      }),
      { numRuns },
    );
  });

  test('an inexact division is undefined, a division by zero throws', () => {
    expect(divideExactPoly(poly(1, 0, 1), poly(1, 1))).toBeUndefined();
    expect(() => divmodPoly(poly(1), poly(0))).toThrow(RangeError);
  });
});

describe('gcd', () => {
  test('is monic, divides both, and the cofactors are coprime', () => {
    fc.assert(
      fc.property(polynomials(5), polynomials(5), polynomials(4), (a, b, c) => {
        const x = mulPoly(a, c);
        const y = mulPoly(b, c);
        fc.pre(x.length > 0 && y.length > 0);
        const g = gcdPoly(x, y);
        expect(g[g.length - 1]!.equals(Rational.ONE)).toBe(true);
        const u = divideExactPoly(x, g);
        const v = divideExactPoly(y, g);
        expect(u).toBeDefined();
        expect(v).toBeDefined();
        expect(gcdPoly(u!, v!)).toHaveLength(1);
        expect(divideExactPoly(g, c)).toBeDefined();
      }),
      { numRuns },
    );
  });

  test('a prime that divides a coefficient pattern does not fool it', () => {
    // Modulo the first prime used, x + p is x: the gcd with x(x + 1) looks larger than it is.
    const p = BigInt(wordPrime(0));
    expect(gcdInt([p, 1n], [0n, 1n, 1n])).toEqual([1n]);
    expect(gcdInt(mulInt([p, 1n], [3n, 5n]), mulInt([0n, 1n, 1n], [3n, 5n]))).toEqual([3n, 5n]);
  });

  test('a prime that divides a leading coefficient is passed over', () => {
    const p = BigInt(wordPrime(0));
    expect(gcdInt(mulInt([1n, p], [1n, 1n]), mulInt([1n, p], [2n, 1n]))).toEqual([1n, p]);
  });

  test('degree 100 with a common factor of degree 40 and 60-digit coefficients', () => {
    const pseudo = (n: number, seed: bigint): bigint[] => {
      let s = seed;
      return Array.from({ length: n + 1 }, () => (s = (s * 6364136223846793005n + 1442695040888963407n) % 10n ** 60n));
    };
    const common = primitiveInt(pseudo(40, 3n));
    const start = performance.now();
    expect(gcdInt(mulInt(common, pseudo(60, 5n)), mulInt(common, pseudo(60, 8n)))).toEqual(common);
    expect(performance.now() - start).toBeLessThan(3000);
  });

  test('zero is neutral', () => {
    expect(gcdPoly(poly(0), poly(2, 4))).toEqual(poly('1/2', 1));
    expect(gcdPoly([], [])).toEqual([]);
  });
});

describe('squarefree decomposition', () => {
  test('factors are squarefree, coprime, and their powers give the polynomial back', () => {
    fc.assert(
      fc.property(polynomials(3), polynomials(2), polynomials(2), (a, b, c) => {
        const p = [b, b, c, c, c].reduce<RationalPoly>(mulPoly, a);
        fc.pre(p.length > 0);
        const factors = squarefree(p);
        let product: RationalPoly = [p[p.length - 1]!];
        let radical: RationalPoly = [Rational.ONE];
        for (const { factor, multiplicity } of factors) {
          const lead = factor[factor.length - 1]!;
          const monic = factor.map((x) => x.div(lead));
          for (let i = 0; i < multiplicity; i++) product = mulPoly(product, monic);
          radical = mulPoly(radical, monic);
        }
        expect(equalPoly(product, p)).toBe(true);
        expect(gcdPoly(radical, derivativePoly(radical))).toHaveLength(1);
        expect(new Set(factors.map((f) => f.multiplicity)).size).toBe(factors.length);
      }),
      { numRuns: numRuns / 2 },
    );
  });

  test('(x − 1)(x + 2)²(x² + 1)³', () => {
    const [a, b, c] = [poly(-1, 1), poly(2, 1), poly(1, 0, 1)];
    const p = [b, b, c, c, c].reduce<RationalPoly>(mulPoly, a);
    expect(squarefree(p)).toEqual([
      { factor: a, multiplicity: 1 },
      { factor: b, multiplicity: 2 },
      { factor: c, multiplicity: 3 },
    ]);
  });

  test('a repeated factor is never called squarefree', () => {
    const square = mulInt([1n, 1n], [1n, 1n]);
    for (let i = 0; i < 5; i++) expect(provablySquarefree(square, i)).toBe(false);
    expect(provablySquarefree([1n, 0n, 1n])).toBe(true);
  });
});

describe('word primes', () => {
  test('descend from 2^25, without a gap, and invert', () => {
    const isPrime = (n: number): boolean => {
      for (let d = 2; d * d <= n; d++) if (n % d === 0) return false;
      return true;
    };
    let n = 2 ** 25 - 1;
    for (let i = 0; i < 100; i++, n--) {
      while (!isPrime(n)) n--;
      expect(wordPrime(i)).toBe(n);
    }
    expect(isPrime(wordPrime(20_000))).toBe(true);
    for (const a of [1, 2, 12345, 2 ** 24]) {
      const p = wordPrime(7);
      expect(Number((BigInt(a) * BigInt(invertWord(a, p))) % BigInt(p))).toBe(1);
    }
  });

  test('reduction is exact up to 2^53', () => {
    const p = wordPrime(3);
    fc.assert(
      fc.property(fc.maxSafeNat(), (x) => {
        expect(modWord(x, p, 1 / p)).toBe(x % p);
      }),
      { numRuns: 1000 * MULTIPLIER },
    );
    for (const k of [1, 2, 2 ** 27]) expect(modWord(k * p, p, 1 / p)).toBe(0);
  });
});

test('fractions over one long denominator come out in lowest terms', () => {
  const den = -(2n ** 900n) * 3n ** 900n * (10n ** 700n + 7n);
  const nums = [6n ** 50n, -(3n ** 1000n), 0n, 10n ** 700n + 7n, 5n * den, 11n];
  const out = overCommonDenominator(nums, den);
  out.forEach((r, i) => {
    expect(r.equals(Rational.of(nums[i]!, den))).toBe(true);
    expect(r.den > 0n).toBe(true);
  });
  expect(subPoly(out, overCommonDenominator([1n, 2n, 3n], 7n)).length).toBe(6);
  expect(overCommonDenominator([4n], -6n)[0]!.equals(q(-2, 3))).toBe(true);
});
