/** @module The tables of a bubble chain: coefficients, poles, ambiguity by pole, prescriptions against the exact value; views and cuts. */
import type { BubbleCutResult, BubbleResult, BubbleViewResult } from '../../extraction/index.js';
import { longText, measured, number, size, symmetric, text } from '../table.js';
import { ratio } from './cut.js';
import type { PaperTable } from '../table.js';

/** The list of quantities that bubbles prints when none is named. */
export interface BubbleList {
  readonly quantities: readonly {
    readonly name: string;
    readonly title: string;
    readonly meaning: string;
    readonly borelTransform: string;
    readonly normalisation: string;
  }[];
}

type AnyBubbles = BubbleResult | BubbleViewResult | BubbleCutResult;

const atCoupling = ({ coupling }: AnyBubbles): string => `alpha_s = ${coupling.value}`;

function laboratory(result: BubbleResult): PaperTable[] {
  const { quantity, sum } = result;
  const what = `${quantity.title}, large-β_0 limit`;
  return [
    {
      name: 'terms',
      title: `Terms of ${what}, at ${atCoupling(result)}`,
      columns: [
        number('n', '*n*'),
        number('coefficient', '*c_{n}*'),
        number('term'),
        number('partial_sum', 'partial sum'),
        longText('exact'),
        text('mark', ''),
      ],
      rows: result.terms.map((row) => [
        String(row.n),
        measured(row.coefficient),
        measured(row.term),
        measured(row.partialSum),
        row.exact ?? '',
        row.least === true ? 'least term' : '',
      ]),
      notes: [`normalisation ${quantity.normalisation}, in powers of β_0 alpha_s`],
    },
    {
      name: 'poles',
      title: `Borel poles of ${what}`,
      columns: [number('u', '*u*'), number('order'), text('side'), text('residues')],
      rows: result.poles.map((row) => [row.u, String(row.order), row.side, row.residues.join(', ')]),
      notes: [],
    },
    {
      name: 'ambiguity',
      title: `Principal value of ${what}, at ${atCoupling(result)}, and its ambiguity by pole`,
      columns: [
        text('part'),
        number('value'),
        size('im', '|Im|'),
        size('im_over_pi', '|Im|/π'),
        size('per_lambda', 'over (Λ/*Q*)^{d}'),
      ],
      rows: [
        ['all', measured(sum.pv, symmetric('input', sum.inputError)), sum.ambiguity.im, sum.ambiguity.imOverPi, ''],
        ...sum.ambiguity.byPole.map((row) => [`dimension ${row.dimension}`, '', row.im, row.imOverPi, row.perLambda]),
      ],
      notes: [`principal value ${sum.standing}`],
    },
    {
      name: 'prescriptions',
      title: `Prescriptions on ${result.terms.length} coefficients of ${what}, against the exact value`,
      columns: [
        text('prescription'),
        text('variant'),
        number('value'),
        size('deviation'),
        size('over_ambiguity', 'over |Im|/π'),
        size('over_error', 'over own error'),
      ],
      rows: result.trials
        .filter((trial) => trial.value !== undefined)
        .map((trial) => [
          trial.prescription,
          trial.variant,
          measured(trial.value, symmetric('truncation', trial.truncationError)),
          trial.deviation ?? '',
          trial.overAmbiguity ?? '',
          trial.overError ?? '',
        ]),
      notes: result.trials.flatMap(({ prescription, refused }) =>
        refused === undefined ? [] : [`${prescription} refused: ${refused.reason}`],
      ),
    },
  ];
}

function view(result: BubbleViewResult): PaperTable[] {
  return [
    {
      name: result.view,
      title: `Momenta of ${result.quantity.title}, large-β_0 limit, at ${atCoupling(result)}: ${result.view}`,
      columns: result.columns.map(({ name }) => number(name, name)),
      rows: result.rows.map((row) => row.map((cell) => (cell === '' ? '' : measured(cell)))),
      notes: [
        ...result.columns.map(({ name, meaning }) => `${name}: ${meaning}`),
        ...result.integrals.map(({ name, value }) => `${name}: ${value}`),
        ...result.notes,
      ],
    },
  ];
}

function cutTables(result: BubbleCutResult): PaperTable[] {
  const { cut, quantity } = result;
  const about = `${quantity.title}, large-β_0 limit`;
  return [
    {
      name: 'coefficients',
      title: `Coefficients of ${about}, cut at ${ratio(cut.overHard)} ${quantity.hard}`,
      columns: [
        number('n', '*n*'),
        number('whole', '*c_{n}*'),
        number('low', 'below the cut'),
        number('high', 'above the cut'),
      ],
      rows: cut.terms.map((row) => [String(row.n), measured(row.whole), measured(row.low), measured(row.high)]),
      notes: [cut.growth.whole.statement, cut.growth.high.statement],
    },
    {
      name: 'powers',
      title: `Powers of Λ in the momenta of ${about} below ${ratio(cut.overHard)} ${quantity.hard}, at ${atCoupling(result)}`,
      columns: [number('dimension'), number('value'), number('sum', 'up to here'), size('left')],
      rows: cut.powers.map((row) => [row.dimension, measured(row.value), measured(row.upToHere), row.left]),
      notes: [],
    },
    {
      name: 'sums',
      title: `Sum of ${about} for cuts beside it, at ${atCoupling(result)}`,
      columns: [
        number('cut'),
        number('high', 'above the cut'),
        number('low', 'below the cut'),
        number('sum'),
        number('leading', 'lowest power'),
        size('remainder'),
      ],
      rows: cut.rows.map((row) => [
        measured(row.cut),
        measured(row.high),
        measured(row.low),
        measured(row.sum),
        measured(row.leading),
        row.remainder,
      ]),
      notes: [],
    },
  ];
}

const list = ({ quantities }: BubbleList): PaperTable[] => [
  {
    name: 'quantities',
    title: 'Quantities with an exact large-β_0 limit',
    columns: [
      text('name'),
      text('title'),
      text('normalisation'),
      longText('transform', 'Borel transform'),
      longText('meaning'),
    ],
    rows: quantities.map((row) => [row.name, row.title, row.normalisation, row.borelTransform, row.meaning]),
    notes: [],
  },
];

export function bubbleTables(result: AnyBubbles | BubbleList): PaperTable[] {
  if ('quantities' in result) return list(result);
  const tables = 'view' in result ? view(result) : 'cut' in result ? cutTables(result) : laboratory(result);
  return tables.filter(({ rows }) => rows.length > 0);
}
