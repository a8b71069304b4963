import { readTyped } from "../../../_ui/quantity/read-typed";
import type { Network } from "./network";
import { givenResistance, uncertaintyMember } from "./tolerance";

/** What an address of a calculation page asks for, as the service read it. */
export interface ShapeRequest {
  readonly title: string;
  readonly request: Readonly<Record<string, unknown>>;
}

/** The body of `POST /networks`; null while a shape's request is still on its way. */
export function networkBody(
  network: Network,
  requests: ReadonlyMap<string, ShapeRequest>,
): Readonly<Record<string, unknown>> | null {
  const { elements, ports, drive, temperature, requirement } = network;
  const list = elements.map(({ name, from, to, value }) => {
    const ends = { name: name.trim(), between: [from.trim(), to.trim()] };
    if (value.kind === "resistance") {
      return { ...ends, resistance: givenResistance(spelled(value.text), value.tolerance) };
    }
    if (value.kind === "request") return { ...ends, request: value.request };
    const known = requests.get(value.address);
    return known && { ...ends, request: known.request };
  });
  if (list.some((element) => element === undefined)) return null;
  const operating = {
    ...(temperature.trim() === "" ? {} : { temperature: spelled(temperature) }),
    ...(drive.kind === "none" || drive.text.trim() === "" ? {} : { [drive.kind]: spelled(drive.text) }),
  };
  const limits = Object.entries(requirement).flatMap(([name, text]) =>
    text.trim() === "" ? [] : [[name, spelled(text)]],
  );
  return {
    elements: list,
    ports: ports.map((name) => name.trim()),
    ...(Object.keys(operating).length > 0 ? { operating } : {}),
    ...(limits.length > 0 ? { requirement: Object.fromEntries(limits) } : {}),
    ...uncertaintyMember(network),
  };
}

/** As the API spells it: "0,5 mohm" of a reader who writes decimal commas is "0.5 mohm". */
function spelled(text: string): string {
  const typed = readTyped(text, false);
  if (typed.kind !== "quantity") return text.trim();
  return typed.unit === "" ? typed.number : `${typed.number} ${typed.unit}`;
}
