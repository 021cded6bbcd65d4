/**
 * @module M(b) = max(η, |b|/ξ, hi−b, b−lo), a convex polygon, with its powers at the corners.
 *
 * The lowest point of M is the unit, so that M ≥ 1 and no power of it overflows.
 */

export interface Polygon {
  /** Exponent of the powers. */
  readonly s: number;
  /** M = offset[i] + slope[i] b between bound[i] and bound[i+1]. */
  readonly slope: readonly number[];
  readonly offset: readonly number[];
  /** Corners, with −Infinity in front and Infinity behind. */
  readonly bound: readonly number[];
  /** M^(−s) at the corners; 0 at infinity. */
  readonly power: readonly number[];
  /** The unit, in the unit of the arguments. */
  readonly lowest: number;
}

/** Minimum of the maximum of lines: the highest crossing of a falling and a rising line, or a flat line above it. */
function lowestPoint(slopes: readonly number[], offsets: readonly number[]): number {
  let lowest = Number.MIN_VALUE;
  for (let i = 0; i < slopes.length; i++) {
    const [p, q] = [slopes[i] ?? 0, offsets[i] ?? 0];
    if (p === 0) lowest = Math.max(lowest, q);
    if (p >= 0) continue;
    for (let j = 0; j < slopes.length; j++) {
      const r = slopes[j] ?? 0;
      if (r > 0) lowest = Math.max(lowest, (q * r - (offsets[j] ?? 0) * p) / (r - p));
    }
  }
  return lowest;
}

/** The polygon; all arguments in one unit, lo ≤ hi, eta ≥ 0, xi > 0. */
export function polygonOf(lo: number, hi: number, eta: number, xi: number, s: number): Polygon {
  const steep = xi >= 1 ? [-1, -1 / xi, 0, 1 / xi, 1] : [-1 / xi, -1, 0, 1, 1 / xi];
  const lifts = xi >= 1 ? [hi, 0, eta, 0, -lo] : [0, hi, eta, -lo, 0];
  const lowest = lowestPoint(steep, lifts);
  const slope: number[] = [];
  const offset: number[] = [];
  const bound: number[] = [];
  for (let i = 0; i < steep.length; i++) {
    const [p, q] = [steep[i] ?? 0, (lifts[i] ?? 0) / lowest];
    let from = -Infinity;
    while (slope.length > 0) {
      const [topSlope, topOffset] = [slope.at(-1) ?? 0, offset.at(-1) ?? 0];
      if (p > topSlope) from = (topOffset - q) / (p - topSlope);
      else from = q >= topOffset ? -Infinity : Infinity;
      if (from > (bound.at(-1) ?? -Infinity)) break;
      slope.pop();
      offset.pop();
      bound.pop();
      from = -Infinity;
    }
    if (from === Infinity) continue;
    slope.push(p);
    offset.push(q);
    bound.push(from);
  }
  const power = bound.map((b, i) => (b === -Infinity ? 0 : ((offset[i] ?? 0) + (slope[i] ?? 0) * b) ** -s));
  return { s, slope, offset, bound: [...bound, Infinity], power: [...power, 0], lowest };
}

export interface Stretch {
  /** ∫ M^(−s) db, ∫ b M^(−s) db. */
  readonly area: number;
  readonly first: number;
}

/** Integrals over the whole line. */
export function moments({ s, slope, offset, bound, power }: Polygon): Stretch {
  let [area, first] = [0, 0];
  for (let i = 0; i < slope.length; i++) {
    const [p, q] = [slope[i] ?? 0, offset[i] ?? 0];
    const [from, to] = [bound[i] ?? 0, bound[i + 1] ?? 0];
    const [low, high] = [power[i] ?? 0, power[i + 1] ?? 0];
    if (p === 0) {
      area += low * (to - from);
      first += (low * (to - from) * (to + from)) / 2;
      continue;
    }
    // M^(1−s) at the ends; the power 0 at infinity stays 0.
    const a = low === 0 ? 0 : low * (q + p * from);
    const b = high === 0 ? 0 : high * (q + p * to);
    const own = (b - a) / (p * (1 - s));
    const second = (b === 0 ? 0 : b * (q + p * to)) - (a === 0 ? 0 : a * (q + p * from));
    area += own;
    first += (second / (p * (2 - s)) - q * own) / p;
  }
  return { area, first };
}
