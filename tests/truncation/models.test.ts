/** What holds for all models: invariances, order of the bands, refusals with reasons, and no number that is none. */
import * as fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { exact, Rational } from '../../src/numerics/index.js';
import {
  TRUNCATION_MODELS,
  USUAL_PRIORS,
  questionOf,
  restricted,
  type TruncationModel,
} from '../../src/truncation/index.js';
import { rational } from '../support/check-value.js';
import { answer, ask, expectClose, numbers, refusal, type Given } from './support.js';

const model = (name: string): TruncationModel => {
  const found = TRUNCATION_MODELS.find((m) => m.name === name);
  if (found === undefined) expect.fail(`no model ${name}`);
  return found;
};

const ADLER = ['1', '1.6398212', '6.3710145', '49.0757'];
const given: Given = {
  at: '0.3',
  divisor: 'pi',
  flavours: 3,
  stated: [{ t: exact(-1), corrections: [], kind: 'ultraviolet', origin: 'file' }],
};
const names = TRUNCATION_MODELS.map((m) => m.name);
/** The others need terms that have passed their least one: competing.test.ts. */
const answering = names.filter((name) => name !== 'least-term' && name !== 'remainder');

test('names are unique, and every prior of a model exists', () => {
  expect(new Set(names).size).toBe(names.length);
  for (const { priors } of TRUNCATION_MODELS)
    for (const name of priors) expect(USUAL_PRIORS[name]).toBeTypeOf('number');
});

describe.each(answering)('%s', (name) => {
  const usual = answer(model(name), ask(numbers(ADLER), given));

  test('has the wider band at 95 %', () => {
    expect(usual.high68 - usual.low68).toBeGreaterThan(0);
    expect(usual.high95 - usual.low95).toBeGreaterThan(usual.high68 - usual.low68);
  });

  test('scales with an overall factor, and turns with its sign', () => {
    const scaled = answer(model(name), ask(numbers(ADLER), { ...given, factor: '7/3' }));
    expectClose(scaled.high68, (7 / 3) * usual.high68, 1e-7);
    expectClose(scaled.low95, (7 / 3) * usual.low95, 1e-7);
    const turned = answer(model(name), ask(numbers(ADLER), { ...given, factor: '-1' }));
    expectClose(turned.high68, -usual.low68, 1e-4);
    expectClose(turned.low95, -usual.high95, 1e-4);
  });

  test('keeps its relative size far outside the range of doubles', () => {
    const far = ask(numbers(ADLER), { ...given, factor: '1e-5000' });
    const near = ask(numbers(ADLER), given);
    const estimate = model(name).estimate(far);
    if (estimate.kind === 'refusal') expect.fail(estimate.reason);
    const last = far.known.values.at(-1) ?? 0;
    expectClose(
      estimate.bands[68].high / last,
      usual.high68 / ((near.known.values.at(-1) ?? 0) * 2 ** near.known.unit),
      1e-6,
    );
  });
});

describe('a change of variable', () => {
  // The same series in alpha_s itself: c_k divided by π^k to 60 digits.
  const PI = rational('3.14159265358979323846264338327950288419716939937510582097494');
  const inAlpha = ADLER.map((c, k) => exact(rational(c).div(PI.pow(k + 1))));
  const pi = ask(numbers(ADLER), given);
  const alpha = ask(inAlpha, { ...given, divisor: '1' });

  test.each([
    'last-term',
    'last-ratio',
    'geometric-tail',
    'pade-next',
    'fac-next',
    'scale-envelope',
    'modified-ch',
    'geometric',
    'abc',
  ])('leaves %s alone', (name) => {
    expectClose(answer(model(name), alpha).high68, answer(model(name), pi).high68, 1e-6);
  });

  test('does not leave Cacciari and Houdeau alone', () => {
    expect(answer(model('cacciari-houdeau'), alpha).high68).toBeGreaterThan(
      2 * answer(model('cacciari-houdeau'), pi).high68,
    );
  });

  test('is undone by the unit of the model', () => {
    const undone = ask(inAlpha, { ...given, divisor: '1', priors: { 'ch.unit': Math.PI } });
    expectClose(answer(model('cacciari-houdeau'), undone).high68, answer(model('cacciari-houdeau'), pi).high68, 1e-9);
  });
});

describe('the modified model and the plain one', () => {
  test('differ by the factorials: b_k as coefficients give S = k! S(b)', () => {
    const factorials = [1, 1, 2, 6];
    const b = ADLER.map((c, k) => exact(rational(c).div(Rational.of(factorials[k] ?? 1))));
    const plain = answer(model('cacciari-houdeau'), ask(b, { at: '0.2' }));
    const modified = answer(model('modified-ch'), ask(numbers(ADLER), { at: '0.2' }));
    expectClose(modified.high68, 24 * plain.high68, 1e-12);
    expectClose(modified.high95, 24 * plain.high95, 1e-12);
  });

  test('the renormalon form is flat on a series of its own kind', () => {
    // c_n = Γ(n + 5/2)/Γ(5/2) 2^n: all b_n equal, so S is the next term itself.
    let c = Rational.ONE;
    const own = [c];
    for (let n = 0; n < 7; n++) {
      c = c.mul(rational('5/2').add(Rational.of(n))).mul(Rational.of(2));
      own.push(c);
    }
    const next = own.pop()?.toNumber() ?? 0;
    const stated = [
      { t: exact(rational('1/2')), exponent: exact(rational('5/2')), corrections: [], kind: 'other', origin: 'file' },
    ] as const;
    const question = ask(
      own.map((q) => exact(q)),
      { at: '0.05', plain: true, power: 0, stated },
    );
    const { estimate } = answer(model('renormalon-ch'), question);
    expectClose((estimate.facts[0]?.value ?? 0) * 2 ** question.known.unit, next * 0.05 ** 7, 1e-12);
  });
});

describe('refusals', () => {
  test.each([
    ['last-ratio', ['1'], /1 coefficient known/],
    ['pade-next', ['1', '2'], /no approximant that predicts/],
    ['fac-next', ['1'], /nothing to predict from/],
    ['cacciari-houdeau', ['1'], /prior alone/],
    ['modified-ch', ['1'], /prior alone/],
    ['geometric', ['1'], /no ratio/],
    ['abc', ['1'], /no ratio/],
    ['scale-marginalised', ['1'], /no ratio/],
    ['least-term', ['1', '1'], /not reached/],
    ['last-term', ['1', '2', '0'], /exactly zero/],
    ['geometric-tail', ['1', '20'], /not below 1/],
    ['geometric', ['1', '20', '800'], /do not fall any more \(smallest at order 1\)/],
    ['abc', ['1', '20', '800'], /do not fall/],
    ['scale-averaged', ['1', '20', '800'], /do not fall/],
    ['geometric', ['1', '0', '0'], /end with too many zeros/],
    ['abc', ['1', '0', '0'], /end with too many zeros/],
    ['fac-next', ['1', '1', '1', '1', '1', '1'], /as many loops/],
    ['pade-next', ['1', '0', '0', '1'], /singular block/],
  ])('%s of %j', (name, coefficients, reason) => {
    const refused = refusal(model(name), ask(numbers(coefficients), { at: '0.3', divisor: 'pi', flavours: 3 }));
    expect(refused.reason).toMatch(reason);
  });

  test.each(['fac-next', 'scale-envelope', 'scale-marginalised', 'scale-averaged'])(
    '%s without a beta function',
    (name) => {
      refusal(model(name), ask(numbers(ADLER), { at: '0.1', plain: true }));
      refusal(model(name), ask(numbers(ADLER), { at: '0.3', divisor: 'pi' }));
    },
  );

  test('a scale envelope that runs into the Landau pole', () => {
    const { remedy } = refusal(model('scale-envelope'), ask(numbers(ADLER), { at: '0.9', divisor: 'pi', flavours: 3 }));
    expect(remedy).toContain('scale.factor');
  });

  test('no singularity known beforehand, or one that makes a logarithm', () => {
    refusal(model('renormalon-ch'), ask(numbers(ADLER), { at: '0.3' }));
    const logarithm = [{ t: exact(1), exponent: exact(-1), corrections: [], kind: 'other', origin: 'file' }] as const;
    refusal(model('renormalon-ch'), ask(numbers(ADLER), { at: '0.3', stated: logarithm }));
  });

  test('a series that is all zero is no question', () => {
    const { expansion } = ask(numbers(ADLER), given);
    const setting = { coupling: { name: 'x', divisor: '1', plain: true }, priors: USUAL_PRIORS } as const;
    expect(questionOf({ ...expansion, coefficients: numbers(['0', '0']) }, setting)).toBeUndefined();
    expect(questionOf({ ...expansion, x: exact(0) }, setting)).toBeUndefined();
    expect(questionOf({ ...expansion, factor: exact(0) }, setting)).toBeUndefined();
  });
});

describe('shapes of series', () => {
  test('zeros in front are no terms', () => {
    const padded = questionOf(
      { ...ask(numbers(ADLER), given).expansion, coefficients: numbers(['0', '0', ...ADLER]), power: -1 },
      { coupling: { name: 'alpha_s', divisor: 'pi', plain: false }, flavours: 3, priors: USUAL_PRIORS },
    );
    if (padded === undefined) expect.fail();
    expect(padded.known.orders).toEqual([1, 2, 3, 4]);
  });

  test('alternating signs: the abc model expects the next sign, the symmetric ones do not mind', () => {
    const same = ask(numbers(['1', '0.5', '0.3', '0.12']), { at: '1', plain: true, power: 0 });
    const turned = ask(numbers(['1', '-0.5', '0.3', '-0.12']), { at: '1', plain: true, power: 0 });
    expect(answer(model('abc'), same).next).toBeGreaterThan(0);
    expectClose(answer(model('abc'), turned).next, answer(model('abc'), same).next, 1e-9);
    expectClose(answer(model('geometric'), turned).high68, answer(model('geometric'), same).high68, 1e-12);
    const odd = ask(numbers(['1', '-0.5', '0.3']), { at: '1', plain: true, power: 0 });
    expect(answer(model('abc'), odd).high68).toBeLessThan(0);
  });

  test('a lacunary series is read in the square of its variable', () => {
    const dense = ask(numbers(['1', '0.5', '0.3']), { at: '0.25', plain: true, power: 0 });
    const sparse = ask(numbers(['1', '0', '0.5', '0', '0.3', '0']), { at: '0.5', plain: true, power: 0 });
    expect(sparse.known).toMatchObject({ orders: [0, 2, 4], stride: 2 });
    for (const name of ['last-term', 'geometric-tail', 'pade-next', 'cacciari-houdeau', 'geometric', 'abc']) {
      expectClose(answer(model(name), sparse).high95, answer(model(name), dense).high95, 1e-6);
    }
  });

  test('past the least term the band of that term belongs to the sum cut there', () => {
    const factorials = ask(numbers(['1', '1', '2', '6', '24', '120']), { at: '0.3', plain: true, power: 0 });
    const { estimate, high68 } = answer(model('least-term'), factorials);
    expect(estimate.terms).toBe(4);
    expectClose(high68, 6 * 0.3 ** 3, 1e-12);
  });

  test('Padé predicts a rational function exactly', () => {
    // 1/((1 − x)(1 − 2x)): c_n = 2^(n+1) − 1.
    const c = Array.from({ length: 6 }, (_, n) => String(2 ** (n + 1) - 1));
    const { next } = answer(model('pade-next'), ask(numbers(c), { at: '0.1', plain: true, power: 0 }));
    expectClose(next, 127e-6, 1e-12);
  });

  test('a part of the terms is the question that those terms alone would make', () => {
    const whole = ask(numbers(ADLER), given);
    const part = restricted(whole, 3);
    if (part === undefined) expect.fail();
    const alone = ask(numbers(ADLER.slice(0, 3)), given);
    for (const name of answering)
      expectClose(answer(model(name), part).high95, answer(model(name), alone).high95, 1e-9);
  });
});

const multiplier = Number(process.env['LEASTTERM_TEST_MULTIPLIER'] ?? 1);

/** Coefficients of wild sizes and signs, zeros among them. */
const coefficient = fc.oneof(
  { weight: 6, arbitrary: fc.tuple(fc.integer({ min: -999, max: 999 }), fc.integer({ min: -4, max: 4 })) },
  { weight: 1, arbitrary: fc.tuple(fc.integer({ min: -9, max: 9 }), fc.integer({ min: -400, max: 400 })) },
  { weight: 1, arbitrary: fc.constant([0, 0] as [number, number]) },
);

test('whatever the coefficients, a model answers with ordered finite bands or refuses with reason and remedy', () => {
  fc.assert(
    fc.property(
      fc.array(coefficient, { minLength: 1, maxLength: 7 }),
      fc.integer({ min: 1, max: 60 }),
      fc.integer({ min: 0, max: 3 }),
      (list, hundredths, power) => {
        const coefficients = numbers(list.map(([c, e]) => `${c}e${e}`));
        if (coefficients.every((c) => c.rational?.isZero() === true)) return;
        const lead = coefficients.findIndex((c) => c.rational?.isZero() !== true);
        const question = ask(coefficients.slice(lead), { ...given, at: `${hundredths}e-2`, power });
        for (const m of TRUNCATION_MODELS) {
          const outcome = m.estimate(question);
          if (outcome.kind === 'refusal') {
            expect(outcome.reason, m.name).toMatch(/^(?!.*(NaN|undefined))./);
            expect(outcome.remedy, m.name).not.toBe('');
            continue;
          }
          const [one, two] = [outcome.bands[68], outcome.bands[95]];
          for (const end of [one.low, one.high, two.low, two.high]) expect(Number.isFinite(end), m.name).toBe(true);
          expect(one.low, m.name).toBeLessThanOrEqual(one.high);
          expect(two.high - two.low, m.name).toBeGreaterThanOrEqual(one.high - one.low);
          for (const fact of outcome.facts) expect(Number.isNaN(fact.value), `${m.name} ${fact.name}`).toBe(false);
          expect(outcome.next ?? 0, m.name).not.toBeNaN();
          expect(outcome.notes.join(), m.name).not.toMatch(/NaN|undefined/);
        }
      },
    ),
    { numRuns: Math.ceil(40 * multiplier), seed: 20260513 },
  );
});
