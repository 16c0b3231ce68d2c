/** How far a figure or formula can be traced. */
export type Provenance =
  /** Printed in the named place. */
  | "published"
  /** Worked out here from the network; the reference scripts check it. */
  | "derived"
  /** The trade does it so; no source is known. */
  | "common practice"
  /** Remembered, not re-read. */
  | "from memory";

export interface Citation {
  id: string;
  title: string;
  /** Chapter, section, equation or table. */
  place?: string;
  provenance: Provenance;
}

export interface Formula {
  id: string;
  /** What it gives, in words. */
  name: string;
  /** TeX, symbols as in the descriptors. */
  tex: string;
  /** Where it holds and what it leaves out. */
  holds: string;
  /** Ids of citations. */
  sources: readonly string[];
}
