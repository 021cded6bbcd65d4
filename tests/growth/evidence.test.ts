/**
 * Factorial against geometric growth: closed forms of the Bayes factor and of ΔAICc.
 * Series: pole mass over MSbar mass, n_l = 4, and Adler function, n_f = 3, both in α_s/π (P. Marquard et al.,
 * arXiv:1606.06754; P. A. Baikov, K. G. Chetyrkin, J. H. Kühn, arXiv:0801.1821; from memory, re-derived).
 * Check values: own least squares, 30 reliable digits, computed with mpmath 1.2.1 and PARI/GP 2.15.2.
 * Wording of the grades: R. E. Kass and A. E. Raftery, J. Am. Stat. Assoc. 90 (1995) 773 (from memory).
 */
import { describe, expect, it } from 'vitest';
import { compareModels, evidenceGrade } from '../../src/growth/evidence.js';
import { diagnoseGrowth, type GrowthModelComparison } from '../../src/growth/index.js';
import { readTerms } from '../../src/growth/reading.js';
import { fromTexts, type Options } from './terms.js';

const POLE = ['1.33333333333333333333333333333333333', '9.2778', '94.4182', '1235.665776'];
const ADLER = ['1', '1.6398', '6.371', '49.0757'];
const FACTORIAL = ['1.1', '1.35', '4.95', '18.225', '133.65', '820.125'];
const GEOMETRIC = ['1.1', '1.98', '5.324', '9.5832', '25.76816', '46.382688'];

function compare(texts: readonly string[], b = 0, options: Options = {}): GrowthModelComparison {
  const reading = readTerms(fromTexts(texts, options));
  if (reading.kind !== 'series') throw new Error(reading.kind);
  const c = compareModels(reading.sequence.points, 1, b);
  if (c === undefined) throw new Error('no comparison');
  return c;
}

const near = (actual: number | undefined, wanted: number): void => {
  expect(Math.abs((actual ?? NaN) / wanted - 1), `${actual} against ${wanted}`).toBeLessThan(1e-9);
};

describe('check values', () => {
  it('pole mass, b = 0.3696', () => {
    const c = compare(POLE, 0.3696);
    near(c.rssGeometric, 0.10058521506878872);
    near(c.rssFactorial, 0.018262364758141508);
    near(c.inversePosition, 4.382562416360519);
    near(c.bayesFactor, 5.5077869925879686);
    near(c.growthOrder?.value, 0.5732589898518735);
    near(c.growthOrder?.error, 0.014764987428620407);
    expect(c.wording).toBe('positive evidence for factorial growth');
    expect(c.deltaAICc).toBeUndefined();
  });

  it('Adler function, four coefficients', () => {
    const c = compare(ADLER);
    near(c.rssGeometric, 0.5999154402586148);
    near(c.rssFactorial, 0.0508698539170373);
    near(c.inversePosition, 2.0074893432447154);
    near(c.bayesFactor, 11.793142579827451);
    near(c.growthOrder?.value, 1.3974990889877348);
    near(c.growthOrder?.error, 0.09112412755107192);
  });

  it('Adler function with the estimate 283 for the fifth', () => {
    const c = compare([...ADLER, '283']);
    near(c.rssGeometric, 0.8729611043606728);
    near(c.rssFactorial, 0.06910550367976903);
    near(c.inversePosition, 1.9235676995476871);
    near(c.deltaAICc, 12.681283126026253);
    near(c.bayesFactor, 44.89762678610002);
    near(c.growthOrder?.value, 1.0444088507254696);
    near(c.growthOrder?.error, 0.21404538517863625);
    expect(c.wording).toBe('strong evidence for factorial growth');
  });

  it('n! 1.5^n (1 ± 0.1)', () => {
    const c = compare(FACTORIAL);
    near(c.rssGeometric, 1.54251463855479);
    near(c.rssFactorial, 0.05522568413796126);
    near(c.inversePosition, 1.4744201041846254);
    near(c.deltaAICc, 19.97844665076591);
    near(c.bayesFactor, 780.1468856745491);
    near(c.growthOrder?.value, 1.017823893172928);
    near(c.growthOrder?.error, 0.11275009699963669);
    expect(c.wording).toBe('very strong evidence for factorial growth');
  });

  it('2.2^n (1 ± 0.1)', () => {
    const c = compare(GEOMETRIC);
    near(c.rssGeometric, 0.05522568413796126);
    near(c.rssFactorial, 1.4401273992236874);
    near(c.inversePosition, 0.8053615972001589);
    near(c.deltaAICc, -19.56635233750365);
    near(c.bayesFactor, 0.00147055198917552);
    near(c.growthOrder?.value, 0.01782389317294793);
    expect(c.wording).toBe('very strong evidence for geometric growth');
  });

  it('the diagnosis takes b from an expected singularity whose side the signs show', () => {
    const pole = diagnoseGrowth(fromTexts(POLE, { expected: [{ t: 0.24, exponent: 1.3696, kind: 'infrared' }] }));
    near(pole.comparison?.bayesFactor, 5.5077869925879686);
    expect(pole.comparison?.shift).toBeCloseTo(0.3696, 12);
    const expected = [
      { t: -0.444, exponent: 1.21, kind: 'ultraviolet' },
      { t: 0.889, exponent: 2.58, kind: 'infrared' },
    ];
    // Same signs: the nearest expected one, on the negative axis, is not what these terms show.
    near(diagnoseGrowth(fromTexts(ADLER, { expected })).comparison?.bayesFactor, 11.793142579827451);
  });
});

describe('grades and errors', () => {
  it('uses the four grades with their borders', () => {
    expect([2.9, 3, 19.9, 20, 149, 150].map(evidenceGrade)).toEqual([
      'not worth mentioning',
      'positive',
      'positive',
      'strong',
      'strong',
      'very strong',
    ]);
  });

  it('quoted errors lower the evidence: exact factorials known to 30 % are no proof', () => {
    const sure = compare(['1', '1', '2', '6', '24']);
    const vague = compare(['1', '1', '2', '6', '24'], 0, { errors: [0, 0.1, 0.2, 0.3, 0.3] });
    expect(sure.bayesFactor).toBeGreaterThan(1e20);
    expect(vague.bayesFactor).toBeLessThan(1000);
  });

  it('drops a first coefficient that lies far off the better line', () => {
    const c = compare(['500', '1', '2', '6', '24.1', '120', '722', '5030', '40400', '362000']);
    expect(c.points).toBe(9);
    expect(c.bayesFactor).toBeGreaterThan(1e6);
  });
});
