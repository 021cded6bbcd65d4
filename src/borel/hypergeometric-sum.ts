/**
 * @module Laplace integral of a hypergeometric Borel transform in closed form (a Meijer G function).
 *
 * Purpose    Ψ(x) = ∫_0^∞ e^{−s} ₚ₊₁Fₚ(A; Y; K x s) ds, for K > 0 its upper lateral value.
 * Method     residues of the Mellin–Barnes integral to the left: with y = −1/(Kx) (K > 0: y = e^{iπ}/(Kx) above the axis) and
 *            a over {1, A_1, …, A_{p+1}},
 *              Ψ = [ΠΓ(Y)/ΠΓ(A)] Σ_a Γ(a) Π_{a′≠a} Γ(a′−a)/ΠΓ(Y−a) · y^a · ₚ₊₁Fₚ₊₁(a, 1+a−Y; 1+a−a′; y).
 *            Parameters that differ by integers are moved apart by multiples of ±η; the mean of the two signs is the value.
 *            For large |y| the divergent series itself, to its least term.
 * Bound      without coinciding parameters: ball arithmetic and, for the tails, a bound on the ratio of terms that falls
 *            with k: enclosed. With coinciding parameters the radius is the difference of the two signs of η (far more than
 *            the error, which is quadratic in η): converged.
 * Reference  DLMF 16.17.2, 16.5 (residue expansion; re-derived); arXiv:1405.7956.
 */
import { C, cexp, gammaComplex, log, pi, R, rgammaComplex } from '../numerics/index.js';
import type { Ball, Complex } from '../numerics/index.js';
import type { HypergeometricTransform } from './hypergeometric-fit.js';
import type { LaplaceSum } from './laplace.js';

export interface HypergeometricSum extends LaplaceSum {
  /** True when the enclosure is proved. */
  readonly certified: boolean;
}

/** Spare bits beside what cancellation is known to cost. */
const SPARE = 48;
/** Bits of the shift that separates coinciding parameters, beyond the precision wanted. */
const SHIFT_SPARE = 24;
/** Most terms of a residue series. */
const MOST_TERMS = 20_000;
/** Beyond this |y| the divergent series itself has the bits wanted, and an imaginary part e^{−|y|} is beneath them. */
const large = (prec: number): number => Math.max(60, prec * Math.LN2 + 40);

/** Does the difference of two parameters certainly-possibly equal an integer? */
function mayDifferByInteger(a: Complex, b: Complex): boolean {
  const d = C.sub(a, b, 60);
  if (!R.containsZero(d.im)) return false;
  const nearest = R.fromNumber(Math.round(R.toNumber(d.re)));
  return R.containsZero(R.sub(d.re, nearest, 60));
}

/** For each parameter its rank among those it coincides with: 0 for the first. */
function ranks(a: readonly Complex[]): number[] {
  return a.map((x, i) => a.slice(0, i).filter((other) => mayDifferByInteger(x, other)).length);
}

/** Bits of |y| = 1/|Kx| as a number. */
export function inverseCoupling(K: Ball, x: Ball): number {
  return 1 / Math.abs(R.toNumber(K) * R.toNumber(x));
}

/** Precision of the parameters that a sum with `prec` bits needs: cancellation e^{2|y|}, coinciding parameters. */
export function parameterBits(h: HypergeometricTransform, x: Ball, prec: number): number {
  const repeats = Math.max(0, ...ranks([C.ONE, ...h.upper]));
  const y = Math.min(large(prec), inverseCoupling(h.K, x));
  return Math.ceil(prec + SPARE + 2.9 * y + repeats * (prec + SHIFT_SPARE) * 2);
}

/** Ψ(x); `h` must be known to parameterBits. Undefined when the parameters leave it undefined. */
export function hypergeometricSum(h: HypergeometricTransform, x: Ball, prec: number): HypergeometricSum | undefined {
  const work = parameterBits(h, x, prec);
  if (inverseCoupling(h.K, x) > large(prec)) return divergentSeries(h, x, prec);
  const all = [C.ONE, ...h.upper];
  const rank = ranks(all);
  if (rank.every((r) => r === 0)) {
    const value = residueSum(h, all, x, work);
    return value === undefined ? undefined : { pv: value.re, im: value.im, certified: true };
  }
  const moved = (sign: 1 | -1): Complex | undefined => {
    const eta = R.mul2exp(R.fromNumber(sign), -(prec + SHIFT_SPARE));
    const shifted = all.map((a, i) => ({ re: R.add(a.re, R.mul(eta, R.fromNumber(rank[i]!), work), work), im: a.im }));
    return residueSum(h, shifted, x, work);
  };
  const [plus, minus] = [moved(1), moved(-1)];
  if (plus === undefined || minus === undefined) return undefined;
  const mean = (p: Ball, m: Ball): Ball => R.widen(R.mul2exp(R.add(p, m, work), -1), R.abs(R.sub(p, m, work)));
  return { pv: mean(plus.re, minus.re), im: mean(plus.im, minus.im), certified: false };
}

/** The sum over residues for parameters a (a[0] belongs to the Borel weight). */
function residueSum(h: HypergeometricTransform, a: readonly Complex[], x: Ball, prec: number): Complex | undefined {
  const kx = R.mul(h.K, x, prec);
  const positive = R.isPositive(h.K);
  const size = R.div(R.ONE, R.abs(kx), prec);
  const logY: Complex = { re: log(size, prec), im: positive ? pi(prec) : R.ZERO };
  const y = positive ? R.neg(size) : size;
  const prefactor = [
    ...h.lower.map((p) => gammaComplex(p, prec)),
    ...a.slice(1).map((p) => rgammaComplex(p, prec)),
  ].reduce((acc, g) => C.mul(acc, g, prec), C.ONE);
  let total = C.ZERO;
  for (let i = 0; i < a.length; i++) {
    // Without a phase a conjugate pair contributes twice the real part of one member.
    const mirrored = !positive && R.isNegative(a[i]!.im);
    if (mirrored) continue;
    const part = residue(h, a, i, y, logY, prec);
    if (part === undefined) return undefined;
    const value = C.mul(part, prefactor, prec);
    const doubled = !positive && R.isPositive(a[i]!.im);
    total = C.add(total, doubled ? C.fromReal(R.mul2exp(value.re, 1)) : value, prec);
  }
  if (!positive) total = C.fromReal(total.re);
  return total.re.rad < Infinity && total.im.rad < Infinity ? total : undefined;
}

function residue(
  h: HypergeometricTransform,
  all: readonly Complex[],
  i: number,
  y: Ball,
  logY: Complex,
  prec: number,
): Complex | undefined {
  const a = all[i]!;
  const others = all.filter((_, j) => j !== i);
  let front = C.mul(gammaComplex(a, prec), cexp(C.mul(a, logY, prec), prec), prec);
  for (const other of others) front = C.mul(front, gammaComplex(C.sub(other, a, prec), prec), prec);
  for (const Y of h.lower) front = C.mul(front, rgammaComplex(C.sub(Y, a, prec), prec), prec);
  if (R.isExactZero(front.re) && R.isExactZero(front.im)) return C.ZERO;
  const up = [a, ...h.lower.map((Y) => C.sub(C.add(C.ONE, a, prec), Y, prec))];
  const down = others.map((other) => C.sub(C.add(C.ONE, a, prec), other, prec));
  const series = entireSeries(up, down, y, prec);
  return series === undefined ? undefined : C.mul(front, series, prec);
}

/** Σ_k Π(up)_k/Π(down)_k y^k/k! with one more factor below than above. */
function entireSeries(up: readonly Complex[], down: readonly Complex[], y: Ball, prec: number): Complex | undefined {
  const sizes = (list: readonly Complex[]): number[] => list.map((p) => 2 ** C.upperBits(p));
  const upSizes = sizes(up);
  const downSizes = sizes(down);
  const absY = 2 ** R.upperBits(y);
  let term = C.ONE;
  let sum = C.ONE;
  for (let k = 0; k < MOST_TERMS; k++) {
    const n = R.fromNumber(k);
    for (const p of up) term = C.mul(term, { re: R.add(p.re, n, prec), im: p.im }, prec);
    let below: Complex = C.fromReal(R.fromNumber(k + 1));
    for (const p of down) below = C.mul(below, { re: R.add(p.re, n, prec), im: p.im }, prec);
    term = C.mulReal(C.div(term, below, prec), y, prec);
    sum = C.add(sum, term, prec);
    if (!(C.upperBits(term) < Infinity)) return undefined;
    if (C.upperBits(term) > C.upperBits(sum) - prec) continue;
    // Bound of all later ratios: it falls with k once k exceeds every lower parameter.
    const from = k + 1;
    const ratio =
      upSizes.reduce((r, s) => r * (1 + s / from), 1) *
      downSizes.reduce((r, s) => (s < from ? r / (1 - s / from) : Infinity), 1);
    const bound = (ratio * absY * from ** (up.length - down.length)) / (from + 1);
    if (!(bound <= 0.5)) continue;
    const tail = C.upperBits(term);
    return { re: R.addError(sum.re, 1, tail), im: R.addError(sum.im, 1, tail) };
  }
  return undefined;
}

/** Σ (A)_n/(Y)_n (Kx)^n to its least term, or until the terms are below 2^-prec. */
function divergentSeries(h: HypergeometricTransform, x: Ball, prec: number): HypergeometricSum {
  const work = prec + SPARE;
  const kx = R.mul(h.K, x, work);
  let term = C.ONE;
  let sum = C.ONE;
  for (let n = 0; n < MOST_TERMS; n++) {
    const k = R.fromNumber(n);
    const shift = (p: Complex): Complex => ({ re: R.add(p.re, k, work), im: p.im });
    const up = h.upper.reduce((acc, p) => C.mul(acc, shift(p), work), C.fromReal(kx));
    const below = h.lower.reduce((acc, p) => C.mul(acc, shift(p), work), C.ONE);
    const next = C.div(C.mul(term, up, work), below, work);
    if (C.upperBits(next) < -prec || C.upperBits(next) >= C.upperBits(term) + 4) break;
    term = next;
    sum = C.add(sum, term, work);
  }
  return { pv: R.addError(sum.re, 1, C.upperBits(term) + 1), im: R.ZERO, certified: false };
}
