/**
 * @module What shifts several predictions at once.
 *
 * One series that serves several data shifts them together; different series are independent in coefficients, truncation and
 * ambiguity. The renormalisation scale, α_s, the thresholds and the condensates are common to all.
 */
import { isRefusal } from '../../qcd/index.js';
import type { Refusal } from '../../qcd/index.js';
import type { ComponentName } from '../budget.js';
import { coefficientCauses, inputCauses, powerCauses, remainderCause, scaleCause } from '../causes.js';
import type { Cause } from '../causes.js';
import type { FitModel, ShiftsOf } from './model.js';

export interface FitCause {
  readonly component: ComponentName;
  readonly label: string;
  readonly variations: readonly { readonly cause: string; readonly shifts: ShiftsOf }[];
}

/** What truncation and ambiguity leave open of each datum's R, around its sum. */
export interface OpenBand {
  readonly low: number;
  readonly high: number;
}
export interface OpenBands {
  readonly truncation: readonly (OpenBand | Refusal)[];
  readonly ambiguity: readonly (OpenBand | Refusal)[];
}

/** The cause for those data that it moves; its words are prefixed by the series it belongs to. */
function among(cause: Cause, moves: (datum: number) => boolean, prefix = ''): FitCause {
  return {
    component: cause.component,
    label: `${prefix}${cause.label}`,
    variations: cause.variations.map((v) => ({
      cause: `${prefix}${v.cause}`,
      shifts: (i) => (moves(i) ? v.shifts : {}),
    })),
  };
}

/** Each datum of a series by its own band, all of them together. */
function openCause(name: 'truncation' | 'ambiguity', id: string, bands: readonly (OpenBand | undefined)[]): FitCause {
  const side = (which: 'low' | 'high'): ShiftsOf => {
    const value = (i: number): number => bands[i]?.[which] ?? 0;
    return (i) => (value(i) === 0 ? {} : { remainder: value(i) });
  };
  const model = remainderCause(name, name, -1, 1);
  return {
    component: name,
    label: `${id}: ${name}`,
    variations: [
      { cause: `${id}: ${model.variations[0]?.cause ?? ''}`, shifts: side('high') },
      { cause: `${id}: ${model.variations[1]?.cause ?? ''}`, shifts: side('low') },
    ],
  };
}

/** All causes of a fit, each once. */
export function fitCauses({ settings, problem }: FitModel, bands: OpenBands): readonly FitCause[] {
  const ids = settings.map((s) => s.stages.series.id);
  const crossed = new Set(problem.thresholds.map((t) => t.name));
  const list: FitCause[] = [];
  const everywhere = new Set<string>();
  settings.forEach(({ datum, stages, terms }, i) => {
    const id = ids[i] ?? '';
    for (const c of [...inputCauses(problem, datum, crossed), ...powerCauses(terms)]) {
      if (c.label === 'norm') {
        list.push(among(c, (k) => k === i, `${id}: `));
      } else if (!everywhere.has(c.label)) {
        everywhere.add(c.label);
        list.push(among(c, () => true));
      }
    }
    if (ids.indexOf(id) !== i) return;
    const own = (k: number): boolean => ids[k] === id;
    for (const c of coefficientCauses(stages)) list.push(among(c, own, `${id}: `));
    for (const name of ['truncation', 'ambiguity'] as const) {
      const known = bands[name].map((b, k) => (own(k) && !isRefusal(b) ? b : undefined));
      if (known.some((b) => b !== undefined)) list.push(openCause(name, id, known));
    }
  });
  return [...list, among(scaleCause, () => true)];
}
