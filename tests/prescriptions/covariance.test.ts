/**
 * What no prescription may see: the unit of the expansion variable, a constant in front or beside the series. Identities.
 *   x → λx, c_n → c_n/λ^n, t* → λt*, b_k → b_k/λ^{k+1} leaves every value, error and imaginary part alone;
 *   R → A + M R moves values by A + M and multiplies errors and imaginary parts by M.
 */
import { describe, expect, it } from 'vitest';
import { exact, R, Rational } from '../../src/numerics/index.js';
import type { Ball } from '../../src/numerics/index.js';
import { PRESCRIPTIONS } from '../../src/prescriptions/index.js';
import type { Outcome } from '../../src/prescriptions/index.js';
import type { Expansion, StatedSingularity } from '../../src/series/index.js';
import { benchExpansion, expansion, growthOf, readBench } from '../support/expansions.js';
import { rational } from '../support/check-value.js';

const q = rational;
const LAMBDA = q('7/5');

function rescaled(e: Expansion): Expansion {
  const inverse = LAMBDA.inv();
  const power = (n: number): Rational => inverse.pow(n);
  const times = (x: { readonly rational?: Rational }, factor: Rational) => exact(x.rational!.mul(factor));
  const { running } = e;
  return {
    ...e,
    x: times(e.x, LAMBDA),
    factor: times(e.factor, power(e.power)),
    coefficients: e.coefficients.map((c, n) => times(c, power(n))),
    stated: e.stated.map((s) => ({ ...s, t: times(s.t, LAMBDA) })),
    ...(running === undefined
      ? {}
      : {
          running: {
            ...running,
            beta: running.beta.map((b, k) => times(b, power(k + 1))),
            ...(running.flavourPolynomials === undefined
              ? {}
              : {
                  flavourPolynomials: () =>
                    running.flavourPolynomials?.()?.map((p, n) => p.map((c) => times(c, power(n)))),
                }),
          },
        }),
  };
}

const shifted = (e: Expansion): Expansion => ({
  ...e,
  additive: exact(e.additive.rational!.mul(q('-3')).add(q('5/2'))),
  factor: exact(e.factor.rational!.mul(q('-3'))),
});

const stated = (t: string, exponent: string, kind: StatedSingularity['kind']): StatedSingularity => ({
  t: exact(q(t)),
  exponent: exact(q(exponent)),
  corrections: [],
  kind,
  origin: 'file',
});

/** Series that between them every prescription accepts. */
const oscillator = readBench('s40_aho_quartic');
const SERIES: Readonly<Record<string, Expansion>> = {
  alternating: { ...benchExpansion(oscillator, '1/10', 8), strongCoupling: { power: q('1/3'), spacing: q('2/3') } },
  'of one sign': benchExpansion(readBench('s13_mass_like'), '1/10', 9),
  '(2n)!': benchExpansion(readBench('s60_eh_spinor_magnetic'), '1/16', 8),
  geometric: expansion(
    Array.from({ length: 8 }, (_, n) =>
      exact(
        q('-2/3')
          .pow(n)
          .mul(Rational.of(n + 1, n + 2)),
      ),
    ),
    exact(q('1/2')),
  ),
  running: expansion(
    ['1', '8/5', '32/5', '49'].map((c) => exact(q(c))),
    exact(q('1/10')),
    {
      power: 1,
      additive: exact(1),
      stated: [stated('-4/9', '6/5', 'ultraviolet'), stated('8/9', '13/5', 'infrared')],
      running: {
        beta: ['9/4', '4', '10', '47', '130'].map((b) => exact(q(b))),
        scaleRatio: exact(1),
        flavours: 3,
        flavourPolynomials: () =>
          [['1'], ['19/10', '-1/10'], ['10', '-7/5', '1/15'], ['100', '-24', '8/3', '-1/9']].map((p) =>
            p.map((c) => exact(q(c))),
          ),
      },
    },
  ),
};

const run = (e: Expansion, name: string): readonly Outcome[] =>
  PRESCRIPTIONS.find((p) => p.name === name)!.apply(e, growthOf(e), { digits: 12, central: true });

function close(a: Ball, b: Ball, size: Ball, what: string): void {
  const difference = Math.abs(R.toNumber(R.sub(a, b, 200)));
  expect(difference, what).toBeLessThanOrEqual(1e-11 * Math.abs(R.toNumber(size)) + 1e-300);
}

function errorsAgree(a: number | undefined, b: number | undefined, factor: number, size: number, what: string): void {
  expect(a === undefined, what).toBe(b === undefined);
  if (a === undefined || b === undefined) return;
  expect(Math.abs(b - a * factor), what).toBeLessThanOrEqual(1e-4 * a * factor + 1e-9 * size);
}

const names = PRESCRIPTIONS.map((p) => p.name);
const tested = new Set<string>();

for (const [label, e] of Object.entries(SERIES)) {
  describe(`a series ${label}`, () => {
    it.each(names)('%s', (name) => {
      const before = run(e, name);
      const unit = run(rescaled(e), name);
      const moved = run(shifted(e), name);
      expect(unit.map((o) => o.kind)).toEqual(before.map((o) => o.kind));
      expect(moved.map((o) => o.kind)).toEqual(before.map((o) => o.kind));
      before.forEach((o, i) => {
        const [u, m] = [unit[i]!, moved[i]!];
        if (o.kind !== 'sum' || u.kind !== 'sum' || m.kind !== 'sum') return;
        tested.add(name);
        const what = `${name}, ${o.variant}`;
        const size = Math.abs(R.toNumber(o.value));
        close(u.value, o.value, o.value, `${what}: unit`);
        errorsAgree(o.truncation, u.truncation, 1, size, `${what}: error, unit`);
        const wanted = R.add(R.mul(o.value, R.fromNumber(-3), 200), R.fromRational(q('5/2'), 200), 200);
        close(m.value, wanted, R.add(R.abs(wanted), R.abs(o.value), 60), `${what}: offset`);
        errorsAgree(o.truncation, m.truncation, 3, size, `${what}: error, offset`);
        if (o.imaginary === undefined) return;
        close(u.imaginary!, o.imaginary, o.imaginary, `${what}: imaginary part, unit`);
        close(m.imaginary!, R.mul(o.imaginary, R.fromNumber(-3), 200), o.imaginary, `${what}: imaginary part, offset`);
      });
    });
  });
}

it('every prescription for a plain or running series was among them', () => {
  expect(names.filter((name) => !tested.has(name))).toEqual([]);
});
