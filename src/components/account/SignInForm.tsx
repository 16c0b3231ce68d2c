import { zodResolver } from "@hookform/resolvers/zod";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { auth } from "#lib/client/auth.ts";
import { refusal } from "#lib/client/authProblem.ts";
import type { Role } from "#lib/policy/index.ts";
import { signInInput } from "#lib/wire/account.ts";
import { FormMessage } from "../forms/FormMessage.tsx";
import { SubmitButton } from "../forms/SubmitButton.tsx";
import { TextField } from "../forms/TextField.tsx";
import { roleWords } from "./roleWords.ts";

export interface DemoAccount {
  email: string;
  password: string;
  role: Role;
}

export function SignInForm({ next, demoAccounts = [] }: { next: string; demoAccounts?: DemoAccount[] }) {
  const [failure, setFailure] = useState<string | null>(null);
  const form = useForm({ resolver: zodResolver(signInInput), defaultValues: { email: "", password: "" } });
  const { errors, isSubmitting, isSubmitSuccessful } = form.formState;

  const send = form.handleSubmit(async (entries) => {
    setFailure(null);
    const refused = await refusal(auth.signIn.email({ ...entries, callbackURL: "/verify?confirmed=1" }));
    if (refused !== null) return setFailure(refused);
    window.location.assign(next);
  });

  const fill = (account: DemoAccount) => {
    form.reset({ email: account.email, password: account.password });
    form.setFocus("password");
  };

  return (
    <>
      <form method="post" onSubmit={(event) => void send(event)} noValidate>
        {failure !== null && <FormMessage kind="fault">{failure}</FormMessage>}
        <TextField
          label="E-mail"
          type="email"
          autoComplete="username"
          registration={form.register("email")}
          error={errors.email?.message}
        />
        <TextField
          label="Password"
          type="password"
          autoComplete="current-password"
          registration={form.register("password")}
          error={errors.password?.message}
        />
        <p className="mt-2 flex flex-wrap items-center gap-x-5 gap-y-2">
          <SubmitButton
            label="Sign in"
            busyLabel="Signing in…"
            busy={isSubmitting || (isSubmitSuccessful && failure === null)}
          />
          <a href="/forgot-password">Set a new password</a>
        </p>
      </form>
      {demoAccounts.length > 0 && (
        <section className="mt-7" aria-labelledby="demo-accounts">
          <h2 id="demo-accounts" className="text-body">
            Demo accounts
          </h2>
          <p className="mb-2 text-small text-ink-2">
            This is a demo. Each role of the team has an account; its name fills the form.
          </p>
          <table className="table">
            <tbody>
              {demoAccounts.map((account) => (
                <tr key={account.email}>
                  <th scope="row">
                    <button type="button" className="btn-text" onClick={() => fill(account)}>
                      {account.role}
                    </button>
                  </th>
                  <td className="text-small text-ink-2">{roleWords[account.role]}</td>
                </tr>
              ))}
            </tbody>
          </table>
        </section>
      )}
    </>
  );
}
