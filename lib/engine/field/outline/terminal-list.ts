import type { OutlineError, TerminalInput } from "./schema";

/** Complaints about the list of terminals as such: how many, their names, whether each names some boundary. */
export function checkTerminalList(terminals: readonly TerminalInput[], least = 2): OutlineError[] {
  const errors: OutlineError[] = [];
  if (terminals.length < least) {
    errors.push({
      pointer: "#/terminals",
      detail: `${terminals.length === 0 ? "There is no terminal" : "There is only one terminal"}; a resistance needs at least two.`,
    });
  }
  const first = new Map<string, number>();
  terminals.forEach((terminal, i) => {
    const earlier = first.get(terminal.name);
    if (earlier === undefined) first.set(terminal.name, i);
    else {
      errors.push({
        pointer: `#/terminals/${i}/name`,
        detail: `Terminals ${earlier} and ${i} are both named "${terminal.name}"; names must differ.`,
      });
    }
    const stretches = (terminal.segments?.length ?? 0) + (terminal.parts?.length ?? 0);
    if (stretches > 0) return;
    const member = terminal.segments === undefined && terminal.parts !== undefined ? "parts" : "segments";
    errors.push({
      pointer: `#/terminals/${i}/${member}`,
      detail: `Terminal "${terminal.name}" names no piece of the boundary; give at least one segment or part.`,
    });
  });
  return errors;
}
