/** @module What can be cut, and the model of the leading infrared singularity that the cut removes. */
import {
  R,
  Rational,
  addExact,
  divExact,
  exact,
  exactReal,
  exp,
  log,
  mulExact,
  subExact,
  toNumberExact,
} from '../../numerics/index.js';
import type { Exact } from '../../numerics/index.js';
import { changeScale, refuse } from '../../qcd/index.js';
import type { Refusal } from '../../qcd/index.js';
import type { Expansion, Series, StatedSingularity, Uncertain } from '../../series/index.js';
import { exactText, expand } from '../../studies/index.js';
import type { Expanded } from '../../studies/index.js';
import { lowMomentumSeries, lowMomentumStrength, loweredSeries, shiftedStrength } from './low-momenta.js';
import type { SeriesCutResult } from './result.js';
import { cutStrengths } from './strength.js';
import type { CutStrength } from './strength.js';

export interface SeriesCutQuestion {
  readonly series: Series;
  /** Without it there are coefficients and verdicts, but no sums. */
  readonly at?: Uncertain;
  readonly path?: readonly string[];
  /** μ_f/Q. */
  readonly cut: Rational;
  readonly order?: number;
  readonly digits: number;
  readonly request: SeriesCutResult['request'];
}

const LEAST_TERMS = 3;
const ZERO = exact(0);

export interface Setting {
  readonly e: Expansion;
  readonly expanded: Expanded;
  readonly beta: readonly Exact[];
  readonly ratio: Exact;
  readonly singularity: StatedSingularity & { readonly u: Exact };
  /** g of the model, ν and k of its x(k)^(1+ν) and x(Q)^k. */
  readonly g: readonly Exact[];
  readonly nu: Exact;
  readonly k: number;
  readonly wilson: readonly Exact[];
}

/** ln(Q²/μ²) of a ratio μ/Q. */
const logOver = (ratio: Exact): Exact => exactReal((prec) => R.neg(R.mul2exp(log(ratio.ball(prec + 8), prec + 8), 1)));

/** Coefficients per unit λ of the part below a cut, for the series at its own scale. */
export function modelBelow(setting: Setting, cut: Rational): Exact[] {
  const { beta, ratio, singularity, g, nu, k, wilson } = setting;
  const below = loweredSeries(g, beta, logOver(exact(cut)), nu);
  const size = exactReal((prec) => {
    const power = R.mul2exp(log(R.fromRational(cut, prec + 8), prec + 8), 1);
    return exp(R.mul(power, singularity.u.ball(prec + 8), prec + 8), prec);
  });
  const operator = [exact(1), ...wilson];
  const atQ = below.map((_, n) =>
    mulExact(
      size,
      operator.reduce((sum, c, j) => addExact(sum, mulExact(c, below[n - k - j] ?? ZERO)), ZERO),
    ),
  );
  const up = exactReal((prec) => R.mul2exp(log(ratio.ball(prec + 8), prec + 8), 1));
  return changeScale({ coefficients: atQ, firstPower: 1 }, beta, up);
}

/** ν and k of γ = 1 + s b_1/b_0² + ν − k; without a stated exponent both are 0. */
function shapeOf(s: StatedSingularity & { readonly u: Exact }, beta: readonly Exact[]): { nu: Exact; k: number } {
  const [b0 = exact(1), b1 = ZERO] = beta;
  if (s.exponent === undefined) return { nu: ZERO, k: 0 };
  const natural = divExact(mulExact(s.u, b1), mulExact(b0, b0));
  const extra = subExact(subExact(s.exponent, exact(1)), natural);
  const k = Math.max(0, Math.round(-toNumberExact(extra)));
  return { nu: addExact(extra, exact(k)), k };
}

export function settingOf({ series, cut, order, at }: SeriesCutQuestion): Setting | Refusal {
  const expanded = expand(series, at?.value ?? exact(1), order);
  const e = expanded.expansion;
  const { running } = e;
  if (running === undefined || series.coupling.plain) {
    return refuse(
      `the running of ${series.id} is not known, and with it how low momenta enter`,
      'name coupling, scheme: MSbar and flavours: in its file',
    );
  }
  if (series.expandedFrom !== undefined) {
    return refuse(
      `${series.id} is an integral over a circle: its momenta are those of the function under the integral`,
      'cut that function (adler for the tau width)',
    );
  }
  if (e.power !== 1)
    return refuse(
      `${series.id} starts at the power ${e.power}`,
      'only series that start at the first power can be cut',
    );
  if (e.coefficients.length < LEAST_TERMS) {
    return refuse(
      `${e.coefficients.length} coefficients say nothing about their growth`,
      `give ${LEAST_TERMS} or more`,
    );
  }
  const singularity = e.stated.find((x) => x.kind === 'infrared' && x.u !== undefined);
  if (singularity?.u === undefined) {
    return refuse(
      `${series.id} states no infrared singularity: nothing says which power the low momenta leave`,
      'write singularities: [{ dimension: 4 }] into its file, with the dimension of its leading power correction',
    );
  }
  if (cut.cmp(Rational.ONE) > 0) {
    return refuse(
      `the cut mu_f = ${cut.toNumber().toPrecision(4)} Q lies above Q: nothing of the short distances would be left`,
      'give a cut below 1 (in units of Q)',
    );
  }
  const found = { ...singularity, u: singularity.u };
  const { nu, k } = shapeOf(found, running.beta);
  return {
    e,
    expanded,
    beta: running.beta,
    ratio: running.scaleRatio,
    singularity: found,
    g: lowMomentumSeries(running.beta, found.u, e.coefficients.length, nu),
    nu,
    k,
    wilson: singularity.wilson ?? [],
  };
}

/** The ultraviolet singularity that is nearer than the one cut, if the series states one. */
export const nearerUltraviolet = ({ e, singularity }: Setting): StatedSingularity | undefined =>
  e.stated.find(
    (s) => s.kind === 'ultraviolet' && s.u !== undefined && -toNumberExact(s.u) < toNumberExact(singularity.u),
  );

/** What λ there is, from the model at μ_f = Q. */
export function strengthsOf(series: Series, setting: Setting): CutStrength[] | Refusal {
  const { beta, singularity, nu, k, expanded, e } = setting;
  const [b, s, v] = [beta.map(toNumberExact), toNumberExact(singularity.u), toNumberExact(nu)];
  const [b0 = NaN, b1 = 0] = b;
  const gamma = 1 + (s * b1) / (b0 * b0) + v - k;
  const perUnit = shiftedStrength(lowMomentumStrength(b, s, v), s / b0, gamma, k);
  const stated = e.stated.find((x) => x.t === singularity.t) ?? singularity;
  const list = cutStrengths(
    series,
    expanded,
    stated,
    modelBelow(setting, Rational.ONE),
    perUnit,
    nearerUltraviolet(setting) !== undefined,
  );
  return list.length > 0
    ? list
    : refuse(
        `nothing says how strong the singularity of ${series.id} at u = ${exactText(singularity.u, 6)} is`,
        'state strength: beside it in the file',
      );
}

/** γ of a singularity without anomalous dimension. */
export function naturalExponent({ beta, singularity }: Setting): Exact {
  const [b0 = exact(1), b1 = ZERO] = beta;
  return addExact(exact(1), divExact(mulExact(singularity.u, b1), mulExact(b0, b0)));
}
