/**
 * @module Value of an expression, exactly.
 *
 * Purpose    rational when everything in it is rational; otherwise an enclosure that can be asked for any precision.
 * Method     our own walk over the tree; functions and constants are balls from the numerics room. Roots of squares,
 *            log(1) and integer powers stay rational.
 * Bound      a sum may cancel leading digits: the value as a whole is evaluated again with more bits until its ball is as
 *            sharp as was asked for (six rounds; a value that is zero stays a ball around zero).
 */
import {
  R,
  Rational,
  addExact,
  divExact,
  eulerGamma,
  exact,
  exactReal,
  log,
  mulExact,
  pi,
  polylogHalf,
  isZeroExact,
  signExact,
  subExact,
  zeta,
} from '../../numerics/index.js';
import type { Exact } from '../../numerics/index.js';
import { LIMITS, grouped } from '../limits.js';
import { isNumberProblem, parsePlain } from '../number-text.js';
import { quote } from '../quote.js';
import { ExpressionProblem } from './syntax.js';
import type { BinaryOperator, SyntaxTree } from './syntax.js';

/** Where an expression finds its names, and the allowance of exact arithmetic it draws on. */
export interface Scope {
  /** Value of nf or of one of the file's constants; throws ExpressionProblem when it has none. */
  lookup(name: string): Exact;
  /** Draws `amount` (units of LIMITS.work); throws ExpressionProblem when the allowance is used up. */
  spend(amount: number): void;
}

const BUILT_IN: ReadonlyMap<string, Exact> = new Map([
  ['pi', exactReal(pi)],
  ['gamma_euler', exactReal(eulerGamma)],
  ['li4_half', exactReal((prec) => polylogHalf(4, prec))],
]);

const bits = (n: bigint): number => n.toString(16).length * 4;
const size = (q: Rational): number => bits(q.num) + bits(q.den);
/** 19 digits are 63 bits. */
const words = (q: Rational): number => 1 + size(q) / 63;

const excessive = (): ExpressionProblem =>
  new ExpressionProblem(`a value of more than ${grouped(LIMITS.bits)} bits`, 'numbers of a moderate size');

/** |log2 |x|| for an x that is not rational, about. */
function magnitude(x: Exact): number {
  const ball = x.ball(64);
  return R.isExactZero(ball) ? 0 : Math.abs(R.upperBits(ball));
}

/** Turns away rationals of more than LIMITS.bits; others are looked at when they are raised to a power, and at the end. */
function moderate(value: Exact): Exact {
  if (value.rational !== undefined && size(value.rational) > LIMITS.bits) throw excessive();
  return value;
}

/** Re-evaluates with more bits until a cancellation is made good. */
function sharpened(value: Exact): Exact {
  if (value.rational !== undefined) return value;
  return exactReal((prec) => {
    let work = prec + 16;
    let ball = value.ball(work);
    for (let round = 0; round < 6 && R.accuracyBits(ball) < prec; round++) {
      const missing = Math.ceil(prec - R.accuracyBits(ball)) + 16;
      work += round < 2 ? Math.min(work, missing) : work;
      ball = value.ball(work);
    }
    return ball;
  });
}

function integer(value: Exact, what: string, least: number): number {
  const q = value.rational;
  if (q === undefined || !q.isInteger()) throw new ExpressionProblem(`${what} is not an integer`, 'an integer');
  const n = Number(q.num);
  if (n >= least && n <= LIMITS.power) return n;
  throw new ExpressionProblem(
    `${what} is ${quote(q.toString()).slice(1, -1)}`,
    `an integer from ${least} to ${grouped(LIMITS.power)}`,
  );
}

function power(base: Exact, exponent: Exact, scope: Scope): Exact {
  const n = integer(exponent, 'the power', -LIMITS.power);
  const q = base.rational;
  if (q === undefined) {
    if (n < 0 && signExact(base) === 0)
      throw new ExpressionProblem('a division by what cannot be told from zero', 'a divisor other than 0');
    if (Math.abs(n) > 1 && magnitude(base) * Math.abs(n) > LIMITS.bits) throw excessive();
    return exactReal((prec) => R.powInt(base.ball(prec + 16), n, prec + 8));
  }
  if (q.isZero() && n < 0) throw new ExpressionProblem('a negative power of zero', 'a base other than 0');
  if (size(q) * Math.abs(n) > LIMITS.bits) throw excessive();
  scope.spend((words(q) * Math.abs(n)) ** 2 / 16);
  return exact(q.pow(n));
}

function combine(operator: BinaryOperator, a: Exact, b: Exact, scope: Scope): Exact {
  if (operator === '^') return power(a, b, scope);
  if (operator === '/' && signExact(b) === 0) {
    const what = b.rational === undefined ? 'what cannot be told from zero' : 'zero';
    throw new ExpressionProblem(`a division by ${what}`, 'a divisor other than 0');
  }
  if (a.rational !== undefined && b.rational !== undefined) scope.spend(words(a.rational) * words(b.rational));
  // nf = 0 makes whole brackets vanish, and they must vanish exactly.
  if ((operator === '*' || operator === '/') && (isZeroExact(a) || isZeroExact(b))) return exact(0);
  if (operator === '+') return addExact(a, b);
  if (operator === '-') return subExact(a, b);
  return operator === '*' ? mulExact(a, b) : divExact(a, b);
}

/** Square root of an integer that is a perfect square. */
function rootOfSquare(n: bigint): Rational | undefined {
  const root = R.midpoint(R.sqrt(R.fromNumber(n), bits(n) + 4));
  return root.mul(root).equals(Rational.of(n)) ? root : undefined;
}

function squareRoot(x: Exact): Exact {
  const sign = signExact(x);
  if (x.rational?.isZero() === true) return x;
  if (sign <= 0)
    throw new ExpressionProblem(
      sign < 0 ? 'sqrt of a negative number' : 'sqrt of what cannot be told from zero',
      'an argument of 0 or more',
    );
  const q = x.rational;
  if (q !== undefined) {
    const num = rootOfSquare(q.num);
    const den = rootOfSquare(q.den);
    if (num !== undefined && den !== undefined) return exact(num.div(den));
  }
  return exactReal((prec) => R.sqrt(x.ball(prec + 8), prec + 8));
}

function call(name: string, x: Exact): Exact {
  if (name === 'zeta') {
    const n = integer(x, 'the argument of zeta', 2);
    return exactReal((prec) => zeta(n, prec));
  }
  if (name === 'sqrt') return squareRoot(x);
  if (name !== 'log') throw new ExpressionProblem(`${quote(name)} is not a function`, 'zeta(n), log(x) or sqrt(x)');
  if (signExact(x) <= 0) throw new ExpressionProblem('log of a number that is not positive', 'an argument above 0');
  if (x.rational?.equals(Rational.ONE) === true) return exact(0);
  return exactReal((prec) => log(x.ball(prec + 16), prec + 8));
}

function number(text: string, scope: Scope): Exact {
  const q = parsePlain(text);
  if (q === undefined) throw new ExpressionProblem(`${quote(text)} is not a number`, 'a decimal number');
  if (isNumberProblem(q)) throw new ExpressionProblem(q.problem, q.wanted);
  scope.spend(words(q));
  return exact(q);
}

/** Value of an expression; throws ExpressionProblem for divisions by zero, functions outside their range, and excessive sizes. */
export function evaluate(tree: SyntaxTree, scope: Scope): Exact {
  const value = sharpened(walk(tree, scope));
  if (value.rational === undefined && magnitude(value) > LIMITS.bits) throw excessive();
  return value;
}

function walk(tree: SyntaxTree, scope: Scope): Exact {
  switch (tree.kind) {
    case 'number':
      return moderate(number(tree.text, scope));
    case 'name':
      return BUILT_IN.get(tree.name) ?? scope.lookup(tree.name);
    case 'negative':
      return subExact(exact(0), walk(tree.of, scope));
    case 'call':
      return moderate(call(tree.name, walk(tree.argument, scope)));
    case 'binary':
      return moderate(combine(tree.operator, walk(tree.left, scope), walk(tree.right, scope), scope));
  }
}
