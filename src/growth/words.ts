/** @module Numbers and places in words, for statements and flags. */
import type { Estimate, FoundSingularity } from './growth.js';

/** At most `digits` significant digits, without trailing zeros. */
export const short = (x: number, digits = 3): string => Number(x.toPrecision(digits)).toString();

/** Relative errors below this are the rounding of doubles, and say nothing about the series. */
const ROUNDING = 1e-12;

/** Places after the point, and the power of ten, from which on a number is written with an exponent. */
const MOST_PLACES = 15;
const MOST_PLAIN = 7;

/** value ± error, the error to two digits and the value to the same place. */
export function plusMinus(e: Estimate): string {
  if (!(e.error > ROUNDING * Math.abs(e.value)) || !Number.isFinite(e.error)) return short(e.value, 10);
  const last = Math.floor(Math.log10(e.error)) - 1;
  const leading = e.value === 0 ? last : Math.floor(Math.log10(Math.abs(e.value)));
  const plain = last < 0 && last >= -MOST_PLACES && leading < MOST_PLAIN;
  const value = plain ? e.value.toFixed(-last) : short(e.value, Math.min(15, Math.max(1, leading - last + 1)));
  return `${value} ± ${short(e.error, 2)}`;
}

/** "t = −0.333 ± …, on the negative axis". */
export function place(s: FoundSingularity, variable = 't'): string {
  if (s.t.value === 0 || !Number.isFinite(s.t.value)) {
    return `|${variable}| = 10^${short(s.logAbs / Math.LN10, 8)}, on the ${s.kind === 'complex pair' ? 'complex plane' : s.kind}`;
  }
  switch (s.kind) {
    case 'complex pair': {
      const degrees = ((s.angle?.value ?? 0) * 180) / Math.PI;
      const error = ((s.angle?.error ?? 0) * 180) / Math.PI;
      return `|${variable}| = ${plusMinus(s.t)} at angles ±${plusMinus({ value: degrees, error })}°, a complex-conjugate pair`;
    }
    case 'both axes':
      return `${variable} = ±(${plusMinus(s.t)}), on both axes`;
    case 'positive axis':
    case 'negative axis':
      return `${variable} = ${plusMinus(s.t)}, on the ${s.kind}`;
  }
}

export const plural = (n: number, one: string): string => `${n} ${one}${n === 1 ? '' : 's'}`;
