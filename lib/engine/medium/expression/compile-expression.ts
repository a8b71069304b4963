/**
 * An expression such as "58e6/(1+3*u^2)" to a function of two variables.
 *
 * The text is parsed by mathjs; the tree is then walked here and turned into closures, node by node, from a whitelist of
 * node types, operators and functions. Nothing is ever evaluated by mathjs or by JavaScript's own evaluator.
 */
import { parse, type MathNode } from "mathjs/number";
import { suggestion } from "../../shape/nearest-names";
import {
  COMPARISONS,
  EXPRESSION_CONSTANTS,
  EXPRESSION_FUNCTIONS,
  type Comparison,
} from "./expression-functions";
import { DEEPEST, MOST_NODES, scanExpression, tooDeep } from "./scan-expression";

/** A value as a function of the two variables, in the order in which they were named. */
export type Evaluate = (a: number, b: number) => number;

export interface CompiledExpression {
  readonly evaluate: Evaluate;
  /** Number of nodes, a measure of the cost of one value. */
  readonly nodes: number;
  /** Functions whose zeros are the places where if, abs, min or max switch: there may be kinks and jumps, nowhere else. */
  readonly switches: readonly Evaluate[];
}

export type ExpressionReading =
  | { readonly ok: true; readonly expression: CompiledExpression }
  | { readonly ok: false; readonly detail: string };

/** The members of mathjs's nodes that the walk looks at. */
interface AnyNode {
  readonly type: string;
  readonly value?: unknown;
  readonly name?: string;
  readonly op?: string;
  readonly implicit?: boolean;
  readonly isPercentage?: boolean;
  readonly args?: readonly AnyNode[];
  readonly content?: AnyNode;
  readonly fn?: unknown;
}

class Refusal extends Error {}

/**
 * Compiles an expression in two variables, such as `["s", "u"]` or `["x", "y"]`.
 * At most 1,000 characters, 200 nodes, 32 levels; a chain of + and − or of * and / counts as one level.
 */
export function compileExpression(text: string, variables: readonly [string, string]): ExpressionReading {
  const complaint = scanExpression(text);
  if (complaint !== null) return { ok: false, detail: complaint };
  const plain = text.replace(/\s/g, " ");
  try {
    const tree = parseTree(plain);
    const compiler = new Compiler(plain, variables);
    const evaluate = compiler.compile(tree);
    return { ok: true, expression: { evaluate, nodes: compiler.nodes, switches: compiler.switches } };
  } catch (error) {
    if (error instanceof Refusal) return { ok: false, detail: error.message };
    throw error;
  }
}

function parseTree(text: string): AnyNode {
  try {
    const tree: MathNode = parse(text);
    return tree as unknown as AnyNode;
  } catch (error) {
    // The parser recurses; an endless chain of signs or powers exhausts the stack before the tree exists.
    if (error instanceof RangeError) throw new Refusal(tooDeep());
    if (error instanceof Error) {
      const place = (error as { char?: unknown }).char;
      const what = error.message.replace(/\s*\(char \d+\)\s*$/, "").replace(/\.$/, "");
      const where = typeof place === "number" ? ` at character ${Math.min(place, text.length + 1)}` : "";
      throw new Refusal(`cannot be read${where}: ${what[0].toLowerCase()}${what.slice(1)}.`);
    }
    throw error;
  }
}

class Compiler {
  nodes = 0;
  readonly switches: Evaluate[] = [];

  constructor(
    private readonly text: string,
    private readonly variables: readonly [string, string],
  ) {}

  compile(node: AnyNode, depth = 1): Evaluate {
    if (depth > DEEPEST) throw new Refusal(tooDeep());
    if (node.type === "ParenthesisNode" && node.content) return this.compile(node.content, depth + 1);
    this.count();
    switch (node.type) {
      case "ConstantNode":
        return this.constant(node);
      case "SymbolNode":
        return this.symbol(node.name ?? "");
      case "OperatorNode":
        return this.operator(node, depth);
      case "FunctionNode":
        return this.call(node, depth);
      default:
        throw new Refusal(
          `contains ${describe(node.type)}; only plain arithmetic and functions are allowed.`,
        );
    }
  }

  private count(): void {
    this.nodes++;
    if (this.nodes > MOST_NODES)
      throw new Refusal(`has more than ${MOST_NODES} numbers, names and operations.`);
  }

  private constant(node: AnyNode): Evaluate {
    const { value } = node;
    if (typeof value !== "number")
      throw new Refusal("is not a plain number: only numbers are allowed as constants.");
    if (!Number.isFinite(value)) throw new Refusal("has a number that is not finite.");
    return () => value;
  }

  private symbol(name: string): Evaluate {
    if (name === this.variables[0]) return (a) => a;
    if (name === this.variables[1]) return (_, b) => b;
    const constant = EXPRESSION_CONSTANTS.get(name);
    if (constant !== undefined) return () => constant;
    const allowed = [...this.variables, ...EXPRESSION_CONSTANTS.keys()];
    if (EXPRESSION_FUNCTIONS.has(name)) {
      throw new Refusal(`has the function "${name}"${this.place(name)} without its arguments.`);
    }
    throw new Refusal(
      `has the unknown name "${name}"${this.place(name)}; it may use ${allowed.join(", ")} and functions.${suggestion(name, [...allowed, ...EXPRESSION_FUNCTIONS.keys()])}`,
    );
  }

  private operator(node: AnyNode, depth: number): Evaluate {
    const { op = "", args = [] } = node;
    if (node.implicit) throw new Refusal("leaves out a multiplication sign; write * between factors.");
    if (COMPARISONS.has(op)) {
      throw new Refusal(`compares with ${op} outside the first argument of if(c, a, b).`);
    }
    if (node.isPercentage || args.length === 0 || args.length > 2)
      throw new Refusal(`has the operator ${op}, which is not allowed.`);
    if (args.length === 1) {
      const a = this.compile(args[0], depth + 1);
      if (op === "-") return (x, y) => -a(x, y);
      if (op === "+") return a;
      throw new Refusal(`has the operator ${op}, which is not allowed.`);
    }
    // A sum or product of many terms is a left-leaning chain in the tree, but no deeper for a reader.
    const chained = isChain(op, args[0]);
    const a = this.compile(args[0], chained ? depth : depth + 1);
    const b = this.compile(args[1], depth + 1);
    switch (op) {
      case "+":
        return (x, y) => a(x, y) + b(x, y);
      case "-":
        return (x, y) => a(x, y) - b(x, y);
      case "*":
        return (x, y) => a(x, y) * b(x, y);
      case "/":
        return (x, y) => a(x, y) / b(x, y);
      case "^":
        return this.power(a, b, args[1]);
      default:
        throw new Refusal(`has the operator ${op}, which is not allowed.`);
    }
  }

  private power(a: Evaluate, b: Evaluate, exponent: AnyNode): Evaluate {
    // A square is common, and exactly rounded as a product.
    if (exponent.type === "ConstantNode" && exponent.value === 2) {
      return (x, y) => {
        const base = a(x, y);
        return base * base;
      };
    }
    return (x, y) => Math.pow(a(x, y), b(x, y));
  }

  private call(node: AnyNode, depth: number): Evaluate {
    const callee = node.fn as AnyNode | undefined;
    const args = node.args ?? [];
    if (callee?.type !== "SymbolNode" || callee.name === undefined) {
      throw new Refusal("calls something that is not a plain function name.");
    }
    const name = callee.name;
    const known = EXPRESSION_FUNCTIONS.get(name);
    if (!known) {
      throw new Refusal(
        `has the unknown function "${name}"${this.place(name)}.${suggestion(name, [...EXPRESSION_FUNCTIONS.keys()])}`,
      );
    }
    if (args.length < known.least || args.length > known.most) {
      const wanted = known.least === known.most ? `${known.least}` : `${known.least} to ${known.most}`;
      throw new Refusal(`gives ${name}${this.place(name)} ${args.length} arguments; it takes ${wanted}.`);
    }
    if (name === "if") return this.condition(args, depth);
    const inner = args.map((arg) => this.compile(arg, depth + 1));
    if (known.one) {
      const f = known.one;
      const a = inner[0];
      if (name === "abs") this.switches.push(a);
      return (x, y) => f(a(x, y));
    }
    const f = known.fold ?? Math.min;
    return inner.reduce((a, b) => {
      this.switches.push((x, y) => a(x, y) - b(x, y));
      return (x, y) => f(a(x, y), b(x, y));
    });
  }

  private condition(args: readonly AnyNode[], depth: number): Evaluate {
    const [test, yes, no] = args;
    const holds = this.comparison(test, depth + 1);
    const a = this.compile(yes, depth + 1);
    const b = this.compile(no, depth + 1);
    return (x, y) => (holds(x, y) ? a(x, y) : b(x, y));
  }

  private comparison(node: AnyNode, depth: number): (a: number, b: number) => boolean {
    if (depth > DEEPEST) throw new Refusal(tooDeep());
    if (node.type === "ParenthesisNode" && node.content) return this.comparison(node.content, depth + 1);
    this.count();
    const compare: Comparison | undefined = COMPARISONS.get(node.op ?? "");
    if (node.type !== "OperatorNode" || !compare || node.args?.length !== 2) {
      throw new Refusal("needs one comparison such as u < 0.5 as the first argument of if(c, a, b).");
    }
    const a = this.compile(node.args[0], depth + 1);
    const b = this.compile(node.args[1], depth + 1);
    this.switches.push((x, y) => a(x, y) - b(x, y));
    return (x, y) => compare(a(x, y), b(x, y));
  }

  /** Where a name stands first in the text. */
  private place(name: string): string {
    const found = new RegExp(`(?<![A-Za-z0-9_])${name}(?![A-Za-z0-9_])`).exec(this.text);
    return found ? ` at character ${found.index + 1}` : "";
  }
}

function isChain(op: string, left: AnyNode): boolean {
  if (left.type !== "OperatorNode" || left.args?.length !== 2) return false;
  const sums = "+-";
  const products = "*/";
  return (
    (sums.includes(op) && sums.includes(left.op ?? " ")) ||
    (products.includes(op) && products.includes(left.op ?? " "))
  );
}

const DESCRIPTIONS: Readonly<Record<string, string>> = {
  AssignmentNode: "an assignment",
  FunctionAssignmentNode: "a function definition",
  AccessorNode: "a property access",
  IndexNode: "an index",
  ArrayNode: "a matrix",
  ObjectNode: "an object",
  BlockNode: "more than one expression",
  ConditionalNode: "a condition with ? and :; write if(c, a, b)",
  RangeNode: "a range",
  RelationalNode: "a chain of comparisons",
};

function describe(type: string): string {
  return DESCRIPTIONS[type] ?? "something that is not arithmetic";
}
