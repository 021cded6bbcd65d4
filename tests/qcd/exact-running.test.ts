import { describe, expect, it } from 'vitest';
import { C, R, Rational, exact, toNumberExact, type Ball, type Exact } from '../../src/numerics/index.js';
import {
  complexAlpha,
  evolveAlpha,
  evolveComplex,
  evolveMass,
  exactAlpha,
  exactLambda,
  exactMassRatio,
  exactPath,
  evolvePath,
  flowOf,
  isRefusal,
  lambdaOf,
  type Refusal,
} from '../../src/qcd/index.js';

const q = (text: string): Exact => exact(Rational.parse(text) ?? Rational.ZERO);
function granted<T>(x: T | Refusal): T {
  if (isRefusal(x)) throw new Error(x.reason);
  return x;
}
/** The ball holds the decimal, half a unit of its last digit aside, and is sharp. */
function holds(x: Ball, decimal: string, bits: number): void {
  const places = decimal.length - decimal.indexOf('.') - 1;
  const value = Rational.parse(decimal) ?? Rational.ZERO;
  const near = R.widen(R.fromRational(value, bits + 200), R.fromRational(Rational.of(1n, 10n ** BigInt(places)), 64));
  expect(R.overlaps(x, near)).toBe(true);
  expect(R.accuracyBits(x)).toBeGreaterThan(bits);
}

describe('certified running', () => {
  // Check values computed with mpmath 1.3.0 at 70 digits: quadrature of 1/β and root finding.
  it('α_s to 50 digits', () => {
    const five = { alpha: q('0.118'), from: q('91.1876'), to: q('10'), flavours: 5, loops: 5 };
    holds(granted(exactAlpha(five)).ball(180), '0.1782339999303968412331258840779158868169981234579303747', 170);
    const three = { alpha: q('0.32'), from: q('1'), to: q('2'), flavours: 3, loops: 4 };
    holds(granted(exactAlpha(three)).ball(120), '0.231655208283124093177952344723385736', 118);
    const down = { ...three, to: q('1/2') };
    holds(granted(exactAlpha(down)).ball(120), '0.565924729008037406691105794263662458', 118);
  });

  it('Λ to 36 digits', () => {
    const lambda = granted(exactLambda(q('0.225'), q('4.18'), 4, 4));
    holds(lambda.ball(120), '0.291177917272968345086225090059965911', 118);
  });

  it('doubles agree with the enclosures for every n_f and order', () => {
    for (let flavours = 0; flavours <= 16; flavours++) {
      for (let loops = 1; loops <= 5; loops++) {
        const question = { alpha: q('0.03'), from: q('10'), to: q('3'), flavours, loops };
        const numbers = { alpha: 0.03, from: 10, to: 3, flavours, loops };
        const value = granted(exactAlpha(question)).ball(70);
        expect(R.accuracyBits(value)).toBeGreaterThan(69);
        expect(Math.abs(granted(evolveAlpha(numbers)) / R.toNumber(value) - 1)).toBeLessThan(2e-15);
        const mass = granted(exactMassRatio(question)).ball(70);
        expect(R.accuracyBits(mass)).toBeGreaterThan(69);
        expect(Math.abs(granted(evolveMass({ ...numbers, mass: 1 })).mass / R.toNumber(mass) - 1)).toBeLessThan(3e-14);
        const lambda = granted(exactLambda(q('0.03'), q('10'), flavours, loops)).ball(70);
        const double = granted(lambdaOf(0.03, 10, { flavours, loops }));
        // Λ of an almost conformal theory leaves the range of doubles.
        if (double > 1e-290) expect(Math.abs(double / R.toNumber(lambda) - 1)).toBeLessThan(3e-13);
      }
    }
  });

  it('an uncertain coupling gives a wide enclosure, a hopeless one none', () => {
    const wide: Exact = { ball: (prec) => R.widen(R.fromRational(Rational.of(32, 100), prec), R.fromNumber(2 ** -20)) };
    const value = granted(exactAlpha({ alpha: wide, from: q('1'), to: q('2'), flavours: 3, loops: 4 })).ball(100);
    expect(R.accuracyBits(value)).toBeGreaterThan(15);
    expect(R.accuracyBits(value)).toBeLessThan(25);
    const exactOne = granted(exactAlpha({ alpha: q('0.32'), from: q('1'), to: q('2'), flavours: 3, loops: 4 })).ball(
      60,
    );
    expect(R.overlaps(value, exactOne)).toBe(true);
  });

  it('refuses as the doubles do', () => {
    const base = { alpha: q('0.32'), from: q('1'), to: q('2'), flavours: 3, loops: 4 };
    expect(isRefusal(exactAlpha({ ...base, to: q('0.2') }))).toBe(true);
    expect(isRefusal(exactAlpha({ ...base, flavours: 17 }))).toBe(true);
    expect(isRefusal(exactMassRatio({ ...base, to: q('-1') }))).toBe(true);
    expect(isRefusal(exactLambda(q('-1'), q('1'), 3, 4))).toBe(true);
  });
});

describe('certified coupling at complex scales', () => {
  // Check values computed with mpmath 1.3.0 at 70 digits: complex quadrature of 1/β and root finding.
  it.each([
    ['0', '3', '0.190981193106665107948446104933789166943', '-0.155274534288860048366918722059677988256'],
    ['-1', '2', '0.2633875914521440447916535387884476499449', '-0.2202624970788384282338300684399462515269'],
  ])('ln μ²/μ_0² = %s + %s i', (re, im, valueRe, valueIm) => {
    const question = { alpha: q('0.34'), log: { re: q(re), im: q(im) }, flavours: 3, loops: 4 };
    const value = granted(complexAlpha(question, 110));
    holds(value.re, valueRe, 105);
    holds(value.im, valueIm, 105);
    const double = granted(evolveComplex(flowOf(3, 4), 0.34, { re: Number(re), im: Number(im) }));
    expect(Math.hypot(double.re - Number(valueRe), double.im - Number(valueIm))).toBeLessThan(1e-15);
  });

  it('agrees with the real enclosure and refuses the singularity', () => {
    const question = { alpha: q('0.34'), log: { re: q('2'), im: q('0') }, flavours: 3, loops: 2 };
    const value = granted(complexAlpha(question, 80));
    const direct = C.toNumbers(value).re;
    expect(Math.abs(granted(evolveComplex(flowOf(3, 2), 0.34, { re: 2, im: 0 })).re - direct)).toBeLessThan(1e-15);
    expect(R.containsZero(value.im)).toBe(true);
    expect(isRefusal(complexAlpha({ ...question, log: { re: q('-5'), im: q('0') } }, 80))).toBe(true);
    expect(isRefusal(complexAlpha({ ...question, flavours: -1 }, 80))).toBe(true);
    expect(isRefusal(complexAlpha({ ...question, alpha: q('0') }, 80))).toBe(true);
  });
});

describe('certified paths over thresholds', () => {
  const thresholds = [
    { name: 'c', flavours: 4, mass: 1.2729 },
    { name: 'b', flavours: 5, mass: 4.186 },
    { name: 't', flavours: 6, mass: 162.5 },
  ];
  // Check values computed with mpmath 1.3.0 (15 digits): α_s(M_Z) = 0.1180, thresholds at m(m).
  it.each([
    [4, '1.77693', 3, 0.313798695216788],
    [5, '1.77693', 3, 0.313894712825042],
    [5, '1000', 6, 0.08851277191694],
  ])('%i loops to %s GeV', (loops, scale, flavours, value) => {
    const from = { scale: q('91.1879'), flavours: 5 };
    const to = { scale: q(scale), flavours };
    const end = granted(exactPath({ alpha: q('0.1180'), mass: q('0.1'), from, to, options: { loops, thresholds } }));
    const ball = end.alpha.ball(56);
    expect(R.accuracyBits(ball)).toBeGreaterThan(50);
    expect(Math.abs(R.toNumber(ball) / value - 1)).toBeLessThan(3e-14);
    const doubles = granted(
      evolvePath({
        alpha: 0.118,
        mass: 0.1,
        from: { scale: 91.1879, flavours: 5 },
        to: { scale: Number(scale), flavours },
        options: { loops, thresholds },
      }),
    );
    expect(Math.abs(R.toNumber(ball) / doubles.alpha - 1)).toBeLessThan(1e-14);
    expect(Math.abs(toNumberExact(end.mass ?? q('0')) / (doubles.mass ?? NaN) - 1)).toBeLessThan(1e-14);
    // And back: the enclosure holds the start.
    const back = granted(exactPath({ alpha: end.alpha, from: to, to: from, options: { loops, thresholds } }));
    expect(R.containsRational(back.alpha.ball(56), Rational.of(118, 1000))).toBe(true);
  });

  it('has as many digits as the constants: all of them at three-loop matching', () => {
    const question = {
      alpha: q('0.1180'),
      from: { scale: q('91.1879'), flavours: 5 },
      to: { scale: q('2'), flavours: 4 },
    };
    const all = granted(exactPath({ ...question, options: { loops: 4, thresholds } })).alpha.ball(170);
    expect(R.accuracyBits(all)).toBeGreaterThan(165);
    // One master integral of the four-loop constant is known to 17 digits.
    const some = granted(exactPath({ ...question, options: { loops: 5, thresholds } })).alpha.ball(170);
    expect(R.accuracyBits(some)).toBeGreaterThan(55);
    expect(R.accuracyBits(some)).toBeLessThan(90);
    expect(isRefusal(exactPath({ ...question, to: { scale: q('2'), flavours: 1 } }))).toBe(true);
  });
});
