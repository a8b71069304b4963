/**
 * Replays all records of the team, for a nightly run; the exit code is 1 if one drifted by more than the first argument
 * (relative, 1e-12 where left out). The key needs the scopes compute and records:read, and field where records of field
 * solutions are among them.
 */
import { hasEnded, listRecords, readField, replayRecord, rhoform } from "@rhoform/client";

const largest = Number(process.argv[2] ?? 1e-12);
const client = rhoform({
  baseUrl: process.env.RHOFORM_URL ?? "http://127.0.0.1:3000",
  key: process.env.RHOFORM_KEY,
});

async function driftOf(id: string): Promise<number | undefined> {
  let answer = await replayRecord({ client, path: { id } });
  // A field solution is replayed as a job.
  while ("status" in answer) {
    if (hasEnded(answer)) return answer.replay?.drift ?? undefined;
    await new Promise((resolve) => setTimeout(resolve, 500));
    answer = await readField({ client, path: { id: answer.id } });
  }
  return answer.drift;
}

let replayed = 0;
let drifted = 0;
for (let cursor: string | undefined, more = true; more;) {
  const page = await listRecords({ client, query: { limit: 100, cursor } });
  for (const { id, label } of page.items) {
    const drift = await driftOf(id);
    replayed += 1;
    if (drift !== undefined && Math.abs(drift) <= largest) continue;
    drifted += 1;
    console.log(`${label} (${id}): ${drift}`);
  }
  cursor = page.next ?? undefined;
  more = cursor !== undefined;
}
console.log(`${replayed} replayed, ${drifted} beyond a drift of ${largest}`);
process.exitCode = drifted > 0 ? 1 : 0;
