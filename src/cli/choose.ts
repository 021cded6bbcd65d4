/** @module --only, --except and --family: which prescriptions to run. */
import type { Given } from './command.js';
import { UsageError } from './faults.js';

/** Names joined by commas, or given by repeating the option. */
const split = (list: readonly string[] | undefined): string[] =>
  (list ?? []).flatMap((text) => text.split(',').map((name) => name.trim())).filter((name) => name !== '');

async function checked(
  option: string,
  what: string,
  list: readonly string[] | undefined,
  known: readonly string[],
  command: string,
): Promise<string[] | undefined> {
  if (list === undefined) return undefined;
  const { series } = await import('./rooms.js');
  const names = split(list);
  const wrong = names.find((name) => !known.includes(name));
  if (wrong !== undefined || names.length === 0)
    throw new UsageError(
      `--${option}: no ${what} "${wrong ?? ''}"${wrong === undefined ? '' : series.suggestion(wrong, known)}; wanted one of ${known.join(', ')}`,
      command,
    );
  return names;
}

/** Names of the prescriptions chosen, in the order of the list; undefined when nothing narrows it. */
export async function chosenPrescriptions(given: Given, command: string): Promise<readonly string[] | undefined> {
  const { prescriptions } = await import('./rooms.js');
  const all = [
    ...prescriptions.PRESCRIPTIONS,
    ...Object.values(prescriptions.CONTOUR_NAMES),
    prescriptions.BUBBLE_CHAIN,
  ];
  const names = all.map((p) => p.name);
  const families = [...new Set(all.map((p) => p.family))];
  const only = await checked('only', 'prescription', given.only, names, command);
  const except = await checked('except', 'prescription', given.except, names, command);
  const family = await checked('family', 'family', given.family, [...new Set([...families, 'scale'])], command);
  if (only === undefined && except === undefined && family === undefined) return undefined;
  const left = all.filter(
    (p) =>
      only?.includes(p.name) !== false && except?.includes(p.name) !== true && family?.includes(p.family) !== false,
  );
  if (left.length === 0)
    throw new UsageError(
      '--only, --except and --family together leave no prescription; take one of them away',
      command,
    );
  return left.map((p) => p.name);
}
