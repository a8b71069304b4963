import "server-only";
import { cookies, headers } from "next/headers";
import { redirect } from "next/navigation";
import { cache } from "react";
import { type Action, mayAnywhere } from "@/lib/auth/permissions";
import { type SignedIn, signedInBy } from "@/lib/auth/session";
import { type Service, sharedService } from "@/lib/service/service";

/** Who is signed in, if anybody; looked up once a request. */
export const currentPerson = cache(async (): Promise<SignedIn | undefined> => {
  await cookies();
  return signedInBy(sharedService(), (await headers()).get("cookie"));
});

/**
 * The signed-in person a console page is made for. Leads to the sign-in where nobody is signed in, and to an
 * explanation where the person's role never may do `action`.
 */
export async function requireSession(
  action?: Action,
): Promise<{ readonly person: SignedIn; readonly service: Service }> {
  const person = await currentPerson();
  if (!person) redirect("/sign-in?next=%2Fconsole");
  if (action !== undefined && !mayAnywhere(person, action)) redirect("/console/no-access");
  return { person, service: sharedService() };
}
