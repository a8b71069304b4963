import { z } from "zod";
import { parseParameters } from "@/api/parameters";
import { Refusal } from "@/lib/service/refusal";
import { answerPageCall, PageAnswer } from "../../../../api/_server/page-call";
import { readRecordFor } from "../../_server/read-record";
import { sheetPdf } from "../../_sheet/sheet-pdf";

interface Context {
  readonly params: Promise<{ readonly id: string }>;
}

const query = z.strictObject({ paper: z.enum(["a4", "letter"]).default("a4") });

/**
 * The printed sheet of a record: `?paper=a4` (also where nothing is said) or `?paper=letter`. Refusals are problem
 * documents; a reader of pages who is signed out is led to the sign-in and back instead.
 */
export async function GET(request: Request, { params }: Context): Promise<Response> {
  const { id } = await params;
  return answerPageCall(request, async ({ url, headers }) => {
    const { paper } = parseParameters(query, url.searchParams) as z.infer<typeof query>;
    const record = await readRecordFor(headers.get("cookie"), id);
    if (record.kind === "signed-out") {
      if (!headers.get("accept")?.includes("text/html")) {
        throw new Refusal("sign-in-required", "Sign in first; programs read records from /api/v1/records.");
      }
      return leadTo(`/sign-in?next=${encodeURIComponent(url.pathname + url.search)}`);
    }
    if (record.kind === "elsewhere") return leadTo(`/records/${record.id}/sheet.pdf${url.search}`);
    if (record.kind === "unknown") {
      throw new Refusal("not-found", "There is no record of this id or code that you may see.");
    }
    const { label, code } = record.content;
    return new Response(await sheetPdf(record.content, paper), {
      headers: {
        "Content-Type": "application/pdf",
        "Content-Disposition": disposition(label, code),
        "Cache-Control": "private, no-store",
      },
    });
  });
}

/** A redirect by path alone: behind a proxy the request does not tell the address that the reader used. */
function leadTo(path: string): PageAnswer {
  return new PageAnswer(303, { kind: "none" }, { Location: path });
}

/** How the file is called where it is kept: by the record's name, as far as file names and headers bear it. */
function disposition(label: string, code: string): string {
  // By whole characters: half of one could not be written into a header.
  const name = [
    ...label
      .replace(/[^\p{L}\p{N} ._-]+/gu, " ")
      .replace(/ +/g, " ")
      .trim(),
  ]
    .slice(0, 80)
    .join("");
  const ascii = name.replace(/[^ -~]/g, "_");
  const whole = encodeURIComponent(`${name || "Record"} ${code}.pdf`);
  return `inline; filename="${ascii || "Record"} ${code}.pdf"; filename*=UTF-8''${whole}`;
}
