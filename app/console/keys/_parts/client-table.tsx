import { DataTable } from "../../../_ui/data-table";
import { LocalTime } from "../../../_ui/local-time";
import { clientText, countText } from "../../_parts/numbers";
import type { KeyDetail } from "./key";

/** By what clients a key was called, so that it is known whom a change reaches. */
export function ClientTable({ clients }: Pick<KeyDetail, "clients">) {
  return (
    <DataTable
      caption="Clients of the last 30 days"
      rows={clients}
      rowKey={({ client }) => client}
      empty="Nothing has called with this key in the last 30 days."
      columns={[
        {
          key: "client",
          title: "Client",
          cell: ({ client }) => clientText(client),
          sortBy: ({ client }) => client,
        },
        {
          key: "requests",
          title: "Requests",
          align: "end",
          cell: ({ requests }) => countText(requests),
          sortBy: ({ requests }) => requests,
        },
        {
          key: "lastAt",
          title: "Last call",
          cell: ({ lastAt }) => <LocalTime at={lastAt} />,
          sortBy: ({ lastAt }) => lastAt,
        },
      ]}
    />
  );
}

/** The consequence of a key's end in a sentence. */
export function reachText({ clients }: Pick<KeyDetail, "clients">): string {
  if (clients.length === 0) return "Nothing has called with it in the last 30 days.";
  const names = clients
    .slice(0, 4)
    .map(({ client, requests }) => `${clientText(client)} (${countText(requests)})`);
  const more = clients.length > 4 ? ` and ${clients.length - 4} more` : "";
  return `Calls of the last 30 days came from: ${names.join(", ")}${more}.`;
}
