/** @module The message for a word that is no command. */
import { nearest } from '../series/index.js';
import type { Command } from './command.js';

export function unknownCommand(word: string, commands: readonly Command[]): string {
  const names = commands.map((command) => command.name);
  const near = nearest(word, names);
  const hint = near === undefined ? `wanted one of ${names.join(', ')}` : `did you mean ${near}?`;
  return `"${word}" is no command; ${hint}`;
}
