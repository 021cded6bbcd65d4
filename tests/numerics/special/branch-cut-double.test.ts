/** @module G_b(w) in doubles on the cut plane against enclosures. */
import { expect, test } from 'vitest';
import { branchCut, branchCutDouble, C, R, Rational, scaledE1Double } from '../../../src/numerics/index.js';

/** Largest relative error on the grid; measured, a regression fails. */
const ALLOWED = 1e-14;

test('agrees with the enclosure on a grid of exponents, moduli and angles', () => {
  const exponents = [-0.9, -0.5, -0.3, 0, 1e-9, 0.3951, 0.5, 1, 1.000001, 1.58, 3, 7];
  const moduli = [0.01, 0.5, 0.99, 1.01, 2, 3, 6, 12, 25, 49.9, 60, 200];
  const degrees = [0.5, 20, 60, 85, 95, 120, 150, 175, 179.5];
  let worst = 0;
  let at = '';
  for (const b of exponents) {
    for (const size of moduli) {
      for (const angle of degrees) {
        const re = size * Math.cos((angle * Math.PI) / 180);
        const im = size * Math.sin((angle * Math.PI) / 180);
        const exact = C.toNumbers(
          branchCut(Rational.fromNumber(b), { re: R.fromNumber(re), im: R.fromNumber(im) }, 80),
        );
        const found = branchCutDouble(b, re, im);
        const error = Math.hypot(found.re - exact.re, found.im - exact.im) / Math.hypot(exact.re, exact.im);
        if (!(error <= worst)) [worst, at] = [error, `b = ${b}, |w| = ${size}, ${angle}°`];
      }
    }
  }
  expect(worst, at).toBeLessThan(ALLOWED);
});

test('b = 0 is e^w E₁(w); conjugate points give conjugate values', () => {
  const [a, b] = [branchCutDouble(0, -3, 2), scaledE1Double(-3, 2)];
  expect(Math.hypot(a.re - b.re, a.im - b.im)).toBeLessThan(1e-15);
  const [up, down] = [branchCutDouble(0.4, 1, 2), branchCutDouble(0.4, 1, -2)];
  expect([up.re, up.im]).toEqual([down.re, -down.im]);
});

test('refused: the cut, zero, b not above −1', () => {
  for (const [b, re, im] of [
    [0.4, -1, 0],
    [0.4, 0, 0],
    [-1, 1, 1],
    [NaN, 1, 1],
  ] as const)
    expect(branchCutDouble(b, re, im).re).toBeNaN();
});
