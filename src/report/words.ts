/** @module Plain words for the names that results use. */
import { BUBBLE_CHAIN, CONTOUR_NAMES, PRESCRIPTIONS } from '../prescriptions/index.js';

const capital = (text: string): string => text.slice(0, 1).toUpperCase() + text.slice(1);

/** The title of a prescription as a heading; an unknown one in its own letters. */
export function prescriptionTitle(name: string): string {
  const all = [...PRESCRIPTIONS, ...Object.values(CONTOUR_NAMES), BUBBLE_CHAIN];
  const known = all.find((prescription) => prescription.name === name);
  return capital(known?.title ?? name.replaceAll('-', ' '));
}

/** A statement as a sentence: a capital letter in front where a word begins it, a full stop behind. */
export function sentence(text: string): string {
  const begun = /^(a(?= [^=])|[a-z]{2,}(?=[\s,:-]))/.test(text) ? capital(text) : text;
  return /[.!?:]$/.test(begun) || begun === '' ? begun : `${begun}.`;
}

/** Names from files and results keep their letters; only pi gets its sign. */
export const withPi = (text: string): string => text.replaceAll(/\bpi\b/g, 'π');

/** "alpha_s/π", "a/(4π)". */
export function over(name: string, divisor: string): string {
  if (divisor === '1') return name;
  const sign = withPi(divisor).replace('*', '');
  return `${name}/${sign.length > 1 ? `(${sign})` : sign}`;
}
