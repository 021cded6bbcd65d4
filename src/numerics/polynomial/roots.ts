/**
 * @module All complex roots of a real polynomial, each in a box of its own that provably holds it.
 *
 * Purpose    poles and zeros of Padé approximants, with multiplicities and with certainty about which are real.
 * Method     exact coefficients: squarefree factors (Yun), then isolation of each factor's roots; ball coefficients:
 *            isolation directly. See roots-isolate.ts and, for the theorem, roots-discs.ts.
 * Bound      the true root lies in the box; boxes are pairwise disjoint; `real` is a proof, not a guess, and then the
 *            imaginary part is exactly 0; conjugate pairs are exact mirror images.
 * Reference  B. T. Smith, J. ACM 17 (1970) 661 (inclusion); D. Y. Y. Yun, SYMSAC 1976, p. 26 (multiplicities).
 */
import * as C from '../ball/complex.js';
import type { Complex } from '../ball/complex.js';
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import { shift } from '../bits.js';
import { Rational } from '../rational.js';
import type { IntPoly } from './integer.js';
import { toIntegers } from './rational-poly.js';
import type { RootCloud } from './roots-cloud.js';
import type { Discs } from './roots-discs.js';
import { isolateRoots, refineRoots, type Isolation } from './roots-isolate.js';
import type { NewtonRatio } from './roots-start.js';
import { log2Length } from './scaled-polynomial.js';
import { squarefreeInt } from './squarefree.js';

export interface CertifiedRoot {
  readonly value: Complex;
  readonly multiplicity: number;
  readonly real: boolean;
}

export type RootsResult = { readonly roots: readonly CertifiedRoot[] } | { readonly failed: string };

/** Heuristic: how often the precision is doubled to separate roots of different squarefree factors. */
const SEPARATION_TRIES = 6;
/** Bits kept in a centre beyond its radius. */
const CENTRE_BITS = 10;
/** Difference of log2|z| below which two moduli count as equal in the order of the list. */
const TIE = 2 ** -40;

/**
 * Roots of Σ p_k x^k (ascending coefficients), nearest to the origin first, conjugate pairs adjacent with the upper
 * one first. The box radius is at most 2^-prec |z|, except where inexact coefficients do not allow it.
 * Refused (failed): coefficients in which the degree or a root at 0 is uncertain, clusters that the error of the
 * coefficients does not separate. Throws RangeError for the zero polynomial.
 */
export function certifiedRoots(p: readonly Rational[] | readonly Ball[], prec: number): RootsResult {
  return isRationals(p) ? rationalRoots(toIntegers(p).integers, prec) : ballRoots(p, prec);
}

function isRationals(p: readonly Rational[] | readonly Ball[]): p is readonly Rational[] {
  return p[0] instanceof Rational;
}

/** Roots of an integer polynomial with their multiplicities. */
export function rationalRoots(p: IntPoly, prec: number): RootsResult {
  if (p.length === 0) throw new RangeError('certifiedRoots: the zero polynomial');
  const zeros = p.findIndex((c) => c !== 0n);
  const factors = squarefreeInt(p.slice(zeros));
  for (let attempt = 0, bits = prec; attempt < SEPARATION_TRIES; attempt++, bits *= 2) {
    const roots: CertifiedRoot[] = zeros > 0 ? [{ value: C.ZERO, multiplicity: zeros, real: true }] : [];
    for (const { factor, multiplicity } of factors) {
      const result = isolateRoots(
        factor.map((c) => R.fromNumber(c)),
        bits,
      );
      if ('failed' in result) return result;
      roots.push(...boxes(result.cloud, result.discs, multiplicity));
    }
    if (factors.length < 2 || pairwiseDisjoint(roots)) return { roots: sorted(roots) };
  }
  return { failed: 'roots of different multiplicity are closer than the precisions tried' };
}

/** Roots of a polynomial known by enclosures of its coefficients; `ratio` as in isolateRoots. */
export function ballRoots(p: readonly Ball[], prec: number, ratio?: NewtonRatio): RootsResult {
  return refinableRoots(p, ratio)(prec);
}

/** ballRoots as a search that can be gone on with: each call takes up the roots where the one before left them. */
export function refinableRoots(p: readonly Ball[], ratio?: NewtonRatio): (prec: number) => RootsResult {
  let n = p.length;
  while (n > 0 && R.isExactZero(p[n - 1]!)) n--;
  if (n === 0) throw new RangeError('certifiedRoots: the zero polynomial');
  let zeros = 0;
  while (R.isExactZero(p[zeros]!)) zeros++;
  const roots: CertifiedRoot[] = zeros > 0 ? [{ value: C.ZERO, multiplicity: zeros, real: true }] : [];
  const a = p.slice(zeros, n);
  if (R.containsZero(a[a.length - 1]!))
    return always({ failed: 'the leading coefficient may be zero: the degree is uncertain' });
  if (a.length === 1) return always({ roots });
  if (R.containsZero(a[0]!))
    return always({ failed: 'the constant coefficient may be zero: a root cannot be told from 0' });
  let result: Isolation | undefined;
  return (prec) => {
    result = result === undefined || 'failed' in result ? isolateRoots(a, prec, ratio) : refineRoots(result, prec);
    if ('failed' in result) return result;
    return { roots: sorted([...roots, ...boxes(result.cloud, result.discs, 1)]) };
  };
}

const always = (result: RootsResult) => (): RootsResult => result;

/** The discs as boxes of balls. */
function boxes(cloud: RootCloud, discs: Discs, multiplicity: number): CertifiedRoot[] {
  const out: CertifiedRoot[] = [];
  for (let i = 0; i < cloud.n; i++) {
    if (!cloud.leads(i)) continue;
    const unit = cloud.exp[i]! - cloud.w;
    const drop = Math.max(0, Math.floor(discs.radius[i]!) - CENTRE_BITS - unit);
    const rad = 2 ** (discs.radius[i]! - unit - drop) * (1 + 2 ** -30) + (drop > 0 ? 0.5 : 0);
    const half = drop > 0 ? 1n << BigInt(drop - 1) : 0n;
    const part = (v: bigint): Ball => R.ball(shift(v + half, -drop), unit + drop, rad);
    const real = cloud.partner[i] === i;
    const im = cloud.im[i]! < 0n ? -cloud.im[i]! : cloud.im[i]!;
    const value: Complex = { re: part(cloud.re[i]!), im: real ? R.ZERO : part(im) };
    out.push({ value, multiplicity, real });
    if (!real) out.push({ value: C.conj(value), multiplicity, real });
  }
  return out;
}

function pairwiseDisjoint(roots: readonly CertifiedRoot[]): boolean {
  for (let i = 0; i < roots.length; i++) {
    for (let j = 0; j < i; j++) if (C.overlaps(roots[i]!.value, roots[j]!.value)) return false;
  }
  return true;
}

/** log2 of the modulus of a box's centre. */
const modulus = ({ re, im }: Complex): number => {
  if (im.mid === 0n) return log2Length(re.mid, 0n) + re.exp;
  const exp = Math.min(re.exp, im.exp);
  return log2Length(shift(re.mid, re.exp - exp), shift(im.mid, im.exp - exp)) + exp;
};

/** Nearest first; equal moduli (to TIE) by falling real part; members of a pair stay together. */
function sorted(roots: CertifiedRoot[]): CertifiedRoot[] {
  const keyed = roots.map((root, index) => ({
    root,
    index,
    size: Math.round(modulus(root.value) / TIE),
    re: R.toNumber(root.value.re),
  }));
  keyed.sort((a, b) => (a.size === b.size ? b.re - a.re || a.index - b.index : a.size - b.size));
  return keyed.map(({ root }) => root);
}
