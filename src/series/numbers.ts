/**
 * @module Values of the numbers in a file: plain ones read here, expressions handed to the parser (when it is loaded) and
 * evaluated in the file's own scope.
 */
import { R, Rational, exact } from '../numerics/index.js';
import type { Exact } from '../numerics/index.js';
import { evaluate } from './expression/evaluate.js';
import type { Scope } from './expression/evaluate.js';
import { scanExpression } from './expression/scan.js';
import { ExpressionProblem } from './expression/syntax.js';
import type { ParseExpression } from './expression/syntax.js';
import { LIMITS } from './limits.js';
import { isNumberProblem, numberCost, plainSigns } from './number-text.js';
import type { NumberProblem } from './number-text.js';
import { quote } from './quote.js';
import { PLUS_MINUS, readNumber } from './uncertain.js';
import type { ReadNumber } from './uncertain.js';
import { textOf, written } from './written.js';
import type { Written } from './written.js';

/** Thrown in place of a value when an expression is met and the parser is not there yet. */
export const PARSER_NEEDED: NumberProblem = { problem: 'an expression', wanted: 'its parser' };

/** A named constant: its text, and its value once it was asked for. */
interface Constant {
  readonly text: string;
  state: 'untouched' | 'in work' | 'done';
  value?: Exact | NumberProblem;
}

export class Numbers implements Scope {
  /** True once an expression was met without a parser at hand. */
  parserWanted = false;
  /** True once nf was asked for. */
  flavoursUsed = false;
  flavours: number | undefined;
  private readonly parse: ParseExpression | undefined;
  private readonly constants = new Map<string, Constant>();
  private work = 0;

  constructor(parse: ParseExpression | undefined) {
    this.parse = parse;
  }

  define(name: string, text: string): void {
    this.constants.set(name, { text, state: 'untouched' });
  }

  /** A number or an expression without an error. */
  exact(text: string): Written | NumberProblem {
    const read = this.number(text);
    if (read !== undefined) {
      if (isNumberProblem(read)) return read;
      if (read.error !== undefined)
        return { problem: `${quote(text)} has an error`, wanted: 'a number without an error' };
      return written(read.value, read.text);
    }
    return this.expression(text.trim());
  }

  /** A number with an optional error; the value may be an expression, as in `11 - 2*nf/3 +- 0.1`. */
  uncertain(text: string): ReadNumber | NumberProblem {
    const read = this.number(text);
    if (read !== undefined)
      return isNumberProblem(read) ? read : { ...read, value: written(read.value, textOfValue(read)) };
    const sides = text.split(PLUS_MINUS).map((side) => side.trim());
    if (sides.length === 2) {
      const value = this.expression(sides[0]!);
      if (isNumberProblem(value)) return value;
      const error = this.error(sides[1]!);
      return isNumberProblem(error) ? error : { value, error: { plus: error, minus: error }, text: text.trim() };
    }
    const value = this.expression(text.trim());
    return isNumberProblem(value) ? value : { value, text: value.text };
  }

  /** An error: a number or expression >= 0; one that is not rational is replaced by a rational just above it. */
  error(text: string): Rational | NumberProblem {
    const value = this.exact(text);
    if (isNumberProblem(value)) return value;
    const upper = value.rational ?? upperBound(value);
    return upper.sign() < 0
      ? { problem: `a negative error ${quote(text.trim())}`, wanted: 'an error of 0 or more' }
      : upper;
  }

  private number(text: string): ReadNumber | NumberProblem | undefined {
    try {
      if (text.length <= LIMITS.numberLength) this.spend(numberCost(text));
    } catch (problem) {
      return asNumberProblem(problem);
    }
    return readNumber(text);
  }

  private expression(raw: string): Written | NumberProblem {
    const text = plainSigns(raw);
    try {
      this.spend(text.length * LIMITS.workPerCharacter);
      scanExpression(text, this.constants);
      if (this.parse === undefined) {
        this.parserWanted = true;
        return PARSER_NEEDED;
      }
      return written(evaluate(this.parse(text), this), text);
    } catch (problem) {
      return asNumberProblem(problem);
    }
  }

  /** Value of a named constant, worked out when it is first asked for. */
  constant(name: string): Exact | NumberProblem {
    const constant = this.constants.get(name);
    if (constant === undefined) return { problem: `unknown name ${quote(name)}`, wanted: 'a name from "constants"' };
    if (constant.state === 'in work')
      return {
        problem: `a constant ${quote(name)} that refers to itself`,
        wanted: 'constants that can be worked out one by one',
      };
    if (constant.state === 'untouched') {
      constant.state = 'in work';
      constant.value = this.exact(constant.text);
      constant.state = 'done';
    }
    return constant.value!;
  }

  lookup(name: string): Exact {
    if (name === 'nf') {
      this.flavoursUsed = true;
      if (this.flavours === undefined)
        throw new ExpressionProblem('nf without a number of flavours', 'a field "flavours"');
      return exact(this.flavours);
    }
    const known = this.constants.get(name)?.state === 'done';
    const value = this.constant(name);
    if (!isNumberProblem(value)) return value;
    if (known)
      throw new ExpressionProblem(`the constant ${quote(name)}, which is wrong itself`, 'that constant mended');
    throw new ExpressionProblem(value.problem, value.wanted);
  }

  spend(amount: number): void {
    this.work += amount;
    if (this.work > LIMITS.work) {
      throw new ExpressionProblem(
        'more exact arithmetic in this file than is allowed',
        'shorter numbers (decimals of fewer digits)',
      );
    }
  }
}

function asNumberProblem(problem: unknown): NumberProblem {
  if (problem instanceof ExpressionProblem) return { problem: problem.found, wanted: problem.wanted };
  throw problem;
}

/** The value without its error, as text. */
const textOfValue = (read: ReadNumber): string => (read.error === undefined ? read.text : textOf(read.value));

/** A rational with 20 digits just above a non-rational value. */
function upperBound(value: Exact): Rational {
  const ball = value.ball(80);
  const top = R.midpoint(ball).add(Rational.fromNumber(Math.max(R.radiusToNumber(ball), 0)));
  const scale = 10n ** 20n;
  return Rational.of(top.mul(Rational.of(scale)).floor() + 1n, scale);
}
