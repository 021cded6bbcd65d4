/** @module Which row is quoted, what the prescriptions' spread adds, and the budget where the coupling is wanted. */
import { CONTESTED } from '../contour/index.js';
import { CONTOUR_NAMES } from '../prescriptions/index.js';
import { isRefusal } from '../qcd/index.js';
import { indicative, verdict } from '../studies/index.js';
import { component, mapped, spreadOf, totals, withOverlaps } from './budget.js';
import type { Component } from './budget.js';
import { componentEntry, errorText, printed, totalsEntry } from './entries.js';
import { evolvedBudget } from './evolved.js';
import type { Evolver } from './evolved.js';
import type { Prescription } from '../prescriptions/index.js';
import type { Caution } from '../studies/index.js';
import type { Problem } from './problem.js';
import type { ExtractRow, ExtractSummary } from './result.js';
import { evaluated } from './rows.js';
import type { RowNumbers } from './rows.js';
import type { Solved } from './solve.js';

/** What speaks for or against quoting a row. */
export interface Quotable {
  readonly prescription: Prescription;
  readonly solved: Solved;
  readonly cautions: readonly Caution[];
}

/** How the solution was found, and which others there are, does not speak against it. */
const HARMLESS = ['several roots', 'followed'];
const clean = (r: Quotable): boolean => r.cautions.every((c) => HARMLESS.includes(c.code));

/** The row that is quoted, and the rule that chose it: the verdict's ladder among the rows without a caution. */
export function quotedRow<T extends Quotable>(
  rows: readonly T[],
  central: string | undefined,
): { row: T; rule: string } | undefined {
  const named = rows.find((r) => r.prescription.name === central);
  if (named !== undefined) return { row: named, rule: 'as chosen' };
  const [first] = rows;
  if (first === undefined) return undefined;
  const stage = first.solved.theory.prediction.stages.central;
  const candidates = rows.some(clean) ? rows.filter(clean) : rows;
  const values = candidates.map((r) => evaluated(r.solved));
  const report = verdict(values, stage.growth, stage.expanded.expansion.coefficients.length, undefined);
  const name = report.prescription?.split(':')[0];
  const row = candidates.find((r) => r.prescription.name === name);
  const among = candidates.length === rows.length ? '' : ', among the rows whose sum bears no caution';
  return row === undefined
    ? { row: candidates[0] ?? first, rule: `the first that stands${among}` }
    : { row, rule: `${report.rule}${among}` };
}

/** Sums with the coupling running along the circle: another expansion, not another estimate of the same one. */
const improved = (r: Quotable): boolean =>
  r.prescription.name === CONTOUR_NAMES.improved.name ||
  (r.prescription.name === CONTOUR_NAMES.subtracted.name && r.solved.whole.sum.variant.startsWith('contour improved'));

/**
 * The rows that count for the spread: without a caution, or all when fewer than two are. Fixed-order and contour-improved
 * sums are never put into one spread: their difference is told instead.
 */
export function acceptedRows<T extends Quotable>(rows: readonly T[], quoted: T): readonly T[] {
  const alike = rows.filter((r) => improved(r) === improved(quoted));
  const accepted = alike.filter(clean);
  return accepted.length >= 2 ? accepted : alike;
}

/** What the expansions on a circle make of the unknown, side by side; nothing elsewhere. */
export function contested(rows: readonly Quotable[], values: readonly number[]): Caution[] {
  const at = rows.findIndex(improved);
  const fixed = rows.findIndex((r) => r.prescription.name === 'fixed-order');
  const [a, b] = [values[fixed], values[at]];
  if (a === undefined || b === undefined) return [];
  const text = `fixed order gives ${indicative(a)}, contour improvement ${indicative(b)}, apart by ${indicative(b - a, 2)}: ${CONTESTED}`;
  return [{ code: 'contested', text }];
}

/** Half the spread of the accepted values. */
export function prescriptionComponent(names: readonly string[], values: readonly number[]): Component {
  const spread = spreadOf(values);
  if (spread === undefined) return component('prescription', [], { missing: 'one prescription only: no spread' });
  return component('prescription', [], {
    sides: { plus: spread.half, minus: spread.half },
    note: `half-spread of ${names.join(', ')}`,
  });
}

/** The spread as a result states it. */
export function spreadEntry(names: readonly string[], values: readonly number[]): Pick<ExtractSummary, 'spread'> {
  const spread = spreadOf(values);
  if (spread === undefined) return {};
  return {
    spread: {
      accepted: names,
      low: indicative(spread.low, 10),
      high: indicative(spread.high, 10),
      half: errorText(spread.half),
      rectangular: errorText(spread.rectangular),
    },
  };
}

/** The value and its components where the coupling is wanted. */
export function evolvedEntry(
  problem: Problem,
  evolve: Evolver | undefined,
  alpha: number,
  components: readonly Component[],
): Pick<ExtractSummary, 'evolved'> {
  if (evolve === undefined) return {};
  const moved = evolvedBudget(problem, evolve, alpha, components);
  if (isRefusal(moved)) return {};
  const value = indicative(moved.value, EVOLVED_DIGITS);
  return {
    evolved: {
      value,
      printed: printed(value, moved.components),
      components: moved.components.map(componentEntry),
      totals: totalsEntry(totals(moved.components)),
      scale: indicative(evolve.to.scale, 6),
      flavours: evolve.to.flavours,
      path: moved.path,
    },
  };
}

/** Digits of a coupling that was evolved in doubles. */
const EVOLVED_DIGITS = 12;

/** The quoted value with its budget. */
export function summaryOf(
  rows: readonly RowNumbers[],
  problem: Problem,
  unit: string | undefined,
  evolve: Evolver | undefined,
): ExtractSummary | undefined {
  const choice = quotedRow(rows, problem.central);
  if (choice === undefined) return undefined;
  const { solved, components: own, found } = choice.row;
  const accepted = acceptedRows(rows, choice.row);
  const names = accepted.map((r) => r.prescription.name);
  const values = accepted.map((r) => r.solved.number);
  const components = withOverlaps([...own, prescriptionComponent(names, values)], found.leastTermReached);
  return {
    prescription: choice.row.prescription.name,
    rule: choice.rule,
    value: solved.text,
    printed: printed(solved.text, components, unit),
    components: components.map(componentEntry),
    totals: totalsEntry(totals(components)),
    ...spreadEntry(names, values),
    ...evolvedEntry(problem, evolve, solved.number, components),
  };
}

/** A row with its value where it is wanted as well. */
export function withEvolved(entry: ExtractRow, row: RowNumbers, evolve: Evolver | undefined): ExtractRow {
  const value = evolve?.at(row.solved.number);
  if (evolve === undefined || value === undefined) return entry;
  const moved = totals(mapped(row.components, row.solved.number, (p) => evolve.at(p)));
  return { ...entry, evolved: { value: indicative(value, EVOLVED_DIGITS), totals: totalsEntry(moved) } };
}
