import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  DEFAULT_THRESHOLDS,
  evolveAlongPath,
  evolveAlpha,
  evolveComplex,
  evolveMass,
  evolvePath,
  flavoursAt,
  flowOf,
  isRefusal,
  lambdaOf,
  massAtItself,
  matchDown,
  scaledThresholds,
  type ComplexNumber,
  type Loops,
  type Refusal,
} from '../../src/qcd/index.js';

const runs = Number(process.env['LEASTTERM_TEST_MULTIPLIER'] ?? 1);
const LOOPS: readonly Loops[] = [1, 2, 3, 4, 5];
const number = (x: unknown): number => (typeof x === 'number' ? x : NaN);
const close = (x: unknown, y: number, relative: number): void =>
  expect(Math.abs(number(x) / y - 1)).toBeLessThanOrEqual(relative);
function granted<T>(x: T | Refusal): T {
  if (isRefusal(x)) throw new Error(x.reason);
  return x;
}

describe('running at fixed n_f', () => {
  // Check values computed with mpmath: quadrature of 1/β and root finding, 36 digits (n_f = 3, four loops).
  it('agrees with direct quadrature to rounding', () => {
    const common = { alpha: 0.32, from: 1, flavours: 3, loops: 4 };
    close(evolveAlpha({ ...common, to: 2 }), 0.23165520828312408, 4e-16);
    close(evolveAlpha({ ...common, to: 0.5 }), 0.5659247290080374, 4e-15);
    close(evolveAlpha({ alpha: 0.225, from: 4.18, to: 2, flavours: 4, loops: 4 }), 0.3017915663785547, 1e-15);
  });

  it('satisfies the renormalisation-group equation for every n_f and order', () => {
    for (let flavours = 0; flavours <= 16; flavours++) {
      for (const loops of LOOPS) {
        const flow = flowOf(flavours, loops);
        const alpha = Math.min(0.25, flow.fixedPoint / 2);
        const h = 1e-3;
        const up = number(evolveAlpha({ alpha, from: 1, to: Math.exp(h / 2), flavours, loops }));
        const down = number(evolveAlpha({ alpha, from: 1, to: Math.exp(-h / 2), flavours, loops }));
        let beta = 0;
        for (let k = flow.s.length - 1; k >= 0; k--) beta = beta * alpha + (flow.s[k] ?? 0);
        beta *= -flow.b0 * alpha * alpha;
        expect(Math.abs((up - down) / (2 * h) / beta - 1)).toBeLessThan(1e-5);
      }
    }
  });

  it('comes back to the start from anywhere', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 16 }),
        fc.constantFrom(...LOOPS),
        fc.double({ min: 0.01, max: 0.6, noNaN: true }),
        fc.double({ min: -3, max: 40, noNaN: true }),
        (flavours, loops, alpha, log) => {
          const to = Math.exp(log / 2);
          const there = evolveAlpha({ alpha, from: 1, to, flavours, loops });
          if (isRefusal(there)) {
            expect(there.remedy.length).toBeGreaterThan(10);
            return;
          }
          // Coming back amplifies rounding by β(α)/α at the strong end.
          const condition = 1 + Math.abs(log) * flowOf(flavours, loops).b0 * 20;
          if (there < 1)
            close(evolveAlpha({ alpha: there, from: to, to: 1, flavours, loops }), alpha, 1e-13 * condition);
        },
      ),
      { numRuns: 300 * runs },
    );
  });

  it('refuses with a reason and a remedy', () => {
    const good = { alpha: 0.3, from: 2, to: 1.5, flavours: 3, loops: 4 };
    const bad: unknown[] = [
      evolveAlpha({ ...good, to: 0.3 }),
      evolveAlpha({ ...good, to: 0.5 }),
      evolveAlpha({ ...good, to: -1 }),
      evolveAlpha({ ...good, from: 0 }),
      evolveAlpha({ ...good, from: NaN }),
      evolveAlpha({ ...good, flavours: 17 }),
      evolveAlpha({ ...good, flavours: -1 }),
      evolveAlpha({ ...good, flavours: 3.2 }),
      evolveAlpha({ ...good, loops: 0 }),
      evolveAlpha({ ...good, loops: 6 }),
      evolveAlpha({ ...good, alpha: 0 }),
      evolveAlpha({ ...good, alpha: -0.1 }),
      evolveAlpha({ ...good, alpha: Infinity }),
      evolveAlpha({ ...good, flavours: 16, alpha: 0.2 }),
    ];
    for (const answer of bad) {
      expect(isRefusal(answer)).toBe(true);
      if (isRefusal(answer)) expect(Math.min(answer.reason.length, answer.remedy.length)).toBeGreaterThan(10);
    }
    expect(JSON.stringify(bad[0])).toContain('Landau');
    expect(JSON.stringify(bad[13])).toContain('zero');
  });

  it('never answers nonsense to odd questions', () => {
    const odd = fc.oneof(
      fc.double(),
      fc.constantFrom(0, -0, NaN, Infinity, -Infinity, 1e308, 5e-324, 1e-300),
      fc.double({ min: 0.001, max: 100, noNaN: true }),
    );
    fc.assert(
      fc.property(
        odd,
        odd,
        odd,
        fc.double({ min: -2, max: 20 }),
        fc.integer({ min: -1, max: 7 }),
        (alpha, from, to, nf, loops) => {
          const answer = evolveAlpha({ alpha, from, to, flavours: Math.abs(nf) < 9 ? Math.round(nf) : nf, loops });
          if (typeof answer === 'number') expect(answer > 0 && Number.isFinite(answer)).toBe(true);
          else expect(isRefusal(answer)).toBe(true);
        },
      ),
      { numRuns: 500 * runs },
    );
  });
});

describe('complex scales', () => {
  const flow = flowOf(3, 4);

  it('agrees with the real axis and with conjugation', () => {
    const real = number(evolveAlpha({ alpha: 0.34, from: 1, to: Math.E, flavours: 3, loops: 4 }));
    const along = granted(evolveComplex(flow, 0.34, { re: 2, im: 0 }));
    close(along.re, real, 4e-15);
    expect(Math.abs(along.im)).toBeLessThan(1e-16);
    const up = granted(evolveComplex(flow, 0.34, { re: 0, im: 3 }));
    const down = granted(evolveComplex(flow, 0.34, { re: 0, im: -3 }));
    close(up.re, down.re, 1e-14);
    close(up.im, -down.im, 1e-14);
  });

  it('obeys the differential equation on the circle (fourth-order Runge–Kutta, 4000 steps)', () => {
    // da/dφ = i β(a) for ln μ² = ln μ_0² + iφ.
    const rhs = (a: ComplexNumber): ComplexNumber => {
      let s: ComplexNumber = { re: 0, im: 0 };
      for (let k = flow.s.length - 1; k >= 0; k--) {
        s = { re: s.re * a.re - s.im * a.im + (flow.s[k] ?? 0), im: s.re * a.im + s.im * a.re };
      }
      const a2 = { re: a.re * a.re - a.im * a.im, im: 2 * a.re * a.im };
      const beta = { re: -flow.b0 * (a2.re * s.re - a2.im * s.im), im: -flow.b0 * (a2.re * s.im + a2.im * s.re) };
      return { re: -beta.im, im: beta.re };
    };
    const n = 4000;
    const h = Math.PI / n;
    const plus = (a: ComplexNumber, b: ComplexNumber, x: number): ComplexNumber => ({
      re: a.re + x * b.re,
      im: a.im + x * b.im,
    });
    let a: ComplexNumber = { re: 0.34, im: 0 };
    for (let i = 0; i < n; i++) {
      const k1 = rhs(a);
      const k2 = rhs(plus(a, k1, h / 2));
      const k3 = rhs(plus(a, k2, h / 2));
      const k4 = rhs(plus(a, k3, h));
      a = plus(plus(plus(plus(a, k1, h / 6), k2, h / 3), k3, h / 3), k4, h / 6);
    }
    const own = granted(evolveComplex(flow, 0.34, { re: 0, im: Math.PI }));
    expect(Math.hypot(own.re - a.re, own.im - a.im)).toBeLessThan(1e-12);
    const path = granted(
      evolveAlongPath(flow, 0.34, [
        { re: 0, im: 1 },
        { re: 0, im: 2 },
        { re: 0, im: Math.PI },
      ]),
    );
    expect(Math.hypot((path[2]?.re ?? NaN) - own.re, (path[2]?.im ?? NaN) - own.im)).toBeLessThan(1e-14);
  });

  it('refuses a path into the Landau singularity and goes around it', () => {
    expect(isRefusal(evolveComplex(flow, 0.34, { re: -4, im: 0 }))).toBe(true);
    const around = granted(
      evolveAlongPath(flow, 0.34, [
        { re: 0, im: 2 },
        { re: -4, im: 2 },
      ]),
    );
    expect(Number.isFinite(around[1]?.re)).toBe(true);
  });
});

// Check values computed with mpmath 1.3.0: quadrature of 1/β with root finding, 15 digits. α_s(M_Z) = 0.1180 at
// M_Z = 91.1879 GeV, m_b(m_b) = 4.186, m_c(m_c) = 1.2729, m_t(m_t) = 162.5 GeV, thresholds at μ = m(m).
const GRID: Readonly<Record<number, Readonly<Record<string, number>>>> = {
  1: {
    'alpha5(mb)': 0.212090791732393,
    'alpha5(10)': 0.173083756481555,
    'alpha4(mb)': 0.212090791732393,
    'alpha4(3)': 0.234020491117913,
    'alpha4(mc)': 0.318869276862472,
    'alpha3(mc)': 0.318869276862472,
    'alpha3(mtau=1.77693)': 0.27670837800296,
    'alpha5(mt)': 0.108937838842645,
    'alpha6(mt)': 0.108937838842645,
    'alpha6(1000)': 0.0892544377231675,
  },
  2: {
    'alpha5(mb)': 0.223486730141124,
    'alpha5(10)': 0.177874418163029,
    'alpha4(mb)': 0.223486730141124,
    'alpha4(3)': 0.251166153255488,
    'alpha4(mc)': 0.373832041898019,
    'alpha3(mc)': 0.373832041898019,
    'alpha3(mtau=1.77693)': 0.308220868393632,
    'alpha5(mt)': 0.108559244146264,
    'alpha6(mt)': 0.108559244146264,
    'alpha6(1000)': 0.0885387260109673,
    Lambda3_MeV: 357.078322353,
    Lambda4_MeV: 301.819069351,
    Lambda5_MeV: 211.888061655,
    Lambda6_MeV: 88.4883830917,
    'mb(10)': 3.6577603535948,
    'mb(MZ)': 2.8909477569971,
    'mc(3,nf=4)': 1.0161899438044,
  },
  3: {
    'alpha5(mb)': 0.224243103326837,
    'alpha5(10)': 0.178145468813244,
    'alpha4(mb)': 0.224417652472898,
    'alpha4(3)': 0.252853967711699,
    'alpha4(mc)': 0.38281043345671,
    'alpha3(mc)': 0.383678817312976,
    'alpha3(mtau=1.77693)': 0.312168961445343,
    'alpha5(mt)': 0.108543375274489,
    'alpha6(mt)': 0.10852359041801,
    'alpha6(1000)': 0.0885196109746233,
    Lambda3_MeV: 336.770939992,
    Lambda4_MeV: 291.657211584,
    Lambda5_MeV: 208.986567825,
    Lambda6_MeV: 88.5010654598,
    'mb(10)': 3.6441594470018,
    'mb(MZ)': 2.8702658054974,
    'mc(3,nf=4)': 0.99524628064762,
  },
  4: {
    'alpha5(mb)': 0.224519087726346,
    'alpha5(10)': 0.178230868181372,
    'alpha4(mb)': 0.224746195158098,
    'alpha4(3)': 0.253466980623928,
    'alpha4(mc)': 0.386978214350403,
    'alpha3(mc)': 0.38839464825011,
    'alpha3(mtau=1.77693)': 0.313798695216788,
    'alpha5(mt)': 0.108539561006583,
    'alpha6(mt)': 0.108517325092653,
    'alpha6(1000)': 0.0885128033147572,
    Lambda3_MeV: 333.959430938,
    Lambda4_MeV: 290.622152106,
    Lambda5_MeV: 208.63205518,
    Lambda6_MeV: 88.3803546413,
    'mb(10)': 3.6424858218659,
    'mb(MZ)': 2.8681286561223,
    'mc(3,nf=4)': 0.98845234230517,
  },
  5: {
    'alpha5(mb)': 0.224531512260878,
    'alpha5(10)': 0.178234137421788,
    'alpha4(mb)': 0.224763223854957,
    'alpha4(3)': 0.25351524040382,
    'alpha4(mc)': 0.38760645637414,
    'alpha3(mc)': 0.389205137828253,
    'alpha3(mtau=1.77693)': 0.313894712825042,
    'alpha5(mt)': 0.108539450748787,
    'alpha6(mt)': 0.108517281102756,
    'alpha6(1000)': 0.08851277191694,
    Lambda3_MeV: 333.11975941,
    Lambda4_MeV: 290.492987633,
    Lambda5_MeV: 208.625007143,
    Lambda6_MeV: 88.3800173571,
    'mb(10)': 3.642177952263,
    'mb(MZ)': 2.867758134773,
    'mc(3,nf=4)': 0.98613729005675,
  },
};

describe('thresholds', () => {
  const thresholds = [
    { name: 'c', flavours: 4, mass: 1.2729 },
    { name: 'b', flavours: 5, mass: 4.186 },
    { name: 't', flavours: 6, mass: 162.5 },
  ];
  it.each(LOOPS)('reproduces the reference grid at %i loops', (loops) => {
    const row = GRID[loops] ?? {};
    const at = (
      scale: number,
      flavours: number,
      mass?: number,
      from = { scale: 91.1879, flavours: 5 },
      alpha = 0.118,
    ) =>
      granted(
        evolvePath({
          alpha,
          from,
          to: { scale, flavours },
          options: { loops, thresholds },
          ...(mass === undefined ? {} : { mass }),
        }),
      );
    const points: [string, number, number][] = [
      ['alpha5(mb)', 4.186, 5],
      ['alpha5(10)', 10, 5],
      ['alpha4(mb)', 4.186, 4],
      ['alpha4(3)', 3, 4],
      ['alpha4(mc)', 1.2729, 4],
      ['alpha3(mc)', 1.2729, 3],
      ['alpha3(mtau=1.77693)', 1.77693, 3],
      ['alpha5(mt)', 162.5, 5],
      ['alpha6(mt)', 162.5, 6],
      ['alpha6(1000)', 1000, 6],
    ];
    for (const [name, scale, flavours] of points) close(at(scale, flavours).alpha, row[name] ?? NaN, 3e-14);
    if (loops === 1) return;
    for (const nf of [3, 4, 5, 6]) {
      const scale = [1.2729, 4.186, 91.1879, 162.5][nf - 3] ?? NaN;
      const lambda = number(lambdaOf(at(scale, nf).alpha, scale, { flavours: nf, loops })) * 1000;
      close(lambda, row[`Lambda${nf}_MeV`] ?? NaN, 1e-11);
    }
    const b = { scale: 4.186, flavours: 5 };
    close(at(10, 5, 4.186, b, at(4.186, 5).alpha).mass, row['mb(10)'] ?? NaN, 1e-13);
    close(at(91.1879, 5, 4.186, b, at(4.186, 5).alpha).mass, row['mb(MZ)'] ?? NaN, 1e-13);
    const c = { scale: 1.2729, flavours: 4 };
    close(at(3, 4, 1.2729, c, at(1.2729, 4).alpha).mass, row['mc(3,nf=4)'] ?? NaN, 1e-13);
  });

  it('down and up again is the identity, for coupling and mass', () => {
    for (const loops of LOOPS) {
      const down = granted(
        evolvePath({
          alpha: 0.118,
          mass: 0.003,
          from: { scale: 91, flavours: 5 },
          to: { scale: 2, flavours: 3 },
          options: { loops },
        }),
      );
      const up = granted(
        evolvePath({
          alpha: down.alpha,
          mass: down.mass ?? NaN,
          from: { scale: 2, flavours: 3 },
          to: { scale: 91, flavours: 5 },
          options: { loops },
        }),
      );
      close(up.alpha, 0.118, 1e-14);
      close(up.mass, 0.003, 1e-14);
      expect(down.steps.map((s) => s.action)).toEqual(['start', 'run', 'match', 'run', 'match', 'run']);
      expect(down.steps.map((s) => s.flavours)).toEqual([5, 5, 4, 4, 3, 3]);
    }
  });

  it('the choice of the crossing scale and of the mass definition matters less with every loop', () => {
    const spread = [2, 3, 4, 5].map((loops) => {
      const values = [0.5, 1, 2].map(
        (factor) =>
          granted(
            evolvePath({
              alpha: 0.118,
              from: { scale: 91.1879, flavours: 5 },
              to: { scale: 20, flavours: 4 },
              options: { loops, thresholds: scaledThresholds(DEFAULT_THRESHOLDS, factor) },
            }),
          ).alpha,
      );
      return Math.max(...values) - Math.min(...values);
    });
    for (let k = 1; k < spread.length; k++) expect(spread[k]).toBeLessThan((spread[k - 1] ?? 0) / 2);

    const m = 4.186;
    const alpha = number(evolveAlpha({ alpha: 0.118, from: 91.1879, to: m, flavours: 5, loops: 5 }));
    const atTen = granted(evolveMass({ mass: m, alpha, from: m, to: 10, flavours: 5, loops: 5 }));
    const kinds = [
      { name: 'b', flavours: 5, mass: m, scale: 10 },
      { name: 'b', flavours: 5, mass: atTen.mass, scale: 10, kind: 'running' as const },
    ].map(
      (t) =>
        granted(
          evolvePath({
            alpha: 0.118,
            from: { scale: 91.1879, flavours: 5 },
            to: { scale: 10, flavours: 4 },
            options: { thresholds: [t] },
          }),
        ).alpha,
    );
    close(kinds[0], kinds[1] ?? NaN, 2e-4);
  });

  it('the definitions of the heavy mass agree up to the order left out', () => {
    // Halving α_s divides the disagreement of n-loop matching, of order α_s^(n+1), by 2^(n+1).
    const gap = (alpha: number, loops: number): number => {
      const ratio = granted(evolveMass({ mass: 1, alpha, from: 10, to: 4, flavours: 5, loops: 5 })).mass;
      const values = [
        matchDown(alpha, { light: 4, log: 2 * Math.log(10 / 4), heavyMass: 'scale-invariant', loops }),
        matchDown(alpha, { light: 4, log: 2 * Math.log((10 * ratio) / 4), heavyMass: 'running', loops }),
      ].map(number);
      return Math.abs((values[0] ?? NaN) / (values[1] ?? NaN) - 1);
    };
    for (const loops of [1, 2, 3, 4]) {
      const order = Math.log2(gap(0.04, loops) / gap(0.02, loops));
      expect(Math.abs(order - (loops + 1))).toBeLessThan(0.4);
    }
  });

  it('knows the active flavours and refuses unknown thresholds', () => {
    expect([0.5, 1.3, 4, 5, 100, 200].map((mu) => flavoursAt(mu))).toEqual([3, 4, 4, 5, 5, 6]);
    const question = { alpha: 0.118, from: { scale: 91, flavours: 5 }, to: { scale: 2, flavours: 2 } };
    const answer = evolvePath(question);
    expect(isRefusal(answer) && answer.reason).toContain('between 2 and 3');
    expect(isRefusal(evolvePath({ ...question, to: { scale: 0.3, flavours: 3 } }))).toBe(true);
    expect(isRefusal(evolvePath({ ...question, to: { scale: 2, flavours: 4 }, options: { matchingLoops: 5 } }))).toBe(
      true,
    );
    expect(
      isRefusal(
        evolvePath({
          ...question,
          to: { scale: 2, flavours: 4 },
          options: { thresholds: [{ name: 'b', flavours: 5, mass: -4 }] },
        }),
      ),
    ).toBe(true);
  });
});

describe('masses', () => {
  it('m(m) and m(μ) are inverse to each other', () => {
    for (const loops of LOOPS) {
      const m = granted(massAtItself({ mass: 0.986, alpha: 0.2536, from: 3, flavours: 4, loops }));
      close(
        granted(evolveMass({ mass: m.mass, alpha: m.alpha, from: m.mass, to: 3, flavours: 4, loops })).mass,
        0.986,
        1e-14,
      );
    }
  });

  it('refuses masses below the Landau pole', () => {
    expect(isRefusal(massAtItself({ mass: 0.09, alpha: 0.3, from: 2, flavours: 3, loops: 4 }))).toBe(true);
    expect(isRefusal(evolveMass({ mass: -1, alpha: 0.3, from: 2, to: 3, flavours: 3, loops: 4 }))).toBe(true);
  });
});
