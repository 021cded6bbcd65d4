/** @module All commands, in the order of the help. */
import type { Command } from './command.js';
import { assess } from './commands/assess.js';
import { backtest } from './commands/backtest.js';
import { bubbles } from './commands/bubbles.js';
import { catalogue } from './commands/catalogue.js';
import { evolve } from './commands/evolve.js';
import { extract } from './commands/extract.js';
import { compare } from './commands/compare.js';
import { combine } from './commands/combine.js';
import { contour } from './commands/contour.js';
import { growth } from './commands/growth.js';
import { helpCommand } from './commands/help.js';
import { mass } from './commands/mass.js';
import { plane } from './commands/plane.js';
import { plot } from './commands/plot.js';
import { completionCommand } from './commands/completion.js';
import { create } from './commands/new.js';
import { replayCommand } from './commands/replay.js';
import { report } from './commands/report.js';
import { rewrite } from './commands/rewrite.js';
import { sum } from './commands/sum.js';
import { truncation } from './commands/truncation.js';
import { withPapers } from './papers.js';

const STUDIES: readonly Command[] = [
  assess,
  growth,
  plane,
  sum,
  compare,
  truncation,
  backtest,
  contour,
  evolve,
  extract,
  mass,
  rewrite,
  combine,
  plot,
  report,
  bubbles,
  catalogue,
];

const WITH_FORMS = STUDIES.map(withPapers);

const MOST = [...WITH_FORMS, replayCommand(WITH_FORMS), create];

const ALL = [...MOST, completionCommand(MOST)];

export const COMMANDS: readonly Command[] = [...ALL, helpCommand(ALL)];
