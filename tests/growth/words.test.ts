import { expect, test } from 'vitest';
import { plusMinus } from '../../src/growth/words.js';

test('the rounding of doubles is no error of a series', () => {
  expect(plusMinus({ value: 1, error: 2.2e-16 })).toBe('1');
  expect(plusMinus({ value: 1, error: 2.2e-9 })).toBe('1 ± 2.2e-9');
  expect(plusMinus({ value: -0.4444, error: 0.0123 })).toBe('-0.444 ± 0.012');
  expect(plusMinus({ value: 0, error: 0.5 })).toBe('0 ± 0.5');
});
