/**
 * @module How a solution answers to small changes: by the slope where they are small, by solving again where they are not.
 *
 * Method     slope by central differences, with one step of Richardson's in fast arithmetic. A changed input moves X by δX at
 *            the old solution, so the unknown by (dX − δX)/slope; beyond LINEAR of itself the equation is solved again.
 * Bound      slope 1e-10, changes 1e-9 of the unknown.
 */
import { R, Rational, exact } from '../numerics/index.js';
import { isRefusal, refuse } from '../qcd/index.js';
import type { Refusal } from '../qcd/index.js';
import type { Shifts } from './place.js';
import { logGrid, nearRoot, refineRoot, scanGrid } from './root.js';
import type { Real } from './root.js';
import type { Theory } from './theory.js';

/** A changed unknown, and how it was found. */
export interface Changed {
  readonly value: number;
  readonly how: 'slope' | 'refit';
}

/** Relative steps of the slope: in doubles, and with many digits. */
const STEP = 2 ** -9;
const FINE_STEP = 2 ** -17;
const FINE_DIGITS = 17;
/** Relative changes beyond this are solved for again; the slope alone would mislead. */
const LINEAR = 0.05;
/** Relative precision of a changed solution. */
const PRECISION = 1e-10;

/** dX/dp; undefined where X has no value on both sides. */
export function slopeAt(theory: Theory, p: number): number | undefined {
  if (theory.prediction.quick === undefined) return fineSlope(theory, p);
  const difference = (h: number): number | undefined => {
    const [up, down] = [theory.number(p + h), theory.number(p - h)];
    return up === undefined || down === undefined ? undefined : (up - down) / (2 * h);
  };
  const [whole, half] = [difference(p * STEP), difference((p * STEP) / 2)];
  return whole === undefined || half === undefined ? undefined : (4 * half - whole) / 3;
}

function fineSlope(theory: Theory, p: number): number | undefined {
  const h = p * FINE_STEP;
  const at = (q: number): ReturnType<Theory['value']> => theory.value(exact(Rational.fromNumber(q)), FINE_DIGITS);
  const [up, down] = [at(p + h), at(p - h)];
  return isRefusal(up) || isRefusal(down) ? undefined : R.toNumber(R.sub(up, down, 160)) / (2 * h);
}

const lost = refuse('no solution with the input shifted by its error', 'the error is too large for this prescription');

/** The answer to shifts of a solution. */
export function shifter(
  theory: Theory,
  target: number,
  at: number,
  slope: number,
): (shifts: Shifts, dX?: number) => Changed | Refusal {
  const central = theory.number(at);
  return (shifts, dX = 0) => {
    const still = Object.keys(shifts).length === 0;
    const moved = still ? central : theory.number(at, shifts);
    if (moved === undefined || central === undefined) {
      const why = theory.value(exact(Rational.fromNumber(at)), 6, shifts);
      return isRefusal(why) ? why : lost;
    }
    const linear = (dX - (moved - central)) / slope;
    if (Math.abs(linear) <= LINEAR * Math.abs(at)) return { value: at + linear, how: 'slope' };
    const f: Real = (p) => {
      const value = theory.number(p, shifts);
      return value === undefined ? undefined : value - target - dX;
    };
    const again = nearRoot(f, Math.max(at + linear, at / 2), slope, PRECISION) ?? bracketed(f, at, linear);
    return again === undefined ? lost : { value: again, how: 'refit' };
  };
}

/** The nearest root on the side to which the slope points. */
function bracketed(f: Real, at: number, linear: number): number | undefined {
  const far = linear > 0 ? at * 4 : at / 4;
  const scan = scanGrid(
    f,
    logGrid(at, far, 24).toSorted((a, b) => a - b),
  );
  const b = linear > 0 ? scan.brackets[0] : scan.brackets.at(-1);
  const found = b === undefined ? undefined : refineRoot(f, b, PRECISION);
  return found?.kind === 'root' ? found.p : undefined;
}
