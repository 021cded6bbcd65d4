import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { exp, gamma, log, R, Rational, toDecimal } from '../../../src/numerics/index.js';
import { expFixed, FIXED_ULPS } from '../../../src/numerics/ball/fixed-tables.js';
import { expReduced, expSeries, EXP_ULPS } from '../../../src/numerics/ball/exp-series.js';
import { ODD_ULPS, oddSeries } from '../../../src/numerics/ball/odd-series.js';
import { acothFixed } from '../../../src/numerics/ball/constants.js';
import { primeLogs } from '../../../src/numerics/ball/prime-logs.js';
import { PRIMES, RELATIONS } from '../../../src/numerics/ball/relations.js';
import { expSmooth, SMOOTH_ULPS } from '../../../src/numerics/ball/smooth-exp.js';
import {
  REACH,
  rowsFor,
  SMOOTH_FROM,
  smoothExponents,
  smoothFraction,
  smoothLog,
  WORD,
} from '../../../src/numerics/ball/smooth.js';
import { cases, mustOverlap } from './generate.js';

/** A decimal as a rational. */
function decimal(text: string): Rational {
  const x = Rational.parse(text);
  if (x === undefined) throw new Error(text);
  return x;
}
/** |a − b| in units of the last place. */
const apart = (a: bigint, b: bigint): number => Number(a > b ? a - b : b - a);
const fraction = (wp: number): fc.Arbitrary<bigint> => fc.bigInt({ min: 0n, max: (1n << BigInt(wp)) - 1n });

describe('reduction by primes', () => {
  it('has rows in the ranges that its table promises', () => {
    const logs = primeLogs(200);
    RELATIONS.forEach((row, i) => {
      expect(row).toHaveLength(PRIMES.length);
      const epsilon = Math.log2(Number(row.reduce((s, d, j) => s + BigInt(d) * logs[j]!, 0n)) * 2 ** -200);
      if (i > 0) expect(epsilon).toBeLessThan(-2 * i);
      expect(epsilon).toBeGreaterThan(-2 * i - 2.5);
    });
  });

  it('keeps the sum of the exponents within what smoothLog allows for', () => {
    // row i is taken ε_(i−1)/(2 ε_i) + 1/2 times at most, row 0 up to 64/ln 2 + 1/2 times
    const logs = primeLogs(200);
    const sizes = RELATIONS.map((row) => Number(row.reduce((s, d, j) => s + BigInt(d) * logs[j]!, 0n)));
    const times = sizes.map((e, i) =>
      Math.floor(i === 0 ? 2 ** REACH / Math.LN2 + 0.5 : sizes[i - 1]! / (2 * e) + 0.5),
    );
    const total = RELATIONS.reduce((s, row, i) => s + times[i]! * row.reduce((t, d) => t + Math.abs(d), 0), 0);
    expect(total).toBeLessThan(2 ** 13);
  });

  it('gives logarithms of primes that other identities give too', () => {
    for (const wp of [64, 400, 1500, 64]) {
      const [l2, l3, l5, l7] = primeLogs(wp) as [bigint, bigint, bigint, bigint];
      // log 41 = log 40 + 2 artanh(1/81), log 37 = log 36 + 2 artanh(1/73), log 11 = log 10 + 2 artanh(1/21)
      const wide = wp + 20;
      const more = (x: number): bigint => acothFixed(x, wide) >> 19n;
      expect(apart(primeLogs(wp)[12]!, 3n * l2 + l5 + more(81))).toBeLessThan(16);
      expect(apart(primeLogs(wp)[11]!, 2n * l2 + 2n * l3 + more(73))).toBeLessThan(16);
      expect(apart(primeLogs(wp)[4]!, l2 + l5 + more(21))).toBeLessThan(16);
      // log(4375/4374) = 2 artanh(1/8749)
      expect(apart(4n * l5 + l7 - l2 - 7n * l3, more(8749))).toBeLessThan(32);
    }
  });

  it('leaves a small rest, and its fraction is the exponential of its logarithm', () => {
    fc.assert(
      fc.property(fc.double({ min: -63.9, max: 63.9, noNaN: true }), fc.integer({ min: 1, max: 32 }), (t, rows) => {
        const high = Math.floor(t * 2 ** WORD);
        const e = smoothExponents(high, 0, rows);
        const rest = high * 2 ** -WORD - Number(smoothLog(e, 100)) * 2 ** -100;
        expect(Math.abs(rest)).toBeLessThan(2 ** (1.01 - 2 * Math.min(rows, 23)));
        const { num, den } = smoothFraction(e);
        const size = Math.log(Number(num)) - Math.log(Number(den)) + e[0]! * Math.LN2;
        if (Number.isFinite(size)) expect(Math.abs(size - t)).toBeLessThan(1 + 1e-9);
      }),
      cases(300),
    );
  });

  it('agrees with the tables of exp on both sides of the switch', () => {
    fc.assert(
      fc.property(fc.constantFrom(832, 896, 960, 1024, 2048), fraction(832), (wp, t) => {
        const x = t << BigInt(wp - 832);
        const { y, n } = expSmooth(x, wp);
        const value = n >= 0 ? y << BigInt(n) : y >> BigInt(-n);
        expect(apart(value, expFixed(x, wp))).toBeLessThan(FIXED_ULPS + 4 * SMOOTH_ULPS);
      }),
      cases(60),
    );
  });

  it('sums both series within their bounds', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(64, 192, 640, 1100, 2500, 4000),
        fc.integer({ min: 10, max: 80 }),
        fraction(4300),
        fc.boolean(),
        (wp, h, bits, minus) => {
          const size = bits >> BigInt(4300 - Math.max(1, wp - h));
          const r = minus ? -size : size;
          const more = 64;
          const wide = expSeries(r << BigInt(more), wp + more, h) >> BigInt(more);
          expect(apart(expSeries(r, wp, h), wide)).toBeLessThan(EXP_ULPS);
          for (const s of [1, -1] as const) {
            const odd = oddSeries(r << BigInt(more), wp + more, s) >> BigInt(more);
            expect(apart(oddSeries(r, wp, s), odd)).toBeLessThan(ODD_ULPS);
          }
        },
      ),
      cases(200),
    );
  });

  it('squares back what it has halved', () => {
    fc.assert(
      fc.property(fraction(300), fc.integer({ min: 0, max: 9 }), (t, h) => {
        const r = t >> BigInt(h);
        expect(apart(expReduced(r, 300, h), expFixed(r << 20n, 320) >> 20n)).toBeLessThan(4);
      }),
      cases(100),
    );
  });
});

describe('exp and log across the change of method', () => {
  const points = [
    '1/3',
    '-17/5',
    '63.99',
    '64.01',
    '-64.5',
    '1e-9',
    '-1e-31',
    '12345.678',
    '0.6931471805599453',
    '1e-300',
  ];

  it('neighbouring precisions overlap, sharply', () => {
    for (const text of points) {
      for (let prec = SMOOTH_FROM - 70; prec <= SMOOTH_FROM + 70; prec += 10) {
        const x = R.exactMid(R.fromRational(decimal(text), prec));
        const e = exp(x, prec);
        mustOverlap(e, exp(x, 1400), { x, prec });
        expect(R.accuracyBits(e)).toBeGreaterThanOrEqual(prec);
        const positive = R.abs(x);
        const l = log(positive, prec);
        mustOverlap(l, log(positive, 1400), { x, prec });
        expect(R.accuracyBits(l)).toBeGreaterThanOrEqual(prec);
        const near = R.add(R.ONE, R.mul2exp(x, -40), 4000);
        mustOverlap(log(near, prec), log(near, 1400), { near, prec });
      }
    }
  });

  it('undo each other at long precisions', () => {
    for (const prec of [900, 1100, 2000, 3400, 6000, 14_000]) {
      for (const text of ['2.5', '-40.25', '0.001', '5000.125']) {
        const x = R.fromRational(decimal(text), prec + 40);
        const back = log(exp(x, prec + 40), prec);
        mustOverlap(back, x, { text, prec });
        expect(R.accuracyBits(back)).toBeGreaterThan(prec - 4);
      }
    }
  });

  it('reach the last of a thousand digits', () => {
    // ends of 1,000 digits, the same by mpmath 1.2.1 and PARI/GP 2.15.2
    const prec = 3420;
    const root2 = R.sqrt(R.fromNumber(2), prec);
    const last = (x: ReturnType<typeof exp>): string => toDecimal(x, 1000).text.replace(/e.*/u, '').slice(-40);
    expect(last(exp(root2, prec))).toBe('0190432342591779411873627471575851889439');
    const seventh = R.fromRational(Rational.of(-1000n, 7n), prec + 20);
    expect(last(exp(seventh, prec))).toBe('6586684664940594312917957766341498213605');
    expect(last(log(R.fromRational(Rational.of(22n, 7n), prec + 20), prec))).toBe(
      '9366758938259110980078902046484722412174',
    );
    expect(last(log(R.fromNumber(41), prec))).toBe('3928438954942650276071386972562718028792');
    expect(last(gamma(R.mul(root2, R.fromNumber(3), prec), prec))).toBe('0670638885244357678692713604031731730602');
  });

  it('has as many rows as pay, and never more than there are', () => {
    expect(rowsFor(SMOOTH_FROM)).toBeGreaterThanOrEqual(15);
    expect(rowsFor(1e6)).toBe(RELATIONS.length);
  });
});
