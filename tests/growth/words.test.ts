import { expect, test } from 'vitest';
import { plusMinus } from '../../src/growth/words.js';

test('the rounding of doubles is no error of a series', () => {
  expect(plusMinus({ value: 1, error: 2.2e-16 })).toBe('1');
  expect(plusMinus({ value: 1, error: 2.2e-9 })).toBe('1.0000000000 ± 2.2e-9');
  expect(plusMinus({ value: 1234567, error: 4321 })).toBe('1234600 ± 4300');
  expect(plusMinus({ value: 1.234567e30, error: 4.321e27 })).toBe('1.2346e+30 ± 4.3e+27');
  expect(plusMinus({ value: -0.4444, error: 0.0123 })).toBe('-0.444 ± 0.012');
  expect(plusMinus({ value: 0, error: 0.5 })).toBe('0.00 ± 0.5');
});
