import { data } from "react-router";
import { z } from "zod";
import { keepTallyDraft, readTallyDraft } from "#app/domain/deliveries/tally-draft.server.ts";
import { tallyRows } from "#app/domain/deliveries/tally-draft.ts";
import { dbContext } from "#app/server/context.server.ts";
import { requireFound, requireRole } from "#app/server/guards.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/tally-draft.ts";

const body = z.object({
  rows: tallyRows,
  version: z.number().int().min(0).max(4_000_000_000),
  writer: z.string().min(1).max(40),
  after: z.coerce.date().nullable(),
});

/** The half-typed tally of a delivery as it is kept now, for a page that was away. */
export async function loader({ params, context }: Route.LoaderArgs) {
  const { actor } = requireRole(context, "delivery:tally");
  const { talliedAt, draft } = requireFound(await readTallyDraft(context.get(dbContext), actor, params.deliveryId));
  return { talliedAt: talliedAt?.toISOString() ?? null, draft };
}

/** Keeps a half-typed tally. 409 with the newer one when another page kept that meanwhile. */
export async function action({ params, request, context }: Route.ActionArgs) {
  const { actor } = requireRole(context, "delivery:tally");
  const parsed = body.safeParse(await request.json().catch(() => null));
  if (!parsed.success) throw data({ why: "wrong shape" }, { status: 400 });
  const db = context.get(dbContext);
  const result = requireFound(await keepTallyDraft(db, actor, params.deliveryId, parsed.data, systemClock.now()));
  return data(result, { status: result.kept ? 200 : 409 });
}
