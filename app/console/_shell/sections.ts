import type { LucideIcon } from "lucide-react";
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
export const SECTIONS: readonly Section[] = [];
