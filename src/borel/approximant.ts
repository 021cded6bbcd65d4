/**
 * @module One Borel–Padé approximant: certified poles and amplitudes, each pole with its role.
 *
 * Purpose    partial fractions of [L/M] of a Borel transform, and what is to be thought of each pole.
 * Method     poles and principal parts with certified enclosures (numerics); zeros of the numerator in the same way.
 *            A pole is a Froissart doublet when a zero lies within DOUBLET_DISTANCE of it (relative) and its amplitude is
 *            below DOUBLET_SHARE of the sum of all amplitudes; or, for coefficients with relative noise ε, when its
 *            amplitude is below NOISE_FACTOR·ε·max|b|. Poles that form a string on the real axis mimic a cut: there pole
 *            and zero alternate closely by nature, so they are exempt.
 * Bound      positions and amplitudes are enclosures; roles are heuristics.
 * Reference  M. Froissart, CNRS RCP 25 (1969) (from memory); J. Gilewicz, B. Truong-Van (1988) (from memory).
 */
import { C, certifiedRoots, padePoles, R } from '../numerics/index.js';
import type { Ball, Complex, Exact, Rational } from '../numerics/index.js';
import type { PolePart } from './laplace.js';
import { borelTransform } from './transform.js';

/** Heuristics of the doublet test (see the header). */
export const DOUBLET_DISTANCE = 1e-2;
const DOUBLET_SHARE = 1e-2;
export const NOISE_FACTOR = 1e3;
/** Real poles on one side that count as a string mimicking a cut. */
const STRING = 3;
const ZERO_BITS = 64;

export interface RatedPole extends PolePart {
  readonly multiplicity: number;
  readonly modulus: number;
  /** Absent: a pole to be believed as far as any. "noise doublet": at the level of the coefficients' noise, left out of sums. */
  readonly role?: 'doublet' | 'noise doublet';
}

export interface Zero {
  readonly z: Complex;
  readonly real: boolean;
}

export interface Approximant {
  readonly label: string;
  readonly exists: boolean | undefined;
  readonly reason?: string;
  /** > 0: the entry lies in a degenerate block and equals one of lower order. */
  readonly deficiency: number;
  readonly polynomialPart: readonly Ball[];
  /** Real poles once, of each conjugate pair the member with Im z > 0. */
  readonly poles: readonly RatedPole[];
  /** Zeros of the numerator, in the same way; empty where they cannot be enclosed. */
  readonly zeros: readonly Zero[];
  /** Exact number of distinct positive real poles. */
  readonly positiveRealPoles: number;
}

interface Kept {
  readonly prec: number;
  readonly noise: number;
  readonly approximant: Approximant;
}

const kept = new WeakMap<readonly Exact[], Map<string, Kept>>();

/**
 * [L/M] of the Borel–Leroy transform with parameter b, made once for a list: enclosures that are sharp enough for one
 * question serve the next one too. @param noise relative one-sigma noise of the coefficients, 0 when exact. */
export function approximate(
  c: readonly Exact[],
  b: Rational,
  L: number,
  M: number,
  prec: number,
  noise: number,
): Approximant {
  const entries = kept.get(c) ?? new Map<string, Kept>();
  kept.set(c, entries);
  const key = `${L}/${M} ${b.toString()}`;
  const before = entries.get(key);
  if (before !== undefined && before.prec >= prec && before.noise === noise) return before.approximant;
  const approximant = approximateTransformed(borelTransform(c.slice(0, L + M + 1), b), L, M, prec, noise);
  entries.set(key, { prec, noise, approximant });
  return approximant;
}

/** [L/M] of an already transformed coefficient list. */
export function approximateTransformed(
  b: readonly Exact[],
  L: number,
  M: number,
  prec: number,
  noise: number,
): Approximant {
  const label = `[${L}/${M}]`;
  const found = padePoles(b, L, M, prec);
  if (found.exists !== true)
    return {
      label,
      exists: found.exists,
      reason: found.reason,
      deficiency: 0,
      polynomialPart: [],
      poles: [],
      zeros: [],
      positiveRealPoles: 0,
    };
  const poles = found.poles
    .filter((p) => p.real || !R.isNegative(p.position.im))
    .map((p) => ({
      z: p.position,
      real: p.real,
      multiplicity: p.multiplicity,
      amplitudes: amplitudes(p.position, p.principal, prec),
    }));
  const zeros = zerosOf(found.entry.numerator);
  const largest = Math.max(...b.slice(0, L + M + 1).map((e) => Math.abs(R.toNumber(e.ball(64)))));
  return {
    label,
    exists: true,
    deficiency: found.entry.deficiency,
    polynomialPart: found.polynomial,
    poles: rate(
      poles,
      zeros.map(({ z }) => C.toNumbers(z)),
      noise,
      largest,
    ),
    zeros: zeros.filter(({ z, real }) => real || !R.isNegative(z.im)),
    positiveRealPoles: poles.filter((p) => p.real && R.isPositive(p.z.re)).length,
  };
}

/** A_j of (1 − t/z)^{−j} from the coefficients of (t − z)^{−j}: A_j = c_j (−z)^{−j}. */
function amplitudes(z: Complex, principal: readonly Complex[], prec: number): Complex[] {
  const inverse = C.inv(C.neg(z), prec);
  let power = C.ONE;
  return principal.map((c) => {
    power = C.mul(power, inverse, prec);
    return C.mul(c, power, prec);
  });
}

interface Point {
  readonly re: number;
  readonly im: number;
}

/** Zeros of the approximant, both of each pair. */
function zerosOf(numerator: readonly Rational[] | readonly Ball[]): Zero[] {
  if (numerator.length < 2) return [];
  const found = certifiedRoots(numerator, ZERO_BITS);
  return 'failed' in found ? [] : found.roots.map(({ value, real }) => ({ z: value, real }));
}

type Unrated = Omit<RatedPole, 'role' | 'modulus'>;

function rate(poles: readonly Unrated[], zeros: readonly Point[], noise: number, largest: number): RatedPole[] {
  const points = poles.map((p) => C.toNumbers(p.z));
  const sizes = poles.map((p) => {
    const a = C.toNumbers(p.amplitudes[p.amplitudes.length - 1]!);
    return Math.hypot(a.re, a.im);
  });
  const total = sizes.reduce((s, a) => s + a, 0);
  const side = (sign: number): number => poles.filter((p, i) => p.real && points[i]!.re * sign > 0).length;
  const strings = { positive: side(1) >= STRING, negative: side(-1) >= STRING };
  return poles.map((p, i) => {
    const { re, im } = points[i]!;
    const modulus = Math.hypot(re, im);
    const rated = { ...p, modulus };
    if (noise > 0 && sizes[i]! <= NOISE_FACTOR * noise * largest && isPaired(points[i]!, zeros))
      return { ...rated, role: 'noise doublet' as const };
    if (p.real && (re > 0 ? strings.positive : strings.negative)) return rated;
    return sizes[i]! < DOUBLET_SHARE * total && isPaired(points[i]!, zeros)
      ? { ...rated, role: 'doublet' as const }
      : rated;
  });
}

function isPaired(z: Point, zeros: readonly Point[]): boolean {
  const modulus = Math.hypot(z.re, z.im);
  return zeros.some((w) => Math.hypot(z.re - w.re, z.im - w.im) < DOUBLET_DISTANCE * modulus);
}
