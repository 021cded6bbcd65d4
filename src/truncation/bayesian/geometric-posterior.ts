/**
 * @module Posterior of the geometric model.
 *
 * Purpose    the next relative term δ_{m+1}, given δ_0 … δ_m.
 * Model      δ_k uniform in [−c a^k, c a^k]; P(a) = (1+ω)(1−a)^ω on (0,1); P(c) = ε c^(−1−ε) for c > 1.
 * Method     with n = m+1, s = n+ε, M(a) = max(1, max |δ_k| a^(−k)), the integral over c is closed; what remains is
 *            P(a|δ) ∝ (1−a)^ω a^(−m(m+1)/2) M(a)^(−s), and given a the next term is bounded-uniform with power s and
 *            scale a^(m+1) M(a). With v = −ln a, M is the exponential of a convex polygon and the integral over v is done
 *            piece by piece.
 * Bound      relative 1e-11 by the quadrature's own estimate.
 * Reference  M. Bonvini, Eur. Phys. J. C 80 (2020) 989, arXiv:2006.16293; C. Duhr, A. Huss, A. Mazeliauskas,
 *            R. Szafron, JHEP 09 (2021) 122, arXiv:2106.04585 [abstracts seen, priors from memory; integrals re-derived].
 */
import { integrate, panelNodes } from '../numeric/quadrature.js';
import { increasingRoot } from '../numeric/root.js';
import { densityAt, within } from './bounded-uniform.js';
import { gradedEdges, type Decay } from './edges.js';
import { upperEnvelope } from './envelope.js';

export interface GeometricPrior {
  readonly omega: number;
  readonly epsilon: number;
}

export interface GeometricPosterior {
  /** ln P(δ_0 … δ_m). */
  readonly logEvidence: number;
  readonly meanRatio: number;
  /** The posterior as a sum over ratios: weights adding up to 1, and ln of the scale of the next term. Good to 1e-5. */
  readonly components: readonly { readonly weight: number; readonly logScale: number }[];
  /** P(|δ_{m+1}| < d), from ln d. */
  within(logD: number): number;
  /** Density of δ_{m+1} at ±d, from ln d. */
  density(logD: number): number;
  /** ln d with P(|δ_{m+1}| < d) = p; NaN if none is found. */
  logHalfWidth(p: number): number;
}

const TOLERANCE = 1e-11;
/** Of ln d. */
const QUANTILE_TOLERANCE = 1e-10;

/**
 * The posterior from ln|δ_k|, k = 0 … m; −Infinity for a zero.
 *
 * @returns undefined when the posterior cannot be normalised: the sequence ends with too many zeros.
 */
export function geometricPosterior(logs: readonly number[], prior: GeometricPrior): GeometricPosterior | undefined {
  const { omega, epsilon } = prior;
  const n = logs.length;
  const m = n - 1;
  const s = n + epsilon;
  const triangle = (m * (m + 1)) / 2;
  const pieces = upperEnvelope([[0, 0], ...logs.map((l, k): [number, number] => [k, l])]);
  const rate = (slope: number): number => s * slope - triangle + 1;
  if (!(rate(pieces.at(-1)?.slope ?? 0) > 0)) return undefined;

  const logM = (v: number): number => {
    const piece = pieces.find((p) => v < p.to) ?? { slope: 0, offset: 0 };
    return piece.offset + piece.slope * v;
  };
  const logWeight = (v: number): number =>
    (triangle - 1) * v - s * logM(v) + (omega === 0 ? 0 : omega * Math.log(-Math.expm1(-v)));
  /** ln of the scale of the next term; falls with v. */
  const logScale = (v: number): number => logM(v) - n * v;

  const decays: Decay[] = pieces.map((p) => ({ from: p.from, to: p.to, rate: rate(p.slope) }));
  const peaks = decays.flatMap((d) => (d.rate > 0 && omega > 0 ? [Math.log1p(omega / d.rate)] : []));
  const own = gradedEdges(decays, peaks);
  const top = Math.max(...own.filter((v) => v > 0 || omega === 0).map(logWeight));
  const weight = (v: number): number => Math.exp(logWeight(v) - top);
  const total = integrate(weight, own, TOLERANCE).value;

  /** Mean of g(ln d − ln scale) over the posterior of a, cut where the two are equal. */
  const mean = (logD: number, g: (logR: number, v: number) => number): number => {
    const kink = pieces.map((p) => (p.offset - logD) / (n - p.slope)).find((v, i) => inPiece(v, pieces[i]));
    const edges = kink === undefined ? own : gradedEdges(decays, [...peaks, kink]);
    return integrate((v) => weight(v) * g(logD - logScale(v), v), edges, TOLERANCE).value / total;
  };
  const inside = (logD: number): number => mean(logD, (logR) => within(s, Math.exp(logR)));

  const nodes = own.slice(1).flatMap((to, i) => panelNodes(own[i] ?? 0, to));
  const sum = nodes.reduce((t, node) => t + node.kronrod * weight(node.at), 0);

  return {
    components: nodes.map(({ at, kronrod }) => ({ weight: (kronrod * weight(at)) / sum, logScale: logScale(at) })),
    logEvidence: Math.log(((1 + omega) * epsilon * total) / s) + top - n * Math.LN2,
    meanRatio: integrate((v) => weight(v) * Math.exp(-v), own, TOLERANCE).value / total,
    within: inside,
    density: (logD) => mean(logD, (logR, v) => densityAt(s, Math.exp(logR)) * Math.exp(-logScale(v))),
    logHalfWidth: (p) =>
      increasingRoot((logD) => inside(logD) - p, logScale(own[1] ?? 0), 1, QUANTILE_TOLERANCE) ?? Number.NaN,
  };
}

const inPiece = (v: number, piece: { readonly from: number; readonly to: number } | undefined): boolean =>
  piece !== undefined && v > piece.from && v < piece.to;
