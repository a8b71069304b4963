import type { Material } from "./material";
import { materialStatements } from "./material-statements";

/** Materials, cautions and assumptions met on the way, each once. */
export class Collected {
  readonly used: { readonly id: string; readonly version: number; readonly name: string }[] = [];
  readonly cautions: string[] = [];
  readonly assumptions: string[] = [];

  use(material: Material): void {
    if (this.used.some(({ id }) => id === material.id)) return;
    this.used.push({ id: material.id, version: material.version, name: material.name });
    const statements = materialStatements(material);
    this.assumptions.push(...statements.assumptions);
    this.cautions.push(...statements.cautions);
  }

  caution(sentence: string): void {
    if (!this.cautions.includes(sentence)) this.cautions.push(sentence);
  }
}
