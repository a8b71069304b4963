import { z } from "zod";
import { keySettings } from "@/lib/auth/key-settings";
import { SCOPE_NAMES } from "@/lib/auth/scope";

const time = (description: string) => z.iso.datetime().meta({ description });

const members = {
  id: z.string(),
  name: z.string(),
  team: z.string().meta({ description: "Short name of the team that owns it." }),
  scopes: z.array(z.enum(SCOPE_NAMES)),
  quotas: z.object({
    minute: z.int().meta({ description: "Requests a minute." }),
    month: z.int().meta({ description: "Computations a calendar month (UTC)." }),
  }),
  origins: z.array(z.string()).meta({ description: "Origins of browser pages that may call with it." }),
  allowedInUrl: z.boolean().meta({ description: "Whether it may come as `?key=`." }),
  state: z.enum(["active", "expired", "revoked"]),
  createdAt: time("When it was issued."),
  createdBy: z.string().meta({ description: "Who issued it." }),
  expiresAt: time("When it ends.").nullable(),
  revokedAt: time("When it was revoked.").nullable(),
  lastUsedAt: time("Its last call.").nullable(),
  lastClient: z.string().nullable().meta({ description: "Kind of client of its last call." }),
};

export const keySchema = z
  .object(members)
  .meta({ id: "Key", description: "A key of the team, without its secret." });

export const shownKeySchema = z
  .object({
    ...members,
    key: z
      .string()
      .optional()
      .meta({ description: "The whole key, shown this once; absent when an idempotent call is repeated." }),
  })
  .meta({ id: "IssuedKey", description: "A key that has just been issued." });

export const rotatedKeySchema = z
  .object({
    ...members,
    key: z
      .string()
      .optional()
      .meta({ description: "The key with its new secret, shown this once; absent when a call is repeated." }),
    previousUntil: time("When the secret before ends."),
  })
  .meta({ id: "RotatedKey", description: "A key with a new secret." });

export const newKeySchema = keySettings.meta({ id: "NewKey", description: "A key to issue." });

export const rotationSchema = z
  .strictObject({
    overlap: z
      .string()
      .max(20)
      .optional()
      .meta({
        description:
          "How long the secret before still counts: `30m`, `12h`, `7d`, at most `90d`; not at all where left out.",
        examples: ["7d"],
      }),
  })
  .meta({ id: "Rotation", description: "How to rotate." });
