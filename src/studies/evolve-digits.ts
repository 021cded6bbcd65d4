/** @module evolve to any number of digits: the value of the study in certified digits, from enclosures of the same path. */
import { Rational, certainDigits, exact } from '../numerics/index.js';
import type { Exact } from '../numerics/index.js';
import { INPUTS, exactPath, isRefusal } from '../qcd/index.js';
import type { ExactPathResult, Refusal } from '../qcd/index.js';
import { settingOf } from './evolve-run.js';
import type { Setting } from './evolve-run.js';
import { evolveStudy } from './evolve.js';
import type { EvolveRequest, EvolveResult } from './evolve-types.js';
import { exactText } from './figures.js';

/** The decimals that a person wrote stand for the double of a scale. */
const asWritten = (x: number): Exact => exact(Rational.parse(String(x)) ?? Rational.fromNumber(x));

/** α_s at the start of the path, exactly: as given, or evolved there. */
function alphaAtStart(request: EvolveRequest, setting: Setting): Exact | Refusal {
  if (request.quantity === 'alpha_s') return request.value.value;
  const given = request.alphaS?.value.value ?? exact(Rational.parse(INPUTS.alphaSMZ.value) ?? Rational.ZERO);
  const { alphaAt, from, loops, thresholds } = setting;
  const there = exactPath({
    alpha: given,
    from: { scale: asWritten(alphaAt.scale), flavours: alphaAt.flavours },
    to: { scale: asWritten(from.scale), flavours: from.flavours },
    options: { loops, thresholds },
  });
  return isRefusal(there) ? there : there.alpha;
}

/** The end of the path as exact numbers; undefined where only doubles know it (a mass at its own scale). */
function exactEnd(request: EvolveRequest): ExactPathResult | Refusal | undefined {
  const setting = settingOf(request);
  if (isRefusal(setting)) return setting;
  const { to, from, loops, thresholds } = setting;
  if (to.scale === undefined) return undefined;
  const alpha = alphaAtStart(request, setting);
  if (isRefusal(alpha)) return alpha;
  return exactPath({
    alpha,
    ...(request.quantity === 'mass' ? { mass: request.value.value } : {}),
    from: { scale: asWritten(from.scale), flavours: from.flavours },
    to: { scale: asWritten(to.scale), flavours: to.flavours },
    options: { loops, thresholds },
  });
}

/** One constant of the four-loop decoupling relation is published as a decimal. */
const FEWER =
  'no more digits are certain: a constant of the four-loop decoupling is published to 17 digits (with --loops 4 there is no end to them)';

/** The study behind `evolve`, with `digits` certified digits of the value where there are enclosures of it. */
export function evolveToDigits(request: EvolveRequest, digits: number): EvolveResult | Refusal {
  const result = evolveStudy(request);
  if (isRefusal(result)) return result;
  const end = exactEnd(request);
  if (end === undefined) return result;
  if (isRefusal(end)) return end;
  const value = request.quantity === 'mass' ? end.mass : end.alpha;
  if (value === undefined) return result;
  const known = certainDigits(value.ball(Math.ceil(digits * 3.33) + 32));
  return {
    ...result,
    value: exactText(value, digits),
    digits: 'certified',
    ...(known < digits ? { digitsNote: FEWER } : {}),
  };
}
