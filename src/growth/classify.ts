/**
 * @module The verdict rule: one word for the growth, or "undecided" with the reason.
 */
import { classifyLong } from './classify-long.js';
import { classifyShort } from './classify-short.js';
import type { RatioRow } from './growth.js';
import type { Prepared } from './prepare.js';
import { MIDDLE, MIN_AFTER_LOSS, MIN_COEFFICIENTS, SHORT, undecided, type Classified } from './verdict-rule.js';
import { plural } from './words.js';

/** rows: ratio test over the computed coefficients. */
export function classify(p: Prepared, rows: readonly RatioRow[]): Classified {
  const n = p.nonZero.length;
  if (n < MIN_COEFFICIENTS) {
    return undecided(
      n === 0
        ? 'no coefficient is known'
        : `the series is too short: ${plural(n, 'known coefficient')}, and nothing is said of growth from fewer than ${MIN_COEFFICIENTS}`,
    );
  }
  const { unknown, unknownFrom } = p.sequence;
  if (unknown > 0 && n < MIN_AFTER_LOSS) {
    return undecided(
      `the quoted errors exceed the coefficients from n = ${unknownFrom ?? 0} on and leave ${n} of them`,
    );
  }
  if (n <= SHORT) return classifyShort(p, rows);
  const long = classifyLong(p);
  // A dozen coefficients may still be judged by the evidence of short series.
  if (long.verdict !== 'undecided' || n > MIDDLE) return long;
  const short = classifyShort(p, rows);
  return short.verdict === 'factorial' ? short : long;
}
