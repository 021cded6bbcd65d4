/**
 * What running and rewriting cost, as a ratio to mpmath doing the same in the same run: 10^5 values of α_s to 15 digits, one
 * to 50 digits, a series of 35 coefficients rewritten to 50 digits. The results are compared first. `node tests/bench/qcd.mjs`;
 * exit code 1 when a result differs or a bar is missed.
 */
import { spawnSync } from 'node:child_process';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';

const ROOT = fileURLToPath(new URL('../..', import.meta.url));
const FLAVOURS = 4;
const RATIO = 7.3;
const FACTOR = 2;
/** The reference does a sample of the many: all of them would take hours. */
const SAMPLE = 12;
const MANY = 100_000;

const outfile = join(ROOT, 'node_modules', '.cache', 'leastterm', 'bench-qcd', 'qcd.mjs');
await build({
  stdin: {
    contents: "export * from './src/qcd/index.ts'; export * from './src/numerics/index.ts';",
    resolveDir: ROOT,
    loader: 'ts',
  },
  bundle: true,
  platform: 'node',
  format: 'esm',
  outfile,
  logLevel: 'warning',
});
const { Rational, betaCoefficients, changeScale, evolveAlpha, exact, exactAlpha, exactReal, log, R, toDecimal } = await import(outfile);

const alphas = Array.from({ length: SAMPLE }, (_, i) => (0.15 + 0.013 * i).toFixed(4));
const coefficients = Array.from({ length: 35 }, (_, n) => `${n % 2 === 0 ? '' : '-'}${(1.37 * (n + 1) ** 2).toFixed(4)}`);

const task = JSON.stringify({ flavours: FLAVOURS, ratio: String(RATIO), factor: String(FACTOR), alphas, coefficients });
const python = spawnSync('python3', [join(ROOT, 'tests', 'bench', 'qcd-reference.py')], { input: task, encoding: 'utf8' });
if (python.status !== 0) throw new Error(`python3 with mpmath is needed: ${python.stderr}`);
const reference = JSON.parse(python.stdout);

/** Value, and CPU seconds of the first round and of the least of some. A busy machine slows both programs alike. */
function timed(run, rounds = 1) {
  const times = [];
  let value;
  for (let i = 0; i < rounds; i++) {
    const before = process.cpuUsage();
    value = run(i);
    const { user, system } = process.cpuUsage(before);
    times.push((user + system) / 1e6);
  }
  return { value, first: times[0], seconds: Math.min(...times) };
}

const question = (alpha) => ({ alpha, from: 1, to: RATIO, flavours: FLAVOURS, loops: 5 });
const rational = (text) => exact(Rational.parse(text));
const cases = [];

// Many values in doubles; the first thousand warm the machine up.
for (let i = 0; i < 1000; i++) evolveAlpha(question(0.15 + i * 1e-4));
const many = timed(() => {
  let last = 0;
  for (let i = 0; i < MANY; i++) last += evolveAlpha(question(0.15 + (i / MANY) * 0.15));
  return last;
});
const agree = (own, other, digits) => Math.abs(Number(own) / Number(other) - 1) < 10 ** (1 - digits);
cases.push({
  name: `10^5 values of α_s, 15 digits (each ${((many.seconds / MANY) * 1e6).toFixed(2)} µs)`,
  good: alphas.every((a, i) => agree(evolveAlpha(question(Number(a))), reference.many[i], 14)),
  seconds: many.seconds / MANY,
  reference: reference.perValue,
  bar: 1000,
});

const text = (value, digits) => toDecimal(value.ball(Math.ceil(digits * 3.33) + 32), digits).text;
/** Agreement of two decimal strings, as rationals. */
function near(a, b, digits) {
  const [x, y] = [a, b].map((t) => Rational.parse(t.replace('e+', 'e')));
  const gap = x.sub(y).div(y).abs();
  return gap.toNumber() < 10 ** (1 - digits);
}
const exactQuestion = { alpha: rational(alphas[0]), from: rational('1'), to: rational(String(RATIO)), flavours: FLAVOURS, loops: 5 };
const one = timed(() => text(exactAlpha(exactQuestion), 50), 8);
cases.push({
  name: `one value of α_s, 50 certified digits (first use ${(one.first * 1000).toFixed(0)} ms)`,
  good: near(one.value, reference.one, 48),
  seconds: one.seconds,
  reference: reference.oneTime,
  bar: 5,
});

const rewritten = timed(() => {
  const shift = exactReal((prec) => R.mul2exp(log(R.fromNumber(FACTOR), prec + 4), 1));
  const series = { coefficients: coefficients.map(rational), firstPower: 1 };
  return changeScale(series, betaCoefficients(FLAVOURS, 'pi'), shift).map((c) => text(c, 50));
}, 8);
cases.push({
  name: `35 coefficients rewritten, 50 certified digits (first use ${(rewritten.first * 1000).toFixed(0)} ms)`,
  good: rewritten.value.every((c, i) => near(c, reference.rewritten[i], 40)),
  seconds: rewritten.seconds,
  reference: reference.rewriteTime,
  bar: 1,
});

console.log(`node ${process.version}, mpmath ${reference.version}\n`);
console.log('| task | same result | ms | mpmath ms | times faster | bar |\n| --- | --- | ---: | ---: | ---: | ---: |');
for (const { name, good, seconds, reference: other, bar } of cases) {
  const ratio = other / seconds;
  const missed = bar !== undefined && ratio < bar;
  if (missed || !good) process.exitCode = 1;
  const ms = (s) => (s * 1000 < 0.1 ? (s * 1000).toFixed(4) : (s * 1000).toFixed(1));
  console.log(`| ${name} | ${good ? 'yes' : 'NO'} | ${ms(seconds)} | ${ms(other)} | ${ratio.toPrecision(3)} | ${bar ?? ''}${missed ? ' missed' : ''} |`);
}
