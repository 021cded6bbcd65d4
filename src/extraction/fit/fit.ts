/**
 * @module A χ² fit of one or two parameters to several measurements, by every chosen prescription, with its budget.
 *
 * Weights    the covariance of the measurements; with the theory in the weights, the coefficient and truncation errors of the
 *            predictions at the starting point as well.
 */
import { isRefusal, refuse } from '../../qcd/index.js';
import type { Refusal } from '../../qcd/index.js';
import { PRESCRIPTIONS } from '../../prescriptions/index.js';
import type { Prescription } from '../../prescriptions/index.js';
import type { Series } from '../../series/index.js';
import type { Evaluated } from '../../studies/index.js';
import { ambiguityAt } from '../ambiguity-of.js';
import type { AmbiguityFound } from '../ambiguity-of.js';
import { truncationBand } from '../components.js';
import { numberOf } from '../place.js';
import type { Problem } from '../problem.js';
import type { Setting } from '../rows.js';
import { solveRow } from '../rows.js';
import { settingOf } from '../setting.js';
import type { Solved } from '../solve.js';
import { componentCovariance, effectsOf } from './fit-budget.js';
import type { Effect, Fitted } from './fit-budget.js';
import { fitCauses } from './fit-causes.js';
import type { FitCause, OpenBands } from './fit-causes.js';
import { cholesky } from './matrix.js';
import type { Matrix } from './matrix.js';
import { minimise } from './minimise.js';
import type { Minimum } from './minimise.js';
import { fitModel } from './model.js';
import type { FitModel } from './model.js';

/** α_s(M_Z) that is searched for the start of a fit. */
const AT_MZ = { from: 0.05, to: 0.25 } as const;

export interface FitSetting {
  readonly problem: Problem;
  readonly settings: readonly Setting[];
  readonly data: readonly number[];
  readonly measured: Matrix;
  readonly start: readonly number[];
}

/** Covariance from errors and correlation; a refusal when it is none. */
export function measuredCovariance(problem: Problem): Matrix | Refusal {
  const sigma = problem.data.map(({ measured }) => ((measured?.plus ?? 0) + (measured?.minus ?? 0)) / 2);
  const bare = problem.data.findIndex((_, i) => !((sigma[i] ?? 0) > 0));
  if (bare >= 0) {
    return refuse(
      `the measurement ${problem.data[bare]?.measured?.text ?? ''} of ${problem.data[bare]?.series ?? ''} has no error: it would have infinite weight`,
      "give its error: --measured '0.2042(50)'",
    );
  }
  const rho = (i: number, j: number): number => (i === j ? 1 : (problem.correlation?.[i]?.[j] ?? 0));
  if (cholesky(sigma.map((_, i) => sigma.map((__, j) => rho(i, j)))) === undefined) {
    return refuse(
      'the correlation matrix of the measurements is not positive definite: a combination of them would have no error, or a negative one',
      'check its entries: correlations that can occur together, below 1 in size',
    );
  }
  return sigma.map((a, i) => sigma.map((b, j) => rho(i, j) * a * b));
}

/** All data placed on the common parameters, and where the search begins. */
export function fitSetting(problem: Problem, series: readonly Series[]): FitSetting | Refusal {
  const measured = measuredCovariance(problem);
  if (isRefusal(measured)) return measured;
  const common = problem.for === 'alpha_s' && problem.to !== undefined;
  const settings: Setting[] = [];
  for (const [i, datum] of problem.data.entries()) {
    const one = series[i];
    if (one === undefined) return refuse('a measurement has no series', 'name as many series as measurements');
    const asked = common && problem.search === undefined ? { ...problem, search: AT_MZ } : problem;
    const setting = settingOf(asked, one, datum, common);
    if (isRefusal(setting)) return setting;
    settings.push(setting);
  }
  const start = startOf(problem, settings);
  if (isRefusal(start)) return start;
  const free = start.length;
  if (free > problem.data.length) {
    return refuse(`${free} parameters from ${problem.data.length} measurement: too few`, 'give more measurements');
  }
  const data = problem.data.map((d) => (d.measured === undefined ? NaN : numberOf(d.measured)));
  return { problem, settings, data, measured, start };
}

/** The parameters by fixed order from the first datum that fixes them. */
function startOf(problem: Problem, settings: readonly Setting[]): readonly number[] | Refusal {
  const fixed = PRESCRIPTIONS.find((p) => p.name === 'fixed-order');
  let reason: Refusal = refuse('there is no measurement to begin with', 'give one');
  for (const setting of settings) {
    if (problem.for === 'mass' && setting.datum.massPower === 0) continue;
    const found = fixed === undefined ? reason : solveRow(setting, fixed);
    if (isRefusal(found)) {
      reason = found;
      continue;
    }
    const alpha = problem.alphaS === undefined ? [] : [numberOf(problem.alphaS)];
    return problem.freeAlphaS === true ? [found.number, ...alpha] : [found.number];
  }
  return reason;
}

/** A fit by the measurements' weights alone, and each series as it stands there. */
export interface FirstFit {
  readonly prescription: Prescription;
  readonly model: FitModel;
  readonly minimum: Minimum;
  readonly solved: readonly Solved[];
}

export interface FittedRow extends Fitted, FirstFit {
  readonly effects: readonly Effect[];
  readonly silent: readonly string[];
  readonly found: readonly AmbiguityFound[];
}

/** A solution-like view of each datum at the minimum, for what looks at one series at a time. */
function views(model: FitModel, p: readonly number[]): Solved[] | Refusal {
  const wholes = model.wholes(p);
  if (isRefusal(wholes)) return wholes;
  const unused = refuse('a fit has no root of its own', 'ask the fit');
  return wholes.flatMap((whole, i): Solved[] => {
    const theory = model.theories[i];
    if (theory === undefined) return [];
    const bare = { number: p[0] ?? NaN, text: '', digits: 'converged', slope: 1, otherRoots: [], notes: [] } as const;
    return [{ ...bare, theory, whole, shifted: () => unused }];
  });
}

const unsettled = refuse('the fit does not settle', 'give data that fix the parameters, or another prescription');

/** The minimum by one prescription, with the members that its families name there. */
export function firstFit(
  { problem, settings, data, measured, start }: FitSetting,
  prescription: Prescription,
): FirstFit | Refusal {
  const factor = cholesky(measured);
  const first = fitModel(problem, settings, prescription, start);
  if (isRefusal(first)) return first;
  const rough = factor && minimise(first.vector(), data, factor, start);
  if (factor === undefined || rough === undefined) return unsettled;
  const again = fitModel(problem, settings, prescription, rough.parameters);
  if (isRefusal(again)) return again;
  const same = again.theories.every((t, i) => t.prediction.variant === first.theories[i]?.prediction.variant);
  const minimum = same ? rough : minimise(again.vector(), data, factor, rough.parameters);
  if (minimum === undefined) return unsettled;
  const model = again;
  const solved = views(model, minimum.parameters);
  return isRefusal(solved) ? solved : { prescription, model, minimum, solved };
}

/** The fit with its weights and all its effects; `others` lend lateral sums, datum by datum. */
export function wholeFit(
  setting: FitSetting,
  first: FirstFit,
  others: readonly (readonly Evaluated[])[],
): FittedRow | Refusal {
  const { problem, data, measured } = setting;
  const { model, solved } = first;
  const found = solved.map((s, i) => ambiguityAt(s, others[i] ?? [], problem.ambiguityBy));
  const bands: OpenBands = {
    truncation: solved.map((s) => truncationBand(s, problem.truncationBy)),
    ambiguity: found.map(({ ambiguity: a }) => (isRefusal(a) ? a : { low: -a.value, high: a.value })),
  };
  const causes = fitCauses(model, bands);
  const bare = cholesky(measured);
  if (bare === undefined) return unsettled;
  const simple: Fitted = { model, minimum: first.minimum, data, factor: bare, measured };
  const factor = problem.theoryInWeights === true ? theoryWeights(simple, causes) : bare;
  if (factor === undefined) return unsettled;
  const minimum = factor === bare ? first.minimum : minimise(model.vector(), data, factor, first.minimum.parameters);
  if (minimum === undefined) return unsettled;
  const fitted: Fitted = { ...simple, minimum, factor };
  return { ...first, ...fitted, ...effectsOf(fitted, causes), found };
}

/** L of the measurements' covariance with that of coefficients and truncation added. */
function theoryWeights(simple: Fitted, causes: readonly FitCause[]): Matrix | undefined {
  const own = causes.filter((c) => c.component === 'coefficients' || c.component === 'truncation');
  const { effects } = effectsOf(simple, own);
  const n = simple.measured.length;
  const parts = (['coefficients', 'truncation'] as const).map((name) => componentCovariance(effects, name, n));
  return cholesky(
    simple.measured.map((row, i) => row.map((v, j) => parts.reduce((sum, c) => sum + (c[i]?.[j] ?? 0), v))),
  );
}
