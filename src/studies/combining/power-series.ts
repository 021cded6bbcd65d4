/**
 * @module A truncated power series whose coefficients are tracked numbers, and its arithmetic.
 *
 * Method     Σ c_n x^(n + power), known through x^through; a pure number is known to all orders (through = ∞). Every result
 *            is known exactly as far as its operands fix it: products lose what the unknown tail of one times the first
 *            term of the other would add.
 * Bound      exact in the coefficients.
 */
import { Rational } from '../../numerics/index.js';
import { expSeries, logSeries, mulSeries, powSeries, reciprocal, refuse } from '../../qcd/index.js';
import type { Refusal, RingFormula } from '../../qcd/index.js';
import { rationalPower } from '../derive/powers.js';
import { derive, isNonZeroTracked, isZeroTracked, trackedRational } from '../derive/tracked.js';
import type { Tracked } from '../derive/tracked.js';

export interface PowerSeries {
  readonly power: number;
  readonly coefficients: readonly Tracked[];
  /** Highest known order; ∞ for a number. */
  readonly through: number;
}

export const numberSeries = (x: Tracked): PowerSeries => ({ power: 0, coefficients: [x], through: Infinity });

const ZERO = trackedRational(Rational.ZERO);

/** Drops leading coefficients that are exactly zero. */
export function stripped(a: PowerSeries): PowerSeries {
  const first = a.coefficients.findIndex((c) => !isZeroTracked(c));
  if (first === 0) return a;
  const lost = first < 0 ? a.coefficients.length : first;
  return { ...a, power: a.power + lost, coefficients: a.coefficients.slice(lost) };
}

/** Cuts what lies above an order. */
export function cutAt(a: PowerSeries, through: number): PowerSeries {
  if (through >= a.through) return a;
  return { ...a, through, coefficients: a.coefficients.slice(0, Math.max(through - a.power + 1, 0)) };
}

/** Coefficients from x^power on, `length` of them, zeros where there are none. */
function window(a: PowerSeries, power: number, length: number): Tracked[] {
  return Array.from({ length }, (_, i) => a.coefficients[power + i - a.power] ?? ZERO);
}

function apply(
  power: number,
  through: number,
  inputs: readonly Tracked[],
  length: number,
  formula: RingFormula,
): PowerSeries {
  return { power, through, coefficients: derive(inputs, formula, { length }) };
}

const lengthOf = (a: PowerSeries, power: number, through: number): number =>
  through === Infinity ? Math.max(a.power + a.coefficients.length - power, 0) : Math.max(through - power + 1, 0);

/** a + b, or a − b. */
export function addTo(a: PowerSeries, b: PowerSeries, sign: 1 | -1): PowerSeries {
  const power = Math.min(a.power, b.power);
  const through = Math.min(a.through, b.through);
  const length =
    through === Infinity
      ? Math.max(lengthOf(a, power, through), lengthOf(b, power, through))
      : lengthOf(a, power, through);
  const inputs = [...window(a, power, length), ...window(b, power, length)];
  return apply(power, through, inputs, length, (ring, x) =>
    x.slice(0, length).map((u, i) => {
      const v = x[length + i] ?? ring.zero;
      return sign > 0 ? ring.add(u, v) : ring.sub(u, v);
    }),
  );
}

export function times(a: PowerSeries, b: PowerSeries): PowerSeries {
  const power = a.power + b.power;
  const through = Math.min(a.power + b.through, b.power + a.through);
  const length =
    through === Infinity ? a.coefficients.length + b.coefficients.length - 1 : Math.max(through - power + 1, 0);
  const n = a.coefficients.length;
  return apply(power, through, [...a.coefficients, ...b.coefficients], length, (ring, x) =>
    mulSeries(ring, x.slice(0, n), x.slice(n), length),
  );
}

const vanishes = (what: string): Refusal =>
  refuse(
    `${what} of a series whose first coefficient cannot be told from zero`,
    'an exact first coefficient other than 0',
  );

/** 1/a. */
export function inverse(series: PowerSeries): PowerSeries | Refusal {
  const a = stripped(series);
  const [first] = a.coefficients;
  if (first === undefined || !isNonZeroTracked(first)) return vanishes('the quotient');
  const n = a.coefficients.length;
  const through = a.through === Infinity ? Infinity : a.through - 2 * a.power;
  return apply(-a.power, through, a.coefficients, n, (ring, x) => reciprocal(ring, x, n));
}

/** The m-th root of a positive rational when it is rational. */
function rationalRoot(q: Rational, m: number): Rational | undefined {
  const root = (n: bigint): bigint | undefined => {
    const near = Math.round(Number(n) ** (1 / m));
    if (!Number.isSafeInteger(near)) return undefined;
    const guess = BigInt(near);
    return [guess - 1n, guess, guess + 1n].find((r) => r >= 0n && r ** BigInt(m) === n);
  };
  const [num, den] = [root(q.num), root(q.den)];
  return num === undefined || den === undefined ? undefined : Rational.of(num, den);
}

/** Largest power and root; more are a slip of the pen. */
const MOST = 64;

/** a^p for rational p. */
export function toPower(series: PowerSeries, p: Rational): PowerSeries | Refusal {
  if (p.abs().num > BigInt(MOST) || p.den > BigInt(MOST)) {
    return refuse(`the power ${p.toString()}`, `a power p/q with p and q up to ${MOST}`);
  }
  const k = Number(p.num);
  if (p.isInteger()) {
    if (k === 0) return numberSeries(trackedRational(Rational.ONE));
    const base = k < 0 ? inverse(series) : stripped(series);
    return 'reason' in base ? base : integerPower(base, Math.abs(k));
  }
  const a = stripped(series);
  const m = Number(p.den);
  const [first] = a.coefficients;
  const q = first?.slopes.length === 0 ? first.value.rational : undefined;
  const root = q === undefined || q.sign() <= 0 ? undefined : rationalRoot(q, m);
  if (root === undefined) {
    return refuse(
      `the power ${p.toString()} of a series whose first coefficient has no exact positive root of that order`,
      'divide by the first coefficient before, so that the series begins with 1',
    );
  }
  if ((a.power * k) % m !== 0) {
    return refuse(
      `the power ${p.toString()} of a series that begins with x^${a.power} has no integer powers of x`,
      'take the leading power out before',
    );
  }
  const n = a.coefficients.length;
  const power = (a.power * k) / m;
  const front = root.pow(k);
  return apply(power, a.through === Infinity ? Infinity : power + n - 1, a.coefficients, n, (ring, x) => {
    const inverted = ring.div(ring.one, x[0] ?? ring.one);
    const scale = ring.fromRational(front);
    return rationalPower(
      ring,
      x.map((c) => ring.mul(c, inverted)),
      p,
      n,
    ).map((c) => ring.mul(c, scale));
  });
}

function integerPower(a: PowerSeries, k: number): PowerSeries {
  const power = a.power * k;
  const single = a.through === Infinity;
  const n = single ? (a.coefficients.length - 1) * k + 1 : a.coefficients.length;
  return apply(power, single ? Infinity : power + n - 1, a.coefficients, n, (ring, x) => powSeries(ring, x, k, n));
}

/** exp(a) for a series without a constant term. */
export function exponential(series: PowerSeries): PowerSeries | Refusal {
  const a = stripped(series);
  if (a.coefficients.length > 0 && a.power <= 0) {
    return refuse(
      a.power < 0 ? 'exp of a series with negative powers' : 'exp of a series with a constant term',
      'a series that begins with a positive power: take the constant out, as in exp(s - 1)',
    );
  }
  if (a.through === Infinity) return numberSeries(trackedRational(Rational.ONE));
  const n = a.through + 1;
  return apply(0, a.through, window(a, 0, n), n, (ring, x) => expSeries(ring, x, n));
}

/** log(a) for a series that begins with 1. */
export function logarithm(series: PowerSeries): PowerSeries | Refusal {
  const a = stripped(series);
  const first = a.coefficients[0];
  if (a.power !== 0 || first?.slopes.length !== 0 || first.value.rational?.equals(Rational.ONE) !== true) {
    return refuse(
      'log of a series that does not begin with 1',
      'divide by the first term before, so that the series begins with 1',
    );
  }
  if (a.through === Infinity) return numberSeries(ZERO);
  const n = a.coefficients.length;
  return apply(0, a.through, a.coefficients, n, (ring, x) => logSeries(ring, x, n));
}

/** outer(y) for a series y that begins with a positive power. */
export function composed(outer: PowerSeries, y: PowerSeries): PowerSeries | Refusal {
  const inner = stripped(y);
  if (inner.power < 1 || inner.coefficients.length === 0) {
    return refuse(
      'a series put for the coupling of another must begin with a positive power',
      'take its constant term out, as in f(s - 1)',
    );
  }
  let sum: PowerSeries | undefined;
  for (const c of outer.coefficients.toReversed()) {
    const here = numberSeries(c);
    sum = sum === undefined ? here : addTo(times(sum, inner), here, 1);
  }
  if (sum === undefined) return refuse('a series without a known coefficient', 'a series with at least one');
  const front = toPower(inner, Rational.of(outer.power));
  if ('reason' in front) return front;
  const all = outer.power === 0 ? sum : times(front, sum);
  return cutAt(all, inner.power * (outer.through + 1) - 1);
}
