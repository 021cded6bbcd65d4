/**
 * @module The unknown for which a prescription reproduces the measurement, with every other root that the search shows.
 *
 * Method     the family's member at the starting point is searched on a grid and refined in doubles (root.ts); the family is
 *            asked anew at the root, and where it names another member there, that one is solved for. A member without a fast
 *            version is followed from the starting point, and searched on a coarse grid only when that leads nowhere.
 * Bound      polished with the prescription itself (polish.ts).
 */
import { Rational, exact, toNumberExact } from '../numerics/index.js';
import type { Exact } from '../numerics/index.js';
import { isRefusal, refuse } from '../qcd/index.js';
import type { Refusal } from '../qcd/index.js';
import type { Standing } from '../studies/index.js';
import { shifter, slopeAt } from './change.js';
import type { Changed } from './change.js';
import type { Shifts } from './place.js';
import { polish } from './polish.js';
import { logGrid, nearRoot, refineRoot, scanGrid } from './root.js';
import type { Bracket, Real } from './root.js';
import type { Theory, Whole } from './theory.js';

export interface Solved {
  readonly theory: Theory;
  readonly number: number;
  /** Decimal text, as many digits as are known. */
  readonly text: string;
  readonly digits: Standing;
  readonly whole: Whole;
  /** dX/dp at the solution. */
  readonly slope: number;
  readonly otherRoots: readonly number[];
  readonly notes: readonly string[];
  /** The unknown with shifted inputs and a measurement changed by dX. */
  shifted(shifts: Shifts, dX?: number): Changed | Refusal;
}

export interface Search {
  readonly from: number;
  readonly to: number;
  /** Where to ask the family for its member; the fixed-order solution. */
  readonly start?: number;
  /** The weak-coupling end: where the root is looked for first without a start. */
  readonly weak: 'low' | 'high';
}

/** Points of a grid, for members with a fast version and without. */
const POINTS = { fast: 61, slow: 13 } as const;
/** Digits at which a family is asked for its member, and at which its errors are taken. */
const MEMBER_DIGITS = 8;
const WHOLE_DIGITS = 15;
/** Relative precision of a root in doubles. */
const DOUBLE = 4e-16;
/** How often the family may name another member at the solution. */
const MEMBERS = 4;

/** How the note of a member begins that was not searched on a grid. */
export const FOLLOWED = 'followed from the fixed-order solution';

const fromDouble = (x: number): Exact => exact(Rational.fromNumber(x));

export const short = (x: number): string => String(Number(x.toPrecision(4)));

function noRoot(theory: Theory, target: number, values: readonly number[], search: Search): Refusal {
  const name = theory.prediction.prescription.name;
  const range = `${short(search.from)} to ${short(search.to)}`;
  if (values.length === 0)
    return refuse(`${name} has no value anywhere from ${range}`, 'search elsewhere: --search FROM:TO');
  const [low, high] = [Math.min(...values), Math.max(...values)];
  if (low < target && target < high)
    return refuse(
      `${name} has no value where it would pass the measurement ${short(target)}: a pole or a change of its contour lies there`,
      'choose another prescription',
    );
  const reached = `${short(low)} to ${short(high)}`;
  return refuse(
    `the measurement ${short(target)} lies outside what ${name} reaches for the unknown from ${range}: ${reached}`,
    'check the normalisation of the measurement, or search elsewhere: --search FROM:TO',
  );
}

/** The bracket whose middle is nearest to the start, or the one at the weak end. */
function choose(brackets: readonly Bracket[], search: Search): Bracket | undefined {
  const { start } = search;
  if (start === undefined) return search.weak === 'low' ? brackets[0] : brackets.at(-1);
  const apart = (b: Bracket): number =>
    start >= b.from && start <= b.to ? 0 : Math.abs(Math.log((b.from * b.to) / start ** 2));
  return brackets.toSorted((a, b) => apart(a) - apart(b))[0];
}

/** The root in a bracket: secants from its ends, Brent's method where they leave it. */
function inBracket(f: Real, b: Bracket): { kind: 'root' | 'jump'; p: number } | undefined {
  const slope = (b.fTo - b.fFrom) / (b.to - b.from);
  const quick = nearRoot(f, b.from - b.fFrom / slope, slope, DOUBLE);
  if (quick !== undefined && quick >= b.from && quick <= b.to) return { kind: 'root', p: quick };
  return refineRoot(f, b, DOUBLE);
}

interface Roots {
  readonly roots: readonly number[];
  readonly notes: readonly string[];
}

/** All roots of one member that a grid shows; the first one is the chosen one. */
function onGrid(theory: Theory, f: Real, target: number, search: Search): Roots | Refusal {
  const count = theory.prediction.quick === undefined ? POINTS.slow : POINTS.fast;
  const rough: Real = (p) => {
    const value = theory.rough(p);
    return value === undefined ? undefined : value - target;
  };
  const scan = scanGrid(rough, logGrid(search.from, search.to, count));
  const jumps: number[] = [];
  const roots: number[] = [];
  const left = [...scan.brackets];
  // The chosen bracket first; where it holds a jump only, the next one.
  for (let b = choose(left, search); b !== undefined; b = choose(left, search)) {
    left.splice(left.indexOf(b), 1);
    const found = inBracket(f, b);
    if (found !== undefined) (found.kind === 'root' ? roots : jumps).push(found.p);
  }
  const places = jumps.map(short).join(', ');
  if (roots.length > 0)
    return { roots, notes: jumps.length === 0 ? [] : [`the sum jumps over the measurement at ${places} as well`] };
  if (jumps.length > 0) {
    return refuse(
      `${theory.prediction.prescription.name} jumps over the measurement at ${places}: the sum has no value there that equals it`,
      'choose a prescription without a pole or a change of its cut there',
    );
  }
  return noRoot(theory, target, scan.points.map((p) => p.f + target), search); // prettier-ignore
}

function rootsOf(theory: Theory, target: number, search: Search): Roots | Refusal {
  const f: Real = (p) => {
    const value = theory.number(p);
    return value === undefined ? undefined : value - target;
  };
  const { start } = search;
  if (theory.prediction.quick !== undefined || start === undefined) return onGrid(theory, f, target, search);
  const slope = slopeAt(theory, start);
  const near = slope === undefined ? undefined : nearRoot(f, start, slope, DOUBLE);
  if (near === undefined || near < search.from || near > search.to) return onGrid(theory, f, target, search);
  return { roots: [near], notes: [`${FOLLOWED}; other roots were not looked for`] };
}

interface Settled extends Roots {
  readonly theory: Theory;
  readonly p: number;
  readonly whole: Whole;
}

/** Roots of the member that the family names at the first of them. */
function settle(family: Theory, target: number, search: Search): Settled | Refusal {
  const start = search.start ?? Math.sqrt(search.from * search.to);
  const first = family.whole(fromDouble(start), MEMBER_DIGITS);
  if (isRefusal(first)) return first;
  let theory = family.member(first);
  const found = rootsOf(theory, target, search);
  if (isRefusal(found)) return found;
  const [root = start] = found.roots;
  let p = root;
  const notes = [...found.notes];
  const seen = [first.sum.variant];
  for (;;) {
    const whole = family.whole(fromDouble(p), WHOLE_DIGITS);
    if (isRefusal(whole)) return whole;
    const { variant } = whole.sum;
    if (variant === theory.prediction.variant) return { theory, p, whole, roots: found.roots, notes };
    if (seen.includes(variant) || seen.length === MEMBERS) {
      notes.push(`near the solution the family changes from ${theory.prediction.variant ?? ''} to ${variant}`);
      return { theory, p, whole, roots: found.roots, notes };
    }
    seen.push(variant);
    theory = family.member(whole);
    const f: Real = (q) => {
      const value = theory.number(q);
      return value === undefined ? undefined : value - target;
    };
    const slope = slopeAt(theory, p);
    const next = slope === undefined ? undefined : nearRoot(f, p, slope, DOUBLE);
    if (next === undefined)
      return refuse(
        `${variant}, the member at the solution, does not reach the measurement`,
        'choose another prescription',
      );
    p = next;
  }
}

/** Solves X(p) = target. `family` is a theory whose member is still to be named. */
export function solve(family: Theory, target: Exact, search: Search, digits: number): Solved | Refusal {
  const settled = settle(family, toNumberExact(target), search);
  if (isRefusal(settled)) return settled;
  const { theory, whole } = settled;
  const slope = slopeAt(theory, settled.p);
  if (slope === undefined || !(Math.abs(slope) > 0)) {
    return refuse('the sum does not depend on the unknown at the solution', 'choose another prescription');
  }
  const polished = polish(theory, target, settled.p, slope, digits);
  const number = toNumberExact(polished.at);
  return {
    theory,
    number,
    text: polished.text,
    digits: whole.sum.digitsTrust === 'converged' ? 'converged' : polished.standing,
    whole,
    slope,
    otherRoots: settled.roots.slice(1),
    notes: settled.notes,
    shifted: shifter(theory, toNumberExact(target), number, slope),
  };
}
