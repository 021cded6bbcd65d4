/**
 * @module The static potential in position space from the one in momentum space.
 *
 * Method     V(q) = −4πC_F α_V(q)/q² is written in α_s(1/r) with powers of l = ln(1/(r²q²)); the Fourier transform replaces
 *            l^n by n! [u^n] exp(2γ_E u + (π²/6) u² + (8/3) ζ(3) u³ + …), the expansion of Γ(1/2 − u)/(4^u √π Γ(1 + u)).
 * Bound      exact (three-loop constant numerically known); the ultrasoft logarithm is left out.
 * Reference  own Fourier transform; momentum-space coefficients: constants/potential.ts.
 */
import { exact, type Exact } from '../../numerics/index.js';
import { liftExact } from '../algebra/ring.js';
import { betaCoefficients } from '../beta-function.js';
import { exactOfFormal } from '../constants/index.js';
import { parseFormal } from '../constants/formal-parse.js';
import type { CouplingDivisor } from '../divisor.js';
import { scaleLogTable } from './scale.js';
import { potentialRelation } from './schemes.js';

/** Averages of l^0 … l^3 at μ = 1/r. */
const MOMENTS: readonly string[] = ['1', '2*gE', '4*gE^2 + pi^2/3', '8*gE^3 + 2*pi^2*gE + 16*z3'];

/** k_1 = 1, k_2, k_3, k_4 of V(r) = −(C_F divisor/r) Σ k_n x^n, x = α_s(1/r)/divisor with n_l flavours. */
export function positionPotential(flavours: number, divisor: CouplingDivisor): Exact[] {
  const coefficients = potentialRelation(flavours, divisor);
  const table = scaleLogTable({ coefficients, firstPower: 1 }, betaCoefficients(flavours, divisor));
  const moments = MOMENTS.map((text) => exactOfFormal(parseFormal(text)));
  return table.map((row) => {
    const [sum] = liftExact([...row, ...moments], (ring, x) => {
      // The table is in ln(q²/μ²) = −l.
      let total = ring.zero;
      row.forEach((_, k) => {
        const term = ring.mul(x[k] ?? ring.zero, x[row.length + k] ?? ring.zero);
        total = k % 2 === 0 ? ring.add(total, term) : ring.sub(total, term);
      });
      return [total];
    });
    return sum ?? exact(0);
  });
}
