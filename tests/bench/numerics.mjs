/**
 * Arithmetic and special functions against mpmath (GMP backend) and PARI/GP in one run: single operations at 20 to 1,000
 * digits, and the way from exact coefficients to [N/N], all poles, principal value and imaginary part at 110 digits.
 * Results are compared first. Every program is warmed up, repeats short batches, and the CPU time of its least batch counts; the three
 * take turns. `node tests/bench/numerics.mjs [--quick]`. Exit code 1 when a result differs or the pipeline misses its bars.
 */
import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';

const ROOT = fileURLToPath(new URL('../..', import.meta.url));
const QUICK = process.argv.includes('--quick');
const ROUNDS = QUICK ? 1 : 2;
const DIGITS = [20, 50, 100, 300, 1000];
const ORDERS = QUICK ? [10, 20] : [10, 20, 50, 100];
const MPMATH_ORDERS = QUICK ? [10] : [10, 20, 50];
const PIPELINE_DIGITS = 110;
const BATCH_SECONDS = 0.02;
const BATCHES = 10;
const BARS = { mpmath: 8, pari: 1, growth: 2.6 };
const DEBIAN_PYTHON = '/usr/bin/python3';
const LOG2_10 = Math.log2(10);

const outfile = join(ROOT, 'node_modules', '.cache', 'leastterm', 'bench-numerics', 'numerics.mjs');
await build({
  stdin: {
    contents: "export * from './src/numerics/index.ts'; export { laplace } from './src/borel/index.ts';",
    resolveDir: ROOT,
    loader: 'ts',
  },
  bundle: true,
  platform: 'node',
  format: 'esm',
  outfile,
  logLevel: 'warning',
});
const { atan, exact, exp, expintE1, gamma, laplace, log, padePoles, R, Rational, toDecimal, upperGamma } = await import(
  outfile
);

const bits = (digits) => Math.ceil(digits * LOG2_10) + 1;
const OPERATIONS = {
  multiply: (x, y, s, p) => R.mul(x, y, p),
  divide: (x, y, s, p) => R.div(x, y, p),
  exp: (x, y, s, p) => exp(y, p),
  log: (x, y, s, p) => log(x, p),
  atan: (x, y, s, p) => atan(x, p),
  gamma: (x, y, s, p) => gamma(x, p),
  e1: (x, y, s, p) => expintE1(x, p),
  'incomplete gamma': (x, y, s, p) => upperGamma(s, x, p),
};

/** CPU milliseconds of this process so far. */
function cpu() {
  const { user, system } = process.cpuUsage();
  return (user + system) / 1000;
}

/** Least CPU microseconds a call, after some hundred calls, or calls for some milliseconds, that do not count. */
function least(run) {
  const start = cpu();
  let warm = 0;
  do run(warm++);
  while (warm < 400 && (warm < 4 || cpu() - start < 200));
  const each = (cpu() - start) / warm;
  const count = Math.max(1, Math.min(20_000, Math.floor((BATCH_SECONDS * 1000) / each)));
  let best = Infinity;
  for (let b = 0; b < BATCHES; b++) {
    const t = cpu();
    for (let i = 0; i < count; i++) run(i);
    best = Math.min(best, (cpu() - t) / count);
  }
  return best * 1000;
}

const root = (n, p) => R.exactMid(R.sqrt(R.fromNumber(n), p));
function ourOperations() {
  const out = {};
  for (const digits of DIGITS) {
    const p = bits(digits);
    const times = (a, num, den) => R.exactMid(R.mul(a, R.fromRational(Rational.of(BigInt(num), BigInt(den)), p), p));
    const xs = Array.from({ length: 8 }, (_, i) => times(root(2, p), 21 + i, 7));
    const ys = Array.from({ length: 8 }, (_, i) => times(root(3, p), 11 + i, 11));
    const s = R.exactMid(R.div(root(5, p), R.fromNumber(-7), p));
    out[digits] = {};
    for (const [name, f] of Object.entries(OPERATIONS)) {
      const us = least((i) => f(xs[i & 7], ys[i & 7], s, p));
      out[digits][name] = { us, value: toDecimal(f(xs[0], ys[0], s, p), 15).text };
    }
  }
  return out;
}

/** Least microseconds of the bare product and quotient of two BigInts of these digits: no arrangement of such products can be faster. */
function bare(digits) {
  const p = bits(digits);
  const integers = (n) => Array.from({ length: 8 }, (_, i) => R.mul(root(n, p), R.fromNumber(21 + i), p).mid);
  const [xs, ys] = [integers(2), integers(3)];
  const wide = xs.map((x) => x << BigInt(p));
  return { product: least((i) => xs[i & 7] * ys[i & 7]), quotient: least((i) => wide[i & 7] / ys[i & 7]) };
}

/** b_n = (1.3696)_n/n!·2^n + 0.3·(1.2)_n/n!·(−1)^n, exactly: two branch points, at 1/2 and −1. */
function coefficients(count) {
  const out = [];
  let [a, b] = [Rational.ONE, Rational.of(3n, 10n)];
  for (let n = 0; n < count; n++) {
    out.push(a.add(b));
    const k = Rational.of(BigInt(n));
    const next = Rational.of(BigInt(n + 1));
    a = a.mul(Rational.of(13696n, 10000n).add(k)).mul(Rational.of(2n)).div(next);
    b = b.mul(Rational.of(12n, 10n).add(k)).neg().div(next);
  }
  return out;
}
const series = coefficients(2 * Math.max(...ORDERS) + 1);
const X = Rational.of(1n, 7n);

function ourPipeline(n) {
  const prec = bits(PIPELINE_DIGITS) + 16;
  const found = padePoles(series.slice(0, 2 * n + 1).map(exact), n, n, prec);
  if (found.exists !== true) throw new Error(found.reason);
  const poles = found.poles
    .filter((p) => p.position.im.mid >= 0n)
    .map((p) => ({ z: p.position, real: p.real, amplitudes: [p.amplitude] }));
  return laplace(found.polynomial, poles, R.fromRational(X, prec), Rational.ZERO, prec);
}

function ourPipelines() {
  const out = {};
  for (const n of ORDERS) {
    let best = Infinity;
    let value = ourPipeline(n);
    for (let k = 0; k < (n <= 20 ? 40 : 6); k++) {
      const t = cpu();
      value = ourPipeline(n);
      best = Math.min(best, cpu() - t);
    }
    out[n] = { s: best / 1000, re: toDecimal(value.pv, 110).text, im: toDecimal(value.im, 110).text };
  }
  return out;
}

function pythonRun(orders) {
  const task = {
    digits: DIGITS,
    operations: Object.keys(OPERATIONS),
    batchSeconds: BATCH_SECONDS,
    batches: BATCHES,
    coefficients: series.map((q) => [String(q.num), String(q.den)]),
    x: [String(X.num), String(X.den)],
    orders,
    pipelineDigits: PIPELINE_DIGITS,
  };
  const program = existsSync(DEBIAN_PYTHON) ? DEBIAN_PYTHON : 'python3';
  const run = spawnSync(program, [join(ROOT, 'tests/bench/numerics-reference.py')], {
    input: JSON.stringify(task),
    encoding: 'utf8',
    maxBuffer: 1 << 28,
  });
  if (run.status !== 0) throw new Error(`python3 with mpmath is needed: ${run.stderr}`);
  return JSON.parse(run.stdout);
}

function pariRun() {
  const head = [
    `DIGITS=[${DIGITS}]`,
    `ORDERS=[${ORDERS}]`,
    `COEFFICIENTS=[${series.map((q) => `${q.num}/${q.den}`)}]`,
    `X=${X.num}/${X.den}`,
    `PIPELINE_DIGITS=${PIPELINE_DIGITS}`,
    `read("${join(ROOT, 'tests/bench/numerics-reference.gp')}")`,
  ];
  const run = spawnSync('gp', ['-q', '-f', '-s', '1G'], {
    input: head.join('\n') + '\n',
    encoding: 'utf8',
    maxBuffer: 1 << 28,
  });
  if (run.status !== 0) throw new Error(`PARI/GP is needed: ${run.stderr}`);
  const out = { operations: {}, pipeline: {} };
  for (const line of run.stdout.replaceAll(' E', 'e').split('\n')) {
    const [kind, key, ...rest] = line.trim().split(/ +/);
    if (kind === 'operation')
      (out.operations[key] ??= {})[rest[0].replace('-', ' ')] = { us: Number(rest[1]), value: rest[2] };
    if (kind === 'pipeline') out.pipeline[key] = { s: Number(rest[0]) / 1000, re: rest[1], im: rest[2] };
  }
  return out;
}

/** The least cost of each entry over the rounds. */
function merge(into, more) {
  for (const [digits, row] of Object.entries(more.operations))
    for (const [name, cell] of Object.entries(row)) {
      const have = ((into.operations ??= {})[digits] ??= {})[name];
      into.operations[digits][name] = have === undefined || cell.us < have.us ? cell : have;
    }
  for (const [n, cell] of Object.entries(more.pipeline)) {
    const have = (into.pipeline ??= {})[n];
    into.pipeline[n] = have === undefined || cell.s < have.s ? cell : have;
  }
}

const ours = {};
const mpmath = {};
const pari = {};
let about;
ourOperations(); // compiled before anything counts
for (let round = 0; round < ROUNDS; round++) {
  // The pipeline of mpmath takes half a minute at N = 50: once is enough.
  about = pythonRun(round === 0 ? MPMATH_ORDERS : []);
  merge(mpmath, about);
  merge(ours, { operations: ourOperations(), pipeline: ourPipelines() });
  merge(pari, pariRun());
}

let failures = 0;
/** Equal to the digits given, but for the last few. */
function check(what, a, b, digits) {
  const scale = Math.abs(Number(a)) || 1;
  const same = Math.abs(Number(a) - Number(b)) <= 1e-13 * scale && sameDigits(a, b, digits);
  if (!same) {
    failures++;
    console.log(`DIFFERS ${what}: ${a} against ${b}`);
  }
}
function sameDigits(a, b, digits) {
  if (digits <= 15) return true;
  const [p, q] = [Rational.parse(a), Rational.parse(b)];
  return p.isZero()
    ? Number(b) === 0
    : p
        .sub(q)
        .abs()
        .cmp(p.abs().mul(Rational.parse(`1e-${digits}`))) <= 0;
}

console.log(
  `mpmath ${about.version} (backend ${about.backend}), Node ${process.version}; microseconds, and times as long`,
);
console.log(['digits', ...Object.keys(OPERATIONS)].map((t) => t.padEnd(22)).join(''));
for (const digits of DIGITS) {
  const cells = Object.keys(OPERATIONS).map((name) => {
    const [o, m, p] = [ours, mpmath, pari].map((s) => s.operations[digits][name]);
    check(`${name} at ${digits} digits, mpmath`, o.value, m.value, 13);
    check(`${name} at ${digits} digits, PARI/GP`, o.value, p.value, 13);
    const flag = m.us < o.us ? '!' : ' ';
    return `${o.us.toPrecision(3)} ${(m.us / o.us).toFixed(2)}${flag} ${(p.us / o.us).toFixed(2)}`.padEnd(22);
  });
  console.log(String(digits).padEnd(22) + cells.join(''));
}
const last = DIGITS[DIGITS.length - 1];
const limit = bare(last);
console.log(
  `\nBigInts of ${last} digits alone: product ${limit.product.toPrecision(3)}, quotient ${limit.quotient.toPrecision(3)} microseconds; the whole`,
);
console.log(
  `operations of mpmath: ${mpmath.operations[last].multiply.us.toPrecision(3)} and ${mpmath.operations[last].divide.us.toPrecision(3)}`,
);
console.log('\npipeline at 110 digits: milliseconds, mpmath and PARI/GP over ours');
for (const n of ORDERS) {
  const o = ours.pipeline[n];
  const [m, p] = [mpmath.pipeline[n], pari.pipeline[n]];
  for (const [name, other] of Object.entries({ mpmath: m, 'PARI/GP': p }))
    if (other !== undefined)
      for (const part of ['re', 'im']) check(`[${n}/${n}] ${part}, ${name}`, o[part], other[part], 104);
  const ratio = (other) => (other === undefined ? '-' : (other.s / o.s).toFixed(2)).padEnd(10);
  console.log(`[${n}/${n}]`.padEnd(12) + (o.s * 1000).toPrecision(3).padEnd(10) + ratio(m) + ratio(p));
}
const bar = (text, ok) => {
  if (!ok) failures++;
  console.log(`${ok ? 'met   ' : 'MISSED'} ${text}`);
};
for (let i = 1; i < ORDERS.length; i++) {
  const [low, high] = [ORDERS[i - 1], ORDERS[i]];
  const growth = Math.log(ours.pipeline[high].s / ours.pipeline[low].s) / Math.log(high / low);
  bar(`growth from N = ${low} to ${high}: N^${growth.toFixed(2)} (bar ${BARS.growth})`, growth <= BARS.growth);
}
if (!QUICK) {
  bar(
    `N = 50: at least ${BARS.mpmath} times as fast as mpmath`,
    mpmath.pipeline[50].s >= BARS.mpmath * ours.pipeline[50].s,
  );
  bar(`N = 50: no slower than PARI/GP`, pari.pipeline[50].s >= BARS.pari * ours.pipeline[50].s);
}
process.exitCode = failures > 0 ? 1 : 0;
