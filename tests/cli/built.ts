/** @module The bundled program, built once for a test file, for what only a process can show. */
import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { rmSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

const ROOT = fileURLToPath(new URL('../..', import.meta.url));

interface Bundler {
  bundle(outdir: string): Promise<unknown>;
}

const isBundler = (module: object): module is Bundler => 'bundle' in module;

/** Bundles into a folder of this process's own below node_modules, where the catalogue is found as in dist/. */
export async function builtProgram(): Promise<string> {
  const path = new URL('../../esbuild.config.mjs', import.meta.url).href;
  const module: unknown = await import(path);
  if (typeof module !== 'object' || module === null || !isBundler(module)) throw new Error('no bundler');
  const outdir = join(ROOT, 'node_modules', '.cache', 'leastterm', `test-${process.pid}`);
  await module.bundle(outdir);
  return join(outdir, 'leastterm.mjs');
}

/** Removes what builtProgram left; nothing when it left nothing. */
export function removeProgram(program: string): void {
  if (program !== '') rmSync(dirname(program), { recursive: true, force: true });
}

export interface Ended {
  readonly status: number | null;
  readonly signal: NodeJS.Signals | null;
  readonly stdout: string;
  readonly stderr: string;
}

/** Runs a shell line in bash; $LEASTTERM stands for the program. */
export async function bash(program: string, line: string): Promise<Ended> {
  const child = spawn('bash', ['-c', line], {
    cwd: ROOT,
    stdio: ['ignore', 'pipe', 'pipe'],
    env: { PATH: process.env['PATH'], LEASTTERM: `${process.execPath} ${program}`, LANG: 'de_DE.UTF-8' },
  });
  let stdout = '';
  let stderr = '';
  child.stdout.setEncoding('utf8').on('data', (text: string) => {
    stdout += text;
  });
  child.stderr.setEncoding('utf8').on('data', (text: string) => {
    stderr += text;
  });
  await once(child, 'close');
  return { status: child.exitCode, signal: child.signalCode, stdout, stderr };
}
