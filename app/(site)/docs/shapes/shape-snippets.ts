import { exampleRequest, shapeEntry, type Shape } from "@/lib/engine";
import { addressCall } from "../../calculate/_model/address-call";
import { exampleParameters } from "../../calculate/_model/parameters";
import { clientSnippets } from "../../_live/client-snippets";
import type { DocSnippet } from "../_content/page";

/** A shape's example in every language; a spreadsheet's formula where an address can say it. */
export function shapeSnippets(origin: string, shape: Shape): readonly DocSnippet[] {
  const entry = shapeEntry(shape);
  const [curl, typescript, python] = clientSnippets(origin, {
    operation: "computeResistance",
    method: "POST",
    path: "/resistance",
    body: exampleRequest(shape),
    typescript: ["console.log(answer.resistance.text, answer.resistance.lower, answer.resistance.upper);"],
    python: ["print(answer.resistance.text, answer.resistance.lower, answer.resistance.upper)"],
  });
  const address = addressCall(origin, entry, exampleParameters(entry));
  return [
    { language: "sh", label: curl.label, code: curl.code },
    { language: "ts", label: typescript.label, code: typescript.code },
    { language: "python", label: python.label, code: python.code },
    ...(address.ok
      ? [{ language: "text" as const, label: "Spreadsheet", code: address.formula, shownOnly: true as const }]
      : []),
  ];
}
