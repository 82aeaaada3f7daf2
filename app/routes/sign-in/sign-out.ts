import { data, href, redirect } from "react-router";
import { dbContext } from "#app/server/context.server.ts";
import { originOf } from "#app/server/origin.server.ts";
import { endSession } from "#app/server/session.server.ts";
import type { Route } from "./+types/sign-out.ts";

export async function action({ request, context }: Route.ActionArgs) {
  // The framework asks this for addresses that have a page, and this one has none.
  if (originOf(request) === "foreign") throw data({ why: "origin" }, { status: 403 });
  const cookie = await endSession(context.get(dbContext), request);
  return redirect(href("/sign-in"), { headers: { "Set-Cookie": cookie } });
}

/** Opened as a page, it does nothing. */
export function loader() {
  return redirect(href("/rack"));
}
