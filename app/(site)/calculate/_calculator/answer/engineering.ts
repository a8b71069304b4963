import { axisUnit, readOff } from "../../../../_ui/plot/axis";

/** A number of the answer with an engineering prefix and four digits: "2.358 A". */
export function engineering(value: number, unit: string): string {
  const { factor, label } = axisUnit([value], unit);
  return `${readOff(value * factor)}\u2009${label}`;
}
