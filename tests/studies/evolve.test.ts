import { describe, expect, it } from 'vitest';
import { parseUncertain, type Uncertain } from '../../src/series/index.js';
import { evolveStudy, type EvolveRequest, type EvolveResult } from '../../src/studies/index.js';

function uncertain(text: string): Uncertain {
  const read = parseUncertain(text);
  if (!('value' in read)) throw new Error(`cannot read ${text}`);
  return read;
}
function granted(request: EvolveRequest): EvolveResult {
  const result = evolveStudy(request);
  if ('reason' in result) throw new Error(result.reason);
  return result;
}
const MZ = 91.1879;

describe('evolve', () => {
  it('α_s(M_Z) to the τ mass with three flavours', () => {
    const result = granted({
      quantity: 'alpha_s',
      value: uncertain('0.1180(9)'),
      from: { scale: MZ },
      to: { scale: 1.77693, flavours: 3 },
    });
    // Check values computed with mpmath 1.3.0, five loops and one less.
    expect(Number(result.value)).toBeCloseTo(0.313894712825, 11);
    expect(result.value).toBe('0.313894712825');
    expect(result.digits).toBe('converged');
    expect(Number(result.oneLoopLess?.shift)).toBeCloseTo(0.313798695217 - 0.313894712825, 6);
    expect(result.lambda.map((l) => l.flavours)).toEqual([5, 3]);
    expect(Number(result.lambda[0]?.GeV)).toBeCloseTo(0.208625007, 8);
    expect(Number(result.lambda[1]?.GeV)).toBeCloseTo(0.33311976, 7);
    expect(Number(result.lambda[0]?.error)).toBeGreaterThan(0.009);
    expect(result.path.map((s) => s.flavours)).toEqual([5, 5, 4, 4, 3, 3]);
    expect(result.path[2]?.text).toContain('b threshold');
    expect(result.matching?.crossings.map((c) => c.threshold)).toEqual(['c', 'c', 'b', 'b']);
    // At half the charm mass the coupling with three flavours is beyond use, or far off: both are said.
    for (const c of result.matching?.crossings ?? []) expect(c.value ?? c.refused?.remedy).toBeDefined();
    const alpha = result.errors.find((e) => e.label === 'α_s');
    // The derivative β(α)/β(α_Z) carries the error: 0.0009 · (0.3139/0.118)² within the higher orders.
    expect(Number(alpha?.plus)).toBeGreaterThan(0.006);
    expect(Number(alpha?.plus)).toBeLessThan(0.0085);
    expect(Number(alpha?.plus)).toBeGreaterThan(Number(alpha?.minus));
    expect(result.printed).toMatch(/^0\.31\d+ ± 0\.00\d+ \(α_s\)/);
  });

  it('a mass to its own scale, with the coupling of the world average behind it', () => {
    const result = granted({
      quantity: 'mass',
      value: uncertain('0.986(6)'),
      from: { scale: 3, flavours: 4 },
      to: { scale: 'own' },
      alphaS: { value: uncertain('0.1183(7)'), scale: 91.1876, flavours: 5 },
      loops: 4,
      thresholds: [
        { name: 'c', flavours: 4, mass: 1.275 },
        { name: 'b', flavours: 5, mass: 4.18 },
      ],
    });
    // HPQCD arXiv:1004.4285 (abstract read): m_c(m_c) = 1.273(6) from m_c(3 GeV) = 0.986(6).
    expect(Math.abs(Number(result.value) - 1.273)).toBeLessThan(5e-4);
    expect(result.unit).toBe('GeV');
    expect(Math.abs(Number(result.errors.find((e) => e.label === 'mass')?.plus) - 0.0055)).toBeLessThan(5e-4);
    expect(result.couplingPath?.[0]?.scale).toBe('91.1876');
    expect(result.matching?.crossings.map((c) => c.threshold)).toEqual(['b', 'b']);
    expect(result.to.scale).toBe('1.27318');
  });

  it('at fixed n_f there is no matching, at one loop nothing to compare with', () => {
    const result = granted({
      quantity: 'alpha_s',
      value: uncertain('0.3'),
      from: { scale: 3, flavours: 3 },
      to: { scale: 30, flavours: 3 },
      loops: 1,
    });
    expect(result.matching).toBeUndefined();
    expect(result.oneLoopLess).toBeUndefined();
    expect(result.errors).toEqual([]);
    expect(result.printed).toBe(result.value);
    // 1/α = 1/0.3 + b_0 ln 100.
    expect(Number(result.value)).toBeCloseTo(1 / (1 / 0.3 + (9 / (4 * Math.PI)) * Math.log(100)), 11);
  });

  it('refuses with reason and remedy', () => {
    const base: EvolveRequest = {
      quantity: 'alpha_s',
      value: uncertain('0.118(1)'),
      from: { scale: MZ },
      to: { scale: 2 },
    };
    const bad: EvolveRequest[] = [
      { ...base, to: { scale: 0.3 } },
      { ...base, to: { scale: 'own' } },
      { ...base, to: { scale: 2, flavours: 17 } },
      { ...base, to: { scale: 2, flavours: 3.5 } },
      { ...base, to: { scale: 2, flavours: 1 } },
      { ...base, loops: 7 },
      { ...base, value: uncertain('-0.118') },
      { ...base, from: { scale: 0 } },
      { ...base, quantity: 'mass', value: uncertain('0') },
    ];
    for (const request of bad) {
      const result = evolveStudy(request);
      expect('reason' in result && result.remedy.length > 10).toBe(true);
    }
  });

  it('is plain data', () => {
    const result = granted({
      quantity: 'alpha_s',
      value: uncertain('0.118(1)'),
      from: { scale: MZ },
      to: { scale: 2 },
    });
    expect(JSON.parse(JSON.stringify(result))).toEqual(result);
  });
});

describe('errors that leave the range of the evolution', () => {
  const request = (text: string, to: number): EvolveRequest => ({
    quantity: 'alpha_s',
    value: uncertain(text),
    from: { scale: MZ },
    to: { scale: to },
  });
  // 0.118 − 0.200 is below 0; 0.118 + 0.060 has its Landau pole above 1 GeV. Neither may pass for no error at all.
  it.each([
    ['0.118(200)', 10],
    ['0.118(60)', 1],
  ])('%s to %d GeV is refused with a remedy', (text, to) => {
    const result = evolveStudy(request(text, to));
    expect('reason' in result && result.reason).toMatch(/^the error of α_s reaches values that cannot be evolved: /);
    expect('remedy' in result && result.remedy).toContain('a smaller error');
  });

  it('an end that still stands gives its error, on its own side', () => {
    const result = granted(request('0.118(60)', 10));
    const alpha = result.errors.find((e) => e.label === 'α_s')!;
    const at = (text: string): number => Number(granted(request(text, 10)).value);
    expect(Number(alpha.plus)).toBeCloseTo(at('0.178') - at('0.118'), 3);
    expect(Number(alpha.minus)).toBeCloseTo(at('0.118') - at('0.058'), 3);
  });
});
