/**
 * A large installation for the bench of the console: 2,000 keys in 20 teams, 1,000,000 calls of the last sixty days with
 * the sums that `insertUsage` would have kept, 5,000 records. Drawn by a generator with a fixed seed; nothing is real.
 */
import type { Database } from "@/db/client";
import { latencyBucket } from "@/db/queries/usage";

export const CALLS = 1_000_000;
export const KEYS = 2_000;
const TEAMS = 20;
const DAYS = 60;
const RECORDS = 5_000;
const HOUR_MS = 3_600_000;
const DAY_MS = 24 * HOUR_MS;

const OPERATIONS = ["computeResistance", "readResistance", "solveField", "sizeDimension", "listMaterials"];
const SHAPES = ["bar", "round-wire", "cylindrical-shell", "sheet-strip", "earth-rod", ""];
const CLIENTS = ["python", "browser", "spreadsheet", "command-line"];

class Sums {
  private readonly rows = new Map<string, number[]>();

  add(key: readonly (string | number)[], values: readonly number[]): void {
    const name = key.join("\n");
    const row = this.rows.get(name);
    if (!row) this.rows.set(name, [...values]);
    else values.forEach((value, i) => (row[i] += value));
  }

  /** Writes every sum: the key's parts, then its values. */
  store(db: Database, table: string, columns: string): void {
    const places = columns
      .split(",")
      .map(() => "?")
      .join(",");
    const insert = db.$client.prepare(`insert into ${table} (${columns}) values (${places})`);
    for (const [name, values] of this.rows) insert.run(...name.split("\n"), ...values);
  }
}

/** Fills an empty, migrated database. `now` is Unix ms. Answers the busiest key and the ids of the teams. */
export function fillConsoleData(db: Database, now: number): { busiest: string; teamIds: string[] } {
  let state = 20_250_301;
  const random = () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return state / 4_294_967_296;
  };
  const pick = <Item>(from: readonly Item[]) => from[Math.floor(random() * from.length)];
  const { $client } = db;
  const teamIds = Array.from({ length: TEAMS }, (_, i) => `team_${i}`);
  const keyId = (i: number) => `k${String(i).padStart(15, "0")}`;
  const month = new Date(now).toISOString().slice(0, 7);
  const [hours, days, details, latencies, dayLatencies, clients] = Array.from(
    { length: 6 },
    () => new Sums(),
  );
  $client.transaction(() => {
    const team = $client.prepare("insert into teams (id, slug, name, created_at) values (?, ?, ?, 0)");
    teamIds.forEach((id, i) => team.run(id, `t${i}`, `Team ${i}`));
    const key = $client.prepare(
      `insert into keys (id, team_id, name, scopes, origins, allowed_in_url, minute_quota, month_quota, created_at, created_by, expires_at, last_used_at, last_client)
       values (?, ?, ?, '["compute"]', '[]', 0, 600, 100000, ?, 'Bench', ?, ?, 'python')`,
    );
    const spent = $client.prepare("insert into rate_limits (key, points, expire) values (?, ?, ?)");
    for (let i = 0; i < KEYS; i++) {
      const expires = i % 10 === 0 ? now + Math.floor(random() * 100) * DAY_MS : null;
      key.run(keyId(i), teamIds[i % TEAMS], `Key ${i}`, now - i * 1000, expires, now - i * 500);
      spent.run(`month:key:${keyId(i)}:${month}`, Math.floor(random() * 105_000), now + 40 * DAY_MS);
    }
    const event = $client.prepare(
      `insert into usage_events (at, request_id, key_id, team_id, operation, shape, status, latency_us, computations, client)
       values (?, ?, ?, ?, ?, ?, ?, ?, ?, ?)`,
    );
    for (let i = 0; i < CALLS; i++) {
      // In the order of time, as calls come; some keys call far more often than others.
      const at = Math.floor(now - DAYS * DAY_MS * (1 - i / CALLS));
      const number = Math.floor(KEYS * random() ** 3);
      const [id, teamId] = [keyId(number), teamIds[number % TEAMS]];
      const [operation, shape, client] = [pick(OPERATIONS), pick(SHAPES), pick(CLIENTS)];
      const draw = random();
      const status = draw < 0.001 ? 500 : draw < 0.05 ? 422 : 200;
      const latencyUs = Math.floor(1000 * Math.exp(3 * random() + 2 * random()));
      const computations = status === 200 ? 1 : 0;
      event.run(
        at,
        `req_${i}`,
        id,
        teamId,
        operation,
        shape || null,
        status,
        latencyUs,
        computations,
        client,
      );
      const [hour, day] = [Math.floor(at / HOUR_MS), Math.floor(at / DAY_MS)];
      const counters = [1, computations, Number(status >= 400), Number(status >= 500), latencyUs];
      hours.add([hour, id, teamId], counters);
      days.add([day, id, teamId], counters);
      details.add([day, teamId, operation, shape, status], [1, computations]);
      latencies.add([hour, teamId, latencyBucket(latencyUs)], [1]);
      dayLatencies.add([day, teamId, latencyBucket(latencyUs)], [1]);
      clients.add([day, id, teamId, client], [1, computations]);
    }
    const counters = "requests, computations, refused, failed, latency_us";
    hours.store(db, "usage_hours", `hour, key_id, team_id, ${counters}`);
    days.store(db, "usage_days", `day, key_id, team_id, ${counters}`);
    details.store(db, "usage_day_details", "day, team_id, operation, shape, status, requests, computations");
    latencies.store(db, "usage_hour_latencies", "hour, team_id, bucket, requests");
    dayLatencies.store(db, "usage_day_latencies", "day, team_id, bucket, requests");
    $client.exec("create temp table sums (day, key_id, team_id, client, requests, computations)");
    clients.store(db, "sums", "day, key_id, team_id, client, requests, computations");
    $client.exec(
      "insert into usage_day_clients select day, key_id, team_id, client, requests, computations, day * 86400000 from sums",
    );
    const record = $client.prepare(
      `insert into records (id, team_id, operation, label, shape, created_at, by_kind, by_id, by_name, request, result, materials, engine, catalogue)
       values (?, ?, 'resistance', ?, 'bar', ?, 'key', ?, 'Bench', '{}', ?, '[]', '1.0.0', '1')`,
    );
    const result = JSON.stringify({ resistance: { text: "1 Ω" }, padding: "x".repeat(20_000) });
    for (let i = 0; i < RECORDS; i++)
      record.run(`rec_${i}`, teamIds[i % TEAMS], `Record ${i}`, now - i * HOUR_MS, keyId(i % KEYS), result);
  })();
  return { busiest: keyId(0), teamIds };
}
