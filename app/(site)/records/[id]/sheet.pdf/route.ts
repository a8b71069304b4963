import { readRecordFor } from "../../_server/read-record";
import { sheetPdf } from "../../_sheet/sheet-pdf";

interface Context {
  readonly params: Promise<{ readonly id: string }>;
}

/** The printed sheet of a record: `?paper=a4` (also where nothing is said) or `?paper=letter`. */
export async function GET(request: Request, { params }: Context): Promise<Response> {
  const { id } = await params;
  const { pathname, searchParams, search } = new URL(request.url);
  const paper = searchParams.get("paper") ?? "a4";
  if (paper !== "a4" && paper !== "letter") return plain(400, "The paper is a4 or letter.");
  const record = await readRecordFor(request.headers.get("cookie"), id);
  if (record.kind === "signed-out") return leadTo(`/sign-in?next=${encodeURIComponent(pathname + search)}`);
  if (record.kind === "elsewhere") return leadTo(`/records/${record.id}/sheet.pdf${search}`);
  if (record.kind === "unknown") return plain(404, "There is no record under this id that you may see.");
  const { content } = record;
  // By whole characters: half of one could not be written into a header.
  const name = [
    ...content.label
      .replace(/[^\p{L}\p{N} ._-]+/gu, " ")
      .replace(/ +/g, " ")
      .trim(),
  ]
    .slice(0, 80)
    .join("");
  const ascii = name.replace(/[^ -~]/g, "_");
  return new Response(await sheetPdf(content, paper), {
    headers: {
      "Content-Type": "application/pdf",
      "Content-Disposition": `inline; filename="${ascii || "Record"} ${content.code}.pdf"; filename*=UTF-8''${encodeURIComponent(`${name || "Record"} ${content.code}.pdf`)}`,
      "Cache-Control": "private, no-store",
    },
  });
}

/** A redirect by path alone: behind a proxy the request does not tell the address that the reader used. */
function leadTo(path: string): Response {
  return new Response(null, { status: 303, headers: { Location: path } });
}

function plain(status: number, text: string): Response {
  return new Response(`${text}\n`, { status, headers: { "Content-Type": "text/plain; charset=utf-8" } });
}
