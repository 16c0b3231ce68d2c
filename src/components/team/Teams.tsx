import { zodResolver } from "@hookform/resolvers/zod";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { auth } from "#lib/client/auth.ts";
import { refusal } from "#lib/client/authProblem.ts";
import { teamNameInput } from "#lib/wire/account.ts";
import { FormMessage } from "../forms/FormMessage.tsx";
import { SubmitButton } from "../forms/SubmitButton.tsx";
import { TextField } from "../forms/TextField.tsx";

export interface TeamRow {
  id: string;
  name: string;
  role: string;
  current: boolean;
}

/** Letters and digits of the name, and a moment, so that two teams of one name have two addresses. */
const slugOf = (name: string) =>
  `${
    name
      .normalize("NFKD")
      .toLowerCase()
      .replace(/[^a-z0-9]+/g, "-")
      .replace(/^-+|-+$/g, "")
      .slice(0, 40)
      .replace(/-+$/, "") || "team"
  }-${Date.now().toString(36)}`;

/** The teams a person belongs to; one of them is worked in at a time. */
export function Teams({ teams }: { teams: TeamRow[] }) {
  const [failure, setFailure] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const form = useForm({ resolver: zodResolver(teamNameInput), defaultValues: { name: "" } });
  const { errors, isSubmitting } = form.formState;

  const settle = async (asked: Promise<{ error: { code?: string | undefined; status: number } | null }>) => {
    setFailure(null);
    setBusy(true);
    const refused = await refusal(asked);
    setBusy(false);
    if (refused === null) window.location.assign("/voices");
    else setFailure(refused);
  };
  // A new team is worked in at once: the library behind makes it the session's own.
  const begin = form.handleSubmit(({ name }) => settle(auth.organization.create({ name, slug: slugOf(name) })));

  return (
    <>
      {failure !== null && <FormMessage kind="fault">{failure}</FormMessage>}
      <ul className="rows">
        {teams.map(({ id, name, role, current }) => (
          <li key={id} className="flex flex-wrap items-baseline gap-x-3 py-2">
            <span className="wrap-anywhere">{name}</span>
            <span className="text-small text-ink-2">{role}</span>
            {current ? (
              <span className="ml-auto text-small text-ink-2">worked in now</span>
            ) : (
              <button
                type="button"
                className="btn-text ml-auto"
                aria-disabled={busy}
                aria-label={`Work in ${name}`}
                onClick={() => void settle(auth.organization.setActive({ organizationId: id }))}
              >
                Work in it
              </button>
            )}
          </li>
        ))}
      </ul>
      <form method="post" className="mt-3" onSubmit={(event) => void begin(event)} noValidate>
        <TextField
          label="Name of a new team"
          autoComplete="off"
          registration={form.register("name")}
          error={errors.name?.message}
          idPrefix="new-team"
        />
        <p className="mt-2">
          <SubmitButton label="Begin a team" busyLabel="Beginning…" busy={isSubmitting} />
        </p>
      </form>
    </>
  );
}
