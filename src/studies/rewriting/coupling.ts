/** @module The step to another definition of the coupling, at the same scale and n_f. */
import { divExact, exact, exactReal, exp, mulExact, Rational } from '../../numerics/index.js';
import { isRefusal, substituteOver } from '../../qcd/index.js';
import type { Refusal } from '../../qcd/index.js';
import { derive } from '../derive/tracked.js';
import type { Tracked } from '../derive/tracked.js';
import { sameScheme, schemeText } from '../scheme.js';
import type { CouplingScheme } from '../scheme.js';
import { trackedBeta } from './beta.js';
import { cToC, msbarRelation, type FindSeries } from './relations.js';
import { movedSingularities } from './singularities.js';
import type { State } from './state.js';

/** Coefficients after x_old = k_1 X + k_2 X² + …: as many as the relation fixes. */
export function substituted(state: State, oldInNew: readonly Tracked[]): Tracked[] {
  const { coefficients, firstPower } = state;
  const fixed = firstPower === 0 ? oldInNew.length + 1 : oldInNew.length;
  const n = Math.min(coefficients.length, fixed);
  return derive(
    [...coefficients.slice(0, n), ...oldInNew],
    (ring, x) => substituteOver(ring, x.slice(0, n), firstPower, x.slice(n), n),
    { length: n },
  );
}

/** The sentence on coefficients that a relation does not fix; nothing when it fixes all. */
export function cutNote(before: number, after: number): string {
  const lost = before - after;
  if (lost <= 0) return '';
  return ` The relation fixes ${after} coefficients; the ${lost === 1 ? 'last one is' : `last ${lost} are`} left out.`;
}

/** Λ_old/Λ_new = exp(κ/(2 b_0)) for x_old = X + κ X² + …, exact to all orders. */
function lambdaFactor(state: State, oldInNew: readonly Tracked[]) {
  const kappa = oldInNew[1]?.value ?? exact(0);
  const [b0] = trackedBeta(state.flavours, state.divisor, 1);
  if (b0 === undefined || kappa.rational?.isZero() === true) return exact(Rational.ONE);
  const exponent = divExact(kappa, mulExact(exact(2), b0.value));
  return exactReal((prec) => exp(exponent.ball(prec + 16), prec + 8));
}

async function relationTo(
  state: State,
  scheme: CouplingScheme,
  find: FindSeries,
): Promise<readonly Tracked[] | Refusal> {
  const { scheme: old, coefficients } = state;
  if (old.kind === 'C' && scheme.kind === 'C') return cToC(old.c, scheme.c, state, coefficients.length);
  const direction = scheme.kind === 'MSbar' ? 'new in MSbar' : 'MSbar in new';
  // To MSbar: the old coupling in powers of x; from MSbar: x in powers of the new one.
  return msbarRelation(scheme.kind === 'MSbar' ? old : scheme, direction, state, find);
}

/** The series in the coupling of another scheme. */
export async function toCoupling(state: State, scheme: CouplingScheme, find: FindSeries): Promise<State | Refusal> {
  const { scheme: old } = state;
  if (sameScheme(old, scheme)) return state;
  const direct = old.kind === 'MSbar' || scheme.kind === 'MSbar' || (old.kind === 'C' && scheme.kind === 'C');
  if (!direct) {
    const middle = await toCoupling(state, { kind: 'MSbar' }, find);
    return isRefusal(middle) ? middle : toCoupling(middle, scheme, find);
  }
  const relation = await relationTo(state, scheme, find);
  if (isRefusal(relation)) return relation;
  const coefficients = substituted(state, relation);
  return {
    ...state,
    scheme,
    coefficients,
    singularities: movedSingularities(state, { factor: lambdaFactor(state, relation) }),
    notes: [
      ...state.notes,
      `Coupling: from ${schemeText(old)} to ${schemeText(scheme)} at nf = ${state.flavours}, same scale.` +
        cutNote(state.coefficients.length, coefficients.length),
    ],
  };
}
