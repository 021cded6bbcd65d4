/**
 * Hyperasymptotics.
 * Check values: mpmath 1.2.1 (besselk in 60 digits; closed-form kernels; 34 reliable digits). K₀: DLMF 10.40(iv) (equation number
 * from memory, identity checked there). The ladder of a pole-mass-like toy: arXiv:1909.01370 (abstract seen) for the method.
 */
import { describe, expect, it } from 'vitest';
import { addExact, exact, exactReal, exp, mulExact, pi, R, Rational, rgamma } from '../../src/numerics/index.js';
import type { Ball, Exact } from '../../src/numerics/index.js';
import { fitStrengths, hyperasymptoticSum } from '../../src/borel/index.js';
import type { Leader } from '../../src/borel/index.js';
import { hyperasymptotic } from '../../src/prescriptions/hyperasymptotic.js';
import {
  benchExpansion,
  central,
  digitsReached,
  expansion,
  outcomes,
  readBench,
  refused,
  rescaled,
} from '../support/expansions.js';
import { expectNear, rational } from '../support/check-value.js';
import type { StatedSingularity } from '../../src/series/index.js';

const q = (s: string): Exact => exact(rational(s));
const PREC = 240;

describe('K₀(4) with the coefficients of the neighbouring exponential', () => {
  // c_n = a_n(0) of √(2z/π) e^z K₀(z) in x = 1/z; singularity t* = −2, γ = 0, S_j = 2^j a_j/π.
  const a = [Rational.ONE];
  for (let k = 1; k < 16; k++) a.push(a[k - 1]!.mul(Rational.of(-((2 * k - 1) ** 2), 8 * k)));
  const s: Leader = { t: exact(-2), exponent: exact(0) };
  const front = R.mul(R.sqrt(R.div(pi(PREC), R.fromNumber(8), PREC), PREC), exp(R.fromNumber(-4), PREC), PREC);
  const known: [number, number, string][] = [
    [8, 4, '0.0111596753184558172632205977720386332'],
    [12, 6, '0.0111596760195713010729481659046477635'],
    [16, 8, '0.0111596760604679791804830168037317857'],
  ];
  for (const [cut, pieces, value] of known) {
    it(`${cut} terms, ${pieces} terminants`, () => {
      const strengths = a
        .slice(0, pieces)
        .map((x, j): Ball => R.div(R.fromRational(x.mul(Rational.of(2).pow(j)), PREC), pi(PREC), PREC));
      const sum = hyperasymptoticSum(a.map(exact), s, strengths, cut, R.fromRational(Rational.of(1, 4), PREC), PREC);
      expectNear(R.mul(front, sum.pv, PREC), value, 1e-34);
    });
  }
  it('reads the same strengths off the late terms', () => {
    const long = [Rational.ONE];
    for (let k = 1; k < 60; k++) long.push(long[k - 1]!.mul(Rational.of(-((2 * k - 1) ** 2), 8 * k)));
    const found = fitStrengths(long.map(exact), s, 12, 800)!;
    for (let j = 0; j < 4; j++) {
      const expected = a[j]!.mul(Rational.of(2).pow(j)).toNumber() / Math.PI;
      expect(Math.abs(R.toNumber(found[j]!) / expected - 1)).toBeLessThan(10 ** (j - 9));
    }
  });
});

describe('the ladder of a pole-mass-like toy', () => {
  // Infrared d = 1 (N = 0.55, c₁ = −0.12), infrared d = 3 (N = 0.35, exponent 1 + 3b), ultraviolet at −2t* (N = 0.12, 1.2); α = 0.2.
  const b = rational('0.3696');
  const t = exactReal((prec) => R.div(R.mul(R.fromNumber(6), pi(prec + 8), prec + 8), R.fromNumber(25), prec + 8));
  const rising = (x: Rational, n: number): Rational =>
    Array.from({ length: n }, (_, k) => x.add(Rational.of(k))).reduce((p, y) => p.mul(y), Rational.ONE);
  const coefficients = Array.from({ length: 14 }, (_, n) => {
    const lead = rational('0.55').mul(rising(b.add(Rational.ONE), n).add(rational('-0.12').mul(rising(b, n))));
    const third = rational('0.35')
      .mul(rising(b.mul(Rational.of(3)).add(Rational.ONE), n))
      .mul(Rational.of(1, 3).pow(n));
    const uv = rational('0.12')
      .mul(rising(rational('1.2'), n))
      .mul(Rational.of(-1, 2).pow(n));
    return mulExact(
      exact(lead.add(third).add(uv)),
      exactReal((prec) => R.powInt(t.ball(prec + 16), -n, prec + 8)),
    );
  });
  const s: Leader = { t, exponent: exact(b.add(Rational.ONE)) };
  const S0 = R.mul(
    R.fromRational(rational('0.55'), PREC),
    rgamma(R.fromRational(b.add(Rational.ONE), PREC), PREC),
    PREC,
  );
  const strengths = [S0, R.mul(S0, R.fromRational(rational('-0.12').mul(b), PREC), PREC)];
  const alpha = R.fromRational(rational('0.2'), PREC);
  const errors: [number, string][] = [
    [3, '0.00244612109906352084767993297274230107'],
    [7, '0.000277833417887736029536531321091164376'],
    [9, '0.00000659256994727941562484693507288133744'],
    [11, '-0.000264727027058119841808210493799945566'],
    [13, '-0.000734178661074791950372917407123720053'],
  ];
  for (const [cut, error] of errors) {
    it(`${cut} terms`, () => {
      const sum = hyperasymptoticSum(coefficients, s, strengths, cut, alpha, PREC);
      const value = R.mul(alpha, sum.pv, PREC);
      expectNear(value, rational('0.271579125026408572958112328884026791').sub(rational(error)).toString(), 1e-33);
    });
  }
  it('states the same through the prescription, with the corrections tied to one strength', () => {
    const stated: StatedSingularity[] = [
      { t, exponent: s.exponent, corrections: [q('-0.12')], strength: q('0.55'), kind: 'infrared', origin: 'file' },
      { t: mulExact(t, exact(-2)), kind: 'ultraviolet', corrections: [], origin: 'file' },
    ];
    const e = expansion(coefficients, q('0.2'), { power: 1, stated });
    const found = central(hyperasymptotic, e);
    expect(found.variant).toBe('8 terms, one strength');
    expect(Math.abs(R.toNumber(found.value) - 0.2715791250264085)).toBeLessThan(2 * found.truncation!);
    expect(R.toNumber(found.imaginary!) / Math.PI).toBeCloseTo(0.01748487636688, 3);
  });
});

describe('exact on its own class', () => {
  for (const id of ['s03_shift_alt_b1_2', 's04_shift_nonalt_b1_2', 's05_shift_nonalt_b_nf4', 's01_euler_alternating']) {
    it(`${id}: a single branch point, both signs`, () => {
      const b = readBench(id);
      for (const r of b.references.slice(0, 3)) {
        const found = central(hyperasymptotic, benchExpansion(b, r.x, 6), 25);
        expect(digitsReached(found, r)).toBeGreaterThan(24.9);
        if (r.im_plus !== undefined) expectNear(found.imaginary!, r.im_plus, 1e-20 * Math.abs(Number(r.im_plus)));
      }
    });
  }
});

describe('the bench', () => {
  const reach = (
    id: string,
    x: string,
    count: number,
    stated?: StatedSingularity[],
  ): { digits: number; miss: number; truncation: number } => {
    const b = readBench(id);
    const e = benchExpansion(b, x, count, stated === undefined ? {} : { stated });
    const found = central(hyperasymptotic, e);
    const r = b.references.find((ref) => ref.x === x)!;
    const miss = Math.abs(R.toNumber(R.sub(found.value, R.fromRational(rational(r.pv), 300), 300)));
    return { digits: digitsReached(found, r), miss, truncation: found.truncation! };
  };
  it('goes far beyond the least term', () => {
    expect(reach('s40_aho_quartic', '1/50', 20).digits).toBeGreaterThan(15);
    expect(reach('s13_mass_like', '1/40', 35).digits).toBeGreaterThan(14);
    expect(reach('s152_demo_tessel_uv', '1/20', 12).digits).toBeGreaterThan(9);
  });
  it('a logarithmic branch point: exponent 0', () => {
    const log: StatedSingularity[] = [
      { t: exact(-2), exponent: exact(0), corrections: [], kind: 'other', origin: 'file' },
    ];
    // ω = 20: the least term alone gives 10 digits.
    expect(reach('s26_bessel_k0', '1/10', 30, log).digits).toBeGreaterThan(16);
  });
  it('covers the miss with its own error', () => {
    for (const [id, x, count] of [
      ['s13_mass_like', '1/20', 12],
      ['s13_mass_like', '1/20', 35],
      ['s40_aho_quartic', '1/20', 20],
      ['s10_uv1_ir2_branch', '1/10', 8],
    ] as const) {
      const { miss, truncation } = reach(id, x, count);
      expect(miss, `${id} ${count}`).toBeLessThan(2 * truncation);
    }
  });
});

describe('covariance', () => {
  it('does not see x → λx; carries prefactor, power and additive part along', () => {
    const b = readBench('s13_mass_like');
    const e = benchExpansion(b, '1/20', 8, { power: 1, factor: exact(4), additive: exact(-1) });
    const one = central(hyperasymptotic, e);
    const other = central(hyperasymptotic, rescaled(e, Rational.of(11, 3)));
    expect(R.overlaps(one.value, other.value)).toBe(true);
    expect(R.overlaps(one.imaginary!, other.imaginary!)).toBe(true);
    const plain = central(hyperasymptotic, benchExpansion(b, '1/20', 8));
    const expected = addExact(exact(-1), exact(0)).ball(200);
    expect(
      R.overlaps(one.value, R.add(expected, R.mul(plain.value, R.fromRational(Rational.of(1, 5), 200), 200), 200)),
    ).toBe(true);
  });
});

describe('refusals and single members', () => {
  it('needs position and exponent, and a coupling that leaves a first term', () => {
    const b = readBench('s04_shift_nonalt_b1_2');
    expect(refused(hyperasymptotic, { ...benchExpansion(b, '1/10', 8), stated: [] }).reason).toContain('position');
    expect(refused(hyperasymptotic, benchExpansion(b, '1', 8)).reason).toContain('too large');
    refused(hyperasymptotic, { ...benchExpansion(readBench('s100_geometric'), '1/20', 20), stated: b.stated });
  });
  it('one member alone is the value of the whole', () => {
    const e = benchExpansion(readBench('s13_mass_like'), '1/20', 8);
    const whole = central(hyperasymptotic, e);
    const [alone] = outcomes(hyperasymptotic, e, 20, whole.variant);
    if (alone?.kind !== 'sum') expect.fail('no sum');
    expect(R.overlaps(alone.value, whole.value)).toBe(true);
  });
});
