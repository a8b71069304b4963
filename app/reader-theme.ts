import "server-only";
import { cookies } from "next/headers";
import { THEME_COOKIE, type Theme, parseTheme } from "./_ui/theme";

/** The theme that this request's reader chose. */
export async function readerTheme(): Promise<Theme> {
  return parseTheme((await cookies()).get(THEME_COOKIE)?.value);
}
