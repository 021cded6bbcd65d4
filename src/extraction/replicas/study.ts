/** @module replicas: the Monte Carlo of an extraction or a fit, from the question to the plain result. */
import { LARGEST_SEED } from '../../numerics/index.js';
import { isRefusal } from '../../qcd/index.js';
import type { Refusal } from '../../qcd/index.js';
import type { Series } from '../../series/index.js';
import type { Problem } from '../problem.js';
import { buildReplicas } from './build.js';
import { sourceOf } from './from-extraction.js';
import type { ReplicaResult } from './result.js';
import { runReplicas } from './run.js';
import type { RunOptions } from './run.js';
import { summarise } from './summary.js';

/** Limits of what can be asked: fewer say nothing about a 95 % interval, more bring a digit that nobody quotes. */
export const REPLICA_LIMITS = { fewest: 100, most: 2_000_000, largestSeed: LARGEST_SEED, mostWorkers: 256 } as const;

/**
 * Replicas of the question that `extract` (one measurement) or `fit` (several) answers: a refusal where they cannot be made.
 * Interrupted by `options.signal`, what is finished is given back.
 */
export async function replicate(
  problem: Problem,
  series: readonly Series[],
  options: RunOptions,
): Promise<ReplicaResult | Refusal> {
  const source = sourceOf(problem, series);
  if (isRefusal(source)) return source;
  const built = buildReplicas(source);
  if (isRefusal(built)) return built;
  const known = await runReplicas(built.problem, options);
  return summarise(built.problem, known, options.seed, built.leftOut);
}
