/** What the console's JSON says of usage. */

export interface Caller {
  readonly id: string;
  readonly kind: "key" | "pages" | "embed" | "signed-out";
  readonly name: string;
}

export interface Total {
  readonly requests: number;
  readonly computations: number;
  readonly refused: number;
  readonly failed: number;
  readonly meanMs: number | null;
  readonly p50Ms: number | null;
  readonly p95Ms: number | null;
  readonly p99Ms: number | null;
}

export interface Period extends Total {
  readonly at: string;
}

export interface UsageAnswer {
  readonly from: string;
  readonly to: string;
  readonly by: "day" | "hour";
  readonly caller: Caller | null;
  readonly total: Total;
  readonly periods: readonly Period[];
}

export interface SharesAnswer {
  readonly by: string;
  readonly rows: readonly {
    readonly name: string;
    readonly label: string;
    readonly requests: number;
    readonly computations: number;
  }[];
  readonly sampled: number | null;
}

export interface CallerRow {
  readonly caller: Caller;
  readonly team: string | null;
  readonly requests: number;
  readonly computations: number;
  readonly refused: number;
  readonly failed: number;
  readonly meanMs: number | null;
  readonly lastUsedAt: string | null;
}

export interface RequestRow {
  readonly requestId: string;
  readonly at: string;
  readonly caller: Caller;
  readonly operation: string;
  readonly shape: string | null;
  readonly status: number;
  readonly latencyMs: number;
  readonly computations: number;
  readonly client: string;
}
