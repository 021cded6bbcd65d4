/** @module What the quadrature rules of this folder take and return. */
import type { Complex } from '../ball/complex.js';

/** The integrand at z, an enclosure for every point of the rectangle z, to about prec bits. */
export type Integrand = (z: Complex, prec: number) => Complex;

export interface Integral {
  /** The radii are the error: proved (`certified`) or estimated from two levels (`converged`). */
  readonly value: Complex;
  readonly standing: 'certified' | 'converged';
  /** Evaluations of the integrand. */
  readonly evaluations: number;
}
