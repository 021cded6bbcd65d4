/** @module The errors of an evolution: shifted inputs, shifted thresholds. */
import { INPUTS, crossingScale, isRefusal, refuse, type Threshold } from '../qcd/index.js';
import type { Uncertain } from '../series/index.js';
import type { Refused } from './assessment.js';
import { runOnce, type Outcome, type Setting } from './evolve-run.js';
import { indicative } from './figures.js';
import type { EvolveRequest, EvolveResult } from './evolve-types.js';

/** Digits of a result in doubles that is good to 1e-14 or so. */
const DIGITS = 12;
/** Crossing scales of the matching spread, in units of the chosen ones. */
const FACTORS = [0.5, 2] as const;
/** No threshold is crossed below this scale in GeV: a custom, since the truncated running means little there. */
export const LOWEST_CROSSING = 1;

/** Shift of the value up and down, from two changed settings. */
export interface Shift {
  readonly label: string;
  readonly plus: number;
  readonly minus: number;
}

export const text = (x: number): string => String(Number(x.toPrecision(DIGITS)));
export const scaleText = (x: number): string => String(Number(x.toPrecision(6)));

/** The shift between the ends of an error; undefined without an error, a refusal where an end cannot be evolved. */
function shiftBetween(
  label: string,
  central: number,
  outcomes: readonly (Outcome | Refused)[],
): Shift | Refused | undefined {
  const lost = outcomes.find(isRefusal);
  if (lost !== undefined)
    return refuse(
      `the error of ${label} reaches values that cannot be evolved: ${lost.reason}`,
      'give a smaller error, or the value without one',
    );
  const moves = outcomes.flatMap((o) => (isRefusal(o) ? [] : [o.value - central]));
  if (moves.length === 0) return undefined;
  return { label, plus: Math.max(0, ...moves), minus: Math.max(0, ...moves.map((x) => -x)) };
}

/** Standard deviations of an uncertain input, up and down. */
function sigmas(u: Uncertain | undefined): readonly number[] {
  const error = u?.error;
  if (error === undefined) return [];
  return [error.plus.toNumber(), -error.minus.toNumber()].filter((x) => x !== 0);
}

/** Shifts of α_s by its errors: those of the request, or of the world average behind a mass. */
export function alphaErrors(request: EvolveRequest): readonly number[] {
  if (request.quantity === 'alpha_s') return sigmas(request.value);
  if (request.alphaS !== undefined) return sigmas(request.alphaS.value);
  return [Number(INPUTS.alphaSMZ.error[0]), -Number(INPUTS.alphaSMZ.error[1])];
}

/** Shifts from the errors of the inputs; a refusal where one of them leaves the range of the evolution. */
export function parametricShifts(
  request: EvolveRequest,
  setting: Setting,
  central: number,
): readonly Shift[] | Refused {
  const shifts: (Shift | Refused | undefined)[] = [];
  const { mass } = setting;
  if (mass !== undefined) {
    const varied = sigmas(request.value).map((d) => runOnce({ ...setting, mass: mass + d }));
    shifts.push(shiftBetween('mass', central, varied));
  }
  const varied = alphaErrors(request).map((d) => runOnce({ ...setting, alpha: setting.alpha + d }));
  shifts.push(shiftBetween('α_s', central, varied));
  shifts.push(thresholdMasses(setting, central));
  const lost = shifts.find((s) => s !== undefined && isRefusal(s));
  return lost !== undefined && isRefusal(lost)
    ? lost
    : shifts.filter((s): s is Shift => s !== undefined && !isRefusal(s));
}

/** Errors of the threshold masses, in quadrature; the crossing scale moves along with its mass. */
function thresholdMasses(setting: Setting, central: number): Shift | undefined {
  let square = 0;
  for (const t of setting.thresholds) {
    if (t.error === undefined) continue;
    const factor = 1 + t.error / t.mass;
    const heavier: Threshold = { ...t, mass: t.mass * factor, scale: crossingScale(t) * factor };
    const moved = runOnce({ ...setting, thresholds: setting.thresholds.map((u) => (u === t ? heavier : u)) });
    if (!isRefusal(moved)) square += (moved.value - central) ** 2;
  }
  const size = Math.sqrt(square);
  return size > 0 ? { label: 'quark masses', plus: size, minus: size } : undefined;
}

/** Crosses each threshold of the path at other scales. */
export function matchingSpread(
  setting: Setting,
  outcome: Outcome,
): (NonNullable<EvolveResult['matching']> & { readonly size: number }) | undefined {
  const crossed = setting.thresholds.filter((t) =>
    [...outcome.approach, ...outcome.steps].some((s) => s.threshold === t.name),
  );
  if (crossed.length === 0) return undefined;
  const parts: { threshold: string; size: number }[] = [];
  const crossings = crossed.flatMap((t) => {
    let largest = 0;
    const rows = FACTORS.map((wanted) => {
      const here = crossingScale(t);
      const scale = Math.max(here * wanted, Math.min(here, LOWEST_CROSSING));
      const factor = scale / here;
      const other: Threshold = { ...t, scale };
      const moved = runOnce({ ...setting, thresholds: setting.thresholds.map((u) => (u === t ? other : u)) });
      const row = {
        threshold: t.name,
        factor: String(Number(factor.toPrecision(3))),
        ...(factor > wanted ? { limited: true } : {}),
      };
      if (isRefusal(moved)) return { ...row, refused: moved };
      largest = Math.max(largest, Math.abs(moved.value - outcome.value));
      return { ...row, value: text(moved.value) };
    });
    parts.push({ threshold: t.name, size: largest });
    return rows;
  });
  const size = Math.hypot(...parts.map((p) => p.size));
  const dominant = parts.reduce((a, b) => (b.size > a.size ? b : a)).threshold;
  return {
    size,
    spread: indicative(size, 3),
    dominant,
    parts: parts.map((p) => ({ threshold: p.threshold, spread: indicative(p.size, 3) })),
    crossings,
  };
}
