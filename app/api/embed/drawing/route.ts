import { parseBody, receiveBody } from "@/api/body";
import { z } from "zod";
import { readGeometry } from "@/app/(site)/calculate/_server/geometry";
import { embedPrincipal } from "@/lib/auth/embed-principal";
import { widgetDimensions } from "@/lib/embeds/enforce";
import { findShape, InputError } from "@/lib/engine";
import { answerFrameCall, answerFramePreflight, frameToken } from "../_server/frame-call";
import { frameDrawing } from "../_server/frame-drawing";

/** The drawing of a widget's shape for its open values; costs no computation. */
export function POST(request: Request): Promise<Response> {
  return answerFrameCall(request, async (call) => {
    const principal = await embedPrincipal(call.service, frameToken(call), call.address);
    const readers = { description: "Open values.", schema: z.unknown(), maxBytes: 20_000 };
    const body = parseBody(readers, await receiveBody(request, readers), call.url.searchParams);
    const { definition } = principal;
    const shape = findShape(definition.shape ?? "");
    const reading = shape && readGeometry(shape, widgetDimensions(definition, body));
    if (!reading?.ok)
      throw new InputError([{ pointer: "#/values", detail: "These values cannot be drawn." }]);
    return frameDrawing(definition, reading.geometry);
  });
}

export function OPTIONS(request: Request): Response {
  return answerFramePreflight(request);
}
