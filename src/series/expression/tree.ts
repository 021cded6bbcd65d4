/**
 * @module The tree of an expression whose names mean something to the caller: series to be combined, or the symbols of a
 * coefficient. The parser is loaded when the first tree is asked for.
 */
import { LIMITS, grouped } from '../limits.js';
import type { NumberProblem } from '../number-text.js';
import { ExpressionProblem } from './syntax.js';
import type { SyntaxTree } from './syntax.js';

/** Deepest nesting of brackets in a text: what a recursive walk will have to bear. */
function depthOf(text: string): number {
  let depth = 0;
  let deepest = 0;
  for (const sign of text) {
    if (sign === '(') depth++;
    else if (sign === ')') depth--;
    deepest = Math.max(deepest, depth);
  }
  return deepest;
}

/**
 * The tree of `text`, built of numbers, names, + - * / ^, parentheses and functions of one argument; or what is wrong.
 * Names and functions are not looked up.
 */
export async function parseTree(text: string): Promise<SyntaxTree | NumberProblem> {
  if (text.length > LIMITS.expressionLength) {
    return {
      problem: `an expression of ${grouped(text.length)} characters`,
      wanted: `at most ${grouped(LIMITS.expressionLength)}`,
    };
  }
  if (depthOf(text) > LIMITS.expressionDepth) {
    return { problem: `more than ${LIMITS.expressionDepth} nested parentheses`, wanted: 'a flatter expression' };
  }
  const { parseExpression } = await import('./mathjs-parser.js');
  try {
    return parseExpression(text);
  } catch (error) {
    if (error instanceof ExpressionProblem) return { problem: error.found, wanted: error.wanted };
    throw error;
  }
}
