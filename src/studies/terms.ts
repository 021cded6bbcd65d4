/** @module The table of terms: order, coefficient, term, partial sum, ratio, least term. */
import { isZeroExact, R } from '../numerics/index.js';
import type { Ball } from '../numerics/index.js';
import type { Coefficient, Series } from '../series/index.js';
import { leastTerm, partialSums, terms } from '../prescriptions/index.js';
import type { TermRow } from './assessment.js';
import type { Expanded } from './expand.js';
import { ballText, exactText, indicative } from './figures.js';

export interface TermTable {
  readonly rows: readonly TermRow[];
  readonly terms: readonly Ball[];
  /** sums[k]: after k terms. */
  readonly sums: readonly Ball[];
  /** Index of the least term; `reached` is false when the terms still fall at the last order. */
  readonly least?: { readonly index: number; readonly tiedWith?: number; readonly reached: boolean };
}

const FIRST_BITS = 256;

/** A number with an error as the file has it; an expression is no number to show. */
const writtenOf = ({ text }: Coefficient): Pick<TermRow, 'written'> =>
  /^[-+\d.e() ±]+$/i.test(text) ? { written: text.replace(/\s*(\+\/?-|±)\s*/, ' ± ') } : {};

/** Rows for the non-zero part of the series (leading zeros are listed with zero terms). */
export function termTable(series: Series, expanded: Expanded, digits: number): TermTable {
  const e = expanded.expansion;
  const prec = Math.max(FIRST_BITS, digits * 4 + 64);
  const t = terms(e, prec);
  const sums = partialSums(e, prec);
  const found = leastTerm(t);
  const lastNonZero = t.reduce((m, b, n) => (R.isExactZero(b) ? m : n), -1);
  const least =
    found === undefined
      ? undefined
      : { ...found, reached: found.index !== lastNonZero || found.tiedWith !== undefined };
  const rows: TermRow[] = [];
  for (let k = 0; k < expanded.leadingZeros; k++)
    rows.push({ order: series.firstPower + k, coefficient: '0', term: '0', partialSum: ballText(sums[0]!, digits) });
  t.forEach((term, n) => {
    const c = series.coefficients[n + expanded.leadingZeros]!;
    const before = n > 0 ? t[n - 1]! : undefined;
    const ratio = before === undefined || R.containsZero(before) ? undefined : R.div(term, before, 96);
    rows.push({
      order: n + e.power,
      coefficient: exactText(c.value, digits),
      ...(expanded.errors[n]! > 0 ? { coefficientError: indicative(expanded.errors[n]!, 4), ...writtenOf(c) } : {}),
      ...(c.status === 'estimated' ? { estimated: true } : {}),
      term: isZeroExact(c.value) ? '0' : ballText(term, digits),
      partialSum: ballText(sums[n + 1]!, digits),
      ...(ratio === undefined ? {} : { ratio: indicative(R.toNumber(ratio), 5) }),
      ...(least?.index === n && least.reached ? { least: true } : {}),
    });
  });
  return { rows, terms: t, sums, ...(least === undefined ? {} : { least }) };
}
