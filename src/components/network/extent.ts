import type { DrawnItem, Network, Point } from "#lib/circuit/index.ts";
import { clearanceOf } from "./clearance.ts";
import { placeOf, px, step } from "./grid.ts";
import type { PartMarking } from "./networkText.ts";

/** About the width of a letter of the drawing's words, a little more than the widest common ones. */
const letter = 8;
const margin = 6;

interface Box {
  left: number;
  top: number;
  right: number;
  bottom: number;
}

/** In pixels of the drawing, whose letters are 13 high. */
export interface View {
  left: number;
  top: number;
  width: number;
  height: number;
}

/** The view that shows the whole drawing: its sheet, widened where words or symbols stand out over the edge. */
export function viewOf({ width, height, items }: Network, markings: Record<string, PartMarking>): View {
  const boxes = items.flatMap((item) => wordsOf(item, markings));
  const left = Math.min(0, ...boxes.map((box) => box.left - margin));
  const top = Math.min(0, ...boxes.map((box) => box.top - margin));
  const right = Math.max(px(width), ...boxes.map((box) => box.right + margin));
  const bottom = Math.max(px(height), ...boxes.map((box) => box.bottom + margin));
  return { left, top, width: right - left, height: bottom - top };
}

/** Where an item's words stand, and what of its symbol lies beyond its points. */
function wordsOf(item: DrawnItem, markings: Record<string, PartMarking>): Box[] {
  switch (item.draw) {
    case "part":
    case "pot": {
      const { name, value } = markings[item.part]!;
      const long = Math.max(name.length, value.length) * letter + clearanceOf(item);
      const { upright, middle } = placeOf(item.from, item.to);
      const [x, y] = middle;
      if (!upright) return [centred(x, y - 45, long, 20)];
      return [{ left: x - 17, right: x + 17 + long, top: y - 15, bottom: y + 15 }];
    }
    case "rail": {
      const [x, y] = at(item.at);
      return [{ left: x - 8, right: x + 13 + item.label.length * letter, top: y - 12, bottom: y + 12 }];
    }
    case "port":
      return [above(item.at, item.label, 22)];
    case "node": {
      const [x, y] = at(item.at);
      return [{ left: x - 7 - item.label.length * letter, right: x, top: y - 18, bottom: y }];
    }
    case "ground": {
      const [x, y] = at(item.at);
      return [{ left: x - 9, right: x + 9, top: y, bottom: y + 14 }];
    }
    case "transistor": {
      const [x, y] = at(item.at);
      const reach = 2 * step + 14 + item.name.length * letter;
      const [left, right] = item.facing === "left" ? [x - reach, x] : [x, x + reach];
      return [{ left, right, top: y - 2 * step, bottom: y + 2 * step }];
    }
    case "diode":
    case "source":
    case "switch": {
      const { upright, middle } = placeOf(item.from, item.to);
      const [x, y] = middle;
      const long = item.name.length * letter;
      return upright
        ? [{ left: x - 13, right: x + 18 + long, top: y - 8, bottom: y + 8 }]
        : [centred(x, y - 31, long, 14)];
    }
    case "op-amp":
    case "ota":
    case "block":
    case "wire":
    case "dot":
      return [];
  }
}

const at = ([x, y]: Point): [number, number] => [px(x), px(y)];
const centred = (x: number, top: number, wide: number, high: number): Box => ({
  left: x - wide / 2,
  right: x + wide / 2,
  top,
  bottom: top + high,
});
const above = (point: Point, label: string, rise: number): Box => {
  const [x, y] = at(point);
  return centred(x, y - rise, label.length * letter, rise);
};
