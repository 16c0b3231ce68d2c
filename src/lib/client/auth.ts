import { createAuthClient } from "better-auth/client";
import { organizationClient } from "better-auth/client/plugins";

/** The browser half of sign-in; nothing else in the client may reach for the library behind it. */
export const auth = createAuthClient({ plugins: [organizationClient()] });
