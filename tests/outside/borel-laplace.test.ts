/**
 * Closed-form Laplace sums against reference values.
 * Source of every value here: computed with mpmath 1.2.1 (rotated-contour quadrature and closed forms), 34 reliable
 * digits, key values repeated in PARI/GP 2.15.2; DLMF 6.2 and 13.3.10 behind the closed forms.
 */
import { describe, expect, it } from 'vitest';
import { approximateTransformed, laplace, rationalSum } from '../../src/borel/index.js';
import type { Approximant } from '../../src/borel/index.js';
import { exact, R, Rational } from '../../src/numerics/index.js';
import type { Exact } from '../../src/numerics/index.js';
import { near } from '../support/near.js';

const value = (s: string): number => q(s).toNumber();
const q = (s: string): Rational => Rational.parse(s)!;

/** Taylor coefficients of p/q, enough to determine [L/M]. */
function taylor(p: readonly string[], d: readonly string[], count: number): Exact[] {
  const P = p.map(q);
  const D = d.map(q);
  const c: Rational[] = [];
  for (let n = 0; n < count; n++) {
    let v = P[n] ?? Rational.ZERO;
    for (let k = 1; k <= Math.min(n, D.length - 1); k++) v = v.sub(D[k]!.mul(c[n - k]!));
    c.push(v.div(D[0]!));
  }
  return c.map(exact);
}

function sum(p: readonly string[], d: readonly string[], g: string): { pv: string; im: string; a: Approximant } {
  const L = p.length - 1;
  const M = d.length - 1;
  const a = approximateTransformed(taylor(p, d, L + M + 1), L, M, 220, 0);
  const s = laplace(a.polynomialPart, a.poles, R.fromRational(q(g), 220), Rational.ZERO, 220);
  // The check values are of ∫ e^{−t/g} …, without the factor 1/g.
  const G = R.fromRational(q(g), 220);
  return { pv: near.text(R.mul(s.pv, G, 220)), im: near.text(R.mul(s.im, G, 220)), a };
}

describe('Laplace integral of a rational function', () => {
  it('simple pole 1/(1−t), g = 1/4', () => {
    const s = sum(['1'], ['1', '-1'], '1/4');
    near.expect(s.pv, '0.359552007863620696177421675826607445', 33);
    near.expect(s.im, '0.0575402765786508252554207807448297505', 33);
  });
  it('double pole 1/(1−t)², g = 1/4', () => {
    const s = sum(['1'], ['1', '-2', '1'], '1/4');
    near.expect(s.pv, '0.438208031454482784709686703306429782', 33);
    near.expect(s.im, '0.230161106314603301021683122979319002', 33);
  });
  it('triple pole at 2 with a polynomial part, g = 2/5', () => {
    const s = sum(['1', '1', '0', '1/3', '1/5'], ['8', '-12', '6', '-1'], '2/5');
    near.expect(s.pv, '0.0315205850754353167787732414687082048', 33);
    near.expect(s.im, '0.127183707795564149525697285738909110', 33);
  });
  it('complex pair 1 ± 0.2i and a real pole at −1, g = 3/10', () => {
    const s = sum(['2', '1'], ['26/25', '-24/25', '-1', '1'], '3/10');
    near.expect(s.pv, '1.52298838818463424970800293189019197', 33);
    expect(value(s.im)).toBe(0);
  });
  it('poles 1 and 3 and a double pole −2, g = 7/20', () => {
    const s = sum(['1', '1/2'], ['12', '-4', '-9', '0', '1'], '7/20');
    near.expect(s.pv, '0.0414404064765561327324756652651947146', 33);
    near.expect(s.im, '0.0150060671116421414333072733192563438', 33);
    expect(s.a.positiveRealPoles).toBe(2);
  });
  it('near-axis pair: straight integral, and the contour lifted over the pair, g = 3/10', () => {
    const p = ['1'];
    const d = ['10001/10000', '-2', '1'];
    const a = approximateTransformed(taylor(p, d, 3), 0, 2, 220, 0);
    const G = R.fromRational(q('3/10'), 220);
    const s = rationalSum(a, G, Rational.ZERO, 220);
    near.expect(near.text(R.mul(s.straight.pv, G, 220)), '11.6801477004019988503563548901091064', 33);
    near.expect(near.text(R.mul(s.lifted!.pv, G, 220)), '0.479057867933861483029737770963608852', 33);
    near.expect(near.text(R.mul(s.lifted!.im, G, 220)), '0.373508007629611065275929741477942337', 33);
  });
  it('Leroy weight t^b, b = 0.3951, simple and double pole at 1, g = 1/4', () => {
    // Check values: ∫ t^b e^{−t/g}/(t−1) dt and /(t−1)², divided by g^b Γ(1+b).
    const b = q('0.3951');
    const G = R.fromRational(q('1/4'), 220);
    const run = (amplitudes: number[]): { pv: string; im: string } => {
      const s = laplace(
        [],
        [
          {
            z: { re: R.ONE, im: R.ZERO },
            real: true,
            amplitudes: amplitudes.map((x) => ({ re: R.fromNumber(x), im: R.ZERO })),
          },
        ],
        G,
        b,
        220,
      );
      return { pv: near.text(R.mul(s.pv, G, 220)), im: near.text(R.mul(s.im, G, 220)) };
    };
    // 1/(t−1) = −1/(1−t); 1/(t−1)² = 1/(1−t)².
    const one = run([-1]);
    const two = run([0, 1]);
    const scale = 0.25 ** 0.3951 * gamma13951;
    expect(value(one.pv) * scale).toBeCloseTo(-0.20601361886341069, 12);
    expect(value(one.im) * scale).toBeCloseTo(-0.05754027657865083, 12);
    expect(value(two.pv) * scale).toBeCloseTo(0.229425164757995, 12);
  });
});

/** Γ(1.3951), mpmath 1.3.0. */
const gamma13951 = 0.8875416749373118;
