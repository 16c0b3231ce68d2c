import { z } from "zod";

/** One line that somebody writes: trimmed, bounded, without control characters. */
export const oneLine = (most: number, missing: string) =>
  z
    .string()
    .trim()
    .min(1, missing)
    .max(most, `Use at most ${most} characters.`)
    .refine((text) => !/\p{Cc}/u.test(text), { error: "Leave out line breaks and other control characters." });

/** Several lines; the only control characters in it are line breaks and tabs. */
export const someLines = (most: number) =>
  z
    .string()
    .trim()
    .max(most, `Use at most ${most} characters.`)
    .refine((text) => !/[^\P{Cc}\n\r\t]/u.test(text), {
      error: "Leave out control characters other than line breaks.",
    });
