/** @module The uncertain inputs of a derivation: the coefficients of series and constants that carry an error. */
import type { Rational } from '../../numerics/index.js';
import type { Series } from '../../series/index.js';

export interface Source {
  /** Which series or constant, and which of its coefficients. */
  readonly of: string;
  readonly index: number;
  readonly plus: number;
  readonly minus: number;
  /** The same as written, for what depends on nothing else. */
  readonly error?: { readonly plus: Rational; readonly minus: Rational };
  readonly estimated: boolean;
}

const sigmaOf = (s: Source): number => (s.plus + s.minus) / 2;

export class Sources {
  private readonly list: Source[] = [];
  private readonly correlations = new Map<string, readonly (readonly Rational[])[]>();

  get all(): readonly Source[] {
    return this.list;
  }

  /** The derivatives of an input that is this source itself. */
  add(source: Source): readonly number[] {
    const known = this.list.findIndex((s) => s.of === source.of && s.index === source.index);
    const k = known >= 0 ? known : this.list.push(source) - 1;
    return Array.from({ length: k + 1 }, (_, i) => (i === k ? 1 : 0));
  }

  /** The slopes of the coefficients of a series, which is known under a name. */
  ofSeries(series: Series, name: string): readonly (readonly number[])[] {
    if (series.correlation !== undefined) this.correlations.set(name, series.correlation);
    return series.coefficients.map(({ error, status }, index) => {
      const estimated = status === 'estimated';
      if (error === undefined && !estimated) return [];
      const plus = error?.plus.toNumber() ?? 0;
      const minus = error?.minus.toNumber() ?? 0;
      return this.add({ of: name, index, plus, minus, estimated, ...(error === undefined ? {} : { error }) });
    });
  }

  private correlation(a: Source, b: Source): number {
    if (a === b) return 1;
    return a.of === b.of ? (this.correlations.get(a.of)?.[a.index]?.[b.index]?.toNumber() ?? 0) : 0;
  }

  /** Covariance matrix of results from their derivatives: S C Sᵀ. */
  covariances(slopes: readonly (readonly number[])[]): readonly (readonly number[])[] {
    const scaled = slopes.map((row) => this.list.map((s, k) => (row[k] ?? 0) * sigmaOf(s)));
    const correlated = this.correlations.size > 0;
    const dot = (a: readonly number[], b: readonly number[]): number =>
      a.reduce((sum, x, k) => (x === 0 ? sum : sum + x * (b[k] ?? 0)), 0);
    const mixed = correlated
      ? scaled.map((row) => this.list.map((s) => row.reduce((sum, x, j) => this.mix(sum, x, s, j), 0)))
      : scaled;
    return mixed.map((row) => scaled.map((other) => dot(row, other)));
  }

  private mix(sum: number, x: number, s: Source, j: number): number {
    const t = this.list[j];
    return x === 0 || t === undefined ? sum : sum + x * this.correlation(s, t);
  }

  /** Does a result with these derivatives rest on an estimated coefficient? */
  estimated(slopes: readonly number[]): boolean {
    return this.list.some((s, i) => s.estimated && (slopes[i] ?? 0) !== 0);
  }

  /** The only source of a result, with its derivative; undefined when there are none or several. */
  only(slopes: readonly number[]): { readonly source: Source; readonly slope: number } | undefined {
    const found = this.list.flatMap((source, i) => {
      const slope = slopes[i] ?? 0;
      return slope === 0 || sigmaOf(source) === 0 ? [] : [{ source, slope }];
    });
    return found.length === 1 ? found[0] : undefined;
  }
}
