/** @module Exact coefficients as text: "151/9 - 16/3*zeta(3)", the way series files write them. */
import { Rational } from '../numerics/index.js';
import { monomialsOf } from '../qcd/index.js';
import type { Formal } from '../qcd/index.js';

/** z3 is ζ(3), gE Euler's constant. */
const symbol = (name: string): string =>
  name === 'gE' ? 'gamma_E' : name.startsWith('z') ? `zeta(${name.slice(1)})` : name;

/** A sum of rational multiples of products of π, γ and ζ values. */
export function formText(form: Formal): string {
  const terms = monomialsOf(form)
    .map(({ powers, factor }) => {
      const list = [...powers].sort(([a], [b]) => (a < b ? -1 : 1));
      return {
        factor,
        product: list.map(([name, k]) => (k === 1 ? symbol(name) : `${symbol(name)}^${k}`)).join('*'),
        degree: list.reduce((sum, [, k]) => sum + k, 0),
      };
    })
    .sort((a, b) => a.degree - b.degree || (a.product < b.product ? -1 : 1));
  if (terms.length === 0) return '0';
  return terms
    .map(({ factor, product }, i) => {
      const sign = factor.sign() < 0 ? (i === 0 ? '-' : ' - ') : i === 0 ? '' : ' + ';
      const size = factor.abs();
      if (product === '') return sign + size.toString();
      return sign + (size.equals(Rational.ONE) ? product : `${size.toString()}*${product}`);
    })
    .join('');
}
