/** @module The step to another renormalisation scale. */
import { Rational, divExact, exact, mulExact } from '../../numerics/index.js';
import type { Exact } from '../../numerics/index.js';
import { isRefusal, refuse, scaleFormal, shiftCoupling, substituteOver } from '../../qcd/index.js';
import type { Formal, Refusal } from '../../qcd/index.js';
import { textOf } from '../../series/index.js';
import { exactLog, formalLog } from '../derive/symbols.js';
import { derive, trackedExact, trackedRational } from '../derive/tracked.js';
import type { Tracked } from '../derive/tracked.js';
import { knownLoops, scaleRatioOf, schemeText } from '../scheme.js';
import type { CouplingScheme } from '../scheme.js';
import { trackedBeta, trackedCBeta } from './beta.js';
import { movedSingularities } from './singularities.js';
import type { State } from './state.js';

/** 2 ln(ratio), with the logarithms of small primes as symbols. */
export function trackedLogSquare(ratio: Exact): Tracked {
  const q = ratio.rational;
  if (q?.equals(Rational.ONE) === true) return trackedRational(Rational.ZERO);
  const formal: Formal | undefined = q && scaleFormal(formalLog(q), Rational.of(2));
  return trackedExact(mulExact(exact(2), exactLog(ratio)), formal);
}

/** The beta function of a scheme that has one of its own, as far as a list of `length` coefficients needs it. */
export function betaOf(scheme: CouplingScheme, state: State, length: number): Tracked[] {
  const { flavours, divisor } = state;
  if (scheme.kind === 'C') return trackedCBeta(flavours, divisor, Math.max(length - 1, 1));
  return trackedBeta(flavours, divisor, Math.min(knownLoops(scheme), Math.max(length - 1, 1)));
}

/** Does the scheme have a beta function of its own here? The others go through MSbar. */
export const hasBeta = (scheme: CouplingScheme): boolean =>
  scheme.kind === 'MSbar' || scheme.kind === 'C' || scheme.kind === 'toy';

/** μ/Q becomes `ratio`. The scheme must have a beta function of its own. */
export function toScale(state: State, ratio: Exact): State | Refusal {
  const before = state.scaleRatio ?? scaleRatioOf(state.series);
  if (isRefusal(before)) return before;
  if (state.mass === 'running') {
    return refuse(
      `${state.series.id} is in the running mass m(mu), which changes with the scale`,
      'go to another mass first: --mass msbar --mass-power P (in one command with --scale)',
    );
  }
  const { coefficients, firstPower } = state;
  const n = coefficients.length;
  const factor = divExact(ratio, before);
  const log = trackedLogSquare(factor);
  const beta = betaOf(state.scheme, state, n);
  const moved = derive(
    [log, ...coefficients, ...beta],
    (ring, [l, ...x]) => {
      const back = ring.sub(ring.zero, l ?? ring.zero);
      const relation = shiftCoupling(ring, x.slice(n), back, n + 1).slice(1);
      return substituteOver(ring, x.slice(0, n), firstPower, relation, n);
    },
    { length: n },
  );
  const loops = knownLoops(state.scheme);
  const how =
    state.scheme.kind === 'C'
      ? 'with its closed beta function'
      : state.scheme.kind === 'toy'
        ? `with its ${loops}-loop beta function`
        : n - 1 > loops
          ? `with the ${loops}-loop beta function; higher loops count as zero`
          : `with the beta function through ${beta.length} ${beta.length === 1 ? 'loop' : 'loops'}`;
  return {
    ...state,
    scaleRatio: ratio,
    coefficients: moved,
    singularities: movedSingularities(state, { factor }),
    notes: [
      ...state.notes,
      `Scale: mu/Q from ${textOf(before)} to ${textOf(ratio)} at nf = ${state.flavours} (${schemeText(state.scheme)}), ${how}.`,
    ],
  };
}
