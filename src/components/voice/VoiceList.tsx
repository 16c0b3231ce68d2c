import { useMemo, useState } from "react";
import { takeAwayCsv } from "#lib/client/csv.ts";
import { SortHeader, type SortOrder } from "../page/SortHeader.tsx";
import { savedTime } from "./savedTime.ts";

export interface VoiceRow {
  id: string;
  name: string;
  stageCount: number;
  updatedAt: string;
}

type Column = "name" | "stageCount" | "updatedAt";

const compare: Record<Column, (a: VoiceRow, b: VoiceRow) => number> = {
  name: (a, b) => a.name.localeCompare(b.name, "en", { numeric: true, sensitivity: "base" }),
  stageCount: (a, b) => a.stageCount - b.stageCount,
  updatedAt: (a, b) => a.updatedAt.localeCompare(b.updatedAt),
};

export function VoiceList({ voices }: { voices: VoiceRow[] }) {
  const [filter, setFilter] = useState("");
  const [order, setOrder] = useState<SortOrder<Column>>({ column: "updatedAt", direction: "descending" });

  const shown = useMemo(() => {
    const wanted = filter.trim().toLocaleLowerCase("en");
    const sign = order.direction === "ascending" ? 1 : -1;
    return voices
      .filter(({ name }) => name.toLocaleLowerCase("en").includes(wanted))
      .sort((a, b) => sign * compare[order.column](a, b) || compare.name(a, b));
  }, [voices, filter, order]);

  const takeAway = () =>
    takeAwayCsv("voices.csv", [
      ["Voice", "Stages", "Updated (UTC)"],
      ...shown.map(({ name, stageCount, updatedAt }) => [name, stageCount, updatedAt]),
    ]);

  return (
    <>
      <div className="needs-js mb-4 flex flex-wrap items-end gap-x-5 gap-y-2">
        <div className="field max-w-[280px] flex-1">
          <label htmlFor="voice-filter">Show voices whose name has</label>
          <input
            id="voice-filter"
            type="search"
            className="input"
            value={filter}
            onChange={(event) => setFilter(event.target.value)}
          />
        </div>
        <p className="pb-2 text-small text-ink-2" role="status">
          {filter === "" ? `${voices.length} in all` : `${shown.length} of ${voices.length}`}
        </p>
        <button type="button" className="btn-text mb-1.5 text-small text-ink-2" onClick={takeAway}>
          Take away as CSV
        </button>
      </div>
      {shown.length === 0 ? (
        <p className="py-3 text-ink-2">
          No voice has “{filter.trim()}” in its name.{" "}
          <button type="button" className="btn-text" onClick={() => setFilter("")}>
            Show all
          </button>
        </p>
      ) : (
        <table className="table">
          <thead>
            <tr>
              <SortHeader column="name" label="Voice" order={order} onOrder={setOrder} />
              <SortHeader column="stageCount" label="Stages" order={order} onOrder={setOrder} numeric />
              <SortHeader column="updatedAt" label="Updated, UTC" order={order} onOrder={setOrder} numeric />
            </tr>
          </thead>
          <tbody>
            {shown.map(({ id, name, stageCount, updatedAt }) => (
              <tr key={id}>
                <th scope="row" className="wrap-anywhere">
                  <a href={`/voices/${id}`}>{name}</a>
                </th>
                <td className="right">{stageCount}</td>
                <td className="right dim">
                  <time dateTime={updatedAt}>{savedTime(updatedAt)}</time>
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
    </>
  );
}
