/**
 * Conformally mapped Borel transforms as a prescription.
 * Check values: mpmath 1.2.1 (ray integral and closed-form kernels); exact sums: the bench of series with exact answers.
 * Method: I. Caprini, J. Fischer, arXiv:hep-ph/9811367, 1106.5336 (abstracts seen).
 */
import { describe, expect, it } from 'vitest';
import { addExact, exact, exactReal, mulExact, pi, R, Rational } from '../../src/numerics/index.js';
import type { Exact } from '../../src/numerics/index.js';
import { conformalBorel } from '../../src/prescriptions/conformal.js';
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
const at = (t: string, exponent: string): StatedSingularity => ({
  t: q(t),
  exponent: q(exponent),
  corrections: [],
  kind: 'other',
  origin: 'file',
});

/** Taylor coefficients c_n of A (1 − u/u0)^(−p): A (p)_n u0^(−n). */
function branch(A: string, u0: string, p: string, count: number): Exact[] {
  const list: Rational[] = [rational(A)];
  for (let n = 1; n < count; n++) list.push(list[n - 1]!.mul(rational(p).add(Rational.of(n - 1))).div(rational(u0)));
  return list.map((c) => exact(c));
}
const sum = (...lists: readonly Exact[][]): Exact[] =>
  lists[0]!.map((_, n) => lists.reduce<Exact>((acc, l) => addExact(acc, l[n] ?? exact(0)), exact(0)));

describe('a toy with ultraviolet and infrared branch points', () => {
  // B = −0.02(1+u)^−1.21 + 0.5(1−u/2)^−2.58 − 0.3(1−u/3)^−3.37 + 0.8 + 0.01u at g = 2.25·0.32/π.
  const toy = (N: number): Exact[] =>
    sum(branch('-0.02', '-1', '1.21', N), branch('0.5', '2', '2.58', N), branch('-0.3', '3', '3.37', N), [
      q('0.8'),
      q('0.01'),
    ]);
  const g = exactReal((prec) => R.div(R.fromRational(rational('0.72'), prec + 8), pi(prec + 8), prec + 8));
  // ∫ e^{−u/g} B du = g F(g): power 1.
  const run = (N: number): ReturnType<typeof outcomes> =>
    outcomes(
      conformalBorel,
      expansion(toy(N), g, { power: 1, stated: [at('-1', '1.21'), at('2', '2.58'), at('3', '3.37')] }),
      25,
    );
  const exactValue = '0.262616345659179386251114794360249554';
  const errors: [number, string, string, string][] = [
    [
      4,
      '-0.00767870571204446661205465956813014221',
      '0.000901182070203737325348819883278244798',
      '0.0111921676752313989718295226642606371',
    ],
    [
      5,
      '-0.00351111307169978034560649460146536276',
      '0.000286151698459847484426729135601830962',
      '0.00955637778503627203654888515464173135',
    ],
    [
      10,
      '0.00337255344726565729650631953910919934',
      '0.00000376076179116349200527594182444323997',
      '0.0101076860460710255874072875346877693',
    ],
    [
      24,
      '0.0000265327850232596506599441787573949201',
      '0.000000914681347305414117844515950789804692',
      '0.0101952084142422249595070880486856363',
    ],
  ];
  for (const [N, plain, soft, softIm] of errors) {
    it(`${N} coefficients`, () => {
      const found = run(N);
      const value = (
        variant: string,
      ): { value: ReturnType<typeof central>['value']; imaginary?: ReturnType<typeof central>['value'] } => {
        const o = found.find((p) => p.variant === variant);
        if (o?.kind !== 'sum') expect.fail(variant);
        return o;
      };
      const expected = (error: string): string => rational(exactValue).add(rational(error)).toString();
      expectNear(value('two cuts, not softened').value, expected(plain), 1e-24);
      expectNear(value('two cuts, softened in w').value, expected(soft), 1e-24);
      expectNear(value('two cuts, softened in w').imaginary!, softIm, 1e-24);
    });
  }
  it('covers the exact value with its own error', () => {
    for (const N of [4, 5, 6, 10]) {
      const s = run(N)[0]!;
      if (s.kind !== 'sum') expect.fail('no sum');
      expect(Math.abs(R.toNumber(s.value) - 0.2626163456591794)).toBeLessThan(s.truncation!);
    }
  });
});

describe('exact on its own class', () => {
  it('one branch point, softened in t, at one coefficient more than none', () => {
    const b = readBench('s04_shift_nonalt_b1_2');
    for (const r of b.references) {
      const found = outcomes(conformalBorel, benchExpansion(b, r.x, 4), 25);
      const s = found.find((o) => o.variant === 'one cut, softened in t');
      if (s?.kind !== 'sum') expect.fail('no sum');
      expect(digitsReached(s, r)).toBeGreaterThan(24);
      expectNear(s.imaginary!, r.im_plus!, 1e-11 * Math.abs(Number(r.im_plus)));
    }
  });
});

describe('the bench', () => {
  const reach = (id: string, x: string, count: number): number => {
    const b = readBench(id);
    return digitsReached(
      central(conformalBorel, benchExpansion(b, x, count)),
      b.references.find((r) => r.x === x)!,
    );
  };
  it('gains with the coefficients', () => {
    expect(reach('s10_uv1_ir2_branch', '1/10', 10)).toBeGreaterThan(5);
    expect(reach('s10_uv1_ir2_branch', '1/10', 30)).toBeGreaterThan(12);
    expect(reach('s13_mass_like', '1/20', 30)).toBeGreaterThan(8);
    expect(reach('s40_aho_quartic', '1/10', 30)).toBeGreaterThan(11);
    expect(reach('s03_shift_alt_b1_2', '1', 20)).toBeGreaterThan(9);
  });
});

describe('covariance', () => {
  it('does not see x → λx; carries prefactor, power and additive part along', () => {
    const b = readBench('s10_uv1_ir2_branch');
    const e = benchExpansion(b, '1/10', 8, { power: 1, factor: exact(5), additive: exact(2) });
    const one = central(conformalBorel, e);
    const other = central(conformalBorel, rescaled(e, Rational.of(9, 5)));
    expect(R.overlaps(one.value, other.value)).toBe(true);
    expect(R.overlaps(one.imaginary!, other.imaginary!)).toBe(true);
    const plain = central(conformalBorel, benchExpansion(b, '1/10', 8));
    const expected = R.add(
      R.fromNumber(2),
      R.mul(plain.value, mulExact(exact(5), exact(Rational.of(1, 10))).ball(200), 200),
      200,
    );
    expect(R.overlaps(one.value, expected)).toBe(true);
  });
});

describe('refusals', () => {
  it('no position stated', () => {
    expect(
      refused(conformalBorel, { ...benchExpansion(readBench('s10_uv1_ir2_branch'), '1/10', 10), stated: [] }).reason,
    ).toContain('position');
  });
  it('a complex pair in the terms', () => {
    const e = { ...benchExpansion(readBench('s119_conj_cos3_5'), '1/10', 30), stated: [at('2', '1')] };
    expect(refused(conformalBorel, e).reason).toContain('complex pair');
  });
  it('a stated position too far out, or on the wrong axis', () => {
    const b = readBench('s02_euler_nonalternating');
    expect(refused(conformalBorel, { ...benchExpansion(b, '1/10', 20), stated: [at('2', '1')] }).reason).toContain(
      'nearer',
    );
    expect(refused(conformalBorel, { ...benchExpansion(b, '1/10', 20), stated: [at('-2', '1')] }).reason).toContain(
      'positive axis',
    );
  });
  it('growth that is not factorial', () => {
    refused(conformalBorel, { ...benchExpansion(readBench('s100_geometric'), '1/10', 20), stated: [at('2', '1')] });
    refused(conformalBorel, { ...benchExpansion(readBench('s113_2nfact_alt'), '1/25', 20), stated: [at('-2', '1')] });
  });
});

describe('one member alone', () => {
  it('is the value of the whole list', () => {
    const e = benchExpansion(readBench('s10_uv1_ir2_branch'), '1/10', 8);
    const [alone] = outcomes(conformalBorel, e, 20, 'two cuts, softened in w');
    if (alone?.kind !== 'sum') expect.fail('no sum');
    expect(R.overlaps(alone.value, central(conformalBorel, e).value)).toBe(true);
  });
});
