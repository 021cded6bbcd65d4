import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  bernoulli,
  digamma,
  eulerGamma,
  gamma,
  log,
  logGamma,
  logGamma1p,
  pi,
  R,
  Rational,
  rgamma,
  sinCosPi,
  zeta,
} from '../../../src/numerics/index.js';
import type { Ball } from '../../../src/numerics/index.js';
import { cases, exactBall, mustContain, mustOverlap } from '../ball/generate.js';

const bits = fc.constantFrom(30, 53, 120, 366);
const SOME = cases(250);

/** Arguments next to integers, half integers, zeros of ψ and plain ones. */
const argument = fc.oneof(
  exactBall(-30, 7),
  fc.tuple(fc.integer({ min: -30, max: 30 }), exactBall(-150, -1)).map(([n, d]) => R.add(R.fromNumber(n), d, 1e9)),
  fc.integer({ min: -61, max: 61 }).map((n) => R.ball(BigInt(n), -1)),
);

const isPole = (x: Ball): boolean => x.mid <= 0n && R.midpoint(x).isInteger();

describe('Γ', () => {
  it('Γ(x+1) = x Γ(x) (DLMF 5.5.1), 1/Γ is its inverse, and both are sharp', () => {
    fc.assert(
      fc.property(argument, bits, (x, prec) => {
        if (isPole(x)) {
          expect(R.isExactZero(rgamma(x, prec))).toBe(true);
          expect(gamma(x, prec)).toBe(R.INDETERMINATE);
          return;
        }
        const g = gamma(x, prec);
        const next = R.add(x, R.ONE, 1e9);
        if (!isPole(next)) mustOverlap(gamma(next, prec), R.mul(x, g, prec), { x, prec });
        mustOverlap(R.mul(g, rgamma(x, prec), prec), R.ONE, { x, prec });
        mustOverlap(g, gamma(x, prec + 60), { x, prec });
        if (g.rad > 0) expect(R.accuracyBits(g)).toBeGreaterThan(prec - 2);
        expect(R.accuracyBits(rgamma(x, prec))).toBeGreaterThan(prec - 2);
      }),
      SOME,
    );
  });

  it('reflection Γ(x) Γ(1−x) sin πx = π (DLMF 5.5.3)', () => {
    fc.assert(
      fc.property(argument, bits, (x, prec) => {
        const y = R.sub(R.ONE, x, 1e9);
        if (isPole(x) || isPole(y)) return;
        const product = R.mul(R.mul(gamma(x, prec), gamma(y, prec), prec), sinCosPi(x, prec).sin, prec);
        mustOverlap(product, pi(prec), { x, prec });
      }),
      SOME,
    );
  });

  it('duplication Γ(2x) = 2^(2x−1) Γ(x) Γ(x+½)/√π (DLMF 5.5.5), at half integers', () => {
    for (let n = 1; n < 60; n++) {
      const x = R.ball(BigInt(n), -1);
      const left = gamma(R.mul2exp(x, 1), 200);
      const right = R.mul(gamma(x, 200), gamma(R.add(x, R.ball(1n, -1), 99), 200), 200);
      mustOverlap(left, R.div(R.mul2exp(right, n - 1), R.sqrt(pi(200), 200), 200), n);
    }
    mustOverlap(R.sqr(gamma(R.ball(1n, -1), 300), 300), pi(300), 'Γ(1/2)² = π');
  });

  it('factorials', () => {
    let f = 1n;
    for (let n = 1; n <= 400; n++) {
      mustContain(gamma(R.fromNumber(n), 200), Rational.of(f), n);
      f *= BigInt(n);
    }
  });

  it('on a ball contains what it is on points of the ball', () => {
    fc.assert(
      fc.property(
        argument,
        bits,
        fc.integer({ min: 1, max: 70 }),
        fc.integer({ min: -8, max: 8 }),
        (x, prec, k, where) => {
          if (R.isExactZero(x)) return;
          const e = R.upperBits(x) - k - 3;
          const ball = R.addError(x, 8, e);
          const inside = R.add(x, R.mul2exp(R.fromNumber(where), e), 5000);
          mustOverlap(rgamma(ball, prec), rgamma(inside, prec + 80), { x, prec, k, where });
          if (!isPole(inside)) {
            mustOverlap(gamma(ball, prec), gamma(inside, prec + 80), { x, prec, k, where });
            mustOverlap(digamma(ball, prec), digamma(inside, prec + 80), { x, prec, k, where });
          }
          if (R.isPositive(inside))
            mustOverlap(logGamma(ball, prec), logGamma(inside, prec + 80), { x, prec, k, where });
        },
      ),
      SOME,
    );
  });

  it('ends of the range', () => {
    expect(gamma(R.ball(0n, 0, 1), 53)).toBe(R.INDETERMINATE);
    expect(gamma(R.INDETERMINATE, 53)).toBe(R.INDETERMINATE);
    expect(rgamma(R.INDETERMINATE, 53)).toBe(R.INDETERMINATE);
    expect(gamma(R.mul2exp(R.ONE, 50), 53)).toBe(R.INDETERMINATE);
    const small = rgamma(R.mul2exp(R.ONE, 50), 53);
    expect(R.containsZero(small)).toBe(true);
    expect(R.upperBits(small)).toBeLessThan(-1e9);
    expect(rgamma(R.neg(R.add(R.mul2exp(R.ONE, 50), R.ball(1n, -1), 99)), 53)).toBe(R.INDETERMINATE);
    expect(logGamma(R.neg(R.ONE), 53)).toBe(R.INDETERMINATE);
    const tiny = R.ball(1n, -3000);
    mustOverlap(gamma(tiny, 200), R.sub(R.mul2exp(R.ONE, 3000), eulerGamma(200), 200), 'Γ(x) = 1/x − γ + …');
    // a wide ball on the positive axis
    const wide = gamma(R.ball(3n, 0, 1.5), 53);
    for (const x of [1.6, 2, 3, 4.4]) mustOverlap(wide, gamma(R.fromNumber(x), 80), x);
  });
});

describe('log Γ and ψ', () => {
  it('log Γ is the logarithm of Γ; sharp next to its zeros 1 and 2', () => {
    fc.assert(
      fc.property(exactBall(-60, 7, 'positive'), exactBall(-400, -1), bits, (x, d, prec) => {
        mustOverlap(logGamma(x, prec), log(gamma(x, prec), prec), { x, prec });
        const a = logGamma1p(d, prec);
        mustOverlap(a, logGamma1p(d, prec + 60), { d, prec });
        expect(R.accuracyBits(a)).toBeGreaterThan(prec - 2);
        const two = R.add(R.fromNumber(2), d, 1e9);
        mustOverlap(logGamma(two, prec), logGamma(two, prec + 60), { d, prec });
        expect(R.accuracyBits(logGamma(two, prec))).toBeGreaterThan(prec - 2);
      }),
      SOME,
    );
    expect(R.isExactZero(logGamma(R.ONE, 53))).toBe(true);
    expect(R.isExactZero(logGamma(R.fromNumber(2), 53))).toBe(true);
    expect(R.isExactZero(logGamma1p(R.ZERO, 53))).toBe(true);
  });

  it('ψ(x+1) = ψ(x) + 1/x (DLMF 5.5.2), ψ(1−x) − ψ(x) = π cot πx (DLMF 5.5.4)', () => {
    fc.assert(
      fc.property(argument, bits, (x, prec) => {
        if (R.midpoint(x).isInteger()) return;
        const p = digamma(x, prec);
        mustOverlap(digamma(R.add(x, R.ONE, 1e9), prec), R.add(p, R.div(R.ONE, x, prec), prec), { x, prec });
        const { sin, cos } = sinCosPi(x, prec);
        const cot = R.div(R.mul(pi(prec), cos, prec), sin, prec);
        mustOverlap(R.sub(digamma(R.sub(R.ONE, x, 1e9), prec), p, prec), cot, { x, prec });
        expect(R.accuracyBits(p)).toBeGreaterThan(prec - 2);
      }),
      SOME,
    );
  });

  it('ψ(1) = −γ, ψ(n+1) = H_n − γ; accurate next to its zero 1.4616…', () => {
    mustOverlap(digamma(R.ONE, 366), R.neg(eulerGamma(366)), 'ψ(1)');
    let h = Rational.ZERO;
    for (let n = 1; n < 60; n++) {
      h = h.add(Rational.of(1n, BigInt(n)));
      mustOverlap(digamma(R.fromNumber(n + 1), 200), R.sub(R.fromRational(h, 240), eulerGamma(240), 200), n);
    }
    // Newton toward the zero (DLMF 5.4.20: 1.46163 21449 68362 …) leaves a value of size 2^-40 or so.
    const near = R.fromNumber(1.4616321449683622);
    const p = digamma(near, 120);
    expect(R.upperBits(p)).toBeLessThan(-45);
    expect(R.accuracyBits(p)).toBeGreaterThan(118);
    expect(digamma(R.ZERO, 53)).toBe(R.INDETERMINATE);
    expect(digamma(R.INDETERMINATE, 53)).toBe(R.INDETERMINATE);
    expect(digamma(R.ball(-2n, 0, 0.1), 53)).toBe(R.INDETERMINATE);
  });
});

describe('ζ and Bernoulli numbers', () => {
  it('ζ(2k) = |B_2k| (2π)^2k/(2 (2k)!) (DLMF 25.6.2)', () => {
    let f = 1n;
    for (let k = 1; k <= 70; k++) {
      f *= BigInt(2 * k - 1) * BigInt(2 * k);
      const b = bernoulli(2 * k).abs();
      const power = R.powInt(R.mul2exp(pi(400), 1), 2 * k, 400);
      const value = R.mul(power, R.fromRational(Rational.of(b.num, b.den * 2n * f), 400), 400);
      mustOverlap(zeta(2 * k, 300), value, k);
    }
  });

  it('neighbouring precisions overlap, every method', () => {
    for (const n of [2, 3, 4, 5, 7, 9, 13, 21, 33, 50, 51, 99, 101, 150, 300, 1000]) {
      for (const prec of [30, 100, 366, 1200]) {
        const z = zeta(n, prec);
        expect(R.accuracyBits(z)).toBeGreaterThan(prec - 2);
        // the defining sum with its tail: ζ(n) − Σ_{k<=K} k^-n < K^(1−n)/(n−1)
        let s = R.ZERO;
        for (let k = 1; k <= 20; k++) s = R.add(s, R.fromRational(Rational.of(1n, BigInt(k) ** BigInt(n)), 2000), 2000);
        const tail = R.fromRational(Rational.of(1n, 20n ** BigInt(n - 1) * BigInt(n - 1)), 60);
        mustOverlap(z, R.widen(s, tail), { n, prec });
      }
    }
  });

  it('Σ (ζ(k) − 1) = 1 (DLMF 25.8.1)', () => {
    let s = R.ZERO;
    for (let k = 2; k < 260; k++) s = R.add(s, R.sub(zeta(k, 250), R.ONE, 250), 250);
    mustOverlap(R.addError(s, 1, -258), R.ONE, 'sum');
  });

  it('ζ at other arguments is refused', () => {
    for (const n of [1, 0, -2, 2.5]) expect(zeta(n, 53)).toBe(R.INDETERMINATE);
  });

  it('Bernoulli numbers: the recurrence Σ C(n+1, k) B_k = 0 (DLMF 24.5.3), and the known first ones', () => {
    const known = ['1', '-1/2', '1/6', '0', '-1/30', '0', '1/42', '0', '-1/30', '0', '5/66', '0', '-691/2730'];
    known.forEach((text, n) => expect(bernoulli(n).toString()).toBe(text));
    for (const n of [20, 67, 140]) {
      let sum = Rational.ZERO;
      let c = 1n;
      for (let k = 0; k <= n; k++) {
        sum = sum.add(bernoulli(k).mul(Rational.of(c)));
        c = (c * BigInt(n + 1 - k)) / BigInt(k + 1);
      }
      expect(sum.isZero()).toBe(true);
    }
  });
});

describe('torture grid: 15 to 1,000 digits, neighbouring precisions overlap', () => {
  it.each([15, 50, 110, 300, 1000])('%i digits', (digits) => {
    const prec = Math.ceil(digits * 3.33);
    for (const text of [
      '1e-20',
      '3.7e-5',
      '0.3',
      '1.5',
      '9.99',
      '-0.5',
      '-7.3',
      '123.4',
      '1e5',
      '-1e-20',
      '-2.000000001',
    ]) {
      const x = R.fromRational(Rational.parse(text)!, prec + 80);
      for (const f of [gamma, rgamma, digamma]) mustOverlap(f(x, prec), f(x, prec + 5), { text, digits });
      if (R.isPositive(x)) mustOverlap(logGamma(x, prec), logGamma(x, prec + 5), { text, digits });
    }
    for (const text of ['1e10', '1e20']) {
      const x = R.fromRational(Rational.parse(text)!, prec);
      mustOverlap(logGamma(x, prec), logGamma(x, prec + 5), { text, digits });
      mustOverlap(digamma(x, prec), digamma(x, prec + 5), { text, digits });
    }
  });
});
