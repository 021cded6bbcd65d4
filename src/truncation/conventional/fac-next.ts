/**
 * @module The next term that fastest apparent convergence predicts.
 *
 * Method      the quantity as an effective charge d = x (R/(c_0 x^p))^(1/p)/x = x (1 + r_1 x + …) has a beta function
 *             −Σ ρ_k d^(k+2) of its own; ρ_n is linear in the unknown r_n, and r_n is set so that ρ_n equals the coefficient
 *             of the coupling's own beta function, which then drops out. Exact to the order needed.
 * Assumption  a beta function of the coupling (five loops known: up to five coefficients), and no other scale than Q.
 * Reference   G. Grunberg, Phys. Lett. B95 (1980) 70, Phys. Rev. D29 (1984) 2315; A. L. Kataev, V. V. Starshenko,
 *             Mod. Phys. Lett. A10 (1995) 235, hep-ph/9502348 [memory; formulas and published values reproduced].
 */
import {
  addExact,
  divExact,
  exact,
  isZeroExact,
  mulExact,
  subExact,
  toNumberExact,
  type Exact,
} from '../../numerics/index.js';
import { betaCoefficients, betaInCoupling } from '../../qcd/index.js';
import { endsWithZero } from '../conduct.js';
import { refuse, tooFew, type TruncationModel } from '../model.js';
import { conventionalBands } from './bands.js';

/** (1 + g_1 x + …)^power to as many terms. f_n = (1/n) Σ_k (k·power − n + k) g_k f_{n−k}. */
function powerOf(g: readonly Exact[], power: Exact): Exact[] {
  const f = [exact(1)];
  for (let n = 1; n < g.length; n++) {
    let sum = exact(0);
    for (let k = 1; k <= n; k++) {
      const weight = addExact(mulExact(exact(k), power), exact(k - n));
      sum = addExact(sum, mulExact(weight, mulExact(g[k] ?? exact(0), f[n - k] ?? exact(0))));
    }
    f.push(divExact(sum, exact(n)));
  }
  return f;
}

/**
 * c_{n}/c_0 of R = c_0 x^p (1 + …) from the n known coefficients.
 *
 * @param beta b_0 … b_{n−1} at least, in the normalisation of x; b_n drops out.
 */
export function facPrediction(coefficients: readonly Exact[], power: number, beta: readonly Exact[]): Exact {
  const [first = exact(1)] = coefficients;
  const n = coefficients.length;
  const relative = coefficients.map((c) => divExact(c, first));
  const charge = powerOf(relative, divExact(exact(1), exact(power)));
  const known = [...beta.slice(0, n), exact(0)];
  const rho = (unknown: number): Exact => betaInCoupling(known, [...charge, exact(unknown)])[n] ?? exact(0);
  const [without, withOne] = [rho(0), rho(1)];
  const root = divExact(subExact(exact(0), without), subExact(withOne, without));
  const whole = powerOf([...charge, root], exact(power));
  return whole[n] ?? exact(0);
}

export const facNext: TruncationModel = {
  name: 'fac-next',
  title: 'FAC-predicted next term',
  summary: 'the next term if the effective charge ran like the coupling',
  nature: 'conventional',
  about: 'next term',
  digits: 5,
  priors: ['conventional.double'],
  reference: 'G. Grunberg 1980, 1984; A. L. Kataev, V. V. Starshenko, hep-ph/9502348',
  estimate(question) {
    const { known, expansion, coupling, flavours } = question;
    if (coupling.plain || flavours === undefined) {
      return refuse(
        'no beta function: the variable is plain, or the number of flavours is not stated',
        'state the flavours in the series file, or with --flavours',
      );
    }
    const refused = tooFew(known, 2, 'nothing to predict from') ?? endsWithZero(known);
    if (refused !== undefined) return refused;
    if (known.stride !== 1 || expansion.power < 1)
      return refuse(
        'the series is no positive power of an effective charge',
        'take out what is not: a constant, or every other power',
      );
    const n = known.values.length;
    const beta = betaCoefficients(flavours, coupling.divisor);
    if (n > beta.length) {
      return refuse(
        `${n} coefficients need as many loops of the beta function; ${beta.length} are known`,
        `cut the series with --order so that ${beta.length} coefficients remain`,
      );
    }
    const [first = exact(1)] = expansion.coefficients;
    if (isZeroExact(first)) return refuse('the leading coefficient is zero', 'cut the zeros in front');
    const ratio = toNumberExact(facPrediction(expansion.coefficients.slice(0, n), expansion.power, beta));
    // t_n/t_0 = (c_n/c_0) x^n.
    const next =
      ratio *
      Math.exp(n * known.logX + (known.logs[0] ?? 0)) *
      Math.sign(known.values[0] ?? 1) *
      Math.sign(toNumberExact(expansion.x)) ** n;
    if (!Number.isFinite(next))
      return refuse('the prediction does not exist for these coefficients', 'use the Padé-predicted next term');
    return { kind: 'estimate', terms: n, next, bands: conventionalBands(next, question), facts: [], notes: [] };
  },
};
