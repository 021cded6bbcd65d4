/**
 * Principal values of bubble chains to 40 digits, as a ratio to mpmath doing the same by rotated Borel contours in the same run. The
 * values are compared first. `node tests/bench/bubbles.mjs [names]`; exit code 1 when one differs or a bar is missed.
 */
import { spawnSync } from 'node:child_process';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';

const ROOT = fileURLToPath(new URL('../..', import.meta.url));
const DIGITS = 40;
/** Digits that mpmath's quadrature is trusted for at its working precision. */
const AGREE = 36;
const BAR = 5;
const ALPHA = { 3: '0.3', 4: '0.22' };
const FLAVOURS = { 'pole-mass': 4, 'b-to-u-pole': 4 };
const NAMES = ['adler', 'r-ratio', 'tau-width', 'bjorken', 'static-potential', 'pole-mass', 'b-to-u-pole'];

const outfile = join(ROOT, 'node_modules', '.cache', 'leastterm', 'bench-bubbles', 'bubbles.mjs');
await build({
  stdin: {
    contents: "export * from './src/bubbles/index.ts'; export * from './src/numerics/index.ts';",
    resolveDir: ROOT,
    loader: 'ts',
  },
  bundle: true,
  platform: 'node',
  format: 'esm',
  outfile,
  logLevel: 'warning',
});
const { Rational, chainSum, exact, quantityNamed, toDecimal } = await import(outfile);

const names = process.argv.length > 2 ? process.argv.slice(2) : NAMES;
const task = JSON.stringify({ digits: DIGITS + 3, alpha3: ALPHA[3], alpha4: ALPHA[4], names });
const python = spawnSync('python3', [join(ROOT, 'tests', 'bench', 'bubbles-reference.py')], { input: task, encoding: 'utf8' });
if (python.status !== 0) throw new Error(`python3 with mpmath is needed: ${python.stderr}`);
const reference = JSON.parse(python.stdout);

/** CPU seconds of the first round, and the least of some with everything compiled. Sums are made anew in each. */
function timed(run, rounds) {
  const times = [];
  let value;
  for (let i = 0; i < rounds; i++) {
    const before = process.cpuUsage();
    value = run();
    const { user, system } = process.cpuUsage(before);
    times.push((user + system) / 1e6);
  }
  return { value, first: times[0], seconds: Math.min(...times) };
}

const near = (a, b) => {
  const [x, y] = [a, b].map((t) => Rational.parse(t.replace('e+', 'e')));
  return x.sub(y).div(y).abs().toNumber() < 10 ** (1 - AGREE);
};

console.log(`node ${process.version}, mpmath ${reference.version}, ${DIGITS} digits\n`);
console.log('| principal value | same | first, ms | ms | mpmath ms | times faster, first | times faster | bar |');
console.log('| --- | --- | ---: | ---: | ---: | ---: | ---: | ---: |');
for (const name of names) {
  const flavours = FLAVOURS[name] ?? 3;
  const point = { alpha: exact(Rational.parse(ALPHA[flavours])), flavours, ratio: exact(1) };
  const { value, first, seconds } = timed(() => toDecimal(chainSum(quantityNamed(name), point).pv.ball(Math.ceil(DIGITS * 3.33) + 8), DIGITS).text, 6);
  const other = reference.seconds[name];
  const good = near(value, reference.values[name]);
  const missed = other / seconds < BAR;
  if (missed || !good) process.exitCode = 1;
  if (!good) console.error(value, reference.values[name]);
  const ms = (s) => (s * 1000).toFixed(0);
  console.log(
    `| ${name} | ${good ? 'yes' : 'NO'} | ${ms(first)} | ${ms(seconds)} | ${ms(other)} | ${(other / first).toPrecision(3)} | ${(other / seconds).toPrecision(3)} | ${BAR}${missed ? ' missed' : ''} |`,
  );
}
