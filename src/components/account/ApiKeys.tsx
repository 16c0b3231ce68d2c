import { zodResolver } from "@hookform/resolvers/zod";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { newApiKey } from "#lib/wire/apiKey.ts";
import { FormMessage } from "../forms/FormMessage.tsx";
import { SubmitButton } from "../forms/SubmitButton.tsx";
import { TextField } from "../forms/TextField.tsx";
import { useAction } from "../team/useAction.ts";
import { Confirmed } from "../voice/Confirmed.tsx";

export interface KeyRow {
  id: string;
  name: string;
  start: string;
  team: string;
  used: string | null;
}

/** Personal keys for scripts. A new one is shown once, and only here. */
export function ApiKeys({ keys: first }: { keys: KeyRow[] }) {
  const [keys, setKeys] = useState(first);
  const [made, setMade] = useState<{ name: string; key: string } | null>(null);
  const { busy, failure, run } = useAction();
  const form = useForm({ resolver: zodResolver(newApiKey), defaultValues: { name: "" } });

  const send = form.handleSubmit((entries) =>
    run<{ id: string; name: string; start: string; team: { name: string }; key: string }>(
      "/api/account/keys",
      { method: "POST", body: entries },
      ({ key, team, ...row }) => {
        setMade({ name: row.name, key });
        setKeys([{ ...row, team: team.name, used: null }, ...keys]);
        form.reset();
      },
    ),
  );

  return (
    <>
      {failure !== null && <FormMessage kind="fault">{failure}</FormMessage>}
      {made !== null && (
        <div className="done mb-3" role="status">
          <strong>Key “{made.name}”.</strong> Copy it now: it is shown this once.
          <code className="mt-1 block wrap-anywhere">{made.key}</code>
        </div>
      )}
      <form method="post" onSubmit={(event) => void send(event)} noValidate>
        <TextField
          label="What will use the key"
          autoComplete="off"
          hint="It acts with your role in the team you work in now"
          registration={form.register("name")}
          error={form.formState.errors.name?.message}
          idPrefix="new-key"
        />
        <p className="mt-2">
          <SubmitButton label="Make a key" busyLabel="Making…" busy={busy} />
        </p>
      </form>
      {keys.length > 0 && (
        <ul className="rows mt-3">
          {keys.map(({ id, name, start, team, used }) => (
            <li key={id} className="flex flex-wrap items-baseline gap-x-3 py-2">
              <span className="wrap-anywhere">
                {name} <span className="val text-ink-2">{start}…</span>
                <span className="block text-small text-ink-2">
                  in {team}, {used === null ? "never used" : `last used ${used} UTC`}
                </span>
              </span>
              <span className="ml-auto">
                <Confirmed
                  label={`Revoke ${name}`}
                  warning="Whatever uses this key stops working at once."
                  confirmLabel="Revoke it"
                  keepLabel="Keep it"
                  busy={busy}
                  onConfirm={() =>
                    void run(`/api/account/keys/${id}`, { method: "DELETE" }, () =>
                      setKeys(keys.filter((key) => key.id !== id)),
                    )
                  }
                />
              </span>
            </li>
          ))}
        </ul>
      )}
    </>
  );
}
