/** @module The prescriptions that a contour quantity has beside the usual ones: chosen by name, loaded when needed. */
import { UsageError } from './faults.js';
import type { Prescription } from '../prescriptions/index.js';
import type { Series } from '../series/index.js';

export interface Extras {
  readonly by?: readonly string[];
  readonly more?: readonly Prescription[];
}

/** Prescriptions for a series: the chosen names that apply to it, and those that have to be loaded. */
export async function contourExtras(
  series: Series,
  by: readonly string[] | undefined,
  command: string,
): Promise<Extras> {
  const { prescriptions } = await import('./rooms.js');
  const names = Object.values(prescriptions.CONTOUR_NAMES).map((facts) => facts.name);
  if (series.contour !== undefined) {
    const { contour } = await import('./rooms-more.js');
    const more = prescriptions.contourPrescriptions(contour);
    return { more, ...(by === undefined ? {} : { by }) };
  }
  if (by === undefined) return {};
  const left = by.filter((name) => !names.includes(name));
  if (left.length === 0)
    throw new UsageError(
      `${by.join(', ')}: only for contour quantities, and ${series.id} is none; use a series of kind contour, such as tau-contour`,
      command,
    );
  return { by: left };
}
