/**
 * @module Quadratic Hermite–Padé approximants of the Borel transform.
 *
 * P + Q B + R B² = O(t^N), p + q + r + 2 = N, degrees as equal as can be (up to three members). Square-root branch points of its
 * own; summed along a rotated ray below every complex one. Truncation error: neighbours and order before.
 * Reference: R. E. Shafer, SIAM J. Numer. Anal. 11 (1974) 447; G. A. Baker, P. Graves-Morris (1996) ch. 8 (from memory).
 */
import { C } from '../numerics/index.js';
import type { Complex } from '../numerics/index.js';
import {
  borelTransform,
  quadraticApproximant,
  quadraticDegrees,
  quadraticPoles,
  quadraticQuick,
  quadraticValue,
} from '../borel/index.js';
import type { Growth } from '../growth/index.js';
import type { Expansion } from '../series/index.js';
import { cleanPart, growthObjection, inputObjection } from './eligibility.js';
import type { Outcome, Prescription } from './prescription.js';
import type { Attempt, Offer } from './ray-family.js';
import { nearestDistance, rayFamily } from './ray-family.js';

/** Most coefficients used. Heuristic: cost of the null vector. */
const MOST = 44;
/** A singularity nearer than this fraction of the nearest known one is where none may be. Heuristic. */
const INSIDE = 0.7;
/** Branch points nearer to each other than this, relatively, cancel: the rest is of the order of its square. Heuristic. */
const TWINS = 1e-3;
/** Bits that decide which zeros of R are poles. */
const POLE_BITS = 96;

function build(e: Expansion, growth: Growth, bits: number): readonly Offer[] {
  const b = borelTransform(e.coefficients);
  const nearest = nearestDistance(e, growth.nearest);
  return quadraticDegrees(b.length).map((degrees): Offer => {
    const label = `[${degrees.join(',')}]`;
    const make = (): Attempt => {
      const a = quadraticApproximant(b, degrees, bits);
      if (typeof a === 'string') return { label, reason: a };
      const all = a.branchPoints.filter((p) => p.multiplicity % 2 === 1).map((p) => p.value);
      const branchPoints = all.filter((z, i) => !all.some((other, j) => j !== i && isTwin(z, other)));
      const singular: readonly Complex[] = [...branchPoints, ...quadraticPoles(a, POLE_BITS).map((p) => p.value)];
      const inside = singular.map(modulus).find((m) => nearest !== undefined && m < INSIDE * nearest);
      const quick = quadraticQuick(a, e.x.ball(bits), bits);
      return {
        label,
        singular,
        value: (s, prec) => quadraticValue(a, C.mulReal(s, e.x.ball(prec), prec), prec),
        ...(quick === undefined ? {} : { quick }),
        notes:
          branchPoints.length < all.length
            ? ['branch points that lie on top of each other cancel and are ignored']
            : [],
        ...(inside === undefined
          ? {}
          : { suspicion: `a singularity at |t| = ${inside.toPrecision(3)} lies where none is expected` }),
      };
    };
    return { label, make };
  });
}

/** Two square-root branch points so close that their product is as good as a simple zero. */
function isTwin(a: Complex, b: Complex): boolean {
  const p = C.toNumbers(a);
  const q = C.toNumbers(b);
  return Math.hypot(p.re - q.re, p.im - q.im) < TWINS * Math.hypot(p.re, p.im);
}

function modulus(z: Complex): number {
  const { re, im } = C.toNumbers(z);
  return Math.hypot(re, im);
}

export const borelQuadratic: Prescription = {
  name: 'borel-quadratic',
  title: 'quadratic Hermite–Padé of the Borel transform',
  summary: 'approximants with square-root branch points of their own, summed along a rotated ray',
  family: 'borel',
  apply(full, growth, request): readonly Outcome[] {
    const e = cleanPart(full, growth, MOST);
    const no = growthObjection(growth, 'equal degrees') ?? inputObjection(e, growth, 'equal degrees', 4);
    if (no !== undefined) return [no];
    return rayFamily(e, growth, request, (short, bits) => build(short, growth, bits));
  },
};
