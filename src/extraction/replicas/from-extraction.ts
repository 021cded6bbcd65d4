/** @module The central solutions of an extraction as the source of its Monte Carlo. */
import { toNumberExact } from '../../numerics/index.js';
import type { Prescription } from '../../prescriptions/index.js';
import { isRefusal } from '../../qcd/index.js';
import type { Refusal, ScalePoint } from '../../qcd/index.js';
import type { Series } from '../../series/index.js';
import type { Evaluated } from '../../studies/index.js';
import { checkEvolution } from '../check.js';
import { firstFit, fitSetting, wholeFit } from '../fit/fit.js';
import type { FitSetting } from '../fit/fit.js';
import { cholesky, forward } from '../fit/matrix.js';
import type { Matrix } from '../fit/matrix.js';
import { hardScale, MZ, powerOfGeV } from '../place.js';
import type { Problem } from '../problem.js';
import { evaluated } from '../rows.js';
import type { Setting } from '../rows.js';
import { chosen, settingOf, solveAll } from '../setting.js';
import type { Solved } from '../solve.js';
import type { ReplicaSource } from './build.js';
import type { CentralSource, DatumSource } from './compile.js';
import type { ParameterModel } from './problem.js';

type Parameter = Pick<ParameterModel, 'symbol' | 'unit'>;

/** Where the coupling of a series stands, and where it is wanted. */
function evolutionOf({ problem, stages, datum }: Setting): {
  readonly evolution?: ReplicaSource['evolution'] & object;
} {
  const { series } = stages;
  if (problem.for !== 'alpha_s' || problem.to === undefined || checkEvolution(series, datum) !== undefined) return {};
  const ratio = series.scaleRatio === undefined ? 1 : toNumberExact(series.scaleRatio);
  const from: ScalePoint = { scale: (hardScale(series, datum) ?? 0) * ratio, flavours: series.flavours ?? 0 };
  return { evolution: { from, to: problem.to } };
}

/** Symbol and unit of what one measurement gives. */
function parameterOf({ problem, stages, extracted, datum }: Setting): Parameter {
  switch (problem.for) {
    case 'alpha_s':
      return { symbol: stages.series.coupling.name };
    case 'mass':
      return { symbol: 'm(m)', unit: 'GeV' };
    case 'pole-mass':
      return { symbol: 'M', unit: 'GeV' };
    case 'condensate': {
      const unit = hardScale(stages.series, datum) === undefined ? {} : { unit: powerOfGeV(extracted?.dimension ?? 4) };
      return { symbol: extracted?.name ?? 'condensate', ...unit };
    }
  }
}

const datumSource = ({ datum, stages, placeAt, terms, extracted }: Setting): DatumSource => ({
  datum,
  stages,
  placeAt,
  terms,
  ...(extracted === undefined ? {} : { extracted }),
});

/** One measurement: every prescription that was solved. */
export function singleSource(setting: Setting, solved: ReadonlyMap<Prescription, Solved | Refusal>): ReplicaSource {
  const { problem, search } = setting;
  return {
    problem,
    sources: [datumSource(setting)],
    solutions: [...solved].flatMap(([prescription, one]): CentralSource[] => {
      if (isRefusal(one)) return [];
      const members = [{ variant: one.theory.prediction.variant, whole: one.whole }];
      return [{ prescription, parameters: [one.number], members }];
    }),
    parameters: [parameterOf(setting)],
    ...(search === undefined ? {} : { search: { from: search.from, to: search.to } }),
    common: false,
    fitted: false,
    ...evolutionOf(setting),
  };
}

function single(problem: Problem, series: Series): ReplicaSource | Refusal {
  const [datum] = problem.data;
  if (datum === undefined) return { reason: 'there is no series', remedy: 'name one' };
  const setting = settingOf(problem, series, datum);
  if (isRefusal(setting)) return setting;
  return singleSource(setting, solveAll(setting, chosen(problem, [series])));
}

/** Rows of L⁻¹. */
function inverseFactor(factor: Matrix): number[][] {
  const columns = factor.map((_, j) =>
    forward(
      factor,
      factor.map((_row, i) => (i === j ? 1 : 0)),
    ),
  );
  return factor.map((_, i) => columns.map((column) => column[i] ?? 0));
}

/** The fit by one prescription, with the factor of the covariance that weighs the data. */
function centralFit(
  setting: FitSetting,
  prescription: Prescription,
  lenders: readonly (readonly Evaluated[])[],
): CentralSource | Refusal {
  const first = firstFit(setting, prescription);
  if (isRefusal(first)) return first;
  const whole = setting.problem.theoryInWeights === true ? wholeFit(setting, first, lenders) : undefined;
  if (whole !== undefined && isRefusal(whole)) return whole;
  const factor = whole?.factor ?? cholesky(setting.measured);
  if (factor === undefined) return { reason: 'the data have no weights', remedy: 'check their errors' };
  return {
    prescription,
    parameters: (whole ?? first).minimum.parameters,
    members: first.solved.map((s) => ({ variant: s.theory.prediction.variant, whole: s.whole })),
    whitening: inverseFactor(factor),
  };
}

/** Several measurements: every prescription that was fitted. */
function fitted(problem: Problem, series: readonly Series[]): ReplicaSource | Refusal {
  const setting = fitSetting(problem, series);
  if (isRefusal(setting)) return setting;
  const list = chosen(problem, series);
  const firsts = problem.theoryInWeights === true ? list.map((p) => firstFit(setting, p)) : [];
  const lenders = setting.settings.map((_, i): readonly Evaluated[] =>
    firsts.flatMap((f) => {
      const one = isRefusal(f) ? undefined : f.solved[i];
      return one?.whole.sum.imaginary === undefined ? [] : [evaluated(one)];
    }),
  );
  const fits = list.map((p) => centralFit(setting, p, lenders));
  const common = problem.for === 'alpha_s' && problem.to !== undefined;
  const coupling: Parameter = { symbol: common || problem.for === 'mass' ? `alpha_s(${MZ.scale} GeV)` : 'alpha_s' };
  const mass: Parameter = { symbol: 'm(m)', unit: 'GeV' };
  const free = problem.freeAlphaS === true ? [mass, coupling] : [mass];
  const { to } = problem;
  const elsewhere = common && to !== undefined && (to.scale !== MZ.scale || to.flavours !== MZ.flavours);
  return {
    problem,
    sources: setting.settings.map(datumSource),
    solutions: fits.flatMap((f) => (isRefusal(f) ? [] : [f])),
    parameters: problem.for === 'mass' ? free : [coupling],
    common,
    fitted: true,
    ...(elsewhere ? { evolution: { from: MZ, to } } : {}),
  };
}

/** The Monte Carlo of the question that `extract` or `fit` answers. */
export function sourceOf(problem: Problem, series: readonly Series[]): ReplicaSource | Refusal {
  const [only] = series;
  if (only === undefined) return { reason: 'there is no series', remedy: 'name one' };
  return series.length > 1 || problem.freeAlphaS === true ? fitted(problem, series) : single(problem, only);
}
