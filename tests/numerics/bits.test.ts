import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bitLength, doubleBits, isqrt, shift } from '../../src/numerics/bits.js';
import { cases } from './ball/generate.js';

/** Lengths around those where the method changes: doubles end at 1,024 bits, the search strides by 960. */
const LENGTHS = [1, 2, 3, 31, 32, 52, 53, 54, 63, 64, 65, 99, 100, 101, 959, 960, 961, 1022, 1023, 1024, 1025, 1026];
const LONG = [1919, 1920, 1921, 1984, 1985, 2880, 2944, 3000, 3903, 3904, 3905, 6784, 6785, 12_000, 70_001];

describe('length in bits', () => {
  it.each([...LENGTHS, ...LONG])('of numbers of %i bits', (n) => {
    const top = 1n << BigInt(n - 1);
    for (const sign of [1n, -1n]) {
      expect(bitLength(sign * top)).toBe(n);
      expect(bitLength(sign * (top + (top >> 1n)))).toBe(n);
      // next to the following power of two the conversion to a double may round up
      const all = bitLength(sign * (2n * top - 1n));
      expect(all === n || (n > 53 && all === n + 1)).toBe(true);
      if (n <= 53) expect(all).toBe(n);
    }
  });

  it('zero has none, a double as many as its integer part', () => {
    expect(bitLength(0n)).toBe(0);
    expect(doubleBits(1)).toBe(1);
    expect(doubleBits(0.5)).toBe(0);
    expect(doubleBits(-8)).toBe(4);
    expect(doubleBits(7.99)).toBe(3);
    expect(doubleBits(2 ** -1022)).toBe(-1021);
  });
});

describe('shift', () => {
  it('left is exact, right goes to the floor', () => {
    expect(shift(-5n, 3)).toBe(-40n);
    expect(shift(-5n, 0)).toBe(-5n);
    expect(shift(-5n, -1)).toBe(-3n);
    expect(shift(5n, -1)).toBe(2n);
  });
});

describe('integer square root', () => {
  it('is the floor: r² <= n < (r+1)²', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 2500 }), fc.bigInt({ min: 0n, max: 1n << 2500n }), (bits, n) => {
        const m = n >> BigInt(2500 - bits);
        const r = isqrt(m);
        expect(r * r <= m && m < (r + 1n) * (r + 1n)).toBe(true);
      }),
      cases(500),
    );
  });

  it('next to squares of every length', () => {
    for (let n = 1; n < 400; n++)
      for (const root of [1n << BigInt(n), (1n << BigInt(n)) - 1n, (1n << BigInt(n)) + 1n]) {
        expect(isqrt(root * root)).toBe(root);
        expect(isqrt(root * root - 1n)).toBe(root - 1n);
        expect(isqrt(root * root + 2n * root)).toBe(root);
      }
    for (let k = 0n; k < 100n; k++) {
      const r = isqrt(k);
      expect(r * r <= k && k < (r + 1n) * (r + 1n)).toBe(true);
    }
  });

  it('a negative number is refused', () => {
    expect(() => isqrt(-1n)).toThrow(RangeError);
  });
});
