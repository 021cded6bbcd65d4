/** @module One evolution of α_s or a mass in plain numbers: what the study repeats with shifted inputs. */
import {
  DEFAULT_THRESHOLDS,
  INPUTS,
  evolvePath,
  flavoursAt,
  isRefusal,
  massAtItself,
  refuse,
  type PathStep,
  type Refusal,
  type ScalePoint,
  type Threshold,
} from '../qcd/index.js';
import { toNumberExact } from '../numerics/index.js';
import type { EvolveRequest } from './evolve-types.js';

/** Everything that an evolution depends on, as numbers. */
export interface Setting {
  /** The mass in GeV; absent when α_s itself is evolved. */
  readonly mass?: number;
  readonly alpha: number;
  /** Where α_s is given. */
  readonly alphaAt: ScalePoint;
  readonly from: ScalePoint;
  /** Scale absent: the mass's own. */
  readonly to: { readonly scale?: number; readonly flavours: number };
  readonly loops: number;
  readonly thresholds: readonly Threshold[];
}

export interface Outcome {
  /** α_s, or the mass in GeV. */
  readonly value: number;
  readonly alpha: number;
  readonly scale: number;
  /** Of the evolution asked for. */
  readonly steps: readonly PathStep[];
  /** The way from the given α_s to the start of a mass. */
  readonly approach: readonly PathStep[];
  /** α_s at the start. */
  readonly alphaFrom: number;
}

/** The central setting of a request. */
export function settingOf(request: EvolveRequest): Setting | Refusal {
  const thresholds = request.thresholds ?? DEFAULT_THRESHOLDS;
  const from = {
    scale: request.from.scale,
    flavours: request.from.flavours ?? flavoursAt(request.from.scale, thresholds),
  };
  const own = request.to.scale === 'own';
  if (own && request.quantity !== 'mass') {
    return refuse('only a mass has a scale of its own', 'give the scale to evolve α_s to, in GeV');
  }
  const to =
    request.to.scale === 'own'
      ? { flavours: request.to.flavours ?? from.flavours }
      : { scale: request.to.scale, flavours: request.to.flavours ?? flavoursAt(request.to.scale, thresholds) };
  const value = toNumberExact(request.value.value);
  const common = { from, to, loops: request.loops ?? 5, thresholds };
  if (request.quantity === 'alpha_s') return { ...common, alpha: value, alphaAt: from };
  const reference = request.alphaS;
  return {
    ...common,
    mass: value,
    alpha: reference === undefined ? Number(INPUTS.alphaSMZ.value) : toNumberExact(reference.value.value),
    alphaAt: reference ?? { scale: Number(INPUTS.MZ.value), flavours: 5 },
  };
}

/** Evolves once. */
export function runOnce(setting: Setting): Outcome | Refusal {
  const { mass, from, to, loops, thresholds } = setting;
  const options = { loops, thresholds };
  let alphaFrom = setting.alpha;
  let approach: readonly PathStep[] = [];
  if (setting.alphaAt !== from) {
    const there = evolvePath({ alpha: setting.alpha, from: setting.alphaAt, to: from, options });
    if (isRefusal(there)) return there;
    alphaFrom = there.alpha;
    approach = there.steps;
  }
  const goal = { scale: to.scale ?? from.scale, flavours: to.flavours };
  const path = evolvePath({ alpha: alphaFrom, from, to: goal, options, ...(mass === undefined ? {} : { mass }) });
  if (isRefusal(path)) return path;
  if (mass === undefined)
    return { value: path.alpha, alpha: path.alpha, scale: goal.scale, steps: path.steps, approach, alphaFrom };
  const arrived = path.mass ?? NaN;
  if (to.scale !== undefined)
    return { value: arrived, alpha: path.alpha, scale: goal.scale, steps: path.steps, approach, alphaFrom };
  const end = massAtItself({ mass: arrived, alpha: path.alpha, from: goal.scale, flavours: to.flavours, loops });
  if (isRefusal(end)) return end;
  const last: PathStep = { action: 'run', scale: end.mass, flavours: to.flavours, alpha: end.alpha, mass: end.mass };
  return { value: end.mass, alpha: end.alpha, scale: end.mass, steps: [...path.steps, last], approach, alphaFrom };
}
