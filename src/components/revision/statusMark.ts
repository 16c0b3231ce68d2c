import type { RevisionStatus } from "#lib/policy/index.ts";
import type { FigureState } from "../page/StateMark.tsx";

/** The shape and colour under which a status is shown; its word stands beside. */
export const statusMark: Record<RevisionStatus, FigureState> = {
  "in preparation": "unknown",
  "under review": "close",
  returned: "outside",
  released: "within",
  superseded: "unknown",
};
