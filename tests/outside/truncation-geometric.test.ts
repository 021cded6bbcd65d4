/**
 * The geometric model.
 *
 * Model: M. Bonvini, Eur. Phys. J. C 80 (2020) 989, arXiv:2006.16293 [abstract seen, priors from memory; integrals
 * re-derived]. Check values computed with mpmath 1.2.1: evidence and mean ratio in closed form (18 digits), the predictive
 * distribution by quadrature of the density.
 */
import { describe, test } from 'vitest';
import { geometricPosterior } from '../../src/truncation/bayesian/geometric-posterior.js';
import { expectClose } from '../truncation/support.js';
import { expect } from 'vitest';

describe('relative terms 1, 0.5, 0.3, 0.12 with omega = 1, epsilon = 0.1', () => {
  const posterior = geometricPosterior([1, 0.5, 0.3, 0.12].map(Math.log), { omega: 1, epsilon: 0.1 });
  if (posterior === undefined) expect.fail();

  test('evidence', () =>
    expectClose(Math.exp(posterior.logEvidence), '0.0124088101956161088132200831337460407', 1e-10));

  test('posterior mean of the ratio', () =>
    expectClose(posterior.meanRatio, '0.505945849258342169614595536762668981', 1e-10));

  test('predictive density', () => {
    expectClose(posterior.density(-Infinity), '5.59949291945635251179180747957420117', 1e-9);
    expectClose(posterior.density(Math.log(0.1)), '1.46233220504959361482548809742232354', 1e-9);
  });

  test('half-widths at 68 and 95 %', () => {
    expectClose(Math.exp(posterior.logHalfWidth(0.68)), '0.0666902211886862285408774544243591664', 1e-6);
    // The reference integrates the density across its kinks; a recomputation with the kinks split off gives 0.1870951857
    // (mpmath 1.3.0), 6e-6 lower. Both agree within the tolerance of the reference, 1e-5.
    expectClose(Math.exp(posterior.logHalfWidth(0.95)), '0.187096252289382235163653581274355309', 1e-5);
    expectClose(Math.exp(posterior.logHalfWidth(0.95)), 0.18709518570854408, 1e-9);
  });
});
