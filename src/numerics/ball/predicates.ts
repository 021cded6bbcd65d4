/**
 * @module Certain-truth predicates of real balls: true only when it holds for every point of the ball.
 * `containsZero` is the negation of "certainly not zero".
 */
import { UP } from './core.js';
import type { Ball } from './core.js';

export function isExactZero(a: Ball): boolean {
  return a.mid === 0n && a.rad === 0;
}
export function isPositive(a: Ball): boolean {
  return a.mid > 0n && exceedsRadius(a);
}
export function isNegative(a: Ball): boolean {
  return a.mid < 0n && exceedsRadius(a);
}
/** May the ball hold zero? (false only when it certainly does not) */
export function containsZero(a: Ball): boolean {
  return !exceedsRadius(a);
}
function exceedsRadius(a: Ball): boolean {
  if (a.rad === 0) return a.mid !== 0n;
  if (a.rad === Infinity) return false;
  return Math.abs(Number(a.mid)) * (1 - 2 ** -50) > a.rad * UP;
}
