import { dispatch } from "@/api/dispatch";
import { registry } from "@/api/registry";
import { sharedService } from "@/lib/service/service";

/** Hands a call over to the dispatcher: the registry decides what exists, and answers 404 and 405 itself. */
export function answer(request: Request): Promise<Response> {
  return dispatch(request, sharedService(), registry);
}
