/**
 * Check values for twelve terms computed with mpmath 1.2.1, the recursions there compared with the
 * explicit ratios of sums to 30 digits. Transformations: Wynn 1956, Levin 1973, Weniger 1989 (arXiv:math/0306302),
 * Brezinski 1971, DLMF 3.9; all from memory.
 */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { ballField, doubleField, R, Rational, rationalField } from '../../src/numerics/index.js';
import { padeExact } from '../../src/numerics/polynomial/pade-exact.js';
import type { Ball } from '../../src/numerics/index.js';
import {
  aitkenColumns,
  epsilonColumns,
  epsilonStaircase,
  eulerSums,
  levinDiagonal,
  sumsOf,
  thetaColumns,
  wenigerDiagonal,
} from '../../src/sequences/index.js';
import { expectNear } from '../support/check-value.js';

const PREC = 300;
const field = ballField(PREC);
const last = <T>(list: readonly T[]): T => list[list.length - 1]!;

/** Σ (−1)^n n! g^n. */
function euler(count: number, g: Rational): Rational[] {
  const list = [Rational.ONE];
  for (let n = 1; n < count; n++) list.push(list[n - 1]!.mul(g).mul(Rational.of(-n)));
  return list;
}

const balls = (q: readonly Rational[]): Ball[] => q.map((x) => R.fromRational(x, PREC));

const ln2 = (count: number): Rational[] =>
  Array.from({ length: count }, (_, n) => Rational.of(n % 2 === 0 ? 1 : -1, n + 1));

const TWELVE: readonly {
  readonly name: string;
  readonly terms: Rational[];
  readonly values: Record<string, string>;
}[] = [
  {
    name: 'Euler series at g = 1',
    terms: euler(12, Rational.ONE),
    values: {
      aitken: '0.596362730193729155943072951631309712',
      epsilon: '0.595084087968952134540750323415265201',
      theta: '0.596384329467725584136307116732092183',
      u: '0.596347294112500059152419948018719950',
      t: '0.596347386780273407057148350542003191',
      d: '0.596347283135043152274601041994225652',
      v: '0.596347212324816914780961261176855491',
      delta: '0.596347387349628539654013387598252592',
      euler: '-3039.73828125',
    },
  },
  {
    name: 'Euler series at g = 1/5',
    terms: euler(12, Rational.of(1, 5)),
    values: {
      aitken: '0.852110885372870178029770759367966810',
      epsilon: '0.852110474205315268368942157373632100',
      theta: '0.852110881752230358014988592170876283',
      u: '0.852110881395187435049863274708269708',
      t: '0.852110881456480183114525956473503534',
      d: '0.852110881361444045131050157399620229',
      v: '0.852110881297224117450710226486775636',
      delta: '0.852110881423721112018133698395544229',
      euler: '0.8520446985',
    },
  },
  {
    name: 'ln 2',
    terms: ln2(12),
    values: {
      aitken: '0.693147180663563589943271794996343409',
      epsilon: '0.693147179517776761268338603713795138',
      theta: '0.693147180652746525530756764116207651',
      u: '0.693147180559930781040273482742564110',
      t: '0.693147180559953020825683545179321040',
      d: '0.693147180559839691917968900678655170',
      v: '0.693147180559846560459308620249386807',
      delta: '0.693147180559947107679329254298741457',
      euler: '0.693129590407422438672438672438672439',
    },
  },
];

describe('twelve terms', () => {
  for (const { name, terms, values } of TWELVE) {
    it(name, () => {
      const a = balls(terms);
      const s = sumsOf(field, a);
      const found: Record<string, Ball> = {
        aitken: aitkenColumns(field, s)[5]![0]!,
        epsilon: last(epsilonStaircase(epsilonColumns(field, s)))!,
        theta: last(thetaColumns(field, s)[3]!),
        u: last(levinDiagonal(field, a, 'u')),
        t: last(levinDiagonal(field, a, 't')),
        d: last(levinDiagonal(field, a, 'd')),
        v: last(levinDiagonal(field, a, 'v')),
        delta: last(wenigerDiagonal(field, a)),
        euler: last(eulerSums(field, a)),
      };
      for (const [key, text] of Object.entries(values)) expectNear(found[key]!, text, key === 'euler' ? 1e-30 : 2e-35);
    });
  }

  it('runs in doubles to the accuracy that twelve terms leave', () => {
    const a = euler(12, Rational.ONE).map((q) => q.toNumber());
    expect(last(wenigerDiagonal(doubleField, a))).toBeCloseTo(0.5963473873, 8);
    expect(last(levinDiagonal(doubleField, a, 'u'))).toBeCloseTo(0.5963472941, 8);
  });
});

describe('ε algorithm', () => {
  /** Padé [L/M] of Σ c_n at x = 1, undefined where it has a pole. */
  function padeAtOne(c: readonly Rational[], L: number, M: number): Rational | undefined {
    const p = padeExact(c, L, M);
    if (!p.exists) return undefined;
    const sum = (list: readonly Rational[]): Rational => list.reduce((x, y) => x.add(y), Rational.ZERO);
    const below = sum(p.denominator);
    return below.isZero() ? undefined : sum(p.numerator).div(below);
  }

  it('gives the Padé approximants [n+k/k] of random series, singular blocks included', () => {
    // Small integers make zero coefficients, equal partial sums and blocks of the table frequent.
    const coefficient = fc.integer({ min: -2, max: 2 });
    let compared = 0;
    fc.assert(
      fc.property(fc.array(coefficient, { minLength: 5, maxLength: 9 }), (list) => {
        const c = list.map((n) => Rational.of(n));
        const columns = epsilonColumns(rationalField, sumsOf(rationalField, c));
        columns.forEach((column, k) =>
          column.forEach((value, n) => {
            const expected = padeExact(c, n + k, k);
            // Where Baker's definition knows no entry, the table continues its block: nothing to compare.
            if (!expected.exists) return;
            const at = padeAtOne(c, n + k, k);
            if (at === undefined) expect(value).toBeUndefined();
            else {
              expect(value?.toString()).toBe(at.toString());
              compared++;
            }
          }),
        );
      }),
      { numRuns: 400 * Number(process.env['LEASTTERM_TEST_MULTIPLIER'] ?? 1), seed: 11 },
    );
    expect(compared).toBeGreaterThan(1000);
  });

  it('goes on past an infinite element', () => {
    // The first two differences are equal, so ε_2^{(0)} is infinite.
    const s = [0, 1, 2, 4, 7, 12, 20].map((n) => Rational.of(n));
    const columns = epsilonColumns(rationalField, s);
    expect(columns[1]![0]).toBeUndefined();
    expect(columns[2]!.every((v) => v !== undefined)).toBe(true);
  });

  it('is exact on a sum of geometric series', () => {
    const terms = Array.from({ length: 9 }, (_, n) =>
      Rational.of(-1, 2).pow(n).add(Rational.of(3).pow(n)).add(Rational.of(-5, 3).pow(n)),
    );
    const exact = Rational.of(2, 3).add(Rational.of(-1, 2)).add(Rational.of(3, 8));
    const columns = epsilonColumns(rationalField, sumsOf(rationalField, terms));
    expect(columns[3]![0]!.equals(exact)).toBe(true);
    // Further columns sit in the block of equal elements.
    expect(columns[4]![0]!.equals(exact)).toBe(true);
  });

  it('says INDETERMINATE in balls where it cannot decide', () => {
    const third = R.addError(R.fromRational(Rational.of(1, 3), 100), 1);
    const columns = epsilonColumns(ballField(100), sumsOf(ballField(100), [R.ONE, third, third, R.ONE, R.ONE]));
    expect(columns[1]!.some((v) => v !== undefined && v.rad === Infinity)).toBe(true);
  });
});

describe('model sequences', () => {
  const q = (n: number, d = 1): Rational => Rational.of(n, d);
  const weights = [q(2), q(-1, 3), q(5, 7), q(1, 11)];
  const limit = q(17, 13);

  /** Terms whose partial sums are limit + ω_n Σ_j weights_j basis_j(n), found by solving for a_n one by one. */
  function model(
    omegaOf: (a: Rational, n: number) => Rational,
    basis: (n: number, j: number) => Rational,
    count: number,
  ): Rational[] {
    const terms: Rational[] = [];
    let sum = q(0);
    for (let n = 0; n < count; n++) {
      const z = weights.reduce((acc, w, j) => acc.add(w.mul(basis(n, j))), q(0));
      // s_{n−1} + a = limit + κ a z with ω_n = κ a, linear in a.
      const kappa = omegaOf(q(1), n);
      const a = limit.sub(sum).div(q(1).sub(kappa.mul(z)));
      terms.push(a);
      sum = sum.add(a);
    }
    return terms;
  }

  const inversePower = (n: number, j: number): Rational => q(1, n + 1).pow(j);

  it('t and u are exact on theirs', () => {
    const forT = model((a) => a, inversePower, 6);
    expect(levinDiagonal(rationalField, forT, 't')[4]!.equals(limit)).toBe(true);
    expect(levinDiagonal(rationalField, forT, 't')[2]!.equals(limit)).toBe(false);
    const forU = model((a, n) => a.mul(q(n + 1)), inversePower, 6);
    expect(levinDiagonal(rationalField, forU, 'u')[4]!.equals(limit)).toBe(true);
  });

  it('d and δ are exact on theirs', () => {
    // s_n = limit + a_{n+1} z_n: a_{n+1} = (s_n − limit)/z_n.
    const build = (basis: (n: number, j: number) => Rational): Rational[] => {
      const terms = [q(1)];
      let sum = q(1);
      for (let n = 0; n < 6; n++) {
        const z = weights.reduce((acc, w, j) => acc.add(w.mul(basis(n, j))), q(0));
        const a = sum.sub(limit).div(z);
        terms.push(a);
        sum = sum.add(a);
      }
      return terms;
    };
    expect(levinDiagonal(rationalField, build(inversePower), 'd')[4]!.equals(limit)).toBe(true);
    const rising = (n: number, j: number): Rational =>
      Array.from({ length: j }, (_, i) => q(1, n + 1 + i)).reduce((x, y) => x.mul(y), q(1));
    expect(wenigerDiagonal(rationalField, build(rising))[4]!.equals(limit)).toBe(true);
  });

  it('ϑ is exact on linear convergence with one exponential, Aitken too', () => {
    const s = Array.from({ length: 8 }, (_, n) => q(3).add(q(-2, 3).pow(n).mul(q(5))));
    expect(thetaColumns(rationalField, s.slice(0, 4))[1]![0]!.equals(q(3))).toBe(true);
    expect(aitkenColumns(rationalField, s)[1]![0]!.equals(q(3))).toBe(true);
    // From here on the second differences vanish: the guard keeps the limit.
    expect(aitkenColumns(rationalField, s)[3]![0]!.equals(q(3))).toBe(true);
  });

  it("Euler's transformation is exact on an alternating polynomial", () => {
    const terms = Array.from({ length: 6 }, (_, n) => q((n % 2 === 0 ? 1 : -1) * (n * n + 1)));
    // Σ (−1)^n (n² + 1) = 0 + 1/2 in Abel's sense.
    expect(last(eulerSums(rationalField, terms)).equals(q(1, 2))).toBe(true);
  });
});
