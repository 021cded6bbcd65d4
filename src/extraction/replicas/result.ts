/** @module The plain result of a Monte Carlo. Numbers are decimal strings; `error` is always the Monte Carlo error. */

export interface ReplicaNumber {
  readonly value: string;
  readonly error: string;
}

/** The distribution of one quantity. */
export interface ReplicaDistribution {
  readonly replicas: number;
  readonly median: ReplicaNumber;
  readonly low68: ReplicaNumber;
  readonly high68: ReplicaNumber;
  readonly low95: ReplicaNumber;
  readonly high95: ReplicaNumber;
  readonly mean: ReplicaNumber;
  readonly sigma: ReplicaNumber;
  readonly skewness: ReplicaNumber;
  /** Largest difference of the percentiles of the two halves, in units of its expected size. */
  readonly halves?: string;
  readonly histogram: readonly number[];
  readonly below: number;
  readonly above: number;
}

export interface ReplicaQuantity {
  readonly symbol: string;
  readonly unit?: string;
  /** Ends of the histograms' range, the same for all prescriptions. */
  readonly from: string;
  readonly to: string;
}

export interface ReplicaRow {
  readonly prescription: string;
  readonly variants: readonly string[];
  /** Replicas without a value, and why. */
  readonly failed: number;
  readonly reasons: readonly { readonly reason: string; readonly count: number }[];
  /** At most one replica in twenty failed. */
  readonly stable: boolean;
  /** For each quantity; absent where fewer than two replicas have a value. */
  readonly values: readonly {
    readonly central: string;
    readonly distribution?: ReplicaDistribution;
    /** Width by linear propagation of the same errors, and the replicas' σ in units of it. */
    readonly linear: string;
    readonly ratio?: ReplicaNumber;
  }[];
}

export interface ReplicaResult {
  readonly asked: number;
  readonly done: number;
  readonly interrupted: boolean;
  readonly seed: string;
  readonly quantities: readonly ReplicaQuantity[];
  readonly inputs: readonly {
    readonly name: string;
    readonly central: string;
    readonly plus: string;
    readonly minus: string;
  }[];
  readonly rows: readonly ReplicaRow[];
  /** One prescription drawn for each replica, all stable ones alike; absent when fewer than two are stable. */
  readonly mixture?: {
    readonly prescriptions: readonly string[];
    readonly failed: number;
    readonly values: readonly { readonly distribution?: ReplicaDistribution }[];
  };
  /** Over all quantities of all rows, in the order of `labels`. */
  readonly covariance: {
    readonly labels: readonly string[];
    readonly matrix: readonly (readonly string[])[];
    readonly correlation: readonly (readonly string[])[];
  };
  readonly leftOut: readonly { readonly prescription: string; readonly reason: string }[];
  readonly notes: readonly string[];
}
