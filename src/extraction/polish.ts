/**
 * @module The last digits of a root, with the prescription itself: Newton steps in exact arithmetic with the slope in doubles,
 * then a change of sign around the result.
 *
 * Bound      certified by the change of sign where the values are enclosures and nothing in doubles enters; elsewhere one step,
 *            and the digits of doubles.
 */
import { R, Rational, exact, toDecimal, toNumberExact } from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';
import { isRefusal } from '../qcd/index.js';
import type { Standing } from '../studies/index.js';
import type { Theory } from './theory.js';

/** Digits of a solution in doubles. */
const DOUBLE_DIGITS = 13;
/** Digits of the values of one step. */
const STEP_DIGITS = 17;
/** Newton steps: the slope brings so many digits a step. */
const DIGITS_PER_STEP = 8;
const FIRST_STEPS = 3;

const fromDouble = (x: number): Exact => exact(Rational.fromNumber(x));

export interface Polished {
  readonly at: Exact;
  readonly text: string;
  readonly standing: Standing;
}

const decimals = (x: number, digits: number): string =>
  toDecimal(R.addRelativeError(R.fromNumber(x), 10 ** -digits), digits).text;

/** Is the unknown the coupling itself, so that no double enters? */
function ownFrame(theory: Theory, at: number): boolean {
  const place = theory.placeAt(fromDouble(at), {});
  return theory.terms.length === 0 && !isRefusal(place) && place.factor === 1 && place.steps.length === 0;
}

export function polish(theory: Theory, target: Exact, start: number, slope: number, digits: number): Polished {
  if (!ownFrame(theory, start)) return oneStep(theory, target, start, slope, digits);
  const work = digits + 3;
  const prec = Math.ceil(work * 3.33) + 64;
  const miss = (p: Rational): Ball | undefined => {
    const value = theory.value(exact(p), work);
    return isRefusal(value) ? undefined : R.sub(value, target.ball(prec), prec);
  };
  let p = Rational.fromNumber(start);
  for (let k = 0; k < FIRST_STEPS + digits / DIGITS_PER_STEP; k++) {
    const f = miss(p);
    if (f === undefined) break;
    const move = R.midpoint(R.round(R.exactMid(f), 64)).div(Rational.fromNumber(slope));
    p = R.midpoint(R.round(R.fromRational(p.sub(move), prec), prec));
    // The next step would be shorter by the error of the slope.
    if (Math.abs(move.toNumber()) < Math.abs(start) * 10 ** (DIGITS_PER_STEP - digits - 3)) break;
  }
  const margin = Rational.fromNumber(start * 10 ** -(digits + 1));
  const [low, high] = [miss(p.sub(margin)), miss(p.add(margin))];
  const opposite =
    low !== undefined &&
    high !== undefined &&
    ((R.isNegative(low) && R.isPositive(high)) || (R.isPositive(low) && R.isNegative(high)));
  if (!opposite) return { at: exact(p), text: decimals(p.toNumber(), DOUBLE_DIGITS), standing: 'converged' };
  const ball = R.addError(R.fromRational(p, prec), margin.toNumber());
  return { at: exact(p), text: toDecimal(ball, digits).text, standing: 'certified' };
}

function oneStep(theory: Theory, target: Exact, start: number, slope: number, digits: number): Polished {
  const prec = STEP_DIGITS * 4 + 64;
  const value = theory.value(fromDouble(start), STEP_DIGITS);
  const move = isRefusal(value) ? 0 : R.toNumber(R.sub(value, target.ball(prec), prec)) / slope;
  const at = fromDouble(start - move);
  return { at, text: decimals(toNumberExact(at), Math.min(digits, DOUBLE_DIGITS)), standing: 'converged' };
}
