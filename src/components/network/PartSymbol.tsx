import { clearanceOf, type PartItem } from "./clearance.ts";
import { placeOf, px } from "./grid.ts";
import type { PartMarking } from "./networkText.ts";
import { SymbolTspans } from "./SymbolTspans.tsx";

interface PartSymbolProps {
  item: PartItem;
  marking: PartMarking;
  lit: boolean;
  fitted: boolean;
}

/** A part with a value: its body on the wire, name and value beside it. */
export function PartSymbol({ item, marking, lit, fitted }: PartSymbolProps) {
  const { transform, length, upright, middle } = placeOf(item.from, item.to);
  const [x, y] = middle;
  const wiperRight = item.draw === "pot" && px(item.wiper[0]) > x;
  const tall = item.draw === "part" && item.symbol !== "resistor";
  const side = upright && wiperRight ? -1 : 1;
  const textX = upright ? x + (17 + clearanceOf(item)) * side : x;
  return (
    <g className={`part${lit ? " lit" : ""}${fitted ? "" : " unfitted"}`}>
      <g transform={transform}>
        <PartShape item={item} length={length} fitted={fitted} />
      </g>
      {item.draw === "pot" && <Wiper from={item.wiper} to={middle} />}
      <text
        x={textX}
        y={upright ? y - 3 : y - (tall ? 33 : 28) - clearanceOf(item)}
        textAnchor={upright ? (side === 1 ? "start" : "end") : "middle"}
      >
        <SymbolTspans symbol={marking.name} />
        <tspan className="part-value" x={textX} dy="15">
          {/* Short, since it stands where a value of a few letters does. */}
          {fitted ? marking.value : "none"}
        </tspan>
      </text>
    </g>
  );
}

/** Drawn from (0, 0) to (length, 0). */
function PartShape({ item, length, fitted }: { item: PartItem; length: number; fitted: boolean }) {
  const middle = length / 2;
  if (item.draw === "part" && item.symbol === "capacitor") {
    const [left, right] = [middle - 3.5, middle + 3.5];
    return <path className="line" d={`M0 0H${left}M${right} 0H${length}M${left} -11V11M${right} -11V11`} />;
  }
  // A pot that is not fitted is bridged, and the current still finds its way; any other part leaves its place open.
  if (!fitted && (item.draw === "pot" || item.symbol === "rheostat"))
    return <path className="line" d={`M0 0H${length}`} />;
  const half = Math.min(18, middle - 6);
  return (
    <>
      <path className="line" d={`M0 0H${middle - half}M${middle + half} 0H${length}`} />
      <rect className="body" x={middle - half} y="-7" width={2 * half} height="14" />
      {item.draw === "part" && item.symbol === "rheostat" && (
        <path className="line" d={`M${middle - 15} 14L${middle + 15} -14m-8 1l8 -1l-2 8`} />
      )}
    </>
  );
}

function Wiper({ from, to: [x, y] }: { from: readonly [number, number]; to: readonly [number, number] }) {
  const [wx, wy] = [px(from[0]), px(from[1])];
  const distance = Math.hypot(wx - x, wy - y);
  if (distance < 9) return null;
  const [ux, uy] = [(wx - x) / distance, (wy - y) / distance];
  // The tip touches the edge of the body, half its width from the middle.
  const [tx, ty] = [x + 8 * ux, y + 8 * uy];
  const wing = (turn: 1 | -1) => `${tx + 7 * ux - turn * 4 * uy} ${ty + 7 * uy + turn * 4 * ux}`;
  return <path className="line" d={`M${wx} ${wy}L${tx} ${ty}M${wing(1)}L${tx} ${ty}L${wing(-1)}`} />;
}
