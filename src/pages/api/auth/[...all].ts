import { answer } from "#lib/server/answer.ts";
import { auth } from "#lib/server/auth/index.ts";
import { vouchedRequest } from "#lib/server/auth/peer.ts";
import { asProblem } from "#lib/server/auth/asProblem.ts";

/** better-auth's own interface: sign-up, sign-in, verification, teams, members, invitations. */
export const ALL = answer(async ({ request, clientAddress }) =>
  asProblem(await auth().handler(vouchedRequest(request, clientAddress))),
);
