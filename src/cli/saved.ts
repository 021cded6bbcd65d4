/** @module Results that a command wrote with --json, read back. */
import { readFile } from 'node:fs/promises';
import type { SavedResult } from '../pictures/index.js';

/** The result in a file; undefined when the operand is no readable JSON file with one in it. */
export async function savedResult(operand: string): Promise<SavedResult | undefined> {
  if (!operand.endsWith('.json')) return undefined;
  const { pictures } = await import('./rooms-pictures.js');
  try {
    const value: unknown = JSON.parse(await readFile(operand, 'utf8'));
    return pictures.isSavedResult(value) ? value : undefined;
  } catch {
    return undefined;
  }
}
