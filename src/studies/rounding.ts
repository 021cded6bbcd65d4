/** @module A value and its error components, rounded together as the Particle Data Group rounds. */
import { roundPdg, writePlusMinus } from '../numerics/index.js';

export interface Component {
  readonly label: string;
  /** Positive. */
  readonly error: number;
}

/** A component below this share of the largest does not decide the place of the last digit: it would print unknown digits. */
const NEGLIGIBLE = 0.01;

/** "0.1384 ± 0.0013 (truncation) ± 0.0031 (ambiguity)"; negligible components are named, not printed. Digits of `value` stay when there is no error. */
export function writeVerdict(value: string, components: readonly Component[]): string {
  const largest = Math.max(0, ...components.map((c) => c.error));
  const shown = components.filter((c) => c.error >= NEGLIGIBLE * largest);
  const hidden = components.filter((c) => c.error < NEGLIGIBLE * largest);
  const rounded = roundPdg(
    value,
    shown.map((c) => c.error.toPrecision(6)),
  );
  if (rounded === undefined) return value;
  const text = writePlusMinus(
    rounded,
    shown.map((c) => c.label),
  );
  return hidden.length === 0 ? text : `${text}; ${hidden.map((c) => c.label).join(' and ')} negligible`;
}
