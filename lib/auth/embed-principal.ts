import { embedById } from "@/db/queries/embeds";
import { embedState } from "../embeds/embed-view";
import { previewedEmbed } from "../embeds/show-embed";
import { readEmbedToken } from "../embeds/token";
import { EMBED_MINUTE_QUOTA } from "../embeds/usage";
import { Refusal } from "../service/refusal";
import type { Service } from "../service/service";
import type { EmbedPrincipal } from "./principal";

/**
 * The widget behind a token. It counts for the version that pages show now, so that a roll-back holds at once; a
 * preview in the console counts for the version it was opened with.
 */
export async function embedPrincipal(
  service: Service,
  token: string,
  address: string,
): Promise<EmbedPrincipal> {
  const { db, config } = service;
  const read = await readEmbedToken(config.secret, token, service.now());
  if (read === "expired") {
    throw new Refusal("invalid-token", "The widget's token has expired: ask for the next one.");
  }
  const row = read === "wrong" ? undefined : embedById(db, read.embedId);
  if (read === "wrong" || !row) throw new Refusal("invalid-token", "The token is not one of this service.");
  if (!read.preview && embedState(row) === "withdrawn") {
    throw new Refusal("embed-withdrawn", "This widget was withdrawn by the team that owns it.");
  }
  const shown = previewedEmbed(db, row.id, read.version);
  if (!shown || (!read.preview && row.publishedVersion !== read.version)) {
    throw new Refusal("invalid-token", "Another version of the widget is shown by now: ask for its token.");
  }
  return {
    kind: "embed",
    id: row.id,
    version: read.version,
    definition: shown.definition,
    host: read.host,
    teamId: row.teamId,
    team: row.team,
    scopes: [shown.definition.outlineId === undefined ? "compute" : "field"],
    minuteQuota: EMBED_MINUTE_QUOTA,
    monthQuota: row.monthQuota,
    address,
  };
}
