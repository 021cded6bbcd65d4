/**
 * @module The functions whose radius growth is limited, with points that are hard on them: what tightness.test.ts and torture.test.ts run.
 */
import {
  atan,
  atan2,
  branchAlternating,
  branchCut,
  branchSame,
  C,
  cexp,
  clog,
  csqrt,
  cosh,
  digamma,
  digammaComplex,
  eiScaled,
  exp,
  expintE1,
  expm1,
  gamma,
  gammaComplex,
  gauss,
  kummerM,
  kummerU,
  log,
  log1p,
  logGamma,
  polylogHalf,
  R,
  Rational,
  rgamma,
  scaledE1,
  sinCos,
  sinCosPi,
  sinh,
  tanh,
  upperGamma,
  upperGammaComplex,
  zeta,
  zetaReal,
} from '../../src/numerics/index.js';
import type { Ball, Complex } from '../../src/numerics/index.js';

/** An exact real or complex argument of full length at `prec` bits: decimals are cut there and taken as exact. */
export const real = (text: string, prec: number): Ball => R.exactMid(R.fromRational(Rational.parse(text)!, prec));

export interface RealFunction {
  readonly name: string;
  readonly f: (x: Ball, prec: number) => Ball;
  readonly domain: 'all' | 'positive' | 'moderate' | 'small positive' | 'above one' | 'pole-free';
}

const B = Rational.of(32n, 81n);
const THIRD = Rational.of(1n, 3n);

export const REAL: readonly RealFunction[] = [
  { name: 'exp', f: exp, domain: 'moderate' },
  { name: 'expm1', f: expm1, domain: 'moderate' },
  { name: 'log', f: log, domain: 'positive' },
  { name: 'log1p', f: log1p, domain: 'positive' },
  { name: 'sin', f: (x, p) => sinCos(x, p).sin, domain: 'all' },
  { name: 'cos', f: (x, p) => sinCos(x, p).cos, domain: 'all' },
  { name: 'sin πx', f: (x, p) => sinCosPi(x, p).sin, domain: 'all' },
  { name: 'sinh', f: sinh, domain: 'moderate' },
  { name: 'cosh', f: cosh, domain: 'moderate' },
  { name: 'tanh', f: tanh, domain: 'all' },
  { name: 'atan', f: atan, domain: 'all' },
  { name: 'atan2', f: (x, p) => atan2(x, R.fromNumber(-3), p), domain: 'all' },
  { name: 'sqrt', f: R.sqrt, domain: 'positive' },
  { name: 'Γ', f: gamma, domain: 'pole-free' },
  { name: '1/Γ', f: rgamma, domain: 'pole-free' },
  { name: 'log Γ', f: logGamma, domain: 'positive' },
  { name: 'ψ', f: digamma, domain: 'pole-free' },
  { name: 'ζ', f: zetaReal, domain: 'above one' },
  { name: 'ζ(n)', f: (_, p) => zeta(3, p), domain: 'all' },
  { name: 'Li₅(1/2)', f: (_, p) => polylogHalf(5, p), domain: 'all' },
  { name: 'F_b', f: (x, p) => branchSame(B, x, p).pv, domain: 'small positive' },
  { name: 'E₁(x)', f: expintE1, domain: 'small positive' },
  { name: 'e^−x Ei', f: eiScaled, domain: 'small positive' },
  { name: 'G_b', f: (x, p) => branchAlternating(B, x, p), domain: 'small positive' },
  { name: 'Γ(s, x)', f: (x, p) => upperGamma(B.neg(), x, p), domain: 'small positive' },
];

export interface ComplexFunction {
  readonly name: string;
  readonly f: (z: Complex, prec: number) => Complex;
  /** Moduli it is asked for, as powers of ten from … to. */
  readonly from: number;
  readonly to: number;
  /** Largest number of digits of the torture grid. */
  readonly digits: number;
}

const ORDER: Complex = { re: R.ball(3n, -2), im: R.ball(-5n, -2) };

export const COMPLEX: readonly ComplexFunction[] = [
  { name: 'exp z', f: cexp, from: -20, to: 3, digits: 1000 },
  { name: 'log z', f: clog, from: -20, to: 20, digits: 1000 },
  { name: '√z', f: csqrt, from: -20, to: 20, digits: 1000 },
  { name: 'Γ(z)', f: gammaComplex, from: -20, to: 2, digits: 300 },
  { name: 'ψ(z)', f: digammaComplex, from: -20, to: 3, digits: 110 },
  { name: 'e^w E₁', f: scaledE1, from: -20, to: 20, digits: 1000 },
  { name: 'G_b(w)', f: (w, p) => branchCut(B, w, p), from: -20, to: 20, digits: 1000 },
  { name: 'Γ(s, z), real s', f: (z, p) => upperGammaComplex(B, z, p), from: -20, to: 3, digits: 300 },
  { name: 'Γ(s, z), complex s', f: (z, p) => upperGammaComplex(ORDER, z, p), from: -20, to: 2, digits: 110 },
  { name: 'M(a, b, z)', f: (z, p) => kummerM(THIRD, B, z, p), from: -20, to: 2, digits: 110 },
  { name: 'U(a, b, z)', f: (z, p) => kummerU(THIRD, B, z, p), from: -20, to: 2, digits: 110 },
  { name: 'U(a, n, z)', f: (z, p) => kummerU(THIRD, Rational.of(2), z, p), from: -20, to: 2, digits: 110 },
  { name: '2F1', f: (z, p) => gauss(THIRD, Rational.of(1n, 2n), B, z, p), from: -20, to: 20, digits: 110 },
  {
    name: '2F1, logarithmic',
    f: (z, p) => gauss(THIRD, THIRD, Rational.of(2n, 3n), z, p),
    from: -20,
    to: 20,
    digits: 110,
  },
];

/** Directions of the plane, in turns of π. */
export const DIRECTIONS = [0, 0.25, 0.5, 0.75, -0.999];

/** 1.7·10^e in the direction; exact. */
export function planePoint(e: number, turn: number, prec: number): Complex {
  const size = R.fromRational(Rational.parse(`1.7e${e}`)!, prec + 20);
  const { sin, cos } = sinCosPi(R.fromNumber(turn), prec + 20);
  return C.exactMid({ re: R.mul(size, cos, prec), im: R.mul(size, sin, prec) });
}

/** Decimal points inside a domain, from 1e-20 to 1e20 where it allows. */
export function pointsOf(domain: RealFunction['domain']): string[] {
  const all = [
    '1e-20',
    '1e-10',
    '0.00123',
    '0.37',
    '0.99999999',
    '1.0000001',
    '1.4616',
    '2.0000001',
    '7.3',
    '63.1',
    '1234.5',
  ];
  const far = ['1e10', '1e20'];
  const negative = all.concat(far).map((x) => `-${x}`);
  switch (domain) {
    case 'all':
      return [...all, ...far, ...negative];
    case 'positive':
      return [...all, ...far];
    case 'moderate':
      return [...all, ...all.map((x) => `-${x}`)];
    case 'small positive':
      return [...all, '4000'];
    case 'pole-free':
      return [...all, '-0.37', '-1e-20', '-0.99999999', '-7.3', '-63.1', '-20.000000001'];
    case 'above one':
      return ['1.0000001', '1.4616', '7.3', '63.1', '0.5', '0.37', '-1.5', '-2.0000001', '-30.7'];
  }
}
