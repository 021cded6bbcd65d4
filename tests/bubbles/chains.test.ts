/** Bubble chains: identities between sums, imaginary parts, momenta and cuts. */
import { describe, expect, test } from 'vitest';
import {
  betaNought,
  borelPoles,
  chainCoefficients,
  chainSum,
  cutCoefficients,
  cutObjection,
  cutSum,
  distribution,
  factorBall,
  imaginaryShare,
  logLength,
  lowPart,
  massiveGluon,
  orderScales,
  quantityNamed,
  QUANTITIES,
  rangeObjection,
} from '../../src/bubbles/index.js';
import { R, Rational, exact, exactReal, exp, log, pi, sinCos, toNumberExact } from '../../src/numerics/index.js';
import { at, distance, named, q } from './support.js';

const PREC = 150;

describe('one sum, several ways', () => {
  test.each(['adler', 'bjorken', 'pole-mass', 'static-potential'])('Im of %s is π w at the Landau pole', (name) => {
    const quantity = named(name);
    const point = at(4, '0.24');
    const tau = exp(R.neg(logLength(point, 400)), 400);
    const digits = Rational.of(tau.mid << BigInt(Math.max(0, tau.exp)), 1n << BigInt(Math.max(0, -tau.exp)));
    const w = distribution(quantity, digits).ball(PREC);
    const scale = R.div(R.mul(pi(PREC), factorBall(quantity.norm.factor, PREC), PREC), betaNought(4, PREC), PREC);
    expect(distance(chainSum(quantity, point).im.ball(PREC), R.mul(scale, w, PREC))).toBeLessThan(1e-38);
  });

  test('Im of the potential is sin(e^(5/6) Λr)/β0', () => {
    const point = at(3, '0.25');
    const x = exp(R.mul2exp(R.neg(logLength(point, 200)), -1), 200);
    const reference = R.div(sinCos(x, 200).sin, betaNought(3, 200), 200);
    expect(R.overlaps(chainSum(named('static-potential'), point).im.ball(PREC), reference)).toBe(true);
  });

  test.each(QUANTITIES.map(({ name }) => name))(
    '%s: two precisions agree, and the smaller error is the later',
    (name) => {
      const { pv, im } = chainSum(named(name), at(4, '0.2'));
      for (const x of [im, pv]) {
        const [coarse, fine] = [x.ball(60), x.ball(140)];
        expect(R.overlaps(coarse, fine)).toBe(true);
        expect(R.accuracyBits(fine)).toBeGreaterThanOrEqual(140);
      }
    },
  );

  test.each(QUANTITIES.map(({ name }) => name))('%s: the shares of the poles add up to Im', (name) => {
    const quantity = named(name);
    const point = at(4, '0.2');
    const sum = borelPoles(quantity, 24)
      .filter(({ u }) => u.sign() > 0)
      .reduce((s, pole) => s + R.toNumber(imaginaryShare(quantity, point, pole, 80)), 0);
    expect(Math.abs(sum / toNumberExact(chainSum(quantity, point).im) - 1)).toBeLessThan(1e-11);
  });

  test('the sum does not depend on μ: a(μ) runs by one loop', () => {
    for (const name of ['adler', 'tau-width', 'static-potential', 'b-to-u-pole']) {
      const quantity = named(name);
      const here = at(3, '0.2');
      const ratio = q('7/4');
      const alpha = exactReal((prec) => {
        const a = R.mul(betaNought(3, prec), here.alpha.ball(prec), prec);
        const shift = R.mul(a, R.mul2exp(log(R.fromRational(ratio, prec), prec), 1), prec);
        return R.div(here.alpha.ball(prec), R.add(R.ONE, shift, prec), prec);
      });
      const there = { alpha, flavours: 3, ratio: exact(ratio) };
      expect(R.overlaps(chainSum(quantity, here).pv.ball(PREC), chainSum(quantity, there).pv.ball(PREC))).toBe(true);
    }
  });

  test('coefficients at another μ are those of the re-expanded series', () => {
    const quantity = named('adler');
    const ratio = q('2');
    const there = chainCoefficients(quantity, 5, exact(ratio)).map(toNumberExact);
    const here = chainCoefficients(quantity, 5).map(toNumberExact);
    // Σ c_n a^(n+1) with a = A/(1 − A ln 4), A the coupling at 2Q.
    const l = Math.log(4);
    const binomial = (n: number, k: number): number => (k === 0 ? 1 : (binomial(n - 1, k - 1) * n) / k);
    there.forEach((c, n) => {
      let sum = 0;
      for (let k = 0; k <= n; k++) sum += here[k]! * binomial(n, n - k) * l ** (n - k);
      expect(Math.abs(c / sum - 1)).toBeLessThan(1e-12);
    });
  });
});

describe('cancellation at u = 1/2', () => {
  const at12 = (name: string): ReturnType<typeof borelPoles>[number] | undefined =>
    borelPoles(named(name), 1).find(({ u }) => u.equals(q('1/2')));
  test('the width in the MSbar mass has none', () => {
    expect(at12('b-to-u-pole')?.parts.map(String)).toEqual(['5/2']);
    expect(at12('pole-mass')?.parts.map(String)).toEqual(['-1/2']);
    expect(at12('b-to-u-msbar')).toBeUndefined();
  });
  test('2 m_pole + V(r) has none', () => {
    const { norm, ...mass } = { ...named('pole-mass'), pole: at12('pole-mass')! };
    const potential = at12('static-potential')!;
    // 2 m (C_F/π)(−1/2)(…/m) and −(C_F/r)(−1/π)(… r).
    const twice = q('2').mul(norm.factor.rational).mul(mass.pole.parts[0]!);
    expect([norm.factor.pi + mass.pole.pi, potential.pi]).toEqual([-1, -1]);
    expect(twice.add(q('-4/3').mul(potential.parts[0]!)).isZero()).toBe(true);
  });
});

describe('momenta', () => {
  test('w closes the moments: ∫ dτ/τ w τ^(−u) at u = 0 is c_0', () => {
    const f = (y: number): number => toNumberExact(distribution(named('bjorken'), Rational.fromNumber(Math.exp(y))));
    let sum = 0;
    for (let y = -40; y < 40; y += 0.01) sum += 0.01 * f(y + 0.005);
    expect(sum).toBeCloseTo(1, 4);
  });

  test('the mean scale of the potential falls by e^(−1) an order', () => {
    const rows = orderScales(named('static-potential'), at(3, '0.2'), 12);
    const ratio = Math.exp((rows[11]!.meanLogBelow - rows[10]!.meanLogBelow) / 2);
    expect(ratio).toBeCloseTo(Math.exp(-1), 3);
    expect(rows[11]!.share).toBeCloseTo(1, 6);
  });

  // mpmath 1.2.1, 40 digits: quadrature of ∫ dτ w/(τ+z) for the Adler function, which carries 1/π.
  test.each([
    [0.01, '0.3151747674711491307'],
    [0.1, '0.2938893789988925516'],
    [1, '0.2079581395133986579'],
    [10, '0.0862788858611385677'],
  ])('massive gluon in the Adler function at z = %f', (z, text) => {
    const r = (1 + massiveGluon(named('adler')).difference(Math.log(z))) / Math.PI;
    expect(Math.abs(r / Number(text) - 1)).toBeLessThan(1e-13);
  });

  test('massive gluon in the potential: Yukawa; in the pole mass: −(C_F/2)·λ/m at first', () => {
    const yukawa = massiveGluon(named('static-potential'));
    for (const y of [-5, 0, 2]) expect(yukawa.difference(y)).toBeCloseTo(Math.exp(-Math.exp(y / 2)) - 1, 14);
    const mass = massiveGluon(named('pole-mass'));
    // b = −(1/2)/(u − 1/2) gives −(π/2) √z in units of C_F α/π.
    expect(mass.difference(-24) / Math.exp(-12)).toBeCloseTo(-Math.PI / 2, 4);
  });

  test('the b → u width: (5π/2)√z at small masses, nothing emitted at large ones', () => {
    const gluon = massiveGluon(named('b-to-u-pole'));
    expect(gluon.difference(-24) / Math.exp(-12)).toBeCloseTo(2.5 * Math.PI, 3);
    const r0 = 25 / 8 - Math.PI ** 2 / 2;
    expect(Math.abs(r0 + gluon.difference(8))).toBeLessThan(1e-2);
  });

  test('R_cont of the sum rules in closed form', () => {
    // Re r(−τ_L) − r(0) = PV ∫ dτ w (1/(τ−τ_L) − 1/τ) is what PV has more.
    const point = at(3, '0.3');
    const L = R.toNumber(logLength(point, 80));
    const t = Math.exp(-L);
    const beta = R.toNumber(betaNought(3, 60));
    // w = (8τ − 5τ²)/9 below 1, 4/(9τ) − 1/(9τ²) above.
    const below = (8 * t * Math.log((1 - t) / t) - 5 * (t + t * t * Math.log((1 - t) / t)) + 0) / 9;
    const above = ((4 / t) * (-Math.log(1 - t) - t) + (1 / (t * t)) * (Math.log(1 - t) + t + (t * t) / 2)) / 9;
    const rest = (below + above) / (Math.PI * beta);
    const { pv } = chainSum(named('bjorken'), point);
    expect(massiveGluon(named('bjorken')).continued(point)! + rest).toBeCloseTo(toNumberExact(pv), 9);
  });
});

describe('cuts', () => {
  test.each(['adler', 'r-ratio', 'tau-width', 'bjorken', 'pole-mass', 'static-potential'])(
    'Im of %s lies below the cut',
    (name) => {
      const quantity = named(name);
      const parts = cutCoefficients(quantity, exact(1), q('1/2'), 6);
      parts.whole.forEach((c, n) => {
        const [low, window, uv, high] = [parts.low, parts.window, parts.ultraviolet, parts.high].map((l) =>
          toNumberExact(l[n]!),
        ) as [number, number, number, number];
        expect(low + window + uv).toBeCloseTo(toNumberExact(c), 8);
        expect(window + uv).toBeCloseTo(high, 8);
      });
    },
  );

  test('the sum of both parts does not depend on the cut, but each does', () => {
    const quantity = named('tau-width');
    const point = at(3, '0.3');
    const cuts = ['0.4', '0.6', '0.9'].map((c) => cutSum(quantity, point, q(c)));
    for (const { high, low, whole } of cuts) {
      expect(R.overlaps(R.add(high.ball(PREC), low.ball(PREC), PREC), whole.ball(PREC))).toBe(true);
    }
    expect(toNumberExact(cuts[0]!.high)).not.toBeCloseTo(toNumberExact(cuts[2]!.high), 3);
  });

  test('without the low momenta the coefficients of the potential grow no faster than a power', () => {
    const { high } = cutCoefficients(named('static-potential'), exact(1), q('1/2'), 24);
    const bound = 5 / 3 + Math.log(4);
    high.forEach((c, n) => expect(Math.abs(toNumberExact(c))).toBeLessThan(2 * bound ** n));
  });

  test('the powers of the low part sum up to it', () => {
    const point = at(3, '0.25');
    const quantity = named('adler');
    const whole = toNumberExact(cutSum(quantity, point, q('0.4')).low);
    let sum = 0;
    for (let p = 2; p < 14; p++) sum += toNumberExact(lowPart(quantity, point, q('0.4'), q(String(p))));
    expect(Math.abs(sum / whole - 1)).toBeLessThan(1e-9);
  });
});

describe('refusals', () => {
  test('couplings', () => {
    expect(rangeObjection(named('adler'), at(3, '0.9'))?.reason).toMatch(/Landau pole .* 1\.06 Q/);
    expect(rangeObjection(named('adler'), at(3, '-0.1'))?.reason).toMatch(/not positive/);
    expect(rangeObjection(named('adler'), at(3, '0.8'))).toBeUndefined();
    expect(rangeObjection(named('adler'), at(3, '0.8', '2'))).toBeDefined();
  });
  test('cuts', () => {
    const point = at(3, '0.3');
    expect(cutObjection(named('adler'), point, q('1.1'))?.reason).toMatch(/above the hard scale/);
    expect(cutObjection(named('adler'), point, q('0.2'))?.reason).toMatch(/below the Landau pole/);
    expect(cutObjection(named('b-to-u-msbar'), point, q('0.5'))?.reason).toMatch(/Euclidean/);
    expect(cutObjection(named('adler'), point, q('0.5'))).toBeUndefined();
  });
  test('names', () => {
    expect(quantityNamed('adlr')).toBeUndefined();
    expect(quantityNamed('GLS')?.name).toBe('gross-llewellyn-smith');
  });
});
