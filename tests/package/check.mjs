/**
 * Packs, installs the tarball into an empty folder without a network, and uses it there as a user would: the program, the
 * library, its types, the schema. `npm run check:package`.
 */
import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

const ROOT = fileURLToPath(new URL('../..', import.meta.url));
const folder = mkdtempSync(join(tmpdir(), 'leastterm-package-'));
const run = (command, argv, cwd = folder) => execFileSync(command, argv, { cwd, encoding: 'utf8' });

const CONSUMER = `
import { assess, isNumberProblem, loadSeries, parseUncertain } from 'leastterm';
import type { Assessment } from 'leastterm';

const series = await loadSeries('adler');
const at = parseUncertain('0.3156(30)');
if (isNumberProblem(at)) throw new Error(at.problem);
const result: Assessment = assess(series, at, { digits: 15, request: {} });
const printed: string = result.verdict.printed;
console.log(printed);
`;

function step(name, action) {
  const result = action();
  console.log(`${name}: ${result}`);
}

try {
  const [{ filename, files, size }] = JSON.parse(run('npm', ['pack', '--json', '--pack-destination', folder], ROOT).replace(/^[^[]*/s, ''));
  step('packed', () => `${filename}, ${files.length} files, ${Math.round(size / 1024)} KiB`);
  writeFileSync(join(folder, 'package.json'), '{ "name": "consumer", "private": true, "type": "module" }\n');
  run('npm', ['install', '--offline', '--no-audit', '--no-fund', join(folder, filename)]);
  const bin = join(folder, 'node_modules', '.bin', 'leastterm');
  step('--version', () => run(bin, ['--version']).trim());
  const verdict = run(bin, ['assess', 'adler', '--at', '0.3156(30)', '-q']).trim();
  step('assess adler', () => verdict);

  // The worker's file has to be found where the package is installed.
  const replicas = (workers) =>
    run(bin, ['extract', 'tau-delta0', '--measured', '0.2042(30)', '--for', 'alpha_s', '--only', 'fixed-order', '--replicas', '2000', '--workers', workers]);
  step('replicas', () => {
    if (replicas('2') !== replicas('1')) throw new Error('two threads give other replicas than one');
    return 'the same on one thread and on two';
  });

  writeFileSync(join(folder, 'consumer.ts'), CONSUMER);
  writeFileSync(
    join(folder, 'tsconfig.json'),
    JSON.stringify({
      compilerOptions: { strict: true, target: 'ES2022', lib: ['ES2023', 'DOM'], module: 'NodeNext', types: ['node'], skipLibCheck: false, outDir: 'out' },
      include: ['consumer.ts'],
    }),
  );
  symlinkSync(join(ROOT, 'node_modules', '@types'), join(folder, 'node_modules', '@types'));
  symlinkSync(join(ROOT, 'node_modules', 'undici-types'), join(folder, 'node_modules', 'undici-types'));
  run(process.execPath, [join(ROOT, 'node_modules', 'typescript', 'bin', 'tsc'), '-p', folder]);
  step('types', () => 'a strict consumer compiles');
  const library = run(process.execPath, [join(folder, 'out', 'consumer.js')]).trim();
  if (library !== verdict) throw new Error(`the library says ${library}`);
  step('library', () => library);
  run(process.execPath, ['-e', "import('leastterm/assessment.schema.json', { with: { type: 'json' } }).then((m) => m.default.title)"]);
  step('schema', () => 'found');
} finally {
  rmSync(folder, { recursive: true, force: true });
}
