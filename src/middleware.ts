import { actorOf } from "#lib/server/auth/actorOf.ts";
import { actorOfKey, hasBearer } from "#lib/server/apiKeys/bearer.ts";
import { settings } from "#lib/server/env.ts";
import { secureHeaders } from "#lib/server/headers.ts";
import { problemResponse } from "#lib/server/problem.ts";
import { siteOf } from "#lib/server/site.ts";
import { defineMiddleware } from "astro:middleware";

// Nothing under these addresses depends on who asks, so nobody is looked up for them.
const impersonal = ["/api/kinds", "/api/idle", "/api/health", "/api/openapi.json", "/api/auth/"];

const isImpersonal = (path: string) => impersonal.some((prefix) => path.startsWith(prefix));

export const onRequest = defineMiddleware(async (context, next) => {
  context.locals.actor = null;
  context.locals.site = "";
  context.locals.byKey = false;
  context.locals.sessionId = null;
  // Prerendered pages are made at build time, where there is neither a visitor nor a setting.
  if (context.isPrerendered) return next();

  const { pathname } = context.url;
  context.locals.site = siteOf(context.url);
  const cookies: string[] = [];
  let response: Response;
  try {
    if (hasBearer(context.request.headers)) {
      context.locals.byKey = true;
      if (!isImpersonal(pathname)) context.locals.actor = await actorOfKey(context.request.headers);
    } else if (!isImpersonal(pathname)) {
      const visit = await actorOf(context.request.headers);
      context.locals.actor = visit.actor;
      context.locals.sessionId = visit.sessionId;
      cookies.push(...visit.cookies);
    }
    response = await next();
  } catch (error) {
    if (!pathname.startsWith("/api/")) throw error;
    response = problemResponse(error);
  }

  for (const cookie of cookies) response.headers.append("set-cookie", cookie);
  secureHeaders(response.headers, { https: settings().PUBLIC_URL.startsWith("https:") });
  return response;
});
