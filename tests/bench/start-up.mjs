/**
 * What a command costs, as a ratio to `node -e 0` in the same run: CPU time (user and system) of the process, the least of
 * many interleaved rounds, so that a busy machine slows both alike. `npm run bench`; exit code 1 when a bar is missed.
 */
import { spawnSync } from 'node:child_process';
import { rmSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { bundle } from '../../esbuild.config.mjs';

const ROOT = fileURLToPath(new URL('../..', import.meta.url));
const ROUNDS = Number(process.argv[2] ?? 15);

const outdir = join(ROOT, 'node_modules', '.cache', 'leastterm', `bench-${process.pid}`);
await bundle(outdir);
const program = join(outdir, 'leastterm.mjs');
const file = (name) => join(ROOT, 'tests', 'bench', name);

const CASES = [
  { name: 'node -e 0', argv: ['-e', '0'] },
  { name: '--help', argv: [program, '--help'], bar: 2.2 },
  {
    name: 'assess, five plain coefficients, 15 digits',
    argv: [program, 'assess', file('plain.yaml'), '--at', '0.3156(30)'],
    bar: 3,
  },
  {
    name: 'assess, with expressions, 15 digits',
    argv: [program, 'assess', file('expressions.yaml'), '--at', '0.3156(30)'],
    bar: 6,
  },
];

/** CPU milliseconds of one process, from the shell that waited for it. */
function cpu(argv) {
  const script = 'TIMEFORMAT="%3U %3S"; time "$@" > /dev/null 2> /dev/null';
  const { stderr, status } = spawnSync('bash', ['-c', script, 'bash', process.execPath, ...argv], { encoding: 'utf8' });
  if (status !== 0) throw new Error(`${argv.join(' ')} ended with ${status}`);
  const [user, system] = stderr.trim().split(/\s+/).map(Number);
  return 1000 * (user + system);
}

const least = CASES.map(() => Infinity);
for (let round = 0; round < ROUNDS; round++) {
  CASES.forEach(({ argv }, i) => {
    least[i] = Math.min(least[i], cpu(argv));
  });
}

console.log(`least CPU time of ${ROUNDS} rounds, node ${process.version}\n`);
console.log('| command | CPU ms | ratio | bar |\n| --- | ---: | ---: | ---: |');
CASES.forEach(({ name, bar }, i) => {
  const ratio = least[i] / least[0];
  const missed = bar !== undefined && ratio > bar;
  if (missed) process.exitCode = 1;
  console.log(`| ${name} | ${least[i].toFixed(0)} | ${ratio.toFixed(2)} | ${bar ?? ''}${missed ? ' missed' : ''} |`);
});

rmSync(outdir, { recursive: true, force: true });
