/** Identities of the mass relations: exact ones in enclosures and rationals, the others to rounding. */
import fc from 'fast-check';
import { describe, expect, it, test } from 'vitest';
import { ASYMPTOTIC_SERIES, renormalonOf } from '../../src/masses/asymptotic.js';
import type { DefinitionName, MassPlace } from '../../src/masses/index.js';
import {
  DEFINITION_NAMES,
  ambiguityOverLambda,
  convertMass,
  definitionOf,
  exactMass,
  type MassRequest,
} from '../../src/masses/index.js';
import { asWritten, exactGeometric } from '../../src/masses/exact-couplings.js';
import { ballNumbers } from '../../src/masses/numbers.js';
import { POLE_SERIES } from '../../src/masses/pole-series.js';
import {
  R,
  Rational,
  addExact,
  exact,
  exp,
  ln2,
  pi,
  rgamma,
  subExact,
  type Ball,
  type Exact,
} from '../../src/numerics/index.js';
import {
  betaCoefficients,
  changeScale,
  evolveMass,
  exactAlpha,
  exactLambda,
  isRefusal,
  type Refusal,
} from '../../src/qcd/index.js';

function granted<T>(x: T | Refusal | undefined): T {
  if (x === undefined) throw new Error('no value');
  if (isRefusal(x)) throw new Error(`${x.reason}; ${x.remedy}`);
  return x;
}

const BOTTOM = { mass: 4.18, alpha: { value: 0.225, scale: 4.18, flavours: 4 }, light: 4 } as const;
const TOP = { mass: 163, alpha: { value: 0.1085, scale: 163, flavours: 5 }, light: 5 } as const;
const CHARM = { mass: 1.28, alpha: { value: 0.38, scale: 1.28, flavours: 3 }, light: 3 } as const;
const MSBAR: MassPlace = { definition: 'msbar' };

const place = (definition: DefinitionName, scale: number): MassPlace =>
  definitionOf(definition).parameter === undefined ? { definition } : { definition, scale };

const OTHERS = DEFINITION_NAMES.filter((name) => name !== 'msbar');

describe.each([
  ['bottom', BOTTOM, 2],
  ['top', TOP, 20],
  ['charm', CHARM, 1],
] as const)('%s', (_name, quark, cutoff) => {
  it.each(OTHERS)('m(m) to %s and back is the identity to 15 digits', (name) => {
    const to = place(name, cutoff);
    const there = granted(convertMass({ ...quark, from: MSBAR, to }));
    const back = granted(convertMass({ ...quark, mass: there.value, from: to, to: MSBAR }));
    // The charm pole mass at four loops has its least value near by: there the slope takes digits away.
    const lost = name === 'pole' && quark.light === 3 ? 1e-12 : 3e-15;
    expect(Math.abs(back.value / quark.mass - 1)).toBeLessThan(lost);
  });

  it('from any definition to any other and back', () => {
    const some = ['pole', 'rs', 'msr', 'mrs', 'kinetic'] as const;
    for (const a of some) {
      for (const b of some) {
        const [from, to] = [place(a, cutoff), place(b, cutoff)];
        // One order for all: the way there and the way back must use the same relations.
        const order = 2;
        const start = granted(convertMass({ ...quark, from: MSBAR, to: from, order }));
        const there = granted(convertMass({ ...quark, mass: start.value, from, to, order }));
        const back = granted(convertMass({ ...quark, mass: there.value, from: to, to: from, order }));
        expect(Math.abs(back.value / start.value - 1), `${a} to ${b}`).toBeLessThan(1e-14);
      }
    }
  });

  it('m_MSRp(m(m)) = m(m)', () => {
    const found = granted(
      convertMass({ ...quark, from: MSBAR, to: { definition: 'msr-practical', scale: quark.mass } }),
    );
    expect(found.value).toBe(quark.mass);
  });

  it('the R-evolution may stop on the way', () => {
    const half = { definition: 'msr', scale: Math.sqrt(cutoff * quark.mass) } as const;
    const end = { definition: 'msr', scale: cutoff } as const;
    const there = granted(convertMass({ ...quark, from: MSBAR, to: half }));
    const onwards = granted(convertMass({ ...quark, mass: there.value, from: half, to: end }));
    const direct = granted(convertMass({ ...quark, from: MSBAR, to: end }));
    expect(Math.abs(onwards.value / direct.value - 1)).toBeLessThan(2e-15);
  });

  it('order 0 is the mass itself, and the Borel integral for the summed ones', () => {
    for (const name of OTHERS) {
      const definition = definitionOf(name);
      if (definition.kind !== 'subtracted') continue;
      const found = granted(convertMass({ ...quark, from: MSBAR, to: place(name, cutoff), order: 0 }));
      expect(found.value).toBe(quark.mass);
    }
  });
});

test('m(μ) is the running of the other room', () => {
  const alpha = { value: 0.2268, scale: 4.163, flavours: 5 };
  const request: MassRequest = { mass: 4.163, from: MSBAR, to: { definition: 'running', scale: 10 }, alpha, light: 4 };
  const other = granted(evolveMass({ mass: 4.163, alpha: 0.2268, from: 4.163, to: 10, flavours: 5, loops: 5 }));
  expect(granted(convertMass(request)).value).toBe(other.mass);
});

describe('the ambiguity', () => {
  const { b, t } = renormalonOf(4);
  const prec = 150;
  const alpha = exact(Rational.of(9, 40));
  const mass = exact(Rational.of(209, 50));
  const source = { given: BOTTOM.alpha, light: 4, flavours: 5, loops: 4 };
  const ball = (x: Exact): Ball => x.ball(prec);

  /** |Im| of the Borel integral in the geometric coupling at μ, N = 1. */
  function imaginary(mu: Exact): Ball {
    const there = granted(exactAlpha({ alpha, from: mass, to: mu, flavours: 4, loops: 4 }));
    const geometric = granted(exactGeometric(source, there, mu));
    const x = R.div(ball(t), geometric.ball(prec), prec);
    const { im } = ballNumbers(prec).kernel(b, x);
    return R.mul(R.mul(ball(mu), ball(t), prec), im, prec);
  }

  it('|Im|/π = (2π/β_0) 2^(−b) Λ/Γ(1+b) to 30 digits, whatever the scale', () => {
    const lambda = granted(exactLambda(alpha, mass, 4, 4)).ball(prec);
    for (const mu of [mass, exact(Rational.of(2)), exact(Rational.of(10))]) {
      const left = R.div(imaginary(mu), pi(prec), prec);
      const power = exp(R.neg(R.mul(R.fromRational(b, prec), ln2(prec), prec)), prec);
      const factor = rgamma(R.add(R.ONE, R.fromRational(b, prec), prec), prec);
      const right = R.mul(R.mul(R.mul(ball(t), factor, prec), lambda, prec), power, prec);
      const gap = R.sub(left, right, prec);
      expect(R.containsZero(gap)).toBe(true);
      expect(R.radiusToNumber(gap)).toBeLessThan(1e-30);
    }
  });

  it('the same in doubles', () => {
    const lambda = granted(exactLambda(alpha, mass, 4, 4)).ball(prec);
    const wanted = R.toNumber(R.div(imaginary(mass), R.mul(pi(prec), lambda, prec), prec));
    expect(Math.abs(ambiguityOverLambda(4, 1) / wanted - 1)).toBeLessThan(1e-14);
    expect(ambiguityOverLambda(4, 0.5) * 2).toBeCloseTo(ambiguityOverLambda(4, 1), 15);
  });
});

describe('re-expansion', () => {
  const log = exact(Rational.of(-22, 15));

  it('there and back is the identity, in rationals', () => {
    const beta = betaCoefficients(4).slice(0, 3);
    // The series of unit strength over 4π, geometric coupling: rational in a = α_s/(4π).
    const { b } = renormalonOf(4);
    const own: Exact[] = [exact(1)];
    for (let n = 1; n < 4; n++) {
      const factor = Rational.of(50, 3).mul(b.add(Rational.of(n)));
      own.push(exact((own[n - 1]?.rational ?? Rational.ZERO).mul(factor)));
    }
    const there = changeScale({ coefficients: own, firstPower: 1 }, beta, log);
    const back = changeScale({ coefficients: there, firstPower: 1 }, beta, exact(Rational.of(22, 15)));
    back.forEach((c, n) => expect(c.rational?.toString()).toBe(own[n]?.rational?.toString()));
    expect(there[3]?.rational?.toString()).not.toBe(own[3]?.rational?.toString());
  });

  it('pole to RS to pole, order by order, is the identity in enclosures', () => {
    const beta = betaCoefficients(4);
    const at = (coefficients: readonly Exact[], l: Exact): Exact[] =>
      changeScale({ coefficients, firstPower: 1 }, beta, l);
    const pole = at(POLE_SERIES.coefficients(4), log);
    const removed = at(ASYMPTOTIC_SERIES.coefficients(4), exact(Rational.of(3, 4)));
    const rs = pole.map((p, n) => subExact(p, removed[n] ?? exact(0)));
    rs.map((c, n) => addExact(c, removed[n] ?? exact(0))).forEach((c, n) => {
      const gap = R.sub(c.ball(120), pole[n]?.ball(120) ?? R.ZERO, 120);
      expect(R.containsZero(gap)).toBe(true);
      expect(R.radiusToNumber(gap)).toBeLessThan(1e-25);
    });
  });

  // What a change of the scale of the expansion does to the sum of n orders is of order n + 1: half the coupling, 2^(n+1) less.
  it.each([
    ['pole', 1],
    ['rs', 3],
    ['rs-prime', 3],
    ['ps', 4],
    ['msr', 3],
    ['mrs', 3],
    ['pv', 2],
    ['kinetic', 2],
  ] as const)('%s at order %i depends on μ at the next order only', (name, order) => {
    const shift = (alpha: number): number => {
      const request = {
        mass: 163,
        from: MSBAR,
        to: place(name, 100),
        alpha: { value: alpha, scale: 163, flavours: 5 },
        light: 5,
        strength: 0.46,
        order,
      };
      const one = granted(convertMass(request)).value;
      return granted(convertMass({ ...request, scale: { ratio: 2 } })).value - one;
    };
    const ratio = shift(0.04) / shift(0.02);
    expect(ratio / 2 ** (order + 1)).toBeGreaterThan(0.8);
    expect(ratio / 2 ** (order + 1)).toBeLessThan(1.35);
  });
});

test('certified and quick values agree for random input', () => {
  const names = ['pole', 'rs', 'rs-prime', 'ps', 'mrs', 'pv', 'kinetic'] as const;
  fc.assert(
    fc.property(
      fc.constantFrom(...names),
      fc.integer({ min: 3000, max: 20000 }),
      fc.integer({ min: 140, max: 240 }),
      fc.integer({ min: 1000, max: 2900 }),
      (name, m, a, r) => {
        const [mass, alpha, cutoff] = [m / 1000, a / 1000, r / 1000];
        const to = place(name, cutoff);
        const request: MassRequest = {
          mass,
          from: MSBAR,
          to,
          alpha: { value: alpha, scale: 4, flavours: 4 },
          light: 4,
          strength: 0.5,
        };
        const quick = convertMass(request);
        if (isRefusal(quick)) return;
        const inputs = { mass: asWritten(mass), alpha: asWritten(alpha) };
        const sharp = R.toNumber(granted<Exact>(exactMass(request, inputs)).ball(80));
        expect(Math.abs(quick.value / sharp - 1)).toBeLessThan(1e-14);
        const inverse = { ...request, mass: quick.value, from: to, to: MSBAR };
        const back = granted<Exact>(exactMass(inverse, { ...inputs, mass: asWritten(quick.value) })).ball(80);
        expect(Math.abs(R.toNumber(back) / mass - 1)).toBeLessThan(1e-14);
      },
    ),
    { numRuns: 5 },
  );
});
