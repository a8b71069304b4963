"use client";

import { useRef } from "react";
import { mediumKind, type MediumKind, ofMedium, type Parameters } from "../_model/parameters";
import { START_VALUES } from "../_model/profile-starts";
import { baseValue, neatText } from "../_model/value-texts";
import { useForm } from "./form-context";
import type { Patch } from "./use-page-state";

/**
 * Changes how a medium is given. What was typed for the other ways is kept, and a way used for the first time starts
 * from the same resistivity, so that the answer does not jump.
 */
export function useMediumSwitch(prefix: string): (kind: MediumKind) => void {
  const { entry, parameters, materials, change, ranges } = useForm();
  const remembered = useRef(new Map<MediumKind, Parameters>());

  return (kind) => {
    const before = mediumKind(parameters, prefix);
    if (before === kind) return;
    const own = Object.fromEntries(
      Object.entries(parameters).filter(([name]) => ofMedium(name, prefix, entry)),
    );
    if (before) remembered.current.set(before, own);
    const cleared: Patch = Object.fromEntries(Object.keys(own).map((name) => [name, undefined]));
    // Only a sheet's medium has a thickness; it stays while the reader tries other materials.
    const thickness = own[`${prefix}thickness`];
    const kept: Patch =
      thickness !== undefined && kind !== "sheetResistance" && kind !== "graded"
        ? { [`${prefix}thickness`]: thickness }
        : {};
    const start = remembered.current.get(kind) ?? startOf(kind);
    change({ ...cleared, ...kept, ...start });
  };

  function startOf(kind: MediumKind): Parameters {
    const resistivity = resistivityNow();
    const inverse = resistivity === null ? null : 1 / resistivity;
    switch (kind) {
      case "material":
        return { [`${prefix}material`]: materials[0]?.id ?? "" };
      case "resistivity":
        return { [`${prefix}resistivity`]: neatText(resistivity, "resistivity", "ohm m") };
      case "conductivity":
        return { [`${prefix}conductivity`]: neatText(inverse, "conductivity", "S/m") };
      case "sheetResistance":
        return { [`${prefix}sheetResistance`]: neatText(sheetNow(resistivity), "sheetResistance", "ohm/sq") };
      case "graded": {
        const value = neatText(inverse, "conductivity", "S/m") || START_VALUES.conductivity;
        const coordinate = entry.media.gradable.find((name) => name in ranges) ?? entry.media.gradable[0];
        return {
          [`${prefix}graded`]: coordinate,
          [`${prefix}quantity`]: "conductivity",
          [`${prefix}profile`]: "linear",
          [`${prefix}profile.from`]: value,
          [`${prefix}profile.to`]: value,
        };
      }
    }
  }

  /** Resistivity of the medium as it is given now, ohm m; null where it cannot be told. */
  function resistivityNow(): number | null {
    const material = materials.find(({ id }) => id === parameters[`${prefix}material`]);
    if (material) return material.resistivityOhmM;
    const resistivity = baseValue(parameters[`${prefix}resistivity`], "resistivity", "ohm m");
    if (resistivity !== null) return resistivity;
    const conductivity = baseValue(parameters[`${prefix}conductivity`], "conductivity", "S/m");
    return conductivity === null ? null : 1 / conductivity;
  }

  function sheetNow(resistivity: number | null): number | null {
    const thickness = baseValue(parameters[`${prefix}thickness`], "length", "m");
    return resistivity === null || thickness === null ? null : resistivity / thickness;
  }
}
