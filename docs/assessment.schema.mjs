/**
 * Writes docs/assessment.schema.json from the TypeScript types of the assessment, so that type and schema cannot drift
 * apart: `npm run schema`. The types are read as syntax; only the forms that they use are known, any other stops the run.
 */
import { readFileSync, writeFileSync } from 'node:fs';
import { fileURLToPath, pathToFileURL } from 'node:url';
import ts from 'typescript';

const SOURCES = ['basics', 'growth', ''].map(
  (part) => new URL(`../src/studies/assessment${part === '' ? '' : `-${part}`}.ts`, import.meta.url),
);
const TARGET = new URL('assessment.schema.json', import.meta.url);

const docOf = (node) => {
  const comments = ts.getJSDocCommentsAndTags(node).map((doc) => ts.getTextOfJSDocComment(doc.comment));
  const text = comments.filter((comment) => comment !== undefined).join(' ');
  return text === '' ? {} : { description: text.replace(/\s+/g, ' ') };
};

function objectSchema(members) {
  const properties = {};
  const required = [];
  let additionalProperties = false;
  for (const member of members) {
    if (ts.isIndexSignatureDeclaration(member)) {
      additionalProperties = schemaOf(member.type);
      continue;
    }
    const name = member.name.text;
    properties[name] = { ...docOf(member), ...schemaOf(member.type) };
    if (member.questionToken === undefined) required.push(name);
  }
  return {
    type: 'object',
    ...(Object.keys(properties).length > 0 ? { properties } : {}),
    ...(required.length > 0 ? { required } : {}),
    additionalProperties,
  };
}

function unionSchema(types) {
  const values = types.map((type) => (ts.isLiteralTypeNode(type) ? type.literal.text : undefined));
  if (values.every((value) => value !== undefined)) return { enum: values };
  return { anyOf: types.map((type) => schemaOf(type)) };
}

function tupleSchema(elements) {
  const items = elements.map((element) => schemaOf(ts.isNamedTupleMember(element) ? element.type : element));
  return { type: 'array', items, minItems: items.length, maxItems: items.length };
}

function schemaOf(type) {
  switch (type.kind) {
    case ts.SyntaxKind.StringKeyword:
      return { type: 'string' };
    case ts.SyntaxKind.NumberKeyword:
      return { type: 'number' };
    case ts.SyntaxKind.BooleanKeyword:
      return { type: 'boolean' };
    case ts.SyntaxKind.ParenthesizedType:
      return schemaOf(type.type);
    case ts.SyntaxKind.TypeOperator:
      return schemaOf(type.type);
    case ts.SyntaxKind.ArrayType:
      return { type: 'array', items: schemaOf(type.elementType) };
    case ts.SyntaxKind.TupleType:
      return tupleSchema(type.elements);
    case ts.SyntaxKind.UnionType:
      return unionSchema(type.types);
    case ts.SyntaxKind.LiteralType:
      return { const: type.literal.text };
    case ts.SyntaxKind.TypeLiteral:
      return objectSchema(type.members);
    case ts.SyntaxKind.TypeReference:
      return { $ref: `#/definitions/${type.typeName.text}` };
    default:
      throw new Error(`no schema for the type ${type.getText()}`);
  }
}

const statementsOf = (path) =>
  ts.createSourceFile(path, readFileSync(path, 'utf8'), ts.ScriptTarget.ES2022, true).statements;

/** The schema as an object. */
export function assessmentSchema() {
  const definitions = {};
  for (const statement of SOURCES.flatMap((source) => [...statementsOf(fileURLToPath(source))])) {
    if (ts.isInterfaceDeclaration(statement)) {
      if (statement.heritageClauses !== undefined) throw new Error(`${statement.name.text} extends another type`);
      definitions[statement.name.text] = { ...docOf(statement), ...objectSchema(statement.members) };
    } else if (ts.isTypeAliasDeclaration(statement)) {
      definitions[statement.name.text] = { ...docOf(statement), ...schemaOf(statement.type) };
    }
  }
  const { Assessment: root, ...rest } = definitions;
  const used = new Set(JSON.stringify(definitions).match(/(?<=#\/definitions\/)\w+/g));
  const defs = Object.fromEntries(Object.entries(rest).filter(([name]) => used.has(name)));
  return {
    $schema: 'http://json-schema.org/draft-07/schema#',
    title: 'Leastterm assessment',
    description:
      'The object that leastterm assess --json writes. Numbers are decimal strings with as many digits as are known.',
    ...root,
    definitions: defs,
  };
}

/** The text of the schema file. */
export const schemaText = () => `${JSON.stringify(assessmentSchema(), null, 2)}\n`;

if (import.meta.url === pathToFileURL(process.argv[1] ?? '').href) writeFileSync(TARGET, schemaText());
