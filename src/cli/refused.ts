/** @module A refusal of a study as a complaint about the command line: what is wrong, and the remedy. */
import { UsageError } from './faults.js';

interface Refused {
  readonly reason: string;
  readonly remedy: string;
}

/** The result, when it is one. */
export function accepted<T extends object>(result: T | Refused, command: string): T {
  if ('reason' in result && 'remedy' in result) {
    throw new UsageError(`${result.reason}; remedy: ${result.remedy}`, command);
  }
  return result;
}
