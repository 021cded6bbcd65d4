/** @module leastterm plot: a chart of a series, or of a saved result. */
import type { Call, Command } from '../command.js';
import { EXIT, UsageError } from '../faults.js';
import { couplingOf, readSeries, requestOf, USUAL_DIGITS, wantedCoupling } from '../input.js';
import { deliver } from '../output.js';
import { presentation } from '../present.js';
import { drawnFrom, savedResult } from '../saved.js';
import type { Chart, ChartKind, Format, SavedResult } from '../../pictures/index.js';

const FORMS = ['svg', 'pdf', 'png'] as const;
type Form = (typeof FORMS)[number];

/** A chart in wider lines than this does not read better. */
const MOST_COLUMNS = 100;

const isForm = (text: string): text is Form => FORMS.some((form) => form === text);

async function kindOf(name: string): Promise<ChartKind> {
  const { pictures } = await import('../rooms-pictures.js');
  const found = pictures.chartKind(name);
  if (found !== undefined) return found;
  const { series } = await import('../rooms.js');
  const names = pictures.CHART_KINDS.map((kind) => kind.name);
  throw new UsageError(
    `no chart "${name}"${series.suggestion(name, names)}; wanted one of ${names.join(', ')}`,
    plot.name,
  );
}

/** How to write: characters, or one of the forms; what the options leave open, the output decides. */
function formOf({ given, surroundings }: Call): Form | 'terminal' {
  const { as, output, terminal } = given;
  if (terminal === true && as !== undefined)
    throw new UsageError('--terminal and --as exclude each other: give one of them', plot.name);
  if (terminal === true) return 'terminal';
  if (as !== undefined) {
    if (isForm(as)) return as;
    throw new UsageError(`--as: no form "${as}"; wanted one of ${FORMS.join(', ')}`, plot.name);
  }
  if (output === undefined || output === '-') return surroundings.stdout.isTerminal ? 'terminal' : 'svg';
  const ending = /\.([a-z0-9]+)$/i.exec(output)?.[1]?.toLowerCase() ?? '';
  if (isForm(ending)) return ending;
  if (ending === 'txt') return 'terminal';
  throw new UsageError(
    `--output: the ending of ${output} names no form; end it in .svg, .pdf, .png or .txt, or write --as svg`,
    plot.name,
  );
}

async function sizeOf(name: string | undefined): Promise<Format> {
  const { pictures } = await import('../rooms-pictures.js');
  const format = pictures.formatNamed(name ?? 'column');
  if (format !== undefined) return format;
  throw new UsageError(
    `--size: no size "${name}"; wanted one of ${pictures.FORMATS.map((f) => f.name).join(', ')}`,
    plot.name,
  );
}

/** The result that a kind of chart needs, worked out for a series. */
async function resultFor(kind: ChartKind, name: string, call: Call): Promise<SavedResult> {
  const { given } = call;
  const wanted = await wantedCoupling(call, plot.name);
  const series = await readSeries(name, call);
  const { at, path } = await couplingOf(wanted, series, plot.name);
  const { studies } = await import('../rooms.js');
  const [command = ''] = kind.from;
  const request = { ...requestOf(command, name, call), command };
  const options = {
    ...(given.order === undefined ? {} : { order: given.order }),
    ...(path === undefined ? {} : { path }),
    digits: given.digits ?? USUAL_DIGITS,
    request,
  };
  const hide = 3;
  const results: Readonly<Record<string, () => object>> = {
    assess: () => studies.assess(series, at, options),
    compare: () => studies.compare(series, [at], options),
    backtest: () => studies.backtest(series, at, { ...options, hide }),
    scale: () => studies.scaleDependence(series, at, options),
    integrand: () => studies.laplaceIntegrand(series, at, options),
  };
  const make = results[command];
  if (make === undefined)
    throw new UsageError(
      `plot ${kind.name} draws a saved result of ${kind.from.join(' or ')}: write its --json to a file, and name the file`,
      plot.name,
    );
  return { ...make(), request };
}

/** Nothing to draw is no picture: the reason instead. */
function checkDrawn(kind: ChartKind, chart: Chart, result: SavedResult): void {
  if (chart.data.some(({ rows }) => rows.length > 0)) return;
  const refused = 'refused' in result ? result['refused'] : 'stopped' in result ? result['stopped'] : undefined;
  const reason =
    typeof refused === 'object' && refused !== null && 'reason' in refused ? `: ${String(refused.reason)}` : '';
  const remedy = kind.wants === undefined ? '' : `; wanted ${kind.wants}`;
  throw new UsageError(`plot ${kind.name}: there is nothing to draw${reason}${remedy}`, plot.name);
}

async function draw(chart: Chart, call: Call, form: Form | 'terminal'): Promise<string | Uint8Array> {
  const { pictures } = await import('../rooms-pictures.js');
  if (form === 'terminal') {
    const { environment } = call.surroundings;
    const { columns } = await presentation(call);
    return pictures.terminalChart(chart, {
      columns: Math.min(columns ?? MOST_COLUMNS, MOST_COLUMNS),
      unicode: speaksUnicode(environment),
    });
  }
  const picture = pictures.pictureOf(chart, await sizeOf(call.given.size));
  if (form === 'svg') return pictures.svgOf(picture);
  return form === 'pdf' ? pictures.pdfOf(picture) : pictures.pngOf(picture);
}

/** The locale says whether the terminal shows more than ASCII; where it says nothing, it does. */
function speaksUnicode(environment: Call['surroundings']['environment']): boolean {
  if (environment['TERM'] === 'dumb') return false;
  const locale = environment['LC_ALL'] || environment['LC_CTYPE'] || environment['LANG'] || '';
  return locale === '' || /utf-?8/i.test(locale);
}

async function run(call: Call): Promise<number> {
  const [kindName = '', name = ''] = call.operands;
  const { given } = call;
  const kind = await kindOf(kindName);
  const form = formOf(call);
  await sizeOf(given.size);
  const saved = await savedResult(name, plot.name);
  if (saved !== undefined && !kind.from.includes(saved.request.command))
    throw new UsageError(
      `${name} holds a result of ${saved.request.command}; plot ${kind.name} draws one of ${kind.from.join(' or ')}`,
      plot.name,
    );
  const result = saved ?? (await resultFor(kind, name, call));
  const chart = drawnFrom(saved === undefined ? [] : [name], plot.name, () => kind.draw(result));
  checkDrawn(kind, chart, result);
  const { pictures } = await import('../rooms-pictures.js');
  deliver(given.csv === true ? pictures.chartCsv(chart) : await draw(chart, call, form), call);
  return EXIT.done;
}

export const plot: Command = {
  name: 'plot',
  summary: 'a chart as SVG, PDF or PNG, or drawn in the terminal',
  about: [
    'Kinds: terms (terms and partial sums), ratios, plane (the Borel plane), values (by prescription), scale (dependence on the renormalisation scale), integrand (of the Borel integral), coverage (of stated errors in back-tests), budget and replicas (of a saved extraction).',
    'SERIES may also be the file of a result written with --json by the command that the chart is drawn from: assess for terms, ratios, plane and values, growth for ratios, plane for plane, compare and sum for values, backtest for coverage, extract for budget and replicas. With --csv the plotted numbers.',
  ],
  operands: [
    { name: 'KIND', help: 'terms, ratios, plane, values, scale, integrand, coverage, budget or replicas' },
    { name: 'SERIES', help: 'a catalogue id, a series file, - for standard input, or a saved result' },
  ],
  options: [
    'at',
    'alpha-s-mz',
    'size',
    'as',
    'terminal',
    'csv',
    'order',
    'flavours',
    'digits',
    'output',
    'quiet',
    'no-color',
    'help',
  ],
  examples: [
    ['leastterm plot terms adler --at 0.3156 -o terms.pdf', 'terms and partial sums for a paper'],
    ['leastterm plot values adler --at 0.3156 --terminal', 'values by prescription, drawn with characters'],
    ['leastterm plot plane result.json --size slide -o plane.png', 'the Borel plane of a saved assessment'],
  ],
  run,
};
