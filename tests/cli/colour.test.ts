import { expect, test } from 'vitest';
import { colourLevel } from '../../src/cli/colour.js';

const TERMINAL = { refused: false, isTerminal: true };
const PIPE = { refused: false, isTerminal: false };

test.each([
  ['a terminal', TERMINAL, {}, 1],
  ['a pipe', PIPE, {}, 0],
  ['NO_COLOR', TERMINAL, { NO_COLOR: '1' }, 0],
  ['an empty NO_COLOR counts as not set', TERMINAL, { NO_COLOR: '' }, 1],
  ['TERM=dumb', TERMINAL, { TERM: 'dumb' }, 0],
  ['--no-color', { refused: true, isTerminal: true }, {}, 0],
  ['FORCE_COLOR in a pipe', PIPE, { FORCE_COLOR: '1' }, 1],
  ['FORCE_COLOR without value', PIPE, { FORCE_COLOR: '' }, 1],
  ['FORCE_COLOR=0', TERMINAL, { FORCE_COLOR: '0' }, 0],
  ['FORCE_COLOR=false', TERMINAL, { FORCE_COLOR: 'false' }, 0],
  ['FORCE_COLOR=3', PIPE, { FORCE_COLOR: '3' }, 3],
  ['FORCE_COLOR on a dumb terminal', TERMINAL, { FORCE_COLOR: '2', TERM: 'dumb' }, 2],
  ['NO_COLOR against FORCE_COLOR', TERMINAL, { NO_COLOR: '1', FORCE_COLOR: '1' }, 0],
  ['--no-color against FORCE_COLOR', { refused: true, isTerminal: true }, { FORCE_COLOR: '1' }, 0],
] as const)('%s', (_, stream, environment, level) => {
  expect(colourLevel({ ...stream, environment })).toBe(level);
});
