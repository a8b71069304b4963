/** Python's words that cannot be names, and those of ours that a member must not hide. */
const RESERVED = new Set(
  "False None True and as assert async await break class continue def del elif else except finally for from global if import in is lambda nonlocal not or pass raise return try while with yield self".split(
    " ",
  ),
);

/** `innerRadius` as Python spells it: `inner_radius`; a reserved word gets an underscore behind it. */
export function snakeCase(name: string): string {
  const snake = name
    .replace(/([a-z0-9])([A-Z])/g, "$1_$2")
    .replace(/[^A-Za-z0-9]+/g, "_")
    .toLowerCase();
  return RESERVED.has(snake) ? `${snake}_` : snake;
}

/** `cylindrical-shell`, `currentDensity` as the name of a class. */
export function pascalCase(name: string): string {
  return name
    .split(/[^A-Za-z0-9]+/)
    .map((part) => part.charAt(0).toUpperCase() + part.slice(1))
    .join("");
}

/** A text as a literal of Python; JSON's form of a text is one. */
export function literal(text: string): string {
  return JSON.stringify(text);
}

/** A docstring on one line or more, broken at 110 characters. */
export function docstring(text: string, indent: string): string {
  const words = text.replaceAll("\\", "\\\\").replaceAll('"""', "'''").split(/\s+/).filter(Boolean);
  const lines: string[] = [];
  let line = "";
  for (const word of words) {
    if (line !== "" && indent.length + line.length + 1 + word.length > 112) {
      lines.push(line);
      line = word;
    } else line = line === "" ? word : `${line} ${word}`;
  }
  lines.push(line);
  if (lines.length === 1 && line.length + indent.length < 110 && !line.endsWith('"'))
    return `${indent}"""${line}"""\n`;
  return `${indent}"""\n${lines.map((part) => indent + part).join("\n")}\n${indent}"""\n`;
}
