/** Closed forms of coefficients against their enclosures. */
import { describe, expect, test } from 'vitest';
import { QUANTITIES, chainCoefficients, exactForms, formText } from '../../src/bubbles/index.js';
import { R, exact } from '../../src/numerics/index.js';
import { exactOfFormal } from '../../src/qcd/constants/formal-value.js';
import { named } from './support.js';

/** 200 digits. */
const BITS = 670;

describe('closed forms lie in the enclosures', () => {
  test.each(QUANTITIES.map(({ name }) => name))('%s', (name) => {
    const quantity = named(name);
    const forms = exactForms(quantity, exact(1), 4)!;
    expect(forms).toHaveLength(4);
    const values = chainCoefficients(quantity, 4);
    forms.forEach((form, n) => {
      const [own, ball] = [exactOfFormal(form).ball(BITS), values[n]!.ball(BITS)];
      expect(R.overlaps(own, ball), `c_${n} = ${formText(form)}`).toBe(true);
      expect(R.accuracyBits(ball)).toBeGreaterThan(BITS - 8);
    });
  });
});

// T. van Ritbergen, Phys. Lett. B 454 (1999) 353 (from memory): the n_f part of the two-loop width in the pole mass,
// (C_F/2)(−1009/288 + 77π²/216 + 8ζ(3)/3) = C_F c_1 (−1/6).
test('b → u: one and two loops are the published ones', () => {
  const [c0, c1] = exactForms(named('b-to-u-pole'), exact(1), 2)!;
  expect(formText(c0!)).toBe('25/8 - 1/2*pi^2');
  expect(formText(c1!)).toBe('1009/96 - 8*zeta(3) - 77/72*pi^2');
});

test('none away from μ = Q, and no more than are known', () => {
  expect(exactForms(named('b-to-u-pole'), exact(2), 4)).toBeUndefined();
  expect(exactForms(named('b-to-u-msbar'), exact(1), 8)).toHaveLength(4);
});
