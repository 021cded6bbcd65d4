// All prescriptions over a range of couplings, as rows for a table or a plot.
import { compare, isGridProblem, loadSeries, readGrid } from 'leastterm';

const series = await loadSeries('bjorken');
const grid = readGrid('0.2:0.3:3');
if (isGridProblem(grid)) throw new Error(grid.problem);

const { rows } = compare(series, grid.values, { digits: 8, hide: 0, request: {} });
for (const { at, prescription, value, truncationError } of rows)
  if (value !== undefined) console.log([at, prescription, value, truncationError ?? ''].join(','));
