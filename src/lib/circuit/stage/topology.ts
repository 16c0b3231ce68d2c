import type { DeviceClass } from "../device/classes.ts";
import type { Citation, Formula } from "./citation.ts";
import type { Curve } from "./curve.ts";
import type { PlainConditions } from "./defaults.ts";
import type { Draw } from "./draw.ts";
import type { AnalysedState, Joints, JointState } from "./joint.ts";
import type { Signal } from "./signal.ts";
import type { Network } from "./network.ts";
import type {
  Conditions,
  ConditionValues,
  Parts,
  PartValues,
  Results,
  ResultValues,
  State,
  Targets,
  TargetValues,
} from "./values.ts";
import type { Shown } from "./shown.ts";
import type { Severity } from "./warning.ts";
import type { Unit } from "../quantity/units.ts";

/** A generic class of device, never a maker's type. */
export interface Device {
  /** Unique in the topology: "u1". */
  key: string;
  /** Reference-designator class (IEEE 315). */
  letter: "D" | "Q" | "U" | "J" | "SW";
  label: string;
  deviceClass: DeviceClass;
}

/** Why no parts meet the targets, and which target to move to where. */
export interface DesignRefusal {
  refused: true;
  /** The target or condition to change. */
  field: string;
  message: string;
}

export interface DesignRequest<P extends Parts, C extends Conditions, T extends Targets> {
  targets: TargetValues<T>;
  conditions: ConditionValues<C>;
  /** Parts that are already decided: always those in `anchors`, and any pot the designer keeps. */
  given: Partial<PartValues<P>>;
}

/** A limit of the trade: speaks up when `check` returns a figure. */
export interface Limit<P extends Parts, C extends Conditions, R extends Results> {
  code: string;
  severity: Severity;
  unit: Unit;
  /** How its figures are put in the message where that is not the plain unit. */
  shown?: Shown;
  /** Braces are filled in: {value} and {limit} with units, {detail} with what `check` adds. */
  template: string;
  source: string;
  check(context: {
    parts: PartValues<P>;
    conditions: ConditionValues<C>;
    results: ResultValues<R>;
    /** Least and most of each target that was given. */
    windows: Readonly<Record<string, { least: number; most: number; target: number }>>;
  }): { value: number; limit: number; detail?: string } | undefined;
}

export interface Topology<
  P extends Parts = Parts,
  C extends Conditions = Conditions,
  T extends Targets = Targets,
  R extends Results = Results,
> {
  id: string;
  name: string;
  summary: string;
  parts: P;
  conditions: C;
  targets: T;
  results: R;
  /**
   * Results of these parts under these conditions.
   * Pure; figures that have no meaning are left out rather than given as NaN.
   *
   * @param wanted the targets given, for figures that only have a meaning against them: how much of a knob's travel lies
   *   inside the window
   */
  analyse(state: State<P, C>, wanted?: Partial<TargetValues<T>>): ResultValues<R>;
  /** Exact parts for the targets. */
  design(request: DesignRequest<P, C, T>): PartValues<P> | DesignRefusal;
  /** Parts that the designer chooses first and `design` takes as given; `follows` keeps one equal to another. */
  anchors: readonly { part: keyof P & string; least: number; most: number; follows?: readonly (keyof P & string)[] }[];
  curves: readonly Curve<State<P, C>>[];
  limits: readonly Limit<P, C, R>[];
  formulas: readonly Formula[];
  sources: readonly Citation[];
  network: Network;
  /** Devices on the board besides the parts with values. */
  devices: readonly Device[];
  /** How the kind's ports meet other stages; where given, a port that is not among them is none of this topology. */
  joints?: Joints;
  /** What the stage draws from the rails besides what its devices draw at rest. */
  draws?(state: AnalysedState): Draw[];
  /** Conditions that several inputs decide together: how far the paths of a sum carry the same wave. */
  meets?(inputs: Readonly<Record<string, Signal | undefined>>, state: JointState): PlainConditions;
  /** One row each in the comparison of a kind's topologies: op amps needed, range, what retunes it. */
  traits: readonly { label: string; text: string }[];
  /** What the figures leave out, said beside the results. */
  leavesOut: readonly string[];
}

/** A topology with its own value types forgotten, as generic code handles it. */
export type AnyTopology = Topology;

/**
 * Declares a topology. Inside, values are typed by the descriptors; outside, generic code sees records of numbers that
 * were checked against the same descriptors at the edge.
 */
export function defineTopology<
  const P extends Parts,
  const C extends Conditions,
  const T extends Targets,
  const R extends Results,
>(topology: Topology<P, C, T, R>): AnyTopology {
  for (const [key, field] of Object.entries(topology.targets)) {
    if (!(field.result in topology.results)) throw new Error(`${topology.id}: target ${key} names no result`);
  }
  return topology as unknown as AnyTopology;
}
