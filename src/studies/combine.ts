/**
 * @module combine: products, quotients, powers, exponentials, logarithms and compositions of series in one coupling at one
 * scale. The result is a series that says where it came from, with errors and correlations carried.
 */
import { exact } from '../numerics/index.js';
import { isRefusal, refuse } from '../qcd/index.js';
import type { Refusal } from '../qcd/index.js';
import { isNumberProblem, parseTree, suggestion } from '../series/index.js';
import type { Series, SyntaxTree } from '../series/index.js';
import { disagreement } from './combining/agreement.js';
import { operandSeries } from './combining/operands.js';
import type { Operand } from './combining/operands.js';
import { stripped } from './combining/power-series.js';
import { combinedSingularities } from './combining/singularities.js';
import type { PowerSeries } from './combining/power-series.js';
import { COMBINE_FORMS, COMBINE_FUNCTIONS, RESERVED, evaluate, isLinear, namesIn } from './combining/walk.js';
import { writtenList, writtenValue } from './derive/coefficients.js';
import { Sources } from './derive/sources.js';
import { couplingScheme, schemeWords } from './scheme.js';
import { VERSION } from './version.js';

export type { Operand } from './combining/operands.js';

export interface CombineRequest {
  /** Such as 'width * ratio^5'. */
  readonly expression: string;
  readonly operands: readonly Operand[];
  readonly title?: string;
}

const NAME = /^[A-Za-z][A-Za-z0-9_]{0,31}$/;

/** What is wrong with the names, before anything is computed. */
function nameProblem(operands: readonly Operand[], tree: SyntaxTree): Refusal | undefined {
  const names = operands.map((o) => o.name);
  for (const name of names) {
    if (!NAME.test(name)) return refuse(`the name "${name}"`, 'a letter, then letters, digits and _');
    if (RESERVED.includes(name)) return refuse(`the name "${name}", which has a meaning already`, 'another name');
    if (names.indexOf(name) !== names.lastIndexOf(name))
      return refuse(`two series called ${name}`, 'one --with for each name');
  }
  const { used, applied } = namesIn(tree);
  for (const name of [...used, ...applied]) {
    if (names.includes(name) || name === 'pi' || (applied.has(name) && [...COMBINE_FUNCTIONS, 'zeta'].includes(name)))
      continue;
    return refuse(
      `"${name}" is not defined${suggestion(name, [...names, ...RESERVED])}`,
      `--with ${name}=SERIES, or ${COMBINE_FORMS}`,
    );
  }
  const idle = names.find((name) => !used.has(name) && !applied.has(name));
  return idle === undefined
    ? undefined
    : refuse(`${idle} does not occur in the expression`, `an expression with ${idle}, or no --with ${idle}=…`);
}

/** Operands that stand for themselves share one coupling; those that are only applied to others have their own. */
const sharing = (operands: readonly Operand[], tree: SyntaxTree): readonly Operand[] => {
  const { used } = namesIn(tree);
  return operands.filter((o) => used.has(o.name));
};

async function bind(
  operands: readonly Operand[],
  names: ReadonlySet<string>,
  divisor: Series['coupling']['divisor'],
  sources: Sources,
) {
  const bound = new Map<string, PowerSeries>();
  for (const operand of operands) {
    if (!names.has(operand.name)) continue;
    const series = await operandSeries(operand, divisor, sources);
    if (isRefusal(series)) return series;
    bound.set(operand.name, series);
  }
  return bound;
}

function notesOf(
  request: CombineRequest,
  result: PowerSeries,
  operands: readonly Operand[],
  open: readonly string[],
): string[] {
  const list = request.operands.map((o) => `${o.name} = ${o.from}`).join(', ');
  const rounded = operands.some((o) =>
    o.series.coefficients.some((c) => c.error === undefined && c.significantDigits !== undefined),
  );
  return [
    `Combined by leastterm ${VERSION}: ${request.expression} with ${list}.`,
    ...request.operands.map(
      (o) => `${o.name}: ${o.series.title}${o.series.quantity === undefined ? '' : `; ${o.series.quantity}`}`,
    ),
    `Known through power ${result.through} of the coupling.`,
    ...open.map((text) => `${text}: it may cancel here, and is not stated.`),
    ...(rounded
      ? [
          'Coefficients written as decimals without an error were taken as exact: the digits of the new ones beyond theirs carry no information.',
        ]
      : []),
  ];
}

/** Scheme, flavours and scales that all operands share. */
function common(operands: readonly Operand[]): Partial<Series> {
  const [first] = operands;
  if (first === undefined) return {};
  const { series } = first;
  const { flavours, scaleRatio, hardScale } = series;
  const one = operands.every((o) => o.series.scheme === series.scheme);
  const scheme = couplingScheme(series);
  const words = one ? series.scheme : isRefusal(scheme) ? undefined : schemeWords(scheme, undefined);
  const scaled = operands.find((o) => o.series.hardScale !== undefined)?.series.hardScale ?? hardScale;
  return {
    ...(words === undefined ? {} : { scheme: words }),
    ...(flavours === undefined ? {} : { flavours }),
    ...(scaleRatio === undefined ? {} : { scaleRatio }),
    ...(scaled === undefined ? {} : { hardScale: scaled }),
  };
}

/** additive and the rest: a number at order 0 without an error is no part of the series that is resummed. */
function split(result: PowerSeries): {
  readonly constant: PowerSeries['coefficients'][number] | undefined;
  readonly rest: PowerSeries;
} {
  const [first, ...others] = result.coefficients;
  if (result.power !== 0 || first === undefined || first.slopes.length > 0 || others.length === 0)
    return { constant: undefined, rest: result };
  const rest = stripped({ ...result, power: 1, coefficients: others });
  return rest.coefficients.length === 0 ? { constant: undefined, rest: result } : { constant: first, rest };
}

/** The combined series, or why it cannot be had. */
export async function combineStudy(request: CombineRequest): Promise<Series | Refusal> {
  const { expression, operands } = request;
  const tree = await parseTree(expression);
  if (isNumberProblem(tree)) return refuse(`the expression: ${tree.problem}`, COMBINE_FORMS);
  const bad = nameProblem(operands, tree);
  if (bad !== undefined) return bad;
  const shared = sharing(operands, tree);
  const [first] = shared;
  if (first === undefined)
    return refuse('an expression without a series', 'at least one name of a series, as in width * ratio^5');
  const wrong = disagreement(shared);
  if (wrong !== undefined) return wrong;

  const sources = new Sources();
  const { used, applied } = namesIn(tree);
  const { divisor, plain } = first.series.coupling;
  const series = await bind(operands, used, divisor, sources);
  if (isRefusal(series)) return series;
  // In f(g) the value of g stands for the coupling of f itself, without a divisor.
  const functions = await bind(operands, applied, '1', sources);
  if (isRefusal(functions)) return functions;
  const whole = evaluate(tree, { series, functions });
  if (isRefusal(whole)) return whole;
  const result = stripped(whole);
  if (result.coefficients.length === 0 || result.through === Infinity) {
    return refuse('every known order of the combination vanishes, or none is known', 'series with more known orders');
  }

  const { constant, rest } = split(result);
  const { coefficients, correlation } = writtenList(rest.coefficients, sources);
  const { stated, open } = await combinedSingularities(shared, { linear: isLinear(tree), firstPower: rest.power });
  const texts = (field: 'sources'): string[] => [...new Set(operands.flatMap((o) => o.series[field]))];
  return {
    id: 'combined',
    title: request.title ?? `${expression}, with ${operands.map((o) => `${o.name} = ${o.from}`).join(', ')}`,
    sources: texts('sources'),
    notes: notesOf(request, result, operands, open),
    invented: operands.some((o) => o.series.invented),
    coupling: { name: first.series.coupling.name, divisor: plain ? '1' : divisor, plain },
    firstPower: rest.power,
    ...common(shared),
    factor: exact(1),
    additive: constant === undefined ? exact(0) : writtenValue(constant, 0),
    coefficients,
    ...(correlation === undefined ? {} : { correlation }),
    singularities: stated,
    condensates: [],
  };
}
