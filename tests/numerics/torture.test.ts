/**
 * Special functions from 1e-20 to 1e20 in five directions of the plane, at 15 to 1,000 digits: neighbouring precisions overlap, the answer is no
 * shrug, and no point takes long. The limit is CPU time, generous for a busy machine: a hang or an exploding sum breaks it.
 */
import { describe, expect, it } from 'vitest';
import { C, R } from '../../src/numerics/index.js';
import { COMPLEX, DIRECTIONS, planePoint, pointsOf, real, REAL } from './tightness.js';

const DIGITS = [15, 50, 110, 300, 1000];
const bits = (digits: number): number => Math.ceil(digits * Math.log2(10));
/** CPU seconds of one point. */
const LIMIT = 15;

function timed<T>(run: () => T, what: string): T {
  const before = process.cpuUsage();
  const value = run();
  const { user, system } = process.cpuUsage(before);
  expect((user + system) / 1e6, what).toBeLessThan(LIMIT);
  return value;
}

describe('on the real line', () => {
  const special = REAL.filter(({ name }) => /Γ|ψ|ζ|F_b|G_b|Ei|E₁|tanh/.test(name));
  it.each(special.map((f) => [f.name, f] as const))('%s', (name, { f, domain }) => {
    const points = pointsOf(domain);
    DIGITS.forEach((digits, k) => {
      const prec = bits(digits);
      // All points at few digits, every sixth at many.
      points.forEach((text, i) => {
        if (digits > 110 && i % 6 !== k % 6) return;
        const x = real(text, prec);
        const what = `${name} at ${text}, ${digits} digits`;
        const [low, high] = timed(() => [f(x, prec), f(x, prec + 7)] as const, what);
        expect(low.rad, what).toBeLessThan(Infinity);
        expect(R.overlaps(low, high), what).toBe(true);
      });
    });
  });
});

describe('in the plane', () => {
  it.each(COMPLEX.map((f) => [f.name, f] as const))('%s', (name, { f, from, to, digits: most }) => {
    DIGITS.filter((digits) => digits <= most).forEach((digits, k) => {
      const prec = bits(digits);
      [-20, -10, -5, -2, -1, 0, 1, 2, 3, 5, 10, 20].forEach((e, i) => {
        if (e < from || e > to) return;
        DIRECTIONS.forEach((turn, j) => {
          if (digits > 50 && (i + 2 * j + k) % 9 !== 0) return;
          if (name.startsWith('2F1') && turn === 0 && e >= 0) return;
          const z = planePoint(e, turn, prec);
          const what = `${name} at 1.7e${e}, ${turn} π, ${digits} digits`;
          const [low, high] = timed(() => [f(z, prec), f(z, prec + 7)] as const, what);
          expect(C.upperBits(low), what).toBeLessThan(Infinity);
          expect(C.overlaps(low, high), what).toBe(true);
        });
      });
    });
  });
});
