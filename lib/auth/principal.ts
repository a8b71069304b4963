import type { Role } from "@/db/schema/organisation";
import type { EmbedDefinition } from "../embeds/definition";
import type { Scope } from "./scope";

/** A program with a key, or a page of our own on behalf of the person who is signed in to it. */
export interface KeyPrincipal {
  readonly kind: "key";
  /** The key's id; for a page the person's and the team's, by which its usage is counted. */
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
  /** Who is signed in to the page that calls; none behind a program's key. */
  readonly person?: { readonly id: string; readonly name: string; readonly role: Role };
}

/** A page of our own that nobody is signed in to, with its short-lived token. */
export interface SignedOutPrincipal {
  readonly kind: "signed-out";
  readonly scopes: readonly Scope[];
  readonly minuteQuota: number;
  readonly monthQuota: number;
  readonly address: string;
}

/** The frame of a widget, with its short-lived token: it may compute what its version leaves open, nothing else. */
export interface EmbedPrincipal {
  readonly kind: "embed";
  /** The widget's id. */
  readonly id: string;
  readonly version: number;
  readonly definition: EmbedDefinition;
  /** Origin of the page around it; empty where the browser did not tell it. */
  readonly host: string;
  readonly teamId: string;
  readonly team: string;
  readonly scopes: readonly Scope[];
  /** Requests a minute from one address. */
  readonly minuteQuota: number;
  /** Computations a month, all pages together. */
  readonly monthQuota: number;
  readonly address: string;
}

/** Neither key nor token: only what is open to all. */
export interface AnonymousPrincipal {
  readonly kind: "anonymous";
  readonly address: string;
}

export type Principal = KeyPrincipal | EmbedPrincipal | SignedOutPrincipal | AnonymousPrincipal;

/** Id under which signed-out calls are counted in the usage. */
export const SIGNED_OUT_ID = "signed-out";

/** Id under which the calls of one person's pages for one team are counted in the usage. */
export function pageCallerId(personId: string, teamId: string): string {
  return `${personId}:${teamId}`;
}
