export { accounts, rateLimits, sessions, users, verifications } from "./auth.ts";
export { auditEvents } from "./auditEvents.ts";
export { invitations, members } from "./members.ts";
export { revisions } from "./revisions.ts";
export { teams } from "./teams.ts";
export { voices } from "./voices.ts";
export { workingCopies } from "./workingCopies.ts";
