import type { Scope } from "./scope";

/** A program with a key. */
export interface KeyPrincipal {
  readonly kind: "key";
  readonly id: string;
  readonly name: string;
  readonly teamId: string;
  /** The team's short name. */
  readonly team: string;
  readonly scopes: readonly Scope[];
  readonly origins: readonly string[];
  readonly minuteQuota: number;
  readonly monthQuota: number;
  readonly address: string;
}

/** A page of our own that nobody is signed in to, with its short-lived token. */
export interface SignedOutPrincipal {
  readonly kind: "signed-out";
  readonly scopes: readonly Scope[];
  readonly minuteQuota: number;
  readonly monthQuota: number;
  readonly address: string;
}

/** Neither key nor token: only what is open to all. */
export interface AnonymousPrincipal {
  readonly kind: "anonymous";
  readonly address: string;
}

export type Principal = KeyPrincipal | SignedOutPrincipal | AnonymousPrincipal;

/** Id under which signed-out calls are counted in the usage. */
export const SIGNED_OUT_ID = "signed-out";
