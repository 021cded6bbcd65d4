/**
 * @module One coefficient that does not belong: a mistyped sign or digit.
 *
 * Purpose    names the coefficient; the diagnosis goes on without it.
 * Method     sign: a regular pattern broken at an inner coefficient whose size is in line. Size: a single error δ at k
 *            leaves the pattern δ·(−1)^i C(2j, j+i)/C(2j, j) in the centred differences of order 2j of ln|c_n|; that
 *            pattern is matched, and must rise far above the differences elsewhere.
 * Bound      heuristic constants below. The last two coefficients cannot be judged (nothing follows them).
 */
import { logGammaDouble } from '../numerics/index.js';
import type { Point } from './reading.js';
import type { SignPattern } from './sign-pattern.js';

/** Fewest points. */
const MIN_POINTS = 8;
/** An error must exceed the differences elsewhere by this factor. */
const CONTRAST = 20;
/** … and the mismatch of the pattern must stay below this part of it. */
const MISMATCH = 0.1;
/** Power of the index by which differences of a true series are taken to fall. */
const ROUGHNESS = 2;
/** Differences elsewhere from which on a second misprint is allowed for. */
const LONG = 12;
/** Coefficients at the start and at the end that are never called outliers. */
const START = 3;
const END = 2;
/** Below this index a coefficient may be small by a natural cancellation: only an error this much clearer is named. */
const EARLY = { k: 5, contrast: 200 };
/** Most outliers looked for, as a part of the points. */
const SHARE = 1 / 8;

export interface Outlier {
  readonly k: number;
  readonly what: 'sign' | 'size';
  /** ln of the factor by which |c| is off; 0 for a sign. */
  readonly offset: number;
}

interface Series {
  readonly points: readonly Point[];
  readonly outliers: readonly Outlier[];
}

/** Centred differences of order 2j, normalised so that an error δ gives δ at its own place. Ends are undefined. */
function centred(y: readonly number[], j: number): (number | undefined)[] {
  const w = template(j);
  return y.map((_, i) => {
    if (i < j || i + j >= y.length) return undefined;
    return w.reduce((s, v, l) => s + v * y[i - j + l]!, 0);
  });
}

/** (−1)^i C(2j, j+i)/C(2j, j), i = −j…j. */
function template(j: number): number[] {
  return j === 1 ? [-1 / 2, 1, -1 / 2] : [1 / 6, -4 / 6, 1, -4 / 6, 1 / 6];
}

function sizeOutlier(points: readonly Point[]): Outlier | undefined {
  const j = points.length >= 11 ? 2 : 1;
  const z = points.map((p) => p.y - logGammaDouble(p.k + 1));
  const f = centred(z, j);
  const w = template(j);
  let best: { i: number; amplitude: number } | undefined;
  f.forEach((v, i) => {
    if (v === undefined || i < START || i >= points.length - END) return;
    if (best === undefined || Math.abs(v) > Math.abs(best.amplitude)) best = { i, amplitude: v };
  });
  if (best === undefined) return undefined;
  const { i, amplitude } = best;
  let mismatch = 0;
  for (let l = -j; l <= j; l++) {
    const v = f[i + l];
    if (v !== undefined) mismatch = Math.max(mismatch, Math.abs(v - amplitude * w[j + l]!));
  }
  // The start of a series is naturally rougher: expect differences elsewhere to fall like ROUGHNESS of the index.
  const elsewhere = f.flatMap((v, l) =>
    v !== undefined && Math.abs(l - i) > j ? [Math.abs(v) * (points[l]!.k / points[i]!.k) ** ROUGHNESS] : [],
  );
  if (elsewhere.length < 3) return undefined;
  elsewhere.sort((a, b) => b - a);
  // In a long series a second misprint may stand elsewhere; its pattern has 2j + 1 members.
  const background = elsewhere[elsewhere.length >= LONG ? 2 * j + 1 : 0]!;
  const contrast = points[i]!.k < EARLY.k ? EARLY.contrast : CONTRAST;
  if (Math.abs(amplitude) < contrast * background || mismatch > MISMATCH * Math.abs(amplitude)) return undefined;
  if (Math.abs(amplitude) < CONTRAST * points[i]!.sigma) return undefined;
  return { k: points[i]!.k, what: 'size', offset: amplitude };
}

function consecutive(points: readonly Point[]): boolean {
  return points.every((p, i) => i === 0 || p.k === points[i - 1]!.k + 1);
}

/** Relative error given to a coefficient that was put back in line by interpolation. */
const REPAIRED_ERROR = 0.1;

function repair(p: Point, outlier: Outlier): Point {
  return {
    ...p,
    y: p.y - outlier.offset,
    sign: outlier.what === 'sign' ? (-p.sign as -1 | 0 | 1) : p.sign,
    sigma: Math.max(p.sigma, REPAIRED_ERROR),
    quoted: Math.max(p.quoted, REPAIRED_ERROR),
    repaired: true,
  };
}

/** Repeated until no more is found. `pattern` is the sign pattern of the points. */
export function findOutliers(points: readonly Point[], pattern: SignPattern): Series {
  const outliers: Outlier[] = [];
  if (points.length < MIN_POINTS || !consecutive(points)) return { points, outliers };
  const allowed = Math.max(1, Math.floor(points.length * SHARE));
  let current = points;
  const inner = pattern.breaks.filter((i) => i >= START && i < points.length - END);
  const isolated = inner.every((i) => !pattern.breaks.includes(i - 1) && !pattern.breaks.includes(i + 1));
  if (inner.length > 0 && inner.length === pattern.breaks.length && inner.length <= allowed && isolated) {
    const z = points.map((p) => p.y - logGammaDouble(p.k + 1));
    const f = centred(z, 1);
    const smooth = inner.every((i) => Math.abs(f[i] ?? 0) < SIGN_SMOOTH);
    if (smooth) {
      for (const i of inner) outliers.push({ k: points[i]!.k, what: 'sign', offset: 0 });
      current = current.map((p, i) => (inner.includes(i) ? repair(p, { k: p.k, what: 'sign', offset: 0 }) : p));
    }
  }
  // Sizes are judged only where the signs say that one singularity rules.
  const ruled = pattern.kind !== 'irregular' || outliers.length > 0;
  for (let pass = 0; ruled && pass < allowed; pass++) {
    const found = sizeOutlier(current);
    if (found === undefined) break;
    outliers.push(found);
    current = current.map((p) => (p.k === found.k ? repair(p, found) : p));
  }
  return { points: current, outliers };
}

/** A sign is called mistyped only when |c| is in line with its neighbours to this accuracy (in ln). */
const SIGN_SMOOTH = 0.35;
