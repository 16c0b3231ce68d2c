import { graphlib, layout } from "@dagrejs/dagre";

export interface BoxToPlace {
  id: string;
  /** Trigger and control stand above, audio below. */
  lane: "upper" | "lower";
}

export interface PlacedBox {
  id: string;
  x: number;
  y: number;
}

export const boxSize = { width: 150, height: 58 } as const;
const gap = { column: 40, row: 26, lane: 22 } as const;

/**
 * Places the boxes of a chain: columns by how far the signal has come, rows within two lanes. The package settles the
 * order that crosses fewest links; columns and lanes are ours.
 */
export function placeBoxes(boxes: readonly BoxToPlace[], links: readonly { from: string; to: string }[]): PlacedBox[] {
  const graph = new graphlib.Graph({ multigraph: true });
  graph.setGraph({ rankdir: "LR", nodesep: gap.row, ranksep: gap.column });
  graph.setDefaultEdgeLabel(() => ({}));
  for (const { id } of boxes) graph.setNode(id, { ...boxSize });
  links.forEach(({ from, to }, index) => graph.setEdge(from, to, {}, String(index)));
  layout(graph);
  const placed = boxes.map((box) => ({ ...box, ...(graph.node(box.id) as { x: number; y: number }) }));
  const column = columnsOf(boxes, links);
  const columnOf = ({ id }: { id: string }) => column.get(id)!;
  const rows = { upper: rowsOf("upper"), lower: rowsOf("lower") };
  const upperRows = Math.max(0, ...[...rows.upper.values()].map((row) => row + 1));
  return placed.map((box) => {
    const row = rows[box.lane].get(box.id)! + (box.lane === "lower" ? upperRows : 0);
    const shift = box.lane === "lower" && upperRows > 0 ? gap.lane : 0;
    return {
      id: box.id,
      x: columnOf(box) * (boxSize.width + gap.column),
      y: row * (boxSize.height + gap.row) + shift,
    };
  });

  /** Each box in the row of what feeds it where that is free, else in the nearest free one below. */
  function rowsOf(lane: BoxToPlace["lane"]): Map<string, number> {
    const row = new Map<string, number>();
    const taken = new Set<string>();
    const own = placed.filter((box) => box.lane === lane).sort((a, b) => columnOf(a) - columnOf(b) || a.y - b.y);
    for (const box of own) {
      const feeding = links.flatMap(({ from, to }) => (to === box.id ? (row.get(from) ?? []) : []));
      let at = feeding.length > 0 ? Math.min(...feeding) : 0;
      while (taken.has(`${columnOf(box)} ${at}`)) at += 1;
      taken.add(`${columnOf(box)} ${at}`);
      row.set(box.id, at);
    }
    return row;
  }
}

/** Each box one column behind the last of those that feed it. Links must be free of circles. */
function columnsOf(boxes: readonly { id: string }[], links: readonly { from: string; to: string }[]) {
  const column = new Map<string, number>();
  const settle = (id: string): number => {
    const known = column.get(id);
    if (known !== undefined) return known;
    const feeding = links.filter(({ to }) => to === id).map(({ from }) => settle(from));
    const own = feeding.length === 0 ? 0 : Math.max(...feeding) + 1;
    column.set(id, own);
    return own;
  };
  for (const { id } of boxes) settle(id);
  return column;
}
