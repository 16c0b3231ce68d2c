import { useId } from "react";
import { formatPartValue, type AnyTopology, type PlainValues } from "#lib/circuit/index.ts";
import { viewOf } from "./extent.ts";
import { FixtureSymbol } from "./FixtureSymbol.tsx";
import { networkText, type PartMarking } from "./networkText.ts";
import { PartSymbol } from "./PartSymbol.tsx";

interface NetworkDrawingProps {
  topology: AnyTopology;
  parts: PlainValues;
  designators?: Record<string, string> | undefined;
  /** The part whose field has the focus. */
  lit?: string | undefined;
}

/** The topology's network as a schematic in our own hand: IEC bodies, thin wires, values beside the parts. */
export function NetworkDrawing({ topology, parts, designators = {}, lit }: NetworkDrawingProps) {
  const id = useId();
  const { items } = topology.network;
  const markings = Object.fromEntries(
    Object.entries(topology.parts).map(([key, field]): [string, PartMarking] => {
      const value = parts[key]!;
      const name = designators[key] ?? field.symbol;
      return [key, { name, value: value === 0 ? "not fitted" : formatPartValue(value, field.unit) }];
    }),
  );
  return (
    <svg
      className="network"
      viewBox={viewOf(topology.network, markings)}
      role="img"
      aria-labelledby={`${id}-title`}
      aria-describedby={`${id}-text`}
    >
      <title id={`${id}-title`}>{`Network, ${topology.name.toLowerCase()}`}</title>
      <desc id={`${id}-text`}>{networkText(topology, markings).replaceAll("_", "")}</desc>
      {items.map((item, i) =>
        item.draw === "part" || item.draw === "pot" ? (
          <PartSymbol
            key={i}
            item={item}
            marking={markings[item.part]!}
            lit={lit === item.part}
            fitted={parts[item.part] !== 0}
          />
        ) : (
          <FixtureSymbol key={i} item={item} />
        ),
      )}
    </svg>
  );
}
