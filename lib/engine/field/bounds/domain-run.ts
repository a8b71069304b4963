/** One domain from its first mesh to a bracket. */

import type { MediumList } from "../assembly/medium";
import { meshDomain } from "../mesh/mesh-domain";
import type { Domain } from "../outline/domain";
import { solveAdaptively, type AdaptiveLimits, type AdaptiveProgress, type AdaptiveResult } from "./adaptive";
import { BoundaryReference } from "./displacement";

export interface DomainRun {
  readonly domain: Domain;
  readonly medium: MediumList;
  readonly terminalCount: number;
  readonly accuracy: number;
  readonly limits: AdaptiveLimits;
  readonly onProgress?: (progress: AdaptiveProgress) => void;
}

export function solveDomain(run: DomainRun): AdaptiveResult {
  const { domain, ...rest } = run;
  // A medium that is a function may vary along a stretch, all the more in narrow parts; a body of revolution always has one.
  const spanChannels = domain.axisymmetric || run.medium.every((m) => typeof m === "number");
  const { mesh } = meshDomain(domain, { spanChannels });
  const revolution = domain.axisymmetric;
  return solveAdaptively({ ...rest, mesh, revolution, reference: new BoundaryReference(domain, mesh) });
}
