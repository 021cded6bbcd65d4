/**
 * @module Conformal mapping of the Borel plane: one cut or two cuts, with and without softening factors.
 *
 * Needs the positions of the first singularity on each axis; exponents, where known, soften the expansion. Members:
 * softened in w, softened in t, plain; the first that exists is central. Principal value and imaginary part by a rotated ray.
 * Truncation error: the step from one coefficient fewer plus half the spread of the members.
 * References: I. Caprini, J. Fischer, arXiv:hep-ph/9811367; arXiv:1106.5336 (abstracts seen); S. Ciulli, J. Fischer (1961).
 */
import { C, isZeroExact, R, signExact, toNumberExact } from '../numerics/index.js';
import type { Ball, Complex } from '../numerics/index.js';
import { borelTransform, lateralSums, RAYS, remap, remappedQuick, remappedValues, STRAIGHT } from '../borel/index.js';
import type { Contour, CutEnd, Cuts, LaplaceSum, Softening } from '../borel/index.js';
import type { Growth } from '../growth/index.js';
import type { Expansion } from '../series/index.js';
import { cleanPart, growthObjection, inputObjection, trustOf } from './eligibility.js';
import type { Outcome, Prescription, Refusal, Request } from './prescription.js';
import { dressed, refusal, scaled } from './prescription.js';

/** Most coefficients used. Heuristic: cost. */
const MOST = 80;
/** Bits that the re-expansion loses for each coefficient, log2(3 + 2√2) rounded up. */
const BITS_LOST = 3;
/** A singularity found nearer than this fraction of the stated one contradicts the map. Heuristic. */
const INSIDE = 0.8;

interface Member {
  readonly softening: Softening;
  readonly full: LaplaceSum;
  readonly shorter: LaplaceSum;
}

export const memberLabel = (cuts: Cuts, softening: Softening): string => {
  const count = cuts.left !== undefined && cuts.right !== undefined ? 'two cuts' : 'one cut';
  return softening === 'none' ? `${count}, not softened` : `${count}, softened ${softening}`;
};

/** The softening that a member's name says; undefined for a name that is none. */
export const softeningOf = (cuts: Cuts, variant: string): Softening | undefined =>
  (['in w', 'in t', 'none'] as const).find((softening) => memberLabel(cuts, softening) === variant);

/** First stated singularity on each axis. */
export function cutsOf(e: Expansion): Cuts {
  const end = (side: 1 | -1): CutEnd | undefined => {
    const s = e.stated.find((p) => signExact(p.t) === side);
    if (s === undefined) return undefined;
    const distance = side === 1 ? s.t : { ball: (prec: number): Ball => R.neg(s.t.ball(prec)) };
    return { distance, ...(s.exponent === undefined ? {} : { exponent: s.exponent }) };
  };
  const [left, right] = [end(-1), end(1)];
  return { ...(left === undefined ? {} : { left }), ...(right === undefined ? {} : { right }) };
}

/** What the terms say against the assumed domain. */
function domainObjection(cuts: Cuts, growth: Growth): Refusal | undefined {
  const found = growth.nearest;
  if (found === undefined || found.standing !== 'converged') return undefined;
  const at = found.t.value.toPrecision(4);
  if (found.kind === 'complex pair')
    return refusal(
      'mapped plane',
      `the terms show a complex pair at |t| = ${at}, inside the assumed domain`,
      'use Borel–Padé',
    );
  for (const [side, end] of [
    ['negative axis', cuts.left],
    ['positive axis', cuts.right],
  ] as const) {
    if (found.kind !== side && found.kind !== 'both axes') continue;
    if (end === undefined)
      return refusal(
        'mapped plane',
        `the terms show a singularity at t = ${at} on the ${side}, where none is stated`,
        'state it in the series file (singularities)',
      );
    if (Math.abs(found.t.value) < INSIDE * toNumberExact(end.distance))
      return refusal(
        'mapped plane',
        `the terms show a singularity at t = ${at}, nearer than the stated one`,
        'correct the stated position',
      );
  }
  return undefined;
}

/** Sums of the given softenings; undefined when the quadrature does not settle. */
function evaluate(e: Expansion, cuts: Cuts, softenings: readonly Softening[], digits: number): Member[] | undefined {
  const N = e.coefficients.length;
  const prec = Math.ceil(digits * 3.33) + 64 + BITS_LOST * N;
  const b = borelTransform(e.coefficients).map((c) => c.ball(prec));
  const list = softenings.map((softening) => remap(b, cuts, softening, prec));
  // Vanishing last coefficients are no step: the one before them is left out as well.
  const fewer = e.coefficients.length - e.coefficients.findLastIndex((c) => !isZeroExact(c));
  const contour: Contour =
    cuts.right === undefined
      ? STRAIGHT
      : { ray: RAYS[0]!, first: toNumberExact(cuts.right.distance) / toNumberExact(e.x) };
  const quick = remappedQuick(list, cuts, e.x.ball(prec), fewer, prec);
  const balls = (s: Complex, p: number): readonly Complex[] =>
    remappedValues(list, cuts, C.mulReal(s, e.x.ball(p), p), p, fewer).flatMap(({ full, shorter }) => [full, shorter]);
  const found = lateralSums({ balls, ...(quick === undefined ? {} : { quick }) }, contour, digits);
  return found && softenings.map((softening, i) => ({ softening, full: found[2 * i]!, shorter: found[2 * i + 1]! }));
}

/** |N − (N−1)| of the member plus half the spread of all members, in units of R. */
function truncationOf(e: Expansion, member: Member, all: readonly Member[]): number {
  const size = (a: Ball, b: Ball): number => Math.abs(R.toNumber(scaled(e, R.sub(a, b, 128), 128)));
  const step = size(member.full.pv, member.shorter.pv);
  const spread = Math.max(0, ...all.flatMap((p) => all.map((q) => size(p.full.pv, q.full.pv))));
  return step + spread / 2;
}

function sums(e: Expansion, cuts: Cuts, request: Request): readonly Outcome[] {
  const anyExponent = cuts.left?.exponent !== undefined || cuts.right?.exponent !== undefined;
  const offered: readonly Softening[] = anyExponent ? ['in w', 'in t', 'none'] : ['none'];
  const wanted = request.only === undefined ? offered : offered.filter((s) => memberLabel(cuts, s) === request.only);
  if (wanted.length === 0)
    return [refusal(request.only ?? 'mapped plane', 'not a member of the family', 'choose another')];
  const members = evaluate(e, cuts, wanted, request.digits);
  if (members === undefined)
    return [
      refusal(
        memberLabel(cuts, wanted[0]!),
        'the integral along the rotated ray does not settle',
        'take a smaller coupling or fewer digits',
      ),
    ];
  const prec = Math.max(128, request.digits * 4 + 64);
  return members.map((member, i): Outcome => {
    const value = dressed(e, member.full.pv, prec);
    const truncation = request.only === undefined ? truncationOf(e, member, members) : undefined;
    return {
      kind: 'sum',
      variant: memberLabel(cuts, member.softening),
      value,
      imaginary: scaled(e, member.full.im, prec),
      ...(truncation === undefined ? {} : { truncation }),
      termsUsed: e.coefficients.length,
      trust: trustOf(value, truncation),
      digitsTrust: 'converged',
      notes: [],
      ...(i === 0 ? { central: true } : {}),
    };
  });
}

export const conformalBorel: Prescription = {
  name: 'borel-conformal',
  title: 'conformally mapped Borel transform',
  summary:
    'Borel transform re-expanded in the variable that maps the cut plane to the unit disc; needs stated positions',
  family: 'borel',
  apply(full, growth, request): readonly Outcome[] {
    const e = cleanPart(full, growth, MOST);
    const cuts = cutsOf(e);
    const variant = 'mapped plane';
    const no = growthObjection(growth, variant) ?? inputObjection(e, growth, variant, 3);
    if (no !== undefined) return [no];
    if (cuts.left === undefined && cuts.right === undefined)
      return [
        refusal(
          variant,
          'no position of a Borel singularity is stated',
          'state them in the series file (singularities: u, t or dimension)',
        ),
      ];
    const contradiction = domainObjection(cuts, growth);
    return contradiction === undefined ? sums(e, cuts, request) : [contradiction];
  },
};
