import { createHash } from "node:crypto";

const RANDOM =
  /\b(?:(?:act|fld|mat|out|per|rec|req|sec|team)_[0-9A-Za-z]{16}|mat-[0-9a-z]{20}|k[0-9A-Za-z]{15})\b/g;
const CURSOR = /"next":"([\w-]+)"/g;
const KEY = /\brho_(k[0-9A-Za-z]{15})_[0-9A-Za-z]{43}\b/g;

/**
 * Puts sample ids in the place of random ones, the same each time, so that a document made from real calls does not
 * change by itself. Secrets are replaced by dots.
 */
export class SampleIds {
  private readonly samples = new Map<string, string>();

  /** The sample for a random id, by the order in which ids turn up. */
  of(id: string): string {
    let sample = this.samples.get(id);
    if (!sample) {
      const prefix = /^(?:[a-z]+[_-]|k)/.exec(id)?.[0] ?? "";
      const digest = createHash("sha256").update(`${prefix}${this.samples.size}`).digest("hex");
      sample = prefix + digest.slice(0, id.length - prefix.length);
      this.samples.set(id, sample);
    }
    return sample;
  }

  /** A cursor carries an id inside. */
  private cursor(text: string): string {
    const inside = Buffer.from(text, "base64url").toString("utf8");
    return Buffer.from(inside.replace(RANDOM, (id) => this.of(id))).toString("base64url");
  }

  /** A text with every random id replaced. */
  replace(text: string): string {
    return text
      .replace(CURSOR, (_, cursor: string) => `"next":"${this.cursor(cursor)}"`)
      .replace(KEY, (_, id: string) => `rho_${this.of(id)}_${"…".repeat(3)}`)
      .replace(RANDOM, (id) => this.of(id));
  }
}
