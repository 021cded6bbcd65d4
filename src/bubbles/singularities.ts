/**
 * @module The Borel poles of a quantity as one list: position, order, exact residues, and what each contributes to the
 * imaginary part.
 *
 * Purpose    the components of a quantity share positions; kernels change orders: the sine removes one power at integers.
 * Method     Laurent series of sin(πu)/π · Σ w/(u−c) times the principal part. Poles have order 3 at most before the sine and
 *            2 behind it, so that only its first term counts: (−1)^p (u−p) at integers, (−1)^k/π at 1/2 + k.
 * Bound      exact: rational, or a rational over π for the static potential.
 */
import { R, Rational, exp, pi, toNumberExact } from '../numerics/index.js';
import type { Ball } from '../numerics/index.js';
import { logLength, overBeta } from './point.js';
import type { ChainPoint } from './point.js';
import type { Quantity } from './quantity.js';
import { factorBall, polesWithin } from './tower.js';
import type { Component, Factor, Pole } from './tower.js';

/** A pole of b(u) in B(u) = e^(5u/3) (μ²/Q²)^u b(u). */
export interface BorelPole {
  readonly u: Rational;
  readonly order: number;
  /** parts[m−1] π^pi multiplies (u − position)^(−m). */
  readonly parts: readonly Rational[];
  readonly pi: number;
}

/** Principal part of Σ_c w_c/(u−c) · Σ parts (u−at)^(−m) at `at`. */
function withPoles(kernel: Extract<Component['kernel'], { kind: 'sine' }>, { at, parts }: Pole): readonly Rational[] {
  if (kernel.poles.length === 0) return parts;
  const out = Array.from({ length: parts.length + 1 }, () => Rational.ZERO);
  for (const { at: c, weight } of kernel.poles) {
    const gap = c.sub(at);
    parts.forEach((part, i) => {
      const m = i + 1;
      if (gap.isZero()) out[m] = out[m]!.add(part.mul(weight));
      else for (let j = 1; j <= m; j++) out[j - 1] = out[j - 1]!.sub(part.mul(weight).mul(gap.pow(j - m - 1)));
    });
  }
  return out;
}

/** What the kernel leaves of a pole, and the powers of π that it brings. */
function behindKernel(component: Component, pole: Pole): { readonly parts: readonly Rational[]; readonly pi: number } {
  const { kernel, factor } = component;
  if (kernel.kind === 'plain') return { parts: pole.parts, pi: factor.pi };
  const parts = withPoles(kernel, pole);
  const floor = Number(pole.at.floor());
  const sign = Rational.of(floor % 2 === 0 ? 1 : -1);
  return pole.at.isInteger()
    ? { parts: parts.slice(1).map((p) => p.mul(sign)), pi: factor.pi }
    : { parts: parts.map((p) => p.mul(sign)), pi: factor.pi - 1 };
}

/** The poles with |u| <= reach, u ≠ 0, in order. */
export function borelPoles(quantity: Quantity, reach: number): BorelPole[] {
  const merged = new Map<string, { readonly u: Rational; readonly parts: Rational[]; pi: number }>();
  for (const component of quantity.components) {
    for (const pole of polesWithin(component, reach)) {
      if (pole.at.isZero()) continue;
      const { parts, pi: power } = behindKernel(component, pole);
      if (parts.every((p) => p.isZero())) continue;
      const key = pole.at.toString();
      const entry = merged.get(key) ?? { u: pole.at, parts: [], pi: power };
      parts.forEach((p, i) => {
        entry.parts[i] = (entry.parts[i] ?? Rational.ZERO).add(p.mul(component.factor.rational));
      });
      merged.set(key, entry);
    }
  }
  return [...merged.values()]
    .map(({ u, parts, pi: power }) => {
      const order = parts.findLastIndex((p) => !p.isZero()) + 1;
      return { u, order, parts: parts.slice(0, order), pi: power };
    })
    .filter(({ order }) => order > 0)
    .sort((a, b) => a.u.cmp(b.u));
}

const unitOf = (pole: BorelPole): Factor => ({ rational: Rational.ONE, pi: pole.pi });

/** −π (norm/β0) Res_p [e^(−Lu) b(u)], p > 0: the share of a pole in the imaginary part. */
export function imaginaryShare(quantity: Quantity, point: ChainPoint, pole: BorelPole, prec: number): Ball {
  const L = logLength(point, prec);
  let sum: Ball = R.ZERO;
  let weight = exp(R.neg(R.mul(L, R.fromRational(pole.u, prec), prec)), prec);
  pole.parts.forEach((part, i) => {
    if (i > 0) weight = R.div(R.mul(weight, R.neg(L), prec), R.fromNumber(i), prec);
    sum = R.add(sum, R.mul(weight, R.fromRational(part, prec), prec), prec);
  });
  const scale = R.mul(R.mul(pi(prec), overBeta(quantity, point, prec), prec), factorBall(unitOf(pole), prec), prec);
  return R.neg(R.mul(scale, sum, prec));
}

/** Strength of the most singular part with e^(5u/3)(μ²/Q²)^u, for (1 − u/p)^(−order). */
export function leadingStrength(pole: BorelPole, ratio: ChainPoint['ratio']): number {
  const u = pole.u.toNumber();
  const top = pole.parts[pole.order - 1]!.toNumber() * Math.PI ** pole.pi;
  return (top * Math.exp((5 / 3 + 2 * Math.log(toNumberExact(ratio))) * u)) / (-u) ** pole.order;
}
