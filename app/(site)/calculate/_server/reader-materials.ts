import "server-only";
import { libraryMaterial, libraryMaterials, type Material } from "@/lib/engine";
import { teamMaterialsInUse } from "@/lib/materials/team-materials";
import { sharedService } from "@/lib/service/service";
import { currentPerson } from "../../../console/_shell/require-session";

export interface ReaderMaterials {
  /** The library's first. */
  readonly all: readonly Material[];
  readonly find: (id: string) => Material | undefined;
}

/** What the reader of a page may choose from: the library and, signed in, what the team has in use. */
export async function readerMaterials(): Promise<ReaderMaterials> {
  const team = (await currentPerson())?.team;
  const own = team ? teamMaterialsInUse(sharedService().db, team.id) : [];
  return {
    all: [...libraryMaterials, ...own],
    find: (id) => libraryMaterial(id) ?? own.find((material) => material.id === id),
  };
}
