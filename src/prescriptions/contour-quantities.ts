/**
 * @module The prescriptions of contour quantities, made from the contour room when somebody has loaded it: it is large, and
 * no plain series needs it.
 */
import type * as Contour from '../contour/index.js';
import type { Expansion } from '../series/index.js';
import { CONTOUR_NAMES } from './contour-names.js';
import type { ContourFacts } from './contour-names.js';
import type { Outcome, Prescription, Request } from './prescription.js';
import { refusal } from './prescription.js';
import { R } from '../numerics/index.js';
import type { Ball } from '../numerics/index.js';

/** What the prescriptions need of the contour room. */
export type ContourEngine = Pick<
  typeof Contour,
  'improvedAnswers' | 'modelAnswers' | 'padeAnswers' | 'subtractedAnswers'
>;

type Answers = (e: Contour.ContourQuantity, request: Request) => readonly Contour.ContourAnswer[];

/** Factor and additive part: R = additive + factor · value. */
function outcomeOf(e: Expansion, answer: Contour.ContourAnswer, digits: number): Outcome {
  if (answer.kind === 'refusal') return answer;
  const prec = Math.max(128, digits * 4 + 64);
  const front = e.factor.ball(prec);
  const { value, imaginary, truncation } = answer;
  const times = (b: Ball): Ball => R.mul(front, b, prec);
  return {
    ...answer,
    value: R.add(e.additive.ball(prec), times(value), prec),
    ...(imaginary === undefined ? {} : { imaginary: times(imaginary) }),
    ...(truncation === undefined ? {} : { truncation: truncation * Math.abs(R.toNumber(front)) }),
    trust: 'indicative',
    digitsTrust: 'converged',
  };
}

function prescription(facts: ContourFacts, answers: Answers): Prescription {
  return {
    ...facts,
    apply(e, _growth, request) {
      const { contour } = e;
      if (contour === undefined)
        return [
          refusal(
            facts.title,
            'this is no contour quantity',
            'use it on a series of kind contour, such as tau-contour',
          ),
        ];
      return answers({ ...e, contour }, request).map((answer) => outcomeOf(e, answer, request.digits));
    },
  };
}

/** The prescriptions, in the order in which they are shown. */
export const contourPrescriptions = (engine: ContourEngine): readonly Prescription[] => [
  prescription(CONTOUR_NAMES.improved, engine.improvedAnswers),
  prescription(CONTOUR_NAMES.borel, engine.modelAnswers),
  prescription(CONTOUR_NAMES.pade, engine.padeAnswers),
  prescription(CONTOUR_NAMES.subtracted, engine.subtractedAnswers),
];
