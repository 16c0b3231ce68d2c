import { createTransport } from "nodemailer";
import type { Letter } from "./letters.ts";

export interface Mailer {
  send(to: string, letter: Letter): Promise<void>;
}

const patience = 10_000;

interface Post {
  from: () => string;
  smtpUrl: () => Promise<string>;
}

/** Sends over SMTP. The address is asked for at first use: the local fake has none before it is started. */
export function createMailer({ smtpUrl, from }: Post): Mailer {
  let transport: ReturnType<typeof createTransport> | undefined;
  return {
    async send(to, { subject, text, html, unsubscribe }) {
      transport ??= createTransport({ url: await smtpUrl(), connectionTimeout: patience, socketTimeout: patience });
      const headers = unsubscribe && {
        "List-Unsubscribe": `<${unsubscribe}>`,
        "List-Unsubscribe-Post": "List-Unsubscribe=One-Click",
      };
      await transport.sendMail({ from: from(), to, subject, text, html, ...(headers && { headers }) });
    },
  };
}
