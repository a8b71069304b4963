import "server-only";
import {
  InputError,
  type Material,
  Problems,
  type Problem,
  profileKinds,
  profileSchema,
  resolveDimensions,
  type Shape,
} from "@/lib/engine";
import { flowsOf } from "./geometry";

/** A profile as a line: positions in m or degrees, values in S/m, ohm m or 1/cm³; two points at a jump. */
export interface ProfilePreview {
  readonly coordinate: string;
  readonly unit: "m" | "deg";
  readonly quantity: "conductivity" | "resistivity" | "density";
  readonly positions: readonly number[];
  readonly values: readonly number[];
  readonly cautions: readonly string[];
}

export type PreviewReading =
  | { readonly ok: true; readonly preview: ProfilePreview }
  | { readonly ok: false; readonly errors: readonly Problem[] };

interface PreviewRequest {
  readonly dimensions: Readonly<Record<string, unknown>>;
  readonly graded: { readonly coordinate?: unknown; readonly quantity?: unknown; readonly profile?: unknown };
}

/** Points along the whole range, shared among the profile's pieces. */
const POINTS = 320;
const FEWEST = 2;

/** Samples a profile over the range that its coordinate has with these dimensions. */
export function previewProfile(
  shape: Shape,
  request: PreviewRequest,
  material: (id: string) => Material | undefined,
): PreviewReading {
  const problems = new Problems();
  try {
    const resolved = resolveDimensions(shape, request.dimensions);
    const { graded } = request;
    const coordinate = shape.coordinates.find(({ name }) => name === graded.coordinate);
    const flow = flowsOf(shape, resolved).find((entry) => entry.coordinate === coordinate?.name);
    const parsed = profileSchema.safeParse(graded.profile);
    if (!coordinate || !flow || !parsed.success) return { ok: false, errors: [] };
    // A dopant profile shows what was entered: the density.
    const dopant = parsed.data.kind === "dopant";
    const profile = parsed.data.kind === "dopant" ? parsed.data.profile : parsed.data;
    const cautions: string[] = [];
    const law = profileKinds
      .find(({ kind }) => kind === profile.kind)
      ?.build(profile, {
        coordinate: coordinate.name,
        unit: coordinate.unit,
        start: flow.start,
        extent: flow.extent,
        zeroAllowed: dopant || coordinate.role === "across",
        values: dopant ? "density" : graded.quantity === "resistivity" ? "resistivity" : "conductivity",
        pointer: "#/medium/graded/profile",
        problems,
        material,
        use: () => undefined,
        caution: (sentence) => cautions.push(sentence),
      });
    if (!law) return { ok: false, errors: problems.list };
    const factor = coordinate.unit === "rad" ? 180 / Math.PI : 1;
    const positions: number[] = [];
    const values: number[] = [];
    const share = Math.max(FEWEST, Math.ceil(POINTS / law.count) + 1);
    const stride = Math.max(1, Math.ceil((law.count * FEWEST) / 4000));
    for (let piece = 0; piece < law.count; piece += stride) {
      for (let i = 0; i < share; i++) {
        const t = (law.width[piece] * i) / (share - 1);
        positions.push((flow.start + law.from[piece] + t) * factor);
        values.push(law.at(piece, t));
      }
    }
    if (!values.every(Number.isFinite)) return { ok: false, errors: [] };
    return {
      ok: true,
      preview: {
        coordinate: coordinate.name,
        unit: coordinate.unit === "rad" ? "deg" : "m",
        quantity: law.quantity,
        positions,
        values,
        cautions,
      },
    };
  } catch (error) {
    if (error instanceof InputError) return { ok: false, errors: error.errors };
    throw error;
  }
}
