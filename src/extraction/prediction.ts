/**
 * @module R(α; shifts): what one prescription makes of one series, as a function of the coupling and of what an error
 * budget shifts. The smallest thing that root finding, error propagation and a Monte Carlo need.
 *
 * A prescription is a family; at a given coupling it names its central member. A prediction stays with one member, so that it
 * is a smooth function of the coupling; `whole` asks the family anew.
 */
import { R } from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';
import type { Prescription, Sum } from '../prescriptions/index.js';
import { isRefusal, refuse } from '../qcd/index.js';
import type { Refusal } from '../qcd/index.js';
import { quickOf } from './quick.js';
import type { Quick } from './quick.js';
import type { SeriesShifts, Stages } from './stage.js';

export interface Prediction {
  readonly prescription: Prescription;
  readonly stages: Stages;
  /** The member of the family; undefined before one is named. */
  readonly variant: string | undefined;
  /** R by the member, an enclosure of about `digits` digits. */
  value(alpha: Exact, digits: number, shifts?: SeriesShifts): Ball | Refusal;
  /** The family's central sum with its own errors. */
  whole(alpha: Exact, digits: number, shifts?: SeriesShifts): Sum | Refusal;
  /** R by the member in doubles; absent where the member has no fast version. */
  readonly quick?: Quick;
  /** The same prediction by the member that a sum at α stands for. */
  member(sum: Sum, alpha: Exact): Prediction;
}

const NOTHING = refuse('no value', 'choose another prescription');

/** The central sum of a prescription, or why there is none. */
function central(
  prescription: Prescription,
  stages: Stages,
  alpha: Exact,
  digits: number,
  shifts: SeriesShifts,
): Sum | Refusal {
  const stage = stages.at(shifts);
  if (isRefusal(stage)) return stage;
  const e = stage.at(alpha);
  if (isRefusal(e)) return e;
  const outcomes = prescription.apply(e, stage.growth, { digits });
  const sums = outcomes.filter((o) => o.kind === 'sum');
  const best = sums.find((s) => s.central === true) ?? sums[0];
  if (best !== undefined) return best;
  const [first] = outcomes;
  return first?.kind === 'refusal' ? refuse(first.reason, first.remedy) : NOTHING;
}

export function predictionOf(prescription: Prescription, stages: Stages, variant?: string, quick?: Quick): Prediction {
  return {
    prescription,
    stages,
    variant,
    ...(quick === undefined ? {} : { quick }),
    value(alpha, digits, shifts = {}) {
      const stage = stages.at(shifts);
      if (isRefusal(stage)) return stage;
      const e = stage.at(alpha);
      if (isRefusal(e)) return e;
      const request = variant === undefined ? { digits } : { digits, only: variant };
      const outcomes = prescription.apply(e, stage.growth, request);
      // Families with a single member need not look at the name.
      const found = outcomes.find((o) => o.variant === variant) ?? outcomes[0];
      if (found === undefined) return NOTHING;
      if (found.kind === 'refusal') return refuse(found.reason, found.remedy);
      return found.value.rad < Infinity && Number.isFinite(R.toNumber(found.value))
        ? found.value
        : refuse('the value could not be enclosed', 'choose another prescription');
    },
    whole: (alpha, digits, shifts = {}) => central(prescription, stages, alpha, digits, shifts),
    member: (sum, alpha) =>
      predictionOf(prescription, stages, sum.variant, quickOf(prescription.name, stages, sum, alpha)),
  };
}
