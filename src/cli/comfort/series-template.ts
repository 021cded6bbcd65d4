/** @module A series file with comments, from answers: what was not answered stands there as a comment to be filled in. */

export interface Answers {
  readonly title: string;
  readonly quantity: string;
  /** "alpha_s/pi", or the name of a plain variable. */
  readonly coupling: string;
  readonly coefficients: readonly string[];
  readonly firstPower: string;
  readonly scheme: string;
  readonly flavours: string;
  readonly hardScale: string;
  readonly dimension: string;
}

const text = (value: string): string => JSON.stringify(value);

/** A field, or the same line as a comment with an example. */
const field = (name: string, value: string, example: string): string =>
  value === '' ? `# ${name}: ${example}` : `${name}: ${value}`;

function couplingLines(coupling: string): string[] {
  const [name = '', divisor] = coupling.split('/').map((part) => part.trim());
  if (divisor === undefined && !/^alpha/i.test(name)) return [`variable: ${text(name === '' ? 'x' : name)}`];
  return [`coupling: { name: ${text(name)}, divisor: ${divisor ?? '1'} }   # the series is in name/divisor`];
}

/** "1, 1.64, 6.37(1)": commas inside brackets belong to an expression. */
export function splitCoefficients(list: string): string[] {
  const parts: string[] = [];
  let depth = 0;
  let part = '';
  for (const c of list) {
    if (c === '(') depth++;
    if (c === ')') depth--;
    if (c === ',' && depth === 0) {
      parts.push(part.trim());
      part = '';
    } else part += c;
  }
  return [...parts, part.trim()].filter((one) => one !== '');
}

export function seriesTemplate(answers: Answers): string {
  const runs = couplingLines(answers.coupling)[0]?.startsWith('coupling') === true;
  return [
    '# A series file: R = additive + factor * (c_0 x^p + c_1 x^(p+1) + ...). All fields: docs/series-file.md.',
    'format: 1',
    field('title', answers.title === '' ? '' : text(answers.title), '"One line"'),
    field('quantity', answers.quantity === '' ? '' : text(answers.quantity), '"What R is, with its normalisation"'),
    '# sources:',
    '#   - { text: "Author, Journal 1 (2001) 1, arXiv:0101.00001", status: published }',
    ...couplingLines(answers.coupling),
    field('first power', answers.firstPower === '' ? (runs ? '1' : '0') : answers.firstPower, '1'),
    '# additive: 1          # what stands before the series',
    '# factor: 1            # what multiplies it',
    ...(runs
      ? [
          field('scheme', answers.scheme === '' ? '' : text(answers.scheme), 'MSbar'),
          field('flavours', answers.flavours, '3            # active flavours; may stand as nf in the coefficients'),
          'scale ratio: 1       # mu/Q',
          field('hard scale', answers.hardScale.replace(/^([\d.]+)\s*([A-Za-z]+)$/, '$1 $2'), '1.777 GeV'),
        ]
      : []),
    'coefficients:          # exact numbers, 6.371(4), 283 +- 142, or expressions such as 365/24 - 11*zeta(3)',
    ...answers.coefficients.map((c) => `  - ${c}`),
    ...(answers.dimension === ''
      ? ['# singularities:', '#   - { dimension: 4, kind: infrared }   # u = dimension/2']
      : ['singularities:', `  - { dimension: ${answers.dimension}, kind: infrared }   # u = dimension/2`]),
    '# condensates:',
    '#   - { dimension: 4, name: gluon condensate, wilson: 2*pi^2/3, value: 0.012 +- 0.004, unit: GeV^4 }',
    '# measurement: 0.2042(50)',
    '',
  ].join('\n');
}
