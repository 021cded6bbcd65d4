/**
 * @module Quadratic Hermite–Padé approximants.
 *
 * Purpose    P + Q f + R f² = O(t^{p+q+r+2}): an approximant with square-root branch points of its own, so that a real series
 *            can have a complex sum on its cut.
 * Method     null vector of the equations for Q and R (N = p+q+r+2 coefficients; P follows), exactly for rational coefficients
 *            (and then with the smallest degrees when the null space is larger), else in balls.
 *            f = [−Q + √D]/(2R), D = Q² − 4PR, the branch fixed at the origin by √D(0) = 2R(0)f(0) + Q(0) and continued along
 *            straight lines from there by √D(t) = √D(0) Π √(1 − t/d_i), d_i the zeros of D.
 * Bound      evaluation is in balls: it encloses the approximant.
 * Reference  R. E. Shafer, SIAM J. Numer. Anal. 11 (1974) 447; G. A. Baker, P. Graves-Morris (1996) ch. 8 (from memory).
 */
import { ballField, C, certifiedRoots, csqrt, DoubleDouble, R, Rational, rationalField } from '../numerics/index.js';
import type { Ball, CertifiedRoot, Complex, Exact } from '../numerics/index.js';
import { columns, nullVectorBalls, nullVectorExact, partsOf } from './hermite-pade-vector.js';
import type { Degrees, Parts } from './hermite-pade-vector.js';
import { multiplySeries } from './power-series.js';
import { amplification, polynomialValue } from './partial.js';
import { quickComplexes, quickReals } from './ray-quick.js';
import type { Lossy, QuickComplex } from './ray-quick.js';

export interface QuadraticApproximant {
  readonly p: readonly Ball[];
  readonly q: readonly Ball[];
  readonly r: readonly Ball[];
  /** Zeros of the discriminant with their multiplicities: branch points where odd. */
  readonly branchPoints: readonly CertifiedRoot[];
  /** Zeros of R: poles where the branch from the origin is the infinite one. */
  readonly zerosOfR: readonly CertifiedRoot[];
  /** 2R(0)f(0) + Q(0). */
  readonly rootAtOrigin: Ball;
  /** Coefficients that fixed it. */
  readonly used: number;
}

/** Most coefficients for which exact elimination is tried. Heuristic: cost. */
const EXACT_UP_TO = 12;
/** Degrees of the small relations that a longer rational series is tested for. */
const SMALL: readonly Degrees[] = [
  [2, 2, 2],
  [3, 3, 3],
];
/** Bits lost per coefficient at the first guess, and how often the guess is doubled. Heuristics. */
const LOSS = 10;
const TRIES = 3;
/** Sizes of Q + √D and Q − √D closer than these many bits are a tie: both branches count as infinite. Heuristic. */
const TIE = 20;
/** Spare bits for the discriminant and its zeros. */
const SPARE = 32;

/**
 * The approximant of Σ f_n t^n with the given degrees, from its first p+q+r+2 coefficients; a string tells why there is
 * none.
 */
export function quadraticApproximant(
  f: readonly Exact[],
  degrees: Degrees,
  prec: number,
): QuadraticApproximant | string {
  const [p, q, r] = degrees;
  const rows = p + q + r + 2;
  const used = f.slice(0, rows);
  const rationals = used.map((c) => c.rational).filter((x): x is Rational => x !== undefined);
  if (rationals.length === rows) {
    if (rows <= EXACT_UP_TO) return assemble(relation(rationals, degrees, rows), rationals[0]!, rows, prec);
    // A relation of low degree makes the null space of higher ones large: it is looked for first.
    for (const small of SMALL) {
      const found = relation(rationals, small, small[0] + small[1] + small[2] + 2);
      if (annihilates(found, rationals)) return assemble(found, rationals[0]!, rows, prec);
    }
  }
  let work = prec + LOSS * rows;
  for (let attempt = 0; attempt < TRIES; attempt++, work *= 2) {
    const balls = used.map((c) => c.ball(work));
    const vector = nullVectorBalls(columns(ballField(work), balls, degrees, rows), work);
    if (vector === undefined || !vector.every((v) => R.radiusBits(v) < R.upperBits(v) - prec || R.isExactZero(v)))
      continue;
    return assembleBalls(partsOf(ballField(work), balls, degrees, vector), balls[0]!, rows, work);
  }
  return 'the null vector cannot be fixed: a relation of lower degree, or too little precision';
}

/** P, Q, R that annihilate the first `rows` coefficients. */
function relation(f: readonly Rational[], degrees: Degrees, rows: number): Parts<Rational> {
  return partsOf(rationalField, f, degrees, nullVectorExact(columns(rationalField, f, degrees, rows)).vector);
}

/** Does P + Q f + R f² vanish to the order of all coefficients given? */
function annihilates([p, q, r]: Parts<Rational>, f: readonly Rational[]): boolean {
  const dot = (a: readonly Rational[], g: readonly Rational[], n: number): Rational =>
    a.reduce((sum, c, k) => (k > n ? sum : sum.add(c.mul(g[n - k]!))), Rational.ZERO);
  // f (Q + R f): one convolution with the whole of f, one with R.
  const inner: Rational[] = [];
  return f.every((_, n) => {
    inner.push(dot(r, f, n).add(q[n] ?? Rational.ZERO));
    return dot(inner, f, n)
      .add(p[n] ?? Rational.ZERO)
      .isZero();
  });
}

/** Exact polynomials: the multiplicities of the zeros of the discriminant are then exact too. */
function assemble(parts: Parts<Rational>, f0: Rational, used: number, prec: number): QuadraticApproximant | string {
  const [p, q, r] = parts;
  const length = Math.max(2 * q.length, p.length + r.length);
  const four = Rational.of(4);
  const square = multiplySeries(rationalField, q, q, length);
  const product = multiplySeries(rationalField, p, r, length);
  const D = trimmed(square.map((x, n) => x.sub(four.mul(product[n]!))));
  if (D.length === 0) return 'the discriminant vanishes';
  const branchPoints = certifiedRoots(D, prec);
  if ('failed' in branchPoints) return branchPoints.failed;
  const top = trimmed(r);
  const zerosOfR = top.length < 2 ? { roots: [] } : certifiedRoots(top, prec);
  if ('failed' in zerosOfR) return zerosOfR.failed;
  const ball = (list: readonly Rational[]): Ball[] => list.map((x) => R.fromRational(x, prec + SPARE));
  const rest = { branchPoints: branchPoints.roots, zerosOfR: zerosOfR.roots, used };
  return finished(ball(p), ball(q), ball(r), R.fromRational(f0, prec + SPARE), rest, prec + SPARE);
}

function trimmed(a: readonly Rational[]): readonly Rational[] {
  let n = a.length;
  while (n > 0 && a[n - 1]!.isZero()) n--;
  return a.slice(0, n);
}

function assembleBalls(parts: Parts<Ball>, f0: Ball, used: number, prec: number): QuadraticApproximant | string {
  const [p, q, r] = parts;
  const field = ballField(prec);
  const length = Math.max(2 * q.length - 1, p.length + r.length - 1);
  const square = multiplySeries(field, q, q, length);
  const product = multiplySeries(field, p, r, length);
  const D = square.map((x, n) => R.sub(x, R.mul2exp(product[n]!, 2), prec));
  const bits = Math.max(64, prec >> 1);
  const branchPoints = certifiedRoots(D, bits);
  if ('failed' in branchPoints) return branchPoints.failed;
  const zerosOfR = r.length < 2 ? { roots: [] } : certifiedRoots(r, bits);
  if ('failed' in zerosOfR) return zerosOfR.failed;
  return finished(p, q, r, f0, { branchPoints: branchPoints.roots, zerosOfR: zerosOfR.roots, used }, prec);
}

function finished(
  p: readonly Ball[],
  q: readonly Ball[],
  r: readonly Ball[],
  f0: Ball,
  rest: Pick<QuadraticApproximant, 'branchPoints' | 'zerosOfR' | 'used'>,
  prec: number,
): QuadraticApproximant | string {
  const rootAtOrigin = R.add(R.mul2exp(R.mul(r[0]!, f0, prec), 1), q[0]!, prec);
  if (R.containsZero(rootAtOrigin)) return 'the two branches meet at the origin';
  return { p, q, r, rootAtOrigin, ...rest };
}

/** √D(t), continued along the straight line from the origin. */
function discriminantRoot(a: QuadraticApproximant, t: Complex, prec: number): Complex {
  return a.branchPoints.reduce((acc, { value, multiplicity }) => {
    const ratio = C.sub(C.ONE, C.div(t, value, prec), prec);
    let factor = multiplicity % 2 === 0 ? C.ONE : csqrt(ratio, prec);
    for (let i = 0; i < Math.floor(multiplicity / 2); i++) factor = C.mul(factor, ratio, prec);
    return C.mul(acc, factor, prec);
  }, C.fromReal(a.rootAtOrigin));
}

/** The approximant at t, off the cuts that run outward from its branch points. */
export function quadraticValue(a: QuadraticApproximant, t: Complex, prec: number): Complex {
  const root = discriminantRoot(a, t, prec);
  const Q = polynomialValue(a.q, t, prec);
  const sum = C.add(Q, root, prec);
  const difference = C.sub(root, Q, prec);
  // Of the two equivalent forms the one without cancellation; at a zero of R only the first may be finite.
  if (C.upperBits(C.exactMid(sum)) >= C.upperBits(C.exactMid(difference)))
    return C.div(C.mul2exp(C.neg(polynomialValue(a.p, t, prec)), 1), sum, prec);
  return C.div(difference, C.mul2exp(polynomialValue(a.r, t, prec), 1), prec);
}

/** Zeros of R at which the branch from the origin is infinite; `bits` bits decide. */
export function quadraticPoles(a: QuadraticApproximant, bits: number): readonly CertifiedRoot[] {
  return a.zerosOfR.filter(({ value }) => {
    const at = C.exactMid(value);
    const root = discriminantRoot(a, at, bits);
    const Q = polynomialValue(a.q, at, bits);
    // √D = ±Q there: with the minus sign the branch is infinite. A double zero has both infinite.
    return C.upperBits(C.add(root, Q, bits)) <= C.upperBits(C.sub(root, Q, bits)) + TIE;
  });
}

const Z = DoubleDouble.complex;

/** The approximant at t = x s in double-double arithmetic; undefined where its parts are known too badly for it. */
export function quadraticQuick(
  a: QuadraticApproximant,
  x: Ball,
  prec: number,
): ((s: QuickComplex) => Lossy) | undefined {
  const scaled = (p: readonly Ball[]): DoubleDouble.DoubleDouble[] | undefined =>
    quickReals(p.map((c, k) => R.mul(c, R.powInt(x, k, prec), prec)));
  const [p, q, r] = [scaled(a.p), scaled(a.q), scaled(a.r)];
  const slopes = quickComplexes(a.branchPoints.map(({ value }) => C.mulReal(C.inv(value, prec), x, prec)));
  const origin = quickReals([a.rootAtOrigin])?.[0];
  if (p === undefined || q === undefined || r === undefined || slopes === undefined || origin === undefined)
    return undefined;
  return (s) => {
    let root = Z.fromReal(origin);
    let lost = 0;
    slopes.forEach((slope, i) => {
      const step = Z.mul(s, slope);
      const ratio = Z.sub(Z.ONE, step);
      const { multiplicity } = a.branchPoints[i]!;
      lost += (4 * multiplicity * (1 + Z.size(step))) / Z.size(ratio) + 8;
      if (multiplicity % 2 === 1) root = Z.mul(root, Z.sqrt(ratio));
      for (let k = 0; k < Math.floor(multiplicity / 2); k++) root = Z.mul(root, ratio);
    });
    const Q = Z.polynomial(q, s);
    const sum = Z.add(Q, root);
    const difference = Z.sub(root, Q);
    const first = Z.size(sum) >= Z.size(difference);
    const other = Z.polynomial(first ? p : r, s);
    const large = first ? sum : difference;
    lost += 4 * (q.length * amplification(q, s, Q) + p.length * amplification(first ? p : r, s, other));
    const value = first ? Z.div(Z.mul2exp(Z.neg(other), 1), large) : Z.div(large, Z.mul2exp(other, 1));
    return { value, lost };
  };
}
