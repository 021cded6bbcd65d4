/**
 * Opens a report in headless Chromium: no message on the console, no request beyond the file itself, no finding of axe-core
 * (WCAG 2.2 A and AA), light and dark. Screenshots on request.
 *
 *   node tests/browser/check.mjs REPORT.html [FOLDER FOR SCREENSHOTS]
 *
 * Needs Chromium at /usr/bin/chromium (Debian's package), or at $CHROMIUM.
 */
import { readFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import { join, resolve } from 'node:path';
import { pathToFileURL } from 'node:url';
import { chromium } from 'playwright-core';

const [page, folder] = process.argv.slice(2);
if (page === undefined) throw new Error('name the report: node tests/browser/check.mjs REPORT.html');
const url = pathToFileURL(resolve(page)).href;
const axe = await readFile(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');

const browser = await chromium.launch({
  executablePath: process.env.CHROMIUM ?? '/usr/bin/chromium',
  args: [
    '--no-sandbox',
    '--disable-gpu',
    '--disable-quic',
    '--disable-background-networking',
    '--disable-component-update',
    '--disable-sync',
    '--no-first-run',
  ],
});
const problems = [];
for (const colorScheme of ['light', 'dark']) {
  const context = await browser.newContext({ colorScheme, viewport: { width: 1000, height: 1400 } });
  const tab = await context.newPage();
  tab.on('console', (message) => problems.push(`${colorScheme}: console ${message.type()}: ${message.text()}`));
  tab.on('pageerror', (error) => problems.push(`${colorScheme}: ${error.message}`));
  tab.on('request', (request) => {
    if (request.url() !== url && !request.url().startsWith('data:'))
      problems.push(`${colorScheme}: request ${request.url()}`);
  });
  await tab.goto(url);
  await tab.evaluate(axe);
  const { violations, passes } = await tab.evaluate(() =>
    globalThis.axe.run({ runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice'] }),
  );
  for (const { id, help, nodes } of violations)
    problems.push(`${colorScheme}: ${id}: ${help} (${nodes.length}): ${nodes[0].html.slice(0, 160)}`);
  console.log(`${colorScheme}: ${passes.length} rules passed, ${violations.length} violated`);
  if (folder !== undefined) {
    await tab.screenshot({ path: join(folder, `report-${colorScheme}.png`), fullPage: true });
    await tab.setViewportSize({ width: 390, height: 844 });
    await tab.screenshot({ path: join(folder, `report-${colorScheme}-narrow.png`) });
  }
  await context.close();
}
await browser.close();
for (const problem of problems) console.log(problem);
console.log(problems.length === 0 ? 'no problem found' : `${problems.length} problems`);
process.exitCode = problems.length === 0 ? 0 : 1;
