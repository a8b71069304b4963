import { readFile } from "node:fs/promises";
import { join } from "node:path";
import { packedClient } from "../../../(site)/docs/_content/client-files";

interface Context {
  readonly params: Promise<{ readonly file: string }>;
}

/** The TypeScript client, packed by the build: `npm install` takes this address as it stands. */
export async function GET(_request: Request, { params }: Context): Promise<Response> {
  const { file } = await params;
  const name = packedClient();
  if (file !== name)
    return new Response(`There is no such client; this service has ${name}.\n`, { status: 404 });
  const content = Buffer.from(await readFile(join(process.cwd(), "dist/clients", name)));
  return new Response(content, {
    headers: {
      "Content-Type": "application/gzip",
      "Content-Disposition": `attachment; filename="${name}"`,
      "Cache-Control": "no-cache",
    },
  });
}
