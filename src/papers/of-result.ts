/** @module The tables of any result, by the command that made it; results are those that --json writes. */
import type {
  Assessment,
  BacktestResult,
  BacktestSummary,
  CompareResult,
  EvolveResult,
  GrowthResult,
  PlaneResult,
  SumResult,
  TruncationResult,
} from '../studies/index.js';
import type { ContourReport } from '../contour/index.js';
import type { BubbleResult, ExtractResult, FitResult, SeriesCutResult } from '../extraction/index.js';
import type { MassResult } from '../masses/index.js';
import type { PlainSeries } from '../report/index.js';
import type { PaperTable } from './table.js';
import { assessmentTables } from './tables/assess.js';
import { bubbleTables } from './tables/bubbles.js';
import type { BubbleList } from './tables/bubbles.js';
import { contourTables } from './tables/contour.js';
import { seriesCutTables } from './tables/cut.js';
import { extractTables } from './tables/extract.js';
import { growthTables, planeTables } from './tables/growth.js';
import { massTables } from './tables/mass.js';
import { compareTables } from './tables/compare.js';
import { catalogueTables, seriesTables } from './tables/series.js';
import type { CatalogueList } from './tables/series.js';
import { backtestTables, evolveTables, sumTables, truncationTables } from './tables/studies.js';

/** What a result is, its request says. */
export interface CommandResult {
  readonly request: { readonly command: string };
}

type Growth = CommandResult & (GrowthResult | SeriesCutResult);
type Listed = CommandResult & { readonly entries: CatalogueList };

const isListed = (result: CommandResult): result is Listed => 'entries' in result;

const MAKERS: Readonly<Record<string, (result: CommandResult) => PaperTable[]>> = {
  assess: (result) => assessmentTables(result as CommandResult & Assessment),
  sum: (result) => sumTables(result as CommandResult & SumResult),
  compare: (result) => compareTables(result as CommandResult & CompareResult),
  truncation: (result) => truncationTables(result as CommandResult & TruncationResult),
  backtest: (result) => backtestTables(result as CommandResult & (BacktestResult | BacktestSummary)),
  evolve: (result) => evolveTables(result as CommandResult & EvolveResult),
  extract: (result) => extractTables(result as CommandResult & (ExtractResult | FitResult)),
  mass: (result) => massTables(result as CommandResult & MassResult),
  growth: (result) => {
    const growth = result as Growth;
    return 'cut' in growth ? seriesCutTables(growth) : growthTables(growth);
  },
  plane: (result) => planeTables(result as CommandResult & PlaneResult),
  bubbles: (result) => bubbleTables(result as CommandResult & (BubbleResult | BubbleList)),
  rewrite: (result) => seriesTables(result as CommandResult & PlainSeries),
  combine: (result) => seriesTables(result as CommandResult & PlainSeries),
  catalogue: (result) =>
    isListed(result) ? catalogueTables(result.entries) : seriesTables(result as CommandResult & PlainSeries),
  contour: (result) => contourTables(result as CommandResult & ContourReport),
};

/** Commands whose results have tables. */
export const TABLED = Object.keys(MAKERS);

export const tablesOf = (result: CommandResult): PaperTable[] => MAKERS[result.request.command]?.(result) ?? [];
