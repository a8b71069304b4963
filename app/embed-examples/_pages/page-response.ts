/** A document of the examples with its policy; none of them may be framed. */
export function page(body: string, status: number, policy: string): Response {
  return new Response(body, {
    status,
    headers: {
      "Content-Type": "text/html; charset=utf-8",
      "Cache-Control": "no-store",
      "Content-Security-Policy": `${policy}; frame-ancestors 'none'`,
      "X-Content-Type-Options": "nosniff",
      "Referrer-Policy": "strict-origin-when-cross-origin",
    },
  });
}

export function newNonce(): string {
  return crypto.randomUUID().replaceAll("-", "");
}

/** What a page of the examples needs where it has no policy of its own. */
export function usualPolicy(nonce: string): string {
  return `default-src 'self'; style-src 'nonce-${nonce}'; script-src 'self' 'nonce-${nonce}'`;
}
