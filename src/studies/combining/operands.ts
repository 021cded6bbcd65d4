/** @module Series as operands: one coupling, one divisor, every order from the constant on. */
import { isZeroExact } from '../../numerics/index.js';
import { refuse } from '../../qcd/index.js';
import type { CouplingDivisor, Refusal } from '../../qcd/index.js';
import type { Series } from '../../series/index.js';
import { FormalReader } from '../derive/read-formal.js';
import type { Sources } from '../derive/sources.js';
import { derive, trackedExact } from '../derive/tracked.js';
import { divisorQuotient } from '../rewriting/beta.js';
import { trackedCoefficients } from '../rewriting/state.js';
import type { PowerSeries } from './power-series.js';

export interface Operand {
  /** The name in the expression. */
  readonly name: string;
  /** What the user called the series: id or path. The errors of equal ones are the same errors. */
  readonly from: string;
  readonly series: Series;
}

/** additive + factor Σ c_n x_own^(n + p) with x_own = x · divisor/own divisor. */
export async function operandSeries(
  operand: Operand,
  divisor: CouplingDivisor,
  sources: Sources,
): Promise<PowerSeries | Refusal> {
  const { series, from, name } = operand;
  const { firstPower, additive, factor } = series;
  const withConstant = !isZeroExact(additive);
  if (firstPower < 0 && withConstant) {
    return refuse(
      `${name} has both a constant and negative powers of the coupling`,
      'write the constant as a coefficient',
    );
  }
  const reader = new FormalReader(series);
  const list = await trackedCoefficients(series, from, sources);
  const constant = trackedExact(additive, await reader.read(additive));
  const front = trackedExact(factor, await reader.read(factor));
  const own = series.coupling.plain ? divisor : series.coupling.divisor;
  const steps = [divisorQuotient(divisor, own), divisorQuotient(own, divisor)];
  const power = withConstant ? 0 : firstPower;
  const length = firstPower - power + list.length;
  const coefficients = derive(
    [constant, front, ...steps, ...list],
    (ring, [c, f, up, down, ...x]) => {
      const step = up ?? ring.one;
      const each = firstPower < 0 ? (down ?? ring.one) : step;
      let weight = f ?? ring.one;
      for (let k = 0; k < Math.abs(firstPower); k++) weight = ring.mul(weight, each);
      const out = Array.from({ length }, () => ring.zero);
      x.forEach((value, n) => {
        out[firstPower - power + n] = ring.mul(value, weight);
        weight = ring.mul(weight, step);
      });
      if (withConstant) out[0] = ring.add(out[0] ?? ring.zero, c ?? ring.zero);
      return out;
    },
    { length },
  );
  return { power, coefficients, through: firstPower + list.length - 1 };
}
