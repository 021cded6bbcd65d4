/** Least term with terminant: its error. Exact sums: the bench of series with exact answers. */
import { describe, expect, it } from 'vitest';
import { exact, R, Rational } from '../../src/numerics/index.js';
import { terminantSum } from '../../src/prescriptions/terminant.js';
import { benchExpansion, central, expansion, readBench } from '../support/expansions.js';
import { rational } from '../support/check-value.js';

const size = (x: { readonly value: Parameters<typeof R.toNumber>[0] }): number => R.toNumber(x.value);

describe('error of a terminant', () => {
  it('vanishes with the doubt about the strength: exact on its own class', () => {
    // Σ (−1)^n n! g^n, all strengths alike: only the move of the cut is left, and it does not move the value.
    const b = readBench('s01_euler_alternating');
    for (const x of ['1/10', '1/5']) {
      const s = central(terminantSum, benchExpansion(b, x, 14), 25);
      expect(s.truncation).toBeLessThan(1e-20);
    }
  });

  it('by hand: three terms, strengths that do not settle', () => {
    // c = 1, 1, 3 with t* = 1, γ = 1: s = 1, 1, 3/2; ρ = 1 of k = 2 (|1 − 2/3| = 1/3) and k = 1 (below two). x = 1/5: cut after two
    // terms at most, T_2 = 3/25, ω F_{2}(5) = 5 (5 F_1 − 1)/2, F_1 = 5 F_0 − 1, F_0 = e^{−5} Ei(5) (mpmath 1.3.0: 0.27076625549).
    const F0 = 0.27076625549;
    const factor = (5 * (5 * (5 * F0 - 1) - 1)) / 2;
    const e = expansion(
      [1, 1, 3].map((c) => exact(c)),
      exact(rational('1/5')),
      {
        stated: [{ t: exact(1), exponent: exact(1), corrections: [], kind: 'infrared', origin: 'file' }],
      },
    );
    const s = central(terminantSum, e);
    expect(s.variant).toBe('2 terms');
    const moved = 0.12 * factor - (0.2 * (5 * (5 * F0 - 1)) - 0.2);
    const next = size(s) - (1.2 + 0.12 * factor);
    expect(Math.abs(next)).toBeLessThan(1e-9);
    const wanted = 0.12 * Math.max(0.5, Math.abs(factor - 1));
    expect(Math.abs(moved)).toBeLessThan(wanted);
    expect(s.truncation).toBeCloseTo(wanted, 8);
  });

  it('covers the miss where a second singularity and 1/n corrections spoil the strength', () => {
    const b = readBench('s13_mass_like');
    for (const r of b.references) {
      const x = Rational.parse(r.x)!.toNumber();
      for (const count of [4, 6, 10, 16]) {
        // Cuts before the first term are refused.
        if (0.5 / x < 1.5) continue;
        const s = central(terminantSum, benchExpansion(b, r.x, count), 20);
        expect(Math.abs(size(s) - Number(r.pv)), `${r.x}, ${count} terms`).toBeLessThan(s.truncation!);
      }
    }
  });
});
