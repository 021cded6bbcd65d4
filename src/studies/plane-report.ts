/** @module The Borel plane as the result states it: Padé entries with their poles, doublets, non-existing entries. */
import { approximate, nearAxisPoles, nearDiagonal } from '../borel/index.js';
import type { Approximant, RatedPole, Zero } from '../borel/index.js';
import { C, R, Rational, toNumberExact } from '../numerics/index.js';
import type { Complex } from '../numerics/index.js';
import type { Growth } from '../growth/index.js';
import { leroyParameter } from '../prescriptions/index.js';
import type { BorelPlaneReport, PadeEntry, PlaceReport, PoleReport } from './assessment.js';
import type { Expanded } from './expand.js';
import { ballText, indicative } from './figures.js';
import { poleErrors } from './pole-errors.js';
import type { Position } from './pole-errors.js';

/** Coefficients shown in the plane of a long series: the picture does not change beyond, the cost does. Heuristic. */
const MOST = 24;
const POLE_BITS = 96;
const POLE_DIGITS = 8;

/** Near-diagonal entries of the plain transform and, where the leading exponent is known, of the Leroy transform. */
export function planeReport(
  expanded: Expanded,
  growth: Growth,
  digits: number,
  correlation?: readonly (readonly number[])[],
): BorelPlaneReport {
  const e = expanded.expansion;
  const usable = Math.min(e.coefficients.length, growth.usableCoefficients ?? MOST, MOST);
  const variable = expanded.uPerT === undefined ? 't' : 't (u = uPerT * t)';
  const empty = (note: string): BorelPlaneReport => ({
    variable,
    entries: [],
    doublets: 0,
    notes: [note],
    standing: 'certified',
  });
  if (growth.verdict === 'terminating') return empty('the series terminates: its Borel transform is a polynomial');
  if (growth.verdict === 'superfactorial')
    return empty(
      'growth faster than n!: the order-1 Borel transform has zero radius of convergence, there is no plane to show',
    );
  if (usable < 3)
    return empty(
      `${usable} usable coefficient${usable === 1 ? '' : 's'}: an approximant with a pole and a check needs three`,
    );
  const b = leroyParameter(e, growth);
  const transforms =
    b === undefined || b.isZero() || b.cmp(Rational.of(-1)) <= 0 ? [Rational.ZERO] : [Rational.ZERO, b];
  const noise = Math.max(0, ...e.relativeErrors.slice(0, usable));
  const shown = Math.min(digits, POLE_DIGITS);
  const scale = expanded.uPerT === undefined ? undefined : toNumberExact(expanded.uPerT);
  const entries: PadeEntry[] = [];
  for (const leroy of transforms) {
    for (const order of [usable - 1, usable - 2]) {
      for (const [L, M] of nearDiagonal(order, order === usable - 1 ? 2 : 1)) {
        const approximant = approximate(e.coefficients, leroy, L, M, POLE_BITS, noise);
        const errors = errorsOf(approximant, expanded, correlation, leroy, [L, M]);
        entries.push(entryReport(approximant, errors, leroy, shown, scale));
      }
    }
  }
  const notes: string[] = [];
  if (usable < e.coefficients.length)
    notes.push(`the plane is drawn from the first ${usable} of ${e.coefficients.length} coefficients`);
  const missing = entries.filter((x) => !x.exists);
  if (missing.length > 0) notes.push(`not existing (degenerate block): ${missing.map((x) => labelOf(x)).join(', ')}`);
  if (entries.some((x) => x.poles.some((p) => p.note === 'near-axis')))
    notes.push('a complex pair close to the positive axis is lifted over in the sums unless the terms confirm it');
  const doublets = entries.reduce((s, x) => s + x.poles.filter((p) => p.note === 'doublet').length, 0);
  const central = expanded.errors.slice(0, usable).some((error) => error > 0);
  return { variable, entries, doublets, notes, standing: 'certified', ...(central ? { central } : {}) };
}

/** Errors of the poles from those of the coefficients; a multiple pole, or one set aside, has none. */
function errorsOf(
  a: Approximant,
  expanded: Expanded,
  correlation: readonly (readonly number[])[] | undefined,
  leroy: Rational,
  entry: readonly [number, number],
): readonly (Position | undefined)[] {
  if (a.exists !== true || a.deficiency > 0 || !expanded.errors.some((error) => error > 0)) return [];
  const places = a.poles.map((p) => C.toNumbers(p.z));
  const found = poleErrors(expanded.expansion.coefficients, expanded.errors, correlation, leroy, entry, places);
  return a.poles.map((p, i) => (p.multiplicity > 1 || p.role !== undefined ? undefined : found[i]));
}

const labelOf = (x: PadeEntry): string => (x.leroy === '0' ? x.label : `${x.label} (b = ${x.leroy})`);

function entryReport(
  a: Approximant,
  errors: readonly (Position | undefined)[],
  leroy: Rational,
  digits: number,
  scale: number | undefined,
): PadeEntry {
  if (a.exists !== true)
    return {
      label: a.label,
      leroy: leroy.toString(),
      exists: false,
      ...(a.reason === undefined ? {} : { reason: a.reason }),
      poles: [],
    };
  const near = new Set(nearAxisPoles(a.poles));
  return {
    label: a.label,
    leroy: leroy.toString(),
    exists: true,
    ...(a.deficiency > 0 ? { deficiency: a.deficiency } : {}),
    positiveRealPoles: a.positiveRealPoles,
    poles: a.poles.map((p, i) => poleReport(p, errors[i], near.has(p), digits, scale)),
    ...(a.zeros.length === 0 ? {} : { zeros: a.zeros.map((zero) => placeReport(zero, digits, scale)) }),
  };
}

function complexText(z: Complex, digits: number, real: boolean): { re: string; im?: string } {
  return real ? { re: ballText(z.re, digits) } : { re: ballText(z.re, digits), im: ballText(z.im, digits) };
}

function placeReport({ z, real }: Zero, digits: number, scale: number | undefined): PlaceReport {
  const u = scale === undefined ? undefined : C.mulReal(z, R.fromNumber(scale), POLE_BITS);
  return { ...complexText(z, digits, real), ...(u === undefined ? {} : { u: complexText(u, digits, real) }) };
}

function poleReport(
  p: RatedPole,
  error: Position | undefined,
  near: boolean,
  digits: number,
  scale: number | undefined,
): PoleReport {
  const amplitude = p.amplitudes[p.amplitudes.length - 1];
  const role = p.role !== undefined ? 'doublet' : near ? 'near-axis' : undefined;
  return {
    ...placeReport(p, digits, scale),
    ...(error === undefined
      ? {}
      : { error: { re: indicative(error.re, 2), ...(p.real ? {} : { im: indicative(error.im, 2) }) } }),
    multiplicity: p.multiplicity,
    ...(amplitude === undefined ? {} : { amplitude: complexText(amplitude, Math.min(digits, 6), p.real) }),
    ...(role === undefined ? {} : { note: role }),
  };
}
