/** @module Is the number of flavours at a scale clear, or are two of them in use? */
import { DEFAULT_THRESHOLDS, crossingScale } from '../qcd/index.js';
import type { Threshold } from '../qcd/index.js';

/**
 * From a little below a quark mass to twice the mass, α_s is quoted with and without that quark: α_s(m_τ) with three
 * flavours, though charm is lighter than τ. A heuristic range.
 */
const UNCLEAR = { from: 0.9, to: 2 } as const;

/** The quark that is active for some authors and not for others at this scale (GeV). */
export function unclearQuark(
  scale: number,
  thresholds: readonly Threshold[] = DEFAULT_THRESHOLDS,
): Threshold | undefined {
  return thresholds.find((t) => {
    const ratio = scale / crossingScale(t);
    return ratio >= UNCLEAR.from && ratio <= UNCLEAR.to;
  });
}
