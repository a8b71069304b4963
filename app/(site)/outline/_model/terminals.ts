/** Changes of a sketch's terminals. */
import { edgeOf, nearestOn } from "./edges";
import type { Part, Point, Ring, Sketch, Terminal } from "./sketch";

/** Shares nearer than this to an end of the edge are the end. */
const END = 1e-9;

const NAMES = ["in", "out"] as const;

/** A name that no terminal has yet. */
export function freeName({ terminals }: Sketch): string {
  const taken = new Set(terminals.map(({ name }) => name));
  const plain = NAMES.find((name) => !taken.has(name));
  if (plain) return plain;
  for (let k = 1; ; k++) {
    const name = k === 1 ? "tap" : `tap ${k}`;
    if (!taken.has(name)) return name;
  }
}

export function addTerminal(sketch: Sketch): Sketch {
  const terminal: Terminal = { name: freeName(sketch), parts: [], segments: [] };
  return { ...sketch, terminals: [...sketch.terminals, terminal] };
}

export function removeTerminal(sketch: Sketch, index: number): Sketch {
  return { ...sketch, terminals: sketch.terminals.filter((_, k) => k !== index) };
}

export function changeTerminal(sketch: Sketch, index: number, change: Partial<Terminal>): Sketch {
  return {
    ...sketch,
    terminals: sketch.terminals.map((terminal, k) => (k === index ? { ...terminal, ...change } : terminal)),
  };
}

/** Which terminal has a stretch of the edge, −1 for none. */
export function terminalOn({ terminals }: Sketch, ring: number, edge: number): number {
  return terminals.findIndex(({ parts }) => parts.some((part) => part.ring === ring && part.edge === edge));
}

/** Gives the whole edge to a terminal and takes it from the others; takes it away if the terminal has it already. */
export function toggleEdge(sketch: Sketch, index: number, ring: number, edge: number): Sketch {
  const here = (part: Part) => part.ring === ring && part.edge === edge;
  const has = sketch.terminals[index].parts.some((part) => here(part));
  return {
    ...sketch,
    terminals: sketch.terminals.map((terminal, k) => {
      const parts = terminal.parts.filter((part) => !here(part));
      return {
        ...terminal,
        parts: k === index && !has ? [...parts, { ring, edge, from: 0, to: 1 }] : parts,
      };
    }),
  };
}

export function addPart(sketch: Sketch, index: number, part: Part): Sketch {
  const { parts } = sketch.terminals[index];
  return changeTerminal(sketch, index, { parts: [...parts, part] });
}

export function changePart(sketch: Sketch, index: number, place: number, change: Partial<Part>): Sketch {
  const parts = sketch.terminals[index].parts.map((part, k) => (k === place ? { ...part, ...change } : part));
  return changeTerminal(sketch, index, { parts });
}

export function removePart(sketch: Sketch, index: number, place: number): Sketch {
  const parts = sketch.terminals[index].parts.filter((_, k) => k !== place);
  return changeTerminal(sketch, index, { parts });
}

export function removeSegment(sketch: Sketch, index: number, place: number): Sketch {
  const segments = sketch.terminals[index].segments.filter((_, k) => k !== place);
  return changeTerminal(sketch, index, { segments });
}

/** The stretch of one straight edge on which both points lie; null where there is none. */
export function partOfSegment(rings: readonly Ring[], [a, b]: readonly [Point, Point]): Part | null {
  const all = rings.flat();
  const size = Math.max(
    Math.max(...all.map(({ x }) => x)) - Math.min(...all.map(({ x }) => x)),
    Math.max(...all.map(({ y }) => y)) - Math.min(...all.map(({ y }) => y)),
  );
  for (let ring = 0; ring < rings.length; ring++) {
    for (let edge = 0; edge < rings[ring].length; edge++) {
      const line = edgeOf(rings[ring], edge);
      if (line.arc) continue;
      const [start, end] = [nearestOn(line, a), nearestOn(line, b)];
      if (Math.max(start.distance, end.distance) > 1e-9 * size || start.t === end.t) continue;
      const clean = (t: number) => (t < END ? 0 : t > 1 - END ? 1 : t);
      return {
        ring,
        edge,
        from: clean(Math.min(start.t, end.t)),
        to: clean(Math.max(start.t, end.t)),
      };
    }
  }
  return null;
}
