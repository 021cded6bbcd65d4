/** @module One block of replicas: what a thread does at a time. */
import type { Engine } from './engine.js';
import type { Block, BlockResult } from './tally.js';

/** One block by an engine. */
export function runBlock(engine: Engine, block: Block): BlockResult {
  const size = engine.problem.prescriptions.length;
  const values = new Float64Array(size * engine.quantities * block.count);
  const codes = new Uint8Array(size * block.count);
  engine.block(block.first, block.count, values, codes);
  return { ...block, values, codes };
}
