/**
 * @module R-evolution: the dependence of an MSR mass on its scale, summed.
 *
 * Formula    dm/d ln R = −R γ(α_s(R)), γ = Σ_{n≥0} γ_n a^(n+1), γ_n = a_{n+1} − 2 Σ_{j<n} (n−j) β_j a_{n−j}; integrated over the
 *            coupling: m(R_1) − m(R_0) = −∫ dα R(α) γ(α)/β_R(α), β_R = dα/d ln R, R(α) in closed form.
 *            Leading logarithms: (γ_0/2β_0) [R_0 E(x_0) − R_1 E(x_1)], E(x) = e^(−x) Ei(x), x = 2π/(β_0 α), one-loop running.
 * Method     double-exponential quadrature; the same with twice the step tells how far the digits go.
 * Bound      converged: 1e-14 relative for couplings below 1.
 * Reference  A. Hoang, A. Jain, I. Scimemi, I. Stewart, arXiv:0803.4214, arXiv:0908.3189.
 */
import { branchSameDouble, exact, mulExact, subExact, type Exact } from '../numerics/index.js';
import { betaCoefficients, betaNumbers, flowOf, logOverLambda, type Loops } from '../qcd/index.js';
import type { SeriesInA } from './definition.js';

const gammas = new WeakMap<SeriesInA, SeriesInA>();

/** γ_0, γ_1, … of the series a_1, a_2, … as a series in a. */
export function gammaSeries(series: SeriesInA): SeriesInA {
  const found = gammas.get(series);
  if (found !== undefined) return found;
  const made: SeriesInA = {
    ...series,
    key: `γ of ${series.key}`,
    coefficients(light) {
      const a = series.coefficients(light);
      const beta = betaCoefficients(light);
      return a.map((_, n) => {
        let sum: Exact = a[n] ?? exact(0);
        for (let j = 0; j < n; j++) {
          const weight = mulExact(exact(2 * (n - j)), beta[j] ?? exact(0));
          sum = subExact(sum, mulExact(weight, a[n - 1 - j] ?? exact(0)));
        }
        return sum;
      });
    },
  };
  gammas.set(series, made);
  return made;
}

/** Nodes and weights of x = tanh(π/2 sinh s) on [−1, 1] at s = k h, |s| ≤ 3.2: what lies beyond is below rounding. */
const STEP = 1 / 16;
const REACH = 3.2;

interface Node {
  /** Distance from the nearer end of [0, 1], and which end. */
  readonly near: number;
  readonly fromLeft: boolean;
  readonly weight: number;
  readonly coarse: boolean;
}

const NODES: readonly Node[] = Array.from({ length: 2 * Math.floor(REACH / STEP) + 1 }, (_, i) => {
  const k = i - Math.floor(REACH / STEP);
  const s = k * STEP;
  const u = (Math.PI / 2) * Math.sinh(Math.abs(s));
  const near = 1 / (1 + Math.exp(2 * u));
  return { near, fromLeft: k <= 0, weight: Math.PI * Math.cosh(s) * near * (1 - near) * STEP, coarse: k % 2 === 0 };
});

export interface REvolution {
  /** R_0 and R_1 in GeV. */
  readonly from: number;
  /** α_s at λR_0 and λR_1 with n_l flavours. */
  readonly alphaFrom: number;
  readonly alphaTo: number;
  readonly light: number;
  /** Loops of the running. */
  readonly loops: Loops;
  /** γ_n in the coupling at λR; as many as are to count. */
  readonly gamma: readonly number[];
}

export interface REvolved {
  /** m(R_1) − m(R_0) in GeV. */
  readonly shift: number;
  /** The difference to the quadrature with twice the step. */
  readonly doubt: number;
}

/** The sum over the evolution. λ enters through the couplings and γ_n alone. */
export function rEvolve(question: REvolution): REvolved {
  const { from, alphaFrom, alphaTo, light, loops, gamma } = question;
  const flow = flowOf(light, loops);
  const start = logOverLambda(flow, alphaFrom);
  const width = alphaTo - alphaFrom;
  let fine = 0;
  let coarse = 0;
  for (const node of NODES) {
    const alpha = node.fromLeft ? alphaFrom + width * node.near : alphaTo - width * node.near;
    const a = alpha / (4 * Math.PI);
    let g = 0;
    for (let n = gamma.length - 1; n >= 0; n--) g = (g + (gamma[n] ?? 0)) * a;
    let s = 0;
    for (let k = flow.s.length - 1; k >= 0; k--) s = s * alpha + (flow.s[k] ?? 0);
    const R = from * Math.exp((logOverLambda(flow, alpha) - start) / 2);
    const part = (node.weight * R * g) / (2 * flow.b0 * alpha * alpha * s);
    fine += part;
    if (node.coarse) coarse += 2 * part;
  }
  return { shift: width * fine, doubt: Math.abs(width * (fine - coarse)) };
}

/** The leading logarithms in closed form, one-loop running from α_s(R_0). */
export function leadingLogShift(from: number, to: number, alphaFrom: number, light: number, gamma0: number): number {
  const [beta0 = NaN] = betaNumbers(light, 1);
  const x0 = (2 * Math.PI) / (beta0 * alphaFrom);
  const x1 = x0 + Math.log(to / from);
  const scaled = (x: number): number => branchSameDouble(0, x).pv;
  return (gamma0 / (2 * beta0)) * (from * scaled(x0) - to * scaled(x1));
}
