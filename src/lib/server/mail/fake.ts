import PostalMime from "postal-mime";
import { SMTPServer } from "smtp-server";

export interface StoredMail {
  id: string;
  to: string[];
  from: string;
  subject: string;
  text: string;
  html: string;
  receivedAt: Date;
}

export interface MailFake {
  /** Where to send mail to, as an SMTP address. */
  url: string;
  /** Newest first. */
  list(): readonly StoredMail[];
  find(id: string): StoredMail | undefined;
  close(): Promise<void>;
}

const mostKept = 200;

async function readAll(stream: AsyncIterable<Buffer>): Promise<Buffer> {
  const chunks: Buffer[] = [];
  for await (const chunk of stream) chunks.push(chunk);
  return Buffer.concat(chunks);
}

/** An SMTP server on loopback that delivers nothing and keeps what it was given in memory. */
export async function startMailFake(): Promise<MailFake> {
  const box: StoredMail[] = [];
  let count = 0;

  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ["STARTTLS", "AUTH"],
    onData(stream, session, done) {
      readAll(stream)
        .then((raw) => PostalMime.parse(raw))
        .then(
          (mail) => {
            count += 1;
            box.unshift({
              id: String(count),
              to: session.envelope.rcptTo.map(({ address }) => address),
              from: session.envelope.mailFrom ? session.envelope.mailFrom.address : "",
              subject: mail.subject ?? "",
              text: mail.text ?? "",
              html: mail.html ?? "",
              receivedAt: new Date(),
            });
            box.length = Math.min(box.length, mostKept);
            done();
          },
          (error: unknown) => done(error instanceof Error ? error : new Error(String(error))),
        );
    },
  });

  const port = await new Promise<number>((resolve, reject) => {
    server.once("error", reject);
    const listener = server.listen(0, "127.0.0.1", () => {
      const address = listener.address();
      if (address && typeof address === "object") resolve(address.port);
      else reject(new Error("the mail fake has no port"));
    });
    // Nothing waits for mail: the process may end while this listens.
    listener.unref();
  });

  return {
    url: `smtp://127.0.0.1:${port}`,
    list: () => box,
    find: (id) => box.find((mail) => mail.id === id),
    close: () => new Promise((resolve) => server.close(() => resolve())),
  };
}
