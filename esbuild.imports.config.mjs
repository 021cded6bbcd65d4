/**
 * A plugin for esbuild that imports each name from the file that declares it, past the rooms' index files.
 *
 * esbuild cuts chunks by files: whoever imports one name from a room's index reaches every file of that room, used or not, so that
 * `assess` loaded the text of all commands (870 kB; 630 kB with this). The sources keep to the indices; only the bundle goes past them.
 */
import { readFileSync } from 'node:fs';
import { dirname, relative, resolve } from 'node:path';
import ts from 'typescript';

const parsed = new Map();

/** What a source file exports: names declared there, names handed on as [file, name there], files handed on whole. */
function exportsOf(path) {
  const known = parsed.get(path);
  if (known !== undefined) return known;
  const source = ts.createSourceFile(path, readFileSync(path, 'utf8'), ts.ScriptTarget.ES2022, false, ts.ScriptKind.TS);
  const face = { source, own: new Set(), handedOn: new Map(), whole: [] };
  parsed.set(path, face);
  for (const statement of source.statements) {
    if (ts.isExportDeclaration(statement) && statement.moduleSpecifier !== undefined && !statement.isTypeOnly) {
      const file = resolve(dirname(path), sourceName(statement.moduleSpecifier.text));
      const clause = statement.exportClause;
      if (clause === undefined) face.whole.push(file);
      else if (ts.isNamespaceExport(clause)) face.handedOn.set(clause.name.text, [file, '*']);
      else
        for (const one of values(clause)) face.handedOn.set(one.name.text, [file, (one.propertyName ?? one.name).text]);
    } else if (ts.isExportDeclaration(statement) && !statement.isTypeOnly) {
      for (const one of values(statement.exportClause)) face.own.add(one.name.text);
    } else if (statement.modifiers?.some(({ kind }) => kind === ts.SyntaxKind.ExportKeyword)) {
      const named = ts.isVariableStatement(statement) ? statement.declarationList.declarations : [statement];
      for (const { name } of named) face.own.add(name.text);
    }
  }
  return face;
}

/** The elements of an import or export clause that are there when the program runs. */
const values = (clause) => clause.elements.filter(({ isTypeOnly }) => !isTypeOnly);
const sourceName = (specifier) => specifier.replace(/\.js$/, '.ts');

/** Where a name that a file exports is declared: [file, name there], '*' for all of a file, or undefined. */
function declarationOf(path, name) {
  if (name === '*') return [path, '*'];
  const { own, handedOn, whole } = exportsOf(path);
  if (own.has(name)) return [path, name];
  const next = handedOn.get(name);
  if (next !== undefined) return declarationOf(...next);
  for (const file of whole) {
    const found = declarationOf(file, name);
    if (found !== undefined) return found;
  }
  return undefined;
}

/** `import { a as b } from …` or `export { a as b } from …` for each name of a statement that reads from an index. */
function direct(path, statement, keyword, clause) {
  const index = resolve(dirname(path), sourceName(statement.moduleSpecifier.text));
  return values(clause).map(({ name, propertyName }) => {
    const wanted = (propertyName ?? name).text;
    // A name that is nowhere stays with the index, where esbuild reports it.
    const found = declarationOf(index, wanted) ?? [index, wanted];
    const from = relative(dirname(path), found[0]).replace(/\.ts$/, '.js');
    const what = found[1] === '*' ? `* as ${name.text}` : `{ ${found[1]} as ${name.text} }`;
    return `${keyword} ${what} from '${from.startsWith('.') ? from : `./${from}`}';`;
  });
}

export const directImports = {
  name: 'direct-imports',
  setup({ onLoad }) {
    onLoad({ filter: /\/src\/.*\.ts$/ }, ({ path }) => {
      const { source } = exportsOf(path);
      let contents = '';
      let at = 0;
      for (const statement of source.statements) {
        const specifier = statement.moduleSpecifier?.text;
        if (specifier === undefined || !/^\..*\/index\.js$/.test(specifier)) continue;
        const isImport = ts.isImportDeclaration(statement);
        const clause = isImport ? statement.importClause?.namedBindings : statement.exportClause;
        const typesOnly = isImport ? statement.importClause?.isTypeOnly : statement.isTypeOnly;
        if (typesOnly || clause === undefined || clause.elements === undefined) continue;
        const lines = direct(path, statement, isImport ? 'import' : 'export', clause);
        contents += source.text.slice(at, statement.getStart(source)) + lines.join(' ');
        at = statement.end;
      }
      return { contents: contents + source.text.slice(at), loader: 'ts' };
    });
  },
};
