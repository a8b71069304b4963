/** A shape's dimensions again and again with some of them changed, as fast as sampling and root search need it. */
import { Problems } from "../failure";
import { radiansToDegrees } from "../quantity/parse-quantity";
import type { Dimension, Dimensions, Resolved, Shape } from "./define-shape";
import {
  readDimensions,
  readDimensionValue,
  readerOf,
  sizeComplaint,
  type DimensionInput,
} from "./resolve-dimensions";

interface Varied {
  readonly input: DimensionInput;
  readonly dimension: Exclude<Dimension, { type: "choice" }>;
}

type Derivation = readonly [name: string, derive: (d: Resolved<Dimensions>) => number];

/**
 * Dimensions of one request of which the named inputs vary. The same rules as `readDimensions`, without its complaints:
 * what the shape refuses is null, and `complain` says why.
 */
export class VaryingDimensions {
  private readonly base: Readonly<Record<string, number | string>>;
  private readonly varied: readonly Varied[];
  private readonly derivations: readonly Derivation[];
  private readonly derived: readonly { readonly name: string; readonly zero: boolean }[];

  /**
   * @param given dimensions as the request names them, complete but for those of `names` that are to be found.
   * @param names inputs that vary, twins and alternatives included; quantities, numbers or whole numbers.
   */
  constructor(
    private readonly shape: Shape,
    private readonly given: Readonly<Record<string, unknown>>,
    private readonly names: readonly string[],
  ) {
    const reader = readerOf(shape);
    this.varied = names.map((name) => {
      const input = reader.inputs.get(name);
      const dimension = input && shape.dimensions[input.dimension];
      if (!dimension || dimension.type === "choice") throw new Error(`${name} of ${shape.id} cannot vary`);
      return { input, dimension };
    });
    const base: Record<string, number | string> = {};
    for (const [name, value] of Object.entries(given)) {
      const input = reader.inputs.get(name);
      if (!input || names.includes(name) || value === undefined) continue;
      const reading = readDimensionValue(shape.dimensions[input.dimension], input, value);
      // The caller reads the request first, so that a complaint about it never gets here.
      if (!("value" in reading)) throw new Error(`${name} of ${shape.id} ${reading.complaint}`);
      base[input.dimension] = reading.value;
    }
    const derivations: Derivation[] = [];
    const derived: { name: string; zero: boolean }[] = [];
    for (const group of reader.groups) {
      const known = group.names.find(
        (name) => names.includes(name) || (given[name] !== undefined && reader.inputs.has(name)),
      );
      const { defaulted } = group;
      if (known === undefined && defaulted !== undefined) {
        base[defaulted] = shape.dimensions[defaulted].default as number | string;
      }
      const own = known === undefined ? defaulted : reader.inputs.get(known)?.dimension;
      for (const name of group.dimensions) {
        const derive = group.derive[name];
        if (name !== own && derive) derivations.push([name, derive]);
        const dimension = shape.dimensions[name];
        if (dimension.type === "quantity") derived.push({ name, zero: dimension.zero === true });
      }
    }
    this.base = base;
    this.derivations = derivations;
    this.derived = derived;
  }

  /** The dimensions where the varied inputs have these values (SI, radians); null where the shape refuses them. */
  at(values: ArrayLike<number>): Resolved<Dimensions> | null {
    const found: Record<string, number | string> = { ...this.base };
    for (let k = 0; k < this.varied.length; k++) {
      const { input, dimension } = this.varied[k];
      const value = values[k] * input.factor;
      if (!Number.isFinite(value) || sizeComplaint(dimension, value, input.factor) !== null) return null;
      found[input.dimension] = value;
    }
    const resolved = found as Resolved<Dimensions>;
    for (const [name, derive] of this.derivations) found[name] = derive(resolved);
    for (const { holds } of this.shape.constraints) if (!holds(resolved)) return null;
    for (const { name, zero } of this.derived) {
      const value = found[name];
      if (typeof value !== "number" || !Number.isFinite(value) || value < 0 || (value === 0 && !zero))
        return null;
    }
    return resolved;
  }

  /** Why the shape refuses these values: complaints of `readDimensions`, or none. */
  complain(values: ArrayLike<number>): readonly { readonly pointer: string; readonly detail: string }[] {
    const problems = new Problems();
    const given: Record<string, unknown> = { ...this.given };
    for (const [k, name] of this.names.entries()) {
      const { dimension } = this.varied[k];
      const angle = dimension.type === "quantity" && dimension.kind === "angle";
      given[name] = angle ? radiansToDegrees(values[k]) : values[k];
    }
    readDimensions(this.shape, given, "#/dimensions", problems);
    return problems.list;
  }
}
