/**
 * @module The strength N_m of the pole mass's leading renormalon for n_l flavours, in α_s, with its error.
 * Method  the sum rule with four coefficients, as qcd/normalisation has it; kept for each n_l.
 */
import { isRefusal, leadingNormalisation, type Normalisation } from '../qcd/index.js';
import { POLE_SERIES } from './pole-series.js';

const kept = new Map<number, Normalisation>();

/** All estimates of N for n_l flavours. */
export function poleStrength(light: number): Normalisation {
  let found = kept.get(light);
  if (found === undefined) {
    const made = leadingNormalisation({
      coefficients: POLE_SERIES.coefficients(light),
      firstPower: 1,
      divisor: '4*pi',
      flavours: light,
      dimension: 1,
    });
    if (isRefusal(made)) throw new RangeError(made.reason);
    found = made;
    kept.set(light, found);
  }
  return found;
}

/** N of the series in α_s itself. */
export const defaultStrength = (light: number): number => poleStrength(light).inAlpha.value;
