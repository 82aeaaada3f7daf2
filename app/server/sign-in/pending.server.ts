import { createCookie } from "react-router";
import { z } from "zod";
import { env } from "#app/services/env.server.ts";
import { challengeMinutes } from "./challenges.server.ts";

const pending = z.object({ challengeId: z.string(), email: z.string(), to: z.string() });

/** A sign-in that has begun in this browser: which challenge, for whom, and where to go after. */
export type Pending = z.infer<typeof pending>;

function cookie() {
  return createCookie("sign-in", {
    path: "/sign-in",
    httpOnly: true,
    sameSite: "lax",
    secure: env().PUBLIC_URL.startsWith("https:"),
    maxAge: challengeMinutes * 60,
    secrets: env().SESSION_SECRETS,
  });
}

/** What this browser began, or null: nothing, too long ago, or an edited cookie. */
export async function readPending(request: Request): Promise<Pending | null> {
  const parsed = pending.safeParse(await cookie().parse(request.headers.get("Cookie")));
  return parsed.success ? parsed.data : null;
}

export function keepPending(value: Pending): Promise<string> {
  return cookie().serialize(value);
}

export function forgetPending(): Promise<string> {
  return cookie().serialize("", { maxAge: 0 });
}

const nowhere = "http://nowhere.invalid";

/** Where to go after signing in: only ever a page of ours. The address is read as a browser reads it, for which "//elsewhere" and "/\\elsewhere" are others'. */
export function localPath(to: string | null | undefined): string {
  if (!to?.startsWith("/") || !URL.canParse(to, nowhere)) return "/";
  const { origin, pathname, search } = new URL(to, nowhere);
  // "/..//elsewhere" is ours by origin, and would be another's once it stands alone.
  return origin === nowhere && !pathname.startsWith("//") ? pathname + search : "/";
}
