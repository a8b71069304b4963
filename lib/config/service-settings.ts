import { z } from "zod";
import { transact, type Database } from "@/db/client";
import { readSetting, writeSetting } from "@/db/queries/settings";
import { type Actor, appendActivity } from "../activity/append";
import { SIGNED_OUT_SETTING, signedOutLimits, signedOutSetting } from "../auth/signed-out-limits";

const organisation = z.strictObject({ name: z.string().trim().min(1).max(100) });

const retention = z.strictObject({
  /** Single requests of the usage; their sums stay. */
  usageDays: z.int().min(7).max(3650),
  /** Mails that were sent or kept. */
  mailDays: z.int().min(1).max(365),
});

/** What administrators may change while the service runs. */
export const settingsChange = z.strictObject({
  organisation: organisation.optional(),
  retention: retention.optional(),
  signedOut: signedOutSetting.optional(),
});

export interface ServiceSettings {
  readonly organisation: z.infer<typeof organisation>;
  readonly retention: z.infer<typeof retention>;
  readonly signedOut: z.infer<typeof signedOutSetting>;
}

const USUAL_RETENTION = { usageDays: 400, mailDays: 30 };

const NAMES = {
  organisation: "organisation",
  retention: "retention",
  signedOut: SIGNED_OUT_SETTING,
} as const;

/** The settings as they are now, with what holds where nothing was set. */
export function readSettings(db: Database): ServiceSettings {
  const named = organisation.safeParse(readSetting(db, NAMES.organisation));
  const kept = retention.safeParse(readSetting(db, NAMES.retention));
  return {
    organisation: named.success ? named.data : { name: "" },
    retention: kept.success ? kept.data : USUAL_RETENTION,
    signedOut: signedOutLimits(db),
  };
}

/** Changes settings and records it. */
export function changeSettings(
  db: Database,
  change: z.infer<typeof settingsChange>,
  actor: Actor,
  now: number,
): ServiceSettings {
  return transact(db, () => {
    const before = readSettings(db);
    for (const name of ["organisation", "retention", "signedOut"] as const) {
      const value = change[name];
      if (value === undefined || JSON.stringify(value) === JSON.stringify(before[name])) continue;
      writeSetting(db, NAMES[name], value, now);
      appendActivity(
        db,
        actor,
        {
          action: "settings.change",
          teamId: null,
          subject: { kind: "setting", id: NAMES[name] },
          before: before[name],
          after: value,
        },
        now,
      );
    }
    return readSettings(db);
  });
}
