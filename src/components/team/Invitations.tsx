import { zodResolver } from "@hookform/resolvers/zod";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { auth } from "#lib/client/auth.ts";
import { refusal } from "#lib/client/authProblem.ts";
import { roles, type Role } from "#lib/policy/index.ts";
import { invitationInput } from "#lib/wire/account.ts";
import { FormMessage } from "../forms/FormMessage.tsx";
import { SubmitButton } from "../forms/SubmitButton.tsx";
import { TextField } from "../forms/TextField.tsx";

export interface InvitationRow {
  id: string;
  email: string;
  role: Role;
  /** As a list prints it. */
  until: string;
  expired: boolean;
}

interface InvitationsProps {
  teamId: string;
  open: InvitationRow[];
}

/** Invites by e-mail; what nobody has answered yet can be sent again or revoked. */
export function Invitations({ teamId, open }: InvitationsProps) {
  const [failure, setFailure] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const form = useForm({
    resolver: zodResolver(invitationInput),
    defaultValues: { email: "", role: "designer" as Role },
  });
  const { errors, isSubmitting } = form.formState;

  const settle = async (asked: Promise<{ error: { code?: string | undefined; status: number } | null }>) => {
    setFailure(null);
    setBusy(true);
    const refused = await refusal(asked);
    setBusy(false);
    if (refused === null) window.location.reload();
    else setFailure(refused);
  };
  const send = form.handleSubmit(({ email, role }) =>
    settle(auth.organization.inviteMember({ email, role: role as never, organizationId: teamId })),
  );

  return (
    <>
      {failure !== null && <FormMessage kind="fault">{failure}</FormMessage>}
      <form method="post" onSubmit={(event) => void send(event)} noValidate>
        <TextField
          label="E-mail"
          type="email"
          autoComplete="off"
          hint="A mail invites them; it holds for a week"
          registration={form.register("email")}
          error={errors.email?.message}
          idPrefix="invite"
        />
        <div className="field">
          <label htmlFor="invite-role">As</label>
          <select id="invite-role" className="input" defaultValue="designer" {...form.register("role")}>
            {roles.map((role) => (
              <option key={role} value={role}>
                {role}
              </option>
            ))}
          </select>
        </div>
        <p className="mt-3">
          <SubmitButton label="Invite" busyLabel="Inviting…" busy={isSubmitting} />
        </p>
      </form>
      {open.length > 0 && (
        <>
          <h3 className="mt-5">Not answered yet</h3>
          <ul className="rows">
            {open.map(({ id, email, role, until, expired }) => (
              <li key={id} className="py-2">
                <span className="wrap-anywhere">{email}</span>, {role}
                <span className="block text-small text-ink-2">
                  {expired ? "expired" : "holds until"} {until}
                </span>
                <span className="row-actions" role="group" aria-label={`Invitation of ${email}`}>
                  <button
                    type="button"
                    className="btn-text"
                    aria-disabled={busy}
                    onClick={() =>
                      void settle(
                        auth.organization.inviteMember({
                          email,
                          role: role as never,
                          organizationId: teamId,
                          resend: true,
                        }),
                      )
                    }
                  >
                    Send again
                  </button>
                  <button
                    type="button"
                    className="btn-text"
                    aria-disabled={busy}
                    onClick={() => void settle(auth.organization.cancelInvitation({ invitationId: id }))}
                  >
                    Revoke
                  </button>
                </span>
              </li>
            ))}
          </ul>
        </>
      )}
    </>
  );
}
