/**
 * Kernels and terminants against check values computed with mpmath 1.2.1 and PARI/GP 2.15.2 (34 reliable digits; each was obtained in
 * two ways, named beside it), in doubles to the tolerance that goes with them.
 *
 * The formulas: R. B. Dingle, "Asymptotic Expansions: Their Derivation and Interpretation" (1973), chapters 21–23, basic terminants
 * (from memory; re-derived); DLMF 2.11.10, 2.11.11 (identities checked numerically).
 */
import { describe, expect, it } from 'vitest';
import {
  branchAlternating,
  branchAlternatingDouble,
  branchSame,
  branchSameDouble,
  C,
  exp,
  gamma,
  pi,
  pow,
  R,
  Rational,
  scaledE1,
} from '../../src/numerics/index.js';
import type { Ball, Complex } from '../../src/numerics/index.js';

const PREC = 160;
const q = (text: string): Rational => {
  const value = Rational.parse(text);
  if (value === undefined) throw new Error(text);
  return value;
};
const ball = (text: string): Ball => R.fromRational(q(text), PREC + 40);

/** The check value has 34 reliable digits; the ball must agree to all of them. */
function agrees(value: Ball, text: string): void {
  expect(R.accuracyBits(value)).toBeGreaterThan(120);
  expect(R.containsRational(R.addRelativeError(value, 1e-33), q(text)), `${R.toNumber(value)} against ${text}`).toBe(
    true,
  );
}

describe('F_b: series closed form against quadrature on a rotated contour', () => {
  it.each([
    ['0.3951', '3', '0.521809878341159984547882341108438809', '0.272012135509232422915416070945164709'],
    [
      '1.5802469135802469135802469135802469',
      '5',
      '0.382722681397991451265622824296045947',
      '0.191163017150932843376286212638231498',
    ],
    ['-0.37', '2', '0.660979789489444781487515307448866661', '0.230998779113757071486783449314612797'],
    ['2.37037', '7.5', '0.270144737115597025759866877206553722', '0.0713618664454256118893941962645539412'],
    ['0', '3', '0.494576401348641235028769696756170918', '0.156410688228254140853756571604016519'],
    ['1', '4', '0.438208031454482784709686703306429782', '0.230161106314603301021683122979319002'],
    ['2', '5', '0.384578193638214944754729351183165475', '0.264598559907553709138066475184970408'],
  ])('b = %s, x = %s', (b, x, pv, im) => {
    const f = branchSame(q(b), ball(x), PREC);
    agrees(f.pv, pv);
    agrees(f.im, im);
    const d = branchSameDouble(Number(b), Number(x));
    expect(Math.abs(d.pv / Number(pv) - 1)).toBeLessThan(1e-12);
    expect(Math.abs(d.im / Number(im) - 1)).toBeLessThan(1e-12);
  });

  it.each([
    ['1.000000001', '0.438208031475726506295415561061146016'],
    ['0.999999999', '0.438208031433239062972766529603080055'],
  ])('next to an integer: b = %s, x = 4 (60-digit series)', (b, pv) => {
    agrees(branchSame(q(b), R.fromNumber(4), PREC).pv, pv);
    expect(Math.abs(branchSameDouble(Number(b), 4).pv / Number(pv) - 1)).toBeLessThan(1e-12);
  });
});

describe('G_b: incomplete Γ against quadrature and Tricomi U', () => {
  it.each([
    ['0.21', '2', '0.340297859224623357253627815177738495'],
    ['-0.79', '3', '0.315804275379244432596774956151874073'],
    ['1.21', '1.5', '0.309291359805490931021795912523863125'],
  ])('b = %s, x = %s', (b, x, value) => {
    agrees(branchAlternating(q(b), ball(x), PREC), value);
    expect(Math.abs(branchAlternatingDouble(Number(b), Number(x)) / Number(value) - 1)).toBeLessThan(1e-13);
  });
});

describe('terminants: partial sum plus exact terminant is the closed form', () => {
  const rows = [
    [
      -1,
      '0',
      8,
      '0.915633339397880818760698157664384492',
      '0.000217339397880818760698157664384492267',
      '0.539036205061554466017256112064712963',
    ],
    [
      -1,
      '0.3951',
      9,
      '0.885867756821549811145348019217669805',
      '-0.000503978781407163491246334830888861590',
      '0.502277542299310807908766326753555235',
    ],
    [
      -1,
      '1.5802469135802469135802469135802469',
      7,
      '0.806607883528099862360202385417107594',
      '-0.00528629683959630962634983295451619840',
      '0.523130046910128768506350106900078696',
    ],
    [
      1,
      '0',
      8,
      '1.13147020473410778034051681354477015',
      '0.000646204734107780340516813544770147648',
      '1.60269031276731235247225581540215190',
    ],
    [
      1,
      '0.3951',
      9,
      '1.19627707501082453284288131077722554',
      '0.000272251452902270780146686911963855975',
      '0.271332436396151515556729904977860243',
    ],
    [
      1,
      '1.5802469135802469135802469135802469',
      7,
      '1.45456553573584381617904218722276961',
      '0.0109246565509069506805081822835512713',
      '1.08110010984351540341077694539376802',
    ],
  ] as const;

  it.each(rows)('sign %i, b = %s, %i terms at x = 10', (s, b, n, value, remainder, factor) => {
    const x = R.fromNumber(10);
    const kernel = (e: Rational): Ball => (s > 0 ? branchSame(e, x, PREC).pv : branchAlternating(e, x, PREC));
    const full = R.mul(x, kernel(q(b)), PREC);
    agrees(full, value);
    const terminant = R.mul(x, kernel(q(b).add(Rational.of(n))), PREC);
    agrees(terminant, factor);
    // T_n = s^n (1+b)_n x^−n
    let term = Rational.ONE;
    let partial = Rational.ZERO;
    for (let k = 0; k < n; k++) {
      partial = partial.add(term);
      term = term.mul(q(b).add(Rational.of(k + 1))).mul(Rational.of(BigInt(s), 10n));
    }
    const rest = R.mul(R.fromRational(term, PREC), terminant, PREC);
    agrees(rest, remainder);
    expect(R.overlaps(R.add(R.fromRational(partial, PREC), rest, PREC), full)).toBe(true);
  });

  it('Euler’s series Σ (−1)^n n! 10^−n: closed form (Stieltjes)', () => {
    agrees(
      R.mul(R.fromNumber(10), branchAlternating(Rational.ZERO, R.fromNumber(10), PREC), PREC),
      '0.915633339397880818760698157664384492',
    );
  });

  it('DLMF 2.11.10–2.11.11: E_p(z) and its terminant, p = 1.3, z = 6, n = 5', () => {
    const z = R.fromNumber(6);
    const scale = exp(R.neg(z), PREC);
    const e = (p: Rational): Ball => R.mul(scale, branchAlternating(p.sub(Rational.ONE), z, PREC), PREC);
    const p = q('1.3');
    const ep = e(p);
    agrees(ep, '0.000346519239445353254498969996095590051');
    const s = p.add(Rational.of(5));
    const power = pow(z, s.sub(Rational.ONE), PREC);
    const f = R.div(
      R.mul(gamma(R.fromRational(s, PREC + 20), PREC), e(s), PREC),
      R.mul(R.mul2exp(pi(PREC), 1), power, PREC),
      PREC,
    );
    agrees(f, '0.000000505751961672167594868172508944163174');
    // e^−z/z Σ_{s<n} (−1)^s (p)_s/z^s + (−1)^n (2π/Γ(p)) z^(p−1) F_{n+p}(z)
    let sum = Rational.ZERO;
    let term = Rational.ONE;
    for (let k = 0; k < 5; k++) {
      sum = sum.add(term);
      term = term.mul(p.add(Rational.of(k))).div(Rational.of(-6));
    }
    const first = R.div(R.mul(scale, R.fromRational(sum, PREC), PREC), z, PREC);
    const factor = R.div(
      R.mul(R.mul2exp(pi(PREC), 1), pow(z, p.sub(Rational.ONE), PREC), PREC),
      gamma(R.fromRational(p, PREC + 20), PREC),
      PREC,
    );
    expect(R.overlaps(R.sub(first, R.mul(factor, f, PREC), PREC), ep)).toBe(true);
  });

  it('near the optimum, x = 30, s = N + b = 30.25: exact factors, and their expansions in 1/x (re-derived)', () => {
    const x = R.fromNumber(30);
    const alternating = R.mul(x, branchAlternating(q('30.25'), x, PREC), PREC);
    const same = R.mul(x, branchSame(q('30.25'), x, PREC).pv, PREC);
    agrees(alternating, '0.493844286702635428666242147579304636');
    agrees(same, '-0.578053717434474862884791425695614835');
    // ½ − (1+2η)/(8x) + (1+6η+4η²)/(32x²) + (1−14η−24η²−8η³)/(128x³), and
    // −(1/3+η) + (4/135+η/3+2η²/3+η³/3)/x + (8/2835 − 8η/135 − 47η²/135 − 5η³/9 − η⁴/3 − η⁵/15)/x² at η = 1/4
    const h = 0.25;
    const alt =
      0.5 -
      (1 + 2 * h) / 240 +
      (1 + 6 * h + 4 * h * h) / (32 * 900) +
      (1 - 14 * h - 24 * h * h - 8 * h ** 3) / (128 * 27000);
    const pv =
      -(1 / 3 + h) +
      (4 / 135 + h / 3 + (2 * h * h) / 3 + h ** 3 / 3) / 30 +
      (8 / 2835 - (8 * h) / 135 - (47 * h * h) / 135 - (5 * h ** 3) / 9 - h ** 4 / 3 - h ** 5 / 15) / 900;
    expect(Math.abs(R.toNumber(alternating) - alt)).toBeLessThan(1e-7);
    expect(Math.abs(R.toNumber(same) - pv)).toBeLessThan(1e-5);
  });
});

describe('Laplace integrals of rational functions (partial fractions against rotated-contour quadrature)', () => {
  it('a simple and a double pole on the path: ∫ e^−4t/(1−t) and ∫ e^−4t/(1−t)²', () => {
    const simple = branchSame(Rational.ZERO, R.fromNumber(4), PREC);
    agrees(simple.pv, '0.359552007863620696177421675826607445');
    agrees(simple.im, '0.0575402765786508252554207807448297505');
    const double = branchSame(Rational.ONE, R.fromNumber(4), PREC);
    agrees(double.pv, '0.438208031454482784709686703306429782');
    agrees(double.im, '0.230161106314603301021683122979319002');
  });

  it('(2+t)/((t−1−i/5)(t−1+i/5)(t+1)) at g = 0.3, by e^w E₁(w) at w = −pole/g', () => {
    // ∫ e^(−t/g)/(t−a) dt = E(−a/g); residues (2+a)/q′(a)
    const g = ball('0.3');
    const at = (a: Complex, others: readonly Complex[]): Complex => {
      const residue = others.reduce((r, o) => C.div(r, C.sub(a, o, PREC), PREC), C.add(a, C.fromNumbers(2, 0), PREC));
      const w = C.neg({ re: R.div(a.re, g, PREC), im: R.div(a.im, g, PREC) });
      return C.mul(residue, scaledE1(w, PREC), PREC);
    };
    const up: Complex = { re: R.ONE, im: ball('0.2') };
    const down = C.conj(up);
    const left = C.fromNumbers(-1, 0);
    const sum = C.add(C.add(at(up, [down, left]), at(down, [up, left]), PREC), at(left, [up, down]), PREC);
    agrees(sum.re, '1.52298838818463424970800293189019197');
    expect(R.containsZero(sum.im)).toBe(true);
  });
});
