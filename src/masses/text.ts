/** @module Numbers of this room as decimal text that pretends to no digit. */

/** Digits of a result in doubles that is good to 1e-14 or so. */
const DIGITS = 12;

export const text = (x: number): string => String(Number(x.toPrecision(DIGITS)));

/** An estimate: a few significant digits. */
export function few(x: number, digits = 3): string {
  if (x === 0 || !Number.isFinite(x)) return String(x);
  const magnitude = Math.floor(Math.log10(Math.abs(x)));
  if (magnitude < -6 || magnitude >= 7) return x.toExponential(digits - 1).replace('e+', 'e');
  return Number(x.toPrecision(digits)).toFixed(Math.max(0, digits - 1 - magnitude));
}

/** A scale as a person would write it. */
export const scaleText = (x: number): string => String(Number(x.toPrecision(6)));

/** A term of a series in GeV: six digits are more than anybody reads. */
export const term = (x: number): string => few(x, 7);
