/** leastterm bubbles: what it prints, in which forms, and what it refuses. */
import { describe, expect, test } from 'vitest';
import { leastterm, words } from './harness.js';

const run = (line: string): ReturnType<typeof leastterm> => leastterm(words(line));

describe('leastterm bubbles', () => {
  test('lists the quantities', async () => {
    const { status, stdout } = await run('bubbles -q');
    expect(status).toBe(0);
    expect(stdout.trim().split('\n')).toHaveLength(9);
    const { quantities } = JSON.parse((await run('bubbles --json')).stdout) as { quantities: { name: string }[] };
    expect(quantities.map(({ name }) => name).join('\n')).toBe(stdout.trim());
  });

  test('the laboratory: exact sum, ambiguity in GeV, prescriptions against it', async () => {
    const { status, stdout, stderr } = await run("bubbles adler --at '0.32(1)' --scale 1.777GeV --order 6");
    expect([status, stderr]).toEqual([0, '']);
    // mpmath 1.2.1, 60 digits: 0.15116848607033257…, Im 0.01034580691619555….
    expect(stdout).toContain('0.151168486070333');
    expect(stdout).toContain('0.0103458069161956');
    expect(stdout).toContain('c_2   302/9 - 76/3*zeta(3)');
    expect(stdout).toMatch(/2 +infrared +1 +-2\n/);
    expect(stdout).toMatch(/borel-pade +0\.\d+ +-?0\.\d+/);
    expect(stdout).toContain('|Im|/π in GeV^d');
    expect(stdout.split('\n').every((line) => line.length <= 100)).toBe(true);
  });

  test('--quiet is the principal value to the digits asked', async () => {
    expect((await run('bubbles pole-mass --at 0.22 --digits 40 -q')).stdout).toBe(
      '0.1942613489234478274180296169188391470344\n',
    );
  });

  test('--json holds what the text shows, as text', async () => {
    const result = JSON.parse((await run('bubbles bjorken --at 0.3 --mu 2 --order 5 --json')).stdout) as {
      request: Record<string, unknown>;
      coupling: { mu: string };
      terms: { exact?: string }[];
      sum: { pv: string; standing: string; ambiguity: { byPole: { dimension: string }[] } };
      trials: unknown[];
    };
    expect(result.request).toEqual({
      command: 'bubbles',
      quantity: 'bjorken',
      at: '0.3',
      mu: '2',
      order: 5,
      digits: 15,
    });
    expect(result.coupling.mu).toBe('2');
    expect(result.terms).toHaveLength(5);
    expect(result.sum.standing).toBe('certified');
    expect(result.sum.ambiguity.byPole.map((a) => a.dimension)).toEqual(['2', '4']);
    expect(result.trials.length).toBeGreaterThan(10);
  });

  test('--alpha-s-mz: evolved to the mass of the tau', async () => {
    const { stdout } = await run('bubbles tau-width --alpha-s-mz 0.118 --order 3');
    expect(stdout).toMatch(/α_s\(m_tau\) +0\.31389/);
    expect(stdout).toContain('reached by');
  });

  test.each(['distribution', 'scales', 'dispersive'])('--view %s as text, CSV and JSON', async (view) => {
    const line = `bubbles adler --at 0.3 --view ${view}`;
    const text = await run(line);
    expect(text.status).toBe(0);
    const csv = (await run(`${line} --csv`)).stdout.trim().split('\n');
    const json = JSON.parse((await run(`${line} --json`)).stdout) as { rows: string[][]; columns: { name: string }[] };
    expect(csv[0]).toBe(json.columns.map((c) => c.name).join(','));
    expect(csv.slice(1)).toEqual(json.rows.map((row) => row.join(',')));
    for (const row of json.rows) for (const cell of row) expect(Number.isFinite(Number(cell))).toBe(true);
  });

  test('--cut: coefficients by momentum, the change of the verdict, the sum', async () => {
    const line = 'bubbles adler --at 0.32 --cut 0.5';
    const { stdout } = await run(line);
    expect(stdout).toContain('0.13083101');
    const { cut } = JSON.parse((await run(`${line} --json --digits 20`)).stdout) as {
      cut: {
        growth: Record<'whole' | 'high' | 'window', { verdict: string; statement: string }>;
        rows: { sum: string; high: string; direct: string }[];
      };
    };
    expect(cut.growth.whole.verdict).toBe('factorial');
    expect(cut.growth.high.statement).toContain('negative axis');
    expect(cut.growth.window.verdict).toBe('geometric');
    expect(new Set(cut.rows.map((row) => row.sum)).size).toBe(1);
    for (const row of cut.rows) expect(Number(row.direct) / Number(row.high)).toBeCloseTo(1, 7);
    const rows = (await run(`${line} --csv`)).stdout.trim().split('\n');
    expect(rows).toHaveLength(9);
  });

  test('the potential without soft momenta does not grow factorially any more', async () => {
    const { stdout } = await run('bubbles static-potential --at 0.25 --cut 0.5 --json');
    const { cut } = JSON.parse(stdout) as { cut: { growth: Record<'whole' | 'high', { verdict: string }> } };
    expect(cut.growth.whole.verdict).toBe('factorial');
    expect(cut.growth.high.verdict).not.toBe('factorial');
  });

  test.each([
    ['bubbles adlr --at 0.3', /no quantity "adlr".*did you mean "adler"/],
    ['bubbles adler', /--at is missing/],
    ['bubbles adler --at 0.9', /Landau pole.*remedy: give a smaller coupling/],
    ['bubbles adler --at 0.3 --cut 1.2', /above the hard scale/],
    ['bubbles adler --at 0.3 --cut 0.1', /below the Landau pole/],
    ['bubbles adler --at 0.3 --cut 1.2GeV', /needs the hard scale Q in GeV; write --scale/],
    ['bubbles adler --at 0.3 --cut -0.5', /no positive number/],
    ['bubbles adler --at 0.3 --scale 2', /has no unit; write --scale 2GeV/],
    ['bubbles adler --alpha-s-mz 0.118', /the hard scale Q is not known; write --scale/],
    ['bubbles adler --at 0.3 --view scale', /no view "scale" \(did you mean "scales"\?\)/],
    ['bubbles adler --at 0.3 --view scales --cut 0.5', /exclude each other/],
    ['bubbles adler --at 0.3 --csv', /--csv is for --view and --cut/],
    ['bubbles b-to-u-pole --at 0.2 --cut 0.5', /no integral over a Euclidean gluon momentum/],
    ['bubbles b-to-u-pole --at 0.2 --view scales', /look at --view dispersive/],
    ['bubbles adler --at 0.3 --order 61', /more than the 60/],
  ])('%s is refused', async (line, message) => {
    const { status, stdout, stderr } = await run(line);
    expect([status, stdout]).toEqual([2, '']);
    expect(stderr.replaceAll('\nleastterm: ', ' ')).toMatch(message);
  });
});

describe('the prescription bubble-chain', () => {
  test('is a row of compare where the file names a chain, and only there', async () => {
    const rows = async (series: string): Promise<string[]> =>
      (await run(`compare ${series} --at 0.25 --only fixed-order,bubble-chain --hide 0 -q`)).stdout
        .trim()
        .split('\n')
        .map((row) => row.split('\t')[0] ?? '');
    expect(await rows('bjorken')).toEqual(['fixed-order', 'bubble-chain']);
    expect(await rows('top-width')).toEqual(['fixed-order']);
  });

  test('sum gives its digits', async () => {
    const { stdout } = await run('sum adler --at 0.3139 --by bubble-chain --digits 15 -q');
    expect(stdout).toBe('1.14038258567987\n');
  });

  test('asked of a series without a chain, and of one with a wrong name', async () => {
    const none = await run('sum top-width --at 0.1 --by bubble-chain');
    expect([none.status, none.stderr]).toEqual([2, expect.stringContaining('names no bubble chain; write "bubble chain: adler"')]); // prettier-ignore
    const text =
      'coupling: { name: alpha_s, divisor: pi }\nscheme: MSbar\nflavours: 3\nfirst power: 1\nbubble chain: adlr\ncoefficients: [1, 2, 3]\n';
    const wrong = await leastterm(words('sum - --at 0.1 --by bubble-chain'), { stdin: text });
    expect(wrong.status).toBe(2);
    expect(wrong.stderr).toContain('no quantity "adlr" (did you mean "adler"?)');
  });
});
