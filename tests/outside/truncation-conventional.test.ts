/**
 * Simple estimates of the truncation error of the Adler function, n_f = 3, at alpha_s = 0.32.
 *
 * Coefficients: P. A. Baikov, K. G. Chetyrkin, J. H. Kuehn, arXiv:0801.1821 [memory, cross-checked]. Check values computed
 * with mpmath 1.2.1 ("arithmetic"). The FAC estimate 275 of the fifth coefficient is the published one, from the method of
 * A. L. Kataev, V. V. Starshenko, hep-ph/9502348 [memory; reproduced].
 */
import { describe, expect, test } from 'vitest';
import { toNumberExact } from '../../src/numerics/index.js';
import { betaCoefficients } from '../../src/qcd/index.js';
import { loadSeries } from '../../src/series/index.js';
import { facNext, facPrediction } from '../../src/truncation/conventional/fac-next.js';
import { geometricTail } from '../../src/truncation/conventional/geometric-tail.js';
import { lastRatio } from '../../src/truncation/conventional/last-ratio.js';
import { lastTerm } from '../../src/truncation/conventional/last-term.js';
import { padeNext } from '../../src/truncation/conventional/pade-next.js';
import { answer, ask, expectClose, numbers } from '../truncation/support.js';

const ROUNDED = ['1', '1.6398212', '6.3710145', '49.0757'];

describe('the Adler function at alpha_s = 0.32', () => {
  const question = ask(numbers(ROUNDED), { at: '0.32', divisor: 'pi', flavours: 3 });

  test('last term', () => {
    const { low68, high68, high95 } = answer(lastTerm, question);
    expectClose(high68, '0.00528283352785183863935518129036463322', 1e-12);
    expect(low68).toBe(-high68);
    expectClose(high95, 2 * high68, 1e-15);
  });

  test('last term times ratio', () => {
    const { high68, next, estimate } = answer(lastRatio, question);
    expectClose(high68, '0.00414500387152162798064018965017089695', 1e-12);
    expectClose(next, high68, 1e-15);
    expectClose(estimate.facts[0]?.value ?? 0, '0.784617544669652513730536259970588242', 1e-12);
  });

  test('geometric tail', () => {
    expectClose(answer(geometricTail, question).high68, '0.0192448538353049179076500080657827207', 1e-12);
  });

  test('Padé: [1/2] by its determinant formula', () => {
    const [c0 = 0, c1 = 0, c2 = 0, c3 = 0] = ROUNDED.map(Number);
    const c4 = (2 * c1 * c2 * c3 - c0 * c3 ** 2 - c2 ** 3) / (c1 ** 2 - c0 * c2);
    expectClose(answer(padeNext, question).next, c4 * (0.32 / Math.PI) ** 5, 1e-12);
  });
});

describe('the coefficient that fastest apparent convergence predicts', () => {
  test.each([
    [2, '5.60425128162443847231399067283274631'],
    [3, '27.4644835424747340191823252748248210'],
    [4, '274.583719606761980424308222466466094'],
  ])('from %i coefficients of the Adler function', async (count, wanted) => {
    const { coefficients } = await loadSeries('adler');
    const known = coefficients.slice(0, count).map((c) => c.value);
    expectClose(toNumberExact(facPrediction(known, 1, betaCoefficients(3, 'pi'))), wanted, 1e-10);
  });

  test('rounds to the published 275', async () => {
    const { coefficients } = await loadSeries('adler');
    const known = coefficients.map((c) => c.value);
    expect(Math.round(toNumberExact(facPrediction(known, 1, betaCoefficients(3, 'pi'))))).toBe(275);
  });

  test('enters the band with the right power of the coupling', () => {
    const question = ask(numbers(ROUNDED.slice(0, 2)), { at: '0.32', divisor: 'pi', flavours: 3 });
    // r_2 = r_1 (c_1 + r_1), c_1 = 16/9 for n_f = 3.
    expectClose(answer(facNext, question).next, 1.6398212 * (16 / 9 + 1.6398212) * (0.32 / Math.PI) ** 3, 1e-12);
  });
});
