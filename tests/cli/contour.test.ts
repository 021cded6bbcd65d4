import { describe, expect, test } from 'vitest';
import { leastterm, words } from './harness.js';

const run = (line: string, stdin?: string): ReturnType<typeof leastterm> =>
  leastterm(words(line), stdin === undefined ? {} : { stdin });

interface Json {
  readonly orders: readonly {
    readonly order: number;
    readonly fixedOrder: { sum: string };
    readonly improved?: { sum: string };
  }[];
  readonly weight: { readonly text: string };
  readonly borel: readonly { readonly value?: string }[];
  readonly subtracted: { readonly norm?: { value: string }; readonly refused?: { reason: string } };
  readonly request: Record<string, unknown>;
}

const json = async (line: string): Promise<Json> => JSON.parse((await run(`${line} --json`)).stdout) as Json;

describe('leastterm contour', () => {
  test('everything about the tau width, within 100 columns', async () => {
    const { status, stdout, stderr } = await run('contour tau-contour-estimate --at 0.34');
    expect([status, stderr]).toEqual([0, '']);
    await expect(stdout).toMatchFileSnapshot('./golden/contour-tau.txt');
    expect(stdout.split('\n').every((line) => line.length <= 100)).toBe(true);
  });

  test('--quiet: a line a value', async () => {
    const { stdout } = await run('contour tau-contour-estimate --at 0.34 -q --digits 8');
    const lines = stdout
      .trimEnd()
      .split('\n')
      .map((line) => line.split('\t'));
    expect(lines.map(([name]) => name)).toEqual([
      'fixed-order',
      'contour-improved',
      'contour-borel',
      'contour-borel-pade',
      'condensate-subtracted fixed-order',
      'condensate-subtracted contour-improved',
    ]);
    expect(lines[0]).toEqual(['fixed-order', '0.22878571', '0.00877']);
  });

  test('the table of docs/methods/contour.md', async () => {
    const { readFile } = await import('node:fs/promises');
    const page = await readFile(new URL('../../docs/methods/contour.md', import.meta.url), 'utf8');
    const rows = [...page.matchAll(/^\| (\d+) \| ([\d.]+) \| ([\d.]+) \| ([\d.]+) \| ([\d.]+) \|$/gm)];
    expect(rows.length).toBe(7);
    const result = (await json('contour tau-contour-model --at 0.34 --norm model --digits 8')) as Json & {
      readonly subtracted: { readonly orders: readonly { fixedOrder: { sum: string }; improved: { sum: string } }[] };
    };
    for (const [, order, fixed, improved, subtractedFixed, subtractedImproved] of rows) {
      const n = Number(order) - 1;
      const four = (text: string | undefined): string => Number(text).toFixed(4);
      expect(four(result.orders[n]?.fixedOrder.sum)).toBe(fixed);
      expect(four(result.orders[n]?.improved?.sum)).toBe(improved);
      expect(four(result.subtracted.orders[n]?.fixedOrder.sum)).toBe(subtractedFixed);
      expect(four(result.subtracted.orders[n]?.improved.sum)).toBe(subtractedImproved);
    }
  });

  test('--weight: any polynomial, and a plain Adler function with one', async () => {
    const own = await json("contour tau-contour --at 0.34 --weight '1, -2, 1' --loops 4");
    const plain = await json('contour adler --at 0.34 --weight [1,-2,1] --loops 4');
    expect(own.weight.text).toBe('1 - 2*x + x^2');
    expect(plain.orders.map((o) => o.improved?.sum)).toEqual(own.orders.map((o) => o.improved?.sum));
    expect(plain.request).toMatchObject({ weight: '[1,-2,1]', loops: 4 });
  });

  test('--order, --norm and --subtraction-scale', async () => {
    const short = await json('contour tau-contour --at 0.3 --order 2 --norm 0.4(1) --subtraction-scale 1');
    expect(short.orders.length).toBe(2);
    expect(short.subtracted.norm?.value).toBe('0.4');
    const model = await json('contour tau-contour-model --at 0.3 --norm model');
    expect(model.subtracted.norm?.value).toMatch(/^0\.6700/);
  });

  test('what cannot be had is refused with the reason, the rest stands', async () => {
    const far = await json('contour tau-contour --at 1');
    expect(far.subtracted.refused?.reason).toContain('Landau singularity');
    expect(far.orders.length).toBe(4);
    const bare = await run(
      'contour - --at 0.3 -q',
      'kind: contour\nweight: [1]\ncoupling: { name: alpha_s, divisor: pi }\nscheme: MSbar\nflavours: 3\nfirst power: 1\ncoefficients: [1, 2]\n',
    );
    expect(bare.status).toBe(0);
    expect(bare.stdout.trimEnd().split('\n').length).toBe(2);
  });

  test.each([
    ['contour tau-contour', '--at is missing'],
    ['contour tau-contour --at 0', 'wanted a value other than zero'],
    ['contour tau-contour --at 11', 'a coupling above 0 and at most 10'],
    ['contour adler --at 0.3', 'adler: a plain series; wanted a contour quantity'],
    ['contour tau-contour --at 0.3 --weight 1,x', '--weight: "x"; wanted "kinematic"'],
    ['contour tau-contour --at 0.3 --weight 0', '--weight: a weight that vanishes'],
    ['contour tau-contour --at 0.3 --norm many', '--norm: "many"'],
    ['contour tau-contour --at 0.3 --norm 0', '--norm: 0 subtracts nothing'],
    ['contour tau-contour --at 0.3 --subtraction-scale -1', '--subtraction-scale: "-1" is no ratio'],
    ['contour tau-contour --at 0.3 --loops 6', '--loops'],
    ['contour tau-contour-model --at 0.3 --loops 3', '--loops 3 with "MSbar, four-loop running only"'],
    ['sum adler --at 0.3 --by contour-improved', 'only for contour quantities, and adler is none'],
    ['compare adler --at 0.3 --only contour-borel', 'only for contour quantities, and adler is none'],
    ['combine 2*t --with t=tau-contour', 'is a contour quantity'],
  ])('%s', async (line, message) => {
    const { status, stdout, stderr } = await run(line);
    expect([status, stdout]).toEqual([2, '']);
    expect(stderr).toContain(message);
  });
});

describe('elsewhere', () => {
  test('compare shows the difference of the two expansions as what it is', async () => {
    const { stdout } = await run('compare tau-contour --at 0.34 --only fixed-order,contour-improved,contour-borel');
    const flat = stdout.replaceAll(/\s+/g, ' ');
    expect(flat).toMatch(/Fixed order minus contour improved is 0\.0220, 1\.3 times/);
    expect(flat).toContain('not to be averaged');
  });

  test('sum to 30 digits: converged', async () => {
    const { stdout } = await run('sum tau-contour-model --order 4 --at 0.34 --by contour-improved --digits 30 -q');
    // mpmath 1.2.1.
    expect(stdout.trim()).toBe('0.198358335264986304658151931242');
  });

  test('backtest hides coefficients of D too', async () => {
    const { status, stdout } = await run('backtest tau-contour --at 0.34 --only contour-improved --hide 1');
    expect(status).toBe(0);
    expect(stdout).toMatch(/contour-improved +own value +1 of 1 +-0\.043/);
  });

  test('catalogue show prints the weight', async () => {
    expect((await run('catalogue show tau-contour')).stdout).toContain('weight w(x) = 1 - 3*x^2 + 2*x^3');
  });
});
