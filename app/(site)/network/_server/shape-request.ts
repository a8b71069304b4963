import "server-only";
import { findShape, shapeEntry } from "@/lib/engine";
import { exampleParameters } from "../../calculate/_model/parameters";
import { requestBody } from "../../calculate/_model/request";
import { readState } from "../../calculate/_model/variants";
import type { ShapeRequest } from "../_model/body";

/** Members of a single calculation that an element of a network does not take. */
const OWN = ["include", "record", "requirement", "uncertainty"];
const DRIVES = ["voltage", "current", "power"];

/** What the address of a calculation page asks for; null where its shape does not exist. */
export function shapeRequest(id: string, query: URLSearchParams): ShapeRequest | null {
  const shape = findShape(id);
  if (!shape) return null;
  const entry = shapeEntry(shape);
  const { variants, active } = readState([...query], entry, exampleParameters(entry));
  const body: Record<string, unknown> = { ...requestBody(entry, variants[active]) };
  for (const name of OWN) delete body[name];
  const { operating } = body;
  if (typeof operating === "object" && operating !== null) {
    const kept = Object.entries(operating).filter(([name]) => !DRIVES.includes(name));
    if (kept.length > 0) body.operating = Object.fromEntries(kept);
    else delete body.operating;
  }
  return { title: entry.title, request: body };
}
