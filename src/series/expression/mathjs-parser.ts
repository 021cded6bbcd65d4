/**
 * @module mathjs as a parser, and as nothing else: its tree is copied into our own over a list of allowed nodes, and no
 * number is ever computed by it. Loaded only when a file holds an expression, because it costs more start-up time than all
 * the rest.
 */
import { create, parseDependencies } from 'mathjs';
import type { FactoryFunctionMap, MathNode } from 'mathjs';
import { quote } from '../quote.js';
import { EXPRESSION_FORMS, ExpressionProblem } from './syntax.js';
import type { BinaryOperator, SyntaxTree } from './syntax.js';

// The published types call each dependency collection possibly undefined; the package always defines it.
// BigNumber keeps every digit of a literal; 'number' would cut it to a double.
const math = create({ parseDependencies } as FactoryFunctionMap, { number: 'BigNumber' });

/** The fields that the allowed node types carry. */
interface AnyNode extends MathNode {
  readonly value?: unknown;
  readonly name?: unknown;
  readonly op?: unknown;
  readonly implicit?: unknown;
  readonly content?: AnyNode;
  readonly fn?: AnyNode | string;
  readonly args?: readonly AnyNode[];
}

const BINARY: readonly string[] = ['+', '-', '*', '/', '^'];
const isBinary = (op: unknown): op is BinaryOperator => typeof op === 'string' && BINARY.includes(op);

function refuse(node: AnyNode): never {
  throw new ExpressionProblem(`${quote(node.toString())} is not part of an expression`, EXPRESSION_FORMS);
}

function copy(node: AnyNode): SyntaxTree {
  const args = node.args ?? [];
  const [first, second] = args;
  switch (node.type) {
    case 'ConstantNode':
      // Only literals become BigNumbers; strings, booleans and null do not.
      if (!math.isBigNumber(node.value)) return refuse(node);
      return { kind: 'number', text: node.value.toString() };
    case 'SymbolNode':
      return typeof node.name === 'string' ? { kind: 'name', name: node.name } : refuse(node);
    case 'ParenthesisNode':
      return node.content === undefined ? refuse(node) : copy(node.content);
    case 'FunctionNode':
      if (typeof node.fn !== 'object' || typeof node.fn.name !== 'string' || first === undefined || args.length !== 1)
        break;
      return { kind: 'call', name: node.fn.name, argument: copy(first) };
    case 'OperatorNode':
      if (first === undefined || node.implicit === true) break;
      if (args.length === 1 && node.op === '+') return copy(first);
      if (args.length === 1 && node.op === '-') return { kind: 'negative', of: copy(first) };
      if (args.length === 2 && second !== undefined && isBinary(node.op)) {
        return { kind: 'binary', operator: node.op, left: copy(first), right: copy(second) };
      }
      break;
    default:
      break;
  }
  return refuse(node);
}

/** The tree of an expression; throws ExpressionProblem for wrong syntax and for every node outside the allowed list. */
export function parseExpression(text: string): SyntaxTree {
  let root: AnyNode;
  try {
    // A line break would start a second statement.
    root = math.parse(text.replace(/\s+/g, ' '));
  } catch (error) {
    const place = error instanceof SyntaxError && 'char' in error ? ` at character ${String(error.char)}` : '';
    throw new ExpressionProblem(`${quote(text)} breaks off${place}`, 'a complete expression');
  }
  return copy(root);
}
