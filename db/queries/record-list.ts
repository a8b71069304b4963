import { and, asc, eq, gte, inArray, like, lt, or, type SQL, sql } from "drizzle-orm";
import type { Database } from "../client";
import { teams } from "../schema/organisation";
import { recordMaterials, records } from "../schema/records";
import type { Page } from "./usage-sums";

/** A record without its request and result: what lists show. */
export interface ListedRecord {
  readonly id: string;
  readonly teamId: string;
  readonly teamName: string;
  readonly operation: string;
  readonly label: string;
  readonly shape: string | null;
  readonly createdAt: number;
  readonly byName: string;
  readonly engine: string;
  /** Text of the resistance, where the result has one. */
  readonly resistance: string | null;
}

interface RecordListFilter extends Page {
  readonly teamIds: readonly string[];
  /** Part of the label, the id or the name of who stored it. */
  readonly search: string;
  readonly operation?: string;
  readonly shape?: string;
  readonly materialId?: string;
  /** Unix ms, the end not included. */
  readonly from?: number;
  readonly to?: number;
}

const ORDERS: Readonly<Record<string, SQL>> = {
  label: sql`${records.label} collate nocase`,
  operation: sql`${records.operation}`,
  shape: sql`coalesce(${records.shape}, '')`,
  team: sql`${teams.slug}`,
  createdAt: sql`${records.createdAt}`,
  by: sql`${records.byName} collate nocase`,
};

/** Records of some teams, a page of them. */
export function pageOfRecords(
  db: Database,
  filter: RecordListFilter,
): { rows: ListedRecord[]; total: number } {
  const { teamIds, search, operation, shape, materialId, from, to, order, limit, offset } = filter;
  const pattern = `%${search.replace(/[\\%_]/g, "\\$&")}%`;
  const where = and(
    inArray(records.teamId, [...teamIds]),
    operation === undefined ? undefined : eq(records.operation, operation),
    shape === undefined ? undefined : eq(records.shape, shape),
    from === undefined ? undefined : gte(records.createdAt, from),
    to === undefined ? undefined : lt(records.createdAt, to),
    materialId === undefined
      ? undefined
      : sql`${records.id} in (select ${recordMaterials.recordId} from ${recordMaterials} where ${recordMaterials.materialId} = ${materialId})`,
    search === ""
      ? undefined
      : or(
          sql`${like(records.label, pattern)} escape '\\'`,
          sql`${like(records.byName, pattern)} escape '\\'`,
          eq(records.id, search),
        ),
  );
  // Requests and results are long: they are read only of the rows shown.
  const page = db
    .select({ id: records.id, total: sql<number>`count(*) over ()`.as("total") })
    .from(records)
    .innerJoin(teams, eq(teams.id, records.teamId))
    .where(where)
    .orderBy(
      sql`${ORDERS[order.by] ?? ORDERS.createdAt} ${sql.raw(order.descending ? "desc" : "asc")}`,
      asc(records.id),
    )
    .limit(limit)
    .offset(offset)
    .all();
  if (page.length === 0) {
    // A page past the end has no row to tell the total.
    const total = offset > 0 ? pageOfRecords(db, { ...filter, limit: 1, offset: 0 }).total : 0;
    return { rows: [], total };
  }
  const rows = db
    .select({
      id: records.id,
      teamId: records.teamId,
      teamName: teams.name,
      operation: records.operation,
      label: records.label,
      shape: records.shape,
      createdAt: records.createdAt,
      byName: records.byName,
      engine: records.engine,
      resistance: sql<string | null>`json_extract(${records.result}, '$.resistance.text')`,
    })
    .from(records)
    .innerJoin(teams, eq(teams.id, records.teamId))
    .where(
      inArray(
        records.id,
        page.map(({ id }) => id),
      ),
    )
    .all();
  const byId = new Map(rows.map((row) => [row.id, row]));
  return {
    rows: page.map(({ id }) => byId.get(id)).filter((row) => row !== undefined),
    total: page[0].total,
  };
}

/** In how many records of some teams each of their materials stands, by material and version. */
export function usesOfMaterial(
  db: Database,
  materialId: string,
  teamIds: readonly string[],
): { version: number; records: number }[] {
  return db
    .select({ version: recordMaterials.version, records: sql<number>`count(*)` })
    .from(recordMaterials)
    .where(and(eq(recordMaterials.materialId, materialId), inArray(recordMaterials.teamId, [...teamIds])))
    .groupBy(recordMaterials.version)
    .orderBy(asc(recordMaterials.version))
    .all();
}
