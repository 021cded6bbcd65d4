/**
 * @module The (−1)^n admixture of a second singularity on the other side.
 *
 * Purpose    a weak singularity on the negative axis that is nearer than the leading one on the positive axis stays hidden
 *            at low order; its growing (−1)^n admixture shows first.
 * Method     the filter (1, −4, 6, −4, 1)/16 on ln|c_k| − ln Γ(qk+1) removes cubic polynomials and keeps (−1)^k.
 * Bound      indicative: size and growth at the last orders.
 * Reference  M. Beneke, Phys. Rept. 317 (1999) 1 (competition of ultraviolet and infrared renormalons; from memory).
 */
import { logGammaDouble } from '../numerics/index.js';
import type { Point } from './reading.js';
import { short } from './words.js';

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
  const z = points.map((p) => p.y - logGammaDouble(q * p.k + 1));
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

/** In words. */
export function alternationText(a: Alternation, dominant: 'same' | 'alternating'): string {
  const where = dominant === 'same' ? 'negative' : 'positive';
  const size = `the terms carry a (−1)^n admixture of relative size ${short(a.size, 2)} at n = ${a.k}`;
  const change = `changing by a factor ${short(a.growth, 2)} from order to order`;
  const meaning =
    a.growth > 1
      ? `a singularity on the ${where} axis is nearer than the one seen now and takes over at higher order`
      : `a second singularity lies on the ${where} axis, at about ${short(1 / a.growth, 2)} times the distance`;
  return `${size}, ${change}: ${meaning}`;
}
