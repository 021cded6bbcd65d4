/**
 * @module Quadratic Hermite–Padé approximants.
 *
 * Purpose    P + Q f + R f² = O(t^{p+q+r+2}): an approximant with square-root branch points of its own, so that a real series
 *            can have a complex sum on its cut.
 * Method     null vector of the N × (N+1) matrix [δ | f | f²], N = p+q+r+2, exactly for rational coefficients (and then with
 *            the smallest degrees when the null space is larger), else in balls.
 *            f = [−Q + √D]/(2R), D = Q² − 4PR, the branch fixed at the origin by √D(0) = 2R(0)f(0) + Q(0) and continued along
 *            straight lines from there by √D(t) = √D(0) Π √(1 − t/d_i), d_i the zeros of D.
 * Bound      evaluation is in balls: it encloses the approximant.
 * Reference  R. E. Shafer, SIAM J. Numer. Anal. 11 (1974) 447; G. A. Baker, P. Graves-Morris (1996) ch. 8 (from memory).
 */
import { ballField, C, certifiedRoots, csqrt, R, Rational, rationalField, solveBall } from '../numerics/index.js';
import type { Ball, CertifiedRoot, Complex, Exact, Field } from '../numerics/index.js';
import { multiplySeries } from './power-series.js';
import { polynomialValue } from './partial.js';

export type Degrees = readonly [p: number, q: number, r: number];

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

/** Degrees that use `count` coefficients, nearest to equal ones first. */
export function quadraticDegrees(count: number): Degrees[] {
  const total = count - 2;
  const k = Math.floor(total / 3);
  switch (total - 3 * k) {
    case 0:
      return [[k, k, k]];
    case 1:
      return [
        [k + 1, k, k],
        [k, k + 1, k],
        [k, k, k + 1],
      ];
    default:
      return [
        [k + 1, k + 1, k],
        [k + 1, k, k + 1],
        [k, k + 1, k + 1],
      ];
  }
}

/** One column of the matrix for every coefficient of P, Q and R: rows t^0 … t^{rows−1}. */
function columns<T>(field: Field<T>, f: readonly T[], [p, q, r]: Degrees, rows: number): T[][] {
  const square = multiplySeries(field, f, f, rows);
  const shifted = (s: readonly T[], by: number): T[] =>
    Array.from({ length: rows }, (_, n) => (n < by ? field.zero : (s[n - by] ?? field.zero)));
  const block = (s: readonly T[], degree: number): T[][] => Array.from({ length: degree + 1 }, (_, k) => shifted(s, k));
  return [...block([field.one], p), ...block(f, q), ...block(square, r)];
}

/** A non-zero exact null vector with as few trailing coefficients as possible, and the dimension of the null space. */
function nullVectorExact(cols: readonly (readonly Rational[])[]): { vector: Rational[]; dimension: number } {
  const rows = cols[0]!.length;
  const m = Array.from({ length: rows }, (_, i) => cols.map((c) => c[i]!));
  const pivots: number[] = [];
  for (let j = 0; j < cols.length && pivots.length < rows; j++) {
    const at = pivots.length;
    const found = m.findIndex((row, i) => i >= at && !row[j]!.isZero());
    if (found < 0) continue;
    [m[at], m[found]] = [m[found]!, m[at]!];
    const inverse = m[at]![j]!.inv();
    m[at] = m[at]!.map((x) => x.mul(inverse));
    for (let i = 0; i < rows; i++) {
      const factor = m[i]![j]!;
      if (i !== at && !factor.isZero()) m[i] = m[i]!.map((x, k) => x.sub(factor.mul(m[at]![k]!)));
    }
    pivots.push(j);
  }
  // The first free column gives the vector whose entries end there.
  const free = cols.findIndex((_, j) => !pivots.includes(j));
  const vector = cols.map((_, j) => {
    if (j === free) return Rational.ONE;
    const row = pivots.indexOf(j);
    return row < 0 || j > free ? Rational.ZERO : m[row]![free]!.neg();
  });
  return { vector, dimension: cols.length - pivots.length };
}

function nullVectorBalls(cols: readonly (readonly Ball[])[], prec: number): Ball[] | undefined {
  const rows = cols[0]!.length;
  // One component is set to 1; the first choice that leaves a regular system serves.
  for (let one = cols.length - 1; one >= 0; one--) {
    const others = cols.filter((_, j) => j !== one);
    const matrix = Array.from({ length: rows }, (_, i) => others.map((c) => c[i]!));
    const solved = solveBall(matrix, cols[one]!.map(R.neg), prec);
    if (solved !== undefined) return [...solved.slice(0, one), R.ONE, ...solved.slice(one)];
  }
  return undefined;
}

/** Most coefficients for which exact elimination is tried first. Heuristic: cost. */
const EXACT_UP_TO = 12;
/** Bits lost per coefficient at the first guess, and how often the guess is doubled. Heuristics. */
const LOSS = 10;
const TRIES = 4;
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
  const isRational = rationals.length === rows;
  const exactly = (): QuadraticApproximant | string => {
    const { vector } = nullVectorExact(columns(rationalField, rationals, degrees, rows));
    return assemble(split(vector, degrees), rationals[0]!, rows, prec);
  };
  if (isRational && rows <= EXACT_UP_TO) return exactly();
  let work = prec + LOSS * rows;
  for (let attempt = 0; attempt < TRIES; attempt++, work *= 2) {
    const balls = used.map((c) => c.ball(work));
    const vector = nullVectorBalls(columns(ballField(work), balls, degrees, rows), work);
    if (vector === undefined || !vector.every((v) => R.radiusBits(v) < R.upperBits(v) - prec || R.isExactZero(v)))
      continue;
    return assembleBalls(split(vector, degrees), balls[0]!, rows, work);
  }
  return isRational ? exactly() : 'the null vector cannot be fixed at this precision';
}

function split<T>(vector: readonly T[], [p, q]: Degrees): [T[], T[], T[]] {
  return [vector.slice(0, p + 1), vector.slice(p + 1, p + q + 2), vector.slice(p + q + 2)];
}

/** Exact polynomials: the multiplicities of the zeros of the discriminant are then exact too. */
function assemble(
  parts: readonly [Rational[], Rational[], Rational[]],
  f0: Rational,
  used: number,
  prec: number,
): QuadraticApproximant | string {
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

function trimmed(a: Rational[]): Rational[] {
  let n = a.length;
  while (n > 0 && a[n - 1]!.isZero()) n--;
  return a.slice(0, n);
}

function assembleBalls(
  parts: readonly [Ball[], Ball[], Ball[]],
  f0: Ball,
  used: number,
  prec: number,
): QuadraticApproximant | string {
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
