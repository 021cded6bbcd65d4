/** @module Words that several charts share. */
import type { Assessment } from '../../studies/index.js';

export const nameOf = ({ series }: Pick<Assessment, 'series'>): string => series.title;

export const atCoupling = ({ coupling }: Pick<Assessment, 'coupling'>): string =>
  `${coupling.name} = ${coupling.value}`;
