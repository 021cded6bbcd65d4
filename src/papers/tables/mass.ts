/** @module The tables of a mass conversion: every definition side by side, and the ambiguity of the pole mass. */
import type { MassResult } from '../../masses/index.js';
import { measured, number, size, text } from '../table.js';
import type { PaperTable } from '../table.js';

const bare = (value: string): string => value.replace(/^[-+]/, '');

export function massTables(result: MassResult): PaperTable[] {
  const values = result.values.flatMap((entry) => ('value' in entry ? [entry] : []));
  return [
    {
      name: 'mass',
      title: `Masses from ${result.from.symbol} = ${result.mass}`,
      columns: [
        text('definition'),
        number('value', 'mass', 'GeV'),
        size('perturbative', 'perturbative', 'GeV'),
        size('ambiguity', 'ambiguity', 'GeV'),
        number('order'),
        text('digits'),
      ],
      rows: values.map((entry) => [
        entry.symbol,
        measured(
          entry.value,
          entry.errors.map(({ label, plus, minus }) => ({ label, plus: bare(plus), minus: bare(minus) })),
        ),
        entry.perturbative ?? '',
        entry.ambiguity ?? '',
        String(entry.order),
        entry.digits,
      ]),
      notes: [
        `alpha_s = ${result.alphaS.given} at ${result.alphaS.scale} GeV with ${result.alphaS.flavours} flavours; ${result.light} light flavours; ${result.loops} loops`,
        ...result.values.flatMap((entry) =>
          'refused' in entry ? [`${entry.title} refused: ${entry.refused.reason}`] : [],
        ),
        ...result.cautions,
      ],
    },
    {
      name: 'ambiguity',
      title: 'Ambiguity of the pole mass by convention',
      columns: [text('convention'), size('GeV', 'GeV'), size('Lambda', 'Λ'), text('about')],
      rows: result.poleAmbiguity.conventions.map((row) => [row.name, row.GeV, row.inLambda, row.about]),
      notes: [],
    },
  ].filter(({ rows }) => rows.length > 0);
}
