import { describe, expect, it } from 'vitest';
import { Rational, exact, toNumberExact, type Exact } from '../../src/numerics/index.js';
import {
  anomalousTerm,
  betaCoefficients,
  expectedSingularity,
  uPerT,
  ultravioletPartner,
} from '../../src/qcd/index.js';

const q = (text: string): Rational => Rational.parse(text) ?? Rational.ZERO;
const num = (x: Exact | undefined): number => (x === undefined ? NaN : toNumberExact(x));

describe('expected singularities', () => {
  // Closed forms for d = 1: M. Beneke, Phys. Lett. B344 (1995) 341 (c_1); A. Pineda, hep-ph/0105008 (c_2).
  // Status: recalled; re-derived here from the RG invariance of Λ.
  it.each([3, 4, 5])('agrees with the closed forms of the pole mass for %i flavours', (nf) => {
    const s = expectedSingularity({ flavours: nf, dimension: 1, divisor: '1' });
    const [b0 = 0, b1 = 0, b2 = 0, b3 = 0] = betaCoefficients(nf).map(toNumberExact);
    const b = b1 / (2 * b0 ** 2);
    expect(num(s.exponent)).toBeCloseTo(1 + b, 14);
    expect(num(s.t)).toBeCloseTo((2 * Math.PI) / b0, 14);
    expect(num(s.corrections[0])).toBeCloseTo((b1 ** 2 / b0 - b2) / (4 * b * b0 ** 3), 13);
    const c2 =
      (b1 ** 4 +
        4 * b0 ** 3 * b1 * b2 -
        2 * b0 * b1 ** 2 * b2 +
        b0 ** 2 * (-2 * b1 ** 3 + b2 ** 2) -
        2 * b0 ** 4 * b3) /
      (32 * b * (b - 1) * b0 ** 8);
    expect(num(s.corrections[1])).toBeCloseTo(c2, 12);
  });

  // Check values computed with mpmath 1.2.1 and PARI/GP 2.15.2.
  it.each([
    [3, 1, '0.395061728395061728', '-0.163821373456790123', '0.237170389864641250', '0.698131700797731830'],
    [4, 1, '0.3696', '-0.105356709956709957', '0.273572467211719758', '0.753982236861550377'],
    [5, 1, '0.328922495274102079', '0.0237938096169306651', '0.326452950498681383', '0.819545909632119975'],
    [3, 4, '1.58024691358024691', '-0.655285493827160493', '-3.51766872105753344', '2.79252680319092732'],
    [4, 4, '1.4784', '-0.421426839826839826', '-5.56208104305374905', '3.01592894744620150'],
  ])('n_f = %i, d = %i', (nf, d, b, c1, c2, t) => {
    const s = expectedSingularity({ flavours: nf, dimension: d, divisor: '1' });
    expect(num(s.exponent)).toBeCloseTo(1 + Number(b), 14);
    expect(num(s.corrections[0])).toBeCloseTo(Number(c1), 13);
    expect(num(s.corrections[1])).toBeCloseTo(Number(c2), 12);
    expect(num(s.t)).toBeCloseTo(Number(t), 14);
    expect(s.corrections).toHaveLength(3);
  });

  it('keeps rational what is rational', () => {
    const s = expectedSingularity({ flavours: 4, dimension: 1, divisor: 'pi' });
    expect(s.exponent.rational?.toString()).toBe(Rational.of(13696, 10000).toString());
    expect(s.t.rational?.toString()).toBe('6/25');
    expect(s.corrections[0]?.rational).toBeDefined();
    expect(s.corrections[1]?.rational).toBeUndefined(); // holds ζ(3)
    expect(expectedSingularity({ flavours: 4, dimension: 1, divisor: '1' }).t.rational).toBeUndefined();
    expect(uPerT(3, 'pi').rational?.toString()).toBe('9/4');
    expect(uPerT(3, '4*pi').rational?.toString()).toBe('9');
  });

  // Beneke, Jamin arXiv:0806.3156: the Adler function at n_f = 3. Figures recalled, all reproduced by the model fit.
  // Their factors multiply (p ∓ u)^j, ours (1 − t/t*)^j: c_j = b̃_j p^j.
  it('reproduces the exponents and factors of the Adler function model', () => {
    const uv = expectedSingularity({ flavours: 3, dimension: -2, wilson: { power: -1 }, divisor: 'pi' });
    expect(num(uv.exponent)).toBeCloseTo(1.2098765432, 9);
    expect(num(uv.corrections[0])).toBeCloseTo(-1.23348, 5);
    expect(num(uv.corrections[1])).toBeCloseTo(-3.03754, 5);
    expect(uv.kind).toBe('ultraviolet');
    const partner = ultravioletPartner({ flavours: 3, divisor: 'pi' });
    expect(partner.exponent.rational?.toString()).toBe(uv.exponent.rational?.toString());
    expect(num(partner.corrections[1])).toBe(num(uv.corrections[1]));
    const simple = ultravioletPartner({ flavours: 3, divisor: 'pi', doublePole: false });
    expect(simple.exponent.rational?.toString()).toBe('17/81');
    expect(simple.u.toString()).toBe('-1');
    const gluon = expectedSingularity({
      flavours: 3,
      dimension: 4,
      wilson: { corrections: [exact(q('-11/18'))] },
      divisor: 'pi',
    });
    expect(num(gluon.exponent)).toBeCloseTo(2.58025, 5);
    expect(num(gluon.corrections[0]) / 2).toBeCloseTo(-0.499518, 6);
    expect(num(gluon.corrections[1]) / 4).toBeCloseTo(-0.726052, 6);
    const six = expectedSingularity({ flavours: 3, dimension: 6, divisor: 'pi' });
    expect(num(six.exponent)).toBeCloseTo(3.37037, 5);
    expect(num(six.corrections[0]) / 3).toBeCloseTo(-0.327643, 6);
    expect(num(six.corrections[1]) / 9).toBeCloseTo(-0.341418, 6);
  });

  it('takes Wilson corrections in the variable of the series, whatever its normalisation', () => {
    const inPi = expectedSingularity({
      flavours: 3,
      dimension: 4,
      wilson: { corrections: [exact(q('-11/18')), exact(q('7/5'))] },
      divisor: 'pi',
    });
    const inFourPi = expectedSingularity({
      flavours: 3,
      dimension: 4,
      wilson: { corrections: [exact(q('-44/18')), exact(q('112/5'))] },
      divisor: '4*pi',
    });
    expect(inFourPi.corrections[0]?.rational?.toString()).toBe(inPi.corrections[0]?.rational?.toString());
    expect(num(inFourPi.corrections[1])).toBeCloseTo(num(inPi.corrections[1]), 13);
  });

  it('subtracts the anomalous term and stops where a logarithm would appear', () => {
    // One-loop term chosen to make the exponent exactly 2: p = 1, so c_2 would hold 1/(p−1).
    const b = Rational.of(64, 162).mul(Rational.of(4));
    const s = expectedSingularity({
      flavours: 3,
      dimension: 4,
      anomalousDimension: exact(b.sub(Rational.ONE)),
      divisor: 'pi',
    });
    expect(s.exponent.rational?.toString()).toBe('2');
    expect(s.corrections).toHaveLength(1);
    expect(anomalousTerm(exact(9), 3).rational?.toString()).toBe('2');
  });
});
