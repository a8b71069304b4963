"use client";

import { useState } from "react";
import type { EmbedDefinition, InputRule } from "@/lib/embeds/definition";
import type { EmbedDetail } from "../../../api/console/embeds/_server/embed-detail";
import { Button } from "../../../_ui/button";
import { Select } from "../../../_ui/select";
import { InputRuleFields } from "./input-rule-fields";
import { JsonField } from "./json-field";
import type { Draft } from "./use-draft";

interface RulesProps {
  readonly detail: EmbedDetail;
  readonly draft: Draft;
}

type Inputs = EmbedDefinition["inputs"];

/** Every input of the widget with its rule, in the order in which visitors see them. */
export function InputRules({ detail, draft }: RulesProps) {
  const { definition, change, problems } = draft;
  const used = new Set(definition.inputs.map(({ name }) => name));
  const others = detail.inputs.filter(({ name }) => !used.has(name));
  const [adding, setAdding] = useState("");
  const put = (inputs: Inputs) => change({ inputs });

  function add() {
    const input = others.find(({ name }) => name === adding) ?? others[0];
    if (!input) return;
    const value = firstValue(input.type, input.kind, input.choices[0]?.value);
    put([...definition.inputs, { name: input.name, rule: { mode: "fixed", value } }]);
    setAdding("");
  }

  function remove(gone: string) {
    const kept = <Entry extends { readonly name: string }>(entries: readonly Entry[]) =>
      entries.filter(({ name }) => name !== gone);
    const { inputs, tolerances } = definition;
    change({
      inputs: kept(inputs),
      tolerances: tolerances && { ...tolerances, inputs: kept(tolerances.inputs) },
    });
  }

  return (
    <>
      <h2 className="text-h3! mt-1 mb-0.5">Inputs</h2>
      <p className="mb-1 max-w-prose text-small text-ink-soft">
        Quantities with their unit, such as 250 mm or 65 degC; the unit is the one that visitors start with.
        Hidden inputs are not shown, but whoever knows the formula can work them out from the result.
      </p>
      {definition.inputs.map(({ name, rule }, index) => {
        const input = detail.inputs.find((known) => known.name === name);
        const own = problems.filter(({ pointer }) => new RegExp(`^#/inputs/${index}(?:/|$)`).test(pointer));
        return (
          <InputRuleFields
            key={name}
            name={name}
            input={input}
            rule={rule}
            materials={detail.materials}
            errors={own.map((problem) => ({
              place: problem.pointer.split("/")[3] ?? "",
              detail: problem.detail,
            }))}
            onChange={(next: InputRule) =>
              put(definition.inputs.map((each, at) => (at === index ? { name, rule: next } : each)))
            }
            onRemove={() => remove(name)}
            onUp={index === 0 ? undefined : () => put(swapped(definition.inputs, index))}
          />
        );
      })}
      {others.length > 0 ? (
        <div className="mt-1 flex flex-wrap items-start gap-1">
          <Select
            label="Another input"
            value={adding || others[0].name}
            options={others.map(({ name, label }) => ({ value: name, label: `${label} (${name})` }))}
            onChange={(event) => setAdding(event.target.value)}
            className="grow"
          />
          <Button className="mt-3.5" onClick={add}>
            Add
          </Button>
        </div>
      ) : null}
      {definition.outlineId === undefined ? (
        <JsonField
          label="Graded medium"
          help="As the member graded of the API, in JSON; empty for none. It takes the place of material or resistivity."
          offer="Fix a graded medium"
          placeholder={GRADED}
          value={definition.graded}
          error={problems.find(({ pointer }) => pointer.startsWith("#/graded"))?.detail}
          onChange={(graded) => change({ graded: graded as typeof definition.graded })}
        />
      ) : null}
    </>
  );
}

function swapped(inputs: Inputs, index: number): Inputs {
  const next = [...inputs];
  [next[index - 1], next[index]] = [next[index], next[index - 1]];
  return next;
}

const FIRST_VALUES: Readonly<Record<string, string>> = {
  length: "10 mm",
  area: "100 mm^2",
  angle: "90 deg",
  temperature: "20 degC",
  temperatureCoefficient: "0.00393 1/K",
  resistivity: "1.72e-8 ohm m",
  conductivity: "58 MS/m",
  sheetResistance: "50 ohm/sq",
  voltage: "1 V",
  current: "1 A",
  power: "1 W",
};

/** Something that can be computed with, to be changed at once. */
function firstValue(type: string, kind: string | null, choice: string | undefined): string {
  if (type === "material") return "copper-annealed";
  if (type === "flag") return "true";
  return choice ?? FIRST_VALUES[kind ?? ""] ?? "1";
}

const GRADED = `{
  "coordinate": "length",
  "quantity": "resistivity",
  "profile": { "kind": "linear", "from": 1.7e-8, "to": 2.2e-8 }
}`;
