/** @module Plain words for the names that results use. */

const PRESCRIPTIONS = new Map([
  ['fixed-order', 'Fixed order'],
  ['least-term', 'Least term'],
  ['terminant', 'Least term with terminant'],
  ['pade', 'Padé in the coupling'],
  ['borel-pade', 'Borel–Padé, principal value'],
  ['borel-leroy-pade', 'Borel–Leroy–Padé, principal value'],
  ['borel-pade-2', 'Borel–Padé of order two, principal value'],
  ['singularity-model', 'Singularity model'],
  ['hyperasymptotic', 'Hyperasymptotic, level 1'],
  ['fac', 'Fastest apparent convergence'],
  ['pms', 'Minimal sensitivity'],
  ['blm', 'BLM scale'],
  ['wynn-epsilon', 'Wynn ε'],
  ['levin', 'Levin'],
  ['weniger-delta', 'Weniger δ'],
  ['euler', 'Euler'],
  ['order-dependent-map', 'Order-dependent mapping'],
  ['borel-dlog', 'Borel, logarithmic-derivative Padé'],
  ['borel-partial-pade', 'Borel, partial Padé'],
  ['borel-quadratic', 'Borel, quadratic approximants'],
  ['borel-conformal', 'Borel, conformal mapping'],
  ['borel-hypergeometric', 'Borel, hypergeometric'],
]);

/** The name of a prescription as a heading; an unknown one in its own letters. */
export function prescriptionTitle(name: string): string {
  return PRESCRIPTIONS.get(name) ?? name.slice(0, 1).toUpperCase() + name.slice(1).replaceAll('-', ' ');
}

/** A statement as a sentence: a capital letter in front where a word begins it, a full stop behind. */
export function sentence(text: string): string {
  const begun = /^(a(?= [^=])|[a-z]{2,}(?=[\s,:-]))/.test(text) ? text.slice(0, 1).toUpperCase() + text.slice(1) : text;
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
