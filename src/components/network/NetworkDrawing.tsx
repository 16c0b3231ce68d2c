import { useId } from "react";
import { formatPartValue, type AnyTopology, type Network, type PlainValues, type Point } from "#lib/circuit/index.ts";
import { SymbolTspans } from "./SymbolTspans.tsx";
import { networkText, type PartMarking } from "./networkText.ts";

interface NetworkDrawingProps {
  topology: AnyTopology;
  parts: PlainValues;
  designators?: Record<string, string> | undefined;
  /** The part whose field has the focus. */
  lit?: string | undefined;
}

/** Pixels of a grid step. */
const step = 20;
type Item = Network["items"][number];
type DrawnPart = Extract<Item, { draw: "part" }>;

/** The topology's network as a schematic in our own hand: IEC bodies, thin wires, values beside the parts. */
export function NetworkDrawing({ topology, parts, designators = {}, lit }: NetworkDrawingProps) {
  const id = useId();
  const { width, height, items } = topology.network;
  const markings = Object.fromEntries(
    Object.entries(topology.parts).map(([key, field]): [string, PartMarking] => {
      const value = parts[key]!;
      return [
        key,
        {
          name: designators[key] ?? field.symbol,
          value: value === 0 ? "not fitted" : formatPartValue(value, field.unit),
        },
      ];
    }),
  );
  return (
    <svg
      className="network"
      viewBox={`0 0 ${width * step} ${height * step}`}
      role="img"
      aria-labelledby={`${id}-title ${id}-text`}
    >
      <title id={`${id}-title`}>{`Network, ${topology.name.toLowerCase()}`}</title>
      <desc id={`${id}-text`}>{networkText(topology, markings).replaceAll("_", "")}</desc>
      {items.map((item, i) =>
        item.draw === "part" ? (
          <Part
            key={i}
            item={item}
            marking={markings[item.part]!}
            lit={lit === item.part}
            fitted={parts[item.part] !== 0}
          />
        ) : (
          <Fixture key={i} item={item} />
        ),
      )}
    </svg>
  );
}

const px = (n: number) => n * step;
const polyline = (points: readonly Point[]) => points.map(([x, y]) => `${px(x)},${px(y)}`).join(" ");

function Fixture({ item }: { item: Exclude<Item, DrawnPart> }) {
  switch (item.draw) {
    case "wire":
      return <polyline className="wire" points={polyline(item.through)} />;
    case "dot":
      return <circle className="dot" cx={px(item.at[0])} cy={px(item.at[1])} r="3" />;
    case "ground":
      return (
        <path
          className="wire"
          d={`M${px(item.at[0])} ${px(item.at[1])}v5m-9 0h18m-15 4h12m-9 4h6`}
        />
      );
    case "port": {
      const side = item.side === "left" ? -1 : 1;
      return (
        <g>
          <circle className="port" cx={px(item.at[0]) + side * 4} cy={px(item.at[1])} r="4" />
          <text className="port-label" x={px(item.at[0]) + side * 4} y={px(item.at[1]) - 10} textAnchor="middle">
            {item.label}
          </text>
        </g>
      );
    }
    case "node":
      return (
        <text className="node-label" x={px(item.at[0]) - 7} y={px(item.at[1]) - 7} textAnchor="end">
          {item.label}
        </text>
      );
    case "op-amp": {
      const [x, y] = [px(item.at[0]), px(item.at[1])];
      const back = x - 4 * step;
      const plusY = item.plusAbove ? y - step : y + step;
      const minusY = item.plusAbove ? y + step : y - step;
      return (
        <g>
          <path className="body" d={`M${back} ${y - 2 * step}L${x} ${y}L${back} ${y + 2 * step}Z`} />
          <path className="wire" d={`M${back + 7} ${minusY}h8M${back + 7} ${plusY}h8m-4 -4v8`} />
          <text className="node-label" x={back + 1.7 * step} y={y + 4} textAnchor="middle">
            {item.name}
          </text>
        </g>
      );
    }
  }
}

function Part({
  item,
  marking,
  lit,
  fitted,
}: {
  item: DrawnPart;
  marking: PartMarking;
  lit: boolean;
  fitted: boolean;
}) {
  const [x1, y1] = [px(item.from[0]), px(item.from[1])];
  const [x2, y2] = [px(item.to[0]), px(item.to[1])];
  const length = Math.hypot(x2 - x1, y2 - y1);
  const angle = (Math.atan2(y2 - y1, x2 - x1) * 180) / Math.PI;
  const upright = Math.abs(x2 - x1) < Math.abs(y2 - y1);
  const [mx, my] = [(x1 + x2) / 2, (y1 + y2) / 2];
  return (
    <g className={`part${lit ? " lit" : ""}${fitted ? "" : " unfitted"}`}>
      <g transform={`translate(${x1} ${y1}) rotate(${angle})`}>
        <SymbolShape symbol={item.symbol} length={length} fitted={fitted} />
      </g>
      <text
        x={upright ? mx + 15 : mx}
        y={upright ? my - 3 : my - (item.symbol === "capacitor" ? 34 : 27)}
        textAnchor={upright ? "start" : "middle"}
      >
        <tspan className="part-name">
          <SymbolTspans symbol={marking.name} />
        </tspan>
        <tspan className="part-value" x={upright ? mx + 15 : mx} dy="15">
          {marking.value}
        </tspan>
      </text>
    </g>
  );
}

/** Drawn from (0, 0) to (length, 0). */
function SymbolShape({ symbol, length, fitted }: { symbol: DrawnPart["symbol"]; length: number; fitted: boolean }) {
  const middle = length / 2;
  if (symbol === "capacitor") {
    return (
      <path
        className="line"
        d={`M0 0H${middle - 3.5}M${middle + 3.5} 0H${length}M${middle - 3.5} -11V11M${middle + 3.5} -11V11`}
      />
    );
  }
  // A pot that is not fitted is bridged: the current still finds its way.
  if (!fitted) return <path className="line" d={`M0 0H${length}`} />;
  const half = Math.min(18, middle - 6);
  return (
    <>
      <path className="line" d={`M0 0H${middle - half}M${middle + half} 0H${length}`} />
      <rect className="body" x={middle - half} y="-7" width={2 * half} height="14" />
      {symbol === "rheostat" && (
        <path className="line" d={`M${middle - 15} 14L${middle + 15} -14m-7.500 1.500l7.500 -1.500l-1.500 7.500`} />
      )}
    </>
  );
}
