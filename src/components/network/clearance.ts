import type { DrawnItem } from "#lib/circuit/index.ts";

export type PartItem = Extract<DrawnItem, { draw: "part" | "pot" }>;

/** How much farther than usual a part's words stand off its body: the arrow of a rheostat reaches beyond it. */
export const clearanceOf = (item: PartItem) => (item.draw === "part" && item.symbol === "rheostat" ? 6 : 0);
