/** @module Which Borel singularities of the operands a combination can be said to have. */
import { Rational, addExact, exact } from '../../numerics/index.js';
import { textOf } from '../../series/index.js';
import type { KnownSingularity } from '../../series/index.js';
import { freestanding } from '../derive/freestanding.js';
import { positionOf } from '../rewriting/singularities.js';
import type { Operand } from './operands.js';

interface Shape {
  /** A sum of series with numbers in front. */
  readonly linear: boolean;
  /** Of the combination. */
  readonly firstPower: number;
}

export interface Combined {
  readonly stated: readonly KnownSingularity[];
  /** Sentences on positions that several operands share. */
  readonly open: readonly string[];
}

/**
 * Positions that one operand alone has; those of several may cancel, and are left to be found out. In a sum the exponents
 * stay (they refer to the first coefficient, which may be another one now); products change them.
 */
export async function combinedSingularities(operands: readonly Operand[], shape: Shape): Promise<Combined> {
  const seen = new Map<string, { readonly s: KnownSingularity; readonly names: Set<string> }>();
  for (const { name, series } of operands) {
    const { singularities } = await freestanding(series);
    const { plain, divisor } = series.coupling;
    const shift = exact(Rational.of(shape.firstPower - series.firstPower));
    for (const s of singularities) {
      const u = plain || series.flavours === undefined ? undefined : positionOf(s, series.flavours, divisor);
      const where = u === undefined ? s.t && { t: s.t } : { u };
      if (where === undefined) continue;
      const place = u === undefined ? `t = ${textOf(s.t ?? exact(0))}` : `u = ${textOf(u)}`;
      const exponent = shape.linear && s.exponent !== undefined ? { exponent: addExact(s.exponent, shift) } : {};
      const entry = seen.get(place) ?? { s: { ...where, ...exponent, kind: s.kind }, names: new Set<string>() };
      entry.names.add(name);
      seen.set(place, entry);
    }
  }
  const alone = [...seen.values()].filter(({ names }) => names.size === 1);
  const shared = [...seen].filter(([, { names }]) => names.size > 1);
  return {
    stated: alone.map(({ s }) => s),
    open: shared.map(([place, { names }]) => `${place} is a singularity of ${[...names].join(' and ')}`),
  };
}
