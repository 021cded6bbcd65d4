/**
 * @module A component on a vertical line of the Borel plane, in doubles.
 *
 * Purpose    Mellin–Barnes integrals of the massive-gluon function, which decay like e^(−π|y|) along the line.
 * Method     pole by pole; towers by the Chebyshev weights of alternating.ts, whose moments 1/(p − u) converge for Re u < p.
 * Bound      rounding of doubles: relative 1e-13 or so where |b| is not small. Converged, not certified.
 */
import { R } from '../numerics/index.js';
import { alternatingWeights } from './alternating.js';
import { scalingOf } from './scaling.js';
import { factorBall } from './tower.js';
import type { Component } from './tower.js';

export interface Point {
  readonly re: number;
  readonly im: number;
}

/** Terms of a tower for the digits of doubles. */
const TERMS = 24;
/** Of a tower that falls off like 4^(−k). */
const GEOMETRIC_TERMS = 28;
const LINE_BITS = 64;

export interface Residue {
  readonly at: number;
  readonly parts: readonly number[];
}

/** All poles of a component with the weights that sum its towers, scaled by κ^p. */
function weighted(component: Component): Residue[] {
  const scaling = scalingOf(component, component.base, LINE_BITS);
  const factor = R.toNumber(factorBall(component.factor, LINE_BITS));
  const entry = (
    at: { toNumber(): number },
    parts: readonly Parameters<typeof R.toNumber>[0][],
    by: number,
  ): Residue => ({
    at: at.toNumber(),
    parts: parts.map((p) => R.toNumber(p) * by * factor),
  });
  const list = component.poles.map((pole) => entry(pole.at, scaling.pole(pole).parts, 1));
  const { c, d } = alternatingWeights(TERMS);
  for (const tower of component.towers) {
    const count = tower.decay.kind === 'geometric' ? GEOMETRIC_TERMS : TERMS;
    for (let k = 0; k < count; k++) {
      const pole = scaling.inTower(tower, k);
      // c_k already alternates.
      const weight = tower.decay.kind === 'geometric' ? 1 : (Number(c[k]) / Number(d)) * (k % 2 === 0 ? 1 : -1);
      list.push(entry(pole.at, pole.parts, weight));
    }
  }
  return list;
}

/** The poles of a component whose towers fall off geometrically, to the digits of doubles. */
export function finitePoles(component: Component): readonly Residue[] {
  return weighted(component);
}

/** b at re + iy for each y, kernel left out. */
export function onLine(component: Component, re: number, ys: readonly number[]): Point[] {
  const poles = weighted(component);
  const logBase = Math.log(component.base.toNumber());
  return ys.map((y) => {
    let [sumRe, sumIm] = [0, 0];
    for (const { at, parts } of poles) {
      const x = re - at;
      const norm = x * x + y * y;
      const [ir, ii] = [x / norm, -y / norm];
      let [pr, pi] = [ir, ii];
      for (const part of parts) {
        sumRe += part * pr;
        sumIm += part * pi;
        [pr, pi] = [pr * ir - pi * ii, pr * ii + pi * ir];
      }
    }
    const size = Math.exp(-re * logBase);
    const [cr, ci] = [size * Math.cos(y * logBase), -size * Math.sin(y * logBase)];
    return { re: sumRe * cr - sumIm * ci, im: sumRe * ci + sumIm * cr };
  });
}
