/** @module The result of a cut through a user's own series: plain, serialisable, every number a decimal string. */
import type { GrowthReport as Report, Standing } from '../studies/index.js';

export type GrowthReport = Report;
type Words = Pick<Report, 'verdict' | 'statement' | 'signPattern'>;

export interface SeriesCutRow {
  /** mu_f/Q. */
  readonly cut: string;
  /** Fixed-order sum of the part k > mu_f, and its last term. */
  readonly high: string;
  readonly lastTerm: string;
  /** The model's part between the cut asked for and this one, and the sum with it. */
  readonly between?: string;
  readonly both?: string;
}

export interface SeriesCutResult {
  readonly leastterm: string;
  readonly request: Readonly<Record<string, string | number | boolean>>;
  readonly series: { readonly id: string; readonly title: string };
  readonly coupling: string;
  readonly cut: string;
  readonly singularity: { readonly u: string; readonly dimension: string; readonly origin: string };
  /** lambda of lambda times the integral over the low momenta, with the step from one coefficient fewer. */
  readonly strength: { readonly value: string; readonly error: string };
  readonly terms: readonly {
    readonly n: number;
    readonly whole: string;
    readonly low: string;
    readonly high: string;
  }[];
  readonly value: { readonly whole: string; readonly high: string };
  readonly rows: readonly SeriesCutRow[];
  readonly growth: { readonly whole: Words; readonly high: Words };
  readonly standing: Standing;
}
