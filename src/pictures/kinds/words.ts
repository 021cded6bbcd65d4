/** @module Words that several charts share. */
import type { Assessment } from '../../studies/index.js';

export const nameOf = ({ series }: Pick<Assessment, 'series'>): string => series.title;

export const atCoupling = ({ coupling }: Pick<Assessment, 'coupling'>): string =>
  `${coupling.name} = ${coupling.value}`;

/** Names as a picture has room for them; those that are not here are their own, with blanks. */
const SHORT: Readonly<Record<string, string>> = {
  fac: 'FAC',
  pms: 'PMS',
  blm: 'BLM',
  pade: 'Padé',
  'wynn-epsilon': 'Wynn ε',
  'weniger-delta': 'Weniger δ',
  'borel-pade': 'Borel–Padé',
  'borel-leroy-pade': 'Borel–Leroy–Padé',
  'borel-dlog': 'D-log Borel–Padé',
  'borel-partial-pade': 'Partial Borel–Padé',
  'borel-quadratic': 'Quadratic Padé',
  'borel-conformal': 'Conformal Borel',
  'borel-hypergeometric': 'Hypergeometric',
  'borel-pade-2': 'Borel–Padé, order 2',
  'order-dependent-map': 'Order-dep. mapping',
  'contour-borel': 'Contour Borel',
  'contour-borel-pade': 'Contour Borel–Padé',
  'pade-next': 'Padé, next term',
  'fac-next': 'FAC, next term',
  'cacciari-houdeau': 'Cacciari–Houdeau',
  'modified-ch': 'Modified C–H',
  'renormalon-ch': 'Renormalon C–H',
  abc: 'abc model',
};

/** A prescription or model as a label. */
export function labelName(name: string): string {
  const words = name.replaceAll('-', ' ');
  return SHORT[name] ?? words.slice(0, 1).toUpperCase() + words.slice(1);
}

/** The symbol of a quantity in the notation of labels: alpha_s is α_s, in italics. */
export const symbolLabel = (symbol: string): string => symbol.replace(/\balpha_s\b/g, '*α*_s');

/** A number with the sign that print has for minus. */
export const printedNumber = (text: string): string => text.replace('-', '−');
