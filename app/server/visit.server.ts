import type { MiddlewareFunction } from "react-router";
import { systemClock } from "#app/services/clock.server.ts";
import { dbContext, visitContext } from "./context.server.ts";
import { keepSession, readSession, setsSession } from "./session.server.ts";

/** Finds out who is asking, for everything below; a stranger is null, never an error. Whoever comes back within a season stays signed in. */
export const findVisitor: MiddlewareFunction<Response> = async ({ request, context }, next) => {
  const db = context.get(dbContext);
  const now = systemClock.now();
  const found = await readSession(db, request, now);
  context.set(visitContext, found?.visit ?? null);
  const response = await next();
  // A file may be kept by the browser, and a cookie has no business in what is kept.
  const isKept = response.headers.has("Cache-Control");
  if (!found?.dueToExtend || isKept || setsSession(response.headers)) return response;
  const line = await keepSession(db, request, found.visit, now);
  if (line) response.headers.append("Set-Cookie", line);
  return response;
};
