"use client";

import { useRef } from "react";
import type { Parameters } from "../../_model/parameters";
import { firstValue, levelProfile, type ProfileValues, START_VALUES } from "../../_model/profile-starts";
import { useForm } from "../form-context";
import type { Patch } from "../use-page-state";

/**
 * Changes the law of the profile whose parameters begin with `name`. A law chosen again has its former numbers; a new
 * one starts level, at the first value of the law before, so that the answer does not jump for no reason.
 */
export function useProfileSwitch(
  name: string,
  prefix: string,
  values: ProfileValues,
): { readonly switchKind: (kind: string) => void; readonly forget: () => void } {
  const { parameters, change, materials, ranges } = useForm();
  const remembered = useRef(new Map<string, Parameters>());
  const level = useRef("");

  function switchKind(kind: string) {
    const before = parameters[name] ?? "constant";
    if (kind === before) return;
    const own = ownParameters(name, parameters);
    remembered.current.set(before, own);
    level.current = firstValue(name, own) || level.current || START_VALUES[values];
    const cleared: Patch = Object.fromEntries(Object.keys(own).map((key) => [key, undefined]));
    const start = remembered.current.get(kind) ?? {
      [name]: kind,
      ...levelProfile(name, kind, {
        value: level.current,
        material: parameters[`${prefix}profile.material`] ?? materials[0]?.id ?? "",
        temperature: parameters.temperature ?? "20 degC",
        span: ranges[parameters[`${prefix}graded`]],
      }),
    };
    change({ ...cleared, ...start });
  }

  /** For a quantity or a coordinate of another kind, whose numbers are none of this one's. */
  function forget() {
    remembered.current.clear();
    level.current = "";
  }

  return { switchKind, forget };
}

/** What a profile is made of: its kind and everything below it. */
export function ownParameters(name: string, parameters: Parameters): Parameters {
  return Object.fromEntries(
    Object.entries(parameters).filter(([key]) => key === name || key.startsWith(`${name}.`)),
  );
}
