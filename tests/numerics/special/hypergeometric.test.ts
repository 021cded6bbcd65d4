/**
 * Incomplete Γ, confluent and Gauss functions, ζ on the line, ψ in the plane: functional identities, values on balls against values at points, and
 * cases made to be hard: next to poles, zeros, the cut, integer parameters.
 */
import { describe, expect, it } from 'vitest';
import {
  branchSame,
  C,
  cexp,
  clog,
  cpow,
  digammaComplex,
  gammaComplex,
  expintE1,
  gauss,
  kummerM,
  kummerU,
  ln2,
  log,
  pi,
  polylogHalf,
  R,
  Rational,
  scaledE1,
  sinCosPi,
  tanh,
  gamma,
  upperGamma,
  upperGammaComplex,
  zeta,
  zetaReal,
  exp,
} from '../../../src/numerics/index.js';
import type { Ball, Complex } from '../../../src/numerics/index.js';

const P = 160;
const W = P + 60;
const q = (text: string): Rational => Rational.parse(text)!;
const b = (text: string): Ball => R.fromRational(q(text), W);
const z = (re: string, im: string): Complex => ({ re: b(re), im: b(im) });
const c = (text: string): Complex => C.fromReal(b(text));
const add = (...all: Complex[]): Complex => all.reduce((x, y) => C.add(x, y, W));
const mul = (...all: Complex[]): Complex => all.reduce((x, y) => C.mul(x, y, W));

/** Both sides meet, and the left one is sharp. */
function same(left: Complex, right: Complex, what: unknown, bits = P - 20): void {
  expect(C.overlaps(left, right), JSON.stringify(what)).toBe(true);
  expect(C.accuracyBits(left), JSON.stringify(what)).toBeGreaterThan(bits);
}

const ORDERS = ['1/3', '-2/3', '0', '-1', '-4', '3', '-2.000000000000000000000001', '-0.99999999', '17.5'];
const PLACES = [z('2', '1'), z('-3', '0.5'), z('0.01', '-0.02'), z('12', '-9'), z('-0.3', '1e-9'), z('60', '40')];

describe('upper incomplete Γ', () => {
  it('Γ(s+1, z) = s Γ(s, z) + z^s e^−z, real s', () => {
    for (const s of ORDERS) {
      for (const w of PLACES) {
        const power = C.mul(cpow(w, c(s), W), cexp(C.neg(w), W), W);
        same(upperGammaComplex(q(s).add(Rational.ONE), w, P), add(mul(c(s), upperGammaComplex(q(s), w, P)), power), [
          s,
          C.toNumbers(w),
        ]);
      }
    }
  });

  it('the same for complex s, next to the poles of Γ(s) too', () => {
    for (const s of [
      z('0.3', '2'),
      z('-3', '1e-20'),
      z('-2.01', '0.1'),
      z('-1', '-0.24'),
      z('6', '1'),
      z('-3.75', '-4'),
    ]) {
      for (const w of PLACES) {
        const e = C.exactMid(s);
        const power = C.mul(cpow(w, e, W), cexp(C.neg(w), W), W);
        const next: Complex = { re: R.add(e.re, R.ONE, 1e9), im: e.im };
        same(upperGammaComplex(next, w, P), add(mul(e, upperGammaComplex(e, w, P)), power), [
          C.toNumbers(s),
          C.toNumbers(w),
        ]);
      }
    }
  });

  it('a ball of orders holds the values at its points, also across a pole of Γ(s)', () => {
    for (const x of ['0.05', '2', '30']) {
      for (const centre of ['-2', '0', '0.5', '-7.3']) {
        const wide = upperGamma(R.addError(b(centre), 1, -40), b(x), P);
        const plane = upperGammaComplex({ re: R.addError(b(centre), 1, -40), im: R.ball(1n, -50, 2 ** 12) }, c(x), P);
        for (const shift of ['-9e-13', '0', '1e-30', '9e-13']) {
          const s = q(centre).add(q(shift));
          expect(R.overlaps(wide, upperGamma(s, b(x), P)), `${x} ${centre} ${shift}`).toBe(true);
          expect(C.overlaps(plane, C.fromReal(upperGamma(s, b(x), P))), `${x} ${centre} ${shift}`).toBe(true);
        }
        expect(R.accuracyBits(wide)).toBeGreaterThan(20);
      }
    }
  });

  it('a ball of arguments holds the values at its points', () => {
    for (const s of ['1/3', '-2', '-5.5']) {
      const wide = upperGammaComplex(q(s), { re: R.addError(b('1.5'), 1, -30), im: R.addError(b('-2'), 1, -30) }, P);
      for (const d of ['-9e-10', '0', '9e-10']) {
        const at = upperGammaComplex(q(s), { re: b('1.5'), im: R.add(b('-2'), b(d), W) }, P);
        expect(C.overlaps(wide, at)).toBe(true);
      }
      expect(C.accuracyBits(wide)).toBeGreaterThan(24);
    }
  });

  it('on the cut from above, and next to it on both sides', () => {
    for (const s of ['1/3', '-2', '4', '-0.999999999999']) {
      for (const x of ['0.2', '3', '25']) {
        const above = upperGammaComplex(q(s), C.fromReal(R.neg(b(x))), P);
        const near = upperGammaComplex(q(s), { re: R.neg(b(x)), im: R.ball(1n, -150) }, P);
        const below = upperGammaComplex(q(s), { re: R.neg(b(x)), im: R.ball(-1n, -150) }, P);
        const gap = C.sub(near, above, P);
        expect(C.upperBits(gap)).toBeLessThan(C.upperBits(above) - 140);
        expect(C.upperBits(C.sub(C.conj(below), near, P))).toBeLessThan(C.upperBits(above) - 140);
      }
    }
    const { pv, im } = branchSame(Rational.ZERO, b('3'), P);
    const e1 = scaledE1({ re: b('-3'), im: R.ball(1n, -150) }, P);
    expect(R.upperBits(R.add(e1.re, pv, P))).toBeLessThan(-140);
    expect(R.upperBits(R.add(e1.im, im, P))).toBeLessThan(-140);
  });

  it('says so where it knows nothing', () => {
    expect(upperGamma(q('1/2'), R.neg(R.ONE), P)).toBe(R.INDETERMINATE);
    expect(upperGamma(q('1/2'), R.ball(0n, 0, 1), P)).toBe(R.INDETERMINATE);
    expect(upperGamma(q('100000'), R.ONE, P)).toBe(R.INDETERMINATE);
    expect(upperGammaComplex(q('1/2'), C.ZERO, P)).toBe(C.INDETERMINATE);
    expect(upperGammaComplex(q('1/2'), { re: R.neg(R.ONE), im: R.ball(0n, 0, 1) }, P)).toBe(C.INDETERMINATE);
    expect(upperGammaComplex(z('1', '1'), { re: R.neg(R.ONE), im: R.ball(0n, 0, 1) }, P)).toBe(C.INDETERMINATE);
    expect(upperGammaComplex(z('1', '90000'), C.ONE, P)).toBe(C.INDETERMINATE);
  });
});

describe('E₁(x)', () => {
  it('is Γ(0, x) and e^−x G₀(x), also on balls', () => {
    for (const x of ['1e-20', '0.3', '5', '40', '400', '3000']) {
      expect(R.overlaps(expintE1(b(x), P), upperGamma(Rational.ZERO, b(x), P)), x).toBe(true);
      const wide = expintE1(R.addRelativeError(b(x), 1, -30), P);
      for (const t of ['0.9999999991', '1', '1.0000000009']) {
        expect(R.overlaps(wide, expintE1(R.mul(b(x), b(t), W), P)), `${x} ${t}`).toBe(true);
      }
    }
    expect(expintE1(R.ball(0n, 0, 1), P)).toBe(R.INDETERMINATE);
  });
});

describe('confluent functions', () => {
  it('b M(a, b) − b M(a−1, b) − z M(a, b+1) = 0 (DLMF 13.3.4)', () => {
    for (const a of ['1/3', '-2', '7/2', '-5.3']) {
      for (const w of PLACES) {
        const less = q(a).sub(Rational.ONE);
        const [B, B1] = [q('5/7'), q('12/7')];
        const left = mul(c('5/7'), kummerM(q(a), B, w, P));
        same(
          left,
          add(mul(c('5/7'), kummerM(less, B, w, P)), mul(w, kummerM(q(a), B1, w, P))),
          [a, C.toNumbers(w)],
          P - 40,
        );
      }
    }
  });

  it('U(a−1) + (b−2a−z) U(a) + a(a−b+1) U(a+1) = 0 (DLMF 13.3.7): b at, next to and off the integers', () => {
    for (const B of ['1/2', '1', '3', '-2', '1.00000000000001', '2.5', '0']) {
      for (const a of ['1/3', '2', '2.7']) {
        for (const w of PLACES) {
          const A = q(a);
          const middle = C.sub(c(q(B).sub(A).sub(A).num + '/' + q(B).sub(A).sub(A).den), w, W);
          const front = A.mul(A.sub(q(B)).add(Rational.ONE));
          const sum = add(
            mul(middle, kummerU(A, q(B), w, P)),
            mul(C.fromReal(R.fromRational(front, W)), kummerU(A.add(Rational.ONE), q(B), w, P)),
          );
          same(kummerU(A.sub(Rational.ONE), q(B), w, P), C.neg(sum), [B, a, C.toNumbers(w)]);
        }
      }
    }
  });

  it('U(1/2, 1/2, x²) e^−x² √π is… the complementary error function: Γ(1/2, x²) = e^−x² U(1/2, 1/2, x²)', () => {
    for (const x of ['0.01', '1', '9', '400']) {
      const left = kummerU(q('1/2'), q('1/2'), q(x), P);
      same(left, mul(C.fromReal(exp(b(x), W)), C.fromReal(upperGamma(q('1/2'), b(x), P))), x);
    }
  });
});

describe('Gauss function', () => {
  const POINTS = [z('0.3', '0.2'), z('-40', '1'), z('0.97', '0'), z('5', '-3'), z('0.45', '0.8'), z('-0.9', '0')];
  it('F(a, b; c; z) = (1−z)^(c−a−b) F(c−a, c−b; c; z) (DLMF 15.8.1)', () => {
    for (const [A, B, D] of [
      ['1/3', '1/2', '5/7'],
      ['1/3', '1/2', '5/6'],
      ['1/3', '1/2', '17/6'],
      ['1/3', '4/3', '5/7'],
      ['2', '3', '1/2'],
    ] as const) {
      for (const w of POINTS) {
        const [u, v, t] = [q(A), q(B), q(D)];
        const power = cpow(C.sub(C.ONE, w, W), C.fromReal(R.fromRational(t.sub(u).sub(v), W)), W);
        same(gauss(u, v, t, w, P), mul(power, gauss(t.sub(u), t.sub(v), t, w, P)), [A, B, D, C.toNumbers(w)]);
      }
    }
  });

  it('closed forms: F(1, 1; 2; z) = −log(1−z)/z, F(a, b; b; z) = (1−z)^−a, Gauss at 1, polynomials', () => {
    for (const w of POINTS) {
      same(gauss(1, 1, 2, w, P), C.neg(C.div(clog(C.sub(C.ONE, w, W), W), w, W)), C.toNumbers(w));
      same(gauss(q('1/3'), q('5/7'), q('5/7'), w, P), cpow(C.sub(C.ONE, w, W), c('-1/3'), W), C.toNumbers(w));
    }
    const at = mul(gammaComplex(c('3'), W), gammaComplex(c('13/6'), W));
    const below = mul(gammaComplex(c('8/3'), W), gammaComplex(c('5/2'), W));
    same(gauss(q('1/3'), q('1/2'), 3, 1, P), C.div(at, below, W), 'z = 1');
    // 1 − 2·3·z/5 + …: (−2)_k (3)_k/(5)_k/k!
    expect(R.containsRational(gauss(-2, 3, 5, 10, P).re, q('1').sub(q('12')).add(q('40')))).toBe(true);
    expect(gauss(q('1/3'), q('1/2'), q('5/7'), 2, P)).toEqual(C.INDETERMINATE);
  });
});

describe('Gauss function, complex parameters with integer differences', () => {
  const cq = (re: string, im: string): { re: Rational; im: Rational } => ({ re: q(re), im: q(im) });
  const [a, conjugate] = [cq('1/3', '1/5'), cq('1/3', '-1/5')];
  // 62 digits by mpmath 1.2.1; PARI/GP 2.15.2 agrees but for c = −4/3, where the power series (|z| < 1) does
  it.each([
    [a, conjugate, q('2/3'), cq('0.95', '0'), '1.7433427174065506579589996205738321127755314754856876359638728', '0'],
    [a, conjugate, q('5/3'), cq('0.95', '0'), '1.1538031588105985866240868865027710020839552251360708177142105', '0'],
    [
      a,
      conjugate,
      q('11/3'),
      cq('0.97', '0.2'),
      '1.0502337712328948209784541470284744915947468346642160920229781',
      '0.014640915068153327982232814879741768448309581725172146086548435',
    ],
    [
      a,
      conjugate,
      q('-4/3'),
      cq('0.9', '-0.3'),
      '-3.9877613865471655026362447139716379809418130763516717700652380',
      '0.98287938760941132996363279398910606151928890195946042242708556',
    ],
    [
      a,
      cq('4/3', '1/5'),
      q('1/7'),
      cq('3', '4'),
      '-0.42777689385104470506428348149888170465907471374056840324600599',
      '-0.60606441610222921985631591661989059363052719106576140151813444',
    ],
    [
      a,
      a,
      cq('1/7', '1'),
      cq('-0.3', '1.4'),
      '0.91189045368997996662921288007276788350991213293890957781075630',
      '0.15531137919031402789434940000495229716235766555434084924806079',
    ],
  ])('F(%o, %o; %o; %o)', (A, B, D, w, re, im) => {
    const value = gauss(A, B, D, w, 200);
    const near = (text: string): Ball => R.addError(R.fromRational(q(text), 260), 1, -200);
    expect(R.overlaps(value.re, near(re))).toBe(true);
    expect(R.overlaps(value.im, near(im))).toBe(true);
    expect(C.accuracyBits(value)).toBeGreaterThan(198);
  });

  it('Euler’s transformation (DLMF 15.8.1) for exact balls, c − a − b = 2, and for c next to it', () => {
    const [A, B] = [C.fromNumbers(0.375, 1.25), C.fromNumbers(0.625, -1.25)];
    for (const w of [z('0.97', '0'), z('0.8', '0.7'), z('1.3', '-0.4')]) {
      for (const shift of ['0', '1e-12', '-1e-25']) {
        const D = q('3').add(q(shift));
        const excess = C.fromReal(R.fromRational(D.sub(Rational.ONE), W));
        const [cA, cB] = [A, B].map((x) => C.sub(C.fromReal(R.fromRational(D, 3 * W)), x, 3 * W)) as [Complex, Complex];
        const power = cpow(C.sub(C.ONE, w, W), excess, W);
        same(gauss(A, B, D, w, P), mul(power, gauss(cA, cB, D, w, W)), [C.toNumbers(w), shift], P - 60);
      }
    }
  });

  it('an enclosure that may meet an integer difference still has no value there', () => {
    const wide = C.fromReal(R.ball(1n, 0, 2 ** -60));
    expect(C.upperBits(gauss(C.fromNumbers(0.5, 1), C.fromNumbers(0.5, -1), wide, q('0.97'), P))).toBe(Infinity);
  });
});

describe('ζ on the line, ψ in the plane, Li, tanh', () => {
  it('ζ agrees with the integers, with its reflection, and next to the pole', () => {
    for (const n of [2, 3, 7, 40])
      expect(R.overlaps(zetaReal(R.ball(BigInt(n) << 40n, -40, 1), P), zeta(n, P))).toBe(true);
    for (const s of ['0.6', '0.9', '1.2', '3.3', '24.9']) {
      const S = b(s);
      const other = R.sub(R.ONE, S, W);
      // ζ(1−s) = 2 (2π)^−s cos(πs/2) Γ(s) ζ(s)
      const power = exp(R.neg(R.mul(S, log(R.mul2exp(pi(W), 1), W), W)), W);
      const right = R.mul(R.mul(power, gamma(S, W), W), R.mul(sinCosPi(R.mul2exp(S, -1), W).cos, zetaReal(S, W), W), W);
      expect(R.overlaps(zetaReal(other, P), R.mul2exp(right, 1)), s).toBe(true);
    }
    const near = zetaReal(R.add(R.ONE, R.ball(1n, -100), 1e9), P);
    expect(R.accuracyBits(near)).toBeGreaterThan(P - 2);
    expect(zetaReal(R.ball(1n, 0, 0.1), P)).toBe(R.INDETERMINATE);
    expect(zetaReal(R.ball(5n, 0, 0.3), P)).toBe(R.INDETERMINATE);
  });

  it('ψ(z+1) = ψ(z) + 1/z', () => {
    for (const w of [...PLACES, z('-7.5', '0.001'), z('0.2', '300')]) {
      same(digammaComplex(C.add(w, C.ONE, W), P), C.add(digammaComplex(w, W), C.inv(w, W), W), C.toNumbers(w));
    }
  });

  it('Li₂(1/2) = π²/12 − ln²2/2, Li₃(1/2) = 7ζ(3)/8 − π² ln 2/12 + ln³2/6', () => {
    const l = ln2(W);
    const p2 = R.div(R.sqr(pi(W), W), R.fromNumber(12), W);
    expect(R.overlaps(polylogHalf(2, P), R.sub(p2, R.mul2exp(R.sqr(l, W), -1), W))).toBe(true);
    const cube = R.div(R.powInt(l, 3, W), R.fromNumber(6), W);
    const three = R.add(R.mul(b('7/8'), zeta(3, W), W), R.sub(cube, R.mul(p2, l, W), W), W);
    expect(R.overlaps(polylogHalf(3, P), three)).toBe(true);
    expect(polylogHalf(2.5, P)).toBe(R.INDETERMINATE);
  });

  it('tanh 2x = 2t/(1 + t²)', () => {
    for (const x of ['1e-30', '0.3', '-2', '40', '-1e6']) {
      const t = tanh(b(x), W);
      const right = R.div(R.mul2exp(t, 1), R.add(R.ONE, R.sqr(t, W), W), W);
      expect(R.overlaps(tanh(R.mul2exp(b(x), 1), P), right), x).toBe(true);
    }
    expect(R.toNumber(tanh(R.mul2exp(R.neg(R.ONE), 80), P))).toBe(-1);
  });
});
