/**
 * @module The terms of a mass definition, order by order in α_s at one scale μ, from m(m).
 *
 * Formula    M = m + Σ p_n, p_n = m c_n(ln(m²/μ²)) a^n; m_X = m + closed form + Σ (p_n − q_n), q_n what the definition takes out,
 *            re-expanded at the same μ. For the summed masses q_n is the renormalon's series at R = μ, and its Borel integral
 *            is the closed form.
 * Bound      that of the numbers: rounding in doubles, enclosures in balls.
 */
import { mulSeries, reciprocal, substituteOver } from '../qcd/index.js';
import { ASYMPTOTIC_SERIES, GEOMETRIC_SERIES } from './asymptotic.js';
import type { Piece, SeriesInA, SubtractedDefinition, SummedDefinition } from './definition.js';
import type { LogTable, Numbers } from './numbers.js';
import { POLE_SERIES } from './pole-series.js';

/** Where the terms are evaluated. */
export interface Point<T> {
  readonly light: number;
  /** m(m). */
  readonly msbar: T;
  readonly mu: T;
  /** α_s(μ) with n_l flavours. */
  readonly alpha: T;
  /** The geometric coupling at μ; needed by MRS. */
  readonly geometric?: T;
  /** Strength N. */
  readonly strength: T;
}

export interface Terms<T> {
  /** Index is the power of α_s; entry 0 is zero in both. */
  readonly pole: readonly T[];
  readonly removed: readonly T[];
  /** Added at once: the Borel integral of the summed masses, else zero. */
  readonly closed: T;
}

/** ln(Q²/μ²). */
const logRatio = <T>(n: Numbers<T>, Q: T, mu: T): T => {
  const half = n.log(n.ring.div(Q, mu));
  return n.ring.add(half, half);
};

/** c_1 … c_order at μ. */
export function coefficientsAt<T>(n: Numbers<T>, table: LogTable<T>, L: T, order: number): T[] {
  const { ring } = n;
  return table.slice(0, order).map((row) => {
    let sum = ring.zero;
    for (let k = row.length - 1; k >= 0; k--) sum = ring.add(ring.mul(sum, L), row[k] ?? ring.zero);
    return sum;
  });
}

/** [0, size c_1 a, size c_2 a², …], padded to the order. */
function termsOf<T>(n: Numbers<T>, c: readonly T[], size: T, alpha: T, order: number): T[] {
  const { ring } = n;
  const a = ring.div(alpha, n.fourPi);
  const out = [ring.zero];
  let power = size;
  for (let k = 0; k < order; k++) {
    power = ring.mul(power, a);
    out.push(ring.mul(power, c[k] ?? ring.zero));
  }
  return out;
}

const at = <T>(n: Numbers<T>, series: SeriesInA, light: number, Q: T, mu: T, order: number): T[] =>
  coefficientsAt(n, n.table(series, light), logRatio(n, Q, mu), order);

/** Terms of M − m at μ in the MSbar coupling. */
export function poleTerms<T>(n: Numbers<T>, point: Point<T>, order: number): T[] {
  const { light, msbar, mu, alpha } = point;
  return termsOf(n, at(n, POLE_SERIES, light, msbar, mu, order), msbar, alpha, order);
}

/** What one piece takes out at cutoff R. */
function pieceTerms<T>(
  n: Numbers<T>,
  piece: Piece,
  point: Point<T>,
  cutoff: T,
  pole: readonly T[],
  order: number,
): T[] {
  const { ring } = n;
  const { light, msbar, mu, alpha, strength } = point;
  const Q = piece.couplingAt === 1 ? cutoff : ring.add(cutoff, cutoff);
  const c = at(n, piece.series, light, Q, mu, order);
  const linear = termsOf(n, c, piece.timesStrength ? ring.mul(strength, cutoff) : cutoff, alpha, order);
  if (piece.form === 'R') return linear;
  // R/(2M) = (R/2m) / (1 + Σ p_n/m), term by term.
  const ratio = pole.map((p, k) => (k === 0 ? ring.one : ring.div(p, msbar)));
  const factor = ring.div(cutoff, ring.add(msbar, msbar));
  return mulSeries(ring, linear, reciprocal(ring, ratio, order + 1), order + 1).map((x) => ring.mul(x, factor));
}

/** Terms of a subtracted mass at its cutoff. */
export function subtractedTerms<T>(
  n: Numbers<T>,
  definition: SubtractedDefinition,
  point: Point<T>,
  cutoff: T,
  order: number,
): Terms<T> {
  const { ring } = n;
  const pole = poleTerms(n, point, order);
  let removed = pole.map(() => ring.zero);
  for (const piece of definition.pieces) {
    const list = pieceTerms(n, piece, point, cutoff, pole, order);
    removed = removed.map((x, k) => ring.add(x, list[k] ?? ring.zero));
  }
  return { pole, removed, closed: ring.zero };
}

/** N μ t Σ_k c_k F_{b−k}(t/α), or with c_0 alone up to the branch point. */
function borelIntegral<T>(n: Numbers<T>, definition: SummedDefinition, point: Point<T>, alpha: T): T {
  const { ring } = n;
  const shape = n.shape(point.light);
  const x = ring.div(shape.t, alpha);
  const size = ring.mul(ring.mul(point.strength, point.mu), shape.t);
  const kernels = definition.coupling === 'msbar' ? shape.exponents : shape.exponents.slice(0, 1);
  let sum = ring.zero;
  kernels.forEach((b, k) => {
    const { pv, im } = n.kernel(b, x);
    const part = definition.integral === 'principal value' ? pv : ring.sub(pv, ring.mul(im, shape.cot));
    sum = ring.add(sum, ring.mul(k === 0 ? ring.one : (shape.c[k] ?? ring.zero), part));
  });
  return ring.mul(size, sum);
}

/** Terms of a summed mass at μ. */
export function summedTerms<T>(n: Numbers<T>, definition: SummedDefinition, point: Point<T>, order: number): Terms<T> {
  const { ring } = n;
  const { light, msbar, mu, strength } = point;
  const own = definition.coupling === 'geometric';
  const alpha = own ? (point.geometric ?? point.alpha) : point.alpha;
  const c = at(n, POLE_SERIES, light, msbar, mu, order);
  const inOwn = own && order > 0 ? substituteOver(ring, c, 1, n.shape(light).geometric, order) : c;
  const removed = at(n, own ? GEOMETRIC_SERIES : ASYMPTOTIC_SERIES, light, mu, mu, order);
  return {
    pole: termsOf(n, inOwn, msbar, alpha, order),
    removed: termsOf(n, removed, ring.mul(strength, mu), alpha, order),
    closed: borelIntegral(n, definition, point, alpha),
  };
}

/** m + closed + Σ (p_n − q_n), smallest parts first. */
export function totalOf<T>(n: Numbers<T>, msbar: T, terms: Terms<T>): T {
  const { ring } = n;
  let sum = ring.zero;
  for (let k = terms.pole.length - 1; k > 0; k--) {
    sum = ring.add(sum, ring.sub(terms.pole[k] ?? ring.zero, terms.removed[k] ?? ring.zero));
  }
  return ring.add(msbar, ring.add(terms.closed, sum));
}
