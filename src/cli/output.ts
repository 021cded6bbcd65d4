/** @module Where a result goes: standard output, or a file that is whole or not there. */
import { closeSync, fsyncSync, openSync, realpathSync, renameSync, rmSync, statSync, writeSync } from 'node:fs';
import { basename, dirname, join } from 'node:path';
import { UsageError } from './faults.js';
import type { Call } from './command.js';

const codeOf = (error: unknown): string =>
  error instanceof Error && 'code' in error && typeof error.code === 'string' ? error.code : '';

const REASONS: Readonly<Record<string, string>> = {
  ENOENT: 'its folder does not exist',
  ENOTDIR: 'its folder is not a folder',
  EISDIR: 'it is a folder',
  EACCES: 'no permission to write there',
  EPERM: 'no permission to write there',
  EROFS: 'the file system is read-only',
  ENOSPC: 'no space left on the device',
  EDQUOT: 'the disk quota is used up',
  ENAMETOOLONG: 'the name is too long',
};

/** The reason of a failed write in words. */
export function writeFailure(error: unknown): string {
  const code = codeOf(error);
  return REASONS[code] ?? (code === '' ? String(error) : `the system says ${code}`);
}

const bytesOf = (data: string | Uint8Array): Uint8Array =>
  typeof data === 'string' ? Buffer.from(data, 'utf8') : data;

function writeAll(descriptor: number, data: string | Uint8Array): void {
  const bytes = bytesOf(data);
  for (let done = 0; done < bytes.length;) done += writeSync(descriptor, bytes, done);
}

/** Behind a symbolic link stands the file to replace; a device or pipe cannot be replaced. */
function target(path: string): { readonly path: string; readonly plain: boolean } {
  try {
    const real = realpathSync(path);
    return { path: real, plain: statSync(real).isFile() };
  } catch (error) {
    if (codeOf(error) === 'ENOENT') return { path, plain: true };
    throw error;
  }
}

/**
 * Writes a file through a temporary neighbour and a rename: a reader, a full disk or an interruption never meets half of
 * it. Devices and pipes are written directly.
 */
export function writeWhole(path: string, text: string | Uint8Array): void {
  const { path: real, plain } = target(path);
  if (!plain) {
    const descriptor = openSync(real, 'w');
    try {
      writeAll(descriptor, text);
    } finally {
      closeSync(descriptor);
    }
    return;
  }
  const temporary = join(dirname(real), `.${basename(real)}.${process.pid}.part`);
  try {
    const descriptor = openSync(temporary, 'wx', 0o666);
    try {
      writeAll(descriptor, text);
      fsyncSync(descriptor);
    } finally {
      closeSync(descriptor);
    }
    renameSync(temporary, real);
  } catch (error) {
    rmSync(temporary, { force: true });
    throw error;
  }
}

/** Sends a result where the command line wants it. */
export function deliver(text: string | Uint8Array, { given, surroundings }: Call): void {
  const { output } = given;
  if (output === undefined || output === '-') {
    surroundings.stdout.write(text);
    return;
  }
  try {
    writeWhole(output, text);
  } catch (error) {
    throw new UsageError(`--output: ${output} cannot be written: ${writeFailure(error)}; name another file`);
  }
  if (!given.quiet) surroundings.stderr.write(`wrote ${output}\n`);
}
