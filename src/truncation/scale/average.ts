/**
 * @module The geometric model averaged over the renormalisation scale.
 *
 * Assumption  at every scale the geometric model, ln μ uniform within [μ_0/F, F μ_0].
 * Method      marginalisation weights each scale with the probability P(δ(μ)) of its known terms, averaging does not:
 *             P(Δ) = Σ_j W_j P(Δ | δ(μ_j)),  W_j ∝ w_j P(δ(μ_j)) or w_j, w_j the weights of Gauss and Legendre.
 *             The first prefers the scale of fastest apparent convergence, the second does not.
 * Reference   M. Bonvini, arXiv:2006.16293; C. Duhr, A. Huss, A. Mazeliauskas, R. Szafron, arXiv:2106.04585
 *             [abstracts seen, priors from memory].
 */
import { geometricPosterior, type GeometricPosterior, type GeometricPrior } from '../bayesian/geometric-posterior.js';
import { distributionAt } from '../bayesian/bounded-uniform.js';
import { ENDS_WITH_ZEROS } from '../bayesian/geometric.js';
import { doesNotFall } from '../conduct.js';
import { refuse, tooFew, type Question, type TruncationModel, type TruncationRefusal } from '../model.js';
import { gaussLegendre } from '../numeric/gauss-legendre.js';
import { shortestIntervals, type Predictive } from '../numeric/predictive.js';
import { movedTerms } from './moved-terms.js';

/** The terms at one scale, and the weight of the scale in the quadrature over ln μ. */
export interface ScaleNode {
  readonly weight: number;
  readonly terms: readonly number[];
}

export interface ScaleAverage extends Predictive {
  /** Posterior weight of each scale. */
  readonly weights: readonly number[];
  /** Mean of the sum of the known terms over the scales. */
  readonly mean: number;
}

const sumOf = (terms: readonly number[]): number => terms.reduce((a, b) => a + b, 0);

const posteriorsKept = new WeakMap<readonly ScaleNode[], { prior: GeometricPrior; posteriors: GeometricPosterior[] }>();

/** The posterior at each scale, kept: both models ask for the same ones. Undefined when one cannot be normalised. */
function posteriorsOf(nodes: readonly ScaleNode[], prior: GeometricPrior): GeometricPosterior[] | undefined {
  const before = posteriorsKept.get(nodes);
  if (before !== undefined && before.prior.omega === prior.omega && before.prior.epsilon === prior.epsilon)
    return before.posteriors;
  const posteriors: GeometricPosterior[] = [];
  for (const { terms } of nodes) {
    const first = Math.log(Math.abs(terms[0] ?? 0));
    const posterior = geometricPosterior(
      terms.map((t) => Math.log(Math.abs(t)) - first),
      prior,
    );
    if (posterior === undefined) return undefined;
    posteriors.push(posterior);
  }
  posteriorsKept.set(nodes, { prior, posteriors });
  return posteriors;
}

/** Probability of the components that are left out, all together: far below the three digits shown. */
const LEFT_OUT = 1e-10;

/** The components without the lightest ones. */
function heaviest<T extends { readonly weight: number }>(parts: readonly T[]): T[] {
  const sorted = parts.toSorted((a, b) => a.weight - b.weight);
  let left = 0;
  return sorted.filter(({ weight }) => (left += weight) > LEFT_OUT);
}

/**
 * Distribution of the sum with the next term included, over the scales; undefined when a posterior cannot be normalised.
 *
 * @param marginal weight each scale with the probability of its terms
 */
export function averageOverScales(
  nodes: readonly ScaleNode[],
  prior: GeometricPrior,
  marginal: boolean,
): ScaleAverage | undefined {
  const posteriors = posteriorsOf(nodes, prior);
  if (posteriors === undefined) return undefined;
  const logs = nodes.map((node, j) => Math.log(node.weight) + (marginal ? (posteriors[j]?.logEvidence ?? 0) : 0));
  const top = Math.max(...logs);
  const raw = logs.map((l) => Math.exp(l - top));
  const total = sumOf(raw);
  const weights = raw.map((w) => w / total);
  const s = (nodes[0]?.terms.length ?? 0) + prior.epsilon;
  const parts = nodes.flatMap((node, j) =>
    (posteriors[j]?.components ?? []).map(({ weight, logScale }) => ({
      weight: weight * (weights[j] ?? 0),
      offset: sumOf(node.terms),
      scale: Math.exp(logScale) * Math.abs(node.terms[0] ?? 0),
    })),
  );
  const kept = heaviest(parts);
  const mean = nodes.reduce((sum, node, j) => sum + (weights[j] ?? 0) * sumOf(node.terms), 0);
  const at = (y: number): { cdf: number; pdf: number } => {
    let [cdf, pdf] = [0, 0];
    for (const { weight, offset, scale } of kept) {
      const r = (y - offset) / scale;
      const { inside, density } = distributionAt(s, Math.abs(r));
      cdf += (weight * (1 + Math.sign(r) * inside)) / 2;
      pdf += (weight * density) / scale;
    }
    return { cdf, pdf };
  };
  const spread = kept.reduce((sum, p) => sum + p.weight * (p.scale + Math.abs(p.offset - mean)), 0);
  return { weights, mean, at, centre: mean, spread };
}

const nodesKept = new WeakMap<Question, ScaleNode[] | TruncationRefusal>();

/** The known terms at the nodes in ln μ, worked out once for a question. */
function scaleNodes(question: Question): ScaleNode[] | TruncationRefusal {
  const nodes = nodesKept.get(question) ?? nodesOf(question);
  nodesKept.set(question, nodes);
  return nodes;
}

function nodesOf(question: Question): ScaleNode[] | TruncationRefusal {
  const logFactor = Math.log(question.priors['scale.factor']);
  const nodes: ScaleNode[] = [];
  for (const { at, weight } of gaussLegendre(question.priors['scale.nodes'])) {
    const moved = question.atScale(2 * logFactor * at);
    if (moved.kind === 'refusal') return moved;
    nodes.push({ weight, terms: movedTerms(question, moved) });
  }
  return nodes;
}

function average(marginal: boolean): TruncationModel['estimate'] {
  return (question) => {
    const { known, priors } = question;
    const refused =
      tooFew(known, 2, 'there is no ratio to learn from') ?? doesNotFall(known, 'terms below c a^k with a < 1');
    if (refused !== undefined) return refused;
    if (known.stride !== 1)
      return refuse(
        'the series has every other coefficient only: it is no expansion in a running coupling',
        'use a model that needs no scale',
      );
    const nodes = scaleNodes(question);
    if ('kind' in nodes) return nodes;
    const prior = { omega: priors['geometric.omega'], epsilon: priors['geometric.epsilon'] };
    const result = averageOverScales(nodes, prior, marginal);
    if (result === undefined) return ENDS_WITH_ZEROS;
    const sum = sumOf(known.values);
    const [one, two] = shortestIntervals(result, [0.68, 0.95]);
    if (one === undefined || two === undefined) return ENDS_WITH_ZEROS;
    const band = ({ low, high }: typeof one): typeof one => ({ low: low - sum, high: high - sum });
    return {
      kind: 'estimate',
      terms: known.values.length,
      bands: { 68: band(one), 95: band(two) },
      facts: [{ name: 'mean over the scales, from the sum', value: result.mean - sum, scaled: true }],
      notes: [],
    };
  };
}

const shared = {
  nature: 'credible',
  about: 'next term',
  digits: 3,
  priors: ['scale.factor', 'scale.nodes', 'scale.loops', 'geometric.omega', 'geometric.epsilon'],
  reference: 'M. Bonvini, arXiv:2006.16293; C. Duhr, A. Huss, A. Mazeliauskas, R. Szafron, arXiv:2106.04585',
} as const;

export const scaleMarginalised: TruncationModel = {
  ...shared,
  name: 'scale-marginalised',
  title: 'scale-marginalised geometric model',
  summary: 'geometric model over the scales, weighted by how well they converge',
  estimate: average(true),
};

export const scaleAveraged: TruncationModel = {
  ...shared,
  name: 'scale-averaged',
  title: 'scale-averaged geometric model',
  summary: 'geometric model over the scales, all alike',
  estimate: average(false),
};
