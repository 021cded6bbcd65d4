/**
 * @module The error budget: components that stay apart, the rules for those that overlap, and three totals with names.
 *
 * Method     a source answers +1σ and −1σ (or two ends of a range) with two signed shifts of the unknown; its sides are the
 *            largest shift up and down; independent sources add in quadrature within a component. Correlated coefficient errors:
 *            σ² = J C Jᵀ.
 *            Overlaps: truncation and scale estimate the same missing orders, the larger counts; where the least term is
 *            reached, truncation and renormalon ambiguity overlap as well, the larger counts.
 *            Totals of what counts: quadrature; linear; mixed = √(Σ stochastic²) + Σ ranges.
 * Reference  common practice, no single source; the rules are stated in docs/methods/extraction.md.
 */

export const COMPONENT_NAMES = [
  'measurement',
  'inputs',
  'coefficients',
  'power corrections',
  'truncation',
  'scale',
  'ambiguity',
  'prescription',
  'evolution',
] as const;
export type ComponentName = (typeof COMPONENT_NAMES)[number];

/** Signed change of the unknown, and how it was found. */
export interface Shift {
  readonly cause: string;
  readonly shift: number;
  readonly how: 'slope' | 'refit';
}

export interface Source {
  readonly label: string;
  readonly shifts: readonly Shift[];
}

export interface Component {
  readonly name: ComponentName;
  readonly sources: readonly Source[];
  /** Both non-negative. */
  readonly plus: number;
  readonly minus: number;
  readonly nature: 'stochastic' | 'range';
  readonly counted: boolean;
  /** Where the number comes from, or why the component does not count. */
  readonly note?: string;
  /** Why there is no number. */
  readonly missing?: string;
}

const NATURE: Readonly<Record<ComponentName, Component['nature']>> = {
  measurement: 'stochastic',
  inputs: 'stochastic',
  coefficients: 'stochastic',
  'power corrections': 'stochastic',
  truncation: 'stochastic',
  scale: 'stochastic',
  evolution: 'stochastic',
  ambiguity: 'range',
  prescription: 'range',
};

export interface Sides {
  readonly plus: number;
  readonly minus: number;
}

export const sidesOf = ({ shifts }: Source): Sides => ({
  plus: Math.max(0, ...shifts.map((s) => s.shift)),
  minus: Math.max(0, ...shifts.map((s) => -s.shift)),
});

const quadrature = (sizes: readonly number[]): number => Math.hypot(...sizes, 0);

/** A component of independent sources; sides given outright where the sources are correlated. */
export function component(
  name: ComponentName,
  sources: readonly Source[],
  more: { readonly sides?: Sides; readonly note?: string; readonly missing?: string } = {},
): Component {
  const each = sources.map(sidesOf);
  const { sides, ...rest } = more;
  return {
    name,
    sources,
    plus: sides?.plus ?? quadrature(each.map((s) => s.plus)),
    minus: sides?.minus ?? quadrature(each.map((s) => s.minus)),
    nature: NATURE[name],
    counted: true,
    ...rest,
  };
}

/** √(J C Jᵀ) for shifts J_i of one standard deviation each and their correlation matrix. */
export function correlatedError(
  shifts: readonly number[],
  correlation: readonly (readonly number[])[] | undefined,
): number {
  let variance = 0;
  shifts.forEach((a, i) =>
    shifts.forEach((b, j) => {
      variance += a * b * (i === j ? 1 : (correlation?.[i]?.[j] ?? 0));
    }),
  );
  return Math.sqrt(Math.max(0, variance));
}

const sizeOf = ({ plus, minus }: Sides): number => Math.max(plus, minus);

/** The components with those that overlap a larger one taken out of the totals. */
export function withOverlaps(components: readonly Component[], leastTermReached: boolean): readonly Component[] {
  const find = (name: ComponentName): Component | undefined =>
    components.find((c) => c.name === name && c.missing === undefined);
  const out = new Map<ComponentName, string>();
  const [truncation, scale, ambiguity] = [find('truncation'), find('scale'), find('ambiguity')];
  let orders = truncation;
  if (truncation !== undefined && scale !== undefined) {
    const [larger, smaller] = sizeOf(scale) > sizeOf(truncation) ? [scale, truncation] : [truncation, scale];
    out.set(smaller.name, `estimates the same missing orders as ${larger.name}, which is larger`);
    orders = larger;
  }
  orders ??= scale;
  if (leastTermReached && orders !== undefined && ambiguity !== undefined) {
    const [larger, smaller] = sizeOf(ambiguity) > sizeOf(orders) ? [ambiguity, orders] : [orders, ambiguity];
    out.set(smaller.name, `the least term is reached: overlaps with ${larger.name}, which is larger`);
  }
  return components.map((c) => {
    const because = out.get(c.name);
    return because === undefined ? c : { ...c, counted: false, note: because };
  });
}

export const TOTALS = ['quadrature', 'linear', 'mixed'] as const;
export type TotalName = (typeof TOTALS)[number];
export type Totals = Readonly<Record<TotalName, Sides>>;

export function totals(components: readonly Component[]): Totals {
  const counted = components.filter((c) => c.counted && c.missing === undefined);
  const side = (which: 'plus' | 'minus', rule: TotalName): number => {
    const of = (list: readonly Component[]): number[] => list.map((c) => c[which]);
    const sum = (list: readonly number[]): number => list.reduce((a, b) => a + b, 0);
    if (rule === 'linear') return sum(of(counted));
    if (rule === 'quadrature') return quadrature(of(counted));
    return (
      quadrature(of(counted.filter((c) => c.nature === 'stochastic'))) +
      sum(of(counted.filter((c) => c.nature === 'range')))
    );
  };
  const both = (rule: TotalName): Sides => ({ plus: side('plus', rule), minus: side('minus', rule) });
  return { quadrature: both('quadrature'), linear: both('linear'), mixed: both('mixed') };
}

/**
 * The same components for a function of the unknown, each shift taken through it. A component whose shifted unknown leads
 * nowhere has no number there.
 */
export function mapped(
  components: readonly Component[],
  central: number,
  f: (p: number) => number | undefined,
): readonly Component[] {
  const there = f(central);
  if (there === undefined) return [];
  const through = (shift: number): number | undefined => {
    if (shift === 0) return 0;
    const moved = f(central + shift);
    return moved === undefined ? undefined : moved - there;
  };
  return components.map((c) => {
    if (c.missing !== undefined) return c;
    const sources = c.sources.map((s) => ({
      ...s,
      shifts: s.shifts.flatMap((one) => {
        const shift = through(one.shift);
        return shift === undefined ? [] : [{ ...one, shift }];
      }),
    }));
    const [up, down] = [through(c.plus), through(-c.minus)];
    if (up === undefined || down === undefined) {
      return { ...c, sources, plus: 0, minus: 0, missing: 'the shifted value cannot be taken there' };
    }
    return { ...c, sources, plus: Math.max(0, up, down), minus: Math.max(0, -up, -down) };
  });
}

export interface PrescriptionSpread {
  readonly low: number;
  readonly high: number;
  readonly half: number;
  /** Half-spread over √3: the standard deviation of a rectangular distribution. */
  readonly rectangular: number;
}

/** Half the spread of values that share their data: no average, since their errors are not independent. */
export function spreadOf(values: readonly number[]): PrescriptionSpread | undefined {
  if (values.length < 2) return undefined;
  const [low, high] = [Math.min(...values), Math.max(...values)];
  const half = (high - low) / 2;
  return { low, high, half, rectangular: half / Math.sqrt(3) };
}
