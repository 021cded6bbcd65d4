/** @module All commands, in the order of the help. */
import type { Command } from './command.js';
import { assess } from './commands/assess.js';
import { catalogue } from './commands/catalogue.js';
import { growth } from './commands/growth.js';
import { helpCommand } from './commands/help.js';
import { plane } from './commands/plane.js';
import { sum } from './commands/sum.js';
import { truncation } from './commands/truncation.js';

const STUDIES: readonly Command[] = [assess, growth, plane, sum, truncation, catalogue];

export const COMMANDS: readonly Command[] = [...STUDIES, helpCommand(STUDIES)];
