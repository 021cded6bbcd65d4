/** @module Quantity and coupling of a bubble chain as the result states them. */
import { couplingA, lambdaOverQ, landauOverQ } from '../bubbles/index.js';
import type { ChainPoint, Quantity } from '../bubbles/index.js';
import { R, toNumberExact } from '../numerics/index.js';
import type { Rational } from '../numerics/index.js';
import type { Uncertain } from '../series/index.js';
import { exactText, indicative } from '../studies/index.js';
import type { BubbleCoupling, BubbleQuantity, BubbleResult } from './bubble-result.js';

/** The coupling as the user gave it. */
export interface BubbleQuestion {
  readonly quantity: Quantity;
  readonly at: Uncertain;
  readonly flavours: number;
  readonly ratio: ChainPoint['ratio'];
  /** Hard scale in GeV. */
  readonly scale?: Rational;
  readonly path?: readonly string[];
  readonly digits: number;
  /** Number of coefficients. */
  readonly order: number;
  readonly request: BubbleResult['request'];
}

export const pointOf = ({ at, flavours, ratio }: BubbleQuestion): ChainPoint => ({ alpha: at.value, flavours, ratio });

/** Bits for `digits` decimal digits. */
export const bitsFor = (digits: number): number => Math.ceil(digits * 3.33) + 8;

export const quantityWords = (quantity: Quantity): BubbleQuantity => ({
  name: quantity.name,
  title: quantity.title,
  meaning: quantity.meaning,
  borelTransform: quantity.formula,
  normalisation: quantity.norm.text,
  hard: quantity.hard,
  sources: quantity.sources,
  status: quantity.status,
});

/** Digits of Λ and of scales. */
const SCALE_DIGITS = 8;

function length(overHard: number, scale: Rational | undefined): { overHard: string; GeV?: string } {
  return {
    overHard: indicative(overHard, SCALE_DIGITS),
    ...(scale === undefined ? {} : { GeV: indicative(overHard * scale.toNumber(), SCALE_DIGITS) }),
  };
}

/** One-sigma error of the coupling, 0 when it has none. */
export const couplingError = (at: Uncertain): number =>
  at.error === undefined ? 0 : (at.error.plus.toNumber() + at.error.minus.toNumber()) / 2;

export function couplingWords(question: BubbleQuestion): BubbleCoupling {
  const { at, flavours, ratio, scale, path, digits } = question;
  const point = pointOf(question);
  const error = couplingError(at);
  return {
    value: exactText(at.value, digits),
    ...(error === 0 ? {} : { error: indicative(error, 3) }),
    flavours,
    mu: exactText(ratio, 12),
    ...(scale === undefined ? {} : { scale: indicative(scale.toNumber(), SCALE_DIGITS) }),
    a: indicative(R.toNumber(couplingA(point, 80)), SCALE_DIGITS),
    lambda: length(lambdaOverQ(point), scale),
    landau: length(landauOverQ(point), scale),
    ...(path === undefined ? {} : { path }),
  };
}

/** Value of a double-sized difference. */
export const numberOf = toNumberExact;
