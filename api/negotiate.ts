import { Refusal } from "@/lib/service/refusal";

interface Range {
  readonly type: string;
  readonly quality: number;
}

function ranges(header: string): Range[] {
  return header
    .split(",")
    .map((part) => {
      const [type, ...parameters] = part.split(";").map((piece) => piece.trim().toLowerCase());
      const quality = Number(parameters.find((parameter) => parameter.startsWith("q="))?.slice(2) ?? "1");
      return { type, quality: Number.isFinite(quality) ? quality : 0 };
    })
    .filter(({ type }) => type !== "");
}

/** How much a client wants a media type: the most specific range that matches it decides (RFC 9110, 12.5.1). */
function qualityOf(mediaType: string, wanted: readonly Range[]): number {
  const group = `${mediaType.split("/")[0]}/*`;
  for (const type of [mediaType, group, "*/*"]) {
    const range = wanted.find((entry) => entry.type === type);
    if (range) return range.quality;
  }
  return 0;
}

/**
 * The media type to answer with. `format=` names one by the last part of its name (`text` for text/plain) and goes
 * before the Accept header. Throws a Refusal of 406 where nothing fits.
 */
export function negotiate(produces: readonly string[], headers: Headers, query: URLSearchParams): string {
  const format = query.get("format");
  if (format !== null) {
    const named = produces.find((type) => formatName(type) === format);
    if (named) return named;
    const detail = `must be one of ${produces.map(formatName).join(", ")}.`;
    throw new Refusal("invalid-input", `The parameter format ${detail}`, {
      errors: [{ parameter: "format", detail }],
    });
  }
  const accept = headers.get("accept");
  if (accept === null || accept.trim() === "") return produces[0];
  const wanted = ranges(accept);
  let best: { type: string; quality: number } | undefined;
  for (const type of produces) {
    const quality = qualityOf(type, wanted);
    if (quality > 0 && quality > (best?.quality ?? 0)) best = { type, quality };
  }
  if (!best) throw new Refusal("not-acceptable", `This call answers with ${produces.join(" or ")}.`);
  return best.type;
}

function formatName(mediaType: string): string {
  return mediaType === "text/plain" ? "text" : mediaType.split("/")[1];
}
