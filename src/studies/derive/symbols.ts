/**
 * @module Exact numbers as polynomials in π, ζ(3), log(2), …, with names that are the expressions of a series file: what is
 * computed with them can be written down again without a digit lost.
 */
import { Rational, exactReal, log, R } from '../../numerics/index.js';
import type { Exact } from '../../numerics/index.js';
import {
  FORMAL_ONE,
  FORMAL_ZERO,
  addFormal,
  exactOfFormal,
  formalRational,
  formalSymbol,
  scaleFormal,
  substituteFormal,
} from '../../qcd/index.js';
import type { Formal } from '../../qcd/index.js';
import { textOf } from '../../series/index.js';

const piTo = (power: number, over: number): Formal => ({ terms: new Map([[`pi^${power}`, Rational.of(1, over)]]) });

/** A number that has no name in a series file: by its decimals. */
const decimal = (name: string): Formal =>
  formalRational(Rational.parse(textOf(exactOfFormal(formalSymbol(name)))) ?? Rational.ZERO);

/** ζ(2), ζ(4), ζ(6) are powers of π, so that equal numbers are equal polynomials. */
export const EVEN_ZETA: Readonly<Record<number, Formal>> = { 2: piTo(2, 6), 4: piTo(4, 90), 6: piTo(6, 945) };

let names: Readonly<Record<string, Formal>> | undefined;

/** The symbols of the published constants in those of a series file. */
function fileNames(): Readonly<Record<string, Formal>> {
  names ??= {
    z2: EVEN_ZETA[2] ?? FORMAL_ZERO,
    z3: formalSymbol('zeta(3)'),
    z4: EVEN_ZETA[4] ?? FORMAL_ZERO,
    z5: formalSymbol('zeta(5)'),
    z6: EVEN_ZETA[6] ?? FORMAL_ZERO,
    z7: formalSymbol('zeta(7)'),
    ln2: formalSymbol('log(2)'),
    gE: formalSymbol('gamma_euler'),
    a4: formalSymbol('li4_half'),
    a5: decimal('a5'),
    X0: decimal('X0'),
  };
  return names;
}

/** A published constant, renamed. */
export const inFileNames = (a: Formal): Formal => substituteFormal(a, fileNames());

/** An argument that consists of these is taken apart, so that log(4) is 2 log(2) (habit). */
const SMALL_PRIMES = [2n, 3n, 5n, 7n] as const;

/** log(n) in logarithms of the small primes; undefined when another prime is in n. */
function logOfSmooth(n: bigint): Formal | undefined {
  let sum = FORMAL_ZERO;
  let rest = n;
  for (const p of SMALL_PRIMES) {
    let k = 0;
    for (; rest % p === 0n; k++) rest /= p;
    if (k > 0) sum = addFormal(sum, scaleFormal(formalSymbol(`log(${p})`), Rational.of(k)));
  }
  return rest === 1n ? sum : undefined;
}

/** log(q) for q > 0, such that log(1/q) is its negative. */
export function formalLog(q: Rational): Formal {
  const [num, den] = [logOfSmooth(q.num), logOfSmooth(q.den)];
  if (num !== undefined && den !== undefined) return addFormal(num, scaleFormal(den, Rational.of(-1)));
  const small = q.cmp(Rational.ONE) < 0;
  return scaleFormal(formalSymbol(`log(${(small ? q.inv() : q).toString()})`), Rational.of(small ? -1 : 1));
}

/** log(x) for x > 0 as a number. */
export function exactLog(x: Exact): Exact {
  if (x.rational?.equals(Rational.ONE) === true) return { rational: Rational.ZERO, ball: () => R.ZERO };
  return exactReal((prec) => log(x.ball(prec + 16), prec + 8));
}

/** divisor/(4π), with π^(−1) for the divisor 1. */
export function formalOverFourPi(divisor: '1' | 'pi' | '2*pi' | '4*pi'): Formal {
  if (divisor === '1') return { terms: new Map([['pi^-1', Rational.of(1, 4)]]) };
  return scaleFormal(FORMAL_ONE, Rational.of(divisor === 'pi' ? 1 : divisor === '2*pi' ? 2 : 4, 4));
}
