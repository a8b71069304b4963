import "server-only";
import { computeNetwork, libraryMaterial } from "@/lib/engine";
import { networkBody, type ShapeRequest } from "../_model/body";
import { START } from "../_model/network";
import type { FirstSolution } from "../_network/use-solution";
import { shapeRequest } from "./shape-request";

/** The example, solved: the page shows an answer before its first call. */
export function firstSolution(): FirstSolution {
  const requests: [string, ShapeRequest][] = START.elements.flatMap(({ value }) => {
    if (value.kind !== "shape") return [];
    const [shape, query = ""] = value.address.split("?", 2);
    const found = shapeRequest(shape, new URLSearchParams(query));
    return found ? [[value.address, found] as [string, ShapeRequest]] : [];
  });
  const body = networkBody(START, new Map(requests));
  return {
    text: JSON.stringify(body),
    result: computeNetwork(body, { material: libraryMaterial }),
    requests,
  };
}
