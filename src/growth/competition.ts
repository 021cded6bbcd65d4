/**
 * @module Two singularities at similar distance: what the terms show of the second one.
 *
 * Purpose    a weak singularity on the negative axis that is nearer than the leading one on the positive axis stays hidden
 *            at low order; its growing (−1)^n admixture shows first.
 * Method     (a) the (−1)^n part of ln|c_k| in a fourth-order filter, and its growth; (b) even and odd root ratios
 *            (b_k/b_{k−2})^{1/2}; (c) the two roots of the three-term recurrence from the last four coefficients: exact for
 *            poles, strongly biased for branch points; (d) with expected positions and exponents, the two strengths from
 *            the last two coefficients and the order where the nearer one takes over.
 * Bound      all indicative.
 * Reference  C. Domb and M. F. Sykes 1957 (even–odd plots); M. Beneke, Phys. Rept. 317 (1999) 1, section 2 (competition of
 *            ultraviolet and infrared renormalons).
 */
import type { GrowthInput } from './growth.js';
import { logGamma } from './log-gamma.js';
import type { Point } from './reading.js';

/** The (−1)^n part counts from this relative size on. */
const ALTERNATION = 0.01;
/** … and must exceed the errors of the coefficients by this factor. */
const ABOVE_NOISE = 4;
/** It must keep its sign for this many consecutive k. */
const STEADY = 3;

export interface Alternation {
  /** Relative size of the (−1)^k part at the last k where it is measured. */
  readonly size: number;
  /** Factor per step by which it grows. */
  readonly growth: number;
  readonly k: number;
}

/** (−1)^k part of ln|c_k| − ln Γ(qk+1) − smooth, by the filter (1, −4, 6, −4, 1)/16, which removes cubic polynomials. */
export function alternation(points: readonly Point[], q: number): Alternation | undefined {
  if (points.length < STEADY + 4) return undefined;
  const z = points.map((p) => p.y - logGamma(q * p.k + 1));
  const found: { k: number; v: number }[] = [];
  for (let i = 2; i + 2 < z.length; i++) {
    const c = points[i]!.k;
    if (points[i - 2]!.k !== c - 2 || points[i + 2]!.k !== c + 2) continue;
    const f = (z[i - 2]! - 4 * z[i - 1]! + 6 * z[i]! - 4 * z[i + 1]! + z[i + 2]!) / 16;
    found.push({ k: c, v: c % 2 === 0 ? f : -f });
  }
  const last = found[found.length - 1];
  const tail = found.slice(-STEADY);
  if (last === undefined || tail.length < STEADY || tail.some((f) => f.v * last.v <= 0)) return undefined;
  const noise = Math.max(...points.slice(-(STEADY + 4)).map((p) => p.sigma));
  if (Math.abs(last.v) < Math.max(ALTERNATION, ABOVE_NOISE * noise)) return undefined;
  const growth = Math.abs(last.v / tail[0]!.v) ** (1 / (STEADY - 1));
  return { size: Math.abs(last.v), growth, k: last.k };
}

/** b_n = c_n/n! at a position t with exponent γ and unit strength: (γ)_n/(n! t^n), as logarithm and sign. */
function unit(t: number, exponent: number, n: number): { log: number; sign: number } {
  let sign = t < 0 && n % 2 === 1 ? -1 : 1;
  let log = -n * Math.log(Math.abs(t));
  for (let j = 0; j < n; j++) {
    const f = (exponent + j) / (j + 1);
    log += Math.log(Math.abs(f));
    if (f < 0) sign = -sign;
  }
  return { log, sign };
}

export interface FixedStrengths {
  readonly first: number;
  readonly second: number;
  /** Condition number of the scaled 2×2 system. */
  readonly condition: number;
}

export interface FixedPosition {
  readonly t: number;
  readonly exponent: number;
}

/** Strengths of two singularities with given positions and exponents from b_n and b_{n+1} = c/n! (logs and signs). */
export function fixedStrengths(a: FixedPosition, b: FixedPosition, last: readonly [Point, Point]): FixedStrengths | undefined {
  const rows = last.map((p) => {
    const u = unit(a.t, a.exponent, p.n);
    const v = unit(b.t, b.exponent, p.n);
    const scale = p.y - logGamma(p.n + 1);
    return { x: u.sign * Math.exp(u.log - scale), y: v.sign * Math.exp(v.log - scale), r: p.sign };
  });
  const [r1, r2] = [rows[0]!, rows[1]!];
  const cx = Math.hypot(r1.x, r2.x);
  const cy = Math.hypot(r1.y, r2.y);
  const [a11, a12, a21, a22] = [r1.x / cx, r1.y / cy, r2.x / cx, r2.y / cy];
  const det = a11 * a22 - a12 * a21;
  if (!(Math.abs(det) > 1e-14)) return undefined;
  const first = (r1.r * a22 - a12 * r2.r) / det / cx;
  const second = (a11 * r2.r - a21 * r1.r) / det / cy;
  // Columns of length one: the singular values are √(1 ± c), c the cosine between them.
  const c = Math.abs(a11 * a12 + a21 * a22);
  return { first, second, condition: Math.sqrt((1 + c) / (1 - c)) };
}

const g = (x: number, digits = 3): string => Number(x.toPrecision(digits)).toString();

/** (b) and (a) in words. */
export function alternationText(a: Alternation, dominant: 'same' | 'alternating'): string {
  const where = dominant === 'same' ? 'negative' : 'positive';
  const size = `the terms carry a (−1)^n admixture of relative size ${g(a.size, 2)} at n = ${a.k}`;
  const change = `changing by a factor ${g(a.growth, 2)} from order to order`;
  const meaning =
    a.growth > 1
      ? `a singularity on the ${where} axis is nearer than the one seen now and takes over at higher order`
      : `a second singularity lies on the ${where} axis, at about ${g(1 / a.growth, 2)} times the distance`;
  return `${size}, ${change}: ${meaning}`;
}

/** Orders where the sizes of two singular parts cross, looked for up to this order. */
const FARTHEST_CROSSING = 400;

function crossing(a: FixedPosition, sa: number, b: FixedPosition, sb: number, from: number): number | undefined {
  const lead = (n: number): number =>
    Math.log(Math.abs(sa)) + unit(a.t, a.exponent, n).log - Math.log(Math.abs(sb)) - unit(b.t, b.exponent, n).log;
  for (let n = from; n < FARTHEST_CROSSING; n++) if (lead(n) > 0) return n;
  return undefined;
}

/** (d) in words: nearest expected singularity of each sign. */
export function expectedText(points: readonly Point[], expected: GrowthInput['expected']): string | undefined {
  const nearest = (sign: number): FixedPosition | undefined => {
    const side = expected.filter((e) => Math.sign(e.t) === sign).sort((a, b) => Math.abs(a.t) - Math.abs(b.t));
    return side[0] === undefined ? undefined : { t: side[0].t, exponent: side[0].exponent ?? 1 };
  };
  const minus = nearest(-1);
  const plus = nearest(1);
  const [p, l] = [points[points.length - 2], points[points.length - 1]];
  if (minus === undefined || plus === undefined || p === undefined || l === undefined || p.k !== l.k - 1) return undefined;
  const s = fixedStrengths(minus, plus, [p, l]);
  if (s === undefined) return undefined;
  const head =
    `with the expected positions t = ${g(minus.t)} and ${g(plus.t)} the last two coefficients give the strengths ` +
    `${g(s.first)} and ${g(s.second)} (condition number ${g(s.condition, 2)})`;
  const [near, sn, far, sf] =
    Math.abs(minus.t) < plus.t ? [minus, s.first, plus, s.second] : [plus, s.second, minus, s.first];
  const takeover = crossing(near, sn, far, sf, l.n);
  if (takeover === undefined) return head;
  return takeover === l.n
    ? `${head}; the nearer one dominates already`
    : `${head}; the nearer one would dominate from n = ${takeover} on`;
}

/** (b): even and odd root ratios where they differ. */
export function evenOddText(ratio: readonly (number | undefined)[], differsBy: number): string | undefined {
  const last = ratio.length - 1;
  const [a, b, c] = [ratio[last], ratio[last - 1], ratio[last - 2]];
  if (a === undefined || b === undefined || c === undefined || a * b <= 0 || b * c <= 0) return undefined;
  const even = Math.sqrt(a * b);
  const odd = Math.sqrt(b * c);
  const difference = Math.abs(even / odd - 1);
  return difference < differsBy
    ? undefined
    : `the root ratios over two orders differ between even and odd n: ${g(even)} and ${g(odd)}`;
}

/** (c) in words. */
export function recurrenceText(positions: readonly [number, number]): string {
  return (
    `two poles through the last four Borel coefficients would stand at t = ${g(positions[0])} and ${g(positions[1])} ` +
    `(exact for poles, biased for branch points)`
  );
}
