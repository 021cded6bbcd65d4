/**
 * @module The mass m with f(m) = target, bracketed: f is a pole or subtracted mass as a function of m(m).
 *
 * Method     f grows with m where perturbation theory holds; below it f turns up again, since the coupling grows. The search
 *            goes down from above, so that it meets the perturbative solution first, and ends where f no longer falls: the least
 *            value is looked up there, since the solution may lie just above it.
 *            Inside the bracket: false position with the weights of Anderson and Björck, which keeps the bracket.
 * Bound      a few 2^-53.
 */
import { isRefusal, refuse, type Refusal } from '../qcd/index.js';

/** Factor between the points of the search. Heuristic: small enough not to jump over a turning point that matters. */
const SEARCH_FACTOR = 1.04;
const SEARCH_STEPS = 200;
const POLISH_STEPS = 100;

type Function = (m: number) => number | Refusal;

interface Bracket {
  readonly low: number;
  readonly fLow: number;
  readonly high: number;
  readonly fHigh: number;
}

function none(target: number, why: string): Refusal {
  return refuse(`no MSbar mass leads to ${target} GeV: ${why}`, 'use fewer orders (--order), or a heavier quark');
}

const GOLDEN = (Math.sqrt(5) - 1) / 2;
const TURN_STEPS = 40;

/** f turns between low and high · SEARCH_FACTOR: the bracket above its least value, if the target lies above that. */
function aboveTurn(f: Function, target: number, low: number, high: number): Bracket | Refusal {
  let [a, b] = [low, high * SEARCH_FACTOR];
  const value = (m: number): number => {
    const found = f(m);
    return isRefusal(found) ? Infinity : found;
  };
  const fHigh = value(b);
  const top = b;
  let [x, y] = [b - GOLDEN * (b - a), a + GOLDEN * (b - a)];
  let [fx, fy] = [value(x), value(y)];
  for (let k = 0; k < TURN_STEPS && Math.min(fx, fy) > target; k++) {
    if (fx < fy) {
      [b, y, fy] = [y, x, fx];
      x = b - GOLDEN * (b - a);
      fx = value(x);
    } else {
      [a, x, fx] = [x, y, fy];
      y = a + GOLDEN * (b - a);
      fy = value(y);
    }
  }
  const [m, least] = fx < fy ? [x, fx] : [y, fy];
  if (least <= target) return { low: m, fLow: least - target, high: top, fHigh: fHigh - target };
  return none(
    target,
    `its series has no smaller value than ${least.toPrecision(6)} GeV, at m(m) = ${m.toPrecision(4)} GeV`,
  );
}

function findBracket(f: Function, target: number): Bracket | Refusal {
  let high = target;
  let fHigh = f(high);
  for (let k = 0; ; k++) {
    if (!isRefusal(fHigh) && fHigh >= target) break;
    if (k >= SEARCH_STEPS) return isRefusal(fHigh) ? fHigh : none(target, 'the series stays below it');
    high *= SEARCH_FACTOR;
    fHigh = f(high);
  }
  for (let k = 0; k < SEARCH_STEPS; k++) {
    const low = high / SEARCH_FACTOR;
    const fLow = f(low);
    if (isRefusal(fLow)) return none(target, `at m(m) = ${low.toPrecision(4)} GeV ${fLow.reason}`);
    if (fLow <= target) return { low, fLow: fLow - target, high, fHigh: fHigh - target };
    if (fLow >= fHigh) return aboveTurn(f, target, low, high);
    high = low;
    fHigh = fLow;
  }
  return none(target, 'the series stays above it');
}

/** The perturbative solution, or a refusal that says why there is none. */
export function solveMass(f: Function, target: number): number | Refusal {
  const bracket = findBracket(f, target);
  if (isRefusal(bracket)) return bracket;
  let { low, fLow, high, fHigh } = bracket;
  let best = Math.abs(fLow) < Math.abs(fHigh) ? low : high;
  let least = Math.min(Math.abs(fLow), Math.abs(fHigh));
  for (let k = 0; k < POLISH_STEPS && least > 0; k++) {
    const m = (low * fHigh - high * fLow) / (fHigh - fLow);
    if (!(m > low && m < high)) break;
    const value = f(m);
    if (isRefusal(value)) return value;
    const g = value - target;
    if (Math.abs(g) < least) {
      least = Math.abs(g);
      best = m;
    } else if (Math.abs(g) <= 4e-16 * target) break;
    // The end that stays is pulled in, so that neither end stays for long.
    if (g > 0) {
      const weight = 1 - g / fHigh;
      high = m;
      fHigh = g;
      fLow *= weight > 0 ? weight : 0.5;
    } else {
      const weight = 1 - g / fLow;
      low = m;
      fLow = g;
      fHigh *= weight > 0 ? weight : 0.5;
    }
    if (high - low <= 2e-16 * high) break;
  }
  return best;
}
