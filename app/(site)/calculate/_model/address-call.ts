/** The same calculation as one address, for spreadsheets and links; what the API's query form cannot say is refused. */
import type { ShapeEntry } from "@/lib/engine";
import {
  compactValue,
  mediumKind,
  mediumPrefixes,
  orderedPairs,
  type Parameters,
  queryText,
} from "./parameters";
import { SIZING_NAMES, tolerancedName, toleranceText } from "./tolerances";

export type AddressCall =
  | { readonly ok: true; readonly address: string; readonly formula: string }
  | { readonly ok: false; readonly reason: string };

/** Excel takes no longer text inside a formula. */
const LONGEST_LITERAL = 240;

/**
 * @param origin Where the API is reached.
 * @returns An address that ends in `key=`, and a formula that takes the key from cell B1.
 */
export function addressCall(origin: string, entry: ShapeEntry, parameters: Parameters): AddressCall {
  const reason = refusal(entry, parameters);
  if (reason) return { ok: false, reason };
  const pairs = orderedPairs(parameters, entry)
    .filter(([name, value]) => value.trim() !== "" && name === tolerancedName(name))
    .filter(([name]) => !SIZING_NAMES.includes(name))
    .map(
      ([name, value]) => [name, compactValue(name, value.trim()) + toleranceOf(parameters, name)] as const,
    );
  const query = queryText([...pairs, ["format", "text"]]);
  const address = `${origin}/api/v1/resistance/${entry.id}?${query}&key=`;
  return { ok: true, address, formula: `=NUMBERVALUE(WEBSERVICE(${literals(address)}&$B$1),".")` };
}

function toleranceOf(parameters: Parameters, name: string): string {
  const tolerance = toleranceText(parameters[`${name}.tolerance`] ?? "", parameters[name]);
  return tolerance === "" ? "" : `±${compactValue(name, tolerance)}`;
}

function refusal(entry: ShapeEntry, parameters: Parameters): string | null {
  if (mediumPrefixes(entry).some((prefix) => mediumKind(parameters, prefix) === "graded")) {
    return "A graded medium does not fit an address: use one of the other forms.";
  }
  const beyond = Object.keys(parameters).some(
    (name) => /(?:temperatureCoefficient|referenceTemperature)$/.test(name) && parameters[name].trim() !== "",
  );
  if (beyond) return "A temperature coefficient does not fit an address: use one of the other forms.";
  const shaped = Object.keys(parameters).some((name) => {
    const own = parameters[name];
    return name.endsWith(".distribution") && own !== "uniform" && own !== "";
  });
  if (shaped) return "Only tolerances without a distribution fit an address: use one of the other forms.";
  if (
    Object.keys(parameters).some((name) => /\.(?:plus|minus)$/.test(name) && parameters[name].trim() !== "")
  ) {
    return "Plus and minus apart do not fit an address: use one of the other forms.";
  }
  if (parameters.min?.trim() || parameters.max?.trim()) {
    return "A requirement does not fit an address, which answers a bare number: use one of the other forms.";
  }
  return null;
}

function literals(text: string): string {
  const parts = text.match(new RegExp(`.{1,${LONGEST_LITERAL}}`, "gs")) ?? [];
  return parts.map((part) => `"${part.replaceAll('"', '""')}"`).join("&");
}
