import { letter, type Letter } from "./letters.ts";

interface About {
  /** Whom the mail greets. */
  name: string;
  voice: string;
  number: number;
  url: string;
}

export function reviewAskedLetter(about: About & { asker: string; reason: string }): Letter {
  const { name, voice, number, url, asker, reason } = about;
  return letter({
    subject: `Review revision ${number} of ${voice}`,
    greeting: `Hello ${name},`,
    paragraphs: [`${asker} asks you to review revision ${number} of ${voice}: “${reason}”`],
    action: { label: "See what changed", url },
    closing: "Release it or return it with a note; whoever decides first has decided.",
  });
}

export function reviewDecidedLetter(
  about: About & { reviewer: string; decision: "release" | "return"; note: string },
): Letter {
  const { name, voice, number, url, reviewer, decision, note } = about;
  const released = decision === "release";
  return letter({
    subject: `Revision ${number} of ${voice} was ${released ? "released" : "returned"}`,
    greeting: `Hello ${name},`,
    paragraphs: [
      `${reviewer} ${released ? "released" : "returned"} revision ${number} of ${voice}.`,
      ...(note === "" ? [] : [`“${note}”`]),
      ...(released
        ? ["What it holds is frozen; earlier revisions are superseded."]
        : ["The working copy is as you left it. Change it, then make a new revision."]),
    ],
    action: { label: "Open the revision", url },
    closing: "You get this because the revision is yours, or because you asked for its review.",
  });
}
