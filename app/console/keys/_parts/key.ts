/** A key as the console's JSON has it. */
export interface Key {
  readonly id: string;
  readonly name: string;
  readonly team: string;
  readonly teamId: string;
  readonly teamName: string;
  readonly scopes: readonly string[];
  readonly quotas: { readonly minute: number; readonly month: number };
  readonly origins: readonly string[];
  readonly allowedInUrl: boolean;
  readonly state: "active" | "expired" | "revoked";
  readonly createdAt: string;
  readonly createdBy: string;
  readonly expiresAt: string | null;
  readonly revokedAt: string | null;
  readonly lastUsedAt: string | null;
  readonly lastClient: string | null;
  readonly monthUsed: number;
}

export interface KeyDetail extends Key {
  readonly clients: readonly {
    readonly client: string;
    readonly requests: number;
    readonly lastAt: string;
  }[];
  readonly previousUntil: string | null;
  readonly mayManage: boolean;
}

/** The answer of issuing and of rotating: the whole key, this once. */
export interface ShownKey {
  readonly id: string;
  readonly name: string;
  readonly key: string;
  readonly previousUntil?: string;
}
