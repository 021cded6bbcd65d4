/** @module Results that a command wrote with --json, read back. */
import { readFile } from 'node:fs/promises';
import { UsageError } from './faults.js';
import type { SavedResult } from '../pictures/index.js';

/** A JSON file may also be a series: YAML reads JSON. */
const isSeries = (value: unknown): boolean =>
  typeof value === 'object' && value !== null && 'coefficients' in value && !('leastterm' in value);

/**
 * The result in a file; undefined when the operand is no JSON file that can be read, or holds a series. A file that holds
 * something else is a mistake, and said to be one.
 */
export async function savedResult(operand: string, command: string): Promise<SavedResult | undefined> {
  if (!operand.endsWith('.json')) return undefined;
  const { pictures } = await import('./rooms-pictures.js');
  let value: unknown;
  try {
    value = JSON.parse(await readFile(operand, 'utf8'));
  } catch {
    return undefined;
  }
  if (pictures.isSavedResult(value)) return value;
  if (isSeries(value)) return undefined;
  throw new UsageError(
    `${operand} holds no result with the request behind it; wanted a file that assess, compare, extract or their like wrote with --json`,
    command,
  );
}

/**
 * What is drawn from saved results. One that lacks what its command writes now, written by another version or changed by
 * hand, is wrong input and no fault of the program.
 */
export function drawnFrom<T>(names: readonly string[], command: string, draw: () => T): T {
  try {
    return draw();
  } catch (error) {
    if (!(error instanceof TypeError) || names.length === 0) throw error;
    throw new UsageError(
      `${names.join(', ')}: not all that this version needs is in it; write it anew with --json, leastterm replay shows what moved`,
      command,
      { cause: error },
    );
  }
}
