import { ESLint } from "eslint";
import { describe, expect, it } from "vitest";

const eslint = new ESLint();

/** What the import rules say of one import in a file at that place. */
async function complaints(file: string, statement: string): Promise<string[]> {
  const [result] = await eslint.lintText(`${statement}\n`, { filePath: file });
  return result.messages.flatMap(({ ruleId }) => (ruleId?.startsWith("import-x/") ? [ruleId] : []));
}

const FORBIDDEN = [
  ["lib/engine/shape/x.ts", 'import { sharedDatabase } from "@/db/client"; sharedDatabase("");'],
  ["lib/engine/shape/x.ts", 'import { readConfig } from "@/lib/config/environment"; readConfig({});'],
  ["lib/auth/x.ts", 'import { dispatch } from "@/api/dispatch"; void dispatch;'],
  ["lib/auth/x.ts", 'import { migrateDatabase } from "@/lib/cli/migrate"; void migrateDatabase;'],
  ["db/queries/x.ts", 'import { readConfig } from "@/lib/config/environment"; readConfig({});'],
  ["db/schema/x.ts", 'import { registry } from "@/api/registry"; void registry;'],
  ["api/x.ts", 'import { Mark } from "@/app/_ui/site/mark"; void Mark;'],
  ["api/x.ts", 'import { seedDemo } from "@/db/seed"; void seedDemo;'],
  ["api/x.ts", 'import { createApiServer } from "@/lib/cli/api-server"; void createApiServer;'],
  ["app/_ui/x.ts", 'import { PROBLEMS } from "@/api/problem"; void PROBLEMS;'],
  ["app/_ui/x.ts", 'import { sharedDatabase } from "@/db/client"; void sharedDatabase;'],
  ["app/_ui/x.ts", 'import { sharedService } from "@/lib/service/service"; void sharedService;'],
  ["app/x.ts", 'import { createApiServer } from "@/lib/cli/api-server"; void createApiServer;'],
  ["app/x.ts", 'import { rhoform } from "@/sdk/typescript/src/rhoform"; void rhoform;'],
  ["sdk/typescript/src/x.ts", 'import { parseQuantity } from "@/lib/engine"; void parseQuantity;'],
  ["lib/cli/x.ts", 'import { Mark } from "@/app/_ui/site/mark"; void Mark;'],
] as const;

const ALLOWED = [
  ["app/x.ts", 'import { PROBLEMS } from "@/api/problem"; void PROBLEMS;'],
  ["app/_ui/x.ts", 'import { rectangle } from "@/lib/engine/shape/drawing"; void rectangle;'],
  ["api/x.ts", 'import { sharedService } from "@/lib/service/service"; void sharedService;'],
  ["lib/auth/x.ts", 'import { sharedDatabase } from "@/db/client"; void sharedDatabase;'],
  ["db/queries/x.ts", 'import type { Material } from "@/lib/engine"; export type { Material };'],
  ["lib/engine/shape/x.ts", 'import { InputError } from "../failure"; void InputError;'],
  ["lib/cli/x.ts", 'import { seedDemo } from "@/db/seed"; void seedDemo;'],
] as const;

describe("import directions", () => {
  it.each(FORBIDDEN)("%s may not: %s", async (file, statement) => {
    expect(await complaints(file, statement)).toContain("import-x/no-restricted-paths");
  });

  it.each(ALLOWED)("%s may: %s", async (file, statement) => {
    expect(await complaints(file, statement)).toEqual([]);
  });
});

describe("cycles", () => {
  it("are errors", async () => {
    const results = await new ESLint({ ignore: false }).lintFiles("tests/fixtures/cycle/*.ts");
    expect(results.map(({ messages }) => messages.map(({ ruleId }) => ruleId))).toEqual([
      ["import-x/no-cycle"],
      ["import-x/no-cycle"],
    ]);
  });
});
