import { z } from "zod";
import { LONGEST_OVERLAP_MS, parseDuration } from "@/lib/auth/duration";
import { rotateKey } from "@/lib/auth/manage-keys";
import { Refusal } from "@/lib/service/refusal";
import { consoleRoute } from "../../../_server/console-route";
import { ownKey } from "../../../_server/own-key";

/** Gives a key a new secret; the one before counts until the overlap is over. */
export const POST = consoleRoute({
  action: "keys.manage",
  body: z.strictObject({ overlap: z.string().max(10) }),
  handle: (call) => {
    const { id } = ownKey(call);
    const overlapMs = parseDuration(call.body.overlap);
    if (overlapMs === undefined || overlapMs > LONGEST_OVERLAP_MS) {
      const detail = 'must be a duration such as "12h" or "7d", at most "90d", or "0".';
      throw new Refusal("invalid-input", `#/overlap ${detail}`, {
        errors: [{ pointer: "#/overlap", detail }],
      });
    }
    const { view, text, previousUntil } = rotateKey(call.db, {
      id,
      actor: call.actor,
      now: call.now,
      overlapMs,
    });
    return { ...view, key: text, previousUntil };
  },
});
