import { useSyncExternalStore } from "react";
import type { StageFields } from "./fields.ts";

export type FieldName = `${keyof StageFields}.${string}`;

/** What stands in one field, and why it cannot be computed with. Replaced as a whole when either changes. */
interface Typed {
  text: string;
  fault?: string | undefined;
}

export interface FieldStore {
  get(name: FieldName): Typed;
  set(name: FieldName, text: string, fault?: string): void;
  subscribe(listener: () => void): () => void;
}

/**
 * The fields of a sheet, each watched by itself: a sheet has dozens, and a keystroke is to draw one again, not all. Not
 * the form library of the account pages, which would be a tenth of the script that a calculator waits for.
 */
export function fieldStore(start: StageFields): FieldStore {
  const fields = new Map<string, Typed>(
    Object.entries(start).flatMap(([group, texts]) =>
      Object.entries(texts as Record<string, string>).map(([key, text]): [string, Typed] => [
        `${group}.${key}`,
        { text },
      ]),
    ),
  );
  const listeners = new Set<() => void>();
  const blank: Typed = { text: "" };
  return {
    get: (name) => fields.get(name) ?? blank,
    set(name, text, fault) {
      const old = fields.get(name);
      if (old?.text === text && old.fault === fault) return;
      fields.set(name, { text, fault });
      for (const listener of listeners) listener();
    },
    subscribe(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
  };
}

export function useField(store: FieldStore, name: FieldName): Typed {
  const read = () => store.get(name);
  return useSyncExternalStore(store.subscribe, read, read);
}

/** The place in the list of the first field with a fault, and the fault. */
export function useFirstFault(
  store: FieldStore,
  names: readonly FieldName[],
): { at: number; fault: string } | undefined {
  const read = () => names.map((name) => store.get(name)).find(({ fault }) => fault !== undefined);
  const found = useSyncExternalStore(store.subscribe, read, read);
  if (found?.fault === undefined) return undefined;
  return { at: names.findIndex((name) => store.get(name) === found), fault: found.fault };
}
