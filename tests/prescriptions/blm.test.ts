/**
 * BLM on series files, and the scale one order further.
 * Check values: R(e⁺e⁻): remaining coefficient 1/12 of S. J. Brodsky, G. P. Lepage, P. B. Mackenzie, Phys. Rev. D 28 (1983) 228
 * (memory, reproduced), which the Adler function shares; scale terms T_0, T_1: exact re-expansion of a made-up decomposition
 * (mpmath 1.2.1).
 */
import { describe, expect, it } from 'vitest';
import { exact, R, Rational, signExact, subExact } from '../../src/numerics/index.js';
import type { Exact } from '../../src/numerics/index.js';
import { blm } from '../../src/prescriptions/blm.js';
import { betaParts, scaleTerms } from '../../src/prescriptions/blm-sequential.js';
import { betaCoefficients } from '../../src/qcd/index.js';
import { loadSeries, parseSeries } from '../../src/series/index.js';
import type { Series } from '../../src/series/index.js';
import { expand } from '../../src/studies/index.js';
import { central, expansion, outcomes, refused } from '../support/expansions.js';
import { rational } from '../support/check-value.js';

const q = (s: string): Exact => exact(rational(s));
const at = (series: Series, alpha: string) => expand(series, q(alpha)).expansion;

describe('BLM on a series file', () => {
  it('takes the n_f dependence from the expressions of the file', async () => {
    const e = at(await loadSeries('adler'), '0.3');
    const s = central(blm, e);
    expect(s.notes.slice(0, 2)).toEqual(['μ/Q = 0.707593', 'next-to-leading coefficient there: 0.083333']);
    expect(s.notes[2]).toMatch(
      /^naive non-abelianisation of c₁, c₂, … \(known\): 1\.556 \(1\.640\), 15\.71 \(6\.371\)/,
    );
  });
  it('is the same for a file read at its own or at another number of flavours, and reads no file twice', async () => {
    const polynomials = async (flavours: number): Promise<readonly string[]> => {
      const e = at(await loadSeries('adler', { flavours }), '0.3');
      const found = e.running?.flavourPolynomials;
      expect(found?.()).toBe(found?.());
      return (found?.() ?? []).flatMap((p) => p.map((c) => R.toNumber(c.ball(100)).toPrecision(12)));
    };
    expect(await polynomials(3)).toEqual(await polynomials(5));
    expect(await polynomials(3)).toHaveLength(10);
  });
  it('stands for numbers of flavours that the file is not meant for: polynomials do not mind', async () => {
    const pole = await loadSeries('pole-msbar');
    expect(pole.flavourChoices).toBeDefined();
    expect(
      at(pole, '0.1')
        .running?.flavourPolynomials?.()
        ?.map((p) => p.length),
    ).toEqual([1, 2, 3, 4]);
  });
  it('refuses numbers without nf, and coefficients that are no polynomials of the right degree', async () => {
    const file = (c: string): string =>
      `{"coupling": {"name": "alpha_s", "divisor": "pi"}, "first power": 1, "scheme": "MSbar", "flavours": 4, "coefficients": [${c}]}`;
    for (const c of ['"1", "2", "3"', '"1", "2 - nf/3", "nf^3"', '"1", "1/(33 - 2*nf)"', '"1 + nf", "2 - nf"']) {
      const e = at(await parseSeries(file(c), { name: 'x' }), '0.1');
      expect(refused(blm, e).reason).toBe('the n_f dependence of the coefficients is not known');
    }
  });
});

describe('the scale one order further', () => {
  const parts = { r20: q('1/10'), r21: q('7/10'), r30: q('-13/10'), r31: q('2/5'), r32: q('11/10') };
  it('has the terms of the exact re-expansion', () => {
    const [T0, T1] = scaleTerms(parts, q('2'));
    expect([T0.rational?.toString(), T1.rational?.toString()]).toEqual(['-7/10', '-47/25']);
  });
  it('takes coefficients apart: r_ij put together come back', () => {
    // α_s/π: b_0 = (11 − 2n/3)/4, b_1 = (102 − 38n/3)/16.
    const c1 = (n: number): Rational => rational('1/10').add(rational('7/10').mul(b0(n)));
    const c2 = (n: number): Rational =>
      rational('-13/10')
        .add(rational('7/10').mul(b1(n)))
        .add(rational('4/5').mul(b0(n)))
        .add(rational('11/10').mul(b0(n)).mul(b0(n)));
    const b0 = (n: number): Rational => Rational.of(33 - 2 * n, 12);
    const b1 = (n: number): Rational => Rational.of(306 - 38 * n, 48);
    const linear = [c1(0), c1(1).sub(c1(0))].map(exact);
    const half = c2(2).sub(c2(1)).sub(c2(1)).add(c2(0)).div(Rational.of(2));
    const quadratic = [c2(0), c2(1).sub(c2(0)).sub(half), half].map(exact);
    const found = betaParts(linear, quadratic, q('1/4'));
    for (const [name, value] of Object.entries(found))
      expect(subExact(value, parts[name as keyof typeof parts]).rational?.toString(), name).toBe('0');
  });
  it('is the same series: it differs from fixed order beyond the third term only', async () => {
    const series = await loadSeries('adler');
    const difference = (alpha: string): number => {
      const e = { ...at(series, alpha), additive: exact(0) };
      const short = { ...e, coefficients: e.coefficients.slice(0, 3) };
      const member = outcomes(blm, short, 30).find((o) => o.variant.startsWith('scale of all n_f'));
      if (member?.kind !== 'sum') return expect.fail(member?.reason ?? 'no member');
      const x = short.x.ball(160);
      const fixed = short.coefficients.reduceRight((acc, c) => R.add(R.mul(acc, x, 160), c.ball(160), 160), R.ZERO);
      return R.toNumber(R.sub(member.value, R.mul(fixed, x, 160), 160)) / R.toNumber(x) ** 4;
    };
    const [large, small] = [difference('1/1000'), difference('1/10000')];
    expect(Number.isFinite(small)).toBe(true);
    expect(Math.abs(large / small - 1)).toBeLessThan(0.02);
  });
  it('solves its own equation for the scale', () => {
    // One-loop running without further n_f: T_1 = b_0 (r_21² − r_32) + 2 (r_20 r_21 − r_31).
    const beta = betaCoefficients(3, 'pi').slice(0, 2);
    const polynomials = [[exact(1)], [q('1'), q('-1/10')], [q('2'), q('-1/2'), q('1/50')]];
    const value = (list: readonly Exact[]): Exact =>
      exact(list.reduceRight((acc, c) => acc.mul(Rational.of(3)).add(c.rational!), Rational.ZERO));
    const e = expansion(polynomials.map(value), q('1/20'), {
      power: 1,
      running: { beta, scaleRatio: exact(1), flavours: 3, flavourPolynomials: () => polynomials },
    });
    const found = outcomes(blm, e, 20).find((o) => o.variant.startsWith('scale of all n_f'));
    if (found?.kind !== 'sum') return expect.fail('no member');
    const r = betaParts(polynomials[1]!, polynomials[2]!, q('1/4'));
    const [T0, T1] = scaleTerms(r, beta[0]!).map((t) => R.toNumber(t.ball(80))) as [number, number];
    expect(signExact(r.r21)).toBe(1);
    // x* from the value: x + r_20 x² + r_30 x³ = R, then 1/x + c ln(b x/(1 + c x))… = const + b_0 (T_0 + T_1 x).
    const [r20, r30] = [R.toNumber(r.r20.ball(80)), R.toNumber(r.r30.ball(80))];
    let x = 0.05;
    for (let i = 0; i < 60; i++) x = R.toNumber(found.value) - r20 * x * x - r30 * x ** 3;
    const [b0, c] = [R.toNumber(beta[0]!.ball(80)), R.toNumber(beta[1]!.ball(80)) / R.toNumber(beta[0]!.ball(80))];
    const scale = (y: number): number => 1 / y + c * Math.log((c * y) / (1 + c * y));
    expect(scale(x) - scale(0.05)).toBeCloseTo(b0 * (T0 + T1 * x), 9);
  });
});
