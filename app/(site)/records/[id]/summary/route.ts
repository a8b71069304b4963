import { Refusal } from "@/lib/service/refusal";
import { answerPageCall } from "../../../../api/_server/page-call";
import { summaryFor } from "../../_server/record-summary";

interface Context {
  readonly params: Promise<{ readonly id: string }>;
}

/** What a page tells of a record that it has just stored: its code and whose it is. */
export async function GET(request: Request, { params }: Context): Promise<Response> {
  const { id } = await params;
  return answerPageCall(request, async ({ service, headers }) => {
    const summary = await summaryFor(service, headers.get("cookie"), id);
    if (summary === "signed-out") throw new Refusal("sign-in-required", "Sign in first.");
    if (!summary) throw new Refusal("not-found", "There is no record of this id that you may see.");
    return summary;
  });
}
