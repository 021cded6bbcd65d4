/**
 * @module Partial fractions with a stated accuracy.
 *
 * Purpose    spend as many bits on residues as they need, and say how many are missing when that is not enough.
 * Method     partial-fractions.ts with rising precision, up to that of the coefficients.
 * Bound      as there; the accuracy of each result is read off its radius.
 * Reference  none beyond partial-fractions.ts.
 */
import * as C from '../ball/complex.js';
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import { partialFractions, type PartialFractions, type Pole } from './partial-fractions.js';
import type { CertifiedRoot } from './roots.js';

/** Heuristic: bits beyond those asked in the first evaluation, and added to every raise. */
const GUARD_BITS = 16;
/** Certain bits of an amplitude however weak its pole is. */
const WEAK_BITS = 64;

/** What kept balls from an answer: bits missing, or (missing absent) nothing decided. */
export interface Shortage {
  readonly reason: string;
  readonly missing?: number;
  /** Relative accuracy of the poles, in bits, that should do: that of the pole in want and what is missing there. */
  readonly poleBits?: number;
}

/** Partial fractions evaluated with as many bits as the accuracy needs, `most` at the utmost. */
export function sharpFractions(
  p: readonly Ball[],
  q: readonly Ball[],
  roots: readonly CertifiedRoot[],
  prec: number,
  most: number,
): PartialFractions | Shortage {
  let bits = Math.min(most, prec + 2 * GUARD_BITS + q.length);
  for (let last = Infinity; ;) {
    const fractions = partialFractions(p, q, roots, bits);
    const strongest = Math.max(...fractions.poles.map((pole) => C.upperBits(pole.amplitude)));
    const shortages = fractions.poles.map((pole) => Math.min(most, missingBits(pole, prec, strongest)));
    const missing = Math.max(0, ...shortages);
    if (missing === 0) return fractions;
    if (bits >= most) {
      const poleBits = Math.max(
        ...shortages.map((s, i) => (s > 0 ? s + C.accuracyBits(fractions.poles[i]!.position) : 0)),
      );
      return { reason: 'residues need more bits', missing, poleBits };
    }
    // Bits that leave half of the want or more are not what is missing: one evaluation with all of them settles that.
    bits = missing > last / 2 ? most : Math.min(most, bits + Math.ceil(missing) + GUARD_BITS);
    last = missing;
  }
}

/**
 * Bits that a pole falls short of: `prec` for its position; for its amplitude A `prec` relative to the strongest amplitude
 * 2^strongest and WEAK_BITS relative to |A|; for other terms of a principal part `prec` relative to A. 0 when none.
 */
function missingBits({ position, amplitude, principal }: Pole, prec: number, strongest: number): number {
  const size = C.upperBits(position);
  const weakness = Math.max(0, strongest - C.upperBits(amplitude));
  const wanted = Math.max(prec - weakness, Math.min(prec, WEAK_BITS));
  let missing = Math.max(prec - C.accuracyBits(position), wanted - C.accuracyBits(amplitude));
  const scale = C.upperBits(principal[principal.length - 1]!) - principal.length * size;
  for (let j = 0; j < principal.length - 1; j++) {
    const radius = Math.max(R.radiusBits(principal[j]!.re), R.radiusBits(principal[j]!.im)) - (j + 1) * size;
    missing = Math.max(missing, radius - scale + wanted);
  }
  return missing > 0 ? missing : 0;
}
