#!/usr/bin/env node
/** @module The program: the process's own streams and exit code around one run. */
import { EXIT, tell } from './faults.js';
import { writeFailure } from './output.js';
import { run } from './run.js';
import { processSurroundings } from './surroundings.js';

/** A reader that has seen enough (`| head`) is no error; any other failed write is told on standard error. */
function onWriteError(error: Error): void {
  if ('code' in error && error.code === 'EPIPE') return;
  process.exitCode = EXIT.wrongInput;
  process.stderr.write(`leastterm: standard output cannot be written: ${writeFailure(error)}\n`);
}

process.stdout.on('error', onWriteError);
process.stderr.on('error', () => {
  // Nowhere is left to say so.
});
process.on('uncaughtException', (error) => {
  const { text, exitCode } = tell(error, (process.env['LEASTTERM_DEBUG'] ?? '') !== '');
  process.stderr.write(text);
  process.exitCode = exitCode;
});

// The exit code is set, never forced: process.exit() would cut off what a pipe has not taken yet.
const exitCode = await run(process.argv.slice(2), processSurroundings());
process.exitCode ??= exitCode;
