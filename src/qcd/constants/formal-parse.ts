/**
 * @module Reads constants in the notation of the papers: + − * / ^ ( ), integers, decimals and symbols.
 * Division only by rational numbers, powers only by non-negative integers: the result is always a polynomial.
 */
import { Rational } from '../../numerics/index.js';
import {
  FORMAL_ZERO,
  addFormal,
  formalRational,
  formalSymbol,
  mulFormal,
  negFormal,
  powFormal,
  rationalOfFormal,
  scaleFormal,
  type Formal,
} from './formal.js';

const TOKEN = /\s*(?:(\d+(?:\.\d+)?)|([A-Za-z]\w*)|([-+*/^()]))/y;

function tokens(text: string): string[] {
  const found: string[] = [];
  TOKEN.lastIndex = 0;
  while (TOKEN.lastIndex < text.trimEnd().length) {
    const at = TOKEN.lastIndex;
    const m = TOKEN.exec(text);
    if (m === null) throw new SyntaxError(`constant "${text}": cannot read on from position ${at}`);
    found.push(m[1] ?? m[2] ?? m[3] ?? '');
  }
  return found;
}

/** Parses one constant. Throws SyntaxError: the texts are part of the program, not of the user's input. */
export function parseFormal(text: string): Formal {
  const list = tokens(text);
  let at = 0;
  const peek = (): string | undefined => list[at];
  const fail = (what: string): never => {
    throw new SyntaxError(`constant "${text}": ${what}`);
  };

  function primary(): Formal {
    const token = list[at++] ?? fail('ends too early');
    if (token === '(') {
      const inner = sum();
      if (list[at++] !== ')') fail('a bracket is not closed');
      return inner;
    }
    if (/^\d/.test(token)) return formalRational(Rational.parse(token) ?? fail(`"${token}" is not a number`));
    if (/^[A-Za-z]/.test(token)) return formalSymbol(token);
    return fail(`unexpected "${token}"`);
  }

  function power(): Formal {
    const base = primary();
    if (peek() !== '^') return base;
    at++;
    const exponent = Number(list[at++]);
    if (!Number.isInteger(exponent)) fail('powers must be integers');
    return powFormal(base, exponent);
  }

  function product(): Formal {
    let result = power();
    for (let op = peek(); op === '*' || op === '/'; op = peek()) {
      at++;
      const right = power();
      if (op === '*') result = mulFormal(result, right);
      else result = scaleFormal(result, (rationalOfFormal(right) ?? fail('division by a symbol')).inv());
    }
    return result;
  }

  function sum(): Formal {
    let result = FORMAL_ZERO;
    let sign = peek();
    if (sign === '+' || sign === '-') at++;
    else sign = '+';
    for (;;) {
      const term = product();
      result = addFormal(result, sign === '-' ? negFormal(term) : term);
      sign = peek();
      if (sign !== '+' && sign !== '-') return result;
      at++;
    }
  }

  const result = sum();
  if (at !== list.length) fail(`unexpected "${list[at] ?? ''}"`);
  return result;
}
