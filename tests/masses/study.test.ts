/** The study of a mass: errors against conversions with shifted input, digits, what is refused and what is said. */
import { describe, expect, it, test } from 'vitest';
import {
  convertMass,
  massStudy,
  poleStrength,
  type MassPlace,
  type MassQuestion,
  type MassRequest,
  type MassResult,
  type MassValue,
} from '../../src/masses/index.js';
import { isRefusal, type Refusal } from '../../src/qcd/index.js';
import { isNumberProblem, parseUncertain, type Uncertain } from '../../src/series/index.js';
import { massLines, massText } from '../../src/sheets/index.js';

function uncertain(text: string): Uncertain {
  const read = parseUncertain(text);
  if (isNumberProblem(read)) throw new Error(read.problem);
  return read;
}

const MSBAR: MassPlace = { definition: 'msbar' };
const QUESTION: MassQuestion = {
  mass: uncertain('4.186(6)'),
  from: MSBAR,
  to: [{ definition: 'rs', scale: 2 }],
  alpha: { value: uncertain('0.1180(9)'), scale: 91.1879, flavours: 5 },
  light: 4,
  flavours: 5,
  digits: 20,
};

function granted<T>(x: T | Refusal): T {
  if (isRefusal(x)) throw new Error(x.reason);
  return x;
}

const study = (change: Partial<MassQuestion> = {}): MassResult => granted(massStudy({ ...QUESTION, ...change }));

function valueOf(result: MassResult, k = 0): MassValue {
  const entry = result.values[k];
  if (entry === undefined || 'refused' in entry) throw new Error('no value');
  return entry;
}

const request: MassRequest = {
  mass: 4.186,
  from: MSBAR,
  to: { definition: 'rs', scale: 2 },
  alpha: { value: 0.118, scale: 91.1879, flavours: 5 },
  light: 4,
  flavours: 5,
};
const quick = (change: Partial<MassRequest>): number => granted(convertMass({ ...request, ...change })).value;

describe('errors', () => {
  const entry = valueOf(study());
  const central = quick({});
  const errorOf = (label: string): number => Number(entry.errors.find((e) => e.label === label)?.plus);
  const { inAlpha } = poleStrength(4);

  it.each([
    ['mass', quick({ mass: 4.192 })],
    ['α_s', quick({ alpha: { ...request.alpha, value: 0.1189 } })],
    ['strength N', quick({ strength: inAlpha.value - inAlpha.error })],
    ['four-loop coefficient', quick({ shifts: { pole: 1 } })],
  ])('%s: the conversion with shifted input', (label, shifted) => {
    expect(Math.abs(errorOf(label) / (shifted - central) - 1)).toBeLessThan(5e-3);
  });

  it('the four-loop coefficient: 1.64 + 0.04 n_l in (α_s/π)⁴', () => {
    const { alpha } = granted(convertMass(request));
    expect(errorOf('four-loop coefficient')).toBeCloseTo(4.186 * (1.64 + 0.16) * (alpha / Math.PI) ** 4, 6);
  });

  it('at R = m(m) it cancels in the natural MSR mass: one coefficient is uncertain, not two', () => {
    const msr = valueOf(study({ to: [{ definition: 'msr', scale: 4.186 }] }));
    expect(msr.errors.some((e) => e.label === 'four-loop coefficient')).toBe(false);
  });

  it('last term and scales; the larger is the perturbative error', () => {
    const rows = entry.byOrder;
    expect(rows.map((r) => r.order)).toEqual([0, 1, 2, 3, 4]);
    expect(Number(rows[0]?.value)).toBe(4.186);
    expect(Number(rows[4]?.value)).toBeCloseTo(central, 11);
    expect(Number(rows[4]?.change)).toBeCloseTo(central - quick({ order: 3 }), 7);
    const points = entry.scaleVariation?.points ?? [];
    expect(points.map((p) => p.factor)).toEqual(['0.5', '0.707', '1.41', '2']);
    expect(Number(points[3]?.value)).toBeCloseTo(quick({ scale: { ratio: 2 } }), 11);
    const both = [entry.lastTerm, entry.scaleVariation?.plus, entry.scaleVariation?.minus].map(Number);
    expect(Number(entry.perturbative)).toBe(Math.max(...both));
  });

  it('only a pole mass has an ambiguity', () => {
    expect(entry.ambiguity).toBeUndefined();
    const pole = study({ to: [{ definition: 'pole' }] });
    const convention = pole.poleAmbiguity.conventions.find((c) => c.name === '|Im|/pi');
    expect(Number(valueOf(pole).ambiguity)).toBeCloseTo(Number(convention?.GeV), 3);
    expect(pole.poleAmbiguity.conventions.map((c) => c.name)).toEqual([
      '|Im|',
      '|Im|/pi',
      'least term',
      'near-least partial sums',
    ]);
    const im = pole.poleAmbiguity.conventions[0];
    expect(Number(im?.GeV) / Number(im?.inLambda)).toBeCloseTo(Number(pole.lambda), 3);
  });
});

describe('terms', () => {
  const entry = valueOf(study());

  it('left is pole minus removed, and they add up to the value', () => {
    let sum = 4.186;
    for (const t of entry.terms ?? []) {
      expect(Number(t.left)).toBeCloseTo(Number(t.pole) - Number(t.removed), 6);
      sum += Number(t.left);
    }
    expect(sum).toBeCloseTo(Number(entry.value), 6);
  });

  it('the pole term is the renormalon to a few per cent at the fourth order, and most of it is taken out', () => {
    const last = entry.terms?.at(-1);
    expect(Math.abs(Number(last?.renormalon) / Number(last?.pole) - 1)).toBeLessThan(0.05);
    expect(Number(last?.left)).toBeLessThan(0.1 * Number(last?.pole));
    expect(Number(last?.leftRatio)).toBeLessThan(Number(last?.poleRatio));
  });
});

describe('strength', () => {
  it('is the sum rule with its error and the other estimates', () => {
    const { strength } = study();
    expect(strength.value).toBe('0.506182');
    expect(strength.method).toContain('sum rule');
    expect(strength.others.map((o) => o.value)).toEqual(['0.505601', '0.474851']);
  });

  it('as given, its error carried', () => {
    const result = study({ strength: uncertain('0.563(26)') });
    expect(result.strength.method).toBe('as given');
    const error = valueOf(result).errors.find((e) => e.label === 'strength N');
    // RS is linear in N.
    const slope = quick({ strength: 1 }) - quick({ strength: 0 });
    expect(Number(error?.plus)).toBeCloseTo(Math.abs(slope) * 0.026, 3);
  });
});

describe('digits', () => {
  it('certified where enclosures exist, and as many as asked', () => {
    const entry = valueOf(study({ loops: 4, digits: 30 }));
    expect(entry.digits).toBe('certified');
    expect(entry.value.replace('.', '')).toHaveLength(30);
    expect(Number(entry.value)).toBeCloseTo(quick({ loops: 4 }), 13);
  });

  it('converged for the R-evolution', () => {
    const entry = valueOf(study({ to: [{ definition: 'msr', scale: 2 }] }));
    expect(entry.digits).toBe('converged');
    const { evolution } = entry;
    expect(evolution?.path.map((p) => p.scale)).toEqual(['4.186', '3.48022', '2.89344', '2.40559', '2']);
    expect(evolution?.path.at(-1)?.mass).toBe(entry.value);
    expect(Number(evolution?.doubt)).toBeLessThan(1e-13);
    expect(Math.abs(Number(evolution?.fixedOrder) - Number(entry.value))).toBeLessThan(0.003);
  });

  it('an MSbar mass is itself', () => {
    expect(valueOf(study({ to: [MSBAR] })).value).toBe('4.186');
  });
});

describe('several definitions', () => {
  const to: readonly MassPlace[] = [
    { definition: 'pole' },
    { definition: 'kinetic', scale: 1 },
    { definition: 'rs', scale: 0.2 },
  ];
  const result = study({ to, order: 3 });

  it('each has the orders it has', () => {
    expect([valueOf(result, 0).order, valueOf(result, 1).order]).toEqual([3, 2]);
  });

  it('one that is refused does not stop the others', () => {
    expect(result.values[2]).toMatchObject({
      definition: 'rs',
      refused: { remedy: expect.stringContaining('1 GeV') as string },
    });
    expect(massText(result)).toContain('refused. ν_f = 0.2 GeV');
    expect(massLines(result).split('\n')).toEqual([
      expect.stringMatching(/^pole 4\.9/),
      expect.stringMatching(/^kinetic 4\.5/),
      'rs refused',
      '',
    ]);
  });

  it('alone it is a refusal, as is an order too high', () => {
    expect(massStudy({ ...QUESTION, to: [{ definition: 'rs', scale: 0.2 }] })).toHaveProperty('remedy');
    expect(massStudy({ ...QUESTION, to: [{ definition: 'kinetic', scale: 1 }], order: 3 })).toHaveProperty('remedy');
  });
});

describe('refused', () => {
  it.each([
    ['negative mass', { mass: -4.18 }, 'positive'],
    ['no cutoff', { to: { definition: 'rs' } }, 'needs ν_f'],
    ['cutoff above the mass', { to: { definition: 'ps', scale: 5 } }, 'lies above the mass'],
    [
      'cutoff below perturbation theory',
      { to: { definition: 'msr', scale: 0.55 } },
      'perturbation theory does not hold',
    ],
    ['cutoff below Λ', { to: { definition: 'msr', scale: 0.2 } }, 'Landau'],
    ['cutoff not positive', { to: { definition: 'ps', scale: 0 } }, 'not a positive scale'],
    ['light flavours', { light: 6 }, 'n_l = 6'],
    ['more light flavours than beside the quark', { light: 5, flavours: 5 }, 'do not fit'],
    ['order', { order: 5 }, '4 orders'],
    ['loops', { loops: 6 }, '1 to 5 loops'],
    ['strength', { strength: NaN }, 'not a number'],
    ['coupling', { alpha: { value: 0, scale: 91, flavours: 5 } }, 'not a positive number'],
    ['mass at Λ', { mass: 0.2 }, 'Landau'],
    [
      'pole mass below all',
      { mass: 1.5, light: 3, flavours: 4, from: { definition: 'pole' }, to: MSBAR },
      'no smaller value',
    ],
  ] as const)('%s', (_what, change, words) => {
    const found = convertMass({ ...request, ...change });
    expect(isRefusal(found) ? found.reason : 'granted').toContain(words);
    expect(isRefusal(found) && found.remedy.length > 0).toBe(true);
  });
});

test('cautions: strong coupling, decoupled quarks', () => {
  const charm = study({ mass: uncertain('1.28'), light: 3, flavours: 4, to: [{ definition: 'rs', scale: 0.8 }] });
  expect(charm.cautions.join()).toContain('at the cutoff 0.8 GeV');
  expect(study({ light: 3 }).cautions.join()).toContain('decoupled');
  expect(study().cautions).toEqual([]);
});

test('a mass in MeV is named as given; the result is plain data', () => {
  const result = study({ mass: { ...uncertain('4.186(6)'), text: '4186(6) MeV' } });
  expect(massText(result)).toContain('m(m) = 4186(6) MeV as m_RS(2 GeV)');
  expect(JSON.parse(JSON.stringify(result))).toEqual(result);
});

test('the relation of the given definition is shown when it is no MSbar mass', () => {
  const result = study({
    mass: uncertain('4.40'),
    from: { definition: 'rs', scale: 2 },
    to: [{ definition: 'ps', scale: 2 }],
  });
  expect(result.sourceTerms).toHaveLength(4);
  expect(massText(result)).toContain('Between m(m) and m_RS(2 GeV)');
  expect(
    massText(result, { columns: 80 })
      .split('\n')
      .every((line) => line.length <= 80),
  ).toBe(true);
});

test('an error of α_s that no conversion can carry is refused, not left out', () => {
  // 0.118 − 0.118 = 0 and 0.236, whose Landau pole lies above the bottom mass.
  const result = massStudy({ ...QUESTION, alpha: { ...QUESTION.alpha, value: uncertain('0.118(118)') } });
  expect(isRefusal(result) && result.reason).toMatch(/^the error of α_s reaches values that have no conversion: /);
});
