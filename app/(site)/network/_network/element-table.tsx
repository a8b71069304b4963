"use client";

import { memo } from "react";
import { SquareArrowOutUpRight, Trash2 } from "lucide-react";
import { formatQuantity } from "@/lib/engine/quantity/format-quantity";
import type { ShapeRequest } from "../_model/body";
import type { Complaints } from "../_model/complaints";
import { type Element, type Network, readValue, type Value, valueText } from "../_model/network";
import { percent } from "./drawing";
import { ToleranceCell } from "./tolerance-cell";
import type { Answer } from "./use-solution";

interface ElementTableProps {
  readonly network: Network;
  /** Places of the elements to show, in their order. */
  readonly shown: readonly number[];
  /** By the elements' ids, as are the complaints. */
  readonly answers: ReadonlyMap<number, Answer>;
  readonly stale: boolean;
  readonly complaints: ReadonlyMap<number, Complaints>;
  readonly requests: ReadonlyMap<string, ShapeRequest>;
  readonly onChange: (id: number, change: Partial<Element>, whole?: Partial<Network>) => void;
  readonly onRemove: (id: number) => void;
  readonly onFocus: (id: number | null) => void;
}

const HEADS = [
  "Element",
  "From",
  "To",
  "Resistance, or a link",
  "Tolerance",
  "Resistance",
  "Current",
  "Loss",
  "Share",
  "dR/dRₖ",
];

/** Elements as rows: what they are on the left, what passes through them on the right. */
export function ElementTable(props: ElementTableProps) {
  const { network, shown, answers, complaints, stale } = props;
  return (
    <div
      role="group"
      tabIndex={0}
      aria-label="Elements"
      className="relative overflow-x-auto rounded border border-rule bg-sheet text-table"
    >
      <table className="w-full border-collapse">
        <caption className="sr-only">Elements of the network and what passes through them</caption>
        <thead>
          <tr>
            {HEADS.map((head, k) => (
              <th
                key={k}
                scope="col"
                className={`px-1 py-0.5 font-medium whitespace-nowrap text-ink-soft ${k > 4 ? "text-end" : "text-start"}`}
              >
                {head}
              </th>
            ))}
            <th scope="col">
              <span className="sr-only">Remove</span>
            </th>
          </tr>
        </thead>
        <tbody>
          {shown.map((index) => {
            const element = network.elements[index];
            return (
              <ElementRow
                key={element.id}
                element={element}
                number={index + 1}
                answer={answers.get(element.id)}
                stale={stale}
                wrong={complaints.get(element.id)}
                title={titleOf(element.value, props.requests)}
                uncertainty={network.uncertainty}
                onChange={props.onChange}
                onRemove={props.onRemove}
                onFocus={props.onFocus}
              />
            );
          })}
          {shown.length === 0 ? (
            <tr className="border-t border-rule">
              <td colSpan={HEADS.length + 1} className="px-2 py-3 text-center text-ink-soft">
                No element yet. Add one and name the two nodes that it joins.
              </td>
            </tr>
          ) : null}
        </tbody>
      </table>
    </div>
  );
}

function titleOf(value: Value, requests: ElementTableProps["requests"]): string | undefined {
  return value.kind === "shape" ? requests.get(value.address)?.title : undefined;
}

interface ElementRowProps extends Pick<ElementTableProps, "onChange" | "onRemove" | "onFocus"> {
  readonly element: Element;
  readonly number: number;
  readonly answer: Answer | undefined;
  readonly stale: boolean;
  readonly wrong: Complaints | undefined;
  /** Title of the shape, where it is one. */
  readonly title: string | undefined;
  readonly uncertainty: Network["uncertainty"];
}

const ElementRow = memo(function ElementRow(props: ElementRowProps) {
  const { element, number, answer, stale, wrong, title, onChange, onRemove, onFocus } = props;
  const { id, name, from, to, value } = element;
  const problemId = `element-${id}-problem`;
  const text = valueText(value);
  const tolerance = value.kind === "resistance" ? value.tolerance : undefined;
  const cell = (
    label: string,
    content: string,
    change: (text: string) => Partial<Element>,
    complaint: string | undefined,
    width: string,
    list?: string,
  ) => (
    <input
      id={label === "Name" ? `element-${id}` : undefined}
      aria-label={`${label} of element ${number}`}
      aria-invalid={complaint === undefined ? undefined : true}
      aria-describedby={complaint === undefined ? undefined : problemId}
      value={content}
      list={list}
      onChange={(event) => onChange(id, change(event.target.value))}
      onFocus={() => onFocus(id)}
      onBlur={() => onFocus(null)}
      autoComplete="off"
      spellCheck={false}
      className={`min-h-5.5 w-full ${width} rounded border border-transparent bg-transparent px-0.5 font-mono hover:border-edge focus:border-edge aria-invalid:border-2 aria-invalid:border-oxide medium:min-h-4`}
    />
  );
  const told = [wrong?.name, wrong?.between, wrong?.value].filter((entry) => entry !== undefined);
  const figures = answer
    ? [
        formatQuantity(answer.resistance, "ohm", { digits: 5 }),
        formatQuantity(answer.current, "ampere", { digits: 5 }),
        formatQuantity(answer.power, "watt", { digits: 4 }),
        percent(answer.share),
        answer.sensitivity.toPrecision(3),
      ]
    : ["–", "–", "–", "–", "–"];
  return (
    <>
      <tr className="border-t border-rule">
        <td className="p-0.5">{cell("Name", name, (next) => ({ name: next }), wrong?.name, "min-w-14")}</td>
        <td className="p-0.5">
          {cell("First node", from, (next) => ({ from: next }), wrong?.between, "min-w-9", "nodes")}
        </td>
        <td className="p-0.5">
          {cell("Second node", to, (next) => ({ to: next }), wrong?.between, "min-w-9", "nodes")}
        </td>
        <td className="p-0.5">
          <span className="flex items-center gap-0.5">
            {cell(
              "Resistance",
              text,
              (next) => ({ value: readValue(next, tolerance) }),
              wrong?.value,
              "min-w-20",
            )}
            {value.kind === "shape" ? (
              <a
                href={`/calculate/${value.address}`}
                target="_blank"
                rel="noreferrer"
                title={`${title ?? "The calculation"}: open it, change it there and paste its link here`}
                aria-label={`${title ?? "The calculation"} of element ${number}, in a new tab`}
                className="grid size-5.5 shrink-0 place-items-center rounded text-verdigris hover:text-ink medium:size-3.5"
              >
                <SquareArrowOutUpRight aria-hidden size={14} />
              </a>
            ) : null}
          </span>
        </td>
        <td className="p-0.5">
          <ToleranceCell
            element={element}
            number={number}
            uncertainty={props.uncertainty}
            wrong={wrong}
            onChange={onChange}
          />
        </td>
        {figures.map((figure, k) => (
          <td key={k} className={`px-1 text-end font-mono whitespace-nowrap ${stale ? "text-ink-soft" : ""}`}>
            {figure}
          </td>
        ))}
        <td className="pe-0.5 text-end">
          <button
            type="button"
            aria-label={`Remove element ${number}`}
            title="Remove the element"
            onClick={() => onRemove(id)}
            className="grid size-5.5 cursor-pointer place-items-center rounded text-ink-soft hover:text-ink medium:size-3.5"
          >
            <Trash2 aria-hidden size={14} />
          </button>
        </td>
      </tr>
      {told.length > 0 ? (
        <tr>
          <td colSpan={HEADS.length + 1} className="px-1 pb-0.5 text-small text-oxide">
            {/* In view wherever the table is scrolled to. */}
            <span id={problemId} className="sticky start-1 block w-fit max-w-[calc(100vw-4rem)]">
              {told.join(" ")}
            </span>
          </td>
        </tr>
      ) : null}
    </>
  );
});
