/** @module What the room answers when a question has no trustworthy number: why, and what to do about it. */

export interface Refusal {
  readonly reason: string;
  readonly remedy: string;
}

/** Tells a refusal from a result (a number, or any result object without the member `reason`). */
export function isRefusal(x: unknown): x is Refusal {
  return typeof x === 'object' && x !== null && 'reason' in x && 'remedy' in x;
}

export const refuse = (reason: string, remedy: string): Refusal => ({ reason, remedy });
