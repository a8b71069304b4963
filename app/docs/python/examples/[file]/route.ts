import { readFile } from "node:fs/promises";
import { join } from "node:path";
import { PYTHON_EXAMPLES } from "../../../../(site)/docs/_content/client-files";

interface Context {
  readonly params: Promise<{ readonly file: string }>;
}

/** One of the scripts that come with the Python client, to put beside it. */
export async function GET(_request: Request, { params }: Context): Promise<Response> {
  const { file } = await params;
  const name = PYTHON_EXAMPLES.find((example) => example === file);
  if (name === undefined)
    return new Response(`There is no such example; there are ${PYTHON_EXAMPLES.join(", ")}.\n`, {
      status: 404,
    });
  const text = await readFile(join(process.cwd(), "sdk/python/examples", name), "utf8");
  return new Response(text, {
    headers: {
      "Content-Type": "text/x-python; charset=utf-8",
      "Content-Disposition": `attachment; filename="${name}"`,
      "Cache-Control": "no-cache",
    },
  });
}
