/**
 * @module The whole Monte Carlo of an extraction, checked: what is fast agrees with what is certified at the central values, and
 * every map reaches as far as the inputs can carry the parameters.
 */
import { evolvePath, isRefusal, refuse } from '../../qcd/index.js';
import type { Refusal, ScalePoint } from '../../qcd/index.js';
import { shiftedThresholds } from '../place.js';
import type { Problem } from '../problem.js';
import { dataModels, prescriptionModel } from './compile.js';
import type { CentralSource, DatumSource } from './compile.js';
import { Engine } from './engine.js';
import { couplingMap, LARGEST_DEVIATE } from './maps.js';
import type { Range } from './places.js';
import type { DatumModel, DerivedModel, ParameterModel, PrescriptionModel, ReplicaProblem, Task } from './problem.js';
import { SlotList } from './slots.js';

export interface ReplicaSource {
  readonly problem: Problem;
  readonly sources: readonly DatumSource[];
  readonly solutions: readonly CentralSource[];
  /** Symbols and units of the parameters. */
  readonly parameters: readonly Pick<ParameterModel, 'symbol' | 'unit'>[];
  /** Values of the first parameter that are searched. */
  readonly search?: { readonly from: number; readonly to: number };
  /** The parameter is α_s(M_Z). */
  readonly common: boolean;
  /** The parameters are fitted to all data at once. */
  readonly fitted: boolean;
  /** Where α_s stands and where it is wanted as well. */
  readonly evolution?: { readonly from: ScalePoint; readonly to: ScalePoint };
}

export interface LeftOut {
  readonly prescription: string;
  readonly reason: string;
}

export interface Built {
  readonly problem: ReplicaProblem;
  readonly leftOut: readonly LeftOut[];
}

/** Relative difference between fast and certified solutions at the central values that is still rounding. */
const AGREES = 1e-8;
/** First guess of a parameter's standard deviation, relative. */
const GUESS = 0.01;
/** A box may be wider than needed by this factor; rebuilding costs more. */
const SLACK = 4;
/** Deviates reach 8.7 standard deviations; responses are not exactly linear. */
const MARGIN = 1.25;
const ATTEMPTS = 4;
/** The coupling is followed at least so far below and above its central value, never farther below than `least`; in units of it. */
const FOLLOWED = { down: 0.3, up: 0.4, least: 0.9 } as const;

interface Solutions {
  readonly list: readonly PrescriptionModel[];
  readonly leftOut: readonly LeftOut[];
}

function fastOnes({ solutions, sources }: ReplicaSource): Solutions {
  const list: PrescriptionModel[] = [];
  const leftOut: LeftOut[] = [];
  for (const one of solutions) {
    const model = prescriptionModel(one, sources);
    if (isRefusal(model)) leftOut.push({ prescription: one.prescription.name, reason: model.reason });
    else list.push(model);
  }
  return { list, leftOut };
}

/** Middle of the central values, and the reach that their distance and the largest deviate ask for. */
function rangeOf(values: readonly number[], sigma: number): Range {
  const [low, high] = [Math.min(...values), Math.max(...values)];
  return { central: (low + high) / 2, reach: (high - low) / 2 + LARGEST_DEVIATE * sigma };
}

function taskOf({ problem, sources, fitted: several }: ReplicaSource): Task | Refusal {
  if (several) return { kind: 'fit' };
  if (problem.for === 'pole-mass') return { kind: 'prediction' };
  if (problem.for !== 'condensate') return { kind: 'root' };
  const extracted = sources[0]?.extracted;
  if (extracted === undefined) return refuse('no condensate is named', 'name it: --condensate');
  const { wilson, corrections, dimension } = extracted;
  return { kind: 'condensate', term: { wilson, corrections, dimension } };
}

/** Largest √(Σ_j responses²) of quantity q over the prescriptions. */
function widest(engine: Engine, q: number): number {
  return engine.responses.reduce((most, list) => {
    const sigma = Math.sqrt(list.reduce((sum, r) => sum + r[q]! ** 2, 0));
    return Number.isFinite(sigma) ? Math.max(most, sigma) : most;
  }, 0);
}

/** Does a parameter move a map of the data? */
const isMapped = (data: readonly DatumModel[], parameters: number): boolean =>
  data.some((d) => d.coupling.kind === 'map' && d.coupling.variables.some((slot) => slot < parameters));

interface Draft {
  readonly problem: ReplicaProblem;
  readonly slots: SlotList;
  readonly engine: Engine;
}

/** The problem for given ranges of the parameters. */
function draft(
  source: ReplicaSource,
  task: Task,
  list: readonly PrescriptionModel[],
  ranges: readonly Range[],
): Draft | Refusal {
  const { problem, sources, parameters, search, common } = source;
  const slots = new SlotList(parameters.length);
  const data = dataModels(problem, sources, slots, ranges, common);
  if (isRefusal(data)) return data;
  const inputs = slots.inputs();
  if (isRefusal(inputs)) return inputs;
  const bounded = isMapped(data, parameters.length);
  const free = task.kind === 'prediction' || task.kind === 'condensate';
  const models = parameters.map((p, k): ParameterModel => {
    if (free) return { ...p, from: -Infinity, to: Infinity };
    const { central, reach } = ranges[k]!;
    const box = { from: central - reach, to: central + reach };
    return { ...p, ...(bounded || search === undefined ? box : search) };
  });
  const made: ReplicaProblem = { task, parameters: models, inputs, data, prescriptions: list };
  return { problem: made, slots, engine: new Engine(made, 0) };
}

/** Drafts until the boxes fit the responses. */
function fitted(source: ReplicaSource, task: Task, list: readonly PrescriptionModel[]): Draft | Refusal {
  const centrals = source.parameters.map((_, k) => list.map((p) => p.central[k]!));
  let ranges = centrals.map((values) => rangeOf(values, GUESS * Math.abs(values[0]!)));
  for (let attempt = 0; ; attempt++) {
    const made = draft(source, task, list, ranges);
    if (isRefusal(made) || !isMapped(made.problem.data, source.parameters.length)) return made;
    const needed = centrals.map((values, k) => rangeOf(values, MARGIN * widest(made.engine, k)));
    const fits = needed.every(({ reach }, k) => reach <= ranges[k]!.reach && reach * SLACK >= ranges[k]!.reach);
    if (fits || attempt === ATTEMPTS) return made;
    ranges = needed.map(({ central, reach }) => ({ central, reach: reach * 1.1 }));
  }
}

/** The coupling where it is wanted as well, over the range of the parameter. */
function derivedOf(
  source: ReplicaSource,
  { slots, engine }: Draft,
  list: readonly PrescriptionModel[],
): DerivedModel | undefined | Refusal {
  const { evolution, problem } = source;
  if (evolution === undefined) return undefined;
  const values = list.map((p) => p.central[0]!);
  const { central, reach } = rangeOf(values, MARGIN * widest(engine, 0));
  const down = Math.min(Math.max(reach, FOLLOWED.down * central), FOLLOWED.least * central);
  const variable = { slot: 0, central, down, up: Math.max(reach, FOLLOWED.up * central) };
  const mapped = couplingMap(problem, slots, [variable], ([alpha = NaN], shifts) => {
    const thresholds = shiftedThresholds(problem.thresholds, shifts);
    const end = evolvePath({ alpha, ...evolution, options: { loops: problem.loops, thresholds } });
    return isRefusal(end) ? NaN : end.alpha;
  });
  if (isRefusal(mapped)) return mapped;
  return { symbol: `alpha_s(${evolution.to.scale} GeV)`, ...mapped };
}

/** Fast versions that do not reproduce the certified solution are left out, and said to be. */
function disagreeing(engine: Engine, list: readonly PrescriptionModel[]): LeftOut[] {
  return list.flatMap((p, i) => {
    const found = engine.central[i]!;
    const gap = Math.max(...p.central.map((value, k) => Math.abs(found[k]! / value - 1)));
    if (gap <= AGREES) return [];
    const reason = Number.isNaN(gap)
      ? 'its fast version has no value at the central inputs'
      : `its fast version is off by ${gap.toExponential(1)} at the central inputs: doubles do not carry it`;
    return [{ prescription: p.name, reason }];
  });
}

/** The Monte Carlo of an extraction; a refusal where nothing of it can be made. */
export function buildReplicas(source: ReplicaSource): Built | Refusal {
  const task = taskOf(source);
  if (isRefusal(task)) return task;
  const fast = fastOnes(source);
  let { list } = fast;
  let leftOut = [...fast.leftOut];
  for (;;) {
    if (list.length === 0) {
      return refuse(
        `no prescription can be replicated: ${leftOut.map((l) => `${l.prescription}: ${l.reason}`).join('; ') || 'none has a solution'}`,
        'choose others, or leave --replicas out',
      );
    }
    const made = fitted(source, task, list);
    if (isRefusal(made)) return made;
    const wrong = disagreeing(made.engine, list);
    if (wrong.length > 0) {
      leftOut = [...leftOut, ...wrong];
      list = list.filter((p) => !wrong.some((w) => w.prescription === p.name));
      continue;
    }
    if (made.problem.inputs.drawn.length === 0) {
      return refuse('nothing has an error: all replicas would be the same', "give errors: --measured '0.2042(50)'");
    }
    const derived = derivedOf(source, made, list);
    if (isRefusal(derived)) return derived;
    // The evolution may have brought inputs of its own: the thresholds.
    const inputs = made.slots.inputs();
    if (isRefusal(inputs)) return inputs;
    return { problem: { ...made.problem, inputs, ...(derived === undefined ? {} : { derived }) }, leftOut };
  }
}
