/**
 * @module Which coupling values an assessment accepts.
 *
 * A coupling is positive and not beyond ten, where no running and no truncated series means anything (the same limit as
 * in the QCD room); a plain variable is any number but zero whose powers stay in range.
 */
import { InputError } from '../series/index.js';
import type { Series, Uncertain } from '../series/index.js';
import { R, signExact, toNumberExact } from '../numerics/index.js';

const LARGEST_COUPLING = 10;
/** Bits of the largest and smallest plain variable. */
const LARGEST_BITS = 1000;

/** Throws InputError, naming the value and what is wanted, for a coupling that cannot be assessed. */
export function checkCoupling(series: Series, at: Uncertain): void {
  const found = (wanted: string): never => {
    throw new InputError([{ file: series.id, field: series.coupling.name, found: at.text, wanted }]);
  };
  const sign = signExact(at.value);
  if (sign === 0) found('a value other than zero');
  const bits = R.upperBits(at.value.ball(64));
  if (Math.abs(bits) > LARGEST_BITS) found(`a value between 1e-300 and 1e300 in size`);
  if (series.coupling.plain) return;
  const alpha = toNumberExact(at.value);
  if (!(alpha > 0) || alpha > LARGEST_COUPLING) found(`a coupling above 0 and at most ${LARGEST_COUPLING}`);
}
