import { useEffect, useState } from "react";
import { findIn, type FindTopology } from "#lib/circuit/voice/index.ts";
import type { StageKind } from "#lib/circuit/index.ts";

export interface Library {
  find: FindTopology;
  kinds: readonly StageKind[];
}

/** Every stage kind, fetched once the page stands: a voice may hold any of them. Undefined until it is there. */
export function useLibrary(): Library | undefined {
  const [library, setLibrary] = useState<Library>();
  useEffect(() => {
    let wanted = true;
    void import("#lib/circuit/kinds/index.ts").then(({ stageKinds }) => {
      if (wanted) setLibrary({ find: findIn(stageKinds), kinds: stageKinds });
    });
    return () => {
      wanted = false;
    };
  }, []);
  return library;
}
