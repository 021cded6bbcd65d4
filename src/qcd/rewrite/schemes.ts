/**
 * @module Other definitions of the coupling as relations to the MSbar coupling of the same n_f at the same scale.
 *
 * Method     C-scheme: the beta function is known in closed form, β̂(X) = −b_0 X²/(1 − q X), q = b_1/b_0, and x(X) follows
 *            from β(x(X)) = x′(X) β̂(X) order by order, its second coefficient b_0 C being the only freedom. Potential and
 *            mini-MOM couplings: published coefficients, rescaled to the divisor of the series.
 * Bound      exact (the numerically known three-loop constants carry their digits).
 * Reference  D. Boito, M. Jamin, R. Miravitllas, Phys. Rev. Lett. 117 (2016) 152001, arXiv:1606.06175 (C-scheme);
 *            M. Peter, hep-ph/9702245 (V coupling); L. von Smekal et al., arXiv:0903.1696 (mini-MOM).
 */
import { exact, mulExact, type Exact } from '../../numerics/index.js';
import { liftExact, type Ring } from '../algebra/ring.js';
import { derivative, integer, mulSeries, powSeries, truncate } from '../algebra/truncated.js';
import { betaCoefficients } from '../beta-function.js';
import { MINIMOM, POTENTIAL, exactOfFormal, formalAt, type PublishedConstant } from '../constants/index.js';
import { overFourPi, type CouplingDivisor } from '../divisor.js';
import type { CouplingRelation } from './relation.js';

/**
 * k_1 = 1, k_2 (given), k_3, … of x = Σ k_n X^n when dx/d ln μ² = −Σ b_k x^(k+2) and dX/d ln μ² = −Σ B_k X^(k+2) share
 * b_0 and b_1. The coefficient of X^(n+1) in β(x(X)) = x′ B(X) gives (n − 2) b_0 k_n. n terms need b_0 … b_(n−1).
 */
export function relationOfBetas<T>(ring: Ring<T>, b: readonly T[], bNew: readonly T[], second: T, terms: number): T[] {
  const k = [ring.zero, ring.one, second];
  const b0 = b[0] ?? ring.one;
  for (let n = 3; n <= terms; n++) {
    // With k_n = 0 so far: the mismatch of both sides at X^(n+1).
    const x = truncate(ring, k, n + 2);
    let left = ring.zero;
    b.slice(0, n).forEach((c, j) => {
      const power = powSeries(ring, x, j + 2, n + 2)[n + 1] ?? ring.zero;
      left = ring.add(left, ring.mul(c, power));
    });
    const beta = [ring.zero, ring.zero, ...bNew];
    const right = mulSeries(ring, derivative(ring, x), beta, n + 2)[n + 1] ?? ring.zero;
    k.push(ring.div(ring.sub(left, right), ring.mul(integer(ring, n - 2), b0)));
  }
  return k.slice(1, terms + 1);
}

/** Terms that the five-loop beta function fixes. */
const C_SCHEME_TERMS = 5;

/** b_0, b_0 q, b_0 q², …: the beta function of every C-scheme coupling. */
export function cSchemeBeta(flavours: number, divisor: CouplingDivisor, count: number): Exact[] {
  const [b0 = exact(0), b1 = exact(0)] = betaCoefficients(flavours, divisor);
  return liftExact([b0, b1], (ring, [c0, c1]) => {
    const first = c0 ?? ring.one;
    const q = ring.div(c1 ?? ring.zero, first);
    const out = [first];
    while (out.length < count) out.push(ring.mul(out[out.length - 1] ?? first, q));
    return out;
  });
}

/**
 * MSbar x in powers of the C-scheme coupling X, up to five terms:
 * 1/X + q ln X − b_0 C = 1/x + q ln x − …, so that Λ_C = Λ_MSbar e^(−C/2).
 */
export function cSchemeRelation(flavours: number, divisor: CouplingDivisor, c: Exact): CouplingRelation {
  const beta = betaCoefficients(flavours, divisor);
  const inC = cSchemeBeta(flavours, divisor, C_SCHEME_TERMS);
  return liftExact([c, ...beta, ...inC], (ring, [shift, ...x]) =>
    relationOfBetas(
      ring,
      x.slice(0, beta.length),
      x.slice(beta.length),
      ring.mul(x[0] ?? ring.one, shift ?? ring.zero),
      C_SCHEME_TERMS,
    ),
  );
}

/** X = x (1 + Σ_k d_k a^k), a = α_s/(4π), in powers of x = α_s/divisor. */
function publishedRelation(
  list: readonly PublishedConstant[],
  values: Readonly<Record<string, number>>,
  divisor: CouplingDivisor,
): CouplingRelation {
  const unit = overFourPi(divisor);
  let power = exact(1);
  return [
    exact(1),
    ...list.map((constant) => {
      power = mulExact(power, unit);
      return mulExact(exactOfFormal(formalAt(constant, values)), power);
    }),
  ];
}

/**
 * The coupling of the static potential, V(q) = −4π C_F α_V/q², at μ = |q|, in powers of the MSbar coupling with n_l
 * flavours: four terms, the ultrasoft logarithm of the last one left out.
 */
export const potentialRelation = (flavours: number, divisor: CouplingDivisor): CouplingRelation =>
  publishedRelation(POTENTIAL, { nl: flavours }, divisor);

/** The mini-MOM coupling in Landau gauge in powers of the MSbar coupling: four terms. */
export const minimomRelation = (flavours: number, divisor: CouplingDivisor): CouplingRelation =>
  publishedRelation(MINIMOM, { nf: flavours }, divisor);

/**
 * B_k of the beta function of X, dX/d ln μ² = −Σ B_k X^(k+2), from that of x and X in powers of x (k_1 = 1):
 * as many as both lists fix.
 */
export function betaInCoupling(beta: readonly Exact[], newInOld: CouplingRelation): Exact[] {
  const n = Math.min(beta.length, newInOld.length);
  return liftExact([...beta.slice(0, n), ...newInOld.slice(0, n)], (ring, x) => {
    const length = n + 2;
    const relation = [ring.zero, ...x.slice(n)];
    // B(X(x)) = X′(x) β(x): solve for B_0, B_1, … by matching powers of x, lowest first.
    const image = mulSeries(ring, derivative(ring, relation), [ring.zero, ring.zero, ...x.slice(0, n)], length);
    const rest = [...image];
    const out = [];
    for (let k = 0; k < n; k++) {
      const power = powSeries(ring, relation, k + 2, length);
      const c = ring.div(rest[k + 2] ?? ring.zero, power[k + 2] ?? ring.one);
      out.push(c);
      power.forEach((p, i) => {
        rest[i] = ring.sub(rest[i] ?? ring.zero, ring.mul(c, p));
      });
    }
    return out;
  });
}

/** Λ of a coupling X = x + k_2 x² + … over Λ of x: exp(k_2/(2 b_0)), exact to all orders. Returns the exponent. */
export function lambdaRatioExponent(beta: readonly Exact[], newInOld: CouplingRelation): Exact {
  const [value = exact(0)] = liftExact([beta[0] ?? exact(1), newInOld[1] ?? exact(0)], (ring, [b0, k2]) => [
    ring.div(k2 ?? ring.zero, ring.mul(integer(ring, 2), b0 ?? ring.one)),
  ]);
  return value;
}
