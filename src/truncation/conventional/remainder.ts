/**
 * @module Remainder at the least term: the principal value minus the truncated sum, through relative order 1/ω.
 *
 * Method      for terms T_n → S Γ(n+γ)/Γ(γ) t*^(−n) x^(n+p) [1 + e_1/(n+b) + …], b = γ − 1, ω = |t*|/x, cut after N of them,
 *             η = N + b − ω, T = S Γ(N+γ)/Γ(γ) t*^(−N) x^(N+p):
 *               t* > 0:  R_PV − S_N = T {−(1/3 + η) + [4/135 + η/3 + 2η²/3 + η³/3 − e_1 (η − 2/3)]/ω + …}
 *               t* < 0:  R − S_N    = T {1/2 + [e_1/2 − (1 + 2η)/8]/ω + …}
 *             e_1 = c_1 b. S from the last known coefficient over its form with all known c_k; N nearest to where the leading
 *             bracket vanishes, or the last known term.
 * Bound       error: the 1/ω² of the same expansions, not below its usual size, with (|e_1| + |e_2|)/ω², and the step of S from
 *             one coefficient fewer, on the remainder and on no less than T/2. Refused where S steps by more than itself, where
 *             ultraviolet and infrared growth compete, and beyond η² = ω, where the expansion is none.
 * Reference   terminants: R. B. Dingle 1973 (from memory); DLMF 2.11(iii); the coefficients are re-derived.
 */
import { toNumberExact } from '../../numerics/index.js';
import { competingBracket } from '../bracket.js';
import type { Known } from '../known.js';
import { counted, refuse, tooFew, type Band, type Question, type TruncationModel } from '../model.js';

/** Usual size of the coefficient of 1/ω², for an η at which it vanishes by accident. Heuristic. */
const USUAL = { same: 0.1, alternating: 1 / 32 } as const;

/** Share of T that the error of the strength counts for where the bracket vanishes by its choice of N. Heuristic. */
const LEAST_SHARE = 0.5;

interface Form {
  readonly t: number;
  readonly gamma: number;
  /** c_1, c_2, … of [1 + c_1 (1 − t/t*) + …]. */
  readonly corrections: readonly number[];
}

/** (R − S_N)/T through 1/ω, and the size of what comes at 1/ω². */
export function remainderFactor(
  side: 1 | -1,
  eta: number,
  omega: number,
  e1 = 0,
): { readonly value: number; readonly left: number } {
  const e = eta;
  if (side < 0) {
    return {
      value: 0.5 + (e1 / 2 - (1 + 2 * e) / 8) / omega,
      left: Math.abs(1 + 6 * e + 4 * e * e) / 32 / omega ** 2,
    };
  }
  const second = 4 / 135 + e / 3 + (2 * e ** 2) / 3 + e ** 3 / 3 - e1 * (e - 2 / 3);
  const third = 8 / 2835 - (8 * e) / 135 - (47 * e ** 2) / 135 - (5 * e ** 3) / 9 - e ** 4 / 3 - e ** 5 / 15;
  return { value: -(1 / 3 + e) + second / omega, left: Math.abs(third) / omega ** 2 };
}

/** ln and sign of Γ(n+γ)/Γ(γ) t*^(−n). */
function leadingForm({ t, gamma }: Form, n: number): { readonly log: number; readonly sign: number } {
  let log = -n * Math.log(Math.abs(t));
  let sign = t < 0 && n % 2 !== 0 ? -1 : 1;
  for (let i = 0; i < n; i++) {
    log += Math.log(Math.abs(i + gamma));
    if (i + gamma < 0) sign = -sign;
  }
  return { log, sign };
}

/** 1 + c_1 b/(n+b) + c_2 b(b−1)/((n+b)(n+b−1)) + …. */
function correction({ gamma, corrections }: Form, n: number): number {
  const b = gamma - 1;
  let factor = 1;
  return corrections.reduce((sum, c, k) => sum + c * (factor *= (b - k) / (n + b - k)), 1);
}

/** S x^p of the term with index k, as ln and sign, in the unit of the terms. */
function strengthAt(known: Known, form: Form, k: number, ahead: number): number {
  const { log, sign } = leadingForm(form, k + ahead);
  const size = Math.exp((known.logs[k] ?? -Infinity) - log - (k + ahead) * known.logX);
  return (size * Math.sign(known.values[k] ?? 0) * sign) / correction(form, k + ahead);
}

function formOf({ expansion }: Question): Form | undefined {
  const [s] = expansion.stated;
  if (s?.exponent === undefined) return undefined;
  return { t: toNumberExact(s.t), gamma: toNumberExact(s.exponent), corrections: s.corrections.map(toNumberExact) };
}

export const remainder: TruncationModel = {
  name: 'remainder',
  title: 'remainder at the least term',
  summary: 'principal value minus truncated sum, from the nearest known Borel singularity through 1/ω',
  nature: 'conventional',
  about: 'remainder',
  digits: 5,
  priors: ['conventional.double'],
  reference: 'R. B. Dingle 1973; DLMF 2.11(iii)',
  estimate(question) {
    const { known, expansion, priors } = question;
    const refused = tooFew(known, 3, 'the strength of the singularity could not be seen to settle');
    if (refused !== undefined) return refused;
    const form = formOf(question);
    if (form === undefined) {
      return refuse(
        'no Borel singularity with its exponent is known beforehand',
        'state position and exponent in the series file',
      );
    }
    if (known.stride !== 1 || (Number.isInteger(form.gamma) && form.gamma <= 0)) {
      return refuse('the leading form does not fit these terms', 'use the last term');
    }
    if (competingBracket(question) !== undefined) {
      return refuse(
        'ultraviolet and infrared growth compete: no single singularity makes the remainder',
        'read the bracket of orders, or sum with the singularity model',
      );
    }
    const ahead = (known.orders[0] ?? expansion.power) - expansion.power;
    const b = form.gamma - 1;
    const omega = Math.exp(Math.log(Math.abs(form.t)) - known.logX);
    const side = form.t < 0 ? -1 : 1;
    const best = Math.round(omega - b - ahead - (side > 0 ? 1 / 3 : 0));
    const count = Math.min(known.values.length, Math.max(1, best));
    const eta = count + ahead + b - omega;
    if (eta * eta > omega) {
      return refuse(
        best < 1
          ? 'the least term of the leading singularity lies before the first one'
          : `the known terms end ${Math.abs(eta).toFixed(1)} orders before the least one of the leading singularity`,
        best < 1 ? 'take a smaller coupling' : 'use the last term, or a larger coupling',
      );
    }
    const last = known.values.length - 1;
    const [strength, before] = [last, last - 1].map((k) => strengthAt(known, form, k, ahead)) as [number, number];
    const step = Math.abs(1 - before / strength);
    if (!(step < 1)) {
      return refuse(
        `${counted(known.values.length)} do not show the strength of the singularity at t = ${form.t.toPrecision(4)}: it moves by more than itself with the last one`,
        'use the last term, or sum with the singularity model',
      );
    }
    const lead = leadingForm(form, count + ahead);
    const term = strength * lead.sign * Math.exp(lead.log + (count + ahead) * known.logX);
    const [c1 = 0, c2 = 0] = form.corrections;
    const [e1, e2] = [c1 * b, c2 * b * (b - 1)];
    const { value, left } = remainderFactor(side, eta, omega, e1);
    const centre = term * value;
    const usual = side > 0 ? USUAL.same : USUAL.alternating;
    const beyond = Math.max(left, usual / omega ** 2) + (Math.abs(e1) + Math.abs(e2)) / omega ** 2;
    const error = Math.abs(term) * beyond + Math.abs(term) * Math.max(LEAST_SHARE, Math.abs(value)) * step;
    const band = (times: number): Band => ({ low: centre - times * error, high: centre + times * error });
    return {
      kind: 'estimate',
      terms: count,
      bands: { 68: band(1), 95: band(priors['conventional.double']) },
      facts: [
        { name: side > 0 ? 'PV - sum' : 'value - sum', value: centre, scaled: true },
        { name: 't*', value: form.t },
        { name: 'omega', value: omega },
        { name: 'eta', value: eta },
      ],
      notes: [
        `belongs to the sum through order ${known.orders[count - 1] ?? 0}`,
        ...(step > 0.1 ? [`the strength moved by ${(100 * step).toPrecision(2)} % with the last coefficient`] : []),
      ],
    };
  },
};
