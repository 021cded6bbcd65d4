/**
 * Special functions against mpmath 1.3.0 and PARI/GP 2.15.2: stored values on which the two agree to 63 digits
 * (tests/outside/generate_special.py), and, where python3 with mpmath is installed, fresh points at 110 digits.
 */
import { spawnSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import {
  atan,
  branchAlternating,
  branchCut,
  branchSame,
  C,
  digamma,
  eiScaled,
  exp,
  gamma,
  log,
  logGamma,
  R,
  Rational,
  scaledE1,
  sinCos,
  zeta,
} from '../../src/numerics/index.js';
import type { Ball } from '../../src/numerics/index.js';

type Row = Readonly<Record<string, string | number>>;
interface Reference {
  readonly versions: Readonly<Record<string, string>>;
  readonly digits: number;
  readonly functions: Readonly<Record<string, readonly Row[]>>;
}

const file = new URL('./data/special-functions.json', import.meta.url);
const reference = JSON.parse(readFileSync(file, 'utf8')) as Reference;

const rational = (row: Row, key: string): Rational => {
  const q = Rational.parse(String(row[key]));
  if (q === undefined) throw new Error(`not a number: ${String(row[key])}`);
  return q;
};
const ball = (row: Row, key: string, prec: number): Ball => R.fromRational(rational(row, key), prec + 60);

/** Every function: what it returns under the names of the reference's columns. */
const EVALUATE: Readonly<Record<string, (row: Row, prec: number) => Readonly<Record<string, Ball>>>> = {
  exp: (r, p) => ({ value: exp(ball(r, 'x', p), p) }),
  sin: (r, p) => ({ value: sinCos(ball(r, 'x', p), p).sin }),
  cos: (r, p) => ({ value: sinCos(ball(r, 'x', p), p).cos }),
  atan: (r, p) => ({ value: atan(ball(r, 'x', p), p) }),
  log: (r, p) => ({ value: log(ball(r, 'x', p), p) }),
  gamma: (r, p) => ({ value: gamma(ball(r, 'x', p), p) }),
  digamma: (r, p) => ({ value: digamma(ball(r, 'x', p), p) }),
  logGamma: (r, p) => ({ value: logGamma(ball(r, 'x', p), p) }),
  zeta: (r, p) => ({ value: zeta(Number(r['n']), p) }),
  branchSame: (r, p) => ({ ...branchSame(rational(r, 'b'), ball(r, 'x', p), p) }),
  eiScaled: (r, p) => ({ value: eiScaled(ball(r, 'x', p), p) }),
  branchAlternating: (r, p) => ({ value: branchAlternating(rational(r, 'b'), ball(r, 'x', p), p) }),
  scaledE1: (r, p) => ({ ...scaledE1({ re: ball(r, 'wr', p), im: ball(r, 'wi', p) }, p) }),
  branchCut: (r, p) => ({ ...branchCut(rational(r, 'b'), { re: ball(r, 'wr', p), im: ball(r, 'wi', p) }, p) }),
};

/** Bits lost against the precision asked for, by the conditioning of these points: the table of allowed radius growth. */
const ALLOWED_LOSS: Readonly<Record<string, number>> = {
  exp: 2,
  sin: 2,
  cos: 2,
  atan: 2,
  log: 2,
  gamma: 2,
  digamma: 2,
  logGamma: 2,
  zeta: 2,
  branchSame: 3,
  eiScaled: 2,
  branchAlternating: 2,
  scaledE1: 3,
  branchCut: 3,
};

/** The value lies within the ball and the reference's last digit; returns the worst loss of bits. */
function compare(name: string, row: Row, digits: number, prec: number): void {
  const result = EVALUATE[name]!(row, prec);
  const complex = name === 'scaledE1' || name === 'branchCut';
  const size = complex ? C.upperBits({ re: result['re']!, im: result['im']! }) : 0;
  for (const [key, value] of Object.entries(result)) {
    const wanted = rational(row, key);
    const last = complex ? 2 * 10 ** (1 - digits) : 10 ** (1 - digits);
    const slack = complex ? R.addError(value, last, size) : R.addRelativeError(value, last);
    expect(R.containsRational(slack, wanted), `${name} ${JSON.stringify(row)}: ${key} = ${R.toNumber(value)}`).toBe(
      true,
    );
    if (R.isExactZero(value)) continue;
    const accuracy = complex ? size - 1 - R.radiusBits(value) : R.accuracyBits(value);
    expect(accuracy, `${name} ${JSON.stringify(row)}: bits of ${key}`).toBeGreaterThan(prec - 1 - ALLOWED_LOSS[name]!);
  }
}

describe(`stored reference values (mpmath ${reference.versions['mpmath']}, PARI/GP ${reference.versions['pari-gp']})`, () => {
  it.each(Object.keys(EVALUATE))('%s: at least 100 points to 63 digits', (name) => {
    const rows = reference.functions[name]!;
    expect(rows.length).toBeGreaterThanOrEqual(100);
    for (const row of rows) compare(name, row, reference.digits - 3, 230);
  });
});

const LIVE = `
import json, sys
from mpmath import mp, mpf, mpc
mp.dps = 160
def f(name, r):
    g = lambda k: mpf(int(r[k].split('/')[0])) / mpf(int(r[k].split('/')[1])) if '/' in r[k] else mpf(r[k])
    if name == 'scaledE1':
        w = mpc(g('wr'), g('wi')); v = mp.exp(w) * mp.e1(w); return {'re': v.real, 'im': v.imag}
    if name == 'branchCut':
        w = mpc(g('wr'), g('wi')); b = g('b'); v = mp.exp(w) * mp.power(w, b) * mp.gammainc(-b, w); return {'re': mp.re(v), 'im': mp.im(v)}
    if name == 'branchAlternating':
        x = g('x'); b = g('b'); return {'value': mp.exp(x) * x**b * mp.gammainc(-b, x)}
    if name == 'eiScaled':
        return {'value': mp.exp(-g('x')) * mp.ei(g('x'))}
    fn = {'exp': mp.exp, 'log': mp.log, 'sin': mp.sin, 'cos': mp.cos, 'atan': mp.atan, 'gamma': mp.gamma, 'digamma': mp.digamma, 'logGamma': mp.loggamma}[name]
    return {'value': mp.re(fn(g('x')))}
out = []
for name, r in json.load(sys.stdin):
    mp.dps = 260
    out.append({k: mp.nstr(v, 120) for k, v in f(name, r).items()})
print(json.dumps(out))
`;

/** A few fresh points a run; the seed is printed with a failure through the row itself. */
function freshPoints(): [string, Row][] {
  const rows: [string, Row][] = [];
  const between = (low: number, high: number): string => (low + (high - low) * Math.random()).toFixed(12);
  for (let i = 0; i < 8; i++) {
    for (const name of ['exp', 'sin', 'cos', 'atan']) rows.push([name, { x: between(-40, 40) }]);
    for (const name of ['log', 'logGamma', 'gamma', 'digamma']) rows.push([name, { x: between(0.01, 60) }]);
    for (const name of ['gamma', 'digamma']) rows.push([name, { x: between(-20, 0) }]);
    rows.push(['eiScaled', { x: between(0.05, 80) }]);
    rows.push(['scaledE1', { wr: between(-40, 40), wi: between(-30, 30) }]);
    rows.push(['branchAlternating', { b: between(-4, 8), x: between(0.05, 40) }]);
    rows.push(['branchCut', { b: between(-4, 8), wr: between(-20, 20), wi: between(-10, 10) }]);
  }
  return rows;
}

describe('fresh points against the mpmath of this machine', () => {
  const there = spawnSync('python3', ['-c', 'import mpmath'], { timeout: 20_000 }).status === 0;

  it.runIf(there)('agree to 105 digits', () => {
    const rows = freshPoints();
    const run = spawnSync('python3', ['-c', LIVE], { input: JSON.stringify(rows), encoding: 'utf8', timeout: 50_000 });
    expect(run.stderr).toBe('');
    const values = JSON.parse(run.stdout) as Row[];
    rows.forEach(([name, row], i) => compare(name, { ...row, ...values[i] }, 105, 366));
  });
});
