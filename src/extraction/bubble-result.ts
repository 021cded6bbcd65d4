/**
 * @module The result of `bubbles`: plain, serialisable, the very object that --json prints. Every number is a decimal string
 * with as many digits as are known.
 */
import type { Assessment, Caution, GrowthReport, Standing } from '../studies/index.js';

export interface BubbleQuantity {
  readonly name: string;
  readonly title: string;
  readonly meaning: string;
  /** b(u) of B(u) = e^(5u/3) (mu^2/Q^2)^u b(u). */
  readonly borelTransform: string;
  /** What stands in front of the series, such as alpha_s/pi. */
  readonly normalisation: string;
  /** The hard scale by its symbol. */
  readonly hard: string;
  readonly sources: readonly string[];
  readonly status: string;
}

export interface BubbleCoupling {
  readonly value: string;
  readonly error?: string;
  readonly flavours: number;
  /** mu over the hard scale. */
  readonly mu: string;
  /** The hard scale in GeV, when it is known. */
  readonly scale?: string;
  /** a = beta_0 alpha_s. */
  readonly a: string;
  /** Lambda_MSbar of one loop over the hard scale, and in GeV. */
  readonly lambda: { readonly overHard: string; readonly GeV?: string };
  /** Landau pole of the effective coupling, e^(5/6) Lambda. */
  readonly landau: { readonly overHard: string; readonly GeV?: string };
  readonly path?: readonly string[];
}

export interface BubbleTerm {
  readonly n: number;
  /** c_n of normalisation · sum c_n a^n. */
  readonly coefficient: string;
  /** c_n in closed form, where it is short. */
  readonly exact?: string;
  /** The form was matched to the enclosure, not derived. */
  readonly exactBy?: 'integer relation';
  readonly term: string;
  readonly partialSum: string;
  readonly least?: boolean;
}

export interface BubblePole {
  readonly u: string;
  readonly order: number;
  readonly side: 'infrared' | 'ultraviolet';
  /** Coefficients of (u − position)^(−m), m = 1, 2, …, of b(u). */
  readonly residues: readonly string[];
}

/** What one infrared pole leaves undetermined. */
export interface BubbleAmbiguity {
  readonly dimension: string;
  /** Its share of Im R above the axis. */
  readonly im: string;
  /** |share|/pi. */
  readonly imOverPi: string;
  /** |share|/pi over (Lambda/Q)^d: with logarithms of Lambda/Q inside where the pole is double. */
  readonly perLambda: string;
  /** |share| and |share|/pi times Q^d, in GeV^d. */
  readonly GeV?: { readonly im: string; readonly imOverPi: string };
}

export interface BubbleSum {
  readonly pv: string;
  /** Imaginary part of the sum above the positive axis. */
  readonly im: string;
  readonly standing: Standing;
  /** From the error of the coupling. */
  readonly inputError?: string;
  readonly ambiguity: {
    readonly im: string;
    readonly imOverPi: string;
    readonly byPole: readonly BubbleAmbiguity[];
  };
}

/** A prescription on the first coefficients, against the exact principal value. */
export interface BubbleTrial {
  readonly prescription: string;
  readonly variant: string;
  readonly value?: string;
  readonly truncationError?: string;
  /** value − PV. */
  readonly deviation?: string;
  /** |value − PV| over |Im|/pi, and over the prescription's own error. */
  readonly overAmbiguity?: string;
  readonly overError?: string;
  readonly refused?: { readonly reason: string; readonly remedy: string };
}

export interface BubbleResult {
  readonly leastterm: string;
  readonly request: Assessment['request'];
  readonly quantity: BubbleQuantity;
  readonly coupling: BubbleCoupling;
  readonly terms: readonly BubbleTerm[];
  readonly poles: readonly BubblePole[];
  readonly sum: BubbleSum;
  readonly trials: readonly BubbleTrial[];
  readonly growth: { readonly verdict: string; readonly statement: string };
  readonly cautions: readonly Caution[];
}

export interface CutRow {
  /** mu_f over the hard scale. */
  readonly cut: string;
  /** k > mu_f, k < mu_f and their sum. */
  readonly high: string;
  readonly low: string;
  readonly sum: string;
  /** The lowest power alone in place of k < mu_f, and what that leaves. */
  readonly leading: string;
  readonly remainder: string;
  /** The part k > mu_f by an integral over the momenta. */
  readonly direct: string;
}

export interface CutTerm {
  readonly n: number;
  readonly whole: string;
  readonly low: string;
  readonly window: string;
  readonly ultraviolet: string;
  readonly high: string;
}

export interface CutPower {
  readonly dimension: string;
  /** This power's part of k < mu_f, and the sum of the powers up to here. */
  readonly value: string;
  readonly upToHere: string;
  /** What the powers up to here leave of the part k < mu_f. */
  readonly left: string;
}

export interface BubbleCutResult {
  readonly leastterm: string;
  readonly request: BubbleResult['request'];
  readonly quantity: BubbleQuantity;
  readonly coupling: BubbleCoupling;
  readonly cut: {
    readonly overHard: string;
    readonly GeV?: string;
    /** The effective coupling at the cut. */
    readonly coupling: string;
    /** Imaginary part of the sum over k < mu_f, which is all of it, and over k > mu_f, which has none. */
    readonly imaginary: { readonly low: string; readonly high: string };
    readonly terms: readonly CutTerm[];
    readonly powers: readonly CutPower[];
    /** The condensate that the perturbative low momenta stand for, where the quantity has one. */
    readonly condensate?: { readonly name: string; readonly value: string; readonly unit: string };
    readonly rows: readonly CutRow[];
    readonly growth: {
      readonly whole: Pick<GrowthReport, 'verdict' | 'statement' | 'signPattern'>;
      readonly high: Pick<GrowthReport, 'verdict' | 'statement' | 'signPattern'>;
      readonly window: Pick<GrowthReport, 'verdict' | 'statement' | 'signPattern'>;
    };
  };
  readonly cautions: readonly Caution[];
}

export type BubbleView = 'distribution' | 'scales' | 'dispersive';

/** A view of the momenta as a table: numbers as text, one row a point. */
export interface BubbleViewResult {
  readonly leastterm: string;
  readonly request: BubbleResult['request'];
  readonly quantity: BubbleQuantity;
  readonly coupling: BubbleCoupling;
  readonly view: BubbleView;
  readonly columns: readonly { readonly name: string; readonly meaning: string }[];
  readonly rows: readonly (readonly string[])[];
  /** Integrals over what is shown. */
  readonly integrals: readonly { readonly name: string; readonly value: string; readonly standing: Standing }[];
  readonly notes: readonly string[];
}
