import { notFound } from "./errors.ts";

/** The number of a revision in the address. One that no revision can have names nothing. */
export function numberInPath(params: Record<string, string | undefined>): number {
  const value = params.number;
  if (value === undefined || !/^[1-9]\d{0,8}$/.test(value)) throw notFound();
  return Number(value);
}
