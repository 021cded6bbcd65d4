/** @module The shape of an expression once it is parsed, and what a wrong one is told. */

export type BinaryOperator = '+' | '-' | '*' | '/' | '^';

export type SyntaxTree =
  | { readonly kind: 'number'; readonly text: string }
  | { readonly kind: 'name'; readonly name: string }
  | { readonly kind: 'call'; readonly name: string; readonly argument: SyntaxTree }
  | { readonly kind: 'negative'; readonly of: SyntaxTree }
  | {
      readonly kind: 'binary';
      readonly operator: BinaryOperator;
      readonly left: SyntaxTree;
      readonly right: SyntaxTree;
    };

/** Turns checked text into a tree; throws ExpressionProblem. */
export type ParseExpression = (text: string) => SyntaxTree;

/** What is wrong with an expression. Thrown inside this folder only; the reader turns it into a Problem. */
export class ExpressionProblem extends Error {
  readonly found: string;
  readonly wanted: string;

  constructor(found: string, wanted: string) {
    super(`${found}; wanted ${wanted}`);
    this.found = found;
    this.wanted = wanted;
  }
}

export const FUNCTIONS: readonly string[] = ['zeta', 'log', 'sqrt'];
export const CONSTANTS: readonly string[] = ['pi', 'gamma_euler', 'li4_half', 'nf'];
export const EXPRESSION_FORMS =
  'numbers, + - * / ^, parentheses, pi, zeta(n), log(x), sqrt(x), gamma_euler, li4_half, nf';
