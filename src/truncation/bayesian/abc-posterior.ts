/**
 * @module Posterior of the abc model: a ratio a of either sign, a bias b and a width c.
 *
 * Purpose    the next relative term δ_{m+1}, given δ_0 … δ_m, with signs: the interval need not be symmetric.
 * Model      δ_k/a^k − b uniform in [−c, c]; P(a) = ½(1+ω)(1−|a|)^ω on (−1,1); P(b,c) = ε η^ε/(2ξ c^(2+ε)) for c > η,
 *            |b| < ξ c.
 * Method     b and c are integrated in closed form (abc-inner); a = ±e^(−v) by Kronrod panels in v that are halved until the
 *            evidence stands. The predictive distribution is the sum over the same nodes; the embedded Gauss rule on them
 *            tells its error.
 * Bound      none proved; relative 1e-7 of the evidence and absolute 1e-5 of the distribution by the rules' difference.
 * Reference  C. Duhr, A. Huss, A. Mazeliauskas, R. Szafron, JHEP 09 (2021) 122, arXiv:2106.04585
 *            [abstract seen, priors from memory; integrals re-derived].
 */
import { panelNodes } from '../numeric/quadrature.js';
import type { Predictive } from '../numeric/predictive.js';
import { abcInner, outside, type AbcInner, type AbcShape, type Outside } from './abc-inner.js';
import { gradedEdges } from './edges.js';
import { upperEnvelope } from './envelope.js';

export interface AbcPrior extends AbcShape {
  readonly omega: number;
}

/** A relative term: sign and ln of the size. */
export interface SignedLog {
  readonly sign: number;
  readonly log: number;
}

export interface AbcPosterior extends Predictive {
  /** ln P(δ_0 … δ_m). */
  readonly logEvidence: number;
  /** Posterior means of a and of δ_{m+1} = b a^(m+1). */
  readonly meanRatio: number;
  readonly mean: number;
  /** ln of the unit in which y, mean, centre and spread are given. */
  readonly logUnit: number;
  /** Largest difference of the two rules in the distribution at y. */
  ruleDifference(y: number): number;
}

interface RatioNode {
  readonly ratio: number;
  readonly inner: AbcInner;
  readonly logWeight: number;
  readonly kronrod: number;
  readonly gauss: number;
}

interface Panel {
  readonly from: number;
  readonly to: number;
  readonly sign: 1 | -1;
  readonly nodes: readonly RatioNode[];
}

/** Makes the distribution good to about 1e-5. */
const TOLERANCE = 1e-9;
/** Panels with a steeper fall than this, in powers of e, are halved in any case. */
const STEEP = 20;
/** Panels whose highest point lies deeper than this below the top contribute nothing. */
const NEGLIGIBLE = 30;
const MOST_PANELS = 400;
/** First panels of a piece in units of its decay length: few, since panels are halved as needed. */
const FEW_STEPS = [14, 45];
/** Nodes of less weight are left out of the sum. */
const NO_WEIGHT = 1e-10;

/** ln of δ_k/a^k with its sign, extremes scaled to 1: what the inner integral needs. */
function innerAt(terms: readonly SignedLog[], sign: 1 | -1, v: number, shape: AbcShape): AbcInner {
  let logScale = -Infinity;
  terms.forEach((t, k) => {
    logScale = Math.max(logScale, t.log + k * v);
  });
  let [lo, hi] = [Infinity, -Infinity];
  terms.forEach((t, k) => {
    const value = t.sign * (k % 2 === 0 ? 1 : sign) * Math.exp(t.log + k * v - logScale);
    lo = Math.min(lo, value);
    hi = Math.max(hi, value);
  });
  return abcInner(terms.length, lo, hi, logScale, shape);
}

/**
 * The posterior from δ_0 … δ_m.
 *
 * @param tolerance a panel is halved while its rules differ by more than this share of the evidence
 * @returns undefined when it cannot be normalised: the sequence ends with too many zeros.
 */
export function abcPosterior(
  terms: readonly SignedLog[],
  prior: AbcPrior,
  tolerance = TOLERANCE,
): AbcPosterior | undefined {
  const { omega, epsilon, eta, xi } = prior;
  const n = terms.length;
  const m = n - 1;
  const triangle = (m * (m + 1)) / 2;
  // Far down in a the polygon's lowest point follows the largest |δ_k|/a^k: the same envelope as for the geometric model.
  const pieces = upperEnvelope([[0, Math.log(eta)], ...terms.map((t, k): [number, number] => [k, t.log])]);
  const decays = pieces.map((p) => ({ from: p.from, to: p.to, rate: (n + epsilon) * p.slope - triangle + 1 }));
  if (!((decays.at(-1)?.rate ?? 0) > 0)) return undefined;
  const edges = gradedEdges(decays, [], FEW_STEPS);

  const logPrior = Math.log((1 + omega) / 2) + Math.log(epsilon / (2 * xi)) + epsilon * Math.log(eta) - n * Math.LN2;
  const makePanel = (from: number, to: number, sign: 1 | -1): Panel => ({
    from,
    to,
    sign,
    nodes: panelNodes(from, to).map(({ at, kronrod, gauss }) => {
      const inner = innerAt(terms, sign, at, prior);
      const logWeight = inner.logWeight + (triangle - 1) * at + omega * Math.log(-Math.expm1(-at));
      return { ratio: sign * Math.exp(-at), inner, logWeight, kronrod, gauss };
    }),
  });
  const panels: Panel[] = [];
  for (let i = 0; i + 1 < edges.length; i++) {
    for (const sign of [1, -1] as const) panels.push(makePanel(edges[i] ?? 0, edges[i + 1] ?? 0, sign));
  }
  refine(panels, makePanel, tolerance);

  const all = panels.flatMap((p) => p.nodes);
  const top = Math.max(...all.map((node) => node.logWeight));
  const total = all.reduce((sum, node) => sum + node.kronrod * Math.exp(node.logWeight - top), 0);
  const kept = all.filter((node) => node.kronrod * Math.exp(node.logWeight - top) > NO_WEIGHT * total);
  const share = (node: RatioNode, rule: number): number => (rule * Math.exp(node.logWeight - top)) / total;

  // y = z a^n: the unit of a node in y, as a logarithm; the posterior mean of these is the unit of the answer.
  const logSize = (node: RatioNode): number => node.inner.logUnit + n * Math.log(Math.abs(node.ratio));
  const logUnit = kept.reduce((sum, node) => sum + share(node, node.kronrod) * logSize(node), 0);
  const spots = kept.map((node) => ({
    inner: node.inner,
    ratio: node.ratio,
    weight: share(node, node.kronrod),
    gaussWeight: share(node, node.gauss),
    size: Math.exp(logSize(node) - logUnit),
    flip: node.ratio < 0 && n % 2 === 1,
  }));
  const scratch = { tail: 0, pdf: 0 };
  const mixture = (y: number, by: 'weight' | 'gaussWeight'): { cdf: number; pdf: number } => {
    let cdf = 0;
    let pdf = 0;
    for (const spot of spots) {
      const w = spot[by];
      if (w === 0) continue;
      below(spot.inner, (spot.flip ? -y : y) / spot.size, scratch);
      cdf += w * (spot.flip ? 1 - scratch.tail : scratch.tail);
      pdf += (w * scratch.pdf) / spot.size;
    }
    return { cdf, pdf };
  };
  const meanOf = (f: (spot: (typeof spots)[number]) => number): number =>
    spots.reduce((sum, spot) => sum + spot.weight * f(spot), 0);
  const mean = meanOf((spot) => (spot.flip ? -1 : 1) * spot.inner.meanBias * spot.size);
  return {
    logEvidence: logPrior + top + Math.log(total),
    meanRatio: meanOf((spot) => spot.ratio),
    mean,
    logUnit,
    centre: mean,
    spread: meanOf((spot) => (spot.inner.hi - spot.inner.lo + 1) * spot.size),
    at: (y) => mixture(y, 'weight'),
    ruleDifference: (y) => Math.abs(mixture(y, 'weight').cdf - mixture(y, 'gaussWeight').cdf),
  };
}

/** Distribution function (as `tail`) and density of z at fixed a, into `out`. */
function below(inner: AbcInner, z: number, out: Outside): void {
  if (z > inner.hi) {
    outside(inner, z, 1, out);
    out.tail = 1 - out.tail;
  } else if (z < inner.lo) outside(inner, z, -1, out);
  else {
    out.tail = inner.below + (z - inner.lo) * inner.plateau;
    out.pdf = inner.plateau;
  }
}

/** Halves panels until the evidence stands. */
function refine(panels: Panel[], make: (from: number, to: number, sign: 1 | -1) => Panel, tolerance: number): void {
  for (let round = 0; round < 30; round++) {
    const top = Math.max(...panels.flatMap((p) => p.nodes.map((node) => node.logWeight)));
    const measured = panels.map((panel) => {
      let [kronrod, gauss, least, most] = [0, 0, Infinity, -Infinity];
      for (const node of panel.nodes) {
        const weight = Math.exp(node.logWeight - top);
        kronrod += node.kronrod * weight;
        gauss += node.gauss * weight;
        least = Math.min(least, node.logWeight);
        most = Math.max(most, node.logWeight);
      }
      return { kronrod, error: Math.abs(kronrod - gauss), steep: most > top - NEGLIGIBLE && most - least > STEEP };
    });
    const total = measured.reduce((sum, p) => sum + p.kronrod, 0);
    const poor = panels.filter((_, i) => {
      const p = measured[i];
      return p !== undefined && (p.error > tolerance * total || (p.steep && p.kronrod > tolerance * total));
    });
    if (poor.length === 0 || panels.length + poor.length > MOST_PANELS) return;
    for (const panel of poor) {
      const middle = (panel.from + panel.to) / 2;
      panels.splice(panels.indexOf(panel), 1, make(panel.from, middle, panel.sign), make(middle, panel.to, panel.sign));
    }
  }
}
