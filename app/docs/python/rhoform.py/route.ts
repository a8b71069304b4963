import { readFile } from "node:fs/promises";
import { join } from "node:path";

/** The Python client, one file to put beside a script. */
export async function GET(): Promise<Response> {
  const text = await readFile(join(process.cwd(), "sdk/python/rhoform.py"), "utf8");
  return new Response(text, {
    headers: {
      "Content-Type": "text/x-python; charset=utf-8",
      "Content-Disposition": 'attachment; filename="rhoform.py"',
      "Cache-Control": "no-cache",
    },
  });
}
