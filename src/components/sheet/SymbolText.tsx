import { cutAtSubscripts } from "#lib/wire/symbols.ts";

/** A formula symbol written "f_0" or "|H_0|", with its subscript set low. */
export function SymbolText({ symbol }: { symbol: string }) {
  const pieces = cutAtSubscripts(symbol);
  return (
    <span className="symbol">
      {/* Every second piece is a subscript, whatever the text: its place in the row is its identity. */}
      {pieces.map((piece, i) => (i % 2 === 1 ? <sub key={i}>{piece.replace("-", "\u2212")}</sub> : piece))}
    </span>
  );
}

/** The same for places that hold text only. */
export const plainSymbol = (symbol: string) => symbol.replaceAll("_", "");
