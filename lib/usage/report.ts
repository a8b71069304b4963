import { daysOfKey, type DaySum } from "@/db/queries/usage";
import type { KeyPrincipal } from "../auth/principal";
import type { Bucket } from "../limits/limiter";
import type { Service } from "../service/service";

/** How far back the days of a key's own report go, days. */
const REPORTED_DAYS = 31;

interface QuotaReport {
  readonly quota: number;
  readonly remaining: number;
  readonly resetsAt: string;
}

export interface UsageReport {
  readonly key: string;
  readonly scopes: readonly string[];
  readonly minute: QuotaReport;
  readonly month: QuotaReport;
  readonly byDay: readonly DaySum[];
}

/** What a key has used and what is left to it. */
export async function usageReport(
  service: Service,
  key: KeyPrincipal,
  buckets: { readonly minute: Bucket; readonly month: Bucket },
  now: number,
): Promise<UsageReport> {
  const quota = async (bucket: Bucket): Promise<QuotaReport> => {
    const { remaining, resetSeconds } = await service.limiter.look(bucket);
    const resets = bucket.endsAt ?? now + resetSeconds * 1000;
    return { quota: bucket.quota, remaining, resetsAt: new Date(resets).toISOString() };
  };
  return {
    key: key.id,
    scopes: key.scopes,
    minute: await quota(buckets.minute),
    month: await quota(buckets.month),
    byDay: daysOfKey(service.db, key.id, now - (REPORTED_DAYS - 1) * 86_400_000),
  };
}
