/** @module All commands, in the order of the help. */
import type { Command } from './command.js';
import { assess } from './commands/assess.js';
import { backtest } from './commands/backtest.js';
import { catalogue } from './commands/catalogue.js';
import { evolve } from './commands/evolve.js';
import { compare } from './commands/compare.js';
import { combine } from './commands/combine.js';
import { growth } from './commands/growth.js';
import { helpCommand } from './commands/help.js';
import { plane } from './commands/plane.js';
import { plot } from './commands/plot.js';
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
  evolve,
  rewrite,
  combine,
  plot,
  catalogue,
];

const WITH_FORMS = STUDIES.map(withPapers);

export const COMMANDS: readonly Command[] = [...WITH_FORMS, helpCommand(WITH_FORMS)];
