import { formatPartValue, printQuantity, type Unit } from "#lib/circuit/index.ts";
import { changeText } from "#lib/wire/changeText.ts";
import type { CompareAnswer } from "#lib/wire/compare.ts";
import type { FigureState } from "../page/StateMark.tsx";

type Figure = number | string | readonly number[] | undefined;

/** A figure of either side as it stands in a table. */
export function sideText(value: Figure, unit: string): string {
  if (value === undefined) return "–";
  if (typeof value === "string") return value;
  const list = typeof value === "number" ? [value] : value;
  return list
    .map((figure) => {
      const printed = printQuantity(figure, unit as Unit);
      return printed.unit === "" ? printed.figure : `${printed.figure}\u00a0${printed.unit}`;
    })
    .join(", ");
}

export const partSideText = (value: number | undefined, unit: string): string =>
  value === undefined ? "not fitted" : formatPartValue(value, unit as Unit);

export function changeBetween(from: Figure, to: Figure, unit: string): string {
  if (typeof from !== "number" || typeof to !== "number") return "";
  return changeText(from, to, unit as Unit) ?? "";
}

type Result = CompareAnswer["results"][number];

/** What became of a result against its window: word and shape. */
export function verdictMark({ verdict, states }: Result): { state: FigureState; word: string } | undefined {
  if (!states) return undefined;
  const { from, to } = states;
  if (verdict === "held") return { state: to, word: to };
  if (from !== to) return { state: verdict === "worse" && to === "close" ? "close" : to, word: `now ${to}` };
  return { state: to, word: verdict === "better" ? "nearer, still outside" : "farther outside" };
}
