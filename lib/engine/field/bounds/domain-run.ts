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
  const { mesh } = meshDomain(domain);
  const revolution = domain.axisymmetric;
  return solveAdaptively({ ...rest, mesh, revolution, reference: new BoundaryReference(domain, mesh) });
}
