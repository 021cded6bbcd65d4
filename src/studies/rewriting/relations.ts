/** @module Couplings as power series in the MSbar coupling of the same n_f at the same scale, with the errors of the relations. */
import { exact, Rational, toNumberExact } from '../../numerics/index.js';
import {
  MINIMOM,
  POTENTIAL,
  formalAt,
  isRefusal,
  minimomRelation,
  mulFormal,
  numberOfFormal,
  overFourPiNumber,
  potentialRelation,
  refuse,
  relationOfBetas,
  reversion,
  type PublishedConstant,
  type Refusal,
} from '../../qcd/index.js';
import type { Series } from '../../series/index.js';
import { inFileNames } from '../derive/symbols.js';
import { derive, trackedExact, trackedRational } from '../derive/tracked.js';
import type { Tracked } from '../derive/tracked.js';
import { couplingScheme, schemeText } from '../scheme.js';
import type { CouplingScheme } from '../scheme.js';
import { divisorQuotient, trackedBeta, trackedCBeta, unitPower } from './beta.js';
import { trackedCoefficients } from './state.js';
import type { State } from './state.js';

/** What a relation depends on. */
export type Place = Pick<State, 'flavours' | 'divisor' | 'sources'>;

/** Terms that the five-loop beta function fixes. */
const C_SCHEME_TERMS = 5;

/** x in powers of the C-scheme coupling. */
function cRelation(c: Rational, { flavours, divisor }: Place): Tracked[] {
  const n = C_SCHEME_TERMS;
  const inputs = [trackedRational(c), ...trackedBeta(flavours, divisor, n), ...trackedCBeta(flavours, divisor, n)];
  return derive(
    inputs,
    (ring, [shift, ...b]) => {
      const second = ring.mul(b[0] ?? ring.one, shift ?? ring.zero);
      return relationOfBetas(ring, b.slice(0, n), b.slice(n), second, n);
    },
    { length: n },
  );
}

/** One C-scheme coupling in powers of another, C = from in powers of C = to: both have the same beta function. */
export function cToC(from: Rational, to: Rational, { flavours, divisor }: Place, terms: number): Tracked[] {
  const b = trackedCBeta(flavours, divisor, terms);
  return derive(
    [trackedRational(to.sub(from)), ...b],
    (ring, [shift, ...beta]) =>
      relationOfBetas(ring, beta, beta, ring.mul(beta[0] ?? ring.one, shift ?? ring.zero), terms),
    { length: terms },
  );
}

interface Published {
  readonly constants: readonly PublishedConstant[];
  readonly values: readonly ReturnType<typeof potentialRelation>[number][];
  readonly symbol: 'nl' | 'nf';
  readonly name: string;
}

/** A published coupling in powers of x; the errors of its numerical constants become sources. */
function publishedRelation(of: Published, { flavours, divisor, sources }: Place): Tracked[] {
  const at = { [of.symbol]: Rational.of(flavours) };
  return of.values.map((value, k) => {
    const constant = of.constants[k - 1];
    if (constant === undefined) return trackedExact(value);
    const unit = unitPower(divisor, k).formal;
    const formal = unit && mulFormal(inFileNames(formalAt(constant, at)), unit);
    const error = constant.error;
    const size =
      error === undefined ? 0 : numberOfFormal(formalAt({ formula: error }, at)) * overFourPiNumber(divisor) ** k;
    const source = { of: of.name, index: k, plus: size, minus: size, estimated: false };
    return { ...trackedExact(value, formal), slopes: size > 0 ? sources.add(source) : [] };
  });
}

/** What is wrong with a series as the definition of a coupling, for a series of this kind. */
function unfit(relation: Series, place: Place): Refusal | undefined {
  const scheme = couplingScheme(relation);
  if (isRefusal(scheme)) return scheme;
  const name = relation.id;
  if (scheme.kind !== 'MSbar') {
    return refuse(
      `${name} defines a coupling in terms of ${schemeText(scheme)}, not of MSbar`,
      `leastterm rewrite ${name} --coupling MSbar`,
    );
  }
  if (relation.flavours !== place.flavours) {
    return refuse(
      `${name} has nf = ${relation.flavours ?? 'nothing'}, the series nf = ${place.flavours}`,
      `use ${name} at ${place.flavours} flavours`,
    );
  }
  if (relation.scaleRatio?.rational?.equals(Rational.ONE) === false) {
    return refuse(`${name} defines its coupling at another scale than mu`, `leastterm rewrite ${name} --scale 1`);
  }
  if (relation.firstPower !== 1 || toNumberExact(relation.coefficients[0]?.value ?? exact(0)) === 0) {
    return refuse(
      `${name} does not begin with the coupling itself`,
      'a series with first power 1 and a first coefficient other than 0',
    );
  }
  return undefined;
}

/** X = x + … with the coefficients of a series over its first one, in the divisor of the place. */
async function seriesRelation(relation: Series, place: Place): Promise<Tracked[] | Refusal> {
  const bad = unfit(relation, place);
  if (bad !== undefined) return bad;
  const list = await trackedCoefficients(relation, relation.id, place.sources);
  // x_file = x (divisor/divisor_file).
  return derive(
    [divisorQuotient(place.divisor, relation.coupling.divisor), ...list],
    (ring, [quotient, ...c]) => {
      const step = quotient ?? ring.one;
      let power = ring.one;
      return c.map((x, n) => {
        if (n > 0) power = ring.mul(power, step);
        return ring.mul(ring.div(x, c[0] ?? ring.one), power);
      });
    },
    { length: list.length },
  );
}

const inverted = (relation: readonly Tracked[]): Tracked[] =>
  derive(relation, (ring, k) => reversion(ring, [ring.zero, ...k], k.length + 1).slice(1), {
    length: relation.length,
  });

/** Finds the series that defines a coupling. */
export type FindSeries = (name: string) => Promise<Series>;

/** X of a scheme in powers of x in MSbar, or the other way round. */
export async function msbarRelation(
  scheme: CouplingScheme,
  direction: 'new in MSbar' | 'MSbar in new',
  place: Place,
  find: FindSeries,
): Promise<readonly Tracked[] | Refusal> {
  const { flavours, divisor } = place;
  const forward = direction === 'new in MSbar';
  if (scheme.kind === 'C') {
    const relation = cRelation(scheme.c, place);
    return forward ? inverted(relation) : relation;
  }
  const found = await newInMSbar();
  return isRefusal(found) || forward ? found : inverted(found);

  function newInMSbar(): Promise<Tracked[] | Refusal> | Tracked[] | Refusal {
    if (scheme.kind === 'V') {
      const values = potentialRelation(flavours, divisor);
      return publishedRelation({ constants: POTENTIAL, values, symbol: 'nl', name: 'static potential' }, place);
    }
    if (scheme.kind === 'mini-MOM') {
      const values = minimomRelation(flavours, divisor);
      return publishedRelation({ constants: MINIMOM, values, symbol: 'nf', name: 'mini-MOM' }, place);
    }
    if (scheme.kind === 'series') return find(scheme.name).then((relation) => seriesRelation(relation, place));
    if (scheme.kind === 'MSbar') return [trackedRational(Rational.ONE)];
    return refuse(
      `a series of the kind "${schemeText(scheme)}" has no relation to other couplings`,
      'only its scale can be changed',
    );
  }
}
