const everywhere: Record<string, string> = {
  "x-content-type-options": "nosniff",
  "x-frame-options": "DENY",
  "referrer-policy": "strict-origin-when-cross-origin",
  "cross-origin-opener-policy": "same-origin",
  "permissions-policy": "camera=(), geolocation=(), microphone=(), payment=(), usb=()",
};

/** What Astro cannot know about: it writes script and style sources with their hashes, these close the rest. */
const pagePolicy = ["frame-ancestors 'none'", "base-uri 'self'", "form-action 'self'", "object-src 'none'"];

/** Adds the headers that hold for every answer; a page keeps the content security policy it was rendered with. */
export function secureHeaders(headers: Headers, { https }: { https: boolean }): void {
  for (const [name, value] of Object.entries(everywhere)) if (!headers.has(name)) headers.set(name, value);
  if (https) headers.set("strict-transport-security", "max-age=31536000");
  const isPage = headers.get("content-type")?.startsWith("text/html") ?? false;
  if (!isPage) {
    if (!headers.has("content-security-policy")) {
      headers.set("content-security-policy", "default-src 'none'; frame-ancestors 'none'");
    }
    return;
  }
  const rendered = headers.get("content-security-policy")?.replace(/;\s*$/, "");
  const missing = pagePolicy.filter((directive) => !rendered?.includes(directive.split(" ")[0] ?? directive));
  headers.set("content-security-policy", [...(rendered ? [rendered] : []), ...missing].join("; "));
}
