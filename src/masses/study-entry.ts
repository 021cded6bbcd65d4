/** @module One definition in the study of a mass: its value, order by order, with its errors. */
import { roundPdg, toDecimal, writePlusMinus, type Exact } from '../numerics/index.js';
import { isRefusal, type Refusal } from '../qcd/index.js';
import { commonOrders } from './check.js';
import { convertMass, fixedTerms, pointAt, settingOf } from './convert.js';
import type { MassPlace } from './definition.js';
import { definitionOf } from './definitions.js';
import { exactMass, type ExactInputs } from './exact.js';
import type { MassConversion, MassRequest } from './request.js';
import { inputErrors, variedScales, type Shift } from './study-errors.js';
import { evolutionOf } from './study-evolution.js';
import { listTerms } from './study-terms.js';
import type { MassByOrder, MassEntry, MassQuestion, MassValue, ScalePoint } from './study-types.js';
import { few, scaleText, term, text } from './text.js';

/** m_RS(ν_f) with its number in place of the symbol. */
export function symbolAt(place: MassPlace): string {
  const { symbol, parameter } = definitionOf(place.definition);
  if (parameter === undefined || place.scale === undefined) return symbol;
  return symbol.replace(`(${parameter.symbol})`, `(${scaleText(place.scale)} GeV)`);
}

/** Values with fewer orders, the same input each time. */
function byOrder(request: MassRequest, order: number): MassByOrder[] {
  const rows: MassByOrder[] = [];
  let before: number | undefined;
  for (let n = 0; n <= order; n++) {
    const found = convertMass({ ...request, order: n });
    if (isRefusal(found)) continue;
    rows.push({
      order: n,
      value: text(found.value),
      ...(before === undefined ? {} : { change: term(found.value - before) }),
    });
    before = found.value;
  }
  return rows;
}

/** Value with its digits: certified where an enclosure exists. */
function digitsOf(
  exactValue: Exact | Refusal | undefined,
  found: MassConversion,
  digits: number,
): Pick<MassValue, 'value' | 'digits'> {
  if (exactValue !== undefined && !isRefusal(exactValue)) {
    const shown = toDecimal(exactValue.ball(Math.ceil(digits * 3.33) + 32), digits);
    // An exact number, the mass as it was given, needs no zeros behind it.
    const short =
      exactValue.rational === undefined ? shown.text : shown.text.replace(/(\.\d*?)0+$/, '$1').replace(/\.$/, '');
    if (shown.certainDigits > 0) return { value: short, digits: 'certified' };
  }
  return { value: text(found.value), digits: 'converged' };
}

function scaleParts(request: MassRequest, central: number): Pick<MassValue, 'scaleVariation'> & { spread: number } {
  const varied = variedScales(request);
  const moves = varied.flatMap(({ outcome }) => (isRefusal(outcome) ? [] : [outcome.value - central]));
  if (moves.length === 0) return { spread: 0 };
  const plus = Math.max(0, ...moves);
  const minus = Math.max(0, ...moves.map((x) => -x));
  const points = varied.map(({ factor, outcome }): ScalePoint =>
    isRefusal(outcome)
      ? { factor: String(Number(factor.toPrecision(3))), refused: outcome }
      : {
          factor: String(Number(factor.toPrecision(3))),
          scale: scaleText(outcome.scale),
          alpha: few(outcome.alphaAtScale, 5),
          value: text(outcome.value),
        },
  );
  return { scaleVariation: { plus: few(plus), minus: few(minus), points }, spread: Math.max(plus, minus) };
}

/** A component below this share of the largest would print digits that the larger one makes meaningless. Heuristic. */
const NEGLIGIBLE = 0.1;

/** "4.408 ± 0.021 (inputs) ± 0.006 (perturbative)"; negligible components are named, not printed. */
function printedText(
  value: string,
  inputs: readonly Shift[],
  perturbative: number,
  ambiguity: number | undefined,
): string {
  const quadrature = (side: 'plus' | 'minus'): number => Math.hypot(...inputs.map((s) => s[side]));
  const all = [
    { label: 'inputs', plus: quadrature('plus'), minus: quadrature('minus') },
    { label: 'perturbative', plus: perturbative, minus: perturbative },
    { label: 'ambiguity', plus: ambiguity ?? 0, minus: ambiguity ?? 0 },
  ].filter((p) => p.plus > 0 || p.minus > 0);
  const size = (p: { readonly plus: number; readonly minus: number }): number => Math.max(p.plus, p.minus);
  const floor = NEGLIGIBLE * Math.max(0, ...all.map(size));
  const parts = all.filter((p) => size(p) >= floor);
  const hidden = all.filter((p) => size(p) < floor).map((p) => `; ${p.label} negligible`);
  const rounded = roundPdg(
    value,
    parts.map((p) => ({ plus: few(p.plus, 6), minus: few(p.minus, 6) })),
  );
  if (rounded === undefined) return value;
  const labels = parts.map((p) => p.label);
  return `${writePlusMinus(rounded, labels)}${hidden.join('')}`;
}

export interface EntryInputs {
  readonly question: MassQuestion;
  readonly exact: ExactInputs;
  readonly strength: { readonly value: number; readonly error: number };
  /** |Im|/π in GeV. */
  readonly ambiguity: number;
}

/** Is the renormalon left in at either end? */
const touchesPole = (request: MassRequest): boolean =>
  request.from.definition === 'pole' || request.to.definition === 'pole';

/** The conversion of one request with everything around it. */
export function entryOf(request: MassRequest, inputs: EntryInputs): MassEntry {
  const { question, strength } = inputs;
  const definition = definitionOf(request.to.definition);
  const { name, title } = definition;
  const found = convertMass(request);
  if (isRefusal(found)) return { definition: name, title, refused: found };
  const setting = settingOf(request);
  if (isRefusal(setting)) return { definition: name, title, refused: setting };
  const point = pointAt(setting, found.msbar);
  if (isRefusal(point)) return { definition: name, title, refused: point };
  const terms = fixedTerms(setting, request.to, point);
  const evolution = evolutionOf(setting, request.to, found.msbar);
  const rows = byOrder(request, found.order);
  const shifts = inputErrors(request, question, strength, found.value);
  if (isRefusal(shifts)) return { definition: name, title, refused: shifts };
  const last = rows.length > 1 ? Math.abs(Number(rows.at(-1)?.change ?? 0)) : 0;
  const { spread, scaleVariation } = scaleParts(request, found.value);
  const perturbative = Math.max(last, spread);
  const value = digitsOf(exactMass(request, inputs.exact), found, question.digits);
  const ambiguity = touchesPole(request) ? inputs.ambiguity : undefined;
  return {
    definition: name,
    title,
    symbol: symbolAt(request.to),
    ...(request.to.scale === undefined ? {} : { scale: scaleText(request.to.scale) }),
    renormalonFree: definition.renormalonFree,
    ...value,
    order: found.order,
    byOrder: rows,
    ...(terms === undefined || isRefusal(terms) ? {} : { terms: listTerms(point, terms) }),
    ...(terms === undefined || isRefusal(terms) || terms.closed === 0 ? {} : { closed: term(terms.closed) }),
    ...(evolution === undefined ? {} : { evolution }),
    errors: shifts.map((s) => ({
      label: s.label,
      plus: few(s.plus),
      minus: few(s.minus),
      ...(s.oneSided === true ? { oneSided: true } : {}),
    })),
    ...(last > 0 ? { lastTerm: few(last) } : {}),
    ...(scaleVariation === undefined ? {} : { scaleVariation }),
    ...(perturbative > 0 ? { perturbative: few(perturbative) } : {}),
    ...(ambiguity === undefined ? {} : { ambiguity: few(ambiguity, 4) }),
    printed: printedText(text(found.value), shifts, perturbative, ambiguity),
    source: definition.source,
    status: definition.status,
    notes: definition.notes,
  };
}

/** As many orders as both ends have, at most those asked for. */
export const orderFor = (question: MassQuestion, to: MassPlace): number =>
  Math.min(question.order ?? Infinity, commonOrders(question.from, to));
