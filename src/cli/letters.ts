/** @module Whether the surroundings show more than ASCII: the locale says so, or a terminal that calls itself dumb. */

import type { Surroundings } from './surroundings.js';

/** The locale that decides about letters, by the order of POSIX. */
const localeOf = (environment: Readonly<Record<string, string | undefined>>): string =>
  [environment['LC_ALL'], environment['LC_CTYPE'], environment['LANG']].find(
    (text) => text !== undefined && text !== '',
  ) ?? '';

/** Locales without a word about their letters are taken to know all of them: nothing else is in use. */
export function asciiOnly(environment: Readonly<Record<string, string | undefined>>): boolean {
  if (environment['TERM'] === 'dumb') return true;
  const locale = localeOf(environment);
  if (/^(C|POSIX)$/i.test(locale)) return true;
  const [, letters] = locale.split('.');
  return letters !== undefined && !/^utf-?8(@|$)/i.test(letters);
}

/** A text as these surroundings can show it. */
export async function plainText(text: string, { environment }: Pick<Surroundings, 'environment'>): Promise<string> {
  if (!asciiOnly(environment)) return text;
  const { asciiOf } = await import('./rooms-core.js');
  return asciiOf(text);
}
