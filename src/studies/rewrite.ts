/**
 * @module rewrite: a series at another scale, in another coupling, with other flavours in the coupling, in another mass.
 * The result is a series that says where it came from; exact where the input is exact, errors and correlations carried.
 */
import type { Exact, Rational } from '../numerics/index.js';
import { DEFAULT_THRESHOLDS, isRefusal, refuse } from '../qcd/index.js';
import type { MassDefinition, Refusal, Threshold } from '../qcd/index.js';
import { textOf } from '../series/index.js';
import type { Series } from '../series/index.js';
import { writtenList } from './derive/coefficients.js';
import { toCoupling } from './rewriting/coupling.js';
import { toFlavours } from './rewriting/flavours.js';
import { toMass } from './rewriting/mass.js';
import type { FindSeries } from './rewriting/relations.js';
import { hasBeta, toScale } from './rewriting/scale.js';
import { openState } from './rewriting/state.js';
import type { State } from './rewriting/state.js';
import { MASS_WORDS, massDefinition, schemeText, schemeWords } from './scheme.js';
import type { CouplingScheme } from './scheme.js';
import { VERSION } from './version.js';

export interface RewriteRequest {
  /** New μ/Q. */
  readonly scale?: Exact;
  readonly coupling?: CouplingScheme;
  /** New number of active flavours of the coupling. */
  readonly flavours?: number;
  readonly mass?: {
    readonly to: MassDefinition;
    /** p of a quantity proportional to m^p. */
    readonly power: Rational;
    /** The mass the series is in; default: as its scheme says. */
    readonly from?: MassDefinition;
    readonly heavyInCoupling?: boolean;
    readonly hardScale?: 'pole' | 'msbar';
  };
  /** The quarks that can be crossed; default c, b, t with their published masses. */
  readonly thresholds?: readonly Threshold[];
  /** Finds the series that defines a coupling. */
  readonly find: FindSeries;
}

type AsyncStep = (state: State) => Promise<State | Refusal> | State | Refusal;

/** Takes a step in MSbar and comes back to the coupling of the state. */
async function throughMSbar(state: State, find: FindSeries, step: AsyncStep): Promise<State | Refusal> {
  const { scheme } = state;
  if (scheme.kind === 'toy') {
    return refuse(
      `"${schemeText(scheme)}" is a world of its own: it has no quarks to decouple and no other couplings`,
      'change its scale only',
    );
  }
  const inMSbar = await toCoupling(state, { kind: 'MSbar' }, find);
  if (isRefusal(inMSbar)) return inMSbar;
  const after = await step(inMSbar);
  return isRefusal(after) ? after : toCoupling(after, scheme, find);
}

function steps(request: RewriteRequest): AsyncStep[] {
  const { scale, coupling, flavours, mass, thresholds = DEFAULT_THRESHOLDS, find } = request;
  const list: AsyncStep[] = [];
  // To MSbar first and from it last: between them stands what is known best there.
  if (coupling?.kind === 'MSbar') list.push((s) => toCoupling(s, coupling, find));
  if (mass !== undefined) {
    const { to, power, heavyInCoupling = false, hardScale = 'msbar' } = mass;
    const change = { to, power, heavyInCoupling, hardScale };
    list.push((s) => throughMSbar(s, find, (t) => toMass(t, change)));
  }
  if (scale !== undefined) {
    list.push((s) => (hasBeta(s.scheme) ? toScale(s, scale) : throughMSbar(s, find, (t) => toScale(t, scale))));
  }
  if (flavours !== undefined) list.push((s) => throughMSbar(s, find, (t) => toFlavours(t, flavours, thresholds)));
  if (coupling !== undefined && coupling.kind !== 'MSbar') list.push((s) => toCoupling(s, coupling, find));
  return list;
}

/** What was asked, in a few words for the title. */
function titleOf(series: Series, state: State, request: RewriteRequest): string {
  const parts = [
    request.coupling === undefined ? '' : schemeText(state.scheme),
    request.mass === undefined || state.mass === undefined ? '' : MASS_WORDS[state.mass],
    request.scale === undefined ? '' : `mu/Q = ${state.scaleRatio === undefined ? '' : textOf(state.scaleRatio)}`,
    request.flavours === undefined ? '' : `nf = ${state.flavours}`,
  ].filter((part) => part !== '');
  // A series that was rewritten before says so in its title already; only the last state counts.
  return `${series.title.replace(/ \[[^[\]]*\]$/, '')} [${parts.join(', ')}]`;
}

/** Plain decimals without an error are exact to the arithmetic and rounded to the physicist. */
function roundingNote(series: Series): string[] {
  const short = series.coefficients.filter((c) => c.error === undefined && c.significantDigits !== undefined);
  if (short.length === 0) return [];
  return [
    'Coefficients written as decimals without an error were taken as exact: the digits of the new ones beyond theirs carry no information.',
  ];
}

/** The series at the end of the way. */
function closed(state: State, request: RewriteRequest): Series {
  const { series } = state;
  const { correlation: _correlation, measurement, scaleRatio: _ratio, ...rest } = series;
  const { coefficients, correlation } = writtenList(state.coefficients, state.sources);
  const where = `Rewritten by leastterm ${VERSION} from ${series.id}.`;
  const notes = [...series.notes, where, ...state.notes, ...roundingNote(series)];
  return {
    ...rest,
    title: titleOf(series, state, request),
    notes: notes.filter((note, i) => notes.indexOf(note) === i),
    scheme: schemeWords(state.scheme, state.mass),
    flavours: state.flavours,
    ...(state.scaleRatio === undefined ? {} : { scaleRatio: state.scaleRatio }),
    firstPower: state.firstPower,
    coefficients,
    ...(correlation === undefined ? {} : { correlation }),
    singularities: state.singularities,
    ...(measurement === undefined || state.otherQuantity ? {} : { measurement }),
  };
}

/** The rewritten series, or why it cannot be had. */
export async function rewriteStudy(series: Series, request: RewriteRequest): Promise<Series | Refusal> {
  let state = await openState(series, request.mass?.from ?? massDefinition(series));
  for (const step of steps(request)) {
    if (isRefusal(state)) return state;
    state = await step(state);
  }
  return isRefusal(state) ? state : closed(state, request);
}
