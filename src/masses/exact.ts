/**
 * @module A conversion in certified digits: the truncated relations of convert.ts in enclosures of any precision.
 *
 * Method     couplings by the certified running; the same text of the terms over balls; m(m) as a root whose bracket is proved.
 * Bound      certified: for the coefficients as published, the thresholds as given and the doubles of the request read as
 *            the decimals they print as. R-evolution is a quadrature in doubles and has no enclosure here.
 */
import { R, exact, exactReal, toNumberExact, type Ball, type Exact } from '../numerics/index.js';
import { exactAlpha, exactMassRatio, isRefusal, type Refusal } from '../qcd/index.js';
import { massFrom, msbarFrom, settingOf, type Setting } from './convert.js';
import type { MassPlace } from './definition.js';
import { definitionOf } from './definitions.js';
import { asWritten, exactGeometric, exactHeavyAlpha, exactLightAlpha } from './exact-couplings.js';
import { ballNumbers } from './numbers.js';
import { provedRoot } from './proved-root.js';
import type { MassRequest } from './request.js';
import { subtractedTerms, summedTerms, totalOf, type Point } from './terms.js';

const GUARD = 40;

type Evaluation = Exact | Refusal | undefined;

/** μ as an exact number. */
function exactMu(setting: Setting, msbar: Exact): Exact {
  const { scale } = setting;
  if ('GeV' in scale) return asWritten(scale.GeV);
  if (scale.ratio === 1) return msbar;
  const ratio = asWritten(scale.ratio);
  return exactReal((prec) => R.mul(msbar.ball(prec + 8), ratio.ball(prec + 8), prec + 8));
}

/** m(μ) with the quark active. */
function exactRunning(setting: Setting, alpha: Exact, scale: number, msbar: Exact): Evaluation {
  const { source } = setting;
  const heavy = exactHeavyAlpha(source, alpha, msbar);
  if (heavy === undefined || isRefusal(heavy)) return heavy;
  const { flavours, loops } = source;
  const ratio = exactMassRatio({ alpha: heavy, from: msbar, to: asWritten(scale), flavours, loops });
  if (isRefusal(ratio)) return ratio;
  return exactReal((prec) => R.mul(msbar.ball(prec + 8), ratio.ball(prec + 8), prec + 8));
}

/** The mass of a definition from m(m); undefined where no enclosure is at hand. */
function exactFrom(setting: Setting, alpha: Exact, place: MassPlace, msbar: Exact): Evaluation {
  const definition = definitionOf(place.definition);
  const { source, order, strength } = setting;
  if (definition.kind === 'msbar') {
    return place.scale === undefined ? msbar : exactRunning(setting, alpha, place.scale, msbar);
  }
  if (definition.kind === 'subtracted' && definition.evolution !== undefined) return undefined;
  const atMass = exactLightAlpha(source, alpha, msbar);
  if (isRefusal(atMass)) return atMass;
  const mu = exactMu(setting, msbar);
  const { light, loops } = source;
  const atMu = mu === msbar ? atMass : exactAlpha({ alpha: atMass, from: msbar, to: mu, flavours: light, loops });
  if (isRefusal(atMu)) return atMu;
  const own = definition.kind === 'summed' && definition.coupling === 'geometric';
  const geometric = own ? exactGeometric(source, atMu, mu) : undefined;
  if (geometric !== undefined && isRefusal(geometric)) return geometric;
  const cutoff = place.scale === undefined ? mu : asWritten(place.scale);
  const N = asWritten(strength);
  return exactReal((prec) => {
    const work = prec + GUARD;
    const n = ballNumbers(work);
    const point: Point<Ball> = {
      light,
      msbar: msbar.ball(work),
      mu: mu.ball(work),
      alpha: atMu.ball(work),
      strength: N.ball(work),
      ...(geometric === undefined ? {} : { geometric: geometric.ball(work) }),
    };
    const terms =
      definition.kind === 'summed'
        ? summedTerms(n, definition, point, order)
        : subtractedTerms(n, definition, point, cutoff.ball(work), order);
    return totalOf(n, point.msbar, terms);
  });
}

/** Relative step for the slope of the double function: half the digits are right. */
const SLOPE_STEP = 1e-6;

/** m(m) with mass_X(m(m)) = mass. */
function exactMsbar(setting: Setting, alpha: Exact, place: MassPlace, mass: Exact): Evaluation {
  if (place.definition === 'msbar') return mass;
  const start = msbarFrom(setting, place, toNumberExact(mass));
  if (isRefusal(start)) return start;
  const near = [start * (1 - SLOPE_STEP), start * (1 + SLOPE_STEP)] as const;
  const [below, above] = [massFrom(setting, place, near[0]), massFrom(setting, place, near[1])];
  const probe = exactFrom(setting, alpha, place, exact(R.midpoint(R.fromNumber(start))));
  if (probe === undefined || isRefusal(probe)) return probe;
  if (isRefusal(below) || isRefusal(above)) return undefined;
  const slope = (above - below) / (near[1] - near[0]);
  if (!(slope > 0)) return undefined;
  return exactReal((prec) => {
    const work = prec + GUARD;
    const f = (x: Ball): Ball => {
      const value = exactFrom(setting, alpha, place, exact(R.midpoint(x)));
      if (value === undefined || isRefusal(value)) return R.INDETERMINATE;
      return R.sub(value.ball(work), mass.ball(work), work);
    };
    return provedRoot(f, R.fromNumber(start), slope, work);
  });
}

export interface ExactInputs {
  readonly mass: Exact;
  readonly alpha: Exact;
}

/**
 * The conversion as an exact number: the request's mass and coupling in exact form beside it. Undefined where no
 * enclosure is at hand (R-evolution; an MSbar mass at a scale when the coupling is given without the quark).
 */
export function exactMass(request: MassRequest, inputs: ExactInputs): Evaluation {
  const setting = settingOf(request);
  if (isRefusal(setting)) return setting;
  const msbar = exactMsbar(setting, inputs.alpha, request.from, inputs.mass);
  if (msbar === undefined || isRefusal(msbar)) return msbar;
  return exactFrom(setting, inputs.alpha, request.to, msbar);
}
