/**
 * @module Laplace integrals along a ray in double-double arithmetic.
 *
 * Purpose    the same integral as in ray.ts at a tenth of the cost, for up to MOST_DIGITS digits.
 * Method     the same rule and nodes. Each value comes with what it has lost, in units of the last bits; the losses are added
 *            up with the terms, and when they take a digit that is wanted there is no answer (balls then give it).
 * Bound      the estimated losses times SAFETY, beside the level error of ray-levels.ts: converged, not certified.
 */
import { C, DoubleDouble as D, R } from '../numerics/index.js';
import type { Ball, Complex } from '../numerics/index.js';
import { quadratureBits, refine, sweep } from './ray-levels.js';
import type { Ray } from './ray-nodes.js';

const Z = D.complex;
export type QuickComplex = D.complex.Complex;

/** A value and what it has lost: its relative error in units of D.UNIT. */
export interface Lossy {
  readonly value: QuickComplex;
  readonly lost: number;
}

/** Values of the Borel transforms at t = x s. */
export type QuickIntegrand = (s: QuickComplex) => readonly Lossy[];

/** Digits up to which double-double arithmetic is tried. */
export const MOST_DIGITS = 24;
/** Bits of the sums where they go on as balls. */
const PREC = 128;
/** Factor on the estimated rounding errors. Heuristic. */
const SAFETY = 8;
/** What a node and a product lose, in units. */
const NODE_LOSS = 64;

interface Node {
  readonly s: QuickComplex;
  readonly weight: QuickComplex;
}

function makeNode(turn: QuickComplex, j: number, steps: number): Node {
  const v = D.div(D.fromNumber(j), D.fromNumber(steps));
  const inner = D.exp(D.neg(v));
  const s = Z.mulReal(turn, D.exp(D.sub(v, inner)));
  const slope = Z.mulReal(s, D.add(inner, D.fromNumber(1)));
  return { s, weight: Z.mul(slope, Z.exp(Z.neg(s))) };
}

const cache = new Map<string, Map<number, Node>>();
/** Levels of nodes kept; a session asks for some dozens. */
const KEPT = 128;

/** The nodes j/steps of a ray, kept for the next integral. */
function nodesOf(ray: Ray, steps: number): (j: number) => Node {
  const key = `${ray.name} ${steps}`;
  const list = cache.get(key) ?? new Map<number, Node>();
  if (cache.size >= KEPT) cache.clear();
  cache.set(key, list);
  const part = (q: Ray['cos']): D.DoubleDouble => D.fromBall(R.fromRational(q, PREC));
  const turn = { re: part(ray.cos), im: part(ray.sin) };
  return (j) => {
    const known = list.get(j);
    if (known !== undefined) return known;
    const node = makeNode(turn, j, steps);
    list.set(j, node);
    return node;
  };
}

/** As rayIntegral of ray.ts; undefined also where the digits are beyond this arithmetic. */
export function quickIntegral(
  f: QuickIntegrand,
  ray: Ray,
  digits: number,
  origin: Ball = R.ZERO,
): readonly Complex[] | undefined {
  if (digits > MOST_DIGITS) return undefined;
  const bits = quadratureBits(digits);
  const from = D.fromBall(origin);
  const negligible = 2 ** -(bits + 16);
  const level = (steps: number, odd: boolean): readonly Complex[] | undefined => {
    let sums: QuickComplex[] = [];
    let errors: number[] = [];
    let largest: number[] = [];
    const nodeAt = nodesOf(ray, steps);
    const visit = (j: number): 'negligible' | 'counts' | 'fails' => {
      const { s, weight } = nodeAt(j);
      const values = f({ re: D.add(s.re, from), im: s.im });
      if (sums.length === 0) {
        sums = values.map(() => Z.ZERO);
        errors = values.map(() => 0);
        largest = values.map(() => 0);
      }
      let quiet = true;
      for (let i = 0; i < values.length; i++) {
        const { value, lost } = values[i]!;
        const term = Z.mul(value, weight);
        const size = Z.size(term);
        if (!(size < Infinity && lost < Infinity)) return 'fails';
        sums[i] = Z.add(sums[i]!, term);
        errors[i] = errors[i]! + size * (lost + NODE_LOSS);
        largest[i] = Math.max(largest[i]!, size);
        if (size > largest[i]! * negligible) quiet = false;
      }
      return quiet ? 'negligible' : 'counts';
    };
    if (!sweep(visit, steps, odd)) return undefined;
    return sums.map((sum, i) => {
      const radius = errors[i]! * SAFETY * D.UNIT;
      return { re: R.addError(D.toBall(sum.re), radius), im: R.addError(D.toBall(sum.im), radius) };
    });
  };
  return refine(level, ray, bits, PREC);
}

/** What an enclosure as wide as this, relatively, costs is nothing beside the other losses. */
const SHARP = -112;

/** Double-doubles of enclosures; undefined where one is too wide, or too large, for them. */
export function quickReals(list: readonly Ball[]): D.DoubleDouble[] | undefined {
  const sharp = list.every((x) => R.isExactZero(x) || R.radiusBits(x) <= R.upperBits(x) + SHARP);
  if (!sharp) return undefined;
  const found = list.map(D.fromBall);
  return found.every(([high]) => Number.isFinite(high)) ? found : undefined;
}

/** As quickReals, for complex numbers: wide relative to the modulus, or to 2^floor where that is larger. */
export function quickComplexes(list: readonly Complex[], floor = -Infinity): QuickComplex[] | undefined {
  const sharp = list.every((z) => {
    const allowed = Math.max(floor, C.upperBits(z)) + SHARP;
    return allowed === -Infinity || Math.max(R.radiusBits(z.re), R.radiusBits(z.im)) <= allowed;
  });
  if (!sharp) return undefined;
  const found = list.map(Z.fromBall);
  return found.every((z) => Number.isFinite(Z.size(z))) ? found : undefined;
}
