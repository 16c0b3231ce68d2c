/** Whether an answer is wanted as CSV: the address may say so, since a link cannot carry an Accept header. */
export function wantsCsv(request: Request, format: "json" | "csv" | undefined): boolean {
  if (format !== undefined) return format === "csv";
  const accepted = (request.headers.get("accept") ?? "").split(",").map((range) => range.split(";", 1)[0]!.trim());
  const [first] = accepted.filter((type) => type === "text/csv" || type === "application/json");
  return first === "text/csv";
}
