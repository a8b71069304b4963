import { embedUsageSince, listEmbeds } from "@/db/queries/embeds";
import type { Service } from "../service/service";
import { type EmbedView, embedView } from "./embed-view";
import { embedQuota, type EmbedQuota } from "./usage";

/** A widget in the console's list, with what it was used for this month. */
export interface EmbedRowView extends EmbedView {
  /** Calls in the last 31 days. */
  readonly requests: number;
  /** Origins that called in the last 31 days. */
  readonly hosts: number;
  readonly month: EmbedQuota;
}

const DAYS = 31;

/** Widgets of some teams, newest first. */
export async function embedRows(
  service: Service,
  teamIds: readonly string[],
  now: number,
): Promise<EmbedRowView[]> {
  const { db } = service;
  const usage = embedUsageSince(db, now - (DAYS - 1) * 86_400_000);
  return Promise.all(
    listEmbeds(db, teamIds).map(async (row) => {
      const own = usage.filter(({ embedId }) => embedId === row.id);
      return {
        ...embedView(row),
        requests: own.reduce((sum, { requests }) => sum + requests, 0),
        hosts: new Set(own.map(({ host }) => host)).size,
        month: await embedQuota(service, row, now),
      };
    }),
  );
}
