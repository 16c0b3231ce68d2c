/** Whether an answer is wanted as CSV: the address may say so, since a link cannot carry an Accept header. */
export function wantsCsv(request: Request, format: "json" | "csv" | undefined): boolean {
  if (format !== undefined) return format === "csv";
  const accepted = (request.headers.get("accept") ?? "").split(",").map((range) => range.split(";", 1)[0]!.trim());
  const [first] = accepted.filter((type) => type === "text/csv" || type === "application/json");
  return first === "text/csv";
}

/** Whether a page's address is asked for its data, as a script would. */
export function wantsJson(request: Request, format: string | null): boolean {
  if (format !== null) return format === "json";
  const accept = request.headers.get("accept") ?? "";
  return accept.includes("application/json") && !accept.includes("text/html");
}
