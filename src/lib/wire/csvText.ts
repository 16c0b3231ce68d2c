export type Cell = string | number;

// A cell that opens with one of these would be taken for a formula by a spreadsheet.
const formulaStart = /^[=+\-@\t\r]/;

function printed(cell: Cell): string {
  if (typeof cell === "number") return String(cell);
  const text = formulaStart.test(cell) ? `'${cell}` : cell;
  return /[",\n\r]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}

/** Rows as a spreadsheet reads them (RFC 4180); the first row names the columns. */
export function csvText(rows: readonly (readonly Cell[])[]): string {
  return rows.map((row) => row.map(printed).join(",") + "\r\n").join("");
}
