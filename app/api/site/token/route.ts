import { answerSiteToken } from "@/api/site-token";
import { sharedService } from "@/lib/service/service";

/** The token of signed-out pages. */
export function POST(request: Request): Promise<Response> {
  return answerSiteToken(request, sharedService());
}
