/** Where a sign-in may lead back to: a path of this site, never another address. Anything else becomes `fallback`. */
export function safeNextPath(next: string | null | undefined, fallback = "/voices"): string {
  if (!next?.startsWith("/")) return fallback;
  const base = "http://site.invalid";
  // The URL parser reads "//host", "/\host" and tabs the way a browser will, so its verdict is the one that counts.
  const url = URL.canParse(next, base) ? new URL(next, base) : null;
  if (url === null || url.origin !== base) return fallback;
  return url.pathname + url.search + url.hash;
}

/** The sign-in page that comes back to `url`. */
export function signInPath(url: URL): string {
  return `/sign-in?next=${encodeURIComponent(url.pathname + url.search)}`;
}
