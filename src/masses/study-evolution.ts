/** @module The way of an MSR mass from m(m) to its scale, with the closed form of the leading logarithms beside it. */
import { isRefusal } from '../qcd/index.js';
import { alphaAt } from './couplings.js';
import { fixedTerms, msrValue, pointAt, type Setting } from './convert.js';
import type { MassPlace } from './definition.js';
import { definitionOf } from './definitions.js';
import { gammaSeries, leadingLogShift } from './r-evolution.js';
import type { Evolution } from './study-types.js';
import { totalOf } from './terms.js';
import { few, scaleText, text } from './text.js';

/** Intervals of the path that is shown. */
const PATH_STEPS = 4;

const PATH_DIGITS = 6;

/** Undefined for a definition that does not evolve, or at R = m(m). */
export function evolutionOf(setting: Setting, place: MassPlace, msbar: number): Evolution | undefined {
  const definition = definitionOf(place.definition);
  const { scale } = place;
  if (definition.kind !== 'subtracted' || definition.evolution === undefined || scale === undefined) return undefined;
  const point = pointAt(setting, msbar);
  if (isRefusal(point)) return undefined;
  const path = [];
  for (let k = 0; k <= PATH_STEPS; k++) {
    const R = k === 0 ? msbar : k === PATH_STEPS ? scale : msbar * (scale / msbar) ** (k / PATH_STEPS);
    const alpha = alphaAt(setting.source, point.atMass, msbar, R);
    const there = msrValue(setting, definition, R, point);
    if (isRefusal(alpha) || isRefusal(there)) return undefined;
    path.push({
      scale: scaleText(R),
      alpha: few(alpha, PATH_DIGITS),
      mass: text(there.value),
      doubt: there.doubt,
    });
  }
  const fixed = fixedTerms(setting, place, point);
  if (fixed === undefined || isRefusal(fixed)) return undefined;
  const gamma0 = setting.numbers.table(gammaSeries(definition.evolution), point.light)[0]?.[0] ?? NaN;
  const leading = msbar + leadingLogShift(msbar, scale, point.atMass, point.light, gamma0);
  return {
    path: path.map(({ scale: R, alpha, mass }) => ({ scale: R, alpha, mass })),
    leadingLog: text(leading),
    fixedOrder: text(totalOf(setting.numbers, msbar, fixed)),
    doubt: few(Math.max(...path.map((p) => p.doubt)), 2),
  };
}
