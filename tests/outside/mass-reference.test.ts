/**
 * Masses against mpmath 1.3.0 at 50 digits (data/masses.json, made by generate_masses.py): the terms that each definition
 * takes out, Borel integrals along a rotated ray, R-evolution by quadrature in ln R. The formulas there were written
 * independently; the constants are the published ones of src/qcd/constants.
 */
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { fixedTerms, pointAt, settingOf } from '../../src/masses/convert.js';
import { convertMass, exactMass, type DefinitionName, type MassRequest } from '../../src/masses/index.js';
import { renormalonOf } from '../../src/masses/asymptotic.js';
import { gammaSeries, leadingLogShift, rEvolve } from '../../src/masses/r-evolution.js';
import { POLE_SERIES } from '../../src/masses/pole-series.js';
import { Rational, exact, toNumberExact, type Exact } from '../../src/numerics/index.js';
import { evolveAlpha, isRefusal, type Loops, type Refusal } from '../../src/qcd/index.js';
import { distanceTo } from '../support/check-value.js';

type Values = Readonly<Record<string, string | readonly string[]>>;
interface Case {
  readonly name: string;
  readonly light: number;
  readonly mass: string;
  readonly alpha: string;
  readonly strength: string;
  readonly cutoff: string;
  readonly ratio: string;
  readonly values: Values;
}
interface Data {
  readonly cases: readonly Case[];
  readonly evolved: {
    readonly light: number;
    readonly mass: string;
    readonly alpha: string;
    readonly cutoff: string;
    readonly shifts: readonly string[];
  };
}

const data: Data = JSON.parse(readFileSync(new URL('data/masses.json', import.meta.url), 'utf8')) as Data;

function granted<T>(x: T | Refusal | undefined): T {
  if (x === undefined) throw new Error('no value');
  if (isRefusal(x)) throw new Error(x.reason);
  return x;
}

const rational = (text: string): Rational => {
  const q = Rational.parse(text);
  if (q === undefined) throw new Error(text);
  return q;
};
const list = (values: Values, key: string): readonly string[] => {
  const found = values[key];
  if (!Array.isArray(found)) throw new Error(`no list ${key}`);
  return found as readonly string[];
};
const one = (values: Values, key: string): string => {
  const found = values[key];
  if (typeof found !== 'string') throw new Error(`no value ${key}`);
  return found;
};

function requestOf(c: Case, definition: DefinitionName, needsScale: boolean): MassRequest {
  return {
    mass: Number(c.mass),
    from: { definition: 'msbar' },
    to: { definition, ...(needsScale ? { scale: Number(c.cutoff) } : {}) },
    alpha: { value: Number(c.alpha), scale: Number(c.mass), flavours: c.light },
    light: c.light,
    loops: 4,
    strength: Number(c.strength),
    scale: { ratio: Number(c.ratio) },
  };
}

/** The terms of a definition at m(m) = mass. */
function termsOf(c: Case, definition: DefinitionName, needsScale: boolean) {
  const request = requestOf(c, definition, needsScale);
  const setting = granted(settingOf(request));
  const point = granted(pointAt(setting, Number(c.mass)));
  return granted(fixedTerms(setting, request.to, point));
}

function expectClose(own: number, wanted: string, size: number, digits: number): void {
  expect(Math.abs(own - Number(wanted)), `${own} against ${wanted}`).toBeLessThan(size * 10 ** -digits);
}

describe.each(data.cases.map((c) => [c.name, c] as const))('%s', (_name, c) => {
  it.each([
    ['rs', true, 'rs'],
    ['rs-prime', true, 'rs-prime'],
    ['msr-practical', true, 'msr-practical fixed order'],
    ['ps', true, 'ps'],
    ['kinetic', true, 'kinetic'],
    ['pv', false, 'pv removed'],
  ] as const)('what %s takes out', (definition, needsScale, key) => {
    const { pole, removed } = termsOf(c, definition, needsScale);
    list(c.values, 'pole').forEach((wanted, n) => {
      if (n + 1 < pole.length) expectClose(pole[n + 1] ?? NaN, wanted, 1, 13);
    });
    list(c.values, key).forEach((wanted, n) => expectClose(removed[n + 1] ?? NaN, wanted, 1, 12));
  });

  it('the Borel integrals of PV and MRS', () => {
    const pv = termsOf(c, 'pv', false);
    expectClose(pv.closed, one(c.values, 'pv closed'), Number(c.mass), 13);
    const mrs = termsOf(c, 'mrs', false);
    expectClose(mrs.closed, one(c.values, 'mrs closed'), Number(c.mass), 13);
    list(c.values, 'mrs terms').forEach((wanted, n) =>
      expectClose((mrs.pole[n + 1] ?? NaN) - (mrs.removed[n + 1] ?? NaN), wanted, 1, 12),
    );
  });

  it('principal value minus MRS is |Im| cot(πb)', () => {
    const b = renormalonOf(c.light).b.toNumber();
    const { closed } = termsOf(c, 'mrs', false);
    const whole = closed + Number(one(c.values, 'Im')) / Math.tan(Math.PI * b);
    expectClose(whole, one(c.values, 'geometric pv closed'), Number(c.mass), 13);
  });

  // Certified digits: the sum of the reference's terms to 28 digits.
  it.each([
    ['rs', true, 'rs'],
    ['ps', true, 'ps'],
    ['pv', false, 'pv removed'],
    ['mrs', false, ''],
  ] as const)('%s in enclosures', (definition, needsScale, key) => {
    const inputs = { mass: exact(rational(c.mass)), alpha: exact(rational(c.alpha)) };
    const found = granted<Exact>(exactMass(requestOf(c, definition, needsScale), inputs));
    const sum = (texts: readonly string[]): Rational =>
      texts.reduce((total, text) => total.add(rational(text)), Rational.ZERO);
    const closed =
      definition === 'pv' ? one(c.values, 'pv closed') : definition === 'mrs' ? one(c.values, 'mrs closed') : '0';
    const left =
      key === '' ? sum(list(c.values, 'mrs terms')) : sum(list(c.values, 'pole')).sub(sum(list(c.values, key)));
    const wanted = rational(c.mass).add(rational(closed)).add(left);
    expect(distanceTo(found.ball(140), wanted.toString())).toBeLessThan(Number(c.mass) * 1e-28);
    const quick = granted(convertMass(requestOf(c, definition, needsScale)));
    expect(Math.abs(quick.value / wanted.toNumber() - 1)).toBeLessThan(1e-14);
  });
});

describe('R-evolution', () => {
  const { light, mass, alpha, cutoff, shifts } = data.evolved;
  const gamma = gammaSeries(POLE_SERIES).coefficients(light).map(toNumberExact);
  const [from, to, start] = [Number(mass), Number(cutoff), Number(alpha)];

  it.each([1, 2, 3, 4] as const)('with %i terms of γ and of β', (terms: Loops) => {
    const alphaTo = granted(evolveAlpha({ alpha: start, from, to, flavours: light, loops: terms }));
    const { shift, doubt } = rEvolve({
      from,
      alphaFrom: start,
      alphaTo,
      light,
      loops: terms,
      gamma: gamma.slice(0, terms),
    });
    expectClose(shift, shifts[terms - 1] ?? '', 1, 14);
    expect(doubt).toBeLessThan(1e-14);
  });

  it('leading logarithms in closed form', () => {
    expectClose(leadingLogShift(from, to, start, light, gamma[0] ?? NaN), shifts[0] ?? '', 1, 14);
  });

  it('is the conversion of the practical MSR mass', () => {
    const found = granted(
      convertMass({
        mass: from,
        from: { definition: 'msbar' },
        to: { definition: 'msr-practical', scale: to },
        alpha: { value: start, scale: from, flavours: light },
        light,
        loops: 4,
      }),
    );
    expectClose(found.value - from, shifts[3] ?? '', 1, 14);
  });
});
