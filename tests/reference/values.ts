/** The reference values computed outside of the project: 50-digit arithmetic, each agreed by a second route. */
import values from "../fixtures/values.json";

export interface ReferenceValue {
  readonly id: string;
  readonly statement: string;
  readonly inputs: Readonly<Record<string, number | readonly number[]>>;
  readonly value: string;
  readonly exactness: string;
  readonly condition?: number | null;
}

const byId = new Map((values as unknown as readonly ReferenceValue[]).map((entry) => [entry.id, entry]));

/** The entry of that id, with its plain numbers and its lists apart. */
export function reference(id: string): {
  readonly value: number;
  readonly n: Readonly<Record<string, number>>;
  readonly lists: Readonly<Record<string, readonly number[]>>;
  /** What rounding of the inputs and of a few operations may do to the result in doubles. */
  readonly tolerance: number;
} {
  const entry = byId.get(id);
  if (!entry) throw new Error(`there is no reference value ${id}`);
  const n: Record<string, number> = {};
  const lists: Record<string, readonly number[]> = {};
  for (const [name, input] of Object.entries(entry.inputs)) {
    if (typeof input === "number") n[name] = input;
    else lists[name] = input;
  }
  return { value: Number(entry.value), n, lists, tolerance: (entry.condition ?? 4) * 1.2e-16 + 4e-16 };
}
