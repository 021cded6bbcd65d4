/**
 * Conformal maps and ray integrals.
 * Check values: mpmath 1.2.1, 34 reliable digits; the ray integral there does not depend on its angle to 15 digits. Adler
 * function n_f = 3: coefficients of arXiv:0801.1821, c_5 = 283 of arXiv:0806.3156 (memory). Method: arXiv:hep-ph/9811367.
 */
import { describe, expect, it } from 'vitest';
import { C, exact, pi, R, Rational } from '../../src/numerics/index.js';
import type { Ball, Exact } from '../../src/numerics/index.js';
import { inverseMapSeries, mapTo, remap, remappedValues } from '../../src/borel/conformal.js';
import type { Cuts, Softening } from '../../src/borel/conformal.js';
import { borelTransform } from '../../src/borel/transform.js';
import { lateralSums, STRAIGHT } from '../../src/borel/ray.js';
import { RAYS } from '../../src/borel/ray-nodes.js';
import { expectNear, rational } from '../support/check-value.js';

const q = (s: string): Exact => exact(rational(s));
const PREC = 200;
const TWO: Cuts = { left: { distance: exact(1) }, right: { distance: exact(2) } };

describe('the map of cuts (−∞, −1] and [2, ∞)', () => {
  it('has the known Taylor series', () => {
    const found = inverseMapSeries(TWO, 7, PREC);
    ['0', '8/3', '16/9', '-40/27', '-224/81', '-88/243', '1840/729'].forEach((v, n) => expectNear(found[n]!, v, 1e-50));
  });
  it('has the known values', () => {
    const at = (re: string, im = '0'): ReturnType<typeof mapTo> =>
      mapTo(TWO, { re: q(re).ball(PREC), im: q(im).ball(PREC) }, PREC);
    expectNear(at('1/2').re, '0.171572875253809902396622551580603843', 1e-35);
    expectNear(at('1').re, '1/3', 1e-50);
    expectNear(at('-1/2').re, '-0.225148226554413778667404303711520978', 1e-35);
    const above = at('3', '1e-60');
    expectNear(above.re, '0.777777777777777777777777777777777778', 1e-35);
    expectNear(above.im, '0.628539361054708910578528321870976924', 1e-35);
  });
  it('inverts: t(w(t)) = t', () => {
    const t = { re: q('0.3').ball(PREC), im: q('1.7').ball(PREC) };
    const w = mapTo(TWO, t, PREC);
    const one = C.ONE;
    const square = (z: typeof w): typeof w => C.mul(z, z, PREC);
    const below = C.add(square(C.sub(one, w, PREC)), C.mul2exp(square(C.add(one, w, PREC)), -1), PREC);
    const back = C.div(C.mul2exp(w, 2), below, PREC);
    expect(C.overlaps(back, t)).toBe(true);
    expect(C.accuracyBits(back)).toBeGreaterThan(150);
  });
});

/** ∫ e^{−s} B(g s) ds of the re-expanded transform. */
function sum(c: readonly Exact[], cuts: Cuts, softening: Softening, g: Exact, digits = 30): { pv: Ball; im: Ball } {
  const prec = 300;
  const b = borelTransform(c).map((x) => x.ball(prec));
  const list = [remap(b, cuts, softening, prec)];
  const right = cuts.right;
  const found = lateralSums(
    { balls: (s, p) => [remappedValues(list, cuts, C.mulReal(s, g.ball(p), p), p)[0]!.full] },
    right === undefined
      ? STRAIGHT
      : { ray: RAYS[0]!, first: R.toNumber(right.distance.ball(60)) / R.toNumber(g.ball(60)) },
    digits,
  );
  return found![0]!;
}

describe('Adler function, n_f = 3, in u', () => {
  const c = ['1', '1.6398212048969847', '6.3710144831009364', '49.075700002948', '283'].map((s, n) =>
    exact(rational(s).div(Rational.of(9, 4).pow(n))),
  );
  const cuts: Cuts = {
    left: { distance: exact(1), exponent: q('1.21') },
    right: { distance: exact(2), exponent: q('2.58') },
  };
  it('re-expands to the known coefficients', () => {
    const b = borelTransform(c).map((x) => x.ball(PREC));
    const known: [Softening, string[]][] = [
      [
        'none',
        [
          '1',
          '1.94349179839642631111111111111111111',
          '5.77022829817330949794238683127572016',
          '18.5031353157454765709563244085420583',
          '45.5009196809761817061481268224820190',
        ],
      ],
      [
        'in w',
        [
          '1',
          '-0.796508201603573688888888888888888889',
          '0.408860770567101405497942386831275720',
          '8.66515137564865791413196226862436282',
          '2.24875485682243342497926131756237601',
        ],
      ],
    ];
    for (const [softening, values] of known) {
      const found = remap(b, cuts, softening, PREC).coefficients;
      values.forEach((v, n) => expectNear(found[n]!, v, 1e-32));
    }
  });
  const reference: [string, number, Softening, string, string][] = [
    ['0.32', 3, 'none', '0.125027811272155992814939823717482511', '0.0000648551192894956488435186004824343711'],
    ['0.32', 3, 'in w', '0.131181520699649055221938191287191469', '0.00249574997709199234105170454370755936'],
    ['0.32', 4, 'in w', '0.138124998360701389880183019315099492', '0.00899318574941953380036566555633263802'],
    ['0.32', 5, 'none', '0.134732085100176049178714104496627513', '0.000885908403603787803518283451465562399'],
    ['0.32', 5, 'in w', '0.138437899193181566149630810207082510', '0.00982540484284968900557120563392140525'],
    ['0.34', 5, 'none', '0.147566168933654057705162355793923749', '0.00158122993686271057606042995803542669'],
    ['0.34', 5, 'in w', '0.150792544927090481564472183321688356', '0.0146871919087105265061400855772285875'],
  ];
  for (const [alpha, N, softening, pv, im] of reference) {
    it(`α = ${alpha}, N = ${N}, softening ${softening}`, () => {
      // D = (1/β₀) ∫ du e^{−u/(β₀ a)} B(u) = a F(β₀ a), β₀ = 9/4.
      const prec = 200;
      const a = R.div(q(alpha).ball(prec), pi(prec), prec);
      const g: Exact = { ball: (p) => R.mul(R.div(q(alpha).ball(p + 8), pi(p + 8), p + 8), q('9/4').ball(p), p) };
      const found = sum(c.slice(0, N), cuts, softening, g);
      expectNear(R.mul(a, found.pv, prec), pv, 1e-28);
      expectNear(R.mul(a, found.im, prec), im, 1e-28);
    });
  }
});

describe('one cut', () => {
  const euler = (N: number): Exact[] => {
    const list = [Rational.ONE];
    for (let n = 1; n < N; n++) list.push(list[n - 1]!.mul(Rational.of(-n)));
    return list.map((c) => exact(c));
  };
  const left: Cuts = { left: { distance: exact(1), exponent: exact(1) } };
  it('sums the Euler series at g = 1 as known', () => {
    const known: [number, string][] = [
      [6, '0.591891426132730098037764197815149888'],
      [12, '0.596315294165932797303439294111269554'],
      [20, '0.596347258344958176089533293447766629'],
    ];
    for (const [N, value] of known) expectNear(sum(euler(N), left, 'none', exact(1)).pv, value, 1e-28);
  });
  it('is exact when softened in t: a pure pole', () => {
    expectNear(sum(euler(4), left, 'in t', exact(1)).pv, '0.596347362323194074341078499369279376', 1e-28);
  });
  it('agrees with the mirror image: the other cut alone, at the mirrored transform', () => {
    // 1/(1−t) with a right cut: PV e^{−1}Ei(1) = 0.697174883235066…, Im π/e (DLMF 6.2).
    const c = euler(4).map((x, n) => exact(n % 2 === 0 ? x.rational! : x.rational!.neg()));
    const s = sum(c, { right: { distance: exact(1), exponent: exact(1) } }, 'in t', exact(1));
    expectNear(s.pv, '0.697174883235066068765478681919', 1e-25);
    expectNear(s.im, '1.155727349790921717910093183312696', 1e-25);
  });
});

describe('a small imaginary part', () => {
  it('keeps its relative digits far below the principal value', () => {
    // 1/(1 − t) at x = 1/60: Im = π 60 e^{−60} = 1.65…e−24.
    const c = [1, 1, 2, 6].map((n) => exact(n));
    const s = sum(c, { right: { distance: exact(1), exponent: exact(1) } }, 'in t', exact(Rational.of(1, 60)), 20);
    const expected = Math.PI * 60 * Math.exp(-60);
    expect(Math.abs(R.toNumber(s.im) / expected - 1)).toBeLessThan(1e-11);
    expect(R.accuracyBits(s.im)).toBeGreaterThan(35);
  });
});
