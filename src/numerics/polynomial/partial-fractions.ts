/**
 * @module p/q in partial fractions, with enclosures.
 *
 * Purpose    the form in which a rational Borel transform is summed in closed form.
 * Method     p/q = Σ_n a_n t^n + Σ_ζ Σ_{j=1}^m c_{ζ,j}/(t − ζ)^j. With q(ζ+h) = h^m Σ_i q_{m+i}h^i and
 *            p(ζ+h) = Σ p_i h^i the c_{ζ,j} are the coefficients of h^(m−j) in p/(q/h^m), a power series division of
 *            m terms. The polynomial part is that of long division.
 * Bound      enclosures throughout: Taylor coefficients by taylor-enclosure.ts, the rest in balls. Multiplicities must
 *            be exact (they are when they come from a squarefree decomposition or are 1 for certified roots).
 * Reference  P. Henrici, "Applied and Computational Complex Analysis" vol. 1, section 7.1.
 */
import * as C from '../ball/complex.js';
import type { Complex } from '../ball/complex.js';
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import type { CertifiedRoot } from './roots.js';
import { TaylorEnclosure } from './taylor-enclosure.js';

export interface Pole {
  /** Position ζ; `real` is proved and then im is exactly 0. Conjugate poles are exact mirror images. */
  readonly position: Complex;
  readonly real: boolean;
  readonly multiplicity: number;
  /** principal[j−1] is the coefficient of 1/(t − ζ)^j, j = 1..multiplicity. */
  readonly principal: readonly Complex[];
  /** A of A/(1 − t/ζ)^m, the strongest term: for a simple pole −residue/ζ. */
  readonly amplitude: Complex;
}

export interface PartialFractions {
  /** Coefficients a_n of the polynomial part, ascending; [] when deg p < deg q. */
  readonly polynomial: readonly Ball[];
  /** In the order of the roots given. */
  readonly poles: readonly Pole[];
}

/**
 * Partial fractions of p/q from the certified roots of q, evaluating with `prec` bits. Coefficients ascending; the leading
 * coefficient of q must certainly not be zero (the polynomial part is INDETERMINATE otherwise).
 */
export function partialFractions(
  p: readonly Ball[],
  q: readonly Ball[],
  roots: readonly CertifiedRoot[],
  prec: number,
): PartialFractions {
  const top = new TaylorEnclosure(p);
  const bottom = new TaylorEnclosure(q);
  const poles: Pole[] = [];
  for (const { value, multiplicity, real } of roots) {
    const last = poles[poles.length - 1];
    if (last !== undefined && !real && isMirror(last.position, value)) {
      poles.push(mirrored(last));
      continue;
    }
    const series = (f: TaylorEnclosure, from: number): Complex[] =>
      Array.from({ length: multiplicity }, (_, i) => f.coefficient(from + i, value, prec));
    const quotient = divideSeries(series(top, 0), series(bottom, multiplicity), prec);
    const principal = quotient.toReversed();
    let factor = C.ONE;
    for (let j = 0; j < multiplicity; j++) factor = C.mul(factor, C.neg(value), prec);
    const amplitude = C.div(principal[multiplicity - 1]!, factor, prec);
    poles.push({ position: value, real, multiplicity, principal, amplitude });
  }
  return { polynomial: polynomialPart(p, q, prec), poles };
}

/** First terms of a/b as power series, b[0] certainly non-zero. */
function divideSeries(a: readonly Complex[], b: readonly Complex[], prec: number): Complex[] {
  const out: Complex[] = [];
  for (let i = 0; i < a.length; i++) {
    let value = a[i]!;
    for (let j = 1; j <= i; j++) value = C.sub(value, C.mul(b[j]!, out[i - j]!, prec), prec);
    out.push(C.div(value, b[0]!, prec));
  }
  return out;
}

function isMirror(a: Complex, b: Complex): boolean {
  return a.re === b.re && a.im.mid === -b.im.mid && a.im.exp === b.im.exp;
}

function mirrored(pole: Pole): Pole {
  return {
    ...pole,
    position: C.conj(pole.position),
    principal: pole.principal.map(C.conj),
    amplitude: C.conj(pole.amplitude),
  };
}

/** Quotient of p by q. */
function polynomialPart(p: readonly Ball[], q: readonly Ball[], prec: number): Ball[] {
  const n = q.length - 1;
  if (p.length <= n) return [];
  const rest = p.slice();
  const quotient = new Array<Ball>(p.length - n);
  for (let k = p.length - 1 - n; k >= 0; k--) {
    const c = R.div(rest[n + k]!, q[n]!, prec);
    quotient[k] = c;
    for (let j = 0; j < n; j++) rest[k + j] = R.sub(rest[k + j]!, R.mul(c, q[j]!, prec), prec);
  }
  return quotient;
}
