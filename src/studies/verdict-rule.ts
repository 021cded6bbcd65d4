/** @module The rules that may make the verdict, by name. docs/verdict.md says what each does. */
import { PRESCRIPTIONS } from '../prescriptions/index.js';

export type VerdictRule =
  { readonly kind: 'ladder' | 'fixed-order' | 'least-term' } | { readonly kind: 'prescription'; readonly name: string };

export const LADDER: VerdictRule = { kind: 'ladder' };

const PREFIX = 'prescription:';
const PLAIN = ['ladder', 'fixed-order', 'least-term'] as const;

/** Every rule that can be asked for. */
export const verdictRules = (): string[] => [...PLAIN, ...PRESCRIPTIONS.map(({ name }) => PREFIX + name)];

/** The rule of that name; undefined for an unknown one. */
export function verdictRule(text: string): VerdictRule | undefined {
  const kind = PLAIN.find((name) => name === text);
  if (kind !== undefined) return { kind };
  const name = text.startsWith(PREFIX) ? text.slice(PREFIX.length) : undefined;
  return name !== undefined && PRESCRIPTIONS.some((p) => p.name === name) ? { kind: 'prescription', name } : undefined;
}

export const ruleName = (rule: VerdictRule): string => (rule.kind === 'prescription' ? PREFIX + rule.name : rule.kind);
