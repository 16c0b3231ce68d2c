import { quantile } from "../../numeric/quantile.ts";
import { spacedValues } from "../../stage/curve.ts";
import type { AnyTopology } from "../../stage/topology.ts";
import type { Bench } from "./bench.ts";
import type { SpreadRequest } from "./request.ts";
import { bandShares } from "./statistics.ts";

/** Boards whose curves are kept: more would only cost memory, since a quantile of so many is sure to half a per cent. */
export const mostBandBoards = 10_000;
const usualPoints = 121;
/** Curve points kept at most: 64 MiB. */
const mostCells = 8 * 1024 * 1024;

export interface Band {
  curve: string;
  x: { quantity: string; unit: string };
  y: { quantity: string; unit: string };
  /** x, then the curve's 5, 50 and 95 % quantiles there; points without a figure on any board are left out. */
  points: [x: number, low: number, middle: number, high: number][];
  /** Boards it was taken from: the first ones. */
  boards: number;
}

export interface BandRecorder {
  /** Draws the curve of the board on the bench. */
  record(board: number): void;
  /** The band of the first `boards`. */
  band(boards: number): Band | undefined;
}

/** Keeps the curve of each board, point by point. */
export function bandRecorder(topology: AnyTopology, request: SpreadRequest, bench: Bench): BandRecorder | undefined {
  const curve = topology.curves.find(({ id }) => id === request.band?.curve);
  if (!curve) return undefined;
  const state = { parts: bench.parts, conditions: bench.conditions as never };
  const [least, most] = curve.defined ?? [-Infinity, Infinity];
  const stretch = curve.domain(state);
  if (!stretch.every(Number.isFinite) || stretch[0] >= stretch[1]) return undefined;
  const xs = request.band?.at?.filter((x) => x >= least && x <= most) ?? spacedValues(curve.x, stretch, usualPoints);
  const room = Math.min(request.boards, mostBandBoards, Math.floor(mostCells / Math.max(1, xs.length)));
  const cells = new Float64Array(xs.length * room);
  return {
    record(board) {
      if (board >= room) return;
      const line = curve.lines(state)[0]!;
      for (let i = 0; i < xs.length; i++) cells[i * room + board] = line.at(xs[i]!);
    },
    band(boards) {
      const seen = Math.min(boards, room);
      const points = xs.flatMap((x, i): Band["points"] => {
        const sorted = cells
          .slice(i * room, i * room + seen)
          .filter(Number.isFinite)
          .sort();
        if (sorted.length === 0) return [];
        const [low, middle, high] = bandShares.map((share) => quantile(sorted, share));
        return [[x, low!, middle!, high!]];
      });
      const named = ({ quantity, unit }: { quantity: string; unit: string }) => ({ quantity, unit });
      return { curve: curve.id, x: named(curve.x), y: named(curve.y), points, boards: seen };
    },
  };
}
