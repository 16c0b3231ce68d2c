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

/** A drawing wider or higher than a plot has a row for itself. */
const halfWidth = 560;
const plotHeight = 400;

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
  const view = viewOf(topology.network, markings);
  return (
    <figure
      className={view.width > halfWidth || view.height > plotHeight ? "plot network-wide" : "plot"}
      aria-labelledby={`${id}-head`}
    >
      <figcaption className="plot-head">
        <h3 id={`${id}-head`}>Network</h3>
      </figcaption>
      {/* It shrinks so far that it can still be read, and scrolls from there: by keyboard too, which is why it takes the focus. */}
      {/* eslint-disable-next-line jsx-a11y-x/no-noninteractive-tabindex */}
      <div className="network-scroll" role="group" aria-label="Drawing of the network" tabIndex={0}>
        <svg
          className="network"
          viewBox={`${view.left} ${view.top} ${view.width} ${view.height}`}
          width={view.width}
          height={view.height}
          role="img"
          aria-labelledby={`${id}-title`}
          aria-describedby={`${id}-text`}
        >
          <title id={`${id}-title`}>{`Network, ${topology.name}`}</title>
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
      </div>
    </figure>
  );
}
