/**
 * @module The first coefficients of the b → u width in closed form.
 *
 * Purpose    c_0 … c_3 in π and ζ values; the Borel transform gives enclosures only, since its ₃F₂ has no closed Taylor series.
 * Method     c_0 and c_1 are the known one- and two-loop numbers; c_2 and c_3 were matched by an integer relation on 60 digits.
 * Bound      not proved: they agree with the enclosures, to 200 digits in the tests.
 * Reference  one loop: textbooks; two loops, leading n_f: T. van Ritbergen, Phys. Lett. B 454 (1999) 353 (from memory).
 */
import { Rational } from '../numerics/index.js';
import { formalRational, formalRing, formalSymbol, mulFormal, powFormal, scaleFormal } from '../qcd/index.js';
import type { Formal } from '../qcd/index.js';
import { FORMAL_CONSTANTS, timesFactorials } from './gamma-series.js';
import { massSeries } from './taylor.js';

type Entry = readonly [numerator: number, denominator: number, ...symbols: readonly (readonly [string, number])[]];

const PI2 = ['pi', 2] as const;
const PI4 = ['pi', 4] as const;
const Z3 = ['z3', 1] as const;
const Z5 = ['z5', 1] as const;

const FORMS: readonly (readonly Entry[])[] = [
  [
    [25, 8],
    [-1, 2, PI2],
  ],
  [
    [1009, 96],
    [-77, 72, PI2],
    [-8, 1, Z3],
  ],
  [
    [24763, 576],
    [-1417, 432, PI2],
    [-37, 6, Z3],
    [-121, 180, PI4],
  ],
  [
    [7586975, 34560],
    [-155020, 34560, PI2],
    [3869280, 34560, Z3],
    [-108912, 34560, PI4],
    [-345600, 34560, PI2, Z3],
    [-11612160, 34560, Z5],
  ],
];

const monomial = ([numerator, denominator, ...symbols]: Entry): Formal =>
  symbols.reduce(
    (product, [name, power]) => mulFormal(product, powFormal(formalSymbol(name), power)),
    scaleFormal(formalRational(Rational.ONE), Rational.of(numerator, denominator)),
  );

/** c_0, c_1, … of the width in the pole mass, at μ = m: as many as are known, at most `length`. */
export const widthForms = (length: number): Formal[] =>
  FORMS.slice(0, length).map((entries) =>
    entries.reduce((sum, entry) => formalRing.add(sum, monomial(entry)), formalRing.zero),
  );

/** The same in the MSbar mass: with five times the pole mass. */
export function widthAndMass(length: number): Formal[] {
  const mass = timesFactorials(massSeries(FORMAL_CONSTANTS, formalRational(Rational.of(5, 3)), length));
  return widthForms(length).map((c, n) => formalRing.add(c, scaleFormal(mass[n] ?? formalRing.zero, Rational.of(5))));
}
