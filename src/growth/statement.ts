/** @module The verdict as one sentence for people. */
import { MIDDLE, type Classified } from './verdict-rule.js';
import type { Estimate } from './growth.js';
import type { Located } from './locate.js';
import type { Prepared } from './prepare.js';
import { place, plural, plusMinus, short } from './words.js';

/** Exponents near 3/2 in the order-2 Borel plane belong to (n!)², near others to (2n)!. */
const SQUARE_EXPONENT = { value: 1.5, within: 0.1 };

/** A position known worse than this, relative, is only pointed to. */
const VAGUE = 0.3;

function evidenceOf(p: Prepared): string {
  const k = p.comparison?.bayesFactor;
  const n = p.nonZero.length;
  const factor =
    k === undefined ? '' : ` (Bayes factor ${k > 1e6 ? 'above 1000000' : short(k)} against geometric growth)`;
  return `${plural(n, 'coefficient')}${factor}`;
}

function exponentText(located: Located): string {
  const s = located.nearest;
  if (located.essential !== undefined) {
    return `, where growth e^(${short(located.essential.rate)} n^${short(located.essential.kappa)}) on top of n! leaves no power exponent`;
  }
  if (s?.exponent === undefined || !(s.exponent.error < 1)) return '';
  const kind = s.logarithmic === true ? ' (a logarithm)' : '';
  return `, with exponent ${plusMinus(s.exponent)}${kind}`;
}

function factorialText(p: Prepared, located: Located | undefined): string {
  const head = `factorial growth n! in ${evidenceOf(p)}`;
  if (located?.nearest === undefined) {
    return `${head}; the position of the nearest singularity is not resolved because ${located?.competition[0] ?? 'the ratios do not settle'}`;
  }
  const { t, standing } = located.nearest;
  const vague = standing === 'indicative' && (located.competing || t.error > VAGUE * Math.abs(t.value));
  const so = vague ? 'so far the terms point to' : 'the nearest Borel singularity is at';
  return `${head}; ${so} ${place(located.nearest)}${exponentText(located)}`;
}

function superText(p: Prepared, c: Classified, located: Located | undefined, order: number | undefined): string {
  if (c.beyond)
    return `growth faster than any (kn)! in ${plural(p.nonZero.length, 'coefficient')}: no Borel method of finite order applies`;
  const gamma = located?.nearest?.exponent;
  const square =
    gamma !== undefined &&
    gamma.error < SQUARE_EXPONENT.within &&
    Math.abs(gamma.value - SQUARE_EXPONENT.value) < SQUARE_EXPONENT.within;
  const name =
    order === 2
      ? square
        ? '(n!)^2'
        : '(2n)!'
      : order !== undefined && Number.isInteger(order)
        ? `(${order}n)!`
        : `(n!)^${short(order ?? 2)}`;
  const where =
    located?.nearest === undefined
      ? ''
      : `; the transform of order ${order ?? 2}, Σ c_n t^(${order ?? 2}n)/(${order ?? 2}n)!, is singular at ${place(located.nearest)}`;
  return `growth ${name}, Gevrey order ${short(order ?? c.order?.value ?? 2)}: the order-1 Borel transform diverges everywhere${where}`;
}

export function statementOf(
  p: Prepared,
  c: Classified,
  located: Located | undefined,
  radius: Estimate | undefined,
  order: number | undefined,
): string {
  switch (c.verdict) {
    case 'undecided':
      return `undecided: ${c.reason}`;
    case 'factorial':
      return factorialText(p, located);
    case 'superfactorial':
      return superText(p, c, located, order);
    case 'subfactorial':
      return `divergent but slower than n!: |c_n| grows like (n!)^${short(order ?? c.order?.value ?? 0.5)}, and the Borel transform is entire`;
    case 'geometric':
      return (
        `geometric growth${p.nonZero.length <= MIDDLE ? ' so far' : ''}: the series converges` +
        (radius === undefined ? '' : ` for |x| < ${plusMinus(radius)}`) +
        `, and there is no factorial growth to resum`
      );
    case 'convergent':
      return `the coefficients fall ${order === undefined ? 'faster than geometrically, roughly ' : ''}like (n!)^${short(order ?? c.order?.value ?? -1, 2)}: the series converges for every x, and there is no factorial growth to resum`;
    case 'terminating':
      return 'the series terminates';
  }
}
