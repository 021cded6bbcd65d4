/** The page of a report: self-contained, well formed, with its results inside. */
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { leastterm, words } from '../cli/harness.js';

let folder = '';
let page = '';
beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'leastterm-test-'));
  page = (await leastterm(words("report adler --at '0.3156(30)'"))).stdout;
}, 120_000);
afterAll(() => rmSync(folder, { recursive: true }));

test('loads nothing: no address, no source, no style sheet from elsewhere', () => {
  const outside = page
    .replaceAll(/xmlns="[^"]*"/g, '')
    .replaceAll(/<script type="application\/json"[\s\S]*?<\/script>/g, '')
    .match(/(src|href)="(?!#)[^"]*"|url\((?!#)|@import|https?:/g);
  expect(outside).toBeNull();
});

test('every section that the contents name is there, ids are unique, pictures have texts', () => {
  const ids = [...page.matchAll(/ id="([^"]+)"/g)].map((match) => match[1]);
  expect(new Set(ids).size).toBe(ids.length);
  for (const [, target] of page.matchAll(/href="#([^"]+)"/g)) expect(ids).toContain(target);
  const pictures = [...page.matchAll(/<svg [^>]*>/g)];
  expect(pictures.length).toBeGreaterThan(5);
  for (const [svg] of pictures) expect(svg).toContain('role="img"');
  expect(page).toContain('<math');
});

test('a page drawn again from the results inside it is the same page', async () => {
  const results = JSON.parse(
    /<script type="application\/json" id="results">([\s\S]*?)<\/script>/.exec(page)![1]!,
  ) as unknown[];
  const files = results.map((result, i) => {
    const path = join(folder, `${i}.json`);
    writeFileSync(path, JSON.stringify(result));
    return path;
  });
  const { status, stdout } = await leastterm(['report', ...files]);
  expect(status).toBe(0);
  // The hashes of the input files are there instead of nothing; all else is alike.
  const bare = (text: string): string => text.replaceAll(/<dt>sha256 of [^<]*<\/dt><dd>[^<]*<\/dd>/g, '');
  expect(bare(stdout)).toBe(bare(page));
});

test('texts of a series cannot become markup', async () => {
  const path = join(folder, 'odd.yaml');
  writeFileSync(path, 'title: "<script>alert(1)</script> & \\"odd\\""\ncoefficients: [1, -1, 2, -6, 24, -120]\n');
  const { stdout } = await leastterm(['report', path, '--at', '0.1']);
  expect(stdout).not.toContain('<script>alert');
  expect(stdout).toContain('&lt;script&gt;alert(1)&lt;/script&gt; &amp; &quot;odd&quot;');
});

test('replay of a saved result: nothing moved; of no result: a complaint', async () => {
  const path = join(folder, 'result.json');
  writeFileSync(path, (await leastterm(words('sum adler --at 0.3156 --by borel-pade --json'))).stdout);
  expect((await leastterm(['replay', path])).stdout).toBe(`${path}: nothing moved\n`);
  const changed = readFileSync(path, 'utf8').replace('"at": "0.3156"', '"at": "0.32"');
  writeFileSync(path, changed);
  const moved = await leastterm(['replay', path]);
  expect(moved.status).toBe(1);
  expect(moved.stdout).toContain('the coupling has another value');
  writeFileSync(path, '{}');
  const refused = await leastterm(['replay', path]);
  expect(refused.status).toBe(2);
  expect(refused.stderr).toContain('holds no result');
});
