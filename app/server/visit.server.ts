import type { MiddlewareFunction } from "react-router";
import { systemClock } from "#app/services/clock.server.ts";
import { dbContext, visitContext } from "./context.server.ts";
import { readVisit } from "./session.server.ts";

/** Finds out who is asking, for everything below; a stranger is null, never an error. */
export const findVisitor: MiddlewareFunction<Response> = async ({ request, context }) => {
  context.set(visitContext, await readVisit(context.get(dbContext), request, systemClock.now()));
};
