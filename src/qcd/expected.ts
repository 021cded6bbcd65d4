/**
 * @module Borel singularities that the operator product expansion and the renormalisation group demand.
 *
 * Purpose    a power correction Λ^d/Q^d puts a singularity (1 − t/t_s)^(−γ)[1 + c_1(1 − t/t_s) + c_2(1 − t/t_s)² + …] into the
 *            Borel plane; position, exponent and all c_k follow from d, the beta function and the coefficient function.
 * Method     Im of the lateral Borel sum ∝ x^k (1 + C_1 x + C_2 x² + …) Λ^d with
 *            (Λ/μ)^d = e^(−t_s/x) (b_0 x)^(−d β_1/(2β_0²)) (1 + s_1 x + s_2 x² + …) exactly, so with p = γ − 1
 *            t_s = d/(2 b_0),  γ = 1 + d β_1/(2β_0²) − (anomalous term) − k,  c_j = s_j t_s^j/(p(p−1)…(p−j+1)),
 *            where s is the product of the two brackets and ln Σ s_j x^j = (d/2b_0) Σ_j h_j x^(j+1)/(j+1) for C = 0,
 *            h_j the coefficient of x^(j+2) in 1/(1 + (b_1/b_0)x + (b_2/b_0)x² + …).
 *            d < 0 gives the ultraviolet singularities on the negative axis.
 * Bound      exact: rational whenever the ingredients are.
 * Reference  M. Beneke, Phys. Rept. 317 (1999) 1; A. Pineda, JHEP 06 (2001) 022, hep-ph/0105008 (c_1, c_2 for d = 1);
 *            M. Beneke, M. Jamin, JHEP 09 (2008) 044, arXiv:0806.3156, section 5.
 */
import { Rational, addExact, divExact, exact, mulExact, signExact, subExact, type Exact } from '../numerics/index.js';
import { integer, expSeries, mulSeries, reciprocal } from './algebra/truncated.js';
import { liftExact, type Ring } from './algebra/ring.js';
import { betaCoefficients } from './beta-function.js';
import { overFourPi, type CouplingDivisor } from './divisor.js';

export interface WilsonCoefficient {
  /** k: the coefficient function of the power correction starts at x^k. Default 0. */
  readonly power?: number;
  /** C_1, C_2, … of C = C_0 x^k (1 + C_1 x + C_2 x² + …), x the expansion variable of the series. */
  readonly corrections?: readonly Exact[];
}

export interface ExpectedSingularityInput {
  readonly flavours: number;
  /** Operator dimension d ≠ 0; negative for the ultraviolet singularity at u = d/2. */
  readonly dimension: Rational | number;
  /** The term that the operator's one-loop anomalous dimension subtracts from the exponent; see anomalousTerm. */
  readonly anomalousDimension?: Exact;
  readonly wilson?: WilsonCoefficient;
  readonly divisor: CouplingDivisor;
  /** A world in which the beta function ends after so many loops; QCD's five when absent. */
  readonly loops?: number;
}

export interface ExpectedSingularity {
  /** Position in u = β_0 α_s-normalised Borel variable: d/2. */
  readonly u: Rational;
  /** Position in the Borel variable conjugate to x = α_s/divisor. */
  readonly t: Exact;
  /** γ of (1 − t/t_s)^(−γ). */
  readonly exponent: Exact;
  /** c_1, c_2, c_3: as many as the five-loop beta function fixes; fewer when γ is a small positive integer (logarithms). */
  readonly corrections: readonly Exact[];
  readonly kind: 'infrared' | 'ultraviolet';
}

/** Corrections fixed by β_2, β_3, β_4. */
const CORRECTIONS = 3;

/** u per unit of t: β_0 divisor/(4π); rational unless the divisor is 1. */
export function uPerT(flavours: number, divisor: CouplingDivisor): Exact {
  return mulExact(betaNought(flavours), overFourPi(divisor));
}

const betaNought = (flavours: number): Exact => betaCoefficients(flavours)[0] ?? exact(0);

/**
 * The term 2 γ_O/β_0 that an operator with −d O/d ln μ = γ_O (α_s/π) O subtracts from the exponent
 * (Beneke, Jamin arXiv:0806.3156, section 5).
 */
export function anomalousTerm(gammaOverPi: Exact, flavours: number): Exact {
  return divExact(mulExact(exact(2), gammaOverPi), betaNought(flavours));
}

/** s_1 … s_n of (Λ/μ)^d = leading · (1 + s_1 x + …) times the Wilson coefficient, from b_0 … b_(n+1). */
function lambdaSeries<T>(ring: Ring<T>, beta: readonly T[], d: T, wilson: readonly T[], n: number): T[] {
  const b0 = beta[0] ?? ring.one;
  const inverse = reciprocal(
    ring,
    beta.map((b) => ring.div(b, b0)),
    n + 2,
  );
  const scale = ring.div(d, ring.mul(integer(ring, 2), b0));
  const exponent = [ring.zero];
  for (let j = 1; j <= n; j++) {
    exponent.push(ring.div(ring.mul(scale, inverse[j + 1] ?? ring.zero), integer(ring, j)));
  }
  const powers = expSeries(ring, exponent, n + 1);
  return mulSeries(ring, powers, [ring.one, ...wilson], n + 1);
}

/** Position, exponent and subleading coefficients of the singularity of one operator dimension. */
export function expectedSingularity(input: ExpectedSingularityInput): ExpectedSingularity {
  const dimension = input.dimension instanceof Rational ? input.dimension : Rational.of(input.dimension);
  if (dimension.isZero()) throw new RangeError('expectedSingularity: dimension 0 is no power correction');
  const beta = betaCoefficients(input.flavours).map((b, k) => (k < (input.loops ?? Infinity) ? b : exact(0)));
  const power = Rational.of(input.wilson?.power ?? 0);
  // In a = α_s/(4π) everything but Wilson coefficients given in α_s itself is free of π.
  const toA = overFourPi(input.divisor);
  let scale = exact(1);
  const wilson = (input.wilson?.corrections ?? []).slice(0, CORRECTIONS).map((c) => {
    scale = mulExact(scale, toA);
    return divExact(c, scale);
  });
  const half = exact(dimension.div(Rational.of(2)));
  const anomalous = input.anomalousDimension ?? exact(0);

  const [b0 = exact(0), b1 = exact(0)] = beta;
  const leading = divExact(mulExact(half, b1), mulExact(b0, b0));
  const p = subExact(subExact(leading, anomalous), exact(power));
  const count = usableCorrections(p);
  const inputs = [exact(dimension), p, ...beta, ...wilson];
  const corrections = liftExact(inputs, (ring, [d, exponent, ...rest]) => {
    if (d === undefined || exponent === undefined) return [];
    const b = rest.slice(0, beta.length);
    const s = lambdaSeries(ring, b, d, rest.slice(beta.length), count);
    const t = ring.div(d, ring.mul(integer(ring, 2), b[0] ?? ring.one));
    const out = [];
    let factor = ring.one;
    for (let j = 1; j <= count; j++) {
      factor = ring.div(ring.mul(factor, t), ring.sub(exponent, integer(ring, j - 1)));
      out.push(ring.mul(s[j] ?? ring.zero, factor));
    }
    return out;
  });

  return {
    u: dimension.div(Rational.of(2)),
    t: divExact(half, uPerT(input.flavours, input.divisor)),
    exponent: addExact(p, exact(1)),
    corrections,
    kind: dimension.sign() > 0 ? 'infrared' : 'ultraviolet',
  };
}

/**
 * The first ultraviolet singularity, u = −1, that every series of a short-distance quantity has beside its infrared ones:
 * operators of dimension six in the Lagrangian, d = −2. For correlators of quark currents its coefficient function starts at
 * 1/x, which makes the double pole of the large-β_0 limit (γ = 2 − β_1/β_0², the default); `doublePole: false` for
 * quantities with a simple one. Anomalous dimensions of the operators are left out.
 */
export function ultravioletPartner(input: {
  readonly flavours: number;
  readonly divisor: CouplingDivisor;
  readonly doublePole?: boolean;
}): ExpectedSingularity {
  const { flavours, divisor, doublePole = true } = input;
  return expectedSingularity({ flavours, divisor, dimension: -2, wilson: { power: doublePole ? -1 : 0 } });
}

/** How many c_j exist: c_j has the factor 1/(p(p−1)…(p−j+1)). */
function usableCorrections(p: Exact): number {
  for (let j = 0; j < CORRECTIONS; j++) {
    const q = p.rational;
    const vanishes = q !== undefined ? q.equals(Rational.of(j)) : signExact(subExact(p, exact(j))) === 0;
    if (vanishes) return j;
  }
  return CORRECTIONS;
}
