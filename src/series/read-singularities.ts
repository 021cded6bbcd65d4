/** @module Borel singularities that are known beforehand. */
import { signExact } from '../numerics/index.js';
import type { Exact } from '../numerics/index.js';
import type { Entry } from './entry.js';
import type { FieldReader, Group } from './field-reader.js';
import type { Coupling, KnownSingularity, SingularityKind } from './series.js';
import type { Written } from './written.js';

const FIELDS = ['u', 't', 'dimension', 'exponent', 'anomalous dimension', 'wilson corrections', 'strength', 'kind'];
const KINDS: readonly SingularityKind[] = ['infrared', 'ultraviolet', 'other'];

export function readSingularities(
  entry: Entry | undefined,
  coupling: Coupling,
  reader: FieldReader,
): readonly KnownSingularity[] {
  if (entry === undefined) return [];
  const items = reader.list(entry, 'singularities', 'singularities') ?? [];
  const list = items.map((item, i) => singularity(item, `singularities[${i}]`, coupling, reader));
  return list.filter((s) => s !== undefined);
}

function singularity(
  entry: Entry,
  field: string,
  coupling: Coupling,
  reader: FieldReader,
): KnownSingularity | undefined {
  const group = reader.group(entry, field, FIELDS);
  if (group === undefined) return undefined;
  const { complaints } = reader;
  const given = ['u', 't', 'dimension'].filter((name) => group.get(name) !== undefined);
  if (given.length !== 1) {
    const found = given.length === 0 ? 'no position' : `the positions ${given.join(' and ')}`;
    return complaints.add(group.at, field, found, 'one of u, t and dimension');
  }
  const [way] = given;
  if (coupling.plain && way !== 't') {
    return complaints.add(group.get(way!)!.at, `${field}.${way!}`, `${way!} for a plain variable`, 't, or a coupling');
  }
  const u = reader.exact(group.get('u'), `${field}.u`, 'non-zero');
  const t = reader.exact(group.get('t'), `${field}.t`, 'non-zero');
  const dimension = reader.rational(
    group.get('dimension'),
    `${field}.dimension`,
    'a positive number',
    (q) => q.sign() > 0,
  );
  const exponent = reader.exact(group.get('exponent'), `${field}.exponent`);
  const anomalousDimension = reader.exact(group.get('anomalous dimension'), `${field}.anomalous dimension`);
  const wilsonCorrections = corrections(group.get('wilson corrections'), `${field}.wilson corrections`, reader);
  const strength = reader.uncertain(group.get('strength'), `${field}.strength`);
  const position = u ?? t ?? dimension;
  if (position === undefined) return undefined;
  return {
    ...(u && { u }),
    ...(t && { t }),
    ...(dimension && { dimension }),
    ...(exponent && { exponent }),
    ...(anomalousDimension && { anomalousDimension }),
    ...(wilsonCorrections && { wilsonCorrections }),
    ...(strength && {
      strength: { value: strength.value, ...(strength.error && { error: strength.error }), text: strength.text },
    }),
    kind: kind(group, field, u ?? t, coupling, reader),
  };
}

/** C_1, C_2, … of the coefficient function; a wrong entry is complained about and drops the list. */
function corrections(entry: Entry | undefined, field: string, reader: FieldReader): readonly Exact[] | undefined {
  if (entry === undefined) return undefined;
  const items = reader.list(entry, field, 'numbers');
  const values = items?.map((item, i) => reader.exact(item, `${field}[${i}]`));
  return values?.every((v) => v !== undefined) ? values : undefined;
}

/** Stated, or else from the side of the axis: infrared on the positive one, ultraviolet on the negative one. */
function kind(
  group: Group,
  field: string,
  position: Written | undefined,
  coupling: Coupling,
  reader: FieldReader,
): SingularityKind {
  const side = position === undefined ? 1 : signExact(position);
  const stated = reader.choice(group.get('kind'), `${field}.kind`, KINDS);
  if (stated === undefined) return coupling.plain ? 'other' : side < 0 ? 'ultraviolet' : 'infrared';
  if ((stated === 'infrared' && side < 0) || (stated === 'ultraviolet' && side > 0)) {
    const where = side < 0 ? 'negative' : 'positive';
    reader.complaints.add(
      group.get('kind')!.at,
      `${field}.kind`,
      `${stated} at a ${where} position`,
      side < 0 ? 'ultraviolet or other' : 'infrared or other',
    );
  }
  return stated;
}
