/** @module The options of replicas: how many, from which seed, on how many threads. */
import type { OptionSpec } from './option-kinds.js';

export const REPLICA_OPTIONS = {
  replicas: {
    kind: 'whole',
    placeholder: 'N',
    example: '100000',
    least: 100,
    most: 2_000_000,
    help: 'that many Monte Carlo replicas over measurement, coefficients, inputs and prescriptions',
  },
  seed: {
    kind: 'whole',
    placeholder: 'N',
    example: '7',
    least: 0,
    most: 999_999_999,
    help: 'seed of the replicas (default 1): the same seed gives the same replicas',
  },
  workers: {
    kind: 'whole',
    placeholder: 'N',
    example: '2',
    least: 1,
    most: 256,
    help: 'threads for the replicas (default: one a core); the result does not depend on it',
  },
} as const satisfies Readonly<Record<string, OptionSpec>>;

export interface ReplicaGiven {
  readonly replicas?: number;
  readonly seed?: number;
  readonly workers?: number;
}
