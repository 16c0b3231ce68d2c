import { formatPartValue, formatQuantity } from "../quantity/format.ts";
import { isInSeries, type ValueSeries } from "../parts/series.ts";
import type { PartClass } from "../stage/fields.ts";
import type { StageWarning } from "../voice/analyseStages.ts";
import type { Comparison } from "./compareVoices.ts";

/** `checked`: the data answers it. `look`: the data names what to look at. `open`: it stands against a release. `by hand`: no data can say. */
export type CheckState = "checked" | "look" | "open" | "by hand";

export interface CheckItem {
  id: string;
  state: CheckState;
  title: string;
  /** What the data says, one line each. */
  details: string[];
}

export interface Reviewed {
  comparison: Comparison;
  reason: string;
  /** All warnings of the newer side, and whether its author accepted each. */
  warnings: readonly (StageWarning & { accepted: boolean })[];
  /** Names of the newer side's stages by id. */
  stageNames: Readonly<Record<string, string>>;
  /** Threads of discussion that are not resolved. */
  openThreads: number;
}

/** What the trade checks between two revisions, each point answered from data as far as data can. */
export function reviewChecklist(reviewed: Reviewed): CheckItem[] {
  return [
    valuesHaveReason(reviewed),
    resultsHeld(reviewed),
    changedElsewhere(reviewed),
    warningsAccepted(reviewed),
    netUnchanged(reviewed),
    newUniqueValues(reviewed),
    seriesKept(reviewed),
    supplyInWindow(reviewed),
    nothingClips(reviewed),
    discussionClosed(reviewed),
    {
      ...{
        id: "measurements",
        state: "by hand",
        title: "Measurements taken on earlier hardware do not vouch for these values",
      },
      details: ["Measurements belong to the revision they were taken on; none is carried over by itself."],
    },
    {
      ...{ id: "geometry", state: "by hand", title: "Panel and board still fit: holes, pot laws, knobs, printing" },
      details: ["Look at the panel drawing and the silkscreen against the changed parts above."],
    },
  ];
}

const name = ({ stageNames }: Reviewed, stage: string) => stageNames[stage] ?? stage;

function valuesHaveReason({ comparison: { parts, targets }, reason }: Reviewed): CheckItem {
  const count = parts.length + targets.length;
  return {
    ...{ id: "reason", state: "checked", title: "Every changed value has a reason" },
    details: [count === 0 ? "No value changed." : `${count} changed, all for: “${reason}”`],
  };
}

function resultsHeld(reviewed: Reviewed): CheckItem {
  const worse = reviewed.comparison.results.filter(({ verdict }) => verdict === "worse");
  const details = worse.map(({ stage, label, to, unit, states }) => {
    const figure = typeof to === "number" ? formatQuantity(to, unit) : "no figure";
    return `${name(reviewed, stage)}: ${label} is now ${figure}, ${states?.to ?? "outside"}`;
  });
  const outside = worse.some(({ states }) => states?.to === "outside");
  const title = "No result got worse against its window";
  return { id: "results", state: worse.length === 0 ? "checked" : outside ? "open" : "look", title, details };
}

/** A stage nobody touched whose figures moved all the same: the change that is easiest to miss. */
function changedElsewhere(reviewed: Reviewed): CheckItem {
  const untouched = reviewed.comparison.stages.changed.filter(
    ({ parts, targets, conditions, results, topologyBefore }) =>
      results > 0 && parts + targets + conditions === 0 && topologyBefore === undefined,
  );
  const crossed = untouched.filter(({ stage }) =>
    reviewed.comparison.results.some((result) => result.stage === stage && result.verdict === "worse"),
  );
  return {
    id: "elsewhere",
    state: crossed.length > 0 ? "open" : untouched.length > 0 ? "look" : "checked",
    title: "No result crossed its window because of a change elsewhere",
    details: untouched.map(({ name: stage, results }) => `${stage}: ${results} figures moved, none of its values did`),
  };
}

function warningsAccepted(reviewed: Reviewed): CheckItem {
  const weighty = reviewed.warnings.filter(({ severity }) => severity !== "note");
  const open = weighty.filter(({ accepted }) => !accepted);
  const lines = [...open, ...weighty.filter(({ accepted }) => accepted)].map(
    ({ stage, message, accepted }) => `${name(reviewed, stage)}${accepted ? ", accepted" : ""}: ${message}`,
  );
  const fault = open.some(({ severity }) => severity === "fault");
  const title = "Every warning that stands has been accepted";
  return { id: "warnings", state: open.length === 0 ? "checked" : fault ? "open" : "look", title, details: lines };
}

function netUnchanged(reviewed: Reviewed): CheckItem {
  const { links, parts, stages } = reviewed.comparison;
  const renumbered = parts.filter(({ designatorBefore }) => designatorBefore !== undefined);
  const nets = stages.changed.filter(({ topologyBefore }) => topologyBefore !== undefined);
  const details = [
    ...nets.map((stage) => `${stage.name}: ${stage.topologyBefore} became ${stage.topology}`),
    ...stages.added.map((stage) => `${stage.name} was added`),
    ...stages.removed.map((stage) => `${stage.name} was removed`),
    ...renumbered.map(({ designator, designatorBefore }) => `${designatorBefore || "unnumbered"} is now ${designator}`),
    ...(links.added.length + links.removed.length > 0
      ? [`Links: ${links.added.length} new, ${links.removed.length} gone`]
      : []),
  ];
  const title = "Nets and designators are those of the board: the swap trap";
  return { id: "nets", state: details.length === 0 ? "checked" : "look", title, details };
}

function newUniqueValues({ comparison }: Reviewed): CheckItem {
  const unique = comparison.quantities.filter(({ newUnique }) => newUnique);
  const details = unique.map(
    ({ value, unit, partClass }) => `${formatPartValue(value, unit)}, ${partClass}, is used once`,
  );
  const title = "No new part value that is used only once";
  return { id: "unique", state: unique.length === 0 ? "checked" : "look", title, details };
}

/** What is stocked without asking: closer steps only where a figure needs them. */
const ordinary: Record<PartClass, ValueSeries> = { resistor: "E24", capacitor: "E12", pot: "pots" };

/** A value outside the ordinary series where the old one was inside, and so could have stayed. */
function seriesKept(reviewed: Reviewed): CheckItem {
  const left = reviewed.comparison.parts.filter(
    ({ from, to, partClass }) =>
      to !== undefined &&
      !isInSeries(to, ordinary[partClass]) &&
      (from === undefined || isInSeries(from, ordinary[partClass])),
  );
  const details = left.map(
    ({ designator, label, to, unit, partClass }) =>
      `${designator || label}: ${formatPartValue(to!, unit)} is not in ${partClass === "pot" ? "the usual pot values" : ordinary[partClass]}`,
  );
  const title = "No value left the ordinary series without need";
  return { id: "series", state: left.length === 0 ? "checked" : "look", title, details };
}

/** The window is that of the older side: it is what the bench still expects. */
function supplyInWindow({ comparison: { supply } }: Reviewed): CheckItem {
  const title = "Supply stays inside the first-power window";
  if (!supply)
    return { id: "supply", state: "by hand", title, details: ["There is no earlier budget to compare with."] };
  const outside = (["positive", "negative"] as const).filter((rail) => {
    const { to, windowLow, windowHigh } = supply[rail];
    return to < windowLow || to > windowHigh;
  });
  const details = outside.map((rail) => {
    const { to, windowLow, windowHigh } = supply[rail];
    const window = `${formatQuantity(windowLow, "A")} to ${formatQuantity(windowHigh, "A")}`;
    return `${rail} rail: ${formatQuantity(to, "A")}, window so far ${window}`;
  });
  return { id: "supply", state: outside.length === 0 ? "checked" : "look", title, details };
}

function nothingClips(reviewed: Reviewed): CheckItem {
  const clipping = reviewed.comparison.levels.filter(({ to }) => to !== undefined && (to.headroomDb ?? 0) < 0);
  const details = clipping.map(
    ({ stage, label, from, to }) =>
      `${name(reviewed, stage)}, ${label}: headroom ${formatQuantity(to!.headroomDb!, "dB")}${
        from?.headroomDb === undefined ? "" : `, before ${formatQuantity(from.headroomDb, "dB")}`
      }`,
  );
  const title = "No level that changed clips";
  return { id: "levels", state: clipping.length === 0 ? "checked" : "open", title, details };
}

function discussionClosed({ openThreads }: Reviewed): CheckItem {
  const details =
    openThreads === 0 ? [] : [`${openThreads} ${openThreads === 1 ? "thread is" : "threads are"} not resolved`];
  const title = "What was asked has been answered";
  return { id: "discussion", state: openThreads === 0 ? "checked" : "open", title, details };
}
