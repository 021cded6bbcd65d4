/**
 * @module The abc model at a fixed ratio a: bias b and width c integrated in closed form.
 *
 * Purpose    weight of a, and distribution of z = δ_{m+1}/a^(m+1) given a.
 * Method     with n = m+1, s = n+1+ε, lo/hi the extremes of δ_k/a^k, the integral over c leaves M(b)^(−s)/s with the polygon
 *            M(b) = max(η, |b|/ξ, hi−b, b−lo). The density of z is s/(2(s+1)) · ∫db max(M, |z−b|)^(−s−1) / ∫db M^(−s): constant
 *            for lo ≤ z ≤ hi; its tails integrate to powers at the corners of the polygon and at the two points at most
 *            where |z−b| = M.
 * Bound      rounding; short sides of the polygon lose relative, not absolute accuracy.
 * Reference  C. Duhr, A. Huss, A. Mazeliauskas, R. Szafron, JHEP 09 (2021) 122, arXiv:2106.04585
 *            [abstract seen, priors from memory; integrals re-derived].
 */
import { moments, polygonOf, type Polygon } from './polygon.js';

export interface AbcShape {
  readonly epsilon: number;
  readonly xi: number;
  readonly eta: number;
}

export interface AbcInner {
  /** ln of ∫db M^(−s)/s in the original unit. */
  readonly logWeight: number;
  /** ln of the unit of everything below. */
  readonly logUnit: number;
  readonly lo: number;
  readonly hi: number;
  readonly polygon: Polygon;
  /** s/(2(s+1)) / ∫db M^(−s). */
  readonly norm: number;
  /** Posterior mean of b. */
  readonly meanBias: number;
  /** Density of z between lo and hi. */
  readonly plateau: number;
  /** P(z < lo). */
  readonly below: number;
}

/** The inner integrals for n values v_k = δ_k/a^k with extremes lo and hi in units of e^logScale; η in the original unit. */
export function abcInner(n: number, lo: number, hi: number, logScale: number, shape: AbcShape): AbcInner {
  const s = n + 1 + shape.epsilon;
  const polygon = polygonOf(lo, hi, shape.eta * Math.exp(-logScale), shape.xi, s);
  const { area, first } = moments(polygon);
  const norm = s / (2 * (s + 1) * area);
  const bottom = lo / polygon.lowest;
  const edge = outside({ polygon, norm }, bottom, -1);
  const logUnit = logScale + Math.log(polygon.lowest);
  // Written out field by field: this object is made a thousand times for one answer.
  return {
    polygon,
    norm,
    lo: bottom,
    hi: hi / polygon.lowest,
    logWeight: Math.log(area / s) + (1 - s) * logUnit,
    logUnit,
    meanBias: first / area,
    plateau: edge.pdf,
    below: edge.tail,
  };
}

/** Tail and density of z, written over by every call: the sum over ratios asks for them a hundred thousand times. */
export interface Outside {
  tail: number;
  pdf: number;
}

/** P(z' beyond z) and the density at z, for z ≥ hi (toward = 1) or z ≤ lo (toward = −1), into `out`. */
export function outside(
  { polygon, norm }: Pick<AbcInner, 'polygon' | 'norm'>,
  z: number,
  toward: 1 | -1,
  out: Outside = { tail: 0, pdf: 0 },
): Outside {
  const { s, slope, offset, bound, power } = polygon;
  // D = toward·(z − b) exceeds the convex M on one interval, from farFrom to farTo.
  let farFrom = Infinity;
  let farTo = -Infinity;
  for (let i = 0; i < slope.length; i++) {
    const bend = toward + (slope[i] ?? 0);
    const gap = toward * z - (offset[i] ?? 0);
    let from = bound[i] ?? 0;
    let to = bound[i + 1] ?? 0;
    if (bend > 0) to = Math.min(to, gap / bend);
    else if (bend < 0) from = Math.max(from, gap / bend);
    else if (gap <= 0) continue;
    if (from >= to) continue;
    if (from < farFrom) farFrom = from;
    if (to > farTo) farTo = to;
  }
  const empty = farFrom >= farTo;
  const powerFrom = empty || farFrom === -Infinity ? 0 : (toward * (z - farFrom)) ** -s;
  const powerTo = empty || farTo === Infinity ? 0 : (toward * (z - farTo)) ** -s;
  // ∫ D^(−s)/s and ∫ D^(−s−1) over the interval.
  const firstFrom = powerFrom === 0 ? 0 : (z - farFrom) * powerFrom;
  const firstTo = powerTo === 0 ? 0 : (z - farTo) * powerTo;
  out.tail = (firstTo - firstFrom) / (s * (s - 1));
  out.pdf = (toward * (powerTo - powerFrom)) / s;
  // The rest of the line. At the ends of the interval D = M.
  for (let i = 0; i < slope.length; i++) {
    const from = bound[i] ?? 0;
    const to = bound[i + 1] ?? 0;
    const low = power[i] ?? 0;
    const high = power[i + 1] ?? 0;
    if (empty) addNear(out, polygon, i, z * toward, toward, from, to, low, high);
    else {
      if (from < farFrom)
        addNear(
          out,
          polygon,
          i,
          z * toward,
          toward,
          from,
          Math.min(to, farFrom),
          low,
          to <= farFrom ? high : powerFrom,
        );
      if (to > farTo)
        addNear(out, polygon, i, z * toward, toward, Math.max(from, farTo), to, from >= farTo ? low : powerTo, high);
    }
  }
  out.tail *= norm;
  out.pdf *= norm;
  return out;
}

/** Adds ∫ [(1+1/s) M^(−s) − D M^(−s−1)] and ∫ M^(−s−1) over a stretch of side i, given M^(−s) at its ends; zed = toward·z. */
function addNear(
  out: Outside,
  { s, slope, offset }: Polygon,
  i: number,
  zed: number,
  toward: 1 | -1,
  from: number,
  to: number,
  low: number,
  high: number,
): void {
  if (from >= to) return;
  const p = slope[i] ?? 0;
  const q = offset[i] ?? 0;
  if (p === 0) {
    out.tail += (to - from) * low * (1 + 1 / s - (zed - (toward * (from + to)) / 2) / q);
    out.pdf += ((to - from) * low) / q;
    return;
  }
  const whole = ((high === 0 ? 0 : high * (q + p * to)) - (low === 0 ? 0 : low * (q + p * from))) / (p * (1 - s));
  const raised = (low - high) / (p * s);
  const slant = toward / p;
  out.tail += (1 + 1 / s + slant) * whole - (zed + slant * q) * raised;
  out.pdf += raised;
}
