/**
 * The asymmetric (abc) model.
 *
 * Model: C. Duhr, A. Huss, A. Mazeliauskas, R. Szafron, JHEP 09 (2021) 122, arXiv:2106.04585 [abstract seen, priors from
 * memory; integrals re-derived]. Check values: inner integral by mpmath 1.2.1 (15 digits); the rest in double precision by
 * Gauss and Legendre over the ratio (3 digits).
 */
import { describe, expect, test } from 'vitest';
import { abcInner } from '../../src/truncation/bayesian/abc-inner.js';
import { abcPosterior } from '../../src/truncation/bayesian/abc-posterior.js';
import { shortestIntervals } from '../../src/truncation/numeric/predictive.js';
import { expectClose } from '../truncation/support.js';

const DELTA = [1, 0.5, 0.3, 0.12];
const PRIOR = { omega: 1, epsilon: 0.1, xi: 2, eta: 0.1 };

test('the integral over bias and width at a = 0.45', () => {
  const values = DELTA.map((d, k) => d / 0.45 ** k);
  const { logWeight } = abcInner(4, Math.min(...values), Math.max(...values), 0, PRIOR);
  // Priors and likelihood beside the integral over b: epsilon eta^epsilon/(2 xi), (1/2)^4, |a|^(-6).
  const outside = ((0.1 * 0.1 ** 0.1) / 4) * 2 ** -4 * 0.45 ** -6;
  expectClose(Math.exp(logWeight) * outside, '0.379801830371630934021255632249136625', 1e-12);
});

describe('relative terms 1, 0.5, 0.3, 0.12', () => {
  const posterior = abcPosterior(
    DELTA.map((d) => ({ sign: 1, log: Math.log(d) })),
    PRIOR,
  );
  if (posterior === undefined) expect.fail();
  const unit = Math.exp(posterior.logUnit);
  const density = (y: number): number => posterior.at(y / unit).pdf / unit;

  test('evidence: between the reference with 24 and with 48 panels', () => {
    expectClose(Math.exp(posterior.logEvidence), 0.05988602087914697, 1e-3);
    expectClose(Math.exp(posterior.logEvidence), 0.05989797683847584, 1e-3);
  });

  test('predictive density', () => {
    expectClose(density(0), 1.3510355581600142, 1e-3);
    expectClose(density(-0.1), 0.03959976822376564, 1e-3);
    // The reference has 12 panels for the numerator: 11.7271 and 3.7604. With 384 panels in both the same code gives the
    // values below, which it approaches monotonously.
    expectClose(density(0.05), 11.72710186942435, 2e-3);
    expectClose(density(0.05), 11.711407837476546, 1e-3);
    expectClose(density(0.1), 3.760363923770972, 1e-3);
  });

  test('mean, and the interval on the positive side', () => {
    expectClose(posterior.mean * unit, 0.06570165646979026, 3e-3);
    const [one, two] = shortestIntervals(posterior, [0.68, 0.95]);
    if (one === undefined || two === undefined) expect.fail();
    // The reference collects steps of 0.005: its ends are right to one step.
    expect(Math.abs(one.low * unit - 0.02)).toBeLessThan(0.005);
    expect(Math.abs(one.high * unit - 0.085)).toBeLessThan(0.005);
    expect(Math.abs(two.low * unit + 0.01)).toBeLessThan(0.005);
    expect(Math.abs(two.high * unit - 0.19)).toBeLessThan(0.005);
  });

  test('the density is highest at 0.04', () => {
    const grid = Array.from({ length: 60 }, (_, k) => k / 200);
    const best = grid.reduce((a, b) => (density(b) > density(a) ? b : a));
    expect(best).toBeCloseTo(0.04, 10);
  });
});
