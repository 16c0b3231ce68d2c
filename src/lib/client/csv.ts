import { csvText, type Cell } from "#lib/wire/csvText.ts";

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
