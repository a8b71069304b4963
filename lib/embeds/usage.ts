import { type EmbedRow, embedUsageSince } from "@/db/queries/embeds";
import { monthBucket } from "../limits/quota";
import type { Service } from "../service/service";

/** Requests a minute that one address may make through one widget: a person who types fast, and room to spare. */
export const EMBED_MINUTE_QUOTA = 120;

/** How far back the usage of a widget is told, days. */
const TOLD_DAYS = 31;

/** Whom a widget's monthly counter belongs to. */
export function embedSubject(id: string): string {
  return `embed:${id}`;
}

export interface EmbedQuota {
  readonly quota: number;
  readonly remaining: number;
  readonly resetsAt: string;
}

/** What is left of a widget's month at `now` (Unix ms). */
export async function embedQuota(
  service: Service,
  { id, monthQuota }: Pick<EmbedRow, "id" | "monthQuota">,
  now: number,
): Promise<EmbedQuota> {
  const bucket = monthBucket(embedSubject(id), monthQuota, now);
  const { remaining } = await service.limiter.look(bucket);
  return { quota: monthQuota, remaining, resetsAt: new Date(bucket.endsAt ?? now).toISOString() };
}

export interface HostUsage {
  /** Origin of the page; empty where browsers did not tell it. */
  readonly host: string;
  readonly requests: number;
  readonly computations: number;
  readonly refused: number;
  /** Last day with a call, `2025-03-01`, UTC. */
  readonly lastDay: string;
}

/** Calls of a widget in the last 31 days by the page around it, most first. */
export function usageByHost({ db }: Service, embedId: string, now: number): HostUsage[] {
  const hosts = new Map<string, HostUsage>();
  for (const row of embedUsageSince(db, now - (TOLD_DAYS - 1) * 86_400_000, embedId)) {
    const { host, day: lastDay } = row;
    const before = hosts.get(host) ?? { requests: 0, computations: 0, refused: 0 };
    hosts.set(host, {
      host,
      requests: before.requests + row.requests,
      computations: before.computations + row.computations,
      refused: before.refused + row.refused,
      lastDay,
    });
  }
  return [...hosts.values()].sort((a, b) => b.requests - a.requests || a.host.localeCompare(b.host));
}
