type Cell = string | number;

// A cell that opens with one of these would be taken for a formula by a spreadsheet.
const formulaStart = /^[=+\-@\t\r]/;

function printed(cell: Cell): string {
  if (typeof cell === "number") return String(cell);
  const text = formulaStart.test(cell) ? `'${cell}` : cell;
  return /[",\n\r]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}

export function csvText(rows: readonly (readonly Cell[])[]): string {
  return rows.map((row) => row.map(printed).join(",") + "\r\n").join("");
}

/** Hands the reader a CSV file of the rows; the first row names the columns. */
export function takeAwayCsv(fileName: string, rows: readonly (readonly Cell[])[]): void {
  const address = URL.createObjectURL(new Blob([csvText(rows)], { type: "text/csv;charset=utf-8" }));
  const link = document.createElement("a");
  link.href = address;
  link.download = fileName;
  link.click();
  // The download reads the address after this task has ended.
  setTimeout(() => URL.revokeObjectURL(address), 10_000);
}
