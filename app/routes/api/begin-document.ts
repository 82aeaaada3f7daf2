import { data } from "react-router";
import { z } from "zod";
import { documentTypes, mostDocumentBytes } from "#app/domain/deliveries/document.ts";
import { beginDocument } from "#app/domain/deliveries/documents.server.ts";
import { dbContext, storageContext } from "#app/server/context.server.ts";
import { requireFound, requireRole } from "#app/server/guards.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/begin-document.ts";

const body = z.object({
  name: z.string().max(200),
  bytes: z.number().int().min(1).max(mostDocumentBytes),
  contentType: z.enum(documentTypes.split(",")),
});

/** Announces a paper of a delivery; answers with the address to PUT it to. */
export async function action({ params, request, context }: Route.ActionArgs) {
  const { actor } = requireRole(context, "delivery:receive");
  const parsed = body.safeParse(await request.json().catch(() => null));
  if (!parsed.success) throw data({ why: "wrong type" }, { status: 400 });
  const file = { deliveryId: params.deliveryId, ...parsed.data };
  return requireFound(
    await beginDocument(context.get(dbContext), context.get(storageContext), actor, file, systemClock.now()),
  );
}
