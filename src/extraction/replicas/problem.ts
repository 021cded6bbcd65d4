/**
 * @module A Monte Carlo of an extraction as plain data: what a worker is sent, and all that it needs.
 *
 * The state of a replica is one list of numbers: the unknown parameters, then the inputs, drawn or fixed. References to it are
 * places in that list.
 */
import type { FastSetting } from '../../fast/index.js';
import type { ChebyshevMap } from '../../numerics/index.js';

/** A place in the state. */
export type Slot = number;

/** The inputs, in the order of their slots behind the parameters. */
export interface Inputs {
  readonly names: readonly string[];
  readonly central: readonly number[];
  /** One-sigma errors upwards and downwards; zero for an input that is not drawn. */
  readonly plus: readonly number[];
  readonly minus: readonly number[];
  /** Places (among the inputs) of those that are drawn, and the rows of L of their correlation matrix. */
  readonly drawn: readonly number[];
  readonly factor: readonly (readonly number[])[];
}

/** Where the coupling comes from: the state itself, or a map of some of it. */
export type CouplingSource =
  | { readonly kind: 'slot'; readonly slot: Slot }
  | { readonly kind: 'map'; readonly map: ChebyshevMap; readonly variables: readonly Slot[] };

/** C_d (1 + C_1 x + …) ⟨O_d⟩/Q^d. */
export interface PowerTermModel {
  readonly wilson: number;
  readonly corrections: readonly number[];
  readonly dimension: number;
  readonly value: Slot;
}

/** X = norm · m^massPower · (additive + factor x^power F(x) + Σ C_d ⟨O_d⟩/Q^d), x = α/divisor. */
export interface DatumModel {
  readonly series: string;
  readonly coupling: CouplingSource;
  readonly divisor: number;
  readonly additive: number;
  readonly factor: number;
  readonly power: number;
  /** c_0, c_1, …; of D for a contour quantity. */
  readonly coefficients: readonly Slot[];
  /** A contour quantity: rows of the matrix that turns the coefficients of D into those of the fixed-order expansion. */
  readonly circle?: readonly (readonly number[])[];
  /** Coefficients that move with a mass: tables of what is added to each. */
  readonly drift?: { readonly variable: Slot; readonly maps: readonly ChebyshevMap[] };
  readonly norm?: Slot;
  readonly mass?: Slot;
  readonly massPower: number;
  /** Hard scale in GeV; needed with power terms. */
  readonly scale?: Slot;
  readonly terms: readonly PowerTermModel[];
  /** Absent for a prediction. */
  readonly measured?: Slot;
}

/** One prescription: the member of its family for each datum, and its central solution. */
export interface PrescriptionModel {
  readonly name: string;
  readonly variants: readonly string[];
  readonly settings: readonly FastSetting[];
  /** Central parameters. */
  readonly central: readonly number[];
  /** For a fit: rows of L⁻¹, L Lᵀ the covariance that weighs the data. */
  readonly whitening?: readonly (readonly number[])[];
}

/** What is solved for. */
export type Task =
  /** X = measured for the one parameter. */
  | { readonly kind: 'root' }
  /** The parameter is X itself. */
  | { readonly kind: 'prediction' }
  /** The parameter is ⟨O_d⟩ = (measured/… − R) Q^d/C_d. */
  | { readonly kind: 'condensate'; readonly term: Omit<PowerTermModel, 'value'> }
  /** Least χ² of several data. */
  | { readonly kind: 'fit' };

export interface ParameterModel {
  readonly symbol: string;
  readonly unit?: string;
  /** Values outside are no solutions. */
  readonly from: number;
  readonly to: number;
}

/** A quantity beside the parameters: the coupling where it is wanted. */
export interface DerivedModel {
  readonly symbol: string;
  readonly unit?: string;
  readonly map: ChebyshevMap;
  /** The first is a parameter. */
  readonly variables: readonly Slot[];
}

export interface ReplicaProblem {
  readonly task: Task;
  readonly parameters: readonly ParameterModel[];
  readonly inputs: Inputs;
  readonly data: readonly DatumModel[];
  readonly prescriptions: readonly PrescriptionModel[];
  readonly derived?: DerivedModel;
}

/** Numbers that one replica gives for one prescription: the parameters, and the derived quantity. */
export const quantitiesOf = (p: ReplicaProblem): number => p.parameters.length + (p.derived === undefined ? 0 : 1);
