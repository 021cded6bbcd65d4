/**
 * @module One mass into another, in doubles: quick enough for root finding and for replicas.
 *
 * Method     every conversion goes through m(m): the source relation is solved for it, the target relation evaluated, both
 *            truncated at the same order. So there and back is the identity. Masses of other MSbar scales by the renormalisation
 *            group, MSR masses by R-evolution from m(m), all others at fixed order at the scale μ.
 * Bound      rounding: a few 2^-53 for the truncated relations.
 */
import { betaNumbers, evolveMass, isRefusal, type Loops, type Refusal } from '../qcd/index.js';
import { checkCutoff, checkRequest, commonOrders } from './check.js';
import { alphaAt, geometricAlpha, heavyAlpha, lambdaAt, lightAlpha, type CouplingSource } from './couplings.js';
import type { MassPlace, SubtractedDefinition } from './definition.js';
import { definitionOf } from './definitions.js';
import { DOUBLES, shiftedDoubles, type Numbers } from './numbers.js';
import { POLE_SERIES, NATURAL_SERIES } from './pole-series.js';
import { gammaSeries, rEvolve } from './r-evolution.js';
import type { MassConversion, MassRequest } from './request.js';
import { solveMass } from './root.js';
import { defaultStrength } from './strength.js';
import { coefficientsAt, subtractedTerms, summedTerms, totalOf, type Point, type Terms } from './terms.js';
import { PS_SERIES } from './definitions/ps.js';

/** A request with everything that was left open filled in. */
export interface Setting {
  readonly source: CouplingSource;
  readonly numbers: Numbers<number>;
  readonly order: number;
  readonly strength: number;
  readonly scale: { readonly ratio: number } | { readonly GeV: number };
}

/** The last coefficients moved: pole and MSR by the same number, since it is one coefficient that is uncertain. */
function numbersOf(request: MassRequest): Numbers<number> {
  const { light, shifts } = request;
  const pole = (shifts?.pole ?? 0) * (POLE_SERIES.error?.(light) ?? 0);
  const potential = (shifts?.potential ?? 0) * (PS_SERIES.error?.(light) ?? 0);
  if (pole === 0 && potential === 0) return DOUBLES;
  const moved = [POLE_SERIES, NATURAL_SERIES, gammaSeries(POLE_SERIES), gammaSeries(NATURAL_SERIES)];
  return shiftedDoubles(new Map([...moved.map((s): [string, number] => [s.key, pole]), [PS_SERIES.key, potential]]));
}

export function settingOf(request: MassRequest): Setting | Refusal {
  const bad = checkRequest(request);
  if (bad !== undefined) return bad;
  const { alpha, light, flavours = light + 1, loops = 5, thresholds, from, to } = request;
  return {
    source: { given: alpha, light, flavours, loops, ...(thresholds === undefined ? {} : { thresholds }) },
    numbers: numbersOf(request),
    order: request.order ?? commonOrders(from, to),
    strength: request.strength ?? defaultStrength(light),
    scale: request.scale ?? { ratio: 1 },
  };
}

const muOf = (setting: Setting, msbar: number): number =>
  'GeV' in setting.scale ? setting.scale.GeV : setting.scale.ratio * msbar;

/** The place of the expansions at a value of m(m). */
export function pointAt(setting: Setting, msbar: number): (Point<number> & { readonly atMass: number }) | Refusal {
  const { source, strength } = setting;
  const atMass = lightAlpha(source, msbar);
  if (isRefusal(atMass)) return atMass;
  const mu = muOf(setting, msbar);
  const alpha = alphaAt(source, atMass, msbar, mu);
  if (isRefusal(alpha)) return alpha;
  return { light: source.light, msbar, mu, alpha, strength, atMass };
}

/** The point with its geometric coupling. */
function withGeometric(setting: Setting, point: Point<number>): Point<number> | Refusal {
  const lambda = lambdaAt(setting.source, point.alpha, point.mu);
  if (isRefusal(lambda)) return lambda;
  const [b0 = NaN, b1 = NaN] = betaNumbers(point.light, 2, '1');
  const geometric = geometricAlpha(2 * Math.log(point.mu / lambda), b0, b1 / b0, point.alpha);
  return isRefusal(geometric) ? geometric : { ...point, geometric };
}

/** The terms at fixed order; undefined for MSbar masses, which have none. */
export function fixedTerms(
  setting: Setting,
  place: MassPlace,
  point: Point<number>,
): Terms<number> | Refusal | undefined {
  const definition = definitionOf(place.definition);
  const { numbers, order } = setting;
  if (definition.kind === 'msbar') return undefined;
  if (definition.kind === 'subtracted') {
    return subtractedTerms(numbers, definition, point, place.scale ?? point.mu, order);
  }
  const full = definition.coupling === 'geometric' ? withGeometric(setting, point) : point;
  return isRefusal(full) ? full : summedTerms(numbers, definition, full, order);
}

const loopsOf = (n: number): Loops => (n === 1 || n === 2 || n === 3 || n === 4 ? n : 5);

export interface MsrValue {
  readonly value: number;
  /** Difference of two quadratures. */
  readonly doubt: number;
}

/** An MSR mass: m(m), the fixed-order difference to it at R = m(m), and the evolution from there. */
export function msrValue(
  setting: Setting,
  definition: SubtractedDefinition,
  cutoff: number,
  point: Point<number> & { readonly atMass: number },
): MsrValue | Refusal {
  const { numbers, order, source } = setting;
  const { msbar, light, atMass } = point;
  const series = definition.evolution ?? POLE_SERIES;
  const ratio = point.mu / msbar;
  const at = { ...point, alpha: point.alpha };
  const matching = totalOf(numbers, msbar, subtractedTerms(numbers, definition, at, msbar, order));
  if (cutoff === msbar) return { value: matching, doubt: 0 };
  const alphaTo = alphaAt(source, atMass, msbar, cutoff * ratio);
  if (isRefusal(alphaTo)) return alphaTo;
  const gamma = coefficientsAt(numbers, numbers.table(gammaSeries(series), light), -2 * Math.log(ratio), order);
  const { shift, doubt } = rEvolve({
    from: msbar,
    alphaFrom: point.alpha,
    alphaTo,
    light,
    loops: loopsOf(source.loops),
    gamma,
  });
  return { value: matching + shift, doubt };
}

/** The mass of a definition from m(m). */
export function massFrom(setting: Setting, place: MassPlace, msbar: number): number | Refusal {
  const definition = definitionOf(place.definition);
  if (definition.kind === 'msbar') {
    if (place.definition === 'msbar' || place.scale === undefined) return msbar;
    const { source } = setting;
    const alpha = heavyAlpha(source, msbar);
    if (isRefusal(alpha)) return alpha;
    const { flavours, loops } = source;
    const moved = evolveMass({ mass: msbar, alpha, from: msbar, to: place.scale, flavours, loops });
    return isRefusal(moved) ? moved : moved.mass;
  }
  const point = pointAt(setting, msbar);
  if (isRefusal(point)) return point;
  if (definition.kind === 'subtracted' && definition.evolution !== undefined && place.scale !== undefined) {
    const msr = msrValue(setting, definition, place.scale, point);
    return isRefusal(msr) ? msr : msr.value;
  }
  const terms = fixedTerms(setting, place, point);
  if (terms === undefined || isRefusal(terms)) return terms ?? msbar;
  return totalOf(setting.numbers, msbar, terms);
}

/** m(m) from the mass of a definition. */
export function msbarFrom(setting: Setting, place: MassPlace, mass: number): number | Refusal {
  if (place.definition === 'msbar') return mass;
  return solveMass((m) => massFrom(setting, place, m), mass);
}

/** Refusal for a cutoff that does not fit; looked at once the mass is known. */
export function checkPlaceAt(setting: Setting, place: MassPlace, msbar: number, atMass: number): Refusal | undefined {
  if (place.scale === undefined) return undefined;
  return checkCutoff(place, msbar, alphaAt(setting.source, atMass, msbar, place.scale));
}

/** The conversion; see MassRequest. Plain data in, plain data out; a refusal where there is no answer. */
export function convertMass(request: MassRequest): MassConversion | Refusal {
  const setting = settingOf(request);
  if (isRefusal(setting)) return setting;
  const { from, to, mass } = request;
  const msbar = msbarFrom(setting, from, mass);
  if (isRefusal(msbar)) return msbar;
  const point = pointAt(setting, msbar);
  if (isRefusal(point)) return point;
  const bad = checkPlaceAt(setting, from, msbar, point.atMass) ?? checkPlaceAt(setting, to, msbar, point.atMass);
  if (bad !== undefined) return bad;
  const same = from.definition === to.definition && from.scale === to.scale;
  const value = same ? mass : massFrom(setting, to, msbar);
  if (isRefusal(value)) return value;
  const { order } = setting;
  return { value, msbar, alpha: point.atMass, scale: point.mu, alphaAtScale: point.alpha, order };
}
