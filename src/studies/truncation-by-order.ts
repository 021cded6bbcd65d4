/** @module Order by order: each model sees the first terms alone, and the next one shows whether its band was right. */
import {
  TRUNCATION_MODELS,
  restricted,
  type Band,
  type Estimate,
  type Known,
  type Question,
} from '../truncation/index.js';
import type { Refused } from './assessment.js';
import { ask, bandText, scaledText, type BandText } from './truncation-answer.js';

/** Where the sum with the next known term fell: in the 68 % band, in the 95 % band only, or in neither. */
export type Fell = '68' | '95' | 'outside';

export interface TruncationOrder {
  /** The models saw the terms through this order. */
  readonly through: number;
  readonly termsUsed: number;
  readonly next: { readonly order: number; readonly term: string };
  readonly rows: readonly {
    readonly model: string;
    readonly band68?: BandText;
    readonly band95?: BandText;
    readonly fell?: Fell;
    readonly refused?: Refused;
  }[];
}

/** How often the next sum fell inside. */
export interface TruncationRecord {
  readonly model: string;
  readonly asked: number;
  readonly refused: number;
  readonly inside68: number;
  readonly inside95: number;
}

/** Significant digits of a known term. */
const FIGURES = 5;

/** Sum of the known terms with index from … to − 1, in the unit 2^unit. */
function stretch(known: Known, from: number, to: number, unit: number): number {
  let sum = 0;
  for (let k = from; k < to; k++) {
    sum += Math.sign(known.values[k] ?? 0) * Math.exp((known.logs[k] ?? 0) + (known.unit - unit) * Math.LN2);
  }
  return sum;
}

const inside = (band: Band, distance: number): boolean => distance >= band.low && distance <= band.high;

/** Distance of the next known sum from the sum that the estimate belongs to, against its bands. */
function fellOf(estimate: Estimate, whole: Known, seen: Known): Fell {
  const distance = stretch(whole, estimate.terms, seen.logs.length + 1, seen.unit);
  if (inside(estimate.bands[68], distance)) return '68';
  return inside(estimate.bands[95], distance) ? '95' : 'outside';
}

/** Every known term from the second on, predicted from those before it, by every model. */
export function byOrder(question: Question): { byOrder: TruncationOrder[]; record: TruncationRecord[] } {
  const { known: whole } = question;
  const orders: TruncationOrder[] = [];
  for (let count = 1; count < whole.logs.length; count++) {
    const part = restricted(question, count);
    if (part === undefined) continue;
    const { unit } = part.known;
    orders.push({
      through: whole.orders[count - 1] ?? 0,
      termsUsed: count,
      next: {
        order: whole.orders[count] ?? 0,
        term: scaledText(stretch(whole, count, count + 1, unit), unit, FIGURES),
      },
      rows: TRUNCATION_MODELS.map((model) => {
        const answer = ask(model, part);
        if ('reason' in answer) return { model: model.name, refused: answer };
        return {
          model: model.name,
          band68: bandText(answer.bands[68], unit, model.digits),
          band95: bandText(answer.bands[95], unit, model.digits),
          fell: fellOf(answer, whole, part.known),
        };
      }),
    });
  }
  return { byOrder: orders, record: TRUNCATION_MODELS.map((model) => recordOf(model.name, orders)) };
}

function recordOf(model: string, orders: readonly TruncationOrder[]): TruncationRecord {
  const rows = orders.flatMap((order) => order.rows.filter((row) => row.model === model));
  const count = (...words: Fell[]): number =>
    rows.filter((row) => row.fell !== undefined && words.includes(row.fell)).length;
  return {
    model,
    asked: rows.length,
    refused: rows.filter((row) => row.refused !== undefined).length,
    inside68: count('68'),
    inside95: count('68', '95'),
  };
}
