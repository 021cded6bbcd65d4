/** @module Two results of the same request, held against each other: what moved, by how much, and why it may have. */

export interface Difference {
  /** Where in the result, "values.2.value". */
  readonly path: string;
  readonly before?: string;
  readonly after?: string;
  /** |after − before|/|before| of numbers. */
  readonly relative?: number;
}

export interface Replay {
  readonly differences: readonly Difference[];
  /** Numbers that agree to the digits both have. */
  readonly sameDigits: number;
  readonly reasons: readonly string[];
}

const NUMBER = /^[-+]?\d+(\.\d+)?(e[-+]?\d+)?$/i;

/** Numbers shorter than this were rounded on purpose: they agree only when they are alike. */
const SHORT = 6;

/** What one unit of the last digit is, relative to the number; nothing for a short one. */
function accuracy(text: string): number {
  const digits = text.replace(/e.*$/i, '').replace(/[-+.]/g, '').replace(/^0+/, '').length;
  return digits < SHORT ? 0 : 10 ** -(digits - 1);
}

interface Found {
  readonly differences: Difference[];
  sameDigits: number;
}

const isObject = (value: unknown): value is Readonly<Record<string, unknown>> =>
  typeof value === 'object' && value !== null;

const words = (value: unknown): string | undefined =>
  typeof value === 'string' || value === undefined ? value : JSON.stringify(value);

function leaf(path: string, before: unknown, after: unknown, found: Found): void {
  if (before === after) return;
  const [a, b] = [before, after].map(words);
  if (a !== undefined && b !== undefined && NUMBER.test(a) && NUMBER.test(b)) {
    const relative = Math.abs(Number(b) - Number(a)) / Math.abs(Number(a));
    if (
      relative <= Math.min(accuracy(a), accuracy(b)) ||
      (relative <= Math.max(accuracy(a), accuracy(b)) && a.length !== b.length)
    ) {
      found.sameDigits++;
      return;
    }
    found.differences.push({ path, before: a, after: b, relative });
  } else
    found.differences.push({
      path,
      ...(a === undefined ? {} : { before: a }),
      ...(b === undefined ? {} : { after: b }),
    });
}

function walk(path: string, before: unknown, after: unknown, found: Found): void {
  if (!isObject(before) || !isObject(after)) {
    if (isObject(before) !== isObject(after)) {
      const text = (value: unknown): string | undefined => (isObject(value) ? '(group)' : words(value));
      leaf(path, text(before), text(after), found);
    } else leaf(path, before, after, found);
    return;
  }
  for (const key of new Set([...Object.keys(before), ...Object.keys(after)]))
    walk(path === '' ? key : `${path}.${key}`, before[key], after[key], found);
}

/** Parts that are no outcome: they explain a change, and are not one. */
const EXPLAINING = /^(leastterm|request|series)(\.|$)/;

/** What moved between a saved result and the same request carried out now. */
export function compareResults(before: object, after: object): Replay {
  const found: Found = { differences: [], sameDigits: 0 };
  walk('', before, after, found);
  const explaining = found.differences.filter(({ path }) => EXPLAINING.test(path));
  const differences = found.differences.filter(({ path }) => !EXPLAINING.test(path));
  const reasons = explaining.map(({ path, before: a, after: b }) => {
    if (path === 'leastterm') return `another version of the program: ${a ?? '?'} then, ${b ?? '?'} now`;
    if (path.startsWith('series')) return `the series has changed: ${path} was ${a ?? 'absent'}, is ${b ?? 'absent'}`;
    return `the request is read differently: ${path} was ${a ?? 'absent'}, is ${b ?? 'absent'}`;
  });
  const coefficients = differences.some(({ path }) => /^terms\.\d+\.coefficient/.test(path));
  if (coefficients) reasons.push('coefficients of the series have changed');
  const couplings = differences.some(({ path }) => path === 'coupling.value' || path === 'coupling.x');
  if (couplings) reasons.push('the coupling has another value');
  if (differences.length > 0 && reasons.length === 0)
    reasons.push('same version, same series, same request: the difference has no known cause and is worth a report');
  return { differences, sameDigits: found.sameDigits, reasons };
}
