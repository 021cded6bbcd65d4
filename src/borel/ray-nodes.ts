/**
 * @module Nodes of the double-exponential rule for ∫_0^∞ e^{−s} f(s) ds along a ray s = r e^{iθ}.
 *
 * Method     trapezoidal rule of step h in v, r = exp(v − e^{−v}): the integrand then falls double-exponentially both ways.
 *            The error falls like exp(−2π d/h), d the half-width of the strip about the real v axis in which the integrand
 *            is analytic: for singularities of f on the positive axis, d ≈ min(θ, π/2 − θ).
 *            The angles are those of Pythagorean triangles: e^{iθ} is rational. Nodes are made when first asked for and kept.
 * Reference  M. Mori, M. Sugihara, J. Comput. Appl. Math. 127 (2001) 287 (the map; from memory).
 */
import { C, cexp, exp, R, Rational } from '../numerics/index.js';
import type { Complex } from '../numerics/index.js';

export interface Ray {
  readonly name: string;
  readonly cos: Rational;
  readonly sin: Rational;
  /** Radians. */
  readonly angle: number;
}

function pythagorean(cos: number, sin: number, over: number): Ray {
  return {
    name: `${cos}/${sin}`,
    cos: Rational.of(cos, over),
    sin: Rational.of(sin, over),
    angle: Math.atan2(sin, cos),
  };
}

/** The positive axis itself, for integrands with nothing on it. */
export const AXIS: Ray = pythagorean(1, 0, 1);
/** Angles offered, steepest first: 43.6°, 28.1°, 16.3°, 8.2°. */
export const RAYS: readonly Ray[] = [
  pythagorean(21, 20, 29),
  pythagorean(15, 8, 17),
  pythagorean(24, 7, 25),
  pythagorean(195, 28, 197),
];

export interface RayNode {
  readonly s: Complex;
  /** e^{−s} ds/dv. */
  readonly weight: Complex;
}

function makeNode(ray: Ray, j: number, steps: number, prec: number): RayNode {
  const v = R.fromRational(Rational.of(j, steps), prec);
  const inner = exp(R.neg(v), prec);
  const r = exp(R.sub(v, inner, prec), prec);
  const turn: Complex = { re: R.fromRational(ray.cos, prec), im: R.fromRational(ray.sin, prec) };
  const s = C.mulReal(turn, r, prec);
  // dr/dv = r (1 + e^{−v}).
  const slope = C.mulReal(s, R.add(R.ONE, inner, prec), prec);
  return { s, weight: C.mul(slope, cexp(C.neg(s), prec), prec) };
}

/** All nodes v = j/steps of one ray at one precision. */
export class RayNodes {
  private readonly nodes = new Map<string, RayNode>();
  private readonly ray: Ray;
  private readonly prec: number;

  constructor(ray: Ray, prec: number) {
    this.ray = ray;
    this.prec = prec;
  }

  at(j: number, steps: number): RayNode {
    const key = `${j}/${steps}`;
    let node = this.nodes.get(key);
    if (node === undefined) {
      node = makeNode(this.ray, j, steps, this.prec);
      this.nodes.set(key, node);
    }
    return node;
  }
}

const cache = new Map<string, RayNodes>();
/** Node sets kept; a session asks for a handful. */
const KEPT = 24;

/** The node set of a ray at a precision, shared by all integrals of the process. */
export function rayNodes(ray: Ray, prec: number): RayNodes {
  const key = `${ray.name} ${prec}`;
  let found = cache.get(key);
  if (found === undefined) {
    if (cache.size >= KEPT) cache.clear();
    found = new RayNodes(ray, prec);
    cache.set(key, found);
  }
  return found;
}

/** Share of the strip's half-width counted on; the map narrows it at small r. Heuristic: the level check has the last word. */
const STRIP_USED = 0.9;

/** Step count (1/h) that should bring 2^-bits, from the width of the analytic strip. */
export function stepsFor(ray: Ray, bits: number): number {
  const width = ray === AXIS ? Math.PI / 2 : Math.min(ray.angle, Math.PI / 2 - ray.angle);
  return Math.max(4, Math.ceil((bits * Math.LN2) / (2 * Math.PI * STRIP_USED * width)));
}
