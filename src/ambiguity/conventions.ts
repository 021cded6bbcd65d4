/**
 * @module The renormalon ambiguity under its named conventions, side by side.
 *
 *   half difference of the lateral sums  I = |Im S₊|
 *   |Im|/π                               A = I/π (default)
 *   least term                           |T_min| ≈ A √(2π/ω),  ω = |t*| / x
 *   |Im|/π from N                        N (2πd/β₀)(d/2)^{db}/Γ(1+db) (Λ/Q)^d, from the strength of the leading singularity
 *   near-least partial sums              half the range of the partial sums that end on a term |T_n| <= 5/4 |T_min|
 *
 * The conventions differ by factors of 2 and π: never compare numbers across rows without converting.
 * References: |Im|: M. Beneke, M. Jamin, arXiv:0806.3156; |Im|/π: M. Beneke, Phys. Rept. 317 (1999) 1 and
 * M. Beneke, P. Marquard, P. Nason, M. Steinhauser, arXiv:1605.03609 (abstract seen); near-least partial sums, factor 5/4:
 * A. Hoang, C. Lepenik, M. Preisser, arXiv:1706.08526 (abstract seen; factor from memory); least term: common practice.
 */

/** Terms within this factor of the least one count as near-least (arXiv:1706.08526, factor from memory). */
export const NEAR_LEAST_FACTOR = 1.25;

export type ConventionName = '|Im|' | '|Im|/pi' | 'least term' | 'near-least partial sums' | '|Im|/pi from N';

export interface Convention {
  readonly name: ConventionName;
  readonly value: number;
  /** Of the value itself, from the errors of its inputs. */
  readonly error?: number;
  readonly origin: string;
}

export interface LateralSource {
  /** |Im| of the upper lateral sum. */
  readonly im: number;
  /** |value| of the same sum, for relative numbers. */
  readonly size: number;
  /** Which prescription it comes from. */
  readonly origin: string;
  /** Error of |Im| from the errors of the inputs. */
  readonly error?: number;
}

/**
 * Half the range of the partial sums ending on a near-least term. Undefined when the least term is the last one (the set
 * could still grow) or when there is no non-zero term.
 * @param terms terms T_0 … T_{N−1}; @param sums partial sums through each of them.
 */
export function nearLeastHalfRange(
  terms: readonly number[],
  sums: readonly number[],
): { value: number; first: number; last: number } | undefined {
  const sizes = terms.map(Math.abs);
  const least = Math.min(...sizes.filter((s) => s > 0));
  if (!Number.isFinite(least)) return undefined;
  const at = sizes.indexOf(least);
  if (at === sizes.length - 1) return undefined;
  const near = sizes.flatMap((s, n) => (s > 0 && s <= NEAR_LEAST_FACTOR * least ? [n] : []));
  const values = near.map((n) => sums[n]!);
  return { value: (Math.max(...values) - Math.min(...values)) / 2, first: near[0]!, last: near[near.length - 1]! };
}

/** All conventions that can be stated for these terms and lateral sums. */
export function conventions(
  terms: readonly number[],
  sums: readonly number[],
  powers: readonly number[],
  leastReached: boolean,
  lateral: LateralSource | undefined,
): Convention[] {
  const list: Convention[] = [];
  if (lateral !== undefined) {
    list.push({
      name: '|Im|',
      value: lateral.im,
      ...(lateral.error === undefined ? {} : { error: lateral.error }),
      origin: `half the difference of the lateral sums of ${lateral.origin}`,
    });
    list.push({
      name: '|Im|/pi',
      value: lateral.im / Math.PI,
      ...(lateral.error === undefined ? {} : { error: lateral.error / Math.PI }),
      origin: `the same, divided by pi`,
    });
  }
  if (leastReached) {
    const sizes = terms.map(Math.abs);
    const least = Math.min(...sizes.filter((s) => s > 0));
    list.push({
      name: 'least term',
      value: least,
      origin: `size of the term of order ${powers[sizes.indexOf(least)]}`,
    });
    const near = nearLeastHalfRange(terms, sums);
    if (near !== undefined && near.last > near.first)
      list.push({
        name: 'near-least partial sums',
        value: near.value,
        origin: `half the range of the partial sums of orders ${powers[near.first]} to ${powers[near.last]}`,
      });
  }
  return list;
}
