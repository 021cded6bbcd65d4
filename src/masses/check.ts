/** @module Which conversions have an answer; what is said about the others. */
import { refuse, type Refusal } from '../qcd/index.js';
import type { MassPlace } from './definition.js';
import { definitionOf } from './definitions.js';
import type { MassRequest } from './request.js';

/** n_l of c, b and t; fewer when lighter massive quarks are decoupled too. */
export const MOST_LIGHT = 5;
/**
 * Heuristic limit: with a larger coupling at its cutoff a subtraction has no perturbative meaning, its terms grow from the
 * first on.
 */
export const LARGEST_CUTOFF_COUPLING = 1;

function checkPlace(place: MassPlace): Refusal | undefined {
  const { title, parameter } = definitionOf(place.definition);
  if (parameter === undefined) return undefined;
  if (place.scale === undefined) {
    return refuse(
      `${title} needs ${parameter.symbol}, the ${parameter.meaning}`,
      `give ${parameter.symbol} in GeV, such as 2 GeV`,
    );
  }
  return place.scale > 0 && place.scale < Infinity
    ? undefined
    : refuse(`${parameter.symbol} = ${place.scale} GeV is not a positive scale`, 'give a positive number of GeV');
}

/** Highest order that both definitions have. */
export const commonOrders = (from: MassPlace, to: MassPlace): number =>
  Math.min(definitionOf(from.definition).orders, definitionOf(to.definition).orders);

/** Refusal for a request that cannot be carried out whatever the coupling. */
export function checkRequest(request: MassRequest): Refusal | undefined {
  const { mass, light, flavours = light + 1, from, to, order, loops = 5, strength } = request;
  if (!(mass > 0 && mass < Infinity)) {
    return refuse(`the mass ${mass} GeV is not positive`, 'give a mass above 0, in GeV');
  }
  if (!Number.isInteger(light) || light < 0 || light > MOST_LIGHT) {
    return refuse(
      `n_l = ${light} is not one of 0 to ${MOST_LIGHT}`,
      'give the number of massless flavours beside the quark',
    );
  }
  if (!Number.isInteger(flavours) || flavours <= light || flavours > MOST_LIGHT + 1) {
    return refuse(
      `n_l = ${light} light flavours do not fit a quark that is one of ${flavours} flavours`,
      `give at most ${flavours - 1} light flavours`,
    );
  }
  if (!Number.isInteger(loops) || loops < 1 || loops > 5) {
    return refuse(`the running is known at 1 to 5 loops, not ${loops}`, 'ask for 1, 2, 3, 4 or 5 loops');
  }
  const most = commonOrders(from, to);
  if (order !== undefined && (!Number.isInteger(order) || order < 0 || order > most)) {
    return refuse(
      `between these definitions ${most} orders of α_s are held, not ${order}`,
      `ask for at most ${most} orders`,
    );
  }
  if (strength !== undefined && !Number.isFinite(strength)) {
    return refuse('the strength of the renormalon is not a number', 'give a number such as 0.506');
  }
  return checkPlace(from) ?? checkPlace(to);
}

/** Refusal for a cutoff that does not fit the mass and the coupling found. */
export function checkCutoff(place: MassPlace, msbar: number, alphaThere: number | Refusal): Refusal | undefined {
  const { title, parameter, kind } = definitionOf(place.definition);
  if (parameter === undefined || kind === 'msbar' || place.scale === undefined) return undefined;
  const { symbol } = parameter;
  if (place.scale > msbar * (1 + 1e-12)) {
    return refuse(
      `${symbol} = ${place.scale} GeV lies above the mass, m(m) = ${msbar.toPrecision(5)} GeV: ${title} has no meaning there`,
      `give ${symbol} below the mass`,
    );
  }
  if (typeof alphaThere !== 'number') {
    return refuse(
      `${symbol} = ${place.scale} GeV lies where α_s does not exist: ${alphaThere.reason}`,
      `give a larger ${symbol}, such as 1 GeV`,
    );
  }
  return alphaThere <= LARGEST_CUTOFF_COUPLING
    ? undefined
    : refuse(
        `at ${symbol} = ${place.scale} GeV α_s is ${alphaThere.toPrecision(3)}: perturbation theory does not hold there`,
        `give a larger ${symbol}, such as 1 GeV`,
      );
}
