/**
 * @module All roots of f(p) = 0 that a grid shows, each refined in its bracket.
 *
 * Method     f at the points of a grid; every change of sign is a bracket. Brent's method inside (bisection, secant, inverse
 *            quadratic interpolation). A bracket whose ends stay apart in f is a jump (a cut that moves, a pole), no root.
 * Bound      the bracket shrinks to a few units of 2^-53; roots closer than the grid, in pairs, may be missed.
 * Reference  R. P. Brent, Algorithms for Minimization without Derivatives (1973), ch. 4 (from memory).
 */

export interface Bracket {
  readonly from: number;
  readonly to: number;
  readonly fFrom: number;
  readonly fTo: number;
}

export interface GridScan {
  readonly brackets: readonly Bracket[];
  /** Points with their values, refused ones left out. */
  readonly points: readonly { readonly p: number; readonly f: number }[];
}

/** f where it has a value. */
export type Real = (p: number) => number | undefined;

/** `count` points, even in ln p. */
export const logGrid = (from: number, to: number, count: number): readonly number[] =>
  Array.from({ length: count }, (_, i) => from * (to / from) ** (i / (count - 1)));

export function scanGrid(f: Real, grid: readonly number[]): GridScan {
  const points: { p: number; f: number }[] = [];
  const brackets: Bracket[] = [];
  let before: { p: number; f: number } | undefined;
  for (const p of grid) {
    const value = f(p);
    if (value === undefined || Number.isNaN(value)) {
      before = undefined;
      continue;
    }
    if (before !== undefined && (before.f < 0 !== value < 0 || value === 0)) {
      brackets.push({ from: before.p, to: p, fFrom: before.f, fTo: value });
    }
    before = { p, f: value };
    points.push(before);
  }
  return { brackets, points };
}

export interface Root {
  readonly kind: 'root' | 'jump';
  readonly p: number;
}

const STEPS = 120;
/** Ends of a jump stay apart by more than this share of what they were at the bracket's ends. A heuristic. */
const JUMP = 1e-6;

/** Brent's method. `tolerance` is relative to p. Undefined where f loses its value inside the bracket. */
export function refineRoot(f: Real, bracket: Bracket, tolerance: number): Root | undefined {
  let [a, fa, b, fb] = [bracket.from, bracket.fFrom, bracket.to, bracket.fTo];
  let [c, fc] = [a, fa];
  let step = b - a;
  let last = step;
  for (let k = 0; k < STEPS; k++) {
    if (fb < 0 === fc < 0) {
      [c, fc] = [a, fa];
      step = b - a;
      last = step;
    }
    if (Math.abs(fc) < Math.abs(fb)) [a, fa, b, fb, c, fc] = [b, fb, c, fc, b, fb];
    const half = (c - b) / 2;
    const close = tolerance * Math.abs(b);
    if (Math.abs(half) <= close || fb === 0) {
      const gap = Math.max(Math.abs(bracket.fFrom), Math.abs(bracket.fTo));
      return { kind: fb !== 0 && Math.min(Math.abs(fb), Math.abs(fc)) > JUMP * gap ? 'jump' : 'root', p: b };
    }
    const move = interpolation([a, fa], [b, fb], [c, fc]);
    if (Math.abs(last) >= close && Math.abs(fa) > Math.abs(fb) && accepted(move, half, close, last)) {
      [last, step] = [step, move];
    } else {
      [step, last] = [half, half];
    }
    [a, fa] = [b, fb];
    b += Math.abs(step) > close ? step : Math.sign(half) * close;
    const value = f(b);
    if (value === undefined || Number.isNaN(value)) return undefined;
    fb = value;
  }
  return { kind: 'jump', p: b };
}

type PointValue = readonly [p: number, f: number];

/** Step from b by the secant, or by inverse quadratic interpolation when there are three points. */
function interpolation([a, fa]: PointValue, [b, fb]: PointValue, [c, fc]: PointValue): number {
  const s = fb / fa;
  if (a === c) return ((c - b) * s) / (s - 1);
  const q = fa / fc;
  const r = fb / fc;
  return (s * ((c - b) * q * (q - r) - (b - a) * (r - 1))) / -((q - 1) * (r - 1) * (s - 1));
}

const accepted = (move: number, half: number, close: number, last: number): boolean =>
  move / half > 0 && Math.abs(move) < Math.abs(1.5 * half) - Math.abs(close) / 2 && Math.abs(move) < Math.abs(last / 2);

/**
 * Newton's method with a slope that is known well enough, from a start near the root: for roots that a small change has moved.
 * Secants replace the slope from the second step on. Undefined when it does not settle.
 */
export function nearRoot(f: Real, start: number, slope: number, tolerance: number): number | undefined {
  let p = start;
  let value = f(p);
  let k = slope;
  for (let i = 0; i < 30; i++) {
    if (value === undefined || !Number.isFinite(value) || !(Math.abs(k) > 0)) return undefined;
    const move = -value / k;
    if (Math.abs(move) <= tolerance * Math.abs(p)) return p + move;
    const next = p + move;
    if (!(next > 0) || Math.abs(move) > Math.abs(p)) return undefined;
    const there = f(next);
    if (there === undefined) return undefined;
    const secant: number = (there - value) / move;
    if (secant !== 0 && Number.isFinite(secant) && secant > 0 === k > 0) k = secant;
    [p, value] = [next, there];
  }
  return undefined;
}
