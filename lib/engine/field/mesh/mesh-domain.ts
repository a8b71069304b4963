import type { Domain } from "../outline/domain";
import { FROZEN, spanChannels } from "./channels";
import type { FieldMesh } from "./mesh";
import { carveDomain, triangulateGraph } from "./planar-graph";
import { refineQuality, type MeshStatus, type QualityOptions } from "./quality";
import { nextEdge, type Triangulation } from "./triangulation";

export interface MeshedDomain {
  readonly mesh: FieldMesh;
  readonly status: MeshStatus;
}

export interface MeshOptions extends Partial<QualityOptions> {
  /**
   * Span long straight stretches between parallel borders by single cells (default true). Only where the medium is
   * uniform is the field nearly linear there; for one that varies along the stretch, say false.
   */
  readonly spanChannels?: boolean;
}

/**
 * The first mesh of a domain: constrained Delaunay, refined to the smallest angle asked for (default 20°), except at sharper
 * corners of the outline itself and in spanned channels, whose triangles have one angle near 90° instead. The
 * allowance of vertices defaults to 30,000 plus ten for each point of the domain; running into it is a status.
 */
export function meshDomain(domain: Domain, options: MeshOptions = {}): MeshedDomain {
  const triangulation = triangulateGraph(domain);
  carveDomain(triangulation, domain);
  const firstMark = domain.segmentSide.length + 1;
  const cuts =
    options.spanChannels === false ? [] : spanChannels(triangulation, firstMark, domain.axisymmetric);
  const segments = new Int32Array(domain.segments.length + cuts.length);
  segments.set(domain.segments);
  segments.set(cuts, domain.segments.length);
  const status = refineQuality(triangulation, segments, {
    minimumAngleDeg: options.minimumAngleDeg ?? 20,
    maximumVertices: options.maximumVertices ?? 30_000 + 5 * domain.xy.length,
  });
  return { mesh: extractMesh(triangulation, domain), status };
}

function extractMesh(source: Triangulation, domain: Domain): FieldMesh {
  const { corner, label, xy } = source;
  const number = new Int32Array(source.vertexCount).fill(-1);
  let triangleCount = 0;
  for (let t = 0; t < source.triangleSlots; t++) if (corner[3 * t] >= 0) triangleCount++;
  const triangles = new Int32Array(3 * triangleCount);
  const region = new Int32Array(triangleCount);
  const points = new Float64Array(2 * source.vertexCount);
  let vertexCount = 0;
  let k = 0;
  for (let t = 0; t < source.triangleSlots; t++) {
    if (corner[3 * t] < 0) continue;
    const first = oppositeLongest(xy, corner, t);
    for (let i = 0; i < 3; i++) {
      const v = corner[3 * t + ((first + i) % 3)];
      if (number[v] < 0) {
        points[2 * vertexCount] = xy[2 * v];
        points[2 * vertexCount + 1] = xy[2 * v + 1];
        number[v] = vertexCount++;
      }
      triangles[3 * k + i] = number[v];
    }
    region[k++] = label[t] & (FROZEN - 1);
  }
  return {
    xy: points.slice(0, 2 * vertexCount),
    triangles,
    region,
    boundary: boundaryInOrder(source, domain, number, vertexCount),
    sides: domain.sides,
  };
}

/** Which corner of triangle t lies opposite its longest edge. */
function oppositeLongest(xy: Float64Array, corner: Int32Array, t: number): number {
  let best = 0;
  let longest = -1;
  for (let i = 0; i < 3; i++) {
    const a = corner[3 * t + ((i + 1) % 3)];
    const b = corner[3 * t + ((i + 2) % 3)];
    const length = Math.hypot(xy[2 * b] - xy[2 * a], xy[2 * b + 1] - xy[2 * a + 1]);
    if (length > longest) {
      longest = length;
      best = i;
    }
  }
  return best;
}

/** Boundary edges, side after side, each side's edges in the direction of its ring. */
function boundaryInOrder(
  source: Triangulation,
  domain: Domain,
  number: Int32Array,
  vertexCount: number,
): Int32Array {
  const { corner, twin, mark } = source;
  const next = new Int32Array(vertexCount).fill(-1);
  const side = new Int32Array(vertexCount);
  const sideBefore = new Int32Array(vertexCount).fill(-1);
  let count = 0;
  for (let h = 0; h < 3 * source.triangleSlots; h++) {
    if (corner[h] < 0 || twin[h] >= 0) continue;
    const a = number[corner[h]];
    const b = number[corner[nextEdge(h)]];
    next[a] = b;
    side[a] = domain.segmentSide[mark[h] - 1];
    sideBefore[b] = side[a];
    count++;
  }
  const starts = new Int32Array(domain.sides.length).fill(-1);
  for (let v = 0; v < vertexCount; v++) {
    if (next[v] < 0) continue;
    // A side that is a whole ring has no end; then any of its vertices will do.
    if (sideBefore[v] !== side[v] || starts[side[v]] < 0) starts[side[v]] = v;
  }
  const boundary = new Int32Array(3 * count);
  let k = 0;
  for (let s = 0; s < starts.length; s++) {
    let v = starts[s];
    if (v < 0) continue;
    do {
      boundary[3 * k] = v;
      boundary[3 * k + 1] = next[v];
      boundary[3 * k + 2] = s;
      k++;
      v = next[v];
    } while (side[v] === s && v !== starts[s]);
  }
  return boundary;
}
