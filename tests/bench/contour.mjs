/**
 * What sums on a circle cost, as a ratio to mpmath doing the same in the same run: a contour-improved sum in doubles and to 20
 * digits, and the Borel sum of the moment to 15 digits. The results are compared first. `node tests/bench/contour.mjs`; exit
 * code 1 when a result differs or a bar is missed.
 */
import { spawnSync } from 'node:child_process';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';

const ROOT = fileURLToPath(new URL('../..', import.meta.url));
const ALPHA = '0.34';
const MANY = 20_000;

const outfile = join(ROOT, 'node_modules', '.cache', 'leastterm', 'bench-contour', 'contour.mjs');
await build({
  stdin: {
    contents:
      "export * from './src/contour/index.ts'; export * from './src/numerics/index.ts'; export { parseSeries } from './src/series/index.ts'; export { expand } from './src/studies/expand.ts';",
    resolveDir: ROOT,
    loader: 'ts',
  },
  bundle: true,
  platform: 'node',
  format: 'esm',
  alias: { yaml: join(ROOT, 'node_modules/yaml/browser/index.js') },
  outfile,
  logLevel: 'warning',
});
const { contourSum, exact, expand, improvedAnswers, modelAnswers, parseSeries, Rational, toDecimal } = await import(
  outfile
);

const COEFFICIENTS = ['1', '1.6398212048969847', '6.3710144831009403', '49.075700002947983', '283'];
const FILE = `
kind: contour
weight: kinematic
coupling: { name: alpha_s, divisor: pi }
first power: 1
scheme: MSbar, four-loop running only
flavours: 3
coefficients: [${COEFFICIENTS.join(', ')}]
singularities:
  - { u: -1, anomalous dimension: -1, kind: ultraviolet }
  - { dimension: 4, wilson corrections: [-11/18], kind: infrared }
  - { dimension: 6, kind: infrared }
`;
const series = await parseSeries(FILE, { name: 'bench', form: 'yaml' });
const { expansion } = expand(series, exact(Rational.parse(ALPHA)));
/** Nothing that an earlier round has worked out for this quantity is used again. */
const fresh = () => ({ ...expansion, contour: { ...expansion.contour } });

const task = JSON.stringify({ alpha: ALPHA, coefficients: COEFFICIENTS, integral: ['1', '-2', '0', '2', '-1'] });
const python = spawnSync('python3', [join(ROOT, 'tests', 'bench', 'contour-reference.py')], {
  input: task,
  encoding: 'utf8',
});
if (python.status !== 0) throw new Error(`python3 with mpmath is needed: ${python.stderr}`);
const reference = JSON.parse(python.stdout);

/** Value, and the least CPU seconds of some rounds. A busy machine slows both programs alike. */
function timed(run, rounds) {
  let seconds = Infinity;
  let value;
  for (let i = 0; i < rounds; i++) {
    const before = process.cpuUsage();
    value = run();
    const { user, system } = process.cpuUsage(before);
    seconds = Math.min(seconds, (user + system) / 1e6);
  }
  return { value, seconds };
}

const valueOf = ([answer], digits) => toDecimal(answer.value, digits).text;
const many = timed(() => {
  let value = 0;
  for (let i = 0; i < MANY; i++) value = contourSum(expansion, 'contour-improved', 0.34);
  return String(value);
}, 3);
const replicas = timed(() => {
  for (let i = 0; i < MANY; i++) contourSum(expansion, 'fixed-order', 0.34, [1, 1.64, 6.371, 49.08, 283 + i * 1e-3]);
  return '';
}, 3);

const cases = [
  {
    name: 'contour improved, doubles, each',
    ...many,
    seconds: many.seconds / MANY,
    of: 'doubles',
    digits: 13,
    bar: 1000,
  },
  {
    name: 'contour improved, 20 digits',
    ...timed(() => valueOf(improvedAnswers(fresh(), { digits: 20 }), 20), 3),
    of: 'improved',
    digits: 18,
    bar: 3,
  },
  {
    name: 'Borel sum on the circle, 15 digits',
    ...timed(() => valueOf(modelAnswers(fresh(), { digits: 15, only: 'central' }), 15), 3),
    of: 'borel',
    digits: 13,
    bar: 3,
  },
];

console.log(`mpmath ${reference.version}, node ${process.version}\n`);
console.log('| task | ms | mpmath ms | times faster | bar |\n| --- | ---: | ---: | ---: | ---: |');
for (const { name, value, seconds, of, digits, bar } of cases) {
  const other = reference[of];
  const miss = Rational.parse(value).sub(Rational.parse(other.value)).div(Rational.parse(other.value)).abs().toNumber();
  const factor = other.seconds / seconds;
  const wrong = !(miss < 10 ** -digits);
  if (wrong || factor < bar) process.exitCode = 1;
  const ms = seconds < 1e-3 ? (1000 * seconds).toFixed(3) : (1000 * seconds).toFixed(0);
  console.log(
    `| ${name} | ${ms} | ${(1000 * other.seconds).toFixed(0)} | ${factor.toFixed(0)} | ${bar}${factor < bar ? ' missed' : ''} |${wrong ? ` differs: ${value} against ${other.value}` : ''}`,
  );
}
console.log(`\na fixed-order replica with coefficients of its own: ${((1e6 * replicas.seconds) / MANY).toFixed(1)} µs`);
