import type { StageKind } from "#lib/circuit/index.ts";

/** What a stage sheet says of its kind: sent along with the page, so that the browser need not fetch the whole kind. */
export type KindBrief = Pick<StageKind, "id" | "name" | "summary" | "telling">;

export const kindBrief = ({ id, name, summary, telling }: StageKind): KindBrief => ({ id, name, summary, telling });
