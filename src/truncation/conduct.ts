/** @module How the sizes of the known terms behave: what models that live on falling terms have to ask first. */
import { leastIndex, type Known } from './known.js';
import { refuse, tooFew, type TruncationRefusal } from './model.js';

/** Index of the last non-zero term. */
export const lastNonZero = (known: Known): number => known.logs.findLastIndex((l) => l > -Infinity);

/** ln of the last term over the one before it; undefined when either is zero or there is only one. */
export function lastLogRatio(known: Known): number | undefined {
  const last = known.logs.at(-1) ?? -Infinity;
  const before = known.logs.at(-2) ?? -Infinity;
  return last > -Infinity && before > -Infinity ? last - before : undefined;
}

/** Refusal of what reads a size off a last coefficient that is exactly zero. */
export function endsWithZero(known: Known): TruncationRefusal | undefined {
  if ((known.logs.at(-1) ?? 0) > -Infinity) return undefined;
  return refuse(
    'the last known coefficient is exactly zero: no size can be read off it',
    'cut the series before the zero with --order; if the series ends there, its sum has no truncation error',
  );
}

/** The last term and the ratio to the one before it, with ln|ratio|; a refusal where there is none. */
export function lastStep(
  known: Known,
): { readonly term: number; readonly ratio: number; readonly logRatio: number } | TruncationRefusal {
  const refused = tooFew(known, 2, 'there is no ratio') ?? endsWithZero(known);
  if (refused !== undefined) return refused;
  const logRatio = lastLogRatio(known);
  if (logRatio === undefined)
    return refuse('the term before the last one is zero: there is no ratio', 'use the last term');
  const term = known.values.at(-1) ?? 0;
  return { term, ratio: Math.exp(logRatio) * Math.sign(term * (known.values.at(-2) ?? 0)), logRatio };
}

/**
 * Refusal where the terms do not fall: the last is as large as the first, or the last two steps both grow. One step that
 * grows may be an accident of a small coefficient.
 */
export function doesNotFall(known: Known, assumes: string): TruncationRefusal | undefined {
  const sizes = known.logs.filter((l) => l > -Infinity);
  const [last, before, third] = [sizes.at(-1) ?? 0, sizes.at(-2), sizes.at(-3)];
  const [first = 0] = sizes;
  const rising = before !== undefined && last >= before;
  const twice = rising && (third === undefined || before >= third);
  if (!twice && !(sizes.length > 1 && last >= first)) return undefined;
  const least = known.orders[leastIndex(known)] ?? 0;
  return refuse(
    `the terms do not fall any more (smallest at order ${least}): the model assumes ${assumes}`,
    'cut the series at its least term with --order, or take a smaller coupling',
  );
}

/** A word where the last step alone grows. */
export function lastStepNote(known: Known): string[] {
  const ratio = lastLogRatio(known);
  return ratio !== undefined && ratio >= 0 ? ['the last term is larger than the one before it'] : [];
}
