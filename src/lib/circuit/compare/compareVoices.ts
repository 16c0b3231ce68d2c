import type { StageKind } from "../stage/kind.ts";
import type { VoiceAnalysis } from "../voice/analyseStages.ts";
import { topologyOf, type DocumentLink, type DocumentStage, type VoiceDocument } from "../voice/document.ts";
import { differs, overlaidCurves, type CurvePair } from "./curves.ts";
import { changedLevels, type LevelChange } from "./levels.ts";
import { pairStages } from "./pairStages.ts";
import { changedQuantities, type QuantityChange } from "./quantities.ts";
import { changedResults, type ResultChange } from "./results.ts";
import { changedSupply, type SupplyChange } from "./supply.ts";
import { changedConditions, changedParts, changedTargets, type PartChange, type SettingChange } from "./values.ts";
import { changedWarnings, type WarningChanges } from "./warnings.ts";

/** One side: a document and what was computed of it when it was kept. */
export interface ComparedSide {
  document: VoiceDocument;
  analysis: VoiceAnalysis;
}

export interface StageName {
  stage: string;
  name: string;
  kind: string;
  topology: string;
}

export interface ChangedStage extends StageName {
  /** Where it was called something else. */
  nameBefore?: string;
  topologyBefore?: string;
  parts: number;
  targets: number;
  conditions: number;
  results: number;
}

export interface Comparison {
  stages: { added: StageName[]; removed: StageName[]; changed: ChangedStage[]; unchanged: number };
  parts: PartChange[];
  targets: SettingChange[];
  conditions: SettingChange[];
  results: ResultChange[];
  warnings: WarningChanges;
  links: { added: DocumentLink[]; removed: DocumentLink[] };
  quantities: QuantityChange[];
  levels: LevelChange[];
  /** Absent where a side was kept without it, or is nothing. */
  supply?: SupplyChange;
  curves: CurvePair[];
}

export interface CompareOptions {
  kinds: readonly StageKind[];
  /** Two states of one voice, whose stages keep their ids. */
  ofOneVoice?: boolean;
  /** Which curves to lay over one another: those that differ, those of one stage, or none. */
  curves?: "changed" | "none" | { stage: string };
}

/** What changed from one state of a voice to another, and what it does. Pure. */
export function compareVoices(from: ComparedSide, to: ComparedSide, options: CompareOptions): Comparison {
  const { kinds, ofOneVoice = true, curves = "changed" } = options;
  const { added, removed, kept } = pairStages(from.document, to.document, ofOneVoice);
  const pairs = kept.map((pair) => compareStage(pair, from.analysis, to.analysis, kinds));
  // Warnings are told apart by the ids of the newer side.
  const renamed = new Map(kept.map((pair) => [pair.from.id, pair.to.id]));
  const oldWarnings = from.analysis.warnings.map((w) => ({ ...w, stage: renamed.get(w.stage) ?? w.stage }));
  const lone = (stage: DocumentStage, side: "from" | "to") =>
    changedParts({
      from: side === "from" ? stage : undefined,
      to: side === "to" ? stage : undefined,
      fromTopology: side === "from" ? topologyOf(kinds, stage) : undefined,
      toTopology: side === "to" ? topologyOf(kinds, stage) : undefined,
    });
  return {
    stages: {
      added: added.map(named),
      removed: removed.map(named),
      changed: pairs.flatMap(({ changed }) => (changed ? [changed] : [])),
      unchanged: pairs.filter(({ changed }) => !changed).length,
    },
    parts: [
      ...pairs.flatMap(({ parts }) => parts),
      ...added.flatMap((stage) => lone(stage, "to")),
      ...removed.flatMap((stage) => lone(stage, "from")),
    ],
    targets: pairs.flatMap(({ targets }) => targets),
    conditions: [...pairs.flatMap(({ conditions }) => conditions), ...voiceConditions(from.document, to.document)],
    results: pairs.flatMap(({ results }) => results),
    warnings: changedWarnings(oldWarnings, to.analysis.warnings),
    links: changedLinks(from.document.links, to.document.links, renamed),
    quantities: changedQuantities(from.document, to.document, kinds),
    levels: changedLevels(from.analysis.levels, to.analysis.levels, renamed),
    ...changedSupply(from.analysis.supply, to.analysis.supply),
    curves: pairs.flatMap((pair) => curvesOf(pair, curves)),
  };
}

const named = ({ id, name, kind, topology }: DocumentStage): StageName => ({ stage: id, name, kind, topology });

type Compared = ReturnType<typeof compareStage>;

function compareStage(
  { from, to }: { from: DocumentStage; to: DocumentStage },
  before: VoiceAnalysis,
  now: VoiceAnalysis,
  kinds: readonly StageKind[],
) {
  const fromTopology = topologyOf(kinds, from);
  const toTopology = topologyOf(kinds, to);
  const sides = { from, to, fromTopology, toTopology };
  const parts = changedParts(sides);
  const targets = changedTargets(sides);
  const [fromComputed, toComputed] = [before.conditions[from.id], now.conditions[to.id]];
  const conditions = changedConditions({ ...sides, fromComputed, toComputed });
  const results = changedResults(
    { stage: from, topology: fromTopology, results: before.results[from.id] ?? {} },
    { stage: to, topology: toTopology, results: now.results[to.id] ?? {} },
  );
  const counts = {
    parts: parts.length,
    targets: targets.length,
    conditions: conditions.filter(({ byNeighbour }) => !byNeighbour).length,
    results: results.length,
  };
  const changed: ChangedStage = {
    ...named(to),
    ...(from.name === to.name ? {} : { nameBefore: from.name }),
    ...(from.topology === to.topology ? {} : { topologyBefore: from.topology }),
    ...counts,
  };
  const isSame = Object.keys(changed).length === 8 && Object.values(counts).every((count) => count === 0);
  return {
    ...{ parts, targets, conditions, results, changed: isSame ? undefined : changed },
    // Curves are drawn under the conditions that the neighbours left.
    from: { stage: { ...from, conditions: fromComputed ?? from.conditions }, topology: fromTopology },
    to: { stage: { ...to, conditions: toComputed ?? to.conditions }, topology: toTopology },
  };
}

function curvesOf({ from, to, changed }: Compared, wanted: NonNullable<CompareOptions["curves"]>): CurvePair[] {
  if (wanted === "none" || !from.topology || !to.topology) return [];
  if (wanted === "changed" ? !changed : wanted.stage !== to.stage.id) return [];
  const pairs = overlaidCurves(
    { stage: from.stage, topology: from.topology },
    { stage: to.stage, topology: to.topology },
  );
  return wanted === "changed" ? pairs.filter(differs) : pairs;
}

/** What holds for the whole voice is reported under no stage. */
function voiceConditions(from: VoiceDocument, to: VoiceDocument): SettingChange[] {
  const names = [...new Set([...Object.keys(to.conditions), ...Object.keys(from.conditions)])];
  return names.flatMap((name): SettingChange[] => {
    const [before, now] = [from.conditions[name], to.conditions[name]];
    if (before === now) return [];
    return [
      {
        ...{ stage: "", name, label: name, unit: "" },
        ...(before === undefined ? {} : { from: before }),
        ...(now === undefined ? {} : { to: now }),
      },
    ];
  });
}

function changedLinks(
  from: readonly DocumentLink[],
  to: readonly DocumentLink[],
  renamed: ReadonlyMap<string, string>,
): Comparison["links"] {
  const name = (stage: string) => renamed.get(stage) ?? stage;
  const ends = (link: DocumentLink, at: (stage: string) => string = (stage) => stage) =>
    [at(link.from.stage), link.from.port, at(link.to.stage), link.to.port].join("\n");
  const [before, now] = [new Set(from.map((link) => ends(link, name))), new Set(to.map((link) => ends(link)))];
  return {
    added: to.filter((link) => !before.has(ends(link))),
    removed: from.filter((link) => !now.has(ends(link, name))),
  };
}
