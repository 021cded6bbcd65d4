/**
 * @module The study behind `mass`: one mass in other definitions, order by order, with every error apart, what the renormalon
 * is in it, and what of a pole mass stays ambiguous.
 */
import { toNumberExact } from '../numerics/index.js';
import { isRefusal, type Refusal } from '../qcd/index.js';
import { ambiguityOverLambda, poleAmbiguity } from './ambiguity.js';
import { LARGEST_CUTOFF_COUPLING } from './check.js';
import { convertMass, fixedTerms, pointAt, settingOf } from './convert.js';
import { alphaAt, lambdaAt } from './couplings.js';
import { definitionOf } from './definitions.js';
import type { MassRequest } from './request.js';
import { poleStrength } from './strength.js';
import { entryOf, orderFor, symbolAt } from './study-entry.js';
import { listTerms } from './study-terms.js';
import type { MassQuestion, MassResult, StrengthUsed } from './study-types.js';
import { poleTerms } from './terms.js';
import { few, scaleText, text } from './text.js';

/** Coupling from which on a value is called rough. Heuristic. */
const STRONG = 0.5;

interface Strength {
  readonly value: number;
  readonly error: number;
  readonly used: StrengthUsed;
}

const DIGITS_OF_STRENGTH = 6;

/** N as the user gave it, or as the sum rule has it; the other estimates are told in both cases. */
function strengthOf(question: MassQuestion): Strength {
  const { estimates, inAlpha, value } = poleStrength(question.light);
  const toAlpha = inAlpha.value / value;
  const all = estimates.map((e) => ({
    method: e.method,
    reference: e.reference,
    value: few(e.value * toAlpha, DIGITS_OF_STRENGTH),
  }));
  const { strength } = question;
  if (strength === undefined) {
    return {
      ...inAlpha,
      used: {
        value: few(inAlpha.value, DIGITS_OF_STRENGTH),
        error: few(inAlpha.error, 2),
        method: `sum rule with four coefficients at μ = m(m), ${estimates[0]?.reference ?? ''}`,
        others: all.slice(1),
      },
    };
  }
  const error = strength.error === undefined ? 0 : strength.error.plus.add(strength.error.minus).toNumber() / 2;
  return {
    value: toNumberExact(strength.value),
    error,
    used: {
      value: strength.text,
      ...(error > 0 ? { error: few(error, 2) } : {}),
      method: 'as given',
      others: all,
    },
  };
}

function requestFor(question: MassQuestion, to: MassQuestion['from'], strength: number): MassRequest {
  const { mass, from, alpha, light, flavours, loops, scale, thresholds } = question;
  return {
    mass: toNumberExact(mass.value),
    from,
    to,
    alpha: { value: toNumberExact(alpha.value.value), scale: alpha.scale, flavours: alpha.flavours },
    light,
    flavours,
    strength,
    // One definition: an order too high is refused. Several: each has what it has.
    ...(question.to.length > 1 ? { order: orderFor(question, to) } : {}),
    ...(question.to.length === 1 && question.order !== undefined ? { order: question.order } : {}),
    ...(loops === undefined ? {} : { loops }),
    ...(scale === undefined ? {} : { scale }),
    ...(thresholds === undefined ? {} : { thresholds }),
  };
}

/** What a reader has to know before quoting the values. */
function cautionsFor(
  question: MassQuestion,
  atScale: number,
  mu: number,
  cutoffs: ReadonlyMap<number, number>,
): string[] {
  const list: string[] = [];
  if (atScale > STRONG) {
    list.push(`α_s = ${few(atScale)} at μ = ${scaleText(mu)} GeV: the terms say little about what is left out`);
  }
  for (const [scale, alpha] of cutoffs) {
    if (alpha > STRONG && alpha <= LARGEST_CUTOFF_COUPLING) {
      list.push(`α_s = ${few(alpha)} at the cutoff ${scaleText(scale)} GeV: near the end of perturbation theory`);
    }
  }
  if (question.light < question.flavours - 1) {
    list.push(
      `${question.flavours - 1 - question.light} lighter massive quark is decoupled: what its mass does to the relations beyond the coupling is left out`,
    );
  }
  return list;
}

/** The study. Refused when not one of the definitions can be reached for a reason that they share. */
export function massStudy(question: MassQuestion): MassResult | Refusal {
  const strength = strengthOf(question);
  // With as many orders as the first definition is reached with.
  const [first = question.from] = question.to;
  const probe = {
    ...requestFor(question, { definition: 'msbar' }, strength.value),
    order: orderFor(question, first),
  };
  const found = convertMass(probe);
  if (isRefusal(found)) return found;
  const setting = settingOf(probe);
  if (isRefusal(setting)) return setting;
  const point = pointAt(setting, found.msbar);
  if (isRefusal(point)) return point;
  const lambda = lambdaAt(setting.source, point.atMass, found.msbar);
  if (isRefusal(lambda)) return lambda;

  const overLambda = ambiguityOverLambda(question.light, strength.value);
  const inputs = {
    question,
    exact: { mass: question.mass.value, alpha: question.alpha.value.value },
    strength,
    ambiguity: Math.abs(overLambda) * lambda,
  };
  const values = question.to.map((to) => entryOf(requestFor(question, to, strength.value), inputs));
  const [only] = values;
  if (values.length === 1 && only !== undefined && 'refused' in only) return only.refused;

  const known = poleTerms(setting.numbers, point, definitionOf('pole').orders).slice(1);
  const pole = poleAmbiguity({
    light: question.light,
    strength: strength.value,
    lambda,
    mu: point.mu,
    alpha: point.alpha,
    terms: known,
  });
  const source = fixedTerms(setting, question.from, point);
  const cutoffs = new Map<number, number>();
  for (const { scale } of [question.from, ...question.to]) {
    const alpha = scale === undefined ? undefined : alphaAt(setting.source, point.atMass, found.msbar, scale);
    if (scale !== undefined && typeof alpha === 'number') cutoffs.set(scale, alpha);
  }
  const relative = strength.error / strength.value;
  return {
    mass: question.mass.text,
    from: {
      definition: question.from.definition,
      title: definitionOf(question.from.definition).title,
      symbol: symbolAt(question.from),
      ...(question.from.scale === undefined ? {} : { scale: scaleText(question.from.scale) }),
    },
    light: question.light,
    flavours: question.flavours,
    loops: question.loops ?? 5,
    alphaS: {
      given: question.alpha.value.text,
      scale: scaleText(question.alpha.scale),
      flavours: question.alpha.flavours,
      atMass: text(point.atMass),
    },
    lambda: few(lambda, 6),
    msbar: text(found.msbar),
    scale: scaleText(point.mu),
    ...(source === undefined || isRefusal(source) ? {} : { sourceTerms: listTerms(point, source) }),
    strength: strength.used,
    values,
    poleAmbiguity: {
      conventions: pole.conventions.map((c) => ({
        name: c.name,
        GeV: few(c.value, 4),
        ...(relative > 0 && c.name.startsWith('|Im|') ? { error: few(c.value * relative, 2) } : {}),
        inLambda: few(c.value / lambda, 4),
        about: c.origin,
      })),
      knownOrders: pole.known,
    },
    cautions: cautionsFor(question, point.alpha, point.mu, cutoffs),
  };
}
