"use client";

import { type KeyboardEvent, useMemo, useState } from "react";
import { formatQuantity } from "@/lib/engine/quantity/format-quantity";
import type { NetworkResult } from "@/lib/engine/network/result-schema";
import { layOut, type PlacedElement } from "../_model/layout";
import type { Network } from "../_model/network";
import type { Answer } from "./use-solution";

interface DrawingProps {
  readonly network: Network;
  readonly result: NetworkResult | undefined;
  /** By the elements' ids. */
  readonly answers: ReadonlyMap<number, Answer>;
  readonly stale: boolean;
  readonly focused: number | null;
  readonly onPick: (id: number) => void;
}

/** Beyond so many elements a drawing says nothing any more. */
export const MOST_DRAWN = 120;
/** Beyond so many, labels would cover each other. */
const MOST_LABELLED = 40;
const BODY = { length: 46, width: 15 };

/** The network with its answers: voltages at the nodes, current and share of the loss at the elements. */
export function NetworkDrawing({ network, result, answers, stale, focused, onPick }: DrawingProps) {
  const layout = useMemo(() => layOut(network), [network]);
  /** The one element that the tab key reaches; arrows go on from there. */
  const [reached, setReached] = useState(0);
  const voltages = useMemo(
    () => new Map(result?.nodes.map(({ name, voltage }) => [name, voltage]) ?? []),
    [result],
  );
  const labelled = network.elements.length <= MOST_LABELLED;
  const largest = Math.max(1e-300, ...[...answers.values()].map(({ current }) => Math.abs(current)));
  return (
    <div
      role="group"
      tabIndex={0}
      aria-label="Drawing of the network"
      className="relative overflow-x-auto rounded border border-rule bg-sheet"
    >
      <svg
        role="group"
        aria-label={describe(network, result)}
        viewBox={`0 0 ${layout.width} ${layout.height}`}
        style={{ minWidth: Math.min(layout.width, 700), maxHeight: "34rem" }}
        className={`mx-auto block w-full font-sans ${stale ? "opacity-60" : ""}`}
        fontSize={13}
      >
        {layout.elements.map((placed, k) => {
          const element = network.elements[placed.index];
          const answer = answers.get(placed.id);
          return (
            <Branch
              key={placed.id}
              placed={placed}
              name={element.name}
              labelled={labelled}
              focused={placed.id === focused}
              current={answer?.current}
              share={answer?.share}
              weight={answer ? Math.abs(answer.current) / largest : 0}
              reachable={k === Math.min(reached, layout.elements.length - 1)}
              onReach={() => setReached(k)}
              onPick={() => onPick(placed.id)}
            />
          );
        })}
        {layout.nodes.map(({ name, x, y }, k) => {
          const voltage = voltages.get(name);
          // One name for both ports is one node; no other stands for the second.
          const second = k === 1 && name === network.ports[1].trim();
          const port = k === 0 || second;
          const look = second ? "fill-verdigris" : port ? "fill-copper" : "fill-ink";
          return (
            <g key={name}>
              <circle cx={x} cy={y} r={port ? 7 : 4.5} className={look} />
              {labelled || port ? <Label x={x} y={y - 14} text={name} strong /> : null}
              {voltage !== undefined && (labelled || port) ? (
                <Label x={x} y={y + 23} text={formatQuantity(voltage, "volt", { digits: 4 })} mono />
              ) : null}
            </g>
          );
        })}
      </svg>
    </div>
  );
}

interface BranchProps {
  readonly placed: PlacedElement;
  readonly name: string;
  readonly labelled: boolean;
  readonly focused: boolean;
  readonly current: number | undefined;
  readonly share: number | undefined;
  /** Its current over the largest. */
  readonly weight: number;
  readonly reachable: boolean;
  readonly onReach: () => void;
  readonly onPick: () => void;
}

function Branch(props: BranchProps) {
  const { placed, name, labelled, focused, current, share, weight, onPick } = props;
  const { from, to, bend } = placed;
  const [dx, dy] = [to.x - from.x, to.y - from.y];
  const length = Math.hypot(dx, dy) || 1;
  const [nx, ny] = [-dy / length, dx / length];
  const [mx, my] = [(from.x + to.x) / 2 + nx * bend, (from.y + to.y) / 2 + ny * bend];
  const [cx, cy] = [(from.x + to.x) / 2 + 2 * nx * bend, (from.y + to.y) / 2 + 2 * ny * bend];
  const angle = (Math.atan2(dy, dx) * 180) / Math.PI;
  const upright = angle > 90 || angle <= -90 ? angle + 180 : angle;
  const width = 1.2 + 2.3 * weight;
  const backwards = (current ?? 0) < 0;
  const figures =
    current === undefined || share === undefined
      ? ""
      : `${formatQuantity(Math.abs(current), "ampere", { digits: 4 })} · ${percent(share)}`;
  return (
    <g
      role="button"
      tabIndex={props.reachable ? 0 : -1}
      aria-label={`${name || "Element"} from ${from.name} to ${to.name}${figures === "" ? "" : `, ${figures}`}: go to its row`}
      onClick={onPick}
      onFocus={props.onReach}
      onKeyDown={(event) => {
        if (event.key === "Enter" || event.key === " ") {
          event.preventDefault();
          onPick();
        } else stepOn(event);
      }}
      className="group cursor-pointer outline-none"
    >
      <path
        d={`M${from.x} ${from.y}Q${cx} ${cy} ${to.x} ${to.y}`}
        fill="none"
        strokeWidth={width}
        className="stroke-ink"
      />
      <g transform={`translate(${mx} ${my}) rotate(${angle})`}>
        <rect
          x={-BODY.length / 2}
          y={-BODY.width / 2}
          width={BODY.length}
          height={BODY.width}
          strokeWidth={focused ? 3 : 1.4}
          className={`fill-sheet group-focus-visible:stroke-verdigris group-focus-visible:[stroke-width:4] ${focused ? "stroke-verdigris" : "stroke-copper"}`}
        />
        {share ? (
          <rect
            x={-BODY.length / 2}
            y={-BODY.width / 2}
            width={BODY.length * share}
            height={BODY.width}
            className="fill-copper"
          />
        ) : null}
        {current ? (
          <path d={backwards ? "M-36 -5L-44 0L-36 5Z" : "M36 -5L44 0L36 5Z"} className="fill-ink" />
        ) : null}
      </g>
      {labelled ? (
        <g transform={`translate(${mx} ${my}) rotate(${Math.abs(upright) > 60 ? 0 : upright})`}>
          <Label
            x={Math.abs(upright) > 60 ? 34 : 0}
            y={Math.abs(upright) > 60 ? -3 : -14}
            text={name}
            start={Math.abs(upright) > 60}
          />
          {figures === "" ? null : (
            <Label
              x={Math.abs(upright) > 60 ? 34 : 0}
              y={Math.abs(upright) > 60 ? 13 : 23}
              text={figures}
              start={Math.abs(upright) > 60}
              mono
            />
          )}
        </g>
      ) : null}
    </g>
  );
}

/** Arrows go from element to element, as between the rows of a list. */
function stepOn(event: KeyboardEvent<SVGGElement>): void {
  const step = { ArrowRight: 1, ArrowDown: 1, ArrowLeft: -1, ArrowUp: -1 }[event.key];
  if (step === undefined) return;
  event.preventDefault();
  const all = [
    ...(event.currentTarget.ownerSVGElement?.querySelectorAll<SVGGElement>("[role=button]") ?? []),
  ];
  all[all.indexOf(event.currentTarget) + step]?.focus();
}

interface LabelProps {
  readonly x: number;
  readonly y: number;
  readonly text: string;
  readonly strong?: boolean;
  readonly mono?: boolean;
  readonly start?: boolean;
}

/** A text with the ground around it cleared of lines. */
function Label({ x, y, text, strong = false, mono = false, start = false }: LabelProps) {
  return (
    <text
      x={x}
      y={y}
      textAnchor={start ? "start" : "middle"}
      paintOrder="stroke"
      strokeWidth={4}
      strokeLinejoin="round"
      className={`fill-ink stroke-sheet ${strong ? "font-semibold" : ""} ${mono ? "font-mono text-[12px]" : ""}`}
    >
      {text.length > 26 ? `${text.slice(0, 25)}…` : text}
    </text>
  );
}

export function percent(share: number): string {
  if (share === 0) return "0 %";
  return share < 0.0005 ? "< 0.1 %" : `${(100 * share).toFixed(1)} %`;
}

function describe({ elements, ports }: Network, result: NetworkResult | undefined): string {
  const start = `Network of ${elements.length} elements between ${ports[0]} and ${ports[1]}.`;
  return result ? `${start} Resistance ${result.resistance.text}.` : start;
}
