/**
 * @module All roots of one polynomial with simple roots: start, move, prove, sharpen.
 *
 * Purpose    disjoint discs of a stated relative radius around every root of a real polynomial.
 * Method     doubles give the starting points. At a working precision of w bits the points are moved until they rest at
 *            the error of evaluation, then discs are formed; while they meet, w is doubled, though never beyond the bits
 *            to which the coefficients are known. Once they are disjoint the roots are known as real or paired, only half
 *            of them are moved, and w grows with the correct digits.
 * Bound      the discs are Smith's (roots-discs.ts). `loss` bits between w and the accuracy are measured, not guessed.
 * Reference  D. A. Bini, L. Robol, J. Comput. Appl. Math. 272 (2014) 276 (secular roots, adaptive precision).
 */
import type { Ball } from '../ball/real.js';
import { RootCloud } from './roots-cloud.js';
import { smithDiscs, symmetrise, type Discs } from './roots-discs.js';
import { aberthSweeps, polynomialRatio, startingPoints, type NewtonRatio, type Points } from './roots-start.js';
import { log2Length } from './scaled-polynomial.js';

/** Heuristics: first working precision beyond n/2 bits, sweeps at one precision, guard bits, largest precision. */
const FIRST_BITS = 96;
const SWEEPS = 50;
const GUARD_BITS = 6;
const SPARE_BITS = 64;
const MAX_BITS = 1 << 16;
const MAX_POLISH = 40;
/** Heuristic: how often points are lifted and settled anew at a precision that cannot usefully be raised. */
const LAST_TRIES = 3;

export interface Isolated {
  readonly cloud: RootCloud;
  readonly discs: Discs;
}

export type Isolation = Isolated | { readonly failed: string };

/**
 * Disjoint discs with |z_i|/r_i >= 2^prec for the polynomial with coefficients a (ascending, degree >= 1, a_0 and a_n
 * certainly non-zero). With inexact coefficients the radii are as small as these allow; failed when that is not enough
 * to tell the roots apart. `ratio` may offer a better conditioned p/p' for the search in doubles.
 */
export function isolateRoots(a: readonly Ball[], prec: number, ratio?: NewtonRatio): Isolation {
  const n = a.length - 1;
  const cloud = new RootCloud(a, searchInDoubles(a, ratio), FIRST_BITS + Math.ceil(n / 2));
  for (let tries = 0; ;) {
    settle(cloud);
    const rough = smithDiscs(cloud);
    if (symmetrise(cloud, rough.radius)) {
      const discs = smithDiscs(cloud);
      if (discs.disjoint) return sharpen(cloud, discs, prec);
      cloud.partner.fill(-1);
    }
    const most = cloud.usefulBits() + SPARE_BITS;
    if (cloud.w >= most) tries++;
    if (rough.inputLimited || tries >= LAST_TRIES) {
      return { failed: 'roots cannot be told apart within the error of the coefficients' };
    }
    if (cloud.w * 2 > MAX_BITS) return { failed: `roots cannot be told apart with ${cloud.w} bits` };
    cloud.raise(Math.max(cloud.w, Math.min(cloud.w * 2, most)));
    rough.crowded.forEach((flag, i) => flag === 1 && cloud.lift(i, rough.radius[i]! - 1));
  }
}

/** The same roots with |z_i|/r_i >= 2^prec, from where an earlier call left them; its cloud is changed in place. */
export function refineRoots({ cloud, discs }: Isolated, prec: number): Isolation {
  return sharpen(cloud, discs, prec);
}

/** Starting points from the midpoints of the coefficients. */
function searchInDoubles(a: readonly Ball[], ratio?: NewtonRatio): Points {
  const logs = a.map((c) => log2Length(c.mid, 0n) + c.exp);
  const signs = a.map((c) => (c.mid > 0n ? 1 : c.mid < 0n ? -1 : 0));
  const points = startingPoints(logs);
  aberthSweeps(points, ratio ?? polynomialRatio(logs, signs));
  return points;
}

/** Sweeps at the present precision until every root rests or the sweeps are used up. */
function settle(cloud: RootCloud): void {
  const resting = new Uint8Array(cloud.n);
  for (let sweep = 0, left = cloud.n; sweep < SWEEPS && left > 0; sweep++) {
    for (let i = 0; i < cloud.n; i++) {
      if (resting[i] === 1 || !cloud.step(i)) continue;
      resting[i] = 1;
      left--;
    }
  }
}

/** From disjoint discs to discs of the relative radius asked. */
function sharpen(cloud: RootCloud, first: Discs, prec: number): Isolation {
  let discs = first;
  let known = Math.max(1, Math.floor(discs.accuracy));
  for (let round = 0; round < MAX_POLISH && discs.accuracy < prec; round++) {
    if (discs.inputLimited) break;
    const loss = Math.ceil(discs.loss);
    const goal = Math.min(prec + loss + GUARD_BITS, cloud.usefulBits() + SPARE_BITS);
    while (cloud.w < goal) {
      cloud.raise(Math.min(goal, Math.max(cloud.w + 32, 3 * known + loss)));
      sweepOnce(cloud);
      known = Math.min(cloud.w - loss, 3 * known, 2 * known + 50);
    }
    if (round > 0) sweepOnce(cloud);
    discs = smithDiscs(cloud);
    if (!discs.disjoint) return { failed: 'refined roots lost their separation' };
  }
  if (discs.accuracy < prec && !discs.inputLimited) {
    return { failed: `roots reached ${Math.floor(discs.accuracy)} of ${prec} bits` };
  }
  return { cloud, discs };
}

function sweepOnce(cloud: RootCloud): void {
  for (let i = 0; i < cloud.n; i++) if (cloud.leads(i)) cloud.step(i);
}
