/**
 * The ground state of H = p²/2 + x²/2 + g x⁴ from its weak-coupling series.
 * Coefficients and their large orders: C. M. Bender, T. T. Wu, Phys. Rev. 184 (1969) 1231 (from memory, recomputed by their recursion
 * below); energies: diagonalisation in 80 to 100 oscillator states, mpmath 1.3.0 at 60 digits, two frequencies agreeing to 40
 * digits. At H = p² + x² + x⁴ this is the published 1.392351641530291855657507876609934184600066711220834… of F. Vinette,
 * J. Čížek, J. Math. Phys. 32 (1991) 3392 (from memory; 44 digits agree), twice the energy at g = 1/2.
 */
import { describe, expect, it } from 'vitest';
import { exact, R, Rational } from '../../src/numerics/index.js';
import { borelPade } from '../../src/prescriptions/borel-pade.js';
import { orderDependentMap } from '../../src/prescriptions/order-dependent-map.js';
import { wenigerDelta } from '../../src/prescriptions/weniger-delta.js';
import { conformalBorel } from '../../src/prescriptions/conformal.js';
import type { Prescription } from '../../src/prescriptions/index.js';
import type { Expansion } from '../../src/series/index.js';
import { central, expansion, growthOf, readBench } from '../support/expansions.js';
import { distanceTo, rational } from '../support/check-value.js';

const q = rational;
const bench = readBench('s40_aho_quartic');

/** E_0, E_1, …: ψ = e^{−x²/2} Σ g^k B_k(x²), the Riccati equation of y = −ψ′/ψ order by order. */
function benderWu(count: number): Rational[] {
  // y = x + Σ_k g^k y_k(x), y_k odd polynomials: y′ − y² + x² + 2g x⁴ = 2E, that is 2 x y_k = y_k′ + 2 δ_{k1} x⁴ − Σ y_j y_{k−j} − 2 E_k.
  const y: Rational[][] = [[]];
  const energies = [Rational.of(1, 2)];
  for (let k = 1; k < count; k++) {
    // Coefficients of x^{2m}, m = 0 … 2k, of 2 δ x⁴ − Σ_{0<j<k} y_j y_{k−j}; y_j holds those of x^{2m+1}.
    const right = Array.from({ length: 2 * k + 1 }, (_, m) => (k === 1 && m === 2 ? Rational.of(2) : Rational.ZERO));
    for (let j = 1; j < k; j++)
      y[j]!.forEach((a, m) =>
        y[k - j]!.forEach((b, l) => {
          right[m + l + 1] = right[m + l + 1]!.sub(a.mul(b));
        }),
      );
    const own: Rational[] = Array.from({ length: 2 * k }, () => Rational.ZERO);
    for (let m = 2 * k; m >= 1; m--) {
      const slope = m < 2 * k ? own[m]!.mul(Rational.of(2 * m + 1)) : Rational.ZERO;
      own[m - 1] = right[m]!.add(slope).div(Rational.of(2));
    }
    energies.push(own[0]!.div(Rational.of(2)));
    y.push(own);
  }
  return energies;
}

describe('the series', () => {
  it('is that of Bender and Wu', () => {
    const own = benderWu(30);
    expect(own.slice(0, 7).map(String)).toEqual([
      '1/2', '3/4', '-21/8', '333/16', '-30885/128', '916731/256', '-65518401/1024',
    ]); // prettier-ignore
    own.forEach((c, n) => expect(bench.coefficients[n]!.rational!.equals(c)).toBe(true));
  });
  it('grows like (−1)^{n+1} √(6/π³) 3ⁿ Γ(n + 1/2) (1 − 95/(72 n) + …)', () => {
    let gamma = Math.log(Math.sqrt(Math.PI));
    const logs = Array.from({ length: 121 }, (_, n) => (n === 0 ? gamma : (gamma += Math.log(n - 0.5))));
    const ratio = (n: number): number => {
      const c = bench.coefficients[n]!.ball(96);
      const bits = R.upperBits(c);
      const log = Math.log(Math.abs(R.toNumber(R.mul2exp(c, -bits)))) + bits * Math.LN2;
      return Math.exp(log - n * Math.log(3) - logs[n]! - Math.log(Math.sqrt(6 / Math.PI ** 3)));
    };
    expect(n2(ratio, 120)).toBeCloseTo(1, 4);
    expect(120 * (1 - ratio(120))).toBeCloseTo(95 / 72, 1);
  });
  it('is seen to have its singularity at t = −1/3 with exponent 1/2', () => {
    const growth = growthOf(expansion(bench.coefficients.slice(1, 40), exact(q('1/10'))));
    expect(growth.nearest?.t.value).toBeCloseTo(-1 / 3, 4);
  });
});

/** Two-step Richardson extrapolation. */
const n2 = (f: (n: number) => number, n: number): number => {
  const m = n / 2;
  const k = n / 4;
  const [a, b] = [2 * f(n) - f(m), 2 * f(m) - f(k)];
  return (4 * a - b) / 3;
};

const ENERGIES: readonly (readonly [g: string, energy: string])[] = [
  ['1/10', '0.5591463271835195767154065769198285927113'],
  ['1/2', '0.6961758207651459278287539383049670923000'],
  ['1', '0.8037706512342737693540859647366241910405'],
];

/** E at g from `count` coefficients. */
const series = (g: string, count: number): Expansion => ({
  ...expansion(bench.coefficients.slice(0, count), exact(q(g)), {
    stated: [{ t: exact(q('-1/3')), exponent: exact(q('1/2')), corrections: [], kind: 'other', origin: 'file' }],
  }),
  strongCoupling: { power: q('1/3'), spacing: q('2/3') },
});

describe('energies', () => {
  // [method, correct digits from 30 coefficients at g = 1/10, 1/2, 1]; the order-dependent map knows E ~ g^{1/3}.
  const cases: readonly (readonly [Prescription, readonly [number, number, number]])[] = [
    [borelPade, [15.9, 8.7, 6.6]],
    [conformalBorel, [14.9, 8.2, 6.8]],
    [wenigerDelta, [13.6, 6.4, 4.3]],
    [orderDependentMap, [15.2, 11.7, 11]],
  ];
  it.each(cases.map((c) => [c[0].name, ...c] as const))('%s', (_, p, digits) => {
    ENERGIES.forEach(([g, energy], i) => {
      const s = central(p, series(g, 30), 20);
      expect(-Math.log10(distanceTo(s.value, energy)), `g = ${g}`).toBeGreaterThan(digits[i]!);
      expect(distanceTo(s.value, energy)).toBeLessThan(3 * s.truncation!);
    });
  });
});
