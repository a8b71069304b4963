import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { teamBySlug } from "@/db/queries/teams";
import { libraryMaterials } from "@/lib/engine";
import { createMaterial, retireMaterial } from "@/lib/materials/team-materials";
import { newId } from "@/lib/service/identifier";
import { startServer, type TestServer } from "../support/server";
import { signedInCookie } from "../support/signed-in";

const OURS = `alloys-${newId("per").slice(-8).toLowerCase()}`;
const THEIRS = `others-${newId("per").slice(-8).toLowerCase()}`;

let server: TestServer;
let ours: string;
let theirs: string;
let kept: string;
let retired: string;
beforeAll(async () => {
  server = await startServer();
  const pair = ({ name, value }: { name: string; value: string }) => `${name}=${value}`;
  ours = pair(await signedInCookie(server.service, { team: OURS }));
  theirs = pair(await signedInCookie(server.service, { team: THEIRS }));
  const { db } = server.service;
  const write = {
    teamId: teamBySlug(db, OURS)?.id ?? "",
    actor: { kind: "shell" as const, id: "shell", name: "Tests", address: null, requestId: null },
    now: Date.now(),
  };
  const make = (name: string) =>
    createMaterial(db, write, {
      name,
      kind: "alloy",
      resistivity: { model: "linear", resistivity: 1e-6, coefficient: 0, reference: 20 },
      range: { from: 0, to: 100 },
      uncertainty: { lower: 0.99, upper: 1.01, note: "Invented." },
      source: "Bench, sample 4",
      provenance: "measured",
    }).id;
  kept = make("Foil of the bench");
  retired = make("Foil of last year");
  retireMaterial(db, write, retired, "any");
});
afterAll(() => server.stop());

async function offered(cookie?: string): Promise<readonly string[]> {
  const response = await fetch(`${server.base}/calculate/materials?temperature=25`, {
    headers: cookie ? { Cookie: cookie } : {},
  });
  const choices: readonly { id: string }[] = await response.json();
  return choices.map(({ id }) => id);
}

describe("the materials that pages offer", () => {
  test("are the library's and, signed in, what the team has in use", async () => {
    const library = libraryMaterials.map(({ id }) => id);
    expect(await offered()).toEqual(library);
    expect(await offered(theirs)).toEqual(library);
    expect(await offered(ours)).toEqual([...library, kept]);
  });

  test.each(["/outline", "/calculate/bar"])("stand in the page %s", async (path) => {
    const page = await (await fetch(server.base + path, { headers: { Cookie: ours } })).text();
    expect(page).toContain("Foil of the bench");
    expect(page).not.toContain("Foil of last year");
    expect(await (await fetch(server.base + path)).text()).not.toContain("Foil of the bench");
  });

  test("answer on the page as it arrives", async () => {
    const path = `/calculate/bar?width=1mm&thickness=1mm&length=1m&material=${kept}`;
    const page = await (await fetch(server.base + path, { headers: { Cookie: ours } })).text();
    // 1e-6 Ω·m · 1 m / 1 mm² = 1 Ω.
    expect(page).toMatch(/data-testid="resistance"[^>]*>1(?:\.0+)?\u2009Ω</);
  });
});
