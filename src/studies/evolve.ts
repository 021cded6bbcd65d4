/**
 * @module α_s or a quark mass from one scale and n_f to another, with every error named.
 * Parametric errors by repeating the evolution with shifted inputs; truncation by one loop less; matching by crossing each
 * threshold at half and at twice its scale.
 */
import { LAMBDA_DEFINITIONS, isRefusal, lambdaOf, type PathStep } from '../qcd/index.js';
import type { Refused } from './assessment.js';
import { alphaErrors, matchingSpread, parametricShifts, scaleText, text } from './evolve-errors.js';
import { runOnce, settingOf, type Outcome, type Setting } from './evolve-run.js';
import type { EvolveError, EvolveRequest, EvolveResult, EvolveStep } from './evolve-types.js';
import { indicative } from './figures.js';
import { writeVerdict, type Component } from './rounding.js';

/** The value counts as converged when the way back ends this near the start. */
const WAY_BACK = 1e-11;
function stepText(step: PathStep, before: PathStep | undefined): string {
  const value =
    `α_s = ${indicative(step.alpha, 6)}` + (step.mass === undefined ? '' : `, m = ${indicative(step.mass, 6)} GeV`);
  const where = `${scaleText(step.scale)} GeV, n_f = ${step.flavours}`;
  if (step.action === 'match') {
    return `${step.threshold ?? ''} threshold at ${scaleText(step.scale)} GeV, n_f ${before?.flavours ?? ''} → ${step.flavours}: ${value}`;
  }
  return `${step.action === 'start' ? 'start' : 'run to'} ${where}: ${value}`;
}

const plainStep = (step: PathStep, i: number, all: readonly PathStep[]): EvolveStep => ({
  action: step.action,
  scale: scaleText(step.scale),
  flavours: step.flavours,
  alpha: text(step.alpha),
  ...(step.mass === undefined ? {} : { mass: text(step.mass) }),
  text: stepText(step, all[i - 1]),
});

/** Does the evolution lead back to the start? */
function comesBack(setting: Setting, outcome: Outcome): boolean {
  const start = setting.mass ?? outcome.alphaFrom;
  const back = runOnce({
    ...setting,
    alpha: outcome.alpha,
    from: { scale: outcome.scale, flavours: setting.to.flavours },
    alphaAt: { scale: outcome.scale, flavours: setting.to.flavours },
    to: setting.from,
    ...(setting.mass === undefined ? {} : { mass: outcome.value }),
  });
  return !isRefusal(back) && Math.abs(back.value / start - 1) < WAY_BACK;
}

/** Λ at the two ends, with the error that α_s gives it. */
function lambdas(setting: Setting, outcome: Outcome, errors: readonly number[]): EvolveResult['lambda'] {
  const at = (o: Outcome, end: 'from' | 'to'): number | undefined => {
    const place = end === 'from' ? setting.from : { scale: o.scale, flavours: setting.to.flavours };
    const found = lambdaOf(end === 'from' ? o.alphaFrom : o.alpha, place.scale, {
      flavours: place.flavours,
      loops: setting.loops,
    });
    return isRefusal(found) ? undefined : found;
  };
  const varied = errors.flatMap((d) => {
    const o = runOnce({ ...setting, alpha: setting.alpha + d });
    return isRefusal(o) ? [] : [o];
  });
  const ends = setting.from.flavours === setting.to.flavours ? (['to'] as const) : (['from', 'to'] as const);
  return ends.flatMap((end) => {
    const central = at(outcome, end);
    if (central === undefined) return [];
    const error = Math.max(0, ...varied.map((o) => Math.abs((at(o, end) ?? central) - central)));
    return [
      {
        flavours: end === 'from' ? setting.from.flavours : setting.to.flavours,
        GeV: text(central),
        ...(error > 0 ? { error: indicative(error, 3) } : {}),
        definition: `${LAMBDA_DEFINITIONS.exact}, ${setting.loops} loops`,
      },
    ];
  });
}

/** The study behind `evolve`: a result, or a refusal with its remedy. */
export function evolveStudy(request: EvolveRequest): EvolveResult | Refused {
  const setting = settingOf(request);
  if (isRefusal(setting)) return setting;
  const outcome = runOnce(setting);
  if (isRefusal(outcome)) return outcome;
  const shifts = parametricShifts(request, setting, outcome.value);
  if (isRefusal(shifts)) return shifts;
  const less = setting.loops > 1 ? runOnce({ ...setting, loops: setting.loops - 1 }) : undefined;
  const spread = matchingSpread(setting, outcome);
  const components: Component[] = shifts.map((s) => ({ label: s.label, error: Math.max(s.plus, s.minus) }));
  if (less !== undefined && !isRefusal(less)) {
    components.push({ label: 'one loop less', error: Math.abs(less.value - outcome.value) });
  }
  if (spread !== undefined) components.push({ label: 'matching', error: spread.size });
  return {
    quantity: request.quantity,
    loops: setting.loops,
    from: { scale: scaleText(setting.from.scale), flavours: setting.from.flavours, value: request.value.text },
    to: { scale: scaleText(outcome.scale), flavours: setting.to.flavours },
    value: text(outcome.value),
    ...(request.quantity === 'mass' ? { unit: 'GeV' as const } : {}),
    digits: comesBack(setting, outcome) ? 'converged' : 'indicative',
    errors: shifts.map((s): EvolveError => ({
      label: s.label,
      plus: indicative(s.plus, 3),
      minus: indicative(s.minus, 3),
    })),
    ...(less === undefined || isRefusal(less)
      ? {}
      : {
          oneLoopLess: {
            loops: setting.loops - 1,
            value: text(less.value),
            shift: indicative(less.value - outcome.value, 3),
          },
        }),
    ...(spread === undefined
      ? {}
      : {
          matching: {
            spread: spread.spread,
            dominant: spread.dominant,
            parts: spread.parts,
            crossings: spread.crossings,
          },
        }),
    lambda: lambdas(setting, outcome, alphaErrors(request)),
    path: outcome.steps.map(plainStep),
    ...(outcome.approach.length > 0 ? { couplingPath: outcome.approach.map(plainStep) } : {}),
    printed: writeVerdict(
      text(outcome.value),
      components.filter((c) => c.error > 0),
    ),
  };
}
