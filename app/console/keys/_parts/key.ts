import type { KeyView } from "@/lib/auth/manage-keys";

/** A key as the console's JSON has it. */
export interface Key extends KeyView {
  readonly teamId: string;
  readonly teamName: string;
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
