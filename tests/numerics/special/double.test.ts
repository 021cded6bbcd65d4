import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  branchAlternating,
  branchAlternatingDouble,
  branchSame,
  branchSameDouble,
  C,
  digamma,
  digammaDouble,
  gamma,
  gammaDouble,
  logGamma,
  logGammaDouble,
  R,
  Rational,
  rgamma,
  rgammaDouble,
  scaledE1,
  scaledE1Double,
  zeta,
} from '../../../src/numerics/index.js';
import { EULER_DOUBLE, ZETA_MINUS_ONE } from '../../../src/numerics/special/gamma-double.js';
import { cases } from '../ball/generate.js';

/** Largest allowed errors, measured on the grids below; a regression fails. */
const ALLOWED = {
  branchSame: 2e-14, // relative to max(|F|, 1e-3)
  branchSameLarge: 3e-13, // |b| up to 300
  residue: 4e-13, // relative
  branchAlternating: 1e-14,
  scaledE1: 2e-15,
  gamma: 2e-15,
  logGamma: 1.5e-15,
  digamma: 4e-15, // relative to max(|ψ|, 1)
} as const;

/** The largest error of a list, with the place it happens at. */
class Worst {
  error = 0;
  at = '';
  see(error: number, at: string): void {
    if (!(error <= this.error)) {
      this.error = error;
      this.at = at;
    }
  }
  below(limit: number): void {
    expect(this.error, `worst at ${this.at}`).toBeLessThan(limit);
  }
}

const exponents = [
  -2.3,
  -1.7,
  -1,
  -0.51,
  -0.5,
  -0.49,
  -0.37,
  -0.001,
  0,
  1e-9,
  0.001,
  0.3951,
  0.4999,
  0.5,
  0.79,
  1,
  1 + 1e-9,
  1.5802,
  2,
  2.37,
  3.3,
  4.9,
  5,
  6.2,
];
const places = [0.2, 0.5, 0.79, 0.81, 1, 2, 3, 5, 7.5, 10, 20, 40, 45.5, 60, 100];

describe('double kernels against the balls', () => {
  it('F_b and its imaginary part, exponents of one singularity', () => {
    const pv = new Worst();
    const im = new Worst();
    for (const b of exponents) {
      for (const x of places) {
        const exact = branchSame(Rational.fromNumber(b), R.fromNumber(x), 70);
        const d = branchSameDouble(b, x);
        const value = R.toNumber(exact.pv);
        pv.see(Math.abs(d.pv - value) / Math.max(Math.abs(value), 1e-3), `b=${b} x=${x}`);
        const residue = R.toNumber(exact.im);
        if (residue === 0) expect(d.im + 0).toBe(0);
        else im.see(Math.abs(d.im / residue - 1), `b=${b} x=${x}`);
      }
    }
    pv.below(ALLOWED.branchSame);
    im.below(ALLOWED.branchSame);
  });

  it('F_b and G_b, exponents of terminants and large negative ones', () => {
    const pv = new Worst();
    const im = new Worst();
    const alternating = new Worst();
    for (const b of [10.3951, 30.25, 57.5, 100, 150.2, 200.3951, 300.7, -20.3, -55.5]) {
      for (const x of [0.3, 1, 5, 10, 30, 30.5, 57, 100, 150, 200, 290, 640, 660, 700, 1000]) {
        const exact = branchSame(Rational.fromNumber(b), R.fromNumber(x), 70);
        const d = branchSameDouble(b, x);
        const value = R.toNumber(exact.pv);
        pv.see(Math.abs(d.pv - value) / Math.max(Math.abs(value), 1e-3), `b=${b} x=${x}`);
        const residue = R.toNumber(exact.im);
        if (Math.abs(residue) > 1e-290) im.see(Math.abs(d.im / residue - 1), `b=${b} x=${x}`);
        const g = R.toNumber(branchAlternating(Rational.fromNumber(b), R.fromNumber(x), 70));
        alternating.see(Math.abs(branchAlternatingDouble(b, x) / g - 1), `b=${b} x=${x}`);
      }
    }
    pv.below(ALLOWED.branchSameLarge);
    im.below(ALLOWED.residue);
    alternating.below(ALLOWED.branchAlternating);
  });

  it('G_b', () => {
    const w = new Worst();
    for (const b of exponents) {
      for (const x of [0.001, 0.05, ...places]) {
        const exact = R.toNumber(branchAlternating(Rational.fromNumber(b), R.fromNumber(x), 70));
        w.see(Math.abs(branchAlternatingDouble(b, x) / exact - 1), `b=${b} x=${x}`);
      }
    }
    w.below(ALLOWED.branchAlternating);
  });

  it('e^w E₁(w) on |w| in [0.01, 200], |arg w| <= 179.5°', () => {
    const worst = new Worst();
    for (const r of [0.01, 0.1, 0.5, 0.99, 1.01, 1.4, 1.6, 2, 3, 4, 6, 8, 12, 16, 24, 40, 49, 51, 80, 200]) {
      for (const a of [0, 10, 30, 45, 60, 90, 100, 120, 135, 150, 160, 170, 175, 179, 179.5]) {
        const re = r * Math.cos((a * Math.PI) / 180);
        const im = r * Math.sin((a * Math.PI) / 180);
        const exact = C.toNumbers(scaledE1(C.fromNumbers(re, im), 70));
        const d = scaledE1Double(re, im);
        worst.see(Math.hypot(d.re - exact.re, d.im - exact.im) / Math.hypot(exact.re, exact.im), `|w|=${r} arg=${a}°`);
        const conj = scaledE1Double(re, -im);
        expect(conj.re).toBe(d.re);
        expect(conj.im + 0).toBe(-d.im + 0);
      }
    }
    worst.below(ALLOWED.scaledE1);
  });

  it('refused arguments give NaN', () => {
    expect(scaledE1Double(-1, 0)).toEqual({ re: NaN, im: NaN });
    expect(scaledE1Double(0, 0)).toEqual({ re: NaN, im: NaN });
    expect(branchSameDouble(0.5, 0)).toEqual({ pv: NaN, im: NaN });
    expect(branchSameDouble(NaN, 1)).toEqual({ pv: NaN, im: NaN });
    expect(branchAlternatingDouble(0.5, -1)).toBeNaN();
  });
});

describe('Γ, log Γ and ψ in doubles against the balls', () => {
  it('random arguments', () => {
    const g = new Worst();
    const l = new Worst();
    const p = new Worst();
    fc.assert(
      fc.property(
        fc.double({ min: -140, max: 170, noNaN: true }),
        fc.double({ min: -9, max: 9, noNaN: true }),
        (x, e) => {
          if (!(x <= 0 && Number.isInteger(x)) && Math.abs(x) > 1e-300) {
            const exact = R.toNumber(gamma(R.fromNumber(x), 70));
            if (Math.abs(exact) > 1e-290 && Math.abs(exact) < 1e300) {
              g.see(Math.abs(gammaDouble(x) / exact - 1), String(x));
              g.see(Math.abs(rgammaDouble(x) * exact - 1), `1/Γ ${x}`);
            }
            const psi = R.toNumber(digamma(R.fromNumber(x), 70));
            if (x > -20) p.see(Math.abs(digammaDouble(x) - psi) / Math.max(1, Math.abs(psi)), String(x));
          }
          const y = Math.exp(e);
          const exact = R.toNumber(logGamma(R.fromNumber(y), 70));
          if (exact !== 0) l.see(Math.abs(logGammaDouble(y) / exact - 1), String(y));
        },
      ),
      { ...cases(1000), endOnFailure: true },
    );
    g.below(ALLOWED.gamma);
    l.below(ALLOWED.logGamma);
    p.below(ALLOWED.digamma);
  });

  it('edges', () => {
    for (const n of [0, -1, -7]) {
      expect(gammaDouble(n)).toBeNaN();
      expect(digammaDouble(n)).toBeNaN();
      expect(rgammaDouble(n)).toBe(0);
    }
    expect(gammaDouble(5)).toBe(24);
    expect(gammaDouble(180)).toBe(Infinity);
    expect(rgammaDouble(180)).toBe(0);
    expect(logGammaDouble(0)).toBe(Infinity);
    expect(logGammaDouble(-1)).toBeNaN();
    expect(logGammaDouble(1) + 0).toBe(0);
    expect(logGammaDouble(2)).toBe(0);
    expect(R.toNumber(rgamma(R.fromNumber(-20.5), 70)) / rgammaDouble(-20.5)).toBeCloseTo(1, 13);
  });

  it('the tabulated ζ(k) − 1 and γ', () => {
    ZETA_MINUS_ONE.forEach((v, i) => expect(v).toBe(R.toNumber(R.sub(zeta(i + 2, 200), R.ONE, 60))));
    expect(-R.toNumber(digamma(R.ONE, 80))).toBe(EULER_DOUBLE);
  });
});
