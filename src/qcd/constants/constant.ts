/** @module A published constant: its formula as text, where it stands, and how well it is confirmed. */
import { Rational } from '../../numerics/index.js';
import { formalRational, substituteFormal, type Formal } from './formal.js';
import { parseFormal } from './formal-parse.js';

/**
 * How far a constant is confirmed.
 * confirmed-two-sources: two independent published statements agree. rederived: reproduced by an independent
 * calculation or by consistency relations. one-source: read in one publication. memory: recalled, text not seen,
 * with consistency tests.
 */
export type Status = 'confirmed-two-sources' | 'rederived' | 'one-source' | 'memory';

export interface PublishedConstant {
  readonly quantity: string;
  /** Formula in the notation of formal-parse. */
  readonly formula: string;
  readonly source: string;
  readonly status: Status;
  /** One-standard-deviation error in the same notation, for numerically known constants. */
  readonly error?: string;
}

const parsed = new Map<string, Formal>();

/** The formula as an exact polynomial; each text is read once. */
export function formalOf(constant: Pick<PublishedConstant, 'formula'>): Formal {
  let value = parsed.get(constant.formula);
  if (value === undefined) {
    value = parseFormal(constant.formula);
    parsed.set(constant.formula, value);
  }
  return value;
}

/** The formula with symbols replaced by integers, e.g. { nf: 5 }. */
export function formalAt(
  constant: Pick<PublishedConstant, 'formula'>,
  values: Readonly<Record<string, number | Rational>>,
): Formal {
  const formals = Object.fromEntries(
    Object.entries(values).map(([name, v]) => [name, formalRational(v instanceof Rational ? v : Rational.of(v))]),
  );
  return substituteFormal(formalOf(constant), formals);
}
