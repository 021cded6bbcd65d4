/**
 * @module The second singularity, seen after the first one has been weakened.
 *
 * Purpose    which singularity lies behind the nearest one, and on which side.
 * Method     (1 − t/T)^m B(t) has Borel coefficients Δ^m (b_k T^k): the leading part loses m powers of k (a pole vanishes),
 *            any other keeps its size. Where the linear extrapolants of the ratios of what remains are stable over four k,
 *            and for two m, they give the next position.
 * Bound      indicative; refused where the remainder comes near the rounding of the input, and where it still points at T.
 * Reference  re-expansion about the factored singularity: R. B. Dingle, "Asymptotic Expansions", 1973 (idea).
 */
import { logGammaDouble } from '../numerics/index.js';
import type { Point } from './reading.js';

const POWERS = [1, 2, 4, 6, 8, 10, 12];
/** Consecutive extrapolants that must agree, and how well. */
const WINDOW = 4;
const STABLE = 0.06;
/** Two powers m must agree this well. */
const CONSISTENT = 0.1;
/** Positions nearer to T than this (relative, same side) are the first singularity again; farther than FAR are not looked at. */
const SAME = 1.12;
const FAR = 6;
/** The remainder must exceed the input's rounding by this factor. */
const ABOVE_ROUNDING = 1e3;

export interface Second {
  /** t₂/t₁, signed. */
  readonly ratio: number;
  readonly error: number;
}

function candidate(a: readonly number[], k0: number, m: number, rounding: number): Second | undefined {
  let d = [...a];
  for (let i = 0; i < m; i++) d = d.slice(1).map((v, j) => v - d[j]!);
  const floor = ABOVE_ROUNDING * rounding * 2 ** m * Math.max(...a.map(Math.abs));
  let best: { spread: number; value: number } | undefined;
  const linear: (number | undefined)[] = d.map((v, i) => {
    const before = d[i - 1];
    const twice = d[i - 2];
    if (before === undefined || twice === undefined || Math.abs(v) < floor) return undefined;
    const k = k0 + m + i;
    return (k * v) / before - ((k - 1) * before) / twice;
  });
  for (let i = WINDOW - 1; i < linear.length; i++) {
    const w = linear.slice(i - WINDOW + 1, i + 1);
    if (w.some((v) => v === undefined)) continue;
    const values = w.map((v) => v!);
    const mean = values.reduce((s, v) => s + v, 0) / WINDOW;
    const spread = Math.max(...values.map((v) => Math.abs(v / mean - 1)));
    if (spread < STABLE && (best === undefined || spread < best.spread)) best = { spread, value: mean };
  }
  if (best === undefined) return undefined;
  return { ratio: 1 / best.value, error: Math.abs(best.spread / best.value) };
}

/** points: consecutive ones from the first k on; logT and sign of T per step; q growth order per step. */
export function secondSingularity(
  points: readonly Point[],
  q: number,
  logT: number,
  signT: number,
): Second | undefined {
  if (points.length < 12) return undefined;
  const used = points.slice(0, 60);
  const base = used[Math.floor(used.length / 2)]!;
  const log = (p: Point): number => p.y - logGammaDouble(q * p.k + 1) + p.k * logT;
  const a = used.map((p) => p.sign * (signT < 0 && p.k % 2 === 1 ? -1 : 1) * Math.exp(log(p) - log(base)));
  const rounding = Math.max(...used.map((p) => p.sigma));
  let previous: Second | undefined;
  for (const m of POWERS) {
    const found = candidate(a, used[0]!.k, m, rounding);
    if (found !== undefined && previous !== undefined && Math.abs(found.ratio / previous.ratio - 1) < CONSISTENT) {
      const size = Math.abs(found.ratio);
      if (size < FAR && size > 1 / SAME && !(found.ratio > 0 && size < SAME)) {
        const better = found.error < previous.error ? found : previous;
        return { ratio: better.ratio, error: Math.max(better.error, Math.abs(found.ratio - previous.ratio)) };
      }
    }
    previous = found;
  }
  return undefined;
}
