/** @module Does a series reproduce the published values that its file records? */
import { R, Rational, subExact, exact } from '../numerics/index.js';
import type { Series } from './series.js';

/** One unit of the last digit of a decimal as written. */
function lastUnit(text: string): Rational {
  const [mantissa = '', exponent = '0'] = text.toLowerCase().split('e');
  const decimals = mantissa.includes('.') ? mantissa.length - mantissa.indexOf('.') - 1 : 0;
  return Rational.ofDecimal(1n, Number(exponent) - decimals);
}

/**
 * Sentences on the coefficients that differ from a recorded value by more than one unit of its last digit; empty when all
 * agree. Values recorded for another number of flavours than the series' own are passed over.
 */
export function checkSeries(series: Series): readonly string[] {
  const wrong: string[] = [];
  for (const check of series.checks ?? []) {
    if (check.flavours !== undefined && check.flavours !== series.flavours) continue;
    check.values.forEach((text, i) => {
      const c = series.coefficients[i]?.value;
      const value = Rational.parse(text);
      if (c === undefined || value === undefined) {
        wrong.push(`${series.id}: coefficients[${i}] is missing, recorded ${text}`);
        return;
      }
      const miss = R.abs(subExact(c, exact(value)).ball(256));
      if (R.compare(miss, R.fromRational(lastUnit(text), 256), 256) > 0) {
        wrong.push(`${series.id}: coefficients[${i}] is ${R.toNumber(c.ball(80))}, recorded ${text}`);
      }
    });
  }
  return wrong;
}
