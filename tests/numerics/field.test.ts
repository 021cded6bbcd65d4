import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { ballField, doubleField, R, Rational, rationalField } from '../../src/numerics/index.js';
import type { Field } from '../../src/numerics/index.js';
import { cases } from './ball/generate.js';

const small = fc
  .tuple(fc.bigInt({ min: -1000n, max: 1000n }), fc.bigInt({ min: 1n, max: 999n }))
  .map(([n, d]) => Rational.of(n, d));

/** ((a + b)·c − a/d) with d made non-zero, through the interface only. */
function expression<T>(f: Field<T>, a: Rational, b: Rational, c: Rational, d: Rational): T {
  const [x, y, z, w] = [a, b, c, d].map((q) => f.fromRational(q)) as [T, T, T, T];
  const divisor = f.isNonZero(w) ? w : f.one;
  return f.sub(f.mul(f.add(x, y), z), f.neg(f.neg(f.div(x, divisor))));
}

describe('the three number fields agree', () => {
  it('on an expression', () => {
    fc.assert(
      fc.property(small, small, small, small, (a, b, c, d) => {
        const q = expression(rationalField, a, b, c, d);
        expect(R.containsRational(expression(ballField(80), a, b, c, d), q)).toBe(true);
        const x = expression(doubleField, a, b, c, d);
        const scale = [a, b, c, d].reduce((s, v) => Math.max(s, Math.abs(v.toNumber())), 1);
        expect(Math.abs(x - q.toNumber())).toBeLessThanOrEqual(1e-12 * scale * scale * 1000);
        expect(rationalField.toNumber(q)).toBe(q.toNumber());
      }),
      cases(1000),
    );
  });

  it('zero, one and their predicates', () => {
    const check = <T>(f: Field<T>): void => {
      expect(f.isZero(f.zero)).toBe(true);
      expect(f.isNonZero(f.zero)).toBe(false);
      expect(f.isZero(f.one)).toBe(false);
      expect(f.isNonZero(f.one)).toBe(true);
      expect(f.toNumber(f.one)).toBe(1);
      expect(f.toNumber(f.neg(f.one))).toBe(-1);
    };
    check(rationalField);
    check(doubleField);
    check(ballField(53));
  });

  it('a ball that may be zero is neither zero nor certainly not', () => {
    const f = ballField(53);
    const v = R.ball(1n, 0, 2);
    expect(f.isZero(v)).toBe(false);
    expect(f.isNonZero(v)).toBe(false);
    expect(f.div(f.one, v)).toBe(R.INDETERMINATE);
    expect(doubleField.isNonZero(NaN)).toBe(false);
    expect(() => rationalField.div(Rational.ONE, Rational.ZERO)).toThrow(RangeError);
  });
});
