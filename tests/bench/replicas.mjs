/**
 * What 10^5 replicas of a six-coefficient series by eight prescriptions cost on two threads, beside a plain mpmath loop that does
 * the same for a sample, from the same inputs, and whose values are compared first. `node tests/bench/replicas.mjs [replicas] [sample]`;
 * exit code 1 when a value differs or a bar is missed. Python with mpmath is needed for the yardstick alone.
 */
import { spawnSync } from 'node:child_process';
import { loadavg } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';

const ROOT = fileURLToPath(new URL('../..', import.meta.url));
const COUNT = Number(process.argv[2] ?? 100_000);
const SAMPLE = Number(process.argv[3] ?? 200);
const WORKERS = 2;
const SEED = 7;
/** Seconds of the whole, on two cores that are free, megabytes, and how much faster than the loop. */
const BARS = { seconds: 12, megabytes: 400, ratio: 100 };
const NAMES = ['fixed-order', 'least-term', 'pade', 'borel-pade', 'borel-leroy-pade', 'borel-partial-pade', 'borel-conformal', 'singularity-model'];

const outdir = join(ROOT, 'node_modules', '.cache', 'leastterm', 'bench-replicas');
const common = { bundle: true, platform: 'node', format: 'esm', logLevel: 'warning', absWorkingDir: ROOT };
await build({ ...common, entryPoints: ['src/extraction/replicas/worker.ts'], outfile: join(outdir, 'replica-worker.mjs') });
await build({
  ...common,
  stdin: {
    contents: [
      "export { loadSeries } from './src/series/index.ts';",
      "export { DEFAULT_THRESHOLDS } from './src/qcd/index.ts';",
      "export { buildReplicas } from './src/extraction/replicas/build.ts';",
      "export { sourceOf } from './src/extraction/replicas/from-extraction.ts';",
      "export { runReplicas } from './src/extraction/replicas/run.ts';",
      "export { summarise } from './src/extraction/replicas/summary.ts';",
      "export { Draw } from './src/extraction/replicas/draw.ts';",
    ].join('\n'),
    resolveDir: ROOT,
    loader: 'ts',
  },
  alias: { yaml: join(ROOT, 'node_modules/yaml/browser/index.js') },
  outfile: join(outdir, 'replicas.mjs'),
});
const { loadSeries, DEFAULT_THRESHOLDS, buildReplicas, sourceOf, runReplicas, summarise, Draw } = await import(
  join(outdir, 'replicas.mjs')
);

const series = await loadSeries(join(ROOT, 'tests', 'bench', 'replicas.yaml'));
const measured = { text: '0.137(4)', value: '0.137', plus: 0.004, minus: 0.004 };
const question = {
  for: 'alpha_s',
  data: [{ series: 'replicas', measured }],
  prescriptions: NAMES,
  truncationBy: 'own',
  ambiguityBy: 'im/pi',
  condensates: [],
  fileCondensates: false,
  loops: 5,
  thresholds: DEFAULT_THRESHOLDS,
  digits: 15,
};
const built = (more) => {
  const found = buildReplicas(sourceOf({ ...question, ...more }, [series]));
  if ('reason' in found || found.leftOut.length > 0) throw new Error(JSON.stringify(found));
  return found.problem;
};

/** Value, seconds on the clock, CPU seconds of all threads. */
async function timed(run) {
  const [wall, cpu] = [performance.now(), process.cpuUsage()];
  const value = await run();
  const { user, system } = process.cpuUsage(cpu);
  return { value, wall: (performance.now() - wall) / 1000, cpu: (user + system) / 1e6 };
}

const problem = built({});
const alone = await timed(async () => {
  const known = await runReplicas(problem, { count: COUNT, seed: SEED, workers: WORKERS, workerFile: join(outdir, 'replica-worker.mjs') });
  return { known, result: summarise(problem, known, SEED, []) };
});
const whole = built({ to: { scale: 91.1879, flavours: 5 } });
const evolved = await timed(async () => {
  const known = await runReplicas(whole, { count: COUNT, seed: SEED, workers: WORKERS, workerFile: join(outdir, 'replica-worker.mjs') });
  return summarise(whole, known, SEED, []);
});
const megabytes = process.resourceUsage().maxRSS / 1024;

// The inputs that the sample drew, for the loop.
const draw = new Draw(problem.inputs, SEED);
const state = new Float64Array(problem.inputs.central.length);
const { coefficients, measured: slot } = problem.data[0];
const replicas = Array.from({ length: SAMPLE }, (_, i) => {
  draw.replica(i, state, 0);
  return [state[slot - 1], coefficients.map((s) => state[s - 1])];
});
const task = {
  settings: problem.prescriptions.map((p) => p.settings[0]),
  starts: problem.prescriptions.map((p) => p.central[0]),
  replicas,
};
const python = spawnSync('python3', [join(ROOT, 'tests', 'bench', 'replicas-reference.py')], {
  input: JSON.stringify(task),
  encoding: 'utf8',
  maxBuffer: 1e8,
});
if (python.status !== 0) throw new Error(`python3 with mpmath is needed: ${python.stderr}`);
const reference = JSON.parse(python.stdout);

console.log(`node ${process.version}, mpmath ${reference.version}, load ${loadavg().map((l) => l.toFixed(1)).join(' ')}\n`);
console.log('| prescription | compared | largest difference | mpmath ms each |\n| --- | ---: | ---: | ---: |');
problem.prescriptions.forEach(({ name }, p) => {
  const own = alone.value.known.columns[p];
  let [compared, refused, worst] = [0, 0, 0];
  reference.values[name].forEach((value, i) => {
    if (value === null && Number.isNaN(own[i])) refused++;
    if (value === null || Number.isNaN(own[i])) return;
    compared++;
    worst = Math.max(worst, Math.abs(own[i] / value - 1));
  });
  // The loop knows fewer reasons to refuse.
  const good = worst < 1e-8 && compared + refused >= 0.97 * SAMPLE;
  if (!good) process.exitCode = 1;
  console.log(`| ${name} | ${compared}, both refuse ${refused} | ${worst.toExponential(1)}${good ? '' : ' DIFFERS'} | ${((1000 * reference.seconds[name]) / SAMPLE).toFixed(1)} |`);
});
const loop = (Object.values(reference.seconds).reduce((a, b) => a + b, 0) / SAMPLE) * COUNT;
const rows = [
  ['seconds on the clock', alone.wall, BARS.seconds, (v, bar) => v <= bar],
  ['CPU seconds of all threads', alone.cpu, 2 * BARS.seconds, (v, bar) => v <= bar],
  ['the same with the evolution to M_Z, clock', evolved.wall, BARS.seconds, (v, bar) => v <= bar],
  ['and CPU', evolved.cpu, 2 * BARS.seconds, (v, bar) => v <= bar],
  ['megabytes, the most', megabytes, BARS.megabytes, (v, bar) => v <= bar],
  [`mpmath loop, CPU seconds, from ${SAMPLE}`, loop, undefined, () => true],
  ['times faster, CPU', loop / alone.cpu, BARS.ratio, (v, bar) => v >= bar],
];
console.log(`\n| ${COUNT} replicas, ${NAMES.length} prescriptions, ${WORKERS} threads | | bar |\n| --- | ---: | ---: |`);
for (const [name, value, bar, good] of rows) {
  if (!good(value, bar)) process.exitCode = 1;
  console.log(`| ${name} | ${value.toPrecision(3)} | ${bar ?? ''}${good(value, bar) ? '' : ' missed'} |`);
}
