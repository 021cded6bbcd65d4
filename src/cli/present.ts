/** @module How a command's text is to look here: columns of the terminal, colour, digits. */
import { colourLevel } from './colour.js';
import { asciiOnly } from './letters.js';
import type { Call } from './command.js';
import type { TerminalOptions } from '../report/index.js';

const UNKNOWN_TERMINAL = 100;

/** COLUMNS, where no terminal says better. */
function columnsOf(environment: Readonly<Record<string, string | undefined>>): number | undefined {
  const columns = Number(environment['COLUMNS'] ?? '');
  return Number.isInteger(columns) && columns > 0 ? columns : undefined;
}

export async function presentation({ given, surroundings }: Call): Promise<TerminalOptions> {
  const report = await import('./rooms-core.js');
  const toFile = given.output !== undefined && given.output !== '-';
  const level = colourLevel({
    refused: given.noColor,
    isTerminal: surroundings.stdout.isTerminal && !toFile,
    environment: surroundings.environment,
  });
  const columns = toFile ? undefined : (surroundings.stdout.columns ?? columnsOf(surroundings.environment));
  const paint = await report.painter(level);
  return {
    columns: columns ?? UNKNOWN_TERMINAL,
    paint: !toFile && asciiOnly(surroundings.environment) ? report.inAscii(paint) : paint,
    ...(given.digits === undefined ? {} : { digits: given.digits }),
  };
}
