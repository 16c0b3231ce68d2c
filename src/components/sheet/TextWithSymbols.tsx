import { cutAtSymbols } from "#lib/wire/symbols.ts";
import { SymbolText } from "./SymbolText.tsx";

/** A sentence of a stage kind, with symbols such as "R_A" in it set as the tables set them. */
export function TextWithSymbols({ text }: { text: string }) {
  // Every second piece is a symbol, whatever the text: its place in the row is its identity.
  return cutAtSymbols(text).map((piece, i) => (i % 2 === 1 ? <SymbolText key={i} symbol={piece} /> : piece));
}
