import { accountRoutes } from "./account.ts";
import { teamRoutes } from "./team.ts";
import { calculatorRoutes } from "./calculators.ts";
import { discussionRoutes } from "./discussion.ts";
import type { Route } from "./route.ts";
import { serviceRoutes } from "./service.ts";
import { revisionRoutes } from "./revisions.ts";
import { voiceRoutes } from "./voices.ts";
import { wholeVoiceRoutes } from "./wholeVoice.ts";

/** The whole HTTP interface, in the order in which its description shows it. */
export const routes: readonly Route[] = [
  ...calculatorRoutes,
  ...voiceRoutes,
  ...wholeVoiceRoutes,
  ...revisionRoutes,
  ...discussionRoutes,
  ...teamRoutes,
  ...accountRoutes,
  ...serviceRoutes,
];

export type { Method, Route, RouteAnswer } from "./route.ts";
