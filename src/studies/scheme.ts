/**
 * @module The renormalisation scheme that a series file names: which coupling it is, how that runs, and the mass it is in.
 * A scheme is read from the file's words, never guessed.
 */
import { Rational, divExact, exact } from '../numerics/index.js';
import type { Exact } from '../numerics/index.js';
import { MAX_LOOPS, refuse } from '../qcd/index.js';
import type { MassDefinition, Refusal } from '../qcd/index.js';
import type { Series } from '../series/index.js';

export type CouplingScheme =
  | { readonly kind: 'MSbar' }
  | { readonly kind: 'C'; readonly c: Rational }
  | { readonly kind: 'V' }
  | { readonly kind: 'mini-MOM' }
  /** Defined by another series: the value of that series, normalised to x + …. */
  | { readonly kind: 'series'; readonly name: string }
  /** A world in which the beta function ends after so many loops. */
  | { readonly kind: 'toy'; readonly loops: number };

const WORDS: readonly (readonly [RegExp, (m: RegExpExecArray) => CouplingScheme | undefined])[] = [
  [
    /\b(one|two|three|four|five)-loop running only\b/,
    (m) => ({ kind: 'toy', loops: LOOP_WORDS.indexOf(m[1] ?? '') + 1 }),
  ],
  [/^coupling defined by ([^;]+)/, (m) => ({ kind: 'series', name: (m[1] ?? '').trim() })],
  [/^C-scheme, C = ([-+]?[\d./]+)/, (m) => cScheme(m[1] ?? '')],
  [/^V scheme\b/, () => ({ kind: 'V' })],
  [/^mini-MOM\b/i, () => ({ kind: 'mini-MOM' })],
  [/^MSbar\b/, () => ({ kind: 'MSbar' })],
];

const LOOP_WORDS = ['one', 'two', 'three', 'four', 'five'];

/** "four-loop running only". */
export const loopWords = (loops: number): string => `${LOOP_WORDS[loops - 1]}-loop running only`;

function cScheme(text: string): CouplingScheme | undefined {
  const c = Rational.parse(text);
  return c && { kind: 'C', c };
}

export const SCHEME_WORDS =
  '"MSbar", "C-scheme, C = 0", "V scheme", "mini-MOM", "coupling defined by SERIES" or "one-loop running only"';

/** The words of a scheme, as a file has them. */
export function schemeText(scheme: CouplingScheme): string {
  switch (scheme.kind) {
    case 'C':
      return `C-scheme, C = ${scheme.c.toString()}`;
    case 'V':
      return 'V scheme';
    case 'series':
      return `coupling defined by ${scheme.name}`;
    case 'toy':
      return `toy, ${loopWords(scheme.loops)}`;
    case 'MSbar':
    case 'mini-MOM':
      return scheme.kind;
  }
}

export const sameScheme = (a: CouplingScheme, b: CouplingScheme): boolean => schemeText(a) === schemeText(b);

/** The coupling of a series; a refusal when the file does not say, or says what is not known here. */
export function couplingScheme(series: Series): CouplingScheme | Refusal {
  if (series.coupling.plain) {
    return refuse(
      `${series.id} is a series in the plain variable ${series.coupling.name}: it has no scale, scheme or flavours`,
      'write "coupling: { name: alpha_s, divisor: pi }" with scheme and flavours into its file',
    );
  }
  const text = series.scheme;
  if (text === undefined) {
    return refuse(`${series.id} does not say its scheme`, `write scheme: into its file: ${SCHEME_WORDS}`);
  }
  for (const [pattern, make] of WORDS) {
    const m = pattern.exec(text);
    const found = m === null ? undefined : make(m);
    if (found !== undefined) return found;
  }
  return refuse(`the scheme "${text}" of ${series.id} is not known`, `a scheme that begins with ${SCHEME_WORDS}`);
}

const MASSES: readonly (readonly [RegExp, MassDefinition])[] = [
  [/\bpole mass\b/, 'pole'],
  [/\brunning mass\b/, 'running'],
  [/\bMSbar mass\b/, 'msbar'],
];

/** The words of a mass definition. */
export const MASS_WORDS: Readonly<Record<MassDefinition, string>> = {
  pole: 'pole mass',
  msbar: 'MSbar mass m(m)',
  running: 'running mass m(mu)',
};

/** The mass that the file's scheme names, when it names one (several masses are no one's to change). */
export const massDefinition = (series: Series): MassDefinition | undefined =>
  MASSES.find(([pattern]) => pattern.test(series.scheme ?? ''))?.[1];

/** The file's words for a coupling and the mass, if any, that stands in front. */
export function schemeWords(scheme: CouplingScheme, mass: MassDefinition | undefined): string {
  if (mass === undefined) return schemeText(scheme);
  const coupling = scheme.kind === 'MSbar' ? 'MSbar coupling' : schemeText(scheme);
  return `${coupling}; ${MASS_WORDS[mass]}`;
}

/** Number of flavours; a refusal when the file does not say. */
export function flavoursOf(series: Series): number | Refusal {
  return (
    series.flavours ??
    refuse(`${series.id} does not say its number of flavours`, 'write "flavours: 3" into its file, or give --flavours')
  );
}

/** μ/Q; a refusal when the file does not say. */
export function scaleRatioOf(series: Series): Exact | Refusal {
  return (
    series.scaleRatio ??
    refuse(`${series.id} does not say its renormalisation scale`, 'write "scale ratio: 1" (mu over Q) into its file')
  );
}

/** Q in GeV, exactly; a refusal when the file does not say. */
export function hardScaleOf(series: Series): Exact | Refusal {
  const { hardScale } = series;
  if (hardScale === undefined) {
    return refuse(
      `${series.id} has no hard scale: it does not say at which Q it stands`,
      `write "hard scale: 1.777 GeV" into its file; of a catalogue series into a copy, made by: leastterm catalogue show ${series.id} -q -o copy.yaml`,
    );
  }
  return hardScale.unit === 'GeV' ? hardScale.value : divExact(hardScale.value, exact(1000));
}

/** Loops of the beta function that a scheme knows: all that are known for QCD, fewer in a toy world. */
export const knownLoops = (scheme: CouplingScheme): number => (scheme.kind === 'toy' ? scheme.loops : MAX_LOOPS);

/** Λ_MSbar and its β function belong to an MSbar coupling; a file that names no scheme is taken as MSbar. */
export const isMSbar = (series: Series): boolean => series.scheme === undefined || /^ms-?bar/i.test(series.scheme);
