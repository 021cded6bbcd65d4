/**
 * @module Logarithmic-derivative Borel–Padé: the approximant is a product of branch points with free exponents.
 *
 * [L/M] of B′/B with L + M = N − 2, L ≤ M, nearest to L = M − 1 first: poles become branch points, −residue the exponent.
 * Truncation error: neighbours and order before. An entry is refused when it has a singularity of an exponent that matters
 * well inside the circle of the nearest one, or when none of the offered rays passes below its complex singularities.
 * References: G. A. Baker, Phys. Rev. 124 (1961) 768; D. Boito, P. Masjuan, F. Oliani, arXiv:1807.01567 (memory).
 */
import { C, R, toNumberExact } from '../numerics/index.js';
import type { Complex } from '../numerics/index.js';
import { borelTransform, dlogApproximant, dlogQuick, dlogValue } from '../borel/index.js';
import type { DlogApproximant, DlogPole } from '../borel/index.js';
import type { Growth } from '../growth/index.js';
import type { Expansion } from '../series/index.js';
import { cleanPart, growthObjection, inputObjection } from './eligibility.js';
import type { Outcome, Prescription } from './prescription.js';
import type { Attempt, Offer } from './ray-family.js';
import { nearestDistance, rayFamily } from './ray-family.js';

/** Most coefficients used. Heuristic: cost. */
const MOST = 60;
/** |L − (M − 1)| up to which entries are shown. */
const WIDTH = 1;
/** A singularity nearer than this fraction of the nearest known one is where none may be. Heuristic. */
const INSIDE = 0.7;
/** Exponents this close to 0, −1, −2, … are zeros of B or nothing at all: harmless. Heuristic. */
const HARMLESS = 0.1;
/** Largest x·c of an exponential factor e^{ct} that still leaves the Laplace integral convergent with room to spare. */
const EXPONENTIAL = 0.5;

/** [L, M] of the derivative's table for N coefficients of B. */
function places(N: number): [number, number][] {
  const order = N - 2;
  const list: [number, number][] = [];
  for (let M = 1; M <= order; M++) {
    const L = order - M;
    if (L <= M && Math.abs(L - M + 1) <= WIDTH + (order % 2 === 0 ? 0 : 1)) list.push([L, M]);
  }
  return list.sort((a, b) => Math.abs(a[0] - a[1] + 1) - Math.abs(b[0] - b[1] + 1) || a[0] - b[0]);
}

const exponentOf = (p: DlogPole): { re: number; im: number } => C.toNumbers(C.neg(p.principal[0]!));

/** A pole of B′/B that is a zero of B, or as good as nothing. */
function isHarmless(p: DlogPole): boolean {
  const { re, im } = exponentOf(p);
  const nearest = Math.min(0, Math.round(re));
  return p.principal.length === 1 && Math.hypot(re - nearest, im) < HARMLESS;
}

function suspicion(e: Expansion, growth: Growth, a: DlogApproximant): string | undefined {
  const nearest = nearestDistance(e, growth.nearest);
  if (nearest !== undefined) {
    for (const p of a.poles) {
      const { re, im } = C.toNumbers(p.z);
      const modulus = Math.hypot(re, im);
      if (modulus < INSIDE * nearest && !isHarmless(p))
        return `a branch point at |t| = ${modulus.toPrecision(3)} lies where no singularity is expected`;
    }
  }
  const growthRate = a.polynomial[0] === undefined ? 0 : R.toNumber(a.polynomial[0]) * toNumberExact(e.x);
  if (growthRate > EXPONENTIAL || a.polynomial.length > 1)
    return 'the approximant grows exponentially, too fast for the Laplace integral';
  return undefined;
}

function notesOf(a: DlogApproximant): string[] {
  const positive = a.poles.filter((p) => p.real && R.isPositive(p.z.re) && !isHarmless(p));
  const first = positive[0];
  const notes =
    first === undefined
      ? []
      : [
          `first branch point on the positive axis at t = ${R.toNumber(first.z.re).toPrecision(4)}, exponent ${exponentOf(first).re.toPrecision(3)}`,
        ];
  return a.deficiency > 0 ? [...notes, 'degenerate block: a product of powers as far as the coefficients show'] : notes;
}

function build(e: Expansion, growth: Growth, bits: number): readonly Offer[] {
  const b = borelTransform(e.coefficients);
  return places(b.length).map(([L, M]): Offer => {
    const label = `[${L}/${M}]`;
    const make = (): Attempt => {
      const a = dlogApproximant(b, L, M, bits);
      if (typeof a === 'string') return { label, reason: a };
      const doubt = suspicion(e, growth, a);
      const quick = dlogQuick(a, e.x.ball(bits), bits);
      return {
        label,
        singular: a.poles.map((p): Complex => p.z),
        value: (s, prec) => dlogValue(a, C.mulReal(s, e.x.ball(prec), prec), prec),
        ...(quick === undefined ? {} : { quick }),
        notes: notesOf(a),
        ...(doubt === undefined ? {} : { suspicion: doubt }),
      };
    };
    return { label, make };
  });
}

export const borelDlog: Prescription = {
  name: 'borel-dlog',
  title: 'logarithmic-derivative Borel–Padé',
  summary: 'Padé approximants of B′/B: branch points with free exponents, summed along a rotated ray',
  family: 'borel',
  apply(full, growth, request): readonly Outcome[] {
    const e = cleanPart(full, growth, MOST);
    const no = growthObjection(growth, 'near-diagonal') ?? inputObjection(e, growth, 'near-diagonal', 3);
    if (no !== undefined) return [no];
    return rayFamily(e, growth, request, (short, bits) => build(short, growth, bits));
  },
};
