/**
 * @module A file or standard input as text: at most LIMITS.bytes are ever held, whatever is at the other end.
 */
import { open } from 'node:fs/promises';
import { InputError } from './input-error.js';
import { LIMITS, grouped } from './limits.js';

/** The name of standard input in messages. */
export const STANDARD_INPUT = 'standard input';

/** What is found where there is no file. */
export const NO_SUCH_FILE = 'no such file';

const CHUNK = 65_536;

function reason(error: unknown): string {
  const code = error instanceof Error && 'code' in error ? String(error.code) : '';
  if (code === 'ENOENT' || code === 'ENOTDIR') return NO_SUCH_FILE;
  if (code === 'EACCES' || code === 'EPERM') return 'the file may not be read';
  if (code === 'EISDIR') return 'a directory';
  if (code === 'ENAMETOOLONG') return 'a file name that is too long';
  if (code === 'EMFILE' || code === 'ENFILE') return 'too many open files';
  return `not readable${code === '' ? '' : ` (${code})`}`;
}

const refuse = (file: string, found: string, wanted = 'a series file'): never => {
  throw new InputError([{ file, found, wanted }]);
};

/** UTF-8 bytes as text without the byte order mark; throws InputError when they are not UTF-8 text. */
export function decode(bytes: Uint8Array, file: string): string {
  if (bytes.length > LIMITS.bytes) {
    return refuse(file, `more than ${grouped(LIMITS.bytes)} bytes`, `at most ${grouped(LIMITS.bytes)}`);
  }
  if ((bytes[0] === 0xff && bytes[1] === 0xfe) || (bytes[0] === 0xfe && bytes[1] === 0xff)) {
    return refuse(file, 'text in UTF-16', 'text in UTF-8');
  }
  if (bytes.includes(0)) return refuse(file, 'binary data', 'text in UTF-8');
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    return refuse(file, 'bytes that are not UTF-8', 'text in UTF-8');
  }
}

function joined(chunks: readonly Uint8Array[]): Uint8Array {
  return Buffer.concat(chunks);
}

/** Text of a file; throws InputError. Devices and pipes are read up to the limit and no further. */
export async function readTextFile(path: string): Promise<string> {
  if (path.includes('\0')) return refuse(path.replaceAll('\0', '\\0'), 'a file name with a zero byte');
  const chunks: Uint8Array[] = [];
  let total = 0;
  try {
    const handle = await open(path, 'r');
    try {
      const stat = await handle.stat();
      if (stat.isDirectory()) return refuse(path, 'a directory');
      while (total <= LIMITS.bytes) {
        const { bytesRead, buffer } = await handle.read(new Uint8Array(CHUNK), 0, CHUNK);
        if (bytesRead === 0) break;
        chunks.push(buffer.subarray(0, bytesRead));
        total += bytesRead;
      }
    } finally {
      await handle.close();
    }
  } catch (error) {
    if (error instanceof InputError) throw error;
    return refuse(path, reason(error));
  }
  return decode(joined(chunks), path);
}

/** Text of a stream of bytes; reading stops at the limit. */
export async function readTextStream(
  stream: AsyncIterable<Uint8Array | string>,
  name = STANDARD_INPUT,
): Promise<string> {
  const chunks: Uint8Array[] = [];
  let total = 0;
  for await (const chunk of stream) {
    const bytes = typeof chunk === 'string' ? Buffer.from(chunk) : chunk;
    chunks.push(bytes);
    total += bytes.length;
    if (total > LIMITS.bytes) break;
  }
  return decode(joined(chunks), name);
}
