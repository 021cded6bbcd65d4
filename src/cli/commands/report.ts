/** @module leastterm report: everything about a series on one page. */
import { createHash } from 'node:crypto';
import { readFile } from 'node:fs/promises';
import type { Call, Command } from '../command.js';
import { EXIT, UsageError } from '../faults.js';
import { couplingOf, readSeries, requestOf, USUAL_DIGITS, wantedCoupling } from '../input.js';
import { deliver } from '../output.js';
import { drawnFrom, savedResult } from '../saved.js';
import type { SavedResult } from '../../pictures/index.js';

type Provenance = (readonly [name: string, value: string])[];

/** Coefficients hidden in the page's back-test. */
const HIDDEN = 2;

/** All studies of the page for a series. */
async function studied(name: string, call: Call): Promise<SavedResult[]> {
  const { given } = call;
  const wanted = await wantedCoupling(call, report.name);
  const series = await readSeries(name, call);
  const { at, path } = await couplingOf(wanted, series, report.name);
  const { studies } = await import('../rooms.js');
  const options = (command: string) => ({
    ...(given.order === undefined ? {} : { order: given.order }),
    ...(path === undefined ? {} : { path }),
    digits: given.digits ?? USUAL_DIGITS,
    request: { ...requestOf(command, name, call), command },
  });
  const makers: readonly (() => object)[] = [
    () => studies.assess(series, at, options('assess')),
    () => studies.compare(series, [at], options('compare')),
    () => studies.truncationStudy(series, at, options('truncation')),
    () => studies.scaleDependence(series, at, options('scale')),
    () => studies.laplaceIntegrand(series, at, options('integrand')),
    () => studies.backtest(series, at, { ...options('backtest'), hide: HIDDEN }),
  ];
  const results = makers.map((make, i) => {
    call.surroundings.progress?.step(i, makers.length);
    return make();
  });
  const { pictures } = await import('../rooms-pictures.js');
  // What went through JSON is what a saved file would hold.
  return results.map((result): unknown => JSON.parse(JSON.stringify(result))).filter(pictures.isSavedResult);
}

const sha256 = (bytes: string | Uint8Array): string => createHash('sha256').update(bytes).digest('hex');

/** The hash of an input that is a file. */
async function fileHash(name: string): Promise<Provenance> {
  try {
    return [[`sha256 of ${name}`, sha256(await readFile(name))]];
  } catch {
    return [];
  }
}

async function run(call: Call): Promise<number> {
  const { operands } = call;
  const results: SavedResult[] = [];
  const provenance: Provenance = [];
  const files: string[] = [];
  for (const name of operands) {
    const saved = await savedResult(name, report.name);
    if (saved === undefined && operands.length > 1)
      throw new UsageError(
        `${name} is no saved result; several operands must all be files written with --json`,
        report.name,
      );
    if (saved !== undefined) files.push(name);
    results.push(...(saved === undefined ? await studied(name, call) : [saved]));
    provenance.push(...(await fileHash(name)));
  }
  provenance.push(['sha256 of the results', sha256(JSON.stringify(results))]);
  const { papers } = await import('../rooms-pictures.js');
  const page = drawnFrom(files, report.name, () => papers.reportPage({ results, provenance }));
  deliver(page, call);
  return EXIT.done;
}

export const report: Command = {
  name: 'report',
  summary: 'everything about a series on one self-contained HTML page',
  about: [
    'Assesses the series, compares all prescriptions, runs the truncation models, moves the scale and back-tests, and writes one HTML file with tables, pictures, cautions, formulas and references, the provenance, and the results themselves as JSON. The page loads nothing from anywhere.',
    'With files written by --json (of assess, compare, extract and others), the page is drawn from them alone.',
  ],
  operands: [{ name: 'SERIES', help: 'a catalogue id, a series file, or saved results', several: true }],
  options: ['at', 'alpha-s-mz', 'order', 'flavours', 'digits', 'output', 'quiet', 'help'],
  examples: [
    ['leastterm report adler --at 0.3156 -o adler.html', 'the page of the Adler function'],
    ['leastterm report result.json -o result.html', 'a page drawn from a saved result'],
  ],
  run,
};
