/**
 * @module Borel transforms by their poles: what one looks like when it is taken apart.
 *
 *   b(u) = factor · K(u) · [κ^(−u) Σ_p (principal part of κ^u f(u) at p) + rest(u)],
 *
 * K the kernel: 1, or sin(πu)/π times simple poles, which a contour integral over an Adler function gives; f meromorphic
 * with rational principal parts. The sum runs over single poles and over towers p = ±(first + k), k = 0, 1, 2, …; κ is
 * chosen so that it converges: then κ^u f(u) vanishes at infinity between the poles, and rest = 0, for all but one quantity.
 */
import { R, Rational, pi } from '../numerics/index.js';
import type { Ball } from '../numerics/index.js';

/** Σ_m parts[m−1] (u − at)^(−m). */
export interface Pole {
  readonly at: Rational;
  readonly parts: readonly Rational[];
}

/** How the parts of a tower behave when they are scaled by κ^p: it decides how they are summed and what proves the error. */
export type Decay =
  /** (−1)^k times moments ∫_0^1 x^k dμ; mass[m−1] bounds ∫|dμ| for the parts of order m. */
  | { readonly kind: 'alternating'; readonly mass: readonly number[] }
  /** |parts at k| <= bound(k), and bound(k+1) <= ratio · bound(k) from k = from on. */
  | { readonly kind: 'geometric'; readonly ratio: number; readonly from: number; bound(k: number): number };

export interface Tower {
  /** infrared: p > 0; ultraviolet: p < 0. */
  readonly side: 'infrared' | 'ultraviolet';
  /** |p| of k = 0; the step is 1. */
  readonly first: Rational;
  /** Principal part of f at k. */
  parts(k: number): readonly Rational[];
  readonly decay: Decay;
}

/** sin(πu)/π · Σ weight/(u − at), the `at` integers; an empty list means sin(πu)/π alone. */
export interface SineKernel {
  readonly kind: 'sine';
  readonly poles: readonly { readonly at: Rational; readonly weight: Rational }[];
}

export type Kernel = { readonly kind: 'plain' } | SineKernel;

export const PLAIN: Kernel = { kind: 'plain' };

/** A part of f that the poles do not show; of the plain kernel only. */
export interface Rest {
  /** ∫_0^∞ e^(−Lu) rest(u) du, times the factor of the component. */
  laplace(L: Ball, prec: number): Ball;
  /** The whole distribution w(τ) of the component, poles included. */
  distribution(tau: Rational, prec: number): Ball;
  /** r(z) − r(0) of the whole component, and its slope in ln z, in doubles. */
  massiveGluon(logZ: number): { readonly difference: number; readonly slope: number };
}

/** rational · π^pi. */
export interface Factor {
  readonly rational: Rational;
  readonly pi: number;
}

export const UNIT: Factor = { rational: Rational.ONE, pi: 0 };

export function factorBall({ rational, pi: power }: Factor, prec: number): Ball {
  const value = R.fromRational(rational, prec);
  if (power === 0) return value;
  const powered = R.powInt(pi(prec), Math.abs(power), prec);
  return power > 0 ? R.mul(value, powered, prec) : R.div(value, powered, prec);
}

export interface Component {
  readonly factor: Factor;
  readonly kernel: Kernel;
  /** κ. */
  readonly base: Rational;
  readonly poles: readonly Pole[];
  readonly towers: readonly Tower[];
  readonly rest?: Rest;
}

/** The parts of a tower, each worked out once. */
export function remembered(parts: Tower['parts']): Tower['parts'] {
  const list: (readonly Rational[])[] = [];
  return (k) => {
    for (let n = list.length; n <= k; n++) list.push(parts(n));
    return list[k]!;
  };
}

/** Position of the k-th pole of a tower. */
export function placeOf(tower: Tower, k: number): Rational {
  const size = tower.first.add(Rational.of(k));
  return tower.side === 'infrared' ? size : size.neg();
}

/** The poles of a component up to |u| = reach, ordered by position; single poles and towers together. */
export function polesWithin(component: Component, reach: number): Pole[] {
  const inTowers = component.towers.flatMap((tower) => {
    const found: Pole[] = [];
    for (let k = 0; tower.first.toNumber() + k <= reach; k++)
      found.push({ at: placeOf(tower, k), parts: tower.parts(k) });
    return found;
  });
  const single = component.poles.filter(({ at }) => Math.abs(at.toNumber()) <= reach);
  return [...single, ...inTowers].sort((a, b) => a.at.cmp(b.at));
}
