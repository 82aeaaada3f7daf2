import { href, type RouterContextProvider } from "react-router";
import { dropUnsentInvitation, invite } from "#app/domain/people/people.server.ts";
import type { Role } from "#app/domain/shop/permissions.ts";
import { env } from "#app/services/env.server.ts";
import { type AtWork, dbContext, logContext, mailerContext } from "../context.server.ts";
import { invitationLetter } from "./letters.server.ts";
import { mayInvite } from "./limits.server.ts";

export type AskedIn = { ok: true } | { ok: false; why: "member" | "limit" | "unsent" };

/** Invites somebody and mails the letter. An invitation whose letter could not be sent is taken back, so that nobody waits for it. */
export async function askIn(
  context: Readonly<RouterContextProvider>,
  { actor, shop }: AtWork,
  guest: { email: string; role: Role },
  now: Date,
): Promise<AskedIn> {
  const db = context.get(dbContext);
  const { email, role } = guest;
  if (!(await mayInvite(db, actor.shopId, email, now))) return { ok: false, why: "limit" };
  const invited = await invite(db, actor, email, role, now);
  if (!invited.ok) return invited;
  const link = `${env().PUBLIC_URL}${href("/invitation/:token", { token: invited.token })}`;
  try {
    await context
      .get(mailerContext)
      .send(invitationLetter(email, { by: actor.personName || "An owner", shop: shop.name, role, link }));
  } catch (error) {
    context.get(logContext).error({ err: error }, "an invitation could not be sent");
    await dropUnsentInvitation(db, actor, invited.token);
    return { ok: false, why: "unsent" };
  }
  return { ok: true };
}
