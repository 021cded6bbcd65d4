import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import * as C from '../../../src/numerics/ball/complex.js';
import * as R from '../../../src/numerics/ball/real.js';
import { exact } from '../../../src/numerics/exact.js';
import {
  certifiedRoots,
  DoubleRoots,
  PadeDouble,
  padeDouble,
  padePoles,
  rootsDouble,
} from '../../../src/numerics/polynomial/index.js';
import { Rational } from '../../../src/numerics/rational.js';
import { MULTIPLIER, borelSeries } from './random.js';

const sorted = (z: { re: number; im: number }[]): { re: number; im: number }[] =>
  z.toSorted((a, b) => Math.hypot(a.re, a.im) - Math.hypot(b.re, b.im) || b.im - a.im);

describe('roots in doubles', () => {
  test('agree with the certified ones where these are well separated', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: -1000, max: 1000 }), { minLength: 2, maxLength: 8 }), (a) => {
        fc.pre(a[a.length - 1] !== 0 && a[0] !== 0);
        const certified = certifiedRoots(
          a.map((c) => Rational.of(c)),
          60,
        );
        if ('failed' in certified) throw new Error(certified.failed);
        const z = certified.roots.map((r) => C.toNumbers(r.value));
        const gap = (i: number): number =>
          Math.min(...z.map((w, j) => (j === i ? Infinity : Math.hypot(w.re - z[i]!.re, w.im - z[i]!.im))));
        fc.pre(z.length === a.length - 1 && z.every((w, i) => gap(i) > 0.05 * Math.hypot(w.re, w.im)));
        const found = rootsDouble(a);
        expect(found).toBeDefined();
        for (const [i, w] of z.entries()) {
          const home = found!.filter((v) => Math.hypot(v.re - w.re, v.im - w.im) <= 1e-8 * Math.hypot(w.re, w.im));
          expect(home.length).toBe(1);
          expect(home[0]!.im === 0).toBe(certified.roots[i]!.real);
        }
      }),
      { numRuns: 300 * MULTIPLIER },
    );
  });

  test('pairs are exact conjugates, upper member first', () => {
    const found = rootsDouble([5, -4, 3, -2, 1])!;
    expect(found.length).toBe(4);
    for (let i = 0; i < 4; i += 2) {
      expect(found[i]!.im).toBeGreaterThan(0);
      expect(found[i + 1]).toEqual({ re: found[i]!.re, im: -found[i]!.im });
    }
  });

  test('zeros at both ends of the coefficients, extreme sizes, refusals', () => {
    expect(sorted(rootsDouble([0, 0, 6, -5, 1, 0])!).map((z) => z.re)).toEqual([
      0,
      0,
      expect.closeTo(2, 12),
      expect.closeTo(3, 12),
    ]);
    const wide = sorted(rootsDouble([1e-250, 1, 1e200])!);
    expect(wide.map((z) => z.re)).toEqual([expect.closeTo(-1e-250, 260), expect.closeTo(-1e-200, 210)]);
    expect(Math.abs(wide[0]!.re / -1e-250 - 1)).toBeLessThan(1e-12);
    expect(Math.abs(wide[1]!.re / -1e-200 - 1)).toBeLessThan(1e-12);
    expect(rootsDouble([3])).toEqual([]);
    expect(rootsDouble([0, 0])).toBeUndefined();
    expect(rootsDouble([1, Number.NaN, 1])).toBeUndefined();
    expect(rootsDouble([1, Infinity, 1])).toBeUndefined();
  });

  test('one workspace serves many polynomials', () => {
    const work = new DoubleRoots(5);
    expect(work.find([-2, 1], 1) && work.re[0]).toBe(2);
    expect(work.find([-6, 11, -6, 1], 3)).toBe(true);
    expect(Array.from(work.re.slice(0, work.count)).sort((a, b) => a - b)).toEqual(
      [1, 2, 3].map((x) => expect.closeTo(x, 10)),
    );
    expect(work.find([1, 0, 1], 2) && Array.from(work.im.slice(0, 2))).toEqual([
      expect.closeTo(1, 14),
      expect.closeTo(-1, 14),
    ]);
  });
});

describe('approximants in doubles', () => {
  test('follow the certified poles and amplitudes as far as doubles go', () => {
    const b = borelSeries(9);
    for (const [L, M, digits] of [
      [1, 2, 11],
      [2, 2, 11],
      [3, 2, 10],
      [3, 4, 8],
    ] as const) {
      const truth = padePoles(
        b.map((c) => exact(c)),
        L,
        M,
        80,
      );
      if (!truth.exists) throw new Error(truth.reason);
      const work = new PadeDouble(L, M);
      expect(work.fit(b.map((c) => c.toNumber())) && work.findPoles()).toBe(true);
      expect(work.poleCount).toBe(M);
      for (const pole of truth.poles) {
        const z = C.toNumbers(pole.position);
        const a = C.toNumbers(pole.amplitude);
        const k = [...work.poleRe.keys()].find(
          (i) => Math.hypot(work.poleRe[i]! - z.re, work.poleIm[i]! - z.im) < 10 ** -digits * Math.hypot(z.re, z.im),
        );
        expect(k).toBeDefined();
        expect(work.amplitudeRe[k!]).toBeCloseTo(a.re, digits - 3);
        expect(work.amplitudeIm[k!]).toBeCloseTo(a.im, digits - 3);
      }
      expect(work.polynomialLength).toBe(Math.max(0, L - M + 1));
      truth.polynomial.forEach((c, i) => expect(work.polynomial[i]).toBeCloseTo(R.toNumber(c), digits - 3));
    }
  });

  test('partial fractions and the quotient are the same function', () => {
    const work = new PadeDouble(4, 3);
    const b = borelSeries(8).map((c) => c.toNumber());
    expect(work.fit(b) && work.findPoles()).toBe(true);
    for (const t of [-0.7, 0.05, 0.2]) {
      let total = 0;
      for (let k = work.polynomialLength - 1; k >= 0; k--) total = total * t + work.polynomial[k]!;
      for (let k = 0; k < work.poleCount; k++) {
        // Re A/(1 − t/z) = Re A z/(z − t)
        const [x, y, ar, ai] = [work.poleRe[k]!, work.poleIm[k]!, work.amplitudeRe[k]!, work.amplitudeIm[k]!];
        const [nr, ni, dr] = [ar * x - ai * y, ar * y + ai * x, x - t];
        total += (nr * dr + ni * y) / (dr * dr + y * y);
      }
      expect(total).toBeCloseTo(work.evaluate(t), 9);
    }
  });

  test('complex amplitudes', () => {
    // 1/(1 + t²) = Re[(1 − i·0)/…]: poles ±i with amplitude 1/2 each
    const work = new PadeDouble(0, 2);
    expect(work.fit([1, 0, -1]) && work.findPoles()).toBe(true);
    expect([...work.amplitudeRe]).toEqual([expect.closeTo(0.5, 14), expect.closeTo(0.5, 14)]);
    expect([...work.amplitudeIm]).toEqual([expect.closeTo(0, 14), expect.closeTo(0, 14)]);
    // (2 + 4t)/(1 + t²): residue at i is (2 + 4i)/(2i) = 2 − i, amplitude −(2 − i)/i = 1 + 2i
    const tilted = new PadeDouble(1, 2);
    expect(tilted.fit([2, 4, -2, -4]) && tilted.findPoles()).toBe(true);
    expect(tilted.poleIm[0]).toBeCloseTo(1, 14);
    expect(tilted.amplitudeRe[0]).toBeCloseTo(1, 13);
    expect(tilted.amplitudeIm[0]).toBeCloseTo(2, 13);
    expect(tilted.amplitudeIm[1]).toBeCloseTo(-2, 13);
  });

  test('singular systems and infinities are refused, near ones show in pivotRatio', () => {
    expect(padeDouble([1, 0, 1], 1, 1)).toBeUndefined();
    expect(padeDouble([1, 2, 4, 8, 16], 2, 2)).toBeUndefined();
    expect(padeDouble([1, Infinity, 3], 1, 1)).toBeUndefined();
    const near = padeDouble([1, 2, 4, 8 * (1 + 1e-13), 17], 2, 2);
    expect(near!.pivotRatio).toBeLessThan(1e-12);
    expect(
      padeDouble(
        borelSeries(5).map((c) => c.toNumber()),
        2,
        2,
      )!.pivotRatio,
    ).toBeGreaterThan(1e-4);
    expect([...padeDouble([3, 1, 4], 2, 0)!.numerator]).toEqual([3, 1, 4]);
  });
});
