import type { APIRoute } from "astro";
import { auth } from "#lib/server/auth/index.ts";

/** A plain form ends the session, so that signing out works without JavaScript. */
export const POST: APIRoute = async ({ request }) => {
  const headers = new Headers({ location: "/" });
  const { headers: cleared } = await auth().api.signOut({ headers: request.headers, returnHeaders: true });
  for (const cookie of cleared.getSetCookie()) headers.append("set-cookie", cookie);
  return new Response(null, { status: 303, headers });
};

export const GET: APIRoute = ({ redirect }) => redirect("/account");
