/** @module The kernels of Borel–Laplace integrals: branch point on the path, on the other side, and anywhere off it. */
export { branchSame } from './branch-same.js';
export type { BranchValue } from './branch-same.js';
export { branchAlternating } from './branch-alternating.js';
export { branchCut } from './branch-cut.js';
