/** @module The transcendental numbers that stand in the constants, by the names used in the formulas. */
import { R, Rational, eulerGamma, exactReal, ln2, pi, polylogHalf, zeta, type Exact } from '../../numerics/index.js';

/** Enclosure of a number given by its decimals, half a unit of the last place as radius. */
function decimal(text: string): Exact {
  const q = Rational.parse(text) ?? Rational.ZERO;
  const places = text.length - text.indexOf('.') - 1;
  const half = Rational.of(1n, 2n * 10n ** BigInt(places));
  return exactReal((prec) => R.widen(R.fromRational(q, prec), R.fromRational(half, 32)));
}

export const SYMBOLS: Readonly<Record<string, Exact>> = {
  z2: exactReal((prec) => zeta(2, prec)),
  z3: exactReal((prec) => zeta(3, prec)),
  z4: exactReal((prec) => zeta(4, prec)),
  z5: exactReal((prec) => zeta(5, prec)),
  z6: exactReal((prec) => zeta(6, prec)),
  z7: exactReal((prec) => zeta(7, prec)),
  pi: exactReal(pi),
  ln2: exactReal(ln2),
  gE: exactReal(eulerGamma),
  a4: exactReal((prec) => polylogHalf(4, prec)),
  a5: exactReal((prec) => polylogHalf(5, prec)),
  /**
   * The one master integral of the four-loop decoupling constant without a closed form used here: known to the digits
   * shown (Chetyrkin, Kühn, Sturm hep-ph/0512060; recalled, confirmed through the six decimals of FLAG's c_4).
   */
  X0: decimal('1.8088795462083347'),
};
