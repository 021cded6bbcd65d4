/** @module The step to the coupling with other active flavours, at the same scale, one quark after the other. */
import { Rational, exact, mulExact } from '../../numerics/index.js';
import {
  FORMAL_ZERO,
  addFormal,
  crossingScale,
  decouplingRelation,
  formalRational,
  formalTableAt,
  isRefusal,
  mulFormal,
  refuse,
  reversion,
} from '../../qcd/index.js';
import type { Formal, HeavyMass, Refusal, Threshold } from '../../qcd/index.js';
import { inFileNames } from '../derive/symbols.js';
import { derive, trackedExact } from '../derive/tracked.js';
import type { Tracked } from '../derive/tracked.js';
import { hardScaleOf, scaleRatioOf } from '../scheme.js';
import { unitPower } from './beta.js';
import { cutNote, substituted } from './coupling.js';
import { trackedLogSquare } from './scale.js';
import { barePositions } from './singularities.js';
import type { State } from './state.js';

/** The decimals that a person wrote stand for the double of a threshold. */
const asWritten = (x: number): Rational => Rational.parse(String(x)) ?? Rational.fromNumber(x);

/** Z in closed form: coefficients of (α_s/π)^k at a logarithm. */
function closedForms(light: number, kind: HeavyMass, log: Formal | undefined): Formal[] | undefined {
  if (log === undefined) return undefined;
  return formalTableAt(light, 'coupling', kind).map((row) =>
    row.reduceRight<Formal>((sum, entry) => addFormal(mulFormal(sum, log), inFileNames(entry)), FORMAL_ZERO),
  );
}

/** x^(nl) in powers of x^(nl+1), at μ. */
function relationDown(state: State, threshold: Threshold, muOverMass: Tracked): Tracked[] {
  const light = threshold.flavours - 1;
  const heavyMass = threshold.kind ?? 'scale-invariant';
  const values = decouplingRelation({ light, divisor: state.divisor, log: muOverMass.value, heavyMass });
  const forms = closedForms(light, heavyMass, muOverMass.formal);
  // The table is in α_s/π = 4 (divisor/4π) x.
  return values.map((value, k) => {
    const unit = unitPower(state.divisor, k).formal;
    const form = forms?.[k];
    const four = formalRational(Rational.of(4 ** k));
    return trackedExact(value, form && unit && mulFormal(form, mulFormal(unit, four)));
  });
}

function oneStep(state: State, threshold: Threshold, mu: Tracked['value']): State {
  const up = state.flavours < threshold.flavours;
  const log = trackedLogSquare(mulExact(mu, exact(asWritten(threshold.mass).inv())));
  const down = relationDown(state, threshold, log);
  // Upwards x^(nl) is replaced by its series in x^(nl+1); downwards the inverse.
  const oldInNew = up
    ? down
    : derive(down, (ring, k) => reversion(ring, [ring.zero, ...k], k.length + 1).slice(1), { length: down.length });
  const coefficients = substituted(state, oldInNew);
  const flavours = up ? threshold.flavours : threshold.flavours - 1;
  return {
    ...state,
    flavours,
    coefficients,
    singularities: barePositions(state),
    notes: [
      ...state.notes,
      `Flavours: coupling with nf = ${state.flavours} to nf = ${flavours} at the same scale, four-loop decoupling of ${threshold.name} ` +
        `with mass ${threshold.mass} GeV (${threshold.kind ?? 'scale-invariant'}).${cutNote(state.coefficients.length, coefficients.length)}`,
    ],
  };
}

/** The series in the MSbar coupling with `flavours` active flavours. The state must be in MSbar. */
export function toFlavours(state: State, flavours: number, thresholds: readonly Threshold[]): State | Refusal {
  if (flavours === state.flavours) return state;
  const ratio = state.scaleRatio ?? scaleRatioOf(state.series);
  if (isRefusal(ratio)) return ratio;
  const hard = hardScaleOf(state.series);
  if (isRefusal(hard)) return hard;
  const mu = mulExact(hard, ratio);
  let at = state;
  while (at.flavours !== flavours) {
    const next = at.flavours < flavours ? at.flavours + 1 : at.flavours;
    const threshold = thresholds.find((t) => t.flavours === next);
    if (threshold === undefined) {
      return refuse(
        `no quark is known between ${next - 1} and ${next} flavours`,
        thresholds.length === 0
          ? 'name it: --threshold b=4.186GeV'
          : `only ${thresholds.map((t) => `${t.name} (${t.flavours} flavours, ${crossingScale(t)} GeV)`).join(', ')} can be crossed`,
      );
    }
    at = oneStep(at, threshold, mu);
  }
  return {
    ...at,
    notes: [
      ...at.notes,
      'Only the coupling has changed its number of flavours: the physics of the series is that of the flavours it was made for.',
    ],
  };
}
