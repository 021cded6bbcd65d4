import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { C, cexp, clog, cpow, csqrt, arg, pi, R, Rational } from '../../../src/numerics/index.js';
import type { Complex } from '../../../src/numerics/index.js';
import { cases, exactBall, mustContain, mustOverlap, pointed, precision } from './generate.js';

const RUNS = cases(1000);

interface Point {
  readonly re: Rational;
  readonly im: Rational;
}

const mulPoint = (a: Point, b: Point): Point => ({
  re: a.re.mul(b.re).sub(a.im.mul(b.im)),
  im: a.re.mul(b.im).add(a.im.mul(b.re)),
});

/** A rectangle with a point of it. */
const box = fc.tuple(pointed(300), pointed(300)).map(([x, y]) => ({
  box: { re: x.ball, im: y.ball } satisfies Complex,
  point: { re: x.point, im: y.point } satisfies Point,
}));

function contains(z: Complex, p: Point, context: unknown): void {
  mustContain(z.re, p.re, context);
  mustContain(z.im, p.im, context);
}

function overlap(a: Complex, b: Complex, context: unknown): void {
  mustOverlap(a.re, b.re, context);
  mustOverlap(a.im, b.im, context);
}

describe('complex arithmetic contains the exact result', () => {
  it('sum, difference, product, square, conjugate, norm', () => {
    fc.assert(
      fc.property(box, box, precision, (a, b, prec) => {
        const context = { a: a.box, b: b.box, prec };
        contains(
          C.add(a.box, b.box, prec),
          { re: a.point.re.add(b.point.re), im: a.point.im.add(b.point.im) },
          context,
        );
        contains(
          C.sub(a.box, b.box, prec),
          { re: a.point.re.sub(b.point.re), im: a.point.im.sub(b.point.im) },
          context,
        );
        contains(C.mul(a.box, b.box, prec), mulPoint(a.point, b.point), context);
        contains(C.sqr(a.box, prec), mulPoint(a.point, a.point), context);
        contains(C.conj(a.box), { re: a.point.re, im: a.point.im.neg() }, context);
        contains(C.neg(a.box), { re: a.point.re.neg(), im: a.point.im.neg() }, context);
        mustContain(C.norm(a.box, prec), a.point.re.pow(2).add(a.point.im.pow(2)), context);
      }),
      RUNS,
    );
  });

  it('quotient and inverse', () => {
    fc.assert(
      fc.property(box, box, precision, (a, b, prec) => {
        const n = b.point.re.pow(2).add(b.point.im.pow(2));
        if (n.isZero()) return;
        const q = mulPoint(a.point, { re: b.point.re.div(n), im: b.point.im.neg().div(n) });
        contains(C.div(a.box, b.box, prec), q, { a: a.box, b: b.box, prec });
        contains(C.inv(b.box, prec), { re: b.point.re.div(n), im: b.point.im.neg().div(n) }, { b: b.box, prec });
      }),
      RUNS,
    );
  });

  it('modulus, against its square', () => {
    fc.assert(
      fc.property(box, precision, (a, prec) => {
        const r = C.abs(a.box, prec);
        const n = a.point.re.pow(2).add(a.point.im.pow(2));
        mustContain(R.sqr(r, 4000), n, { a: a.box, prec });
      }),
      RUNS,
    );
  });

  it('size bounds hold', () => {
    fc.assert(
      fc.property(box, (a) => {
        const up = C.upperBits(a.box);
        const n = a.point.re.pow(2).add(a.point.im.pow(2));
        if (up === -Infinity) expect(n.isZero()).toBe(true);
        else mustContain(R.ball(0n, 2 * up, 1), n, a.box);
        if (!C.containsZero(a.box)) expect(n.isZero()).toBe(false);
      }),
      RUNS,
    );
  });
});

const point = fc.tuple(exactBall(-30, 6), exactBall(-30, 6)).map(([re, im]): Complex => ({ re, im }));
const bits = fc.constantFrom(53, 120, 366);

describe('complex elementary functions', () => {
  it('e^(a+b) = e^a e^b', () => {
    fc.assert(
      fc.property(point, point, bits, (a, b, prec) => {
        overlap(cexp(C.add(a, b, 2000), prec), C.mul(cexp(a, prec), cexp(b, prec), prec), { a, b, prec });
      }),
      cases(300),
    );
  });

  it('e^(log z) = z, and log has its imaginary part in (−π, π]', () => {
    fc.assert(
      fc.property(point, bits, (z, prec) => {
        const l = clog(z, prec);
        overlap(cexp(l, prec), z, { z, prec });
        expect(R.isNegative(R.sub(R.abs(l.im), pi(prec + 20), prec + 20)) || R.isExactZero(z.im)).toBe(true);
        if (R.upperBits(l.im) > -40) expect(R.accuracyBits(l.im)).toBeGreaterThan(prec - 3);
      }),
      cases(300),
    );
  });

  it('√z squared is z, with its real part not negative', () => {
    fc.assert(
      fc.property(point, bits, (z, prec) => {
        const s = csqrt(z, prec);
        overlap(C.sqr(s, prec), z, { z, prec });
        expect(R.isNegative(s.re)).toBe(false);
        expect(R.accuracyBits(s.re)).toBeGreaterThan(prec - 4);
        expect(R.accuracyBits(s.im)).toBeGreaterThan(prec - 4);
      }),
      cases(300),
    );
  });

  it('z^a z^b = z^(a+b)', () => {
    fc.assert(
      fc.property(point, exactBall(-5, 3), exactBall(-5, 3), bits, (z, a, b, prec) => {
        const p = cpow(z, C.fromReal(a), prec);
        const q = cpow(z, C.fromReal(b), prec);
        overlap(C.mul(p, q, prec), cpow(z, C.fromReal(R.add(a, b, 2000)), prec), { z, a, b, prec });
      }),
      cases(200),
    );
  });

  it('log |z| keeps its accuracy next to the unit circle', () => {
    const tiny = R.mul2exp(R.ONE, -300);
    const l = clog({ re: R.add(R.ONE, tiny, 1000), im: tiny }, 100);
    expect(R.accuracyBits(l.re)).toBeGreaterThan(95);
  });

  it('rectangles across the cut get the whole range', () => {
    const z: Complex = { re: R.fromNumber(-1), im: R.ball(0n, 0, 0.5) };
    mustContain(arg(z, 53), Rational.of(3), z);
    mustContain(arg(z, 53), Rational.of(-3), z);
    const s = csqrt(z, 53);
    mustContain(s.im, Rational.of(1), z);
    mustContain(s.im, Rational.of(-1), z);
    expect(arg({ re: R.fromNumber(-2), im: R.ZERO }, 53)).toEqual(pi(53));
    expect(C.containsZero(csqrt(C.ZERO, 53))).toBe(true);
    expect(cpow(C.ZERO, C.ONE, 53)).toBe(C.INDETERMINATE);
    expect(cpow(C.ZERO, C.ZERO, 53)).toBe(C.ONE);
    expect(C.div(C.ONE, { re: R.ball(0n, 0, 1), im: R.ball(0n, 0, 1) }, 53).re).toBe(R.INDETERMINATE);
    expect(C.toNumbers(C.mul(C.I, C.I, 53))).toEqual({ re: -1, im: 0 });
  });
});
