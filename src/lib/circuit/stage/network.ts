/**
 * A topology's network, as data: drawn as a schematic, read out as text, and turned into a net list by the reference
 * checks. Coordinates are grid steps, x to the right and y downwards. `nodes` name the electrical nodes; "0" is ground.
 */
export type Point = readonly [x: number, y: number];

export type DrawnItem =
  /** A two-terminal part of the parts table. */
  | {
      draw: "part";
      part: string;
      symbol: "resistor" | "capacitor" | "rheostat";
      from: Point;
      to: Point;
      nodes: readonly [string, string];
    }
  /** A three-terminal pot of the parts table; the wiper's arrow points at the middle of the track. */
  | {
      draw: "pot";
      part: string;
      from: Point;
      to: Point;
      wiper: Point;
      nodes: readonly [from: string, to: string, wiper: string];
    }
  /** Inputs on the left, the inverting one above unless `plusAbove`; output on the right. `at` is the output's point; the inputs lie 4 steps to the left, 1 above and 1 below. */
  | { draw: "op-amp"; name: string; at: Point; plusAbove?: true; nodes: { plus: string; minus: string; out: string } }
  /** As an op amp, with a current output; the bias pin enters from below, 2 steps under and 2 steps left of the output. */
  | {
      draw: "ota";
      name: string;
      at: Point;
      plusAbove?: true;
      nodes: { plus: string; minus: string; out: string; bias: string };
    }
  /** The base lead ends at `at`; collector 2 steps right and 2 above, emitter 2 right and 2 below (the other way up for pnp with its emitter above). */
  | {
      draw: "transistor";
      name: string;
      polarity: "npn" | "pnp";
      at: Point;
      facing?: "right" | "left";
      nodes: { base: string; collector: string; emitter: string };
    }
  | { draw: "diode"; name: string; from: Point; to: Point; nodes: readonly [anode: string, cathode: string] }
  | {
      draw: "source";
      name: string;
      sort: "voltage" | "current" | "noise";
      from: Point;
      to: Point;
      nodes: readonly [string, string];
    }
  | { draw: "switch"; name: string; from: Point; to: Point; nodes: readonly [string, string] }
  | { draw: "block"; label: string; from: Point; to: Point }
  | { draw: "wire"; through: readonly Point[] }
  | { draw: "dot"; at: Point }
  | { draw: "ground"; at: Point }
  | { draw: "rail"; at: Point; label: string }
  | { draw: "port"; at: Point; label: string; side: "left" | "right" }
  | { draw: "node"; at: Point; label: string };

export interface Network {
  width: number;
  height: number;
  items: readonly DrawnItem[];
}
