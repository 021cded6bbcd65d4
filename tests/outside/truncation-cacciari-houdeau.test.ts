/**
 * Credible intervals of Cacciari and Houdeau.
 *
 * Model: M. Cacciari, N. Houdeau, JHEP 09 (2011) 039, arXiv:1105.5152 [abstract seen; formulas re-derived]. No published
 * interval could be read; check values computed with mpmath 1.2.1, where the integral of the density equals the level.
 */
import { describe, expect, test } from 'vitest';
import { cacciariHoudeau } from '../../src/truncation/bayesian/cacciari-houdeau.js';
import { answer, ask, expectClose, numbers } from '../truncation/support.js';

const ADLER = ['1', '1.6398212', '6.3710145', '49.0757'];

describe('the Adler function, n_f = 3, alpha_s = 0.32', () => {
  test('counted in alpha_s/pi', () => {
    const { high68, high95, estimate } = answer(cacciariHoudeau, ask(numbers(ADLER), { at: '0.32', divisor: 'pi' }));
    expectClose(high68, '0.000457389253802133532258335883858992551', 1e-10);
    expectClose(high95, '0.000760995395306690555086327170085689134', 1e-10);
    const unit = 2 ** ask(numbers(ADLER), { at: '0.32', divisor: 'pi' }).known.unit;
    expectClose((estimate.facts[0]?.value ?? 0) * unit, '0.000538105004473098273245101039834108884', 1e-10);
  });

  test('counted in alpha_s the 68 % band is 1.44e-3, and the note says by how much it differs', () => {
    const inPi = ask(numbers(ADLER), { at: '0.32', divisor: 'pi', priors: { 'ch.unit': 1 / Math.PI } });
    expectClose(answer(cacciariHoudeau, inPi).high68, 1.44e-3, 5e-3);
    const note = answer(cacciariHoudeau, ask(numbers(ADLER), { at: '0.32', divisor: 'pi' })).estimate.notes[0];
    expect(note).toContain('counted in powers of alpha_s instead of alpha_s/pi the bands are 3.14 times as wide');
  });
});

/**
 * R(e+e-), n_f = 5, non-singlet, alpha_s = 0.118, in powers of alpha_s; coefficients of (alpha_s/pi)^k from
 * S. G. Gorishny, A. L. Kataev, S. A. Larin 1991; P. A. Baikov et al. arXiv:0801.1821 [memory, cross-checked]. Intervals
 * computed once more by hand from the formula, five digits.
 */
describe('R(e+e-) at five flavours', () => {
  const R5 = ['1', '1.40923', '-12.76709', '-79.981'];
  const given = { at: '0.118', divisor: 'pi', additive: '1', priors: { 'ch.unit': 1 / Math.PI } } as const;

  test.each([
    [2, 0.00053378, 0.0013504],
    [3, 7.238e-5, 1.3651e-4],
    [4, 1.5967e-5, 2.6565e-5],
  ])('%i coefficients, the leading 1 not counted', (count, half68, half95) => {
    const { high68, high95 } = answer(cacciariHoudeau, ask(numbers(R5.slice(0, count)), given));
    expectClose(high68, half68, 1e-4);
    expectClose(high95, half95, 1e-4);
  });

  test.each([
    [2, 0.0014897, 0.0028095],
    [3, 1.648e-4, 2.7418e-4],
    [4, 1.8668e-5, 2.9106e-5],
  ])('%i coefficients, the leading 1 counted', (count, half68, half95) => {
    const counted = { ...given, priors: { ...given.priors, 'ch.constant': 1 } };
    const { high68, high95 } = answer(cacciariHoudeau, ask(numbers(R5.slice(0, count)), counted));
    expectClose(high68, half68, 1e-4);
    expectClose(high95, half95, 1e-4);
  });
});
