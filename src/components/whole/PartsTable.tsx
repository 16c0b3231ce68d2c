import { useMemo, useState } from "react";
import { formatPartValue, formatTyped } from "#lib/circuit/index.ts";
import { compareDesignators } from "#lib/wire/designator.ts";
import type { PartsListAnswer } from "#lib/wire/partsList.ts";
import { SortHeader, type SortOrder } from "../page/SortHeader.tsx";

type Row = Omit<PartsListAnswer["devices"][number], "letter" | "perPackage"> & {
  value?: number;
  unit?: "Ω" | "F";
  tolerance?: number;
};
type Column = "designator" | "value" | "stage";

const compare: Record<Column, (a: Row, b: Row) => number> = {
  designator: (a, b) => compareDesignators(a.designator, b.designator),
  value: (a, b) => (a.unit ?? "~").localeCompare(b.unit ?? "~") || (a.value ?? 0) - (b.value ?? 0),
  stage: (a, b) => a.stageName.localeCompare(b.stageName, "en", { numeric: true }),
};

interface PartsTableProps {
  voiceId: string;
  parts: PartsListAnswer["parts"];
  devices: PartsListAnswer["devices"];
}

/** Every part and device, for checking against the board. */
export function PartsTable({ voiceId, parts, devices }: PartsTableProps) {
  const [filter, setFilter] = useState("");
  const [order, setOrder] = useState<SortOrder<Column>>({ column: "designator", direction: "ascending" });
  const rows: Row[] = useMemo(() => [...parts, ...devices], [parts, devices]);
  const shown = useMemo(() => {
    const wanted = filter.trim().toLocaleLowerCase("en");
    const sign = order.direction === "ascending" ? 1 : -1;
    const words = (row: Row) =>
      [row.designator, row.stageName, row.label, row.type, row.value && formatPartValue(row.value, row.unit)].join(" ");
    return rows
      .filter((row) => words(row).toLocaleLowerCase("en").includes(wanted))
      .sort((a, b) => sign * compare[order.column](a, b) || compare.designator(a, b));
  }, [rows, filter, order]);

  if (rows.length === 0) {
    return <p className="prose text-ink-2">No part yet. Add a stage to the voice, and its parts stand here.</p>;
  }
  return (
    <>
      <div className="needs-js no-print mb-3 flex flex-wrap items-end gap-x-5 gap-y-2">
        <div className="field max-w-[280px] flex-1">
          <label htmlFor="part-filter">Show parts with</label>
          <input
            id="part-filter"
            type="search"
            className="input"
            value={filter}
            onChange={(event) => setFilter(event.target.value)}
          />
        </div>
        <p className="pb-2 text-small text-ink-2" role="status">
          {filter === "" ? `${rows.length} in all` : `${shown.length} of ${rows.length}`}
        </p>
      </div>
      <table className="table table-stacks">
        <thead>
          <tr>
            <SortHeader column="designator" label="Designator" order={order} onOrder={setOrder} />
            <SortHeader column="value" label="Value" order={order} onOrder={setOrder} />
            <th scope="col">Type</th>
            <SortHeader column="stage" label="Stage" order={order} onOrder={setOrder} />
            <th scope="col">Role</th>
            <th scope="col" className="right">
              Quantity
            </th>
          </tr>
        </thead>
        <tbody>
          {shown.map((row) => (
            <tr key={`${row.stage} ${row.part}`}>
              <th scope="row" className="val">
                {row.designator ?? <span className="dim">none yet</span>}
              </th>
              <td className={`val ${row.fitted ? "" : "was"}`}>
                {row.value === undefined ? "" : row.value === 0 ? "–" : formatPartValue(row.value, row.unit)}
              </td>
              <td>
                {row.type}
                {row.tolerance !== undefined && `, ${formatTyped(row.tolerance * 100, "")} %`}
              </td>
              <td className="wrap-anywhere">
                <a href={`/voices/${voiceId}/stages/${row.stage}`}>{row.stageName}</a>
              </td>
              <td>{row.label}</td>
              <td className="right num">{row.fitted ? row.quantity : "not fitted"}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </>
  );
}
