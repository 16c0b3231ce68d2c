import { useState } from "react";
import { failureText, request } from "#lib/client/request.ts";
import { FormMessage } from "../forms/FormMessage.tsx";
import { Confirmed } from "./Confirmed.tsx";

export function DeleteVoice({ voiceId, name }: { voiceId: string; name: string }) {
  const [failure, setFailure] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);

  const remove = async () => {
    setBusy(true);
    setFailure(null);
    const answer = await request(`/api/voices/${voiceId}`, { method: "DELETE" });
    if (answer.kind === "done") return window.location.assign("/voices");
    setBusy(false);
    setFailure(failureText(answer));
  };

  return (
    <>
      {failure !== null && <FormMessage kind="fault">{failure}</FormMessage>}
      <Confirmed
        label="Delete this voice"
        warning={
          <>
            <strong>{name}</strong> and every stage in it will be gone for the whole team. This cannot be taken back.
          </>
        }
        confirmLabel="Delete for good"
        keepLabel="Keep it"
        busy={busy}
        onConfirm={() => void remove()}
      />
    </>
  );
}
