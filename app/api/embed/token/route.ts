import { renewEmbedToken } from "@/lib/embeds/renew-token";
import { answerFrameCall, answerFramePreflight, frameToken } from "../_server/frame-call";

/** The next token of a widget's frame, for the one it has. */
export function POST(request: Request): Promise<Response> {
  return answerFrameCall(request, (call) => renewEmbedToken(call.service, frameToken(call), call.now));
}

export function OPTIONS(request: Request): Response {
  return answerFramePreflight(request);
}
