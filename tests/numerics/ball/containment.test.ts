/**
 * Ten thousand balls an operation, each with an exact point inside: the result holds the exact result at the point. Points and balls come
 * from a small generator of its own, so that the number of cases does not cost a minute; a failure prints seed and case.
 */
import { describe, expect, it } from 'vitest';
import { atan, exp, log, R, sinCos, tanh } from '../../../src/numerics/index.js';
import type { Ball } from '../../../src/numerics/index.js';

/** 10,000 in CI, fewer at the desk. */
const CASES =
  (process.env['CI'] === undefined ? 2_000 : 10_000) *
  Math.max(1, Number(process.env['LEASTTERM_TEST_MULTIPLIER'] ?? '1'));
const PRECISIONS = [24, 53, 64, 113, 333];

/** Marsaglia's xorshift, 32 bits. */
class Stream {
  private state: number;
  constructor(seed: number) {
    this.state = seed;
  }
  next(): number {
    let x = this.state;
    x ^= x << 13;
    x ^= x >>> 17;
    x ^= x << 5;
    this.state = x;
    return x >>> 0;
  }
  below(n: number): number {
    return this.next() % n;
  }
  bits(n: number): bigint {
    let out = 0n;
    for (let k = 0; k < n; k += 32) out = (out << 32n) | BigInt(this.next());
    return BigInt.asUintN(n, out);
  }
}

/** m·2^e: every point here is one, and so are sums and products of points. */
interface Dyadic {
  readonly m: bigint;
  readonly e: number;
}

interface Case {
  readonly ball: Ball;
  readonly point: Dyadic;
}

const shifted = (x: Dyadic, e: number): bigint => x.m << BigInt(x.e - e);
const plus = (x: Dyadic, y: Dyadic, sign = 1n): Dyadic => {
  const e = Math.min(x.e, y.e);
  return { m: shifted(x, e) + sign * shifted(y, e), e };
};
const times = (x: Dyadic, y: Dyadic): Dyadic => ({ m: x.m * y.m, e: x.e + y.e });
const size = (x: Dyadic): Dyadic => ({ m: x.m < 0n ? -x.m : x.m, e: x.e });
const atMost = (x: Dyadic, y: Dyadic): boolean => plus(y, x, -1n).m >= 0n;
/** The double x as a dyadic number. */
function dyadic(x: number): Dyadic {
  let e = 0;
  while (!Number.isInteger(x)) {
    x *= 2;
    e--;
  }
  return { m: BigInt(x), e };
}
/** |value − num/den| <= radius. */
function holds(value: Ball, num: Dyadic, den: Dyadic): boolean {
  const mid: Dyadic = { m: value.mid, e: value.exp };
  const { m, e } = dyadic(value.rad);
  return atMost(size(plus(times(mid, den), num, -1n)), times({ m, e: e + value.exp }, size(den)));
}
const UNITY: Dyadic = { m: 1n, e: 0 };

const SIZES = [1, 8, 53, 64, 65, 128, 200, 1100];
/** Exact, narrow and wide balls, next to powers of two, around zero; the point anywhere in them, the ends included. */
function draw(s: Stream, span: number): Case {
  const n = SIZES[s.below(SIZES.length)]!;
  let mid = s.below(8) === 0 ? 1n << BigInt(n) : s.bits(n);
  if (s.below(16) === 0) mid = 0n;
  if (s.below(8) === 0) mid -= 1n;
  if (s.below(2) === 0) mid = -mid;
  const e = s.below(2 * span) - span - n;
  const kind = s.below(4);
  const rad =
    kind === 0 ? 0 : kind === 1 ? (1 + s.below(1000)) / 1024 : kind === 2 ? 1 + s.below(1 << 20) : 2 ** s.below(60);
  const { m, e: low } = dyadic(rad);
  const offset: Dyadic = { m: m * (BigInt(s.below(129)) - 64n), e: low - 6 }; // 64ths of the radius
  const { m: at, e: unit } = plus({ m: mid, e: 0 }, offset);
  return { ball: { mid, exp: e, rad }, point: { m: at, e: unit + e } };
}

type Quotient = readonly [Dyadic, Dyadic];
type Binary = readonly [string, (a: Ball, b: Ball, p: number) => Ball, (x: Dyadic, y: Dyadic) => Quotient];
const BINARY: readonly Binary[] = [
  ['add', R.add, (x, y) => [plus(x, y), UNITY]],
  ['sub', R.sub, (x, y) => [plus(x, y, -1n), UNITY]],
  ['mul', R.mul, (x, y) => [times(x, y), UNITY]],
  ['div', R.div, (x, y) => [x, y]],
  ['sqr', (a, _, p) => R.sqr(a, p), (x) => [times(x, x), UNITY]],
  ['cube', (a, _, p) => R.powInt(a, 3, p), (x) => [times(times(x, x), x), UNITY]],
  ['round', (a, _, p) => R.round(a, p), (x) => [x, UNITY]],
];

describe('arithmetic', () => {
  it.each(BINARY)('%s', (name, ball, exact) => {
    const s = new Stream(0x9e3779b9);
    for (let i = 0; i < CASES; i++) {
      const [a, b] = [draw(s, 200), draw(s, 200)];
      const prec = PRECISIONS[i % PRECISIONS.length]!;
      const value = ball(a.ball, b.ball, prec);
      if (value.rad === Infinity) continue;
      const [num, den] = exact(a.point, b.point);
      if (!holds(value, num, den)) expect.fail(`${name}, case ${i}, ${prec} bits: ${show(a)} ${show(b)}`);
    }
  });

  it('sqrt, by squaring the ends', () => {
    const s = new Stream(0x51ed270b);
    let roots = 0;
    for (let i = 0; i < CASES; i++) {
      const a = draw(s, 200);
      const value = R.sqrt(a.ball, PRECISIONS[i % PRECISIONS.length]!);
      if (value.rad === Infinity || a.point.m < 0n) continue;
      roots++;
      const { m, e } = dyadic(value.rad);
      const [mid, rad]: Dyadic[] = [
        { m: value.mid, e: value.exp },
        { m, e: e + value.exp },
      ];
      const [low, high] = [plus(mid!, rad!, -1n), plus(mid!, rad!)];
      const below = low.m <= 0n || atMost(times(low, low), a.point);
      if (!below || !atMost(a.point, times(high, high))) expect.fail(`sqrt, case ${i}: ${show(a)}`);
    }
    expect(roots).toBeGreaterThan(CASES / 4);
  });
});

const show = ({ ball, point }: Case): string => `(${ball.mid} ± ${ball.rad})·2^${ball.exp} ∋ ${point.m}·2^${point.e}`;

describe('functions: the value at the point, to 80 bits more, meets the value on the ball', () => {
  const FUNCTIONS: readonly (readonly [string, (x: Ball, p: number) => Ball, number])[] = [
    ['exp', exp, 6],
    ['log', log, 60],
    ['sin', (x, p) => sinCos(x, p).sin, 10],
    ['cos', (x, p) => sinCos(x, p).cos, 10],
    ['atan', atan, 40],
    ['tanh', tanh, 6],
  ];
  it.each(FUNCTIONS)('%s', (name, f, span) => {
    const s = new Stream(0x2545f491);
    let told = 0;
    for (let i = 0; i < CASES; i++) {
      const a = draw(s, span);
      const prec = PRECISIONS[i % 4]!;
      const value = f(a.ball, prec);
      if (value.rad === Infinity) continue;
      told++;
      const at = f(R.ball(a.point.m, a.point.e), prec + 80);
      if (!R.overlaps(value, at)) expect.fail(`${name}, case ${i}, ${prec} bits: ${show(a)}`);
    }
    expect(told).toBeGreaterThan(CASES / 5);
  });
});
