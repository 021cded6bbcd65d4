/**
 * @module Random balls with an exact point inside, biased toward what breaks ball arithmetic: exact and wide balls, long and short
 * mantissas, huge and tiny exponents, midpoints at zero. Exported for every test of a ball function.
 */
import fc from 'fast-check';
import { R, Rational } from '../../../src/numerics/index.js';
import type { Ball } from '../../../src/numerics/index.js';

/** Number of random cases, scaled by LEASTTERM_TEST_MULTIPLIER (1 by default). */
export function cases(n: number): { numRuns: number } {
  const factor = Number(process.env['LEASTTERM_TEST_MULTIPLIER'] ?? '1');
  return { numRuns: Math.max(1, Math.round(n * (factor > 0 ? factor : 1))) };
}

export interface Pointed {
  readonly ball: Ball;
  /** A rational inside the ball. */
  readonly point: Rational;
}

/** 2^e as a rational. */
export function power2(e: number): Rational {
  return e >= 0 ? Rational.of(1n << BigInt(e)) : Rational.of(1n, 1n << BigInt(-e));
}

const bits = fc.oneof(
  { weight: 3, arbitrary: fc.integer({ min: 1, max: 70 }) },
  { weight: 3, arbitrary: fc.integer({ min: 100, max: 400 }) },
  { weight: 1, arbitrary: fc.integer({ min: 1000, max: 1400 }) },
);

const mantissa: fc.Arbitrary<bigint> = fc.oneof(
  { weight: 1, arbitrary: fc.constant(0n) },
  { weight: 8, arbitrary: bits.chain((n) => fc.bigInt({ min: -(1n << BigInt(n)), max: 1n << BigInt(n) })) },
  // next to powers of two
  {
    weight: 1,
    arbitrary: bits.chain((n) => fc.constantFrom(1n << BigInt(n), (1n << BigInt(n)) - 1n, -(1n << BigInt(n)))),
  },
);

/** Radii as dyadic fractions k·2^-s of the unit. */
const radius = fc.oneof(
  { weight: 3, arbitrary: fc.constant([0, 0] as const) },
  { weight: 4, arbitrary: fc.tuple(fc.integer({ min: 1, max: 1 << 20 }), fc.integer({ min: 0, max: 20 })) },
  { weight: 1, arbitrary: fc.tuple(fc.integer({ min: 1, max: 1000 }), fc.integer({ min: -80, max: 300 })) },
);

const exponent = (span: number): fc.Arbitrary<number> =>
  fc.oneof(
    { weight: 5, arbitrary: fc.integer({ min: -200, max: 60 }) },
    { weight: 1, arbitrary: fc.integer({ min: -span, max: span }) },
  );

/** Any ball with a point of it; exponents up to ±span now and then. */
export function pointed(span = 3000): fc.Arbitrary<Pointed> {
  return fc
    .tuple(mantissa, exponent(span), radius, fc.integer({ min: -64, max: 64 }))
    .map(([mid, exp, [k, s], where]) => {
      const rad = k * 2 ** -s;
      // the point mid + where/64·rad, exactly
      const offset = Rational.of(BigInt(where) * BigInt(k), 64n).mul(power2(-s));
      return { ball: { mid, exp, rad }, point: Rational.of(mid).add(offset).mul(power2(exp)) };
    });
}

/** Working precisions. */
export const precision = fc.constantFrom(2, 24, 53, 64, 100, 333, 1200);

/** Exact balls m·2^e of the given size: |x| in [2^low, 2^high). */
export function exactBall(low: number, high: number, sign: 'any' | 'positive' = 'any'): fc.Arbitrary<Ball> {
  const digits = fc.oneof(fc.integer({ min: 1, max: 12 }), fc.constant(53), fc.integer({ min: 60, max: 400 }));
  return fc.tuple(digits, fc.integer({ min: low, max: high - 1 }), fc.boolean()).chain(([n, e, negative]) =>
    fc.bigInt({ min: 1n << BigInt(n - 1), max: (1n << BigInt(n)) - 1n }).map((m) => ({
      mid: negative && sign === 'any' ? -m : m,
      exp: e - n + 1,
      rad: 0,
    })),
  );
}

/** Fails with all inputs when the ball does not contain the rational. */
export function mustContain(result: Ball, value: Rational, context: unknown): void {
  if (R.containsRational(result, value)) return;
  throw new Error(
    `ball ${show(result)} does not contain ${value.toNumber()}: ${JSON.stringify(context, (_, v: unknown) => (typeof v === 'bigint' ? v.toString() : v))}`,
  );
}

/** Fails with all inputs when the balls are disjoint. */
export function mustOverlap(a: Ball, b: Ball, context: unknown): void {
  if (R.overlaps(a, b)) return;
  throw new Error(
    `balls ${show(a)} and ${show(b)} are disjoint: ${JSON.stringify(context, (_, v: unknown) => (typeof v === 'bigint' ? v.toString() : v))}`,
  );
}

function show(b: Ball): string {
  return `(${b.mid} ± ${b.rad})·2^${b.exp}`;
}
