/** @module From numbers to the decimal strings of a result. */
import { roundPdg, writePlusMinus } from '../numerics/index.js';
import type { ErrorText } from '../numerics/index.js';
import { indicative } from '../studies/index.js';
import type { Component, Sides, Totals } from './budget.js';
import type { ComponentEntry, SidesEntry, TotalsEntry } from './result.js';

/** Significant digits of shifts and errors in a result; the page shows fewer. */
const ERROR_DIGITS = 8;

export const errorText = (x: number): string => indicative(x, ERROR_DIGITS);

/** A double with so many digits. */
export const numberText = (x: number, digits = ERROR_DIGITS): string => indicative(x, digits);

const sides = ({ plus, minus }: Sides): SidesEntry => ({ plus: errorText(plus), minus: errorText(minus) });

export const totalsEntry = (t: Totals): TotalsEntry => ({
  quadrature: sides(t.quadrature),
  linear: sides(t.linear),
  mixed: sides(t.mixed),
});

export function componentEntry(c: Component): ComponentEntry {
  const { name, nature, counted, note, missing } = c;
  return {
    name,
    ...(missing === undefined ? sides(c) : {}),
    nature,
    counted: counted && missing === undefined,
    ...(note === undefined ? {} : { note }),
    ...(missing === undefined ? {} : { missing }),
    sources: c.sources.map((s) => ({
      label: s.label,
      shifts: s.shifts.map((one) => ({ ...one, shift: errorText(one.shift) })),
    })),
  };
}

/** A component below this share of the largest does not decide the last digit. A heuristic, as in the verdict. */
const NEGLIGIBLE = 0.1;

/** "0.1180 ± 0.0009 (measurement) +0.0005 −0.0003 (truncation); coefficients negligible", rounded together. */
export function printed(value: string, components: readonly Component[], unit?: string): string {
  const list = components.filter((c) => c.counted && c.missing === undefined && (c.plus > 0 || c.minus > 0));
  const largest = Math.max(0, ...list.map((c) => Math.max(c.plus, c.minus)));
  const shown = list.filter((c) => Math.max(c.plus, c.minus) >= NEGLIGIBLE * largest);
  const hidden = list.filter((c) => !shown.includes(c)).map((c) => c.name);
  const errors = shown.map((c): ErrorText => rounding(c, NEGLIGIBLE * largest));
  const rounded = roundPdg(value, errors);
  const body = rounded === undefined ? value : writePlusMinus(rounded, shown.map((c) => c.name)); // prettier-ignore
  const inUnit = unit === undefined ? body : rounded === undefined ? `${body} ${unit}` : `(${body}) ${unit}`;
  return hidden.length === 0 ? inUnit : `${inUnit}; ${hidden.join(' and ')} negligible`;
}

/** A side that is negligible beside the largest error must not decide the place: it is written as it will round. */
function rounding({ plus, minus }: Sides, floor: number): ErrorText {
  const text = (x: number): string => (x < floor ? '0' : x.toPrecision(6));
  return text(plus) === text(minus) ? text(plus) : { plus: text(plus), minus: text(minus) };
}
