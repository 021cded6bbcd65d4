import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import * as C from '../../../src/numerics/ball/complex.js';
import type { Complex } from '../../../src/numerics/ball/complex.js';
import { pi } from '../../../src/numerics/ball/constants.js';
import * as R from '../../../src/numerics/ball/real.js';
import { exact, exactReal } from '../../../src/numerics/exact.js';
import type { Rational } from '../../../src/numerics/rational.js';
import {
  certifiedRoots,
  degreePoly,
  evaluatePoly,
  mulPoly,
  padeExact,
  padePoles,
  partialFractions,
  type PartialFractions,
  type RationalPoly,
} from '../../../src/numerics/polynomial/index.js';
import { TaylorEnclosure } from '../../../src/numerics/polynomial/taylor-enclosure.js';
import { MULTIPLIER, borelSeries, poly, polynomials, q, seriesOf } from './random.js';

const balls = (p: RationalPoly, prec: number): R.Ball[] => p.map((c) => R.fromRational(c, prec));

/** The partial fractions summed at a real point. */
function sum({ polynomial, poles }: PartialFractions, t: Rational, prec: number): Complex {
  const x = C.fromReal(R.fromRational(t, prec));
  let total = C.ZERO;
  for (const c of polynomial.toReversed()) total = C.add(C.mul(total, x, prec), C.fromReal(c), prec);
  for (const { position, principal } of poles) {
    let power = C.ONE;
    for (const c of principal) {
      power = C.mul(power, C.sub(x, position, prec), prec);
      total = C.add(total, C.div(c, power, prec), prec);
    }
  }
  return total;
}

function decompose(p: RationalPoly, d: RationalPoly, prec: number): PartialFractions {
  const result = certifiedRoots(d, prec);
  if ('failed' in result) throw new Error(result.failed);
  return partialFractions(balls(p, 2 * prec), balls(d, 2 * prec), result.roots, 2 * prec);
}

describe('decomposition', () => {
  test('sums back to p/q at rational points, multiple poles and long numerators included', () => {
    fc.assert(
      fc.property(polynomials(6), polynomials(2), polynomials(2), fc.integer({ min: -50, max: 50 }), (p, a, b, n) => {
        const d = mulPoly(a, mulPoly(b, b));
        fc.pre(p.length > 0 && degreePoly(d) >= 1);
        const t = q(n, 7);
        const value = evaluatePoly(d, t);
        fc.pre(!value.isZero());
        const total = sum(decompose(p, d, 300), t, 500);
        expect(R.containsRational(total.re, evaluatePoly(p, t).div(value))).toBe(true);
        expect(R.containsZero(total.im)).toBe(true);
      }),
      { numRuns: 150 * MULTIPLIER },
    );
  });

  test('(2 + t³)/((1 − t)²(2 + t)) = 1 + 3t/((t − 1)²(t + 2)): residues by hand', () => {
    const d = mulPoly(mulPoly(poly(1, -1), poly(1, -1)), poly(2, 1));
    const { polynomial, poles } = decompose(poly(2, 0, 0, 1), d, 200);
    expect(polynomial.length).toBe(1);
    expect(R.containsRational(polynomial[0]!, q(1))).toBe(true);
    const at = (x: number) => poles.find((pole) => R.containsRational(pole.position.re, q(x)))!;
    // 3t/((t − 1)²(t + 2)) = (2/3)/(t − 1) + 1/(t − 1)² − (2/3)/(t + 2)
    expect(at(1).multiplicity).toBe(2);
    expect(R.containsRational(at(1).principal[0]!.re, q(2, 3))).toBe(true);
    expect(R.containsRational(at(1).principal[1]!.re, q(1))).toBe(true);
    expect(R.containsRational(at(1).amplitude.re, q(1))).toBe(true);
    expect(R.containsRational(at(-2).principal[0]!.re, q(-2, 3))).toBe(true);
    // A/(1 − t/ζ) with ζ = −2: −residue/ζ
    expect(R.containsRational(at(-2).amplitude.re, q(-1, 3))).toBe(true);
    expect(Math.min(...poles.map((pole) => C.accuracyBits(pole.amplitude)))).toBeGreaterThan(190);
  });

  test('complex poles: conjugate pairs carry exact conjugate residues', () => {
    // 1/(1 + t²) = (i/2)/(t + i) − (i/2)/(t − i)
    const { poles } = decompose(poly(1), poly(1, 0, 1), 100);
    const [upper, lower] = poles;
    expect(R.containsRational(upper!.position.im, q(1))).toBe(true);
    expect(R.containsRational(upper!.principal[0]!.im, q(-1, 2))).toBe(true);
    expect(R.containsZero(upper!.principal[0]!.re)).toBe(true);
    expect(lower!.amplitude).toEqual(C.conj(upper!.amplitude));
    expect(lower!.position).toEqual(C.conj(upper!.position));
  });
});

describe('Taylor coefficients on a box', () => {
  test('contain the values at every corner and lose few bits', () => {
    fc.assert(
      fc.property(
        polynomials(9),
        fc.integer({ min: -30, max: 30 }),
        fc.integer({ min: 0, max: 3 }),
        fc.constantFrom(25, 150),
        (p, n, k, w) => {
          fc.pre(n !== 0 && degreePoly(p) > k);
          const centre = q(n, 7);
          const radius = q(1, 2n ** 40n);
          const box = C.fromReal(R.addError(R.fromRational(centre, 80), 1, -40));
          const value = new TaylorEnclosure(balls(p, 200)).coefficient(k, box, w);
          // f^(k)/k! by exact arithmetic
          let f: RationalPoly = p;
          for (let i = 1; i <= k; i++) f = f.slice(1).map((c, j) => c.mul(q(j + 1, i)));
          for (const x of [centre, centre.add(radius), centre.sub(radius)]) {
            expect(R.containsRational(value.re, evaluatePoly(f, x))).toBe(true);
          }
          expect(value.im).toEqual(R.ZERO);
        },
      ),
      { numRuns: 200 * MULTIPLIER },
    );
  });

  test('a box around a double zero: the second order counts where the first vanishes', () => {
    const value = new TaylorEnclosure(balls(poly(1, -2, 1), 100)).coefficient(
      0,
      C.fromReal(R.addError(R.ONE, 1, -5)),
      100,
    );
    expect(R.containsRational(value.re, q(1, 2n ** 10n))).toBe(true);
    expect(R.containsRational(value.re, q(1, 2n ** 8n))).toBe(false);
  });

  test('high powers: (1 − t)^60 near t = 3/4 keeps its digits where Horner in balls would not', () => {
    let p: RationalPoly = poly(1);
    for (let i = 0; i < 60; i++) p = mulPoly(p, poly(1, -1));
    const box = C.fromReal(R.addError(R.fromRational(q(3, 4), 100), 1, -250));
    const value = new TaylorEnclosure(balls(p, 300)).coefficient(0, box, 400);
    expect(R.containsRational(value.re, q(1, 4n ** 60n))).toBe(true);
    expect(R.accuracyBits(value.re)).toBeGreaterThan(200);
  });
});

describe('from series to poles', () => {
  const exacts = (b: readonly Rational[]) => b.map((c) => exact(c));

  test('the exact and the ball way agree at the order where they change', () => {
    const b = borelSeries(21);
    for (const [L, M] of [
      [8, 8],
      [9, 8],
      [9, 9],
      [8, 9],
      [10, 10],
    ] as const) {
      const byBalls = padePoles(exacts(b), L, M, 200);
      const asReals = padePoles(
        b.map((c) => exactReal((prec) => R.fromRational(c, prec))),
        L,
        M,
        200,
      );
      if (!byBalls.exists || !asReals.exists) throw new Error('no entry');
      expect(byBalls.poles.length).toBe(M);
      byBalls.poles.forEach((pole, i) => {
        const other = asReals.poles[i]!;
        expect(C.overlaps(pole.position, other.position)).toBe(true);
        expect(C.overlaps(pole.amplitude, other.amplitude)).toBe(true);
        expect(pole.real).toBe(other.real);
        expect(C.accuracyBits(pole.position)).toBeGreaterThanOrEqual(200);
      });
    }
  });

  test('amplitudes of a sum of poles are found, as sharp as asked', () => {
    // 2/(1 − t/3) − 1/(1 + t/2) + (1/5)/(1 − 7t)
    const b = Array.from({ length: 6 }, (_, n) =>
      q(2)
        .mul(q(1, 3).pow(n))
        .sub(q(-1, 2).pow(n))
        .add(q(1, 5).mul(q(7).pow(n))),
    );
    const result = padePoles(exacts(b), 2, 3, 500);
    if (!result.exists) throw new Error(result.reason);
    const want: [Rational, Rational][] = [
      [q(1, 7), q(1, 5)],
      [q(-2), q(-1)],
      [q(3), q(2)],
    ];
    result.poles.forEach((pole, i) => {
      expect(R.containsRational(pole.position.re, want[i]![0])).toBe(true);
      expect(R.containsRational(pole.amplitude.re, want[i]![1])).toBe(true);
      expect(C.accuracyBits(pole.amplitude)).toBeGreaterThan(499);
    });
    expect(result.polynomial).toEqual([]);
  });

  test('high order, exact: a multiple pole and a block are settled by exact arithmetic', () => {
    // 1/(1 − t)³ + t^2: reduced far below the order asked
    const b = seriesOf(poly(1, 0, 1, -3, 3, -1), poly(1, -3, 3, -1), 41);
    const result = padePoles(exacts(b), 20, 20, 100);
    if (!result.exists) throw new Error(result.reason);
    expect(result.entry.deficiency).toBe(15);
    expect(result.poles.map((pole) => [pole.multiplicity, pole.real])).toEqual([[3, true]]);
    const [pole] = result.poles;
    expect(R.containsRational(pole!.principal[2]!.re, q(-1))).toBe(true);
    expect(R.containsRational(pole!.amplitude.re, q(1))).toBe(true);
    expect(R.containsRational(result.polynomial[2]!, q(1))).toBe(true);
    const missing = padePoles(
      exacts(Array.from({ length: 41 }, (_, n) => q(n === 0 || n === 30 ? 1 : 0))),
      20,
      20,
      100,
    );
    expect(missing.exists).toBe(false);
  });

  test('high order by balls: the amplitudes reproduce the coefficients', () => {
    const N = 20;
    const b = borelSeries(2 * N + 1);
    const result = padePoles(exacts(b), N, N, 300);
    if (!result.exists) throw new Error(result.reason);
    expect(result.poles.length).toBe(N);
    // b_n = Σ A_i ζ_i^{-n} (n > 0)
    for (const n of [1, 7, 2 * N]) {
      let total = C.ZERO;
      for (const { position, amplitude } of result.poles) {
        let term = amplitude;
        for (let k = 0; k < n; k++) term = C.div(term, position, 400);
        total = C.add(total, term, 400);
      }
      expect(R.containsRational(total.re, b[n]!)).toBe(true);
      expect(R.accuracyBits(total.re)).toBeGreaterThan(250);
    }
  });

  test('a doublet of strength 1e-60 has certain digits of its own', () => {
    // 1/(1 − t/2) + 0.6/(1 + t/3) with 1e-60 of noise
    const noise = [-337, 941, -692, -192, 333, -902, -852, 681];
    const b = noise.map((e, n) =>
      q(1, 2)
        .pow(n)
        .add(q(3, 5).mul(q(-1, 3).pow(n)))
        .add(q(`${e}e-63`)),
    );
    const result = padePoles(exacts(b), 3, 4, 53);
    if (!result.exists) throw new Error(result.reason);
    const weak = result.poles.filter((pole) => C.upperBits(pole.amplitude) < -150);
    expect(weak.length).toBe(2);
    for (const pole of result.poles) expect(C.accuracyBits(pole.amplitude)).toBeGreaterThanOrEqual(53);
  });

  test('coefficients with π scale the poles', () => {
    const b = borelSeries(7);
    const scaled = b.map((c, n) =>
      exactReal((prec) => R.mul(R.fromRational(c, prec), R.powInt(pi(prec), n, prec), prec)),
    );
    const plain = padePoles(exacts(b), 3, 3, 200);
    const result = padePoles(scaled, 3, 3, 200);
    if (!plain.exists || !result.exists) throw new Error('no entry');
    result.poles.forEach((pole, i) => {
      expect(C.overlaps(C.mulReal(pole.position, pi(300), 300), plain.poles[i]!.position)).toBe(true);
      expect(C.overlaps(pole.amplitude, plain.poles[i]!.amplitude)).toBe(true);
    });
  });

  test('an inexact series that cannot decide says so', () => {
    const geometric = Array.from({ length: 5 }, (_, n) =>
      exactReal((prec) => R.div(R.ONE, R.powInt(pi(prec), n, prec), prec)),
    );
    const result = padePoles(geometric, 2, 2, 60);
    expect(result.exists).toBeUndefined();
    expect(result.exists === undefined && result.reason).toMatch(/cannot be told from zero/);
  });

  test('the exact entry is handed on', () => {
    const b = borelSeries(6);
    const result = padePoles(exacts(b), 2, 3, 60);
    expect(result.exists && result.entry).toEqual(padeExact(b, 2, 3));
  });
});
