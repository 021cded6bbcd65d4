/** @module The prescription of series that name a bubble chain, loaded when one does; beside those of contour quantities. */
import { contourExtras } from './contour-extras.js';
import type { Extras } from './contour-extras.js';
import { UsageError } from './faults.js';
import type { Series } from '../series/index.js';

/** Prescriptions for a series: the chosen names that apply to it, and those that have to be loaded. */
export async function seriesExtras(
  series: Series,
  by: readonly string[] | undefined,
  command: string,
): Promise<Extras> {
  const { prescriptions, series: reader } = await import('./rooms.js');
  const { name } = prescriptions.BUBBLE_CHAIN;
  const others = by?.filter((other) => other !== name);
  if (series.bubbleChain === undefined) {
    if (by !== undefined && others?.length === 0) {
      throw new UsageError(
        `${name}: ${series.id} names no bubble chain; write "bubble chain: adler" or the like into its file`,
        command,
      );
    }
    return contourExtras(series, others, command);
  }
  const rest = others?.length === 0 ? { by: [] } : await contourExtras(series, others, command);
  if (by !== undefined && others?.length === by.length) return rest;
  const { bubbles } = await import('./rooms-more.js');
  if (bubbles.quantityNamed(series.bubbleChain) === undefined) {
    const near = reader.suggestion(series.bubbleChain, bubbles.QUANTITY_NAMES);
    throw new UsageError(
      `${series.id}: bubble chain: no quantity "${series.bubbleChain}"${near}; wanted one of ${bubbles.QUANTITY_NAMES.join(', ')}`,
      command,
    );
  }
  return {
    ...rest,
    more: [...(rest.more ?? []), prescriptions.bubbleChain(bubbles)],
    ...(by === undefined ? {} : { by }),
  };
}
