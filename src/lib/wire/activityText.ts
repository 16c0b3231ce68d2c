import type { DeedName } from "#lib/policy/index.ts";
import type { ActivityAnswer } from "./activity.ts";
import { csvText } from "./csvText.ts";

type Event = ActivityAnswer["events"][number];

const text = (value: unknown) => (typeof value === "string" || typeof value === "number" ? String(value) : "");

/** What was done, as a sentence that goes on after the name of whoever did it. Deeds that need no words of their own are absent. */
const sentences: Partial<Record<DeedName, (detail: Record<string, unknown>) => string>> = {
  "voice.create": () => "began the voice",
  "voice.rename": ({ from, to }) => `renamed the voice from ${text(from)} to ${text(to)}`,
  "voice.remove": ({ name }) => `removed the voice ${text(name)}`,
  "workingCopy.edit": ({ restored }) =>
    restored === undefined ? "saved the working copy" : `restored revision ${text(restored)} into the working copy`,
  "revision.make": ({ number, reason }) => `made revision ${text(number)}: “${text(reason)}”`,
  "revision.askForReview": ({ number, reviewer }) =>
    `asked ${text(reviewer) || "any reviewer"} to review revision ${text(number)}`,
  "revision.review": ({ number, decision }) =>
    `${decision === "release" ? "released" : "returned"} revision ${text(number)}`,
  "comment.write": ({ number }) => `wrote on revision ${text(number)}`,
  "comment.change": ({ number, deleted }) =>
    `${deleted ? "deleted" : "rewrote"} a remark of their own on revision ${text(number)}`,
  "comment.resolve": ({ number, resolved }) =>
    `${resolved ? "resolved" : "opened again"} a thread on revision ${text(number)}`,
  "shareLink.make": ({ number }) => `made a guest link to revision ${text(number)}`,
  "shareLink.revoke": () => "revoked a guest link",
  "shareLink.open": ({ number }) => `opened revision ${text(number)} by a guest link`,
  "shareLink.download": ({ number }) => `took revision ${text(number)} away by a guest link`,
  "team.invite": ({ email, role }) => `invited ${text(email)} as ${text(role)}`,
  "team.changeRoles": ({ name, from, to }) => `made ${text(name)} ${text(to)}, before ${text(from)}`,
  "team.handOver": ({ name }) => `handed the team over to ${text(name)}`,
  "invitation.accept": ({ role }) => `joined the team as ${text(role)}`,
  "invitation.decline": () => "declined an invitation",
  "invitation.revoke": ({ email }) => `revoked the invitation of ${text(email)}`,
  "member.remove": ({ name }) => `removed ${text(name)} from the team`,
  "member.leave": () => "left the team",
  "session.begin": () => "signed in",
  "apiKey.make": ({ name }) => `made the key ${text(name)}`,
  "apiKey.revoke": ({ name }) => `revoked the key ${text(name)}`,
};

export const activitySentence = ({ action, detail }: Pick<Event, "action" | "detail">): string =>
  sentences[action as DeedName]?.(detail) ?? `did ${action}`;

export function activityCsv(events: readonly Event[]): string {
  return csvText([
    ["When (UTC)", "Who", "What", "Voice", "Deed"],
    ...events.map((event) => [
      ...[event.at, event.actor?.name ?? "", activitySentence(event), event.subject.name ?? "", event.action],
    ]),
  ]);
}
