/** A path of our own that a sign-in may lead on to; anything else, another site's address above all, is the console. */
export function ownPath(wanted: string | null | undefined, fallback = "/console"): string {
  if (!wanted || wanted.length > 2000 || !/^\/(?![/\\])[\x21-\x7e]*$/.test(wanted) || wanted.includes("\\")) {
    return fallback;
  }
  try {
    const here = "http://own.invalid";
    const url = new URL(wanted, here);
    if (url.origin !== here || url.pathname.startsWith("/api/")) return fallback;
    return url.pathname + url.search + url.hash;
  } catch {
    return fallback;
  }
}
