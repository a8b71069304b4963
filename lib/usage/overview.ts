import type { Database } from "@/db/client";
import { brokenEmbeds } from "@/db/queries/attention";
import { keysInNeed, type ListedKey } from "@/db/queries/key-list";
import { listEvents, slowestEvents } from "@/db/queries/usage-events";
import type { UsageScope } from "@/db/queries/usage-sums";
import { expiryText, SOON_MS } from "../auth/key-expiry";
import { callerNames } from "./caller-names";
import {
  DAY_MS,
  HOUR_MS,
  type Period,
  periodsOf,
  type RequestView,
  requestView,
  type Total,
  totalOf,
} from "./console-usage";

/** Rows of each short list. */
const SHORT = 8;

export interface Attention {
  readonly kind: "key-expires" | "quota" | "failed" | "retired-material";
  readonly text: string;
  /** Page of the console that helps. */
  readonly href: string;
}

export interface QuotaState {
  readonly keyId: string;
  readonly name: string;
  readonly team: string;
  readonly used: number;
  readonly quota: number;
}

export interface Overview {
  readonly today: Total;
  readonly month: Total;
  /** Hours of the last two days. */
  readonly hours: readonly Period[];
  /** The last thirty days. */
  readonly days: readonly Period[];
  readonly quotas: readonly QuotaState[];
  readonly errors: { readonly rows: readonly RequestView[]; readonly total: number; readonly more: boolean };
  readonly slowest: readonly RequestView[];
  readonly attention: readonly Attention[];
}

interface Asked {
  readonly scope: UsageScope;
  /** Teams whose keys and embeds are looked at. */
  readonly teamIds: readonly string[];
  /** Unix ms. */
  readonly now: number;
}

/** What the first page of the console shows. */
export function overviewOf(db: Database, { scope, teamIds, now }: Asked): Overview {
  const today = Math.floor(now / DAY_MS);
  const firstOfMonth = Math.floor(
    Date.UTC(new Date(now).getUTCFullYear(), new Date(now).getUTCMonth(), 1) / DAY_MS,
  );
  const nameOf = callerNames(db);
  const month = new Date(now).toISOString().slice(0, 7);
  const needy = keysInNeed(db, { teamIds, now, soonMs: SOON_MS, month, most: 50 });
  const errors = listEvents(
    db,
    { scope, from: now - DAY_MS, to: now + 1, statuses: "error" },
    { limit: SHORT, offset: 0, countUpTo: 10_000 },
  );
  const failed = listEvents(
    db,
    { scope, from: now - DAY_MS, to: now + 1, statuses: "5xx" },
    { limit: 1, offset: 0, countUpTo: 1_000 },
  );
  const thisHour = Math.floor(now / HOUR_MS);
  return {
    today: totalOf(db, scope, { from: today, to: today }),
    month: totalOf(db, scope, { from: firstOfMonth, to: today }),
    hours: periodsOf(db, scope, { from: today - 1, to: today }, "hour", now),
    days: periodsOf(db, scope, { from: today - 29, to: today }, "day", now),
    quotas: needy.filter(isNearlySpent).slice(0, SHORT).map(quotaState),
    errors: { ...errors, rows: errors.rows.map((row) => requestView(row, nameOf)) },
    slowest: slowestEvents(db, scope, { from: thisHour - 23, to: thisHour }, SHORT).map((row) =>
      requestView(row, nameOf),
    ),
    attention: [
      ...failedCalls(failed.total, failed.more),
      ...needy.filter(isNearlySpent).map(quotaAttention),
      ...needy
        .filter(({ expiresAt }) => expiresAt !== null && expiresAt <= now + SOON_MS)
        .map((key) => endAttention(key, now)),
      ...brokenEmbeds(db, teamIds).map(({ id, name, material }): Attention => ({
        kind: "retired-material",
        text: `Embed ${name} names the material ${material}, which is retired: its visitors get no answer.`,
        href: `/console/embeds/${id}`,
      })),
    ],
  };
}

function failedCalls(total: number, more: boolean): Attention[] {
  if (total === 0) return [];
  const calls = `${more ? "More than " : ""}${total} call${total === 1 ? "" : "s"}`;
  return [
    {
      kind: "failed",
      text: `${calls} failed in the last 24 hours by a fault of the service.`,
      href: "/console/usage?requests-statuses=5xx",
    },
  ];
}

const isNearlySpent = ({ monthQuota, monthUsed }: ListedKey) =>
  monthQuota > 0 && monthUsed >= 0.8 * monthQuota;

function quotaState({ id, name, teamName, monthUsed, monthQuota }: ListedKey): QuotaState {
  return { keyId: id, name, team: teamName, used: monthUsed, quota: monthQuota };
}

function quotaAttention({ id, name, teamName, monthUsed, monthQuota }: ListedKey): Attention {
  const share = Math.floor((100 * monthUsed) / monthQuota);
  const text =
    monthUsed >= monthQuota
      ? `Key ${name} (${teamName}) has used up its month: further computations are refused.`
      : `Key ${name} (${teamName}) has used ${share}\u00a0% of its month.`;
  return { kind: "quota", text, href: `/console/keys/${id}` };
}

function endAttention({ id, name, teamName, expiresAt }: ListedKey, now: number): Attention {
  return {
    kind: "key-expires",
    text: `Key ${name} (${teamName}) ${expiryText((expiresAt ?? 0) - now)}.`,
    href: `/console/keys/${id}`,
  };
}
