/**
 * Borel-plane approximants without a closed-form sum, along rotated rays: logarithmic-derivative, partial, quadratic.
 * Check values: mpmath 1.2.1 (rotated contour, closed-form kernels, 34 reliable digits). Exact sums: the bench of series with
 * exact answers. Methods: D. Boito, P. Masjuan, F. Oliani, arXiv:1807.01567; G. A. Baker, P. Graves-Morris (1996) (memory).
 */
import { describe, expect, it } from 'vitest';
import { addExact, divExact, exact, exactReal, mulExact, pi, R, Rational } from '../../src/numerics/index.js';
import type { Exact } from '../../src/numerics/index.js';
import { borelDlog } from '../../src/prescriptions/borel-dlog.js';
import { borelPartialPade } from '../../src/prescriptions/borel-partial-pade.js';
import { borelQuadratic } from '../../src/prescriptions/borel-quadratic.js';
import type { Prescription } from '../../src/prescriptions/index.js';
import type { StatedSingularity } from '../../src/series/index.js';
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

const q = (s: string): Exact => exact(rational(s));
const ALL = [borelDlog, borelPartialPade, borelQuadratic];

describe('partial Borel–Padé of a toy with a known exact sum', () => {
  // N (1−t/T)^(−1−b) [1 + c(1−t/T)] + 0.3 (1+t/2T)^(−1.2), T = 2π/9, b = 64/162, N = 0.56, c = −0.12, α = 0.25.
  const T = exactReal((prec) => R.div(R.mul2exp(pi(prec + 8), 1), R.fromNumber(9), prec + 8));
  const count = 7;
  const rising = (a: Rational, n: number): Rational =>
    Array.from({ length: n }, (_, k) => a.add(Rational.of(k))).reduce((x, y) => x.mul(y), Rational.ONE);
  const gamma = rational('1').add(rational('64/162'));
  const c = Array.from({ length: count }, (_, n) => {
    const leading = rational('0.56').mul(
      rising(gamma, n).add(rational('-0.12').mul(rising(gamma.sub(Rational.ONE), n))),
    );
    const other = rational('0.3')
      .mul(rising(rational('1.2'), n))
      .mul(rational('-1/2').pow(n));
    const inverse = exactReal((prec) => R.powInt(T.ball(prec + 16), -n, prec + 8));
    return mulExact(exact(leading.add(other)), inverse);
  });
  const stated: StatedSingularity[] = [
    { t: T, exponent: exact(gamma), corrections: [], kind: 'infrared', origin: 'file' },
  ];
  const known: [string, string, string][] = [
    ['[1/1]', '0.00431957850183381343097542930297433895', '0.118348797693823553427184616794327927'],
    ['[2/1]', '0.00121337221826467002560532919466792400', '0.125323995514871781567898903052930649'],
    ['[2/2]', '0.000516264651203137285964246923539748567', '0.125701517113284854817070831551213404'],
  ];
  for (const [entry, error, im] of known) {
    it(entry, () => {
      const [L, M] = entry.slice(1, -1).split('/').map(Number);
      const e = expansion(c.slice(0, L! + M! + 1), q('0.25'), { power: 1, stated });
      const [s] = outcomes(borelPartialPade, e, 25, entry);
      if (s?.kind !== 'sum') expect.fail(s?.reason ?? 'nothing');
      expectNear(s.value, rational('0.256034838633100062458468683546544001').add(rational(error)).toString(), 1e-23);
      expectNear(s.imaginary!, im, 1e-12);
    });
  }
});

describe('exact on their own class', () => {
  const reach = (p: Prescription, id: string, count: number): void => {
    const b = readBench(id);
    for (const r of [b.references[0]!, b.references[b.references.length - 1]!]) {
      const s = central(p, benchExpansion(b, r.x, count), 20);
      expect(digitsReached(s, r), `${p.name} ${id} ${r.x}`).toBeGreaterThan(18.5);
      if (r.im_plus !== undefined) expectNear(s.imaginary!, r.im_plus, 1e-10 * Math.abs(Number(r.im_plus)));
      expect(s.digitsTrust).toBe('converged');
    }
  };
  it('d-log and partial Padé on one branch point', () => {
    for (const p of [borelDlog, borelPartialPade]) {
      reach(p, 's03_shift_alt_b1_2', 5);
      reach(p, 's05_shift_nonalt_b_nf4', 5);
    }
  });
  it('partial Padé on two stated poles', () => reach(borelPartialPade, 's09_uv1_ir2_poles', 6));
  it('quadratic on a square-root branch point', () => {
    // B = 2 + (1 + t)^(−1/2): ∫ e^{−s} = 2 + e^{1/x} √(π/x) erfc(1/√x); at x = 1: 2.7578721561413121060…
    const rising = (n: number): Rational =>
      Array.from({ length: n }, (_, k) => rational('1/2').add(Rational.of(k))).reduce((x, y) => x.mul(y), Rational.ONE);
    const c = Array.from({ length: 8 }, (_, n) =>
      exact(
        rising(n)
          .mul(Rational.of(-1).pow(n))
          .add(n === 0 ? Rational.of(2) : Rational.ZERO),
      ),
    );
    const s = central(borelQuadratic, expansion(c, exact(1)), 20);
    expectNear(s.value, '2.75787215614131210604011', 1e-19);
  });
});

describe('the bench', () => {
  const reach = (p: Prescription, id: string, x: string, count: number): number => {
    const b = readBench(id);
    return digitsReached(
      central(p, benchExpansion(b, x, count)),
      b.references.find((r) => r.x === x)!,
    );
  };
  it('two branch points, twelve coefficients', () => {
    expect(reach(borelDlog, 's10_uv1_ir2_branch', '1/10', 12)).toBeGreaterThan(9);
    expect(reach(borelPartialPade, 's10_uv1_ir2_branch', '1/10', 12)).toBeGreaterThan(7);
    expect(reach(borelQuadratic, 's10_uv1_ir2_branch', '1/10', 12)).toBeGreaterThan(7);
  });
  it('a mass-like series: factoring out what is known wins', () => {
    expect(reach(borelPartialPade, 's13_mass_like', '1/20', 12)).toBeGreaterThan(7.5);
    expect(reach(borelDlog, 's13_mass_like', '1/20', 12)).toBeGreaterThan(6);
    expect(reach(borelQuadratic, 's13_mass_like', '1/20', 12)).toBeGreaterThan(5.5);
  });
  it('the anharmonic oscillator', () => {
    expect(reach(borelDlog, 's40_aho_quartic', '1/10', 20)).toBeGreaterThan(11);
    expect(reach(borelQuadratic, 's40_aho_quartic', '1/10', 20)).toBeGreaterThan(12);
  });
  it('a confirmed complex pair: the contour stays below it', () => {
    const b = readBench('s119_conj_cos3_5');
    const s = central(borelQuadratic, benchExpansion(b, '1/10', 12));
    expect(
      digitsReached(
        s,
        b.references.find((r) => r.x === '1/10')!,
      ),
    ).toBeGreaterThan(18);
    expect(s.notes.join(' ')).not.toContain('lifted');
    expect(R.isExactZero(s.imaginary!)).toBe(true);
  });
  it('errors cover the miss on the mass-like series', () => {
    const b = readBench('s13_mass_like');
    const r = b.references.find((ref) => ref.x === '1/20')!;
    for (const p of ALL) {
      for (const count of [8, 12]) {
        const s = outcomes(p, benchExpansion(b, '1/20', count)).find((o) => o.kind === 'sum' && o.central === true);
        if (s?.kind !== 'sum') continue;
        const miss = Math.abs(R.toNumber(R.sub(s.value, R.fromRational(rational(r.pv), 200), 200)));
        expect(miss, `${p.name} ${count}`).toBeLessThan(5 * s.truncation!);
      }
    }
  });
});

describe('covariance', () => {
  it('does not see x → λx', () => {
    const e = benchExpansion(readBench('s10_uv1_ir2_branch'), '1/10', 7, {
      power: 1,
      factor: exact(2),
      additive: exact(1),
    });
    for (const p of ALL) {
      const one = outcomes(p, e);
      const other = outcomes(p, rescaled(e, rational('9/4')));
      one.forEach((o, i) => {
        const same = other[i]!;
        expect(same.kind, p.name).toBe(o.kind);
        if (o.kind === 'sum' && same.kind === 'sum') {
          expect(o.variant).toBe(same.variant);
          expect(R.overlaps(o.value, same.value), `${p.name} ${o.variant}`).toBe(true);
        }
      });
    }
  });
  it('carries prefactor, power and additive part along', () => {
    const b = readBench('s04_shift_nonalt_b1_2');
    const plain = central(borelDlog, benchExpansion(b, '1/10', 5));
    const full = central(borelDlog, benchExpansion(b, '1/10', 5, { power: 1, factor: exact(2), additive: exact(1) }));
    const expected = addExact(exact(1), divExact(exact(2), exact(10))).ball(100);
    const dressedValue = R.add(R.ONE, R.mul(R.sub(expected, R.ONE, 100), plain.value, 100), 100);
    expect(R.overlaps(full.value, dressedValue)).toBe(true);
  });
});

describe('refusals', () => {
  it('a pole of the rest well inside the circle of the nearest singularity', () => {
    const e = benchExpansion(readBench('s13_mass_like'), '1/20', 5, {
      stated: [{ t: q('3'), exponent: q('1'), corrections: [], kind: 'other', origin: 'file' }],
    });
    const all = outcomes(borelPartialPade, e);
    expect(all.some((o) => o.kind === 'refusal' && o.reason.includes('where no singularity'))).toBe(true);
  });
  it('nothing stated: no partial Padé', () => {
    const e = { ...benchExpansion(readBench('s10_uv1_ir2_branch'), '1/10', 10), stated: [] };
    expect(refused(borelPartialPade, e).reason).toContain('stated');
  });
  it('growth that is not factorial, too few terms', () => {
    const at: StatedSingularity = { t: q('2'), exponent: q('1'), corrections: [], kind: 'other', origin: 'file' };
    for (const p of ALL) {
      refused(p, { ...benchExpansion(readBench('s100_geometric'), '1/10', 20), stated: [at] });
      refused(p, { ...benchExpansion(readBench('s113_2nfact_alt'), '1/25', 20), stated: [at] });
      refused(p, { ...benchExpansion(readBench('s01_euler_alternating'), '1/10', 1), stated: [at] });
    }
  });
  it('a singularity where none may be', () => {
    const e = benchExpansion(readBench('s10_uv1_ir2_branch'), '1/10', 6);
    const all = outcomes(borelQuadratic, e);
    expect(all.every((o) => o.kind === 'refusal' && o.reason.includes('where none'))).toBe(true);
  });
});

describe('one member alone', () => {
  it('is the value of the whole list', () => {
    const e = benchExpansion(readBench('s13_mass_like'), '1/20', 8);
    for (const p of ALL) {
      const whole = central(p, e);
      const [alone] = outcomes(p, e, 20, whole.variant);
      if (alone?.kind !== 'sum') expect.fail('no sum');
      expect(R.overlaps(alone.value, whole.value)).toBe(true);
      expect(alone.truncation).toBeUndefined();
    }
  });
});
