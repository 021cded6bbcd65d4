import { describe, expect, test } from 'vitest';
import { tell, UsageError } from '../../src/cli/faults.js';
import { run } from '../../src/cli/run.js';
import { InputError } from '../../src/series/index.js';

describe('what is told', () => {
  test('every problem of an input, a line each', () => {
    const error = new InputError([
      { file: 'a.yaml', line: 3, column: 5, field: 'flavours', found: '"three"', wanted: 'a whole number' },
      { file: 'a.yaml', line: 9, column: 1, field: 'coefficients', found: 'nothing', wanted: 'a list' },
    ]);
    expect(tell(error, false)).toEqual({
      text:
        'leastterm: a.yaml:3:5: flavours: "three"; wanted a whole number\n' +
        'leastterm: a.yaml:9:1: coefficients: nothing; wanted a list\n',
      exitCode: 2,
    });
  });

  test('usage, with a pointer to the help', () => {
    expect(tell(new UsageError('--x: y', 'sum'), false)).toEqual({
      text: 'leastterm: --x: y\nleastterm: see leastterm sum --help\n',
      exitCode: 2,
    });
  });

  test.each([new TypeError('x is not a function'), 'a string', undefined])(
    'a fault of ours, without a stack: %s',
    (error) => {
      const { text, exitCode } = tell(error, false);
      expect(exitCode).toBe(3);
      expect(text).toMatch(/^leastterm: internal fault: /);
      expect(text).toContain('please report it');
      expect(text).toContain('LEASTTERM_DEBUG=1');
      expect(text).not.toContain('    at ');
    },
  );

  test('with LEASTTERM_DEBUG the stack follows', () => {
    const { text } = tell(new TypeError('x'), true);
    expect(text).toContain('    at ');
    expect(text).not.toContain('LEASTTERM_DEBUG');
  });
});

test('a fault during a run is told and ends with 3', async () => {
  let told = '';
  const broken = {
    write: (): never => {
      throw new TypeError('the sink is broken');
    },
    isTerminal: false,
  };
  const listening = {
    write: (text: string): void => {
      told += text;
    },
    isTerminal: false,
  };
  const status = await run(['--help'], { stdout: broken, stderr: listening, stdinIsTerminal: false, environment: {} });
  expect(status).toBe(3);
  expect(told).toMatch(/^leastterm: internal fault: TypeError: the sink is broken\n/);
});
