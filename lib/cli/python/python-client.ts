import { readFileSync } from "node:fs";
import { join } from "node:path";
import { catalogue, shapeEntry } from "@/lib/engine";
import { AnswerClasses, type Schema } from "./answer-classes";
import { literal } from "./names";
import { type DocumentedOperation, type DocumentedParameter, operationMethods } from "./operation-methods";
import { shapeClasses, shapeClassName } from "./shape-classes";

const PARTS = "sdk/python/parts";

/** What is public beside the classes that are made. */
const PUBLIC = [
  "Client",
  "FieldJob",
  "Quantity",
  "RhoformError",
  "RhoformProblem",
  "RhoformStopped",
  "RhoformTimeout",
  "RhoformUnreachable",
  "main",
  "request_of",
  "to_dict",
];

interface Document {
  readonly info: { readonly version: string };
  readonly components: {
    readonly schemas: Readonly<Record<string, Schema>>;
    readonly parameters?: Readonly<Record<string, DocumentedParameter>>;
  };
  readonly paths: Readonly<Record<string, Readonly<Record<string, DocumentedOperation>>>>;
}

/**
 * The Python client as one module: the hand-written parts around classes and methods made from the document and the
 * catalogue.
 * @param json The OpenAPI document.
 */
export function pythonClient(json: string): string {
  const document: Document = JSON.parse(json);
  const { schemas, parameters = {} } = document.components;
  const classes = new AnswerClasses(schemas);
  const operations = Object.entries(document.paths).flatMap(([path, methods]) =>
    Object.entries(methods).map(([method, operation]) => {
      const resolved = operation.parameters?.map((parameter) =>
        parameter.$ref ? parameters[parameter.$ref.split("/").at(-1) ?? ""] : parameter,
      );
      return [method.toUpperCase(), path, { ...operation, parameters: resolved }] as const;
    }),
  );
  const methods = operationMethods(operations, classes);
  const entries = catalogue.map(shapeEntry);
  const made = [...classes.names(), ...entries.map(({ id }) => shapeClassName(id))];
  const twice = made.filter((name, index) => made.indexOf(name) !== index);
  if (twice.length > 0) throw new Error(`Two classes of the Python client are named ${twice.join(", ")}.`);
  const names = [...PUBLIC, ...made].sort().map((name) => `    ${literal(name)},`);
  return `${[
    part("head"),
    `\n__version__ = ${literal(document.info.version)}\n\n__all__ = [\n${names.join("\n")}\n]`,
    part("transport"),
    part("values"),
    shapeClasses(entries).trimEnd(),
    classes.source().trimEnd(),
    methods.trimEnd(),
    part("client"),
    part("command"),
  ].join("\n\n\n")}\n`;
}

function part(name: string): string {
  return readFileSync(join(PARTS, `${name}.py`), "utf8").trimEnd();
}
