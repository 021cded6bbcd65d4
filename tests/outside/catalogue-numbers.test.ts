/**
 * Numbers that the catalogue's files do not record themselves: identities between series, and values at other inputs.
 * Status words: memory (recalled, not seen in a text), abstract read, re-derived (recomputed from the formula named).
 */
import { describe, expect, test } from 'vitest';
import { R, Rational, addExact, exact, mulExact, subExact, toNumberExact } from '../../src/numerics/index.js';
import type { Exact } from '../../src/numerics/index.js';
import { catalogueText, loadSeries, parseSeries } from '../../src/series/index.js';

const coefficients = async (id: string, flavours?: number): Promise<readonly Exact[]> =>
  (await loadSeries(id, flavours === undefined ? {} : { flavours })).coefficients.map((c) => c.value);
const numbers = async (id: string, flavours?: number): Promise<number[]> =>
  (await coefficients(id, flavours)).map(toNumberExact);

/** β_n/4^(n+1): da/dln μ² = −b_0 a² − …; G. 't Hooft 1973 to O. V. Tarasov, A. A. Vladimirov, A. Yu. Zharkov 1980. */
const b = (nf: number): readonly [Rational, Rational, Rational] => [
  Rational.of(33 - 2 * nf, 12),
  Rational.of(306 - 38 * nf, 48),
  Rational.of(2857, 128)
    .sub(Rational.of(5033 * nf, 18 * 64))
    .add(Rational.of(325 * nf * nf, 54 * 64)),
];

/**
 * Generalised Crewther relation, D·C_Bjp − 1 = (β(a)/a)(K_1 a + K_2 a² + K_3 a³) with K_n a polynomial of degree n − 1 in
 * nf: D. J. Broadhurst, A. L. Kataev, Phys. Lett. B 315 (1993) 179; at a⁴ P. A. Baikov, K. G. Chetyrkin, J. H. Kuehn,
 * arXiv:1001.3606 (abstract read). The polynomial degrees are tested by differences over the integers nf.
 */
describe('Crewther relation between the Adler function and the Bjorken sum rule', () => {
  /** Coefficients K_1, K_2, K_3 at one number of flavours. */
  async function factor(nf: number): Promise<readonly [Exact, Exact, Exact]> {
    const d = [exact(1), ...(await coefficients('adler', nf))];
    const c = [exact(1), ...(await coefficients('bjorken', nf))];
    const product = (n: number): Exact =>
      d
        .slice(0, n + 1)
        .map((x, i) => mulExact(x, c[n - i]!))
        .reduce(addExact);
    const [b0, b1, b2] = b(nf).map((q) => exact(q)) as [Exact, Exact, Exact];
    const overB0 = (x: Exact): Exact => mulExact(x, exact(b0.rational!.inv()));
    expect(R.containsZero(product(1).ball(200))).toBe(true);
    // β(a)/a = −b_0 a − b_1 a² − …; the sign is put into K.
    const k1 = overB0(product(2));
    const k2 = overB0(subExact(product(3), mulExact(k1, b1)));
    const k3 = overB0(subExact(subExact(product(4), mulExact(k1, b2)), mulExact(k2, b1)));
    return [k1, k2, k3];
  }
  /** (−1)^n Δ^n of the values at nf = 0, 1, …, n. */
  const difference = (values: readonly Exact[]): Exact =>
    values.length === 1 ? values[0]! : difference(values.slice(1).map((v, i) => subExact(values[i]!, v)));

  test('holds exactly at a² and a³, and at a⁴ to the four decimals of c_4', async () => {
    const k = await Promise.all([0, 1, 2, 3, 4, 5].map(factor));
    const zero = (x: Exact): boolean => R.containsZero(x.ball(200)) && R.upperBits(x.ball(200)) < -150;
    expect(zero(difference(k.slice(0, 2).map((row) => row[0])))).toBe(true);
    expect(zero(difference(k.slice(0, 3).map((row) => row[1])))).toBe(true);
    expect(Math.abs(toNumberExact(difference(k.slice(0, 4).map((row) => row[2]))))).toBeLessThan(1e-3);
    // Not an empty test: the differences one order lower do not vanish.
    expect(Math.abs(toNumberExact(difference(k.slice(0, 2).map((row) => row[1]))))).toBeGreaterThan(0.1);
    expect(Math.abs(toNumberExact(difference(k.slice(0, 3).map((row) => row[2]))))).toBeGreaterThan(0.01);
  });
});

describe('time-like from Euclidean', () => {
  test('R at nf = 5: 1.4092, −12.767, −79.98 (arXiv:0801.1821; memory)', async () => {
    const [, r2, r3, r4] = await numbers('r-ratio-nf5');
    expect([r2!.toFixed(4), r3!.toFixed(3), r4!.toFixed(2)]).toEqual(['1.4092', '-12.767', '-79.98']);
  });
  test('H to b b at nf = 5: 29.147, 41.758, −825.7 (hep-ph/0511063; memory)', async () => {
    const [, r2, r3, r4] = await numbers('higgs-bb');
    expect([r2!.toFixed(3), r3!.toFixed(3), r4!.toFixed(1)]).toEqual(['29.147', '41.758', '-825.7']);
  });
  test('the polynomials in nf of R: 1.986 − 0.115 nf, −6.637 − 1.200 nf − 0.005 nf², −156.61 + 18.775 nf − 0.7974 nf² + 0.0215 nf³ (memory)', async () => {
    const at = await Promise.all([0, 1, 6].map((nf) => numbers('r-ratio', nf)));
    for (const [i, nf] of [0, 1, 6].entries()) {
      expect(at[i]![2]).toBeCloseTo(-6.63694 - 1.20013 * nf - 0.00518 * nf * nf, 3);
      expect(at[i]![3]).toBeCloseTo(-156.608 + 18.7748 * nf - 0.797434 * nf ** 2 + 0.0215161 * nf ** 3, 2);
    }
  });
});

describe('Higgs decay into gluons', () => {
  async function at(higgs: number, top: number): Promise<number[]> {
    const { text } = (await catalogueText('higgs-gg'))!;
    const other = await parseSeries(text.replace('log(125/173)', `log(${higgs}/${top})`), {
      name: 'higgs-gg',
      form: 'yaml',
    });
    return other.coefficients.map((c) => toNumberExact(c.value));
  }
  test('150.419 at 100 GeV (hep-ph/9705240; abstract read)', async () => {
    expect((await at(100, 175))[1]!.toFixed(3)).toBe('150.419');
  });
  test('152.5 and 381.5 at 120 GeV (hep-ph/0604194; abstract read)', async () => {
    const [, k2, k3] = await at(120, 175);
    expect([k2!.toFixed(1), k3!.toFixed(1)]).toEqual(['152.5', '381.5']);
  });
  test('5.703052, 15.51204, 12.6660, −69.3287 in powers of alpha_s at 125 GeV (arXiv:1707.01044; memory)', async () => {
    const k = await numbers('higgs-gg');
    const inAlpha = k.map((value, i) => value / Math.PI ** (i + 1));
    expect(inAlpha[0]!).toBeCloseTo(5.703052, 6);
    expect(inAlpha[1]!).toBeCloseTo(15.51204, 4);
    expect(inAlpha[2]!).toBeCloseTo(12.666, 2);
    expect(inAlpha[3]!).toBeCloseTo(-69.3287, 10);
  });
});

describe('pole mass', () => {
  test('in powers of alpha_s at nl = 5: 0.42441318, 0.83453818, 2.3683225, 8.581195 (arXiv:1606.06754; memory)', async () => {
    const c = (await numbers('pole-msbar-nl5')).map((value, i) => value / Math.PI ** (i + 1));
    for (const [i, value] of [0.42441318, 0.83453818, 2.3683225, 8.581195].entries())
      expect(c[i]! / value).toBeCloseTo(1, 5);
  });
  test('top, m = 163.643 GeV, alpha_s = 0.1088: 7.557 + 1.617 + 0.501 GeV (arXiv:1502.01030; abstract read, numbers memory)', async () => {
    const c = await numbers('pole-msbar-heavy-nf6');
    const terms = c.slice(0, 3).map((value, i) => 163.643 * value * (0.1088 / Math.PI) ** (i + 1));
    for (const [i, value] of [7.557, 1.617, 0.501].entries()) expect(Math.abs(terms[i]! - value)).toBeLessThan(1.1e-3);
  });
  test('leading powers of nl: −1.041367, 0.652691, −0.678141 from the bubble-chain Borel function (re-derived)', async () => {
    // nth difference of a polynomial of degree n: n! times the leading coefficient.
    const all = await Promise.all([0, 1, 2, 3].map((nl) => numbers('pole-msbar', nl)));
    const column = (k: number): number[] => all.map((row) => row[k]!);
    const [a0, a1] = column(1);
    expect(a1! - a0!).toBeCloseTo(-1.041367, 6);
    const [c0, c1, c2] = column(2);
    expect((c2! - 2 * c1! + c0!) / 2).toBeCloseTo(0.652691, 6);
    const [e0, e1, e2, e3] = column(3);
    expect((e3! - 3 * e2! + 3 * e1! - e0!) / 6).toBeCloseTo(-0.678141, 6);
  });
});

describe('static potential', () => {
  test.each([
    [0, [1, 1.83283453, 8.84200659, 55.6813987]],
    [3, [1, 1.38384284, 5.4622779, 28.1116176]],
  ])('nl = %i in powers of alpha_s(1/r) (re-derived from the momentum-space coefficients)', async (nl, wanted) => {
    const v = (await numbers('static-potential', nl)).map((value, n) => value / (4 * Math.PI) ** n);
    for (const [n, value] of wanted.entries()) expect(v[n]! / value).toBeCloseTo(1, 6);
  });
});

test('b to u: the two forms differ by the fifth power of the mass relation', async () => {
  // m^5 = M^5 (…): Y_1 = X_1 + 5·4/3, and Y_2 − X_2 = 48.0803 (T. van Ritbergen, hep-ph/9903226; memory, re-derived).
  const [x, y, c] = await Promise.all([numbers('b-to-u-pole'), numbers('b-to-u-msbar'), numbers('pole-msbar-nl4')]);
  expect(y[0]! - x[0]!).toBeCloseTo(20 / 3, 4);
  const fifth = 5 * c[1]! + 10 * c[0]! ** 2 + 5 * c[0]! * x[0]!;
  expect(fifth).toBeCloseTo(48.0803, 3);
  expect(y[1]! - x[1]!).toBeCloseTo(fifth, 3);
});

test('the moments of the vector correlator: 3104/1215 and 15728/14175 are the exact 2.5547 and 1.1096', async () => {
  expect((await numbers('charm-moment-1'))[0]!.toFixed(4)).toBe('2.5547');
  expect((await numbers('bottom-moment-2'))[0]!.toFixed(4)).toBe('1.1096');
});
