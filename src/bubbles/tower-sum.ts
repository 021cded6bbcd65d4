/**
 * @module A functional of a whole component: single poles exactly, towers to the precision asked with a proved error.
 *
 * Method     alternating towers: poles near those of the kernel one by one, the rest by Chebyshev weights (alternating.ts);
 *            the exponentially small residual term by term. Geometric towers term by term.
 * Bound      alternating: mass of the parts times mass of the functional's moments over the rule's d; products of moment
 *            sequences are moment sequences. Residual and geometric sums: what is left out is below a geometric series.
 */
import { R } from '../numerics/index.js';
import type { Ball, Rational } from '../numerics/index.js';
import { alternatingLength, alternatingWeights, weightedSum } from './alternating.js';
import { wholeValue } from './functional.js';
import type { Functional } from './functional.js';
import { scalingOf } from './scaling.js';
import type { ScaledPole, Scaling } from './scaling.js';
import { factorBall } from './tower.js';
import type { Component, Tower } from './tower.js';

/** Longest sum of the residual, of a geometric tower: beyond it the result is given up as unknown. */
const LONGEST = 20_000;

const contract = (parts: readonly Ball[], values: readonly Ball[], prec: number): Ball =>
  parts.reduce<Ball>((sum, c, i) => (R.isExactZero(c) ? sum : R.add(sum, R.mul(c, values[i]!, prec), prec)), R.ZERO);

/** |ln(κ'/κ)|, rounded up. */
const logRatio = (base: Rational, natural: Rational): number =>
  Math.abs(Math.log(base.toNumber() / natural.toNumber())) * 1.0001;

/** Orders that occur in a tower. */
const ordersOf = (tower: Tower): number => tower.parts(0).length;

/** Masses of the parts when the scaling is κ' <= κ: each order gathers the higher ones with powers of ln(κ/κ'). */
function gathered(mass: readonly number[], log: number): number[] {
  return mass.map((_, i) => {
    let weight = 1;
    let sum = 0;
    for (let l = i; l < mass.length; l++) {
      if (l > i) weight *= log / (l - i);
      sum += mass[l]! * weight;
    }
    return sum;
  });
}

function alternatingTower(tower: Tower, f: Functional, scaling: Scaling, natural: Rational, prec: number): Ball {
  if (tower.decay.kind !== 'alternating') return R.ZERO;
  const orders = ordersOf(tower);
  const mass = gathered(tower.decay.mass, logRatio(scaling.base, natural));
  const poleAt = (k: number): ScaledPole => scaling.inTower(tower, k);
  const first = tower.first.toNumber();
  const total = (start: number, n: number): number =>
    mass.reduce((sum, m, i) => sum + m * f.mass(tower.side, first + start, i + 1, n), 0);

  let start = 0;
  while (!(total(start, 1) < Infinity) && start < 16) start++;
  const guess = alternatingLength(prec + 40);
  const variation = Math.log2(total(start, guess + 40));
  const weights = alternatingWeights(alternatingLength(prec + Math.max(0, variation)));
  const n = weights.c.length;

  let sum: Ball = R.ZERO;
  for (let k = 0; k < start; k++) {
    const pole = poleAt(k);
    sum = R.add(sum, contract(pole.parts, wholeValue(f, pole.at, orders, prec), prec), prec);
  }
  const terms = Array.from({ length: n }, (_, i): Ball => {
    const pole = poleAt(start + i);
    const term = contract(pole.parts, f.moments(pole.at, orders), prec);
    return (start + i) % 2 === 0 ? term : R.neg(term);
  });
  const tail = R.addError(
    weightedSum(terms, weights, prec),
    1,
    Math.ceil(Math.log2(total(start, n))) + 1 - weights.bits,
  );
  sum = R.add(sum, start % 2 === 0 ? tail : R.neg(tail), prec);
  if (f.residual === undefined || tower.side === 'ultraviolet') return sum;
  const residual = residualSum(poleAt, start, f.residual, orders, mass, prec);
  return R.add(sum, residual, prec);
}

function residualSum(
  poleAt: (k: number) => ScaledPole,
  start: number,
  residual: NonNullable<Functional['residual']>,
  orders: number,
  mass: readonly number[],
  prec: number,
): Ball {
  let sum: Ball = R.ZERO;
  for (let k = start; k < start + LONGEST; k++) {
    const pole = poleAt(k);
    const size = Math.abs(pole.at.toNumber());
    const rest = mass.reduce((s, m, i) => s + m * residual.bound(size, i + 1), 0) / (1 - residual.decay);
    if (rest < 2 ** -prec) return R.addError(sum, rest);
    sum = R.add(sum, contract(pole.parts, residual.at(pole.at, orders), prec), prec);
  }
  return R.INDETERMINATE;
}

function geometricTower(tower: Tower, f: Functional, scaling: Scaling, natural: Rational, prec: number): Ball {
  const { decay } = tower;
  if (decay.kind !== 'geometric') return R.ZERO;
  const orders = ordersOf(tower);
  const first = tower.first.toNumber();
  const weights = gathered(
    Array.from({ length: orders }, () => 1),
    logRatio(scaling.base, natural),
  );
  let sum: Ball = R.ZERO;
  for (let k = 0; k < LONGEST; k++) {
    if (k >= decay.from) {
      const size = weights.reduce((s, w, i) => s + w * f.bound(first + k, i + 1), 0);
      const rest = (decay.bound(k) * size) / (1 - decay.ratio);
      if (rest < 2 ** -prec) return R.addError(sum, rest);
    }
    const pole = scaling.inTower(tower, k);
    sum = R.add(sum, contract(pole.parts, wholeValue(f, pole.at, orders, prec), prec), prec);
  }
  return R.INDETERMINATE;
}

export interface SumOptions {
  /** κ in place of the component's own, not above it. */
  readonly base?: Rational;
  /** Only these towers and poles. */
  readonly side?: 'infrared' | 'ultraviolet';
}

/** factor · Σ over the poles. Poles at u = 0 count as ultraviolet. The functional has to know the kernel and κ^(−u). */
export function sumOver(component: Component, f: Functional, prec: number, options: SumOptions = {}): Ball {
  const base = options.base ?? component.base;
  const scaling = scalingOf(component, base, prec);
  const wanted = (side: 'infrared' | 'ultraviolet'): boolean => options.side === undefined || options.side === side;
  let sum: Ball = R.ZERO;
  for (const pole of component.poles) {
    if (!wanted(pole.at.sign() > 0 ? 'infrared' : 'ultraviolet')) continue;
    sum = R.add(sum, contract(scaling.pole(pole).parts, wholeValue(f, pole.at, pole.parts.length, prec), prec), prec);
  }
  for (const tower of component.towers) {
    if (!wanted(tower.side)) continue;
    const sumTower = tower.decay.kind === 'alternating' ? alternatingTower : geometricTower;
    sum = R.add(sum, sumTower(tower, f, scaling, component.base, prec), prec);
  }
  return R.mul(factorBall(component.factor, prec), sum, prec);
}
