/**
 * @module Greatest common divisor of integer polynomials.
 *
 * Purpose    squarefree decomposition, reduced fractions.
 * Method     monic gcds modulo word primes times gcd of the leading coefficients, joined by the Chinese remainder
 *            theorem until the primitive part of the symmetric lift divides both inputs.
 * Bound      exact: the degree modulo a prime that divides no leading coefficient is never too small, and a common
 *            divisor of that degree is the gcd. One prime with degree 0 proves coprimality.
 * Reference  W. S. Brown, J. ACM 18 (1971) 478; von zur Gathen–Gerhard, "Modern Computer Algebra", section 6.7.
 */
import { gcdBigInt } from '../rational.js';
import { divideExactInt, primitiveInt, type IntPoly } from './integer.js';
import { gcdMod, invertWord, modWord, reduceInt, wordPrime } from './modular.js';

/** Primitive gcd with positive leading coefficient; [] when both are zero. */
export function gcdInt(a: IntPoly, b: IntPoly): IntPoly {
  const f = primitiveInt(a);
  const g = primitiveInt(b);
  if (f.length === 0) return g;
  if (g.length === 0) return f;
  const lead = gcdBigInt(f[f.length - 1]!, g[g.length - 1]!);
  let modulus = 1n;
  let lift: bigint[] = [];
  let previous: IntPoly | undefined;
  for (let i = 0; ; i++) {
    const p = wordPrime(i);
    const fp = reduceInt(f, p);
    const gp = reduceInt(g, p);
    if (fp.length < f.length || gp.length < g.length) continue;
    const h = gcdMod(fp, gp, p);
    if (h.length === 1) return [1n];
    if (lift.length > 0 && h.length > lift.length) continue;
    if (h.length < lift.length || lift.length === 0) {
      // Every earlier prime was unlucky (its gcd had too high a degree): start again.
      modulus = 1n;
      lift = new Array<bigint>(h.length).fill(0n);
      previous = undefined;
    }
    const inverse = 1 / p;
    const scale = Number(lead % BigInt(p));
    const step = invertWord(Number(modulus % BigInt(p)), p);
    for (let j = 0; j < lift.length; j++) {
      const want = modWord(h[j]! * scale, p, inverse);
      const have = Number(lift[j]! % BigInt(p));
      lift[j]! += modulus * BigInt(modWord(modWord(want - have + p, p, inverse) * step, p, inverse));
    }
    modulus *= BigInt(p);
    const half = modulus >> 1n;
    const candidate = primitiveInt(lift.map((c) => (c > half ? c - modulus : c)));
    // A division is tried only when one more prime has changed nothing.
    if (previous !== undefined && sameInt(previous, candidate)) {
      if (divideExactInt(f, candidate) !== undefined && divideExactInt(g, candidate) !== undefined) return candidate;
    }
    previous = candidate;
  }
}

function sameInt(a: IntPoly, b: IntPoly): boolean {
  return a.length === b.length && a.every((c, i) => c === b[i]);
}

/** True when one prime proves that a has no repeated factor; false when this prime cannot tell. */
export function provablySquarefree(a: IntPoly, primeIndex = 0): boolean {
  const p = wordPrime(primeIndex);
  const r = reduceInt(a, p);
  if (r.length < a.length) return false;
  if (a.length <= 2) return true;
  const d = new Float64Array(r.length - 1);
  for (let i = 1; i < r.length; i++) d[i - 1] = modWord(r[i]! * i, p, 1 / p);
  return d[d.length - 1] !== 0 && gcdMod(r, d, p).length === 1;
}
