import "server-only";
import type { Invited } from "@/lib/people/manage-people";
import type { Service } from "@/lib/service/service";

/** Who was invited; the link as well where there is no mail server to bring it. */
export function invitedAnswer({ config }: Service, { person, link }: Invited) {
  const expiresAt = new Date(link.expiresAt).toISOString();
  return {
    person,
    mailed: config.mail.kind === "smtp",
    link: config.mail.kind === "smtp" ? null : link.url,
    expiresAt,
  };
}
