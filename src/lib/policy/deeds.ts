import { actions, type Action } from "./matrix.ts";

/** What the log tells besides the actions of the role table: what happens to accounts, members and links by themselves. */
export const otherDeeds = [
  "session.begin",
  "invitation.accept",
  "invitation.decline",
  "invitation.revoke",
  "member.remove",
  "member.leave",
  "shareLink.open",
  "shareLink.download",
  "apiKey.make",
  "apiKey.revoke",
] as const;

/** Everything the log of deeds can hold. */
export type DeedName = Action | (typeof otherDeeds)[number];

export const deedNames: readonly DeedName[] = [...actions, ...otherDeeds];
