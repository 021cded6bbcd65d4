/**
 * @module Conformal maps of the cut Borel plane, and Borel transforms re-expanded in the mapped variable.
 *
 * Purpose    cuts (−∞, −a] and [b, ∞), one of them possibly absent, go to the unit circle:
 *              w(t) = [√(1+t/a) − √(1−t/b)]/[√(1+t/a) + √(1−t/b)],   t(w) = 4w/[(1−w)²/a + (1+w)²/b]
 *            (an absent cut is a or b = ∞); −a goes to w = −1, b to w = +1.
 * Method     Σ b_n t^n = Σ c_n w^n by composition. Softening takes the branch points out first:
 *              in w:  B = (1+w)^{−2γ₁} (1−w)^{−2γ₂} Σ d_n w^n,
 *              in t:  B = (1+t/a)^{−γ₁} (1−t/b)^{−γ₂} Σ e_n w^n,
 *            for B ~ (1+t/a)^{−γ₁} and (1−t/b)^{−γ₂} at the two points.
 * Bound      coefficients are enclosed; the re-expansion costs about 2.6 bits an order.
 * Reference  S. Ciulli, J. Fischer, Nucl. Phys. 24 (1961) 465; A. H. Mueller (1992); I. Caprini, J. Fischer,
 *            arXiv:hep-ph/9811367, 1106.5336 (abstracts seen). Formulas re-derived.
 */
import { ballField, C, cexp, clog, csqrt, DoubleDouble as D, R } from '../numerics/index.js';
import type { Ball, Complex, Exact } from '../numerics/index.js';
import { amplification } from './partial.js';
import { binomialSeries, composeSeries, multiplySeries, reciprocalSeries } from './power-series.js';
import { quickReals } from './ray-quick.js';
import type { Lossy, QuickComplex, QuickIntegrand } from './ray-quick.js';

/** End of a cut: its distance from the origin and the exponent γ of the branch point there, when known. */
export interface CutEnd {
  readonly distance: Exact;
  readonly exponent?: Exact;
}

export interface Cuts {
  /** Cut (−∞, −distance]. */
  readonly left?: CutEnd;
  /** Cut [distance, ∞). */
  readonly right?: CutEnd;
}

export type Softening = 'none' | 'in w' | 'in t';

/** 1/a and 1/b, zero for an absent cut. */
function inverses(cuts: Cuts, prec: number): { left: Ball; right: Ball } {
  const inverse = (end: CutEnd | undefined): Ball =>
    end === undefined ? R.ZERO : R.div(R.ONE, end.distance.ball(prec), prec);
  return { left: inverse(cuts.left), right: inverse(cuts.right) };
}

/** Taylor coefficients of t(w), the first `length`. */
export function inverseMapSeries(cuts: Cuts, length: number, prec: number): Ball[] {
  const { left, right } = inverses(cuts, prec);
  const field = ballField(prec);
  const sum = R.add(left, right, prec);
  const below = reciprocalSeries(field, [sum, R.mul2exp(R.sub(right, left, prec), 1), sum], length);
  return [R.ZERO, ...below.slice(0, length - 1).map((c) => R.mul2exp(c, 2))];
}

/** w and the square roots at a point off the cuts. */
interface Mapped {
  readonly w: Complex;
  /** √(1 + t/a), √(1 − t/b) and their sum: 1 + w = 2 left/sum, 1 − w = 2 right/sum. All have a positive real part. */
  readonly left: Complex;
  readonly right: Complex;
  readonly sum: Complex;
}

function mapPoint(t: Complex, inverse: { left: Ball; right: Ball }, prec: number): Mapped {
  const root = (slope: Ball): Complex =>
    R.isExactZero(slope) ? C.ONE : csqrt(C.add(C.ONE, C.mulReal(t, slope, prec), prec), prec);
  const left = root(inverse.left);
  const right = root(R.neg(inverse.right));
  const sum = C.add(left, right, prec);
  return { w: C.div(C.sub(left, right, prec), sum, prec), left, right, sum };
}

/** w(t), t off the cuts. */
export function mapTo(cuts: Cuts, t: Complex, prec: number): Complex {
  return mapPoint(t, inverses(cuts, prec), prec).w;
}

/** A Borel transform in the mapped variable. */
export interface Remapped {
  readonly softening: Softening;
  readonly coefficients: readonly Ball[];
}

/** Coefficients of Σ b_n t^n, softened as asked, in w. */
export function remap(b: readonly Ball[], cuts: Cuts, softening: Softening, prec: number): Remapped {
  const field = ballField(prec);
  const N = b.length;
  const map = inverseMapSeries(cuts, N, prec);
  const { left, right } = inverses(cuts, prec);
  const ends: readonly [CutEnd | undefined, Ball, Ball][] = [
    [cuts.left, left, R.ONE],
    [cuts.right, R.neg(right), R.neg(R.ONE)],
  ];
  let inT = [...b];
  let factors: Ball[][] = [];
  for (const [end, slope, side] of ends) {
    const gamma = end?.exponent?.ball(prec);
    if (gamma === undefined || softening === 'none') continue;
    if (softening === 'in t') inT = multiplySeries(field, inT, binomialSeries(field, gamma, slope, N), N);
    else factors = [...factors, binomialSeries(field, R.mul2exp(gamma, 1), side, N)];
  }
  const inW = composeSeries(field, inT, map, N);
  return { softening, coefficients: factors.reduce((acc, f) => multiplySeries(field, acc, f, N), inW) };
}

/** Values at t of several re-expansions with the same cuts: each with all its coefficients and with `fewer` less. */
export function remappedValues(
  list: readonly Remapped[],
  cuts: Cuts,
  t: Complex,
  prec: number,
  fewer = 1,
): readonly { readonly full: Complex; readonly shorter: Complex }[] {
  const point = mapPoint(t, inverses(cuts, prec), prec);
  const powers = powersOf(point.w, Math.max(...list.map((r) => r.coefficients.length)), prec);
  const prefactors = softeningFactors(new Set(list.map((r) => r.softening)), cuts, point, prec);
  return list.map(({ softening, coefficients }) => {
    const factor = prefactors.get(softening) ?? C.ONE;
    const terms = coefficients.map((c, n) => C.mulReal(powers[n]!, c, prec));
    const add = (sum: Complex, term: Complex): Complex => C.add(sum, term, prec);
    const shorter = terms.slice(0, -fewer).reduce(add, C.ZERO);
    const full = terms.slice(-fewer).reduce(add, shorter);
    return { full: C.mul(full, factor, prec), shorter: C.mul(shorter, factor, prec) };
  });
}

function powersOf(w: Complex, count: number, prec: number): Complex[] {
  const list: Complex[] = [C.ONE];
  for (let n = 1; n < count; n++) list.push(C.mul(list[n - 1]!, w, prec));
  return list;
}

/**
 * The softening factors at the point, from the logarithms of the square roots:
 * in t exp(−2γ₁ ln left − 2γ₂ ln right), in w the same times (sum/2)^{2γ₁+2γ₂}.
 */
function softeningFactors(
  wanted: ReadonlySet<Softening>,
  cuts: Cuts,
  point: Mapped,
  prec: number,
): Map<Softening, Complex> {
  const factors = new Map<Softening, Complex>();
  if (!wanted.has('in w') && !wanted.has('in t')) return factors;
  const gammas = [cuts.left, cuts.right].map((end) => end?.exponent?.ball(prec) ?? R.ZERO);
  const inT = [point.left, point.right].reduce((acc, root, i) => {
    if (R.isExactZero(gammas[i]!)) return acc;
    return C.sub(acc, C.mulReal(clog(root, prec), R.mul2exp(gammas[i]!, 1), prec), prec);
  }, C.ZERO);
  if (wanted.has('in t')) factors.set('in t', cexp(inT, prec));
  if (wanted.has('in w')) {
    const both = R.mul2exp(R.add(gammas[0]!, gammas[1]!, prec), 1);
    const half = clog(C.mul2exp(point.sum, -1), prec);
    factors.set('in w', cexp(C.add(inT, C.mulReal(half, both, prec), prec), prec));
  }
  return factors;
}

const Z = D.complex;
/** What a logarithm, an exponential or a handful of products lose, in units of D.UNIT. */
const FUNCTION_LOSS = 64;

interface QuickCuts {
  /** x/a and x/b. */
  readonly slopes: readonly D.DoubleDouble[];
  /** Exponents at the two ends, zero where unknown. */
  readonly gammas: readonly D.DoubleDouble[];
}

function quickCuts(cuts: Cuts, x: Ball, prec: number): QuickCuts | undefined {
  const { left, right } = inverses(cuts, prec);
  const slopes = quickReals([R.mul(left, x, prec), R.mul(right, x, prec)]);
  const gammas = quickReals([cuts.left, cuts.right].map((end) => end?.exponent?.ball(prec) ?? R.ZERO));
  return slopes === undefined || gammas === undefined ? undefined : { slopes, gammas };
}

/** remappedValues at t = x s in double-double arithmetic: for each re-expansion with all coefficients and with `fewer` less. */
export function remappedQuick(
  list: readonly Remapped[],
  cuts: Cuts,
  x: Ball,
  fewer: number,
  prec: number,
): QuickIntegrand | undefined {
  const ends = quickCuts(cuts, x, prec);
  const coefficients = list.map((r) => quickReals(r.coefficients));
  if (ends === undefined || coefficients.some((c) => c === undefined)) return undefined;
  const known = coefficients as D.DoubleDouble[][];
  const [left, right] = ends.slopes;
  const [first, second] = ends.gammas;
  return (s) => {
    const roots = [Z.sqrt(Z.add(Z.ONE, Z.mulReal(s, left!))), Z.sqrt(Z.sub(Z.ONE, Z.mulReal(s, right!)))] as const;
    const sum = Z.add(roots[0], roots[1]);
    const w = Z.div(Z.sub(roots[0], roots[1]), sum);
    // Near w = 0 the difference of the roots cancels.
    const loss = 32 + 32 / Math.max(Z.size(w), 1e-30);
    const logs = roots.map(Z.log);
    const inT = Z.mul2exp(Z.add(Z.mulReal(logs[0]!, first!), Z.mulReal(logs[1]!, second!)), 1);
    const half = Z.mulReal(Z.log(Z.mul2exp(sum, -1)), D.mul2exp(D.add(first!, second!), 1));
    const factors: Readonly<Record<Softening, QuickComplex>> = {
      none: Z.ONE,
      'in t': Z.exp(Z.neg(inT)),
      'in w': Z.exp(Z.sub(half, inT)),
    };
    const gammas = Math.abs(first![0]) + Math.abs(second![0]);
    return known.flatMap((c, i): Lossy[] => {
      const factor = factors[list[i]!.softening];
      const value = (count: number): Lossy => {
        const used = c.slice(0, count);
        const polynomial = Z.polynomial(used, w);
        const size = Z.size(w);
        const slope = used.reduceRight((acc, a, n) => acc * size + n * Math.abs(a[0]), 0);
        const lost = (FUNCTION_LOSS + used.length * 4) * amplification(used, w, polynomial);
        const moved = (loss * slope) / Math.max(Z.size(polynomial), 1e-300);
        return {
          value: Z.mul(polynomial, factor),
          lost: lost + moved + FUNCTION_LOSS * (1 + gammas * (1 + Z.size(logs[0]!) + Z.size(logs[1]!))),
        };
      };
      return [value(c.length), value(c.length - fewer)];
    });
  };
}
