/**
 * The whole assessment against the bench of series with exact answers.
 * Source of the exact sums, imaginary parts and optimal orders: computed twice each, with mpmath 1.2.1 (closed forms,
 * spectral methods) and PARI/GP 2.15.2 (Laplace integrals); at least 52 digits agree. Convention: F = Σ c_n x^n, upper
 * lateral sum above the positive axis.
 */
import { describe, expect, it } from 'vitest';
import { exact, Rational } from '../../src/numerics/index.js';
import { assess } from '../../src/studies/index.js';
import type { Assessment } from '../../src/studies/index.js';
import { benchFile, benchSeries } from '../support/bench.js';

function run(id: string, x: string, count?: number): Assessment {
  return assess(
    benchSeries(benchFile(id), count),
    { value: exact(Rational.parse(x)!), text: x },
    { digits: 15, request: {} },
  );
}

/** [file, largest relative error of the verdict's value from 24 coefficients at the smallest reference coupling]. */
const SUMMED: readonly (readonly [string, number])[] = [
  ['s01_euler_alternating', 1e-14],
  ['s02_euler_nonalternating', 1e-14],
  ['s03_shift_alt_b1_2', 1e-13],
  ['s04_shift_nonalt_b1_2', 1e-12],
  ['s05_shift_nonalt_b_nf4', 1e-12],
  ['s07_shift_nonalt_b2', 1e-13],
  ['s08_shift_nonalt_b_m3_2', 1e-12],
  ['s09_uv1_ir2_poles', 1e-13],
  ['s10_uv1_ir2_branch', 1e-12],
  ['s13_mass_like', 1e-9],
  ['s17_pole_times_entire', 1e-13],
  ['s20_stirling_loggamma', 1e-13],
  ['s24_airy_ai', 1e-13],
  ['s25_airy_bi', 1e-13],
  ['s26_bessel_k0', 1e-13],
  ['s27_bessel_i1', 1e-13],
  ['s29_erfc', 1e-13],
  ['s30_dawson', 1e-12],
  ['s34_fresnel_f', 1e-12],
  ['s36_struve_h0_y0', 1e-12],
  ['s40_aho_quartic', 1e-13],
  ['s41_aho_quartic_negative', 1e-13],
  ['s43_cubic_imaginary', 1e-13],
  ['s46_zerodim_phi4', 1e-13],
  ['s49_zerodim_double_well', 1e-13],
  ['s60_eh_spinor_magnetic', 1e-13],
  ['s61_eh_spinor_electric', 1e-13],
  ['s80_wilson_planar_strong', 1e-13],
  ['s86_scqcd_su2', 1e-12],
  ['s87_large_b0_adler', 1e-9],
  ['s88_large_b0_potential', 1e-12],
  ['s113_2nfact_alt', 1e-13],
  ['s114_2nfact_nonalt', 1e-13],
  ['s119_conj_cos3_5', 1e-13],
  ['s135_zero_leading', 1e-12],
  ['s150_demo_marrowgate_mass', 1e-9],
  ['s152_demo_tessel_uv', 1e-12],
];

describe('verdict against the exact sum, 24 coefficients', () => {
  it.each(SUMMED)('%s', (id, tolerance) => {
    const file = benchFile(id);
    const r = file.references[0]!;
    const a = run(id, r.x, 24);
    // Series with first power 1 (group 8) are R = x F as the file's own convention says.
    const exactSum = Number(r.pv);
    const value = Number(a.verdict.value);
    expect(Math.abs(value - exactSum) / Math.abs(exactSum)).toBeLessThan(tolerance);
    if (r.im_plus === undefined) return;
    const im = a.ambiguity.conventions.find((c) => c.name === '|Im|');
    expect(Number(im!.value) / Math.abs(Number(r.im_plus))).toBeCloseTo(1, 2);
  });
});

describe('the stated truncation error covers what happened', () => {
  // At the largest reference couplings, where sums from 24 coefficients have visible errors.
  it.each([
    's13_mass_like',
    's25_airy_bi',
    's34_fresnel_f',
    's41_aho_quartic_negative',
    's46_zerodim_phi4',
    's47_zerodim_phi4_negative',
  ])('%s', (id) => {
    const r = benchFile(id).references.at(-1)!;
    const a = run(id, r.x, 24);
    const miss = Math.abs(Number(a.verdict.value) - Number(r.pv));
    expect(miss).toBeLessThan(5 * Number(a.verdict.truncation) + 1e-14);
  });
});

describe('optimal truncation order as seen in the terms', () => {
  it.each([
    's01_euler_alternating',
    's02_euler_nonalternating',
    's10_uv1_ir2_branch',
    's13_mass_like',
    's24_airy_ai',
    's40_aho_quartic',
  ])('%s', (id) => {
    const file = benchFile(id);
    const o = file.optimal_truncation[2]!;
    const a = run(id, o.x, 60);
    const wanted = typeof o.n_smallest_term === 'number' ? [o.n_smallest_term] : o.n_smallest_term;
    const seen = a.optimalTruncation.observed!;
    expect([seen.power, ...(seen.tiedWith === undefined ? [] : [seen.tiedWith])]).toEqual(wanted);
  });
});

describe('what must not be resummed', () => {
  const RESUMMING = ['borel-pade', 'borel-leroy-pade', 'borel-pade-2', 'singularity-model', 'least-term', 'terminant'];
  it.each([
    ['s28_bessel_k_5_2_terminates', 'terminating'],
    ['s33_incgamma_3_terminates', 'terminating'],
    ['s81_wilson_planar_weak', 'convergent'],
    ['s84_massgap_gross_neveu', 'convergent'],
    ['s100_geometric', 'geometric'],
    ['s101_exponential', 'convergent'],
    ['s103_constant', 'terminating'],
    ['s104_all_zero', 'terminating'],
    ['s105_polynomial', 'terminating'],
    ['s117_lognormal', 'superfactorial'],
    ['s123_errors_exceed_values', 'undecided'],
    ['s127_two_coeffs', 'undecided'],
    ['s128_one_coeff', 'undecided'],
  ] as const)('%s is called %s; no resummed value, no ambiguity', (id, growth) => {
    const a = run(id, '1/10');
    expect(a.growth.verdict).toBe(growth);
    expect(a.values.filter((v) => RESUMMING.includes(v.prescription) && v.value !== undefined)).toEqual([]);
    expect(a.ambiguity.conventions).toEqual([]);
    expect(a.verdict.ambiguity).toBeUndefined();
  });
  it('growth (2n)! is named, and the order-1 transform refused', () => {
    const a = run('s113_2nfact_alt', '1/10', 30);
    expect(a.growth.statement).toMatch(/\(2n\)!/);
    expect(a.values.find((v) => v.prescription === 'borel-pade')!.refused!.reason).toContain('zero radius');
  });
  it('a mistyped sign is named', () => {
    expect(run('s138_sign_typo', '1/10').cautions.find((c) => c.code === 'outlier')!.text).toMatch(/7/);
  });
  it('quoted noise of 30 % shows in the input error; noise of 1e-6 leaves a value with the usable order stated', () => {
    const rough = run('s108_noise_30pct', '1/10').verdict;
    expect(Math.abs(Number(rough.value) - 0.9156333394)).toBeLessThan(3 * Number(rough.input));
    expect(Number(rough.input)).toBeGreaterThan(0.05);
    const { coefficient_errors: _, ...unquoted } = benchFile('s108_noise_30pct');
    const at = { value: exact(Rational.of(1, 10)), text: '1/10' };
    expect(assess(benchSeries(unquoted), at, { digits: 15, request: {} }).verdict.value).toBeUndefined();
    const a = run('s106_noise_1e-6', '1/10');
    expect(Number(a.verdict.value)).toBeCloseTo(0.9156333394, 4);
    expect(a.growth.usableCoefficients).toBeLessThan(15);
  });
});
