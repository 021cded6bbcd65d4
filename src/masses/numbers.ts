/**
 * @module The kinds of number that the formulas of the room run on: doubles for fits and replicas, balls for certified digits.
 *
 * Every series stands at the scale Q where it has no logarithm; its table [n][k] holds the coefficient of a(μ)^(n+1) L^k,
 * L = ln(Q²/μ²). Tables of doubles are made once for each n_l.
 */
import {
  R,
  ballField,
  branchSame,
  branchSameDouble,
  doubleField,
  exact,
  exactReal,
  log,
  sinCosPi,
  toNumberExact,
  type Ball,
  type Exact,
  type Rational,
} from '../numerics/index.js';
import { betaCoefficients, cSchemeRelation, divisorSize, scaleLogTable, type Ring } from '../qcd/index.js';
import { renormalonOf } from './asymptotic.js';
import type { SeriesInA } from './definition.js';

export type LogTable<T> = readonly (readonly T[])[];

/** The renormalon in numbers of one kind. */
export interface Shape<T> {
  /** Exponents b, b − 1, b − 2 of the kernels, one for each c_k. */
  readonly exponents: readonly Rational[];
  readonly c: readonly T[];
  /** 2π/β_0. */
  readonly t: T;
  /** cot(πb). */
  readonly cot: T;
  /** a = k_1 a_g + k_2 a_g² + …, a_g the geometric coupling over 4π. */
  readonly geometric: readonly T[];
}

export interface Numbers<T> {
  readonly ring: Ring<T>;
  readonly fourPi: T;
  table(series: SeriesInA, light: number): LogTable<T>;
  shape(light: number): Shape<T>;
  log(x: T): T;
  /** PV ∫_0^∞ e^(−xv) (1−v)^(−1−b) dv and its imaginary part above the axis. */
  kernel(b: Rational, x: T): { readonly pv: T; readonly im: T };
}

/** Something for each n_l (and name), made once. */
function keeper<T>(make: (light: number, name: string) => T): (light: number, name?: string) => T {
  const kept = new Map<string, T>();
  return (light, name = '') => {
    const key = `${light} ${name}`;
    const found = kept.get(key) ?? make(light, name);
    kept.set(key, found);
    return found;
  };
}

const tables = new Map<string, LogTable<Exact>>();

/** The table of a series in exact numbers. */
export function exactLogTable(series: SeriesInA, light: number): LogTable<Exact> {
  const key = `${light} ${series.key}`;
  const table =
    tables.get(key) ??
    scaleLogTable({ coefficients: series.coefficients(light), firstPower: 1 }, betaCoefficients(light));
  tables.set(key, table);
  return table;
}

const exactShape = keeper((light): Shape<Exact> => {
  const { b, t, c } = renormalonOf(light);
  const cot = exactReal((prec) => {
    const { sin, cos } = sinCosPi(R.fromRational(b, prec + 8), prec + 8);
    return R.div(cos, sin, prec + 8);
  });
  return {
    exponents: c.map((_, k) => b.sub(exact(k).rational ?? b)),
    c,
    t,
    cot,
    geometric: cSchemeRelation(light, '4*pi', exact(0)),
  };
});

function mapShape<T>(shape: Shape<Exact>, map: (x: Exact) => T): Shape<T> {
  const { exponents, c, t, cot, geometric } = shape;
  return { exponents, c: c.map(map), t: map(t), cot: map(cot), geometric: geometric.map(map) };
}

const mapTable = <T>(table: LogTable<Exact>, map: (x: Exact) => T): T[][] => table.map((row) => row.map(map));

const doubleTables = new Map<string, LogTable<number>>();

function doubleTable(series: SeriesInA, light: number): LogTable<number> {
  const key = `${light} ${series.key}`;
  const table = doubleTables.get(key) ?? mapTable(exactLogTable(series, light), toNumberExact);
  doubleTables.set(key, table);
  return table;
}

const doubleShape = keeper((light) => mapShape(exactShape(light), toNumberExact));

export const DOUBLES: Numbers<number> = {
  ring: doubleField,
  fourPi: 4 * Math.PI,
  table: doubleTable,
  shape: doubleShape,
  log: Math.log,
  kernel: (b, x) => branchSameDouble(b.toNumber(), x),
};

/** Doubles with the last coefficients moved: by so many units of a^4 for the series of these keys. */
export function shiftedDoubles(moves: ReadonlyMap<string, number>): Numbers<number> {
  return {
    ...DOUBLES,
    table(series, light) {
      const table = doubleTable(series, light);
      const move = moves.get(series.key);
      if (move === undefined) return table;
      const last = table.length - 1;
      return table.map((row, n) => (n === last ? row.map((c, k) => (k === 0 ? c + move : c)) : row));
    },
  };
}

/** Balls of about `prec` bits. */
export function ballNumbers(prec: number): Numbers<Ball> {
  const ball = (x: Exact): Ball => x.ball(prec);
  return {
    ring: ballField(prec),
    fourPi: divisorSize('4*pi').ball(prec),
    table: (series, light) => mapTable(exactLogTable(series, light), ball),
    shape: (light) => mapShape(exactShape(light), ball),
    log: (x) => log(x, prec),
    kernel: (b, x) => branchSame(b, x, prec),
  };
}
