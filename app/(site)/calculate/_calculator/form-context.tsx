"use client";

import { createContext, useContext } from "react";
import type { ShapeEntry } from "@/lib/engine";
import type { Parameters } from "../_model/parameters";
import type { CoordinateSpan } from "../_server/geometry";
import type { FormDimension, ProfileFacts } from "../_server/form-facts";
import type { MaterialChoice } from "../_server/material-choices";
import type { Patch } from "./use-page-state";

/** What any group of fields needs. */
export interface PlainForm {
  readonly parameters: Parameters;
  readonly change: (patch: Patch) => void;
  /** Complaint about a parameter, or about a place inside it ("profile.layers/2/value"). */
  readonly errorAt: (name: string) => string | undefined;
  /** Whether quantities take tolerances here. */
  readonly tolerances?: boolean;
}

/** What the fields of a medium need. */
export interface MediumForm extends PlainForm {
  readonly materials: readonly MaterialChoice[];
}

/** What the fields of a page share. */
export interface FormState extends MediumForm {
  readonly entry: ShapeEntry;
  readonly dimensions: readonly FormDimension[];
  readonly profiles: readonly ProfileFacts[];
  /** Derived values of all dimensions, in their entries' units. */
  readonly values: Readonly<Record<string, number>>;
  readonly ranges: Readonly<Record<string, CoordinateSpan>>;
  /** Told which dimension's field has focus. */
  readonly onFocus: (line: string | undefined) => void;
}

const Context = createContext<FormState | null>(null);

export const FormProvider = Context.Provider;

export function useForm(): FormState {
  const form = useContext(Context);
  if (!form) throw new Error("A field of the calculation stands outside its form.");
  return form;
}
