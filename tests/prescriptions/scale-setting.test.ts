/**
 * Scale setting: FAC, PMS, BLM with naive non-abelianisation.
 * Check values: mpmath 1.2.1 (exact re-expansion, running, numerical stationarity), digits as stated. Published ones among them:
 * FAC prediction 275 of A. L. Kataev, V. V. Starshenko, Mod. Phys. Lett. A 10 (1995) 235 (memory, reproduced); BLM coefficient 1/12 of
 * S. J. Brodsky, G. P. Lepage, P. B. Mackenzie, Phys. Rev. D 28 (1983) 228 (memory, reproduced). Coefficients of the Adler function:
 * arXiv:0801.1821; of the pole mass: arXiv:1606.06754 in rounded form.
 */
import { describe, expect, it } from 'vitest';
import { divExact, exact, exactReal, mulExact, pi, R, Rational, zeta } from '../../src/numerics/index.js';
import type { Exact } from '../../src/numerics/index.js';
import { blm } from '../../src/prescriptions/blm.js';
import { chargeBeta, predictedCoefficient } from '../../src/prescriptions/effective-charge.js';
import { fac } from '../../src/prescriptions/fac.js';
import { flavourPolynomials, nonAbelianised } from '../../src/prescriptions/flavour-polynomials.js';
import { pms } from '../../src/prescriptions/pms.js';
import { fixedOrder } from '../../src/prescriptions/fixed-order.js';
import { scaleVariation } from '../../src/prescriptions/scale-variation.js';
import type { Outcome, Prescription, Sum } from '../../src/prescriptions/index.js';
import { betaCoefficients } from '../../src/qcd/index.js';
import type { Expansion, Running } from '../../src/series/index.js';
import { central, expansion, growthOf, outcomes, refused, rescaled } from '../support/expansions.js';
import { expectNear, rational } from '../support/check-value.js';

const q = (s: string): Exact => exact(rational(s));
const z = (n: number): Exact => exactReal((prec) => zeta(n, prec));
/** Σ p_k · constants. */
const combine = (...terms: readonly (readonly [string, Exact?])[]): Exact =>
  exactReal((prec) =>
    terms.reduce(
      (s, [p, c]) => R.add(s, R.mul(q(p).ball(prec + 16), c?.ball(prec + 16) ?? R.ONE, prec + 16), prec + 16),
      R.ZERO,
    ),
  );

/** Adler function, n_f = 3: 1, 1.63982, 6.37101, 49.0757, then 283 of arXiv:0806.3156 where asked for. */
const z3 = z(3);
const z5 = z(5);
const z7 = z(7);
const squared = mulExact(z3, z3);
const ADLER: readonly Exact[] = [
  exact(1),
  combine(['299/24'], ['-9', z3]),
  combine(['58057/288'], ['-779/4', z3], ['75/2', z5]),
  combine(['78631453/20736'], ['-1704247/432', z3], ['4185/8', squared], ['34165/96', z5], ['-1995/16', z7]),
];
const a = divExact(
  q('0.32'),
  exactReal((prec) => pi(prec)),
);
const beta = (loops: number): readonly Exact[] => betaCoefficients(3, 'pi').slice(0, loops);
const running = (loops: number): Running => ({ beta: beta(loops), scaleRatio: exact(1), flavours: 3 });
const adler = (terms: number, loops = 4): Expansion =>
  expansion(ADLER.slice(0, terms), a, { power: 1, running: running(loops) });
const member = (p: Prescription, e: Expansion, variant: string, digits = 25): Sum => {
  const found = outcomes(p, e, digits).find((o) => o.variant === variant);
  if (found?.kind !== 'sum') expect.fail(`${variant}: ${found?.reason ?? 'missing'}`);
  return found;
};

describe('fixed order with its scale varied', () => {
  it('has the value of fixed order and the distance to the ends of the known scan as error', () => {
    // R at μ = Q/2, Q, 2Q with four-loop running (mpmath 1.2.1): 0.153078, 0.130889, 0.120148.
    const s = central(scaleVariation, adler(4));
    expect(R.overlaps(s.value, central(fixedOrder, adler(4)).value)).toBe(true);
    expectNear(s.value, '0.130889', 1e-6);
    expect(s.truncation).toBeCloseTo(0.153078 - 0.130889, 5);
    expect(s.notes[0]).toBe('lowest 0.12015 at μ/Q = 2, highest 0.15308 at μ/Q = 0.5');
  });
  it('counts extremes inside the range: an envelope is never below the move to either end', () => {
    // Two terms have a maximum between Q/2 and Q.
    const s = central(scaleVariation, adler(2));
    const known = /lowest ([\d.]+) at μ\/Q = ([\d.]+), highest ([\d.]+) at μ\/Q = ([\d.]+)/.exec(s.notes[0] ?? '');
    expect(Number(known?.[4])).toBeGreaterThan(0.5);
    expect(Number(known?.[4])).toBeLessThan(1);
  });
  it('shrinks to nothing for an exact charge, and refuses below the Landau pole', () => {
    // x/(1 − r x) to many terms: the one-loop coupling at another scale does not depend on μ.
    const c = Array.from({ length: 40 }, (_, n) => exact(Rational.of(1, 3).pow(n)));
    const charge = (x: string): Expansion =>
      expansion(c, q(x), { power: 1, running: { beta: [exact(1)], scaleRatio: exact(1) } });
    expect(central(scaleVariation, charge('1/10')).truncation).toBeLessThan(1e-10);
    expect(refused(scaleVariation, charge('4/5')).reason).toMatch(/below the Landau pole/);
    expect(refused(scaleVariation, expansion(c, q('1/10'))).reason).toMatch(/does not run/);
  });
});

describe('effective charge', () => {
  it('has the known invariants and predictions', () => {
    const b = beta(4);
    const B = chargeBeta(b, ADLER);
    const invariant = (k: number) => R.div(B[k]!.ball(200), b[0]!.ball(200), 200);
    expectNear(invariant(2), '5.23782801629131705388357848532151966', 1e-32);
    expectNear(invariant(3), '64.2126727313696119683747420866132848', 1e-31);
    // The next beta coefficient cancels in the prediction: any value serves.
    const longer = [...b, exact(7)];
    const predict = (n: number) => predictedCoefficient(longer, ADLER.slice(0, n))!.ball(200);
    expectNear(predict(2), '5.60425128162443847231399067283274631', 1e-32);
    expectNear(predict(3), '27.4644835424747340191823252748248210', 1e-31);
    expectNear(predict(4), '274.583719606761980424308222466466094', 1e-30);
  });
  it('solves its own renormalisation-group equation: independent quadrature', () => {
    // D(a): 1/D + c₁ ln(c₁D/(1+c₁D)) + … at three loops (mpmath 1.2.1, quadrature and root finding).
    expectNear(member(fac, adler(2), 'effective charge, 2 terms', 22).value, '0.127446489306183739383214440146', 1e-21);
    expectNear(member(fac, adler(3), 'effective charge, 3 terms', 22).value, '0.130780423170125830402913157628', 1e-21);
    expectNear(member(fac, adler(4), 'effective charge, 4 terms', 22).value, '0.138576940170138032770491704816', 1e-21);
  });
  it('is exact when the series is another coupling of the same theory', () => {
    // D = x/(1 − r x): the one-loop coupling at another scale.
    const c = Array.from({ length: 5 }, (_, n) => exact(Rational.of(2, 3).pow(n)));
    const e = expansion(c, q('1/10'), { power: 1, running: { beta: [exact(1)], scaleRatio: exact(1) } });
    expectNear(
      member(fac, e, 'effective charge, 5 terms').value,
      rational('1/10')
        .div(rational('1').sub(rational('2/30')))
        .toString(),
      1e-24,
    );
  });
});

describe('an effective charge with few loops of the beta function', () => {
  const charge = (terms: number, loops: number): Sum =>
    member(fac, adler(terms, loops), `effective charge, ${terms} terms`);
  // c_k enters through B_k, for which β_k must be known; c_1 through Λ, always.
  it.each([
    [1, 2],
    [2, 2],
    [3, 3],
    [4, 4],
  ])('%i loops: %i coefficients enter, and the error is the step from one fewer', (loops, used) => {
    const full = charge(4, loops);
    const enough = charge(used, loops);
    expect(R.toNumber(full.value)).toBeCloseTo(R.toNumber(enough.value), 15);
    expect(full.termsUsed).toBe(used);
    expect(full.trust).toBe('indicative');
    if (used > 2)
      expect(full.truncation).toBeCloseTo(
        Math.abs(R.toNumber(full.value) - R.toNumber(charge(used - 1, loops).value)),
        12,
      );
    // Two coefficients: the step from the coupling itself.
    else expect(full.truncation).toBeCloseTo(R.toNumber(full.value) - 0.32 / Math.PI, 12);
  });
});

describe('FAC scale', () => {
  it('of the Adler function', () => {
    const two = member(fac, adler(2), 'scale of vanishing c₁, 2 terms');
    expectNear(two.value, '0.129966602289097007479884540220992806', 1e-28);
    const four = member(fac, adler(4), 'scale of vanishing c₁, 4 terms');
    expectNear(four.value, '0.137815922148691678752966594392943456', 1e-28);
    expect(four.notes.join(' ')).toContain('0.69461');
  });
});

describe('PMS', () => {
  it('next-to-leading order', () => {
    const s = member(pms, adler(2), 'optimum, next-to-leading order');
    expectNear(s.value, '0.128925476788737578078690424047078089', 1e-24);
    expect(s.notes.join(' ')).toContain('0.143511');
  });
  it('next-to-next-to-leading order', () => {
    const s = member(pms, adler(3), 'optimum, next-to-next-to-leading order');
    // Nine digits are claimed for the check value.
    expectNear(s.value, '0.130615566688071000611110909737407956', 1e-12);
    expect(s.notes.join(' ')).toContain('0.3396');
    expect(s.central).toBe(true);
    expect(R.accuracyBits(s.value)).toBeGreaterThan(83);
  });
  it('scale alone: one point for two terms, none for three and four', () => {
    const s = member(pms, adler(2), 'scale alone, 2 terms');
    expectNear(s.value, '0.133798825300402381867365085432476541', 1e-15);
    expect(s.notes.join(' ')).toContain('0.553685');
    for (const N of [3, 4]) {
      const found = outcomes(pms, adler(N)).find((o) => o.variant === `scale alone, ${N} terms`);
      expect(found?.kind).toBe('refusal');
    }
  });
});

describe('BLM', () => {
  // R(e⁺e⁻) at next-to-leading order: 365/24 − 11 ζ₃ + n_f(−11/12 + 2/3 ζ₃).
  const at = (nf: number): Exact[] => [
    exact(1),
    combine(['365/24'], ['-11', z3], [`${-11 * nf}/12`], [`${2 * nf}/3`, z3]),
  ];
  const polynomials = flavourPolynomials([at(0), at(1)]);
  for (const [divisor, unit] of [
    ['pi', 1],
    ['4*pi', 4],
  ] as const) {
    it(`R(e⁺e⁻) in α_s/${divisor}: μ*/Q and the remaining 1/12`, () => {
      // Coefficients scale with the divisor: c_1 → c_1/unit… of x = α_s/divisor.
      const scale = (c: Exact, n: number): Exact => mulExact(c, exact(Rational.of(4, unit === 1 ? 4 : 1).pow(n)));
      const b = betaCoefficients(5, divisor).slice(0, 4);
      const x = divExact(
        q('0.12'),
        exactReal((prec) => R.mul(pi(prec), R.fromNumber(unit), prec)),
      );
      const e = expansion(at(5).map(scale), x, {
        power: 1,
        factor: exact(Rational.of(unit)),
        running: {
          beta: b,
          scaleRatio: exact(1),
          flavours: 5,
          flavourPolynomials: () => polynomials.map((p, n) => p.map((c) => scale(c, n))),
        },
      });
      const s = central(blm, e, 25);
      expect(s.notes.join(' ')).toContain('μ/Q = 0.707593');
      expect(s.notes.join(' ')).toContain(unit === 1 ? '0.083333' : '0.33333');
      // Four-loop running to μ*, then a(1 + a/12): independent quadrature with mpmath 1.2.1.
      expectNear(s.value, '0.0404832673410257778951795071', 1e-24);
    });
  }
  it('naive non-abelianisation of the pole mass', () => {
    // Published coefficients in rounded form, polynomials in n_l.
    const rows: readonly (readonly string[])[] = [
      ['4/3'],
      ['13.4434', '-1.0414'],
      ['190.595', '-26.655', '0.6527'],
      ['3567.61', '-745.721', '43.3963', '-0.678141'],
    ];
    const known: Record<number, string[]> = {
      3: [
        '1.33333333333333333333333333333333333',
        '14.0589000000000000000000000000000000',
        '118.954575000000000000000000000000000',
        '1668.48116287500000000000000000000000',
      ],
      4: [
        '1.33333333333333333333333333333333333',
        '13.0175000000000000000000000000000000',
        '101.984375000000000000000000000000000',
        '1324.49414062500000000000000000000000',
      ],
      5: [
        '1.33333333333333333333333333333333333',
        '11.9761000000000000000000000000000000',
        '86.3195750000000000000000000000000000',
        '1031.36769337500000000000000000000000',
      ],
    };
    for (const [nl, values] of Object.entries(known)) {
      const found = nonAbelianised(
        rows.map((r) => r.map(q)),
        Number(nl),
      );
      values.forEach((v, n) =>
        expect(Math.abs(R.toNumber(found[n]!.ball(80)) / Number(v) - 1), `${nl} ${n}`).toBeLessThan(1e-12),
      );
    }
  });
  it('interpolates polynomials exactly', () => {
    const f = (nf: number): Exact[] => [
      exact(2),
      exact(Rational.of(3 - 5 * nf, 7)),
      exact(Rational.of(1 + nf - 4 * nf * nf, 3)),
    ];
    const found = flavourPolynomials([f(0), f(1), f(2)]);
    expect(found.map((p) => p.map((c) => c.rational!.toString()))).toEqual([
      ['2'],
      ['3/7', '-5/7'],
      ['1/3', '1/3', '-4/3'],
    ]);
  });
  it('is refused without the n_f dependence', () => {
    expect(refused(blm, adler(3)).reason).toContain('n_f');
  });
});

describe('covariance', () => {
  it('does not see x → λx with the beta function carried along', () => {
    const c = ['1', '8/5', '32/5', '49'].map(q);
    const b = ['9/4', '4', '10', '47'].map(q);
    const e = expansion(c, q('1/10'), { power: 1, running: { beta: b, scaleRatio: exact(1) } });
    const lambda = Rational.of(7, 2);
    const moved: Expansion = {
      ...rescaled(e, lambda),
      running: { beta: b.map((x, k) => exact(x.rational!.div(lambda.pow(k + 1)))), scaleRatio: exact(1) },
    };
    for (const p of [fac, pms]) {
      const one = outcomes(p, e);
      const other = outcomes(p, moved);
      one.forEach((o, i) => {
        const same = other[i]!;
        expect(same.kind).toBe(o.kind);
        if (o.kind === 'sum' && same.kind === 'sum') expect(R.overlaps(o.value, same.value), o.variant).toBe(true);
      });
    }
  });
  it('does not depend on the scale at which the series is written', () => {
    // One coefficient and a one-loop beta function: the charge at μ and at 2μ are one number.
    const b0 = q('9/4');
    const L = q('1.3862943611198906');
    const x = q('1/10');
    const shifted = exact(rational('1/10').div(rational('1').add(rational('9/40').mul(L.rational!))));
    const r1 = rational('8/5');
    const at0 = expansion([exact(1), exact(r1)], x, { power: 1, running: { beta: [b0], scaleRatio: exact(1) } });
    const at2 = expansion([exact(1), exact(r1.add(rational('9/4').mul(L.rational!)))], shifted, {
      power: 1,
      running: { beta: [b0], scaleRatio: exact(2) },
    });
    // With one loop, the charge from one correction: 1/D = 1/x − r₁ at both scales.
    const one = member(fac, at0, 'effective charge, 2 terms');
    const two = member(fac, at2, 'effective charge, 2 terms');
    expect(R.overlaps(one.value, two.value)).toBe(true);
  });
  it('takes the root of a series that starts at the second power', () => {
    // R = D², D = x/(1 − x/2) with one-loop running.
    const c = Array.from({ length: 4 }, (_, n) =>
      exact(
        Rational.of(1, 2)
          .pow(n)
          .mul(Rational.of(n + 1)),
      ),
    );
    const e = expansion(c, q('1/10'), { power: 2, running: { beta: [exact(1)], scaleRatio: exact(1) } });
    expectNear(member(fac, e, 'effective charge, 4 terms').value, rational('2/19').pow(2).toString(), 1e-22);
    expect(outcomes(pms, e).some((o) => o.kind === 'refusal' && o.reason.includes('power 2'))).toBe(true);
  });
});

describe('refusals and single members', () => {
  it('a variable that does not run, one term, a constant first term', () => {
    const plain = expansion(ADLER, a, { power: 1 });
    for (const p of [fac, pms, blm]) {
      expect(refused(p, plain).reason).toContain('does not run');
      refused(p, adler(1));
      refused(p, { ...adler(3), power: 0 });
    }
  });
  it('a scale below the Landau pole', () => {
    const e = { ...adler(2), coefficients: [exact(1), exact(60)] };
    const found = outcomes(fac, e).find((o) => o.variant.startsWith('scale'));
    expect(found?.kind === 'refusal' && found.reason.includes('Landau')).toBe(true);
  });
  it('one member alone is the value of the whole list, without an error', () => {
    for (const p of [fac, pms]) {
      for (const whole of outcomes(p, adler(3)).filter((o): o is Sum => o.kind === 'sum')) {
        const alone: readonly Outcome[] = p.apply(adler(3), growthOf(adler(3)), { digits: 20, only: whole.variant });
        expect(alone).toHaveLength(1);
        const [only] = alone;
        if (only?.kind !== 'sum') expect.fail('no sum');
        expect(R.overlaps(only.value, whole.value)).toBe(true);
        expect(only.truncation).toBeUndefined();
      }
    }
  });
});
