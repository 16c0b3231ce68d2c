import type { PlainConditions, PlainValues } from "./defaults.ts";
import type { Demand, Signal } from "./signal.ts";

/** Conditions that a joint decides; one that is undefined stays as it is. */
export type Decided = Readonly<Record<string, number | string | null | undefined>>;

/** A stage as its joints see it. */
export interface JointState {
  parts: PlainValues;
  /** Complete. */
  conditions: PlainConditions;
}

export interface AnalysedState extends JointState {
  results: Readonly<Record<string, number | readonly number[]>>;
  /** What comes in, by port; a port without a link is absent. */
  inputs: Readonly<Record<string, Signal | undefined>>;
}

/**
 * What a port of a topology gives to the stage at the other end of a link, and what it takes from there. Written beside
 * the formulas of the kind, so that nothing else has to know how a kind meets its neighbours.
 */
export interface Joint {
  /** Whether the port is there with these parts; always, unless said. */
  fitted?(state: JointState): boolean;
  /** An input that makes another one needless: that one may stay open while this one is linked. */
  insteadOf?: string;
  /** An input: the conditions that what comes in decides. */
  takes?(signal: Signal, state: JointState): Decided;
  /** An input: what it asks of the output that feeds it. Results are absent before the first analysis. */
  asks?(state: JointState & Partial<Pick<AnalysedState, "results">>): Demand;
  /** An output: what it passes on; undefined where its figures have no meaning. */
  gives?(state: AnalysedState): Signal | undefined;
  /** An output: the conditions that the inputs on it decide. */
  bears?(demand: Demand, state: JointState): Decided;
}

/** By id of the port. */
export type Joints = Readonly<Record<string, Joint>>;
