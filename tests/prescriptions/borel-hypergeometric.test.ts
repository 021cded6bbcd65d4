/**
 * Hypergeometric Borel sums as a prescription. Check values: mpmath 1.2.1; exact sums: the bench of series with exact answers
 * (mpmath 1.2.1 and PARI/GP 2.15.2). Method: arXiv:1405.7956, 1802.06034 (abstract seen).
 */
import { describe, expect, it } from 'vitest';
import { exact, R, Rational } from '../../src/numerics/index.js';
import { borelHypergeometric } from '../../src/prescriptions/borel-hypergeometric.js';
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

describe('exact on its own class: six coefficients give every digit asked for', () => {
  for (const id of [
    's03_shift_alt_b1_2',
    's04_shift_nonalt_b1_2',
    's24_airy_ai',
    's26_bessel_k0',
    's27_bessel_i0',
    's29_erfc',
    's30_dawson',
    's46_zerodim_phi4',
    's47_zerodim_phi4_negative',
  ]) {
    it(id, () => {
      const b = readBench(id);
      for (const r of [b.references[0]!, b.references[b.references.length - 1]!]) {
        const s = central(borelHypergeometric, benchExpansion(b, r.x, 6), 25);
        expect(digitsReached(s, r), r.x).toBeGreaterThan(25);
        if (r.im_plus !== undefined) expectNear(s.imaginary!, r.im_plus, 1e-18 * Math.abs(Number(r.im_plus)));
        expect(s.trust).toBe('converged');
      }
    });
  }
});

describe('elsewhere', () => {
  it('the oscillator: (E − 1/2)/g by seven ratios, the first term apart', () => {
    const b = readBench('s40_aho_quartic');
    const s = central(borelHypergeometric, benchExpansion(b, '1', 9), 20);
    expectNear(s.value, '0.803815893577957088584343260238741196', 1e-14);
    expect(s.notes.join(' ')).toContain('stands apart');
    expect(Math.abs(R.toNumber(s.value) - 0.8037706512342738)).toBeLessThan(s.truncation!);
  });
  it('a mass-like series: dominated by one cut, errors cover the miss', () => {
    const b = readBench('s13_mass_like');
    const r = b.references.find((ref) => ref.x === '1/20')!;
    for (const count of [6, 8, 10, 12]) {
      const s = central(borelHypergeometric, benchExpansion(b, '1/20', count));
      const miss = Math.abs(R.toNumber(R.sub(s.value, R.fromRational(rational(r.pv), 200), 200)));
      expect(miss, `${count}`).toBeLessThan(5 * s.truncation!);
    }
  });
  it('tells a fit whose singularity is far from the known one', () => {
    const b = readBench('s04_shift_nonalt_b1_2');
    const e = benchExpansion(b, '1/10', 6, {
      stated: [{ t: exact(5), corrections: [], kind: 'other', origin: 'file' }],
    });
    expect(central(borelHypergeometric, e).notes.join(' ')).toContain('misses it');
  });
});

describe('covariance', () => {
  it('does not see x → λx; carries prefactor, power and additive part along', () => {
    const b = readBench('s13_mass_like');
    const e = benchExpansion(b, '1/20', 6, { power: 1, factor: exact(4), additive: exact(-1) });
    const one = central(borelHypergeometric, e);
    const other = central(borelHypergeometric, rescaled(e, Rational.of(11, 3)));
    expect(R.overlaps(one.value, other.value)).toBe(true);
    expect(R.overlaps(one.imaginary!, other.imaginary!)).toBe(true);
    const plain = central(borelHypergeometric, benchExpansion(b, '1/20', 6));
    expect(
      R.overlaps(one.value, R.sub(R.mul(plain.value, R.fromRational(Rational.of(1, 5), 200), 200), R.ONE, 200)),
    ).toBe(true);
  });
});

describe('refusals', () => {
  it('competing singularities', () => {
    expect(refused(borelHypergeometric, benchExpansion(readBench('s10_uv1_ir2_branch'), '1/10', 6)).reason).toContain(
      'competes',
    );
    refused(borelHypergeometric, benchExpansion(readBench('s119_conj_cos3_5'), '1/10', 8));
  });
  it('a vanishing coefficient, other growth, too few terms', () => {
    const c = ['1', '1', '0', '6', '24', '120', '720', '5040'].map((s) => exact(rational(s)));
    refused(borelHypergeometric, expansion(c, exact(Rational.of(1, 10))));
    refused(borelHypergeometric, benchExpansion(readBench('s100_geometric'), '1/10', 20));
    refused(borelHypergeometric, benchExpansion(readBench('s113_2nfact_alt'), '1/25', 20));
    refused(borelHypergeometric, benchExpansion(readBench('s01_euler_alternating'), '1/10', 2));
  });
});

it('one member alone is the value of the whole, without an error', () => {
  const e = benchExpansion(readBench('s13_mass_like'), '1/20', 6);
  const [alone] = outcomes(borelHypergeometric, e, 20, '6 coefficients');
  if (alone?.kind !== 'sum') expect.fail('no sum');
  expect(R.overlaps(alone.value, central(borelHypergeometric, e).value)).toBe(true);
  expect(alone.truncation).toBeUndefined();
});
