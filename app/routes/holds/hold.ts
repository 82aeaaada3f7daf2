import { data, href, redirect } from "react-router";
import { z } from "zod";
import { extendHold, letGo } from "#app/domain/holds/holds.server.ts";
import { getHold } from "#app/domain/holds/holds.sql.server.ts";
import { backTo } from "#app/server/back-to.server.ts";
import { dbContext } from "#app/server/context.server.ts";
import { notHere, requireForm, requireFound, requireRole } from "#app/server/guards.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/hold.ts";

const form = z.object({ intent: z.enum(["extend", "let go"]) });

/** How long "Extend" adds. */
const extraDays = 14;

export async function action({ params, request, context }: Route.ActionArgs) {
  const { actor } = requireRole(context, "hold:change-own");
  const db = context.get(dbContext);
  const { intent } = await requireForm(request, form);
  const hold = requireFound(await getHold(db, actor, params.holdId));
  const result =
    intent === "extend"
      ? await extendHold(db, actor, params.holdId, extraDays, systemClock.now())
      : await letGo(db, actor, params.holdId);
  if (!result.ok && result.why === "missing") notHere();
  if (!result.ok) throw data({ why: result.why }, { status: result.why === "not yours" ? 403 : 409 });
  return redirect(backTo(request, href("/boards/:boardId", { boardId: hold.boardId })));
}
