import { href, redirect } from "react-router";
import { dbContext } from "#app/server/context.server.ts";
import { endSession } from "#app/server/session.server.ts";
import type { Route } from "./+types/sign-out.ts";

export async function action({ request, context }: Route.ActionArgs) {
  const cookie = await endSession(context.get(dbContext), request);
  return redirect(href("/sign-in"), { headers: { "Set-Cookie": cookie } });
}

/** Opened as a page, it does nothing. */
export function loader() {
  return redirect(href("/rack"));
}
