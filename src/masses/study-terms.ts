/** @module The terms of a definition at μ as the study lists them: of the pole mass, of the renormalon in it, taken out, left. */
import { asymptoticNumbers } from './asymptotic.js';
import type { MassTerm } from './study-types.js';
import type { Point, Terms } from './terms.js';
import { few, term } from './text.js';

const ratio = (x: number, before: number | undefined): string | undefined =>
  before === undefined || before === 0 ? undefined : few(x / before, 3);

export function listTerms(point: Point<number>, terms: Terms<number>): MassTerm[] {
  const { light, mu, alpha, strength } = point;
  const count = terms.pole.length - 1;
  const a = asymptoticNumbers(light, count);
  const left = terms.pole.map((p, k) => p - (terms.removed[k] ?? 0));
  return Array.from({ length: count }, (_, n) => {
    const k = n + 1;
    const [pole = NaN, rest = NaN] = [terms.pole[k], left[k]];
    const poleRatio = ratio(pole, n === 0 ? undefined : terms.pole[n]);
    const leftRatio = ratio(rest, n === 0 ? undefined : left[n]);
    return {
      order: k,
      pole: term(pole),
      renormalon: term(strength * mu * (a[n] ?? 0) * alpha ** k),
      removed: term(terms.removed[k] ?? 0),
      left: term(rest),
      ...(poleRatio === undefined ? {} : { poleRatio }),
      ...(leftRatio === undefined ? {} : { leftRatio }),
    };
  });
}
