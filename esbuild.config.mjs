/**
 * Builds dist/: the program and the library as ESM, everything they need inside, rooms in chunks that are loaded when a
 * command first needs them. `node esbuild.config.mjs [folder]` builds elsewhere.
 */
import { build } from 'esbuild';
import { chmod, copyFile, mkdir, readFile, rm, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { directImports } from './esbuild.imports.config.mjs';

const root = fileURLToPath(new URL('.', import.meta.url));

/** Licence texts of the packages that the bundle holds: their licences ask for it. */
async function notices(metafile) {
  const packages = new Set(Object.values(ASSETS).map((path) => /^(?:@[^/]+\/)?[^/]+/.exec(path)[0]));
  for (const input of Object.keys(metafile.inputs)) {
    const match = /^node_modules\/((?:@[^/]+\/)?[^/]+)\//.exec(input);
    if (match !== null) packages.add(match[1]);
  }
  const parts = [];
  for (const name of [...packages].toSorted((a, b) => (a < b ? -1 : 1))) {
    const folder = join(root, 'node_modules', name);
    const { version, license } = JSON.parse(await readFile(join(folder, 'package.json'), 'utf8'));
    let text = '';
    for (const file of ['LICENSE', 'LICENSE.md', 'LICENSE.txt', 'license', 'LICENCE.md', 'LICENSE-MIT.txt']) {
      text ||= await readFile(join(folder, file), 'utf8').catch(() => '');
    }
    parts.push(`${name} ${version} (${license})\n\n${text.trim()}\n`);
  }
  return `Leastterm's bundle holds the following packages.\n\n${parts.join(`\n${'-'.repeat(80)}\n\n`)}`;
}

/**
 * yargs/helpers re-exports the word parser beside helpers that load the rest of yargs. Nothing of that rest acts when it is
 * loaded, which its package does not say: said here, it stays out of the bundle.
 */
const parserOnly = {
  name: 'yargs-parser-only',
  setup({ onResolve }) {
    onResolve({ filter: /^\.\.\/(build|lib)\// }, ({ path, resolveDir }) =>
      resolveDir.endsWith('/yargs/helpers') ? { path: join(resolveDir, path), sideEffects: false } : undefined,
    );
  },
};

/** Files that pictures need beside the code; `src/pictures/assets.ts` finds them. */
const ASSETS = {
  'DejaVuSans.ttf': 'dejavu-fonts-ttf/ttf/DejaVuSans.ttf',
  'DejaVuSans-Oblique.ttf': 'dejavu-fonts-ttf/ttf/DejaVuSans-Oblique.ttf',
  'resvg.wasm': '@resvg/resvg-wasm/index_bg.wasm',
};

export async function bundle(outdir) {
  await rm(outdir, { recursive: true, force: true });
  const { metafile } = await build({
    absWorkingDir: root,
    entryPoints: { leastterm: 'src/cli/leastterm.ts', index: 'src/index.ts' },
    outdir,
    bundle: true,
    splitting: true,
    format: 'esm',
    platform: 'node',
    target: 'node20',
    // yaml's entry for Node is CommonJS and asks for `require`, which an ESM bundle has not; its other entry is plain ESM.
    alias: { yaml: join(root, 'node_modules/yaml/browser/index.js') },
    chunkNames: 'chunks/[name]-[hash]',
    // .mjs says what it is: for .js, Node looks for a package.json and into the source, which costs a tenth of a command.
    outExtension: { '.js': '.mjs' },
    // Less text to compile is a few per cent of the start; names stay, so that a stack can be read.
    minifyWhitespace: true,
    minifySyntax: true,
    legalComments: 'none',
    plugins: [directImports, parserOnly],
    metafile: true,
    logLevel: 'warning',
  });
  await build({
    absWorkingDir: root,
    // What worker threads run, each whole in one file: sharing chunks with the program would cut those into more pieces, which every
    // command would pay for.
    entryPoints: {
      'replica-worker': 'src/extraction/replicas/worker.ts',
      'progress-worker': 'src/cli/progress-worker.ts',
    },
    outdir,
    bundle: true,
    format: 'esm',
    platform: 'node',
    target: 'node20',
    outExtension: { '.js': '.mjs' },
    minifyWhitespace: true,
    minifySyntax: true,
    legalComments: 'none',
    plugins: [directImports],
    logLevel: 'warning',
  });
  await mkdir(join(outdir, 'assets'), { recursive: true });
  for (const [name, source] of Object.entries(ASSETS))
    await copyFile(join(root, 'node_modules', source), join(outdir, 'assets', name));
  await writeFile(join(outdir, 'THIRD-PARTY-LICENSES.txt'), await notices(metafile));
  await chmod(join(outdir, 'leastterm.mjs'), 0o755);
  return metafile;
}

if (import.meta.url === pathToFileURL(process.argv[1] ?? '').href) {
  await bundle(process.argv[2] ?? join(root, 'dist'));
}
