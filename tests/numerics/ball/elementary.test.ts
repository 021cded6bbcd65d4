import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  atan,
  atan2,
  cosh,
  eulerGamma,
  exp,
  expm1,
  ln2,
  log,
  log1p,
  pi,
  pow,
  R,
  Rational,
  sinCos,
  sinCosPi,
  sinh,
} from '../../../src/numerics/index.js';
import type { Ball } from '../../../src/numerics/index.js';
import { cases, exactBall, mustContain, mustOverlap } from './generate.js';

const bits = fc.constantFrom(24, 53, 120, 366, 700);
const RUNS = cases(1000);
const SOME = cases(300);

/** Real functions with the exponents of their arguments that make sense. */
const FUNCTIONS: readonly {
  name: string;
  f: (x: Ball, prec: number) => Ball;
  low: number;
  high: number;
  positive?: true;
}[] = [
  { name: 'exp', f: exp, low: -60, high: 12 },
  { name: 'expm1', f: expm1, low: -400, high: 8 },
  { name: 'sinh', f: sinh, low: -400, high: 8 },
  { name: 'cosh', f: cosh, low: -60, high: 8 },
  { name: 'log', f: log, low: -200, high: 200, positive: true },
  { name: 'log1p', f: log1p, low: -400, high: -1 },
  { name: 'sin', f: (x, p) => sinCos(x, p).sin, low: -400, high: 60 },
  { name: 'cos', f: (x, p) => sinCos(x, p).cos, low: -60, high: 60 },
  { name: 'sinPi', f: (x, p) => sinCosPi(x, p).sin, low: -400, high: 60 },
  { name: 'cosPi', f: (x, p) => sinCosPi(x, p).cos, low: -60, high: 60 },
  { name: 'atan', f: atan, low: -400, high: 400 },
];

/** Bits lost against the ideal radius 2^-prec|f| for an exact argument: the table of allowed radius growth. */
const ALLOWED_LOSS = 0.6;

describe.each(FUNCTIONS)('$name', ({ f, low, high, positive }) => {
  const argument = exactBall(low, high, positive === undefined ? 'any' : 'positive');

  it('agrees with itself at a higher precision, and is sharp', () => {
    fc.assert(
      fc.property(argument, bits, (x, prec) => {
        const y = f(x, prec);
        mustOverlap(y, f(x, prec + 77), { x, prec });
        // exact zeros and exact values aside
        if (y.rad > 0)
          expect(R.accuracyBits(y), `${x.mid}·2^${x.exp} at ${prec}`).toBeGreaterThan(prec - 1 - ALLOWED_LOSS);
      }),
      RUNS,
    );
  });

  it('on a ball contains what it is on points of the ball', () => {
    fc.assert(
      fc.property(
        argument,
        bits,
        fc.integer({ min: -30, max: 70 }),
        fc.integer({ min: -8, max: 8 }),
        (x, prec, k, where) => {
          // radius |x|·2^-k or so
          const size = R.upperBits(x);
          const ball = R.addError(x, 8, size - k - 3);
          const inside = R.add(x, R.mul2exp(R.fromNumber(where), size - k - 3), 5000);
          if (positive !== undefined && !R.isPositive(ball)) return;
          mustOverlap(f(ball, prec), f(inside, prec + 200), { x, prec, k, where });
        },
      ),
      RUNS,
    );
  });
});

describe('identities', () => {
  it('e^a e^b = e^(a+b), log of it gives back', () => {
    fc.assert(
      fc.property(exactBall(-20, 8), exactBall(-20, 8), bits, (a, b, prec) => {
        const sum = R.add(a, b, 5000);
        const y = exp(sum, prec);
        mustOverlap(R.mul(exp(a, prec), exp(b, prec), prec), y, { a, b, prec });
        mustOverlap(log(y, prec), sum, { a, b, prec });
        mustOverlap(R.sub(y, R.ONE, prec), expm1(sum, prec), { a, b, prec });
      }),
      SOME,
    );
  });

  it('log ab = log a + log b', () => {
    fc.assert(
      fc.property(exactBall(-90, 90, 'positive'), exactBall(-90, 90, 'positive'), bits, (a, b, prec) => {
        mustOverlap(log(R.mul(a, b, 5000), prec), R.add(log(a, prec), log(b, prec), prec), { a, b, prec });
      }),
      SOME,
    );
  });

  it('sin² + cos² = 1, double angle, addition', () => {
    fc.assert(
      fc.property(exactBall(-50, 40), exactBall(-50, 40), bits, (a, b, prec) => {
        const x = sinCos(a, prec);
        const y = sinCos(b, prec);
        const sum = sinCos(R.add(a, b, 5000), prec);
        mustOverlap(R.add(R.sqr(x.sin, prec), R.sqr(x.cos, prec), prec), R.ONE, { a, prec });
        mustOverlap(R.add(R.mul(x.sin, y.cos, prec), R.mul(x.cos, y.sin, prec), prec), sum.sin, { a, b, prec });
        mustOverlap(R.sub(R.mul(x.cos, y.cos, prec), R.mul(x.sin, y.sin, prec), prec), sum.cos, { a, b, prec });
      }),
      SOME,
    );
  });

  it('sin πx is sin of π times x', () => {
    fc.assert(
      fc.property(exactBall(-50, 20), bits, (x, prec) => {
        const a = sinCosPi(x, prec);
        const b = sinCos(R.mul(x, pi(prec + 40), prec + 40), prec);
        mustOverlap(a.sin, b.sin, { x, prec });
        mustOverlap(a.cos, b.cos, { x, prec });
      }),
      SOME,
    );
  });

  it('atan2 is the angle of (cos φ, sin φ), in all quadrants', () => {
    fc.assert(
      fc.property(exactBall(-40, 2), exactBall(-200, 200, 'positive'), bits, (phi, r, prec) => {
        if (!R.isPositive(R.sub(pi(64), R.abs(phi), 64))) return;
        const { sin, cos } = sinCos(phi, prec);
        mustOverlap(atan2(R.mul(r, sin, prec), R.mul(r, cos, prec), prec), phi, { phi, r, prec });
      }),
      SOME,
    );
  });

  it('cosh² − sinh² = 1, log1p undoes expm1', () => {
    fc.assert(
      fc.property(exactBall(-300, 4), bits, (x, prec) => {
        const s = sinh(x, prec);
        const c = cosh(x, prec);
        mustOverlap(R.sub(R.sqr(c, prec), R.sqr(s, prec), prec), R.ONE, { x, prec });
        mustOverlap(log1p(expm1(x, prec), prec), x, { x, prec });
      }),
      SOME,
    );
  });

  it('powers: a^b a^c = a^(b+c), roots, integers, negative bases', () => {
    fc.assert(
      fc.property(exactBall(-60, 60, 'positive'), exactBall(-6, 5), exactBall(-6, 5), bits, (a, b, c, prec) => {
        mustOverlap(R.mul(pow(a, b, prec), pow(a, c, prec), prec), pow(a, R.add(b, c, 5000), prec), { a, b, c, prec });
        mustOverlap(R.sqr(pow(a, Rational.of(1n, 2n), prec), prec), a, { a, prec });
        mustOverlap(R.powInt(pow(a, Rational.of(1n, 7n), prec), 7, prec), a, { a, prec });
        mustOverlap(pow(R.neg(a), Rational.of(3), prec), R.neg(R.powInt(a, 3, prec)), { a, prec });
      }),
      SOME,
    );
  });
});

describe('hard cases', () => {
  it('sin next to multiples of π keeps the relative accuracy of an exact argument', () => {
    for (const prec of [53, 366, 1200]) {
      for (const n of [1, 2, 7, 355, 1_000_001]) {
        const x = R.exactMid(R.mul(R.fromNumber(n), pi(prec), prec));
        expect(R.accuracyBits(sinCos(x, prec).sin), `${n} at ${prec}`).toBeGreaterThan(prec - 2);
        const half = R.exactMid(R.mul2exp(R.mul(R.fromNumber(2 * n + 1), pi(prec), prec), -1));
        expect(R.accuracyBits(sinCos(half, prec).cos), `${n}+1/2 at ${prec}`).toBeGreaterThan(prec - 2);
      }
    }
  });

  it('log next to 1 keeps its relative accuracy', () => {
    for (const e of [1, 20, 29, 30, 31, 100, 1000, 5000]) {
      for (const s of [1n, -1n]) {
        const x = R.add(R.ONE, R.ball(s, -e), 1e9);
        const y = log(x, 100);
        expect(R.accuracyBits(y), `1 ${s} 2^-${e}`).toBeGreaterThan(98);
        mustOverlap(y, log1p(R.ball(s, -e), 120), { e, s });
      }
    }
  });

  it('values near a rounding boundary: f at the rounded inverse', () => {
    // y of few bits, x = log y to many bits: e^x lies within 2^-200 of y.
    for (let y = 3; y < 60; y += 2) {
      const x = R.exactMid(log(R.fromNumber(y), 250));
      const back = exp(x, 53);
      mustOverlap(back, R.fromNumber(y), { y });
      mustOverlap(exp(x, 300), back, { y });
    }
  });

  it('exact values', () => {
    expect(exp(R.ZERO, 53)).toEqual(R.ONE);
    expect(R.isExactZero(log(R.ONE, 53))).toBe(true);
    expect(R.isExactZero(sinCos(R.ZERO, 53).sin)).toBe(true);
    expect(R.isExactZero(expm1(R.ZERO, 53))).toBe(true);
    expect(R.isExactZero(log1p(R.ZERO, 53))).toBe(true);
    expect(R.isExactZero(atan(R.ZERO, 53))).toBe(true);
    for (let n = -8; n <= 8; n++) {
      const { sin, cos } = sinCosPi(R.ball(BigInt(n), -1), 53);
      const table = [0, 1, 0, -1];
      expect(R.toNumber(sin) + 0).toBe(table[((n % 4) + 4) % 4]);
      expect(R.toNumber(cos) + 0).toBe(table[(((n + 1) % 4) + 4) % 4]);
      expect(sin.rad + cos.rad).toBe(0);
    }
    for (const big of [R.fromNumber(2), R.mul2exp(R.ONE, 70)]) expect(R.isExactZero(sinCosPi(big, 53).sin)).toBe(true);
  });

  it('wide balls and ends of the range', () => {
    const wide = exp(R.ball(3n, 0, 2), 53);
    mustContain(wide, Rational.of(3), wide);
    mustContain(wide, Rational.of(148), wide);
    const huge = exp(R.ball(0n, 0, 900), 53);
    expect(huge.rad).toBeLessThan(Infinity);
    mustOverlap(huge, exp(R.fromNumber(899), 53), huge);
    expect(exp(R.INDETERMINATE, 53)).toBe(R.INDETERMINATE);
    expect(exp(R.mul2exp(R.ONE, 60), 53)).toBe(R.INDETERMINATE);
    const nothing = exp(R.neg(R.mul2exp(R.ONE, 60)), 53);
    expect(R.upperBits(nothing)).toBeLessThan(-1e9);
    const unknown = exp(R.ball(-3n, 60, 2.9), 53);
    expect(R.upperBits(unknown)).toBeLessThanOrEqual(2);
    expect(log(R.ball(1n, 0, 1), 53)).toBe(R.INDETERMINATE);
    expect(log(R.fromNumber(-1), 53)).toBe(R.INDETERMINATE);
    for (const v of [
      sinCos(R.INDETERMINATE, 53),
      sinCos(R.ball(0n, 0, 9), 53),
      sinCosPi(R.INDETERMINATE, 53),
      sinCosPi(R.ball(1n, 0, 3), 53),
      sinCos(R.mul2exp(R.ONE, 70_000), 53),
    ]) {
      mustContain(v.sin, Rational.of(-1), v);
      mustContain(v.cos, Rational.of(1), v);
      expect(R.upperBits(v.sin)).toBeLessThanOrEqual(3);
    }
    mustContain(atan(R.INDETERMINATE, 53), Rational.of(3n, 2n), 'atan');
    mustContain(atan2(R.ball(0n, 0, 1), R.ball(0n, 0, 1), 53), Rational.of(-3), 'atan2');
    mustContain(atan2(R.INDETERMINATE, R.ONE, 53), Rational.of(-3n, 2n), 'atan2');
    mustContain(atan2(R.ball(1n, 0, 0.9), R.ball(0n, 0, 100), 53), Rational.of(3), 'atan2');
    expect(pow(R.ZERO, Rational.of(1n, 3n), 53)).toEqual(R.ZERO);
    expect(pow(R.ZERO, Rational.of(-1n, 3n), 53)).toBe(R.INDETERMINATE);
    expect(pow(R.fromNumber(-2), Rational.of(1n, 3n), 53)).toBe(R.INDETERMINATE);
    expect(pow(R.ball(0n, 0, 1), R.ball(1n, -3), 53)).toBe(R.INDETERMINATE);
    expect(R.toNumber(pow(R.fromNumber(2), R.fromNumber(20000), 53))).toBe(Infinity);
    expect(R.toNumber(pow(R.fromNumber(-1), R.fromNumber(20001), 53))).toBe(-1);
    expect(R.toNumber(pow(R.ONE, R.ball(1n, -3), 53))).toBe(1);
  });
});

describe('constants', () => {
  // First digits as printed in DLMF 3.12 (π), 4.2 context (ln 2) and 5.2.3 (γ); re-computed with mpmath 1.3.0 and PARI/GP 2.15.2.
  it.each([
    ['π', pi, '3.14159265358979323846264338327950288419716939937510582097494459'],
    ['ln 2', ln2, '0.693147180559945309417232121458176568075500134360255254120680009'],
    ['γ', eulerGamma, '0.577215664901532860606512090082402431042159335939923598805767235'],
  ] as const)('%s', (_, f, text) => {
    const value = Rational.parse(text)!;
    const ball = R.addError(f(190), 1, -206);
    mustContain(R.addError(ball, 1, -205), value, text);
    for (const prec of [2, 53, 500, 3400]) {
      mustOverlap(f(prec), f(prec + 300), prec);
      expect(R.accuracyBits(f(prec))).toBeGreaterThan(prec - 1.6);
    }
  });

  it('π is 4 artan 1 and 16 artan(1/5) − 4 artan(1/239); ln 2 is log 2', () => {
    for (const prec of [53, 366, 3400]) {
      mustOverlap(R.mul2exp(atan(R.ONE, prec), 2), pi(prec), prec);
      const a = atan(R.fromRational(Rational.of(1n, 5n), prec + 9), prec + 9);
      const b = atan(R.fromRational(Rational.of(1n, 239n), prec + 9), prec + 9);
      mustOverlap(R.sub(R.mul2exp(a, 4), R.mul2exp(b, 2), prec), pi(prec), prec);
      mustOverlap(log(R.fromNumber(2), prec), ln2(prec), prec);
      mustOverlap(
        log(R.fromNumber(3), prec),
        R.add(log(R.fromRational(Rational.of(3n, 2n), 9999), prec), ln2(prec), prec),
        prec,
      );
    }
  });
});

describe('torture grid: 1e-20 to 1e20 at 15 to 1,000 digits, neighbouring precisions overlap, each in time', () => {
  const sizes = [-20, -10, -5, -2, -1, 0, 1, 2, 5, 10, 20];
  it.each([15, 50, 110, 300, 1000])('%i digits', (digits) => {
    const prec = Math.ceil(digits * 3.33);
    const start = performance.now();
    for (const e of sizes) {
      for (const m of ['1', '3.7', '-2.9']) {
        const x = R.fromRational(Rational.parse(`${m}e${e}`)!, prec + 100);
        for (const { name, f, positive } of FUNCTIONS) {
          if (positive !== undefined && !R.isPositive(x)) continue;
          if (/exp|sinh|cosh/.test(name) && e > 10) continue;
          if (name === 'log1p' && !R.isPositive(R.add(R.ONE, x, 64))) continue;
          mustOverlap(f(x, prec), f(x, prec + 5), { name, m, e, digits });
        }
      }
    }
    // 33 arguments × 11 functions × 2: a hang or a blow-up of cost shows, a slow machine does not.
    expect(performance.now() - start).toBeLessThan(30_000);
  });
});
