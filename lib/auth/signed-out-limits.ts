import { z } from "zod";
import type { Database } from "@/db/client";
import { readSetting } from "@/db/queries/settings";

/** Name of the setting by which administrators change the limit of signed-out pages. */
export const SIGNED_OUT_SETTING = "signed-out-limit";

export const signedOutSetting = z.strictObject({
  minuteQuota: z.int().min(0).max(10_000),
  monthQuota: z.int().min(0).max(10_000_000),
});

/** Enough for a person at one address who tries things out; nothing for a program. */
const DEFAULT = { minuteQuota: 60, monthQuota: 3_000 };

/** Requests a minute and computations a month that an address has without signing in. */
export function signedOutLimits(db: Database): { minuteQuota: number; monthQuota: number } {
  const set = signedOutSetting.safeParse(readSetting(db, SIGNED_OUT_SETTING));
  return set.success ? set.data : DEFAULT;
}
