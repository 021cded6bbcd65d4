/**
 * @module The step to another definition of a heavy-quark mass, for a quantity proportional to a power of it.
 *
 * Method     R = M^p (additive + factor Σ c_n x^n) becomes m^p (additive + …) (M/m)^p, re-expanded in the coupling of the
 *            series. The ratio is known through x^4; its four-loop error is a source like any other.
 */
import { Rational, divExact, isZeroExact } from '../../numerics/index.js';
import {
  FORMAL_ONE,
  isRefusal,
  massRatioFormal,
  massRatioSeries,
  mulFormal,
  mulSeries,
  overFourPiNumber,
  poleMassCoefficientError,
  refuse,
} from '../../qcd/index.js';
import type { Formal, MassDefinition, Refusal } from '../../qcd/index.js';
import { inFileNames } from '../derive/symbols.js';
import { derive, trackedExact } from '../derive/tracked.js';
import type { Tracked } from '../derive/tracked.js';
import { rationalPower } from '../derive/powers.js';
import { MASS_WORDS, scaleRatioOf } from '../scheme.js';
import { unitPower } from './beta.js';
import { trackedLogSquare } from './scale.js';
import { barePositions } from './singularities.js';
import type { State } from './state.js';

export interface MassChange {
  readonly to: MassDefinition;
  /** p of R ∝ m^p. */
  readonly power: Rational;
  /** Does `flavours` of the series count the heavy quark? */
  readonly heavyInCoupling: boolean;
  /** The mass that Q stands for: m(m), or the pole mass. */
  readonly hardScale: 'pole' | 'msbar';
}

/** Order through which the ratio is known. */
const KNOWN = 4;

/** The ratio of the old mass to the new one in x, from x^0 to x^4. */
function massRatio(state: State, of: MassDefinition, change: MassChange, log: Tracked): Tracked[] {
  const light = change.heavyInCoupling ? state.flavours - 1 : state.flavours;
  const shape = {
    of,
    over: change.to,
    light,
    coupling: change.heavyInCoupling ? 'heavy' : 'light',
    reference: change.hardScale,
  } as const;
  const values = massRatioSeries({ ...shape, divisor: state.divisor, log: log.value });
  const forms = log.formal && massRatioFormal(shape, log.formal).map(inFileNames);
  // c_4 of M/m enters the x^4 of the ratio alone, with the sign of the power of M.
  const touched = (of === 'pole') !== (change.to === 'pole');
  const size = touched ? poleMassCoefficientError(light) * (4 * overFourPiNumber(state.divisor)) ** KNOWN : 0;
  return values.map((value, k) => {
    const unit = unitPower(state.divisor, k).formal;
    const form: Formal | undefined = forms?.[k];
    const formal = form && unit && mulFormal(form, mulFormal(unit, { terms: new Map([['', Rational.of(4 ** k)]]) }));
    const uncertain = k === KNOWN && size > 0;
    const source = { of: 'pole mass at four loops', index: k, plus: size, minus: size, estimated: false };
    const slopes = uncertain ? state.sources.add(source).map((s) => (of === 'pole' ? s : -s)) : [];
    return { ...trackedExact(value, k === 0 ? FORMAL_ONE : formal), slopes };
  });
}

/** The series with another mass in front. */
export function toMass(state: State, change: MassChange): State | Refusal {
  const { mass: of, series, firstPower, coefficients } = state;
  if (of === undefined) {
    return refuse(
      `${series.id} does not say which mass it is in`,
      'say it: --from-mass pole, msbar or running (or write "MSbar coupling; pole mass" as its scheme)',
    );
  }
  if (of === change.to) return state;
  const ratio = state.scaleRatio ?? scaleRatioOf(series);
  if (isRefusal(ratio)) return ratio;
  if (change.heavyInCoupling && state.flavours < 1) {
    return refuse('with no flavours there is no heavy quark in the coupling', 'leave out --heavy-in-coupling');
  }
  const withConstant = !isZeroExact(series.additive);
  if (withConstant && firstPower < 0) {
    return refuse(
      `${series.id} has both a constant and negative powers of the coupling`,
      'write the constant as a coefficient',
    );
  }
  const first = withConstant ? Math.min(1, firstPower) : firstPower;
  const last = firstPower + coefficients.length - 1;
  const through = Math.min(last, withConstant ? KNOWN : firstPower + KNOWN);
  const length = Math.max(through - first + 1, 0);
  const list = massRatio(state, of, change, trackedLogSquare(ratio));
  const constant = trackedExact(divExact(series.additive, series.factor));
  const moved = derive(
    [constant, ...list, ...coefficients],
    (ring, [c, ...x]) => {
      const power = rationalPower(ring, x.slice(0, KNOWN + 1), change.power, KNOWN + 1);
      const body = mulSeries(ring, x.slice(KNOWN + 1), power, length + 1);
      return Array.from({ length }, (_, i) => {
        const order = first + i;
        const fromBody = order >= firstPower ? (body[order - firstPower] ?? ring.zero) : ring.zero;
        // The constant times what the ratio adds to 1.
        const extra = withConstant && order >= 1 ? ring.mul(c ?? ring.zero, power[order] ?? ring.zero) : ring.zero;
        return ring.add(fromBody, extra);
      });
    },
    { length },
  );
  return {
    ...state,
    mass: change.to,
    otherQuantity: true,
    firstPower: first,
    coefficients: moved,
    singularities: massSingularities(state, of, change.to),
    notes: [
      ...state.notes,
      `Mass: in front stands the ${MASS_WORDS[change.to]} to the power ${change.power.toString()} in place of the ${MASS_WORDS[of]}; ` +
        `${change.heavyInCoupling ? 'flavours counts the heavy quark' : `flavours counts the ${state.flavours} lighter quarks only`}; ` +
        `mu/Q refers to Q = ${change.hardScale === 'msbar' ? 'm(m)' : 'the pole mass'}. Masses of the lighter quarks are neglected.`,
    ],
  };
}

/** The pole mass brings the singularity at u = 1/2 along; a short-distance mass takes it away. */
function massSingularities(state: State, from: MassDefinition, to: MassDefinition): State['singularities'] {
  const bare = barePositions(state);
  const half = Rational.of(1, 2);
  const others = bare.filter(
    (s) => !(s.u?.rational?.equals(half) === true || s.dimension?.equals(Rational.ONE) === true),
  );
  if (from === 'pole') return others;
  return to === 'pole' ? [{ dimension: Rational.ONE, kind: 'infrared' }, ...others] : bare;
}
