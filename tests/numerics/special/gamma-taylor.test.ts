import { describe, expect, it } from 'vitest';
import { gamma, R, Rational, rgamma, toDecimal, zeta } from '../../../src/numerics/index.js';
import type { Ball } from '../../../src/numerics/index.js';
import { reciprocalGamma } from '../../../src/numerics/special/gamma-taylor.js';
import { reciprocalGammaSeries, seriesLength } from '../../../src/numerics/special/reciprocal-gamma-series.js';
import { risingProduct } from '../../../src/numerics/special/stirling.js';
import { zetaList } from '../../../src/numerics/special/zeta-list.js';
import { mustOverlap } from '../ball/generate.js';

/** A decimal as a rational. */
function decimal(text: string): Rational {
  const x = Rational.parse(text);
  if (x === undefined) throw new Error(text);
  return x;
}
const apart = (a: bigint, b: bigint): number => Number(a > b ? a - b : b - a);

/** x·2^wp, rounded down. */
const fixed = (x: Rational, wp: number): bigint => (x.num << BigInt(wp)) / x.den;

describe('coefficients', () => {
  it('all the ζ(j) at once are those of single sums', () => {
    for (const bits of [60, 300, 1300]) {
      const n = Math.ceil(bits / 3);
      const list = zetaList(n, bits);
      for (let j = 2; j <= n; j += j < 20 ? 1 : 17) {
        const unit = R.ball(list[j]!, j - bits, 2);
        mustOverlap(unit, zeta(j, bits + 20), { j, bits });
        expect(R.overlaps(R.ball(list[j]! + 5n, j - bits, 2), zeta(j, bits + 20))).toBe(false);
      }
    }
  });

  it('1/Γ(1+u) has the Taylor coefficients that mpmath and PARI/GP have', () => {
    // mpmath 1.2.1 (taylor) and PARI/GP 2.15.2 (power series) agree on them
    const known: Record<number, string> = {
      2: '-0.6558780715202538810770195151453904812797663804785843472923624456838708384',
      20: '-3.6968056186422057081878158780857662365709634513609951364845465544299974339e-12',
      80: '-4.2827980483017479212715540015789517758572600880308276037155741759402742573e-80',
    };
    const d = reciprocalGammaSeries(600);
    for (const [k, text] of Object.entries(known)) {
      const value = R.ball(d[Number(k)]!, Number(k) - 600, 2 ** 11);
      expect(R.overlaps(value, R.addRelativeError(R.fromRational(decimal(text), 400), 1e-70))).toBe(true);
    }
  });

  it('a lower precision is cut from the higher one, and what is left out is small', () => {
    const high = reciprocalGammaSeries(700);
    const low = reciprocalGammaSeries(400);
    expect(low.length).toBeLessThan(high.length);
    low.forEach((d, k) => expect(apart(d, high[k]! >> 300n)).toBeLessThan(2 ** 11));
    expect(high[low.length]! >> 300n === 0n || high[low.length]! >> 300n === -1n).toBe(true);
    expect(seriesLength(700)).toBeGreaterThan(seriesLength(400));
  });

  it('rising products in rows are those factor by factor, exactly where x is an integer', () => {
    for (const n of [1, 3, 4, 5, 17, 60, 100, 730, 801]) {
      for (const x of [0n, 1n, 7n, 900n]) {
        const { mid, exp } = risingProduct(x << 300n, 300, n);
        let product = 1n;
        for (let k = 1n; k <= BigInt(n); k++) product *= x + k;
        const value = R.ball(mid, exp);
        expect(R.overlaps(R.addRelativeError(value, (n + 1) * 32 * 2 ** -300), R.ball(product, 0))).toBe(true);
      }
    }
  });
});

describe('Γ by Taylor polynomials', () => {
  /** Arguments that meet many centres, and their edges. */
  const points = (prec: number): Ball[] =>
    ['0.3', '1.5', '2.4999999', '2.5000001', '3.03125', '4.242640687119285', '5.96875', '9.015624', '12.7'].map(
      (text) => R.exactMid(R.fromRational(decimal(text), prec)),
    );

  it('is what Stirling’s series gives, at precisions on both sides of every change', { timeout: 60_000 }, () => {
    for (const prec of [40, 1000, 1075, 1460, 1530]) {
      const xs = points(prec);
      // two hundred values at one working precision, eight at one centre
      const before = xs.map((x) => gamma(x, prec));
      for (let k = 0; k < 25; k++) for (const x of xs) gamma(x, prec);
      xs.forEach((x, i) => {
        const y = gamma(x, prec);
        mustOverlap(y, before[i]!, { x, prec });
        mustOverlap(y, gamma(x, prec + 64 * 3), { x, prec });
        expect(R.accuracyBits(y)).toBeGreaterThanOrEqual(prec);
        mustOverlap(R.mul(y, rgamma(x, prec), prec), R.ONE, { x, prec });
      });
    }
  });

  it('stays within the error it states, at every centre', () => {
    for (const wp of [128, 1024, 1600]) {
      const count = wp < 1500 ? 16 : 256;
      for (let i = 0; i < count; i += wp < 1500 ? 1 : 51) {
        for (const share of [0.001, 0.5, 0.999]) {
          const u = fixed(Rational.fromNumber((i + share) / count - 0.5), wp);
          let found: ReturnType<typeof reciprocalGamma>;
          for (let k = 0; k < 300 && found === undefined; k++) found = reciprocalGamma(u, wp);
          const value = R.ball(found!.value, -wp, found!.ulps);
          mustOverlap(value, rgamma(R.add(R.ONE, R.ball(u, -wp), 1e9), 2 * wp), { u, wp });
          expect(found!.ulps).toBeLessThan(2 ** 11);
        }
      }
    }
  });

  it('reaches the last of a thousand digits', { timeout: 60_000 }, () => {
    // mpmath 1.2.1 and PARI/GP 2.15.2
    const prec = 3325;
    const x = R.exactMid(R.sqrt(R.fromNumber(18), prec + 60));
    let y = gamma(x, prec);
    for (let k = 0; k < 210; k++) y = gamma(x, prec);
    expect(toDecimal(y, 1000).text.slice(-40)).toBe('0670638885244357678692713604031731730602');
  });
});
