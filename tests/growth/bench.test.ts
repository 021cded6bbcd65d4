/**
 * Every series of the bench of series with exact answers, computed with mpmath 1.2.1 and PARI/GP 2.15.2
 * (tests/data/bench), must be diagnosed rightly at full length, and never wrongly when cut short.
 */
import { describe, expect, it } from 'vitest';
import { diagnoseGrowth, type Growth, type GrowthFlag, type GrowthVerdict } from '../../src/growth/index.js';
import { benchInput } from './terms.js';

interface Wanted {
  readonly verdict: GrowthVerdict;
  readonly order?: number;
  /** Position on an axis with its sign; modulus of a pair or of ± positions. In the Borel plane of √x for order 2. */
  readonly t?: number;
  readonly angle?: number;
  readonly exponent?: number;
  readonly strength?: number;
  readonly flags?: readonly GrowthFlag['code'][];
  readonly pattern?: Growth['signPattern'];
  /** Largest relative error of the position. */
  readonly sharp?: number;
}

const factorial = (t: number, exponent: number, more: Partial<Wanted> = {}): Wanted => ({
  verdict: 'factorial',
  order: 1,
  t,
  exponent,
  sharp: 1e-10,
  ...more,
});
const second = (t: number, more: Partial<Wanted> = {}): Wanted => ({
  verdict: 'superfactorial',
  order: 2,
  t,
  sharp: 1e-10,
  flags: ['superfactorial'],
  ...more,
});
const refused = (verdict: GrowthVerdict, ...flags: GrowthFlag['code'][]): Wanted => ({ verdict, flags });
/** Six to eight coefficients only: a rough position with an honest error. */
const rough = (t: number): Wanted => ({
  verdict: 'factorial',
  order: 1,
  t,
  pattern: 'alternating',
  flags: ['pre-asymptotic'],
});

const pi = Math.PI;
const b4 = 1 + 231 / 625;

const WANTED: Readonly<Record<string, Wanted>> = {
  s01_euler_alternating: factorial(-1, 1, { strength: 1, pattern: 'alternating' }),
  s02_euler_nonalternating: factorial(1, 1, { strength: 1, pattern: 'same' }),
  s03_shift_alt_b1_2: factorial(-1, 1.5, { strength: 1 }),
  s04_shift_nonalt_b1_2: factorial(1, 1.5, { strength: 1 }),
  s05_shift_nonalt_b_nf4: factorial(1, b4, { strength: 1 }),
  s07_shift_nonalt_b2: factorial(1, 3, { strength: 1 }),
  s08_shift_nonalt_b_m3_2: factorial(1, -0.5, { strength: 1 }),
  s09_uv1_ir2_poles: factorial(-1, 1, { strength: 1, flags: ['competing-singularities'] }),
  s10_uv1_ir2_branch: factorial(-1, 1019 / 625, { strength: 0.1, flags: ['competing-singularities'] }),
  s13_mass_like: factorial(0.5, b4, { strength: 1, flags: ['competing-singularities'] }),
  s17_pole_times_entire: factorial(1, 1, { strength: Math.E }),
  s20_stirling_loggamma: second(2 * pi, { angle: pi / 2 }),
  s21_stirling_lacunary: factorial(2 * pi, 1, {
    angle: pi / 2,
    flags: ['lacunary', 'complex-pair'],
    pattern: 'lacunary',
  }),
  s24_airy_ai: factorial(-2, 0),
  s25_airy_bi: factorial(2, 0),
  s26_bessel_k0: factorial(-2, 0),
  s26_bessel_k1: factorial(-2, 0),
  s27_bessel_i0: factorial(2, 0),
  s27_bessel_i1: factorial(2, 0),
  s28_bessel_k_5_2_terminates: refused('terminating', 'terminating'),
  s29_erfc: factorial(-1, 0.5, { strength: 1 }),
  s30_dawson: factorial(1, 0.5, { strength: 1 }),
  s31_expint_e1: factorial(-1, 1, { strength: 1 }),
  s33_incgamma_3_terminates: refused('terminating', 'terminating'),
  s34_fresnel_f: second(1, { angle: pi / 2 }),
  s36_struve_h0_y0: second(1, { angle: pi / 2 }),
  s40_aho_quartic: factorial(-1 / 3, 0.5, { strength: -Math.sqrt(6) / pi }),
  s41_aho_quartic_negative: factorial(1 / 3, 0.5, { strength: -Math.sqrt(6) / pi }),
  s42_aho_sextic: second(pi / (4 * Math.SQRT2), { angle: pi / 2 }),
  s43_cubic_imaginary: factorial(-2 / 15, 0.5, { strength: -Math.sqrt(60 * pi) / (2 * pi) ** 1.5 }),
  s46_zerodim_phi4: factorial(-1 / 16, 0),
  s47_zerodim_phi4_negative: factorial(1 / 16, 0),
  s49_zerodim_double_well: factorial(1 / 32, 0),
  s60_eh_spinor_magnetic: second(pi, { angle: pi / 2 }),
  s61_eh_spinor_electric: second(pi),
  s62_eh_scalar_magnetic: second(pi, { angle: pi / 2 }),
  s80_wilson_planar_strong: factorial(2, 0),
  s81_wilson_planar_weak: refused('convergent', 'convergent'),
  s84_massgap_gross_neveu: refused('convergent', 'convergent'),
  s85_massgap_on_sigma: refused('convergent', 'convergent'),
  s86_scqcd_su2: factorial(-1, 4.5),
  s87_large_b0_adler: factorial(-1, 2),
  s88_large_b0_potential: factorial(0.5, 1),
  s100_geometric: refused('geometric', 'geometric'),
  s101_exponential: refused('convergent', 'convergent'),
  s103_constant: refused('terminating', 'terminating'),
  s104_all_zero: refused('terminating', 'all-zero'),
  s105_polynomial: refused('terminating', 'terminating'),
  's106_noise_1e-6': factorial(-1, 1, { sharp: 1e-4, flags: ['noisy'] }),
  s108_noise_30pct: factorial(-1, 1, { sharp: 0.4, flags: ['noisy'] }),
  s110_lacunary_even_alt: factorial(1, 1, {
    angle: pi / 2,
    strength: 0.5,
    flags: ['lacunary', 'complex-pair'],
    pattern: 'lacunary',
  }),
  s111_lacunary_even_nonalt: factorial(1, 1, { strength: 0.5, flags: ['lacunary'], pattern: 'lacunary' }),
  s113_2nfact_alt: second(1, { angle: pi / 2 }),
  s114_2nfact_nonalt: second(1),
  s115_nfact2_alt: second(2, { angle: pi / 2 }),
  s117_lognormal: {
    verdict: 'superfactorial',
    order: Infinity,
    flags: ['superfactorial', 'faster-than-any-factorial'],
  },
  s118_subfactorial: { verdict: 'subfactorial', order: 0.5, flags: ['subfactorial'] },
  s119_conj_cos3_5: factorial(1, 1, { angle: Math.acos(3 / 5), flags: ['complex-pair'], pattern: 'quasi-periodic' }),
  s120_conj_cos_m1_2: factorial(1, 1, { angle: (2 * pi) / 3, flags: ['complex-pair'], pattern: 'quasi-periodic' }),
  s123_errors_exceed_values: refused('undecided', 'errors-exceed-values'),
  s124_huge: factorial(-1e-300, 1, { strength: 1 }),
  s125_tiny: factorial(-1e300, 1, { strength: 1 }),
  s127_two_coeffs: refused('undecided', 'too-short'),
  s128_one_coeff: refused('undecided', 'too-short'),
  s130_empty: refused('undecided', 'too-short'),
  s132_essential_singularity: { verdict: 'factorial', order: 1, t: 1, sharp: 0.1, flags: ['essential-singularity'] },
  s135_zero_leading: factorial(1, 1, { flags: ['leading-zeros'] }),
  s136_rounded_4_digits: factorial(-1, 1, { sharp: 1e-3, flags: ['few-digits'] }),
  s138_sign_typo: factorial(1, 1, { flags: ['outlier'] }),
  s150_demo_marrowgate_mass: factorial(6 / 25, 1, { strength: 4 / 3 }),
  s151_demo_vellum_adler: factorial(-4 / 9, 98 / 81, { sharp: 1e-8, strength: 0.1 }),
  s152_demo_tessel_uv: factorial(-12 / 23, 2, { strength: 1 }),
  s154_demo_cancellation: factorial(6 / 25, 1, { strength: 4 / 3 }),
  s156_demo_normalisations: factorial(6 / 25, 1, { strength: 4 / 3 }),
  s160_phi4_n0_eta: rough(-8 / 3),
  s161_phi4_n0_inv_nu: rough(-8 / 3),
  s162_phi4_n0_omega: rough(-8 / 3),
  s163_phi4_n1_eta: rough(-3),
  s164_phi4_n1_inv_nu: rough(-3),
  s165_phi4_n1_omega: rough(-3),
  s170_phi4_n3_inv_nu: rough(-11 / 3),
  s171_phi4_n3_omega: rough(-11 / 3),
};

/** Series with something wrong in them, and the flags that no other may raise. */
const ODD = /s106|s108|s123|s132|s136|s138/;
const ALARMS: readonly GrowthFlag['code'][] = [
  'noisy',
  'few-digits',
  'outlier',
  'essential-singularity',
  'errors-exceed-values',
];

const codes = (g: Growth): GrowthFlag['code'][] => g.flags.map((f) => f.code);
const found = (g: Growth): Growth['nearest'] => g.nearest ?? g.rootPlane;

/** Position, angle and exponent inside their stated errors. */
function expectPosition(g: Growth, w: Wanted): void {
  if (w.t === undefined) return;
  const s = found(g);
  expect(s, g.statement).toBeDefined();
  expect(Math.abs(s!.t.value - w.t), g.statement).toBeLessThanOrEqual(s!.t.error);
  if (w.sharp !== undefined) expect(s!.t.error / Math.abs(w.t)).toBeLessThan(w.sharp);
  if (w.angle !== undefined) {
    expect(Math.abs((s!.angle?.value ?? NaN) - w.angle)).toBeLessThanOrEqual(Math.max(s!.angle!.error, 1e-15));
  }
  if (w.exponent !== undefined) {
    expect(Math.abs((s!.exponent?.value ?? NaN) - w.exponent), g.statement).toBeLessThanOrEqual(s!.exponent!.error);
  }
  if (w.strength !== undefined) {
    expect(Math.abs((s!.strength?.value ?? NaN) - w.strength), g.statement).toBeLessThanOrEqual(s!.strength!.error);
    expect(s!.strength!.error).toBeLessThan(1e-3 * Math.abs(w.strength));
  }
}

describe('at full length', () => {
  it.each(Object.entries(WANTED))('%s', (id, w) => {
    const g = diagnoseGrowth(benchInput(id));
    expect(g.verdict, g.statement).toBe(w.verdict);
    if (w.order !== undefined) expect(g.order).toBe(w.order);
    expectPosition(g, w);
    for (const flag of w.flags ?? []) expect(codes(g), g.statement).toContain(flag);
    if (w.pattern !== undefined) expect(g.signPattern).toBe(w.pattern);
    expect(g.statement.length).toBeGreaterThan(10);
    if (!ODD.test(id)) for (const code of ALARMS) expect(codes(g)).not.toContain(code);
  });
});

describe('in doubles, without the exact coefficients', () => {
  it.each(Object.entries(WANTED).filter(([, w]) => w.t !== undefined && w.sharp === 1e-10))('%s', (id, w) => {
    const g = diagnoseGrowth(benchInput(id, undefined, { exact: false }));
    expect(g.verdict).toBe(w.verdict);
    const { strength: _, ...rest } = w;
    expectPosition(g, { ...rest, sharp: 1e-3 });
  });
});

describe('cut short', () => {
  it.each(Object.entries(WANTED))('%s is never called what it is not', (id, w) => {
    // (1 + x)^7 before its last coefficient is an entire function as good as any.
    const allowed = new Set<GrowthVerdict>([
      'undecided',
      w.verdict,
      ...(id === 's105_polynomial' ? (['convergent'] as const) : []),
    ]);
    for (const count of [1, 3, 4, 5, 6, 7, 8, 10, 12, 16, 20, 30]) {
      if (id === 's123_errors_exceed_values' && count < 5) continue;
      const cut = benchInput(id, count, { exact: false });
      if (cut.terms.every((t) => t.sign === 0)) continue;
      const g = diagnoseGrowth(cut);
      expect(allowed, `${count}: ${g.statement}`).toContain(g.verdict);
      if (count < 4) expect(g.verdict === 'undecided' || g.verdict === 'terminating').toBe(true);
    }
  });
});

describe('flags say what happened', () => {
  it('the mistyped sign is named', () => {
    const g = diagnoseGrowth(benchInput('s138_sign_typo'));
    expect(g.flags.find((f) => f.code === 'outlier')?.text).toBe('outlier at n = 7: its sign alone breaks the pattern');
    expect(g.usableCoefficients).toBe(7);
  });

  it('noise is found in the data themselves, and limits the usable coefficients', () => {
    const small = diagnoseGrowth(benchInput('s106_noise_1e-6', undefined, { silent: true }));
    const large = diagnoseGrowth(benchInput('s108_noise_30pct', undefined, { silent: true }));
    for (const g of [small, large]) {
      expect(g.verdict).toBe('factorial');
      expect(codes(g)).toContain('noisy');
      expect(Math.abs(g.nearest!.t.value + 1)).toBeLessThan(g.nearest!.t.error);
    }
    expect(small.usableCoefficients).toBe(8);
    expect(large.usableCoefficients).toBeLessThanOrEqual(2);
    const scatter = /relative ([0-9.e-]+)/.exec(small.flags.find((f) => f.code === 'noisy')!.text)![1];
    expect(Number(scatter)).toBeGreaterThan(4e-7);
    expect(Number(scatter)).toBeLessThan(2.5e-6);
  });

  it('errors larger than the values end the statement where they begin', () => {
    const g = diagnoseGrowth(benchInput('s123_errors_exceed_values'));
    expect(g.flags.find((f) => f.code === 'errors-exceed-values')?.text).toContain(
      'no statement about growth beyond n = 3',
    );
  });

  it('leading zeros shift the exponent', () => {
    const g = diagnoseGrowth(benchInput('s135_zero_leading'));
    expect(g.flags.find((f) => f.code === 'leading-zeros')?.text).toContain('smaller by 3');
  });

  it('the essential singularity has rate 2 √n', () => {
    const g = diagnoseGrowth(benchInput('s132_essential_singularity'));
    const [, rate, kappa] = /e\^\(([0-9.]+) n\^([0-9.]+)\)/.exec(
      g.flags.find((f) => f.code === 'essential-singularity')!.text,
    )!;
    expect(Number(rate)).toBeCloseTo(2, 1);
    expect(kappa).toBe('0.5');
  });

  it('growth of order 2 is named', () => {
    expect(diagnoseGrowth(benchInput('s113_2nfact_alt')).statement).toContain('(2n)!');
    expect(diagnoseGrowth(benchInput('s115_nfact2_alt')).statement).toContain('(n!)^2');
  });

  it('logarithms have a Stokes constant instead of a strength', () => {
    const g = diagnoseGrowth(benchInput('s26_bessel_k0'));
    expect(g.nearest?.logarithmic).toBe(true);
    expect(g.nearest?.strength).toBeUndefined();
    expect(Math.abs(g.nearest!.stokes!.value - 1 / pi)).toBeLessThan(g.nearest!.stokes!.error);
  });

  it('behind the mass-like singularity at 1/2 stands the ultraviolet pole at −1', () => {
    const g = diagnoseGrowth(benchInput('s13_mass_like'));
    expect(Math.abs(g.second!.t.value + 1)).toBeLessThan(0.1);
    expect(g.second!.kind).toBe('negative axis');
  });

  it('a weak ultraviolet singularity is not claimed before it shows', () => {
    for (const id of ['s09_uv1_ir2_poles', 's10_uv1_ir2_branch', 's151_demo_vellum_adler', 's87_large_b0_adler']) {
      for (const count of [4, 5, 6, 7]) {
        const g = diagnoseGrowth(benchInput(id, count));
        expect(g.verdict, g.statement).toBe('undecided');
        expect(g.nearest).toBeUndefined();
        expect(g.competition.length).toBeGreaterThan(0);
      }
      const g = diagnoseGrowth(benchInput(id, 12));
      expect(codes(g)).toContain('competing-singularities');
      expect(g.nearest?.standing).toBe('indicative');
    }
  });
});
