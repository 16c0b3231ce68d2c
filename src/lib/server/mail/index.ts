import { settings } from "../env.ts";
import { startMailFake, type MailFake } from "./fake.ts";
import { createMailer } from "./mailer.ts";

let started: Promise<MailFake> | undefined;

/** The local fake, which stands in for a mail server in demo mode; null where mail really goes out. */
export function mailbox(): Promise<MailFake> | null {
  const { SMTP_URL, CLATTERBENCH_MODE } = settings();
  if (SMTP_URL || CLATTERBENCH_MODE !== "demo") return null;
  started ??= startMailFake();
  return started;
}

export const mailer = createMailer({
  from: () => settings().MAIL_FROM,
  smtpUrl: async () => {
    const fake = await mailbox();
    const url = fake?.url ?? settings().SMTP_URL;
    if (!url) throw new Error("no mail server is set");
    return url;
  },
});
