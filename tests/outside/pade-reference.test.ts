import { describe, expect, test } from 'vitest';
import {
  C,
  certifiedRoots,
  exact,
  padeExact,
  PadeDouble,
  padePoles,
  R,
  Rational,
  type Pole,
} from '../../src/numerics/index.js';

const q = (text: string): Rational => {
  const value = Rational.parse(text);
  if (value === undefined) throw new Error(`unreadable number ${text}`);
  return value;
};

/** 1/(1 − t/2) + 0.6/(1 + t/3), with the noise given in units of 1e-9. */
const twoPoles = (noise: readonly number[]): Rational[] =>
  noise.map((e, n) =>
    q('1/2')
      .pow(n)
      .add(q('3/5').mul(q('-1/3').pow(n)))
      .add(q(`${e}e-9`)),
  );

describe('Froissart doublets of a noisy sum of two poles', () => {
  // Check values computed with mpmath 1.2.1 from exact rationals (34 digits); noise of 1e-6 from a fixed list.
  const noisy = twoPoles([-337, 941, -692, -192, 333, -902, -852, 681, 97]);
  const reference = [
    [
      '-0.0466131429044276378749203917349406341',
      '0.905313071562259742806085038821098918',
      '2.41795845259104764775972386167e-7',
      '-1.22709470398700313317680556560e-7',
    ],
    ['2.00000501065794758326374586175447311', '0', '1.00000386662988094352933935405867049', '0'],
    ['-2.99998493614120010039179635798023098', '0', '0.599995312778428538261131093996557171', '0'],
  ] as const;
  const near = (ball: R.Ball, text: string): boolean =>
    R.containsRational(R.widen(ball, R.fromRational(q('1e-30'), 64)), q(text));

  test('poles and amplitudes of [3/4]', () => {
    const result = padePoles(noisy.map(exact), 3, 4, 150);
    if (!result.exists) throw new Error(result.reason);
    const upper = result.poles.filter((pole) => pole.real || R.isPositive(pole.position.im));
    expect(upper.length).toBe(3);
    upper.forEach((pole: Pole, i) => {
      const [re, im, amplitudeRe, amplitudeIm] = reference[i]!;
      expect(near(pole.position.re, re) && near(pole.position.im, im)).toBe(true);
      expect(near(pole.amplitude.re, amplitudeRe) && near(pole.amplitude.im, amplitudeIm)).toBe(true);
    });
  });

  test('a zero of the numerator sits at a relative distance of 2e-7', () => {
    const entry = padeExact(noisy, 3, 4);
    if (!entry.exists) throw new Error(entry.reason);
    const zeros = certifiedRoots(entry.numerator, 150);
    if ('failed' in zeros) throw new Error(zeros.failed);
    const distances = zeros.roots.map((zero) => {
      const d = C.sub(
        zero.value,
        { re: R.fromRational(q(reference[0][0]), 150), im: R.fromRational(q(reference[0][1]), 150) },
        150,
      );
      return R.toNumber(C.abs(d, 100)) / Math.hypot(Number(reference[0][0]), Number(reference[0][1]));
    });
    expect(Math.min(...distances)).toBeCloseTo(1.954105106193419e-7, 18);
  });

  test('plain doubles see the same to the noise they add', () => {
    const work = new PadeDouble(3, 4);
    expect(work.fit(noisy.map((c) => c.toNumber()))).toBe(true);
    expect(work.findPoles()).toBe(true);
    const real = [0, 1, 2, 3].filter((i) => work.poleIm[i] === 0);
    expect(real.length).toBe(2);
    for (const i of real) {
      const [re, , amplitude] = work.poleRe[i]! > 0 ? reference[1] : reference[2];
      expect(work.poleRe[i]).toBeCloseTo(Number(re), 7);
      expect(work.amplitudeRe[i]).toBeCloseTo(Number(amplitude), 7);
    }
  });

  test('exact coefficients: Euclid returns the reduced form, deficiency 2', () => {
    const entry = padeExact(twoPoles(Array.from({ length: 9 }, () => 0)), 3, 4);
    if (!entry.exists) throw new Error(entry.reason);
    expect([entry.numerator.length - 1, entry.denominator.length - 1, entry.deficiency]).toEqual([1, 2, 2]);
  });
});

test('D-log Padé [0/1] of (1 − 2u)^(−1.3951): pole 1/2, exponent 1.3951, exactly', () => {
  // d ln B/du = 2·1.3951/(1 − 2u); definition as in G. A. Baker, Phys. Rev. 124 (1961) 768.
  const gamma = q('1.3951');
  const b = [Rational.ONE];
  for (let n = 1; n < 6; n++) b.push(b[n - 1]!.mul(gamma.add(Rational.of(n - 1))).mul(Rational.of(2, n)));
  const d: Rational[] = [];
  for (let k = 0; k < 4; k++) {
    let v = b[k + 1]!.mul(Rational.of(k + 1));
    for (let j = 0; j < k; j++) v = v.sub(d[j]!.mul(b[k - j]!));
    d.push(v.div(b[0]!));
  }
  const result = padePoles(d.map(exact), 0, 1, 100);
  if (!result.exists) throw new Error(result.reason);
  expect(R.containsRational(result.poles[0]!.position.re, q('1/2'))).toBe(true);
  expect(R.containsRational(R.neg(result.poles[0]!.principal[0]!.re), gamma)).toBe(true);
  expect(padeExact(d, 1, 1)).toMatchObject({ exists: true, deficiency: 0 });
});
