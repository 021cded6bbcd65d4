/** @module Series with known growth, made from a seed: the diagnosis is to name what went in. */
import type { GrowthInput, GrowthTerm, GrowthVerdict } from '../../src/growth/index.js';

/** Small linear congruential generator: the same cases on every machine. */
export class Dice {
  #state: number;
  constructor(seed: number) {
    this.#state = seed | 0;
  }
  next(): number {
    this.#state = (Math.imul(this.#state, 1664525) + 1013904223) | 0;
    return (this.#state >>> 0) / 4294967296;
  }
  between(a: number, b: number): number {
    return a + (b - a) * this.next();
  }
  whole(a: number, b: number): number {
    return a + Math.floor((b - a + 1) * this.next());
  }
  sign(): -1 | 1 {
    return this.next() < 0.5 ? -1 : 1;
  }
  normal(): number {
    return Math.sqrt(-2 * Math.log(this.next() + 1e-300)) * Math.cos(2 * Math.PI * this.next());
  }
  pick<T>(list: readonly T[]): T {
    return list[Math.floor(this.next() * list.length)]!;
  }
}

export interface Case {
  readonly family: string;
  readonly text: string;
  readonly input: GrowthInput;
  readonly verdicts: readonly GrowthVerdict[];
  readonly order?: number;
  /** Signed position on an axis, or modulus of a pair. */
  readonly t?: number;
  readonly angle?: number;
  readonly flag?: string;
}

const lnGammaCache: number[] = [0, 0];
/** ln n!. */
export function lnFactorial(n: number): number {
  for (let k = lnGammaCache.length; k <= n; k++) lnGammaCache.push(lnGammaCache[k - 1]! + Math.log(k));
  return lnGammaCache[n]!;
}

/** ln Γ(x) by Stirling after a shift: good to 1e-14 for x > 0. */
export function lnGamma(x: number): number {
  let shift = 0;
  while (x < 15) {
    shift += Math.log(x);
    x += 1;
  }
  const z = 1 / (x * x);
  const s = (1 / 12 - z * (1 / 360 - z * (1 / 1260 - z * (1 / 1680 - z / 1188)))) / x;
  return (x - 0.5) * Math.log(x) - x + 0.5 * Math.log(2 * Math.PI) + s - shift;
}

export const term = (logAbs: number, sign: number, relativeError = 0): GrowthTerm => ({
  logAbs,
  sign: sign > 0 ? 1 : sign < 0 ? -1 : 0,
  relativeError,
  estimated: false,
});
export const zero = (): GrowthTerm => ({ logAbs: -Infinity, sign: 0, relativeError: 0, estimated: false });
export const input = (terms: readonly GrowthTerm[]): GrowthInput => ({ terms, expected: [] });

/** c_n = b_n Γ(1 + s n) e^{L n}. */
export function fromBorel(b: readonly number[], s = 1, scale = 0): GrowthTerm[] {
  return b.map((v, n) => (v === 0 ? zero() : term(Math.log(Math.abs(v)) + lnGamma(1 + s * n) + scale * n, v)));
}

/** Borel coefficients of (1 − t/t*)^(−γ). */
export function power(t: number, gamma: number, count: number): number[] {
  const out = [1];
  for (let n = 1; n < count; n++) out.push((out[n - 1]! * (gamma + n - 1)) / n / t);
  return out;
}

const add = (...parts: readonly (readonly [number, readonly number[]])[]): number[] =>
  parts[0]![1].map((_, n) => parts.reduce((s, [a, b]) => s + a * b[n]!, 0));

/** A leading singularity with two corrections, a weaker one farther out and an irregular start. */
function single(d: Dice): Case {
  const count = d.whole(16, 70);
  const t = d.sign() * d.between(0.05, 3);
  const gamma = d.between(0.4, 3);
  const far = t * d.sign() * d.between(1.7, 4);
  const b = add(
    [1, power(t, gamma, count)],
    [0.4 * d.normal(), power(t, gamma - 1, count)],
    [0.4 * d.normal(), power(t, gamma - 2, count)],
    [0.5 * d.normal(), power(far, d.between(0.5, 2), count)],
  ).map((v, n) => (n < 3 ? v + 0.2 * d.normal() : v));
  const text = `t=${t.toFixed(3)} γ=${gamma.toFixed(2)} far=${far.toFixed(2)} N=${count}`;
  return { family: 'single', text, input: input(fromBorel(b)), verdicts: ['factorial'], order: 1, t };
}

/** Ultraviolet and infrared in competition, the nearer one weaker. */
function competing(d: Dice): Case {
  const count = d.whole(40, 90);
  const near = d.sign() * d.between(0.2, 2);
  const far = -near * d.between(1.4, 2.5);
  const b = add(
    [d.between(0.1, 1) * d.sign(), power(near, d.between(0.8, 2), count)],
    [d.between(0.5, 3) * d.sign(), power(far, d.between(0.8, 2), count)],
  );
  const text = `near=${near.toFixed(3)} far=${far.toFixed(3)} N=${count}`;
  return { family: 'competing', text, input: input(fromBorel(b)), verdicts: ['factorial'], order: 1, t: near };
}

/** Complex-conjugate pair. */
function pair(d: Dice): Case {
  const count = d.whole(30, 90);
  const modulus = d.between(0.3, 3);
  const angle = d.between(0.35, 2.8);
  const gamma = d.between(0.5, 2.5);
  const phase = d.between(-1, 1);
  const size = power(modulus, gamma, count);
  const b = size.map((v, n) => v * Math.cos(n * angle + phase));
  const text = `R=${modulus.toFixed(3)} angle=${angle.toFixed(3)} γ=${gamma.toFixed(2)} N=${count}`;
  return {
    family: 'pair',
    text,
    input: input(fromBorel(b)),
    verdicts: ['factorial'],
    order: 1,
    t: modulus,
    angle,
    flag: 'complex-pair',
  };
}

/** Every p-th coefficient only. */
function lacunary(d: Dice): Case {
  const stride = d.whole(2, 4);
  const count = d.whole(12, 40);
  const alternating = d.next() < 0.5;
  const modulus = d.between(0.3, 4);
  const gamma = d.between(0.5, 2.5);
  const terms: GrowthTerm[] = [];
  for (let k = 0; k < count; k++) {
    const n = k * stride;
    terms.push(term(lnGamma(n + gamma) - n * Math.log(modulus), alternating && k % 2 === 1 ? -1 : 1));
    if (k + 1 < count) terms.push(...Array.from({ length: stride - 1 }, zero));
  }
  const text = `stride ${stride} ${alternating ? 'alternating' : 'same'} R=${modulus.toFixed(3)} γ=${gamma.toFixed(2)} K=${count}`;
  return {
    family: 'lacunary',
    text,
    input: input(terms),
    verdicts: ['factorial'],
    order: 1,
    t: modulus,
    flag: 'lacunary',
  };
}

/** Γ(s n + γ) A^n for s away from 1. */
function otherOrder(d: Dice): Case {
  const s = d.pick([1 / 3, 1 / 2, 2 / 3, 2, 2, 2, 3]);
  const count = d.whole(s < 1 ? 30 : 12, 60);
  const gamma = d.between(0.5, 2.5);
  const alternating = d.next() < 0.5;
  const square = s === 2 && d.next() < 0.4;
  const a = d.between(-3, 3);
  const terms = Array.from({ length: count }, (_, n) =>
    term((square ? 2 * lnFactorial(n) : lnGamma(s * n + gamma)) + a * n, alternating && n % 2 === 1 ? -1 : 1),
  );
  const verdict = s < 1 ? 'subfactorial' : 'superfactorial';
  const text = `${square ? '(n!)^2' : `Γ(${s.toFixed(2)}n+${gamma.toFixed(2)})`} e^(${a.toFixed(2)}n) N=${count}`;
  return { family: 'order', text, input: input(terms), verdicts: [verdict], order: s, flag: verdict };
}

/** Finite radius of convergence. */
function geometric(d: Dice): Case {
  const count = d.whole(14, 60);
  const radius = d.between(0.2, 5);
  const kind = d.whole(0, 3);
  const p = d.between(0.3, 3);
  const r = d.sign() * radius;
  const b =
    kind === 0
      ? power(r, p, count)
      : kind === 1
        ? add([1, power(r, p, count)], [d.normal(), power(-2 * r, 1, count)])
        : kind === 2
          ? power(r, 1, count).map((v, n) => v / (n + 1))
          : power(radius, 1, count).map((v, n) => v * Math.cos(1.1 * n + 0.3));
  const terms = b.map((v) => term(Math.log(Math.abs(v)), v));
  const text = `kind ${kind} R=${radius.toFixed(3)} p=${p.toFixed(2)} N=${count}`;
  return { family: 'geometric', text, input: input(terms), verdicts: ['geometric'], order: 0, flag: 'geometric' };
}

/** Entire functions. */
function entire(d: Dice): Case {
  const count = d.whole(12, 60);
  const a = d.between(-2, 2);
  const s = d.pick([1, 1, 2, 0.5]);
  const gamma = d.between(0.5, 2.5);
  const alternating = d.next() < 0.5;
  const stride = d.next() < 0.3 ? 2 : 1;
  const terms: GrowthTerm[] = [];
  for (let k = 0; k < count; k++) {
    terms.push(term(a * k - lnGamma(s * k + gamma), alternating && k % 2 === 1 ? -1 : 1));
    if (stride === 2 && k + 1 < count) terms.push(zero());
  }
  const text = `1/Γ(${s}k+${gamma.toFixed(2)}) e^(${a.toFixed(2)}k) stride ${stride} K=${count}`;
  return { family: 'entire', text, input: input(terms), verdicts: ['convergent'], flag: 'convergent' };
}

/** q^(n(n−1)/2). */
function logNormal(d: Dice): Case {
  const count = d.whole(12, 60);
  const q = d.between(1.3, 4);
  const alternating = d.next() < 0.5;
  const terms = Array.from({ length: count }, (_, n) =>
    term(((n * (n - 1)) / 2) * Math.log(q) + 0.3 * n, alternating && n % 2 === 1 ? -1 : 1),
  );
  const text = `${q.toFixed(2)}^(n(n-1)/2) N=${count}`;
  return {
    family: 'log-normal',
    text,
    input: input(terms),
    verdicts: ['superfactorial'],
    order: Infinity,
    flag: 'faster-than-any-factorial',
  };
}

/** A factorial series with independent relative noise that nobody quotes. */
function noisy(d: Dice): Case {
  const count = d.whole(36, 60);
  const t = d.sign() * d.between(0.3, 3);
  const gamma = d.between(0.5, 2);
  const level = 10 ** d.between(-6, -0.6);
  const terms = fromBorel(power(t, gamma, count).map((v) => v * (1 + level * d.normal())));
  const text = `t=${t.toFixed(3)} γ=${gamma.toFixed(2)} noise ${level.toExponential(1)} N=${count}`;
  return { family: 'noisy', text, input: input(terms), verdicts: ['factorial'], order: 1, t, flag: 'noisy' };
}

/** One coefficient mistyped. */
function typo(d: Dice): Case {
  const count = d.whole(18, 50);
  const t = d.sign() * d.between(0.3, 3);
  const gamma = d.between(0.5, 2);
  const at = d.whole(5, count - 4);
  const sign = d.next() < 0.5;
  const factor = sign ? -1 : d.pick([1.1, 10, 0.1, 1.9, 0.9]);
  const terms = fromBorel(power(t, gamma, count).map((v, n) => (n === at ? v * factor : v)));
  const text = `n=${at} factor ${factor} t=${t.toFixed(3)} γ=${gamma.toFixed(2)} N=${count}`;
  return { family: 'typo', text, input: input(terms), verdicts: ['factorial'], order: 1, t, flag: 'outlier' };
}

/** A polynomial with zeros after it. */
function terminating(d: Dice): Case {
  const degree = d.whole(0, 8);
  const terms = Array.from({ length: degree + 1 }, () => term(d.between(-2, 4), d.sign()));
  const zeros = d.whole(3, 20);
  for (let i = 0; i < zeros; i++) terms.push(zero());
  return {
    family: 'terminating',
    text: `degree ${degree}, ${zeros} zeros`,
    input: input(terms),
    verdicts: ['terminating'],
    flag: 'terminating',
  };
}

/** exp(a t/(1 − t/t*)): b_n from b' = a (1 − t/t*)^(−2) b. */
function essential(d: Dice): Case {
  const count = d.whole(50, 100);
  const a = d.between(0.7, 2.5);
  const t = d.sign() * d.between(0.5, 2);
  // In s = t/t*: n b_n = a Σ_{j<n} (n − j) b_j.
  const b = [1];
  for (let n = 1; n < count; n++) {
    let s = 0;
    for (let j = 0; j < n; j++) s += (n - j) * b[j]!;
    b.push((a * s) / n);
  }
  const terms = fromBorel(b).map((x, n) => ({
    ...x,
    logAbs: x.logAbs - n * Math.log(Math.abs(t)),
    sign: t < 0 && n % 2 === 1 ? (-x.sign as -1 | 0 | 1) : x.sign,
  }));
  return {
    family: 'essential',
    text: `a=${a.toFixed(2)} t=${t.toFixed(2)} N=${count}`,
    input: input(terms),
    verdicts: ['factorial'],
    order: 1,
    t,
    flag: 'essential-singularity',
  };
}

/** Decimal coefficients cut to a few digits. */
function rounded(d: Dice): Case {
  const count = d.whole(28, 45);
  const digits = d.whole(3, 6);
  const t = d.sign() * d.between(0.3, 3);
  const gamma = d.between(0.5, 2);
  const terms = fromBorel(power(t, gamma, count)).map((x) => {
    const decade = Math.floor(x.logAbs / Math.LN10);
    const mantissa = Number(Math.exp(x.logAbs - decade * Math.LN10).toPrecision(digits));
    return { ...x, logAbs: Math.log(mantissa) + decade * Math.LN10 };
  });
  return {
    family: 'rounded',
    text: `${digits} digits t=${t.toFixed(3)} γ=${gamma.toFixed(2)} N=${count}`,
    input: input(terms),
    verdicts: ['factorial'],
    order: 1,
    t,
    flag: 'noisy',
  };
}

/** Errors larger than the values from some order on. */
function unknown(d: Dice): Case {
  const count = d.whole(8, 14);
  const from = d.whole(2, 5);
  const terms = fromBorel(power(d.sign() * d.between(0.5, 2), 1, count)).map((x, n) => ({
    ...x,
    relativeError: n < from ? 0.05 * n : 1.5,
  }));
  return {
    family: 'unknown',
    text: `known ${from} of ${count}`,
    input: input(terms),
    verdicts: ['undecided'],
    flag: 'errors-exceed-values',
  };
}

export const families: Readonly<Record<string, (d: Dice) => Case>> = {
  single,
  competing,
  pair,
  lacunary,
  otherOrder,
  geometric,
  entire,
  logNormal,
  noisy,
  typo,
  terminating,
  essential,
  rounded,
  unknown,
};
