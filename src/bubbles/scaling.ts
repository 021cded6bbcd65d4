/**
 * @module The principal parts of κ^u f(u), in balls: κ^p Σ_l c_l (ln κ)^(l−m)/(l−m)! from the parts c_l of f at p.
 *
 * They are the same for every integral over a component, so that they are kept for the last few pairs of κ and precision.
 */
import { R, Rational, log, pow } from '../numerics/index.js';
import type { Ball } from '../numerics/index.js';
import { placeOf } from './tower.js';
import type { Component, Pole, Tower } from './tower.js';

/** Parts in balls; weights[m−1] multiplies (u − at)^(−m). */
export interface ScaledPole {
  readonly at: Rational;
  readonly parts: readonly Ball[];
}

/** Scalings kept for a component. */
const KEPT = 4;

export class Scaling {
  readonly base: Rational;
  readonly prec: number;
  private readonly logBase: Ball;
  private readonly towers = new Map<Tower, ScaledPole[]>();
  private readonly poles = new Map<Pole, ScaledPole>();

  constructor(base: Rational, prec: number) {
    this.base = base;
    this.prec = prec;
    this.logBase = base.equals(Rational.ONE) ? R.ZERO : log(R.fromRational(base, prec), prec);
  }

  /** A pole outside the towers. */
  pole(pole: Pole): ScaledPole {
    const have = this.poles.get(pole) ?? this.scaled(pole);
    this.poles.set(pole, have);
    return have;
  }

  /** The k-th pole of a tower. */
  inTower(tower: Tower, k: number): ScaledPole {
    const list = this.towers.get(tower) ?? [];
    this.towers.set(tower, list);
    for (let n = list.length; n <= k; n++) list.push(this.scaled({ at: placeOf(tower, n), parts: tower.parts(n) }));
    return list[k]!;
  }

  private power(at: Rational): Ball {
    if (this.base.equals(Rational.ONE)) return R.ONE;
    const base = R.fromRational(this.base, this.prec);
    return at.isInteger()
      ? R.powInt(base, Number(at.num), this.prec)
      : pow(base, R.fromRational(at, this.prec), this.prec);
  }

  private scaled({ at, parts }: Pole): ScaledPole {
    const { prec } = this;
    const power = this.power(at);
    const scaled = parts.map((_, i) => {
      let sum: Ball = R.ZERO;
      let weight: Ball = power;
      for (let l = i; l < parts.length; l++) {
        if (l > i) weight = R.div(R.mul(weight, this.logBase, prec), R.fromNumber(l - i), prec);
        sum = R.add(sum, R.mul(weight, R.fromRational(parts[l]!, prec), prec), prec);
      }
      return sum;
    });
    return { at, parts: scaled };
  }
}

const kept = new WeakMap<Component, Scaling[]>();

/** The scaling of a component by κ = base. */
export function scalingOf(component: Component, base: Rational, prec: number): Scaling {
  const list = kept.get(component) ?? [];
  const have = list.find((s) => s.prec === prec && s.base.equals(base)) ?? new Scaling(base, prec);
  kept.set(component, [have, ...list.filter((s) => s !== have)].slice(0, KEPT));
  return have;
}
