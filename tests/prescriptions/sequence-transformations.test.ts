/**
 * Sequence transformations as prescriptions. Exact sums: the bench of series with exact answers (mpmath 1.2.1, PARI/GP 2.15.2).
 */
import { describe, expect, it } from 'vitest';
import { exact, R, Rational } from '../../src/numerics/index.js';
import { euler } from '../../src/prescriptions/euler.js';
import { levin } from '../../src/prescriptions/levin.js';
import { wenigerDelta } from '../../src/prescriptions/weniger-delta.js';
import { wynnEpsilon } from '../../src/prescriptions/wynn-epsilon.js';
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
import { expectNear } from '../support/check-value.js';

const ALL = [wynnEpsilon, levin, wenigerDelta];
const alternating = readBench('s01_euler_alternating');

describe('the Euler series with twelve terms', () => {
  // Check values: mpmath 1.2.1, recursions compared with the explicit ratios of sums.
  const e = benchExpansion(alternating, '1', 12);
  it('gives the known estimates', () => {
    expectNear(central(wenigerDelta, e, 30).value, '0.596347387349628539654013387598252592', 1e-30);
    expectNear(central(wynnEpsilon, e, 30).value, '0.595084087968952134540750323415265201', 1e-30);
    const t = outcomes(levin, e, 30).find((o) => o.variant === 't');
    if (t?.kind !== 'sum') expect.fail('no t');
    expectNear(t.value, '0.596347386780273407057148350542003191', 1e-30);
  });
  it('covers the exact sum with its own error', () => {
    for (const p of ALL) {
      const s = central(p, e);
      const miss = Math.abs(R.toNumber(s.value) - 0.5963473623231941);
      expect(miss, p.name).toBeLessThanOrEqual(2 * s.truncation!);
    }
  });
});

describe('the bench', () => {
  const reach = (id: string, x: string, count: number, p: (typeof ALL)[number]): number => {
    const b = readBench(id);
    const r = b.references.find((ref) => ref.x === x)!;
    return digitsReached(central(p, benchExpansion(b, x, count)), r);
  };
  it('δ gains more than half a digit a term on alternating n! growth', () => {
    expect(reach('s01_euler_alternating', '1/5', 20, wenigerDelta)).toBeGreaterThan(17);
    expect(reach('s03_shift_alt_b1_2', '1/5', 20, wenigerDelta)).toBeGreaterThan(14);
    expect(reach('s26_bessel_k0', '1/5', 20, wenigerDelta)).toBeGreaterThan(15);
    expect(reach('s29_erfc', '1/4', 20, wenigerDelta)).toBeGreaterThan(14);
  });
  it('Levin and ε converge on the anharmonic oscillator, Levin first', () => {
    expect(reach('s40_aho_quartic', '1/100', 20, wenigerDelta)).toBeGreaterThan(12);
    expect(reach('s40_aho_quartic', '1/100', 20, wynnEpsilon)).toBeGreaterThan(11);
    expect(reach('s40_aho_quartic', '1/100', 20, levin)).toBeGreaterThan(11);
  });
  it('ε sums (2n)!, slowly', () => {
    expect(reach('s113_2nfact_alt', '1/25', 30, wynnEpsilon)).toBeGreaterThan(5);
  });
});

describe('exact on a series of their own class', () => {
  const q = (n: number, d = 1): Rational => Rational.of(n, d);
  it('ε on a rational function, in balls with no exact singular table', () => {
    // 1/(1+x) + 2/(1+3x): four coefficients make [1/2]; a fifth meets the block of equal elements.
    const c = Array.from({ length: 6 }, (_, n) =>
      exact(
        q(-1)
          .pow(n)
          .add(q(2).mul(q(-3).pow(n))),
      ),
    );
    const s = central(wynnEpsilon, expansion(c, exact(q(1, 2))), 30);
    expectNear(s.value, q(2, 3).add(q(4, 5)).toString(), 1e-30);
  });
  it('Euler on an alternating polynomial', () => {
    // Σ (n² + 1)(−y)^n = (1 − y)/(1 + y)³·(−y) + 1/(1 + y); at y = 1 it is 1/2.
    const c = Array.from({ length: 14 }, (_, n) =>
      exact(
        q(-2)
          .pow(n)
          .mul(q(n * n + 1)),
      ),
    );
    const s = central(euler, expansion(c, exact(q(1, 2))));
    expectNear(s.value, '0.5', 1e-25);
  });
});

describe('covariance', () => {
  it('does not see x → λx, and carries prefactor, power and additive part along', () => {
    const e = benchExpansion(alternating, '1/5', 10, {
      power: 2,
      factor: exact(3),
      additive: exact(Rational.of(1, 7)),
    });
    for (const p of [wynnEpsilon, levin, wenigerDelta]) {
      const plain = central(p, benchExpansion(alternating, '1/5', 10), 25);
      const full = central(p, e, 25);
      const moved = central(p, rescaled(e, Rational.of(7, 3)), 25);
      expect(R.overlaps(full.value, moved.value), p.name).toBe(true);
      const expected = R.add(
        R.fromRational(Rational.of(1, 7), 200),
        R.mul(R.fromRational(Rational.of(3, 25), 200), plain.value, 200),
        200,
      );
      expect(R.overlaps(full.value, expected), p.name).toBe(true);
      expect(full.truncation! / (plain.truncation! * (3 / 25))).toBeCloseTo(1, 10);
    }
  });
});

describe('refusals', () => {
  it('same signs', () => {
    const e = benchExpansion(readBench('s02_euler_nonalternating'), '1/10', 14);
    for (const p of ALL) expect(refused(p, e).remedy).toContain('Borel');
  });
  it('complex pairs, whose signs are irregular', () => {
    for (const p of ALL) refused(p, benchExpansion(readBench('s119_conj_cos3_5'), '1/10', 14));
  });
  it('log-normal growth, terminating series, too few terms', () => {
    for (const p of ALL) {
      refused(p, benchExpansion(readBench('s117_lognormal'), '1/10', 20));
      refused(p, benchExpansion(readBench('s105_polynomial'), '1/10', 20));
      refused(p, benchExpansion(alternating, '1/10', 2));
    }
  });
  it('Euler on factorial growth', () => {
    expect(refused(euler, benchExpansion(alternating, '1/10', 12)).reason).toContain('factorial');
  });
  it('one refusal for all Levin variants', () => {
    expect(outcomes(levin, benchExpansion(readBench('s02_euler_nonalternating'), '1/10', 14))).toHaveLength(1);
  });
});

describe('one member alone', () => {
  it('is the value of the whole list, without an error', () => {
    const e = benchExpansion(alternating, '1/5', 10);
    const whole = central(levin, e);
    const [alone] = outcomes(levin, e, 20, whole.variant);
    if (alone?.kind !== 'sum') expect.fail('no sum');
    expect(R.overlaps(alone.value, whole.value)).toBe(true);
    expect(alone.truncation).toBeUndefined();
  });
});
