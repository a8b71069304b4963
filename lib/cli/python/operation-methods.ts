import { type AnswerClasses, type Schema } from "./answer-classes";
import { docstring, literal, snakeCase } from "./names";

export interface DocumentedParameter {
  readonly $ref?: string;
  readonly name: string;
  readonly in: "path" | "query" | "header";
  readonly required?: boolean;
  readonly schema: Schema;
}

interface Content {
  readonly content?: Readonly<Record<string, { readonly schema: Schema }>>;
}

export interface DocumentedOperation {
  readonly operationId: string;
  readonly summary: string;
  readonly parameters?: readonly DocumentedParameter[];
  readonly requestBody?: Content;
  readonly responses: Readonly<Record<string, Content>>;
}

/** A repeat with the same Idempotency-Key answers these without the secret: the caller decides. */
const SECRET = new Set(["issueKey", "rotateKey"]);

/** A POST that stores nothing and may take as long as the service gives a batch. */
const BATCH = "computeBatch";

/** One method an operation; none for what streams without an end. */
export function operationMethods(
  operations: readonly (readonly [method: string, path: string, operation: DocumentedOperation])[],
  classes: AnswerClasses,
): string {
  const methods: string[] = [];
  const table: string[] = [];
  for (const [method, path, operation] of operations) {
    const good = Object.entries(operation.responses).filter(([status]) => status.startsWith("2"));
    if (good.some(([, { content }]) => content?.["text/event-stream"])) continue;
    const repeats =
      operation.parameters?.some(({ name }) => name === "Idempotency-Key") &&
      !SECRET.has(operation.operationId);
    table.push(
      `    ${literal(operation.operationId)}: (${literal(method)}, ${literal(path)}, ${repeats ? "True" : "False"}),`,
    );
    methods.push(methodText(method, path, operation, good, classes));
  }
  return [
    "class _Operations(_Transport):",
    '    """The API\'s operations, one method each."""',
    "",
    methods.join("\n"),
    "",
    "_OPERATIONS: Dict[str, Tuple[str, str, bool]] = {",
    ...table,
    "}",
    "",
  ].join("\n");
}

function methodText(
  method: string,
  path: string,
  operation: DocumentedOperation,
  good: readonly (readonly [string, Content])[],
  classes: AnswerClasses,
): string {
  const { operationId, summary, parameters = [], requestBody } = operation;
  const inPath = parameters.filter((parameter) => parameter.in === "path");
  const inQuery = parameters.filter((parameter) => parameter.in === "query");
  const inHeader = parameters.filter((parameter) => parameter.in === "header");
  const keyed = inHeader.some(({ name }) => name === "Idempotency-Key");
  const waits = good.some(([status]) => status === "202");
  const bodies = Object.keys(requestBody?.content ?? {});
  const table = bodies.find((type) => type === "text/csv");
  const free = path === "/resistance/{shape}";
  const positional = [
    ...inPath.map(({ name }) => `${snakeCase(name)}: str`),
    ...(bodies.length > 0 ? [`body: ${table ? "Union[Mapping[str, Any], str, Any]" : "Any"}`] : []),
  ];
  const keyword = [
    ...inQuery.map(({ name, required }) => `${snakeCase(name)}: Any${required ? "" : " = None"}`),
    ...inHeader
      .filter(({ name }) => name !== "Prefer")
      .map(({ name, required }) => `${snakeCase(name)}: ${required ? "str" : "Optional[str] = None"}`),
    ...(waits ? ["wait: Optional[int] = None"] : []),
  ].sort((a, b) => Number(a.includes("= None")) - Number(b.includes("= None")));
  const reading = readingOf(operationId, good, classes);
  const signature = ["self", ...positional, ...(keyword.length > 0 ? ["*", ...keyword] : [])].join(", ");
  const rest = free ? ", **dimensions: Any" : "";
  const headers: string[] = [];
  if (keyed) {
    const own = SECRET.has(operationId) ? "" : " or _new_idempotency_key()";
    headers.push(`"Idempotency-Key": idempotency_key${own}`);
  }
  if (inHeader.some(({ name }) => name === "If-Match")) headers.push('"If-Match": if_match');
  if (waits) headers.push('"Prefer": None if wait is None else f"wait={wait}"');
  if (table) headers.push('"Content-Type": "text/csv" if isinstance(body, str) else "application/json"');
  const query = inQuery.map(({ name }) => `${literal(name)}: ${snakeCase(name)}`);
  if (free) query.push("**{_api_name(name): value for name, value in dimensions.items()}");
  const url = path.replace(
    /\{(\w+)\}/g,
    (_whole, name: string) => `{urllib.parse.quote(${snakeCase(name)}, safe='')}`,
  );
  const call = [
    literal(method),
    url === path ? literal(path) : `f${literal(url)}`,
    ...(query.length > 0 ? [`query={${query.join(", ")}}`] : []),
    ...(bodies.length > 0 ? ["body=body"] : []),
    ...(headers.length > 0 ? [`headers={${headers.join(", ")}}`] : []),
    // A longest wait beyond what the service itself may wait for.
    ...(waits ? ["timeout=None if wait is None else max(self._timeout, wait + 15.0)"] : []),
    ...(operationId === BATCH ? ["timeout=_BATCH_SECONDS", "repeatable=True"] : []),
  ].join(", ");
  const read =
    reading.spec === "None"
      ? `return self.call(${call})`
      : `return _read(${reading.spec}, self.call(${call}))`;
  return [
    `    def ${snakeCase(operationId)}(${signature}${rest}) -> ${reading.annotation}:`,
    docstring(`${summary}: \`\`${method} ${path}\`\`.`, "        ") + `        ${read}`,
    "",
  ].join("\n");
}

/** Answers that differ by status or media type are told apart by what they hold. */
function readingOf(id: string, good: readonly (readonly [string, Content])[], classes: AnswerClasses) {
  const contents = good.flatMap(([, { content }]) => Object.entries(content ?? {}));
  if (contents.length === 0) return { annotation: "None", spec: "None" };
  const json = contents.filter(([type]) => type === "application/json");
  const schemas = [...new Map(json.map(([, { schema }]) => [JSON.stringify(schema), schema])).values()];
  if (schemas.length === 0) return { annotation: "str", spec: "None" };
  const flat = schemas.flatMap((schema) => schema.anyOf ?? [schema]);
  const choice = [...new Map(flat.map((schema) => [JSON.stringify(schema), schema])).values()];
  const name = id.charAt(0).toUpperCase() + id.slice(1);
  const reading = classes.reading(choice.length === 1 ? choice[0] : { anyOf: choice }, `${name}Answer`);
  const text = contents.some(([type]) => type !== "application/json");
  return { ...reading, annotation: text ? `Union[${reading.annotation}, str]` : reading.annotation };
}
