/**
 * Malformed files, each with the exact messages it must bring: folder malformed/, messages in malformed/expected.txt
 * (a line "== file", then one line a problem).
 */
import { readFileSync, readdirSync, writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, test } from 'vitest';
import { InputError, loadSeries } from '../../src/series/index.js';

const FOLDER = fileURLToPath(new URL('malformed/', import.meta.url));
const EXPECTED = `${FOLDER}expected.txt`;
const FILES = readdirSync(FOLDER)
  .filter((name) => name !== 'expected.txt')
  .toSorted();

async function messages(name: string): Promise<string[]> {
  try {
    await loadSeries(FOLDER + name);
    return ['(read without complaint)'];
  } catch (error) {
    if (!(error instanceof InputError)) throw error;
    return error.message.split('\n').map((line) => line.replaceAll(FOLDER, ''));
  }
}

// LEASTTERM_RECORD=1 writes what is seen now, to be read and judged before it is kept.
if (process.env['LEASTTERM_RECORD'] === '1') {
  test('record', async () => {
    const blocks = await Promise.all(FILES.map(async (name) => `== ${name}\n${(await messages(name)).join('\n')}\n`));
    writeFileSync(EXPECTED, blocks.join('\n'));
  });
}

const expected = new Map(
  readFileSync(EXPECTED, 'utf8')
    .split(/^== /m)
    .slice(1)
    .map((block) => {
      const [name = '', ...lines] = block.trim().split('\n');
      return [name, lines] as const;
    }),
);

describe('malformed files', () => {
  test('there are at least forty, and each has its messages', () => {
    expect(FILES.length).toBeGreaterThanOrEqual(40);
    expect([...expected.keys()]).toEqual(FILES);
  });

  test.each(FILES)('%s', async (name) => {
    const seen = await messages(name);
    expect(seen).toEqual(expected.get(name));
    for (const line of seen) expect(line).toMatch(/^[^:]+(?::\d+:\d+)?: .+; wanted .+$/);
  });
});
