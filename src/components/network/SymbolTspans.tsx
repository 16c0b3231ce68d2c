/** A symbol such as "R_A" inside SVG text, its subscript set low. */
export function SymbolTspans({ symbol }: { symbol: string }) {
  const [base, ...rest] = symbol.split("_");
  const low = rest.join("");
  if (low === "") return <tspan>{base}</tspan>;
  return (
    <>
      <tspan>{base}</tspan>
      <tspan className="low" dy="3">
        {low}
      </tspan>
      {/* Back to the base line for whatever follows. */}
      <tspan dy="-3">{"\u200b"}</tspan>
    </>
  );
}
