/**
 * Writes reports of catalogue series and of an invented one with the built program, and opens each in headless Chromium.
 *
 *   npm run build && npm run check:report
 */
import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

const root = fileURLToPath(new URL('../..', import.meta.url));
const folder = mkdtempSync(join(tmpdir(), 'leastterm-report-'));
const CASES = [
  ['adler', '--at', '0.3156(30)'],
  ['pole-msbar', '--at', '0.2268'],
  ['tessel', '--at', '0.2'],
];

const node = (...words) => spawnSync(process.execPath, words, { cwd: root, stdio: 'inherit' }).status ?? 1;
let failed = 0;
for (const [name, ...options] of CASES) {
  const page = join(folder, `${name}.html`);
  console.log(name);
  failed += node('dist/leastterm.mjs', 'report', name, ...options, '-o', page, '-q');
  failed += node('tests/browser/check.mjs', page);
}
rmSync(folder, { recursive: true });
process.exitCode = failed === 0 ? 0 : 1;
