/** Unlike randomUUID, this also works where the page is not served over TLS. */
export function newStageId(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(12));
  return `s-${[...bytes].map((byte) => byte.toString(16).padStart(2, "0")).join("")}`;
}
