import { useState } from "react";
import { auth } from "#lib/client/auth.ts";
import { refusal } from "#lib/client/authProblem.ts";
import { FormMessage } from "../forms/FormMessage.tsx";

/** Joins the team or declines. */
export function InvitationAnswer({ id, team }: { id: string; team: string }) {
  const [failure, setFailure] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);

  const answer = async (accept: boolean) => {
    if (busy) return;
    setBusy(true);
    setFailure(null);
    const asked = accept
      ? auth.organization.acceptInvitation({ invitationId: id })
      : auth.organization.rejectInvitation({ invitationId: id });
    const refused = await refusal(asked);
    if (refused === null) return window.location.assign(accept ? "/voices" : `/invitations/${id}`);
    setBusy(false);
    setFailure(refused);
  };

  return (
    <>
      {failure !== null && <FormMessage kind="fault">{failure}</FormMessage>}
      <p className="flex flex-wrap gap-2">
        <button type="button" className="btn btn-primary" aria-disabled={busy} onClick={() => void answer(true)}>
          Join {team}
        </button>
        <button type="button" className="btn" aria-disabled={busy} onClick={() => void answer(false)}>
          Decline
        </button>
      </p>
    </>
  );
}
