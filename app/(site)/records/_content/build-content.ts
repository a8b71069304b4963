import type { RecordView } from "@/lib/records/records";
import type { Draw, Fact, RecordContent, Told } from "./content";
import { tellField } from "./of-field";
import { tellNetwork } from "./of-network";
import { type LookUp, tellResistance } from "./of-resistance";
import { tellSizing } from "./of-sizing";
import { recordCode } from "./record-code";
import { words } from "./typed";

interface Surroundings {
  /** Scheme, host and port under which people reach the service. */
  readonly origin: string;
  readonly team: string;
  readonly lookUp: LookUp;
  /** Draws the picture of a field solution, where it is kept. */
  readonly plot: Draw | null;
}

/** Everything that a record tells, whichever operation it is of. */
export function recordContent(
  record: RecordView,
  { origin, team, lookUp, plot }: Surroundings,
): RecordContent {
  const { id, label, operation, createdAt, by, engine, catalogue, request, result } = record;
  const code = recordCode(id);
  const told = tell(operation, request, result, lookUp, plot) ?? asStored(record);
  const versions: Fact[] = [
    { name: "Record", value: id },
    { name: "Operation", value: words(operation) },
    { name: "Engine", value: engine },
    { name: "Catalogue", value: catalogue },
    ...record.materials.map((material) => ({
      name: "Material",
      value: `${material.id}, version ${material.version}`,
    })),
  ];
  return {
    ...told,
    sections: [
      ...told.sections,
      { id: "versions", title: "Versions", blocks: [{ kind: "facts", facts: versions }] },
    ],
    id,
    code,
    address: `${origin}/records/${code}`,
    label,
    operation,
    team,
    storedAt: createdAt,
    by: by.name,
    engine,
    catalogue,
  };
}

function tell(
  operation: string,
  request: unknown,
  result: unknown,
  lookUp: LookUp,
  plot: Draw | null,
): Told | null {
  switch (operation) {
    case "resistance":
      return tellResistance(request, result, lookUp);
    case "sizing":
      return tellSizing(request, result, lookUp);
    case "network":
      return tellNetwork(request, result, lookUp);
    case "field":
      return tellField(request, result, lookUp, plot);
    default:
      return null;
  }
}

/** A record in a form that this page does not know: what was stored, as it is. */
function asStored({ operation, request, result }: RecordView): Told {
  return {
    subject: words(operation),
    headline: {
      title: "Stored calculation",
      text: "",
      bracket: null,
      statements: [
        "This record is in a form that this page does not lay out; what was stored follows as it is.",
      ],
      verdict: null,
    },
    picture: null,
    cautions: [],
    sections: [
      {
        id: "request",
        title: "Request",
        blocks: [{ kind: "code", label: "request", text: storedText(request) }],
      },
      {
        id: "result",
        title: "Result",
        blocks: [{ kind: "code", label: "result", text: storedText(result) }],
      },
    ],
  };
}

const MOST_CHARACTERS = 20_000;

function storedText(value: unknown): string {
  const text = JSON.stringify(value, null, 2);
  return text.length > MOST_CHARACTERS
    ? `${text.slice(0, MOST_CHARACTERS)}\n… (the API answers all of it)`
    : text;
}
