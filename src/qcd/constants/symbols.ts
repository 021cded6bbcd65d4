/** @module The transcendental numbers that stand in the constants, by the names used in the formulas. */
import * as B from '../../numerics/ball/real.js';
import { exactReal, type Exact } from '../../numerics/exact.js';
import { Rational } from '../../numerics/rational.js';

/** Enclosure of a number given by its decimals, half a unit of the last place as radius. */
function decimal(text: string): Exact {
  const q = Rational.parse(text) ?? Rational.ZERO;
  const places = text.length - text.indexOf('.') - 1;
  const half = Rational.of(1n, 2n * 10n ** BigInt(places));
  return exactReal((prec) => B.widen(B.fromRational(q, prec), B.fromRational(half, 32)));
}

export const SYMBOLS: Readonly<Record<string, Exact>> = {
  z2: decimal('1.64493406684822643647241516665'),
  z3: decimal('1.20205690315959428539973816151'),
  z4: decimal('1.08232323371113819151600369654'),
  z5: decimal('1.03692775514336992633136548646'),
  z6: decimal('1.01734306198444913971451792979'),
  z7: decimal('1.00834927738192282683979754985'),
  pi: decimal('3.14159265358979323846264338328'),
};
