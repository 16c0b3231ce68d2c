import { log } from "../log.ts";
import { mailer } from "./index.ts";
import type { Letter } from "./letters.ts";

export interface Addressed {
  to: string;
  letter: Letter;
}

/**
 * Sends what a deed gives rise to, after the deed is done: a mail server that is down must not undo a release. What could
 * not be sent is in the log.
 */
export async function post(letters: readonly Addressed[]): Promise<void> {
  await Promise.all(
    letters.map(async ({ to, letter }) => {
      try {
        await mailer.send(to, letter);
      } catch (error) {
        log().error({ err: error, subject: letter.subject }, "a mail could not be sent");
      }
    }),
  );
}
