/**
 * @module ζ(2) … ζ(n) all together in fixed point: Taylor coefficients of log Γ.
 *
 * Purpose    the list that the Taylor polynomials of 1/Γ start from; single values are in zeta.ts.
 * Method     Borwein's alternating sum, where two more powers cost one small division a term (odd and even n take turns in two sums of their own);
 *            ζ(j) is wanted to `bits` − j bits only, and terms that have fallen below that are left out.
 * Bound      Borwein's remainder is below 2·(3+√8)^−N (zeta.ts). A weight in units of 2^-bits is off by less than 2 at the start and the floors
 *            of all later divisions add less than 2; a term that has become 0 stays below 1. N terms together: below 5N units, doubled at
 *            most by the factor 1/(1 − 2^(1−j)).
 * Reference  P. Borwein, CMS Conf. Proc. 27 (2000) 29, algorithm 2.
 */
import { int } from '../ball/fixed.js';

/** Room for the errors of up to 2^16 terms. */
const GUARD = 24;

/** ζ(j)·2^(bits−j) for 2 <= j <= n, each off by less than 2; entries 0 and 1 are 0. */
export function zetaList(n: number, bits: number): bigint[] {
  const wp = bits + GUARD;
  const weights = borweinWeights(wp);
  const squares = weights.map((_, k) => int(4 * (k + 1) ** 2));
  const values = new Array<bigint>(n + 1).fill(0n);
  for (const first of [2, 3]) {
    // weight_k/(k+1)^j, in units of 2^(j − wp)
    const terms = weights.map((w, k) => (w / int(k + 1) ** BigInt(first)) >> BigInt(first));
    let active = terms.length;
    for (let j = first; j <= n; j += 2) {
      let eta = 0n;
      for (let k = 0; k < active; k++) eta += k & 1 ? -terms[k]! : terms[k]!;
      const half = 1n << BigInt(j - 1);
      values[j] = ((eta * half) / (half - 1n)) >> BigInt(GUARD);
      for (let k = 0; k < active; k++) terms[k]! /= squares[k]!;
      while (active > 1 && terms[active - 1] === 0n) active--;
    }
  }
  return values;
}

/** (d_N − d_k)/d_N in units of 2^-wp: the weights of 1/(k+1)^s, without their signs. */
function borweinWeights(wp: number): bigint[] {
  const size = Math.ceil((wp + 4) / Math.log2(3 + 2 * Math.SQRT2)) + 1;
  const partial: bigint[] = [];
  let term = 1n;
  let sum = 0n;
  for (let i = 0; i <= size; i++) {
    sum += term;
    partial.push(sum);
    term = (term * BigInt(4 * (size + i) * (size - i))) / BigInt((2 * i + 1) * (2 * i + 2));
  }
  const total = partial[size]!;
  return partial.slice(0, size).map((d) => ((total - d) << BigInt(wp)) / total);
}
