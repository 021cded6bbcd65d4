import { describe, expect, test } from 'vitest';
import { leastterm, words } from './harness.js';

const run = (line: string, stdin?: string): ReturnType<typeof leastterm> =>
  leastterm(words(line), stdin === undefined ? {} : { stdin });

const EULER = '1\n-1\n2\n-6\n24\n-120\n720\n';
const SOME = '--only fixed-order,pade,borel-pade';

describe('leastterm compare', () => {
  test('one row each, spread, refusals by reason', async () => {
    const { status, stdout } = await run(`compare - --at 0.1 ${SOME},singularity-model`, EULER);
    expect(status).toBe(0);
    await expect(stdout).toMatchFileSnapshot('./golden/compare-euler.txt');
    expect(stdout.split('\n').every((line) => line.length <= 100)).toBe(true);
  });

  test('--csv: a line a point and prescription, the same numbers as --json', async () => {
    const line = `compare - --grid 0.1,0.2 ${SOME}`;
    const csv = (await run(`${line} --csv`, EULER)).stdout.trimEnd().split('\n');
    const json = JSON.parse((await run(`${line} --json`, EULER)).stdout) as {
      rows: { at: string; prescription: string; value: string }[];
      points: unknown[];
    };
    expect(csv[0]).toMatch(/^coupling,scale,x,prescription,family,variant,value,truncation,/);
    expect(csv.length - 1).toBe(6);
    expect(json.points.length).toBe(2);
    csv.slice(1).forEach((text, i) => {
      const cells = text.split(',');
      const row = json.rows[i];
      expect([cells[0], cells[3], cells[6]]).toEqual([row?.at, row?.prescription, row?.value]);
    });
  });

  test('--grid scale=…: the coupling runs, a row a scale and prescription', async () => {
    const { status, stdout } = await run(`compare adler --at 0.3 --grid scale=0.8:2:3 --only fixed-order,fac --csv`);
    expect(status).toBe(0);
    const rows = stdout
      .trimEnd()
      .split('\n')
      .slice(1)
      .map((text) => text.split(','));
    expect(rows.map((cells) => cells[1])).toEqual(['0.8', '0.8', '1.26491', '1.26491', '2', '2']);
    expect(Number(rows[0]?.[0])).toBeGreaterThan(0.3);
    expect(Number(rows[4]?.[0])).toBeLessThan(0.3);
    const text = (await run(`compare adler --at 0.3 --grid scale=1,2 --only fixed-order`)).stdout;
    expect(text).toMatch(/scale\s+μ\/Q = 2/);
  });

  test('--only repeated adds up, --except takes away, --family narrows', async () => {
    const names = async (options: string): Promise<string[]> =>
      (await run(`compare - --at 0.1 -q --hide 0 ${options}`, EULER)).stdout
        .trimEnd()
        .split('\n')
        .map((line) => line.split('\t')[0] ?? '');
    expect(await names('--only pade --only fixed-order')).toEqual(['fixed-order', 'pade']);
    expect(await names('--only pade,fixed-order --except pade')).toEqual(['fixed-order']);
    expect(await names('--family coupling --except euler,levin')).toContain('pade');
    expect(await names(`${SOME} --sort value`)).toEqual(['borel-pade', 'pade', 'fixed-order']);
  });

  test.each([
    ['--at 0.1 --only pde', /--only: no prescription "pde" \(did you mean "pade"\?\); wanted one of fixed-order/],
    ['--at 0.1 --except nothing', /--except: no prescription "nothing"/],
    ['--at 0.1 --family borl', /--family: no family "borl" \(did you mean "borel"\?\)/],
    ['--at 0.1 --only pade --except pade', /leave no prescription/],
    ['--at 0.1 --sort size', /--sort: no key "size".*wanted one of value, truncation, ambiguity, score/],
    ['--grid 0.1:0.2', /--grid: "0\.1:0\.2" has 2 parts; wanted start:stop:count/],
    ['--grid 0.1:0.2:1', /--grid: "1" points; wanted a whole number from 2 to 1000/],
    ['--at 0.1 --grid 0.1,0.2', /exclude each other/],
    ['--grid scale=0.5:2:5', /--at is missing/],
    ['--at 0.1 --grid scale=0.5:2:5', /plain variable.*remedy/],
    ['--at 0.1 --grid scale=2:2:5', /start and stop are the same/],
    ['--at 0.1 --grid mu=1,2', /"mu=" is nothing a grid can run over/],
    ['--at 0.1 --csv --json', /--csv and --json: give one of them/],
    ['--at 0.1 --exact x', /--exact: /],
    ['--at 0.1 --hide 99', /--hide: "99" is not a whole number from 0 to 20/],
    ['', /--at is missing/],
  ])('%s is a usage error', async (options, message) => {
    const { status, stderr } = await run(`compare - ${options}`, EULER);
    expect(status).toBe(2);
    expect(stderr).toMatch(message);
  });
});

describe('--strong-coupling', () => {
  // (E − 1/2)/g and E of H = p²/2 + x²/2 + g x⁴ at g = 1: E = 0.80377065 (mpmath 1.2.1, diagonalisation); E ~ g^{1/3}.
  const ENERGY = '1/2\n3/4\n-21/8\n333/16\n-30885/128\n916731/256\n-65518401/1024\n';
  const by = '--by order-dependent-map --at 1 -q';
  test('feeds order-dependent mapping in sum, compare and backtest', async () => {
    const { status, stdout } = await run(`sum - ${by} --strong-coupling 1/3,2/3`, ENERGY);
    expect(status).toBe(0);
    expect(Math.abs(Number(stdout) - 0.80377065)).toBeLessThan(2e-5);
    const rows = (await run('compare - --at 1 -q --only order-dependent-map --strong-coupling 1/3,2/3', ENERGY)).stdout;
    expect(rows).toMatch(/^order-dependent-map\t0\.8037/);
    const tested = await run('backtest - --at 1 --only order-dependent-map --strong-coupling 1/3,2/3 --json', ENERGY);
    expect(JSON.parse(tested.stdout)).toMatchObject({ prescriptions: [{ records: [{ tested: 3 }] }] });
  });
  test('or the field of the file; the power of the first term is no part of F', async () => {
    const file = (power: string, first: number, c: string): string =>
      `{"variable": "g", "first power": ${first}, "strong coupling": {"power": "${power}", "spacing": "2/3"}, "coefficients": [${c}]}`;
    const list = ENERGY.trim().split('\n').map((c) => `"${c}"`); // prettier-ignore
    const whole = (await run(`sum - ${by}`, file('1/3', 0, list.join(',')))).stdout;
    const moved = (await run(`sum - ${by}`, file('4/3', 1, list.join(',')))).stdout;
    // At x = 1 the factor x is 1.
    expect(moved).toBe(whole);
    expect(Math.abs(Number(whole) - 0.80377065)).toBeLessThan(2e-5);
  });
  test('without it the refusal names the option; wrong ones are usage errors', async () => {
    const { status, stdout } = await run('sum - --by order-dependent-map --at 1', ENERGY);
    expect(status).toBe(1);
    expect(stdout).toMatch(/--strong-coupling\s+1\/3,2\/3/);
    for (const text of ['1/3', '1/3,0', '1/3,x', '1,2,3']) {
      const wrong = await run(`sum - ${by} --strong-coupling ${text}`, ENERGY);
      expect(wrong.status).toBe(2);
      expect(wrong.stderr).toMatch(/--strong-coupling: .* not two numbers, the second one positive/);
    }
    const bad = await run(`sum - ${by}`, '{"strong coupling": {"power": "1/3"}, "coefficients": ["1", "-1", "2"]}');
    expect(bad.status).toBe(2);
    expect(bad.stderr).toMatch(/strong coupling: no spacing/);
  });
});

describe('leastterm backtest', () => {
  test('values, next coefficients, truncation errors', async () => {
    const { status, stdout } = await run(`backtest - --at 0.1 ${SOME}`, EULER);
    expect(status).toBe(0);
    await expect(stdout).toMatchFileSnapshot('./golden/backtest-euler.txt');
    expect(stdout.split('\n').every((line) => line.length <= 100)).toBe(true);
  });

  test('several series: coverage by method', async () => {
    const line = 'backtest tests/bench/plain.yaml tests/bench/six.yaml --at 0.2 --only fixed-order --json';
    const { status, stdout } = await run(line);
    const result = JSON.parse(stdout) as { results: unknown[]; summary: { method: string; tested: number }[] };
    expect(status).toBe(0);
    expect(result.results.length).toBe(2);
    expect(result.summary[0]).toMatchObject({ method: 'fixed-order', tested: 6 });
  });

  test('--csv and --quiet', async () => {
    const csv = (await run(`backtest - --at 0.1 ${SOME} --csv`, EULER)).stdout.split('\n');
    expect(csv[0]).toBe('series,coupling,kind,method,against,tested,inside68,inside95,bias,sharpness,score,record');
    expect(csv.some((line) => line.includes(',prescription,borel-pade,known sum,3,3,'))).toBe(true);
    const quiet = (await run(`backtest - --at 0.1 ${SOME} -q`, EULER)).stdout.trimEnd().split('\n');
    expect(quiet.map((line) => line.split('\t').slice(0, 3).join(' '))).toEqual([
      'fixed-order 3 3',
      'pade 3 3',
      'borel-pade 3 3',
    ]);
  });

  test('too short a series: exit code 1, and why', async () => {
    const { status, stdout } = await run('backtest - --at 0.1', '1\n2\n');
    expect(status).toBe(1);
    expect(stdout).toContain('2 known coefficients: at least three are needed to hide one');
  });

  test.each([
    ['backtest --at 0.1', /SERIES is missing/],
    ['backtest adler --catalogue --at 0.1', /--catalogue takes every series/],
    ['backtest --catalogue', /--at is missing/],
    ['backtest adler bjorken --at 0.1 --exact 1', /--exact: an exact sum belongs to one series/],
    ['backtest adler --at 0.1 --hide 0', /--hide: 0 hides nothing/],
    ['backtest adler --at 0.1 --csv --json', /give one of them/],
  ])('%s is a usage error', async (line, message) => {
    const { status, stderr } = await run(line);
    expect(status).toBe(2);
    expect(stderr).toMatch(message);
  });
});

describe('assess --verdict-rule', () => {
  test('stands in the output and in the request', async () => {
    const { stdout } = await run('assess - --at 0.1 --verdict-rule prescription:pade --json', EULER);
    const result = JSON.parse(stdout) as {
      request: Record<string, unknown>;
      verdict: { rule: string; prescription: string };
    };
    expect(result.request['verdict-rule']).toBe('prescription:pade');
    expect(result.verdict.rule).toMatch(/^prescription:pade \(docs\/verdict\.md\)/);
    expect(result.verdict.prescription).toMatch(/^pade: /);
  });

  test('an unknown rule is a usage error', async () => {
    const { status, stderr } = await run('assess - --at 0.1 --verdict-rule laddr', EULER);
    expect(status).toBe(2);
    expect(stderr).toMatch(
      /--verdict-rule: no rule "laddr" \(did you mean "ladder"\?\); wanted one of ladder, fixed-order/,
    );
  });
});
