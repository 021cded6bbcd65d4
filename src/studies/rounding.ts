/** @module A value and its error components, rounded together as the Particle Data Group rounds. */
import { roundPdg, writePlusMinus } from '../numerics/index.js';

export interface Component {
  readonly label: string;
  /** Positive. */
  readonly error: number;
}

/** A component below this share of the largest does not decide the place of the last digit: it would print digits that the
 * larger one makes meaningless. Heuristic. */
const NEGLIGIBLE = 0.1;

/** Said in a verdict where an input has an error whose share could not be computed. */
export const INPUT_NOT_KNOWN = 'input error not known';

/** "0.1384 ± 0.0013 (truncation) ± 0.0031 (ambiguity)"; negligible components are named, not printed. Digits of `value` stay when there is no error. */
export function writeVerdict(value: string, components: readonly Component[]): string {
  const largest = Math.max(0, ...components.map((c) => c.error));
  const floor = Math.max(NEGLIGIBLE * largest, unitOf(value));
  const shown = components.filter((c) => c.error >= floor);
  const hidden = components.filter((c) => c.error < floor);
  const rounded = roundPdg(
    value,
    shown.map((c) => c.error.toPrecision(6)),
  );
  if (rounded === undefined) return hidden.length === 0 ? value : `${value}; ${names(hidden)} negligible`;
  const text = writePlusMinus(
    rounded,
    shown.map((c) => c.label),
  );
  return hidden.length === 0 ? text : `${text}; ${names(hidden)} negligible`;
}

const names = (components: readonly Component[]): string => components.map((c) => c.label).join(' and ');

/** One unit in the last place of a decimal text. */
function unitOf(text: string): number {
  const [mantissa = '', exponent = '0'] = text.split('e');
  const point = mantissa.indexOf('.');
  return 10 ** (Number(exponent) - (point < 0 ? 0 : mantissa.length - point - 1));
}
