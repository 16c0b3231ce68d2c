export type { Actor, Team } from "./actor.ts";
export { can, decide, type Decision, type Target } from "./can.ts";
export { deedNames, otherDeeds, type DeedName } from "./deeds.ts";
export { actions, matrix, ruleFor, type Action } from "./matrix.ts";
export { isRole, roles, type Role } from "./roles.ts";
export { revisionRights, wasReleased, type RevisionRights, type RevisionTarget } from "./revisionRights.ts";
export { mayFollow, revisionStatuses, statusTransitions, type RevisionStatus } from "./revisionStatus.ts";
