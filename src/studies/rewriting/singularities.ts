/**
 * @module What a change of convention does to the Borel singularities that a file states.
 *
 * Method     the position u is a property of the quantity. In units of Λ the strength of (1 − t/t_s)^(−γ) is one too, so
 *            that it scales as (Λ_old/Λ_new · μ_new/μ_old)^(2u).
 * Reference  M. Beneke, Phys. Rept. 317 (1999) 1, hep-ph/9807443 (scale and scheme dependence of renormalons).
 */
import { Rational, addExact, exact, exactReal, exp, mulExact, toNumberExact } from '../../numerics/index.js';
import type { Exact } from '../../numerics/index.js';
import { uPerT } from '../../qcd/index.js';
import { textOf } from '../../series/index.js';
import type { KnownSingularity, Uncertain } from '../../series/index.js';
import { exactLog } from '../derive/symbols.js';
import type { State } from './state.js';

/** Position in u; undefined where the file gives none that can be turned into it. */
export function positionOf(s: KnownSingularity, flavours: number, divisor: State['divisor']): Exact | undefined {
  if (s.u !== undefined) return s.u;
  if (s.dimension !== undefined) return exact(s.dimension.div(Rational.of(2)));
  return s.t && mulExact(s.t, uPerT(flavours, divisor));
}

/** factor^(2u), rational where it can be. */
function power(factor: Exact, u: Exact): Exact {
  const twice = addExact(u, u);
  const n = twice.rational;
  if (factor.rational !== undefined && n?.isInteger() === true && n.abs().cmp(Rational.of(64)) < 0) {
    return exact(factor.rational.pow(Number(n.num)));
  }
  const log = mulExact(twice, exactLog(factor));
  return exactReal((prec) => exp(log.ball(prec + 16), prec + 8));
}

function scaled(strength: Uncertain, factor: Exact): Uncertain {
  const value = mulExact(strength.value, factor);
  const size = Rational.parse(Math.abs(toNumberExact(factor)).toPrecision(12)) ?? Rational.ONE;
  const error = strength.error && { plus: strength.error.plus.mul(size), minus: strength.error.minus.mul(size) };
  return { value, ...(error && { error }), text: textOf(value) };
}

export interface Move {
  /** Λ_old/Λ_new · μ_new/μ_old. */
  readonly factor: Exact;
}

/** The first correction to the operator's coefficient stays when the operator has no anomalous dimension. */
function corrections(s: KnownSingularity): Pick<KnownSingularity, 'wilsonCorrections'> {
  const [first] = s.wilsonCorrections ?? [];
  return first === undefined || s.anomalousDimension !== undefined ? {} : { wilsonCorrections: [first] };
}

/** Strengths after a change of scale or coupling; positions and exponents stay. */
export function movedSingularities(state: State, { factor }: Move): KnownSingularity[] {
  if (factor.rational?.equals(Rational.ONE) === true) return [...state.singularities];
  return state.singularities.map((s) => {
    const { strength, wilsonCorrections: _wilson, ...rest } = s;
    const u = strength && positionOf(s, state.flavours, state.divisor);
    const moved = strength === undefined || u === undefined ? {} : { strength: scaled(strength, power(factor, u)) };
    return { ...rest, ...corrections(s), ...moved };
  });
}

/** Positions alone, where exponents and strengths have no meaning any more. */
export function barePositions(state: State): KnownSingularity[] {
  return state.singularities.flatMap((s): KnownSingularity[] => {
    if (s.dimension !== undefined) return [{ dimension: s.dimension, kind: s.kind }];
    const u = positionOf(s, state.flavours, state.divisor);
    return u === undefined ? [] : [{ u, kind: s.kind }];
  });
}
