import { describe, expect, test } from 'vitest';
import { exact } from '../../src/numerics/index.js';
import {
  isPriorProblem,
  priorNames,
  PRIORS,
  readPriors,
  TRUNCATION_MODELS,
  USUAL_PRIORS,
} from '../../src/truncation/index.js';
import { answer, ask, numbers } from './support.js';

describe('a list of priors', () => {
  test('changes what it names and nothing else', () => {
    const priors = readPriors(' abc.xi=3, geometric.omega = 2.5 ,chbar.lambda=6e-1');
    if (isPriorProblem(priors)) expect.fail(priors.problem);
    expect(priors).toEqual({ ...USUAL_PRIORS, 'abc.xi': 3, 'geometric.omega': 2.5, 'chbar.lambda': 0.6 });
  });

  test.each([
    ['abc.xi', '"abc.xi" is not NAME=VALUE'],
    ['', '"" is not NAME=VALUE'],
    ['abc.zeta=1', 'no prior "abc.zeta"'],
    ['toString=1', 'no prior "toString"'],
    ['abc.xi=0', 'abc.xi = 0'],
    ['abc.xi=-1', 'abc.xi = -1'],
    ['abc.xi=two', 'abc.xi = two'],
    ['abc.xi=1e999', 'abc.xi = 1e999'],
    ['geometric.omega=-0.1', 'geometric.omega = -0.1'],
    ['scale.loops=2.5', 'scale.loops = 2.5'],
    ['scale.factor=1', 'scale.factor = 1'],
    ['abc.xi=1=2', 'abc.xi = 1=2'],
  ])('%j is refused with what is wanted', (text, problem) => {
    const answered = readPriors(text);
    if (!isPriorProblem(answered)) expect.fail(`${text} was taken`);
    expect(answered.problem).toBe(problem);
    expect(answered.wanted).not.toBe('');
  });

  test('the usual values lie within their ranges', () => {
    for (const name of priorNames()) {
      const read = readPriors(`${name}=${USUAL_PRIORS[name]}`);
      expect(isPriorProblem(read), name).toBe(false);
      expect(PRIORS[name].meaning).not.toBe('');
    }
  });
});

test('every prior of a model moves its bands', () => {
  const changed: Readonly<Record<string, number>> = {
    'conventional.double': 3,
    'ch.unit': 2,
    'ch.slope': 1,
    'ch.constant': 1,
    'chbar.lambda': 0.6,
    'chbar.slope': 1,
    'geometric.omega': 4,
    'geometric.epsilon': 1,
    'abc.omega': 4,
    'abc.epsilon': 1,
    'abc.xi': 0.5,
    'abc.eta': 1,
    'scale.factor': 1.5,
    'scale.nodes': 5,
    'scale.loops': 1,
  };
  const given = {
    at: '0.3',
    divisor: 'pi',
    flavours: 3,
    additive: '100',
    stated: [{ t: exact(-1), corrections: [], kind: 'ultraviolet', origin: 'file' }],
  } as const;
  // Past the least term, and short of it: so that every model answers on one of the two.
  for (const list of [
    ['1', '1.6', '6.4', '49'],
    ['1', '0.5', '30'],
  ]) {
    const few = { 'scale.nodes': 7 };
    const usual = ask(numbers(list), { ...given, priors: few });
    for (const model of TRUNCATION_MODELS) {
      if (model.estimate(usual).kind === 'refusal') continue;
      const before = answer(model, usual);
      for (const name of model.priors) {
        const other = ask(numbers(list), { ...given, priors: { ...few, [name]: changed[name] ?? Number.NaN } });
        const after = answer(model, other);
        expect([after.low95, after.high95], `${model.name} ${name}`).not.toEqual([before.low95, before.high95]);
      }
    }
  }
});
