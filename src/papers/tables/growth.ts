/** @module The tables of a growth diagnosis: ratios with extrapolants, expected singularities, the leading strength. */
import type { GrowthResult, PlaneResult } from '../../studies/index.js';
import { measured, number, size, symmetric, text } from '../table.js';
import type { PaperTable } from '../table.js';

type Pole = PlaneResult['borelPlane']['entries'][number]['poles'][number];
type Growth = GrowthResult['growth'];

function ratioTable(title: string, { evidence, statement, agreement }: Growth): PaperTable {
  return {
    name: 'ratios',
    title: `Ratios of coefficients of ${title}`,
    columns: [number('n', '*n*'), number('ratio', '*c_{n}*/(*n* *c_{n−1}*)'), number('linear', 'linear extrapolant')],
    rows: evidence.ratios.map((row) => [
      String(row.n),
      measured(row.ratio),
      measured(row.linear, symmetric('extrapolation', row.linearError)),
    ]),
    notes: [statement, ...(agreement === undefined ? [] : [agreement]), ...evidence.competition],
  };
}

function expectedTable(title: string, { expected }: Growth): PaperTable {
  return {
    name: 'expected',
    title: `Expected Borel singularities of ${title}`,
    columns: [
      number('u', '*u*'),
      number('t', '*t*'),
      number('dimension'),
      number('exponent'),
      text('kind'),
      text('origin'),
    ],
    rows: expected.map((row) => [row.u ?? '', row.t, row.dimension ?? '', row.exponent ?? '', row.kind, row.origin]),
    notes: [],
  };
}

function strengthTable(title: string, { strength }: Growth): PaperTable {
  return {
    name: 'strength',
    title: `Strength of the leading infrared singularity of ${title}`,
    columns: [text('method'), number('strength', '*N*'), text('reference')],
    rows: (strength?.methods ?? []).map((row) => [
      row.method,
      measured(row.value, symmetric('indicative', row.error)),
      row.reference,
    ]),
    notes: strength?.notes ?? [],
  };
}

export function growthTables({ series, growth }: GrowthResult): PaperTable[] {
  const { title } = series;
  return [ratioTable(title, growth), expectedTable(title, growth), strengthTable(title, growth)].filter(
    ({ rows }) => rows.length > 0,
  );
}

export function planeTables({ series, borelPlane }: PlaneResult): PaperTable[] {
  const entries = borelPlane.entries.flatMap(({ label, leroy, poles }) =>
    poles.map((pole) => ({ label, leroy, pole })),
  );
  // Columns that would hold nothing but zeros are left out.
  const inU = entries.some(({ pole }) => pole.u !== undefined);
  const complex = entries.some(({ pole }) => pole.im !== undefined || pole.amplitude?.im !== undefined);
  // Errors are known in t; u is a multiple of it.
  const inUnitsOfU = ({ re, u }: Pole, error: string | undefined): string | undefined =>
    error === undefined || u === undefined ? undefined : String(Math.abs((Number(u.re) / Number(re)) * Number(error)));
  const whenComplex = <T>(...list: T[]): T[] => (complex ? list : []);
  return [
    {
      name: 'poles',
      title: `Poles of the Padé approximants of the Borel transform of ${series.title}`,
      columns: [
        text('approximant'),
        text('leroy', '*b*'),
        ...(inU ? [number('u', 'Re *u*'), ...whenComplex(number('u_im', 'Im *u*'))] : []),
        number('t', 'Re *t*'),
        ...whenComplex(number('t_im', 'Im *t*')),
        number('multiplicity'),
        size('amplitude', 'Re amplitude'),
        ...whenComplex(size('amplitude_im', 'Im amplitude')),
        text('mark', ''),
      ],
      rows: entries.map(({ label, leroy, pole }) => [
        label,
        leroy,
        ...(inU
          ? [
              measured(pole.u?.re, symmetric('coefficients', inUnitsOfU(pole, pole.error?.re))),
              ...whenComplex(measured(pole.u?.im ?? '0', symmetric('coefficients', inUnitsOfU(pole, pole.error?.im)))),
            ]
          : []),
        measured(pole.re, symmetric('coefficients', pole.error?.re)),
        ...whenComplex(measured(pole.im ?? '0', symmetric('coefficients', pole.error?.im))),
        String(pole.multiplicity),
        pole.amplitude?.re ?? '',
        ...whenComplex(pole.amplitude?.im ?? '0'),
        pole.note ?? '',
      ]),
      notes: borelPlane.notes,
    },
  ].filter(({ rows }) => rows.length > 0);
}
