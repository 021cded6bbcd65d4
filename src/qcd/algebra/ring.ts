/**
 * @module The arithmetic that series algebra needs, so that one text of a formula serves rationals, balls and doubles.
 * Purpose  coefficients that are rational stay exact; the others are enclosed to the precision asked.
 * Method   `liftExact` runs the same formula twice: once over rationals-or-unknown, which keeps every output that
 *          depends on rational inputs only; once over balls for the rest, when somebody asks for their digits.
 */
import { R, Rational, ballField, exact, exactReal, type Ball, type Exact, type Field } from '../../numerics/index.js';

/** What a formula may use; every Field of the numerics room is one. */
export type Ring<T> = Pick<Field<T>, 'zero' | 'one' | 'fromRational' | 'add' | 'sub' | 'mul' | 'div'>;

const UNKNOWN = 'some real number';
/** A rational, or no more than that it is some real number. (Not undefined: missing entries of arrays mean zero.) */
type Known = Rational | typeof UNKNOWN;

const isKnownZero = (a: Known): boolean => a !== UNKNOWN && a.isZero();

const knownRationals: Ring<Known> = {
  zero: Rational.ZERO,
  one: Rational.ONE,
  fromRational: (q) => q,
  add: (a, b) => (a === UNKNOWN || b === UNKNOWN ? UNKNOWN : a.add(b)),
  sub: (a, b) => (a === UNKNOWN || b === UNKNOWN ? UNKNOWN : a.sub(b)),
  mul(a, b) {
    if (isKnownZero(a) || isKnownZero(b)) return Rational.ZERO;
    return a === UNKNOWN || b === UNKNOWN ? UNKNOWN : a.mul(b);
  },
  div(a, b) {
    if (isKnownZero(a)) return Rational.ZERO;
    return a === UNKNOWN || b === UNKNOWN ? UNKNOWN : a.div(b);
  },
};

/** A formula over any ring: numbers in, numbers out. The length of the result must not depend on the ring. */
export type RingFormula = <T>(ring: Ring<T>, inputs: readonly T[]) => T[];

/** Guard bits to begin with; formulas that cancel more get twice as many until their results are sharp. */
const GUARD = 64;
/** The working precision stops growing at this multiple of what was asked, or when it no longer helps. */
const LARGEST_WORK = 16;

/** Correct bits of a ball: relative or, for a number that may be zero, absolute. */
function correctBits(x: Ball): number {
  return x.rad === 0 ? Infinity : Math.max(R.accuracyBits(x), -(x.exp + Math.log2(x.rad)));
}

interface Evaluation {
  readonly prec: number;
  readonly values: readonly Ball[];
  /** An input is known to a few digits only: more working bits change nothing. */
  readonly limited: boolean;
}

function evaluate(inputs: readonly Exact[], formula: RingFormula, prec: number): Evaluation {
  let reached = -Infinity;
  for (let work = prec + GUARD; ; work *= 2) {
    const values = formula<Ball>(
      ballField(work),
      inputs.map((x) => x.ball(work)),
    );
    const before = reached;
    reached = values.reduce((least, x) => Math.min(least, correctBits(x)), Infinity);
    const limited = before > -Infinity && reached <= before + 1;
    if (reached >= prec || limited || work > LARGEST_WORK * (prec + GUARD)) return { prec, values, limited };
  }
}

/**
 * Applies a formula to exact numbers. Outputs that depend only on rational inputs come back rational; the others
 * enclose. Throws RangeError when the formula divides by a rational zero.
 */
export function liftExact(inputs: readonly Exact[], formula: RingFormula): Exact[] {
  const known = formula<Known>(
    knownRationals,
    inputs.map((x) => x.rational ?? UNKNOWN),
  );
  let last: Evaluation | undefined;
  const at = (prec: number): readonly Ball[] => {
    if (last === undefined || (last.prec < prec && !last.limited)) last = evaluate(inputs, formula, prec);
    return last.values;
  };
  return known.map((q, i) => (q !== UNKNOWN ? exact(q) : exactReal((prec) => at(prec)[i] ?? R.INDETERMINATE)));
}
