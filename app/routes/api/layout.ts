import { requireAtWorkJson } from "#app/server/at-work.server.ts";
import type { Route } from "./+types/layout.ts";

export const middleware: Route.MiddlewareFunction[] = [requireAtWorkJson];

/** A guarded layout has a loader, so that its guard always runs. */
export function loader() {
  return null;
}
