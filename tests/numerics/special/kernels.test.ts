import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  branchAlternating,
  branchCut,
  branchSame,
  C,
  eiScaled,
  exact,
  exactReal,
  exp,
  gamma,
  log,
  pi,
  R,
  Rational,
  rgamma,
  scaledE1,
  sinCosPi,
} from '../../../src/numerics/index.js';
import type { Ball, Complex } from '../../../src/numerics/index.js';
import { cases, exactBall, mustContain, mustOverlap } from '../ball/generate.js';

const bits = fc.constantFrom(30, 53, 120, 366);
const SOME = cases(200);

/** Exponents: integers, next to integers, thirds and decimals, terminant sizes, large negative ones. */
const exponent: fc.Arbitrary<Rational> = fc.oneof(
  fc.integer({ min: -6, max: 14 }).map((n) => Rational.of(n)),
  fc
    .tuple(fc.integer({ min: -3, max: 9 }), fc.integer({ min: 3, max: 200 }), fc.boolean())
    .map(([n, e, s]) => Rational.of(n).add(Rational.of(s ? 1n : -1n, 10n ** BigInt(e)))),
  fc.integer({ min: -400, max: 1200 }).map((n) => Rational.of(BigInt(n), 81n)),
  fc.integer({ min: 0, max: 350_000 }).map((n) => Rational.of(BigInt(n), 1000n)),
  fc.integer({ min: -40_000, max: 0 }).map((n) => Rational.of(BigInt(n), 777n)),
  exactBall(-80, 4).map((b) => R.midpoint(b)),
);
const argument = fc.oneof(exactBall(-12, 9, 'positive'), exactBall(-70, 70, 'positive'));
const plane: fc.Arbitrary<Complex> = fc.oneof(
  fc.tuple(exactBall(-10, 8), exactBall(-10, 8)).map(([re, im]) => ({ re, im })),
  // along both sides of the cut
  fc.tuple(exactBall(-4, 8, 'positive'), exactBall(-60, 1)).map(([re, im]) => ({ re: R.neg(re), im })),
);

const ball = (q: Rational, prec: number): Ball => R.fromRational(q, prec + 40);

function overlap(a: Complex, b: Complex, context: unknown): void {
  mustOverlap(a.re, b.re, context);
  mustOverlap(a.im, b.im, context);
}

describe('F_b', () => {
  it('b F_b = x F_(b−1) − 1, and the same for the imaginary part without the 1', () => {
    fc.assert(
      fc.property(exponent, argument, bits, (b, x, prec) => {
        const f = branchSame(b, x, prec);
        const g = branchSame(b.sub(Rational.ONE), x, prec);
        const bb = ball(b, prec);
        mustOverlap(R.mul(bb, f.pv, prec), R.sub(R.mul(x, g.pv, prec), R.ONE, prec), { b, x, prec });
        mustOverlap(R.mul(bb, f.im, prec), R.mul(x, g.im, prec), { b, x, prec });
      }),
      SOME,
    );
  });

  it('neighbouring precisions overlap, and the result is sharp', () => {
    fc.assert(
      fc.property(exponent, argument, bits, (b, x, prec) => {
        const f = branchSame(b, x, prec);
        const g = branchSame(b, x, prec + 31);
        mustOverlap(f.pv, g.pv, { b, x, prec });
        mustOverlap(f.im, g.im, { b, x, prec });
        expect(R.accuracyBits(f.pv), `pv b=${b.toString()} x=${x.mid}·2^${x.exp} ${prec}`).toBeGreaterThan(prec - 2);
        if (!R.isExactZero(f.im) && R.upperBits(f.im) > -1e6) {
          expect(R.accuracyBits(f.im), `im b=${b.toString()} x=${x.mid}·2^${x.exp} ${prec}`).toBeGreaterThan(prec - 2);
        }
      }),
      SOME,
    );
  });

  it('im = π x^b e^−x/Γ(1+b)', () => {
    fc.assert(
      fc.property(exponent, exactBall(-12, 7, 'positive'), bits, (b, x, prec) => {
        const work = prec + 30;
        const power = exp(R.sub(R.mul(ball(b, work), log(x, work), work), x, work), work);
        const value = R.mul(R.mul(pi(work), power, work), rgamma(ball(b.add(Rational.ONE), work), work), work);
        mustOverlap(branchSame(b, x, prec).im, value, { b, x, prec });
      }),
      SOME,
    );
  });

  it('an uncertain x or b contains the values at its points', () => {
    fc.assert(
      fc.property(
        exponent,
        argument,
        bits,
        fc.integer({ min: 4, max: 80 }),
        fc.tuple(fc.integer({ min: -8, max: 8 }), fc.integer({ min: -8, max: 8 })),
        (b, x, prec, k, [i, j]) => {
          const e = R.upperBits(x) - k - 3;
          const wide = R.addError(x, 8, e);
          const inside = R.add(x, R.mul2exp(R.fromNumber(i), e), 5000);
          const mid = R.exactMid(ball(b, 200));
          const wideB = R.addError(mid, 8, -k - 3);
          const insideB = R.midpoint(R.add(mid, R.ball(BigInt(j), -k - 3), 5000));
          const context = { b, x, prec, k, i, j };
          const reference = branchSame(insideB, inside, prec + 60);
          const value = branchSame(wideB, wide, prec);
          mustOverlap(value.pv, reference.pv, context);
          mustOverlap(value.im, reference.im, context);
          mustOverlap(branchSame(insideB, wide, prec).pv, reference.pv, context);
          mustOverlap(branchSame(insideB, wide, prec).im, reference.im, context);
          mustOverlap(branchAlternating(wideB, wide, prec), branchAlternating(insideB, inside, prec + 60), context);
        },
      ),
      SOME,
    );
  });

  it('a small radius of x grows by the slope of F only', () => {
    for (const [b, x] of [
      ['0.3951', 3],
      ['0', 20],
      ['2', 200],
      ['30.25', 30],
      ['0.5', 5000],
    ] as const) {
      const prec = 366;
      const wide = R.addError(R.fromNumber(x), 1, -prec);
      expect(R.accuracyBits(branchSame(Rational.parse(b)!, wide, prec).pv), `${b} ${x}`).toBeGreaterThan(prec - 9);
      expect(R.accuracyBits(branchAlternating(Rational.parse(b)!, wide, prec)), `${b} ${x}`).toBeGreaterThan(prec - 3);
    }
  });

  it('exponents as exact reals: π/8 and √2 enclosed to any precision', () => {
    const b = exactReal((prec) => R.mul2exp(pi(prec), -3));
    const c = exactReal((prec) => R.sqrt(R.fromNumber(2), prec));
    for (const prec of [53, 366]) {
      for (const e of [b, c]) {
        const f = branchSame(e, R.fromNumber(7), prec);
        expect(R.accuracyBits(f.pv)).toBeGreaterThan(prec - 2);
        expect(R.accuracyBits(f.im)).toBeGreaterThan(prec - 2);
        mustOverlap(f.pv, branchSame(e, R.fromNumber(7), prec + 50).pv, prec);
        expect(R.accuracyBits(branchAlternating(e, R.fromNumber(7), prec))).toBeGreaterThan(prec - 2);
      }
    }
    mustOverlap(
      branchSame(exact(2), R.fromNumber(5), 100).pv,
      branchSame(Rational.of(2), R.fromNumber(5), 100).pv,
      'exact rational',
    );
  });

  it('exponents of some thousands', () => {
    for (const b of ['1500.3', '5000', '4999.9999999', '-3000.5', '-2000']) {
      const e = Rational.parse(b)!;
      const below = e.sub(Rational.ONE);
      for (const x of [0.5, 40, 4900]) {
        const q = R.fromNumber(x);
        const f = branchSame(e, q, 100);
        expect(R.accuracyBits(f.pv), `F ${b} ${x}`).toBeGreaterThan(98);
        mustOverlap(R.mul(ball(e, 100), f.pv, 100), R.sub(R.mul(q, branchSame(below, q, 100).pv, 100), R.ONE, 100), {
          b,
          x,
        });
        const w: Complex = { re: R.fromNumber(x * 0.6), im: R.fromNumber(x * 0.8) };
        const g = branchCut(e, w, 100);
        expect(C.accuracyBits(g), `G ${b} ${x}`).toBeGreaterThan(97);
        const right = C.sub(C.ONE, C.mul(w, branchCut(below, w, 100), 100), 100);
        overlap(C.mulReal(g, ball(e, 100), 100), right, { b, x });
      }
    }
  });

  it('refused arguments', () => {
    expect(branchSame(Rational.ZERO, R.ZERO, 53).pv).toBe(R.INDETERMINATE);
    expect(branchSame(Rational.ZERO, R.fromNumber(-1), 53).im).toBe(R.INDETERMINATE);
    expect(branchSame(Rational.of(100_000), R.ONE, 53).pv).toBe(R.INDETERMINATE);
    expect(branchSame(R.INDETERMINATE, R.ONE, 53).pv).toBe(R.INDETERMINATE);
    expect(branchAlternating(Rational.ZERO, R.ZERO, 53)).toBe(R.INDETERMINATE);
    expect(branchAlternating(R.ball(1n, 20), R.ONE, 53)).toBe(R.INDETERMINATE);
    expect(branchCut(Rational.ZERO, C.fromNumbers(-1, 0), 53)).toBe(C.INDETERMINATE);
    expect(branchCut(Rational.of(40_000), C.I, 53)).toBe(C.INDETERMINATE);
    expect(scaledE1(C.fromNumbers(-1, 0), 53)).toBe(C.INDETERMINATE);
    expect(scaledE1({ re: R.fromNumber(-1), im: R.ball(0n, 0, 1) }, 53)).toBe(C.INDETERMINATE);
    // nothing useful, but nothing wrong: balls as wide as their midpoints
    for (const b of [R.ball(1n, 0, 3), R.ball(-3n, 0, 2)]) {
      const f = branchSame(b, R.ball(3n, 0, 2.5), 53);
      mustOverlap(f.pv, branchSame(R.midpoint(b), R.fromNumber(1), 53).pv, b);
      mustOverlap(f.im, branchSame(R.midpoint(b), R.fromNumber(5), 53).im, b);
    }
  });
});

describe('G_b', () => {
  it('b G_b = 1 − x G_(b−1), real and complex', () => {
    fc.assert(
      fc.property(exponent, argument, plane, bits, (b, x, w, prec) => {
        const bb = ball(b, prec);
        const c = b.sub(Rational.ONE);
        const left = R.mul(bb, branchAlternating(b, x, prec), prec);
        mustOverlap(left, R.sub(R.ONE, R.mul(x, branchAlternating(c, x, prec), prec), prec), { b, x, prec });
        const cl = C.mulReal(branchCut(b, w, prec), bb, prec);
        overlap(cl, C.sub(C.ONE, C.mul(w, branchCut(c, w, prec), prec), prec), { b, w, prec });
      }),
      SOME,
    );
  });

  it('neighbouring precisions overlap, and the result is sharp', () => {
    fc.assert(
      fc.property(exponent, argument, plane, bits, (b, x, w, prec) => {
        const g = branchAlternating(b, x, prec);
        mustOverlap(g, branchAlternating(b, x, prec + 31), { b, x, prec });
        expect(R.accuracyBits(g), `b=${b.toString()} x=${x.mid}·2^${x.exp} ${prec}`).toBeGreaterThan(prec - 2);
        const c = branchCut(b, w, prec);
        overlap(c, branchCut(b, w, prec + 31), { b, w, prec });
        expect(C.accuracyBits(c), `b=${b.toString()} w=${JSON.stringify(C.toNumbers(w))} ${prec}`).toBeGreaterThan(
          prec - 3,
        );
        overlap(C.conj(c), branchCut(b, C.conj(w), prec), { b, w, prec });
      }),
      SOME,
    );
  });

  it('the two sides of the cut: G_b(−x ∓ i0) = −F_b ± i Im', () => {
    fc.assert(
      fc.property(exponent, exactBall(-6, 8, 'positive'), (b, x) => {
        if (b.cmp(Rational.of(60)) > 0) return;
        // a step of 2^-300 beside the cut changes less than 2^-120
        const w: Complex = { re: R.neg(x), im: R.mul2exp(R.neg(x), -400) };
        const g = branchCut(b, w, 150);
        const f = branchSame(b, x, 150);
        const slack = (v: Ball): Ball =>
          R.addError(R.addRelativeError(v, 1, -120), 1, Math.max(R.upperBits(f.pv), R.upperBits(f.im), -100) - 120);
        mustOverlap(slack(R.neg(g.re)), f.pv, { b, x });
        mustOverlap(slack(g.im), f.im, { b, x });
      }),
      SOME,
    );
  });

  it('an uncertain w contains the values at its points', () => {
    fc.assert(
      fc.property(
        exponent,
        plane,
        bits,
        fc.integer({ min: 6, max: 80 }),
        fc.integer({ min: -8, max: 8 }),
        fc.integer({ min: -8, max: 8 }),
        (b, w, prec, k, i, j) => {
          const er = R.upperBits(w.re) - k;
          const ei = R.upperBits(w.im) - k;
          const wide: Complex = { re: R.addError(w.re, 8, er), im: R.addError(w.im, 8, ei) };
          const inside: Complex = {
            re: R.add(w.re, R.ball(BigInt(i), er), 5000),
            im: R.add(w.im, R.ball(BigInt(j), ei), 5000),
          };
          overlap(branchCut(b, wide, prec), branchCut(b, inside, prec + 60), { b, w, prec, k, i, j });
          overlap(scaledE1(wide, prec), scaledE1(inside, prec + 60), { w, prec, k, i, j });
        },
      ),
      SOME,
    );
  });

  it('half-integer exponents: G_(−1/2)(x) = √π e^x erfc(√x)/√x is √(π/x) minus the error-function series', () => {
    // e^x erfc(√x) = e^x − 2√x/√π Σ (2x)^k/(2k+1)!! (DLMF 7.6.2)
    for (const x of [0.01, 0.5, 2, 5]) {
      const q = R.fromNumber(x);
      let s = R.ZERO;
      let t = R.ONE;
      for (let k = 0; k < 200; k++) {
        s = R.add(s, t, 400);
        t = R.div(R.mul(t, R.mul2exp(q, 1), 400), R.fromNumber(2 * k + 3), 400);
      }
      const root = R.sqrt(q, 400);
      const erfc = R.sub(exp(q, 400), R.mul(R.div(R.mul2exp(root, 1), R.sqrt(pi(400), 400), 400), s, 400), 400);
      const value = R.mul(R.div(R.sqrt(pi(400), 400), root, 400), erfc, 200);
      mustOverlap(branchAlternating(Rational.of(-1n, 2n), q, 200), R.addError(value, 1, -150), x);
    }
  });

  it('integer exponents: G_(−n−1)(x) = Σ_k n!/(n−k)! x^(−k−1) ends (DLMF 8.4.8)', () => {
    for (const n of [0, 1, 2, 5, 12]) {
      for (const x of [0.25, 1, 3, 40]) {
        let s = Rational.ZERO;
        let t = Rational.ONE;
        for (let k = 0; k <= n; k++) {
          t = k === 0 ? Rational.fromNumber(x).inv() : t.mul(Rational.of(n - k + 1)).div(Rational.fromNumber(x));
          s = s.add(t);
        }
        mustContain(branchAlternating(Rational.of(-n - 1), R.fromNumber(x), 150), s, { n, x });
      }
    }
  });
});

describe('e^w E₁(w) and e^−x Ei(x)', () => {
  it('are the kernels at b = 0', () => {
    fc.assert(
      fc.property(plane, exactBall(-12, 9, 'positive'), bits, (w, x, prec) => {
        const e = scaledE1(w, prec);
        overlap(e, branchCut(Rational.ZERO, w, prec), { w, prec });
        expect(C.accuracyBits(e)).toBeGreaterThan(prec - 3);
        mustOverlap(eiScaled(x, prec), branchSame(Rational.ZERO, x, prec).pv, { x, prec });
        const real = scaledE1(C.fromReal(x), prec);
        expect(R.isExactZero(real.im)).toBe(true);
        mustOverlap(real.re, branchAlternating(Rational.ZERO, x, prec), { x, prec });
      }),
      SOME,
    );
  });

  it('derivative: E′ = E − 1/w, by a symmetric difference', () => {
    fc.assert(
      fc.property(plane, (w) => {
        const scale = C.upperBits(w);
        const step = C.mul2exp(C.ONE, scale - 60);
        const far = C.toNumbers(C.mul2exp(w, -scale));
        if (Math.hypot(far.re, far.im) < 0.1 || (far.re < 0 && Math.abs(far.im) < 1e-3)) return;
        const up = scaledE1(C.add(w, step, 2000), 300);
        const down = scaledE1(C.sub(w, step, 2000), 300);
        const slope = C.mul2exp(C.sub(up, down, 300), 59 - scale);
        const value = C.sub(scaledE1(w, 300), C.inv(w, 300), 300);
        // third derivative times the step squared: below 2^-90 relative to |E|/|w|^…, taken generously
        const slack = Math.max(C.upperBits(slope), -scale) - 80 + Math.max(0, 2 * scale);
        overlap({ re: R.addError(slope.re, 1, slack), im: R.addError(slope.im, 1, slack) }, value, { w });
      }),
      SOME,
    );
  });

  it('bounds of DLMF 6.8.1–6.8.2: x/(x+1) < x e^x E₁(x) < (x+1)/(x+2), ½ ln(1+2/x) < e^x E₁(x) < ln(1+1/x)', () => {
    for (const x of [0.01, 0.3, 1, 4, 25, 300]) {
      const q = R.fromNumber(x);
      const e = scaledE1(C.fromReal(q), 100).re;
      const below = R.div(R.ONE, R.add(q, R.ONE, 100), 100);
      const above = R.div(R.add(q, R.ONE, 100), R.mul(q, R.add(q, R.fromNumber(2), 100), 100), 100);
      expect(R.compare(e, below, 100)).toBe(1);
      expect(R.compare(e, above, 100)).toBe(-1);
      const half = R.mul2exp(log(R.add(R.ONE, R.div(R.fromNumber(2), q, 100), 100), 100), -1);
      expect(R.compare(e, half, 100)).toBe(1);
      expect(R.compare(e, log(R.add(R.ONE, R.div(R.ONE, q, 100), 100), 100), 100)).toBe(-1);
    }
  });
});

describe('reflection between the kernels', () => {
  it('F_b(x) e^x + cos πb Γ(−b) x^b is the entire sum, for b away from integers', () => {
    fc.assert(
      fc.property(fc.integer({ min: -300, max: 700 }), exactBall(-6, 5, 'positive'), (n, x) => {
        if (n % 81 === 0) return;
        const b = Rational.of(BigInt(n), 81n);
        const bb = ball(b, 250);
        let s = R.ZERO;
        let t = R.ONE;
        for (let k = 0; k < 400; k++) {
          s = R.add(s, R.div(t, R.sub(R.fromNumber(k), bb, 300), 300), 300);
          t = R.div(R.mul(t, x, 300), R.fromNumber(k + 1), 300);
        }
        const power = exp(R.mul(bb, log(x, 300), 300), 300);
        const other = R.mul(R.mul(gamma(R.neg(bb), 300), power, 300), sinCosPi(bb, 300).cos, 300);
        mustOverlap(branchSame(b, x, 150).pv, R.mul(exp(R.neg(x), 300), R.sub(s, other, 300), 200), { n, x });
      }),
      cases(100),
    );
  });
});

describe('torture grid', () => {
  const directions = [
    [1, 0],
    [0.6, 0.8],
    [0, 1],
    [-0.6, 0.8],
    [-1, 1e-9],
  ] as const;
  it.each([15, 50, 110, 300, 1000])(
    '%i digits, 1e-20 to 1e20 in five directions, neighbouring precisions overlap',
    (digits) => {
      const prec = Math.ceil(digits * 3.33);
      const exponents = digits > 300 ? ['0', '0.3951'] : ['0', '0.3951', '1.000000001', '-2.5', '57.21'];
      const start = performance.now();
      for (const e of digits > 300 ? [-20, 0, 2, 20] : [-20, -8, -2, -1, 0, 1, 2, 3, 8, 20]) {
        for (const [c, s] of directions) {
          const w: Complex = {
            re: R.mul(R.fromNumber(c), R.fromRational(Rational.parse(`2.3e${e}`)!, prec), prec),
            im: R.mul(R.fromNumber(s), R.fromRational(Rational.parse(`2.3e${e}`)!, prec), prec),
          };
          for (const text of exponents) {
            const b = Rational.parse(text)!;
            overlap(branchCut(b, w, prec), branchCut(b, w, prec + 5), { e, c, s, text, digits });
            if (s !== 0) continue;
            const f = branchSame(b, w.re, prec);
            const g = branchSame(b, w.re, prec + 5);
            mustOverlap(f.pv, g.pv, { e, text, digits });
            mustOverlap(f.im, g.im, { e, text, digits });
          }
        }
      }
      expect(performance.now() - start).toBeLessThan(60_000);
    },
  );
});
