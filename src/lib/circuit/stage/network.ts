/**
 * A topology's network, as data: drawn as a schematic, read out as text, and turned into a net list by the reference
 * checks. Coordinates are grid steps, x to the right and y downwards.
 */
export type Point = readonly [x: number, y: number];

export type DrawnItem =
  | {
      draw: "part";
      part: string;
      symbol: "resistor" | "capacitor" | "rheostat";
      from: Point;
      to: Point;
      nodes: readonly [string, string];
    }
  /** Inputs on the left, the inverting one above unless `plusAbove`; output on the right. `at` is the output's point. */
  | { draw: "op-amp"; name: string; at: Point; plusAbove?: true; nodes: { plus: string; minus: string; out: string } }
  | { draw: "wire"; through: readonly Point[] }
  | { draw: "dot"; at: Point }
  | { draw: "ground"; at: Point }
  | { draw: "port"; at: Point; label: string; side: "left" | "right" }
  | { draw: "node"; at: Point; label: string };

export interface Network {
  width: number;
  height: number;
  items: readonly DrawnItem[];
}
