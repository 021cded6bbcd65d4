/**
 * @module bubbles --view: the momenta behind a bubble chain, as tables for plots.
 *
 *   distribution   w(τ) and the effective coupling over k/Q
 *   scales         the mean virtuality that feeds each coefficient
 *   dispersive     the massive-gluon function and the spectral density of the effective coupling
 */
import {
  chainSum,
  distribution,
  factorBall,
  logLength,
  massiveGluon,
  orderScales,
  rangeObjection,
} from '../bubbles/index.js';
import { R, Rational, toNumberExact } from '../numerics/index.js';
import type { Refusal } from '../qcd/index.js';
import { VERSION, ballText, exactText, indicative } from '../studies/index.js';
import type { BubbleView, BubbleViewResult } from './bubble-result.js';
import { bitsFor, couplingWords, pointOf, quantityWords } from './bubble-words.js';
import type { BubbleQuestion } from './bubble-words.js';

export const BUBBLE_VIEWS: readonly BubbleView[] = ['distribution', 'scales', 'dispersive'];

/** k/Q, and sqrt(z), from 10^-2 to 10^2 in even steps of the logarithm. */
const POINTS = 81;
const DECADES = 2;
/** Digits of the columns: certified for w, converged for the massive gluon. */
const W_DIGITS = 12;
const GLUON_DIGITS = 10;
const SHAPE_DIGITS = 6;

type Columns = BubbleViewResult['columns'];
type Table = Pick<BubbleViewResult, 'columns' | 'rows' | 'integrals' | 'notes'>;

const overHard = (i: number): number => 10 ** (-DECADES + (2 * DECADES * i) / (POINTS - 1));

const betaNumber = (flavours: number): number => (33 - 2 * flavours) / (12 * Math.PI);

function pvIntegral(question: BubbleQuestion): BubbleViewResult['integrals'] {
  const { pv, im } = chainSum(question.quantity, pointOf(question));
  const bits = bitsFor(question.digits);
  return [
    {
      name: 'PV of the integral over the momenta',
      value: ballText(pv.ball(bits), question.digits),
      standing: 'certified',
    },
    { name: 'Im above the axis', value: ballText(im.ball(bits), question.digits), standing: 'certified' },
  ];
}

function distributionTable(question: BubbleQuestion): Table {
  const { quantity, flavours } = question;
  const L = R.toNumber(logLength(pointOf(question), 80));
  const norm = R.toNumber(factorBall(quantity.norm.factor, 64));
  const columns: Columns = [
    { name: 'k_over_Q', meaning: `virtuality of the gluon in units of ${quantity.hard}` },
    { name: 'tau', meaning: 'k^2/Q^2' },
    { name: 'w', meaning: 'distribution of virtualities, w(tau): b(u) = integral of dtau/tau w tau^-u' },
    { name: 'alpha_eff', meaning: 'effective coupling alpha_s/(1 + a ln(k^2 e^(-5/3)/mu^2))' },
    { name: 'density', meaning: 'normalisation times w times alpha_eff: the integrand over ln k^2' },
  ];
  const rows = Array.from({ length: POINTS }, (_, i) => {
    const k = overHard(i);
    const tau = Rational.fromNumber(k * k);
    const w = distribution(quantity, tau).ball(bitsFor(W_DIGITS));
    const coupling = 1 / (betaNumber(flavours) * (L + Math.log(k * k)));
    return [
      indicative(k, SHAPE_DIGITS),
      indicative(k * k, SHAPE_DIGITS),
      ballText(w, W_DIGITS),
      indicative(coupling, SHAPE_DIGITS),
      indicative(norm * R.toNumber(w) * coupling, SHAPE_DIGITS),
    ];
  });
  const contour = quantity.components.some((c) => c.kernel.kind === 'sine');
  return {
    columns,
    rows,
    integrals: pvIntegral(question),
    notes: [
      ...(contour
        ? ['w is that of the Adler function under the contour: the integral above is that of the contour quantity']
        : ['Im = pi times normalisation/beta_0 times w at the Landau pole of alpha_eff']),
      'alpha_eff changes its sign at the Landau pole: the integral is a principal value there',
    ],
  };
}

function scalesTable(question: BubbleQuestion): Table {
  const { quantity, order, digits } = question;
  const columns: Columns = [
    { name: 'n', meaning: 'order of the coefficient c_n' },
    { name: 'c_n', meaning: 'coefficient of normalisation times a^n' },
    {
      name: 'k_mean',
      meaning: `exp of half the mean of ln(k^2/Q^2) with the weight of c_n, in units of ${quantity.hard}`,
    },
    { name: 'share_below', meaning: `share of k < ${quantity.hard} in c_n` },
    { name: 'k_mean_below', meaning: `the same mean over k < ${quantity.hard} alone` },
  ];
  const scale = (log: number): string => indicative(Math.exp(log / 2), SHAPE_DIGITS);
  const rows = orderScales(quantity, pointOf(question), order).map((row) => [
    String(row.n),
    exactText(row.coefficient, digits),
    scale(row.meanLog),
    indicative(row.share, SHAPE_DIGITS),
    scale(row.meanLogBelow),
  ]);
  return {
    columns,
    rows,
    integrals: [],
    notes: [
      'the n-th coefficient weighs w(tau) with (5/3 - ln tau)^n: below Q the weight has one sign and moves to ever softer momenta, by a factor e^(-1/d) an order for the power (Lambda/Q)^d',
      'a mean over all momenta is a mean only while the weight keeps its sign; where ultraviolet momenta dominate it is not',
    ],
  };
}

function dispersiveTable(question: BubbleQuestion): Table {
  const { quantity, digits } = question;
  const point = pointOf(question);
  const L = R.toNumber(logLength(point, 80));
  const gluon = massiveGluon(quantity);
  const columns: Columns = [
    { name: 'lambda_over_Q', meaning: `gluon mass in units of ${quantity.hard}` },
    { name: 'z', meaning: 'its square' },
    { name: 'r_minus_r0', meaning: 'massive-gluon correction r(z) - r(0), in units of the normalisation' },
    { name: 'spectral', meaning: '1/((ln z + L)^2 + pi^2): spectral density of alpha_eff times beta_0' },
  ];
  const rows = Array.from({ length: POINTS }, (_, i) => {
    const mass = overHard(i);
    const logZ = 2 * Math.log(mass);
    return [
      indicative(mass, SHAPE_DIGITS),
      indicative(mass * mass, SHAPE_DIGITS),
      indicative(gluon.difference(logZ), GLUON_DIGITS),
      indicative(1 / ((logZ + L) ** 2 + Math.PI ** 2), SHAPE_DIGITS),
    ];
  });
  const continued = gluon.continued(point);
  const { pv } = chainSum(quantity, point);
  const rest = continued === undefined ? 0 : toNumberExact(pv) - continued;
  return {
    columns,
    rows,
    integrals: [
      { name: 'PV', value: ballText(pv.ball(bitsFor(digits)), digits), standing: 'certified' },
      ...(continued === undefined
        ? []
        : [
            {
              name: 'integral of r over the spectral density, without the Landau pole',
              value: indicative(continued, GLUON_DIGITS - 1),
              standing: 'converged' as const,
            },
            {
              name: 'normalisation/beta_0 times [Re r(-tau_L) - r(0)], the rest of PV',
              value: indicative(rest, GLUON_DIGITS - 2),
              standing: 'converged' as const,
            },
          ]),
    ],
    notes: [
      ...(continued === undefined
        ? [
            'a mass is subtracted: r grows like ln z at large z and the integral over the spectral density needs the subtraction',
          ]
        : []),
      'terms sqrt(z), z ln z, z^(3/2) of r at small z are infrared poles of b(u); its digits are converged',
    ],
  };
}

const TABLES: Readonly<Record<BubbleView, (question: BubbleQuestion) => Table>> = {
  distribution: distributionTable,
  scales: scalesTable,
  dispersive: dispersiveTable,
};

/** A view of the momenta, or why there is none. */
export function bubbleView(question: BubbleQuestion, view: BubbleView): BubbleViewResult | Refusal {
  const { quantity, request } = question;
  const objection = rangeObjection(quantity, pointOf(question));
  if (objection !== undefined) return objection;
  if (!quantity.euclidean && view !== 'dispersive') {
    return {
      reason: `${quantity.title} is no integral over Euclidean gluon momenta: there is no distribution of virtualities`,
      remedy: 'look at --view dispersive, which serves for phase space too',
    };
  }
  return {
    leastterm: VERSION,
    request,
    quantity: quantityWords(quantity),
    coupling: couplingWords(question),
    view,
    ...TABLES[view](question),
  };
}
