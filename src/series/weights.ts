/**
 * @module Weights of contour quantities: polynomials w(x), x = s/s_0, by their coefficients or by a published name.
 *
 * Names      kinematic        (1 − x)²(1 + 2x), of the total hadronic width of the τ lepton
 *            kinematic-k-l    (1 − x)^k x^l times it, the spectral moments (k, l)
 * Reference  E. Braaten, S. Narison, A. Pich, Nucl. Phys. B 373 (1992) 581; F. Le Diberder, A. Pich, Phys. Lett. B 289
 *            (1992) 165 (both from memory; the width's published numbers follow from the weight, see the tests).
 */
import { Rational } from '../numerics/index.js';
import { isNumberProblem, parsePlain, plainSigns } from './number-text.js';
import type { NumberProblem } from './number-text.js';
import { quote } from './quote.js';
import type { ContourWeight } from './series.js';

/** Highest degree of a weight, and of k and l in a name. */
export const MOST_DEGREE = 40;
const MOST_MOMENT = 9;

export const WEIGHT_FORMS = '"kinematic", "kinematic-1-0", or the coefficients w_0, w_1, … such as [1, -2, 1]';

const integers = (...numbers: readonly number[]): Rational[] => numbers.map((n) => Rational.of(n));

function product(a: readonly Rational[], b: readonly Rational[]): Rational[] {
  const out = Array.from({ length: a.length + b.length - 1 }, () => Rational.ZERO);
  a.forEach((x, i) => {
    b.forEach((y, j) => {
      out[i + j] = out[i + j]!.add(x.mul(y));
    });
  });
  return out;
}

/** The coefficients of a published weight; undefined for an unknown name. */
export function namedWeight(name: string): readonly Rational[] | undefined {
  const m = /^kinematic(?:-(\d+)-(\d+))?$/.exec(name);
  if (m === null) return undefined;
  const [k, l] = [Number(m[1] ?? 0), Number(m[2] ?? 0)];
  if (k > MOST_MOMENT || l > MOST_MOMENT) return undefined;
  let w: Rational[] = product(integers(1, -2, 1), integers(1, 2));
  for (let i = 0; i < k; i++) w = product(w, integers(1, -1));
  return [...Array.from({ length: l }, () => Rational.ZERO), ...w];
}

/** A weight from its coefficients; what is wrong with them otherwise. Zeros at the end are dropped. */
export function weightOf(coefficients: readonly Rational[], name?: string): ContourWeight | NumberProblem {
  const last = coefficients.findLastIndex((w) => !w.isZero());
  if (last < 0) return { problem: 'a weight that vanishes', wanted: 'at least one coefficient other than 0' };
  if (last > MOST_DEGREE) return { problem: `a weight of degree ${last}`, wanted: `at most ${MOST_DEGREE}` };
  return { coefficients: coefficients.slice(0, last + 1), ...(name === undefined ? {} : { name }) };
}

/** A weight as the command line gives it: a name, or numbers set off by commas, in brackets or not. */
export function parseWeight(text: string): ContourWeight | NumberProblem {
  const plain = plainSigns(text);
  const named = namedWeight(plain);
  if (named !== undefined) return weightOf(named, plain);
  const list = /^\[(.*)\]$/.exec(plain)?.[1] ?? plain;
  const numbers: Rational[] = [];
  for (const item of list.split(',')) {
    const q = parsePlain(plainSigns(item));
    if (q === undefined) return { problem: quote(item.trim()), wanted: WEIGHT_FORMS };
    if (isNumberProblem(q)) return q;
    numbers.push(q);
  }
  return weightOf(numbers);
}

/** "1 - 3*x^2 + 2*x^3". */
export function weightText(weight: ContourWeight): string {
  let text = '';
  weight.coefficients.forEach((w, i) => {
    if (w.isZero()) return;
    const size = w.abs();
    const power = i === 0 ? '' : i === 1 ? 'x' : `x^${i}`;
    const one = size.equals(Rational.ONE);
    const body = power === '' ? size.toString() : one ? power : `${size.toString()}*${power}`;
    text += text === '' ? (w.sign() < 0 ? `-${body}` : body) : ` ${w.sign() < 0 ? '-' : '+'} ${body}`;
  });
  return text;
}
