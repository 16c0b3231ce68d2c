/**
 * A symbol inside a sentence: one or two letters, an underscore, and what stands low. Longer words before an underscore
 * (the name of a function) are no symbols.
 */
const symbol = /(?<![\p{L}_])(\|?\p{L}{1,2}_[\p{L}\d]+(?:,[\p{L}\d]+(?:\/\d)?)?(?:[+\u2212](?![\p{L}\d]))?\|?)/u;

/** A sentence cut at its symbols: every second piece is one. */
export const cutAtSymbols = (text: string): string[] => text.split(symbol);

/** A symbol cut at its subscripts, "t_w,1/2" having one: every second piece stands low. */
export const cutAtSubscripts = (text: string): string[] =>
  text.split(/_((?:[\p{L}\d+\u2212-]|,(?=[\p{L}\d])|\/(?=\d))+)/u);

/** Written HTML with the symbols of its text set as symbols. */
export function setSymbols(html: string): string {
  const set = (text: string) =>
    cutAtSymbols(text)
      .map((piece, i) => (i % 2 === 0 ? piece : `<span class="symbol">${low(piece)}</span>`))
      .join("");
  return html
    .split(/(<code>.*?<\/code>|<[^>]+>)/s)
    .map((piece, i) => (i % 2 === 0 ? set(piece) : piece))
    .join("");
}

const low = (text: string) =>
  cutAtSubscripts(text)
    .map((piece, i) => (i % 2 === 0 ? piece : `<sub>${piece}</sub>`))
    .join("");
