/** Whether a page of that origin is one of our own: the configured origin, or the very host it called. */
export function isOwnOrigin(origin: string, headers: Headers, configured: string): boolean {
  if (origin === configured) return true;
  try {
    return new URL(origin).host === headers.get("host");
  } catch {
    return false;
  }
}
