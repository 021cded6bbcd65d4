/** @module How a command's text is to look here: columns of the terminal, colour, digits. */
import { colourLevel } from './colour.js';
import type { Call } from './command.js';
import type { TerminalOptions } from '../report/index.js';

const UNKNOWN_TERMINAL = 100;

export async function presentation({ given, surroundings }: Call): Promise<TerminalOptions> {
  const { report } = await import('./rooms.js');
  const toFile = given.output !== undefined && given.output !== '-';
  const level = colourLevel({
    refused: given.noColor,
    isTerminal: surroundings.stdout.isTerminal && !toFile,
    environment: surroundings.environment,
  });
  const columns = toFile ? undefined : surroundings.stdout.columns;
  return {
    columns: columns ?? UNKNOWN_TERMINAL,
    paint: await report.painter(level),
    ...(given.digits === undefined ? {} : { digits: given.digits }),
  };
}
