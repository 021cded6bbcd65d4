/**
 * @module The expressions of a series file as polynomials in π, ζ(3), log(2), …, so that they can be computed with and
 * written again. What does not fit (a square root in a denominator, say) has no such form, and is a number only.
 */
import { Rational } from '../../numerics/index.js';
import type { Exact } from '../../numerics/index.js';
import {
  addFormal,
  formalRational,
  formalSymbol,
  monomialsOf,
  mulFormal,
  negFormal,
  powFormal,
  rationalOfFormal,
  scaleFormal,
  subFormal,
} from '../../qcd/index.js';
import type { Formal } from '../../qcd/index.js';
import { isNumberProblem, parseTree } from '../../series/index.js';
import type { Series, SyntaxTree } from '../../series/index.js';
import { EVEN_ZETA, formalLog } from './symbols.js';

/** Polynomials of more terms are not written out (habit: nobody would read them). */
const MOST_TERMS = 200;
const HIGHEST_POWER = 64;

type Found = Formal | undefined;

const NAMES: readonly string[] = ['pi', 'gamma_euler', 'li4_half'];

/** 1/a for a single monomial. */
function inverse(a: Formal): Found {
  const [only, ...more] = monomialsOf(a);
  if (only === undefined || more.length > 0) return undefined;
  const name = [...only.powers].map(([symbol, k]) => `${symbol}^${-k}`).join('*');
  return { terms: new Map([[name.replaceAll(/\^1(?=\*|$)/g, ''), only.factor.inv()]]) };
}

function power(a: Formal, exponent: Formal): Found {
  const n = rationalOfFormal(exponent);
  if (n === undefined || !n.isInteger() || n.abs().cmp(Rational.of(HIGHEST_POWER)) > 0) return undefined;
  const k = Number(n.num);
  const base = k < 0 ? inverse(a) : a;
  return base && powFormal(base, Math.abs(k));
}

function call(name: string, argument: Formal): Found {
  const q = rationalOfFormal(argument);
  if (q === undefined || q.sign() <= 0) return undefined;
  if (name === 'log') return formalLog(q);
  if (name === 'zeta' && q.isInteger()) return EVEN_ZETA[Number(q.num)] ?? formalSymbol(`zeta(${q.num})`);
  if (name === 'sqrt') return q.equals(Rational.ONE) ? argument : formalSymbol(`sqrt(${q.toString()})`);
  return undefined;
}

/** Reads the numbers of one series. */
export class FormalReader {
  private readonly series: Series;
  private readonly constants = new Map<string, Promise<Found>>();

  constructor(series: Series) {
    this.series = series;
  }

  /** The polynomial behind a number of the series; undefined when it has none. */
  async read(value: Exact): Promise<Found> {
    if (value.rational !== undefined) return formalRational(value.rational);
    if (!('text' in value) || typeof value.text !== 'string') return undefined;
    return this.readText(value.text);
  }

  private async readText(text: string): Promise<Found> {
    const tree = await parseTree(text);
    return isNumberProblem(tree) ? undefined : this.walk(tree);
  }

  private name(name: string): Promise<Found> {
    if (name === 'nf') {
      const { flavours } = this.series;
      return Promise.resolve(flavours === undefined ? undefined : formalRational(Rational.of(flavours)));
    }
    if (NAMES.includes(name)) return Promise.resolve(formalSymbol(name));
    let found = this.constants.get(name);
    if (found === undefined) {
      const text = this.series.constants?.find((c) => c.name === name)?.text;
      found = text === undefined ? Promise.resolve(undefined) : this.readText(text);
      this.constants.set(name, found);
    }
    return found;
  }

  private async walk(tree: SyntaxTree): Promise<Found> {
    if (tree.kind === 'number') {
      const q = Rational.parse(tree.text);
      return q && formalRational(q);
    }
    if (tree.kind === 'name') return this.name(tree.name);
    if (tree.kind === 'negative') {
      const of = await this.walk(tree.of);
      return of && negFormal(of);
    }
    if (tree.kind === 'call') {
      const argument = await this.walk(tree.argument);
      return argument && call(tree.name, argument);
    }
    const [left, right] = [await this.walk(tree.left), await this.walk(tree.right)];
    if (left === undefined || right === undefined) return undefined;
    const value = binary(tree.operator, left, right);
    return value === undefined || value.terms.size > MOST_TERMS ? undefined : value;
  }
}

function binary(operator: '+' | '-' | '*' | '/' | '^', left: Formal, right: Formal): Found {
  if (operator === '+') return addFormal(left, right);
  if (operator === '-') return subFormal(left, right);
  if (operator === '*') return mulFormal(left, right);
  if (operator === '^') return power(left, right);
  const q = rationalOfFormal(right);
  if (q !== undefined) return q.isZero() ? undefined : scaleFormal(left, q.inv());
  const over = inverse(right);
  return over && mulFormal(left, over);
}
