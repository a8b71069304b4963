import type { DocPage } from "./page";

export const versioning: DocPage = {
  slug: "versioning",
  title: "Versioning",
  summary: "What stays the same, what may be added, and how a changed number is told.",
  sections: ({ origin }) => [
    {
      id: "api",
      title: "The API",
      blocks: [
        "The version is part of the address, `/api/v1`. Within it members are added and none is removed, renamed or given another meaning; a client must ignore members it does not know. New codes of problems and new values of enumerations count as additions.",
        "The contract is the [OpenAPI document](/api/v1/openapi.json), made from the very schemas that check requests.",
      ],
    },
    {
      id: "engine",
      title: "The engine",
      blocks: [
        "Every result and every record names the `engine` and the `catalogue` that made it. A change of any number by more than its bounds raises the engine’s major version and has an entry in the [changelog](/docs/changelog). To see what an update means for your parts, [replay your records](/docs/records#replay).",
        {
          snippets: [
            {
              language: "sh",
              label: "the versions that answer now",
              code: `curl -s ${origin}/api/v1/health`,
              prints: "engine",
            },
          ],
        },
      ],
    },
    {
      id: "clients",
      title: "The clients",
      blocks: [
        "Both clients leave out of their types what the service added after them and keep working. They carry the version of the service they were made from.",
      ],
    },
  ],
};
