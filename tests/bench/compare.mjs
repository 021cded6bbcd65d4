/**
 * What `leastterm compare` costs with every prescription, at 20 digits, as a whole process, beside a mpmath script that does
 * four of them. CPU time (user and system), the least of several interleaved rounds. `node tests/bench/compare.mjs [rounds]`;
 * exit code 1 when a bar is missed. Python with mpmath is needed for the yardstick alone.
 */
import { spawnSync } from 'node:child_process';
import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { bundle } from '../../esbuild.config.mjs';

const ROOT = fileURLToPath(new URL('../..', import.meta.url));
const ROUNDS = Number(process.argv[2] ?? 5);
const outdir = join(ROOT, 'node_modules', '.cache', 'leastterm', 'bench-compare');
await bundle(outdir);
const program = join(outdir, 'leastterm.mjs');
const here = (name) => join(ROOT, 'tests', 'bench', name);

const s13 = JSON.parse(readFileSync(join(ROOT, 'tests', 'data', 'bench', 's13_mass_like.json'), 'utf8'));
const long = s13.coefficients.values.slice(0, 35);
const list = join(outdir, 's13.txt');
writeFileSync(list, `${long.join('\n')}\n`);
const short = ['1', '1.63982', '6.37101', '49.0757', '283', '3275'];

const leastterm = (...argv) => [process.execPath, program, 'compare', ...argv, '--digits', '20'];
const mpmath = (x, coefficients) => ['python3', here('compare.py'), '20', x, ...coefficients];
const CASES = [
  {
    name: 'compare, six coefficients, with the back-test',
    argv: leastterm(here('six.yaml'), '--at', '0.3156'),
    bar: 1500,
  },
  { name: 'mpmath, four prescriptions, six coefficients', argv: mpmath('0.10045860', short), of: 0 },
  { name: 'compare, 35 mass-like coefficients', argv: leastterm(list, '--at', '1/20'), bar: 6000 },
  { name: 'mpmath, four prescriptions, 35 coefficients', argv: mpmath('1/20', long), of: 2 },
  { name: 'compare, 35 mass-like, --hide 1', argv: leastterm(list, '--at', '1/20', '--hide', '1') },
];

function cpu(argv) {
  const script = 'TIMEFORMAT="%3U %3S"; time "$@" > /dev/null 2> /dev/null';
  const { stderr, status } = spawnSync('bash', ['-c', script, 'bash', ...argv], { encoding: 'utf8' });
  if (status !== 0) return Number.NaN;
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
console.log('| process | CPU ms | over compare | bar, ms |\n| --- | ---: | ---: | ---: |');
CASES.forEach(({ name, bar, of }, i) => {
  const missed = bar !== undefined && !(least[i] <= bar);
  if (missed) process.exitCode = 1;
  const ratio = of === undefined ? '' : (least[i] / least[of]).toFixed(2);
  console.log(`| ${name} | ${least[i].toFixed(0)} | ${ratio} | ${bar ?? ''}${missed ? ' missed' : ''} |`);
});
