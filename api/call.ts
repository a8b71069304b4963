import { authenticate } from "@/lib/auth/authenticate";
import type { Principal } from "@/lib/auth/principal";
import type { Bucket, BucketState, Spending } from "@/lib/limits/limiter";
import { embedSubject } from "@/lib/embeds/usage";
import { addressBucket, minuteBucket, monthBucket } from "@/lib/limits/quota";
import { limitedAddress } from "@/lib/http/client-address";
import { newId } from "@/lib/service/identifier";
import { Refusal } from "@/lib/service/refusal";
import type { Service } from "@/lib/service/service";

/** One call on its way through the dispatcher: who makes it, and what it has spent so far. */
export class Call {
  readonly requestId = newId("req");
  readonly started = performance.now();
  readonly now: number;
  readonly url: URL;
  readonly address: string;
  principal: Principal | undefined;
  private minute: BucketState | undefined;
  private month: BucketState | undefined;
  private reserved = 0;

  constructor(
    readonly request: Request,
    readonly service: Service,
  ) {
    this.now = service.now();
    this.url = new URL(request.url);
    this.address = service.addresses.clientAddress(request.headers);
  }

  get headers(): Headers {
    return this.request.headers;
  }

  /** Finds out who calls and spends one request of the caller's minute. Refuses credentials that do not count, and too many calls. */
  async admit(): Promise<Principal> {
    const { service, address, url, headers } = this;
    try {
      this.principal = await authenticate(service, { headers, url, address });
    } catch (error) {
      // Refused credentials count against the address, like calls without any.
      if (error instanceof Refusal) await this.spendMinute(this.addressBucket());
      throw error;
    }
    const { principal } = this;
    await this.spendMinute(
      principal.kind === "anonymous"
        ? this.addressBucket()
        : minuteBucket(minuteSubject(principal), principal.minuteQuota),
    );
    return principal;
  }

  private addressBucket(): Bucket {
    return addressBucket(this.address, this.service.config.addressMinuteQuota);
  }

  private async spendMinute(bucket: Bucket): Promise<void> {
    const spending = await this.service.limiter.spend(bucket);
    this.minute = spending;
    if (!spending.allowed) throw refused("too-many-requests", spending);
  }

  private monthBucket(): Bucket | undefined {
    const { principal } = this;
    if (!principal || principal.kind === "anonymous") return undefined;
    return monthBucket(subjectOf(principal), principal.monthQuota, this.now);
  }

  /** Reserves computations of the month. Refuses, before any work, if fewer are left. */
  async reserve(computations: number): Promise<void> {
    const bucket = this.monthBucket();
    if (!bucket || computations === 0) return;
    const spending = await this.service.limiter.spend(bucket, computations);
    this.month = spending;
    if (!spending.allowed) throw refused("quota-exhausted", spending, computations);
    this.reserved += computations;
  }

  /** Gives back what was reserved beyond the computations that were made. */
  async settle(computations: number): Promise<void> {
    const bucket = this.monthBucket();
    const rest = this.reserved - computations;
    this.reserved = 0;
    if (bucket && rest > 0) this.month = await this.service.limiter.giveBack(bucket, rest);
  }

  /** The counters as the answer's headers show them. */
  async limits(): Promise<BucketState[]> {
    const bucket = this.monthBucket();
    if (bucket) this.month ??= await this.service.limiter.look(bucket);
    this.minute ??= await this.service.limiter.look(this.addressBucket());
    return this.month ? [this.minute, this.month] : [this.minute];
  }
}

/** Whom a caller's counters belong to. */
export function subjectOf(principal: Exclude<Principal, { kind: "anonymous" }>): string {
  if (principal.kind === "embed") return embedSubject(principal.id);
  return principal.kind === "key" ? `key:${principal.id}` : `address:${limitedAddress(principal.address)}`;
}

/** One visitor of a widget does not use up the minute of all others. */
function minuteSubject(principal: Exclude<Principal, { kind: "anonymous" }>): string {
  const subject = subjectOf(principal);
  return principal.kind === "embed" ? `${subject}:${limitedAddress(principal.address)}` : subject;
}

/** The counters of a caller without spending, for the usage report. */
export function bucketsOf(
  principal: Exclude<Principal, { kind: "anonymous" }>,
  now: number,
): { minute: Bucket; month: Bucket } {
  return {
    minute: minuteBucket(minuteSubject(principal), principal.minuteQuota),
    month: monthBucket(subjectOf(principal), principal.monthQuota, now),
  };
}

function refused(code: "too-many-requests" | "quota-exhausted", spending: Spending, wanted = 1): Refusal {
  const { bucket, remaining, resetSeconds } = spending;
  const ends = new Date(bucket.endsAt ?? Date.now() + resetSeconds * 1000).toISOString().replace(".000", "");
  const detail =
    code === "too-many-requests"
      ? `The ${bucket.quota} requests of this minute are used up; the next window starts in ${resetSeconds} s.`
      : `The call needs ${counted(wanted)}; ${remaining === 0 ? "none" : remaining} of this month's ${bucket.quota} ${remaining === 1 ? "is" : "are"} left until the quota starts anew at ${ends}.`;
  return new Refusal(code, detail, { headers: { "Retry-After": String(resetSeconds) } });
}

function counted(computations: number): string {
  return `${computations} ${computations === 1 ? "computation" : "computations"}`;
}
