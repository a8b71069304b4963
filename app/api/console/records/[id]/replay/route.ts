import { replayResistance } from "@/lib/records/replay";
import { Refusal } from "@/lib/service/refusal";
import { consoleRoute } from "../../../_server/console-route";
import { ownRecord } from "../../../_server/own-record";

/** Computes a record of one resistance again and tells its drift; others are replayed on their own page. */
export const POST = consoleRoute({
  action: "records.manage",
  handle: (call) => {
    const row = ownRecord(call);
    if (row.operation !== "resistance") {
      const detail = "is for records of one resistance; replay this one on its page.";
      throw new Refusal("invalid-input", `This ${detail}`, { errors: [{ pointer: "#", detail }] });
    }
    const { now, drift, identical } = replayResistance(call.db, row);
    return { now: now.resistance.text, engine: now.engine, drift, identical };
  },
});
