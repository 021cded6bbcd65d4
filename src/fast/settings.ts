/**
 * @module From a prescription's own answer at the central values to the setting of its fast version: which member of the family,
 * how many coefficients, where the contour runs.
 *
 * What the prescription decided from the diagnosis of the terms stays decided: a replica changes numbers, not the method.
 */
import { borelTransform, fitModel, padeOf, remap, withoutFactors } from '../borel/index.js';
import type { ModelFit, Softening } from '../borel/index.js';
import { contourSum } from '../contour/index.js';
import type { Growth } from '../growth/index.js';
import { chebyshevMap, exact, R, Rational, toNumberExact } from '../numerics/index.js';
import type { ChebyshevMap, Exact } from '../numerics/index.js';
import {
  cleanPart,
  cutsOf,
  innermostPole,
  innermostRest,
  knownFactors,
  leroyParameter,
  memberLabel,
  modelUsed,
  noiseOf,
  pairConfirmed,
  placeOf,
  termsBeforeAlternation,
} from '../prescriptions/index.js';
import type { Sum } from '../prescriptions/index.js';
import { divisorSize } from '../qcd/index.js';
import type { Expansion } from '../series/index.js';
import type { ConformalSetting } from './conformal.js';
import type { ContourImprovedSetting } from './contour-improved.js';
import type { FastSetting } from './make.js';
import type { Affine, SingularityModelSetting } from './singularity-model.js';

/** Bits at which matrices are made before they are rounded to doubles, beyond what the re-expansion loses. */
const BITS = 160;
const BITS_LOST = 3;
/** Most coefficients that the sequence transformations and the rest take: as in their prescriptions. */
const MOST = 60;

const SOFTENINGS: readonly Softening[] = ['in w', 'in t', 'none'];

/** The setting of the member that `sum` stands for; undefined for a prescription without a fast version. */
export function fastSetting(name: string, e: Expansion, growth: Growth, sum: Sum): FastSetting | undefined {
  const place = placeOf(sum.variant);
  switch (name) {
    case 'fixed-order':
      return { kind: 'fixed-order', terms: sum.termsUsed };
    case 'least-term': {
      const half = sum.variant.startsWith('half');
      return { kind: 'least-term', terms: half ? sum.termsUsed - 1 : sum.termsUsed, half };
    }
    case 'terminant': {
      const s = e.stated[0];
      if (s?.exponent === undefined) return undefined;
      const terms = Number(sum.variant.split(' ')[0]);
      return { kind: 'terminant', terms, t: toNumberExact(s.t), exponent: toNumberExact(s.exponent) };
    }
    case 'pade':
      return place && { kind: 'pade', ...reduced(e.coefficients, place) };
    case 'wynn-epsilon':
    case 'levin':
    case 'weniger-delta':
      return sequenceSetting(name, e, growth, sum.variant);
    case 'borel-pade':
      return place && borelPade('borel-pade', e, growth, Rational.ZERO, place);
    case 'borel-leroy-pade': {
      const b = leroyParameter(e, growth);
      return b && place && borelPade('borel-leroy-pade', e, growth, b, place);
    }
    case 'borel-partial-pade':
      return place && partialPade(e, growth, place);
    case 'borel-conformal':
      return conformal(e, growth, sum.variant);
    case 'singularity-model':
      return singularityModel(e);
    case 'contour-improved':
      return contourImproved(e);
    default:
      return undefined;
  }
}

interface Place {
  readonly L: number;
  readonly M: number;
  /** The entry lay in a block of equal ones; this is its corner. */
  readonly degenerate: boolean;
}

/** Corner of the block of equal entries that [L/M] lies in: the entry itself, unless exact coefficients say otherwise. */
function blockCorner(c: readonly Exact[], [L, M]: readonly [number, number]): Place {
  const found = padeOf(c, L, M, BITS);
  const d = found.exists === true ? found.deficiency : 0;
  return { L: L - d, M: M - d, degenerate: d > 0 };
}

function reduced(c: readonly Exact[], place: readonly [number, number]): { L: number; M: number } {
  const { L, M } = blockCorner(c, place);
  return { L, M };
}

function sequenceSetting(
  kind: 'wynn-epsilon' | 'levin' | 'weniger-delta',
  full: Expansion,
  growth: Growth,
  variant: string,
): FastSetting | undefined {
  const e = cleanPart(full, growth, MOST);
  const start = termsBeforeAlternation(e);
  if (start === undefined) return undefined;
  const common = { count: e.coefficients.length, start };
  if (kind === 'wynn-epsilon') return { kind, ...common };
  if (kind === 'weniger-delta') return { kind, variant: 'd', ...common };
  const known = (['t', 'u', 'd', 'v'] as const).find((v) => v === variant);
  return known && { kind, variant: known, ...common };
}

function borelPade(
  kind: 'borel-pade' | 'borel-leroy-pade',
  e: Expansion,
  growth: Growth,
  b: Rational,
  place: readonly [number, number],
): FastSetting {
  const { L, M, degenerate } = blockCorner(borelTransform(e.coefficients, b), place);
  return {
    kind,
    L,
    M,
    b: b.toNumber(),
    lift: !degenerate && !pairConfirmed(growth),
    innermost: innermostPole(e, growth) ?? 0,
    noise: noiseOf(e),
    x: toNumberExact(e.x),
  };
}

function partialPade(full: Expansion, growth: Growth, place: readonly [number, number]): FastSetting {
  const e = cleanPart(full, growth, MOST);
  const factors = knownFactors(e);
  const { L, M } = blockCorner(withoutFactors(borelTransform(e.coefficients), factors), place);
  return {
    kind: 'borel-partial-pade',
    L,
    M,
    factors: factors.map((f) => ({ t: toNumberExact(f.t), exponent: toNumberExact(f.exponent) })),
    lift: !pairConfirmed(growth),
    innermost: innermostRest(e, growth) ?? 0,
    noise: noiseOf(e),
    x: toNumberExact(e.x),
  };
}

/** The unit vectors of length N. */
const unit = (N: number, k: number): Exact[] => Array.from({ length: N }, (_, n) => exact(n === k ? 1 : 0));

function conformal(full: Expansion, growth: Growth, variant: string): ConformalSetting | undefined {
  const e = cleanPart(full, growth, MOST);
  const cuts = cutsOf(e);
  const softening = SOFTENINGS.find((s) => memberLabel(cuts, s) === variant);
  if (softening === undefined) return undefined;
  const N = e.coefficients.length;
  const prec = BITS + BITS_LOST * N;
  const columns = Array.from({ length: N }, (_, k) => {
    const b = borelTransform(unit(N, k)).map((c) => c.ball(prec));
    return remap(b, cuts, softening, prec).coefficients.map(R.toNumber);
  });
  const end = (cut: typeof cuts.left): ConformalSetting['left'] => ({
    inverse: cut === undefined ? 0 : 1 / toNumberExact(cut.distance),
    exponent: cut?.exponent === undefined ? 0 : toNumberExact(cut.exponent),
  });
  return {
    kind: 'borel-conformal',
    rows: Array.from({ length: N }, (_, n) => columns.map((column) => column[n]!)),
    softening,
    left: end(cuts.left),
    right: end(cuts.right),
    x: toNumberExact(e.x),
  };
}

function singularityModel(e: Expansion): SingularityModelSetting | undefined {
  const N = e.coefficients.length;
  const model = modelUsed(e);
  const fit = (c: readonly Exact[]): ModelFit | undefined => fitModel(c, model, BITS);
  const nothing = fit(unit(N, -1));
  const units = Array.from({ length: N }, (_, n) => fit(unit(N, n)));
  if (nothing === undefined || units.some((u) => u === undefined)) return undefined;
  const affine = (pick: (f: ModelFit) => Parameters<typeof R.toNumber>[0]): Affine => ({
    slopes: units.map((u) => R.toNumber(R.sub(pick(u!), pick(nothing), BITS))),
    constant: R.toNumber(pick(nothing)),
  });
  return {
    kind: 'singularity-model',
    points: model.map((s, i) => ({
      t: toNumberExact(s.t),
      exponent: toNumberExact(s.exponent),
      corrections: s.corrections.map(toNumberExact),
      strength: affine((f) => f.strengths[i]!),
    })),
    polynomial: nothing.polynomial.map((_, k) => affine((f) => f.polynomial[k]!)),
    x: toNumberExact(e.x),
  };
}

/** Error of the tabled integrals, relative to the largest. */
const TABLE_ERROR = 1e-13;
/** Ranges of x that are tried, in units of its central value: near the Landau singularity the circle gives out. */
const TABLED = [
  [0.35, 1.8],
  [0.5, 1.5],
  [0.6, 1.35],
  [0.7, 1.25],
  [0.8, 1.15],
] as const;

function contourImproved(e: Expansion): ContourImprovedSetting | undefined {
  const { contour } = e;
  if (contour === undefined) return undefined;
  const quantity = { factor: exact(1), additive: exact(0), contour };
  const x = toNumberExact(e.x);
  const N = contour.coefficients.length;
  const divisor = toNumberExact(divisorSize(contour.divisor));
  const table = (n: number, from: number, to: number): ChebyshevMap | undefined => {
    const unitVector = Array.from({ length: N }, (_, k) => (k === n ? 1 : 0));
    const integral = ([at = NaN]: readonly number[]): number => {
      const value = contourSum(quantity, 'contour-improved', at * divisor, unitVector);
      return typeof value === 'number' ? value / at ** e.power : NaN;
    };
    return chebyshevMap(integral, [from * x], [to * x], TABLE_ERROR);
  };
  for (const [from, to] of TABLED) {
    const integrals: ChebyshevMap[] = [];
    for (let n = 0; n < N; n++) {
      const map = table(n, from, to);
      if (map === undefined) break;
      integrals.push(map);
    }
    if (integrals.length === N) return { kind: 'contour-improved', integrals };
  }
  return undefined;
}
