/**
 * @module The probability of a larger χ².
 *
 * Method     Q(a, x) = Γ(a, x)/Γ(a), a = dof/2, x = χ²/2: the power series of the lower function for x < a + 1, the continued
 *            fraction of the upper one beyond (modified Lentz).
 * Bound      relative 1e-13 for dof up to some thousands.
 * Reference  DLMF 8.11.4 and 8.9.2 (numbers from memory).
 */
import { logGammaDouble } from '../../numerics/index.js';

const STEPS = 10_000;
const EPSILON = 1e-16;
const TINY = 1e-300;

/** P(a, x) by its series. */
function lower(a: number, x: number): number {
  let term = 1 / a;
  let sum = term;
  for (let n = 1; n < STEPS; n++) {
    term *= x / (a + n);
    sum += term;
    if (Math.abs(term) < EPSILON * Math.abs(sum)) break;
  }
  return sum * Math.exp(a * Math.log(x) - x - logGammaDouble(a));
}

/** Q(a, x) by its continued fraction. */
function upper(a: number, x: number): number {
  let b = x + 1 - a;
  let c = 1 / TINY;
  let d = 1 / b;
  let h = d;
  for (let i = 1; i < STEPS; i++) {
    const an = -i * (i - a);
    b += 2;
    d = an * d + b;
    if (Math.abs(d) < TINY) d = TINY;
    c = b + an / c;
    if (Math.abs(c) < TINY) c = TINY;
    d = 1 / d;
    const step = d * c;
    h *= step;
    if (Math.abs(step - 1) < EPSILON) break;
  }
  return h * Math.exp(a * Math.log(x) - x - logGammaDouble(a));
}

/** Probability that χ² with so many degrees of freedom exceeds the value. */
export function chiSquareTail(value: number, dof: number): number {
  if (!(value > 0)) return 1;
  const [a, x] = [dof / 2, value / 2];
  return x < a + 1 ? 1 - lower(a, x) : upper(a, x);
}
