/**
 * Dependence of the Adler function, n_f = 3, on the renormalisation scale, and what the models make of it.
 *
 * Check values computed with mpmath 1.2.1 by numerical running (four loops) and exact re-expansion; the evidences and
 * weights of the scale-marginalised model in closed form. Models: M. Bonvini, arXiv:2006.16293; C. Duhr, A. Huss,
 * A. Mazeliauskas, R. Szafron, arXiv:2106.04585 [abstracts seen, priors from memory].
 */
import { describe, expect, test } from 'vitest';
import { loadSeries } from '../../src/series/index.js';
import { averageOverScales } from '../../src/truncation/scale/average.js';
import { scaleEnvelope, scaleScan } from '../../src/truncation/scale/envelope.js';
import { movedTerms } from '../../src/truncation/scale/moved-terms.js';
import { geometricPosterior } from '../../src/truncation/bayesian/geometric-posterior.js';
import type { Question } from '../../src/truncation/index.js';
import { answer, ask, expectClose } from '../truncation/support.js';

async function adler(count: number): Promise<Question> {
  const { coefficients } = await loadSeries('adler');
  const known = coefficients.slice(0, count).map((c) => c.value);
  return ask(known, { at: '0.32', divisor: 'pi', flavours: 3 });
}

/** Terms at mu = ratio·Q in absolute units, and the coupling there. */
function at(question: Question, ratio: number): { terms: number[]; alpha: number } {
  const moved = question.atScale(2 * Math.log(ratio));
  if (moved.kind === 'refusal') expect.fail(moved.reason);
  return { terms: movedTerms(question, moved).map((t) => t * 2 ** question.known.unit), alpha: moved.alpha };
}

const sum = (terms: readonly number[]): number => terms.reduce((a, b) => a + b, 0);

describe('the sum at half and twice the scale', () => {
  test.each([
    [
      2,
      '0.132134496961638632533251443213218759',
      '0.118872782824070434444438193828300763',
      '0.0996142294049814622528737984829761982',
    ],
    [
      3,
      '0.134035904315445494762640680993338600',
      '0.125605787393912676290129456689291954',
      '0.112394150662526657872559410578240316',
    ],
    [
      4,
      '0.153077659645581330404740502494904066',
      '0.130888620922081855582725083291871437',
      '0.120148134354538511343332812697787284',
    ],
  ])('of %i terms', async (count, half, one, twice) => {
    const question = await adler(count);
    expectClose(sum(at(question, 0.5).terms), half, 1e-10);
    expectClose(sum(at(question, 1).terms), one, 1e-10);
    expectClose(sum(at(question, 2).terms), twice, 1e-10);
  });

  test('the coupling there', async () => {
    const question = await adler(1);
    expectClose(at(question, 2).alpha, '0.231655208283124093177952344723385736', 1e-11);
    expectClose(at(question, 0.5).alpha, '0.565924729008037406691105794263662458', 1e-11);
  });

  test('makes the envelope, asymmetric, with its warnings', async () => {
    const question = await adler(4);
    const { low68, high68, estimate } = answer(scaleEnvelope, question);
    expectClose(high68, 0.153077659645581 - 0.130888620922082, 1e-9);
    expectClose(low68, 0.120148134354539 - 0.130888620922082, 1e-9);
    expect(estimate.notes).toEqual(['the coupling reaches 0.566 within the range']);
    const points = scaleScan(question);
    if ('kind' in points) expect.fail();
    expect(points.length).toBe(21);
    expect(points[10]?.ratio).toBe(1);
  });

  test('an extremum inside is found: two terms are stationary at mu = 0.5537 Q', async () => {
    const question = await adler(2);
    const { high68, estimate } = answer(scaleEnvelope, question);
    expect(estimate.notes.join()).toMatch(/an extremum lies inside, at 0\.554 times the scale/);
    expectClose(high68 + 0.11887278282407043, '0.133798825300402381867365085432476541', 1e-6);
  });
});

describe('three scales with Simpson weights', () => {
  const ratios = [0.5, 1, 2];
  const simpson = [1 / 6, 4 / 6, 1 / 6];
  const prior = { omega: 1, epsilon: 0.1 };

  test('evidence of the relative terms at each', async () => {
    const question = await adler(4);
    const wanted = [
      '0.0210282912096078804538308673507908050',
      '0.0841920001420466631237359708358515553',
      '0.0212501855402390036828899808448367290',
    ];
    ratios.forEach((ratio, j) => {
      const { terms } = at(question, ratio);
      const logs = terms.map((t) => Math.log(Math.abs(t / (terms[0] ?? 1))));
      expectClose(Math.exp(geometricPosterior(logs, prior)?.logEvidence ?? 0), wanted[j] ?? 0, 1e-8);
    });
  });

  test('weights and means, marginalised and averaged', async () => {
    const question = await adler(4);
    const nodes = ratios.map((ratio, j) => ({ weight: simpson[j] ?? 0, terms: at(question, ratio).terms }));
    const marginal = averageOverScales(nodes, prior, true);
    const plain = averageOverScales(nodes, prior, false);
    if (marginal === undefined || plain === undefined) expect.fail();
    const wanted = [
      '0.0554768147652890409346075830277367907',
      '0.888460969090147402520684651820032096',
      '0.0560622161445635565451312816258582633',
    ];
    wanted.forEach((w, j) => expectClose(marginal.weights[j] ?? 0, w, 1e-8));
    expectClose(marginal.mean, '0.131517462633717865054748779717747054', 1e-8);
    expectClose(plain.mean, '0.132796712948074544020352324492396934', 1e-8);
  });
});
