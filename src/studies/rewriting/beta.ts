/** @module The beta function of the coupling of a series, as tracked numbers. */
import { Rational, divExact, exact } from '../../numerics/index.js';
import {
  BETA,
  FORMAL_ONE,
  betaCoefficients,
  formalAt,
  mulFormal,
  overFourPi,
  type CouplingDivisor,
  type Formal,
} from '../../qcd/index.js';
import { formalOverFourPi, inFileNames } from '../derive/symbols.js';
import { derive, trackedExact } from '../derive/tracked.js';
import type { Tracked } from '../derive/tracked.js';

/** (divisor/4π)^k. */
export function unitPower(divisor: CouplingDivisor, k: number): Tracked {
  const unit = formalOverFourPi(divisor);
  let formal: Formal = FORMAL_ONE;
  for (let i = 0; i < k; i++) formal = mulFormal(formal, unit);
  const one = trackedExact(overFourPi(divisor), unit);
  const [value] = derive([one], (ring, [u]) => [powerOf(ring.one, k, (x) => ring.mul(x, u ?? ring.one))], {
    length: 1,
  });
  return trackedExact(value?.value ?? one.value, formal);
}

/** How many π a divisor holds, and the number beside it. */
const PARTS = { '1': [0, 1], pi: [1, 1], '2*pi': [1, 2], '4*pi': [1, 4] } as const;

/** over/under for two divisors of the coupling: the factor of x^n when a series in α/under is written in α/over. */
export function divisorQuotient(over: CouplingDivisor, under: CouplingDivisor): Tracked {
  const [[p, m], [q, n]] = [PARTS[over], PARTS[under]];
  const name = p === q ? '' : p > q ? 'pi' : 'pi^-1';
  const formal: Formal = { terms: new Map([[name, Rational.of(m, n)]]) };
  // Equal divisors, or equal powers of π, leave a rational number.
  return p === q
    ? trackedExact(exact(Rational.of(m, n)))
    : trackedExact(divExact(overFourPi(over), overFourPi(under)), formal);
}

function powerOf<T>(one: T, k: number, times: (x: T) => T): T {
  let power = one;
  for (let i = 0; i < k; i++) power = times(power);
  return power;
}

/** b_0, b_1, … of dx/d ln μ² = −Σ b_k x^(k+2), x = α_s/divisor in MSbar, through `loops` loops. */
export function trackedBeta(flavours: number, divisor: CouplingDivisor, loops: number): Tracked[] {
  const unit = formalOverFourPi(divisor);
  const values = betaCoefficients(flavours, divisor);
  let power: Formal = FORMAL_ONE;
  return BETA.slice(0, loops).map((constant, k) => {
    power = mulFormal(power, unit);
    const formal = mulFormal(inFileNames(formalAt(constant, { nf: Rational.of(flavours) })), power);
    const value = values[k];
    if (value === undefined) throw new RangeError(`beta coefficient ${k} is missing`);
    return trackedExact(value, formal);
  });
}

/** b_0, b_0 q, b_0 q², …, q = b_1/b_0: the beta function of every C-scheme coupling, exact to all orders. */
export function trackedCBeta(flavours: number, divisor: CouplingDivisor, count: number): Tracked[] {
  return derive(
    trackedBeta(flavours, divisor, 2),
    (ring, [b0, b1]) => {
      const first = b0 ?? ring.one;
      const q = ring.div(b1 ?? ring.zero, first);
      const out = [first];
      for (let k = 1; k < count; k++) out.push(ring.mul(out[k - 1] ?? first, q));
      return out;
    },
    { length: count },
  );
}
