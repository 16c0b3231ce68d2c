import { useState } from "react";
import { designateVoice } from "#lib/client/designateVoice.ts";
import { saveFailure } from "#lib/client/saveFailure.ts";
import type { WorkingCopy } from "#lib/client/workingCopy.ts";
import { FormMessage } from "../forms/FormMessage.tsx";
import { Confirmed } from "../voice/Confirmed.tsx";

interface DesignateProps {
  voiceId: string;
  copy: WorkingCopy;
  /** Parts and devices without a designator. */
  missing: number;
}

/** Gives designators on request; nothing is renumbered unasked. */
export function Designate({ voiceId, copy, missing }: DesignateProps) {
  const [busy, setBusy] = useState(false);
  const [fault, setFault] = useState<string>();
  const run = async (renumber: boolean) => {
    setBusy(true);
    setFault(undefined);
    const outcome = await designateVoice(voiceId, copy, renumber);
    if (outcome.kind === "saved") return window.location.reload();
    setBusy(false);
    setFault(saveFailure(outcome));
  };
  return (
    <>
      {fault !== undefined && <FormMessage kind="fault">{fault}</FormMessage>}
      <div className="flex flex-wrap items-center gap-x-5 gap-y-2">
        {missing > 0 && (
          <button type="button" className="btn" aria-disabled={busy} onClick={() => !busy && void run(false)}>
            Give designators to the {missing} without
          </button>
        )}
        <Confirmed
          label="Renumber all"
          warning="Every designator of this voice is given anew, in the order of the stages. Boards and prints that exist keep the old ones."
          confirmLabel="Renumber all"
          keepLabel="Keep them"
          busy={busy}
          onConfirm={() => void run(true)}
        />
      </div>
    </>
  );
}
