import fc from 'fast-check';
import { expect, test } from 'vitest';
import { gcdBigInt } from '../../src/numerics/integer-gcd.js';

const RUNS = 1000 * Number(process.env['LEASTTERM_TEST_MULTIPLIER'] ?? 1);

function euclid(a: bigint, b: bigint): bigint {
  while (b !== 0n) [a, b] = [b, a % b];
  return a < 0n ? -a : a;
}

const integers = fc.oneof(
  fc.bigInt({ min: -(2n ** 1500n), max: 2n ** 1500n }),
  fc.bigInt({ min: -(2n ** 130n), max: 2n ** 130n }),
  fc.bigInt({ min: -20n, max: 20n }),
);

test('equals the plain Euclidean algorithm, whatever common factor is there', () => {
  fc.assert(
    fc.property(integers, integers, integers, (a, b, g) => {
      expect(gcdBigInt(a * g, b * g)).toBe(euclid(a * g, b * g));
    }),
    { numRuns: RUNS },
  );
});

test('consecutive Fibonacci numbers, the longest chain of quotients 1', () => {
  let [a, b] = [0n, 1n];
  for (let i = 0; i < 3000; i++) [a, b] = [b, a + b];
  expect(gcdBigInt(a, b)).toBe(1n);
  expect(gcdBigInt(a * 10n ** 60n, b * 10n ** 60n)).toBe(10n ** 60n);
});

test('numbers next to powers of two, where leading bits mislead', () => {
  for (let i = 40; i < 400; i += 7) {
    for (const d of [-1n, 0n, 1n]) {
      const a = (1n << BigInt(3 * i)) + d;
      const b = (1n << BigInt(2 * i)) - 1n;
      expect(gcdBigInt(a, b)).toBe(euclid(a, b));
    }
  }
});
