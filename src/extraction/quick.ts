/**
 * @module A member of a prescription in doubles, for searches and shifts: microseconds in place of milliseconds.
 *
 * Method     the fast version that the fast room makes of the member; on a circle, the contour room's. Kernels are kept for each
 *            renormalisation scale; shifted coefficients are handed to them anew.
 * Bound      a few 1e-12 of R; solutions are polished with the prescription itself.
 */
import { exact, Rational, toNumberExact } from '../numerics/index.js';
import type { Exact } from '../numerics/index.js';
import { contourSum } from '../contour/index.js';
import { fastSetting, makeKernel } from '../fast/index.js';
import type { Kernel } from '../fast/index.js';
import { CONTOUR_NAMES } from '../prescriptions/index.js';
import type { Sum } from '../prescriptions/index.js';
import { isRefusal } from '../qcd/index.js';
import type { Expansion } from '../series/index.js';
import type { SeriesShifts, Stage, Stages } from './stage.js';

/** R at α with shifts; undefined where the member has no value. */
export type Quick = (alpha: number, shifts?: SeriesShifts) => number | undefined;

const fromDouble = (x: number): Exact => exact(Rational.fromNumber(x));

const doubles = (e: Expansion): Float64Array => Float64Array.from(e.coefficients, toNumberExact);

/** The fast version of the member that `sum` stands for; undefined for a prescription without one. */
export function quickOf(name: string, stages: Stages, sum: Sum, at: Exact): Quick | undefined {
  if (name === CONTOUR_NAMES.improved.name) return improved(stages);
  const setting = (stage: Stage): ReturnType<typeof fastSetting> => {
    const e = stage.at(at);
    return isRefusal(e) ? undefined : fastSetting(name, e, stage.growth, sum);
  };
  if (setting(stages.central) === undefined) return undefined;
  const kernels = new Map<number, Prepared | undefined>();
  return (alpha, shifts = {}) => {
    const { logScale = 0, coefficients } = shifts;
    if (!kernels.has(logScale)) kernels.set(logScale, prepared(stages, logScale, setting));
    const ready = kernels.get(logScale);
    if (ready === undefined) return undefined;
    const e = ready.stage.at(fromDouble(alpha));
    if (isRefusal(e)) return undefined;
    const x = toNumberExact(e.x);
    if (coefficients?.some((d) => d !== 0) !== true)
      return ready.stands ? whole(e, x, ready.kernel.value(x)) : undefined;
    const stage = stages.at(shifts);
    if (isRefusal(stage)) return undefined;
    const stands = ready.kernel.prepare(doubles(stage.expanded.expansion));
    const value = stands ? whole(e, x, ready.kernel.value(x)) : undefined;
    ready.kernel.prepare(ready.own);
    return value;
  };
}

interface Prepared {
  readonly stage: Stage;
  readonly kernel: Kernel;
  readonly own: Float64Array;
  readonly stands: boolean;
}

function prepared(
  stages: Stages,
  logScale: number,
  setting: (stage: Stage) => ReturnType<typeof fastSetting>,
): Prepared | undefined {
  const stage = stages.at({ logScale });
  if (isRefusal(stage)) return undefined;
  const found = setting(stage);
  if (found === undefined) return undefined;
  const kernel = makeKernel(found);
  const own = doubles(stage.expanded.expansion);
  return { stage, kernel, own, stands: kernel.prepare(own) };
}

/** additive + factor · x^power · F. */
function whole(e: Expansion, x: number, f: number): number | undefined {
  const value = toNumberExact(e.additive) + toNumberExact(e.factor) * x ** e.power * f;
  return Number.isFinite(value) ? value : undefined;
}

/** Contour improvement: x of the expansion is that of s_0 at the scale in use. */
function improved(stages: Stages): Quick | undefined {
  if (stages.central.expanded.expansion.contour === undefined) return undefined;
  return (alpha, shifts = {}) => {
    const stage = stages.at(shifts);
    if (isRefusal(stage)) return undefined;
    const e = stage.at(fromDouble(alpha));
    if (isRefusal(e) || e.contour === undefined) return undefined;
    const value = contourSum({ ...e, contour: e.contour }, 'contour-improved', toNumberExact(e.x) * stages.divisorSize);
    return typeof value === 'number' ? value : undefined;
  };
}
