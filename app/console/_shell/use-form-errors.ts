"use client";

import { useCallback, useState } from "react";
import { ConsoleProblem } from "./call-console";

interface FormErrors {
  /** The complaint about a field, by its name. */
  readonly of: (name: string) => string | undefined;
  /** What is wrong beside the fields that the form shows. */
  readonly general: ConsoleProblem | null;
  /** Takes what a call threw: shows it at the form's fields, focuses the first of them, keeps what was typed. */
  readonly take: (error: unknown, form: HTMLFormElement) => void;
  readonly clear: () => void;
}

/** Errors of one form: kept at the fields that have their name, else above the buttons. */
export function useFormErrors(): FormErrors {
  const [fields, setFields] = useState<ReadonlyMap<string, string>>(new Map());
  const [general, setGeneral] = useState<ConsoleProblem | null>(null);

  const take = useCallback((error: unknown, form: HTMLFormElement) => {
    if (!(error instanceof ConsoleProblem)) throw error;
    // A complaint about one entry of a list stands at the list's field.
    const found = new Map([...error.fieldErrors()].map(([name, text]) => [name.replace(/\/\d+$/, ""), text]));
    const controls = [...form.elements].filter(
      (element): element is HTMLInputElement => "name" in element && found.has(String(element.name)),
    );
    setFields(found);
    setGeneral(controls.length > 0 ? null : error);
    controls[0]?.focus();
  }, []);

  const clear = useCallback(() => {
    setFields(new Map());
    setGeneral(null);
  }, []);

  return { of: (name) => fields.get(name), general, take, clear };
}
