/** @module From the tree of an expression to a power series: a walk over a short list of what is allowed. */
import { Rational, exactReal, pi, zeta } from '../../numerics/index.js';
import { formalSymbol, isRefusal, refuse } from '../../qcd/index.js';
import type { Refusal } from '../../qcd/index.js';
import type { SyntaxTree } from '../../series/index.js';
import { EVEN_ZETA } from '../derive/symbols.js';
import { trackedExact, trackedRational } from '../derive/tracked.js';
import { addTo, composed, exponential, inverse, logarithm, numberSeries, times, toPower } from './power-series.js';
import type { PowerSeries } from './power-series.js';

export const COMBINE_FUNCTIONS: readonly string[] = ['exp', 'log', 'sqrt'];
const NUMBERS: readonly string[] = ['pi', 'zeta'];

/** Words with a meaning of their own: no series can be called so. */
export const RESERVED: readonly string[] = [...COMBINE_FUNCTIONS, ...NUMBERS];

export const COMBINE_FORMS =
  'the names given by --with, numbers, + - * / ^, parentheses, exp, log, sqrt, pi, zeta(n), and f(g)';

export interface Scope {
  /** The series of a name. */
  readonly series: ReadonlyMap<string, PowerSeries>;
  /** Series for f in f(g), in the value that is put for their coupling. */
  readonly functions: ReadonlyMap<string, PowerSeries>;
}

/** Names that stand for a series, and names that are applied to one. */
export function namesIn(tree: SyntaxTree): {
  readonly used: ReadonlySet<string>;
  readonly applied: ReadonlySet<string>;
} {
  const used = new Set<string>();
  const applied = new Set<string>();
  const visit = (t: SyntaxTree): void => {
    if (t.kind === 'name') used.add(t.name);
    else if (t.kind === 'negative') visit(t.of);
    else if (t.kind === 'call') {
      applied.add(t.name);
      visit(t.argument);
    } else if (t.kind === 'binary') {
      visit(t.left);
      visit(t.right);
    }
  };
  visit(tree);
  return { used, applied };
}

/** The rational value of a subtree without names, when it has one: exponents, arguments of zeta. */
function rationalOf(tree: SyntaxTree): Rational | undefined {
  if (tree.kind === 'number') return Rational.parse(tree.text);
  if (tree.kind === 'negative') return rationalOf(tree.of)?.neg();
  if (tree.kind !== 'binary') return undefined;
  const [a, b] = [rationalOf(tree.left), rationalOf(tree.right)];
  if (a === undefined || b === undefined) return undefined;
  if (tree.operator === '+') return a.add(b);
  if (tree.operator === '-') return a.sub(b);
  if (tree.operator === '*') return a.mul(b);
  if (tree.operator === '/') return b.isZero() ? undefined : a.div(b);
  return b.isInteger() && b.abs().cmp(Rational.of(64)) <= 0 && !a.isZero() ? a.pow(Number(b.num)) : undefined;
}

/** Is the expression a sum of series with numbers in front? Then each keeps its own singularities. */
export function isLinear(tree: SyntaxTree): boolean {
  if (tree.kind === 'name' || tree.kind === 'number') return true;
  if (tree.kind === 'negative') return isLinear(tree.of);
  if (tree.kind !== 'binary') return false;
  const free = (t: SyntaxTree): boolean => namesIn(t).used.size === 0;
  const { left, right, operator } = tree;
  if (operator === '+' || operator === '-') return isLinear(left) && isLinear(right);
  if (operator === '*') return (free(left) && isLinear(right)) || (free(right) && isLinear(left));
  return operator === '/' ? free(right) && isLinear(left) : free(tree);
}

const number = (q: Rational): PowerSeries => numberSeries(trackedRational(q));

function zetaValue(argument: SyntaxTree): PowerSeries | Refusal {
  const n = rationalOf(argument);
  if (n === undefined || !n.isInteger() || n.cmp(Rational.of(2)) < 0 || n.cmp(Rational.of(1000)) > 0) {
    return refuse('zeta of something else than an integer from 2 to 1000', 'zeta(3), for example');
  }
  const k = Number(n.num);
  const form = EVEN_ZETA[k] ?? formalSymbol(`zeta(${k})`);
  return numberSeries(
    trackedExact(
      exactReal((prec) => zeta(k, prec)),
      form,
    ),
  );
}

function called(name: string, argument: SyntaxTree, scope: Scope): PowerSeries | Refusal {
  if (name === 'zeta') return zetaValue(argument);
  const inner = evaluate(argument, scope);
  if (isRefusal(inner)) return inner;
  if (name === 'exp') return exponential(inner);
  if (name === 'log') return logarithm(inner);
  if (name === 'sqrt') return toPower(inner, Rational.of(1, 2));
  const outer = scope.functions.get(name);
  return outer === undefined ? refuse(`"${name}" is not a function here`, COMBINE_FORMS) : composed(outer, inner);
}

/** The series that an expression stands for. */
export function evaluate(tree: SyntaxTree, scope: Scope): PowerSeries | Refusal {
  if (tree.kind === 'number') {
    const q = Rational.parse(tree.text);
    return q === undefined ? refuse(`"${tree.text}" is not a number`, 'a decimal number') : number(q);
  }
  if (tree.kind === 'name') {
    if (tree.name === 'pi') return numberSeries(trackedExact(exactReal(pi), formalSymbol('pi')));
    return scope.series.get(tree.name) ?? refuse(`"${tree.name}" is not defined`, `--with ${tree.name}=SERIES`);
  }
  if (tree.kind === 'call') return called(tree.name, tree.argument, scope);
  if (tree.kind === 'negative') {
    const of = evaluate(tree.of, scope);
    return isRefusal(of) ? of : times(number(Rational.of(-1)), of);
  }
  const left = evaluate(tree.left, scope);
  if (isRefusal(left)) return left;
  if (tree.operator === '^') {
    const p = rationalOf(tree.right);
    return p === undefined
      ? refuse('a power that is not a plain number', 'an integer or a fraction such as (1/2) behind ^')
      : toPower(left, p);
  }
  const right = evaluate(tree.right, scope);
  if (isRefusal(right)) return right;
  if (tree.operator === '+') return addTo(left, right, 1);
  if (tree.operator === '-') return addTo(left, right, -1);
  if (tree.operator === '*') return times(left, right);
  const over = inverse(right);
  return isRefusal(over) ? over : times(left, over);
}
