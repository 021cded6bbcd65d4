/** leastterm growth --cut: what it prints, in which forms, and what it refuses. */
import { describe, expect, test } from 'vitest';
import { leastterm, words } from './harness.js';

const run = (line: string): ReturnType<typeof leastterm> => leastterm(words(line));
const HEAD = 'coupling: { name: alpha_s, divisor: pi }\nscheme: MSbar\nflavours: 3\nscale ratio: 1\nfirst power: 1\n';
const fromStdin = (line: string, stdin: string): ReturnType<typeof leastterm> => leastterm(words(line), { stdin });

describe('leastterm growth --cut', () => {
  test('both parts, their sum, and the diagnosis of both', async () => {
    const { status, stdout, stderr } = await run('growth pole-msbar --flavours 4 --at 0.22 --cut 0.5');
    expect([status, stderr]).toEqual([0, '']);
    expect(stdout).toMatch(/cut at μ_f = 0.500000 Q = 2.09300 GeV/);
    expect(stdout).toMatch(/order +all +k < μ_f +k > μ_f/);
    expect(stdout).toMatch(/uncut, fixed order +1.200851/);
    expect(stdout).toMatch(/moves with μ_f +by no more than 0.000\d+/);
    expect(stdout.split('\n').every((line) => line.length <= 100)).toBe(true);
  });

  test('a cut in GeV is a ratio to the hard scale', async () => {
    const [ratio, scale] = await Promise.all(
      ['0.5', '2.093GeV'].map((cut) => run(`growth pole-msbar --flavours 4 --at 0.22 --cut ${cut} --json`)),
    );
    const read = (text: string): { cut: unknown; request: { cut: string } } =>
      JSON.parse(text) as { cut: unknown; request: { cut: string } };
    expect(read(scale!.stdout).cut).toEqual(read(ratio!.stdout).cut);
    expect(read(scale!.stdout).request).toMatchObject({ command: 'growth', series: 'pole-msbar', cut: '2.093GeV' });
  });

  test('--alpha-s-mz, --order and --quiet', async () => {
    const { stdout } = await run('growth adler --alpha-s-mz 0.118 --cut 0.6 --order 4');
    expect(stdout).toMatch(/evolution/);
    expect(stdout).toMatch(/One caution:/);
    expect((await run('growth adler --cut 0.6 -q')).stdout).toBe('undecided\n');
  });

  test.each([
    ['growth adler --cut 1.2', /lies above Q.*below 1/s],
    ['growth adler --cut 5GeV', /mu_f = 2\.814 Q lies above Q/],
    ['growth adler --cut zero', /--cut: "zero" is no positive number/],
    ['growth adler --cut 0', /no positive number/],
    ['growth adler --cut -1GeV', /is no scale/],
    ['growth tau-contour --cut 0.5', /integral over a circle/],
    ['growth adler --order 2 --cut 0.5', /give 3 or more/],
    ['bubbles vellum --at 0.3 --cut 0.5', /no quantity "vellum".*leastterm growth vellum --cut 0\.5/s],
    ['growth adler --at 0.3 --alpha-s-mz 0.118 --cut 0.5', /exclude each other/],
  ])('%s', async (line, message) => {
    const { status, stderr } = await run(line);
    expect(status).toBe(2);
    expect(stderr).toMatch(message);
  });

  test('a file without hard scale, and one without infrared singularity', async () => {
    const file = `${HEAD}singularities: [{ dimension: 4 }]\ncoefficients: [1, 2, 6, 40]\n`;
    const gev = await fromStdin('growth - --cut 0.9GeV', file);
    expect(gev.status).toBe(2);
    expect(gev.stderr).toMatch(/needs the hard scale Q in GeV.*hard scale: .*or give the cut as a ratio/s);
    expect((await fromStdin('growth - --cut 0.5', file)).status).toBe(0);
    const bare = await fromStdin('growth - --cut 0.5', `${HEAD}coefficients: [1, 2, 6, 40]\n`);
    expect(bare.status).toBe(2);
    expect(bare.stderr).toMatch(/states no infrared singularity.*singularities: \[\{ dimension: 4 \}\]/s);
  });
});
