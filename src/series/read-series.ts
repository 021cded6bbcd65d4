/** @module The fields of a series file, checked, as a Series. */
import { exact } from '../numerics/index.js';
import type { Exact } from '../numerics/index.js';
import type { Entry } from './entry.js';
import type { FieldReader, Group } from './field-reader.js';
import { plainSigns } from './number-text.js';
import { quote } from './quote.js';
import { readCoefficients } from './read-coefficients.js';
import { readCondensates } from './read-condensates.js';
import { readContour } from './read-contour.js';
import { readConstants } from './read-constants.js';
import { readCorrelation } from './read-correlation.js';
import { readChecks } from './read-checks.js';
import { readSingularities } from './read-singularities.js';
import { readStrongCoupling } from './read-strong-coupling.js';
import { readSources, readTexts } from './read-texts.js';
import type { Coupling, Divisor, Scale, Series } from './series.js';

/** The version of the file format that this program reads and writes. */
export const FORMAT = 1;

/** Every field of a series file, in the order in which they are written. */
export const FIELDS = [
  'format', 'title', 'quantity', 'sources', 'notes', 'invented', 'coupling', 'variable', 'first power', 'scheme', 'flavours',
  'kind', 'weight', 'flavour choices', 'scale ratio', 'hard scale', 'unit', 'factor', 'additive', 'constants', 'coefficients', 'correlation',
  'singularities', 'condensates', 'strong coupling', 'bubble chain', 'measurement', 'checks',
] as const; // prettier-ignore

export const DIVISORS: readonly Divisor[] = ['1', 'pi', '2*pi', '4*pi'];
const POWERS = { least: -100, most: 100 } as const;
const MOST_FLAVOURS = 16;

/** Without a coupling the expansion variable is called x, and stands for itself. */
const PLAIN: Coupling = { name: 'x', divisor: '1', plain: true };

/**
 * The series that an entry states; complaints go to the reader. `flavours` replaces the file's own number where nf is
 * symbolic, and is an error where it is not.
 */
export function readSeries(entry: Entry, id: string, reader: FieldReader, flavours?: number): Series | undefined {
  const whole: Entry =
    entry.kind === 'list'
      ? { kind: 'map', fields: new Map([['coefficients', { key: entry.at, value: entry }]]), at: entry.at }
      : entry;
  if (whole.kind === 'text')
    return reader.wrongKind(whole, '', 'a list of coefficients, or the fields of a series file');
  const group = reader.group(whole, '', FIELDS);
  if (group === undefined) return undefined;
  const { complaints } = reader;
  const format = group.get('format');
  if (format !== undefined) reader.integer(format, 'format', FORMAT, FORMAT);

  const fileFlavours = reader.integer(group.get('flavours'), 'flavours', 0, MOST_FLAVOURS);
  const choices = flavourChoices(group, reader);
  reader.numbers.flavours = flavours ?? fileFlavours;
  const constants = readConstants(group.get('constants'), reader);
  const coupling = readCoupling(group, reader);
  const coefficients = readCoefficients(group, reader);
  const anyFlavours = reader.numbers.flavoursUsed;
  checkFlavours();

  const measurement = reader.uncertain(group.get('measurement'), 'measurement', ['unit', 'source']);
  const unit = reader.text(measurement?.group?.get('unit'), 'measurement.unit');
  const source = reader.text(measurement?.group?.get('source'), 'measurement.source');
  const optional = {
    quantity: reader.text(group.get('quantity'), 'quantity'),
    scheme: reader.text(group.get('scheme'), 'scheme'),
    flavours: reader.numbers.flavours,
    scaleRatio: reader.exact(group.get('scale ratio'), 'scale ratio', 'positive'),
    hardScale: readScale(group.get('hard scale'), reader),
    unit: reader.text(group.get('unit'), 'unit'),
    strongCoupling: readStrongCoupling(group.get('strong coupling'), reader),
    bubbleChain: reader.text(group.get('bubble chain'), 'bubble chain'),
    correlation: readCorrelation(group.get('correlation'), coefficients?.length ?? 0, reader),
    measurement: measurement && {
      value: measurement.value,
      ...(measurement.error && { error: measurement.error }),
      text: measurement.text,
      ...(unit !== undefined && { unit }),
      ...(source !== undefined && { source }),
    },
    constants: constants.length > 0 ? constants : undefined,
    anyFlavours: anyFlavours ? true : undefined,
    flavourChoices: choices,
    checks: readChecks(group.get('checks'), reader),
  };
  const series = {
    id,
    title: reader.text(group.get('title'), 'title') ?? id,
    sources: readSources(group.get('sources'), reader),
    notes: readTexts(group.get('notes'), 'notes', reader),
    invented: reader.flag(group.get('invented'), 'invented') ?? false,
    coupling,
    firstPower: reader.integer(group.get('first power'), 'first power', POWERS.least, POWERS.most) ?? 0,
    factor: reader.exact(group.get('factor'), 'factor', 'non-zero') ?? exact(1),
    additive: reader.exact(group.get('additive'), 'additive') ?? exact(0),
    coefficients: coefficients ?? [],
    singularities: readSingularities(group.get('singularities'), coupling, reader),
    condensates: readCondensates(group.get('condensates'), reader),
  };
  const contour = readContour(group, series, reader);
  return complaints.any ? undefined : { ...series, ...present({ ...optional, contour }) };

  function checkFlavours(): void {
    if (flavours === undefined) return;
    if (!Number.isInteger(flavours) || flavours < 0 || flavours > MOST_FLAVOURS) {
      complaints.add(undefined, 'flavours', `${flavours} asked for`, `an integer from 0 to ${MOST_FLAVOURS}`);
    } else if (choices !== undefined && !choices.includes(flavours)) {
      complaints.add(
        undefined,
        'flavours',
        `${flavours} asked for`,
        `one of ${choices.join(', ')}, for which the series is meant`,
      );
    } else if (fileFlavours !== undefined && fileFlavours !== flavours && !anyFlavours) {
      complaints.add(
        undefined,
        'flavours',
        `${flavours} asked for, but the coefficients are fixed numbers`,
        `${fileFlavours}`,
      );
    }
  }
}

/** The coefficients alone, for another number of flavours; complaints go to the reader. */
export function readOnlyCoefficients(
  entry: Entry,
  reader: FieldReader,
  flavours: number,
): readonly Exact[] | undefined {
  const group = entry.kind === 'map' ? reader.group(entry, '', FIELDS) : undefined;
  if (group === undefined) return undefined;
  reader.numbers.flavours = flavours;
  readConstants(group.get('constants'), reader);
  const list = readCoefficients(group, reader)?.map((c) => c.value);
  return reader.complaints.any ? undefined : list;
}

type Present<T> = { [K in keyof T]?: Exclude<T[K], undefined> };

/** Drops the fields that are undefined. */
function present<T extends object>(fields: T): Present<T> {
  return Object.fromEntries(Object.entries(fields).filter(([, value]) => value !== undefined)) as Present<T>;
}

function flavourChoices(group: Group, reader: FieldReader): readonly number[] | undefined {
  const entry = group.get('flavour choices');
  if (entry === undefined) return undefined;
  const items = reader.list(entry, 'flavour choices', 'integers') ?? [];
  const numbers = items.map((item, i) => reader.integer(item, `flavour choices[${i}]`, 0, MOST_FLAVOURS));
  return numbers.filter((n) => n !== undefined);
}

function readCoupling(group: Group, reader: FieldReader): Coupling {
  const entry = group.get('coupling');
  const variable = group.get('variable');
  if (entry !== undefined && variable !== undefined) {
    reader.complaints.add(variable.at, 'variable', 'both a coupling and a plain variable', 'one of the two');
  }
  if (entry === undefined) {
    const name = reader.text(variable, 'variable', 'a name');
    return name === undefined ? PLAIN : { ...PLAIN, name };
  }
  const fields = reader.group(entry, 'coupling', ['name', 'divisor']);
  if (fields === undefined) return PLAIN;
  const name = reader.text(fields.get('name'), 'coupling.name', 'a name such as alpha_s') ?? 'alpha_s';
  return { name, divisor: reader.choice(fields.get('divisor'), 'coupling.divisor', DIVISORS) ?? '1', plain: false };
}

/** `91.19 GeV`, or a group of such texts by number of flavours, of which the one in use is taken. */
function readScale(entry: Entry | undefined, reader: FieldReader): Scale | undefined {
  if (entry?.kind !== 'map') return oneScale(entry, 'hard scale', reader);
  let scale: Scale | undefined;
  for (const [flavours, { key, value }] of entry.fields) {
    const n = reader.integer({ kind: 'text', text: flavours, at: key }, 'hard scale', 0, MOST_FLAVOURS);
    const here = oneScale(value, `hard scale.${flavours.slice(0, 20)}`, reader);
    if (n === reader.numbers.flavours) scale = here;
  }
  return scale;
}

function oneScale(entry: Entry | undefined, field: string, reader: FieldReader): Scale | undefined {
  const wanted = 'a positive number with its unit, GeV or MeV';
  const text = reader.text(entry, field, wanted);
  if (entry === undefined || text === undefined) return undefined;
  const m = /^(.*?)\s*(GeV|MeV)$/.exec(plainSigns(text));
  if (m === null) return reader.complaints.add(entry.at, field, quote(text), wanted);
  const value = reader.exact({ kind: 'text', text: m[1]!, at: entry.at }, field, 'positive');
  return value && { value, unit: m[2] === 'GeV' ? 'GeV' : 'MeV', text };
}
