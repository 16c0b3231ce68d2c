import type { PlainConditions } from "../stage/defaults.ts";
import type { ConditionField, NumberField, PartClass } from "../stage/fields.ts";
import type { AnyTopology } from "../stage/topology.ts";
import type { DocumentStage } from "../voice/document.ts";

/** A changed figure; a side is absent where it has none. */
export interface Change {
  from?: number;
  to?: number;
  /** Relative to the old figure: 0.05 for 5 % more. Absent where there is nothing to relate to. */
  change?: number;
}

/** Closer than the digits of any figure that is shown or typed. */
const hair = 1e-12;

export const isSameFigure = (from: number | undefined, to: number | undefined): boolean =>
  from === to ||
  (from !== undefined && to !== undefined && Math.abs(from - to) <= hair * Math.max(Math.abs(from), Math.abs(to)));

export function changeOf(from: number | undefined, to: number | undefined): Change {
  const both = from !== undefined && to !== undefined && from !== 0;
  return {
    ...(from === undefined ? {} : { from }),
    ...(to === undefined ? {} : { to }),
    ...(both ? { change: to / from - 1 } : {}),
  };
}

export interface PartChange extends Change {
  stage: string;
  part: string;
  label: string;
  partClass: PartClass;
  unit: "Ω" | "F";
  /** That of the newer side, or of the older where the part is gone; empty where none was given. */
  designator: string;
  /** Where the part was renumbered. */
  designatorBefore?: string;
}

interface Sides {
  from: DocumentStage | undefined;
  to: DocumentStage | undefined;
  fromTopology: AnyTopology | undefined;
  toTopology: AnyTopology | undefined;
}

const keysOf = (...records: (Readonly<Record<string, unknown>> | undefined)[]) => [
  ...new Set(records.flatMap((record) => Object.keys(record ?? {}))),
];

/** A part of zero is not fitted, which counts as absent. */
const fitted = (value: number | undefined) => (value === 0 ? undefined : value);

/** Parts whose value or designator differs, old and new. */
export function changedParts({ from, to, fromTopology, toTopology }: Sides): PartChange[] {
  const stage = (to ?? from)!.id;
  return keysOf(toTopology?.parts, fromTopology?.parts).flatMap((part): PartChange[] => {
    const [before, now] = [fitted(from?.parts[part]), fitted(to?.parts[part])];
    const [old, designator] = [from?.designators[part] ?? "", to?.designators[part] ?? ""];
    const renumbered = before !== undefined && now !== undefined && old !== designator;
    if (isSameFigure(before, now) && !renumbered) return [];
    const field = (toTopology?.parts[part] ?? fromTopology?.parts[part])!;
    return [
      {
        ...{ stage, part, label: field.label, partClass: field.partClass, unit: field.unit === "F" ? "F" : "Ω" },
        designator: designator || old,
        ...(renumbered && { designatorBefore: old }),
        ...changeOf(before, now),
      },
    ];
  });
}

export interface SettingChange {
  stage: string;
  name: string;
  label: string;
  unit: NumberField["unit"];
  from?: number | string;
  to?: number | string;
  change?: number;
  /** Nobody set it: a stage that is linked to this one did. */
  byNeighbour?: true;
}

const asSetting = (value: number | string | null | undefined) => value ?? undefined;

/** Targets that were moved, set or given up; a window of another width shows as a target of its own name. */
export function changedTargets({ from, to, fromTopology, toTopology }: Sides): SettingChange[] {
  const stage = (to ?? from)!.id;
  return keysOf(toTopology?.targets, fromTopology?.targets).flatMap((name): SettingChange[] => {
    const field = (toTopology?.targets[name] ?? fromTopology?.targets[name])!;
    const [before, now] = [from?.targets[name], to?.targets[name]];
    const common = { stage, name, label: field.label };
    const moved = isSameFigure(before, now) ? [] : [{ ...common, unit: field.unit, ...changeOf(before, now) }];
    const [narrow, wide] = [
      before === undefined ? undefined : (from?.windows?.[name] ?? fromTopology?.targets[name]?.window),
      now === undefined ? undefined : (to?.windows?.[name] ?? toTopology?.targets[name]?.window),
    ];
    if (narrow === undefined || wide === undefined || isSameFigure(narrow, wide)) return moved;
    const window = { ...common, name: `${name}Window`, label: `${field.label}, half-width of the window` };
    return [...moved, { ...window, unit: "", ...changeOf(narrow, wide) }];
  });
}

const valueOf = (field: ConditionField | undefined, given: number | string | null | undefined) =>
  asSetting(given === undefined ? field?.default : given);

/** Conditions as they were given with the stage, and as they stood once its neighbours had decided theirs. */
export interface ConditionSides extends Sides {
  fromComputed: PlainConditions | undefined;
  toComputed: PlainConditions | undefined;
}

/** Conditions that differ, a value left out counting as its usual one. */
export function changedConditions(sides: ConditionSides): SettingChange[] {
  const { from, to, fromTopology, toTopology, fromComputed, toComputed } = sides;
  const stage = (to ?? from)!.id;
  return keysOf(toTopology?.conditions, fromTopology?.conditions).flatMap((name): SettingChange[] => {
    const [old, field] = [fromTopology?.conditions[name], toTopology?.conditions[name]];
    const { label, ...rest } = (field ?? old)!;
    const unit = rest.type === "number" ? rest.unit : "";
    const differing = (before: PlainConditions | undefined, now: PlainConditions | undefined) =>
      settingChange(before && valueOf(old, before[name]), now && valueOf(field, now[name]));
    const given = differing(from?.conditions, to?.conditions);
    // What a neighbour decides overrides what was given, so that is what there is to see.
    const stood = differing(fromComputed ?? from?.conditions, toComputed ?? to?.conditions);
    if (!given && !stood) return [];
    const common = { stage, name, label, unit };
    return given ? [{ ...common, ...(stood ?? given) }] : [{ ...common, ...stood, byNeighbour: true }];
  });
}

function settingChange(
  from: number | string | undefined,
  to: number | string | undefined,
): Pick<SettingChange, "from" | "to" | "change"> | undefined {
  if (typeof from !== "string" && typeof to !== "string")
    return isSameFigure(from, to) ? undefined : changeOf(from, to);
  if (from === to) return undefined;
  return { ...(from === undefined ? {} : { from }), ...(to === undefined ? {} : { to }) };
}
