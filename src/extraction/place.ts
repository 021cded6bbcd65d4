/**
 * @module Where a series stands for a value of the unknown: its coupling, its hard scale, and what multiplies it.
 *
 *   alpha_s     the unknown is the coupling itself, at the series' own scale (or at M_Z, for a common fit)
 *   mass        X = norm · m^P · R(α_s(m)): the unknown is m = m(m), which is the hard scale as well
 *   pole-mass   X = m · R(α_s(m)) at a given m
 *   condensate  R at a given coupling
 */
import { Rational, exact, toNumberExact } from '../numerics/index.js';
import type { Exact } from '../numerics/index.js';
import { INPUTS, evolvePath, isRefusal, refuse } from '../qcd/index.js';
import type { PathStep, Refusal, Threshold } from '../qcd/index.js';
import type { Series } from '../series/index.js';
import { couplingScheme, hardScaleOf, schemeText } from '../studies/index.js';
import { isDefinitionName } from '../masses/index.js';
import type { SeriesShifts } from './stage.js';
import { coefficientDrift } from './threshold-mass.js';
import type { Datum, Problem, Quantity } from './problem.js';

/** Everything an error budget shifts, as changes from the central values. */
export interface Shifts extends SeriesShifts {
  /** Added to α_s(M_Z), or to the coupling that was given in its place. */
  readonly alphaS?: number;
  /** Added to the threshold masses, in their order; a crossing scale moves with its mass. */
  readonly thresholds?: readonly number[];
  /** Added to the condensates, in their order. */
  readonly condensates?: readonly number[];
  readonly norm?: number;
  /** Added to m(m) behind a pole mass. */
  readonly mass?: number;
  /** Added to R: what truncation or ambiguity leave open. */
  readonly remainder?: number;
}

export interface Place {
  /** The coupling at the file's own renormalisation scale. */
  readonly alpha: Exact;
  /** Hard scale in GeV, where the file has one. */
  readonly Q?: number;
  /** X = factor · (R + power corrections). */
  readonly factor: number;
  /** How the coupling was reached. */
  readonly steps: readonly PathStep[];
  /** Where the coefficients themselves depend on the unknown: their change from the series as it stands. */
  readonly drift?: readonly number[];
}

export type PlaceOf = (unknown: Exact, shifts: Shifts) => Place | Refusal;

/** Where α_s(M_Z) stands. */
export const MZ = { scale: Number(INPUTS.MZ.value), flavours: 5 } as const;

/** An exact number from a decimal or p/q. */
export const exactOf = (q: Quantity): Exact => exact(Rational.parse(q.value) ?? Rational.fromNumber(Number(q.value)));
export const numberOf = (q: Quantity): number => toNumberExact(exactOf(q));
const fromDouble = (x: number): Exact => exact(Rational.fromNumber(x));

/** The thresholds with shifted masses. */
export function shiftedThresholds(list: readonly Threshold[], by: readonly number[] | undefined): readonly Threshold[] {
  if (by === undefined) return list;
  return list.map((t, i) => {
    const mass = t.mass + (by[i] ?? 0);
    return { ...t, mass, ...(t.scale === undefined ? {} : { scale: (t.scale * mass) / t.mass }) };
  });
}

/** Hard scale in GeV: the datum's, else the file's; undefined when there is none. */
export function hardScale(series: Series, datum: Datum): number | undefined {
  if (datum.scale !== undefined) return datum.scale;
  const found = hardScaleOf(series);
  return isRefusal(found) ? undefined : toNumberExact(found);
}

const ratioOf = (series: Series): number => (series.scaleRatio === undefined ? 1 : toNumberExact(series.scaleRatio));

/** Why α_s(M_Z) says nothing about this series; undefined when it does. */
export function notMSbar(series: Series): Refusal | undefined {
  const scheme = couplingScheme(series);
  if (isRefusal(scheme)) return scheme;
  if (scheme.kind !== 'MSbar') {
    return refuse(
      `${series.id} is in the coupling of "${schemeText(scheme)}", and α_s(M_Z) is MSbar`,
      'give the coupling of the series with --at, or bring it to MSbar: leastterm rewrite SERIES --coupling MSbar',
    );
  }
  if (series.flavours === undefined) {
    return refuse(
      `${series.id} does not say its number of flavours`,
      'write "flavours: 3" into its file, or give --flavours',
    );
  }
  return undefined;
}

export const noScale = (series: Series): Refusal =>
  refuse(
    `${series.id} has no hard scale: it does not say at which Q it was measured`,
    'give it: --scale-of-measurement 1.777GeV, or leave α_s where it is: --to none',
  );

/** A mass this near to that of a threshold is the mass of that quark: within this factor. Heuristic. */
const SAME_QUARK = 1.3;

/** The quark whose mass is extracted, by the mass that the series was made for. */
function ownQuark(problem: Problem, series: Series, { threshold }: Datum): string | undefined {
  const found = hardScaleOf(series);
  const about = threshold?.reference ?? (isRefusal(found) ? undefined : toNumberExact(found));
  if (about === undefined) return undefined;
  return problem.thresholds.find((t) => Math.abs(Math.log(t.mass / about)) < Math.log(SAME_QUARK))?.name;
}

/** The coupling of a series at a hard scale, from α_s(M_Z); the threshold of `own` lies at that scale. */
function fromMZ(
  series: Series,
  problem: Problem,
  alphaMZ: number,
  Q: number,
  shifts: Shifts,
  own?: string,
): Place | Refusal {
  const to = { scale: Q * ratioOf(series), flavours: series.flavours ?? MZ.flavours };
  const thresholds = shiftedThresholds(problem.thresholds, shifts.thresholds).map((t): Threshold => {
    if (t.name !== own) return t;
    const { scale: _scale, ...rest } = t;
    return { ...rest, mass: Q };
  });
  const end = evolvePath({ alpha: alphaMZ, from: MZ, to, options: { loops: problem.loops, thresholds } });
  return isRefusal(end) ? end : { alpha: fromDouble(end.alpha), Q, factor: 1, steps: end.steps };
}

const withQ = (Q: number | undefined): { Q?: number } => (Q === undefined ? {} : { Q });

/** The place of a datum; a refusal where the question has no meaning for its series. */
export function placeOf(problem: Problem, series: Series, datum: Datum, common: boolean): PlaceOf | Refusal {
  const Q = hardScale(series, datum);
  switch (problem.for) {
    case 'alpha_s': {
      if (!common) return (alpha) => ({ alpha, ...withQ(Q), factor: 1, steps: [] });
      const bad = notMSbar(series);
      if (bad !== undefined) return bad;
      if (Q === undefined) return noScale(series);
      return (alpha, shifts) => fromMZ(series, problem, toNumberExact(alpha), Q, shifts);
    }
    case 'condensate':
      return givenCoupling(problem, series, Q);
    case 'mass':
      return datum.massPower === 0 ? givenCoupling(problem, series, Q) : massPlace(problem, series, datum);
    case 'pole-mass':
      return massPlace(problem, series, datum);
  }
}

/** The coupling is an input. */
function givenCoupling(problem: Problem, series: Series, Q: number | undefined): PlaceOf | Refusal {
  const { coupling, alphaS } = problem;
  if (coupling !== undefined) {
    const central = exactOf(coupling);
    return (_, { alphaS: by = 0 }) => ({
      alpha: by === 0 ? central : fromDouble(toNumberExact(central) + by),
      ...withQ(Q),
      factor: 1,
      steps: [],
    });
  }
  if (alphaS === undefined) return refuse('the coupling is missing', 'give --at or --alpha-s-mz');
  const bad = notMSbar(series);
  if (bad !== undefined) return bad;
  if (Q === undefined) return noScale(series);
  return (_, shifts) => fromMZ(series, problem, numberOf(alphaS) + (shifts.alphaS ?? 0), Q, shifts);
}

/** The coefficients of a threshold mass move with m(m); undefined for a series that stands as it is. */
function driftOf({ threshold }: Datum): ReturnType<typeof coefficientDrift> | undefined | Refusal {
  if (threshold === undefined) return undefined;
  const { definition, scale, light, reference } = threshold;
  if (!isDefinitionName(definition)) return refuse(`there is no mass definition "${definition}"`, 'give one by --from');
  return coefficientDrift({ place: { definition, ...(scale === undefined ? {} : { scale }) }, light }, reference);
}

function massPlace(problem: Problem, series: Series, datum: Datum): PlaceOf | Refusal {
  const { alphaS, mass } = problem;
  const { massPower = 1, norm } = datum;
  if (alphaS === undefined) return refuse('the coupling behind the mass is missing', "give --alpha-s-mz '0.1180(9)'");
  const bad = notMSbar(series);
  if (bad !== undefined) return bad;
  const centralNorm = norm === undefined ? 1 : numberOf(norm);
  const own = ownQuark(problem, series, datum);
  const drifting = driftOf(datum);
  if (isRefusal(drifting)) return drifting;
  const fixed = problem.for === 'pole-mass' && mass !== undefined ? mass : undefined;
  return (unknown, shifts) => {
    const m = fixed === undefined ? toNumberExact(unknown) : numberOf(fixed) + (shifts.mass ?? 0);
    const place = fromMZ(series, problem, numberOf(alphaS) + (shifts.alphaS ?? 0), m, shifts, own);
    if (isRefusal(place)) return place;
    const drift = drifting?.(m);
    if (isRefusal(drift)) return drift;
    return {
      ...place,
      factor: (centralNorm + (shifts.norm ?? 0)) * m ** massPower,
      ...(drift === undefined ? {} : { drift }),
    };
  };
}

/** x = α/divisor as a double. */
export const variableOf = (alpha: Exact, divisor: Exact): number => toNumberExact(alpha) / toNumberExact(divisor);

/** "GeV", "GeV^4". */
export const powerOfGeV = (dimension: number): string => (dimension === 1 ? 'GeV' : `GeV^${dimension}`);
