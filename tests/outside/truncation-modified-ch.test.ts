/**
 * Credible intervals of the modified Cacciari–Houdeau model.
 *
 * Model: E. Bagnaschi, M. Cacciari, A. Guffanti, L. Jenniches, JHEP 02 (2015) 133, arXiv:1409.5036 [summary in
 * arXiv:1505.08029 seen; formulas re-derived; lambda = 1 and 0.6 from memory]. Check values computed with mpmath 1.2.1
 * (closed form).
 */
import { describe, test } from 'vitest';
import { modifiedCacciariHoudeau } from '../../src/truncation/bayesian/modified-ch.js';
import { answer, ask, expectClose, numbers } from '../truncation/support.js';

const ADLER = ['1', '1.6398212', '6.3710145', '49.0757'];

describe('the Adler function, n_f = 3, alpha_s = 0.32, order 5', () => {
  test.each([
    [
      1,
      '0.0256336978341161846168360541791381944',
      '0.0217886431589987569243106460522674652',
      '0.0362515231307809403132126418013088261',
    ],
    [
      0.6,
      '0.197790878349661918339784368666189771',
      '0.168122246597212630588816713366261306',
      '0.279718542675778860441455569454543411',
    ],
  ])('lambda = %d', (lambda, scale, half68, half95) => {
    const question = ask(numbers(ADLER), { at: '0.32', divisor: 'pi', priors: { 'chbar.lambda': lambda } });
    const { high68, high95, estimate } = answer(modifiedCacciariHoudeau, question);
    expectClose(high68, half68, 1e-10);
    expectClose(high95, half95, 1e-10);
    expectClose((estimate.facts[0]?.value ?? 0) * 2 ** question.known.unit, scale, 1e-10);
  });
});
