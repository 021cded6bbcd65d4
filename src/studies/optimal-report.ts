/** @module Where to stop, as the result states it: the least term seen and predicted, other scales, other models of what is missing. */
import { predictOptimum } from '../ambiguity/index.js';
import { R, toNumberExact } from '../numerics/index.js';
import type { Growth } from '../growth/index.js';
import type { Series } from '../series/index.js';
import { DIVERGENT } from './ambiguity-report.js';
import type { CompetingReport, OptimalTruncationReport } from './assessment.js';
import type { Expanded } from './expand.js';
import { ballText, indicative } from './figures.js';
import type { TermTable } from './terms.js';
import { truncationLines } from './truncation-lines.js';

export function optimalReport(
  series: Series,
  expanded: Expanded,
  growth: Growth,
  table: TermTable,
  digits: number,
): OptimalTruncationReport {
  const e = expanded.expansion;
  const lines = growth.verdict === 'terminating' ? {} : truncationLines(series, expanded, growth);
  if (!DIVERGENT.has(growth.verdict))
    return {
      status: 'not applicable',
      ...lines,
      statement: `the growth is ${growth.verdict}: more terms only help`,
      standing: growth.standing,
    };
  const least = table.least;
  const predicted = prediction(expanded, growth);
  const observed =
    least === undefined || !least.reached
      ? undefined
      : {
          power: least.index + e.power,
          ...(least.tiedWith === undefined ? {} : { tiedWith: least.tiedWith + e.power }),
          term: ballText(table.terms[least.index]!, Math.min(digits, 8)),
          sumThrough: ballText(table.sums[least.index + 1]!, digits),
          sumBefore: ballText(table.sums[least.index]!, digits),
        };
  const competing = growth.flags.some((f) => f.code === 'competing-singularities');
  return {
    ...(observed === undefined ? {} : { observed }),
    status: observed === undefined ? 'not reached' : 'reached',
    ...(predicted === undefined ? {} : { predicted }),
    ...(observed === undefined
      ? {}
      : { errorOfStopping: indicative(stopping(table, least!.index, lines.competing), 3) }),
    ...lines,
    statement:
      (observed === undefined
        ? table.terms.length < 2
          ? 'one term alone neither falls nor grows'
          : 'the terms still fall at the last known order: the series has not begun to diverge at this coupling'
        : `the term of order ${observed.power} is the smallest${lines.competing === undefined ? '; stopping there leaves an error of its size' : ''}`) +
      (lines.competing !== undefined
        ? `. ${capital(lines.competing.statement)}`
        : competing
          ? '; singularities compete, so the smallest term alone does not mark the best cut'
          : ''),
    standing: 'indicative',
  };
}

const capital = (text: string): string => text.slice(0, 1).toUpperCase() + text.slice(1);

/** The smallest term or, where two kinds of growth compete, the way to the far end of the bracket. */
function stopping(table: TermTable, least: number, competing: CompetingReport | undefined): number {
  const size = Math.abs(R.toNumber(table.terms[least]!));
  const { sums } = competing ?? {};
  if (sums === undefined) return size;
  const sum = R.toNumber(table.sums[least + 1]!);
  return Math.max(size, Math.abs(Number(sums.low) - sum), Math.abs(Number(sums.high) - sum));
}

/** From the stated leading singularity, or from the one that the terms show. */
function prediction(expanded: Expanded, growth: Growth): OptimalTruncationReport['predicted'] {
  const e = expanded.expansion;
  const s = e.stated[0];
  const x = toNumberExact(e.x);
  const found = growth.nearest;
  const source =
    s?.exponent !== undefined
      ? { t: toNumberExact(s.t), b: toNumberExact(s.exponent) - 1, origin: s.origin }
      : found?.exponent !== undefined && found.kind !== 'complex pair'
        ? { t: found.t.value, b: found.exponent.value - 1, origin: 'the position and exponent found in the terms' }
        : undefined;
  if (source === undefined || !(x > 0)) return undefined;
  const p = predictOptimum(source.t, source.b, x);
  if (!(p.leastTermAt > 0)) return undefined;
  return {
    leastTermAt: indicative(p.leastTermAt, 3),
    ...(source.t > 0 ? { principalValueAt: indicative(p.principalValueAt, 3) } : {}),
    x: indicative(p.omega, 5),
    b: indicative(p.b, 5),
    origin: source.origin,
  };
}
