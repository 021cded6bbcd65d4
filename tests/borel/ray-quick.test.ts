/** Laplace integrals along a ray: double-double arithmetic against balls, and against closed forms. */
import { describe, expect, it } from 'vitest';
import { C, DoubleDouble as D, exact, R, Rational, scaledE1 } from '../../src/numerics/index.js';
import type { Complex, Exact } from '../../src/numerics/index.js';
import {
  dlogApproximant,
  dlogQuick,
  dlogValue,
  lateralSums,
  quadraticApproximant,
  quadraticQuick,
  quadraticValue,
  RAYS,
  remap,
  remappedQuick,
  remappedValues,
} from '../../src/borel/index.js';
import type { Cuts, Integrand, LaplaceSum } from '../../src/borel/index.js';
import { quickIntegral } from '../../src/borel/ray-quick.js';
import { rational } from '../support/check-value.js';

const Z = D.complex;
const x = exact(Rational.of(1, 4));
const contour = { ray: RAYS[0]!, first: 4 };
/** Coefficients of the transform (1 − t)^{−1.3} + (1 + t/2)^{−1.2}/2. */
function transform(N: number): Exact[] {
  const power = (exponent: string, slope: string): Rational[] => {
    const [p, k] = [rational(exponent), rational(slope)];
    const list = [Rational.ONE];
    for (let n = 1; n < N; n++)
      list.push(
        list[n - 1]!.mul(p.add(Rational.of(n - 1)))
          .mul(k)
          .div(Rational.of(n)),
      );
    return list;
  };
  const second = power('1.2', '-1/2');
  return power('1.3', '1').map((c, n) => exact(c.add(second[n]!.div(Rational.of(2)))));
}
/** Both ways give the same sum, and the quick one states an error that covers the difference. */
function agree(f: Integrand, digits: number): void {
  const slow = lateralSums({ balls: f.balls }, contour, digits);
  const quick = lateralSums(f, contour, digits);
  expect(f.quick === undefined ? undefined : quickIntegral(f.quick, contour.ray, digits)).toBeDefined();
  const close = (a: LaplaceSum, b: LaplaceSum): boolean => R.overlaps(a.pv, b.pv) && R.overlaps(a.im, b.im);
  expect(slow!.every((s, i) => close(s, quick![i]!))).toBe(true);
}

describe('double-double sums along a ray', () => {
  it('of a simple pole are exponential integrals', () => {
    // ∫ e^{−s}/(1 − s/4) ds = −4 e^{−4} Ei(4) as principal value: w E₁ at w = −4 ± i0.
    const quick = (s: D.complex.Complex) => [
      { value: Z.div(Z.ONE, Z.sub(Z.ONE, Z.mul2exp(s, -2))), lost: 16 / Z.size(Z.sub(Z.ONE, Z.mul2exp(s, -2))) },
    ];
    const found = quickIntegral(quick, RAYS[0]!, 22)![0]!;
    const below = scaledE1({ re: R.fromNumber(-4), im: R.mul2exp(R.ONE, -400) }, 500);
    expect(R.overlaps(found.re, R.mul2exp(R.neg(below.re), 2))).toBe(true);
    expect(R.accuracyBits(found.re)).toBeGreaterThan(22 * 3.3);
  });

  it('agree with balls for logarithmic-derivative and quadratic approximants', () => {
    const b = transform(8);
    const at = (s: Complex, prec: number): Complex => C.mulReal(s, x.ball(prec), prec);
    const dlog = dlogApproximant(b, 2, 3, 160);
    const quadratic = quadraticApproximant(b, [2, 2, 2], 160);
    if (typeof dlog === 'string' || typeof quadratic === 'string') return expect.fail('no approximant');
    const first = dlogQuick(dlog, x.ball(160), 160)!;
    const second = quadraticQuick(quadratic, x.ball(160), 160)!;
    for (const digits of [12, 20, 24]) {
      agree({ balls: (s, p) => [dlogValue(dlog, at(s, p), p)], quick: (s) => [first(s)] }, digits);
      agree({ balls: (s, p) => [quadraticValue(quadratic, at(s, p), p)], quick: (s) => [second(s)] }, digits);
    }
  });

  it('agree with balls for mapped transforms', () => {
    const end = (distance: number, exponent: string) => ({
      distance: exact(distance),
      exponent: exact(rational(exponent)),
    });
    const cuts: Cuts = { left: end(2, '1.2'), right: end(1, '1.3') };
    const b = transform(9).map((c) => c.ball(200));
    const list = (['in w', 'in t', 'none'] as const).map((softening) => remap(b, cuts, softening, 200));
    const quick = remappedQuick(list, cuts, x.ball(200), 1, 200)!;
    const balls = (s: Complex, p: number): readonly Complex[] =>
      remappedValues(list, cuts, C.mulReal(s, x.ball(p), p), p).flatMap(({ full, shorter }) => [full, shorter]);
    agree({ balls, quick }, 20);
  });

  it('leave it to balls where their digits end', () => {
    const lossy = (lost: number) => (_: D.complex.Complex) => [{ value: Z.ONE, lost }];
    expect(quickIntegral(lossy(1), RAYS[0]!, 20)).toBeDefined();
    expect(quickIntegral(lossy(2 ** 40), RAYS[0]!, 20)).toBeUndefined();
    expect(quickIntegral(lossy(1), RAYS[0]!, 25)).toBeUndefined();
  });
});
