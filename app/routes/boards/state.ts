import { data, href, redirect } from "react-router";
import { z } from "zod";
import { putBack, takeDown } from "#app/domain/holds/holds.server.ts";
import { backTo } from "#app/server/back-to.server.ts";
import { dbContext } from "#app/server/context.server.ts";
import { notHere, requireForm, requireRole } from "#app/server/guards.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/state.ts";

const form = z.object({ intent: z.enum(["take down", "put back"]) });

export async function action({ params, request, context }: Route.ActionArgs) {
  const { actor, shop } = requireRole(context, "board:take-down");
  const db = context.get(dbContext);
  const { intent } = await requireForm(request, form);
  const now = systemClock.now();
  const result =
    intent === "take down"
      ? await takeDown(db, actor, params.boardId, now)
      : await putBack(db, actor, params.boardId, shop.holdDays, now);
  if (!result.ok && result.why === "missing") notHere();
  if (!result.ok) throw data({ why: result.why, state: result.state }, { status: 409 });
  return redirect(backTo(request, href("/boards/:boardId", { boardId: params.boardId })));
}
