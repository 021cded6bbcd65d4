/** @module Decoupling tables for a given number of light flavours: in doubles, exactly, or with every symbol kept. */
import { Rational, doubleField, toNumberExact, type Exact } from '../../numerics/index.js';
import { liftExact, type Ring } from '../algebra/ring.js';
import {
  BETA,
  DECOUPLING_ALPHA,
  DECOUPLING_MASS,
  MASS_DIMENSION,
  POLE_OVER_MSBAR,
  addFormal,
  exactOfFormal,
  formalOf,
  formalRational,
  formalRing,
  formalSymbol,
  scaleFormal,
  substituteFormal,
  type Formal,
  type PublishedConstant,
} from '../constants/index.js';
import { MATCHING_ORDER, matchingTable, type HeavyMass, type MatchingConstants, type MatchingTable } from './logs.js';

export type MatchedQuantity = 'coupling' | 'mass';

const LIST_LENGTH = 5;

/** The ingredients as exact polynomials, nl a number or the symbol itself. */
function ingredients(nl: Formal): MatchingConstants<Formal> {
  const heavy = addFormal(nl, formalRational(Rational.ONE));
  const inPi = (list: readonly PublishedConstant[], nf: Formal): Formal[] =>
    list.map((c, k) => scaleFormal(substituteFormal(formalOf(c), { nf }), Rational.of(1, 4 ** (k + 1))));
  const oneAnd = (list: readonly PublishedConstant[]): Formal[] => [
    formalRing.one,
    ...list.map((c) => substituteFormal(formalOf(c), { nl })),
  ];
  return {
    betaHeavy: inPi(BETA, heavy),
    betaLight: inPi(BETA, nl),
    gammaHeavy: inPi(MASS_DIMENSION, heavy),
    gammaLight: inPi(MASS_DIMENSION, nl),
    coupling: oneAnd(DECOUPLING_ALPHA),
    mass: oneAnd(DECOUPLING_MASS),
    pole: oneAnd(POLE_OVER_MSBAR),
  };
}

const NAMES = ['betaHeavy', 'betaLight', 'gammaHeavy', 'gammaLight', 'coupling', 'mass', 'pole'] as const;

/** The table with nl, l and the constants as symbols: for comparison with the published forms. */
export const formalTable = (quantity: MatchedQuantity, mass: HeavyMass): MatchingTable<Formal> =>
  matchingTable(formalRing, ingredients(formalSymbol('nl')), quantity, mass);

/** The ingredients for a number nl, with π and the ζ values as symbols. */
export const formalConstants = (nl: number): MatchingConstants<Formal> => ingredients(formalRational(Rational.of(nl)));

/** The table for a number nl, with l and the constants as symbols. */
export const formalTableAt = (nl: number, quantity: MatchedQuantity, mass: HeavyMass): MatchingTable<Formal> =>
  matchingTable(formalRing, formalConstants(nl), quantity, mass);

const doubles = new Map<string, MatchingTable<number>>();

/** The table in doubles, computed once for each nl. */
export function doubleTable(nl: number, quantity: MatchedQuantity, mass: HeavyMass): MatchingTable<number> {
  const key = `${nl} ${quantity} ${mass}`;
  let table = doubles.get(key);
  if (table === undefined) {
    const constants = matchingConstants(matchingInputs(nl).map(toNumberExact));
    table = matchingTable(doubleField, constants, quantity, mass);
    doubles.set(key, table);
  }
  return table;
}

/** The ingredients as one flat list of exact numbers, for formulas over any ring. */
export function matchingInputs(nl: number): readonly Exact[] {
  const formal = ingredients(formalRational(Rational.of(nl)));
  return NAMES.flatMap((name) => formal[name].map(exactOfFormal));
}

/** The same list put back into its parts. */
export function matchingConstants<T>(flat: readonly T[]): MatchingConstants<T> {
  const list = (name: (typeof NAMES)[number]): readonly T[] => {
    const i = NAMES.indexOf(name);
    return flat.slice(i * LIST_LENGTH, (i + 1) * LIST_LENGTH);
  };
  return {
    betaHeavy: list('betaHeavy'),
    betaLight: list('betaLight'),
    gammaHeavy: list('gammaHeavy'),
    gammaLight: list('gammaLight'),
    coupling: list('coupling'),
    mass: list('mass'),
    pole: list('pole'),
  };
}

const exactTables = new Map<string, MatchingTable<Exact>>();

/** The table in exact numbers, kept: rational entries stay rational. */
export function exactTable(nl: number, quantity: MatchedQuantity, mass: HeavyMass): MatchingTable<Exact> {
  const key = `${nl} ${quantity} ${mass}`;
  let table = exactTables.get(key);
  if (table === undefined) {
    table = createExactTable(nl, quantity, mass);
    exactTables.set(key, table);
  }
  return table;
}

function createExactTable(nl: number, quantity: MatchedQuantity, mass: HeavyMass): MatchingTable<Exact> {
  // Row k has at most k + 1 powers of l; the flat list keeps the shape whatever the ring.
  const flat = liftExact(matchingInputs(nl), <T>(ring: Ring<T>, x: readonly T[]): T[] => {
    const parts = matchingTable(ring, matchingConstants(x), quantity, mass);
    return parts.flatMap((row, k) => Array.from({ length: k + 1 }, (_, j) => row[j] ?? ring.zero));
  });
  return Array.from({ length: MATCHING_ORDER + 1 }, (_, k) => flat.slice((k * (k + 1)) / 2, ((k + 1) * (k + 2)) / 2));
}
