/**
 * @module Hypergeometric (Meijer G) Borel sum: the ratios of the Borel coefficients as a rational function of n.
 *
 * One dominant cut of any exponent; needs ratios of one sign (the first may differ: the first term then stands apart).
 * Principal value and imaginary part in closed form. Truncation error: the step from one coefficient fewer.
 * References: H. Mera, T. G. Pedersen, B. K. Nikolić, PRL 115 (2015) 143001, arXiv:1405.7956; arXiv:1802.06034 (abstract seen).
 */
import { C, exact, R, signExact } from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';
import { borelTransform, fitRatios, hypergeometricSum, parameterBits } from '../borel/index.js';
import type { HypergeometricSum, HypergeometricTransform, RatioFit } from '../borel/index.js';
import type { Expansion } from '../series/index.js';
import { cleanPart, growthObjection, inputObjection, trustOf } from './eligibility.js';
import type { Outcome, Prescription } from './prescription.js';
import { dressed, refusal, scaled, toDigits } from './prescription.js';
import { nearestDistance } from './ray-family.js';

/** Most coefficients used: a rational function of n of higher degree than five fits noise. Heuristic. */
const MOST = 12;
/** 1/|K| may differ from the nearest known position by this factor before the notes say so. Heuristic. */
const FAR = 2;
/** Bits of the parameters that only decide whether the fit can be believed. */
const ROUGH_BITS = 64;
/** Parameters from 2^this on are refused: singular behaviour of one cut has exponents of order one. Heuristic. */
const LARGEST_PARAMETER_BITS = 6;
/** Digits of the evaluation that only serves the error. */
const ERROR_DIGITS = 12;

interface Fitted {
  /** Free first term that the fit does not contain, in units of F. */
  readonly apart: Exact;
  /** Powers of x in front of the fitted part. */
  readonly shift: 0 | 1;
  readonly fit: RatioFit;
  readonly rough: HypergeometricTransform;
}

/** Terms before the ratios have one sign: 0, 1, or undefined. */
function termsBefore(c: readonly Exact[]): 0 | 1 | undefined {
  const signs = c.map(signExact);
  const steady = (from: number): boolean => {
    const ratios = signs.slice(from + 1).map((s, n) => s * signs[from + n]!);
    return ratios.every((r) => r !== 0 && r === ratios[0]);
  };
  if (steady(0)) return 0;
  return c.length > 3 && steady(1) ? 1 : undefined;
}

/** −1, −2, … and 0 as a parameter, as far as its enclosure tells. */
function mayBeNonPositiveInteger(z: { readonly re: Ball; readonly im: Ball }): boolean {
  const nearest = Math.round(R.toNumber(z.re));
  return nearest <= 0 && C.containsZero({ re: R.sub(z.re, R.fromNumber(nearest), ROUGH_BITS), im: z.im });
}

function fitted(c: readonly Exact[]): Fitted | string {
  const before = termsBefore(c);
  if (before === undefined) return 'the ratios of the coefficients change sign: more than one singularity competes';
  const used = c.slice(before);
  const fit = fitRatios(borelTransform(used));
  if (typeof fit === 'string') return fit;
  const rough = fit.at(ROUGH_BITS);
  if (typeof rough === 'string') return rough;
  if (rough.lower.some(mayBeNonPositiveInteger))
    return 'a lower parameter is 0, −1, −2, …: the function is not defined';
  if (rough.upper.some(mayBeNonPositiveInteger))
    return 'an upper parameter is 0, −1, −2, …: the fitted series terminates';
  if ([...rough.upper, ...rough.lower].some((z) => C.upperBits(z) > LARGEST_PARAMETER_BITS))
    return 'parameters of absurd size: the ratios do not settle to those of one cut';
  const direction = signExact(used[0]!) * signExact(used[1]!);
  if (R.containsZero(rough.K) || (R.isPositive(rough.K) ? 1 : -1) !== direction)
    return 'the fitted ratios change sign at larger n: more than one singularity competes';
  return { apart: before === 1 ? c[0]! : exact(0), shift: before, fit, rough };
}

/** The transform fitted to all coefficients after those that stand apart; undefined where it cannot be believed. */
export function fittedTransform(
  c: readonly Exact[],
  prec: number,
): { readonly apart: 0 | 1; readonly transform: HypergeometricTransform } | undefined {
  const found = c.length > MOST ? 'too many' : fitted(c);
  const transform = typeof found === 'string' ? found : found.fit.at(prec);
  return typeof found === 'string' || typeof transform === 'string' ? undefined : { apart: found.shift, transform };
}

function evaluate(f: Fitted, x: Exact, digits: number): HypergeometricSum | undefined {
  const result = toDigits(
    digits,
    (prec): HypergeometricSum | undefined => {
      const bits = parameterBits(f.rough, x.ball(ROUGH_BITS), prec);
      const h = f.fit.at(bits);
      if (typeof h === 'string') return undefined;
      const ball = x.ball(bits);
      const s = hypergeometricSum(h, ball, prec);
      if (s === undefined) return undefined;
      const weight = R.mul(h.head.ball(bits), f.shift === 1 ? ball : R.ONE, bits);
      return {
        pv: R.add(f.apart.ball(bits), R.mul(weight, s.pv, bits), bits),
        im: R.mul(weight, s.im, bits),
        certified: s.certified,
      };
    },
    (s) => s?.pv ?? R.ZERO,
  );
  return result !== undefined && result.pv.rad < Infinity ? result : undefined;
}

function notesOf(
  e: Expansion,
  f: Fitted,
  found: { readonly t: { readonly value: number } } | undefined,
  dropped: number,
): string[] {
  const position = 1 / R.toNumber(f.rough.K);
  const nearest = nearestDistance(e, found);
  const ratio = nearest === undefined ? 1 : Math.abs(position) / nearest;
  return [
    `singularity of the fit at t = ${position.toPrecision(5)}`,
    ...(f.fit.explained ? ['the ratios are a rational function of n as far as the coefficients show'] : []),
    ...(ratio > FAR || ratio < 1 / FAR
      ? [`the nearest known singularity is at |t| = ${nearest!.toPrecision(4)}: the fit misses it`]
      : []),
    ...(f.shift === 1 ? ['the first term stands apart: its ratio has the other sign'] : []),
    ...(dropped > 0 ? [`the first ${e.coefficients.length} coefficients only`] : []),
  ];
}

export const borelHypergeometric: Prescription = {
  name: 'borel-hypergeometric',
  title: 'hypergeometric Borel sum',
  summary: 'Borel transform continued as a hypergeometric function of one cut, summed in closed form (Meijer G)',
  family: 'borel',
  apply(full, growth, request): readonly Outcome[] {
    const e = cleanPart(full, growth, MOST);
    const N = e.coefficients.length;
    const variant = `${N} coefficients`;
    const no = growthObjection(growth, variant) ?? inputObjection(e, growth, variant, 3);
    if (no !== undefined) return [no];
    if (growth.verdict === 'subfactorial')
      return [
        refusal(
          variant,
          'growth slower than n!: the Borel transform has no singularity at finite distance',
          'use Borel–Padé',
        ),
      ];
    const best = fitted(e.coefficients);
    if (typeof best === 'string')
      return [refusal(variant, best, 'use Borel–Padé or the conformal map, which bear several singularities')];
    const s = evaluate(best, e.x, request.digits);
    if (s === undefined)
      return [
        refusal(
          variant,
          'the parameters cannot be separated well enough for the closed form',
          'use one coefficient fewer (--order), or Borel–Padé',
        ),
      ];
    const prec = Math.max(128, request.digits * 4 + 64);
    const value = dressed(e, s.pv, prec);
    const before = request.only === undefined && N > 3 ? fitted(e.coefficients.slice(0, -1)) : 'not asked for';
    const previous = typeof before === 'string' ? undefined : evaluate(before, e.x, ERROR_DIGITS);
    const truncation = previous === undefined ? undefined : step(e, s.pv, previous.pv);
    return [
      {
        kind: 'sum',
        variant,
        value,
        imaginary: scaled(e, s.im, prec),
        ...(truncation === undefined ? {} : { truncation }),
        termsUsed: N,
        trust: trustOf(value, truncation),
        digitsTrust: s.certified ? 'certified' : 'converged',
        notes: notesOf(e, best, growth.nearest, full.coefficients.length - N),
        central: true,
      },
    ];
  },
};

function step(e: Expansion, a: Ball, b: Ball): number {
  const d = scaled(e, R.sub(a, b, 128), 128);
  return Math.abs(R.toNumber(d)) + R.radiusToNumber(d);
}
