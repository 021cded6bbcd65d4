/**
 * What a mass conversion costs, as a ratio to mpmath doing the same in the same run: MSbar to RS and back in doubles,
 * an MSR mass by R-evolution, a PV mass to 50 certified digits. The results are compared first. `node tests/bench/mass.mjs`;
 * exit code 1 when a result differs or a bar is missed.
 */
import { spawnSync } from 'node:child_process';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';

const ROOT = fileURLToPath(new URL('../..', import.meta.url));
const MANY = 20_000;
/** The reference does a sample: all of them would take hours. */
const SAMPLE = 4;
/** Quicker than this each, in milliseconds of CPU: 10^5 replicas in half a minute at most. */
const MOST_MS = 0.3;

const outfile = join(ROOT, 'node_modules', '.cache', 'leastterm', 'bench-mass', 'mass.mjs');
await build({
  stdin: {
    contents: "export * from './src/masses/index.ts'; export * from './src/numerics/index.ts';",
    resolveDir: ROOT,
    loader: 'ts',
  },
  bundle: true,
  platform: 'node',
  format: 'esm',
  outfile,
  logLevel: 'warning',
});
const { Rational, convertMass, exact, exactMass, toDecimal } = await import(outfile);

const task = {
  light: 4,
  strength: '0.506186',
  alpha: '0.2250',
  at: '4.18',
  cutoff: '2',
  masses: Array.from({ length: SAMPLE }, (_, i) => (4.1 + 0.03 * i).toFixed(4)),
  inverse: Array.from({ length: SAMPLE }, (_, i) => (4.3 + 0.05 * i).toFixed(4)),
};
const python = spawnSync('python3', [join(ROOT, 'tests', 'bench', 'mass-reference.py')], {
  input: JSON.stringify(task),
  encoding: 'utf8',
});
if (python.status !== 0) throw new Error(`python3 with mpmath is needed: ${python.stderr}`);
const reference = JSON.parse(python.stdout);

/** CPU seconds. */
function timed(run) {
  const before = process.cpuUsage();
  const value = run();
  const { user, system } = process.cpuUsage(before);
  return { value, seconds: (user + system) / 1e6 };
}

const base = {
  alpha: { value: Number(task.alpha), scale: Number(task.at), flavours: task.light },
  light: task.light,
  loops: 4,
  strength: Number(task.strength),
};
const msbar = { definition: 'msbar' };
const rs = { definition: 'rs', scale: Number(task.cutoff) };
const msr = { definition: 'msr-practical', scale: Number(task.cutoff) };
const convert = (mass, from, to) => convertMass({ ...base, mass, from, to }).value;
const agree = (own, other, digits) => Math.abs(own / Number(other) - 1) < 10 ** -digits;

/** Many conversions, the first thousand to warm the machine up; seconds each. */
function each(from, to, start) {
  for (let i = 0; i < 1000; i++) convert(start + i * 1e-5, from, to);
  return (
    timed(() => {
      let sum = 0;
      for (let i = 0; i < MANY; i++) sum += convert(start + i * 1e-5, from, to);
      return sum;
    }).seconds / MANY
  );
}

const [first] = task.masses;
const cases = [
  {
    name: 'MSbar to RS, doubles, each',
    good: task.masses.every((m, i) => agree(convert(Number(m), msbar, rs), reference.forward[i], 14)),
    seconds: each(msbar, rs, 4.1),
    reference: reference.forwardTime,
    bar: 100,
  },
  {
    name: 'RS to MSbar, doubles, each',
    good: task.inverse.every((m, i) => agree(convert(Number(m), rs, msbar), reference.inverse[i], 14)),
    seconds: each(rs, msbar, 4.3),
    reference: reference.inverseTime,
    bar: 100,
  },
  {
    name: 'MSbar to MSR by R-evolution, doubles, each',
    good: agree(convert(Number(first), msbar, msr) - Number(first), reference.evolved, 12),
    seconds: each(msbar, msr, 4.1),
    reference: reference.evolvedTime,
    bar: 100,
  },
];
for (const c of cases) {
  if (c.seconds * 1000 > MOST_MS) {
    console.log(`${c.name}: ${(c.seconds * 1000).toFixed(3)} ms is more than ${MOST_MS}`);
    process.exitCode = 1;
  }
}

const inputs = { mass: exact(Rational.parse(first)), alpha: exact(Rational.parse(task.alpha)) };
const sharp = () =>
  toDecimal(exactMass({ ...base, mass: Number(first), from: msbar, to: { definition: 'pv' } }, inputs).ball(200), 50)
    .text;
sharp();
const one = timed(() => sharp());
cases.push({
  name: 'MSbar to PV, 50 certified digits',
  good: Rational.parse(one.value).sub(Rational.parse(reference.pv)).abs().toNumber() < 1e-48,
  seconds: one.seconds,
  reference: reference.pvTime,
  bar: 5,
});

console.log(`node ${process.version}, mpmath ${reference.version}\n`);
console.log('| task | same result | ms | mpmath ms | times faster | bar |\n| --- | --- | ---: | ---: | ---: | ---: |');
for (const { name, good, seconds, reference: other, bar } of cases) {
  const ratio = other / seconds;
  const missed = ratio < bar;
  if (missed || !good) process.exitCode = 1;
  const ms = (s) => (s * 1000 < 1 ? (s * 1000).toFixed(4) : (s * 1000).toFixed(1));
  console.log(
    `| ${name} | ${good ? 'yes' : 'NO'} | ${ms(seconds)} | ${ms(other)} | ${ratio.toPrecision(3)} | ${bar}${missed ? ' missed' : ''} |`,
  );
}
