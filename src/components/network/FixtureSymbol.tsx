import type { DrawnItem } from "#lib/circuit/index.ts";
import { pointsOf, px, step } from "./grid.ts";
import { ActiveSymbol } from "./ActiveSymbol.tsx";

type FixtureItem = Exclude<DrawnItem, { draw: "part" | "pot" }>;

/** Everything of a schematic that carries no value: wires, ground, ports, and the devices. */
export function FixtureSymbol({ item }: { item: FixtureItem }) {
  switch (item.draw) {
    case "wire":
      return <polyline className="line" points={pointsOf(item.through)} />;
    case "dot":
      return <circle className="dot" cx={px(item.at[0])} cy={px(item.at[1])} r="3" />;
    case "ground":
      return <path className="line" d={`M${px(item.at[0])} ${px(item.at[1])}v5m-9 0h18m-15 4h12m-9 4h6`} />;
    case "rail": {
      // A negative rail hangs below its point. The name stands beside the bar, where no part of the column is.
      const way = isNegative(item.label) ? 1 : -1;
      return (
        <g>
          <path className="line" d={`M${px(item.at[0])} ${px(item.at[1])}v${5 * way}m-8 0h16`} />
          <text x={px(item.at[0]) + 13} y={px(item.at[1]) + 5 * way + 4}>
            {item.label}
          </text>
        </g>
      );
    }
    case "port": {
      const x = px(item.at[0]) + (item.side === "left" ? -4 : 4);
      return (
        <g>
          <circle className="body" cx={x} cy={px(item.at[1])} r="4" />
          <text x={x} y={px(item.at[1]) - 10} textAnchor="middle">
            {item.label}
          </text>
        </g>
      );
    }
    case "node":
      return (
        <text className="quiet" x={px(item.at[0]) - 7} y={px(item.at[1]) - 7} textAnchor="end">
          {item.label}
        </text>
      );
    case "block": {
      const [x, y] = [px(item.from[0]), px(item.from[1])];
      const [width, height] = [px(item.to[0]) - x, px(item.to[1]) - y];
      return (
        <g>
          <rect className="body" x={x} y={y} width={width} height={height} />
          <text x={x + width / 2} y={y + height / 2 + step / 5} textAnchor="middle">
            {item.label}
          </text>
        </g>
      );
    }
    case "op-amp":
    case "ota":
    case "transistor":
    case "diode":
    case "source":
    case "switch":
      return <ActiveSymbol item={item} />;
  }
}

const isNegative = (rail: string) => /[\u2212-]/.test(rail);
