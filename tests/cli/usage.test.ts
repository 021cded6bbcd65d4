import { describe, expect, test } from 'vitest';
import { COMMANDS } from '../../src/cli/commands.js';
import { leastterm, words } from './harness.js';

const HELP = ['', '--help', '-h', 'help', '--json'] as const;

describe('help', () => {
  test.each(HELP.slice(0, 4))('leastterm %s', async (line) => {
    const { status, stdout, stderr } = await leastterm(words(line));
    expect(status).toBe(0);
    expect(stderr).toBe('');
    await expect(stdout).toMatchFileSnapshot('golden/help.txt');
  });

  test.each(COMMANDS.map((command) => command.name))('of %s, by three ways', async (command) => {
    const ways = [`help ${command}`, `${command} --help`, `${command} -h`];
    const texts = await Promise.all(ways.map(async (line) => leastterm(words(line))));
    for (const { status, stdout, stderr } of texts) {
      expect(status).toBe(0);
      expect(stderr).toBe('');
      expect(stdout).toBe(texts[0]?.stdout);
    }
    await expect(texts[0]?.stdout).toMatchFileSnapshot(`golden/help-${command}.txt`);
  });

  test('is at most 80 columns of plain ASCII', async () => {
    for (const topic of ['', ...COMMANDS.map((command) => command.name)]) {
      const { stdout } = await leastterm(words(`help ${topic}`));
      // An example is a command line to copy: it is not folded.
      for (const line of stdout.split('\n'))
        expect(line.length, line).toBeLessThanOrEqual(line.startsWith('  leastterm') ? 96 : 80);
      expect(stdout).toMatch(/^[\n -~]*$/);
    }
  });

  test('is answered before anything is read or complained about', async () => {
    const { status, stderr } = await leastterm(words('assess no-such-file --digits many --help'));
    expect([status, stderr]).toEqual([0, '']);
  });
});

test('--version is one line, wherever it stands', async () => {
  for (const line of ['--version', 'assess --version', 'sum x --by y --version']) {
    expect(await leastterm(words(line))).toEqual({ status: 0, stdout: 'leastterm 0.1.0\n', stderr: '' });
  }
});

const USUAL = COMMANDS.map((command) => command.name).join(', ');

/** Command line, and what standard error says after "leastterm: ", without the last line that points to the help. */
const MISTAKES: readonly (readonly [line: string, message: string])[] = [
  ['asses adler', '"asses" is no command; did you mean assess?'],
  ['frobnicate', `"frobnicate" is no command; wanted one of ${USUAL}`],
  ['help grwth', '"grwth" is no command; did you mean growth?'],
  ['--json', `no command given; wanted one of ${USUAL}`],
  ['-- assess', `no command given; wanted one of ${USUAL}`],
  ['assess', 'SERIES is missing: a catalogue id, a series file, or - for standard input'],
  ['assess adler', "--at is missing: the value of the coupling or variable; write --at '0.3156(30)'"],
  ['assess adler other --at 1', '"other" is one operand too many: assess takes one operand'],
  ['assess adler --att 1', '--att: no such option; did you mean --at?'],
  ['assess adler --digit 5 --at 1', '--digit: no such option; did you mean --digits?'],
  ['assess adler --zzz', '--zzz: no such option'],
  ['assess adler -x', '-x: no such option'],
  ['assess adler -digits 5', '-digits: long options have two dashes; write --digits'],
  [
    'assess adler --at',
    "--at: no value given; write --at '0.3156(30)'; a value that begins with a dash is joined on: --at=-0.1",
  ],
  [
    'assess adler --at --json',
    "--at: no value given; write --at '0.3156(30)'; a value that begins with a dash is joined on: --at=-0.1",
  ],
  ["assess adler --at ''", "--at: no value given; write --at '0.3156(30)'"],
  ['assess adler --at 1 -o', '--output: no value given; write --output result.txt'],
  ['assess adler --at 1 --by pade', '--by: assess has no such option'],
  ['assess adler --at 1 --digits foo', '--digits: "foo" is not a whole number from 1 to 2000; write --digits 30'],
  ['assess adler --at 1 --digits 0', '--digits: "0" is not a whole number from 1 to 2000; write --digits 30'],
  ['assess adler --at 1 --digits 1e3', '--digits: "1e3" is not a whole number from 1 to 2000; write --digits 30'],
  [
    'assess adler --at 1 --digits 99999999999999999999',
    '--digits: "99999999999999999999" is not a whole number from 1 to 2000; write --digits 30',
  ],
  ['assess adler --at 1 --order -2', '--order: "-2" is not a whole number from 1 to 1000000; write --order 4'],
  ['assess adler --at 1 --order 2.5', '--order: "2.5" is not a whole number from 1 to 1000000; write --order 4'],
  [
    'assess adler --at 1 --flavours three',
    '--flavours: "three" is not a whole number from 0 to 16; write --flavours 4',
  ],
  ['catalogue lst', '"lst" is no action of the catalogue (did you mean "list"?); wanted list, show ID or check'],
  ['catalogue show', 'ID is missing: which series to show; leastterm catalogue list names them'],
  ['catalogue list adler', '"adler" is one operand too many; write leastterm catalogue show adler'],
  ['catalogue show adler more', '"more" is one operand too many: catalogue takes 2 operands'],
];

describe('usage errors: exit code 2, nothing on standard output, the option and the remedy named', () => {
  test.each(MISTAKES)('leastterm %s', async (line, message) => {
    const { status, stdout, stderr } = await leastterm(words(line));
    const [first, pointer, end] = stderr.split('\n');
    expect(first).toBe(`leastterm: ${message}`);
    expect(pointer).toMatch(/^leastterm: see leastterm (\w+ )?--help$/);
    expect(end).toBe('');
    expect(stdout).toBe('');
    expect(status).toBe(2);
  });

  test('of sum: --by missing or mistyped names the prescriptions', async () => {
    const missing = await leastterm(words('sum adler --at 0.1'));
    expect(missing.status).toBe(2);
    expect(missing.stderr).toMatch(/^leastterm: --by is missing: one of fixed-order, least-term, /);
    const mistyped = await leastterm(words('sum adler --at 0.1 --by borel-pad'));
    expect(mistyped.status).toBe(2);
    expect(mistyped.stderr).toContain('no prescription "borel-pad" (did you mean "borel-pade"?)');
  });
});

test('--order beyond what is known is said, not dropped', async () => {
  const { status, stderr } = await leastterm(words('sum adler --at 0.3 --by fixed-order --order 9'));
  expect([status, stderr]).toEqual([0, 'leastterm: --order 9: adler has 4; all of them are used\n']);
  const quiet = await leastterm(words('sum adler --at 0.3 --by fixed-order --order 9 -q'));
  expect(quiet.stderr).toBe('');
});

describe('--at', () => {
  test.each(['half', '0.1(x)', '0.1 +- ', '1e999999999', 'NaN', '10%'])('refuses "%s"', async (at) => {
    const { status, stderr } = await leastterm(['assess', 'adler', '--at', at]);
    expect(status).toBe(2);
    expect(stderr).toMatch(/^leastterm: --at: .*; wanted /);
  });
});
