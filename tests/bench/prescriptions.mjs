/**
 * What each prescription costs with 5, 10, 20, 40 and 80 coefficients: its own choice and error to 15 digits, CPU time over
 * that of one reference operation in the same process (π to 3000 digits by Machin's formula in whole numbers, some
 * milliseconds). `node tests/bench/prescriptions.mjs [name …]`; exit code 1 when one passes the bound.
 */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';

const ROOT = fileURLToPath(new URL('../..', import.meta.url));
const COUNTS = [5, 10, 20, 40, 80];
const DIGITS = 15;
/** No prescription may take longer than this many reference operations: a second or two. */
const BOUND = 400;
/** Rounds of one measurement, ended early when it has taken so long, in ms. */
const ROUNDS = 5;
const LONG = 400;

const outfile = join(ROOT, 'node_modules', '.cache', 'leastterm', 'bench-prescriptions', 'prescriptions.mjs');
await build({
  stdin: {
    contents: [
      "export * from './src/numerics/index.ts';",
      "export { PRESCRIPTIONS } from './src/prescriptions/index.ts';",
      "export { diagnoseGrowth } from './src/growth/index.ts';",
      "export { betaCoefficients } from './src/qcd/index.ts';",
    ].join('\n'),
    resolveDir: ROOT,
    loader: 'ts',
  },
  bundle: true,
  platform: 'node',
  format: 'esm',
  outfile,
  logLevel: 'warning',
});
const { betaCoefficients, diagnoseGrowth, exact, PRESCRIPTIONS, R, Rational } = await import(outfile);

const q = (text) => exact(Rational.parse(text));
const bench = (id) => JSON.parse(readFileSync(join(ROOT, 'tests', 'data', 'bench', `${id}.json`), 'utf8'));

function logAbs(c) {
  const m = R.exactMid(c.ball(96));
  if (m.mid === 0n) return -Infinity;
  const bits = R.upperBits(m);
  return Math.log(Math.abs(R.toNumber(R.mul2exp(m, -bits)))) + bits * Math.LN2;
}

const stated = (t, exponent) => ({ t: q(t), exponent: q(exponent), corrections: [], kind: 'other', origin: 'file' });

/** Series that no method sums exactly; one for each kind of growth. */
const KINDS = {
  'of one sign': { id: 's13_mass_like', x: '1/10', stated: [stated('1/2', '13699/10000'), stated('-1', '6/5')] },
  alternating: {
    id: 's40_aho_quartic',
    x: '1/10',
    stated: [stated('-1/3', '1/2')],
    strongCoupling: { power: Rational.of(1, 3), spacing: Rational.of(2, 3) },
  },
  '(2n)!': { id: 's42_aho_sextic', x: '1/100', stated: [] },
  geometric: { x: '1/2', stated: [] },
  running: { id: 's13_mass_like', x: '1/20', stated: [stated('1/2', '13699/10000')] },
};

const OF = {
  terminant: 'of one sign',
  hyperasymptotic: 'alternating',
  'scale-variation': 'running',
  fac: 'running',
  pms: 'running',
  blm: 'running',
  'wynn-epsilon': 'alternating',
  levin: 'alternating',
  'weniger-delta': 'alternating',
  euler: 'geometric',
  'order-dependent-map': 'alternating',
  'borel-pade-2': '(2n)!',
};

function coefficientsOf(kind, count) {
  if (kind === 'geometric')
    return Array.from({ length: count }, (_, n) =>
      exact(
        Rational.of(-2, 3)
          .pow(n)
          .mul(Rational.of(n + 1, n + 2)),
      ),
    );
  const list = bench(KINDS[kind].id).coefficients.values.map(q);
  return list.slice(0, count);
}

function expansionOf(kind, count) {
  const { x, stated: list, strongCoupling } = KINDS[kind];
  const coefficients = coefficientsOf(kind, count);
  const polynomials = coefficients.map((c, n) => [
    c,
    ...Array.from({ length: n }, (_, k) => q(k === 0 ? '1/10' : '0')),
  ]);
  return {
    x: q(x),
    power: kind === 'running' ? 1 : 0,
    factor: exact(1),
    additive: exact(0),
    coefficients,
    relativeErrors: coefficients.map(() => 0),
    stated: list,
    ...(strongCoupling === undefined ? {} : { strongCoupling }),
    ...(kind === 'running'
      ? {
          running: {
            beta: betaCoefficients(4, 'pi'),
            scaleRatio: exact(1),
            flavours: 4,
            flavourPolynomials: () => polynomials,
          },
        }
      : {}),
  };
}

const growthOf = (e) =>
  diagnoseGrowth({
    terms: e.coefficients.map((c) => ({
      logAbs: logAbs(c),
      sign: Math.sign(R.toNumber(c.ball(64))),
      relativeError: 0,
      estimated: false,
    })),
    expected: [],
    exact: e.coefficients,
  });

/** Least CPU milliseconds of some rounds, and what the last one gave. */
function timed(run) {
  let least = Infinity;
  let spent = 0;
  let value;
  for (let i = 0; i < ROUNDS && spent < LONG; i++) {
    const before = process.cpuUsage();
    value = run();
    const { user, system } = process.cpuUsage(before);
    const ms = (user + system) / 1000;
    least = Math.min(least, ms);
    spent += ms;
  }
  return { least, value };
}

/** π to 3000 digits: 16 arctan(1/5) − 4 arctan(1/239). */
function machin() {
  const unit = 10n ** 3000n;
  const arctan = (x) => {
    let power = unit / x;
    let sum = power;
    for (let n = 3n, sign = -1n; power > 0n; n += 2n, sign = -sign) {
      power /= x * x;
      sum += (sign * power) / n;
    }
    return sum;
  };
  return 16n * arctan(5n) - 4n * arctan(239n);
}

for (let i = 0; i < 20; i++) machin();
let reference = timed(machin).least;

const chosen = process.argv.slice(2);
const rows = [];
for (const prescription of PRESCRIPTIONS) {
  const { name } = prescription;
  if (chosen.length > 0 && !chosen.includes(name)) continue;
  const kind = OF[name] ?? 'of one sign';
  const cells = COUNTS.map((count) => {
    const e = expansionOf(kind, count);
    const growth = growthOf(e);
    const { least, value } = timed(() => prescription.apply(e, growth, { digits: DIGITS, central: true }));
    reference = Math.min(reference, timed(machin).least);
    const sum = value.find((o) => o.kind === 'sum');
    return { ms: least, used: sum?.termsUsed, refused: sum === undefined ? value[0]?.reason : undefined };
  });
  rows.push({ name, kind, cells });
}

console.log(`reference operation: ${reference.toFixed(2)} ms; node ${process.version}\n`);
console.log(`| prescription | series | ${COUNTS.map((n) => `N = ${n}`).join(' | ')} | used of ${COUNTS.at(-1)} |`);
console.log(`| --- | --- |${COUNTS.map(() => ' ---: |').join('')} ---: |`);
for (const { name, kind, cells } of rows) {
  const texts = cells.map(({ ms, refused }) => {
    const ratio = ms / reference;
    if (ratio > BOUND) process.exitCode = 1;
    const text = `${Number(ratio.toPrecision(2))}${ratio > BOUND ? ' too long' : ''}`;
    return refused === undefined ? text : `(${text})`;
  });
  console.log(`| ${name} | ${kind} | ${texts.join(' | ')} | ${cells.at(-1).used ?? ''} |`);
}
const refusals = rows.flatMap(({ name, cells }) =>
  cells.flatMap(({ refused }, i) => (refused === undefined ? [] : [`${name}, N = ${COUNTS[i]}: ${refused}`])),
);
if (refusals.length > 0) console.log(`\nin brackets, refused:\n${refusals.map((text) => `- ${text}`).join('\n')}`);
