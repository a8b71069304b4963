import "server-only";
import { mayAnywhere } from "@/lib/auth/permissions";
import { currentPerson } from "../../../console/_shell/require-session";
import type { Saving } from "../_calculator/save-record";

/**
 * How the reader of a page may keep a calculation; undefined where the person's role never may.
 * @param back Path that signing in leads back to.
 */
export async function savingFor(back: string): Promise<Saving | undefined> {
  const person = await currentPerson();
  if (!person) return { kind: "sign-in", href: `/sign-in?next=${encodeURIComponent(back)}` };
  return person.team && mayAnywhere(person, "records.manage") ? { kind: "signed-in" } : undefined;
}
