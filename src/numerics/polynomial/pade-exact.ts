/**
 * @module The [L/M] Padé approximant of an exact series.
 *
 * Purpose    p/q with deg p <= L, deg q <= M, q(0) = 1 and b·q − p = O(x^(L+M+1)), or the proof that there is none.
 * Method     small orders: extended Euclid in integers. Large orders: minors of the Toeplitz matrix by many primes,
 *            where the table is normal on the way (a determinant that is non-zero modulo a prime is non-zero: the entry
 *            exists and is reduced); Euclid otherwise, so that a singular block is recognised and never divided through.
 * Bound      exact.
 * Reference  H. Padé, Ann. Sci. Éc. Norm. Supér. 9 (1892) S3 (blocks); G. A. Baker, P. Graves-Morris, "Padé
 *            Approximants", sections 1.4 (existence, q(0) = 1) and 2.4 (Euclid).
 */
import type { Rational } from '../rational.js';
import { contentInt, mulInt, type IntPoly } from './integer.js';
import { overCommonDenominator } from './lowest-terms.js';
import { euclidRow } from './pade-euclid.js';
import { toeplitzMinors } from './pade-minors.js';
import { fromOwnUnit, inOwnUnit } from './pade-scale.js';
import type { PadeEntry } from './pade-types.js';
import { toIntegers, trimPoly } from './rational-poly.js';

/** Heuristic: below this order L+M Euclid in integers is quicker than the primes. */
export const EUCLID_ORDER = 20;

/**
 * [L/M] of Σ b_n x^n from b_0..b_{L+M}; later coefficients, when given, only extend `contactOrder`.
 * Refused (exists: false): entries inside a singular block, where no p/q with q(0) = 1 has the contact order.
 * Throws RangeError when fewer than L+M+1 coefficients are given or L, M are no non-negative integers.
 */
export function padeExact(b: readonly Rational[], L: number, M: number): PadeEntry {
  checkOrders(b.length, L, M);
  const own = inOwnUnit(b);
  const { integers, content } = toIntegers(own?.coefficients ?? b);
  const entry = entryFromIntegers(integers, content, b.length, L, M);
  return own === undefined ? entry : fromOwnUnit(entry, own);
}

/** RangeError unless L, M >= 0 are integers and L+M+1 coefficients are there. */
export function checkOrders(length: number, L: number, M: number): void {
  if (!Number.isInteger(L) || !Number.isInteger(M) || L < 0 || M < 0) {
    throw new RangeError(`Padé orders must be non-negative integers, not [${L}/${M}]`);
  }
  if (length < L + M + 1) throw new RangeError(`[${L}/${M}] needs ${L + M + 1} coefficients, ${length} are given`);
}

/** padeExact on b = content·integers (`known` coefficients of the series are given). */
export function entryFromIntegers(b: IntPoly, content: Rational, known: number, L: number, M: number): PadeEntry {
  if (M > 0 && L + M >= EUCLID_ORDER) {
    const minors = toeplitzMinors(b, L, M);
    if (minors !== undefined) {
      const g = contentInt(minors);
      const t = minors.map((c) => c / g);
      return finish(mulInt(t, b, L + 1), t, b, content, known, L, M);
    }
  }
  const { r, t } = euclidRow(b, L + M + 1, L);
  return finish(r, t, b, content, known, L, M);
}

/** Existence, normalisation q(0) = 1, deficiency and contact order of the integer pair r = t·b mod x^(L+M+1). */
export function finish(
  r: IntPoly,
  t: IntPoly,
  b: IntPoly,
  content: Rational,
  known: number,
  L: number,
  M: number,
): PadeEntry {
  if (t[0] === 0n) {
    const k = t.findIndex((c) => c !== 0n);
    return {
      exists: false,
      reason:
        `[${L}/${M}] lies in a singular block: its reduced fraction [${r.length - 1 - k}/${t.length - 1 - k}] agrees with ` +
        `the series for ${L + M + 1 - k} coefficients only, ${L + M + 1} are needed`,
    };
  }
  const numerator = trimPoly(
    overCommonDenominator(
      r.map((c) => c * content.num),
      t[0]! * content.den,
    ),
  );
  const denominator = trimPoly(overCommonDenominator(t, t[0]!));
  const gapQ = M - (denominator.length - 1);
  return {
    exists: true,
    numerator,
    denominator,
    deficiency: numerator.length === 0 ? gapQ : Math.min(L - (numerator.length - 1), gapQ),
    contactOrder: contactOrder(r, t, b, known, L + M + 1),
  };
}

/** Number of leading coefficients of b that r/t reproduces; `order` of them are known to agree. */
function contactOrder(r: IntPoly, t: IntPoly, b: IntPoly, known: number, order: number): number {
  for (let k = order; k < known; k++) {
    let sum = -(r[k] ?? 0n);
    for (let j = 0; j < t.length && j <= k; j++) sum += t[j]! * (b[k - j] ?? 0n);
    if (sum !== 0n) return k;
  }
  return known;
}
