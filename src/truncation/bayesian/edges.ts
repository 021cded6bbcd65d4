/**
 * @module Where to cut the integral over v = −ln a: exponentials of piecewise linear functions, however steep.
 *
 * On every piece the integrand is e^(−κ v) times a smooth factor. From the higher end of a piece the panels widen in units
 * of 1/|κ|, and what lies deeper than e^(−REACH) below that end is left out.
 */

/** Depth, in powers of e, at which a contribution is dropped: e^(−45) is 1e-20. */
const REACH = 45;
/** Ends of the panels in units of 1/|κ|; a matter of speed only, the quadrature halves panels as it needs. */
const STEPS = [9, 24, REACH];

export interface Decay {
  readonly from: number;
  readonly to: number;
  /** −d ln f/dv without the smooth factor; positive on a piece that reaches to infinity. */
  readonly rate: number;
}

/** Ascending edges for the pieces, further points (peaks, kinks) included where they lie inside. */
export function gradedEdges(
  pieces: readonly Decay[],
  points: readonly number[],
  steps: readonly number[] = STEPS,
): number[] {
  const edges = new Set<number>();
  for (const { from, to, rate } of pieces) {
    const inside = points.filter((v) => v > from && v < to).toSorted((a, b) => a - b);
    const stops = [from, ...inside, to];
    for (let i = 0; i + 1 < stops.length; i++) {
      const [low = 0, high = 0] = [stops[i], stops[i + 1]];
      edges.add(low);
      if (high < Infinity) edges.add(high);
      for (const step of steps) {
        const v = rate >= 0 ? low + step / rate : high + step / rate;
        if (v > low && v < high && v < Infinity) edges.add(v);
      }
    }
  }
  return [...edges].toSorted((a, b) => a - b);
}
