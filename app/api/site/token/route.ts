import { answerSiteToken } from "@/api/site-token";
import { sharedService } from "@/lib/service/service";

/** The token with which pages call the API. */
export function POST(request: Request): Promise<Response> {
  return answerSiteToken(request, sharedService());
}
