/** A stored moment as every list and title block prints it; the zone is named by whoever shows it. */
export function savedTime(moment: string): string {
  return moment.slice(0, 16).replace("T", " ");
}

export function savedDay(moment: string): string {
  return moment.slice(0, 10);
}
