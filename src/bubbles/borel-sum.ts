/**
 * @module The Borel sum of a bubble chain: principal value and imaginary part, certified to any number of digits.
 *
 *   R_PV = (norm/β0) PV ∫_0^∞ du e^(−u/a) B(u),  Im R = −π (norm/β0) Σ_{p>0} Res_p [e^(−u/a) B(u)] (contour above the axis).
 *
 * Method     pole by pole, tower by tower, in closed form (pole-integral.ts, tower-sum.ts). Poles at u = 0 enter by finite
 *            parts; their sum vanishes in every quantity.
 * Bound      enclosures throughout.
 */
import { R, Rational, log, pi } from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';
import type { Functional } from './functional.js';
import { withKernelPoles } from './functional.js';
import { subtractionLaplace } from './mass-subtraction.js';
import { plainLaplace, plainResidue, sineLaplace, sineResidue } from './pole-integral.js';
import { couplingA, logLength, overBeta, sharpened } from './point.js';
import type { ChainPoint } from './point.js';
import type { Quantity } from './quantity.js';
import type { Component } from './tower.js';
import { sumOver } from './tower-sum.js';
import type { SumOptions } from './tower-sum.js';

export interface ChainSum {
  readonly pv: Exact;
  /** Imaginary part of the sum above the positive axis. */
  readonly im: Exact;
}

/** The Laplace or residue functional of a component scaled by κ: with the kernel in it. */
function functionalOf(
  component: Component,
  kind: 'laplace' | 'residue',
  L: Ball,
  base: Rational,
  prec: number,
): Functional {
  const shifted = base.equals(Rational.ONE) ? L : R.add(L, log(R.fromRational(base, prec), prec), prec);
  const { kernel } = component;
  if (kernel.kind === 'plain') return (kind === 'laplace' ? plainLaplace : plainResidue)(shifted, prec);
  return withKernelPoles((kind === 'laplace' ? sineLaplace : sineResidue)(shifted, prec), kernel, prec);
}

/** PV ∫ e^(−Lu) or Σ Res e^(−Lu), of one component, over all its poles or some (κ with SumOptions). */
export function componentIntegral(
  component: Component,
  kind: 'laplace' | 'residue',
  L: Ball,
  prec: number,
  options: SumOptions = {},
): Ball {
  const functional = functionalOf(component, kind, L, options.base ?? component.base, prec);
  return sumOver(component, functional, prec, options);
}

function integral(quantity: Quantity, point: ChainPoint, prec: number): Ball {
  const L = logLength(point, prec);
  let sum: Ball = R.ZERO;
  for (const component of quantity.components) {
    sum = R.add(sum, componentIntegral(component, 'laplace', L, prec), prec);
    if (component.rest !== undefined) {
      // The factor of the component is in `rest` already.
      sum = R.add(sum, component.rest.laplace(L, prec), prec);
    }
  }
  if (quantity.subtraction !== undefined) {
    const weight = R.fromRational(quantity.subtraction, prec);
    sum = R.add(sum, R.mul(weight, subtractionLaplace(couplingA(point, prec), prec), prec), prec);
  }
  return R.mul(overBeta(quantity, point, prec), sum, prec);
}

function imaginary(quantity: Quantity, point: ChainPoint, prec: number): Ball {
  const L = logLength(point, prec);
  const sum = quantity.components.reduce<Ball>(
    (total, component) => R.add(total, componentIntegral(component, 'residue', L, prec), prec),
    R.ZERO,
  );
  return R.neg(R.mul(pi(prec), R.mul(overBeta(quantity, point, prec), sum, prec), prec));
}

/** Principal value and imaginary part at a point that rangeObjection lets pass. */
export const chainSum = (quantity: Quantity, point: ChainPoint): ChainSum => ({
  pv: sharpened((prec) => integral(quantity, point, prec)),
  im: sharpened((prec) => imaginary(quantity, point, prec)),
});
