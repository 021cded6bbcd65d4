/** The arithmetic of budgets: totals, overlaps, correlated errors, spreads, rounding. */
import { describe, expect, test } from 'vitest';
import {
  component,
  correlatedError,
  mapped,
  sidesOf,
  spreadOf,
  totals,
  withOverlaps,
} from '../../src/extraction/budget.js';
import type { Component, ComponentName } from '../../src/extraction/budget.js';
import { printed } from '../../src/extraction/entries.js';

const sized = (name: ComponentName, plus: number, minus = plus): Component =>
  component(name, [], { sides: { plus, minus } });

describe('totals', () => {
  // Arithmetic with mpmath 1.3.0, 36 digits.
  test('quadrature, linear and mixed of four components', () => {
    const list = [
      sized('inputs', 0.0006),
      sized('truncation', 0.0009),
      sized('ambiguity', 0.0004),
      sized('prescription', 0.0005),
    ];
    const t = totals(list);
    expect(t.quadrature.plus).toBeCloseTo(Number('0.00125698050899765347'), 17);
    expect(t.linear.plus).toBeCloseTo(0.0024, 17);
    expect(t.mixed.plus).toBeCloseTo(Number('0.00198166538263919679'), 17);
    expect(t.mixed.minus).toBe(t.mixed.plus);
  });

  test('sides are added by themselves', () => {
    const t = totals([sized('measurement', 3, 1), sized('inputs', 4, 0)]);
    expect(t.quadrature).toEqual({ plus: 5, minus: 1 });
    expect(t.linear).toEqual({ plus: 7, minus: 1 });
  });

  test('what is missing or does not count is left out', () => {
    const missing = component('scale', [], { missing: 'no scale' });
    expect(totals([sized('measurement', 1), missing, { ...sized('truncation', 5), counted: false }]).linear.plus).toBe(
      1,
    );
  });
});

describe('overlaps', () => {
  const counted = (list: readonly Component[]): ComponentName[] => list.filter((c) => c.counted).map((c) => c.name);

  test('of truncation and scale the larger counts', () => {
    expect(counted(withOverlaps([sized('truncation', 2), sized('scale', 1)], false))).toEqual(['truncation']);
    expect(counted(withOverlaps([sized('truncation', 2), sized('scale', 0, 3)], false))).toEqual(['scale']);
  });

  test('the ambiguity joins in only where the least term is reached', () => {
    const list = [sized('truncation', 2), sized('scale', 1), sized('ambiguity', 1.5)];
    expect(counted(withOverlaps(list, false))).toEqual(['truncation', 'ambiguity']);
    expect(counted(withOverlaps(list, true))).toEqual(['truncation']);
    expect(counted(withOverlaps([...list.slice(0, 2), sized('ambiguity', 3)], true))).toEqual(['ambiguity']);
  });

  test('a component without a number takes no part', () => {
    const missing = component('truncation', [], { missing: 'none stated' });
    expect(counted(withOverlaps([missing, sized('scale', 1)], false))).toContain('scale');
  });
});

describe('sources', () => {
  test('a source has the largest shift on each side; independent ones add in quadrature', () => {
    const source = (label: string, ...shifts: number[]) => ({
      label,
      shifts: shifts.map((shift) => ({ cause: '', shift, how: 'slope' as const })),
    });
    expect(sidesOf(source('μ', -1, -2, 0.5))).toEqual({ plus: 0.5, minus: 2 });
    const c = component('inputs', [source('a', 3, -3), source('b', 4, -1)]);
    expect([c.plus, c.minus]).toEqual([5, Math.hypot(3, 1)]);
  });

  test('through a decreasing function the sides change places', () => {
    const [c] = mapped([sized('measurement', 0.1, 0.2)], 1, (p) => 1 / p);
    expect(c?.plus).toBeCloseTo(1 / 0.8 - 1, 14);
    expect(c?.minus).toBeCloseTo(1 - 1 / 1.1, 14);
  });
});

describe('correlated coefficients', () => {
  // σ² = J C Jᵀ, C = [[.04, .015], [.015, .09]], J = (1.5, −.7): mpmath 1.3.0, 36 digits.
  test('√(J C Jᵀ)', () => {
    const shifts = [1.5 * 0.2, -0.7 * 0.3];
    const rho = 0.015 / (0.2 * 0.3);
    expect(correlatedError(shifts, [[1, rho], [rho, 1]])).toBeCloseTo(Number('0.320312347560939336'), 15); // prettier-ignore
    expect(correlatedError(shifts, undefined)).toBeCloseTo(Number('0.366196668472011089'), 15);
  });
});

test('half the spread, no average', () => {
  const s = spreadOf([0.2371, 0.2288, 0.2333])!;
  expect(s.half).toBeCloseTo(0.00415, 15);
  expect((s.low + s.high) / 2).toBeCloseTo(0.23295, 15);
  expect(s.rectangular).toBeCloseTo(Number('0.00239600361713694193'), 15);
  expect(spreadOf([1])).toBeUndefined();
});

describe('the printed line', () => {
  // Particle Data Group, Introduction 5.3: 0.827 ± 0.119 → 0.83 ± 0.12, 0.827 ± 0.367 → 0.8 ± 0.4; the others by the same rule.
  test.each([
    ['0.827', 0.119, '0.83 ± 0.12'],
    ['0.827', 0.367, '0.8 ± 0.4'],
    ['0.827', 0.0096, '0.827 ± 0.010'],
    ['163.4567', 0.0951, '163.46 ± 0.10'],
    ['4.18123', 0.00354, '4.1812 ± 0.0035'],
    ['4.18123', 0.00355, '4.181 ± 0.004'],
  ])('%s ± %s', (value, error, text) => {
    expect(printed(value, [sized('measurement', error)])).toBe(`${text} (measurement)`);
  });

  test('asymmetric sides keep their signs; negligible components are named; a unit stands behind', () => {
    const list = [sized('measurement', 0.0042), sized('scale', 0.026, 0.0062), sized('inputs', 1e-5)];
    expect(printed('0.31987', list)).toBe('0.320 ± 0.004 (measurement) +0.026 −0.006 (scale); inputs negligible');
    expect(printed('4.1665', [sized('measurement', 0.054)], 'GeV')).toBe('(4.17 ± 0.05 (measurement)) GeV');
  });
});
