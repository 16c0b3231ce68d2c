import { Refusal } from "../errors.ts";

export function etagOf(version: number): string {
  return `"v${version}"`;
}

/** The versions named by If-Match or If-None-Match. A proxy that compresses may have marked them weak. */
export function versionsIn(header: string): number[] {
  return header.split(",").flatMap((tag) => {
    const match = /^\s*(?:W\/)?"v(\d{1,9})"\s*$/.exec(tag);
    return match ? [Number(match[1])] : [];
  });
}

/** The versions a save was made from. `*` would overwrite whatever is there, unseen, so it does not count as one. */
export function expectedVersions(header: string | null): number[] {
  if (header === null || header.trim() === "" || header.trim() === "*") {
    throw new Refusal(
      "precondition-required",
      "Send the ETag you last read as If-Match, so that nobody's work is overwritten unseen. Nothing was saved.",
    );
  }
  return versionsIn(header);
}
