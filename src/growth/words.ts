/** @module Numbers and places in words, for statements and flags. */
import type { Estimate, FoundSingularity } from './growth.js';

/** At most `digits` significant digits, without trailing zeros. */
export const short = (x: number, digits = 3): string => Number(x.toPrecision(digits)).toString();

/** Relative errors below this are the rounding of doubles, and say nothing about the series. */
const ROUNDING = 1e-12;

/** value ± error, the error to two digits and the value to the same place. */
export function plusMinus(e: Estimate): string {
  if (!(e.error > ROUNDING * Math.abs(e.value)) || !Number.isFinite(e.error)) return short(e.value, 10);
  const relative = Math.abs(e.value) > 0 ? e.error / Math.abs(e.value) : 1;
  const digits = Math.min(15, Math.max(2, 2 + Math.ceil(-Math.log10(relative))));
  return `${short(e.value, digits)} ± ${short(e.error, 2)}`;
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
