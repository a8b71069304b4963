import type { Metadata } from "next";
import { ROLES, type Role } from "@/db/schema/organisation";
import { type Action, ACTIONS, PERMISSIONS, type Reach } from "@/lib/auth/permissions";
import { Breadcrumb } from "../../../_ui/breadcrumb";
import { neighbours } from "../_content/pages";
import { PageLinks } from "../_parts/page-links";

export const metadata: Metadata = { title: "Roles and permissions" };

const WORDS: Readonly<Record<Reach, string>> = { none: "no", own: "own teams", all: "all teams" };

const GROUPS: readonly { readonly about: "team" | "installation"; readonly title: string }[] = [
  { about: "team", title: "What belongs to a team" },
  { about: "installation", title: "What there is once" },
];

/** What the table says of a cell; what there is once has no teams to tell apart. */
function wordOf(action: Action, role: Role): string {
  const reach = PERMISSIONS[action][role];
  return PERMISSIONS[action].about === "installation" && reach === "all" ? "yes" : WORDS[reach];
}

export default function Permissions() {
  return (
    <>
      <Breadcrumb trail={[{ href: "/docs", label: "Docs" }]} />
      <h1>Roles and permissions</h1>
      <p className="mt-2 max-w-prose text-lead text-ink-soft">
        A person has one role in the installation and belongs to teams. The role says what may be done, the
        teams say to whose things.
      </p>
      <p className="mt-2 max-w-prose">
        This table is the one that the service asks, for pages and calls alike. What belongs to another team
        answers 404, as if it did not exist. Programs have no role: a key has scopes, and belongs to one team.
      </p>
      {GROUPS.map(({ about, title }) => (
        <section key={about} className="mt-4">
          <h2 className="text-h3">{title}</h2>
          <div tabIndex={0} role="group" aria-label={title} className="mt-1 overflow-x-auto">
            <table className="w-full border-collapse text-table">
              <caption className="sr-only">{title}</caption>
              <thead>
                <tr className="border-b border-edge">
                  <th scope="col" className="py-1 pe-2 text-start font-semibold">
                    Action
                  </th>
                  {ROLES.map((role) => (
                    <th key={role} scope="col" className="py-1 pe-2 text-start font-semibold">
                      {role}
                    </th>
                  ))}
                </tr>
              </thead>
              <tbody>
                {ACTIONS.filter((action) => PERMISSIONS[action].about === about).map((action) => (
                  <tr key={action} className="border-b border-rule align-top">
                    <th scope="row" className="py-1 pe-2 text-start font-normal">
                      {PERMISSIONS[action].title}
                    </th>
                    {ROLES.map((role) => (
                      <td key={role} className="py-1 pe-2 whitespace-nowrap">
                        {wordOf(action, role)}
                      </td>
                    ))}
                  </tr>
                ))}
              </tbody>
            </table>
          </div>
        </section>
      ))}
      <p className="mt-3 max-w-prose text-table text-ink-soft">
        The last administrator can be neither removed nor given another role. Somebody who is removed is
        signed out at once; keys, embeds, materials and records stay with their teams.
      </p>
      <PageLinks {...neighbours("/docs/permissions")} />
    </>
  );
}
