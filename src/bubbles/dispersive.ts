/**
 * @module The massive-gluon function of a bubble chain: r(z), the one-loop correction with a gluon of mass² zQ².
 *
 *   b(u) = −(sin πu/π) ∫_0^∞ dz z^(−1−u) r(z),  r(z) = ∫ dτ w(τ)/(τ+z) for a Euclidean quantity,
 *   R_PV = R_cont + (norm/β0)[Re r(−τ_L) − r(0)],  R_cont = −(norm/β0) ∫ dy r′(y) A(y),
 *   y = ln z, A(y) = 1/2 − arctan((y+L)/π)/π: r under the spectral density of the effective coupling.
 * A term √z, z ln z, z^(3/2), … of r at small z is an infrared pole of b.
 *
 * Method     r(z) − r(0): plain kernels by a Mellin–Barnes integral along Re u = 1/4, −(1/2i) ∫ du b(u) z^u/sin πu, by the
 *            trapezoidal rule in y; sine kernels by their poles, z < 1 and z > 1 apart, as for distributions.
 *            R_cont: Gauss–Legendre panels in y for the plain kernels; for the others the moments of pole-integral.ts are it.
 * Bound      converged: the rule of half the step is compared; relative 1e-10 or better.
 * Reference  P. Ball, M. Beneke, V. M. Braun, Nucl. Phys. B 452 (1995) 563, hep-ph/9502300; Yu. L. Dokshitzer,
 *            G. Marchesini, B. R. Webber, Nucl. Phys. B 469 (1996) 93 (from memory).
 */
import { R, Rational } from '../numerics/index.js';
import type { Ball } from '../numerics/index.js';
import { withKernelPoles } from './functional.js';
import { gaussLegendre } from './gauss-legendre.js';
import { finitePoles, onLine } from './line-values.js';
import type { Point } from './line-values.js';
import { logLength, overBeta } from './point.js';
import type { ChainPoint } from './point.js';
import { sineLaplace } from './pole-integral.js';
import { distributionAt } from './pole-values.js';
import type { Quantity } from './quantity.js';
import type { Component, SineKernel } from './tower.js';
import { sumOver } from './tower-sum.js';

/** Line of the Mellin–Barnes integral: between the pole at 0 and the first infrared one. */
const LINE = 0.25;
/** Step and end along the line; both leave an error below 1e-15. */
const STEP = 0.04;
const END = 13;
/** Bits of the sums over poles. */
const BITS = 64;

const NODES = Array.from({ length: Math.ceil(END / STEP) }, (_, j) => j * STEP);

/** π/sin(π(c+iy)) times b, times the weight of the node. */
function lineWeights(component: Component): Point[] {
  return onLine(component, LINE, NODES).map(({ re, im }, j) => {
    const y = Math.PI * NODES[j]!;
    const [s, c] = [Math.sin(Math.PI * LINE) * Math.cosh(y), Math.cos(Math.PI * LINE) * Math.sinh(y)];
    const norm = s * s + c * c;
    const [ir, ii] = [s / norm, -c / norm];
    const weight = j === 0 ? STEP / 2 : STEP;
    return { re: weight * (re * ir - im * ii), im: weight * (re * ii + im * ir) };
  });
}

/** −Re Σ g z^(1/4+iy), or its derivative in ln z. */
function alongLine(weights: readonly Point[], logZ: number, slope: boolean): number {
  let sum = 0;
  weights.forEach(({ re, im }, j) => {
    const y = NODES[j]!;
    const [c, s] = [Math.cos(y * logZ), Math.sin(y * logZ)];
    const [zr, zi] = [re * c - im * s, re * s + im * c];
    sum += slope ? LINE * zr - y * zi : zr;
  });
  return -sum * Math.exp(LINE * logZ);
}

export interface MassiveGluon {
  /** r(z) − r(0) in units of the norm, at z = e^(logZ). */
  difference(logZ: number): number;
  /** R_cont, the part that needs no contour, at a point; undefined where a mass is subtracted. */
  continued(point: ChainPoint): number | undefined;
}

interface Part {
  difference(logZ: number): number;
  /** Derivative in ln z; where it is absent, `continued` gives the integral over it. */
  slope?(logZ: number): number;
  continued?(L: Ball): number;
}

function plainPart(component: Component): Part {
  const { rest } = component;
  if (rest !== undefined) {
    return {
      difference: (logZ) => rest.massiveGluon(logZ).difference,
      slope: (logZ) => rest.massiveGluon(logZ).slope,
    };
  }
  const weights = lineWeights(component);
  return { difference: (logZ) => alongLine(weights, logZ, false), slope: (logZ) => alongLine(weights, logZ, true) };
}

/** sin(πu)/π alone: r is the sum over the poles p > 0 for z < 1, and minus that over the others for z > 1. */
function sinePart(component: Component): Part {
  const poles = finitePoles(component);
  const sum = (logZ: number, slope: boolean): number => {
    let total = 0;
    for (const { at, parts } of poles) {
      if (at > 0 !== logZ < 0) continue;
      let power = Math.exp(at * logZ);
      let own = 0;
      parts.forEach((part, i) => {
        // z^at (ln z)^i/i!, or its derivative.
        const factor = slope ? at * power + (i === 0 ? 0 : (power * i) / logZ) : power;
        own += part * factor;
        power *= logZ / (i + 1);
      });
      total += at > 0 ? own : -own;
    }
    return total;
  };
  return { difference: (logZ) => sum(logZ, false), slope: (logZ) => sum(logZ, true) };
}

/** A sine kernel with poles: by the functionals of the towers. */
function contourPart(component: Component, kernel: SineKernel): Part {
  return {
    difference(logZ) {
      const bare = distributionAt(Rational.fromNumber(Math.exp(logZ)), BITS);
      return -R.toNumber(sumOver(component, withKernelPoles(bare, kernel, BITS), BITS));
    },
    continued(L) {
      const { residual: _residual, ...moments } = sineLaplace(L, BITS);
      return R.toNumber(sumOver(component, withKernelPoles(moments, kernel, BITS), BITS));
    },
  };
}

function partOf(component: Component): Part {
  const { kernel } = component;
  if (kernel.kind === 'plain') return plainPart(component);
  return kernel.poles.length === 0 ? sinePart(component) : contourPart(component, kernel);
}

/** The massive-gluon function of a quantity. */
export function massiveGluon(quantity: Quantity): MassiveGluon {
  const parts = quantity.components.map(partOf);
  return {
    difference: (logZ) => parts.reduce((sum, part) => sum + part.difference(logZ), 0),
    continued(point) {
      // A subtracted mass leaves a logarithm at large z that the formula has no place for.
      if (quantity.subtraction !== undefined) return undefined;
      const L = logLength(point, BITS);
      const length = R.toNumber(L);
      const slope = (y: number): number => parts.reduce((sum, part) => sum + (part.slope?.(y) ?? 0), 0);
      const rest = parts.reduce((sum, part) => sum + (part.continued?.(L) ?? 0), 0);
      const own = parts.every((part) => part.slope === undefined) ? 0 : panels((y) => -slope(y) * density(y, length));
      return R.toNumber(overBeta(quantity, point, BITS)) * (own + rest);
    },
  };
}

/** A(y). */
const density = (y: number, L: number): number => 0.5 - Math.atan((y + L) / Math.PI) / Math.PI;

/** Range and width of the panels in ln z: r′ falls off like √z and 1/z at least. */
const RANGE = { from: -72, to: 40, width: 2 } as const;

function panels(f: (y: number) => number): number {
  const rule = gaussLegendre(16, BITS).map(({ x, weight }) => ({ x: R.toNumber(x), weight: R.toNumber(weight) }));
  let sum = 0;
  for (let start = RANGE.from; start < RANGE.to; start += RANGE.width) {
    for (const { x, weight } of rule) sum += weight * f(start + (RANGE.width / 2) * (1 + x));
  }
  return (sum * RANGE.width) / 2;
}
