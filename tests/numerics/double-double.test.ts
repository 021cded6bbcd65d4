/** Double-double arithmetic against balls of 200 bits, which enclose the exact results. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { atan2, C, cexp, clog, csqrt, DoubleDouble as D, exp, log, R, sinCos } from '../../src/numerics/index.js';
import type { Ball, Complex } from '../../src/numerics/index.js';
import { cases } from './ball/generate.js';

const Z = D.complex;
const PREC = 200;
const part = fc.double({ min: -1e6, max: 1e6, noNaN: true }).filter((x) => x === 0 || Math.abs(x) > 1e-6);
/** A number with bits in both doubles. */
const dd = fc.tuple(part, part).map(([a, b]): D.DoubleDouble => D.twoSum(a, b * 2 ** -60));
const complex = fc.tuple(dd, dd).map(([re, im]) => ({ re, im }));

const distance = (a: D.DoubleDouble, b: Ball): number =>
  Math.abs(R.toNumber(R.sub(R.exactMid(b), D.toBall(a), 2 * PREC)));
const size = (b: Ball): number => Math.abs(R.toNumber(b));
const wide = (z: { re: D.DoubleDouble; im: D.DoubleDouble }): Complex => ({ re: D.toBall(z.re), im: D.toBall(z.im) });
const away = (a: { re: D.DoubleDouble; im: D.DoubleDouble }, b: Complex): number =>
  Math.max(distance(a.re, b.re), distance(a.im, b.im));

describe('real operations', () => {
  it('sum, product, quotient and root are good to a few units', () => {
    fc.assert(
      fc.property(dd, dd, (a, b) => {
        const [x, y] = [D.toBall(a), D.toBall(b)];
        const scale = Math.abs(a[0]) + Math.abs(b[0]);
        expect(distance(D.add(a, b), R.add(x, y, PREC))).toBeLessThanOrEqual(D.UNIT * scale);
        expect(distance(D.mul(a, b), R.mul(x, y, PREC))).toBeLessThanOrEqual(D.UNIT * Math.abs(a[0] * b[0]));
        if (b[0] !== 0)
          expect(distance(D.div(a, b), R.div(x, y, PREC))).toBeLessThanOrEqual(4 * D.UNIT * Math.abs(a[0] / b[0]));
        if (a[0] > 0) expect(distance(D.sqrt(a), R.sqrt(x, PREC))).toBeLessThanOrEqual(8 * D.UNIT * Math.sqrt(a[0]));
      }),
      cases(400),
    );
  });

  it('a ball and back loses nothing of 100 bits', () => {
    const third = R.div(R.ONE, R.fromNumber(3), 100);
    expect(distance(D.fromBall(third), third)).toBeLessThan(2 ** -104);
  });
});

describe('functions', () => {
  const moderate = fc
    .tuple(fc.double({ min: -40, max: 40, noNaN: true }), fc.double({ min: -1, max: 1, noNaN: true }))
    .map(([a, b]): D.DoubleDouble => D.twoSum(a, b * 2 ** -55));
  it('exp, log, sine and cosine', () => {
    fc.assert(
      fc.property(moderate, (a) => {
        const x = D.toBall(a);
        const e = exp(x, PREC);
        expect(distance(D.exp(a), e)).toBeLessThanOrEqual(128 * D.UNIT * size(e));
        const { sin, cos } = sinCos(x, PREC);
        const [s, c] = D.sinCos(a);
        expect(distance(s, sin)).toBeLessThanOrEqual(64 * D.UNIT);
        expect(distance(c, cos)).toBeLessThanOrEqual(64 * D.UNIT);
        if (a[0] > 1e-300)
          expect(distance(D.log(a), log(x, PREC))).toBeLessThanOrEqual(128 * D.UNIT * (1 + Math.abs(Math.log(a[0]))));
      }),
      cases(400),
    );
  });

  it('the argument in all quadrants', () => {
    fc.assert(
      fc.property(complex, ({ re, im }) => {
        fc.pre(re[0] !== 0 || im[0] !== 0);
        expect(distance(D.atan2(im, re), atan2(D.toBall(im), D.toBall(re), PREC))).toBeLessThanOrEqual(256 * D.UNIT);
      }),
      cases(400),
    );
  });
});

describe('complex numbers', () => {
  it('quotient, logarithm, root and exponential', () => {
    fc.assert(
      fc.property(complex, complex, (a, b) => {
        fc.pre(Z.size(a) > 0 && Z.size(b) > 0);
        const [x, y] = [wide(a), wide(b)];
        expect(away(Z.div(a, b), C.div(x, y, PREC))).toBeLessThanOrEqual((16 * D.UNIT * Z.size(a)) / Z.size(b));
        expect(away(Z.log(a), clog(x, PREC))).toBeLessThanOrEqual(512 * D.UNIT * (1 + Math.abs(Math.log(Z.size(a)))));
        const root = csqrt(x, PREC);
        expect(away(Z.sqrt(a), root)).toBeLessThanOrEqual(32 * D.UNIT * Math.sqrt(Z.size(a)));
        const small = Z.mul2exp(a, -18);
        const e = cexp(wide(small), PREC);
        expect(away(Z.exp(small), e)).toBeLessThanOrEqual(256 * D.UNIT * (size(e.re) + size(e.im)));
      }),
      cases(200),
    );
  });
});
