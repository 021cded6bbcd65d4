import { describe, expect, it } from 'vitest';
import { Rational } from '../../src/numerics/index.js';
import { expSeries, mulSeries, reciprocal } from '../../src/qcd/algebra/truncated.js';
import {
  BETA,
  BETA_GROUP,
  DECOUPLING_ALPHA,
  DECOUPLING_MASS,
  INPUTS,
  MASS_DIMENSION,
  MASS_DIMENSION_GROUP,
  POLE_OVER_MSBAR,
  POTENTIAL,
  QED,
  addFormal,
  colourOfSU,
  equalsFormal,
  exactOfFormal,
  forGroup,
  formalAt,
  formalOf,
  formalRational,
  formalRing,
  formalSymbol,
  mulFormal,
  numberOfFormal,
  powersOfSymbol,
  scaleFormal,
  substituteFormal,
  type Formal,
} from '../../src/qcd/constants/index.js';
import { parseFormal } from '../../src/qcd/constants/formal-parse.js';

const q = (p: number, d = 1): Rational => Rational.of(p, d);
const same = (a: Formal, b: Formal): void => expect(equalsFormal(a, b)).toBe(true);
/** The part with one power of a symbol. */
const part = (a: Formal, symbol: string): Formal => powersOfSymbol(a, symbol)[1] ?? formalRing.zero;
const at = <T>(list: readonly T[], k: number): T => {
  const x = list[k];
  if (x === undefined) throw new RangeError(`no entry ${k}`);
  return x;
};

describe('beta function and mass anomalous dimension', () => {
  it('the group forms reduce exactly to SU(3)', () => {
    const su3 = colourOfSU(3);
    expect(su3.dAA.toString()).toBe('135/8');
    expect(su3.dRA.toString()).toBe('15/16');
    expect(su3.dRR.toString()).toBe('5/96');
    expect(su3.dRAr.toString()).toBe('5/2');
    expect(su3.dRRr.toString()).toBe('5/36');
    BETA_GROUP.forEach((c, k) => same(forGroup(c, su3), formalOf(at(BETA, k))));
    MASS_DIMENSION_GROUP.forEach((c, k) => same(forGroup(c, su3), formalOf(at(MASS_DIMENSION, k))));
  });

  // The QED beta function through four loops: Gorishny, Kataev, Larin, Surguladze, Phys. Lett. B256 (1991) 81
  // (recalled; reproduced by the group form). Our sign: β_k > 0 for asymptotic freedom.
  it('the group form has the QED limit', () => {
    const expected = ['-4/3*nf', '-4*nf', '2*nf + 44/9*nf^2', '46*nf - (760/27 - 832/9*z3)*nf^2 + 1232/243*nf^3'].map(
      parseFormal,
    );
    expected.forEach((e, k) => {
      same(forGroup(at(BETA_GROUP, k), QED), e);
    });
  });

  // SU(2): T_F = 1/2, C_F = 3/4, C_A = 2; d_A^{abcd} d_A^{abcd}/N_A = 20/3, one- and two-loop coefficients are textbook.
  it('the group form has the SU(2) limit', () => {
    const su2 = colourOfSU(2);
    expect(su2.CF.toString()).toBe('3/4');
    expect(su2.dAA.toString()).toBe('20/3');
    same(forGroup(at(BETA_GROUP, 0), su2), parseFormal('22/3 - 2/3*nf'));
    same(forGroup(at(BETA_GROUP, 1), su2), parseFormal('136/3 - 49/6*nf'));
  });

  // Absence of even zeta values in Euclidean quantities: Jamin, Miravitllas arXiv:1711.00787;
  // Baikov, Chetyrkin arXiv:1804.10088 (recalled).
  it('even zeta values obey the relations of the no-π theorem', () => {
    const beta = BETA.map(formalOf);
    const gamma = MASS_DIMENSION.map(formalOf);
    same(part(at(beta, 4), 'z4'), scaleFormal(mulFormal(at(beta, 0), part(at(beta, 3), 'z3')), q(-9, 8)));
    same(part(at(gamma, 3), 'z4'), scaleFormal(mulFormal(at(beta, 0), part(at(gamma, 2), 'z3')), q(-3, 2)));
    const z4 = addFormal(
      scaleFormal(
        addFormal(mulFormal(at(beta, 0), part(at(gamma, 3), 'z3')), mulFormal(at(beta, 1), part(at(gamma, 2), 'z3'))),
        q(-3, 2),
      ),
      scaleFormal(mulFormal(part(at(beta, 3), 'z3'), at(gamma, 0)), q(3, 8)),
    );
    same(part(at(gamma, 4), 'z4'), z4);
    same(part(at(gamma, 4), 'z6'), scaleFormal(mulFormal(at(beta, 0), part(at(gamma, 3), 'z5')), q(-5, 2)));
    const colour = beta.map((_, k) => formalOf(at(BETA_GROUP, k)));
    same(part(at(colour, 4), 'z4'), scaleFormal(mulFormal(at(colour, 0), part(at(colour, 3), 'z3')), q(-9, 8)));
  });

  // Palanques-Mestre, Pascual 1984 (γ_m at leading n_f, all orders; recalled).
  it('the leading powers of n_f of γ_m come from the bubble chain', () => {
    const n = 5;
    const lin = (c0: number, c1: number): Formal[] => [formalRational(q(c0)), formalRational(q(c1))];
    const zeta = (k: number): Formal => formalSymbol(`z${k}`);
    /** ln Γ(1 + s x) without the Euler constant, which cancels. */
    const logGamma = (s: number): Formal[] =>
      Array.from({ length: n }, (_, k) => (k < 2 ? formalRing.zero : scaleFormal(zeta(k), q((-s) ** k, k))));
    const gammaOf = (s: number): Formal[] => expSeries(formalRing, logGamma(s), n);
    const product = (...f: Formal[][]): Formal[] => f.reduce((a, b) => mulSeries(formalRing, a, b, n));
    // G(x) = (1 − 2x/3) Γ(4−2x)/(Γ(1+x) Γ(2−x)² Γ(3−x))
    const top = product([formalRing.one, formalRational(q(-2, 3))], lin(3, -2), lin(2, -2), lin(1, -2), gammaOf(-2));
    const bottom = product(
      gammaOf(1),
      lin(1, -1),
      lin(1, -1),
      gammaOf(-1),
      gammaOf(-1),
      lin(2, -1),
      lin(1, -1),
      gammaOf(-1),
    );
    // Normalise the constant terms before dividing: 6 and 2.
    const scaled = (a: Formal[], c: number): Formal[] => a.map((x) => scaleFormal(x, q(1, c)));
    const g = product(scaled(top, 6), reciprocal(formalRing, scaled(bottom, 2), n));
    const pi: Record<string, Formal> = { z2: parseFormal('pi^2/6'), z4: parseFormal('pi^4/90') };
    MASS_DIMENSION.forEach((c, k) => {
      if (k === 0) return;
      // γ_k ∋ 3 C_F (4 T_F/3)^k G_k n_f^k = 4 (2/3)^k G_k n_f^k
      const leading = at(powersOfSymbol(formalOf(c), 'nf'), k);
      const expected = scaleFormal(at(g, k), q(2 ** k * 4, 3 ** k));
      same(substituteFormal(leading, pi), substituteFormal(expected, pi));
    });
  });

  // Baikov, Chetyrkin, Kühn arXiv:1606.08659 and arXiv:1402.6611: numerical forms in α_s/π, recalled.
  it.each([
    [BETA, 3, ['114.230', '-27.1339', '1.58238', '0.0058567']],
    [BETA, 4, ['524.56', '-181.80', '17.16', '-0.22586', '-0.0017993']],
    [MASS_DIMENSION, 4, ['559.7069', '-143.6864', '7.4824', '0.1083', '-0.000085359']],
  ])('published numerical polynomials (%#)', (list, k, published) => {
    const rows = powersOfSymbol(formalOf(at(list, k)), 'nf');
    published.forEach((text, j) => {
      const own = numberOfFormal(at(rows, j)) / 4 ** (k + 1);
      const digits = text.replace(/^-?0*\.?0*/, '').replace('.', '').length;
      const unit = Math.abs(Number(text)) * 10 ** (1 - digits);
      expect(Math.abs(own - Number(text))).toBeLessThanOrEqual(2 * unit);
    });
  });
});

describe('decoupling, pole mass, potential', () => {
  // FLAG Review 2024, arXiv:2411.04268, Eqs. (293)-(295).
  it('the four-loop decoupling constant has the published decimals', () => {
    const c4 = powersOfSymbol(formalOf(at(DECOUPLING_ALPHA, 3)), 'nl').map(numberOfFormal);
    expect(c4[0]).toBeCloseTo(5.170347, 6);
    expect(c4[1]).toBeCloseTo(-1.009932, 6);
    expect(c4[2]).toBeCloseTo(-0.021978, 6);
    const c3 = powersOfSymbol(formalOf(at(DECOUPLING_ALPHA, 2)), 'nl').map(numberOfFormal);
    expect(c3[0]).toBeCloseTo(0.972057, 6);
    expect(c3[1]).toBeCloseTo(-0.0846515, 7);
    const d3 = powersOfSymbol(formalOf(at(DECOUPLING_MASS, 2)), 'nl').map(numberOfFormal);
    // Chetyrkin, Kniehl, Steinhauser hep-ph/9708255 (recalled): 1.8476 + 0.0247 nl.
    expect(d3[0]).toBeCloseTo(1.8476, 4);
    expect(d3[1]).toBeCloseTo(0.0247, 4);
  });

  // Melnikov, van Ritbergen hep-ph/9912391 (recalled): 13.4434 − 1.0414 nl; 190.595 − 26.655 nl + 0.6527 nl².
  it('the pole-mass coefficients have the published decimals', () => {
    const rows = [1, 2, 3].map((k) => powersOfSymbol(formalOf(at(POLE_OVER_MSBAR, k)), 'nl').map(numberOfFormal));
    expect(rows[0]?.[0]).toBeCloseTo(13.4434, 4);
    expect(rows[0]?.[1]).toBeCloseTo(-1.0414, 4);
    expect(rows[1]?.[0]).toBeCloseTo(190.595, 3);
    expect(rows[1]?.[1]).toBeCloseTo(-26.655, 3);
    expect(rows[1]?.[2]).toBeCloseTo(0.6527, 4);
    expect(rows[2]?.[3]).toBeCloseTo(-0.678141, 6);
  });

  // Smirnov, Smirnov, Steinhauser arXiv:0911.4742 (recalled): a_3 for SU(3).
  it('the potential has the published SU(3) polynomials', () => {
    const a2 = powersOfSymbol(formalOf(at(POTENTIAL, 1)), 'nl').map(numberOfFormal);
    const a3 = powersOfSymbol(formalOf(at(POTENTIAL, 2)), 'nl').map(numberOfFormal);
    expect(a2[0]).toBeCloseTo(456.749, 3);
    expect(a2[1]).toBeCloseTo(-66.354, 3);
    expect(a2[2]).toBeCloseTo(1.2346, 4);
    expect(a3[0]).toBeCloseTo(13432.6, 1);
    expect(a3[1]).toBeCloseTo(-3289.91, 2);
    expect(a3[2]).toBeCloseTo(185.99, 2);
    expect(a3[3]).toBeCloseTo(-1.37174, 5);
  });

  it('every constant and input names its source', () => {
    for (const list of [
      BETA,
      BETA_GROUP,
      MASS_DIMENSION,
      MASS_DIMENSION_GROUP,
      DECOUPLING_ALPHA,
      DECOUPLING_MASS,
      POLE_OVER_MSBAR,
      POTENTIAL,
    ]) {
      for (const c of list) expect(c.source.length).toBeGreaterThan(5);
    }
    for (const input of Object.values(INPUTS)) {
      expect(input.source.length).toBeGreaterThan(5);
      expect(Number(input.value)).toBeGreaterThan(Number(input.error[0]));
    }
  });
});

describe('formal polynomials', () => {
  it('read the notation of the papers', () => {
    same(parseFormal('(1 + x)^2 - 2*x'), parseFormal('1 + x^2'));
    same(parseFormal('-x/2 + 0.25'), addFormal(scaleFormal(formalSymbol('x'), q(-1, 2)), formalRational(q(1, 4))));
    same(formalAt({ formula: 'x*y + x' }, { x: 3 }), parseFormal('3*y + 3'));
    for (const bad of ['1 +', '(1', '1/x', '2 $ 3', '1 2', 'x^y']) expect(() => parseFormal(bad)).toThrow();
    expect(() => exactOfFormal(formalSymbol('nf')).ball(60)).toThrow(ReferenceError);
  });
});
