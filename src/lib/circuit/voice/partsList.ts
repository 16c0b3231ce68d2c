import { deviceClasses, packageName } from "../device/classes.ts";
import type { PartClass } from "../stage/fields.ts";
import type { AnyTopology } from "../stage/topology.ts";
import type { ChainStage, FindTopology } from "./chain.ts";
import { typeOf } from "./partType.ts";

/** A part or a device of one stage. */
interface Listed {
  /** Absent until one is given. */
  designator?: string;
  /** Id of the stage. */
  stage: string;
  stageName: string;
  /** Key in the stage. */
  part: string;
  label: string;
  /** In words: "film resistor", "linear pot", "general-purpose NPN". */
  type: string;
  fitted: boolean;
  /** For all boards; 0 where it is not fitted. */
  quantity: number;
}

export interface ListedPart extends Listed {
  partClass: PartClass;
  value: number;
  unit: "Ω" | "F";
  /** Relative. */
  tolerance: number;
}

export interface ListedDevice extends Listed {
  letter: string;
  /** Devices of its sort in a package. */
  perPackage: number;
}

export interface PartsList {
  boards: number;
  parts: ListedPart[];
  devices: ListedDevice[];
  /** Stages whose network this version does not know; their parts are in no list. */
  unknown: string[];
}

/** Every part and device of a voice, in the order of the stages. A part of value zero is one that is not fitted. */
export function partsList(stages: readonly ChainStage[], find: FindTopology, boards = 1): PartsList {
  const list: PartsList = { boards, parts: [], devices: [], unknown: [] };
  for (const stage of stages) {
    const topology = find(stage.kind, stage.topology)?.topology;
    if (!topology) {
      list.unknown.push(stage.id);
      continue;
    }
    list.parts.push(...partsOf(stage, topology, boards));
    list.devices.push(...devicesOf(stage, topology, boards));
  }
  return list;
}

function listed(stage: ChainStage, part: string, present: boolean, boards: number) {
  const fitted = present && !(stage.notFitted?.includes(part) ?? false);
  const designator = stage.designators[part];
  return {
    ...(designator !== undefined && { designator }),
    ...{ stage: stage.id, stageName: stage.name, part, fitted, quantity: fitted ? boards : 0 },
  };
}

function partsOf(stage: ChainStage, topology: AnyTopology, boards: number): ListedPart[] {
  return Object.entries(topology.parts).flatMap(([key, field]): ListedPart[] => {
    const value = stage.parts[key] ?? 0;
    // What was never given a place on the board is no part of it; what has a designator stays visible.
    if (value === 0 && stage.designators[key] === undefined) return [];
    const { partClass, label, tolerance } = field;
    return [
      {
        ...listed(stage, key, value > 0, boards),
        ...{ label, partClass, value, unit: field.unit === "F" ? "F" : "Ω", tolerance },
        type: typeOf(partClass, topology, stage.conditions),
      },
    ];
  });
}

function devicesOf(stage: ChainStage, { devices }: AnyTopology, boards: number): ListedDevice[] {
  return devices.map(({ key, letter, label, deviceClass }) => ({
    ...listed(stage, key, true, boards),
    ...{ letter, label, type: deviceClass, perPackage: deviceClasses[deviceClass].perPackage },
  }));
}

/** What is bought together: one value of one type and tolerance. */
export interface ValueGroup {
  partClass: PartClass;
  value: number;
  unit: "Ω" | "F";
  tolerance: number;
  type: string;
  quantity: number;
  /** Of the parts that are fitted; "?" for one that has none yet. */
  designators: string[];
}

const classOrder: Record<PartClass, number> = { resistor: 0, capacitor: 1, pot: 2 };

/** Parts grouped for purchasing: resistors, capacitors, pots, by rising value. */
export function byValue(parts: readonly ListedPart[]): ValueGroup[] {
  const groups = new Map<string, ValueGroup>();
  for (const { designator = "?", partClass, value, unit, tolerance, type, quantity } of parts) {
    if (quantity === 0) continue;
    // Twelve digits, so that rounding of the same figure does not make two of it.
    const key = JSON.stringify([partClass, value.toPrecision(12), tolerance, type]);
    const group = groups.get(key) ?? { partClass, value, unit, tolerance, type, quantity: 0, designators: [] };
    groups.set(key, { ...group, quantity: group.quantity + quantity, designators: [...group.designators, designator] });
  }
  return [...groups.values()].sort(
    (a, b) => classOrder[a.partClass] - classOrder[b.partClass] || a.value - b.value || a.tolerance - b.tolerance,
  );
}

/** What is bought together of devices: packages of one class. */
export interface PackageGroup {
  type: string;
  /** Packages, for all boards. */
  quantity: number;
  /** Devices in them that nothing uses, for all boards. */
  spare: number;
  designators: string[];
}

const packageOf = (designator: string) => designator.replace(/[A-H]$/, "");

/** Devices as packages: those that share a designator are one, those without one are packed as tightly as they go. */
export function byPackage({ devices, boards }: PartsList): PackageGroup[] {
  const groups = new Map<string, ListedDevice[]>();
  for (const device of devices) {
    if (!device.fitted) continue;
    groups.set(device.type, [...(groups.get(device.type) ?? []), device]);
  }
  return [...groups].map(([type, members]) => {
    const perPackage = members[0]!.perPackage;
    const marked = members.flatMap(({ designator }) => designator ?? []);
    const packages = new Set(perPackage > 1 ? marked.map(packageOf) : marked);
    const room = packages.size * perPackage - marked.length;
    const loose = members.length - marked.length;
    const count = packages.size + Math.ceil(Math.max(0, loose - room) / perPackage);
    return {
      type: packageName(type as Parameters<typeof packageName>[0]),
      quantity: count * boards,
      spare: (count * perPackage - members.length) * boards,
      designators: marked,
    };
  });
}
