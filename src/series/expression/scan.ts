/**
 * @module First look at an expression, before any parser sees it.
 * Purpose: general parsers accept a great deal that a physicist did not mean (`0.1180(9)` as a product, `10%`, `2 cm`,
 * `1_000`, `e` and `i` as constants). Everything outside the small language is turned away here, with its reason.
 */
import { LIMITS, grouped } from '../limits.js';
import { suggestion } from '../nearest.js';
import { quote } from '../quote.js';
import { CONSTANTS, EXPRESSION_FORMS, ExpressionProblem, FUNCTIONS } from './syntax.js';

interface Token {
  readonly kind: 'number' | 'name' | 'function' | 'sign' | 'open' | 'close';
  readonly text: string;
}

const TOKEN = /\s*(?:((?:\d+(?:\.\d*)?|\.\d+)(?:[eE][+-]?\d+)?)|([A-Za-z_][A-Za-z0-9_]*)|([-+*/^])|(\()|(\)))/y;

/** The file's own constants. */
type Names = ReadonlyMap<string, unknown>;

/** Names people type for what is called otherwise here. */
const OTHER_NAMES: ReadonlyMap<string, string> = new Map([
  ['ln', 'log'],
  ['Log', 'log'],
  ['z2', 'zeta(2)'],
  ['z3', 'zeta(3)'],
  ['z5', 'zeta(5)'],
  ['z7', 'zeta(7)'],
  ['zeta2', 'zeta(2)'],
  ['zeta3', 'zeta(3)'],
  ['zeta5', 'zeta(5)'],
  ['gamma', 'gamma_euler'],
  ['gammaE', 'gamma_euler'],
  ['EulerGamma', 'gamma_euler'],
  ['Pi', 'pi'],
  ['PI', 'pi'],
  ['n_f', 'nf'],
  ['Nf', 'nf'],
  ['NF', 'nf'],
  ['a4', 'li4_half'],
]);

function tokens(text: string, names: Names): Token[] {
  const list: Token[] = [];
  TOKEN.lastIndex = 0;
  let end = 0;
  for (let m = TOKEN.exec(text); m !== null; m = TOKEN.exec(text)) {
    end = TOKEN.lastIndex;
    const [, number, name, sign, open, close] = m;
    if (number !== undefined) list.push({ kind: 'number', text: number });
    else if (name !== undefined) list.push({ kind: nameKind(name, names), text: name });
    else if (sign !== undefined) list.push({ kind: 'sign', text: sign });
    else list.push(open === undefined ? { kind: 'close', text: close! } : { kind: 'open', text: open });
  }
  const rest = text.slice(end).trimStart();
  if (rest !== '') {
    throw new ExpressionProblem(
      `${quote(String.fromCodePoint(rest.codePointAt(0)!))} in ${quote(text)}`,
      EXPRESSION_FORMS,
    );
  }
  return list;
}

function nameKind(name: string, names: Names): 'name' | 'function' {
  if (FUNCTIONS.includes(name)) return 'function';
  if (CONSTANTS.includes(name) || names.has(name)) return 'name';
  const other = OTHER_NAMES.get(name);
  const hint =
    other === undefined ? suggestion(name, [...FUNCTIONS, ...CONSTANTS, ...names.keys()]) : ` (write ${other})`;
  throw new ExpressionProblem(`unknown name ${quote(name)}${hint}`, `${EXPRESSION_FORMS}, or a name from "constants"`);
}

const beginsValue = (t: Token): boolean => t.kind !== 'sign' && t.kind !== 'close';
const endsValue = (t: Token): boolean => t.kind === 'number' || t.kind === 'name' || t.kind === 'close';

function neighbours(before: Token, after: Token): void {
  if (endsValue(before) && beginsValue(after)) {
    throw new ExpressionProblem(
      `no operator between ${quote(before.text)} and ${quote(after.text)}`,
      'every product written with *, and an error written as 0.25(3) on a plain number only',
    );
  }
  if (before.kind === 'function' && after.kind !== 'open') {
    throw new ExpressionProblem(`${quote(before.text)} without parentheses`, `${before.text}(…)`);
  }
  if (before.kind === 'sign' && /[-+]/.test(before.text) && /[-+]/.test(after.text) && after.kind === 'sign') {
    throw new ExpressionProblem(`two signs in a row, ${quote(before.text + after.text)}`, 'one sign, or parentheses');
  }
}

/** Throws ExpressionProblem unless `text` consists of the words of the language in a plausible order. */
export function scanExpression(text: string, names: Names): void {
  if (text.length > LIMITS.expressionLength) {
    throw new ExpressionProblem(
      `an expression of ${grouped(text.length)} characters`,
      `at most ${grouped(LIMITS.expressionLength)}`,
    );
  }
  const list = tokens(text, names);
  let depth = 0;
  list.forEach((token, i) => {
    if (i > 0) neighbours(list[i - 1]!, token);
    if (token.kind === 'open') depth++;
    if (token.kind === 'close') depth--;
    if (depth < 0) throw new ExpressionProblem(`a ")" without its "(" in ${quote(text)}`, 'balanced parentheses');
    if (depth > LIMITS.expressionDepth) {
      throw new ExpressionProblem(`more than ${LIMITS.expressionDepth} nested parentheses`, 'a flatter expression');
    }
  });
  if (depth > 0) throw new ExpressionProblem(`a "(" without its ")" in ${quote(text)}`, 'balanced parentheses');
  const last = list.at(-1);
  if (last === undefined) throw new ExpressionProblem('nothing', 'an expression');
  if (last.kind === 'sign')
    throw new ExpressionProblem(`nothing after the last ${quote(last.text)}`, 'a complete expression');
  if (last.kind === 'function') neighbours(last, last);
}
