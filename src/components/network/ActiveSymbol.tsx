import type { DrawnItem } from "#lib/circuit/index.ts";
import { placeOf, px, step } from "./grid.ts";
import { SymbolTspans } from "./SymbolTspans.tsx";

type ActiveItem = Extract<DrawnItem, { draw: "op-amp" | "ota" | "transistor" | "diode" | "source" | "switch" }>;
type Amplifier = Extract<ActiveItem, { draw: "op-amp" | "ota" }>;
type Transistor = Extract<ActiveItem, { draw: "transistor" }>;
type TwoEnded = Exclude<ActiveItem, Amplifier | Transistor>;

/** Devices: amplifiers, transistors, diodes, sources, switches. */
export function ActiveSymbol({ item }: { item: ActiveItem }) {
  switch (item.draw) {
    case "op-amp":
    case "ota":
      return <AmplifierSymbol item={item} />;
    case "transistor":
      return <TransistorSymbol item={item} />;
    case "diode":
    case "source":
    case "switch":
      return <TwoEndedSymbol item={item} />;
  }
}

function AmplifierSymbol({ item }: { item: Amplifier }) {
  const [x, y] = [px(item.at[0]), px(item.at[1])];
  const back = x - 4 * step;
  const up = item.plusAbove ? -1 : 1;
  const [plus, minus] = [y + up * step, y - up * step];
  return (
    <g>
      <path className="body" d={`M${back} ${y - 2 * step}L${x} ${y}L${back} ${y + 2 * step}Z`} />
      <path className="line" d={`M${back + 7} ${minus}h8M${back + 7} ${plus}h8m-4 -4v8`} />
      {/* A current output: two linked rings inside the tip; the bias pin enters from below. */}
      {item.draw === "ota" && (
        <path
          className="line"
          d={`M${x - 29} ${y}a6 6 0 1 0 12 0a6 6 0 1 0 -12 0m7 0a6 6 0 1 0 12 0a6 6 0 1 0 -12 0M${x - 2 * step} ${y + step}V${y + 2 * step}`}
        />
      )}
      <text className="quiet" x={back + 1.6 * step} y={y + 4} textAnchor="middle">
        {item.name}
      </text>
    </g>
  );
}

function TransistorSymbol({ item }: { item: Transistor }) {
  const [x, y] = [px(item.at[0]), px(item.at[1])];
  const turned = item.facing === "left" ? -1 : 1;
  const emitter = item.polarity === "npn" ? 1 : -1;
  // In its own frame: base at (0, 0), leads two steps right, the emitter below (y > 0) for npn.
  const inner = `M0 0H${step}M${step} -16V16M${step} ${-7 * emitter}L${2 * step} ${-20 * emitter}V${-2 * step * emitter}M${step} ${7 * emitter}L${2 * step} ${20 * emitter}V${2 * step * emitter}`;
  const arrow = item.polarity === "npn" ? "M37 18l-8 -1l5 -6z" : `M${step + 2} -8l8 -1l-5 -6z`;
  return (
    <g>
      <g transform={`translate(${x} ${y}) scale(${turned} 1)`}>
        <circle className="body" cx={step + 7} cy="0" r="22" />
        <path className="line" d={inner} />
        <path className="dot" d={arrow} />
      </g>
      <text className="quiet" x={x + turned * (2 * step + 14)} y={y + 4} textAnchor={turned === 1 ? "start" : "end"}>
        {item.name}
      </text>
    </g>
  );
}

function TwoEndedSymbol({ item }: { item: TwoEnded }) {
  const { transform, length, upright, middle } = placeOf(item.from, item.to);
  const half = length / 2;
  return (
    <g>
      <g transform={transform}>
        {item.draw === "diode" && (
          <>
            <path className="line" d={`M0 0H${length}`} />
            <path className="body" d={`M${half - 8} -9L${half + 8} 0L${half - 8} 9Z`} />
            <path className="line" d={`M${half + 8} -9V9`} />
          </>
        )}
        {item.draw === "source" && (
          <>
            <path className="line" d={`M0 0H${half - 13}M${half + 13} 0H${length}`} />
            <circle className="body" cx={half} cy="0" r="13" />
            <path className="line" d={sourceGlyph[item.sort](half)} />
          </>
        )}
        {item.draw === "switch" && (
          <>
            <path className="line" d={`M0 0H${half - 12}L${half + 10} -11M${half + 12} 0H${length}`} />
            <circle className="dot" cx={half - 12} cy="0" r="2.500" />
            <circle className="dot" cx={half + 12} cy="0" r="2.500" />
          </>
        )}
      </g>
      <text
        x={upright ? middle[0] + 18 : middle[0]}
        y={upright ? middle[1] + 4 : middle[1] - 18}
        textAnchor={upright ? "start" : "middle"}
      >
        <SymbolTspans symbol={item.name} />
      </text>
    </g>
  );
}

const sourceGlyph: Record<Extract<TwoEnded, { draw: "source" }>["sort"], (middle: number) => string> = {
  voltage: (m) => `M${m - 9} 0H${m + 9}`,
  current: (m) => `M${m - 8} 0H${m + 8}m-5 -4l5 4l-5 4`,
  noise: (m) => `M${m - 9} 2l3 -7l3 10l3 -8l3 7l3 -9l3 6`,
};
