/**
 * @module The upper envelope of straight lines q + p v: where the largest |δ_k| a^(−k) changes hands, with a = e^(−v).
 */

export interface Piece {
  readonly from: number;
  /** Infinity for the last piece. */
  readonly to: number;
  readonly slope: number;
  readonly offset: number;
}

/** Pieces of max_i (offset_i + slope_i v) on v ≥ 0, ascending; lines of offset −Infinity count as absent. */
export function upperEnvelope(lines: readonly (readonly [slope: number, offset: number])[]): Piece[] {
  const present = lines.filter(([, offset]) => offset > -Infinity);
  const pieces: Piece[] = [];
  let v = 0;
  let current = highestAt(present, 0);
  while (current !== undefined) {
    const [slope, offset] = current;
    let to = Infinity;
    let next: readonly [number, number] | undefined;
    for (const line of present) {
      if (line[0] <= slope) continue;
      const crossing = Math.max(v, (offset - line[1]) / (line[0] - slope));
      // Of several lines that take over at one point the steepest one stays on top.
      if (crossing < to || (crossing === to && line[0] > (next?.[0] ?? 0))) [to, next] = [crossing, line];
    }
    if (to > v) pieces.push({ from: v, to, slope, offset });
    v = to;
    current = next;
  }
  return pieces;
}

/** The highest line at v; the steepest one of several. */
function highestAt(
  lines: readonly (readonly [slope: number, offset: number])[],
  v: number,
): readonly [number, number] | undefined {
  let best: readonly [number, number] | undefined;
  for (const line of lines) {
    const gain = best === undefined ? 1 : line[1] + line[0] * v - (best[1] + best[0] * v);
    if (gain > 0 || (gain === 0 && line[0] > (best?.[0] ?? 0))) best = line;
  }
  return best;
}
