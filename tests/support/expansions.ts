/** @module Expansions for tests of prescriptions: from the bench of series with exact answers, or from plain parts. */
import { readFileSync } from 'node:fs';
import { expect } from 'vitest';
import { diagnoseGrowth } from '../../src/growth/index.js';
import type { Growth } from '../../src/growth/index.js';
import { exact, R, Rational, signExact } from '../../src/numerics/index.js';
import type { Exact } from '../../src/numerics/index.js';
import type { Outcome, Prescription, Request, Sum } from '../../src/prescriptions/index.js';
import type { Expansion, StatedSingularity } from '../../src/series/index.js';
import { distanceTo, rational } from './check-value.js';

export interface Reference {
  readonly x: string;
  readonly pv: string;
  readonly im_plus?: string;
}

export interface Bench {
  readonly id: string;
  readonly coefficients: readonly Exact[];
  readonly firstPower: number;
  readonly references: readonly Reference[];
  /** Branch points and poles with rational data, nearest first. */
  readonly stated: readonly StatedSingularity[];
}

interface BenchFile {
  readonly id: string;
  readonly coefficients: { readonly first_power: number; readonly values: readonly string[] };
  readonly references: readonly Reference[];
  readonly borel_singularities?: readonly { readonly t?: string; readonly p?: string; readonly type?: string }[];
}

/** Position and exponent of a listed singularity, when both are plain rationals. */
function stated(s: { readonly t?: string; readonly p?: string; readonly type?: string }): StatedSingularity[] {
  const t = s.t === undefined ? undefined : Rational.parse(s.t);
  const order = /pole of order (\d+)/.exec(s.type ?? '')?.[1];
  const p = Rational.parse(s.p ?? order ?? '');
  if (t === undefined) return [];
  return [
    { t: exact(t), ...(p === undefined ? {} : { exponent: exact(p) }), corrections: [], kind: 'other', origin: 'file' },
  ];
}

export function readBench(id: string): Bench {
  const file = JSON.parse(readFileSync(new URL(`../data/bench/${id}.json`, import.meta.url), 'utf8')) as BenchFile;
  return {
    id,
    coefficients: file.coefficients.values.map((v) => exact(rational(v))),
    firstPower: file.coefficients.first_power,
    references: file.references,
    stated: (file.borel_singularities ?? [])
      .flatMap(stated)
      .sort((a, b) => Math.abs(R.toNumber(a.t.ball(64))) - Math.abs(R.toNumber(b.t.ball(64)))),
  };
}

/** An expansion from plain parts; everything else is neutral. */
export function expansion(coefficients: readonly Exact[], x: Exact, more: Partial<Expansion> = {}): Expansion {
  return {
    x,
    power: 0,
    factor: exact(1),
    additive: exact(0),
    coefficients,
    relativeErrors: coefficients.map(() => 0),
    stated: [],
    ...more,
  };
}

/** The first `count` coefficients of a bench series at x, with its listed singularities. */
export function benchExpansion(b: Bench, x: string, count: number, more: Partial<Expansion> = {}): Expansion {
  return expansion(b.coefficients.slice(0, count), exact(rational(x)), {
    power: b.firstPower,
    stated: b.stated,
    ...more,
  });
}

function logAbs(c: Exact): number {
  const m = R.exactMid(c.ball(96));
  if (m.mid === 0n) return -Infinity;
  const bits = R.upperBits(m);
  return Math.log(Math.abs(R.toNumber(R.mul2exp(m, -bits)))) + bits * Math.LN2;
}

export function growthOf(e: Expansion): Growth {
  return diagnoseGrowth({
    terms: e.coefficients.map((c, n) => ({
      logAbs: logAbs(c),
      sign: signExact(c),
      relativeError: e.relativeErrors[n] ?? 0,
      estimated: false,
    })),
    expected: [],
    exact: e.coefficients,
  });
}

export function outcomes(p: Prescription, e: Expansion, digits = 20, only?: string): readonly Outcome[] {
  const request: Request = { digits, ...(only === undefined ? {} : { only }) };
  return p.apply(e, growthOf(e), request);
}

/** The central sum; fails the test when there is none. */
export function central(p: Prescription, e: Expansion, digits = 20): Sum {
  const all = outcomes(p, e, digits);
  const found = all.find((o): o is Sum => o.kind === 'sum' && o.central === true);
  if (found === undefined)
    expect.fail(
      `${p.name}: no central sum; ${JSON.stringify(all.map((o) => (o.kind === 'refusal' ? o.reason : o.variant)))}`,
    );
  return found;
}

/** Expects refusals only, and returns the first. */
export function refused(p: Prescription, e: Expansion): { reason: string; remedy: string } {
  const all = outcomes(p, e);
  const first = all[0];
  expect(
    all.every((o) => o.kind === 'refusal'),
    `${p.name} should refuse`,
  ).toBe(true);
  if (first?.kind !== 'refusal') expect.fail(`${p.name}: no outcome`);
  return first;
}

/** Correct decimal digits of the principal value against the reference. */
export function digitsReached(s: Sum, r: Reference): number {
  return -Math.log10(distanceTo(s.value, r.pv) / Math.abs(rational(r.pv).toNumber()));
}

/** x → λx, c_n → c_n/λ^n leaves the sum alone. */
export function rescaled(e: Expansion, lambda: Rational): Expansion {
  const inverse = lambda.inv();
  return {
    ...e,
    x: exact(e.x.rational!.mul(lambda)),
    factor: exact(e.factor.rational!.mul(inverse.pow(e.power))),
    coefficients: e.coefficients.map((c, n) => exact(c.rational!.mul(inverse.pow(n)))),
    stated: e.stated.map((s) => ({ ...s, t: exact(s.t.rational!.mul(lambda)) })),
  };
}
