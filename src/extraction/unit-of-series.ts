/** @module A measurement in GeV of a quantity whose series is in units of its hard scale. */
import { hardScale } from './place.js';
import type { Series } from '../series/index.js';
import type { Datum, Quantity } from './problem.js';

/** "Q", "Q^2": R in units of a power of the hard scale. */
const POWER_OF_Q = /^Q(?:\^([1-9]\d*))?$/;

/** Digits of a measured number after the division: more than any measurement has. */
const DIGITS = 15;

/**
 * The datum with its measurement divided by Q^p, where the series is in units of Q^p and the measurement has that dimension (GeV^p);
 * any other datum as it is, so that a clash of units is still refused later. Q is taken as exact.
 */
export function inUnitOfSeries(datum: Datum, series: Series): Datum {
  const power = POWER_OF_Q.exec(series.unit ?? '');
  const Q = hardScale(series, datum);
  const { measured } = datum;
  if (power === null || Q === undefined || measured?.dimension !== Number(power[1] ?? '1')) return datum;
  const { dimension, ...rest } = measured;
  const size = Q ** dimension;
  const unit = dimension === 1 ? `(${Q} GeV)` : `(${Q} GeV)^${dimension}`;
  const pure: Quantity = {
    ...rest,
    text: `${measured.text}/${unit}`,
    value: String(Number((Number(measured.value) / size).toPrecision(DIGITS))),
    plus: measured.plus / size,
    minus: measured.minus / size,
  };
  return { ...datum, measured: pure };
}
