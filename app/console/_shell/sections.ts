import { AppWindow, KeyRound, type LucideIcon } from "lucide-react";
import type { Action } from "@/lib/auth/permissions";

export interface Section {
  readonly id: string;
  readonly title: string;
  readonly href: string;
  readonly icon: LucideIcon;
  /** Shown to those whose role may do this at all. */
  readonly permission: Action;
}

/** The sections of the console, in the order of its navigation. */
export const SECTIONS: readonly Section[] = [
  { id: "keys", title: "Keys", href: "/console/keys", icon: KeyRound, permission: "keys.view" },
  { id: "embeds", title: "Embeds", href: "/console/embeds", icon: AppWindow, permission: "embeds.view" },
];
