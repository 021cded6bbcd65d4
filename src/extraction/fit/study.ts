/** @module The fit study: every chosen prescription, the quoted one with pulls, profiles and correlations. */
import { isRefusal } from '../../qcd/index.js';
import type { Refusal } from '../../qcd/index.js';
import type { Series } from '../../series/index.js';
import { VERSION } from '../../studies/index.js';
import type { Assessment, Caution, Evaluated } from '../../studies/index.js';
import { totals, withOverlaps } from '../budget.js';
import type { Component } from '../budget.js';
import { componentEntry, numberText, printed, totalsEntry } from '../entries.js';
import { evolver } from '../evolved.js';
import type { Evolver } from '../evolved.js';
import { datumSummary, problemCautions } from '../extract.js';
import { MZ } from '../place.js';
import type { Problem } from '../problem.js';
import type { UnknownSummary } from '../result.js';
import { cautionsOf, evaluated } from '../rows.js';
import { chosen } from '../setting.js';
import { acceptedRows, contested, evolvedEntry, prescriptionComponent, quotedRow, spreadEntry } from '../summary.js';
import type { Quotable } from '../summary.js';
import { chiSquareTail } from './chi-square.js';
import { componentCorrelation, fitComponents } from './fit-budget.js';
import type { FitResult, FitRow, FitSummary } from './fit-result.js';
import { firstFit, fitSetting, wholeFit } from './fit.js';
import type { FitSetting, FittedRow } from './fit.js';
import { correlationOf } from './matrix.js';
import type { Matrix } from './matrix.js';
import { nearRoot } from '../root.js';
import { profileOf, pullsOf } from './profile.js';

/** Digits of a fitted parameter: the minimum settles in doubles. */
const VALUE_DIGITS = 10;

interface Row extends Quotable {
  readonly fitted: FittedRow;
  /** For each parameter. */
  readonly components: readonly (readonly Component[])[];
  readonly leastTermReached: boolean;
}

function parametersOf({ problem, settings }: FitSetting): readonly UnknownSummary[] {
  const atMZ = { scale: String(MZ.scale), flavours: MZ.flavours };
  if (problem.for === 'mass') {
    const mass: UnknownSummary = { name: 'mass', symbol: 'm(m)', unit: 'GeV' };
    return problem.freeAlphaS === true ? [mass, { name: 'alpha_s', symbol: 'alpha_s', ...atMZ }] : [mass];
  }
  const symbol = settings[0]?.stages.series.coupling.name ?? 'alpha_s';
  return [{ name: 'alpha_s', symbol, ...(problem.to === undefined ? {} : atMZ) }];
}

function rowOf(fitted: FittedRow): Row {
  const leastTermReached = fitted.found.some((f) => f.leastTermReached);
  const components = fitted.minimum.parameters.map((_, k) =>
    withOverlaps(fitComponents(fitted, fitted.effects, fitted.silent, k), leastTermReached),
  );
  const cautions = fitted.solved
    .flatMap((s) => cautionsOf(s))
    .filter((c, i, all) => all.findIndex((d) => d.code === c.code) === i);
  // The first datum stands for the series where one series is looked at.
  const [solved] = fitted.solved;
  if (solved === undefined) throw new RangeError('a fit without data');
  return { prescription: fitted.prescription, solved, cautions, fitted, components, leastTermReached };
}

const matrixText = (m: Matrix): readonly (readonly string[])[] => m.map((row) => row.map((x) => numberText(x, 6)));

function rowEntry({ prescription, fitted, components, cautions }: Row, dof: number): FitRow {
  const { minimum, solved } = fitted;
  return {
    prescription: prescription.name,
    variants: solved.map((s) => s.whole.sum.variant),
    values: minimum.parameters.map((p, k) => ({
      value: numberText(p, VALUE_DIGITS),
      components: (components[k] ?? []).map(componentEntry),
      totals: totalsEntry(totals(components[k] ?? [])),
    })),
    chiSquare: numberText(minimum.chiSquare),
    degreesOfFreedom: dof,
    ...(dof > 0 ? { pValue: numberText(chiSquareTail(minimum.chiSquare, dof)) } : {}),
    cautions,
  };
}

/** The one parameter from each datum alone. */
function aloneOf({ model, minimum, data }: FittedRow): readonly (string | undefined)[] {
  const [start = NaN] = minimum.parameters;
  if (minimum.parameters.length > 1) return [];
  return data.map((x, i) => {
    const at = (p: number): number | undefined => {
      const value = model.one(i, [p]);
      return value === undefined ? undefined : value - x;
    };
    const found = nearRoot(at, start, minimum.jacobian[i]?.[0] ?? NaN, 1e-12);
    return found === undefined ? undefined : numberText(found, VALUE_DIGITS);
  });
}

function summaryOf(
  setting: FitSetting,
  rows: readonly Row[],
  parameters: readonly UnknownSummary[],
  evolve: Evolver | undefined,
): FitSummary | undefined {
  const choice = quotedRow(rows, setting.problem.central);
  if (choice === undefined) return undefined;
  const { fitted, components, leastTermReached } = choice.row;
  const accepted = acceptedRows(rows, choice.row);
  const names = accepted.map((r) => r.prescription.name);
  const { minimum, effects, data } = fitted;
  const values = minimum.parameters.map((p, k) => {
    const spread = accepted.map((r) => r.fitted.minimum.parameters[k] ?? NaN);
    const all = withOverlaps([...(components[k] ?? []), prescriptionComponent(names, spread)], leastTermReached);
    const value = numberText(p, VALUE_DIGITS);
    return {
      value,
      printed: printed(value, all, parameters[k]?.unit),
      components: all.map(componentEntry),
      totals: totalsEntry(totals(all)),
      ...spreadEntry(names, spread),
      ...(parameters[k]?.name === 'alpha_s' ? evolvedEntry(setting.problem, evolve, p, all) : {}),
    };
  });
  const moving = ['inputs', 'coefficients', 'power corrections', 'truncation', 'scale', 'ambiguity'] as const;
  return {
    prescription: choice.row.prescription.name,
    rule: choice.rule,
    values,
    pulls: pullsOf(fitted, aloneOf(fitted)),
    covariance: matrixText(minimum.covariance),
    correlation: matrixText(correlationOf(minimum.covariance)),
    profiles: parameters.map((p, k) => profileOf(fitted, k, p.name)),
    correlations: [
      { component: 'measurement', matrix: matrixText(correlationOf(setting.measured)) },
      ...moving
        .filter((name) => effects.some((e) => e.component === name))
        .map((name) => ({ component: name, matrix: matrixText(componentCorrelation(effects, name, data.length)) })),
    ],
  };
}

/** From M_Z to where α_s is wanted, when that is elsewhere. */
function evolverOf({ problem, to }: { problem: Problem; to: Problem['to'] }): Evolver | undefined {
  return to === undefined || (to.scale === MZ.scale && to.flavours === MZ.flavours)
    ? undefined
    : evolver(problem, MZ, to);
}

/** The fit; a refusal when the question cannot be put. Prescriptions that refuse stay in the result. */
export function fit(problem: Problem, series: readonly Series[], request: Assessment['request']): FitResult | Refusal {
  const setting = fitSetting(problem, series);
  if (isRefusal(setting)) return setting;
  const data = setting.settings.map(datumSummary);
  const firsts = chosen(problem, series).map((p) => [p, firstFit(setting, p)] as const);
  const lenders = setting.settings.map((_, i): readonly Evaluated[] =>
    firsts.flatMap(([, f]) => {
      const one = isRefusal(f) ? undefined : f.solved[i];
      return one?.whole.sum.imaginary === undefined ? [] : [evaluated(one)];
    }),
  );
  const dof = problem.data.length - setting.start.length;
  const rows: Row[] = [];
  const entries = firsts.map(([prescription, first]): FitRow => {
    const whole = isRefusal(first) ? first : wholeFit(setting, first, lenders);
    if (isRefusal(whole)) return { prescription: prescription.name, cautions: [], refused: whole };
    const row = rowOf(whole);
    rows.push(row);
    return rowEntry(row, dof);
  });
  const parameters = parametersOf(setting);
  const evolve = problem.for === 'alpha_s' ? evolverOf({ problem, to: problem.to }) : undefined;
  const summary = summaryOf(setting, rows, parameters, evolve);
  const cautions: Caution[] = [
    ...setting.settings.flatMap((s) => problemCautions(s)),
    ...contested(
      rows,
      rows.map((r) => r.fitted.minimum.parameters[0] ?? NaN),
    ),
  ];
  return {
    leastterm: VERSION,
    request,
    kind: 'fit',
    parameters,
    data,
    weights: problem.theoryInWeights === true ? 'measurements, coefficients and truncation' : 'measurements',
    rows: entries,
    ...(summary === undefined ? {} : { summary }),
    cautions: cautions.filter((c, i) => cautions.findIndex((d) => d.text === c.text) === i),
  };
}
