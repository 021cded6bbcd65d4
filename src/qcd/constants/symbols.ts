/** @module The transcendental numbers that stand in the constants, by the names used in the formulas. */
import { R, Rational, exactReal, type Ball, type Exact } from '../../numerics/index.js';

/** Enclosure of a number given by its decimals, half a unit of the last place as radius. */
function decimal(text: string): Exact {
  const q = Rational.parse(text) ?? Rational.ZERO;
  const places = text.length - text.indexOf('.') - 1;
  const half = Rational.of(1n, 2n * 10n ** BigInt(places));
  return exactReal((prec) => R.widen(R.fromRational(q, prec), R.fromRational(half, 32)));
}

/** Li_n(1/2) = Σ_{k≥1} 2^(−k) k^(−n); the terms after the K-th add up to less than 2^(−K). */
function polylogHalf(n: number, prec: number): Ball {
  const last = prec + 4;
  let sum: Ball = R.ZERO;
  for (let k = 1; k <= last; k++) {
    const term = R.fromRational(Rational.of(1n, BigInt(k) ** BigInt(n)), prec + 8);
    sum = R.add(sum, R.mul2exp(term, -k), prec + 8);
  }
  return R.widen(sum, R.mul2exp(R.ONE, -last));
}

export const SYMBOLS: Readonly<Record<string, Exact>> = {
  z2: decimal('1.64493406684822643647241516665'),
  z3: decimal('1.20205690315959428539973816151'),
  z4: decimal('1.08232323371113819151600369654'),
  z5: decimal('1.03692775514336992633136548646'),
  z6: decimal('1.01734306198444913971451792979'),
  z7: decimal('1.00834927738192282683979754985'),
  pi: decimal('3.14159265358979323846264338328'),
  ln2: decimal('0.693147180559945309417232121458'),
  gE: decimal('0.577215664901532860606512090082'),
  a4: exactReal((prec) => polylogHalf(4, prec)),
  a5: exactReal((prec) => polylogHalf(5, prec)),
  /**
   * The one master integral of the four-loop decoupling constant without a closed form used here: known to the digits
   * shown (Chetyrkin, Kühn, Sturm hep-ph/0512060; recalled, confirmed through the six decimals of FLAG's c_4).
   */
  X0: decimal('1.8088795462083347'),
};
