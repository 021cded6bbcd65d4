/**
 * @module A mass of another definition over m(m) as a series, for extractions of m(m) from a measured pole or threshold mass.
 *
 * Method     m_X/m(m) = 1 + Σ c_n (α_s/π)^n with n_l flavours at μ = m(m); c_n depends on the cutoff over m(m) and is taken
 *            from the conversions of the mass room, order by order, at the m(m) in question.
 * Bound      c_n to 1e-10 of itself: differences of conversions in doubles.
 * Refused    definitions that are no plain series in one coupling: MSR masses by R-evolution, MRS, PV. Convert those.
 */
import { Rational, exact } from '../numerics/index.js';
import { convertMass, definitionOf } from '../masses/index.js';
import type { MassPlace } from '../masses/index.js';
import { isRefusal, refuse } from '../qcd/index.js';
import type { Refusal } from '../qcd/index.js';
import type { Coefficient, Series } from '../series/index.js';

/** Coupling at m(m) at which the coefficients are read off; any would do that can be run to the cutoff. */
const PROBE = 0.2;
/** Digits of a coefficient that survive the differences. */
const DIGITS = 11;

export interface ThresholdMass {
  readonly place: MassPlace;
  /** n_l. */
  readonly light: number;
}

/** Are the terms of this definition a series in the coupling at m(m)? */
export function thresholdObjection({ place }: ThresholdMass): Refusal | undefined {
  const { title, kind } = definitionOf(place.definition);
  const definition = definitionOf(place.definition);
  if (kind === 'subtracted' && !('evolution' in definition && definition.evolution !== undefined)) return undefined;
  return refuse(
    `the ${title} is no plain series in the coupling at m(m)`,
    `convert it: leastterm mass VALUE --from ${place.definition} --to msbar`,
  );
}

/** c_1, c_2, … at m(m); `shift`: the last one moved by so many of its standard deviations. */
export function thresholdCoefficients(
  { place, light }: ThresholdMass,
  m: number,
  shift = 0,
): readonly number[] | Refusal {
  const { orders } = definitionOf(place.definition);
  const list: number[] = [];
  let before = m;
  for (let order = 1; order <= orders; order++) {
    const found = convertMass({
      mass: m,
      from: { definition: 'msbar' },
      to: place,
      alpha: { value: PROBE, scale: m, flavours: light },
      light,
      order,
      ...(shift === 0 ? {} : { shifts: { pole: shift } }),
    });
    if (isRefusal(found)) return found;
    list.push((found.value - before) / (m * (PROBE / Math.PI) ** order));
    before = found.value;
  }
  return list;
}

/** The relation at the m(m) given, as a series. */
export function thresholdSeries(mass: ThresholdMass, m: number): Series | Refusal {
  const c = thresholdCoefficients(mass, m);
  if (isRefusal(c)) return c;
  const moved = thresholdCoefficients(mass, m, 1);
  const { title, symbol, source, renormalonFree } = definitionOf(mass.place.definition);
  const last = c.length - 1;
  const error = isRefusal(moved) ? 0 : Math.abs((moved[last] ?? 0) - (c[last] ?? 0));
  const rational = (x: number): Rational => Rational.parse(x.toPrecision(DIGITS)) ?? Rational.ZERO;
  const coefficients = c.map((value, n): Coefficient => {
    const sigma = rational(error);
    const known = n === last && error > 1e-9 * Math.abs(value);
    return {
      value: exact(rational(value)),
      text: value.toPrecision(DIGITS),
      status: 'computed',
      ...(known ? { error: { plus: sigma, minus: sigma } } : {}),
    };
  });
  const at = mass.place.scale === undefined ? '' : ` at ${mass.place.scale} GeV`;
  return {
    id: `${mass.place.definition}${mass.place.scale === undefined ? '' : `@${mass.place.scale}GeV`}`,
    title: `${title}${at} over the MSbar mass`,
    quantity: `${symbol}/m = 1 + c_1 a + …, m = m(m), a = alpha_s(m)/pi with ${mass.light} flavours; coefficients at m = ${Number(m.toPrecision(6))} GeV`,
    sources: [source],
    notes: renormalonFree ? ['The leading renormalon (u = 1/2) is subtracted.'] : [],
    invented: false,
    coupling: { name: 'alpha_s', divisor: 'pi', plain: false },
    firstPower: 1,
    scheme: 'MSbar',
    flavours: mass.light,
    scaleRatio: exact(1),
    factor: exact(1),
    additive: exact(1),
    coefficients,
    singularities: renormalonFree ? [] : [{ dimension: Rational.ONE, kind: 'infrared' }],
    condensates: [],
  };
}

/** How the coefficients at m(m) differ from those at the reference of the series; kept for the last m asked for. */
export function coefficientDrift(mass: ThresholdMass, reference: number): (m: number) => readonly number[] | Refusal {
  const centre = thresholdCoefficients(mass, reference);
  let last: { m: number; drift: readonly number[] | Refusal } | undefined;
  return (m) => {
    if (isRefusal(centre)) return centre;
    if (last?.m === m) return last.drift;
    const there = thresholdCoefficients(mass, m);
    const drift = isRefusal(there) ? there : there.map((c, n) => c - (centre[n] ?? 0));
    last = { m, drift };
    return drift;
  };
}
