import type { ReferenceCase } from "#lib/circuit/index.ts";

/** Sections of a kind's notes by heading. */
export function sectionsOf(markdown: string): Map<string, string> {
  const [, ...parts] = markdown.split(/^## /m);
  return new Map(
    parts.map((part) => {
      const end = part.indexOf("\n");
      return [part.slice(0, end).trim(), part.slice(end + 1).trim()];
    }),
  );
}

const powers: Record<string, number> = { f: -15, p: -12, n: -9, µ: -6, m: -3, k: 3, M: 6, G: 9 };
const figure =
  /(?<![\w.])([-−]?\d+(?:\.\d+)?)(?:\s?([fpnµmkMG]?)(Hz|Ω|F|V|A|S|W|s|K|dB|°|%)(?![A-Za-zΩ/]))?(?![\w.]*\w)/g;

interface Figure {
  value: number;
  hasUnit: boolean;
}

/** The figures of a sentence in plain units: "318.3 kΩ" is 318300. */
export function figuresIn(sentence: string): Figure[] {
  return [...sentence.matchAll(figure)].map(([, digits, prefix, unit]) => ({
    value: Number(`${digits!.replace("−", "-")}e${powers[prefix ?? ""] ?? 0}`) * (unit === "%" ? 0.01 : 1),
    hasUnit: unit !== undefined,
  }));
}

export const sentencesOf = (text: string): string[] => text.replace(/\s+/g, " ").split(/(?<=[.;])\s+(?=[A-Z])/);

/** Whether a sentence works a reference case: it states every expected figure, and no figure with a unit that is not the case's. */
export function works(sentence: string, { given, expect, tolerance }: ReferenceCase): boolean {
  const figures = figuresIn(sentence);
  const known = [given.parts, given.targets, given.conditions, expect]
    .flatMap((values) => Object.values(values ?? {}))
    .filter((value): value is number => typeof value === "number");
  const same = (a: number, b: number) => a === b || Math.abs(a / b - 1) <= tolerance;
  const isKnown = ({ value }: Figure) => known.some((one) => same(value, one));
  return (
    Object.values(expect).every((value) => figures.some((f) => same(f.value, value))) &&
    figures.filter((f) => f.hasUnit).every(isKnown)
  );
}
