/** @module Names of the prescriptions that only contour quantities have: known before anything of them is loaded. */
import type { Prescription } from './prescription.js';

export type ContourFacts = Omit<Prescription, 'apply'>;

const contour = (name: string, title: string, summary: string): ContourFacts => ({
  name,
  title,
  summary,
  family: 'contour',
});

export const CONTOUR_NAMES = {
  improved: contour(
    'contour-improved',
    'contour improved (CIPT)',
    'sum of all known terms of D with the coupling running along the circle; error: the last term',
  ),
  borel: contour(
    'contour-borel',
    'Borel sum on the circle',
    'singularity model of D summed at the couplings of the circle: the Borel sum of the fixed-order series',
  ),
  pade: contour(
    'contour-borel-pade',
    'Borel–Padé on the circle',
    'rational approximants of the Borel transform of D, summed at the couplings of the circle',
  ),
  subtracted: contour(
    'condensate-subtracted',
    'gluon condensate subtracted',
    'fixed-order and contour-improved sums without the renormalon of the gluon condensate',
  ),
} as const;
