/** @module The last look at an answer: bands are finite and in order, or there is no answer. */
import { LEVELS, refuse, type Band, type TruncationModel } from './model.js';

const sound = ({ low, high }: Band): boolean => Number.isFinite(low) && Number.isFinite(high) && low <= high;

/** The model, refusing where its numbers leave the range of doubles. */
export const guarded = (model: TruncationModel): TruncationModel => ({
  ...model,
  estimate(question) {
    const answer = model.estimate(question);
    if (answer.kind === 'refusal' || LEVELS.every((level) => sound(answer.bands[level]))) return answer;
    return refuse(
      'the numbers leave the range in which they can be worked out',
      'bring the priors nearer to their usual values, or take a smaller coupling',
    );
  },
});
