/**
 * Order-dependent mapping. Check values: mpmath 1.2.1 (22 reliable digits), oscillator H = p²/2 + x²/2 + g x⁴.
 * Method: R. Seznec, J. Zinn-Justin, J. Math. Phys. 20 (1979) 1398 (from memory).
 */
import { describe, expect, it } from 'vitest';
import { exact, R, Rational } from '../../src/numerics/index.js';
import type { Exact } from '../../src/numerics/index.js';
import type { Outcome, Sum } from '../../src/prescriptions/index.js';
import { orderDependentMap } from '../../src/prescriptions/order-dependent-map.js';
import { mapScale } from '../../src/sequences/index.js';
import type { StrongCoupling } from '../../src/sequences/index.js';
import type { Expansion } from '../../src/series/index.js';
import { benchExpansion, expansion, growthOf, readBench, refused, rescaled } from '../support/expansions.js';
import { expectNear } from '../support/check-value.js';

const OSCILLATOR: StrongCoupling = { power: Rational.of(1, 3), spacing: Rational.of(2, 3) };
const run = (e: Expansion, strongCoupling: StrongCoupling, digits = 25): readonly Outcome[] =>
  orderDependentMap.apply({ ...e, strongCoupling }, growthOf(e), { digits });
function value(e: Expansion, strong: StrongCoupling, digits = 25): Sum {
  const [found] = run(e, strong, digits);
  if (found?.kind !== 'sum') expect.fail(found?.reason ?? 'nothing');
  return found;
}
const b = readBench('s40_aho_quartic');

describe('the quartic oscillator', () => {
  const known: [number, string, string, string][] = [
    [
      2,
      '0.142857142857142857142857142857139335',
      '0.559050488642970269701686571932414348',
      '0.802668667091902092011207657029631015',
    ],
    [
      3,
      '0.117007120527515746585338062092611982',
      '0.559164021155580875895981668404660771',
      '0.804125309993251752090598595023083959',
    ],
    [
      4,
      '0.0914736805672321239889737098928728127',
      '0.559144644212198842594407385596739247',
      '0.803721188259975634132740206464484071',
    ],
    [
      5,
      '0.0771072234797051770068227606456671606',
      '0.559146371031487368274439381477798637',
      '0.803769934417442338987179193342622354',
    ],
    [
      6,
      '0.0721366803364847821058184050207315094',
      '0.559146228357162285961987470083102171',
      '0.803764069632407974064748631545221043',
    ],
    [
      7,
      '0.0498467386397900379816033160071763860',
      '0.559146210172876187572459513770465410',
      '0.803762425822398559669304702817173780',
    ],
  ];
  for (const [K, rho, small, large] of known) {
    it(`order ${K}`, () => {
      const scale = mapScale(b.coefficients, K, OSCILLATOR, 120)!;
      expectNear(scale.rho, rho, 1e-21);
      expectNear(value(benchExpansion(b, '1/10', K + 1), OSCILLATOR).value, small, 1e-20);
      expectNear(value(benchExpansion(b, '1', K + 1), OSCILLATOR).value, large, 1e-20);
    });
  }
  it('converges at strong coupling, and covers the miss', () => {
    const r = b.references.find((ref) => ref.x === '10')!;
    for (const K of [5, 7, 12]) {
      const s = value(benchExpansion(b, '10', K + 1), OSCILLATOR);
      expect(Math.abs(R.toNumber(s.value) - Number(r.pv))).toBeLessThan(3 * s.truncation!);
    }
    expect(Math.abs(R.toNumber(value(benchExpansion(b, '10', 16), OSCILLATOR).value) - Number(r.pv))).toBeLessThan(
      1e-5,
    );
  });
});

describe('exact on its own class', () => {
  it('(1 + g)^{1/3}: a = 1, σ = 1/3 make it a pure power of 1 − λ', () => {
    // ρ = 1 gives E = (1−λ)^{−1/3} with 1 + g = 1/(1−λ).
    const strong: StrongCoupling = { power: Rational.of(1, 3), spacing: Rational.ONE };
    const c: Exact[] = [exact(1)];
    for (let n = 1; n < 8; n++)
      c.push(exact(c[n - 1]!.rational!.mul(Rational.of(1, 3).sub(Rational.of(n - 1))).div(Rational.of(n))));
    const s = value(expansion(c, exact(7)), strong);
    expectNear(s.value, '2', 1e-20);
  });
});

describe('covariance', () => {
  it('does not see x → λx', () => {
    const e = benchExpansion(b, '1', 7);
    expect(R.overlaps(value(e, OSCILLATOR).value, value(rescaled(e, Rational.of(5, 7)), OSCILLATOR).value)).toBe(true);
  });
});

describe('refusals', () => {
  it('no exponents, no alternation, no positive spacing', () => {
    expect(refused(orderDependentMap, benchExpansion(b, '1', 7)).reason).toContain('strong-coupling');
    const same = benchExpansion(readBench('s02_euler_nonalternating'), '1/10', 8);
    expect(run(same, OSCILLATOR)[0]!.kind).toBe('refusal');
    expect(run(benchExpansion(b, '1', 7), { power: Rational.ONE, spacing: Rational.ZERO })[0]!.kind).toBe('refusal');
  });
});
