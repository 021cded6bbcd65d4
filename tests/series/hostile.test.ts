/**
 * Hostile input ends in a proper error within two seconds, and within 400 MB: the whole collection runs in one child
 * process with its own account of memory and processor time (wall time depends on what else the machine does).
 */
import { execFile } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { promisify } from 'node:util';
import { build } from 'esbuild';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';

const MEMORY_MB = 400;
const SECONDS = 2;

/** Name of the case, a JavaScript expression for its text (or path), and a part of the message it must bring. */
const CASES: readonly (readonly [name: string, text: string, message: string])[] = [
  [
    'alias bomb',
    '["a: &a [1,1,1,1,1,1,1,1,1]", ..."bcdefghij"].reduce((s, c, i) => i === 0 ? c : `${s}\\n${c}: &${c} [${Array(9).fill("*" + "abcdefghij"[i - 1])}]`, "")',
    'a reference *a',
  ],
  ['10 MB of digits', '"1".repeat(10_000_000)', 'more than 4,194,304 bytes'],
  ['3 MB of digits', '"1".repeat(3_000_000)', '3,000,000 characters'],
  ['3 MB of digits in an expression', '"pi*" + "1".repeat(3_000_000)', '3,000,003 characters'],
  ['huge exponent', '"[1e999999999, 1e-999999999]"', 'exponent 999999999'],
  ['huge exponent in an expression', '"[pi*1e999999999]"', 'exponent 999999999'],
  ['deep brackets', '"[".repeat(200_000)', 'brackets inside each other'],
  ['deep dashes', '"- ".repeat(200_000) + "1"', 'levels of nesting'],
  ['deep indentation', 'Array.from({length: 2000}, (_, i) => " ".repeat(i) + "a:").join("\\n")', 'levels of nesting'],
  ['deep parentheses', '"(".repeat(1500) + "1" + ")".repeat(1500)', 'nested parentheses'],
  ['prototype keys', '\'{"__proto__": {"x": 1}, "coefficients": [1]}\'', 'unknown field "__proto__"'],
  ['prototype names', '"[toString, constructor, __proto__, hasOwnProperty(1)]"', 'unknown name "constructor"'],
  [
    'chain of constants',
    '"constants:\\n" + Array.from({length: 5000}, (_, i) => `  k${i}: k${i + 1} + 1`).join("\\n") + "\\ncoefficients: [k0]"',
    '5,000 constants',
  ],
  [
    '200 constants in a row',
    '"constants:\\n" + Array.from({length: 199}, (_, i) => `  k${i}: k${i + 1}/pi`).join("\\n") + "\\n  k199: 1/(pi-pi)\\ncoefficients: [k0]"',
    'told from zero',
  ],
  ['circle of constants', '"constants: {a: b, b: c, c: a}\\ncoefficients: [a]"', 'refers to itself'],
  [
    'doubling constants',
    '"constants:\\n  k0: 3^1000\\n" + Array.from({length: 60}, (_, i) => `  k${i + 1}: k${i}*k${i}`).join("\\n") + "\\ncoefficients: [k60]"',
    'bits',
  ],
  ['tower of powers', '"[2^9^9^9, (pi^1000)^1000, ((2^1000)^1000)^1000]"', 'the power is'],
  [
    'long sum of fractions',
    '"[\\"" + Array.from({length: 400}, (_, i) => `1/${1000003 + 2 * i}`).join("+") + "\\", x]"',
    'unknown name "x"',
  ],
  ['not a number', '"[NaN, Infinity, -Infinity, null, undefined]"', 'not a finite number'],
  ['a million coefficients, JSON', '"[" + "1,".repeat(999_999) + "1]"', 'at most 5,000 coefficients'],
  ['a million coefficients, YAML', '"coefficients:\\n" + "- 1\\n".repeat(1_000_000)', 'at most 5,000 coefficients'],
  ['a million coefficients, list', '"1\\n".repeat(1_000_000)', 'at most 5,000 coefficients'],
  ['a million coefficients, CSV', '"value\\n" + "1\\n".repeat(1_000_000)', 'at most 5,000 coefficients'],
  ['6,000 coefficients', '"1\\n".repeat(6000)', 'at most 5,000'],
  ['5,000 powers of ten', '"1e20000\\n".repeat(4999) + "x"', 'more exact arithmetic'],
  ['long fractions', '`${"7".repeat(4000)}/${"3".repeat(4000)}1\\n`.repeat(400) + "x"', 'more exact arithmetic'],
  ['400 long decimals', '`0.${"7".repeat(9990)}\\n`.repeat(400) + "x"', 'unknown name "x"'],
  ['19,000 keys', 'Array.from({length: 19_000}, (_, i) => `k${i}: 1`).join("\\n")', 'unknown field "k0"'],
  ['a long key', '`title: x\n${"k".repeat(2_000_000)}: 1`', 'not readable'],
  ['a key of 1,000 characters', '`title: x\n${"k".repeat(1000)}: 1`', 'unknown field'],
  ['a long text', '`title: ${"t ".repeat(1_900_000)}\\ncoefficients: [1]`', 'a text of 3,799,999 characters'],
  ['blanks in a number', '`[1${" ".repeat(3_000_000)}2]`', 'characters'],
  ['blanks before +-', '`1${" ".repeat(9_000)}+- x\\n`.repeat(400)', 'error'],
  ['words in a row', '"[" + "pi ".repeat(1300) + "]"', 'no operator between'],
  ['megabytes of expressions', '`${"pi+".repeat(1300)}1\\n`.repeat(1000)', 'more exact arithmetic'],
  ['comments', '"#".repeat(4_000_000)', 'an empty file'],
  ['quotes', "'\"'.repeat(1_000_000)", '1,000,000 brackets, quotes and other marks'],
  ['fewer quotes', "'\"'.repeat(45_000)", 'not readable'],
  ['colons and question marks', '`a: ${"? ".repeat(20_000)}\\n${": ".repeat(20_000)}`', 'not readable'],
  ['empty lists in a row', '"[]".repeat(22_000)', 'not readable'],
  ['a text full of commas', '`title: "${",".repeat(3_000_000)}"`', '20,000 lines and list entries'],
  ['control characters', '"[\\u001b[31m, 1\\u0007, \\u202e2]"', 'not readable'],
  ['binary', '"1\\n\\0"', 'binary data'],
  ['correlation of 5000', '"coefficients: [1, 2]\\ncorrelation: [" + "[1],".repeat(5000) + "[1]]"', '5001 rows'],
];

const PATHS: readonly (readonly [path: string, message: string])[] = [
  ['/dev/zero', 'more than 4,194,304 bytes'],
  ['/dev/null', 'an empty file'],
  ['/dev/urandom', 'more than 4,194,304 bytes'],
  ['/', 'a directory'],
  ['/proc/self/mem', 'not readable'],
  [`/${'x'.repeat(300)}`, 'a file name that is too long'],
];

interface Outcome {
  readonly name: string;
  readonly kind: string;
  readonly message: string;
  readonly ms: number;
}

const folder = mkdtempSync(join(tmpdir(), 'leastterm-hostile-'));
let outcomes: Map<string, Outcome>;
let memory = 0;

beforeAll(async () => {
  const entry = fileURLToPath(new URL('../../src/series/index.ts', import.meta.url));
  await build({
    entryPoints: [entry],
    bundle: true,
    splitting: true,
    format: 'esm',
    platform: 'node',
    outdir: folder,
    logLevel: 'error',
    entryNames: 'series',
    outExtension: { '.js': '.mjs' },
    banner: { js: "import { createRequire } from 'node:module'; const require = createRequire(import.meta.url);" },
  });
  writeFileSync(join(folder, 'latin1.txt'), Buffer.from([0x31, 0x0a, 0xe9, 0x0a]));
  writeFileSync(join(folder, 'utf16.txt'), Buffer.from('\uFEFF1\n2\n', 'utf16le'));
  const script = `
    import { writeFileSync } from 'node:fs';
    import { Readable } from 'node:stream';
    import { loadSeries } from './series.mjs';
    const cases = [${CASES.map(([name, text]) => `[${JSON.stringify(name)}, () => ${text}]`).join(',\n')}];
    const paths = ${JSON.stringify([...PATHS.map(([path]) => path), './latin1.txt', './utf16.txt'])};
    const outcomes = [];
    const cpu = (start) => { const { user, system } = process.cpuUsage(start); return (user + system) / 1000; };
    async function attempt(name, work) {
      const start = process.cpuUsage();
      let kind = 'read', message = '';
      try { await work(); } catch (error) { kind = error.name; message = String(error.message).slice(0, 2000); }
      outcomes.push({ name, kind, message, ms: cpu(start) });
    }
    for (const [name, text] of cases) {
      const bytes = Buffer.from(text());
      await attempt(name, () => loadSeries('-', { stdin: Readable.from([bytes]) }));
    }
    for (const path of paths) await attempt(path, () => loadSeries(path));
    const endless = async function* () { for (;;) yield Buffer.alloc(65536, 49); };
    await attempt('endless input', () => loadSeries('-', { stdin: endless() }));
    writeFileSync('outcomes.json', JSON.stringify({ outcomes, memory: process.resourceUsage().maxRSS / 1024 }));
  `;
  writeFileSync(join(folder, 'run.mjs'), script);
  await promisify(execFile)(process.execPath, ['run.mjs'], { cwd: folder });
  const result = JSON.parse(readFileSync(join(folder, 'outcomes.json'), 'utf8')) as {
    outcomes: Outcome[];
    memory: number;
  };
  outcomes = new Map(result.outcomes.map((o) => [o.name, o]));
  memory = result.memory;
}, 240_000);

afterAll(() => rmSync(folder, { recursive: true, force: true }));

const LOCAL = [
  ['./latin1.txt', 'bytes that are not UTF-8'],
  ['./utf16.txt', 'text in UTF-16'],
  ['endless input', 'more than 4,194,304 bytes'],
] as const;

/** Control characters, except the line feed between problems, and characters that turn the writing direction. */
const actsOnTerminal = (c: string): boolean => c !== '\n' && /\p{Cc}|\p{Cf}/u.test(c);

describe('hostile input', () => {
  test.each([...CASES.map(([name, , message]) => [name, message] as const), ...PATHS, ...LOCAL])(
    '%s',
    (name, message) => {
      const outcome = outcomes.get(name);
      expect(outcome?.kind).toBe('InputError');
      expect(outcome?.message).toContain(message);
      expect(outcome?.ms).toBeLessThan(SECONDS * 1000);
      // Nothing that would act on a terminal.
      expect(Array.from(outcome!.message).filter(actsOnTerminal)).toEqual([]);
    },
  );

  test(`all of it within ${MEMORY_MB} MB`, () => {
    expect(memory).toBeGreaterThan(20);
    expect(memory).toBeLessThan(MEMORY_MB);
  });
});
