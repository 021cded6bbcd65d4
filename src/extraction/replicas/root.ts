/**
 * @module The root of a replica: secant steps from a start that is nearly right, a search where they fail.
 *
 * Method     the first step with the slope of the central solution, secants after it. The error of a secant step is about
 *            C e_n e_{n−1}; the evaluation that would only confirm the last step is left out once that product is negligible.
 *            Where a step leaves the range, the slope turns round or nothing settles: every change of sign on a grid, nearest to
 *            the start first and with the central slope's sign, by the Illinois rule.
 * Bound      a few units of 1e-14, relative, as far as the function allows.
 * Reference  W. M. Dowell, P. Jarratt, BIT 11 (1971) 168 (Illinois; memory).
 */

/** A function of one number; NaN where it has no value. */
export type Real = (p: number) => number;

const STEPS = 14;
/** Relative step at which the root is found. */
const SETTLED = 1e-14;
/** Product of the last two relative steps below which the next error is negligible. */
const PREDICTED = 1e-16;
/** Points of the search. */
const GRID = 48;
const ILLINOIS_STEPS = 100;

/** The root of f near `start` within [from, to] on the branch where f has the slope's sign; NaN when there is none. */
export function rootNear(f: Real, start: number, slope: number, from: number, to: number): number {
  const begin = start > from && start < to ? start : Math.min(Math.max(start, from), to);
  return secants(f, begin, slope, from, to) ?? searched(f, begin, slope > 0, from, to);
}

function secants(f: Real, start: number, slope: number, from: number, to: number): number | undefined {
  let p = start;
  let value = f(p);
  if (value === 0) return p;
  let k = slope;
  let before = 1;
  for (let i = 0; i < STEPS; i++) {
    const next = p - value / k;
    const size = Math.abs(next - p) / Math.abs(next);
    if (!(next >= from && next <= to)) return undefined;
    if (size <= SETTLED || (i > 0 && size * before < PREDICTED)) return next;
    const there = f(next);
    if (there === 0) return next;
    const secant = (there - value) / (next - p);
    if (!Number.isFinite(there) || !(secant * slope > 0)) return undefined;
    [p, value, k, before] = [next, there, secant, size];
  }
  return undefined;
}

function searched(f: Real, start: number, rises: boolean, from: number, to: number): number {
  let best = NaN;
  let p = from;
  let value = f(p);
  for (let i = 1; i <= GRID; i++) {
    const next = from + ((to - from) * i) / GRID;
    const there = f(next);
    if (value < 0 === rises && there < 0 === !rises && Number.isFinite(value) && Number.isFinite(there)) {
      const root = illinois(f, p, value, next, there);
      if (!(Math.abs(root - start) >= Math.abs(best - start))) best = root;
    }
    [p, value] = [next, there];
  }
  return best;
}

/** The zero in a bracket; NaN where f loses its value or jumps. */
function illinois(f: Real, a: number, fa: number, b: number, fb: number): number {
  const gap = Math.abs(fa) + Math.abs(fb);
  for (let i = 0; i < ILLINOIS_STEPS; i++) {
    const c = b - (fb * (b - a)) / (fb - fa);
    const fc = f(c);
    if (fc === 0 || Math.abs(c - b) <= SETTLED * Math.abs(c)) return Math.abs(fc) < 1e-6 * gap ? c : NaN;
    if (!Number.isFinite(fc)) return NaN;
    if (fc < 0 === fb < 0) fa /= 2;
    else [a, fa] = [b, fb];
    [b, fb] = [c, fc];
  }
  return NaN;
}
