export interface SortOrder<Column extends string> {
  column: Column;
  direction: "ascending" | "descending";
}

interface SortHeaderProps<Column extends string> {
  column: Column;
  label: string;
  order: SortOrder<Column>;
  onOrder: (order: SortOrder<Column>) => void;
  /** Figures stand at the right and open with the largest. */
  numeric?: boolean;
}

/** A column heading that sorts: a second press turns the order round. */
export function SortHeader<Column extends string>({
  column,
  label,
  order,
  onOrder,
  numeric = false,
}: SortHeaderProps<Column>) {
  const active = order.column === column;
  const opposite = order.direction === "ascending" ? "descending" : "ascending";
  const first = numeric ? "descending" : "ascending";
  return (
    <th scope="col" className={numeric ? "right" : undefined} aria-sort={active ? order.direction : undefined}>
      <button type="button" onClick={() => onOrder({ column, direction: active ? opposite : first })}>
        {label}
        <span aria-hidden="true">{active ? (order.direction === "ascending" ? " ↑" : " ↓") : ""}</span>
      </button>
    </th>
  );
}
