import type { ComponentType } from "react";
import type { AnyTopology, PlainValues } from "#lib/circuit/index.ts";
import type { KindBrief } from "#lib/wire/kindBrief.ts";
import type { StageState } from "#lib/wire/stageState.ts";
import { later } from "../page/later.tsx";

/** What every panel is told, anew with each change on the sheet. */
export interface StagePanelProps {
  kind: KindBrief;
  topology: AnyTopology;
  /** Parts, conditions, targets, windows and series, always such that they can be computed with. */
  state: StageState;
  /** By part, where the stage stands in a voice. */
  designators: Record<string, string>;
  readOnly: boolean;
  /** Puts these parts on the sheet; the others stay. */
  apply: (parts: PlainValues) => void;
}

export interface StagePanel {
  id: string;
  name: string;
  /** In one sentence, what it answers: what a designer reads before opening it. */
  says: string;
  /** Whether it has anything to say of this topology; where left out it always has. */
  fits?: (topology: AnyTopology) => boolean;
  /** Made by `later`, so that no page fetches its code before somebody opens it. Leaving the page or closing it unmounts it. */
  View: ComponentType<StagePanelProps>;
}

/** What every stage sheet offers below its results, in this order. Adding one: its component and a line here. */
export const stagePanels: readonly StagePanel[] = [
  {
    id: "spread",
    name: "Spread and yield",
    says: "How far boards stray with the tolerances of their parts, how many of them are good, and what would make more so.",
    View: later(() => import("../spread/SpreadPanel.tsx").then((module) => module.SpreadPanel), {
      waiting: "Loading the spread…",
    }),
  },
  {
    id: "travel",
    name: "Trim",
    says: "Whether the pot reaches what it must on every board, with how much of its travel, and values that make more of it.",
    fits: ({ parts, conditions }) =>
      "rotation" in conditions && Object.values(parts).some(({ partClass }) => partClass === "pot"),
    View: later(() => import("../trim/TrimPanel.tsx").then((module) => module.TrimPanel), {
      waiting: "Loading the trim…",
    }),
  },
];
