import { describe, expect, it } from 'vitest';
import { Rational, addExact, exact, toNumberExact, type Exact } from '../../src/numerics/index.js';
import {
  asymptoticRatio,
  betaNumbers,
  borelFactor,
  expectedSingularity,
  isRefusal,
  leadingNormalisation,
  massRatioSeries,
  positionPotential,
  sumRule,
  type Normalisation,
  type NormalisationQuestion,
} from '../../src/qcd/index.js';
import { conformalSums, imageOfOne } from '../../src/qcd/normalisation/conformal.js';
import { sumRuleTerms } from '../../src/qcd/normalisation/estimates.js';

function granted(question: NormalisationQuestion): Normalisation {
  const result = leadingNormalisation(question);
  if (isRefusal(result)) throw new Error(result.reason);
  return result;
}
/** Pole mass over MSbar mass in the coupling of nl flavours at μ = m(m). */
const poleSeries = (light: number): Exact[] =>
  massRatioSeries({
    of: 'pole',
    over: 'msbar',
    light,
    divisor: 'pi',
    coupling: 'light',
    reference: 'msbar',
    log: exact(0),
  }).slice(1);
const pole = (light: number, terms: number): Normalisation =>
  granted({
    coefficients: poleSeries(light).slice(0, terms),
    firstPower: 1,
    divisor: 'pi',
    flavours: light,
    dimension: 1,
  });
const steps = (n: Normalisation, i: number): number[] => (n.estimates[i]?.steps ?? []).map((x) => x / Math.PI);

describe('strength of the pole-mass singularity', () => {
  // A. Pineda, hep-ph/0105008: three loops (recalled).
  it.each([
    [0, 0.622036],
    [3, 0.574974],
    [4, 0.552279],
    [5, 0.523543],
  ])('expansion of the Borel factor, n_l = %i', (light, published) => {
    expect(steps(pole(light, 3), 2)[2]).toBeCloseTo(published, 6);
  });

  // Beneke, Marquard, Nason, Steinhauser arXiv:1605.03609: from c_4 over its asymptotic form (recalled).
  it.each([
    [3, 0.537],
    [4, 0.5056],
    [5, 0.4616],
  ])('ratio at four loops, n_l = %i', (light, published) => {
    expect(Math.abs((steps(pole(light, 4), 1)[3] ?? NaN) - published)).toBeLessThan(1.1e-4);
  });

  // J. Komijani arXiv:1701.00347: 0.535(10) at n_l = 3 (recalled); the four steps computed with mpmath 1.2.1.
  it('sum rule at n_l = 3', () => {
    const n = pole(3, 4);
    [0.3042, 0.4871, 0.5474, 0.5357].forEach((x, i) => expect(steps(n, 0)[i]).toBeCloseTo(x, 4));
    expect(Math.abs(n.inAlpha.value - 0.535)).toBeLessThan(0.01);
    expect(n.inAlpha.error).toBeGreaterThan(0.003);
    expect(n.inAlpha.error).toBeLessThan(0.03);
  });

  // Hoang et al. arXiv:1704.01580: 0.526(12), 0.492(16), 0.446(24) from R-evolution (recalled).
  it.each([
    [3, 0.526, 0.012],
    [4, 0.492, 0.016],
    [5, 0.446, 0.024],
  ])('agrees with the R-evolution sum rule within the errors, n_l = %i', (light, published, error) => {
    const own = pole(light, 4).inAlpha;
    expect(Math.abs(own.value - published)).toBeLessThan(Math.hypot(own.error, error));
  });
});

describe('strength of the static potential', () => {
  // A. Pineda, hep-ph/0105008: −1.10661 from two loops of V at n_l = 3 (recalled).
  it('expansion of the Borel factor', () => {
    const coefficients = positionPotential(3, '1').slice(0, 3);
    const n = granted({ coefficients, firstPower: 1, divisor: '1', flavours: 3, dimension: 1 });
    expect((-4 / 3) * (n.estimates[2]?.value ?? NaN)).toBeCloseTo(-1.10661, 5);
  });

  // Ayala, Cvetič, Pineda arXiv:1407.2128: N_m = 0.5626(260) from three loops of V at n_l = 3 (recalled). N_V = −2 N_m.
  it('three loops agree with the pole mass', () => {
    const coefficients = positionPotential(3, '4*pi');
    const n = granted({ coefficients, firstPower: 1, divisor: '4*pi', flavours: 3, dimension: 1 });
    // V r = −C_F 4π Σ k_n x^n: the divisor in front makes N of the sum in x the one of V r/C_F in α_s.
    expect(Math.abs((2 / 3) * n.value - 0.5626)).toBeLessThan(0.026);
    expect(Math.abs((2 / 3) * n.value - pole(3, 4).inAlpha.value)).toBeLessThan(0.03);
  });

  // Fourier transform by hand: ã_1 = a_1 + 2γ_E β_0.
  it('position-space coefficients', () => {
    const [one, a1] = positionPotential(5, '4*pi');
    expect(one?.rational?.toString()).toBe('1');
    expect(toNumberExact(a1 ?? one ?? exact(0))).toBeCloseTo(
      31 / 3 - 50 / 9 + 2 * 0.5772156649015329 * (11 - 10 / 3),
      12,
    );
  });
});

describe('estimators on series with known strength', () => {
  const rising = (p: number, n: number): number =>
    Array.from({ length: n }, (_, k) => p + k + 1).reduce((a, b) => a * b, 1);

  // 0.5626 (2b_0)^n Γ(n+1+b)/Γ(1+b) + 0.2 (2b_0/3)^n Γ(n+1.5) − 0.1 δ_n0; partial sums computed with mpmath 1.2.1.
  it('sum rule', () => {
    const [b0 = NaN, b1 = NaN] = betaNumbers(3, 2, '1');
    const b = b1 / (2 * b0 * b0);
    let half = Math.sqrt(Math.PI) / 2; // Γ(1.5)
    const r = Array.from({ length: 40 }, (_, n) => {
      if (n > 0) half *= n + 0.5;
      return 0.5626 * (2 * b0) ** n * rising(b, n) + 0.2 * ((2 * b0) / 3) ** n * half - (n === 0 ? 0.1 : 0);
    });
    const own = sumRule(r, b0, b1 / b0, 1);
    expect(own[0]).toBeCloseTo(0.4586502317905724, 13);
    expect(own[3]).toBeCloseTo(0.5716438192453923, 13);
    expect(own[10]).toBeCloseTo(0.5626041624468404, 13);
    expect(own[39]).toBeCloseTo(0.5626, 12);
  });

  it('ratio and Borel factor reproduce a pure power exactly', () => {
    const t = 0.7;
    const p = 0.4;
    const r = Array.from({ length: 8 }, (_, n) => 0.8 * t ** -n * rising(p, n));
    asymptoticRatio(r, t, p, []).forEach((x) => expect(x).toBeCloseTo(0.8, 13));
    // (1 − t/t_s)^(1+p) B is the constant N.
    borelFactor(r, t, p).forEach((x) => expect(x).toBeCloseTo(0.8, 13));
  });

  it('all methods converge on the full renormalisation-group form', () => {
    // r_n of the RG-fixed singularity with c_1, c_2, plus a distant one; beta function truncated at four loops.
    const s = expectedSingularity({ flavours: 4, dimension: 1, divisor: 'pi' });
    const t = toNumberExact(s.t);
    const p = toNumberExact(s.exponent) - 1;
    const [c1 = 0, c2 = 0] = s.corrections.map(toNumberExact);
    const r = Array.from({ length: 14 }, (_, n) => {
      const corrections = 1 + (c1 * p) / (n + p) + (c2 * p * (p - 1)) / ((n + p) * (n + p - 1));
      return 0.5 * t ** -n * rising(p, n) * corrections;
    });
    expect(asymptoticRatio(r, t, p, [c1, c2])[13]).toBeCloseTo(0.5, 12);
    expect(Math.abs((borelFactor(r, t, p)[13] ?? NaN) - 0.5)).toBeLessThan(2e-3);
  });
});

describe('an infrared singularity behind an ultraviolet one', () => {
  // 0.8 (2b_0/d)^n Γ(n+1+p)/Γ(1+p) + 0.003 (−b_0)^n Γ(n+1.2) + 0.1 (b_0/3)^n Γ(n+3), d = 4, n_f = 3, two-loop geometric coupling.
  const [b0 = NaN, b1 = NaN] = betaNumbers(3, 2, '1');
  const q = b1 / b0;
  const p = (2 * q) / b0;
  const series = (count: number, ultraviolet: number): number[] => {
    let [same, opposite, next] = [0.8, ultraviolet * 0.918168742399761, 0.2];
    return Array.from({ length: count }, (_, n) => {
      if (n > 0) {
        same *= (b0 / 2) * (n + p);
        opposite *= -b0 * (n + 0.2);
        next *= (b0 / 3) * (n + 2);
      }
      return same + opposite + next;
    });
  };

  // Computed with mpmath 1.2.1, 40 digits: without and with the ultraviolet part.
  it('spoils the plain sum rule', () => {
    const without = sumRule(series(60, 0), b0, q, 4);
    [
      [3, 0.872327202994382],
      [10, 0.80749525043751],
      [30, 0.800003238298329],
    ].forEach(([n = 0, value]) => expect(without[n]).toBeCloseTo(value ?? NaN, 9));
    const own = sumRule(series(11, 0.003), b0, q, 4);
    expect(own[3]).toBeCloseTo(0.869663658819154, 9);
    expect(own[10]).toBeCloseTo(0.930655824732714, 9);
  });

  it('is no hindrance in the conformal variable', () => {
    const own = conformalSums(sumRuleTerms(series(31, 0.003), b0, q, 4), { a: 0.5, b: 1.5 });
    expect(imageOfOne({ a: 0.5, b: 1.5 })).toBeCloseTo(0.5, 15);
    expect(Math.abs((own[10] ?? NaN) - 0.8)).toBeLessThan(5e-3);
    expect(Math.abs((own[30] ?? NaN) - 0.8)).toBeLessThan(1e-6);
  });

  it('leads with the conformal sum, stops the others at n = 3, and says so', () => {
    const coefficients = [1, 1.6398, 6.371, 49.076, 283].map((x) => exact(Rational.fromNumber(x)));
    const base = { coefficients, firstPower: 1, divisor: 'pi', flavours: 3, dimension: 4, nextInfrared: 3 } as const;
    const n = granted(base);
    expect(n.estimates.map((e) => [e.method, e.steps.length])).toEqual([
      ['sum rule in the conformal variable', 5],
      ['sum rule', 4],
      ['ratio to the asymptotic form', 4],
      ['expansion of the Borel factor', 4],
    ]);
    expect(n.notes.join()).toMatch(/u = −1 lies closer/);
    expect(n.error).toBeGreaterThan(Math.abs(n.value - (n.estimates[1]?.value ?? NaN)));
    // The condensate's coefficient function 1 − (11/18) x is divided out: the answer moves.
    const wilson = granted({ ...base, wilson: [exact(Rational.of(-11, 18))] });
    expect(wilson.value).not.toBeCloseTo(n.value, 2);
  });
});

describe('errors and other couplings', () => {
  it('coefficient errors enter linearly', () => {
    const coefficients = poleSeries(4);
    const base = { coefficients, firstPower: 1, divisor: 'pi', flavours: 4, dimension: 1 } as const;
    const errors = [0, 0, 0, 100];
    const n = granted({ ...base, errors });
    const moved = granted({
      ...base,
      coefficients: coefficients.map((c, k) => (k === 3 ? addExact(c, exact(100)) : c)),
    });
    expect(n.errorParts.input).toBeCloseTo(Math.abs(moved.value - n.value), 10);
    expect(n.error).toBeGreaterThan(granted(base).error);
  });

  // Static energy on the lattice: c_n over the leading asymptotic form tends to 19.0(1.6) (arXiv:1303.3279, recalled).
  it('without a beta function beyond two loops the ratio drifts, and its error says so', () => {
    const coefficients = [1, 2, 8, 60, 700].map((x) => exact(x));
    const n = granted({ coefficients, firstPower: 1, divisor: '1', flavours: 0, dimension: 1, loops: 2 });
    expect(n.estimates.map((e) => e.method)).toEqual(['ratio to the asymptotic form', 'expansion of the Borel factor']);
    expect(n.estimates[0]?.scaleVariation).toBeUndefined();
    const own = n.estimates[0]?.steps ?? [];
    expect(n.estimates[0]?.error).toBeCloseTo(4 * Math.abs((own[4] ?? NaN) - (own[3] ?? NaN)), 10);
    expect(n.notes.join()).toMatch(/not known beyond two loops/);
  });

  it('a world of one loop: the pure pole at u = 1/2 is found exactly', () => {
    // 4/3 (2b_0)^n n! in one-loop running.
    const [first = NaN] = betaNumbers(4, 1, 'pi');
    let r = 4 / 3;
    const coefficients = Array.from({ length: 8 }, (_, n) => {
      if (n > 0) r *= 2 * first * n;
      return exact(Rational.fromNumber(r));
    });
    const n = granted({
      coefficients,
      firstPower: 1,
      divisor: 'pi',
      flavours: 4,
      dimension: 1,
      loops: 1,
      ends: true,
    });
    expect(n.value).toBeCloseTo(4 / 3, 10);
  });
});

it('refuses hopeless questions and warns of closer singularities', () => {
  const coefficients = [1, 2, 3].map((x) => exact(x));
  const base = { coefficients, firstPower: 1, divisor: 'pi', flavours: 3, dimension: 1 } as const;
  expect(isRefusal(leadingNormalisation({ ...base, coefficients: [exact(1)] }))).toBe(true);
  expect(isRefusal(leadingNormalisation({ ...base, dimension: -2 }))).toBe(true);
  expect(isRefusal(leadingNormalisation({ ...base, flavours: 20 }))).toBe(true);
  expect(isRefusal(leadingNormalisation({ ...base, firstPower: 0 }))).toBe(true);
  expect(granted({ ...base, dimension: 4 }).notes).toHaveLength(1);
  expect(granted({ ...base, dimension: 2 }).notes.join()).toMatch(/as near as/);
  expect(granted({ ...base, firstPower: 2 }).estimates[0]?.steps).toHaveLength(4);
});
