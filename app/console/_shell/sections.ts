import {
  Activity,
  AppWindow,
  ChartColumn,
  FileText,
  Gauge,
  KeyRound,
  Layers,
  Settings,
  Users,
  type LucideIcon,
} from "lucide-react";
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
  { id: "overview", title: "Overview", href: "/console", icon: Gauge, permission: "overview.view" },
  { id: "keys", title: "Keys", href: "/console/keys", icon: KeyRound, permission: "keys.view" },
  { id: "embeds", title: "Embeds", href: "/console/embeds", icon: AppWindow, permission: "embeds.view" },
  { id: "usage", title: "Usage", href: "/console/usage", icon: ChartColumn, permission: "usage.view" },
  {
    id: "materials",
    title: "Materials",
    href: "/console/materials",
    icon: Layers,
    permission: "materials.view",
  },
  { id: "records", title: "Records", href: "/console/records", icon: FileText, permission: "records.view" },
  { id: "people", title: "People", href: "/console/people", icon: Users, permission: "people.view" },
  {
    id: "activity",
    title: "Activity",
    href: "/console/activity",
    icon: Activity,
    permission: "activity.view",
  },
  {
    id: "settings",
    title: "Settings",
    href: "/console/settings",
    icon: Settings,
    permission: "settings.view",
  },
];
