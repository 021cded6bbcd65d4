/**
 * @module Coefficients c_n = n! [u^n] B(u) to any order: exact forms while they are short, enclosures always.
 *
 * Method     power series of the closed forms (taylor.ts); for the b → u width, whose real emission has none, the Taylor
 *            coefficients of the pole towers times those of 4^(−u) or sin(πu)/π and e^(5u/3).
 * Bound      everything is ball arithmetic with as many bits as it takes.
 */
import { R, Rational, ballField, exact, exactReal, log } from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';
import { formalRational, monomialsOf, mulSeries, rationalOfFormal } from '../qcd/index.js';
import type { Formal } from '../qcd/index.js';
import { FORMAL_CONSTANTS, ballConstants, exponential, sinc, symbolBall, timesFactorials } from './gamma-series.js';
import type { ConstantRing } from './gamma-series.js';
import { InversePowers, taylorAt } from './pole-values.js';
import type { Quantity } from './quantity.js';
import { subtractionSeries } from './taylor.js';
import type { Component } from './tower.js';
import { sumOver } from './tower-sum.js';

/** Bits of the first evaluation: what prescriptions ask for. */
const FIRST_BITS = 320;
const FIVE_THIRDS = Rational.of(5, 3);

/** 5/3 + ln(μ²/Q²). */
export function schemeExponent(ratio: Exact, prec: number): Ball {
  const own = R.fromRational(FIVE_THIRDS, prec);
  if (ratio.rational?.equals(Rational.ONE) === true) return own;
  return R.add(own, R.mul2exp(log(ratio.ball(prec), prec), 1), prec);
}

/** Laurent coefficients from u^(−2) on of κ^(−u) Σ (…), or of its product with sin(πu)/π. */
function componentSeries(component: Component, ring: ConstantRing<Ball>, length: number, prec: number): Ball[] {
  const powers = new InversePowers(prec);
  const list = Array.from({ length }, (_, n) => sumOver(component, taylorAt(n, powers, prec), prec));
  const singular = originParts(component, prec);
  // From u^(−3) on.
  const whole = [singular[2]!, singular[1]!, singular[0]!, ...list];
  if (component.kernel.kind === 'sine') return mulSeries(ring, whole, sinc(ring, length + 2), length + 2);
  const decay = component.base.equals(Rational.ONE) ? R.ZERO : R.neg(log(R.fromRational(component.base, prec), prec));
  return mulSeries(ring, whole, exponential(ring, decay, length + 3), length + 3).slice(1);
}

/** Parts of orders 1, 2, 3 of κ^u f(u) at u = 0, times the factor. */
function originParts(component: Component, prec: number): Ball[] {
  const parts = component.poles.find(({ at }) => at.isZero())?.parts ?? [];
  const lone: Component = { ...component, poles: [], towers: [] };
  return [1, 2, 3].map((order) => {
    if (order > parts.length) return R.ZERO;
    const pick = { ...lone, poles: [{ at: Rational.ZERO, parts }] };
    return sumOver(
      pick,
      {
        moments: (_at, orders) => Array.from({ length: orders }, (_, i) => (i + 1 === order ? R.ONE : R.ZERO)),
        mass: () => 0,
        bound: () => 0,
      },
      prec,
    );
  });
}

/** [u^n] of B for the quantities that are known by their poles alone. */
function fromPoles(quantity: Quantity, exponent: Ball, length: number, prec: number): Ball[] {
  const ring = ballConstants(ballField(prec), prec);
  let sum = Array.from({ length: length + 2 }, (): Ball => R.ZERO);
  for (const component of quantity.components) {
    const own = componentSeries(component, ring, length, prec);
    sum = sum.map((x, i) => R.add(x, own[i]!, prec));
  }
  const dressed = mulSeries(ring, sum, exponential(ring, exponent, length + 2), length + 2);
  // The poles at u = 0 cancel, but for that of G_0(u)/u.
  const regular = dressed.slice(2);
  if (quantity.subtraction === undefined) return regular;
  const weight = R.fromRational(quantity.subtraction, prec);
  return subtractionSeries(ring, length).map((g, n) => R.add(regular[n]!, R.mul(weight, g, prec), prec));
}

function borelCoefficients(quantity: Quantity, ratio: Exact, length: number, prec: number): Ball[] {
  const exponent = schemeExponent(ratio, prec);
  if (quantity.series === undefined) return fromPoles(quantity, exponent, length, prec);
  return quantity.series(ballConstants(ballField(prec), prec), exponent, length);
}

/** n! times each. */
function withFactorials(list: readonly Ball[], prec: number): Ball[] {
  let factorial = 1n;
  return list.map((c, n) => {
    if (n > 1) factorial *= BigInt(n);
    return R.mul(c, R.fromNumber(factorial), prec);
  });
}

const valueOf = (form: Formal): Exact => {
  const rational = rationalOfFormal(form);
  if (rational !== undefined) return exact(rational);
  return exactReal((prec) => {
    let sum: Ball = R.ZERO;
    for (const { powers, factor } of monomialsOf(form)) {
      let term = R.fromRational(factor, prec + 24);
      for (const [name, k] of powers)
        term = R.mul(term, R.powInt(symbolBall(name, prec + 24), k, prec + 24), prec + 24);
      sum = R.add(sum, term, prec + 24);
    }
    return sum;
  });
};

/** Exact forms of c_0 … c_(length−1) in π, γ (gE), ζ(3) (z3), …; fewer where only the first are known, undefined where no closed form is used, or μ ≠ Q. */
export function exactForms(quantity: Quantity, ratio: Exact, length: number): readonly Formal[] | undefined {
  if (ratio.rational?.equals(Rational.ONE) !== true) return undefined;
  if (quantity.series === undefined) return quantity.matched?.(length);
  return timesFactorials(quantity.series(FORMAL_CONSTANTS, formalRational(FIVE_THIRDS), length));
}

/** Lists kept, since studies ask for the same ones again and again. */
const KEPT = 8;
const kept = new Map<string, readonly Exact[]>();

/** c_0 … c_(length−1), rational where the quantity is, else enclosed to the precision asked. */
export function chainCoefficients(quantity: Quantity, length: number, ratio: Exact = exact(1)): readonly Exact[] {
  if (ratio.rational === undefined) return enclosed(quantity, length, ratio);
  const key = `${quantity.name} ${length} ${ratio.rational.toString()}`;
  const list = kept.get(key) ?? enclosed(quantity, length, ratio);
  if (kept.size >= KEPT) kept.clear();
  kept.set(key, list);
  return list;
}

function enclosed(quantity: Quantity, length: number, ratio: Exact): Exact[] {
  const rational = quantity.rational === true ? exactForms(quantity, ratio, length) : undefined;
  if (rational !== undefined) return rational.map(valueOf);
  let last: { readonly prec: number; readonly values: readonly Ball[] } | undefined;
  const at = (prec: number): readonly Ball[] => {
    for (let work = Math.max(FIRST_BITS, prec + 64) + 4 * length; last === undefined || last.prec < prec; work *= 2) {
      const values = withFactorials(borelCoefficients(quantity, ratio, length, work), work);
      const reached = Math.min(...values.map((v) => R.accuracyBits(v)));
      if (reached >= prec || work > 8 * prec + 4096) last = { prec: Math.max(prec, Math.min(reached, work)), values };
    }
    return last.values;
  };
  return Array.from({ length }, (_, n) => exactReal((prec) => at(prec)[n] ?? R.INDETERMINATE));
}
